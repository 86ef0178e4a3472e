//! Sets to select from at assembly: `one of 0.10, 0.15, 0.20`.
//!
//! A set serves if every assembly that can occur has a member with which all requirements that
//! contain the set hold, at all their conditions. One assembly is told from another by how the first
//! of those quantities comes out at reference with the first member (`z`); every other quantity is
//! `z` plus something whose range is found with common unknowns cancelling. So each member serves an
//! interval of `z`, and the intervals must cover all `z` that occur. What is proven this way holds;
//! where the intervals do not cover, some assembly near the hole may still be served, so a hole is
//! `undecided` unless no member serves the extreme assembly itself.

use super::outcome::{Chosen, Evaluation, Outcome, Selection};
use super::scene::{At, Scene};
use super::{depends, quantity};
use crate::model::{Assembly, ConditionId, DimensionId, Requirement, SubjectId};
use crate::numeric::Recorded;
use crate::numeric::extremes::{Extremes, extremes};
use crate::numeric::tolerance::{EXTREME_GAP, LIMIT_SLACK};

/// Most combinations of members of several sets that one subject is computed for.
const MOST_CHOICES: usize = 64;

/// The sets that a subject contains.
pub(crate) fn sets(assembly: &Assembly, subject: SubjectId) -> Vec<DimensionId> {
    let contained = depends::dimensions(assembly, subject).into_iter();
    contained.filter(|&d| !assembly.dimension(d).members.is_empty()).collect()
}

/// Every choice of members that a subject is computed for; one empty choice where it has no sets.
pub(crate) fn choices(assembly: &Assembly, subject: SubjectId) -> Vec<Vec<Chosen>> {
    let mut list: Vec<Vec<Chosen>> = vec![Vec::new()];
    for dimension in sets(assembly, subject) {
        let count = assembly.dimension(dimension).members.len();
        if list.len() * count > MOST_CHOICES {
            break;
        }
        list = list
            .into_iter()
            .flat_map(|choice| {
                (0..count as u32).map(move |member| {
                    let mut longer = choice.clone();
                    longer.push(Chosen { dimension, member });
                    longer
                })
            })
            .collect();
    }
    list
}

/// Judges every set, and with it the verdicts of the requirements that contain it.
pub(crate) fn settle(assembly: &Assembly, evaluation: &mut Evaluation) {
    for index in 0..assembly.dimensions.len() {
        let dimension = DimensionId(index as u32);
        if assembly.dimension(dimension).members.is_empty() {
            continue;
        }
        let requirements: Vec<usize> = (0..assembly.requirements.len())
            .filter(|&r| sets(assembly, assembly.requirements[r].subject).contains(&dimension))
            .collect();
        if requirements.is_empty() {
            continue;
        }
        let blocked = evaluation
            .verdicts
            .iter()
            .any(|v| requirements.contains(&v.requirement) && v.figure.is_none());
        if blocked {
            continue;
        }
        if let Some(selection) = judge(assembly, dimension, &requirements) {
            let margin = margin(&selection);
            for verdict in &mut evaluation.verdicts {
                if requirements.contains(&verdict.requirement) {
                    verdict.outcome = selection.outcome;
                    verdict.margin = margin;
                    if selection.outcome == Outcome::Holds {
                        verdict.contributors.clear();
                    }
                }
            }
            evaluation.selections.push(selection);
        }
    }
}

