//! What would meet the requirements: ISO 286 classes for sizes left open and for fits that fail,
//! nominals that centre, tolerances that may grow for nothing, the length of a spacer.
//!
//! Each requirement is recorded once; a class only moves the limits of one size, so that hundreds of
//! classes are replays of the same tapes. What a tape cannot tell (statistics, sets to select from,
//! a bonus at maximum material) is evaluated anew for each. Dimensions that share a line, as those of
//! parts `like` each other do, change together. SI throughout; knows no words.

mod cases;
mod centre;
mod choice;
mod loosen;
mod room;
mod spacer;
mod trial;

use super::Options;
use super::outcome::Contributor;
use crate::model::{Assembly, ConditionId, DimensionId, Expr, ExprKind, Origin, SubjectId};
use crate::standards::iso286::{Class, Deviations};
use cases::Cases;
pub use spacer::{NoSpacer, Spacer, spacer};
use std::collections::BTreeSet;

/// What would meet the requirements of an assembly.
#[derive(Debug, Clone, Default)]
pub struct Selections {
    /// Classes, for each dimension left open and for those of fits that fail.
    pub choices: Vec<Choice>,
    /// Nominals, for each subject with limits on both sides.
    pub centrings: Vec<Centring>,
    /// Tolerances, for each dimension that some requirement depends on.
    pub tolerances: Vec<Slack>,
}

/// The classes that one dimension may have, or two of one fit together.
#[derive(Debug, Clone)]
pub struct Choice {
    /// The dimension; or the hole and the shaft of a fit.
    pub dimensions: Vec<DimensionId>,
    /// Other dimensions still open that the same requirements contain; they were taken at their
    /// nominal sizes.
    pub open_beside: Vec<DimensionId>,
    /// The requirements that decide, by index.
    pub requirements: Vec<usize>,
    /// How many classes, or pairs of them, were judged.
    pub judged: usize,
    /// Those that meet every requirement at every condition, widest tolerance first, then by margin.
    pub serving: Vec<Candidate>,
    /// Least and greatest deviation, m, between which every single size meets every requirement;
    /// for one dimension only. `None` where no size does, or where that was not looked for.
    pub room: Option<(f64, f64)>,
    /// What kept the classes from being judged.
    pub obstacle: Option<Obstacle>,
}

/// Why no class was judged.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Obstacle {
    /// Nothing is required of what contains the dimension.
    NothingRequired,
    /// It is not known whether the dimension is a hole or a shaft.
    SideUnknown,
    /// A requirement, by index, cannot be computed, whatever the class.
    NotComputed(usize),
}

/// A class, or a pair, that meets every requirement.
#[derive(Debug, Clone)]
pub struct Candidate {
    /// The class of each dimension of the choice with its deviations.
    pub classes: Vec<(Class, Deviations)>,
    /// How the standard looks on it.
    pub rank: Rank,
    /// What is nearest to its limit.
    pub governing: Governing,
}

impl Candidate {
    /// The sum of the tolerances, µm.
    pub fn tolerance(&self) -> f64 {
        self.classes.iter().map(|(_, deviations)| deviations.tolerance().um()).sum()
    }
}

/// How a standard looks on a class; the first is to be chosen first.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Rank {
    /// It makes a preferred fit with the class of its mate.
    PreferredFit,
    /// A class to choose first by ISO 286-1.
    Preferred,
    /// A class recommended by ISO 286-1.
    Recommended,
    /// Defined, and no more.
    Defined,
}

/// The requirement that is nearest to its limit.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Governing {
    /// Its index.
    pub requirement: usize,
    /// Where; `None` for what has no condition.
    pub condition: Option<ConditionId>,
    /// Distance to the limit, in its own SI unit.
    pub margin: f64,
    /// The distance as margins of requirements on different quantities are compared: the same where
    /// all are of one kind, else a share of what is allowed.
    pub compared: f64,
}

