//! Lines to tree: picks each line's rule by the words it begins with, and joins blocks to headers.

mod blocks;
mod file;

use super::expected;
use super::found::{found, token};
use super::grammar::{self, Node, Place, Rule};
use super::layout::{Layout, Line, word_at};
use super::lower::Lower;
use super::tree::{Broken, File, Name};
use super::{Parsed, STATEMENT_WORDS, layout};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{FileId, Span, Spanned};

/// A function that lowers what a rule has read.
type Lowering<T> = fn(&mut Lower, Node<'_>) -> Option<T>;

/// Reads one file.
pub(super) struct Reader<'a> {
    text: &'a str,
    file: FileId,
    lower: Lower,
    broken: Vec<Broken>,
    /// The statement whose block is being read.
    within: Option<Name>,
}

/// Reads a whole text.
pub(super) fn read(text: &str, file: FileId) -> Parsed {
    let Layout { lines, comments, diagnostics } = Layout::of(text, file);
    let mut reader =
        Reader { text, file, lower: Lower { diagnostics }, broken: Vec::new(), within: None };
    let statements = lines.iter().filter_map(|line| reader.file_line(line)).collect();
    let mut diagnostics = reader.lower.diagnostics;
    diagnostics
        .sort_by_key(|diagnostic| (diagnostic.primary.span.start, diagnostic.primary.span.end));
    Parsed { tree: File { statements, comments, broken: reader.broken }, diagnostics }
}

impl<'a> Reader<'a> {
    fn words(&self, line: &Line) -> &'a str {
        &self.text[line.start..line.end]
    }

    fn first_word(&self, line: &Line) -> &'a str {
        word_at(self.text, line.start)
    }

    /// The word after the first.
    fn second_word(&self, line: &Line) -> &'a str {
        word_at(self.text, self.after_first_word(line))
    }

    /// Offset of what follows the first word.
    fn after_first_word(&self, line: &Line) -> usize {
        layout::skip_lines(self.text, line.start + self.first_word(line).len()).min(line.end)
    }

    fn whole(&self, line: &Line) -> Span {
        Span::new(self.file, line.start, line.whole_end())
    }

    fn report(&mut self, diagnostic: Diagnostic) {
        self.lower.diagnostics.push(diagnostic);
    }

    /// Reads a line's words by one rule; what cannot be read is reported and kept as broken.
    fn header<T>(&mut self, line: &Line, rule: Rule, lower: Lowering<T>) -> Option<T> {
        let said = self.lower.diagnostics.len();
        let read = if line.sound {
            let place = Place { file: self.file, offset: line.start };
            match grammar::read(rule, self.words(line), place) {
                Ok(node) => lower(&mut self.lower, node),
                Err(failure) => {
                    self.report(expected::diagnostic(&failure, self.text, line, self.file));
                    None
                }
            }
        } else {
            None
        };
        if read.is_none() {
            if line.sound && said == self.lower.diagnostics.len() {
                let span = Span::new(self.file, line.start, line.end);
                self.report(Diagnostic::new(
                    Code::SyntaxError,
                    span,
                    "this statement cannot be read",
                ));
            }
            self.broken(line);
        }
        read
    }

    /// Reads a line that takes no block.
    fn lone<T>(&mut self, line: &Line, rule: Rule, lower: Lowering<T>) -> Option<T> {
        let read = self.header(line, rule, lower);
        if let (Some(block), true) = (&line.block, read.is_some()) {
            self.report(expected::unexpected_block(self.text, line, block.open, self.file));
        }
        read
    }

    /// Reports a line that begins with none of the words that may begin it.
    fn unknown(&mut self, line: &Line, words: &[&str], expected: &str) {
        if line.sound {
            let at = line.start;
            let span = Span::new(self.file, at, at + token(self.text, at).len());
            let message = format!("expected {expected}, found {}", found(self.text, at));
            let diagnostic = Diagnostic::new(Code::SyntaxError, span, message);
            let first = self.first_word(line);
            let meant = words.iter().find(|word| word.eq_ignore_ascii_case(first)).copied();
            let rest = &self.text[self.after_first_word(line)..line.end];
            let dimension = !first.is_empty() && rest.starts_with('=') && words.contains(&"part");
            let help = match meant.or_else(|| expected::nearest(first, words)) {
                _ if dimension => {
                    "a dimension stands in the block of its part: is a brace missing above?"
                        .to_owned()
                }
                Some(word) => format!("did you mean `{word}`?"),
                None => {
                    let quoted: Vec<String> =
                        words.iter().map(|word| format!("`{word}`")).collect();
                    format!("what may stand here: {}", quoted.join(", "))
                }
            };
            self.report(diagnostic.help(help));
        }
        self.broken(line);
    }

    /// Keeps what a broken line seems to define.
    fn broken(&mut self, line: &Line) {
        let first = self.first_word(line);
        let name = if STATEMENT_WORDS.contains(&first) && !self.second_word(line).is_empty() {
            let start = self.after_first_word(line);
            Some((self.second_word(line), start))
        } else {
            (!first.is_empty()).then_some((first, line.start))
        };
        let name = name.map(|(name, start)| {
            Spanned::new(name.to_owned(), Span::new(self.file, start, start + name.len()))
        });
        self.broken.push(Broken { name, within: self.within.clone(), span: self.whole(line) });
    }

    /// The name after a header's first word, read or not.
    fn name_of(&self, line: &Line) -> Option<Name> {
        let name = self.second_word(line);
        let start = self.after_first_word(line);
        (!name.is_empty())
            .then(|| Spanned::new(name.to_owned(), Span::new(self.file, start, start + name.len())))
    }

    /// Reads the lines of a statement's block.
    fn block(&mut self, line: &Line, mut each: impl FnMut(&mut Self, &Line)) {
        let Some(block) = &line.block else { return };
        let outer = self.within.take();
        self.within = outer.clone().or_else(|| self.name_of(line));
        for line in &block.lines {
            each(self, line);
        }
        self.within = outer;
    }

    /// Reports a header without the block it needs.
    fn needs_block(&mut self, line: &Line) {
        if line.block.is_none() && line.sound {
            self.report(expected::missing_block(self.text, line, self.file));
        }
    }
}
