//! Figures: the proven range of each quantity at each condition.

use super::outcome::{BeyondData, Chosen, End, Figure, Range};
use super::scene::{At, Response, Scene, Unable};
use super::{joint, quantity};
use crate::model::{Assembly, ConditionId, Quantity, SubjectId, SubjectKind};
use crate::numeric::extremes::{Extreme, extremes};
use crate::numeric::tolerance::EXTREME_GAP;
use crate::units::Kind;

/// What a figure is of.
#[derive(Debug, Clone, PartialEq)]
pub(crate) struct Asked {
    pub(crate) subject: SubjectId,
    pub(crate) quantity: Quantity,
    pub(crate) condition: Option<ConditionId>,
    pub(crate) of_yield: bool,
    pub(crate) members: Vec<Chosen>,
}

/// Records what is asked for.
pub(crate) fn response(
    assembly: &Assembly,
    beyond: &[BeyondData],
    asked: &Asked,
) -> Result<Response, Unable> {
    let at = asked.condition.map_or(At::Reference, At::Condition);
    Scene::record(assembly, &asked.members, beyond, |scene| {
        quantity::record(scene, at, asked.subject, asked.quantity, asked.of_yield)
    })
}

/// Computes the range of what is asked for.
pub(crate) fn compute(
    assembly: &Assembly,
    beyond: &[BeyondData],
    asked: Asked,
) -> Result<(Figure, Response), Unable> {
    if asked.quantity.is_unconditional() {
        return Ok(joining(assembly, asked));
    }
    let response = response(assembly, beyond, &asked)?;
    let gap = EXTREME_GAP * shown_unit(assembly, asked.subject, asked.quantity, asked.of_yield);
    let range = range(&response, gap);
    let Asked { subject, quantity, condition, of_yield, members } = asked;
    Ok((Figure { subject, quantity, condition, members, of_yield, range }, response))
}

/// Joining and loosening temperatures, which are roots and not recorded; their response is empty.
fn joining(assembly: &Assembly, asked: Asked) -> (Figure, Response) {
    let found = match asked.quantity {
        Quantity::JoiningTemperature => joint::joining::joining_range(assembly, asked.subject),
        _ => joint::joining::loosening_range(assembly, asked.subject),
    };
    let unknown = End { bound: f64::NAN, reached: f64::NAN, met: false, corner: Vec::new() };
    let range = found.unwrap_or_else(|| Range {
        least: unknown.clone(),
        mean: f64::NAN,
        greatest: unknown,
    });
    let Asked { subject, quantity, condition, of_yield, members } = asked;
    let response = Response::constant(range.mean);
    (Figure { subject, quantity, condition, members, of_yield, range }, response)
}

/// The range of a recorded quantity.
pub(crate) fn range(response: &Response, gap: f64) -> Range {
    let found = extremes(&response.tape, &response.ranges, gap);
    let mean = response.tape.value(&response.middle);
    let end = |e: Extreme| End {
        bound: e.bound,
        reached: e.reached,
        met: e.met,
        corner: response.unknowns.iter().copied().zip(e.at).collect(),
    };
    Range { least: end(found.least), mean, greatest: end(found.greatest) }
}

/// SI units in one of the unit that a quantity is shown in.
pub(crate) fn shown_unit(
    assembly: &Assembly,
    subject: SubjectId,
    quantity: Quantity,
    of_yield: bool,
) -> f64 {
    if of_yield {
        return 1e-2;
    }
    assembly.defaults.shown(kind(assembly, subject, quantity)).difference_to_si(1.0)
}

/// The kind of a quantity; a result's is that of its expression.
pub(crate) fn kind(assembly: &Assembly, subject: SubjectId, quantity: Quantity) -> Kind {
    match (&assembly.subject(subject).kind, quantity.kind()) {
        (_, Some(kind)) => kind,
        (SubjectKind::Gap(e) | SubjectKind::Result(e), None) => e.quantity,
        (_, None) => Kind::PURE,
    }
}
