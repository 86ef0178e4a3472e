//! Temperatures of parts and fills, K.

use super::ranges;
use super::scene::{At, Scene, Way};
use crate::model::{Assembly, ConditionId, History, OwnTemperature, Owner, Thermal, Unknown};
use crate::numeric::{Number, Recorded};

/// The temperature of a part or fill in a state of the world.
///
/// One without a row of its own follows the condition, tolerance and all; an absolute one is pinned;
/// a difference moves with its base and keeps the base's unknown.
pub(crate) fn of(scene: &Scene<'_>, at: At, owner: Owner) -> Recorded {
    let reference = Recorded::exact(scene.assembly.reference);
    let At::Condition(id) = at else { return reference };
    match scene.shift(id) {
        None => in_condition(scene, id, owner),
        Some(Way::Common(temperature)) => temperature.clone() + stated(scene, id, owner).tolerance,
        Some(Way::Scaled(factor)) => departed(scene, id, owner, factor.clone()),
        Some(Way::Each(factors)) => {
            let own = factors.iter().find(|(o, _)| *o == owner).map(|(_, factor)| factor.clone());
            departed(scene, id, owner, own.unwrap_or(Recorded::exact(1.0)))
        }
    }
}

/// The temperature with its departure from reference multiplied, tolerance kept.
fn departed(scene: &Scene<'_>, id: ConditionId, owner: Owner, factor: Recorded) -> Recorded {
    let reference = scene.assembly.reference;
    let Stated { nominal, tolerance } = stated(scene, id, owner);
    factor * (nominal - reference) + reference + tolerance
}

/// A temperature in two parts: what the spec asks for, and how far it may be off. K.
pub(crate) struct Stated {
    /// A point; every temperature of a range; that of every time of a history.
    pub(crate) nominal: Recorded,
    /// About zero.
    pub(crate) tolerance: Recorded,
}

/// The temperature of a part or fill in a condition, what is asked for apart from its tolerance.
pub(crate) fn stated(scene: &Scene<'_>, id: ConditionId, owner: Owner) -> Stated {
    let none = || Recorded::exact(0.0);
    let sum = |stated: Stated, term: Term| match term {
        Term::Asked(t) => Stated { nominal: stated.nominal + t, ..stated },
        Term::About(t, middle) => {
            Stated { nominal: stated.nominal + middle, tolerance: stated.tolerance + (t - middle) }
        }
    };
    let terms = terms(scene, id, owner).into_iter();
    terms.fold(Stated { nominal: none(), tolerance: none() }, sum)
}

/// The temperature of a part or fill in a condition with everything in the middle of its limits, K.
pub(crate) fn at_middle(assembly: &Assembly, id: ConditionId, owner: Owner) -> f64 {
    let recorded = Scene::record(assembly, &[], &[], |scene| Ok(in_condition(scene, id, owner)));
    recorded.map_or(assembly.reference, |r| r.tape.value(&r.middle))
}

fn in_condition(scene: &Scene<'_>, id: ConditionId, owner: Owner) -> Recorded {
    let terms = terms(scene, id, owner).into_iter();
    terms.fold(Recorded::exact(0.0), |sum, term| match term {
        Term::Asked(t) | Term::About(t, _) => sum + t,
    })
}

/// A summand of a temperature, K.
enum Term {
    /// Asked for as it is: a range, the times of a history.
    Asked(Recorded),
    /// An unknown with its middle: what it is off by is a tolerance.
    About(Recorded, f64),
}

/// What the temperature of a part or fill in a condition is the sum of.
fn terms(scene: &Scene<'_>, id: ConditionId, owner: Owner) -> Vec<Term> {
    let condition = scene.assembly.condition(id);
    let about =
        |unknown| Term::About(scene.unknown(unknown), ranges::middle(scene.assembly, unknown));
    // Of whoever has no row: its own column of a history, else `ambient`.
    let shared = |owner: Option<Owner>| {
        let temperature = Unknown::Temperature(id);
        match &condition.thermal {
            Thermal::Uniform(_) if condition.is_range() => {
                vec![Term::Asked(scene.unknown(temperature))]
            }
            Thermal::Uniform(_) => vec![about(temperature)],
            Thermal::History(history) => vec![
                Term::Asked(in_history(scene, id, history, owner)),
                // A band is about zero already.
                Term::About(scene.unknown(temperature), 0.0),
            ],
        }
    };
    let own = || about(Unknown::OwnTemperature { condition: id, owner });
    let above = |mut base: Vec<Term>| {
        base.push(own());
        base
    };
    match condition.state(owner).and_then(|s| s.temperature.as_ref()) {
        None => shared(Some(owner)),
        Some(OwnTemperature::Absolute(_)) => vec![own()],
        Some(OwnTemperature::Above { base: Some(base), .. }) => above(terms(scene, id, *base)),
        Some(OwnTemperature::Above { base: None, .. }) => above(shared(None)),
    }
}

/// The temperature that a history has for someone, without its tolerance.
fn in_history(
    scene: &Scene<'_>,
    id: ConditionId,
    history: &History,
    owner: Option<Owner>,
) -> Recorded {
    let column = history.parts.iter().find(|(o, _)| Some(*o) == owner).map(|(_, c)| c);
    match column.or(history.ambient.as_ref()) {
        Some(curve) => scene.unknown(Unknown::Time(id)).apply(curve),
        // The resolver refuses a part without a column; nothing else asks.
        None => Recorded::exact(scene.assembly.reference),
    }
}
