//! Temperatures of parts and fills, K.

use super::scene::{At, Scene, Way};
use crate::model::{Assembly, Condition, ConditionId, OwnTemperature, Owner, Thermal, Unknown};
use crate::numeric::{Number, Recorded};

/// The temperature of a part or fill in a state of the world.
///
/// One without a row of its own follows the condition, tolerance and all; an absolute one is pinned;
/// a difference moves with its base and keeps the base's unknown.
pub(crate) fn of(scene: &Scene<'_>, at: At, owner: Owner) -> Recorded {
    let reference = Recorded::exact(scene.assembly.reference);
    let At::Condition(id) = at else { return reference };
    let real = in_condition(scene, id, owner);
    match scene.shift(id) {
        None => real,
        // A range is not a tolerance about its middle: it is asked point by point.
        Some(Way::Common(temperature)) if scene.assembly.condition(id).is_range() => {
            temperature.clone()
        }
        Some(Way::Common(temperature)) => {
            temperature.clone() + (real - at_middle(scene.assembly, id, owner))
        }
        Some(Way::Scaled(factor)) => {
            let middle = at_middle(scene.assembly, id, owner);
            let departure = factor.clone() * (middle - scene.assembly.reference);
            reference + departure + (real - middle)
        }
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
        Thermal::History(history) => {
            let column = history.parts.iter().find(|(o, _)| Some(*o) == owner).map(|(_, c)| c);
            match column.or(history.ambient.as_ref()) {
                Some(curve) => scene.unknown(Unknown::Time(id)).apply(curve) + shared,
                // The resolver refuses a part without a column; nothing else asks.
                None => Recorded::exact(scene.assembly.reference) + shared,
            }
        }
    }
}
