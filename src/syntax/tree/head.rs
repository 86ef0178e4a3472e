//! The longer statements of a file's head.

use super::{Name, Text, Tolerance};
use crate::span::Span;

/// `drawing "FW-300" rev "C"`, of the assembly or of a part.
#[derive(Debug, Clone, PartialEq)]
pub struct Drawing {
    /// The number.
    pub number: Text,
    /// The revision.
    pub revision: Option<Text>,
    /// The whole statement.
    pub span: Span,
}

/// `general …`: the tolerance of a size that states none.
#[derive(Debug, Clone, PartialEq)]
pub struct General {
    /// Which rule.
    pub kind: GeneralKind,
    /// The whole statement.
    pub span: Span,
}

/// The two rules for general tolerances.
#[derive(Debug, Clone, PartialEq)]
pub enum GeneralKind {
    /// `general ISO 2768-m`: the class as spelled, such as `m` or `mK`.
    Iso2768(Name),
    /// `general { .XX ±.010; .XXX ±.005; angle ±0.5 deg }`: by the decimals written.
    ByDecimals(Vec<DecimalRow>),
}

/// One row of `general { … }`.
#[derive(Debug, Clone, PartialEq)]
pub struct DecimalRow {
    /// Which sizes it governs.
    pub decimals: Decimals,
    /// Their tolerance.
    pub tolerance: Tolerance,
    /// The whole row.
    pub span: Span,
}

/// The first column of `general { … }`.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Decimals {
    /// `.XX`: lengths written with this many decimals (`X` alone: none).
    Length(usize),
    /// `angle`: all angles.
    Angle,
}
