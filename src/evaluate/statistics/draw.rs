//! Shares from draws: one draw of the parts serves every requirement at every condition.
//!
//! Each random unknown has a stream of its own, keyed by its name, so that the digits are the same
//! on every machine, with any number of threads, and whatever else the spec says.

use super::corners::Corners;
use super::key::key;
use super::{Case, Drawing};
use crate::evaluate::Options;
use crate::evaluate::outcome::{Drawn, Statistics};
use crate::evaluate::scene::Response;
use crate::model::{Assembly, Unknown};
use crate::numeric::distribution::Distribution;
use crate::numeric::probability::{ShareInterval, clopper_pearson};
use crate::numeric::random::{Merge, Moments, Stream, monte_carlo_of};
use crate::numeric::tape::{Column, Scratch};
use std::collections::BTreeMap;

/// Confidence of the limits that are given with a drawn share.
const CONFIDENCE: f64 = 0.99;
/// Where a width is asked for it is looked at after multiples of so many draws.
const STEP: u64 = 100_000;
/// How far, in standard deviations, mean or standard deviation of a line may be off at a kink.
const LINE_OFF: f64 = 0.02;

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
    /// For each corner that was drawn, what it is of and how it came out.
    corners: Vec<(Of, Moments)>,
}

/// A corner of a check.
#[derive(Clone, Copy)]
struct Of {
    check: usize,
    /// Whether the scenarios there make the quantity least, greatest.
    least: bool,
    greatest: bool,
}

impl Counts {
    /// Width of the widest confidence interval of a single check.
    pub(super) fn widest(&self) -> f64 {
        let width = |&count: &u64| {
            let interval = confidence(count, self.draws);
            interval.high - interval.low
        };
        self.single.iter().map(width).fold(0.0, f64::max)
    }

    /// Mean and standard deviation of a check where the scenarios make it least, and greatest.
    fn ends(&self, check: usize) -> Option<((f64, f64), (f64, f64))> {
        let end = |wanted: fn(&Of) -> bool, sigmas: f64| {
            let of_it = self.corners.iter().filter(|(of, _)| of.check == check);
            let reached = |m: &Moments| sigmas * (m.mean() + sigmas * libm::sqrt(m.variance()));
            of_it
                .map(|(of, m)| (!wanted(of), -reached(m), (m.mean(), libm::sqrt(m.variance()))))
                .min_by(|a, b| a.0.cmp(&b.0).then(a.1.total_cmp(&b.1)))
                .map(|(_, _, moments)| moments)
        };
        Some((end(|of| of.least, -3.0)?, end(|of| of.greatest, 3.0)?))
    }
}

#[derive(Debug, Clone, PartialEq)]
struct Sum {
    single: Vec<u64>,
    any: u64,
    corners: Vec<Moments>,
}

impl Merge for Sum {
    fn merge(&mut self, next: Self) {
        for (a, b) in self.single.iter_mut().zip(next.single) {
            *a += b;
        }
        self.any += next.any;
        for (a, b) in self.corners.iter_mut().zip(next.corners) {
            a.merge(b);
        }
    }
}

/// One corner of one check: where each input comes from.
struct Plan<'a> {
    of: Of,
    response: &'a Response,
    inputs: Vec<Input>,
    lower: Option<f64>,
    upper: Option<f64>,
    /// Whether its mean and deviation are asked for, as no line may tell them.
    sides: bool,
}

#[derive(Clone, Copy)]
enum Input {
    Fixed(f64),
    Drawn(usize),
}

/// Draws assemblies and counts those that break each check, and any.
///
/// Where a width is asked for, draws go on until `width` of what was counted is no greater, or the
/// most draws are made. When to look depends on what was counted alone, so that the digits are the
/// same on any number of threads.
pub(super) fn run(
    assembly: &Assembly,
    checks: &[Check<'_>],
    drawing: Drawing<'_>,
    width: impl Fn(&Counts) -> f64,
) -> Counts {
    let Drawing { options, tally } = drawing;
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
            let of = Of {
                check: index,
                least: check.corners.least.contains(corner),
                greatest: check.corners.greatest.contains(corner),
            };
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
                of,
                response: check.response,
                inputs,
                lower: check.lower,
                upper: check.upper,
                sides: check.response.tape.has_sides(),
            });
        }
    }
    let mut streams: Vec<Option<(Stream, Distribution)>> = vec![None; drawn.len()];
    for (unknown, (place, chance)) in drawn {
        let stream = Stream::new(options.seed, key(assembly, unknown).as_bytes());
        streams[place] = Some((stream, chance));
    }
    let streams: Vec<(Stream, Distribution)> = streams.into_iter().flatten().collect();
    let corners = plans.iter().map(|plan| (plan.of, Moments::default())).collect();
    let mut counts = Counts { draws: 0, single: vec![0; checks.len()], any: 0, corners };
    let mut end = match options.to_width {
        Some(_) => STEP.min(options.draws),
        None => options.draws,
    };
    while counts.draws < end {
        tally.want(end - counts.draws);
        let sum = monte_carlo_of(counts.draws..end, |first, count| {
            let sum = block(&plans, &streams, checks.len(), first, count);
            tally.count(count as u64);
            sum
        });
        if let Some(sum) = sum {
            counts.single.iter_mut().zip(sum.single).for_each(|(a, b)| *a += b);
            counts.any += sum.any;
            counts.corners.iter_mut().zip(sum.corners).for_each(|((_, a), b)| a.merge(b));
        }
        counts.draws = end;
        if let Some(wanted) = options.to_width {
            end = next_look(end, width(&counts), wanted).min(options.draws);
        }
    }
    counts
}

