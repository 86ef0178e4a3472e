//! Elastic data of a part at its temperature. Pa, kg/m³.

use super::outcome::Property as Named;
use super::scene::{Scene, Unable};
use crate::materials::{Material, Property};
use crate::model::{PartId, Unknown};
use crate::numeric::{Number, Recorded};

/// Young's modulus at a temperature, with the scatter of the part's lot.
pub(crate) fn modulus(
    scene: &Scene<'_>,
    part: PartId,
    temperature: Recorded,
) -> Result<Recorded, Unable> {
    let property = stated(scene, part, Named::Modulus)?;
    let value = temperature.apply(&property.curve);
    if property.scatter == 0.0 {
        return Ok(value);
    }
    let lot = scene.assembly.part(part).lot;
    let w = scene.unknown(Unknown::ModulusScatter(lot));
    Ok(value * (w * property.scatter + 1.0))
}

fn stated<'a>(scene: &Scene<'a>, part: PartId, which: Named) -> Result<&'a Property, Unable> {
    of_material(&scene.assembly.part(part).material, which).ok_or(Unable::Missing(part, which))
}

/// The data of a property, where a material has them.
pub(crate) fn of_material(material: &Material, which: Named) -> Option<&Property> {
    match which {
        Named::Modulus => material.modulus.as_ref(),
        Named::Poisson => material.poisson.as_ref(),
        Named::Yield => material.yield_strength.as_ref(),
        Named::Density => material.density.as_ref(),
        Named::BulkModulus => material.bulk_modulus.as_ref(),
    }
}

/// A property without scatter of its own at a temperature.
pub(crate) fn property(
    scene: &Scene<'_>,
    part: PartId,
    which: Named,
    temperature: Recorded,
) -> Result<Recorded, Unable> {
    Ok(temperature.apply(&stated(scene, part, which)?.curve))
}
