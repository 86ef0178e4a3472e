//! `condition`: a named thermal state.

use super::{Name, Quantity, Spread, Text, Tolerance};
use crate::span::{Span, Spanned};

/// `condition hot 85 ±3 { shaft 97; bearing 5 .. 9 K above housing }`
#[derive(Debug, Clone, PartialEq)]
pub struct Condition {
    /// Its name.
    pub name: Name,
    /// The temperature of every part that has none of its own.
    pub state: ThermalState,
    /// How that temperature varies, if statistics may use it.
    pub spread: Option<Spread>,
    /// Rows for single parts.
    pub overrides: Vec<Override>,
    /// Rows `moisture wet`: the moisture of every part without its own.
    pub moisture: Vec<Name>,
    /// Rows `speed 18000 rpm of core, magnets`.
    pub speeds: Vec<Speed>,
    /// The whole statement.
    pub span: Span,
}

/// What a condition's own temperature is.
#[derive(Debug, Clone, PartialEq)]
pub enum ThermalState {
    /// A temperature with its tolerance, or every temperature of a range.
    Temperature(Quantity),
    /// `from "history.csv" ±2`: part temperatures against time.
    History {
        /// The file's path as written.
        file: Text,
        /// What is common to all parts.
        tolerance: Option<Tolerance>,
    },
}

/// `gear wet 75`, `shaft 97`, `bearing 5 .. 9 K above housing`; it has a moisture, a temperature or both.
#[derive(Debug, Clone, PartialEq)]
pub struct Override {
    /// The part, or the fill, that it speaks of.
    pub part: Name,
    /// Its moisture.
    pub moisture: Option<Name>,
    /// Its temperature.
    pub temperature: Option<OwnTemperature>,
    /// How that temperature varies.
    pub spread: Option<Spread>,
    /// The whole row.
    pub span: Span,
}

/// A part's own temperature.
#[derive(Debug, Clone, PartialEq)]
pub enum OwnTemperature {
    /// `97 ±2`; never written with a `+`.
    Absolute(Quantity),
    /// `12 K above`, `5 .. 9 K below housing`
    Difference {
        /// How much.
        amount: Quantity,
        /// Which way.
        sense: Spanned<Sense>,
        /// The part it is measured from; none: the condition's own temperature.
        base: Option<Name>,
    },
}

/// Which way a temperature differs from its base.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Sense {
    /// `above`: warmer.
    Above,
    /// `below`: colder.
    Below,
}

/// `speed 18000 rpm of core, magnets, sleeve`
#[derive(Debug, Clone, PartialEq)]
pub struct Speed {
    /// How fast.
    pub speed: Quantity,
    /// How it varies.
    pub spread: Option<Spread>,
    /// The parts that turn.
    pub parts: Vec<Name>,
    /// The whole row.
    pub span: Span,
}
