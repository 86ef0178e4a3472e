//! How a requirement stands once concessions are taken into account.

use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{Outcome, Verdict};
use crate::model::{Assembly, Concession, Requirement};

/// How a requirement stands at a condition.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Standing {
    /// It holds.
    Holds,
    /// It fails.
    Fails,
    /// It could not be decided; counts as failing.
    Undecided,
    /// It fails within what a concession accepts.
    Conceded,
}

impl Standing {
    /// The word shown to people and programs.
    pub fn word(self) -> &'static str {
        match self {
            Standing::Holds => "holds",
            Standing::Fails => "fails",
            Standing::Undecided => "undecided",
            Standing::Conceded => "conceded",
        }
    }

    /// True when the exit status must say so.
    pub fn is_bad(self) -> bool {
        matches!(self, Standing::Fails | Standing::Undecided)
    }
}

/// How a verdict stands on the day `today` (`YYYY-MM-DD`).
pub fn standing(
    assembly: &Assembly,
    evaluation: &Evaluation,
    verdict: &Verdict,
    today: &str,
) -> Standing {
    match verdict.outcome {
        Outcome::Holds => Standing::Holds,
        Outcome::Undecided => Standing::Undecided,
        Outcome::Fails => {
            let requirement = &assembly.requirements[verdict.requirement];
            match &requirement.concession {
                Some(concession)
                    if in_force(concession, today)
                        && accepted(requirement, concession, evaluation, verdict) =>
                {
                    Standing::Conceded
                }
                _ => Standing::Fails,
            }
        }
    }
}

/// True up to and including the last day. Dates are compared as text: both are `YYYY-MM-DD`, and a
/// malformed one, which the resolver reports, never counts.
pub(super) fn in_force(concession: &Concession, today: &str) -> bool {
    let well_formed = |date: &str| {
        date.len() == 10
            && date.bytes().enumerate().all(|(i, b)| match i {
                4 | 7 => b == b'-',
                _ => b.is_ascii_digit(),
            })
    };
    well_formed(&concession.until) && well_formed(today) && today <= concession.until.as_str()
}

/// True when nothing lies beyond the accepted value on its side, and the other limit holds.
pub(super) fn accepted(
    requirement: &Requirement,
    concession: &Concession,
    evaluation: &Evaluation,
    verdict: &Verdict,
) -> bool {
    let Some(figure) = verdict.figure.map(|f| &evaluation.figures[f]) else { return false };
    let slack = crate::numeric::tolerance::LIMIT_SLACK * requirement.unit.difference_to_si(1.0);
    let mut lower = requirement.lower.as_ref().map(|l| l.value);
    let mut upper = requirement.upper.as_ref().map(|u| u.value);
    if lower.is_some_and(|l| concession.accepts < l) {
        lower = Some(concession.accepts);
    }
    if upper.is_some_and(|u| concession.accepts > u) {
        upper = Some(concession.accepts);
    }
    lower.is_none_or(|l| figure.range.least.bound >= l - slack)
        && upper.is_none_or(|u| figure.range.greatest.bound <= u + slack)
}
