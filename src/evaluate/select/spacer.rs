//! The length of a spacer with which a quantity's mean is the same at two conditions.

use super::of_line;
use crate::evaluate::quantity;
use crate::evaluate::scene::{At, Response, Scene, Unable};
use crate::model::{Assembly, ConditionId, DimensionId, Quantity, SubjectId, SubjectKind, Unknown};
use crate::numeric::root::{Crossing, first_reached};
use crate::numeric::{Interval, Tape};

/// Lengths are looked for up to this many times the present one.
const LONGEST: f64 = 100.0;
/// How near the length is found, m.
const FOUND: f64 = 1e-10;
/// Deviation that an exact length is recorded with, m, so that it is an unknown at all; the tape
/// does not hold it.
const PLACE_HOLDER: f64 = 1e-6;

/// A spacer that makes a mean the same at two conditions.
#[derive(Debug, Clone, PartialEq)]
pub struct Spacer {
    /// The spacer.
    pub dimension: DimensionId,
    /// Of what.
    pub subject: SubjectId,
    /// Between which conditions.
    pub between: (ConditionId, ConditionId),
    /// The nominal length, m.
    pub nominal: f64,
    /// What the mean is with it, at both conditions, SI.
    pub mean: f64,
    /// The means with the present length.
    pub means_now: (f64, f64),
}

/// Why there is no such length.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum NoSpacer {
    /// The subject has no quantity that is a length or value of its own.
    NoQuantity,
    /// A quantity cannot be computed.
    NotComputed,
    /// The length has no say in the difference between the two conditions.
    NoInfluence,
    /// No length up to a hundred times the present one does it; the difference (first condition less
    /// second, SI) at the present length.
    NoLength(f64),
    /// Neither could be proven.
    Undecided,
}

/// Finds the nominal length of `dimension` with which the mean of `subject` is the same at two
/// conditions, everything in the middle of its limits, the spacer's tolerance kept. Found to
/// 1e-10 m.
///
/// # Errors
/// Says why there is none.
pub fn spacer(
    assembly: &Assembly,
    dimension: DimensionId,
    subject: SubjectId,
    between: (ConditionId, ConditionId),
) -> Result<Spacer, NoSpacer> {
    let quantity = match &assembly.subject(subject).kind {
        SubjectKind::Gap(_) => Quantity::Gap,
        SubjectKind::Result(_) => Quantity::Value,
        SubjectKind::Fit(_) => Quantity::Clearance,
        SubjectKind::Restraint(_) | SubjectKind::Fill(_) => return Err(NoSpacer::NoQuantity),
    };
    let line = of_line(assembly, dimension);
    let mut widened = assembly.clone();
    for d in &line {
        let spacer = &mut widened.dimensions[d.index()];
        if spacer.is_exact() {
            (spacer.lower, spacer.upper) =
                (spacer.lower - PLACE_HOLDER, spacer.upper + PLACE_HOLDER);
        }
    }
    let at = |scene: &Scene<'_>, condition| {
        quantity::record(scene, At::Condition(condition), subject, quantity, false)
    };
    let record = |of: &dyn Fn(&Scene<'_>) -> Result<_, Unable>| {
        Scene::record(&widened, &[], &[], of).map_err(|_| NoSpacer::NotComputed)
    };
    let here = record(&|scene| at(scene, between.0))?;
    let there = record(&|scene| at(scene, between.1))?;
    let apart = record(&|scene| Ok(at(scene, between.0)? - at(scene, between.1)?))?;
    let of_spacer = |unknown: &Unknown| match unknown {
        Unknown::Size { dimension, .. } => line.contains(dimension),
        _ => false,
    };
    let difference = OfLength::new(&apart, &of_spacer);
    let stated = assembly.dimension(dimension);
    let now = stated.mean();
    if difference.inputs.is_empty() {
        return Err(NoSpacer::NoInfluence);
    }
    let present = difference.at(now);
    let none = match difference.slope(now) {
        0.0 => NoSpacer::NoInfluence,
        _ => NoSpacer::NoLength(present),
    };
    // From no length at all, upward; turned so that the difference begins below zero.
    let turn = if difference.at(0.0) <= 0.0 { 1.0 } else { -1.0 };
    let f = |x: Interval| difference.over(x) * turn;
    match first_reached(f, 0.0, LONGEST * now, FOUND) {
        Crossing::Reached { at, .. } if at > 0.0 => Ok(Spacer {
            dimension,
            subject,
            between,
            nominal: at - (now - stated.nominal),
            mean: OfLength::new(&here, &of_spacer).at(at),
            means_now: (
                OfLength::new(&here, &of_spacer).at(now),
                OfLength::new(&there, &of_spacer).at(now),
            ),
        }),
        Crossing::Undecided { .. } => Err(NoSpacer::Undecided),
        Crossing::Reached { .. } | Crossing::Never => Err(none),
    }
}

/// A recorded quantity with everything but one length in the middle of its limits.
struct OfLength<'a> {
    tape: &'a Tape,
    middle: &'a [f64],
    inputs: Vec<usize>,
}

impl<'a> OfLength<'a> {
    fn new(response: &'a Response, is_length: &dyn Fn(&Unknown) -> bool) -> Self {
        let inputs =
            (0..response.unknowns.len()).filter(|&i| is_length(&response.unknowns[i])).collect();
        OfLength { tape: &response.tape, middle: &response.middle, inputs }
    }

    fn at(&self, length: f64) -> f64 {
        let mut inputs = self.middle.to_vec();
        self.inputs.iter().for_each(|&i| inputs[i] = length);
        self.tape.value(&inputs)
    }

    fn slope(&self, length: f64) -> f64 {
        let mut inputs = self.middle.to_vec();
        self.inputs.iter().for_each(|&i| inputs[i] = length);
        let (_, slopes) = self.tape.gradient(&inputs);
        self.inputs.iter().map(|&i| slopes[i]).sum()
    }

    /// Encloses it over lengths by its mean value form: the length stands in it once a condition,
    /// and what the two have in common must cancel.
    fn over(&self, lengths: Interval) -> Interval {
        let with = |x: Interval| {
            let mut inputs: Vec<Interval> =
                self.middle.iter().map(|&m| Interval::point(m)).collect();
            self.inputs.iter().for_each(|&i| inputs[i] = x);
            inputs
        };
        let middle = Interval::point(lengths.mid());
        let value = self.tape.value(&with(middle));
        if lengths.is_point() {
            return value;
        }
        let (_, slopes) = self.tape.gradient(&with(lengths));
        let slope = self.inputs.iter().fold(Interval::point(0.0), |sum, &i| sum + slopes[i]);
        value + slope * (lengths - middle)
    }
}
