//! Each quantity of each kind of subject as a recorded number.

use super::expression::{clearance, value};
use super::scene::{At, Scene, Unable};
use super::{filling, joint, restraint};
use crate::model::{Quantity, SubjectId, SubjectKind};
use crate::numeric::Recorded;

/// A quantity of a subject in a state of the world, SI; a stress as a share of yield where asked.
pub(crate) fn record(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    quantity: Quantity,
    of_yield: bool,
) -> Result<Recorded, Unable> {
    match (&scene.assembly.subject(subject).kind, quantity) {
        (SubjectKind::Gap(e) | SubjectKind::Result(e), _) => value(scene, at, e),
        (SubjectKind::Fit(fit), Quantity::Clearance) => clearance(scene, at, fit),
        (SubjectKind::Fit(fit), Quantity::Interference) => Ok(-clearance(scene, at, fit)?),
        (SubjectKind::Fit(fit), Quantity::RadialClearance) => Ok(clearance(scene, at, fit)? * 0.5),
        (SubjectKind::Fit(fit), _) => joint::quantity(scene, at, subject, fit, quantity, of_yield),
        (SubjectKind::Restraint(r), _) => {
            restraint::quantity(scene, at, subject, r, quantity, of_yield)
        }
        (SubjectKind::Fill(f), _) => filling::quantity(scene, at, subject, f, quantity, of_yield),
    }
}
