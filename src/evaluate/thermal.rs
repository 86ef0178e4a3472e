//! What temperature alone does to the mean of a quantity, part by part.
//!
//! The shift from the reference temperature to the condition is shared out as the contributors of a
//! range are: each part's share is the integral of the derivative with respect to how far its own
//! temperature has gone, all going together from reference to the condition. Loads, moisture and
//! speed stay those of the condition.

use super::contributor::integrate;
use super::outcome::{Chosen, PartShift, Verdict};
use super::scene::{At, Scene, Shift, Way};
use super::{depends, quantity};
use crate::model::Assembly;

/// The shift of the mean that each part's temperature makes, largest first; nothing where the
/// quantity has no condition or no finite value.
pub(crate) fn shifts(assembly: &Assembly, verdict: &Verdict, members: &[Chosen]) -> Vec<PartShift> {
    let Some(condition) = verdict.condition else { return Vec::new() };
    let requirement = &assembly.requirements[verdict.requirement];
    let owners = depends::owners(assembly, requirement.subject);
    let recorded = Scene::record_shifted(
        assembly,
        members,
        &[],
        |recorder| {
            let each = owners.iter().map(|&owner| (owner, recorder.input())).collect();
            Some(Shift { condition, way: Way::Each(each) })
        },
        |scene| {
            let at = At::Condition(condition);
            let of_yield = requirement.of_yield();
            quantity::record(scene, at, requirement.subject, requirement.quantity, of_yield)
        },
    );
    let Ok(response) = recorded else { return Vec::new() };
    let ends = |t: f64| -> Vec<f64> {
        std::iter::repeat_n(t, owners.len()).chain(response.middle.iter().copied()).collect()
    };
    let (from, to) = (ends(0.0), ends(1.0));
    let shares = integrate(&response.tape, &from, &to);
    let mut list: Vec<PartShift> = owners
        .iter()
        .zip(shares)
        .map(|(&owner, shift)| PartShift { owner, shift })
        .filter(|s| s.shift != 0.0)
        .collect();
    if list.iter().any(|s| !s.shift.is_finite()) {
        return Vec::new();
    }
    list.sort_by(|a, b| b.shift.abs().total_cmp(&a.shift.abs()).then(a.owner.cmp(&b.owner)));
    list
}
