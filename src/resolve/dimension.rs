//! Dimensions: a size with its tolerance, and the clauses beside it. Lengths in m, angles in rad.

mod clause;
mod coating;
mod general;
mod geometrical;
mod iso286;
mod set;
mod size;

pub(crate) use coating::{report_unsettled, settle_side};
pub(super) use geometrical::check_bonus;

use super::context::Context;
use super::head::exact_temperature;
use super::quantity::{self, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::Material;
use crate::model::{Dimension, Direction, Feature, Form, Geometric, Origin, PartId, Spread};
use crate::span::Span;
use crate::syntax::tree;
use crate::units::Kind;
use std::sync::Arc;

/// The part that a dimension belongs to, as far as its dimensions need to know.
pub(super) struct Owner {
    /// Which part.
    pub(super) part: PartId,
    /// Its name.
    pub(super) name: String,
    /// Its material; none where that could not be found.
    pub(super) material: Option<Arc<Material>>,
    /// Where the material is named.
    pub(super) material_span: Span,
}

/// A size with its limits, before the clauses.
struct Sized {
    nominal: f64,
    lower: f64,
    upper: f64,
    origin: Origin,
    /// Hole or shaft, where the size itself says so.
    feature: Feature,
    members: Vec<f64>,
    geometric: Option<Geometric>,
}

impl Sized {
    fn plain(nominal: f64, lower: f64, upper: f64, origin: Origin) -> Self {
        let (feature, members, geometric) = (Feature::Unstated, Vec::new(), None);
        Sized { nominal, lower, upper, origin, feature, members, geometric }
    }
}

/// What a dimension is before it is resolved, and what it stays where it is wrong: a metre exactly,
/// so that those who use it are not reported as well.
pub(super) fn placeholder(cx: &Context, dimension: &tree::Dimension, part: PartId) -> Dimension {
    Dimension {
        name: dimension.name.value.clone(),
        span: dimension.name.span,
        part,
        line: dimension.span,
        written: written(cx, dimension),
        form: form(dimension),
        feature: side(dimension),
        nominal: 1.0,
        lower: 0.0,
        upper: 0.0,
        origin: Origin::Exact,
        members: Vec::new(),
        geometric: None,
        reference: cx.head(dimension.span.file).reference,
        direction: Direction::None,
        spread: Spread::default_of_sizes(),
        coating: None,
        loads: Vec::new(),
        strains: Vec::new(),
        basis: clause::basis(dimension.basis.as_ref().map(|basis| basis.value)),
        because: dimension.because.as_ref().map(|text| text.value.clone()),
    }
}

/// Resolves a dimension; every clause is read, so that each mistake in it is reported.
pub(super) fn resolve(
    cx: &mut Context,
    dimension: &tree::Dimension,
    owner: &Owner,
) -> Option<Dimension> {
    let blank = placeholder(cx, dimension, owner.part);
    let form = blank.form;
    let sized = size::size(cx, dimension, owner, form);
    let direction = clause::direction(cx, dimension, owner, form);
    let reference = match &dimension.at {
        Some(at) => exact_temperature(cx, at),
        None => Some(blank.reference),
    };
    let loads = clause::loads(cx, dimension, form);
    let strains = clause::strains(cx, dimension, form);
    let feature = match (&sized, blank.feature) {
        (Some(sized), Feature::Unstated) => sized.feature,
        (_, feature) => feature,
    };
    let coating = match &dimension.coating {
        Some(stated) => Some(coating::coating(cx, stated, form, feature)?),
        None => None,
    };
    let sized = sized?;
    let spread = spread(cx, dimension, &sized, form);
    Some(Dimension {
        feature,
        nominal: sized.nominal,
        lower: sized.lower,
        upper: sized.upper,
        origin: sized.origin,
        members: sized.members,
        geometric: sized.geometric,
        reference: reference?,
        direction: direction?,
        spread: spread?,
        coating,
        loads: loads?,
        strains: strains?,
        ..blank
    })
}

/// How a dimension varies.
fn spread(
    cx: &mut Context,
    dimension: &tree::Dimension,
    sized: &Sized,
    form: Form,
) -> Option<Spread> {
    let Some(stated) = &dimension.spread else { return Some(Spread::default_of_sizes()) };
    let measured = matches!(stated.distribution.value, tree::Distribution::File(_));
    if sized.origin == Origin::Exact && !measured {
        return cx.refuse(
            Diagnostic::new(
                Code::SpreadOfNothing,
                stated.span,
                "a spread needs limits to lie between",
            )
            .label(dimension.size.span, "this is theoretically exact")
            .help("state a tolerance instead of `exact`"),
        );
    }
    quantity::spread(cx, stated, expect(form))
}

/// What the numbers of a size are.
fn expect(form: Form) -> Expect {
    if form == Form::Angle { Expect::Of(Kind::ANGLE) } else { Expect::Size }
}

/// Side, form, size and tolerance as written.
fn written(cx: &Context, dimension: &tree::Dimension) -> String {
    let start = dimension.form.as_ref().map_or(dimension.size.span, |form| form.span);
    cx.text(start.to(dimension.size.span)).to_string()
}

/// The side stated, if any.
fn side(dimension: &tree::Dimension) -> Feature {
    match dimension.side.as_ref().map(|side| side.value) {
        Some(tree::Side::Internal) => Feature::Internal,
        Some(tree::Side::External) => Feature::External,
        None => Feature::Unstated,
    }
}

/// What a dimension measures: an angle where a unit of angle stands in its size.
fn form(dimension: &tree::Dimension) -> Form {
    match dimension.form.as_ref().map(|form| form.value) {
        Some(tree::Form::Diameter) => Form::Diameter,
        Some(tree::Form::Radius) => Form::Radius,
        None if size::is_angle(&dimension.size.value) => Form::Angle,
        None => Form::Linear,
    }
}