/// The nominals with which a subject's least margins below and above are alike.
#[derive(Debug, Clone)]
pub struct Centring {
    /// The subject.
    pub subject: SubjectId,
    /// Least distance to a lower limit over all conditions, in the subject's own sense (a fit's
    /// clearance), with where it occurs.
    pub below: Governing,
    /// The same to an upper limit.
    pub above: Governing,
    /// How far the mean should move, rising: half of the difference.
    pub shift: f64,
    /// The margin on both sides once it is centred.
    pub margin: f64,
    /// What would do it: one dimension each.
    pub by: Vec<Recentred>,
    /// The tolerance that makes most of the range where the margins are least.
    pub costliest: Option<Contributor>,
}

/// A dimension with another nominal.
#[derive(Debug, Clone, PartialEq)]
pub struct Recentred {
    /// Which.
    pub dimension: DimensionId,
    /// The nominal that centres, m or rad.
    pub nominal: f64,
    /// The least margin with it.
    pub margin: f64,
    /// Requirements of other subjects, by index, that hold now and would not hold then.
    pub breaks: Vec<usize>,
}

/// How far a tolerance could grow with every requirement still holding.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Slack {
    /// Which dimension.
    pub dimension: DimensionId,
    /// How far each of its deviations may move outward, everything else as it is; m or rad. Zero
    /// where nothing is free, infinite where nothing of it is noticed.
    pub each_side: f64,
    /// What stops it, or what does not hold already.
    pub stopped_by: Option<usize>,
}

/// What is asked for.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Asked {
    /// Every dimension left open, and the dimensions of fits that fail.
    Everything,
    /// This dimension only.
    For(DimensionId),
}

/// Finds what would meet the requirements of an assembly.
pub fn select(assembly: &Assembly, asked: Asked, options: &Options) -> Selections {
    let cases = Cases::record(assembly);
    let open: Vec<DimensionId> = ids(assembly)
        .filter(|&d| assembly.dimension(d).origin == Origin::Open && is_first(assembly, d))
        .collect();
    let mut found = Selections {
        choices: match asked {
            Asked::For(d) => vec![choice::of_one(assembly, &cases, d, &open, options)],
            Asked::Everything => choice::all(assembly, &cases, &open, options),
        },
        ..Selections::default()
    };
    // Beside a size left open, what could be said of others would rest on its nominal.
    if open.is_empty() {
        let wanted = |d: &DimensionId| match asked {
            Asked::Everything => true,
            Asked::For(one) => *d == first_of_line(assembly, one),
        };
        let sizes = ids(assembly).filter(|&d| is_first(assembly, d)).filter(wanted);
        found.tolerances = loosen::all(assembly, &cases, sizes, options);
        if asked == Asked::Everything {
            found.centrings = centre::all(assembly, options);
        }
    }
    found
}

fn ids(assembly: &Assembly) -> impl Iterator<Item = DimensionId> + use<> {
    (0..assembly.dimensions.len() as u32).map(DimensionId)
}

/// The dimensions that the line of one states: itself, and the same of parts `like` its own.
fn of_line(assembly: &Assembly, dimension: DimensionId) -> BTreeSet<DimensionId> {
    let line = assembly.dimension(dimension).line;
    ids(assembly).filter(|&d| assembly.dimension(d).line == line).collect()
}

/// The dimension that stands for its line.
fn first_of_line(assembly: &Assembly, dimension: DimensionId) -> DimensionId {
    of_line(assembly, dimension).first().copied().unwrap_or(dimension)
}

fn is_first(assembly: &Assembly, dimension: DimensionId) -> bool {
    first_of_line(assembly, dimension) == dimension
}

/// The dimension that an expression is, if it is no more than that.
fn plain_size(e: &Expr) -> Option<DimensionId> {
    match &e.kind {
        ExprKind::Size { dimension, .. } => Some(*dimension),
        ExprKind::Named(_, e) => plain_size(e),
        _ => None,
    }
}
