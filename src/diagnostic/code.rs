//! The closed list of finding codes. Each names a problem, not a cure, and has its page section in
//! `docs/findings.md` and a spec that provokes it (`tests/tidy.rs` holds both).

use super::Severity;

macro_rules! codes {
    ($($(#[$doc:meta])* $name:ident = $text:literal, $severity:ident;)*) => {
        /// A stable name for one kind of finding.
        #[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub enum Code { $($(#[$doc])* $name,)* }

        impl Code {
            /// Every code, in the order of this list.
            pub const ALL: &'static [Code] = &[$(Code::$name,)*];

            /// The code as written in reports.
            pub fn text(self) -> &'static str {
                match self { $(Code::$name => $text,)* }
            }

            /// The severity a finding of this code has unless it says otherwise.
            pub fn severity(self) -> Severity {
                match self { $(Code::$name => Severity::$severity,)* }
            }
        }
    };
}

codes! {
    /// A statement the grammar does not know.
    SyntaxError = "syntax-error", Error;
    /// A brace opened and never closed.
    UnclosedBrace = "unclosed-brace", Error;
    /// A brace closed and never opened.
    StrayBrace = "stray-brace", Error;
    /// A string without its closing quote.
    UnclosedString = "unclosed-string", Error;
    /// A clause or line that may stand once and stands twice.
    StatedTwice = "stated-twice", Error;
    /// A name that has a meaning of its own.
    ReservedName = "reserved-name", Error;
    /// A temperature written with a plus, which may be a difference.
    SignedTemperature = "signed-temperature", Error;
    /// A comma where a decimal point is meant.
    DecimalComma = "decimal-comma", Error;
    /// Blocks nested deeper than the language allows.
    NestedTooDeep = "nested-too-deep", Error;
    /// A file that is not UTF-8 or holds NUL bytes.
    NotText = "not-text", Error;
}

impl std::fmt::Display for Code {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        f.write_str(self.text())
    }
}
