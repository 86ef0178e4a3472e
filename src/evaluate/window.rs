//! The temperatures at which a requirement holds, as proven intervals.
//!
//! Where all parts of a subject share one temperature, that temperature is moved; else the
//! departures of all parts from the reference, at every time of a history, are scaled by one factor
//! λ. Tolerances are kept; a range is not a tolerance about its middle. The axis is bisected: a piece is settled when the requirement is proven to hold on all of it, or to
//! fail on all of it; slivers that are neither count as failing. Only temperatures within the data
//! of every material are looked at.

use super::outcome::{Chosen, Outcome, Verdict, Window};
use super::scene::{At, Response, Scene, Shift, Way};
use super::{data_range, depends, quantity, temperature};
use crate::model::{Assembly, ConditionId, Owner, Requirement, Thermal};
use crate::numeric::extremes::extremes_within;
use crate::numeric::tolerance::{EXTREME_GAP, WINDOW_SLACK, WINDOW_SLIVER};
use crate::numeric::{Interval, Recorded};

/// Farthest factor that is looked at where temperatures are scaled.
const MOST_SCALE: f64 = 10.0;
/// Most boxes the extremes of one piece may take: where that is too few, the piece is halved.
const MOST_BOXES: usize = 16;
/// Most pieces one window is made of.
const MOST_PIECES: usize = 800;
/// Temperatures that are looked at where a material's data are unbounded, K.
const WIDEST: (f64, f64) = (1.0, 2000.0);
/// Temperatures this near are one, K.
const SAME: f64 = 1e-9;

/// The window of a verdict; `None` where there is nothing to move.
pub(crate) fn window(assembly: &Assembly, verdict: &Verdict, members: &[Chosen]) -> Option<Window> {
    let condition = verdict.condition?;
    let requirement = &assembly.requirements[verdict.requirement];
    let axis = Axis::of(assembly, requirement, condition)?;
    let of_yield = requirement.of_yield();
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
    let ends = axis.endless;
    Some(Window {
        intervals: joined(search.held, axis.range, axis.start),
        looked_at: (
            if ends.0 { f64::NEG_INFINITY } else { from },
            if ends.1 { f64::INFINITY } else { to },
        ),
        scaled: axis.scaled,
        departures: axis.departures,
    })
}

/// What is moved, and how far it may go.
struct Axis {
    scaled: bool,
    range: (f64, f64),
    /// The ends that are not those of some material's data.
    endless: (bool, bool),
    start: f64,
    sliver: f64,
    departures: Vec<(Owner, f64)>,
}

/// A temperature with its tolerance, and what its material's data cover. K.
struct Felt {
    owner: Owner,
    nominal: Interval,
    tolerance: Interval,
    valid: Interval,
}

impl Felt {
    fn read(assembly: &Assembly, condition: ConditionId, owner: Owner) -> Self {
        let hull = |part: fn(temperature::Stated) -> Recorded| {
            data_range::hull(assembly, |scene| part(temperature::stated(scene, condition, owner)))
        };
        Felt {
            owner,
            nominal: hull(|t| t.nominal),
            tolerance: hull(|t| t.tolerance),
            valid: assembly.material_of(owner).map_or(Interval::ENTIRE, |m| m.valid()),
        }
    }
}

impl Axis {
    fn of(assembly: &Assembly, requirement: &Requirement, condition: ConditionId) -> Option<Self> {
        let felt: Vec<Felt> = depends::owners(assembly, requirement.subject)
            .into_iter()
            .map(|owner| Felt::read(assembly, condition, owner))
            .collect();
        let first = felt.first()?.nominal;
        let near = |a: f64, b: f64| (a - b).abs() < SAME;
        let alike = felt
            .iter()
            .all(|f| near(f.nominal.lo(), first.lo()) && near(f.nominal.hi(), first.hi()));
        match assembly.condition(condition).thermal {
            Thermal::Uniform(_) if alike => Axis::common(&felt, first.mid()),
            Thermal::Uniform(_) | Thermal::History(_) => Axis::scaled(assembly.reference, &felt),
        }
    }

    /// One temperature for all, as far as all have data.
    fn common(felt: &[Felt], start: f64) -> Option<Self> {
        let from = felt.iter().map(|f| f.valid.lo() - f.tolerance.lo()).fold(WIDEST.0, f64::max);
        let to = felt.iter().map(|f| f.valid.hi() - f.tolerance.hi()).fold(WIDEST.1, f64::min);
        // The spec's own temperature counts as within the data by a hair; see `data_range`.
        let from = if near_data(start, from) { from.min(start) } else { from };
        let to = if near_data(start, to) { to.max(start) } else { to };
        (from < to).then_some(Axis {
            scaled: false,
            range: (from, to),
            endless: (from == WIDEST.0, to == WIDEST.1),
            start,
            sliver: WINDOW_SLIVER,
            departures: Vec::new(),
        })
    }

    /// λ ≥ 0, as far as everyone stays within the data.
    fn scaled(reference: f64, felt: &[Felt]) -> Option<Self> {
        let mut most = MOST_SCALE;
        let mut widest: f64 = 0.0;
        for f in felt {
            let departs = (f.nominal.lo() - reference, f.nominal.hi() - reference);
            if departs.0 < 0.0 {
                let room = reference + f.tolerance.lo() - f.valid.lo();
                most = most.min((room / -departs.0).max(0.0));
            }
            if departs.1 > 0.0 {
                let room = f.valid.hi() - f.tolerance.hi() - reference;
                most = most.min((room / departs.1).max(0.0));
            }
            widest = widest.max(-departs.0).max(departs.1);
        }
        let one_temperature = |f: &Felt| (f.nominal.width() < SAME).then_some(f.nominal.mid());
        let departures =
            felt.iter().filter_map(|f| Some((f.owner, one_temperature(f)? - reference))).collect();
        if widest < SAME {
            return None;
        }
        if near_data(widest, most * widest) {
            most = most.max(1.0);
        }
        Some(Axis {
            scaled: true,
            range: (0.0, most),
            endless: (false, false),
            start: 1.0,
            sliver: WINDOW_SLIVER / widest,
            departures,
        })
    }
}

/// Whether a temperature of the spec lies so little beyond the end of data that it counts as within.
fn near_data(temperature: f64, end: f64) -> bool {
    (temperature - end).abs() <= data_range::SLACK
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
