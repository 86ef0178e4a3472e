//! `fit`: an external feature in an internal one, and that each side is what it is said to be.

use super::expression::{Resolver, Term, is_round, terms};
use super::quantity::with_article;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Expr, Feature, Fit, Form, Origin};
use crate::syntax::tree;
use crate::units::Kind;
use std::sync::Arc;

/// A side of a fit.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum Side {
    /// The side before `in`.
    External,
    /// The side after `in`.
    Internal,
}

impl Side {
    fn word(self) -> &'static str {
        match self {
            Side::External => "external",
            Side::Internal => "internal",
        }
    }

    fn opposite(self) -> Feature {
        match self {
            Side::External => Feature::Internal,
            Side::Internal => Feature::External,
        }
    }
}

impl<'t> Resolver<'_, '_, 't> {
    /// A fit with its joint; every mistake of both sides is reported.
    pub(super) fn build_fit(&mut self, written: &'t tree::Fit) -> Option<Fit> {
        let external = self.side(&written.external);
        let internal = self.side(&written.internal);
        let (external, internal) = (external?, internal?);
        self.check_sides(written, &external, &internal)?;
        let round = self.has_diameter(&external) && self.has_diameter(&internal);
        let joint = match &written.joint {
            Some(joint) => Some(self.joint(joint, &external, &internal, round)?),
            None => None,
        };
        Some(Fit { external, internal, round, joint })
    }

    fn side(&mut self, written: &tree::Expr) -> Option<Arc<Expr>> {
        let side = self.expression(written, None)?;
        if side.quantity != Kind::LENGTH {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::WrongKind,
                    side.span,
                    format!(
                        "expected a length as a side of a fit, found {}",
                        with_article(side.quantity)
                    ),
                )
                .help("a side is a size of a part, or a sum of sizes"),
            );
        }
        self.check_radius(&side)?;
        Some(side)
    }

    /// Refuses a side that is a radius, since a clearance is counted on the diameter.
    fn check_radius(&mut self, side: &Expr) -> Option<()> {
        let terms = terms(side);
        let form = |t: &Term| self.cx.dimensions[t.dimension.index()].form;
        let radius = terms.iter().find(|t| t.added && form(t) == Form::Radius).copied();
        let Some(radius) = radius.filter(|_| !terms.iter().any(|t| form(t) == Form::Diameter))
        else {
            return Some(());
        };
        let text = self.cx.text(radius.span).to_string();
        self.cx.refuse(
            Diagnostic::new(
                Code::RadiusInFit,
                radius.span,
                format!("`{text}` is a radius, and a fit is stated by its diameters"),
            )
            .help(format!("write `2 * {text}`")),
        )
    }

    fn has_diameter(&self, side: &Expr) -> bool {
        let mut round = false;
        side.walk(&mut |e| {
            let mentioned = terms(e);
            round |=
                mentioned.iter().any(|t| is_round(self.cx.dimensions[t.dimension.index()].form));
        });
        round
    }

    /// Holds the features of both sides against the side they stand on.
    fn check_sides(&mut self, written: &tree::Fit, external: &Expr, internal: &Expr) -> Option<()> {
        let wrong = |resolver: &Self, e: &Expr, side: Side| {
            terms(e).into_iter().find(|t| {
                t.added && resolver.cx.dimensions[t.dimension.index()].feature == side.opposite()
            })
        };
        let of_external = wrong(self, external, Side::External);
        let of_internal = wrong(self, internal, Side::Internal);
        match (of_external, of_internal) {
            (None, None) => Some(()),
            (Some(a), Some(b)) => self.reversed(written, a, b),
            (Some(term), None) => self.wrong_side(term, Side::External),
            (None, Some(term)) => self.wrong_side(term, Side::Internal),
        }
    }

    fn reversed<T>(&mut self, written: &tree::Fit, external: Term, internal: Term) -> Option<T> {
        let (a, b) = (written.external.span, written.internal.span);
        let (a, b) = (self.cx.text(a).to_string(), self.cx.text(b).to_string());
        let (hole, shaft) = (self.reason(external), self.reason(internal));
        self.cx.refuse(
            Diagnostic::new(
                Code::FitReversed,
                written.external.span.to(written.internal.span),
                format!("the fit `{}` is the wrong way round", written.name.value),
            )
            .label(external.span, format!("internal: {hole}"))
            .label(internal.span, format!("external: {shaft}"))
            .help(format!("write `fit {} = {b} in {a}`", written.name.value)),
        )
    }

    fn wrong_side<T>(&mut self, term: Term, side: Side) -> Option<T> {
        let dimension = &self.cx.dimensions[term.dimension.index()];
        let found = if side == Side::External { "internal" } else { "external" };
        let (line, help) = (
            dimension.line,
            match &dimension.origin {
                Origin::Class(class) => {
                    let other = match side {
                        Side::External => class.to_lowercase(),
                        Side::Internal => class.to_uppercase(),
                    };
                    format!("an {} size has a class such as `{other}`", side.word())
                }
                _ => format!("state the size as `{}`", side.word()),
            },
        );
        let reason = self.reason(term);
        self.cx.refuse(
            Diagnostic::new(
                Code::FeatureOnWrongSide,
                term.span,
                format!(
                    "`{}` is {found}, and stands on the {} side of the fit",
                    self.path_of(term.dimension),
                    side.word()
                ),
            )
            .here(reason)
            .label(line, "stated here")
            .help(help),
        )
    }

    /// Why a dimension counts as a hole or as a shaft.
    fn reason(&self, term: Term) -> String {
        match &self.cx.dimensions[term.dimension.index()].origin {
            Origin::Class(class) if class.starts_with(|c: char| c.is_uppercase()) => {
                format!("`{class}` is a class of holes")
            }
            Origin::Class(class) => format!("`{class}` is a class of shafts"),
            _ => "it is stated so".to_string(),
        }
    }
}

/// Which sizes stand directly on a side of a fit, as written: a coating there grows outward on a
/// shaft and inward on a hole.
pub(crate) fn side_paths(written: &tree::Fit) -> Vec<(&tree::Path, Side)> {
    let mut found = Vec::new();
    for (side, e) in [(Side::External, &written.external), (Side::Internal, &written.internal)] {
        gather(e, side, &mut found);
    }
    found
}

fn gather<'t>(e: &'t tree::Expr, side: Side, found: &mut Vec<(&'t tree::Path, Side)>) {
    match &e.kind {
        tree::ExprKind::Path(path) | tree::ExprKind::Pieces(_, path) => found.push((path, side)),
        tree::ExprKind::Parenthesised(inner) | tree::ExprKind::After(inner, _) => {
            gather(inner, side, found);
        }
        tree::ExprKind::Chain(first, rest) => {
            // Only what is added is a feature of this side.
            gather(first, side, found);
            for (operator, term) in rest {
                if operator.value == tree::Operator::Add {
                    gather(term, side, found);
                }
            }
        }
        _ => {}
    }
}
