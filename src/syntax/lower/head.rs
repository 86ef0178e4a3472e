//! The head of a file.

use super::{Lower, spelled, string};
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Assembly, DecimalRow, Decimals, DefaultUnit, Drawing, General, GeneralKind, Note, Reference,
    Use,
};

impl Lower {
    pub(in crate::syntax) fn assembly(&mut self, node: Node<'_>) -> Option<Assembly> {
        Some(Assembly { title: string(&node.child(Rule::string)?), span: node.span() })
    }

    pub(in crate::syntax) fn drawing(&mut self, node: Node<'_>) -> Option<Drawing> {
        let span = node.span();
        let mut strings = node
            .children()
            .filter(|child| child.rule() == Rule::string)
            .map(|child| string(&child));
        Some(Drawing { number: strings.next()?, revision: strings.next(), span })
    }

    pub(in crate::syntax) fn default_unit(&mut self, node: Node<'_>) -> Option<DefaultUnit> {
        Some(DefaultUnit { unit: spelled(&node.child(Rule::unit)?), span: node.span() })
    }

    pub(in crate::syntax) fn reference(&mut self, node: Node<'_>) -> Option<Reference> {
        Some(Reference { temperature: self.group(node.child(Rule::group)?)?, span: node.span() })
    }

    pub(in crate::syntax) fn general(&mut self, node: Node<'_>) -> Option<General> {
        let kind = GeneralKind::Iso2768(spelled(&node.child(Rule::general_class)?));
        Some(General { kind, span: node.span() })
    }

    /// The header alone; its rows stand in a block.
    pub(in crate::syntax) fn general_table(&mut self, node: Node<'_>) -> Option<General> {
        Some(General { kind: GeneralKind::ByDecimals(Vec::new()), span: node.span() })
    }

    pub(in crate::syntax) fn decimal_row(&mut self, node: Node<'_>) -> Option<DecimalRow> {
        let decimals = match node.child(Rule::decimals) {
            Some(decimals) if decimals.text().starts_with('.') => {
                Decimals::Length(decimals.text().len() - 1)
            }
            Some(_) => Decimals::Length(0),
            None => Decimals::Angle,
        };
        let tolerance = self.tolerance(node.child(Rule::tolerance)?)?;
        Some(DecimalRow { decimals, tolerance, span: node.span() })
    }

    pub(in crate::syntax) fn used(&mut self, node: Node<'_>) -> Option<Use> {
        Some(Use { path: string(&node.child(Rule::string)?), span: node.span() })
    }

    pub(in crate::syntax) fn note(&mut self, node: Node<'_>) -> Option<Note> {
        Some(Note { text: string(&node.child(Rule::string)?), span: node.span() })
    }
}
