//! The tree of a `.gap` file: what was written, statement by statement, with its places.
//!
//! Plain data. Every name, number, unit and statement keeps its span and its spelling; nothing here
//! knows what a unit, a class or a name means. A unit belongs to the number it was written after:
//! how far it governs (the unit-scope rule) is for `resolve` to say.
//!
//! Numbers are finite, and expressions are never deeper than [`MAX_DEPTH`] nor a sum or product
//! longer than [`MAX_TERMS`], so that a reader of the tree may recurse.

pub mod condition;
pub mod expression;
pub mod head;
pub mod material;
pub mod part;
pub mod quantity;
pub mod requirement;
pub mod response;

pub use condition::{Condition, Override, OwnTemperature, Sense, Speed, ThermalState};
pub use expression::{Count, Expr, ExprKind, Operator, Path, Term};
pub use head::{DecimalRow, Decimals, Drawing, General, GeneralKind};
pub use material::{
    Material, Property, PropertyKind, PropertyValue, Row, RowKey, Table, TableForm,
};
pub use part::{
    Basis, Coating, CoatingOrder, Dimension, Direction, Form, Geometrical, GeometricalKind, Load,
    MaterialCondition, Modifier, Part, PartOrigin, Side, Sides, Size, Strain,
};
pub use quantity::{
    Deviation, Distribution, Group, Number, Quantity, Range, Scalar, Spread, Tolerance, Unit,
};
pub use requirement::{Bound, Concession, Conditions, Limit, Measure, Method, Requirement};
pub use response::{
    Cavity, CavityVolume, Charge, ChargeState, Fill, Fit, Gap, Joint, JointLine, Let, Member,
    Operand, Outcome, Preload, Restraint, RingSide, Role, Surface, Wall,
};

use crate::span::{Span, Spanned};

/// Deepest nesting of blocks, and of parentheses and calls in an expression.
pub const MAX_DEPTH: usize = 64;

/// Most terms of one sum or factors of one product.
pub const MAX_TERMS: usize = 1000;

/// A name as spelled.
pub type Name = Spanned<String>;

/// The content of a string, escapes undone; the span includes the quotes.
pub type Text = Spanned<String>;

/// One file.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct File {
    /// The statements that could be read, in the order written.
    pub statements: Vec<Statement>,
    /// Every comment, in the order written.
    pub comments: Vec<Comment>,
    /// What could not be read; each has a diagnostic of its own.
    pub broken: Vec<Broken>,
}

/// A file-level statement.
#[derive(Debug, Clone, PartialEq)]
pub enum Statement {
    /// `assembly "Filter wheel spindle"`
    Assembly(Assembly),
    /// `drawing "FW-300" rev "C"`
    Drawing(Drawing),
    /// `lengths in mm`
    Lengths(DefaultUnit),
    /// `temperatures in degC`
    Temperatures(DefaultUnit),
    /// `reference 20 degC`
    Reference(Reference),
    /// `general ISO 2768-m`
    General(General),
    /// `use "materials.yaml"`
    Use(Use),
    /// `note "first issue"`
    Note(Note),
    /// `condition hot 85 ±3 { shaft 97 }`
    Condition(Condition),
    /// `material plate_alloy like aluminium_6061_t6 { … }`
    Material(Material),
    /// `part housing of plate_alloy { … }`
    Part(Part),
    /// `fit outer_race = bearing.outside in housing.bore { … }`
    Fit(Fit),
    /// `gap end_float = housing.depth - shaft.shoulder { … }`
    Gap(Gap),
    /// `result tilt = atan(wedge.height / wedge.travel) { … }`
    Result(Outcome),
    /// `let half = housing.depth / 2`
    Let(Let),
    /// `restraint clamp { … }`
    Restraint(Restraint),
    /// `fill reservoir { … }`
    Fill(Box<Fill>),
}

impl Statement {
    /// The whole statement, its block included.
    pub fn span(&self) -> Span {
        match self {
            Statement::Assembly(s) => s.span,
            Statement::Drawing(s) => s.span,
            Statement::Lengths(s) | Statement::Temperatures(s) => s.span,
            Statement::Reference(s) => s.span,
            Statement::General(s) => s.span,
            Statement::Use(s) => s.span,
            Statement::Note(s) => s.span,
            Statement::Condition(s) => s.span,
            Statement::Material(s) => s.span,
            Statement::Part(s) => s.span,
            Statement::Fit(s) => s.span,
            Statement::Gap(s) => s.span,
            Statement::Result(s) => s.span,
            Statement::Let(s) => s.span,
            Statement::Restraint(s) => s.span,
            Statement::Fill(s) => s.span,
        }
    }
}

/// `assembly "title"`: names what the file checks.
#[derive(Debug, Clone, PartialEq)]
pub struct Assembly {
    /// The title.
    pub title: Text,
    /// The whole statement.
    pub span: Span,
}

/// `lengths in mm` or `temperatures in degC`: the unit of a bare number.
#[derive(Debug, Clone, PartialEq)]
pub struct DefaultUnit {
    /// The unit as spelled.
    pub unit: Unit,
    /// The whole statement.
    pub span: Span,
}

/// `reference 20 degC`: where every size is stated.
#[derive(Debug, Clone, PartialEq)]
pub struct Reference {
    /// The temperature.
    pub temperature: Group,
    /// The whole statement.
    pub span: Span,
}

/// `use "file"`: another file whose statements count as written here.
#[derive(Debug, Clone, PartialEq)]
pub struct Use {
    /// The path as written.
    pub path: Text,
    /// The whole statement.
    pub span: Span,
}

/// `note "…"`: words that go into the report.
#[derive(Debug, Clone, PartialEq)]
pub struct Note {
    /// The words.
    pub text: Text,
    /// The whole statement.
    pub span: Span,
}

/// A comment.
#[derive(Debug, Clone, PartialEq)]
pub struct Comment {
    /// The comment as written, from its `#`, without blanks at its end.
    pub text: String,
    /// True when nothing but blanks stands before it on its line.
    pub own_line: bool,
    /// Where it stands.
    pub span: Span,
}

/// A statement that could not be read.
///
/// A name that it would have defined is kept, so that its users are not reported as mistakes too.
#[derive(Debug, Clone, PartialEq)]
pub struct Broken {
    /// The name it seems to define.
    pub name: Option<Name>,
    /// The name of the statement whose block it stands in, such as a part's.
    pub within: Option<Name>,
    /// The broken statement, with its block if its header is what broke.
    pub span: Span,
}
