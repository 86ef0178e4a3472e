//! Where the scenarios are at their worst for a piece.
//!
//! A quantity that rises or falls with each scenario, whatever the pieces are, has one corner where
//! it is least for every piece and one where it is greatest. Where that is not proven the scenarios
//! are split, at the places where curves change, until it is; every corner of every part then counts.

use super::chance;
use crate::evaluate::scene::Response;
use crate::model::Assembly;
use crate::numeric::Interval;
use crate::numeric::distribution::Distribution;

/// Standard deviations up to which a random unknown is followed.
pub(super) const REACH: f64 = 6.0;
/// Most parts the scenarios are split into.
const MOST_PARTS: usize = 64;

/// The random unknowns and the corners of the scenarios.
pub(crate) struct Corners {
    /// For each unknown its distribution, or `None` for a scenario.
    pub(super) chances: Vec<Option<Distribution>>,
    /// Inputs with the scenarios where the quantity is least, random ones at their means.
    pub(super) least: Vec<Vec<f64>>,
    /// The same where it is greatest.
    pub(super) greatest: Vec<Vec<f64>>,
    /// True when no worse scenario exists than these.
    pub(super) proven: bool,
}

/// The range that is followed of a random unknown.
pub(super) fn reach(distribution: &Distribution) -> Interval {
    let (low, high) = distribution.support();
    let far = REACH * distribution.standard_deviation();
    Interval::new(low.max(distribution.mean() - far), high.min(distribution.mean() + far))
}

pub(super) fn find(assembly: &Assembly, response: &Response) -> Corners {
    let chances: Vec<Option<Distribution>> =
        response.unknowns.iter().map(|&u| chance::distribution(assembly, u)).collect();
    let whole: Vec<Interval> = chances
        .iter()
        .zip(&response.ranges)
        .map(|(chance, range)| chance.as_ref().map_or(*range, reach))
        .collect();
    let mut corners = Corners { chances, least: Vec::new(), greatest: Vec::new(), proven: true };
    let mut open = vec![whole];
    let mut parts = 1;
    while let Some(ranges) = open.pop() {
        let (_, slopes) = response.tape.gradient(&ranges);
        let unproven = (0..ranges.len())
            .filter(|&i| corners.chances[i].is_none() && !ranges[i].is_point())
            .filter(|&i| slopes[i].lo() < 0.0 && slopes[i].hi() > 0.0)
            .max_by(|&a, &b| {
                let cost = |i: usize| slopes[i].magnitude().min(f64::MAX) * ranges[i].width();
                cost(a).total_cmp(&cost(b))
            });
        match unproven {
            Some(i) if parts < MOST_PARTS => {
                let middle = ranges[i].mid();
                let at = response
                    .tape
                    .breakpoints(i)
                    .into_iter()
                    .filter(|&b| ranges[i].lo() < b && b < ranges[i].hi())
                    .min_by(|a, b| (a - middle).abs().total_cmp(&(b - middle).abs()))
                    .unwrap_or(middle);
                parts += 1;
                for half in [Interval::new(ranges[i].lo(), at), Interval::new(at, ranges[i].hi())] {
                    let mut part = ranges.clone();
                    part[i] = half;
                    open.push(part);
                }
            }
            _ => {
                corners.proven &= unproven.is_none();
                corners.add(&ranges, &slopes);
            }
        }
    }
    corners
}

impl Corners {
    fn add(&mut self, ranges: &[Interval], slopes: &[Interval]) {
        let corner = |rising: fn(Interval) -> f64, falling: fn(Interval) -> f64| {
            let at = |i: usize| match &self.chances[i] {
                Some(distribution) => distribution.mean(),
                None if slopes[i].mid() >= 0.0 => rising(ranges[i]),
                None => falling(ranges[i]),
            };
            (0..ranges.len()).map(at).collect::<Vec<f64>>()
        };
        let least = corner(Interval::lo, Interval::hi);
        let greatest = corner(Interval::hi, Interval::lo);
        if !self.least.contains(&least) {
            self.least.push(least);
        }
        if !self.greatest.contains(&greatest) {
            self.greatest.push(greatest);
        }
    }
}
