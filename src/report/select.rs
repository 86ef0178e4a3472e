//! What would meet the requirements of a spec, in words: classes, nominals, tolerances, a spacer.
//!
//! The types here are what `select --as json` writes, and the text is made from them alone. Lengths
//! and margins are in the unit named beside them, deviations of classes in micrometres as the
//! standard's tables state them; what is not known or has no end is `null`.

mod from;
#[cfg(test)]
mod schema;
mod text;

pub use from::selected;
use serde::{Serialize, Serializer};
pub use text::text;

use crate::units::Unit;

/// The name of the format.
pub const SCHEMA: &str = "gapkeep/select/1";

/// What would meet the requirements of one spec.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Selected {
    /// `gapkeep/select/1`.
    pub schema: &'static str,
    /// The spec's file, relative to the root of the run.
    pub file: String,
    /// Classes, for each dimension left open and for those of fits that fail.
    pub classes: Vec<Choice>,
    /// Nominals that centre.
    pub centrings: Vec<Centring>,
    /// How far tolerances could grow.
    pub tolerances: Vec<Tolerance>,
    /// A spacer, where one was asked for.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub spacer: Option<SpacerLength>,
    /// What to bear in mind where margins of load or of joining decide.
    pub cautions: Vec<&'static str>,
}

/// The classes that a dimension may have, or a hole and a shaft together.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Choice {
    /// `part.dimension`, or those of hole and shaft.
    pub dimensions: Vec<String>,
    /// Their sizes as written.
    pub written: Vec<String>,
    /// The requirements that decide.
    pub requirements: Vec<String>,
    /// How many classes or pairs were judged.
    pub judged: usize,
    /// Those that meet every requirement at every condition, widest tolerance first.
    pub serving: Vec<Candidate>,
    /// Deviations, lower and upper, between which every single size serves.
    pub room: Option<(f64, f64)>,
    /// Unit of `room`.
    #[serde(serialize_with = "name_of")]
    #[cfg_attr(test, schemars(with = "String"))]
    pub unit: &'static Unit,
    /// Other dimensions left open, which were taken at their nominal sizes.
    pub open_beside: Vec<String>,
    /// Why no class was judged.
    pub obstacle: Option<String>,
}

/// A class, or a pair.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Candidate {
    /// As written on a drawing: `K7`, or `H7/g6`.
    pub class: String,
    /// Lower and upper deviation of each, µm.
    pub deviations_um: Vec<(f64, f64)>,
    /// The sum of the tolerances, µm.
    pub tolerance_um: f64,
    /// `preferred fit`, `preferred`, `recommended` or `defined`.
    pub rank: &'static str,
    /// What is nearest to its limit.
    pub nearest: Nearest,
}

/// A requirement and its distance to its limit.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Nearest {
    /// The requirement.
    pub requirement: String,
    /// Where; `null` for what has no condition.
    pub condition: Option<String>,
    /// Distance to the limit; `null` where there is none.
    pub margin: Option<f64>,
    /// Its unit.
    #[serde(serialize_with = "name_of")]
    #[cfg_attr(test, schemars(with = "String"))]
    pub unit: &'static Unit,
}

/// The nominals that centre a subject.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Centring {
    /// The subject.
    pub subject: String,
    /// Least distance to a lower limit.
    pub below: Nearest,
    /// Least distance to an upper limit.
    pub above: Nearest,
    /// How far the mean should move, rising, in the unit of the margins.
    pub shift: f64,
    /// The margin on both sides once it is centred.
    pub margin: f64,
    /// What would do it, one dimension each.
    pub by: Vec<Recentred>,
    /// The tolerance that makes most of the range where it is tightest.
    pub costliest: Option<Cost>,
}

/// A dimension with the nominal that centres.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Recentred {
    /// `part.dimension`.
    pub dimension: String,
    /// The nominal stated.
    pub stated: f64,
    /// The nominal that centres.
    pub nominal: f64,
    /// Unit of both.
    #[serde(serialize_with = "name_of")]
    #[cfg_attr(test, schemars(with = "String"))]
    pub unit: &'static Unit,
    /// Requirements of other subjects that would no longer hold.
    pub breaks: Vec<String>,
}

/// A tolerance and its share.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Cost {
    /// What it is.
    pub name: String,
    /// Its share of the range, 0 … 1.
    pub share: f64,
}

/// How far a tolerance could grow.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct Tolerance {
    /// `part.dimension`.
    pub dimension: String,
    /// The size as written.
    pub written: String,
    /// How far each deviation may move outward; `null` where nothing of it is noticed.
    pub each_side: Option<f64>,
    /// Its unit.
    #[serde(serialize_with = "name_of")]
    #[cfg_attr(test, schemars(with = "String"))]
    pub unit: &'static Unit,
    /// What stops it, or does not hold already.
    pub stopped_by: Option<String>,
}

/// The length of a spacer.
#[derive(Debug, Clone, Serialize)]
#[cfg_attr(test, derive(schemars::JsonSchema))]
pub struct SpacerLength {
    /// `part.dimension`.
    pub dimension: String,
    /// The subject whose mean it makes the same.
    pub subject: String,
    /// The two conditions.
    pub conditions: (String, String),
    /// The length stated.
    pub stated: f64,
    /// The length that does it.
    pub nominal: f64,
    /// Unit of both lengths.
    #[serde(serialize_with = "name_of")]
    #[cfg_attr(test, schemars(with = "String"))]
    pub unit: &'static Unit,
    /// The mean at both conditions with it.
    pub mean: f64,
    /// The means with the length stated.
    pub means_stated: (f64, f64),
    /// Unit of the means.
    #[serde(serialize_with = "name_of")]
    #[cfg_attr(test, schemars(with = "String"))]
    pub unit_of_mean: &'static Unit,
    /// The requirements of the subject at these conditions that such a mean is beyond.
    pub beyond: Vec<String>,
}

fn name_of<S: Serializer>(unit: &&'static Unit, serializer: S) -> Result<S::Ok, S::Error> {
    serializer.serialize_str(unit.symbol)
}

/// The document as JSON, ended by a line end.
pub fn json(selected: &Selected) -> String {
    // Strings, numbers and lists cannot fail to be written.
    let mut text = serde_json::to_string_pretty(selected).unwrap_or_default();
    text.push('\n');
    text
}
