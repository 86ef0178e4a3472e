//! An assembly with other limits on some of its sizes, judged.

use super::cases::{Case, Concern, size};
use super::{Governing, of_line};
use crate::evaluate::figure;
use crate::evaluate::outcome::Outcome;
use crate::evaluate::{Options, ranges, selection, verdict, verdicts};
use crate::model::{Assembly, ConditionId, DimensionId, Method, Requirement};

/// A trial of sizes: limits can be set and judged again and again.
pub(super) struct Trial {
    assembly: Assembly,
    taped: Vec<Case>,
    /// The requirements that are evaluated anew, alone, with their indices in the whole; those
    /// that ask for statistics last and by themselves, so that no other is drawn for.
    anew: Vec<(Assembly, Vec<usize>)>,
    /// What margins are divided by to be compared, for each requirement.
    scales: Vec<f64>,
    options: Options,
}

impl Trial {
    pub(super) fn of(assembly: &Assembly, concern: &Concern, options: &Options) -> Trial {
        let drawn = |r: &usize| {
            let requirement = &assembly.requirements[*r];
            requirement.method != Method::WorstCase
                && selection::sets(assembly, requirement.subject).is_empty()
        };
        let (last, first): (Vec<usize>, Vec<usize>) = concern.anew.iter().partition(|r| drawn(r));
        let alone = |requirements: Vec<usize>| {
            let mut alone = assembly.clone();
            alone.requirements =
                requirements.iter().map(|&r| assembly.requirements[r].clone()).collect();
            (alone, requirements)
        };
        let groups = [first, last].into_iter().filter(|group| !group.is_empty());
        let anew = groups.map(alone).collect();
        Trial {
            assembly: assembly.clone(),
            taped: concern.taped.clone(),
            anew,
            scales: scales(assembly, &concern.requirements()),
            options: *options,
        }
    }

    /// True where every requirement is on a tape, so that trials cost next to nothing.
    pub(super) fn is_cheap(&self) -> bool {
        self.anew.is_empty()
    }

    /// Gives all dimensions of a line these deviations.
    pub(super) fn set(&mut self, dimension: DimensionId, lower: f64, upper: f64) {
        for d in of_line(&self.assembly, dimension) {
            let anew = self.anew.iter_mut().map(|(alone, _)| alone);
            for assembly in std::iter::once(&mut self.assembly).chain(anew) {
                let changed = &mut assembly.dimensions[d.index()];
                (changed.lower, changed.upper) = (lower, upper);
            }
            for case in &mut self.taped {
                let Case { response, .. } = case;
                for (unknown, range) in response.unknowns.iter().zip(&mut response.ranges) {
                    if size(*unknown) == Some(d) {
                        *range = ranges::range(&self.assembly, *unknown);
                    }
                }
            }
        }
    }

    /// What is nearest to its limit, where every requirement holds; else the first that does not.
    pub(super) fn judge(&mut self) -> Result<Governing, Governing> {
        let mut least: Option<Governing> = None;
        for at in 0..self.taped.len() {
            let (holds, governing) = self.taped_case(at);
            if !holds {
                // What failed once is likely to fail again: it is asked first.
                self.taped[..=at].rotate_right(1);
                return Err(governing);
            }
            least = nearer(least, governing);
        }
        for (alone, indices) in &self.anew {
            for verdict in verdicts(alone, &self.options).verdicts {
                let governing =
                    self.governing(indices[verdict.requirement], verdict.condition, verdict.margin);
                if verdict.outcome != Outcome::Holds {
                    return Err(governing);
                }
                least = nearer(least, governing);
            }
        }
        // A trial that nothing decides about holds with all the room there is.
        Ok(least.unwrap_or_else(|| self.governing(0, None, f64::INFINITY)))
    }

    /// The least margin of what is on tapes, as margins are compared, whether it holds or not.
    pub(super) fn taped_margin(&self) -> f64 {
        let each = (0..self.taped.len()).map(|at| self.taped_case(at).1.compared);
        each.fold(f64::INFINITY, f64::min)
    }

    fn taped_case(&self, at: usize) -> (bool, Governing) {
        let case = &self.taped[at];
        let requirement = &self.assembly.requirements[case.requirement];
        let judged = verdict::judge(&figure::range(&case.response, case.gap), requirement);
        let governing = self.governing(case.requirement, case.condition, judged.margin);
        (judged.outcome == Outcome::Holds, governing)
    }

    fn governing(
        &self,
        requirement: usize,
        condition: Option<ConditionId>,
        margin: f64,
    ) -> Governing {
        let scale = self.scales.get(requirement).copied().unwrap_or(1.0);
        Governing { requirement, condition, margin, compared: margin / scale }
    }
}

/// The one with less room; of equals the first in the spec.
fn nearer(least: Option<Governing>, other: Governing) -> Option<Governing> {
    let key = |g: &Governing| (g.requirement, g.condition);
    match least {
        Some(least)
            if least
                .compared
                .total_cmp(&other.compared)
                .then(key(&least).cmp(&key(&other)))
                .is_le() =>
        {
            Some(least)
        }
        _ => Some(other),
    }
}

/// What the margins of each requirement are divided by: nothing where all that decide are of one
/// kind of quantity, else what is allowed.
fn scales(assembly: &Assembly, deciding: &[usize]) -> Vec<f64> {
    let kind = |r: usize| assembly.requirements[r].unit.kind;
    let alike = deciding.windows(2).all(|pair| kind(pair[0]) == kind(pair[1]));
    let of = |requirement: &Requirement| if alike { 1.0 } else { allowed(requirement) };
    assembly.requirements.iter().map(of).collect()
}

/// What a requirement allows: the width between two limits, else the size of the one, else a unit.
fn allowed(requirement: &Requirement) -> f64 {
    let lower = requirement.lower.as_ref().map(|l| l.value);
    let upper = requirement.upper.as_ref().map(|l| l.value);
    match (lower, upper) {
        (Some(lower), Some(upper)) if upper > lower => upper - lower,
        (Some(limit), _) | (_, Some(limit)) if limit != 0.0 => limit.abs(),
        _ => requirement.unit.difference_to_si(1.0),
    }
}
