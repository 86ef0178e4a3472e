//! The generated parser and the only door to it: a rule and a statement in, a node or the place of
//! the failure out. The parser generator is named here and nowhere else but in `Cargo.toml`.

use pest::Parser as _;
use pest::error::{ErrorVariant, InputLocation};
use pest::iterators::{Pair, Pairs};

use crate::span::{FileId, Span};

/// The generated parser, in a module of its own because its items carry the grammar's comments only.
mod generated {
    #![allow(missing_docs)]

    /// Reads one statement.
    #[derive(pest_derive::Parser)]
    #[grammar = "../grammar/lexical.pest"]
    #[grammar = "../grammar/words.pest"]
    #[grammar = "../grammar/quantity.pest"]
    #[grammar = "../grammar/expression.pest"]
    #[grammar = "../grammar/head.pest"]
    #[grammar = "../grammar/condition.pest"]
    #[grammar = "../grammar/material.pest"]
    #[grammar = "../grammar/part.pest"]
    #[grammar = "../grammar/response.pest"]
    #[grammar = "../grammar/requirement.pest"]
    pub(in crate::syntax) struct Statements;
}

pub(super) use generated::Rule;

/// Where a text that is read stands.
#[derive(Debug, Clone, Copy)]
pub(super) struct Place {
    pub(super) file: FileId,
    pub(super) offset: usize,
}

/// A piece of a statement that a rule has read.
#[derive(Debug, Clone)]
pub(super) struct Node<'a> {
    pair: Pair<'a, Rule>,
    place: Place,
}

/// Where a rule could not go on.
#[derive(Debug, Clone)]
pub(super) struct Failure {
    /// Offset in the statement.
    pub(super) at: usize,
    /// What would have been read there.
    pub(super) expected: Vec<Rule>,
}

/// Reads `text`, which stands at `place`, by one of the grammar's `…_line` rules.
pub(super) fn read(rule: Rule, text: &str, place: Place) -> Result<Node<'_>, Failure> {
    match generated::Statements::parse(rule, text) {
        Ok(mut pairs) => match pairs.next() {
            Some(pair) => Ok(Node { pair, place }),
            None => Err(Failure { at: 0, expected: vec![rule] }),
        },
        Err(error) => {
            let at = match error.location {
                InputLocation::Pos(at) | InputLocation::Span((at, _)) => at,
            };
            let expected = match error.variant {
                ErrorVariant::ParsingError { positives, .. } => positives,
                ErrorVariant::CustomError { .. } => Vec::new(),
            };
            Err(Failure { at, expected })
        }
    }
}

impl<'a> Node<'a> {
    pub(super) fn rule(&self) -> Rule {
        self.pair.as_rule()
    }

    pub(super) fn text(&self) -> &'a str {
        self.pair.as_str()
    }

    /// Its place. A rule that ends in something optional has read the blanks and comments before it
    /// too; the place ends where its words do.
    pub(super) fn span(&self) -> Span {
        let span = self.pair.as_span();
        let start = self.place.offset + span.start();
        Span::new(self.place.file, start, start + words_end(span.as_str()))
    }

    pub(super) fn children(self) -> Nodes<'a> {
        Nodes { pairs: self.pair.into_inner(), place: self.place }
    }

    /// The first child that `rule` has read.
    pub(super) fn child(&self, rule: Rule) -> Option<Node<'a>> {
        self.clone().children().find(|node| node.rule() == rule)
    }
}

/// Length of `text` without the blanks and comments at its end.
fn words_end(text: &str) -> usize {
    let trimmed = text.trim_end().len();
    // A comment ends with its line, so only a piece with a line end among its last blanks can end in one.
    if !text[trimmed..].contains('\n') || !text[..trimmed].contains('#') {
        return trimmed;
    }
    let mut end = 0;
    let mut at = 0;
    let bytes = text.as_bytes();
    while at < trimmed {
        match bytes[at] {
            b'#' => at = super::layout::line_end(text, at),
            b'"' => {
                at += 1;
                while at < trimmed && bytes[at] != b'"' {
                    at += if bytes[at] == b'\\' { 2 } else { 1 };
                }
                at += 1;
                end = at;
            }
            byte => {
                at += 1;
                if !byte.is_ascii_whitespace() {
                    end = at;
                }
            }
        }
    }
    text[..end.min(trimmed)].trim_end().len()
}

/// The children of a node.
pub(super) struct Nodes<'a> {
    pairs: Pairs<'a, Rule>,
    place: Place,
}

impl<'a> Iterator for Nodes<'a> {
    type Item = Node<'a>;

    fn next(&mut self) -> Option<Node<'a>> {
        self.pairs.next().map(|pair| Node { pair, place: self.place })
    }
}
