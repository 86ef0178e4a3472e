//! Elastic data of a part at its temperature. Pa, kg/m³.

use super::outcome::Property as Named;
use super::scene::{At, Scene, Unable};
use super::temperature;
use crate::materials::{Material, Property};
use crate::model::{Datum, Owner, PartId, Unknown};
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

/// A stress as it is asked for: in Pa, or as a share of the part's yield strength at its temperature.
pub(crate) fn shown(
    scene: &Scene<'_>,
    at: At,
    part: PartId,
    stress: Recorded,
    of_yield: bool,
) -> Result<Recorded, Unable> {
    if !of_yield {
        return Ok(stress);
    }
    let t = temperature::of(scene, at, Owner::Part(part));
    Ok(stress / property(scene, part, Datum::Yield, t)?)
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
