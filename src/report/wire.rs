//! The report as other programs read it: `gapkeep/1`.
//!
//! The types here are the format. They stand apart from the inner ones, so that a change inside does
//! not change what is written; a change here that breaks a reader takes a new number. Figures are at
//! full precision in the unit named beside them; what is not known or has no end is `null`.

mod from;
#[cfg(test)]
pub(in crate::report) mod schema;

pub use from::document;
use serde::ser::SerializeMap;
use serde::{Serialize, Serializer};

/// The name of the format.
pub const SCHEMA: &str = "gapkeep/1";

/// A whole run.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Document {
    /// `gapkeep/1`.
    pub schema: &'static str,
    /// One for each spec, in the order they were named.
    pub specs: Vec<SpecEntry>,
    /// How many requirements at conditions stand how.
    pub summary: SummaryEntry,
}

/// One spec.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct SpecEntry {
    /// Its file, relative to the root of the run.
    pub file: String,
    /// The words after `assembly`; `null` where nothing could be computed.
    pub title: Option<String>,
    /// Drawing number.
    pub drawing: Option<String>,
    /// Drawing revision.
    pub revision: Option<String>,
    /// Each quantity at each condition.
    pub results: Vec<ResultEntry>,
    /// Each requirement at each of its conditions.
    pub requirements: Vec<RequirementEntry>,
    /// What a shop needs to make each joint; temperatures in the file's unit, clearance in mm.
    pub shop_cards: Vec<ShopCardEntry>,
    /// How far friction along each joint may shift its pressure, where friction is stated.
    pub friction_bands: Vec<FrictionBandEntry>,
    /// The share of assemblies that meet every requirement at every condition, where statistics
    /// were asked for.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub assembly_yield: Option<YieldEntry>,
    /// What to bear in mind with these figures: values from memory, the limits of a material, the
    /// review that figures of load call for, the dangers of joining.
    pub cautions: Vec<String>,
    /// What is wrong or worth knowing.
    pub findings: Vec<FindingEntry>,
}

/// The pressures that friction along a joint leaves possible at a condition.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct FrictionBandEntry {
    /// The joint.
    pub joint: String,
    /// The condition.
    pub condition: String,
    /// The greatest share by which the pressure is shifted.
    pub coupling: Option<f64>,
    /// Unit of the pressures.
    pub unit: &'static str,
    /// No pressure lies below.
    pub least: Option<f64>,
    /// No pressure lies above; `null` where there is no bound.
    pub greatest: Option<f64>,
}

/// What a shop needs to join two parts without force, for every pair within the tolerances.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct ShopCardEntry {
    /// The joint.
    pub joint: String,
    /// The part outside.
    pub outer: String,
    /// The part inside.
    pub inner: String,
    /// Unit of the temperatures.
    pub unit: &'static str,
    /// The condition that is the day of assembly; `null` for the reference temperature.
    pub day: Option<String>,
    /// Temperature of that day.
    pub ambient: Option<f64>,
    /// Clearance while joining, mm.
    pub clearance: Option<f64>,
    /// Heat the outer part to this; `null` where its data end first.
    pub heat_outer: Option<f64>,
    /// The highest temperature that its material allows.
    pub outer_limit: Option<f64>,
    /// Or chill the inner part to this; `null` where its data end first.
    pub chill_inner: Option<f64>,
    /// Both at once, where the outer part may not be heated as far as it alone would have to be.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub together: Option<TogetherEntry>,
}

/// Heat and cold at once.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct TogetherEntry {
    /// Heat the outer part to this.
    pub heat_outer: Option<f64>,
    /// And chill the inner part to this; `null` where its data end first.
    pub chill_inner: Option<f64>,
}

/// A share of assemblies that hold, with what it is known to lie between.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct YieldEntry {
    /// The share, 0 … 1.
    pub share: Option<f64>,
    /// What it lies between.
    pub interval: [Option<f64>; 2],
    /// The share that breaks some requirement at some condition, 0 … 1, with all its digits.
    pub share_failing: Option<f64>,
    /// Number of draws; `null` where it was computed without.
    pub draws: Option<u64>,
    /// Seed of the draws, where it was drawn.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub seed: Option<u64>,
    /// The width that was asked for of its interval, where the most draws allowed did not reach it.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub width_missed: Option<f64>,
}

