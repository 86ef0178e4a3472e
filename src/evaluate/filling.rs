//! Quantities of a filled cavity.

use super::expression::value;
use super::scene::{At, Scene, Unable};
use super::size::strain_of_lot;
use super::{elastic, temperature};
use crate::materials::{Expansion, Expansions};
use crate::mechanics::ring::Ring;
use crate::mechanics::{expansion, filling as formulas};
use crate::model::{
    Charge, Datum, Direction, Fill, Owner, PartId, Quantity, SubjectId, Unknown, Wall,
};
use crate::numeric::{Number, Recorded};

/// What a report shows of a fill.
pub(crate) fn quantities(fill: &Fill) -> Vec<Quantity> {
    let mut list = vec![Quantity::Ullage];
    if fill.material.bulk_modulus.is_some() {
        list.push(Quantity::Pressure);
        list.extend(fill.wall.as_ref().map(|_| Quantity::Stress(fill.cavity_of)));
    }
    list
}

/// Free share of the cavity, the pressure of a liquid that has no room left, or the stress that it
/// brings into the wall.
pub(crate) fn quantity(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    fill: &Fill,
    quantity: Quantity,
    of_yield: bool,
) -> Result<Recorded, Unable> {
    let cavity = cavity(scene, at, subject, fill)?;
    let t = temperature::of(scene, at, Owner::Fill(subject));
    scene.fill_within_data(at, subject)?;
    let liquid = charge(scene, at, subject, fill, t.clone());
    let Some(modulus) = &fill.material.bulk_modulus else {
        return Ok(formulas::ullage(liquid, cavity));
    };
    if !matches!(quantity, Quantity::Pressure | Quantity::Stress(_)) {
        return Ok(formulas::ullage(liquid, cavity));
    }
    let wall = fill.wall.as_ref().map(|w| wall(scene, at, fill.cavity_of, w)).transpose()?;
    // A cavity that does not give way: the true pressure is at most this.
    let rigid = Recorded::exact(0.0);
    let gives = wall.as_ref().map_or(rigid, formulas::closed_cylinder_compliance);
    // As a ratio, one where there is room left, it is exactly nothing then.
    let one = Recorded::exact(1.0);
    let full = (liquid / cavity).max(one.clone());
    let modulus = elastic::scattered(scene, modulus, Unknown::BulkScatter(subject), t);
    let pressure = formulas::full_pressure(full, one, modulus, gives);
    match (quantity, wall) {
        (Quantity::Stress(part), Some(wall)) => {
            let stress = formulas::closed_cylinder_von_mises(&wall, pressure);
            elastic::shown(scene, at, part, stress, of_yield)
        }
        _ => Ok(pressure),
    }
}

/// The wall of a cavity with its elastic data at its temperature. Only the ratio of its diameters
/// enters, so that they are taken at reference.
fn wall(scene: &Scene<'_>, at: At, part: PartId, wall: &Wall) -> Result<Ring<Recorded>, Unable> {
    scene.within_data(at, part)?;
    let t = temperature::of(scene, at, Owner::Part(part));
    Ok(Ring {
        bore: Some(value(scene, At::Reference, &wall.bore)? * 0.5),
        outside: value(scene, At::Reference, &wall.outside)? * 0.5,
        modulus: elastic::modulus(scene, part, t.clone())?,
        poisson: elastic::property(scene, part, Datum::Poisson, t)?,
        spin: Recorded::exact(0.0),
    })
}

/// Free volume of the cavity, m³.
fn cavity(scene: &Scene<'_>, at: At, subject: SubjectId, fill: &Fill) -> Result<Recorded, Unable> {
    if let Some(volume) = &fill.volume {
        return value(scene, at, volume);
    }
    scene.within_data(at, fill.cavity_of)?;
    let part = scene.assembly.part(fill.cavity_of);
    let t = temperature::of(scene, at, Owner::Part(fill.cavity_of));
    let scatter = Unknown::ExpansionScatter(part.lot);
    let strain = strain_of_lot(scene, scatter, &part.material, Direction::None, t);
    Ok(scene.unknown(Unknown::Cavity(subject)) * expansion::volume_ratio(strain))
}

/// Volume of the charge at a temperature, m³.
fn charge(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    fill: &Fill,
    temperature: Recorded,
) -> Recorded {
    let stated = scene.unknown(Unknown::Charge(subject));
    let then = match fill.charged_at {
        Charge::Reference => Recorded::exact(scene.assembly.reference),
        Charge::At(t) => Recorded::exact(t),
        // Where it was measured it is what was measured.
        Charge::Condition(c) if at == At::Condition(c) => return stated,
        Charge::Condition(c) => temperature::of(scene, At::Condition(c), Owner::Fill(subject)),
    };
    let scatter = Unknown::FillScatter(subject);
    let grown = |t: Recorded| {
        let strain = strain_of_lot(scene, scatter, &fill.material, Direction::None, t);
        match &fill.material.expansion {
            Expansions::Volume(Expansion { .. }) => strain + 1.0,
            Expansions::Isotropic(_) | Expansions::Directional { .. } => {
                expansion::volume_ratio(strain)
            }
        }
    };
    stated * (grown(temperature) / grown(then))
}
