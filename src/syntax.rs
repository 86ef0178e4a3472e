//! Text to tree: what a `.gap` file says, with its places, its comments and its mistakes.
//!
//! Owns the grammar, the recovery from mistakes and the one layout of a file. Must not know units
//! or what a name means.

mod decode;
mod expected;
mod found;
mod grammar;
mod layout;
mod lower;
mod read;
mod tidy;
pub mod tree;

use crate::diagnostic::Diagnostic;
use crate::span::FileId;
pub use decode::{NotText, decode};

/// The words that begin a statement.
const STATEMENT_WORDS: [&str; 17] = [
    "assembly",
    "drawing",
    "lengths",
    "temperatures",
    "reference",
    "general",
    "use",
    "note",
    "condition",
    "material",
    "part",
    "fit",
    "gap",
    "result",
    "let",
    "restraint",
    "fill",
];

/// A tree, and what is wrong with the text it was read from.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Parsed {
    /// Everything that could be read.
    pub tree: tree::File,
    /// What could not be read, in the order of the text.
    pub diagnostics: Vec<Diagnostic>,
}

/// Reads a text, mistakes and all.
///
/// Never fails: what cannot be read is reported and kept in [`tree::File::broken`]. The work is
/// linear in the text.
pub fn parse(text: &str, file: FileId) -> Parsed {
    read::read(text, file)
}

/// The text in the one layout, its comments kept; nothing if it has syntax errors.
///
/// Laying out twice changes nothing more, and the tree stays as it is but for places and the one
/// spelling of some units and signs (`degC`, `um`, `dia`, `x`, `>=`, `±`).
pub fn tidy(text: &str, file: FileId) -> Option<String> {
    tidy::tidy(text, file)
}
