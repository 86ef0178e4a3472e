//! Numbers with their units, tolerances, ranges and spreads.

use super::{Lower, spelled, string};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::Spanned;
use crate::syntax::found::short;
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Deviation, Distribution, Group, Number, Quantity, Range, Scalar, Spread, Tolerance,
};

impl Lower {
    /// A number with or without its sign.
    pub(super) fn number(&mut self, node: &Node<'_>) -> Number {
        let span = node.span();
        let mut text = node.text().trim_end().to_owned();
        if text.contains(|c: char| !c.is_ascii_graphic() && c != '\u{2212}') {
            text = node.clone().children().map(|part| part.text()).collect();
        }
        let value = if text.starts_with('\u{2212}') {
            text.replace('\u{2212}', "-").parse()
        } else {
            text.parse()
        };
        let value: f64 = value.unwrap_or(f64::INFINITY);
        if value.is_finite() {
            return Number { value, text, span };
        }
        self.report(
            Diagnostic::new(
                Code::SyntaxError,
                span,
                "expected a number below 1e+308, found a larger one",
            )
            .help("state it in a larger unit"),
        );
        Number { value: 0.0, text, span }
    }

    /// A number and the unit after it, by whichever rule.
    pub(super) fn scalar(&mut self, node: Node<'_>) -> Option<Scalar> {
        let mut number = None;
        let mut unit = None;
        for child in node.children() {
            match child.rule() {
                Rule::number | Rule::signed | Rule::signed_number | Rule::zero => {
                    number = Some(self.number(&child))
                }
                Rule::unit | Rule::factor_unit => unit = Some(spelled(&child)),
                _ => {}
            }
        }
        let scalar = Scalar { number: number?, unit };
        if self.unsigned_exponent(&scalar) { None } else { Some(scalar) }
    }

    /// Reports a power of ten without its sign, which would otherwise be an odd unit.
    fn unsigned_exponent(&mut self, scalar: &Scalar) -> bool {
        let Some(unit) =
            scalar.unit.as_ref().filter(|unit| unit.span.start == scalar.number.span.end)
        else {
            return false;
        };
        let Some(power) = unit.value.strip_prefix(['e', 'E']) else { return false };
        if power.is_empty() || !power.bytes().all(|byte| byte.is_ascii_digit()) {
            return false;
        }
        let (number, power) = (short(&scalar.number.text), short(power));
        self.report(
            Diagnostic::new(
                Code::SyntaxError,
                unit.span,
                format!("expected a unit, found `{}`", short(&unit.value)),
            )
            .help(format!("an exponent has its sign: `{number}e+{power}`")),
        );
        true
    }

    /// What stands after `..`.
    pub(super) fn range(&mut self, low: Scalar, end: Node<'_>) -> Option<Range> {
        let high = self.scalar(end.child(Rule::scalar)?)?;
        let span = low.span().to(high.span());
        Some(Range { low, high, span })
    }

    pub(super) fn tolerance(&mut self, node: Node<'_>) -> Option<Tolerance> {
        let span = node.span();
        let mut children = node.children();
        let first = children.next()?;
        let deviation = if first.rule() == Rule::symmetric {
            Deviation::Symmetric(self.scalar(first.child(Rule::plain)?)?)
        } else {
            let first = self.scalar(first)?;
            let second = children.find(|child| child.rule() == Rule::deviation)?;
            Deviation::Limits(first, self.scalar(second)?)
        };
        Some(Tolerance { deviation, span })
    }

    pub(super) fn group(&mut self, node: Node<'_>) -> Option<Group> {
        let span = node.span();
        let mut children = node.children();
        let value = self.scalar(children.next()?)?;
        let tolerance = match children.next() {
            Some(tolerance) => Some(self.tolerance(tolerance)?),
            None => None,
        };
        Some(Group { value, tolerance, span })
    }

    pub(super) fn quantity(&mut self, node: Node<'_>) -> Option<Quantity> {
        let span = node.span();
        let mut children = node.children();
        let value = self.scalar(children.next()?)?;
        let Some(rest) = children.next() else {
            return Some(Quantity::Group(Group { value, tolerance: None, span }));
        };
        Some(if rest.rule() == Rule::range_end {
            Quantity::Range(self.range(value, rest)?)
        } else {
            Quantity::Group(Group { value, tolerance: Some(self.tolerance(rest)?), span })
        })
    }

    pub(super) fn spread(&mut self, node: Node<'_>) -> Option<Spread> {
        let span = node.span();
        let mut distribution = None;
        let mut shift = None;
        for child in node.children() {
            match child.rule() {
                Rule::distribution => distribution = Some(self.distribution(child)?),
                Rule::shift => shift = Some(self.scalar(child.child(Rule::scalar)?)?),
                _ => {}
            }
        }
        Some(Spread { distribution: distribution?, shift, span })
    }

    fn distribution(&mut self, node: Node<'_>) -> Option<Spanned<Distribution>> {
        let span = node.span();
        let kind = node.children().next()?;
        let distribution = match kind.rule() {
            Rule::normal => {
                Distribution::Normal { cpk: kind.child(Rule::number).map(|cpk| self.number(&cpk)) }
            }
            Rule::word_sorted => Distribution::Sorted,
            Rule::word_uniform => Distribution::Uniform,
            Rule::word_triangular => Distribution::Triangular,
            Rule::measured => Distribution::File(string(&kind.child(Rule::string)?)),
            _ => return None,
        };
        Some(Spanned::new(distribution, span))
    }
}
