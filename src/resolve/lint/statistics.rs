//! Statistics that say less than they seem to.

use super::{dimensions, expressions};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, Binary, DimensionId, Expr, ExprKind, Method, Quantity, SubjectKind};
use crate::span::Span;
use std::collections::{BTreeMap, BTreeSet};

/// Fewest contributors for which a root sum of squares is commonly trusted (common practice).
const ENOUGH: u32 = 4;

/// A root sum of squares of so few contributors that one of them decides.
pub(super) fn rss_of_few(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for requirement in &assembly.requirements {
        if !matches!(requirement.method, Method::Rss { .. }) {
            continue;
        }
        let subject = assembly.subject(requirement.subject);
        let mut all: BTreeMap<DimensionId, u32> = BTreeMap::new();
        for e in expressions(&subject.kind) {
            all.extend(dimensions(e));
        }
        all.retain(|d, _| !assembly.dimension(*d).is_exact());
        let count: u32 = all.values().fold(0, |sum, n| sum.saturating_add(*n));
        // Sides of a fit that an expression names are not counted: it is no sum of them alone.
        let counted = !matches!(subject.kind, SubjectKind::Restraint(_) | SubjectKind::Fill(_))
            && !names_a_fit(&subject.kind)
            && of_sizes(requirement.quantity);
        if counted && count < ENOUGH {
            let sizes = if count == 1 { "size varies" } else { "sizes vary" };
            found.push(
                Diagnostic::new(
                    Code::RssOfFew,
                    requirement.span,
                    format!(
                        "a root sum of squares, and only {count} {sizes} in `{}`",
                        subject.name
                    ),
                )
                .help("with so few, one off its middle decides: use `by worst case`"),
            );
        }
    }
    found
}

fn of_sizes(quantity: Quantity) -> bool {
    matches!(
        quantity,
        Quantity::Clearance
            | Quantity::Interference
            | Quantity::RadialClearance
            | Quantity::Gap
            | Quantity::Value
    )
}

fn names_a_fit(kind: &SubjectKind) -> bool {
    let mut named = false;
    for e in expressions(kind) {
        e.walk(&mut |e| {
            named |= matches!(
                e.kind,
                ExprKind::Clearance(_) | ExprKind::Play(_) | ExprKind::After { .. }
            );
        });
    }
    named
}

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
