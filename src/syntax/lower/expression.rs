//! Expressions.

use super::{Lower, path, spelled};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::Spanned;
use crate::syntax::found::short;
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{Count, Expr, ExprKind, MAX_TERMS, Operator, Scalar, Term};

impl Lower {
    /// A sum, a product, or what they are made of.
    pub(super) fn expr(&mut self, node: Node<'_>) -> Option<Expr> {
        match node.rule() {
            Rule::expr | Rule::product => self.chain(node),
            Rule::factor => self.factor(node),
            _ => self.atom(node),
        }
    }

    fn chain(&mut self, node: Node<'_>) -> Option<Expr> {
        let mut children = node.children();
        let first = self.expr(children.next()?)?;
        let mut rest = Vec::new();
        while let Some(sign) = children.next() {
            let operator = match sign.rule() {
                Rule::add => Operator::Add,
                Rule::subtract => Operator::Subtract,
                Rule::multiply => Operator::Multiply,
                Rule::divide => Operator::Divide,
                _ => return None,
            };
            if rest.len() + 1 >= MAX_TERMS {
                self.report(
                    Diagnostic::new(
                        Code::NestedTooDeep,
                        sign.span(),
                        format!("more than {MAX_TERMS} terms in one expression"),
                    )
                    .help("name a part of it with `let`"),
                );
                return None;
            }
            rest.push((Spanned::new(operator, sign.span()), self.expr(children.next()?)?));
        }
        Some(match rest.last() {
            None => first,
            Some((_, last)) => {
                let span = first.span.to(last.span);
                Expr { kind: ExprKind::Chain(Box::new(first), rest), span }
            }
        })
    }

    /// A power with its minus, and what it is made of.
    fn factor(&mut self, node: Node<'_>) -> Option<Expr> {
        let mut minus = None;
        let mut value = None;
        let mut exponent = None;
        for child in node.children() {
            match child.rule() {
                Rule::subtract => minus = Some(child.span()),
                Rule::atom => value = Some(self.atom(child)?),
                Rule::exponent => exponent = Some(self.factor(child)?),
                _ => {}
            }
        }
        let mut value = value?;
        if let Some(exponent) = exponent {
            let span = value.span.to(exponent.span);
            value = Expr { kind: ExprKind::Power(Box::new(value), Box::new(exponent)), span };
        }
        if let Some(minus) = minus {
            let span = minus.to(value.span);
            value = Expr { kind: ExprKind::Negate(Box::new(value)), span };
        }
        Some(value)
    }

    fn atom(&mut self, node: Node<'_>) -> Option<Expr> {
        let mut children = node.children();
        let first = children.next()?;
        let span = first.span();
        let kind = match first.rule() {
            Rule::pieces => {
                let term = self.term(first)?;
                ExprKind::Pieces(term.count?, term.path)
            }
            Rule::constant => ExprKind::Constant(self.constant(first)?),
            Rule::path => ExprKind::Path(path(first)?),
            Rule::parenthesised => {
                ExprKind::Parenthesised(Box::new(self.expr(first.child(Rule::expr)?)?))
            }
            Rule::call => self.call(first)?,
            _ => return None,
        };
        let expr = Expr { kind, span };
        let Some(after) = children.next() else { return Some(expr) };
        let fit = spelled(&after.child(Rule::name)?);
        let span = span.to(fit.span);
        Some(Expr { kind: ExprKind::After(Box::new(expr), fit), span })
    }

    /// A constant; one that looks like a count without its blank is reported.
    fn constant(&mut self, node: Node<'_>) -> Option<Scalar> {
        let scalar = self.scalar(node)?;
        let (number, unit) = (&scalar.number, scalar.unit.as_ref());
        if let Some(unit) = unit
            .filter(|unit| unit.span.start == number.span.end && unit.value.starts_with(['x', 'X']))
        {
            let name = &unit.value[1..];
            let message =
                format!("expected a blank after `{}x`, found `{}`", number.text, short(name));
            self.report(Diagnostic::new(Code::SyntaxError, scalar.span(), message).help(format!(
                "write `{}x {}` for independent pieces",
                number.text,
                short(name)
            )));
            return None;
        }
        Some(scalar)
    }

    fn call(&mut self, node: Node<'_>) -> Option<ExprKind> {
        let mut function = None;
        let mut arguments = Vec::new();
        let mut from = None;
        for child in node.children() {
            match child.rule() {
                Rule::callee => function = Some(spelled(&child)),
                Rule::expr => arguments.push(self.expr(child)?),
                Rule::name => from = Some(spelled(&child)),
                _ => {}
            }
        }
        Some(ExprKind::Call { function: function?, arguments, from })
    }

    /// A dimension with a count of pieces, by whichever rule.
    pub(super) fn term(&mut self, node: Node<'_>) -> Option<Term> {
        let span = node.span();
        let mut count = None;
        let mut dimension = None;
        for child in node.children() {
            match child.rule() {
                Rule::count => count = Some(self.count(&child)),
                Rule::path => dimension = Some(path(child)?),
                _ => {}
            }
        }
        Some(Term { count, path: dimension?, span })
    }

    fn count(&mut self, node: &Node<'_>) -> Count {
        let span = node.span();
        let digits = node.text().trim_end_matches(|c: char| !c.is_ascii_digit());
        let value = digits.parse().ok().filter(|count| (1..=MAX_TERMS as u32).contains(count));
        if value.is_none() {
            let message =
                format!("expected a count from 1 to {MAX_TERMS}, found `{}`", short(digits));
            self.report(
                Diagnostic::new(Code::SyntaxError, span, message)
                    .help("leave the term out, or count its pieces"),
            );
        }
        Count { value: value.unwrap_or(1), span }
    }
}
