//! Other files of a run: where a path points, and what is there. Does no IO; the bytes are given by
//! whoever has it.

use super::context::Context;
use crate::diagnostic::{Code, Diagnostic};
use crate::source::Source;
use crate::span::FileId;
use crate::syntax::tree::Text;

/// Gives the bytes of the files of a run.
pub trait Files: Sync {
    /// The bytes of the file at `path`: relative to the root of the run, `/` between folders,
    /// without `.` and `..`.
    ///
    /// # Errors
    /// Says why there are none.
    fn read(&self, path: &str) -> Result<Vec<u8>, FileError>;
}

/// Why a file cannot be read.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum FileError {
    /// There is none.
    Missing,
    /// It lies outside the root of the run, by a link for instance.
    Outside,
    /// It is there, and cannot be read; in words.
    Unreadable(String),
}

/// A path as written in file `from`, relative to the root of the run; none when it leaves the root.
///
/// Absolute paths leave it, and so do those of a drive.
pub(crate) fn locate(from: &str, written: &str) -> Option<String> {
    let written = written.replace('\\', "/");
    if written.starts_with('/') || written.contains(':') {
        return None;
    }
    let folder = from.rsplit_once('/').map_or("", |(folder, _)| folder);
    let mut steps: Vec<&str> = Vec::new();
    for step in folder.split('/').chain(written.split('/')) {
        match step {
            "" | "." => {}
            ".." => {
                steps.pop()?;
            }
            step => steps.push(step),
        }
    }
    Some(steps.join("/"))
}

impl Context<'_> {
    /// Reads the text a path names, once however often it is named; a finding if there is none.
    pub(crate) fn load(&mut self, path: &Text) -> Option<FileId> {
        let from = self.sources.get(path.span.file).name().to_string();
        let place = locate(&from, &path.value).ok_or(FileError::Outside);
        if let Ok(place) = &place
            && let Some(file) = self.sources.find(place)
        {
            return Some(file);
        }
        let bytes = place.and_then(|place| Ok((self.files.read(&place)?, place)));
        let (bytes, place) = match bytes {
            Ok(found) => found,
            Err(error) => return self.refuse(unreadable(path, &error)),
        };
        match String::from_utf8(bytes) {
            Ok(text) if !text.contains('\0') => Some(self.sources.add(Source::new(place, text))),
            _ => self.refuse(
                Diagnostic::new(
                    Code::NotText,
                    path.span,
                    format!("`{}` is not a text", path.value),
                )
                .help("save it as UTF-8"),
            ),
        }
    }
}

fn unreadable(path: &Text, error: &FileError) -> Diagnostic {
    let written = &path.value;
    match error {
        FileError::Missing => {
            Diagnostic::new(Code::FileMissing, path.span, format!("there is no file `{written}`"))
                .help("a path is relative to the file it is written in")
        }
        FileError::Outside => Diagnostic::new(
            Code::FileOutside,
            path.span,
            format!("`{written}` lies outside the root of the run"),
        )
        .help("move it below the root, so that the spec gives the same result everywhere"),
        FileError::Unreadable(why) => Diagnostic::new(
            Code::FileUnreadable,
            path.span,
            format!("`{written}` cannot be read: {why}"),
        ),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn paths_are_relative_to_their_file_and_stay_inside() {
        assert_eq!(locate("a/b.gap", "data/x.csv").as_deref(), Some("a/data/x.csv"));
        assert_eq!(locate("a/b.gap", "../x.csv").as_deref(), Some("x.csv"));
        assert_eq!(locate("b.gap", "./x.csv").as_deref(), Some("x.csv"));
        assert_eq!(locate("a/b.gap", "../../x.csv"), None);
        assert_eq!(locate("b.gap", "/etc/x.csv"), None);
        assert_eq!(locate("b.gap", "C:/x.csv"), None);
    }
}
