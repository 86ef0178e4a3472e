//! Verdicts of requirements that ask for statistics.

use crate::evaluate::outcome::{Outcome, Side, Statistics, Verdict};
use crate::model::{Method, Requirement};
use crate::numeric::special::{normal_quantile, normal_tail};
use crate::numeric::tolerance::LIMIT_SLACK;

/// Judges a verdict by its method; margins are in the quantity's SI unit.
pub(super) fn judge(verdict: &mut Verdict, requirement: &Requirement, statistics: &Statistics) {
    let slack = LIMIT_SLACK * requirement.unit.difference_to_si(1.0);
    let below = requirement.lower.as_ref().map(|l| (statistics.low, l.value));
    let above = requirement.upper.as_ref().map(|u| (statistics.high, u.value));
    // Distance from the mean to the limit, less what the method wants for it.
    let room = |sigmas: f64| {
        let least =
            below.map(|((mean, sigma), limit)| (Side::Least, mean - sigmas * sigma - limit));
        let most =
            above.map(|((mean, sigma), limit)| (Side::Greatest, limit - mean - sigmas * sigma));
        match (least, most) {
            (Some(l), Some(m)) => {
                if l.1 <= m.1 {
                    l
                } else {
                    m
                }
            }
            (one, other) => one.or(other).unwrap_or((Side::Least, f64::INFINITY)),
        }
    };
    let by_room = |(side, margin): (Side, f64)| {
        let outcome = if margin >= -slack {
            Outcome::Holds
        } else if margin.is_nan() {
            Outcome::Undecided
        } else {
            Outcome::Fails
        };
        (outcome, side, margin)
    };
    let (outcome, side, margin) = match requirement.method {
        Method::WorstCase => return,
        Method::Rss { sigmas } => by_room(room(sigmas)),
        Method::Cpk(index) => by_room(room(3.0 * index)),
        Method::Share(wanted) => {
            let allowed = 1.0 - wanted;
            let (least, most) = statistics.share_interval;
            // A share of exactly what is allowed holds, whatever the last bit says.
            let close = 1e-12;
            let outcome = if most <= allowed + close {
                Outcome::Holds
            } else if least > allowed + close {
                Outcome::Fails
            } else {
                Outcome::Undecided
            };
            // In standard deviations of a normal quantity, so that it is a length like any other.
            // Where no draw fails, the share is no more than its confidence limit says.
            let unseen = statistics.drawn.is_some() && statistics.share_failing == 0.0;
            let reached = sigmas(if unseen { most } else { statistics.share_failing });
            let margin = (reached - sigmas(allowed)) * statistics.sigma;
            let (side, to_limit) = room(0.0);
            let margin = match outcome {
                // No limit is farther than from the mean, also where nothing at all fails.
                Outcome::Holds => margin.min(to_limit).max(0.0),
                _ => margin,
            };
            (outcome, side, margin)
        }
    };
    verdict.outcome = outcome;
    verdict.governing = side;
    verdict.margin = margin;
}

/// How many standard deviations away a limit is that a share lies beyond; at most where doubles
/// end.
fn sigmas(share: f64) -> f64 {
    const FARTHEST: f64 = 37.0;
    if share <= normal_tail(FARTHEST) { FARTHEST } else { -normal_quantile(share.min(1.0)) }
}
