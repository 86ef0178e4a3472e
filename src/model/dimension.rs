//! Dimensions as drawn. Lengths in m, angles in rad, temperatures in K, deviations about the nominal.

use super::{ConditionId, DimensionId, PartId, Scenario};
use crate::span::Span;
use crate::units::{Defaults, Kind, Unit};
use std::sync::Arc;

/// One toleranced dimension of a part.
#[derive(Debug, Clone)]
pub struct Dimension {
    /// Its name.
    pub name: String,
    /// Where the name stands.
    pub span: Span,
    /// The part it belongs to.
    pub part: PartId,
    /// The whole line that states it.
    pub line: Span,
    /// The size with its tolerance, as written.
    pub written: String,
    /// What kind of feature it measures.
    pub form: Form,
    /// Hole or shaft, where that is known.
    pub feature: Feature,
    /// Nominal size, m or rad.
    pub nominal: f64,
    /// Lower limit deviation, m or rad.
    pub lower: f64,
    /// Upper limit deviation, m or rad.
    pub upper: f64,
    /// Where the tolerance comes from.
    pub origin: Origin,
    /// The sizes of a `one of` set; empty for every other dimension.
    pub members: Vec<f64>,
    /// Set for a geometrical tolerance, which is a contributor of zero nominal.
    pub geometric: Option<Geometric>,
    /// Temperature the size is stated at, K.
    pub reference: f64,
    /// Direction in a material that has one.
    pub direction: Direction,
    /// How it varies when a requirement asks for statistics.
    pub spread: Spread,
    /// Its coating, where that changes the size.
    pub coating: Option<Coating>,
    /// Forces along it.
    pub loads: Vec<Load>,
    /// Strains known from elsewhere.
    pub strains: Vec<Strain>,
    /// Where the number comes from.
    pub basis: Basis,
    /// The reason given.
    pub because: Option<String>,
}

impl Dimension {
    /// The unit that its size is shown in.
    pub fn unit(&self, defaults: &Defaults) -> &'static Unit {
        match self.form {
            Form::Angle => defaults.shown(Kind::ANGLE),
            Form::Diameter | Form::Radius | Form::Linear => defaults.shown(Kind::LENGTH),
        }
    }

    /// Least size at its reference temperature.
    pub fn least(&self) -> f64 {
        self.nominal + self.lower
    }

    /// Greatest size at its reference temperature.
    pub fn greatest(&self) -> f64 {
        self.nominal + self.upper
    }

    /// Middle of the limits.
    pub fn mean(&self) -> f64 {
        self.nominal + 0.5 * (self.lower + self.upper)
    }

    /// True when nothing varies in it.
    pub fn is_exact(&self) -> bool {
        self.lower == self.upper
    }
}

/// What a number measures.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Form {
    /// Across a round feature.
    Diameter,
    /// From its axis.
    Radius,
    /// Any other length.
    Linear,
    /// An angle; does not expand.
    Angle,
}

/// On which side of the material a size lies.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Feature {
    /// A hole or slot: grows when material is taken away.
    Internal,
    /// A shaft or key.
    External,
    /// Not known, and not needed.
    Unstated,
}

/// Where a tolerance comes from.
#[derive(Debug, Clone, PartialEq)]
pub enum Origin {
    /// Deviations or limits stand in the spec.
    Stated,
    /// An ISO 286 class, as written.
    Class(String),
    /// An ISO 286 class is still to be chosen; the limits are the nominal's.
    Open,
    /// A general tolerance, with its name.
    General(String),
    /// Theoretically exact.
    Exact,
    /// A set to select from at assembly.
    Set,
    /// A geometrical tolerance, with its symbol's name.
    Geometrical(&'static str),
}

/// What a geometrical tolerance depends on besides itself.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Geometric {
    /// Share of the stated tolerance that the contributor spans to each side of its middle.
    pub half: f64,
    /// The feature whose departure from maximum material adds to the tolerance.
    pub bonus: Option<DimensionId>,
}

/// Direction of a dimension in its material.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Direction {
    /// The material has none.
    None,
    /// Along the fibre, the flow, the sheet.
    Along,
    /// Across it.
    Across,
}

/// How a value varies from piece to piece.
#[derive(Debug, Clone, PartialEq)]
pub struct Spread {
    /// The shape.
    pub shape: Shape,
    /// Shift of the mean from the middle, in the unit of the value (SI).
    pub shift: f64,
    /// True where the spec says so, false where it is the default.
    pub stated: bool,
}

/// Shapes of a spread.
#[derive(Debug, Clone, PartialEq)]
pub enum Shape {
    /// Normal with the limits at ±3σ, or the σ that a capability index gives.
    Normal {
        /// Capability index, if stated.
        cpk: Option<f64>,
    },
    /// Normal with the limits at ±3σ before what lies outside them is sorted out.
    Sorted,
    /// Anything between the limits is as likely.
    Uniform,
    /// Most likely in the middle.
    Triangular,
    /// Measured values, SI, in the order of the file, and its name as written.
    Measured {
        /// The values.
        values: Arc<[f64]>,
        /// The file they come from.
        file: String,
    },
}

impl Spread {
    /// What a size has unless it says otherwise.
    pub fn default_of_sizes() -> Self {
        Spread { shape: Shape::Normal { cpk: None }, shift: 0.0, stated: false }
    }
}

/// A coating that changes a size.
#[derive(Debug, Clone, PartialEq)]
pub struct Coating {
    /// Thickness on each surface, m.
    pub thickness: Scenario,
    /// Share of the thickness that grows outward.
    pub build_up: f64,
    /// Change of the size for each unit of outward growth: +2 for the diameter of a shaft, −1 for
    /// the radius of a hole, …; 0 where the size is stated after coating.
    pub factor: f64,
    /// True where the size is that of the bare metal.
    pub before: bool,
    /// Where the clause stands.
    pub span: Span,
}

/// A force along a dimension.
#[derive(Debug, Clone, PartialEq)]
pub struct Load {
    /// Force, N; a pull is positive.
    pub force: Scenario,
    /// Area, m².
    pub area: Scenario,
    /// Where it acts; everywhere if empty.
    pub conditions: Vec<ConditionId>,
    /// Where the clause stands.
    pub span: Span,
}

/// A strain known from elsewhere.
#[derive(Debug, Clone, PartialEq)]
pub struct Strain {
    /// The strain.
    pub strain: Scenario,
    /// Where it acts; everywhere if empty.
    pub conditions: Vec<ConditionId>,
    /// Where the clause stands.
    pub span: Span,
}

/// Where a number comes from.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Basis {
    /// A drawing; the default.
    Drawing,
    /// Measurement.
    Measured,
    /// A supplier's statement.
    Supplier,
    /// A guess, which stands out in reports.
    Assumed,
}

impl Basis {
    /// The word for it.
    pub fn word(self) -> &'static str {
        match self {
            Basis::Drawing => "drawing",
            Basis::Measured => "measured",
            Basis::Supplier => "supplier",
            Basis::Assumed => "assumed",
        }
    }
}
