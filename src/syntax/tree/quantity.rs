//! Numbers, units, tolerances and ranges, as spelled.

use super::{Name, Text};
use crate::span::{Span, Spanned};

/// A unit as spelled, such as `mm`, `°C` or `ppm/K`; known or not.
pub type Unit = Name;

/// A finite number.
#[derive(Debug, Clone, PartialEq)]
pub struct Number {
    /// Its value, the sign included.
    pub value: f64,
    /// Its spelling, the sign included (`+0.050`, `−3`, `.125`).
    pub text: String,
    /// Where it stands, the sign included.
    pub span: Span,
}

impl Number {
    /// Count of digits written after the decimal point.
    pub fn decimals(&self) -> usize {
        match self.text.split_once('.') {
            Some((_, fraction)) => fraction.bytes().take_while(u8::is_ascii_digit).count(),
            None => 0,
        }
    }

    /// True when a sign is written, `+` included.
    pub fn is_signed(&self) -> bool {
        self.text.starts_with(['+', '-', '\u{2212}'])
    }

    /// True for a written `+`.
    pub fn has_plus(&self) -> bool {
        self.text.starts_with('+')
    }
}

/// A number and the unit written after it.
#[derive(Debug, Clone, PartialEq)]
pub struct Scalar {
    /// The number.
    pub number: Number,
    /// The unit written after this very number.
    pub unit: Option<Unit>,
}

impl Scalar {
    /// Number and unit.
    pub fn span(&self) -> Span {
        self.unit.as_ref().map_or(self.number.span, |unit| self.number.span.to(unit.span))
    }
}

/// How far a value may lie from what is stated.
#[derive(Debug, Clone, PartialEq)]
pub struct Tolerance {
    /// The deviations.
    pub deviation: Deviation,
    /// From the sign to the last unit.
    pub span: Span,
}

/// The two ways to write a tolerance.
#[derive(Debug, Clone, PartialEq)]
pub enum Deviation {
    /// `±0.05`; the number is as written, without a sign.
    Symmetric(Scalar),
    /// `+0.05/-0.02`, in the order written; each is signed, or a bare `0`.
    Limits(Scalar, Scalar),
}

/// `58 ±0.05`, `23.4 ±0.3 ppm/K` or a lone `58`.
#[derive(Debug, Clone, PartialEq)]
pub struct Group {
    /// The value.
    pub value: Scalar,
    /// Its tolerance.
    pub tolerance: Option<Tolerance>,
    /// From the value to the last unit.
    pub span: Span,
}

/// `58.00 .. 58.05`
#[derive(Debug, Clone, PartialEq)]
pub struct Range {
    /// What stands before the dots; not checked to be the lesser.
    pub low: Scalar,
    /// What stands after the dots.
    pub high: Scalar,
    /// From the first number to the last unit.
    pub span: Span,
}

/// A value with its tolerance, or a range.
#[derive(Debug, Clone, PartialEq)]
pub enum Quantity {
    /// `85 ±3` or `85`
    Group(Group),
    /// `-40 .. 85`
    Range(Range),
}

impl Quantity {
    /// From the first number to the last unit.
    pub fn span(&self) -> Span {
        match self {
            Quantity::Group(group) => group.span,
            Quantity::Range(range) => range.span,
        }
    }
}

/// `spread normal Cpk 1.33 shift +0.01`: how a value varies when statistics are asked for.
#[derive(Debug, Clone, PartialEq)]
pub struct Spread {
    /// The distribution.
    pub distribution: Spanned<Distribution>,
    /// How far its mean lies from the middle of the limits.
    pub shift: Option<Scalar>,
    /// The whole clause.
    pub span: Span,
}

/// The word after `spread`.
#[derive(Debug, Clone, PartialEq)]
pub enum Distribution {
    /// `normal`, with `Cpk 1.33` if stated.
    Normal {
        /// The capability index.
        cpk: Option<Number>,
    },
    /// `sorted`: a normal cut at the limits.
    Sorted,
    /// `uniform`
    Uniform,
    /// `triangular`
    Triangular,
    /// `from "file.csv"`: measured values.
    File(Text),
}
