//! Quantities of a filled cavity.

use super::expression::value;
use super::scene::{At, Scene, Unable};
use super::size::strain_of_lot;
use super::temperature;
use crate::materials::{Expansion, Expansions};
use crate::mechanics::{expansion, filling as formulas};
use crate::model::{Charge, Direction, Fill, Owner, Quantity, SubjectId, Unknown};
use crate::numeric::{Number, Recorded};

/// What a report shows of a fill.
pub(crate) fn quantities(fill: &Fill) -> Vec<Quantity> {
    let mut list = vec![Quantity::Ullage];
    if fill.material.bulk_modulus.is_some() {
        list.push(Quantity::Pressure);
    }
    list
}

/// Free share of the cavity, or the pressure of a liquid that has no room left.
pub(crate) fn quantity(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    fill: &Fill,
    quantity: Quantity,
) -> Result<Recorded, Unable> {
    let cavity = cavity(scene, at, subject, fill)?;
    let t = temperature::of(scene, at, Owner::Fill(subject));
    scene.fill_within_data(at, subject)?;
    let liquid = charge(scene, at, subject, fill, t.clone());
    match (&fill.material.bulk_modulus, quantity) {
        (Some(modulus), Quantity::Pressure) => {
            // A cavity that does not give way: the true pressure is at most this.
            let rigid = Recorded::exact(0.0);
            // As a ratio, one where there is room left, it is exactly nothing then.
            let one = Recorded::exact(1.0);
            let full = (liquid / cavity).max(one.clone());
            Ok(formulas::full_pressure(full, one, t.apply(&modulus.curve), rigid))
        }
        _ => Ok(formulas::ullage(liquid, cavity)),
    }
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
