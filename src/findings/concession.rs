//! `concession-in-force`, `concession-expired`, `concession-exceeded`: accepted departures.

use super::number::{Round, with_unit};
use super::standing::{accepted, in_force};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{Outcome, Verdict};
use crate::model::{Assembly, Concession, Requirement};

pub(super) fn find(
    assembly: &Assembly,
    evaluation: &Evaluation,
    today: &str,
    found: &mut Vec<Diagnostic>,
) {
    for (index, requirement) in assembly.requirements.iter().enumerate() {
        let Some(concession) = &requirement.concession else { continue };
        let failing: Vec<_> = evaluation
            .verdicts
            .iter()
            .filter(|v| v.requirement == index && v.outcome == Outcome::Fails)
            .collect();
        if failing.is_empty() {
            found.push(
                Diagnostic::new(
                    Code::ConcessionUnused,
                    concession.span,
                    format!(
                        "concession {} is not needed: the requirement holds",
                        words::name(&concession.id)
                    ),
                )
                .help("take it out, so that a later departure does not hide behind it"),
            );
            continue;
        }
        let value = with_unit(concession.accepts, requirement.unit, Round::Nearest);
        let id = words::name(&concession.id);
        let diagnostic = if !in_force(concession, today) {
            Diagnostic::new(
                Code::ConcessionExpired,
                concession.span,
                format!("concession {id} counted until {}", concession.until),
            )
            .here(format!("today is {today}"))
            .help("have it renewed, or mend the requirement")
        } else if failing.iter().all(|v| accepted(requirement, concession, evaluation, v)) {
            let approved = match &concession.approved {
                Some(who) => format!(", approved by {who}"),
                None => String::new(),
            };
            Diagnostic::new(
                Code::ConcessionInForce,
                concession.span,
                format!("concession {id} accepts {value} until {}{approved}", concession.until),
            )
        } else {
            Diagnostic::new(
                Code::ConcessionExceeded,
                concession.span,
                format!("concession {id} accepts {value}, and the requirement goes beyond"),
            )
            .here(reached(requirement, concession, evaluation, &failing))
            .help("have the greater departure accepted, or mend the requirement")
        };
        found.push(diagnostic);
    }
}

/// The worst value on the side that the concession is about.
fn reached(
    requirement: &Requirement,
    concession: &Concession,
    evaluation: &Evaluation,
    failing: &[&Verdict],
) -> String {
    let figures = failing.iter().filter_map(|v| v.figure).map(|f| &evaluation.figures[f].range);
    let below = requirement.lower.as_ref().is_some_and(|l| concession.accepts < l.value);
    let (word, worst, round) = if below {
        let least = figures.map(|r| r.least.bound).fold(f64::INFINITY, f64::min);
        ("least", least, Round::Down)
    } else {
        let greatest = figures.map(|r| r.greatest.bound).fold(f64::NEG_INFINITY, f64::max);
        ("greatest", greatest, Round::Up)
    };
    format!("{word} {}", with_unit(worst, requirement.unit, round))
}
