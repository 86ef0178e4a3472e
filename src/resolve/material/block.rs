//! One material block: its properties over those of the material it is like.

use super::{expansion, property, swell};
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::{Expansions, Grade, Material, Property, Source};
use crate::numeric::Interval;
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::span::Span;
use crate::syntax::tree::{self, Direction, PropertyKind};
use crate::units::Kind;
use std::collections::BTreeMap;
use std::sync::Arc;

/// The material of a block; none if anything in it is wrong.
pub(super) fn material(
    cx: &mut Context,
    block: &tree::Material,
    base: Option<Arc<Material>>,
) -> Option<Material> {
    let over = match &block.over {
        Some(range) => Some(validity(cx, range)?),
        None => None,
    };
    let mut complete = unique(cx, block);
    let expansion = expansion::expansions(cx, block, base.as_deref(), over);
    let mut material = match base {
        Some(base) => inherited(&base),
        None => Material::new(block.name.value.clone(), expansion.clone().flatten()?),
    };
    material.name = block.name.value.clone();
    material.designations.clear();
    match expansion {
        Some(Some(own)) => material.expansion = own,
        // As it is in the material that this one is like, perhaps over other temperatures.
        Some(None) => narrow(&mut material.expansion, over),
        None => complete = false,
    }
    for stated in &block.properties {
        if let (Some(direction), false) = (&stated.direction, is_expansion(stated.kind.value)) {
            complete = false;
            cx.report(
                Diagnostic::new(
                    Code::DirectionUnneeded,
                    direction.span,
                    "only expansion has a direction",
                )
                .help("leave it out"),
            );
        }
        complete &= set(cx, &mut material, stated, over).is_some();
    }
    let words: Vec<&str> = block.sources.iter().map(|text| text.value.as_str()).collect();
    if !words.is_empty() {
        material.source = Some(Source::new(Grade::Stated, words.join("; ")));
    } else if !block.properties.is_empty() {
        material.source = None;
    }
    material.extrapolate |= block.extrapolate.is_some();
    complete.then_some(material)
}

/// The temperatures that data hold over, K.
pub(super) fn validity(cx: &mut Context, range: &tree::Range) -> Option<Interval> {
    let (lo, hi, _) = quantity::range(cx, range, Expect::Temperature)?;
    quantity::above_absolute_zero(cx, range.span, lo)?;
    Some(Interval::new(lo, hi))
}

/// Sets a property that is no expansion.
fn set(
    cx: &mut Context,
    material: &mut Material,
    stated: &tree::Property,
    over: Option<Interval>,
) -> Option<()> {
    let place = match stated.kind.value {
        PropertyKind::Cte | PropertyKind::Expansion => return Some(()),
        PropertyKind::Limit => {
            material.limit = Some(property::limit(cx, stated)?);
            return Some(());
        }
        PropertyKind::Swell => {
            material.swell = swell::states(cx, stated)?;
            return Some(());
        }
        PropertyKind::Modulus => (&mut material.modulus, Kind::STRESS),
        PropertyKind::BulkModulus => (&mut material.bulk_modulus, Kind::STRESS),
        PropertyKind::Yield => (&mut material.yield_strength, Kind::STRESS),
        PropertyKind::Poisson => (&mut material.poisson, Kind::PURE),
        PropertyKind::Density => (&mut material.density, Kind::DENSITY),
    };
    *place.0 = Some(property::property(cx, stated, place.1, over)?);
    Some(())
}

fn is_expansion(kind: PropertyKind) -> bool {
    matches!(kind, PropertyKind::Cte | PropertyKind::Expansion)
}

/// Reports properties stated twice.
fn unique(cx: &mut Context, block: &tree::Material) -> bool {
    let mut first: BTreeMap<(PropertyKind, Option<Direction>), Span> = BTreeMap::new();
    let mut unique = true;
    for stated in &block.properties {
        // Both say how a material expands.
        let kind = match stated.kind.value {
            PropertyKind::Expansion => PropertyKind::Cte,
            kind => kind,
        };
        let key = (kind, stated.direction.as_ref().map(|direction| direction.value));
        let Some(&earlier) = first.get(&key) else {
            first.insert(key, stated.kind.span);
            continue;
        };
        unique = false;
        let message = match kind {
            PropertyKind::Cte => "the expansion is stated twice".to_string(),
            _ => format!("`{}` is stated twice", cx.text(stated.kind.span)),
        };
        cx.report(
            Diagnostic::new(Code::StatedTwice, stated.kind.span, message)
                .label(earlier, "first stated here")
                .help("keep one of the two"),
        );
    }
    unique
}

/// A copy whose data name their own sources, so that a new one does not speak for them.
fn inherited(base: &Material) -> Material {
    let mut material = base.clone();
    let Some(source) = material.source.take() else { return material };
    let properties = [
        &mut material.modulus,
        &mut material.poisson,
        &mut material.yield_strength,
        &mut material.density,
        &mut material.bulk_modulus,
    ];
    let keep = |own: &mut Option<Source>| {
        own.get_or_insert_with(|| source.clone());
    };
    properties.into_iter().flatten().for_each(|p: &mut Property| keep(&mut p.source));
    match &mut material.expansion {
        Expansions::Isotropic(one) | Expansions::Volume(one) => keep(&mut one.source),
        Expansions::Directional { along, across } => {
            keep(&mut along.source);
            keep(&mut across.source);
        }
    }
    material.source = Some(source);
    material
}

/// Gives every curve of an expansion another range.
fn narrow(expansions: &mut Expansions, over: Option<Interval>) {
    let Some(over) = over else { return };
    match expansions {
        Expansions::Isotropic(one) | Expansions::Volume(one) => one.range = over,
        Expansions::Directional { along, across } => {
            along.range = over;
            across.range = over;
        }
    }
}
