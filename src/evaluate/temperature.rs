//! Temperatures of parts and fills, K.

use super::ranges;
use super::scene::{At, Scene, Way};
use crate::model::{
    Assembly, Condition, ConditionId, History, OwnTemperature, Owner, Thermal, Unknown,
};
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
    let condition = scene.assembly.condition(id);
    let about = |unknown: Unknown| {
        let middle = ranges::middle(scene.assembly, unknown);
        Stated { nominal: Recorded::exact(middle), tolerance: scene.unknown(unknown) - middle }
    };
    let shared = |owner: Option<Owner>| match &condition.thermal {
        Thermal::Uniform(_) if !condition.is_range() => about(Unknown::Temperature(id)),
        Thermal::Uniform(_) => Stated {
            nominal: scene.unknown(Unknown::Temperature(id)),
            tolerance: Recorded::exact(0.0),
        },
        Thermal::History(history) => Stated {
            nominal: in_history(scene, id, history, owner),
            tolerance: scene.unknown(Unknown::Temperature(id)),
        },
    };
    let own = || about(Unknown::OwnTemperature { condition: id, owner });
    let above = |base: Stated| {
        let own = own();
        Stated { nominal: base.nominal + own.nominal, tolerance: base.tolerance + own.tolerance }
    };
    match condition.state(owner).and_then(|s| s.temperature.as_ref()) {
        None => shared(Some(owner)),
        Some(OwnTemperature::Absolute(_)) => own(),
        Some(OwnTemperature::Above { base: Some(base), .. }) => above(stated(scene, id, *base)),
        Some(OwnTemperature::Above { base: None, .. }) => above(shared(None)),
    }
}

/// The temperature of a part or fill in a condition with everything in the middle of its limits, K.
pub(crate) fn at_middle(assembly: &Assembly, id: ConditionId, owner: Owner) -> f64 {
    let recorded = Scene::record(assembly, &[], &[], |scene| Ok(in_condition(scene, id, owner)));
    recorded.map_or(assembly.reference, |r| r.tape.value(&r.middle))
}

fn in_condition(scene: &Scene<'_>, id: ConditionId, owner: Owner) -> Recorded {
    let condition = scene.assembly.condition(id);
    let own = || scene.unknown(Unknown::OwnTemperature { condition: id, owner });
    match condition.state(owner).and_then(|s| s.temperature.as_ref()) {
        None => common(scene, id, condition, Some(owner)),
        Some(OwnTemperature::Absolute(_)) => own(),
        Some(OwnTemperature::Above { base: Some(base), .. }) => {
            in_condition(scene, id, *base) + own()
        }
        Some(OwnTemperature::Above { base: None, .. }) => {
            common(scene, id, condition, None) + own()
        }
    }
}

/// The condition's temperature for whoever has no row: its own column of a history, else `ambient`.
fn common(
    scene: &Scene<'_>,
    id: ConditionId,
    condition: &Condition,
    owner: Option<Owner>,
) -> Recorded {
    let shared = scene.unknown(Unknown::Temperature(id));
    match &condition.thermal {
        Thermal::Uniform(_) => shared,
        Thermal::History(history) => in_history(scene, id, history, owner) + shared,
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