/// The number of draws at which to look again, `draws` where the width is reached: what the width so
/// far lets expect, as widths shrink with the square root of the draws, but at most twice as many.
fn next_look(draws: u64, width: f64, wanted: f64) -> u64 {
    if width <= wanted {
        return draws;
    }
    let ratio = (1.05 * (width / wanted) * (width / wanted)).clamp(1.1, 2.0);
    let next = (draws as f64 * ratio) as u64;
    next.div_ceil(STEP) * STEP
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
    let mut corners = Vec::with_capacity(plans.len());
    for plan in plans {
        let mut moments = Moments::default();
        inputs.clear();
        inputs.extend(plan.inputs.iter().map(|input| match *input {
            Input::Fixed(x) => Column::Fixed(x),
            Input::Drawn(row) => Column::Drawn(&values[row * count..(row + 1) * count]),
        }));
        let row = &mut failing[plan.of.check * count..(plan.of.check + 1) * count];
        // What is not a number breaks every limit.
        let (lower, upper) =
            (plan.lower.unwrap_or(f64::NEG_INFINITY), plan.upper.unwrap_or(f64::INFINITY));
        let breaks = |x: f64| !(x >= lower && x <= upper);
        plan.response.tape.replay_columns(
            &inputs,
            count,
            &mut scratch,
            |_, at, result| match result {
                Column::Fixed(x) => {
                    if plan.sides {
                        moments.merge(Moments::of(&[x]));
                    }
                    if breaks(x) {
                        row.fill(true);
                    }
                }
                Column::Drawn(result) => {
                    if plan.sides {
                        moments.merge(Moments::of(result));
                    }
                    for (failing, &x) in row[at..].iter_mut().zip(result) {
                        *failing |= breaks(x);
                    }
                }
            },
        );
        corners.push(moments);
    }
    let row = |check: usize| &failing[check * count..(check + 1) * count];
    let single = (0..checks).map(|c| row(c).iter().filter(|f| **f).count() as u64).collect();
    let any = (0..count).filter(|&k| (0..checks).any(|c| row(c)[k])).count() as u64;
    Sum { single, any, corners }
}

/// What a share of which `count` in `draws` were seen lies between.
pub(super) fn confidence(count: u64, draws: u64) -> ShareInterval {
    clopper_pearson(count, draws, CONFIDENCE)
}

/// How a share was drawn that lies between `least` and `most`.
pub(super) fn drawn(draws: u64, (least, most): (f64, f64), options: &Options) -> Drawn {
    let missed = options.to_width.filter(|&width| most - least > width);
    Drawn { draws, seed: options.seed, missed }
}

/// Puts what was counted of a check in the place of what was computed.
pub(super) fn take(
    statistics: &mut Statistics,
    counts: &Counts,
    check: usize,
    limits: (Option<f64>, Option<f64>),
    options: &Options,
) {
    let (count, draws) = (counts.single[check], counts.draws);
    let interval = confidence(count, draws);
    statistics.share_failing = count as f64 / draws.max(1) as f64;
    statistics.share_interval = (interval.low, interval.high);
    statistics.drawn = Some(drawn(draws, statistics.share_interval, options));
    let Some((low, high)) = counts.ends(check).filter(|_| statistics.kinked) else { return };
    let noise = 4.0 / libm::sqrt(draws as f64);
    let apart = |drawn: (f64, f64), line: (f64, f64)| {
        let most = (LINE_OFF + noise) * drawn.1;
        (drawn.0 - line.0).abs() > most || (drawn.1 - line.1).abs() > most
    };
    if !apart(low, statistics.low) && !apart(high, statistics.high) {
        return;
    }
    (statistics.low, statistics.high) = (low, high);
    statistics.cpk = super::linear::cpk(low, high, limits.0, limits.1);
    let room = |side: Option<f64>, (mean, sigma): (f64, f64)| {
        side.map_or(f64::INFINITY, |limit| (limit - mean).abs() / sigma)
    };
    let shown = if room(limits.0, low) <= room(limits.1, high) { low } else { high };
    (statistics.mean, statistics.sigma) = shown;
    statistics.second_order = shown;
    // What the line says each brings is not what it brings here.
    statistics.variance_shares.clear();
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_width_is_looked_at_again_where_it_may_be_reached() {
        assert_eq!(next_look(10 * STEP, 0.01, 0.01), 10 * STEP);
        // Far off: twice as many; near: as many as expected; never no step at all.
        assert_eq!(next_look(10 * STEP, 0.05, 0.01), 20 * STEP);
        assert_eq!(next_look(10 * STEP, 0.012, 0.01), 16 * STEP);
        assert_eq!(next_look(10 * STEP, 0.010_001, 0.01), 11 * STEP);
    }
}
