//! What is asked of the parts: fits, gaps, results, restraints, fills, and named intermediates.

use super::{Expr, Group, Name, Path, Quantity, Requirement, Scalar, Spread, Term};
use crate::span::{Span, Spanned};

/// `let half = housing.depth / 2`
#[derive(Debug, Clone, PartialEq)]
pub struct Let {
    /// Its name.
    pub name: Name,
    /// What it stands for.
    pub expr: Expr,
    /// The whole statement.
    pub span: Span,
}

/// `gap end_float = housing.depth - shaft.shoulder { … }`: positive when open.
#[derive(Debug, Clone, PartialEq)]
pub struct Gap {
    /// Its name.
    pub name: Name,
    /// Its length.
    pub expr: Expr,
    /// What is required of it.
    pub requirements: Vec<Requirement>,
    /// The whole statement.
    pub span: Span,
}

/// `result tilt = atan(wedge.height / wedge.travel) { … }`: anything else that has limits.
#[derive(Debug, Clone, PartialEq)]
pub struct Outcome {
    /// Its name.
    pub name: Name,
    /// Its value.
    pub expr: Expr,
    /// What is required of it.
    pub requirements: Vec<Requirement>,
    /// The whole statement.
    pub span: Span,
}

/// `fit outer_race = bearing.outside in housing.bore { … }`
#[derive(Debug, Clone, PartialEq)]
pub struct Fit {
    /// Its name.
    pub name: Name,
    /// The side before `in`.
    pub external: Expr,
    /// The side after `in`.
    pub internal: Expr,
    /// How the parts hold each other.
    pub joint: Option<Joint>,
    /// What is required of it.
    pub requirements: Vec<Requirement>,
    /// The whole statement.
    pub span: Span,
}

/// `joint { … }`
#[derive(Debug, Clone, PartialEq)]
pub struct Joint {
    /// Its lines in the order written.
    pub lines: Vec<JointLine>,
    /// The whole block with its word.
    pub span: Span,
}

/// A line of a joint.
#[derive(Debug, Clone, PartialEq)]
pub enum JointLine {
    /// `length 20`
    Length {
        /// A size or a dimension.
        length: Operand,
        /// The whole line.
        span: Span,
    },
    /// `friction 0.12 .. 0.18`
    Friction {
        /// The coefficient.
        friction: Quantity,
        /// How it varies.
        spread: Option<Spread>,
        /// The whole line.
        span: Span,
    },
    /// `insertion clearance 0.02`: the clearance wanted when joining by heat or cold.
    InsertionClearance {
        /// How much.
        clearance: Operand,
        /// The whole line.
        span: Span,
    },
    /// `inner core` or `outer housing`: the elastic ring of a side that is a sum.
    Ring {
        /// Which side of the fit.
        side: Spanned<RingSide>,
        /// The part that carries it.
        part: Name,
        /// The whole line.
        span: Span,
    },
    /// `plate outside 60` or `bush bore bush.bore`: the far surface of a ring.
    Surface {
        /// The ring's part.
        part: Name,
        /// Which surface.
        surface: Spanned<Surface>,
        /// Its diameter: a size or a dimension.
        size: Operand,
        /// The whole line.
        span: Span,
    },
    /// `shaft solid`
    Solid {
        /// The ring's part.
        part: Name,
        /// The whole line.
        span: Span,
    },
    /// `plate Rz 6 um`
    Roughness {
        /// The ring's part.
        part: Name,
        /// The roughness Rz of its mating surface.
        rz: Group,
        /// The whole line.
        span: Span,
    },
}

/// A side of a fit, as seen from its joint.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum RingSide {
    /// `inner`: the part before `in`.
    Inner,
    /// `outer`: the part after `in`.
    Outer,
}

/// A cylindrical surface of a ring.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Surface {
    /// `bore`
    Bore,
    /// `outside`
    Outside,
}

/// A size stated on the spot, or a dimension.
#[derive(Debug, Clone, PartialEq)]
pub enum Operand {
    /// `60 ±0.1`
    Quantity(Quantity),
    /// `plate.outside`
    Dimension(Path),
}

/// `restraint clamp { … }`: parts that hold each other.
#[derive(Debug, Clone, PartialEq)]
pub struct Restraint {
    /// Its name.
    pub name: Name,
    /// What is squeezed and what is stretched.
    pub members: Vec<Member>,
    /// `preload 12 kN ±15 % at assembly`
    pub preload: Option<Preload>,
    /// `start gap NAME`: the gap that must close first.
    pub start_gap: Option<Name>,
    /// What is required of it.
    pub requirements: Vec<Requirement>,
    /// The whole statement.
    pub span: Span,
}

/// `stretched screw.grip stiffness 205 kN/mm ±8 % area 84.3 mm2`
#[derive(Debug, Clone, PartialEq)]
pub struct Member {
    /// Squeezed or stretched.
    pub role: Spanned<Role>,
    /// Its length.
    pub term: Term,
    /// The area that carries the force.
    pub area: Option<Quantity>,
    /// Its spring rate, if not that of its area.
    pub stiffness: Option<Quantity>,
    /// The whole line.
    pub span: Span,
}

/// What a restraint does to a member.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Role {
    /// `squeezed`
    Squeezed,
    /// `stretched`
    Stretched,
}

/// `preload 12 kN ±15 % at assembly`
#[derive(Debug, Clone, PartialEq)]
pub struct Preload {
    /// The force.
    pub force: Quantity,
    /// How it varies.
    pub spread: Option<Spread>,
    /// The condition it is there at.
    pub at: Name,
    /// The whole line.
    pub span: Span,
}

/// `fill oil_space { cavity …; charge … }`: a liquid or solid in a cavity.
#[derive(Debug, Clone, PartialEq)]
pub struct Fill {
    /// Its name, under which a condition may give it a temperature.
    pub name: Name,
    /// The space.
    pub cavity: Option<Cavity>,
    /// The wall around it.
    pub wall: Option<Wall>,
    /// What is in it.
    pub charge: Option<Charge>,
    /// What is required of it.
    pub requirements: Vec<Requirement>,
    /// The whole statement.
    pub span: Span,
}

/// `cavity of housing 240 cm3 ±1 %`
#[derive(Debug, Clone, PartialEq)]
pub struct Cavity {
    /// The part whose expansion it follows.
    pub part: Name,
    /// How large it is.
    pub volume: CavityVolume,
    /// The whole line.
    pub span: Span,
}

/// The size of a cavity.
#[derive(Debug, Clone, PartialEq)]
pub enum CavityVolume {
    /// `240 cm3 ±1 %`
    Stated(Quantity),
    /// `= pi/4 * body.bore^2 * body.stroke`
    Computed(Expr),
}

/// `wall bore body.bore outside body.outside`
#[derive(Debug, Clone, PartialEq)]
pub struct Wall {
    /// The diameter of the cavity.
    pub bore: Path,
    /// The diameter around the wall.
    pub outside: Path,
    /// The whole line.
    pub span: Span,
}

/// `charge hydraulic_oil 225 cm3 at fill_day`
#[derive(Debug, Clone, PartialEq)]
pub struct Charge {
    /// Its material.
    pub material: Name,
    /// How much of it.
    pub volume: Quantity,
    /// How the volume varies.
    pub spread: Option<Spread>,
    /// Where it is stated; none: at reference.
    pub at: Option<ChargeState>,
    /// The whole line.
    pub span: Span,
}

/// Where a charge's volume is stated.
#[derive(Debug, Clone, PartialEq)]
pub enum ChargeState {
    /// `at fill_day`
    Condition(Name),
    /// `at 15 degC`
    Temperature(Scalar),
}
