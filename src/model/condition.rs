//! Thermal states. Temperatures in K, times in s, speeds in rad/s.

use super::{PartId, Scenario, SubjectId};
use crate::numeric::Curve;
use crate::span::Span;
use std::sync::Arc;

/// A named thermal state.
#[derive(Debug, Clone)]
pub struct Condition {
    /// Its name.
    pub name: String,
    /// Where the name stands.
    pub span: Span,
    /// As written after the name, for echoing.
    pub written: String,
    /// The temperature of what has none of its own.
    pub thermal: Thermal,
    /// What single parts and fills do differently.
    pub states: Vec<State>,
    /// Moisture state of everyone without one of its own.
    pub moisture: Option<String>,
    /// Rotation, and the parts that turn.
    pub speed: Option<Rotation>,
}

/// Parts that turn together.
#[derive(Debug, Clone)]
pub struct Rotation {
    /// Rotational speed, rad/s.
    pub speed: Scenario,
    /// Who turns.
    pub parts: Vec<PartId>,
}

/// The temperature of a condition.
#[derive(Debug, Clone)]
pub enum Thermal {
    /// One temperature, one with a tolerance, or a range; K.
    Uniform(Scenario),
    /// Temperatures against time.
    History(History),
}

/// Temperatures against time, straight between rows.
#[derive(Debug, Clone)]
pub struct History {
    /// The name of the table, as written.
    pub file: String,
    /// First and last time, s.
    pub time: (f64, f64),
    /// Each part that has a column: temperature (K) against time (s).
    pub parts: Vec<(Owner, Arc<dyn Curve>)>,
    /// The `ambient` column, for everything else.
    pub ambient: Option<Arc<dyn Curve>>,
    /// Tolerance common to all parts at once, K, least to greatest about zero.
    pub band: Scenario,
}

/// Whoever has a temperature.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Owner {
    /// A part.
    Part(PartId),
    /// The charge of a fill.
    Fill(SubjectId),
}

/// What one part or fill does differently in a condition.
#[derive(Debug, Clone)]
pub struct State {
    /// Who.
    pub owner: Owner,
    /// Where the row stands.
    pub span: Span,
    /// Its own temperature, if stated.
    pub temperature: Option<OwnTemperature>,
    /// Its own moisture state, if stated.
    pub moisture: Option<String>,
}

/// A temperature of one's own.
#[derive(Debug, Clone)]
pub enum OwnTemperature {
    /// A temperature whatever the condition's is, K.
    Absolute(Scenario),
    /// A difference, K (negative when below), above another's temperature.
    Above {
        /// By how much.
        difference: Scenario,
        /// Above whom; the condition's own temperature if absent.
        base: Option<Owner>,
    },
}

impl Condition {
    /// What `owner` does differently, if anything.
    pub fn state(&self, owner: Owner) -> Option<&State> {
        self.states.iter().find(|s| s.owner == owner)
    }

    /// The moisture state of a part in this condition, if one is named.
    pub fn moisture_of(&self, part: PartId) -> Option<&str> {
        self.state(Owner::Part(part))
            .and_then(|s| s.moisture.as_deref())
            .or(self.moisture.as_deref())
    }

    /// True where it is stated as every temperature of a range, not as one with a tolerance.
    pub fn is_range(&self) -> bool {
        matches!(self.thermal, Thermal::Uniform(_)) && self.written.contains("..")
    }

    /// True for a temperature without tolerance, range or history.
    pub fn is_single(&self) -> bool {
        matches!(&self.thermal, Thermal::Uniform(t) if t.is_exact())
    }
}