fn judge(assembly: &Assembly, set: DimensionId, requirements: &[usize]) -> Option<Selection> {
    let base = &assembly.requirements[requirements[0]];
    let slack = LIMIT_SLACK * base.unit.difference_to_si(1.0);
    let gap = EXTREME_GAP * base.unit.difference_to_si(1.0);
    let z = |scene: &Scene<'_>| value(scene, base, At::Reference);
    let first = [Chosen { dimension: set, member: 0 }];
    let recorded = Scene::record(assembly, &first, &[], z).ok()?;
    let occurs = extremes(&recorded.tape, &recorded.ranges, gap);
    let mut covers = Vec::new();
    for member in 0..assembly.dimension(set).members.len() as u32 {
        let (mut from, mut to) = (f64::NEG_INFINITY, f64::INFINITY);
        for &index in requirements {
            let requirement = &assembly.requirements[index];
            for &condition in &requirement.conditions {
                let departs = departure(assembly, set, member, requirement, base, condition, gap)?;
                if let Some(lower) = &requirement.lower {
                    from = from.max(lower.value - departs.least.bound);
                }
                if let Some(upper) = &requirement.upper {
                    to = to.min(upper.value - departs.greatest.bound);
                }
            }
        }
        covers.push((from, to));
    }
    let (least, greatest) = (occurs.least.bound, occurs.greatest.bound);
    let outcome = if reach(&covers, least, slack) >= greatest - slack {
        Outcome::Holds
    } else {
        let serves = |z: f64| covers.iter().any(|&(a, b)| a <= z + slack && z <= b + slack);
        let hopeless = covers.iter().all(|(a, b)| a > b)
            || !serves(occurs.least.reached)
            || !serves(occurs.greatest.reached);
        if hopeless { Outcome::Fails } else { Outcome::Undecided }
    };
    Some(Selection {
        dimension: set,
        requirements: requirements.to_vec(),
        covers,
        occurs: (least, greatest),
        outcome,
    })
}

fn value(
    scene: &Scene<'_>,
    requirement: &Requirement,
    at: At,
) -> Result<Recorded, super::scene::Unable> {
    quantity::record(scene, at, requirement.subject, requirement.quantity, false)
}

/// How far a requirement's quantity with this member at a condition lies from `z`.
fn departure(
    assembly: &Assembly,
    set: DimensionId,
    member: u32,
    requirement: &Requirement,
    base: &Requirement,
    condition: ConditionId,
    gap: f64,
) -> Option<Extremes> {
    let chosen = [Chosen { dimension: set, member }];
    let recorded = Scene::record(assembly, &chosen, &[], |scene| {
        let here = value(scene, requirement, At::Condition(condition))?;
        let z = scene.with_members(&[Chosen { dimension: set, member: 0 }], |s| {
            value(s, base, At::Reference)
        })?;
        Ok(here - z)
    })
    .ok()?;
    Some(extremes(&recorded.tape, &recorded.ranges, gap))
}

/// How far the intervals reach from `start` without a hole.
fn reach(covers: &[(f64, f64)], start: f64, slack: f64) -> f64 {
    let mut sorted: Vec<(f64, f64)> = covers.iter().copied().filter(|(a, b)| a <= b).collect();
    sorted.sort_by(|a, b| a.0.total_cmp(&b.0));
    let mut reached = f64::NEG_INFINITY;
    let mut at = start;
    for (from, to) in sorted {
        if from <= at + slack && to > reached {
            reached = to;
            at = at.max(to);
        }
    }
    reached
}

/// The smallest distance by which the intervals overlap, or overrun the values that occur.
fn margin(selection: &Selection) -> f64 {
    let (least, greatest) = selection.occurs;
    let serving = || selection.covers.iter().copied().filter(|(a, b)| a <= b);
    // Members that serve nothing that occurs leave no hole either.
    let mut sorted: Vec<(f64, f64)> =
        serving().filter(|(a, b)| *b >= least && *a <= greatest).collect();
    sorted.sort_by(|a, b| a.0.total_cmp(&b.0));
    let Some(&(from, mut at)) = sorted.first() else {
        let away =
            serving().map(|(a, b)| (a - greatest).max(least - b)).fold(f64::INFINITY, f64::min);
        return least - greatest - if away.is_finite() { away } else { 0.0 };
    };
    let mut margin = least - from;
    for &(from, to) in &sorted[1..] {
        if at >= greatest {
            break;
        }
        margin = margin.min(at - from);
        at = at.max(to);
    }
    margin.min(at - greatest)
}
