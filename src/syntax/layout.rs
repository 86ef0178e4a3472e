//! Where statements begin and end: text to logical lines and blocks, before any grammar.
//!
//! One pass over the bytes that knows strings, comments, braces, parentheses and the few words that
//! begin a statement or carry one on, and nothing else of the language. It is written by hand because
//! recovery depends on it: a mistake inside of one statement can never reach the next, a closing brace
//! or a line that begins a file-level statement, and the work is linear in the text however broken it
//! is. The grammar then sees one statement at a time, in which a line end is a blank like any other.

mod lookahead;
mod scan;

pub(super) use lookahead::{line_end, skip_blanks, skip_lines, word_at};

use super::tree::Comment;
use crate::diagnostic::Diagnostic;
use crate::span::FileId;

/// What a block may hold, as far as line ends depend on it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Context {
    /// The file itself.
    File,
    /// Statements that may run over several lines.
    Statements,
    /// Rows, each on its line: a row may begin with a sign.
    Rows,
    /// The lines of a joint.
    Joint,
}

/// A logical line: a statement's words, however many lines they take, and its block.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Line {
    /// Offset of its first byte.
    pub(super) start: usize,
    /// Offset past its last byte, before its block, without blanks and comments.
    pub(super) end: usize,
    /// What stands in braces after it.
    pub(super) block: Option<Block>,
    /// False when its words are reported already and no grammar needs to look at them.
    pub(super) sound: bool,
}

/// The lines between two braces.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Block {
    /// Offset of `{`.
    pub(super) open: usize,
    /// Offset past `}`, or where the block is taken to end without one.
    pub(super) end: usize,
    /// Its lines.
    pub(super) lines: Vec<Line>,
}

/// A file's lines, its comments, and what is wrong with strings, braces and commas.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct Layout {
    pub(super) lines: Vec<Line>,
    pub(super) comments: Vec<Comment>,
    pub(super) diagnostics: Vec<Diagnostic>,
}

/// True if the word at `at` carries on a statement from the line before.
pub(super) fn carries_on(text: &str, at: usize) -> bool {
    lookahead::carries_on(text, at, Context::File)
}

impl Layout {
    /// Lays out a text.
    pub(super) fn of(text: &str, file: FileId) -> Layout {
        scan::Scanner::new(text, file).run()
    }
}

impl Line {
    /// Offset past the statement, its block included.
    pub(super) fn whole_end(&self) -> usize {
        self.block.as_ref().map_or(self.end, |block| block.end)
    }
}

#[cfg(test)]
mod tests {
    use super::{FileId, Layout, Line};

    fn shape(text: &str) -> String {
        fn write(line: &Line, text: &str, out: &mut String) {
            let words: Vec<&str> = text[line.start..line.end].split_whitespace().collect();
            out.push_str(&format!("[{}", words.join(" ")));
            if let Some(block) = &line.block {
                out.push_str(" {");
                block.lines.iter().for_each(|line| write(line, text, out));
                out.push('}');
            }
            out.push(']');
        }
        let mut out = String::new();
        Layout::of(text, FileId(0)).lines.iter().for_each(|line| write(line, text, &mut out));
        out
    }

    #[test]
    fn a_statement_ends_at_a_line_end_a_semicolon_or_a_brace() {
        assert_eq!(shape("a\nb; c # d\n{e;f}"), "[a][b][c {[e][f]}]");
        assert_eq!(
            shape("part p of m { a = 1; b = \"}\" }\nx"),
            "[part p of m {[a = 1][b = \"}\"]}][x]"
        );
    }

    #[test]
    fn it_goes_on_in_parentheses_after_operators_and_before_clause_words() {
        assert_eq!(
            shape("gap g =\n a # one\n\n - b\n + (c\n d)\n{}"),
            "[gap g = a # one - b + (c d) {}]"
        );
        assert_eq!(shape("gap g = a -\n b"), "[gap g = a - b]");
        assert_eq!(
            shape("part p of m {\na = 1\n because \"x\"\nalong = 2\n}"),
            "[part p of m {[a = 1 because \"x\"][along = 2]}]"
        );
    }

    #[test]
    fn rows_may_begin_with_a_sign() {
        assert_eq!(
            shape("material m {\n expansion {\n -196 1\n -100 2\n }\n}"),
            "[material m {[expansion {[-196 1][-100 2]}]}]"
        );
    }

    #[test]
    fn an_opener_ends_all_open_blocks_and_an_unfinished_line() {
        assert_eq!(
            shape("fit f = a in b {\n joint {\n length 2\ngap g = (a +\npart p of m"),
            "[fit f = a in b {[joint {[length 2]}]}][gap g = (a +][part p of m]"
        );
        assert_eq!(
            shape("part p of m {\n part = 3\n gap = 4\n}"),
            "[part p of m {[part = 3][gap = 4]}]"
        );
    }
}
