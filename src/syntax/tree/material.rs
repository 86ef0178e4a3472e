//! `material`: expansion, stiffness and strength of what parts are made of.

use super::{Direction, Group, Name, Quantity, Range, Scalar, Spread, Text, Tolerance, Unit};
use crate::span::{Span, Spanned};

/// `material plate_alloy like aluminium_6061_t6 { … }`
#[derive(Debug, Clone, PartialEq)]
pub struct Material {
    /// Its name.
    pub name: Name,
    /// The material it starts from.
    pub like: Option<Name>,
    /// Its properties in the order written.
    pub properties: Vec<Property>,
    /// `over -60 .. 150 degC` on its own: where all properties hold.
    pub over: Option<Range>,
    /// `source "…"` lines.
    pub sources: Vec<Text>,
    /// The word `extrapolate`, if it stands.
    pub extrapolate: Option<Span>,
    /// The whole statement.
    pub span: Span,
}

/// `cte along 12 ±1 ppm/K over -60 .. 150 degC`
#[derive(Debug, Clone, PartialEq)]
pub struct Property {
    /// Which one.
    pub kind: Spanned<PropertyKind>,
    /// `along` or `across`, in a direction-dependent material.
    pub direction: Option<Spanned<Direction>>,
    /// Its value.
    pub value: PropertyValue,
    /// The temperatures it holds over.
    pub over: Option<Range>,
    /// How it varies.
    pub spread: Option<Spread>,
    /// The whole line, its table included.
    pub span: Span,
}

/// The properties a material may state.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum PropertyKind {
    /// `cte`
    Cte,
    /// `expansion`: ΔL/L
    Expansion,
    /// `modulus`: Young's
    Modulus,
    /// `bulk modulus`
    BulkModulus,
    /// `poisson`
    Poisson,
    /// `yield`
    Yield,
    /// `density`
    Density,
    /// `limit`: highest temperature allowed
    Limit,
    /// `swell`: free strain from moisture
    Swell,
}

/// A constant or a table.
#[derive(Debug, Clone, PartialEq)]
pub enum PropertyValue {
    /// `69 GPa ±2 %`
    Constant(Quantity),
    /// `mean from 20 degC, ppm/K { 100 11.5; 200 12.1 }`
    Table(Table),
}

/// A property at several temperatures, or for several moistures.
#[derive(Debug, Clone, PartialEq)]
pub struct Table {
    /// What the values of a `cte` mean.
    pub form: TableForm,
    /// A tolerance common to all rows.
    pub tolerance: Option<Tolerance>,
    /// The unit of values that state none.
    pub unit: Option<Unit>,
    /// The rows as written.
    pub rows: Vec<Row>,
}

/// What the values of a table are.
#[derive(Debug, Clone, PartialEq)]
pub enum TableForm {
    /// The property at each temperature, or for each state.
    Plain,
    /// `mean from 20 degC`: mean coefficients from that base.
    MeanFrom(Scalar),
    /// `instantaneous`: the slope at each temperature.
    Instantaneous(Span),
}

/// `-196 degC -4150 ppm`, `wet 0.8 % ±0.15`
#[derive(Debug, Clone, PartialEq)]
pub struct Row {
    /// The first column.
    pub key: RowKey,
    /// The second column.
    pub value: Group,
    /// The whole row.
    pub span: Span,
}

/// The first column of a table.
#[derive(Debug, Clone, PartialEq)]
pub enum RowKey {
    /// A temperature.
    Temperature(Scalar),
    /// A moisture.
    State(Name),
}
