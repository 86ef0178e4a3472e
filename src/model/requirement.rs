//! Requirements: what must hold, where, and by which method. Limits are SI.

use super::{ConditionId, PartId, SubjectId};
use crate::span::Span;
use crate::units::{Kind, Unit};

/// One `require` line.
#[derive(Debug, Clone)]
pub struct Requirement {
    /// The id, if given.
    pub id: Option<String>,
    /// The whole line.
    pub span: Span,
    /// What it is about.
    pub subject: SubjectId,
    /// Which of its quantities.
    pub quantity: Quantity,
    /// The unit its figures are shown in.
    pub unit: &'static Unit,
    /// Least allowed value.
    pub lower: Option<Limit>,
    /// Greatest allowed value.
    pub upper: Option<Limit>,
    /// Where it must hold; at least one unless the quantity has no condition.
    pub conditions: Vec<ConditionId>,
    /// How it is shown to hold.
    pub method: Method,
    /// The reason given.
    pub because: Option<String>,
    /// An accepted departure.
    pub concession: Option<Concession>,
}

/// One end of what is allowed.
#[derive(Debug, Clone, PartialEq)]
pub struct Limit {
    /// The value, SI; a share of the yield strength where `of_yield`.
    pub value: f64,
    /// True where the value is a share of yield at the condition's temperature.
    pub of_yield: bool,
    /// As written.
    pub written: String,
    /// Where it stands.
    pub span: Span,
}

/// What can be required of a subject.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Quantity {
    /// Of a fit: internal minus external.
    Clearance,
    /// Of a fit: external minus internal.
    Interference,
    /// Of a fit: half the clearance.
    RadialClearance,
    /// Of a gap.
    Gap,
    /// Of a result.
    Value,
    /// Of a joint: contact pressure.
    Pressure,
    /// Of a joint: torque it can carry.
    Torque,
    /// Of a joint: axial force it can carry.
    AxialForce,
    /// Of a joint or restraint: stress in a part (von Mises in a joint, axial in a restraint).
    Stress(PartId),
    /// Of a joint: temperature of the outer part at which it can be joined.
    JoiningTemperature,
    /// Of a joint: temperature at which it comes loose.
    LooseningTemperature,
    /// Of a restraint.
    Force,
    /// Of a restraint: the opening where nothing is held.
    Separation,
    /// Of a fill: free share of the cavity.
    Ullage,
}

impl Quantity {
    /// The kind of quantity, where it is fixed; a result's is its own.
    pub fn kind(self) -> Option<Kind> {
        Some(match self {
            Quantity::Clearance
            | Quantity::Interference
            | Quantity::RadialClearance
            | Quantity::Gap
            | Quantity::Separation => Kind::LENGTH,
            Quantity::Value => return None,
            Quantity::Pressure | Quantity::Stress(_) => Kind::STRESS,
            Quantity::Torque => Kind::TORQUE,
            Quantity::AxialForce | Quantity::Force => Kind::FORCE,
            Quantity::JoiningTemperature | Quantity::LooseningTemperature => Kind::TEMPERATURE,
            Quantity::Ullage => Kind::PURE,
        })
    }

    /// True for what has no condition of its own.
    pub fn is_unconditional(self) -> bool {
        matches!(self, Quantity::JoiningTemperature | Quantity::LooseningTemperature)
    }
}

/// How a requirement is shown to hold.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Method {
    /// For everything the limits allow.
    WorstCase,
    /// Mean ± `sigmas` standard deviations.
    Rss {
        /// How many standard deviations.
        sigmas: f64,
    },
    /// A capability index.
    Cpk(f64),
    /// For that share of assemblies, 0 … 1.
    Share(f64),
}

impl Requirement {
    /// True where a limit is a share of yield.
    pub fn of_yield(&self) -> bool {
        [&self.lower, &self.upper].into_iter().flatten().any(|limit| limit.of_yield)
    }
}

/// An accepted departure from a requirement.
#[derive(Debug, Clone, PartialEq)]
pub struct Concession {
    /// Its id.
    pub id: String,
    /// The accepted value, SI.
    pub accepts: f64,
    /// The accepted value, as written.
    pub written: String,
    /// Last day it counts, as written.
    pub until: String,
    /// Who approved it.
    pub approved: Option<String>,
    /// The reason given.
    pub because: Option<String>,
    /// Where it stands.
    pub span: Span,
}
