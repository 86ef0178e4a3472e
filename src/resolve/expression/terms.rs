//! The terms of a sum: which dimensions stand in it directly, with which sign.

use super::Resolver;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Binary, DimensionId, Expr, ExprKind, Form};
use crate::span::Span;
use std::collections::BTreeMap;

/// A dimension that is a summand as it stands.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Term {
    /// Which dimension.
    pub(crate) dimension: DimensionId,
    /// Where it is named.
    pub(crate) span: Span,
    /// True when it is added, false when it is taken away.
    pub(crate) added: bool,
}

/// The dimensions that are summands of an expression, those of named intermediates included.
pub(crate) fn terms(e: &Expr) -> Vec<Term> {
    let mut found = Vec::new();
    gather(e, true, None, &mut found);
    found
}

fn gather(e: &Expr, added: bool, mention: Option<Span>, found: &mut Vec<Term>) {
    let span = mention.unwrap_or(e.span);
    match &e.kind {
        ExprKind::Size { dimension, .. }
        | ExprKind::After { dimension, .. }
        | ExprKind::Pieces { dimension, .. } => {
            found.push(Term { dimension: *dimension, span, added });
        }
        ExprKind::Negate(inner) => gather(inner, !added, mention, found),
        ExprKind::Named(_, inner) => gather(inner, added, Some(span), found),
        ExprKind::Binary(Binary::Add, a, b) => {
            gather(a, added, mention, found);
            gather(b, added, mention, found);
        }
        ExprKind::Binary(Binary::Sub, a, b) => {
            gather(a, added, mention, found);
            gather(b, !added, mention, found);
        }
        _ => {}
    }
}

/// Every dimension mentioned, as one piece and as several, with where.
#[derive(Default)]
struct Mentions {
    one: BTreeMap<DimensionId, Span>,
    several: BTreeMap<DimensionId, Span>,
}

fn mentions(e: &Expr, at: Option<Span>, found: &mut Mentions) {
    let span = at.unwrap_or(e.span);
    match &e.kind {
        ExprKind::Size { dimension, .. } => {
            found.one.entry(*dimension).or_insert(span);
        }
        ExprKind::Pieces { dimension, .. } => {
            found.several.entry(*dimension).or_insert(span);
        }
        ExprKind::Named(_, inner) => mentions(inner, Some(span), found),
        ExprKind::Negate(inner) | ExprKind::Power(inner, _) => mentions(inner, at, found),
        ExprKind::Change { of, .. } => mentions(of, at, found),
        ExprKind::Binary(_, a, b) => {
            mentions(a, at, found);
            mentions(b, at, found);
        }
        ExprKind::Call(_, arguments) => {
            for argument in arguments {
                mentions(argument, at, found);
            }
        }
        _ => {}
    }
}

impl Resolver<'_, '_, '_> {
    /// Refuses pieces of a dimension beside the bare dimension; warns where diameters and radii are
    /// added up.
    pub(super) fn check_sum(&mut self, sum: &Expr) -> Option<()> {
        let mut found = Mentions::default();
        mentions(sum, None, &mut found);
        let both = found.one.iter().find_map(|(d, one)| found.several.get(d).map(|s| (d, one, s)));
        // Where both stand in one intermediate they have been reported there.
        if let Some((dimension, one, several)) = both.filter(|(_, one, several)| one != several) {
            let name = self.cx.text(*one).to_string();
            let pieces = self.cx.text(*several).to_string();
            let part = self.cx.dimensions[dimension.index()].part;
            let part = self.cx.parts[part.index()].name.clone();
            return self.cx.refuse(
                Diagnostic::new(
                    Code::PieceCountedTwice,
                    *one,
                    format!("`{name}` is one of the pieces that `{pieces}` counts already"),
                )
                .label(*several, "pieces from 1 on")
                .help(format!("count all pieces in one term, or state another part `like {part}`")),
            );
        }
        self.warn_of_radii(sum);
        Some(())
    }

    fn warn_of_radii(&mut self, sum: &Expr) {
        let terms = terms(sum);
        let of = |form: Form| {
            terms.iter().find(|t| self.cx.dimensions[t.dimension.index()].form == form).copied()
        };
        let (Some(diameter), Some(radius)) = (of(Form::Diameter), of(Form::Radius)) else {
            return;
        };
        if diameter.span == radius.span {
            return;
        }
        let (d, r) = (self.cx.text(diameter.span), self.cx.text(radius.span));
        let help = format!("write `{d} / 2` or `2 * {r}`");
        self.cx.report(
            Diagnostic::new(
                Code::DiameterAndRadius,
                radius.span,
                "diameters and radii are mixed in one sum",
            )
            .here("a radius")
            .label(diameter.span, "a diameter")
            .help(help),
        );
    }
}
