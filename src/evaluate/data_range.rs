//! Temperatures of all parts, and where they leave the data of their materials. K.

use super::outcome::{BeyondData, PartTemperature};
use super::scene::{At, Scene};
use super::temperature;
use crate::model::{Assembly, Owner, PartId, SubjectId, SubjectKind};
use crate::numeric::{Interval, Recorded};

/// A temperature may lie this far beyond the data, K: 293 K and 20 °C are the same to every table.
pub(crate) const SLACK: f64 = 0.2;

/// The temperature of every part and fill at every condition.
pub(crate) fn temperatures(assembly: &Assembly) -> Vec<PartTemperature> {
    let parts = (0..assembly.parts.len() as u32).map(|i| Owner::Part(PartId(i)));
    let fills = (0..assembly.subjects.len() as u32)
        .map(SubjectId)
        .filter(|&s| matches!(assembly.subject(s).kind, SubjectKind::Fill(_)))
        .map(Owner::Fill);
    let owners: Vec<Owner> = parts.chain(fills).collect();
    let mut list = Vec::new();
    for condition in assembly.condition_ids() {
        for &owner in &owners {
            let range =
                hull(assembly, |scene| temperature::of(scene, At::Condition(condition), owner));
            list.push(PartTemperature {
                owner,
                condition,
                least: range.lo(),
                greatest: range.hi(),
            });
        }
    }
    list
}

/// Everything that a temperature, or a part of one, may be.
pub(crate) fn hull(assembly: &Assembly, part: impl FnOnce(&Scene<'_>) -> Recorded) -> Interval {
    // Each unknown occurs once in a temperature, so the natural enclosure is the hull.
    match Scene::record(assembly, &[], &[], |scene| Ok(part(scene))) {
        Ok(response) => response.tape.value(&response.ranges),
        Err(_) => Interval::ENTIRE,
    }
}

/// The parts that leave the data of their materials.
pub(crate) fn beyond(assembly: &Assembly, temperatures: &[PartTemperature]) -> Vec<BeyondData> {
    let mut list = Vec::new();
    for t in temperatures {
        let Some(material) = assembly.material_of(t.owner) else { continue };
        let valid = material.valid();
        let (from, to) = (valid.lo(), valid.hi());
        if t.least < from - SLACK || t.greatest > to + SLACK {
            list.push(BeyondData {
                owner: t.owner,
                condition: t.condition,
                temperature: (t.least, t.greatest),
                valid: (from, to),
                extrapolated: material.extrapolate,
            });
        }
    }
    list
}
