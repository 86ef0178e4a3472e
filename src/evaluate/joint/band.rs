//! How far friction along a joint may shift its pressure, and what that turns over.
//!
//! For joints of two rings whose friction is stated: what friction does along several rings one in
//! another is not known here.

use super::stack::Stack;
use super::{carried, value};
use crate::evaluate::figure;
use crate::evaluate::outcome::{
    BeyondData, Evaluation, FrictionBand, Outcome, Range, TurnedOver, Verdict,
};
use crate::evaluate::scene::{At, Response, Scene, Unable};
use crate::evaluate::verdict;
use crate::mechanics::joint as formulas;
use crate::model::{Assembly, Joint, Method, Quantity, SubjectId, Unknown};
use crate::numeric::extremes::extremes;
use crate::numeric::tolerance::EXTREME_GAP;
use crate::numeric::{Number, Recorded};

/// Where in the band.
#[derive(Debug, Clone, Copy)]
enum End {
    Least,
    Greatest,
}

/// The band of each joint at each condition, where there is one.
pub(crate) fn bands(assembly: &Assembly, beyond: &[BeyondData]) -> Vec<FrictionBand> {
    let mut list = Vec::new();
    for subject in assembly.subject_ids() {
        let Some(joint) = joint_with_friction(assembly, subject) else { continue };
        for condition in assembly.condition_ids() {
            let at = At::Condition(condition);
            let record = |wanted: End| {
                Scene::record(assembly, &[], beyond, |scene| {
                    banded(scene, at, (subject, joint), (Quantity::Pressure, false), wanted)
                })
            };
            let kappa = Scene::record(assembly, &[], beyond, |scene| {
                let stack = Stack::of(assembly, subject);
                coupling(scene, at, subject, joint, &stack)
            });
            let (Ok(kappa), Ok(low), Ok(high)) = (kappa, record(End::Least), record(End::Greatest))
            else {
                continue;
            };
            let gap =
                EXTREME_GAP * figure::shown_unit(assembly, subject, Quantity::Pressure, false);
            let coupling = extremes(&kappa.tape, &kappa.ranges, EXTREME_GAP).greatest.bound;
            let stuck = coupling >= 1.0 || coupling.is_nan();
            list.push(FrictionBand {
                subject,
                condition,
                coupling,
                least: extremes(&low.tape, &low.ranges, gap).least.bound,
                greatest: if stuck {
                    f64::INFINITY
                } else {
                    extremes(&high.tape, &high.ranges, gap).greatest.bound
                },
            });
        }
    }
    list
}

/// Requirements by worst case that hold and would not within the band.
pub(crate) fn turned_over(assembly: &Assembly, evaluation: &Evaluation) -> Vec<TurnedOver> {
    let one = |(index, judged): (usize, &Verdict)| {
        let requirement = &assembly.requirements[judged.requirement];
        let carried = matches!(
            requirement.quantity,
            Quantity::Pressure | Quantity::Torque | Quantity::AxialForce | Quantity::Stress(_)
        );
        if !carried || judged.outcome != Outcome::Holds || requirement.method != Method::WorstCase {
            return None;
        }
        let (subject, condition) = (requirement.subject, judged.condition?);
        let joint = joint_with_friction(assembly, subject)?;
        let band = evaluation
            .friction_bands
            .iter()
            .find(|b| b.subject == subject && b.condition == condition)?;
        let plain = &evaluation.figures[judged.figure?];
        let what = (requirement.quantity, plain.of_yield);
        let range = |wanted: End| -> Result<Range, Unable> {
            let at = At::Condition(condition);
            let response: Response =
                Scene::record(assembly, &plain.members, &evaluation.beyond_data, |scene| {
                    banded(scene, at, (subject, joint), what, wanted)
                })?;
            let unit = figure::shown_unit(assembly, subject, what.0, what.1);
            Ok(figure::range(&response, EXTREME_GAP * unit))
        };
        let (low, high) = (range(End::Least).ok()?, range(End::Greatest).ok()?);
        let mut hull = plain.range.clone();
        for range in [low, high] {
            if range.least.bound < hull.least.bound {
                hull.least = range.least;
            }
            if range.greatest.bound > hull.greatest.bound {
                hull.greatest = range.greatest;
            }
        }
        if band.greatest.is_infinite() {
            hull.greatest.bound = f64::INFINITY;
        }
        let again = verdict::judge(&hull, requirement);
        (again.outcome != Outcome::Holds).then_some(TurnedOver {
            verdict: index,
            governing: again.governing,
            least: hull.least.bound,
            greatest: hull.greatest.bound,
            coupling: band.coupling,
        })
    };
    evaluation.verdicts.iter().enumerate().filter_map(one).collect()
}

/// A joint of two rings whose friction is stated.
fn joint_with_friction(assembly: &Assembly, subject: SubjectId) -> Option<&Joint> {
    let joint = assembly.fit(subject)?.joint.as_ref().filter(|j| j.friction.is_some())?;
    Stack::of(assembly, subject).is_pair().then_some(joint)
}

/// A quantity of a joint at one end of the band.
fn banded(
    scene: &Scene<'_>,
    at: At,
    (subject, joint): (SubjectId, &Joint),
    what: (Quantity, bool),
    end: End,
) -> Result<Recorded, Unable> {
    let stack = Stack::of(scene.assembly, subject);
    let kappa = coupling(scene, at, subject, joint, &stack)?;
    let (least, greatest) = formulas::pressure_band(stack.pressure(scene, at, 0)?, kappa);
    let pressure = match end {
        End::Least => least,
        End::Greatest => greatest,
    };
    carried(scene, at, subject, joint, (&stack, Some(pressure)), what)
}

/// κ of a joint of two rings.
fn coupling(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    joint: &Joint,
    stack: &Stack,
) -> Result<Recorded, Unable> {
    let (shaft, hub) = (stack.ring(scene, at, 0)?, stack.ring(scene, at, 1)?);
    let friction = scene.unknown(Unknown::Friction(subject));
    let length = value(scene, at, &joint.length)?;
    let diameter = Recorded::exact(stack.contact_diameter(0));
    let compliance = formulas::compliance(&shaft, &hub);
    Ok(formulas::axial_coupling(&shaft, &hub, friction, diameter, length, compliance))
}
