//! Every requirement at every condition, recorded once, with sizes left open as unknowns.

use super::ids;
use crate::evaluate::figure::{Asked, response, shown_unit};
use crate::evaluate::scene::Response;
use crate::evaluate::{data_range, depends, selection};
use crate::model::{Assembly, ConditionId, DimensionId, Method, Origin, Requirement, Unknown};
use crate::numeric::tolerance::EXTREME_GAP;
use std::collections::BTreeSet;

/// Deviation that a size left open is recorded with, m, so that it is an unknown at all; no tape
/// holds it.
const PLACE_HOLDER: f64 = 1e-6;

/// A requirement at a condition, on a tape.
#[derive(Debug, Clone)]
pub(super) struct Case {
    pub(super) requirement: usize,
    pub(super) condition: Option<ConditionId>,
    pub(super) response: Response,
    /// How far apart bound and value reached may stay, SI.
    pub(super) gap: f64,
}

/// All requirements, as far as tapes can tell.
pub(super) struct Cases {
    pub(super) taped: Vec<Case>,
    /// Requirements to be evaluated anew for each trial, by index, in rising order.
    anew: Vec<usize>,
    /// Requirements that cannot be computed.
    unable: BTreeSet<usize>,
}

/// What decides about some dimensions.
pub(super) struct Concern {
    pub(super) taped: Vec<Case>,
    pub(super) anew: Vec<usize>,
    pub(super) unable: Option<usize>,
}

impl Cases {
    pub(super) fn record(assembly: &Assembly) -> Cases {
        let mut widened = assembly.clone();
        for dimension in &mut widened.dimensions {
            if dimension.origin == Origin::Open {
                (dimension.lower, dimension.upper) = (-PLACE_HOLDER, PLACE_HOLDER);
            }
        }
        let temperatures = data_range::temperatures(assembly);
        let beyond = data_range::beyond(assembly, &temperatures);
        let mut cases = Cases { taped: Vec::new(), anew: Vec::new(), unable: BTreeSet::new() };
        for (index, requirement) in assembly.requirements.iter().enumerate() {
            if is_anew(assembly, requirement) {
                cases.anew.push(index);
                continue;
            }
            for condition in conditions(requirement) {
                let asked = asked(requirement, condition);
                let unit = shown_unit(assembly, asked.subject, asked.quantity, asked.of_yield);
                match response(&widened, &beyond, &asked) {
                    Ok(response) => cases.taped.push(Case {
                        requirement: index,
                        condition,
                        response,
                        gap: EXTREME_GAP * unit,
                    }),
                    Err(_) => {
                        cases.unable.insert(index);
                    }
                }
            }
        }
        cases
    }

    /// What decides about the dimensions `of`.
    pub(super) fn concern(&self, assembly: &Assembly, of: &BTreeSet<DimensionId>) -> Concern {
        let contains = |index: usize| {
            let subject = assembly.requirements[index].subject;
            !depends::dimensions(assembly, subject).is_disjoint(of)
        };
        let meets = |case: &&Case| {
            case.response.unknowns.iter().any(|u| size(*u).is_some_and(|d| of.contains(&d)))
        };
        let mut taped: Vec<Case> = self.taped.iter().filter(meets).cloned().collect();
        let mut anew: BTreeSet<usize> =
            self.anew.iter().copied().filter(|&r| contains(r)).collect();
        // A bonus at maximum material rests on the limits themselves, which a tape keeps.
        let bonus = |d: &DimensionId| {
            let of_bonus = assembly.dimension(*d).geometric.and_then(|g| g.bonus);
            of_bonus.is_some_and(|feature| of.contains(&feature))
        };
        let tied = |index: usize| {
            let subject = assembly.requirements[index].subject;
            depends::dimensions(assembly, subject).iter().any(bonus)
        };
        let (kept, rest) = taped.into_iter().partition(|case| !tied(case.requirement));
        taped = kept;
        anew.extend(Vec::from_iter(rest).iter().map(|case: &Case| case.requirement));
        with_whole_sets(assembly, &mut anew);
        let unable = self.unable.iter().copied().find(|&r| contains(r));
        Concern { taped, anew: anew.into_iter().collect(), unable }
    }
}

impl Concern {
    /// The requirements that decide, in the order of the spec.
    pub(super) fn requirements(&self) -> Vec<usize> {
        let taped = self.taped.iter().map(|case| case.requirement);
        let all: BTreeSet<usize> =
            taped.chain(self.anew.iter().copied()).chain(self.unable).collect();
        all.into_iter().collect()
    }
}

/// A set to select from is judged over all requirements that contain it.
fn with_whole_sets(assembly: &Assembly, anew: &mut BTreeSet<usize>) {
    let sets = |r: usize| selection::sets(assembly, assembly.requirements[r].subject);
    loop {
        let shared: BTreeSet<DimensionId> = anew.iter().flat_map(|&r| sets(r)).collect();
        let before = anew.len();
        anew.extend(
            (0..assembly.requirements.len())
                .filter(|&r| sets(r).iter().any(|set| shared.contains(set))),
        );
        if anew.len() == before {
            return;
        }
    }
}

/// True where the limits of sizes enter otherwise than as the ranges of a tape.
fn is_anew(assembly: &Assembly, requirement: &Requirement) -> bool {
    requirement.method != Method::WorstCase
        || !selection::sets(assembly, requirement.subject).is_empty()
}

/// Where a requirement has to hold.
pub(super) fn conditions(requirement: &Requirement) -> Vec<Option<ConditionId>> {
    if requirement.quantity.is_unconditional() {
        vec![None]
    } else {
        requirement.conditions.iter().map(|&c| Some(c)).collect()
    }
}

/// What a requirement asks for at a condition.
pub(super) fn asked(requirement: &Requirement, condition: Option<ConditionId>) -> Asked {
    let of_yield = requirement.of_yield();
    let Requirement { subject, quantity, .. } = *requirement;
    Asked { subject, quantity, condition, of_yield, members: Vec::new() }
}

/// The dimension whose size an unknown is.
pub(super) fn size(unknown: Unknown) -> Option<DimensionId> {
    match unknown {
        Unknown::Size { dimension, .. } => Some(dimension),
        _ => None,
    }
}

/// The dimensions of an assembly that are worth recording again when their limits change.
pub(super) fn varying(assembly: &Assembly) -> impl Iterator<Item = DimensionId> + '_ {
    ids(assembly).filter(|&d| {
        let dimension = assembly.dimension(d);
        let tied = dimension.geometric.is_some_and(|g| g.bonus.is_some());
        !dimension.is_exact() && dimension.members.is_empty() && !tied
    })
}