/// One quantity at a condition.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct ResultEntry {
    /// Name of the fit, gap, result, restraint or fill.
    pub name: String,
    /// Which of these it is.
    pub kind: &'static str,
    /// Which of its quantities.
    pub quantity: String,
    /// `diametral`, `radial` or `linear`, for lengths.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub measure: Option<&'static str>,
    /// The condition; `null` for what has none.
    pub condition: Option<String>,
    /// The member of each `one of` set it was computed with, in mm; angles in deg.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub members: Option<Map>,
    /// Unit of the figures.
    pub unit: &'static str,
    /// No value lies below.
    pub least: Option<f64>,
    /// Value with everything in the middle of its limits.
    pub mean: Option<f64>,
    /// No value lies above.
    pub greatest: Option<f64>,
    /// What kind of fit it is there.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub character: Option<&'static str>,
    /// Where the least value is reached.
    pub least_at: Map,
    /// Where the greatest value is reached.
    pub greatest_at: Map,
}

/// One requirement at a condition.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct RequirementEntry {
    /// The id; `null` where none is given.
    pub id: Option<String>,
    /// What it is about.
    pub subject: String,
    /// Which of its quantities.
    pub quantity: String,
    /// The condition; `null` for what has none.
    pub condition: Option<String>,
    /// How it is shown to hold.
    pub method: String,
    /// Unit of limits, figures and margin.
    pub unit: &'static str,
    /// Least allowed value; `null` where there is none.
    pub lower: Option<f64>,
    /// Greatest allowed value; `null` where there is none.
    pub upper: Option<f64>,
    /// Least value.
    pub least: Option<f64>,
    /// Value with everything in the middle of its limits.
    pub mean: Option<f64>,
    /// Greatest value.
    pub greatest: Option<f64>,
    /// Distance to the nearer limit, negative when passed.
    pub margin: Option<f64>,
    /// What the temperature of each part does to the mean since reference; in detail only.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub thermal_shift: Option<Map>,
    /// Standard deviation to first order, where statistics were asked for.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub sigma: Option<f64>,
    /// Mean and standard deviation to second order, where they are 1 % of sigma or more from those
    /// to first order.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub second_order: Option<SecondOrderEntry>,
    /// Share of assemblies that break a limit, 0 … 1.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub share_failing: Option<f64>,
    /// What that share is known to lie between.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub share_failing_interval: Option<[f64; 2]>,
    /// Number of draws, where it was drawn.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub draws: Option<u64>,
    /// Seed of the draws, where it was drawn.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub seed: Option<u64>,
    /// The width that was asked for of its interval, where the most draws allowed did not reach it.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub width_missed: Option<f64>,
    /// Capability index to the nearer limit.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub cpk: Option<f64>,
    /// The same for the delivery whose lots fail most: all of its pieces share its lots, and this is
    /// the greatest share over the ends of their scatter. For requirements on a share of assemblies
    /// or a capability to which lots bring scatter.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub worst_lot: Option<WorstLotEntry>,
    /// `holds`, `fails`, `undecided` or `conceded`.
    pub verdict: &'static str,
    /// The reason given.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub because: Option<String>,
    /// The concession, if one is stated.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub concession: Option<String>,
    /// Temperatures at which it would hold in the worst case.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub window: Option<WindowEntry>,
    /// What the range is made of, largest share first.
    pub contributors: Vec<ContributorEntry>,
    /// The same summed by cause, largest share first.
    pub causes: Vec<CauseEntry>,
    /// Share of the variance that no contributor brings alone, where there is some; with those of
    /// the contributors it sums to 1.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub interaction: Option<f64>,
}

