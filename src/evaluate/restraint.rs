//! Quantities of parts that hold each other.

use super::expression::{self, value};
use super::joint::nominal;
use super::scene::{At, Scene, Unable};
use super::{elastic, temperature};
use crate::mechanics::restraint as formulas;
use crate::model::{
    Hold, Member, Owner, Quantity, Restraint, Start, SubjectId, SubjectKind, Unknown,
};
use crate::numeric::{Number, Recorded};

/// What a report shows of a restraint.
pub(crate) fn quantities(restraint: &Restraint) -> Vec<Quantity> {
    let mut list = vec![Quantity::Force];
    for member in restraint.members.iter().filter(|m| m.area.is_some()) {
        let stress = Quantity::Stress(member.part);
        if !list.contains(&stress) {
            list.push(stress);
        }
    }
    list.push(Quantity::Separation);
    list
}

/// A quantity of a restraint in a state of the world.
pub(crate) fn quantity(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    restraint: &Restraint,
    quantity: Quantity,
    of_yield: bool,
) -> Result<Recorded, Unable> {
    let known_here = match restraint.start {
        Start::Preload { condition, .. } => at == At::Condition(condition),
        _ => false,
    };
    let force = if known_here {
        // Where the preload was set the force is the preload; the formula would say the same, with
        // every compliance divided by itself.
        scene.unknown(Unknown::Preload(subject))
    } else {
        let take_up = take_up(scene, at, subject, restraint)?;
        if quantity == Quantity::Separation {
            return Ok(formulas::separation(take_up));
        }
        formulas::force(take_up, compliance(scene, at, subject, restraint)?)
    };
    if quantity == Quantity::Separation {
        return Ok(Recorded::exact(0.0));
    }
    let Quantity::Stress(part) = quantity else { return Ok(force) };
    let place = restraint.members.iter().position(|m| m.part == part && m.area.is_some());
    let area = area(scene, subject, place.unwrap_or(0));
    let stress = formulas::stress(force, area);
    elastic::shown(scene, at, part, stress, of_yield)
}

/// The length that the springs take up together, m.
fn take_up(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    restraint: &Restraint,
) -> Result<Recorded, Unable> {
    match restraint.start {
        Start::Misfit => misfit(restraint, |member| value(scene, at, &member.length)),
        // What closes the gap and goes on is what the springs take up.
        Start::Gap(gap) => match &scene.assembly.subject(gap).kind {
            SubjectKind::Gap(opening) => Ok(-value(scene, at, opening)?),
            _ => Ok(Recorded::exact(0.0)),
        },
        Start::Preload { condition, .. } => {
            preloaded(scene, at, At::Condition(condition), subject, restraint)
        }
    }
}

/// Of lengths, or of changes of length, what is squeezed less what is stretched, m.
fn misfit(
    restraint: &Restraint,
    length: impl Fn(&Member) -> Result<Recorded, Unable>,
) -> Result<Recorded, Unable> {
    let of = |hold: Hold| {
        let side = restraint.members.iter().filter(|m| m.hold == hold);
        side.map(&length).collect::<Result<Vec<_>, _>>()
    };
    Ok(formulas::misfit(&of(Hold::Squeezed)?, &of(Hold::Stretched)?))
}

fn preloaded(
    scene: &Scene<'_>,
    at: At,
    then: At,
    subject: SubjectId,
    restraint: &Restraint,
) -> Result<Recorded, Unable> {
    let preload = scene.unknown(Unknown::Preload(subject));
    let compliance_then = compliance(scene, then, subject, restraint)?;
    let growth = misfit(restraint, |member| expression::change(scene, at, then, &member.length))?;
    Ok(formulas::taken_up(preload, compliance_then, growth))
}

/// Compliance of all members in a row, m/N, with their moduli at temperature.
fn compliance(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    restraint: &Restraint,
) -> Result<Recorded, Unable> {
    let mut sum = Recorded::exact(0.0);
    for (place, member) in restraint.members.iter().enumerate() {
        sum = sum + compliance_of(scene, at, subject, place, member)?;
    }
    Ok(sum)
}

fn compliance_of(
    scene: &Scene<'_>,
    at: At,
    subject: SubjectId,
    place: usize,
    member: &Member,
) -> Result<Recorded, Unable> {
    if member.stiffness.is_some() {
        let unknown = Unknown::Stiffness { restraint: subject, member: place as u32 };
        return Ok(Recorded::exact(1.0) / scene.unknown(unknown));
    }
    scene.within_data(at, member.part)?;
    let t = temperature::of(scene, at, Owner::Part(member.part));
    let modulus = elastic::modulus(scene, member.part, t)?;
    let length = Recorded::exact(nominal(scene.assembly, &member.length));
    Ok(formulas::compliance(length, modulus, area(scene, subject, place)))
}

fn area(scene: &Scene<'_>, restraint: SubjectId, place: usize) -> Recorded {
    scene.unknown(Unknown::Area { restraint, member: place as u32 })
}
