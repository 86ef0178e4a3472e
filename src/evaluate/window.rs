//! The temperatures at which a requirement holds, as proven intervals.
//!
//! Where all parts of a subject share one temperature, that temperature is moved; else the
//! departures of all parts from the reference are scaled by one factor λ. Tolerances are kept. The
//! axis is bisected: a piece is settled when the requirement is proven to hold on all of it, or to
//! fail on all of it; slivers that are neither count as failing. Only temperatures within the data
//! of every material are looked at.

use super::outcome::{Chosen, Outcome, Verdict, Window};
use super::scene::{At, Response, Scene, Shift, Way};
use super::{depends, quantity, temperature};
use crate::model::{Assembly, ConditionId, Owner, Requirement, Thermal};
use crate::numeric::Interval;
use crate::numeric::extremes::extremes_within;
use crate::numeric::tolerance::{EXTREME_GAP, WINDOW_SLACK, WINDOW_SLIVER};

/// Farthest factor that is looked at where temperatures are scaled.
const MOST_SCALE: f64 = 10.0;
/// Most boxes the extremes of one piece may take: where that is too few, the piece is halved.
const MOST_BOXES: usize = 16;
/// Most pieces one window is made of.
const MOST_PIECES: usize = 800;
/// Temperatures that are looked at where a material's data are unbounded, K.
const WIDEST: (f64, f64) = (1.0, 2000.0);

/// The window of a verdict; `None` where there is nothing to move.
pub(crate) fn window(assembly: &Assembly, verdict: &Verdict, members: &[Chosen]) -> Option<Window> {
    let condition = verdict.condition?;
    let requirement = &assembly.requirements[verdict.requirement];
    let axis = Axis::of(assembly, requirement, condition)?;
    let of_yield =
        [&requirement.lower, &requirement.upper].into_iter().flatten().any(|l| l.of_yield);
    let response = Scene::record_shifted(
        assembly,
        members,
        &[],
        |recorder| {
            let variable = recorder.input();
            let way = if axis.scaled { Way::Scaled(variable) } else { Way::Common(variable) };
            Some(Shift { condition, way })
        },
        |scene| {
            let at = At::Condition(condition);
            quantity::record(scene, at, requirement.subject, requirement.quantity, of_yield)
        },
    )
    .ok()?;
    let mut search = Search { requirement, response: &response, held: Vec::new(), pieces: 0 };
    // Splitting at the point of the spec itself keeps it off the slivers.
    let (from, to) = axis.range;
    let start = axis.start.clamp(from, to);
    search.look(from, start, axis.sliver);
    search.look(start, to, axis.sliver);
    Some(Window { intervals: joined(search.held, axis.range, axis.start), scaled: axis.scaled })
}

/// What is moved, and how far it may go.
struct Axis {
    scaled: bool,
    range: (f64, f64),
    start: f64,
    sliver: f64,
}

impl Axis {
    fn of(assembly: &Assembly, requirement: &Requirement, condition: ConditionId) -> Option<Self> {
        let state = assembly.condition(condition);
        if matches!(state.thermal, Thermal::History(_)) {
            // A history is not one temperature, nor one departure, that could be moved.
            return None;
        }
        let parts: Vec<_> = depends::parts(assembly, requirement.subject).into_iter().collect();
        let middles: Vec<f64> = parts
            .iter()
            .map(|&p| temperature::at_middle(assembly, condition, Owner::Part(p)))
            .collect();
        let first = *middles.first()?;
        let alike = middles.iter().all(|&t| (t - first).abs() < 1e-9)
            && matches!(state.thermal, Thermal::Uniform(_));
        let valid = |p: &crate::model::PartId| {
            let valid = assembly.part(*p).material.valid();
            (valid.lo().max(WIDEST.0), valid.hi().min(WIDEST.1))
        };
        if alike {
            let range = parts.iter().map(valid).fold(WIDEST, |(a, b), (c, d)| (a.max(c), b.min(d)));
            return (range.0 < range.1).then_some(Axis {
                scaled: false,
                range,
                start: first,
                sliver: WINDOW_SLIVER,
            });
        }
        // λ ≥ 0, as far as every part stays within its data.
        let mut most = MOST_SCALE;
        let mut widest: f64 = 0.0;
        for (part, middle) in parts.iter().zip(&middles) {
            let departure = middle - assembly.reference;
            let (low, high) = valid(part);
            let room =
                if departure > 0.0 { high - assembly.reference } else { assembly.reference - low };
            if departure != 0.0 {
                most = most.min((room / departure.abs()).max(0.0));
                widest = widest.max(departure.abs());
            }
        }
        (widest > 0.0).then_some(Axis {
            scaled: true,
            range: (0.0, most),
            start: 1.0,
            sliver: WINDOW_SLIVER / widest,
        })
    }
}

