//! Quantities of joints under pressure.

use super::scene::{At, Scene, Unable};
use crate::model::{DimensionId, Fit, Joint, Quantity, SubjectId};
use crate::numeric::Recorded;

pub(crate) fn quantities(_joint: &Joint) -> Vec<Quantity> {
    vec![Quantity::Clearance]
}

pub(crate) fn after(
    _scene: &Scene<'_>,
    _at: At,
    _dimension: DimensionId,
    _fit: SubjectId,
) -> Result<Recorded, Unable> {
    Err(Unable::BeyondData)
}

pub(crate) fn quantity(
    _scene: &Scene<'_>,
    _at: At,
    _subject: SubjectId,
    _fit: &Fit,
    _quantity: Quantity,
    _of_yield: bool,
) -> Result<Recorded, Unable> {
    Err(Unable::BeyondData)
}
