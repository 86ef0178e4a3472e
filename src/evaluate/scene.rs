//! One recording of a quantity: which unknowns it meets, and its tape over them.
//!
//! A scene hands out the same recorded variable whenever the same [`Unknown`] is asked for; that is
//! what makes common causes cancel. What is known exactly never becomes a variable.

use super::outcome::{BeyondData, Chosen, Property};
use super::ranges;
use crate::model::{Assembly, ConditionId, DimensionId, Owner, PartId, SubjectId, Unknown};
use crate::numeric::tape::Recorder;
use crate::numeric::{Interval, Number, Recorded, Tape};
use std::cell::RefCell;

/// In which state of the world a quantity is taken.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum At {
    /// As drawn: every part at the reference temperature, dry as delivered, unloaded.
    Reference,
    /// A condition of the spec.
    Condition(ConditionId),
}

/// A quantity that has been recorded.
#[derive(Debug, Clone)]
pub struct Response {
    /// How it is computed from the unknowns.
    pub tape: Tape,
    /// Its unknowns, in the order of the tape's inputs.
    pub unknowns: Vec<Unknown>,
    /// Their ranges.
    pub ranges: Vec<Interval>,
    /// The middle of each.
    pub middle: Vec<f64>,
}

impl Response {
    /// A quantity without unknowns.
    pub(crate) fn constant(value: f64) -> Self {
        let tape = Recorder::new().finish(&[Recorded::exact(value)]);
        Response { tape, unknowns: Vec::new(), ranges: Vec::new(), middle: Vec::new() }
    }
}

/// Why a quantity cannot be computed.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Unable {
    /// A material does not say what is needed.
    Missing(PartId, Property),
    /// A part is outside its material's data, which does not allow to extrapolate.
    BeyondData,
}

/// How the temperatures of one condition are moved away from what the spec states, tolerances kept.
#[derive(Debug, Clone)]
pub(crate) struct Shift {
    /// Which condition; every other one stays as it is.
    pub(crate) condition: ConditionId,
    /// How.
    pub(crate) way: Way,
}

/// The ways to move temperatures.
#[derive(Debug, Clone)]
pub(crate) enum Way {
    /// Every part to this temperature, K.
    Common(Recorded),
    /// Every departure from the reference temperature by this factor.
    Scaled(Recorded),
    /// The departure of each by a factor of its own; of anyone else by 1.
    Each(Vec<(Owner, Recorded)>),
}

/// A recording under way.
pub(crate) struct Scene<'a> {
    pub(crate) assembly: &'a Assembly,
    members: RefCell<Vec<Chosen>>,
    beyond: &'a [BeyondData],
    shift: Option<Shift>,
    recorder: Recorder,
    met: RefCell<Vec<(Unknown, Recorded)>>,
}

impl<'a> Scene<'a> {
    /// Records what `quantity` computes, with these members of `one of` sets (the first of any set
    /// not named); a part that `beyond` says has left its data stops it.
    pub(crate) fn record(
        assembly: &'a Assembly,
        members: &[Chosen],
        beyond: &'a [BeyondData],
        quantity: impl FnOnce(&Scene<'a>) -> Result<Recorded, Unable>,
    ) -> Result<Response, Unable> {
        Scene::record_shifted(assembly, members, beyond, |_| None, quantity)
    }

    /// Records as [`Scene::record`] does, with temperatures moved by a variable that becomes the
    /// first input of the tape (and stands in no list of unknowns).
    pub(crate) fn record_shifted(
        assembly: &'a Assembly,
        members: &[Chosen],
        beyond: &'a [BeyondData],
        shift: impl FnOnce(&Recorder) -> Option<Shift>,
        quantity: impl FnOnce(&Scene<'a>) -> Result<Recorded, Unable>,
    ) -> Result<Response, Unable> {
        let recorder = Recorder::new();
        let shift = shift(&recorder);
        let scene = Scene {
            assembly,
            members: RefCell::new(members.to_vec()),
            beyond,
            shift,
            recorder,
            met: RefCell::default(),
        };
        let result = quantity(&scene)?;
        let unknowns: Vec<Unknown> = scene.met.take().into_iter().map(|(u, _)| u).collect();
        let ranges: Vec<Interval> = unknowns.iter().map(|&u| ranges::range(assembly, u)).collect();
        let middle = unknowns.iter().map(|&u| ranges::middle(assembly, u)).collect();
        let tape = scene.recorder.finish(&[result]);
        Ok(Response { tape, unknowns, ranges, middle })
    }

    /// The variable of an unknown, or its value where it has only one.
    pub(crate) fn unknown(&self, unknown: Unknown) -> Recorded {
        let range = ranges::range(self.assembly, unknown);
        if range.is_point() {
            return Recorded::exact(range.lo());
        }
        let mut met = self.met.borrow_mut();
        if let Some((_, variable)) = met.iter().find(|(u, _)| *u == unknown) {
            return variable.clone();
        }
        let variable = self.recorder.input();
        met.push((unknown, variable.clone()));
        variable
    }

    /// How the temperatures of a condition are moved, if they are.
    pub(crate) fn shift(&self, condition: ConditionId) -> Option<&Way> {
        self.shift.as_ref().filter(|s| s.condition == condition).map(|s| &s.way)
    }

    /// The member chosen from a `one of` set.
    pub(crate) fn member(&self, dimension: DimensionId) -> usize {
        let members = self.members.borrow();
        members.iter().find(|c| c.dimension == dimension).map_or(0, |c| c.member as usize)
    }

    /// Records something with other members chosen, on the same sheet.
    pub(crate) fn with_members<T>(&self, members: &[Chosen], record: impl FnOnce(&Self) -> T) -> T {
        let before = self.members.replace(members.to_vec());
        let result = record(self);
        self.members.replace(before);
        result
    }

    /// Fails where a part's temperature lies beyond data that may not be extrapolated.
    pub(crate) fn within_data(&self, at: At, part: PartId) -> Result<(), Unable> {
        self.owner_within_data(at, Owner::Part(part))
    }

    /// The same for the charge of a fill.
    pub(crate) fn fill_within_data(&self, at: At, fill: SubjectId) -> Result<(), Unable> {
        self.owner_within_data(at, Owner::Fill(fill))
    }

    fn owner_within_data(&self, at: At, owner: Owner) -> Result<(), Unable> {
        let At::Condition(condition) = at else { return Ok(()) };
        let stopped =
            |b: &BeyondData| b.owner == owner && b.condition == condition && !b.extrapolated;
        if self.beyond.iter().any(stopped) { Err(Unable::BeyondData) } else { Ok(()) }
    }
}
