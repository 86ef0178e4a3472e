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
