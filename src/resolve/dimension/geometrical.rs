//! Geometrical tolerances as contributors of zero nominal.

use super::coating::is_size;
use super::{Owner, Sized};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{DimensionId, Geometric, Origin};
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::standards::geometry::Characteristic;
use crate::syntax::tree::{self, GeometricalKind};

/// A geometrical tolerance; its range is what the zone gives a dimension chain.
pub(super) fn geometrical(
    cx: &mut Context,
    dimension: &tree::Dimension,
    stated: &tree::Geometrical,
    owner: &Owner,
) -> Option<Sized> {
    let kind = characteristic(stated.kind.value);
    let name = kind.name();
    let zone = quantity::scalar(cx, &stated.zone, Expect::Limit);
    let misplaced = dimension.form.as_ref().map(|form| form.span);
    if let Some(span) = misplaced {
        return cx.refuse(
            Diagnostic::new(Code::FormOfTolerance, span, format!("`{name}` is no size"))
                .help(format!("the zone may be round: `{name} dia …`")),
        );
    }
    if let Some(span) = stated.diametral.filter(|_| !kind.may_be_diametral()) {
        return cx.refuse(
            Diagnostic::new(
                Code::FormOfTolerance,
                span,
                format!("the zone of `{name}` is never round"),
            )
            .help("leave `dia` out"),
        );
    }
    let bonus = match &stated.modifier {
        Some(modifier) => Some(bonus(cx, modifier, kind, owner)?),
        None => None,
    };
    let zone = zone?;
    if zone < 0.0 || (zone == 0.0 && bonus.is_none()) {
        return cx.refuse(
            Diagnostic::new(
                Code::ValueOutOfRange,
                stated.zone.span(),
                format!("the zone of `{name}` has to be wider than 0"),
            )
            .help("a zone of 0 has a meaning at MMC only"),
        );
    }
    let range = kind.contribution();
    let sized =
        Sized::plain(0.0, range.lower * zone, range.upper * zone, Origin::Geometrical(name));
    Some(Sized { geometric: Some(Geometric { half: range.half(), bonus }), ..sized })
}

/// The feature whose departure from maximum material widens the zone: a size of the same part.
fn bonus(
    cx: &mut Context,
    modifier: &tree::Modifier,
    kind: Characteristic,
    owner: &Owner,
) -> Option<DimensionId> {
    if !kind.takes_material_condition() {
        return cx.refuse(
            Diagnostic::new(
                Code::BonusOfNoSize,
                modifier.span,
                format!("`{}` takes no material condition (ISO 2692)", kind.name()),
            )
            .help("leave it out"),
        );
    }
    if modifier.condition.value == tree::MaterialCondition::Least {
        return cx.refuse(
            Diagnostic::new(
                Code::BonusAtLeastMaterial,
                modifier.condition.span,
                "a bonus at least material condition is not reckoned with",
            )
            .help("write `at MMC of …`, or the widest zone that the bonus can give"),
        );
    }
    let path = &modifier.feature;
    if let Some(other) = path.owner.as_ref().filter(|other| other.value != owner.name) {
        return cx.refuse(
            Diagnostic::new(
                Code::BonusOfNoSize,
                path.span,
                format!("the feature of a bonus is one of `{}` itself", owner.name),
            )
            .help(format!("name a size of `{}`, not of `{}`", owner.name, other.value)),
        );
    }
    let names = cx.dimension_names.get(&owner.part)?;
    let Some(id) = names.get(&path.name.value) else {
        return cx.unknown_dimension(owner.part, &owner.name, &path.name);
    };
    Some(id)
}

/// Refuses bonuses of what is no feature of size; called once all dimensions of a part are known.
pub(in crate::resolve) fn check_bonus(cx: &mut Context, id: DimensionId) {
    let dimension = &cx.dimensions[id.index()];
    let Some(of) = dimension.geometric.and_then(|geometric| geometric.bonus) else { return };
    let feature = &cx.dimensions[of.index()];
    if is_size(feature) {
        return;
    }
    let finding = Diagnostic::new(
        Code::BonusOfNoSize,
        dimension.line,
        format!("`{}` is no feature of size", feature.name),
    )
    .label(feature.line, "stated here")
    .help("the bonus comes from a diameter or a width");
    cx.report(finding);
}

fn characteristic(kind: GeometricalKind) -> Characteristic {
    match kind {
        GeometricalKind::Straightness => Characteristic::Straightness,
        GeometricalKind::Flatness => Characteristic::Flatness,
        GeometricalKind::Roundness => Characteristic::Roundness,
        GeometricalKind::Cylindricity => Characteristic::Cylindricity,
        GeometricalKind::Profile => Characteristic::Profile,
        GeometricalKind::Parallelism => Characteristic::Parallelism,
        GeometricalKind::Perpendicularity => Characteristic::Perpendicularity,
        GeometricalKind::Angularity => Characteristic::Angularity,
        GeometricalKind::Position => Characteristic::Position,
        GeometricalKind::Concentricity => Characteristic::Concentricity,
        GeometricalKind::Symmetry => Characteristic::Symmetry,
        GeometricalKind::Runout => Characteristic::Runout,
        GeometricalKind::TotalRunout => Characteristic::TotalRunout,
    }
}
