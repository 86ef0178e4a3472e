//! Grammar nodes to tree: one function a rule, no decisions about meaning.
//!
//! A function returns nothing only if a node has not the shape that its rule gives it, or if it has
//! said what is wrong; the reader reports the first, so that no statement is ever dropped in silence.

mod condition;
mod expression;
mod head;
mod material;
mod part;
mod quantity;
mod requirement;
mod response;

use super::grammar::{Node, Rule};
use super::tree::{Name, Path, Text};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{Span, Spanned};

/// What lowering has to say.
#[derive(Debug, Default)]
pub(super) struct Lower {
    pub(super) diagnostics: Vec<Diagnostic>,
}

impl Lower {
    fn report(&mut self, diagnostic: Diagnostic) {
        self.diagnostics.push(diagnostic);
    }

    /// Fills a slot that may be filled once.
    fn once<T>(&mut self, slot: &mut Option<T>, value: T, span: Span, what: &str) {
        if slot.is_some() {
            self.stated_twice(span, what);
        } else {
            *slot = Some(value);
        }
    }

    pub(super) fn stated_twice(&mut self, span: Span, what: &str) {
        self.report(
            Diagnostic::new(Code::StatedTwice, span, format!("{what} is stated twice"))
                .help("keep one of the two"),
        );
    }
}

/// A name, word or unit as spelled.
fn spelled(node: &Node<'_>) -> Name {
    Spanned::new(node.text().to_owned(), node.span())
}

/// The content of a string.
fn string(node: &Node<'_>) -> Text {
    let quoted = node.text();
    let content = quoted.get(1..quoted.len().saturating_sub(1)).unwrap_or("");
    let mut value = String::with_capacity(content.len());
    let mut escaped = false;
    for c in content.chars() {
        if c == '\\' && !escaped {
            escaped = true;
            continue;
        }
        if escaped && c != '"' && c != '\\' {
            value.push('\\');
        }
        escaped = false;
        value.push(c);
    }
    if escaped {
        value.push('\\');
    }
    Spanned::new(value, node.span())
}

fn path(node: Node<'_>) -> Option<Path> {
    let span = node.span();
    let mut names = node.children().map(|name| spelled(&name));
    let first = names.next()?;
    Some(match names.next() {
        Some(name) => Path { owner: Some(first), name, span },
        None => Path { owner: None, name: first, span },
    })
}

/// All names among a node's children.
fn names(node: Node<'_>) -> Vec<Name> {
    node.children()
        .filter(|child| child.rule() == Rule::name)
        .map(|child| spelled(&child))
        .collect()
}