/// How a requirement stands within the delivery whose lots fail most.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct WorstLotEntry {
    /// Share of assemblies that break a limit, 0 … 1.
    pub share_failing: Option<f64>,
    /// What that share is known to lie between.
    pub share_failing_interval: [f64; 2],
    /// Number of draws, where it was drawn.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub draws: Option<u64>,
    /// Seed of the draws, where it was drawn.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub seed: Option<u64>,
    /// The width that was asked for of its interval, where the most draws allowed did not reach it.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub width_missed: Option<f64>,
    /// Capability index to the nearer limit.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub cpk: Option<f64>,
    /// The end of each lot's scatter, −1 or 1 in the unit of its tolerance.
    pub at: Map,
}

/// Mean and standard deviation to second order.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct SecondOrderEntry {
    /// The mean, in the requirement's unit.
    pub mean: Option<f64>,
    /// The standard deviation, in the requirement's unit.
    pub sigma: Option<f64>,
}

/// The temperatures at which a requirement would hold.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct WindowEntry {
    /// The file's temperature unit, or empty where the ends are multiples of the condition's
    /// departure from reference.
    pub unit: &'static str,
    /// `[from, to]`, an open end `null`.
    pub intervals: Vec<[Option<f64>; 2]>,
    /// As far as was looked, which is as far as the data of the materials go.
    pub looked_at: [Option<f64>; 2],
}

/// What one unknown does to a quantity.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct ContributorEntry {
    /// What it is.
    pub name: String,
    /// Its tolerance as written; empty where it has none.
    pub written: String,
    /// Which cause it belongs to.
    pub cause: &'static str,
    /// Change of the quantity for each unit of the unknown.
    pub sensitivity: Option<f64>,
    /// Unit of the unknown; empty for scatters, which run from −1 to 1.
    pub unit: &'static str,
    /// Part of the range that it makes, in the requirement's unit.
    pub part: Option<f64>,
    /// The same as a share, 0 … 1.
    pub share_of_range: Option<f64>,
    /// Share of the variance, where statistics were asked for.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub share_of_variance: Option<f64>,
}

/// What all contributors of one cause make together.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct CauseEntry {
    /// The cause.
    pub cause: &'static str,
    /// Part of the range, in the requirement's unit.
    pub part: Option<f64>,
    /// The same as a share, 0 … 1.
    pub share_of_range: Option<f64>,
    /// Share of the variance, where statistics were asked for; left out for scenarios.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub share_of_variance: Option<f64>,
}

/// One thing said about a spec.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct FindingEntry {
    /// Names the problem, for good.
    pub code: &'static str,
    /// `error`, `warning` or `note`.
    pub severity: &'static str,
    /// One sentence.
    pub message: String,
    /// Its file, relative to the root of the run.
    pub file: String,
    /// Line, from 1.
    pub line: usize,
    /// Column in characters, from 1.
    pub column: usize,
    /// What is said at the place itself and at others, the place itself first.
    pub labels: Vec<LabelEntry>,
    /// What would mend it.
    pub help: Option<String>,
}

/// A place and what is said there.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct LabelEntry {
    /// Its file.
    pub file: String,
    /// First line, from 1.
    pub line: usize,
    /// First column in characters, from 1.
    pub column: usize,
    /// Line of the place just past its end.
    pub end_line: usize,
    /// Column just past its end.
    pub end_column: usize,
    /// What is said; may be empty.
    pub text: String,
}

/// How many requirements at conditions stand how.
#[derive(Debug, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct SummaryEntry {
    /// All of them.
    pub requirements: usize,
    /// Those that hold.
    pub hold: usize,
    /// Those that fail.
    pub fail: usize,
    /// Those that could not be decided.
    pub undecided: usize,
    /// Those that fail within what a concession accepts.
    pub conceded: usize,
    /// Specs of which nothing could be computed.
    pub wrong: usize,
}

/// Names and numbers in an order of their own, written as an object.
#[derive(Debug, Default)]
pub struct Map(pub Vec<(String, Option<f64>)>);

impl Serialize for Map {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        let mut map = serializer.serialize_map(Some(self.0.len()))?;
        for (name, value) in &self.0 {
            map.serialize_entry(name, value)?;
        }
        map.end()
    }
}
