//! Elastic data of a part at its temperature. Pa, kg/m³.

use super::outcome::Property as Named;
use super::scene::{Scene, Unable};
use crate::materials::{Material, Property};
use crate::model::{Datum, PartId, Unknown};
use crate::numeric::{Number, Recorded};

/// Young's modulus at a temperature, with the scatter of the part's lot.
pub(crate) fn modulus(
    scene: &Scene<'_>,
    part: PartId,
    temperature: Recorded,
) -> Result<Recorded, Unable> {
    let property = stated(scene, part, Named::Modulus)?;
    let lot = scene.assembly.part(part).lot;
    Ok(scattered(scene, property, Unknown::ModulusScatter(lot), temperature))
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

/// Another property than the modulus at a temperature, with the scatter of the part's lot.
pub(crate) fn property(
    scene: &Scene<'_>,
    part: PartId,
    which: Datum,
    temperature: Recorded,
) -> Result<Recorded, Unable> {
    let named = match which {
        Datum::Poisson => Named::Poisson,
        Datum::Yield => Named::Yield,
        Datum::Density => Named::Density,
    };
    let property = stated(scene, part, named)?;
    let lot = scene.assembly.part(part).lot;
    Ok(scattered(scene, property, Unknown::DataScatter(lot, which), temperature))
}

/// A property at a temperature, with a scatter of its own.
pub(crate) fn scattered(
    scene: &Scene<'_>,
    property: &Property,
    scatter: Unknown,
    temperature: Recorded,
) -> Recorded {
    let value = temperature.apply(&property.curve);
    if property.scatter == 0.0 {
        return value;
    }
    value * (scene.unknown(scatter) * property.scatter + 1.0)
}
