//! Statistics that say less than they seem to.

use super::expressions;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, Binary, DimensionId, Expr, ExprKind, Method};
use crate::span::Span;
use std::collections::BTreeSet;

/// `2 * x` where statistics are asked for: one piece counted twice, or two pieces?
pub(super) fn copies_or_pieces(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut seen: BTreeSet<Span> = BTreeSet::new();
    let mut found = Vec::new();
    for requirement in &assembly.requirements {
        if requirement.method == Method::WorstCase {
            continue;
        }
        let subject = assembly.subject(requirement.subject);
        for e in expressions(&subject.kind) {
            summands(e, &mut |summand| {
                let Some((count, dimension)) = copies(summand) else { return };
                if assembly.dimension(dimension).is_exact() || !seen.insert(summand.span) {
                    return;
                }
                let path = assembly.path(dimension);
                found.push(
                    Diagnostic::new(
                        Code::CopiesOrPieces,
                        summand.span,
                        format!("`{count} * {path}` is one piece counted {count} times"),
                    )
                    .label(requirement.span, "statistics are asked for here")
                    .help(format!(
                        "{count} pieces that vary each by itself are written `{count}x {path}`"
                    )),
                );
            });
        }
    }
    found
}

/// Visits the summands of a sum of two or more.
fn summands(e: &Expr, visit: &mut impl FnMut(&Expr)) {
    match &e.kind {
        ExprKind::Binary(Binary::Add | Binary::Sub, a, b) => {
            for side in [a, b] {
                match side.kind {
                    ExprKind::Binary(Binary::Mul | Binary::Div, ..) => visit(side),
                    _ => summands(side, visit),
                }
            }
        }
        ExprKind::Negate(inner) | ExprKind::Named(_, inner) => summands(inner, visit),
        _ => {}
    }
}

/// A whole number of two or more times one dimension.
fn copies(e: &Expr) -> Option<(f64, DimensionId)> {
    let ExprKind::Binary(Binary::Mul, a, b) = &e.kind else { return None };
    let (ExprKind::Constant(n), ExprKind::Size { dimension, .. }) = (&a.kind, &b.kind) else {
        return None;
    };
    (*n >= 2.0 && *n == n.trunc()).then_some((*n, *dimension))
}
