//! Coatings, and the side of the material that they need to know.
//!
//! Growth on one surface is build-up times thickness. A diameter changes by it twice, a radius once,
//! a linear size once for each coated face: outward for an external feature, inward for an internal
//! one. The side is that of an ISO 286 class, of a fit, or stated.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Coating, Dimension, DimensionId, Feature, Form};
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::syntax::tree;
use crate::units::Kind;

/// A coating; where its side is not known yet, the factor is that of an external feature and
/// [`settle_side`] has to be called.
pub(super) fn coating(
    cx: &mut Context,
    stated: &tree::Coating,
    form: Form,
    feature: Feature,
) -> Option<Coating> {
    let thickness = quantity::scenario(cx, &stated.thickness, None, Expect::Of(Kind::LENGTH));
    let build_up = match &stated.build_up {
        Some(share) => quantity::scalar(cx, share, Expect::Of(Kind::PURE)).map(|b| (b, share)),
        None => None,
    };
    let thickness = thickness?;
    if thickness.least < 0.0 {
        return cx.refuse(
            Diagnostic::new(
                Code::ValueOutOfRange,
                stated.thickness.span(),
                "a coating cannot be thinner than nothing",
            )
            .help("check the tolerance of the thickness"),
        );
    }
    let build_up = match (build_up, &stated.build_up) {
        (Some((share, _)), _) if (0.0..=1.0).contains(&share) => share,
        (Some((_, written)), _) => {
            return cx.refuse(
                Diagnostic::new(
                    Code::ValueOutOfRange,
                    written.span(),
                    "the build-up of a coating lies between 0 % and 100 %",
                )
                .help("it is the share of the thickness that grows outward"),
            );
        }
        (None, Some(_)) => return None,
        (None, None) => 1.0,
    };
    let surfaces = surfaces(cx, stated, form)?;
    let before = stated.order.value == tree::CoatingOrder::Before;
    let factor = match (before, feature) {
        (false, _) => 0.0,
        (true, Feature::Internal) => -surfaces,
        (true, _) => surfaces,
    };
    Some(Coating { thickness, build_up, factor, before, span: stated.span })
}

/// How often the growth of one surface enters the size.
fn surfaces(cx: &mut Context, stated: &tree::Coating, form: Form) -> Option<f64> {
    match (form, &stated.sides) {
        (Form::Angle, _) => cx.refuse(
            Diagnostic::new(Code::WrongKind, stated.span, "a coating does not change an angle")
                .help("state it at a length"),
        ),
        (Form::Diameter, None) => Some(2.0),
        (Form::Radius, None) => Some(1.0),
        (Form::Diameter | Form::Radius, Some(sides)) => cx.refuse(
            Diagnostic::new(Code::CoatingSides, sides.span, "a round feature is coated all around")
                .help("leave the sides out"),
        ),
        (Form::Linear, Some(sides)) => Some(match sides.value {
            tree::Sides::One => 1.0,
            tree::Sides::Both => 2.0,
        }),
        (Form::Linear, None) => cx.refuse(
            Diagnostic::new(
                Code::CoatingSides,
                stated.span,
                "the coating of a linear size has to say which faces it covers",
            )
            .help("add `on one side` or `on both sides`"),
        ),
    }
}

/// True for a feature of size: a diameter, a radius or a width.
pub(super) fn is_size(dimension: &Dimension) -> bool {
    dimension.geometric.is_none() && dimension.form != Form::Angle
}

/// True where a coating cannot be reckoned with before the side is known.
pub(super) fn needs_side(dimension: &Dimension) -> bool {
    dimension.feature == Feature::Unstated
        && dimension.coating.as_ref().is_some_and(|coating| coating.before)
}

/// Says on which side of the material a dimension lies, as the side of a fit does, and so settles
/// the sign of its coating. A side that is known already stays.
pub(crate) fn settle_side(cx: &mut Context, id: DimensionId, feature: Feature) {
    let dimension = &mut cx.dimensions[id.index()];
    if dimension.feature != Feature::Unstated {
        return;
    }
    dimension.feature = feature;
    if let Some(coating) = &mut dimension.coating
        && feature == Feature::Internal
    {
        coating.factor = -coating.factor.abs();
    }
}

/// Reports every coating and every bonus whose side nothing has settled.
pub(crate) fn report_unsettled(cx: &mut Context) {
    let mut findings = Vec::new();
    for dimension in &cx.dimensions {
        let help = |d: &Dimension| {
            format!("write `{0} = internal …` for a hole or slot, `{0} = external …` else", d.name)
        };
        if let Some(coating) = &dimension.coating
            && needs_side(dimension)
        {
            let message = format!(
                "whether the coating adds to `{}` or takes from it is not known",
                dimension.name
            );
            let finding = Diagnostic::new(Code::CoatingSideUnknown, coating.span, message);
            findings.push(finding.help(help(dimension)));
        }
        let bonus = dimension.geometric.and_then(|geometric| geometric.bonus);
        if let Some(feature) = bonus.and_then(|id| cx.dimensions.get(id.index()))
            && feature.feature == Feature::Unstated
            && is_size(feature)
        {
            let message = format!(
                "the maximum material condition of `{}` is not known: it may be a hole or a shaft",
                feature.name
            );
            let finding = Diagnostic::new(Code::BonusSideUnknown, dimension.line, message)
                .label(feature.line, "its size");
            findings.push(finding.help(help(feature)));
        }
    }
    findings.into_iter().for_each(|finding| cx.report(finding));
}
