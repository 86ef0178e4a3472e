//! Shares from draws: one draw of the parts serves every requirement at every condition.
//!
//! Each random unknown has a stream of its own, keyed by its name, so that the digits are the same
//! on every machine, with any number of threads, and whatever else the spec says.

use super::Case;
use super::corners::Corners;
use crate::evaluate::Options;
use crate::evaluate::outcome::Statistics;
use crate::evaluate::scene::Response;
use crate::model::{Assembly, Unknown};
use crate::numeric::distribution::Distribution;
use crate::numeric::probability::clopper_pearson;
use crate::numeric::random::{Merge, Stream, monte_carlo};
use crate::numeric::tape::{Column, Scratch};
use std::collections::BTreeMap;

/// Confidence of the limits that are given with a drawn share.
const CONFIDENCE: f64 = 0.99;

/// What is looked at for each draw: one quantity at all corners of its scenarios.
pub(super) struct Check<'a> {
    response: &'a Response,
    corners: &'a Corners,
    lower: Option<f64>,
    upper: Option<f64>,
}

impl<'a> Check<'a> {
    pub(super) fn of(case: &'a Case<'a>) -> Self {
        Check {
            response: case.response,
            corners: &case.corners,
            lower: case.lower,
            upper: case.upper,
        }
    }
}

/// What was counted.
pub(super) struct Counts {
    pub(super) draws: u64,
    /// For each check.
    pub(super) single: Vec<u64>,
    /// Draws that break any.
    pub(super) any: u64,
}

#[derive(Debug, Clone, PartialEq)]
struct Sum {
    single: Vec<u64>,
    any: u64,
}

impl Merge for Sum {
    fn merge(&mut self, next: Self) {
        for (a, b) in self.single.iter_mut().zip(next.single) {
            *a += b;
        }
        self.any += next.any;
    }
}

/// One corner of one check: where each input comes from.
struct Plan<'a> {
    check: usize,
    response: &'a Response,
    inputs: Vec<Input>,
    lower: Option<f64>,
    upper: Option<f64>,
}

#[derive(Clone, Copy)]
enum Input {
    Fixed(f64),
    Drawn(usize),
}

/// Draws assemblies and counts those that break each check, and any.
pub(super) fn run(assembly: &Assembly, checks: &[Check<'_>], options: &Options) -> Counts {
    let mut drawn: BTreeMap<Unknown, (usize, Distribution)> = BTreeMap::new();
    let mut plans = Vec::new();
    for (index, check) in checks.iter().enumerate() {
        let sides = [
            (check.lower.is_some(), &check.corners.least),
            (check.upper.is_some(), &check.corners.greatest),
        ];
        let mut corners: Vec<&Vec<f64>> = Vec::new();
        for (_, side) in sides.into_iter().filter(|(limited, _)| *limited) {
            for corner in side {
                if !corners.contains(&corner) {
                    corners.push(corner);
                }
            }
        }
        for corner in corners {
            let mut inputs = Vec::with_capacity(corner.len());
            for (i, &unknown) in check.response.unknowns.iter().enumerate() {
                inputs.push(match &check.corners.chances[i] {
                    None => Input::Fixed(corner[i]),
                    Some(chance) => {
                        let next = drawn.len();
                        Input::Drawn(drawn.entry(unknown).or_insert((next, chance.clone())).0)
                    }
                });
            }
            plans.push(Plan {
                check: index,
                response: check.response,
                inputs,
                lower: check.lower,
                upper: check.upper,
            });
        }
    }
    let mut streams: Vec<Option<(Stream, Distribution)>> = vec![None; drawn.len()];
    for (unknown, (place, chance)) in drawn {
        let stream = Stream::new(options.seed, key(assembly, unknown).as_bytes());
        streams[place] = Some((stream, chance));
    }
    let streams: Vec<(Stream, Distribution)> = streams.into_iter().flatten().collect();
    let sum = monte_carlo(options.draws, |first, count| {
        block(&plans, &streams, checks.len(), first, count)
    });
    match sum {
        Some(sum) => Counts { draws: options.draws, single: sum.single, any: sum.any },
        None => Counts { draws: 0, single: vec![0; checks.len()], any: 0 },
    }
}

fn block(
    plans: &[Plan<'_>],
    streams: &[(Stream, Distribution)],
    checks: usize,
    first: u64,
    count: usize,
) -> Sum {
    let mut values = vec![0.0; count * streams.len()];
    for ((stream, chance), row) in streams.iter().zip(values.chunks_mut(count.max(1))) {
        chance.fill(*stream, first, row);
    }
    let mut failing = vec![false; checks * count];
    let mut scratch = Scratch::default();
    let mut inputs = Vec::new();
    for plan in plans {
        inputs.clear();
        inputs.extend(plan.inputs.iter().map(|input| match *input {
            Input::Fixed(x) => Column::Fixed(x),
            Input::Drawn(row) => Column::Drawn(&values[row * count..(row + 1) * count]),
        }));
        let row = &mut failing[plan.check * count..(plan.check + 1) * count];
        // What is not a number breaks every limit.
        let (lower, upper) =
            (plan.lower.unwrap_or(f64::NEG_INFINITY), plan.upper.unwrap_or(f64::INFINITY));
        let breaks = |x: f64| !(x >= lower && x <= upper);
        plan.response.tape.replay_columns(
            &inputs,
            count,
            &mut scratch,
            |_, at, result| match result {
                Column::Fixed(x) if breaks(x) => row.fill(true),
                Column::Fixed(_) => {}
                Column::Drawn(result) => {
                    for (failing, &x) in row[at..].iter_mut().zip(result) {
                        *failing |= breaks(x);
                    }
                }
            },
        );
    }
    let row = |check: usize| &failing[check * count..(check + 1) * count];
    let single = (0..checks).map(|c| row(c).iter().filter(|f| **f).count() as u64).collect();
    let any = (0..count).filter(|&k| (0..checks).any(|c| row(c)[k])).count() as u64;
    Sum { single, any }
}

/// The name that keys an unknown's stream: what it is, not where it stands in the spec.
fn key(assembly: &Assembly, unknown: Unknown) -> String {
    let lot = |l: crate::model::LotId| &assembly.lots[l.index()].name;
    match unknown {
        Unknown::Size { dimension, piece } => format!("size {} {piece}", assembly.path(dimension)),
        Unknown::Coating { dimension, piece } => {
            format!("coating {} {piece}", assembly.path(dimension))
        }
        Unknown::ExpansionScatter(l) => format!("expansion {}", lot(l)),
        Unknown::ModulusScatter(l) => format!("modulus {}", lot(l)),
        Unknown::SwellScatter(l) => format!("swelling {}", lot(l)),
        other => format!("{other:?}"),
    }
}

/// Puts a counted share in the place of a computed one.
pub(super) fn take(statistics: &mut Statistics, count: &u64, draws: u64) {
    let interval = clopper_pearson(*count, draws, CONFIDENCE);
    statistics.share_failing = *count as f64 / draws.max(1) as f64;
    statistics.share_interval = (interval.low, interval.high);
    statistics.draws = Some(draws);
}
