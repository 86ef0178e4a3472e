//! Temperatures of parts and fills, K.

use super::scene::{At, Scene};
use crate::model::{Condition, ConditionId, OwnTemperature, Owner, Thermal, Unknown};
use crate::numeric::{Number, Recorded};

/// The temperature of a part or fill in a state of the world.
///
/// One without a row of its own follows the condition, tolerance and all; an absolute one is pinned;
/// a difference moves with its base and keeps the base's unknown.
pub(crate) fn of(scene: &Scene<'_>, at: At, owner: Owner) -> Recorded {
    let reference = Recorded::exact(scene.assembly.reference);
    let At::Condition(id) = at else { return reference };
    let real = in_condition(scene, id, owner);
    match scene.scale() {
        Some(scale) => reference.clone() + scale.clone() * (real - reference),
        None => real,
    }
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
