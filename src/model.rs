//! The resolved assembly: complete, in SI, finite, without an unresolved name.
//!
//! Types only, and the few look-ups that belong to them; each item keeps the span it was written at,
//! so that a finding can point there. Knows nothing of the syntax tree. Items name each other by
//! index ([`PartId`], [`DimensionId`], …) into the lists of [`Assembly`].

pub mod condition;
pub mod dimension;
pub mod expression;
pub mod joint;
pub mod requirement;
pub mod unknown;

use crate::materials::Material;
use crate::span::{FileId, Span};
use crate::units::Defaults;
pub use condition::{Condition, History, OwnTemperature, Owner, State, Thermal};
pub use dimension::{
    Basis, Coating, Dimension, Direction, Feature, Form, Geometric, Load, Origin, Spread, Strain,
};
pub use expression::{Binary, Expr, ExprKind, Function};
pub use joint::{Charge, Fill, Hold, Joint, Member, Restraint, Ring, Start, Wall};
pub use requirement::{Concession, Limit, Method, Quantity, Requirement};
use std::sync::Arc;
pub use unknown::{Datum, Scenario, Unknown};

macro_rules! ids {
    ($($(#[$doc:meta])* $name:ident,)*) => {$(
        $(#[$doc])*
        #[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub struct $name(pub u32);

        impl $name {
            /// As an index into the list it names an item of.
            pub fn index(self) -> usize {
                self.0 as usize
            }
        }
    )*};
}

ids! {
    /// Names a condition.
    ConditionId,
    /// Names a part.
    PartId,
    /// Names a dimension of some part.
    DimensionId,
    /// Names a fit, gap, result, restraint or fill.
    SubjectId,
    /// Names a lot of material: what shares its scatter.
    LotId,
}

/// Everything one `.gap` file and the files it uses say.
#[derive(Debug, Clone)]
pub struct Assembly {
    /// The file with the `assembly` line.
    pub file: FileId,
    /// The words after `assembly`.
    pub title: String,
    /// Where the title stands.
    pub span: Span,
    /// Drawing number, if stated.
    pub drawing: Option<Drawing>,
    /// Units of bare numbers, and of what is reported.
    pub defaults: Defaults,
    /// Temperature the sizes are stated at, K.
    pub reference: f64,
    /// Free remarks, in order.
    pub notes: Vec<String>,
    /// Thermal states, in order.
    pub conditions: Vec<Condition>,
    /// Lots of material, in order of first use.
    pub lots: Vec<Lot>,
    /// Parts, in order.
    pub parts: Vec<Part>,
    /// Dimensions of all parts, in order.
    pub dimensions: Vec<Dimension>,
    /// Fits, gaps, results, restraints and fills, in order.
    pub subjects: Vec<Subject>,
    /// Requirements of all subjects, in order.
    pub requirements: Vec<Requirement>,
}

/// A drawing number with its revision.
#[derive(Debug, Clone, PartialEq)]
pub struct Drawing {
    /// The number.
    pub number: String,
    /// The revision.
    pub revision: String,
    /// Where it stands.
    pub span: Span,
}

/// Pieces that came from one melt, bar or batch: one unknown each for the scatter of expansion,
/// modulus and swelling.
#[derive(Debug, Clone)]
pub struct Lot {
    /// The name after `lot`, or that of the only part.
    pub name: String,
    /// True where the name is that after `lot`; a part may be called the same.
    pub stated: bool,
    /// What it is made of.
    pub material: Arc<Material>,
}

/// One part of the assembly.
#[derive(Debug, Clone)]
pub struct Part {
    /// Its name.
    pub name: String,
    /// Where the name stands.
    pub span: Span,
    /// What it is made of.
    pub material: Arc<Material>,
    /// Where the material is named.
    pub material_span: Span,
    /// The lot it came from.
    pub lot: LotId,
    /// Its own drawing, if stated.
    pub drawing: Option<Drawing>,
    /// Its dimensions.
    pub dimensions: Vec<DimensionId>,
    /// The part it is drawn like, if any.
    pub like: Option<PartId>,
}

/// Something that is computed at every condition.
#[derive(Debug, Clone)]
pub struct Subject {
    /// Its name.
    pub name: String,
    /// Where the name stands.
    pub span: Span,
    /// What it is.
    pub kind: SubjectKind,
}

/// The kinds of subject.
#[derive(Debug, Clone)]
pub enum SubjectKind {
    /// An external feature in an internal one.
    Fit(Box<Fit>),
    /// A length that is positive when open.
    Gap(Arc<Expr>),
    /// Anything else that has limits.
    Result(Arc<Expr>),
    /// Parts that hold each other.
    Restraint(Box<Restraint>),
    /// A liquid or solid in a cavity.
    Fill(Box<Fill>),
}

/// An external feature in an internal one.
#[derive(Debug, Clone)]
pub struct Fit {
    /// Size of the external feature (the shaft): a diameter, or a width between flats.
    pub external: Arc<Expr>,
    /// Size of the internal feature (the hole).
    pub internal: Arc<Expr>,
    /// True for round features, so that a clearance is diametral.
    pub round: bool,
    /// What makes it a joint under pressure, if stated.
    pub joint: Option<Joint>,
}

impl Assembly {
    /// The part of that index.
    pub fn part(&self, id: PartId) -> &Part {
        &self.parts[id.index()]
    }

    /// The dimension of that index.
    pub fn dimension(&self, id: DimensionId) -> &Dimension {
        &self.dimensions[id.index()]
    }

    /// The condition of that index.
    pub fn condition(&self, id: ConditionId) -> &Condition {
        &self.conditions[id.index()]
    }

    /// The subject of that index.
    pub fn subject(&self, id: SubjectId) -> &Subject {
        &self.subjects[id.index()]
    }

    /// What a part or a charge is made of.
    pub fn material_of(&self, owner: Owner) -> Option<&Arc<Material>> {
        match owner {
            Owner::Part(part) => Some(&self.part(part).material),
            Owner::Fill(fill) => match &self.subject(fill).kind {
                SubjectKind::Fill(fill) => Some(&fill.material),
                _ => None,
            },
        }
    }

    /// The fit of that index, if the subject is one.
    pub fn fit(&self, id: SubjectId) -> Option<&Fit> {
        match &self.subject(id).kind {
            SubjectKind::Fit(fit) => Some(fit),
            _ => None,
        }
    }

    /// `part.dimension`, as a spec writes it.
    pub fn path(&self, id: DimensionId) -> String {
        let dimension = self.dimension(id);
        format!("{}.{}", self.part(dimension.part).name, dimension.name)
    }

    /// All conditions by index.
    pub fn condition_ids(&self) -> impl Iterator<Item = ConditionId> + use<> {
        (0..self.conditions.len() as u32).map(ConditionId)
    }

    /// All subjects by index.
    pub fn subject_ids(&self) -> impl Iterator<Item = SubjectId> + use<> {
        (0..self.subjects.len() as u32).map(SubjectId)
    }
}
