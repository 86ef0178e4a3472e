//! Parts that press, hold or enclose: joints, restraints, fillings. SI throughout.

use super::{ConditionId, Expr, PartId, Scenario, SubjectId};
use crate::materials::Material;
use crate::span::Span;
use std::sync::Arc;

/// What makes a fit a joint under pressure.
#[derive(Debug, Clone)]
pub struct Joint {
    /// Where the block stands.
    pub span: Span,
    /// Length of contact.
    pub length: Arc<Expr>,
    /// The ring inside.
    pub inner: Ring,
    /// The ring outside.
    pub outer: Ring,
    /// Coefficient of friction.
    pub friction: Option<Scenario>,
    /// Clearance wanted while joining, m; a thousandth of the diameter if not stated.
    pub insertion_clearance: Option<Scenario>,
}

/// One ring of a joint.
#[derive(Debug, Clone)]
pub struct Ring {
    /// The part it is.
    pub part: PartId,
    /// The diameter that is not in contact: the bore of the inner ring (absent when solid), the
    /// outside of the outer one.
    pub free: Option<Arc<Expr>>,
    /// Roughness Rz of the contact surface, m.
    pub roughness: Option<f64>,
}

/// Parts that hold each other.
#[derive(Debug, Clone)]
pub struct Restraint {
    /// The members, in order.
    pub members: Vec<Member>,
    /// What the force starts from.
    pub start: Start,
}

/// Which side of a restraint a member is on.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Hold {
    /// Shortened by the force.
    Squeezed,
    /// Lengthened by it.
    Stretched,
}

/// One member of a restraint.
#[derive(Debug, Clone)]
pub struct Member {
    /// Which side it is on.
    pub hold: Hold,
    /// The part it is.
    pub part: PartId,
    /// Its free length at temperature.
    pub length: Arc<Expr>,
    /// Area for stress, and for the spring if no stiffness is stated; m².
    pub area: Option<Scenario>,
    /// Stiffness, N/m.
    pub stiffness: Option<Scenario>,
    /// Where it stands.
    pub span: Span,
}

/// What a restraint's force starts from.
#[derive(Debug, Clone)]
pub enum Start {
    /// The misfit of the free lengths alone.
    Misfit,
    /// A force known at a condition.
    Preload {
        /// The force, N.
        force: Scenario,
        /// Where it is known.
        condition: ConditionId,
    },
    /// Nothing is held until that gap closes.
    Gap(SubjectId),
}

/// A liquid or solid in a cavity.
#[derive(Debug, Clone)]
pub struct Fill {
    /// The part around it.
    pub cavity_of: PartId,
    /// Its volume as an expression, or `None` where it is stated as a number.
    pub volume: Option<Arc<Expr>>,
    /// Its volume as a number, at reference, m³.
    pub stated: Option<Scenario>,
    /// The wall around it; none where it is taken as rigid.
    pub wall: Option<Wall>,
    /// What is in it.
    pub material: Arc<Material>,
    /// How much, m³.
    pub charge: Scenario,
    /// At what temperature that volume was measured.
    pub charged_at: Charge,
    /// Where the charge stands.
    pub span: Span,
    /// Conditions at which the spec limits its pressure, or the stress that it brings into the wall:
    /// there it may be full.
    pub may_be_full: Vec<ConditionId>,
}

/// The wall of a round cavity: a closed cylinder of its part.
#[derive(Debug, Clone)]
pub struct Wall {
    /// Its inner diameter.
    pub bore: Arc<Expr>,
    /// Its outer diameter.
    pub outside: Arc<Expr>,
    /// Where it stands.
    pub span: Span,
}

/// Where a charge was measured.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Charge {
    /// At the file's reference temperature.
    Reference,
    /// At a temperature, K.
    At(f64),
    /// At a condition, with the temperature the fill has there.
    Condition(ConditionId),
}

impl Restraint {
    /// The gap it starts from, if any.
    pub fn start_gap(&self) -> Option<SubjectId> {
        match self.start {
            Start::Gap(gap) => Some(gap),
            _ => None,
        }
    }
}
