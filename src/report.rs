//! One plain account of a run, from which every rendering is a pure function.
//!
//! An account names things in words and keeps figures in SI with the unit they are shown in; it
//! holds no index into the model. Renderings differ in form only: all show the same findings. Must
//! not know the syntax tree, files or the terminal.

mod account;
mod basis;
mod cause;
mod caution;
mod coordinate;
pub mod diagnostic;
pub mod json;
pub mod library;
pub mod limits;
pub mod look;
pub mod record;
#[cfg(test)]
mod sample;
pub mod select;
mod shop;
pub mod summary;
pub mod text;
pub mod wire;
pub(crate) mod wrap;

use crate::diagnostic::Diagnostic;
use crate::evaluate::outcome::Drawn;
use crate::findings::Standing;
use crate::findings::number::{Round, with_unit};
use crate::source::Sources;
use crate::span::Span;
use crate::units::Unit;
pub use account::account;
pub use basis::{Assumption, Grounds, MaterialNote, PartTemperature};
pub use cause::{Cause, CauseSum};
pub use caution::Caution;
pub use coordinate::Coordinate;
pub use shop::ShopCard;

/// Everything one run has to say.
#[derive(Debug, Clone, Default)]
pub struct Report {
    /// One for each spec, in the order they were named.
    pub specs: Vec<Spec>,
}

/// What there is to say about one spec.
#[derive(Debug, Clone)]
pub struct Spec {
    /// Its file, relative to the root of the run.
    pub file: String,
    /// The texts that its findings point into.
    pub sources: Sources,
    /// Its figures; `None` where mistakes in the spec left nothing to compute.
    pub account: Option<Account>,
    /// What is wrong or worth knowing, in the order of the spec.
    pub findings: Vec<Diagnostic>,
    /// Lines that differ from its record, where it was held against one.
    pub stale: Vec<String>,
}

/// The figures of one assembly.
#[derive(Debug, Clone)]
pub struct Account {
    /// The words after `assembly`.
    pub title: String,
    /// Where they stand.
    pub place: Span,
    /// Drawing number and revision, if stated.
    pub drawing: Option<(String, String)>,
    /// Free remarks.
    pub notes: Vec<String>,
    /// Unit of lengths.
    pub length: &'static Unit,
    /// Unit of temperatures.
    pub temperature: &'static Unit,
    /// Temperature the sizes are stated at, K.
    pub reference: f64,
    /// Name of each condition and what was written after it.
    pub conditions: Vec<(String, String)>,
    /// The range of each quantity at each condition, subject by subject.
    pub figures: Vec<Figure>,
    /// Each requirement at each of its conditions, in the order of the spec.
    pub cases: Vec<Case>,
    /// The share of assemblies that break some requirement somewhere, where statistics were asked
    /// for.
    pub failing: Option<FailingShare>,
    /// What a shop needs to make each joint.
    pub shop: Vec<ShopCard>,
    /// How far friction along each joint may shift its pressure.
    pub bands: Vec<FrictionBand>,
    /// What the figures rest on.
    pub grounds: Grounds,
}

/// The pressures that friction along a joint leaves possible at a condition. SI.
#[derive(Debug, Clone)]
pub struct FrictionBand {
    /// The name of the joint.
    pub joint: String,
    /// The condition.
    pub condition: String,
    /// The unit its pressure is shown in.
    pub unit: &'static Unit,
    /// The greatest share by which the pressure is shifted.
    pub coupling: f64,
    /// No pressure lies below.
    pub least: f64,
    /// No pressure lies above.
    pub greatest: f64,
}

/// The range of one quantity of a subject at a condition. Values are SI.
#[derive(Debug, Clone)]
pub struct Figure {
    /// The name of the subject.
    pub subject: String,
    /// `fit`, `gap`, `result`, `restraint` or `fill`.
    pub kind: &'static str,
    /// The word of the quantity.
    pub quantity: String,
    /// Across what a length is measured.
    pub measure: Option<Measure>,
    /// The condition; `None` for what has none.
    pub condition: Option<String>,
    /// The member of each `one of` set it was computed with.
    pub members: Vec<Member>,
    /// The unit it is shown in.
    pub unit: &'static Unit,
    /// No value lies below.
    pub least: f64,
    /// Value with everything in the middle of its limits.
    pub mean: f64,
    /// No value lies above.
    pub greatest: f64,
    /// True where values that near to both bounds are known to occur.
    pub met: bool,
    /// What kind of fit it is there, for fits.
    pub character: Option<&'static str>,
    /// Where the least value is reached.
    pub least_at: Vec<Coordinate>,
    /// Where the greatest value is reached.
    pub greatest_at: Vec<Coordinate>,
    /// True for what is shown only on demand unless something is required of it.
    pub secondary: bool,
    /// What must be said beside it.
    pub caution: Option<Caution>,
}

/// A member of a `one of` set.
#[derive(Debug, Clone, PartialEq)]
pub struct Member {
    /// The name of the set.
    pub name: String,
    /// Its size, SI.
    pub size: f64,
    /// The unit that sizes are shown in.
    pub unit: &'static Unit,
}

impl Member {
    /// The set and the size, such as `shim.thickness 0.1000 mm`.
    pub(crate) fn shown(&self) -> String {
        format!("{} {}", self.name, with_unit(self.size, self.unit, Round::Nearest))
    }
}

