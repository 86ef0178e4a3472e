//! How a command ends: with an answer, or with a refusal that says what to do.

/// The answer of a command.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub(crate) enum Outcome {
    /// Everything that was asked holds.
    Holds,
    /// Something does not.
    Fails,
    /// Some spec or file is wrong, which has been said.
    Wrong,
}

/// Why a command could not do what it was asked.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(crate) struct Refusal {
    /// What is wrong.
    pub(crate) message: String,
    /// What to do about it.
    pub(crate) help: Option<String>,
}

impl Refusal {
    /// A refusal with its way out.
    pub(crate) fn new(message: impl Into<String>, help: impl Into<String>) -> Self {
        Refusal { message: message.into(), help: Some(help.into()) }
    }
}

/// The words for an error of the file system, without its number.
pub(crate) fn reason(error: &std::io::Error) -> String {
    use std::io::ErrorKind;
    match error.kind() {
        ErrorKind::NotFound => "there is no such file".to_string(),
        ErrorKind::PermissionDenied => "its permissions forbid it".to_string(),
        ErrorKind::IsADirectory => "it is a folder".to_string(),
        ErrorKind::StorageFull => "there is no room left".to_string(),
        ErrorKind::ReadOnlyFilesystem => "the file system is read-only".to_string(),
        ErrorKind::InvalidInput => "it is no file name here".to_string(),
        _ => {
            let text = error.to_string();
            match text.find(" (os error") {
                Some(end) => text[..end].to_lowercase(),
                None => text,
            }
        }
    }
}
