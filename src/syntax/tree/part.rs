//! `part`: one piece, its material and its dimensions.

use super::{Drawing, Group, Let, Name, Path, Quantity, Range, Scalar, Spread, Text, Tolerance};
use crate::span::{Span, Spanned};

/// `part housing of plate_alloy lot "A" { … }`
#[derive(Debug, Clone, PartialEq)]
pub struct Part {
    /// Its name.
    pub name: Name,
    /// What it is made of, or which part it is another piece of.
    pub origin: PartOrigin,
    /// `lot "A"`: parts of one lot share their material's scatter.
    pub lot: Option<Text>,
    /// Its drawing.
    pub drawing: Option<Drawing>,
    /// Its dimensions.
    pub dimensions: Vec<Dimension>,
    /// Its named intermediates.
    pub lets: Vec<Let>,
    /// The whole statement.
    pub span: Span,
}

/// What follows a part's name.
#[derive(Debug, Clone, PartialEq)]
pub enum PartOrigin {
    /// `of MATERIAL`
    Of(Name),
    /// `like PART`: its own piece, same drawing.
    Like(Name),
}

/// `bore = dia 42 K6 before coating 10 ±2 um because "slides"`
#[derive(Debug, Clone, PartialEq)]
pub struct Dimension {
    /// Its name.
    pub name: Name,
    /// `internal` or `external`, where coating needs to know.
    pub side: Option<Spanned<Side>>,
    /// `dia` or `radius`; none: a linear size or an angle.
    pub form: Option<Spanned<Form>>,
    /// Its size.
    pub size: Spanned<Size>,
    /// How it varies.
    pub spread: Option<Spread>,
    /// Its coating.
    pub coating: Option<Coating>,
    /// `at 23 degC`: its own reference temperature.
    pub at: Option<Group>,
    /// `along` or `across` its material's direction.
    pub direction: Option<Spanned<Direction>>,
    /// Elastic loads.
    pub loads: Vec<Load>,
    /// Strains known from elsewhere.
    pub strains: Vec<Strain>,
    /// Where the number comes from.
    pub basis: Option<Spanned<Basis>>,
    /// Why it is so.
    pub because: Option<Text>,
    /// The whole line.
    pub span: Span,
}

/// Which surface of the part a size measures.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Side {
    /// `internal`: a hole, a slot.
    Internal,
    /// `external`: a shaft, a tongue.
    External,
}

/// What a size measures.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Form {
    /// `dia`, `Ø`
    Diameter,
    /// `radius`
    Radius,
}

/// The size of a dimension.
#[derive(Debug, Clone, PartialEq)]
pub enum Size {
    /// `58`: takes the general tolerance.
    General(Scalar),
    /// `58 exact`: theoretically exact.
    Exact(Scalar),
    /// `58 ±0.05`, `58 +0.05/-0.02`, `30 deg ±0.5`
    Toleranced(Scalar, Tolerance),
    /// `58.00 .. 58.05`
    Limits(Range),
    /// `42 K6`: an ISO 286 class, as spelled without blanks.
    Class(Scalar, Name),
    /// `42 ?`: a class left open; the span is the mark's.
    OpenClass(Scalar, Span),
    /// `one of 0.10, 0.15, 0.20 ±0.005`
    OneOf(Vec<Scalar>, Option<Tolerance>),
    /// `position dia 0.2 at MMC of bore`
    Geometrical(Geometrical),
}

/// A geometrical tolerance as a contributor of zero nominal.
#[derive(Debug, Clone, PartialEq)]
pub struct Geometrical {
    /// Which one.
    pub kind: Spanned<GeometricalKind>,
    /// The word `dia`: a cylindrical zone.
    pub diametral: Option<Span>,
    /// The width or diameter of the zone.
    pub zone: Scalar,
    /// `at MMC of feature`
    pub modifier: Option<Modifier>,
}

/// The geometrical characteristics of ISO 1101.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum GeometricalKind {
    /// `straightness`
    Straightness,
    /// `flatness`
    Flatness,
    /// `roundness`
    Roundness,
    /// `cylindricity`
    Cylindricity,
    /// `profile`
    Profile,
    /// `parallelism`
    Parallelism,
    /// `perpendicularity`
    Perpendicularity,
    /// `angularity`
    Angularity,
    /// `position`
    Position,
    /// `concentricity`
    Concentricity,
    /// `symmetry`
    Symmetry,
    /// `runout`
    Runout,
    /// `total runout`
    TotalRunout,
}

/// `at MMC of feature`: the zone grows as the feature leaves that size.
#[derive(Debug, Clone, PartialEq)]
pub struct Modifier {
    /// Which limit of size.
    pub condition: Spanned<MaterialCondition>,
    /// The feature of size.
    pub feature: Path,
    /// The whole clause.
    pub span: Span,
}

/// A limit of size in terms of material.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum MaterialCondition {
    /// `MMC`: maximum material condition.
    Maximum,
    /// `LMC`: least material condition.
    Least,
}

/// `before coating 10 ±2 um build-up 50 % on both sides`
#[derive(Debug, Clone, PartialEq)]
pub struct Coating {
    /// Whether the size is the base metal's.
    pub order: Spanned<CoatingOrder>,
    /// Thickness on each surface.
    pub thickness: Quantity,
    /// The share that grows outward.
    pub build_up: Option<Scalar>,
    /// For a linear size: how many faces are coated.
    pub sides: Option<Spanned<Sides>>,
    /// The whole clause.
    pub span: Span,
}

/// Whether a size is stated before or after coating.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum CoatingOrder {
    /// `before`
    Before,
    /// `after`
    After,
}

/// How many faces of a linear size are coated.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Sides {
    /// `on one side`
    One,
    /// `on both sides`
    Both,
}

/// A direction in a direction-dependent material.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Direction {
    /// `along`
    Along,
    /// `across`
    Across,
}

/// `load -12 kN over 350 mm2 at hot, cold`; a pull is positive.
#[derive(Debug, Clone, PartialEq)]
pub struct Load {
    /// The force.
    pub force: Quantity,
    /// How it varies.
    pub spread: Option<Spread>,
    /// The area that carries it.
    pub area: Quantity,
    /// The conditions it acts at; empty: all.
    pub at: Vec<Name>,
    /// The whole clause.
    pub span: Span,
}

/// `strain 0.09 % ±0.01 at spinning`
#[derive(Debug, Clone, PartialEq)]
pub struct Strain {
    /// How much.
    pub strain: Quantity,
    /// The conditions it is there at; empty: all.
    pub at: Vec<Name>,
    /// The whole clause.
    pub span: Span,
}

/// Where a number comes from.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Basis {
    /// `drawing`
    Drawing,
    /// `measured`
    Measured,
    /// `supplier`
    Supplier,
    /// `assumed`
    Assumed,
}
