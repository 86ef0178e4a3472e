//! Quantities of joints under pressure.
//!
//! Joints that share a ring (a shaft in a bush, the bush in a housing) are one stack and are solved
//! together. Stiffness is taken on nominal sizes at the reference temperature, interference on free
//! sizes at the parts' own temperatures.

pub(crate) mod band;
pub(crate) mod joining;
mod stack;

use super::elastic;
use super::expression::value;
use super::scene::{At, Scene, Unable};
use crate::mechanics::joint as formulas;
use crate::model::{DimensionId, Fit, Form, Joint, PartId, Quantity, SubjectId, Unknown};
use crate::numeric::{Number, Recorded};
use stack::Stack;
pub(crate) use stack::nominal;

/// What a report shows of a joint.
pub(crate) fn quantities(joint: &Joint) -> Vec<Quantity> {
    let mut list = vec![
        Quantity::Clearance,
        Quantity::Pressure,
        Quantity::Stress(joint.outer.part),
        Quantity::Stress(joint.inner.part),
    ];
    list.push(Quantity::JoiningTemperature);
    list.push(Quantity::LooseningTemperature);
    if joint.friction.is_some() {
        list.push(Quantity::Torque);
        list.push(Quantity::AxialForce);
    }
    list
}

/// A quantity of a fit that is a joint; free sizes of one that is not.
pub(crate) fn quantity(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    fit: &Fit,
    quantity: Quantity,
    of_yield: bool,
) -> Result<Recorded, Unable> {
    let Some(joint) = &fit.joint else { return super::expression::clearance(scene, at, fit) };
    let stack = Stack::of(scene.assembly, subject);
    carried(scene, at, subject, joint, (&stack, None), (quantity, of_yield))
}

/// A quantity of one joint of a stack. `banded` is the pressure of a joint of two rings where it is
/// another than that of rings free to slide.
fn carried(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    joint: &Joint,
    (stack, banded): (&Stack, Option<Recorded>),
    (quantity, of_yield): (Quantity, bool),
) -> Result<Recorded, Unable> {
    let place = stack.contact_of(subject);
    if let Quantity::Stress(part) = quantity {
        let stress = stress(scene, at, (stack, banded), part)?;
        return elastic::shown(scene, at, part, stress, of_yield);
    }
    let pressure = match banded {
        Some(pressure) => pressure,
        None => stack.pressure(scene, at, place)?,
    };
    Ok(match quantity {
        Quantity::Torque | Quantity::AxialForce => {
            let friction = scene.unknown(Unknown::Friction(subject));
            let length = value(scene, at, &joint.length)?;
            let diameter = Recorded::exact(stack.contact_diameter(place));
            if quantity == Quantity::Torque {
                formulas::torque(friction, pressure, length, diameter)
            } else {
                formulas::axial_force(friction, pressure, length, diameter)
            }
        }
        _ => pressure,
    })
}

/// Greatest von Mises stress in a ring of the stack, Pa.
fn stress(
    scene: &Scene<'_>,
    at: At,
    (stack, banded): (&Stack, Option<Recorded>),
    part: PartId,
) -> Result<Recorded, Unable> {
    let place = stack.ring_of(part);
    let ring = stack.ring(scene, at, place)?;
    let none = Recorded::exact(0.0);
    let (inside, outside) = match banded {
        Some(pressure) if place == 0 => (none, pressure),
        Some(pressure) => (pressure, none),
        None => stack.faces(scene, at, place)?,
    };
    // The general form is the same at rest, but its enclosure is wider there.
    if !stack.turns(scene, at, place) {
        return Ok(ring.greatest_von_mises_at_rest(inside, outside));
    }
    Ok(ring.greatest_von_mises(inside, outside))
}

/// A bore or outside once the joint is made, m: the free size where it is loose.
pub(crate) fn after(
    scene: &Scene<'_>,
    at: At,
    id: DimensionId,
    fit: SubjectId,
) -> Result<Recorded, Unable> {
    let free = super::size::at(scene, at, id, 1)?;
    let dimension = scene.assembly.dimension(id);
    let stack = Stack::of(scene.assembly, fit);
    let place = stack.ring_of(dimension.part);
    let ring = stack.ring(scene, at, place)?;
    let (inside, outside) = stack.faces(scene, at, place)?;
    let diameter =
        if dimension.form == Form::Radius { 2.0 * dimension.nominal } else { dimension.nominal };
    let strain = if stack.is_bore(place, diameter) {
        ring.bore_strain(inside, outside)
    } else {
        ring.outside_strain(inside, outside)
    };
    Ok(free + strain * dimension.nominal)
}