/// Across what a length is measured.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Measure {
    /// Across a round feature.
    Diametral,
    /// From its axis.
    Radial,
    /// Along a straight line.
    Linear,
}

impl Measure {
    /// The word for it.
    pub fn word(self) -> &'static str {
        match self {
            Measure::Diametral => "diametral",
            Measure::Radial => "radial",
            Measure::Linear => "linear",
        }
    }
}

/// One requirement at one of its conditions. Values are SI.
#[derive(Debug, Clone)]
pub struct Case {
    /// Counts the requirements of the spec from 0; cases of one requirement share it.
    pub requirement: usize,
    /// The id, if given.
    pub id: Option<String>,
    /// The id, or subject and quantity.
    pub name: String,
    /// The name of the subject.
    pub subject: String,
    /// `fit`, `gap`, `result`, `restraint` or `fill`.
    pub kind: &'static str,
    /// The word of the quantity.
    pub quantity: String,
    /// Across what a length is measured.
    pub measure: Option<Measure>,
    /// The condition; `None` for what has none.
    pub condition: Option<String>,
    /// How it is shown to hold, in words.
    pub method: String,
    /// True where statistics and not the bounds decide.
    pub statistical: bool,
    /// The limits, as written.
    pub limits: String,
    /// What must be said beside it.
    pub caution: Option<Caution>,
    /// Least allowed value.
    pub lower: Option<f64>,
    /// Greatest allowed value.
    pub upper: Option<f64>,
    /// The unit it is shown in.
    pub unit: &'static Unit,
    /// Index of its figure; `None` where nothing could be computed.
    pub figure: Option<usize>,
    /// Distance to the nearer limit, negative when passed; not a number where nothing could be
    /// computed.
    pub margin: f64,
    /// The margin as a share of what it is measured against, as [`crate::findings::thin_margin`] says.
    pub reserve: Option<f64>,
    /// How it stands, concessions taken into account.
    pub standing: Standing,
    /// The reason given.
    pub because: Option<String>,
    /// Id, last day and approver of a concession.
    pub concession: Option<String>,
    /// What the range is made of, largest share first.
    pub contributors: Vec<Contribution>,
    /// How it varies from assembly to assembly, where statistics were asked for.
    pub statistics: Option<Statistics>,
    /// What temperature does to the mean since reference, by part, largest first.
    pub thermal_shifts: Vec<(String, f64)>,
    /// Temperatures at which it would hold.
    pub window: Option<Window>,
}

/// The temperatures at which a requirement would hold.
#[derive(Debug, Clone)]
pub struct Window {
    /// In words.
    pub words: String,
    /// The intervals, K, an end that only the data set infinite; multiples of the condition's
    /// departure from reference where `scaled`.
    pub intervals: Vec<(f64, f64)>,
    /// As far as was looked: as the data go.
    pub looked_at: (f64, f64),
    /// True where parts have unequal temperatures.
    pub scaled: bool,
}

/// How a quantity varies from assembly to assembly, scenarios at their worst. Values are SI.
#[derive(Debug, Clone)]
pub struct Statistics {
    /// The quantity at the means.
    pub mean: f64,
    /// Its standard deviation to first order.
    pub sigma: f64,
    /// Mean and standard deviation to second order, where they are 1 % of sigma or more from those
    /// to first order.
    pub second_order: Option<(f64, f64)>,
    /// The share of assemblies that break a limit.
    pub failing: FailingShare,
    /// The same for the delivery whose lots fail most.
    pub worst_lot: Option<WorstLot>,
    /// Mean and standard deviation where the scenarios make it least.
    pub low: (f64, f64),
    /// Mean and standard deviation where they make it greatest.
    pub high: (f64, f64),
    /// How many standard deviations to each side its row shows: what the method asks for, else 3.
    pub shown_sigmas: f64,
    /// Capability index to the nearer limit.
    pub cpk: Option<f64>,
    /// True where some spread is the default and not stated.
    pub assumed: bool,
    /// Share of the variance that several unknowns bring together.
    pub interaction: Option<f64>,
}

/// How a quantity varies within the delivery whose lots fail most.
#[derive(Debug, Clone)]
pub struct WorstLot {
    /// The share of assemblies that break a limit.
    pub failing: FailingShare,
    /// Capability index to the nearer limit.
    pub cpk: Option<f64>,
    /// The end of each lot's scatter.
    pub at: Vec<Coordinate>,
}

/// A share of assemblies, 0 … 1.
#[derive(Debug, Clone, Copy)]
pub struct FailingShare {
    /// The share.
    pub share: f64,
    /// What it is known to lie between.
    pub interval: (f64, f64),
    /// How it was drawn, where it was.
    pub drawn: Option<Drawn>,
}

/// What one unknown does to a quantity.
#[derive(Debug, Clone)]
pub struct Contribution {
    /// What it is.
    pub name: String,
    /// Its tolerance as written, where it has one in the spec.
    pub written: String,
    /// Which cause it belongs to.
    pub cause: Cause,
    /// Where its number comes from, if not from a drawing.
    pub basis: Option<&'static str>,
    /// Change of the quantity for each unit of the unknown, both in the units shown.
    pub sensitivity: f64,
    /// Unit of the unknown.
    pub unit: &'static str,
    /// Part of the range that it makes, SI.
    pub part: f64,
    /// The same as a share of the range.
    pub share_of_range: f64,
    /// Share of the variance, where statistics were asked for.
    pub share_of_variance: Option<f64>,
}
