//! How far each tolerance could grow, both limits outward, with every requirement still holding and
//! everything else as it is.

use super::cases::{Cases, varying};
use super::trial::Trial;
use super::{Slack, of_line};
use crate::evaluate::Options;
use crate::model::{Assembly, DimensionId};
use std::collections::BTreeSet;

/// Halvings of the way between what holds and what does not.
const HALVINGS: usize = 45;
/// Halvings where each trial is an evaluation of its own.
const FEW_HALVINGS: usize = 16;
/// Deviations grow to this share of the nominal at most; what is not noticed by then is free.
const MOST: f64 = 0.5;

/// The room of each of `sizes` that varies and that some requirement depends on.
pub(super) fn all(
    assembly: &Assembly,
    cases: &Cases,
    sizes: impl Iterator<Item = DimensionId>,
    options: &Options,
) -> Vec<Slack> {
    let varying: BTreeSet<DimensionId> = varying(assembly).collect();
    sizes
        .filter(|d| varying.contains(d))
        .filter_map(|dimension| {
            let concern = cases.concern(assembly, &of_line(assembly, dimension));
            if concern.requirements().is_empty() {
                return None;
            }
            if concern.unable.is_some() {
                let stopped_by = concern.unable;
                return Some(Slack { dimension, each_side: 0.0, stopped_by });
            }
            let mut trial = Trial::of(assembly, &concern, options);
            Some(one(assembly, &mut trial, dimension))
        })
        .collect()
}

fn one(assembly: &Assembly, trial: &mut Trial, dimension: DimensionId) -> Slack {
    let stated = assembly.dimension(dimension);
    let halvings = if trial.is_cheap() { HALVINGS } else { FEW_HALVINGS };
    let mut stops = |by: f64| {
        trial.set(dimension, stated.lower - by, stated.upper + by);
        trial.judge().err().map(|broken| broken.requirement)
    };
    let slack = |each_side, stopped_by| Slack { dimension, each_side, stopped_by };
    if let Some(already) = stops(0.0) {
        return slack(0.0, Some(already));
    }
    // A zone of zero nominal has no size of its own to measure by.
    let most = (MOST * stated.nominal.abs()).max(100.0 * (stated.upper - stated.lower));
    let Some(mut stopped_by) = stops(most) else { return slack(f64::INFINITY, None) };
    let (mut inside, mut outside) = (0.0, most);
    for _ in 0..halvings {
        let between = 0.5 * (inside + outside);
        match stops(between) {
            None => inside = between,
            Some(requirement) => (outside, stopped_by) = (between, requirement),
        }
    }
    slack(inside, Some(stopped_by))
}