struct Search<'a> {
    requirement: &'a Requirement,
    response: &'a Response,
    held: Vec<(f64, f64)>,
    pieces: usize,
}

impl Search<'_> {
    fn look(&mut self, from: f64, to: f64, sliver: f64) {
        if from > to || self.pieces >= MOST_PIECES {
            return;
        }
        self.pieces += 1;
        match self.judge(Interval::new(from, to)) {
            Outcome::Holds => self.held.push((from, to)),
            Outcome::Fails => {}
            Outcome::Undecided if to - from <= sliver => {}
            Outcome::Undecided => {
                let middle = 0.5 * from + 0.5 * to;
                self.look(from, middle, sliver);
                self.look(middle, to, sliver);
            }
        }
    }

    /// Whether the requirement holds on the whole piece, fails on the whole piece, or neither.
    fn judge(&self, piece: Interval) -> Outcome {
        let unit = self.requirement.unit.difference_to_si(1.0);
        let slack = WINDOW_SLACK * unit;
        let limits = (self.requirement.lower.as_ref(), self.requirement.upper.as_ref());
        let with = |at: Interval| {
            std::iter::once(at).chain(self.response.ranges.iter().copied()).collect::<Vec<_>>()
        };
        // A coarse gap is enough: what matters is the sign of a margin, and pieces only shrink.
        let whole =
            extremes_within(&self.response.tape, &with(piece), EXTREME_GAP * unit, MOST_BOXES);
        let holds = limits.0.is_none_or(|l| whole.least.bound >= l.value - slack)
            && limits.1.is_none_or(|u| whole.greatest.bound <= u.value + slack);
        if holds {
            return Outcome::Holds;
        }
        // One assembly that breaks a limit at every temperature of the piece is enough.
        let breaks = |corner: &[f64], beyond: &dyn Fn(Interval) -> bool| {
            let mut box_: Vec<Interval> = corner.iter().map(|&x| Interval::point(x)).collect();
            box_[0] = piece;
            beyond(self.response.tape.value(&box_))
        };
        let fails = limits
            .0
            .is_some_and(|l| breaks(&whole.least.at, &|v| v.hi() < l.value - slack))
            || limits.1.is_some_and(|u| breaks(&whole.greatest.at, &|v| v.lo() > u.value + slack));
        if fails { Outcome::Fails } else { Outcome::Undecided }
    }
}

/// Joins neighbours, opens ends that only the data cut off, and puts the interval that holds the
/// start first.
fn joined(mut held: Vec<(f64, f64)>, range: (f64, f64), start: f64) -> Vec<(f64, f64)> {
    held.sort_by(|a, b| a.0.total_cmp(&b.0));
    let mut list: Vec<(f64, f64)> = Vec::new();
    for (from, to) in held {
        match list.last_mut() {
            Some(last) if last.1 == from => last.1 = to,
            _ => list.push((from, to)),
        }
    }
    for interval in &mut list {
        if interval.0 == range.0 {
            interval.0 = f64::NEG_INFINITY;
        }
        if interval.1 == range.1 {
            interval.1 = f64::INFINITY;
        }
    }
    let at = list.iter().position(|&(a, b)| a <= start && start <= b);
    if let Some(at) = at {
        let holding = list.remove(at);
        list.insert(0, holding);
    }
    list
}
