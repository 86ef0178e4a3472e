//! Quantities of restraints and fills.

use super::scene::{At, Scene, Unable};
use crate::model::{Fill, Quantity, Restraint, SubjectId};
use crate::numeric::Recorded;

pub(crate) fn quantities(_restraint: &Restraint) -> Vec<Quantity> {
    Vec::new()
}

pub(crate) fn quantity(
    _scene: &Scene<'_>,
    _at: At,
    _subject: SubjectId,
    _restraint: &Restraint,
    _quantity: Quantity,
    _of_yield: bool,
) -> Result<Recorded, Unable> {
    Err(Unable::BeyondData)
}

pub(crate) fn ullage(
    _scene: &Scene<'_>,
    _at: At,
    _subject: SubjectId,
    _fill: &Fill,
) -> Result<Recorded, Unable> {
    Err(Unable::BeyondData)
}
