//! `concession-in-force`, `concession-expired`, `concession-exceeded`: accepted departures.

use super::number::{Round, with_unit};
use super::standing::{accepted, in_force};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Outcome;
use crate::model::Assembly;

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
                Some(who) => format!(", approved {who}"),
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
                format!("concession {id} accepts {value}, which is not enough"),
            )
            .help("what was accepted is exceeded, so the requirement fails")
        };
        found.push(diagnostic);
    }
}
