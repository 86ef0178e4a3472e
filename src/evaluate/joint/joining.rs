//! Temperatures at which a joint can be made, and at which it comes loose.
//!
//! They hold for every pair within the tolerances: the least bore on the greatest shaft to join, the
//! least shaft in the greatest bore to come loose, each lot at its worst.

use super::stack::{nominal, smoothing};
use crate::evaluate::outcome::{End, Range, ShopCard, Together};
use crate::evaluate::scene::{At, Response, Scene};
use crate::evaluate::size::expansion_in;
use crate::evaluate::{expression, temperature};
use crate::mechanics::joining::{self, Expanding, Loosening};
use crate::model::{
    Assembly, ConditionId, Direction, Expr, ExprKind, Fit, Joint, Owner, PartId, SubjectId,
};
use crate::numeric::Interval;
use crate::numeric::extremes::extremes;
use crate::numeric::root::Crossing;

/// How far bound and value may stay apart where a free size is bounded, m.
const GAP: f64 = 1e-13;

/// The condition whose name says that it is the assembly day; else the reference state.
fn assembly_day(assembly: &Assembly) -> Option<ConditionId> {
    let named = |c: &ConditionId| {
        matches!(assembly.condition(*c).name.as_str(), "assembly" | "assembling" | "joining")
    };
    assembly.condition_ids().find(named)
}

/// Least and greatest of a side of a fit in a state of the world, m; proven.
fn side(assembly: &Assembly, at: At, expr: &Expr) -> Option<(f64, f64)> {
    let recorded = Scene::record(assembly, &[], &[], |s| expression::value(s, at, expr));
    let Response { tape, ranges, .. } = recorded.ok()?;
    let found = extremes(&tape, &ranges, GAP);
    Some((found.least.bound, found.greatest.bound))
}

/// How the material of a ring expands, in the direction of the size that is in contact.
fn expanding(assembly: &Assembly, part: PartId, contact: &Expr) -> Expanding {
    let material = &assembly.part(part).material;
    let mut direction = Direction::None;
    contact.walk(&mut |e| {
        if let ExprKind::Size { dimension, .. } = e.kind
            && assembly.dimension(dimension).part == part
        {
            direction = assembly.dimension(dimension).direction;
        }
    });
    let data = expansion_in(material, direction);
    Expanding {
        curve: data.curve.clone(),
        reference: assembly.reference,
        scatter: data.scatter,
        range: data.range,
    }
}

/// Clearance wanted while joining, m.
fn clearance(assembly: &Assembly, fit: &Fit, joint: &Joint) -> f64 {
    match &joint.insertion_clearance {
        Some(stated) => stated.greatest,
        None => joining::insertion_clearance(nominal(assembly, &fit.internal)),
    }
}

/// What a shop needs to make a joint.
pub(crate) fn shop_card(assembly: &Assembly, subject: SubjectId) -> Option<ShopCard> {
    let fit = assembly.fit(subject)?;
    let joint = fit.joint.as_ref()?;
    let day = assembly_day(assembly);
    let at = day.map_or(At::Reference, At::Condition);
    let ambient = |part| match day {
        Some(condition) => temperature::at_middle(assembly, condition, Owner::Part(part)),
        None => assembly.reference,
    };
    let (bore, _) = side(assembly, At::Reference, &fit.internal)?;
    let (_, shaft) = side(assembly, At::Reference, &fit.external)?;
    let (bore_today, _) = side(assembly, at, &fit.internal)?;
    let (_, shaft_today) = side(assembly, at, &fit.external)?;
    let hub = expanding(assembly, joint.outer.part, &fit.internal);
    let inner = expanding(assembly, joint.inner.part, &fit.external);
    let wanted = clearance(assembly, fit, joint);
    let from = ambient(joint.outer.part);
    let heated = joining::hub_heated(&hub, bore, shaft_today, wanted, from).at();
    let chilled =
        joining::shaft_chilled(&inner, shaft, bore_today, wanted, ambient(joint.inner.part)).at();
    let mut card = ShopCard {
        subject,
        ambient: from,
        day,
        insertion_clearance: wanted,
        heat_outer: heated,
        outer_limit: assembly.part(joint.outer.part).material.limit,
        outer_data: hub.hottest(),
        chill_inner: chilled,
        inner_data: inner.coldest(),
        together: None,
    };
    if !card.may_be_heated() {
        let hot = card.outer_limit.map_or(hub.hottest(), |limit| limit.min(hub.hottest()));
        let cold = ambient(joint.inner.part);
        card.together =
            (hot > from).then(|| together((&hub, bore, hot), (&inner, shaft, cold), wanted));
    }
    Some(card)
}

/// The hub at a temperature that it may have, and what is left for the shaft to do.
///
/// `hub`: how it expands, its least bore at reference, its temperature; `shaft`: how it expands, its
/// greatest size at reference, the temperature it is chilled from.
fn together(
    (hub, bore, hot): (&Expanding, f64, f64),
    (inner, shaft, from): (&Expanding, f64, f64),
    wanted: f64,
) -> Together {
    let (hub_strain, nothing) = (hub.least(Interval::point(hot)), Interval::ZERO);
    let warm = joining::free_clearance(Interval::point(bore), hub_strain, nothing, nothing);
    let chilled = joining::shaft_chilled(inner, shaft, warm.lo(), wanted, from).at();
    let at_most = joining::free_clearance(
        warm,
        nothing,
        Interval::point(shaft),
        inner.greatest(Interval::point(inner.coldest())),
    );
    Together { heat_outer: hot, chill_inner: chilled, short: wanted - at_most.lo() }
}

/// The joining temperature as a figure: one number, or unbounded where no heat within the data is
/// enough.
pub(crate) fn joining_range(assembly: &Assembly, subject: SubjectId) -> Option<Range> {
    let card = shop_card(assembly, subject)?;
    Some(single(card.heat_outer.unwrap_or(f64::INFINITY)))
}

/// The temperature up to which a joint warmed as a whole is proven to hold; unbounded where its data
/// end first.
pub(crate) fn loosening_range(assembly: &Assembly, subject: SubjectId) -> Option<Range> {
    let fit = assembly.fit(subject)?;
    let joint = fit.joint.as_ref()?;
    let (least_shaft, _) = side(assembly, At::Reference, &fit.external)?;
    let (_, greatest_bore) = side(assembly, At::Reference, &fit.internal)?;
    let found = Loosening {
        shaft: &expanding(assembly, joint.inner.part, &fit.external),
        hub: &expanding(assembly, joint.outer.part, &fit.internal),
        least_shaft,
        greatest_bore,
        smoothing: smoothing(fit),
    }
    .first(assembly.reference, f64::MAX);
    Some(single(match found {
        Crossing::Reached { before, .. } => before,
        Crossing::Undecided { from } => from,
        Crossing::Never => f64::INFINITY,
    }))
}

fn single(value: f64) -> Range {
    let end = || End { bound: value, reached: value, met: true, corner: Vec::new() };
    Range { least: end(), mean: value, greatest: end() }
}
