//! Kinds of quantity in expressions: what may be added, and what a power gives.

use super::{Resolver, expr};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Binary, Expr, ExprKind};
use crate::resolve::quantity::with_article;
use crate::span::Span;
use crate::units::{Kind, Tag};
use std::sync::Arc;

impl Resolver<'_, '_, '_> {
    /// The kind of a sum, or a finding at its operator.
    pub(super) fn sum_kind(
        &mut self,
        left: &Expr,
        operator: Span,
        sign: &str,
        right: &Expr,
    ) -> Option<Kind> {
        if let Some(kind) = common(left.quantity, right.quantity) {
            let bare = [left, right].into_iter().find(|e| is_bare_constant(e));
            if let (true, Some(bare)) = (left.quantity != right.quantity, bare) {
                return self.bare_angle(bare, operator);
            }
            return Some(kind);
        }
        let (a, b) = (with_article(left.quantity), with_article(right.quantity));
        let message = match sign {
            "+" => format!("{b} cannot be added to {a}"),
            _ => format!("{b} cannot be taken from {a}"),
        };
        let mut finding = Diagnostic::new(Code::KindsDiffer, operator, message)
            .label(left.span, a)
            .label(right.span, b);
        let bare = [left, right].into_iter().find(|e| is_bare_constant(e));
        if let Some(bare) = bare
            && [left.quantity, right.quantity].contains(&Kind::LENGTH)
        {
            let unit = self.cx.head(bare.span.file).defaults.length.name;
            let text = self.cx.text(bare.span);
            finding =
                finding.help(format!("a bare number is pure: a length is written `{text} {unit}`"));
        }
        self.cx.refuse(finding)
    }

    /// A bare number next to an angle, which could be in degrees or in radians.
    fn bare_angle<T>(&mut self, bare: &Expr, operator: Span) -> Option<T> {
        let text = self.cx.text(bare.span).to_string();
        self.cx.refuse(
            Diagnostic::new(
                Code::KindsDiffer,
                operator,
                "an angle and a bare number cannot be added",
            )
            .label(bare.span, "degrees or radians?")
            .help(format!("write `{text} deg` or `{text} rad`")),
        )
    }

    /// A power, whose exponent has to be constant.
    pub(super) fn power(
        &mut self,
        span: Span,
        base: Arc<Expr>,
        exponent: &Expr,
    ) -> Option<Arc<Expr>> {
        let Some(n) = constant(exponent).filter(|n| n.is_finite()) else {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::ExponentNotConstant,
                    exponent.span,
                    "an exponent has to be a constant pure number",
                )
                .help("a power of a length with a varying exponent has no kind"),
            );
        };
        let quantity = match base.quantity {
            kind if kind.is_pure() => Some(Kind::PURE),
            kind => power_kind(kind, n),
        };
        let Some(quantity) = quantity else {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::WrongKind,
                    span,
                    format!("{} to the power {n} is no quantity", with_article(base.quantity)),
                )
                .label(base.span, with_article(base.quantity))
                .help("take a whole power, or the root of an even one"),
            );
        };
        Some(expr(span, quantity, ExprKind::Power(base, n)))
    }
}

/// The kind that two summands share; a moment is an energy by its exponents.
pub(super) fn common(a: Kind, b: Kind) -> Option<Kind> {
    if a == b {
        return Some(a);
    }
    if a.is_pure() && b.is_pure() {
        return Some(Kind::ANGLE);
    }
    let untagged = |k: Kind| Kind { tag: Tag::None, ..k };
    let moments = a.tag == Tag::Moment || b.tag == Tag::Moment;
    (moments && untagged(a) == untagged(b)).then_some(Kind::TORQUE)
}

/// The kind of a power, where its exponents stay whole.
fn power_kind(kind: Kind, n: f64) -> Option<Kind> {
    let whole = |n: f64| (n == n.trunc() && n.abs() <= 12.0).then_some(n as i8);
    if let Some(n) = whole(n) {
        return Some(kind.powi(n));
    }
    kind.sqrt().and_then(|root| whole(2.0 * n).map(|n| root.powi(n)))
}

/// A number written without a unit, a sign before it or not.
fn is_bare_constant(e: &Expr) -> bool {
    match &e.kind {
        ExprKind::Constant(value) => e.quantity == Kind::PURE && *value != 0.0,
        ExprKind::Negate(inner) => is_bare_constant(inner),
        _ => false,
    }
}

/// The value of an expression of pure constants only.
fn constant(e: &Expr) -> Option<f64> {
    if e.quantity != Kind::PURE {
        return None;
    }
    Some(match &e.kind {
        ExprKind::Constant(value) => *value,
        ExprKind::Negate(inner) => -constant(inner)?,
        ExprKind::Named(_, inner) => constant(inner)?,
        ExprKind::Binary(operator, a, b) => {
            let (a, b) = (constant(a)?, constant(b)?);
            match operator {
                Binary::Add => a + b,
                Binary::Sub => a - b,
                Binary::Mul => a * b,
                Binary::Div => a / b,
            }
        }
        _ => return None,
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn powers_keep_whole_exponents() {
        assert_eq!(power_kind(Kind::LENGTH, 2.0), Some(Kind::AREA));
        assert_eq!(power_kind(Kind::AREA, 0.5), Some(Kind::LENGTH));
        assert_eq!(power_kind(Kind::AREA, 1.5), Some(Kind::VOLUME));
        assert_eq!(power_kind(Kind::LENGTH, 0.5), None);
        assert_eq!(power_kind(Kind::LENGTH, 1e9), None);
    }

    #[test]
    fn sums_need_one_kind() {
        assert_eq!(common(Kind::LENGTH, Kind::DIFFERENCE), None);
        assert_eq!(common(Kind::ANGLE, Kind::PURE), Some(Kind::ANGLE));
        assert_eq!(common(Kind::LENGTH * Kind::FORCE, Kind::TORQUE), Some(Kind::TORQUE));
    }
}
