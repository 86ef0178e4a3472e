//! Verdicts: a proven range against its limits.

use super::outcome::{Outcome, Range, Side};
use crate::model::Requirement;
use crate::numeric::tolerance::LIMIT_SLACK;

/// How a range stands to the limits of a requirement, with the governing side and its margin (SI).
pub(crate) struct Judgement {
    pub(crate) outcome: Outcome,
    pub(crate) governing: Side,
    pub(crate) margin: f64,
}

/// Compares a range with the limits of a requirement.
///
/// It holds when the bounds lie within the limits, equality included; it fails when a value beyond
/// one is proven to occur; else it is undecided.
pub(crate) fn judge(range: &Range, requirement: &Requirement) -> Judgement {
    let slack = LIMIT_SLACK * requirement.unit.difference_to_si(1.0);
    let lower = requirement.lower.as_ref().map(|l| l.value);
    let upper = requirement.upper.as_ref().map(|l| l.value);
    let below = lower.map(|l| range.least.bound - l);
    let above = upper.map(|u| u - range.greatest.bound);
    let (governing, margin) = match (below, above) {
        (Some(b), Some(a)) if b <= a => (Side::Least, b),
        (Some(_), Some(a)) => (Side::Greatest, a),
        (Some(b), None) => (Side::Least, b),
        (None, Some(a)) => (Side::Greatest, a),
        (None, None) => (Side::Least, f64::INFINITY),
    };
    let broken = lower.is_some_and(|l| range.least.reached < l - slack)
        || upper.is_some_and(|u| range.greatest.reached > u + slack);
    let outcome = if margin >= -slack {
        Outcome::Holds
    } else if broken {
        Outcome::Fails
    } else {
        Outcome::Undecided
    };
    Judgement { outcome, governing, margin }
}
