//! One plain type for everything the tool has to say about a spec: code, severity, words, places.
//!
//! Knows spans, not source texts, colours or formats. The closed list of codes is in [`code`].

pub mod code;

use crate::span::Span;
pub use code::Code;

/// How grave a finding is.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Severity {
    /// Worth knowing; changes no exit status.
    Note,
    /// Probably a mistake; changes no exit status.
    Warning,
    /// The spec cannot be trusted, or a requirement does not hold.
    Error,
}

impl Severity {
    /// The word shown to people.
    pub fn word(self) -> &'static str {
        match self {
            Severity::Note => "note",
            Severity::Warning => "warning",
            Severity::Error => "error",
        }
    }
}

/// A place and what is to be said about it.
#[derive(Debug, Clone, PartialEq)]
pub struct Label {
    /// The place.
    pub span: Span,
    /// What is said there; may be empty.
    pub text: String,
}

/// One thing said about a spec.
///
/// Words are lower case without a final stop, names stand in backticks, and the cure is in `help`.
#[derive(Debug, Clone, PartialEq)]
pub struct Diagnostic {
    /// Names the problem, for good.
    pub code: Code,
    /// How grave it is.
    pub severity: Severity,
    /// One sentence.
    pub message: String,
    /// The place itself; the first thing shown.
    pub primary: Label,
    /// Other places that explain it.
    pub secondary: Vec<Label>,
    /// What would mend it.
    pub help: Option<String>,
}

impl Diagnostic {
    /// A finding at `span` with the severity its code has.
    pub fn new(code: Code, span: Span, message: impl Into<String>) -> Self {
        Diagnostic {
            code,
            severity: code.severity(),
            message: message.into(),
            primary: Label { span, text: String::new() },
            secondary: Vec::new(),
            help: None,
        }
    }

    /// Says something at the place itself.
    #[must_use]
    pub fn here(mut self, text: impl Into<String>) -> Self {
        self.primary.text = text.into();
        self
    }

    /// Adds another place.
    #[must_use]
    pub fn label(mut self, span: Span, text: impl Into<String>) -> Self {
        self.secondary.push(Label { span, text: text.into() });
        self
    }

    /// Says what would mend it.
    #[must_use]
    pub fn help(mut self, text: impl Into<String>) -> Self {
        self.help = Some(text.into());
        self
    }
}
