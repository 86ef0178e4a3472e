//! `…-below-limit`, `…-above-limit` of a requirement that asks for statistics: what decides is a share
//! of assemblies, a capability or a number of standard deviations, not the worst case.

use super::limit::code;
use super::number::{self, Round, digits};
use super::words;
use crate::diagnostic::Diagnostic;
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{Outcome, Statistics, Verdict};
use crate::model::{Assembly, Method, Quantity, Requirement};

/// How many contributors a finding labels.
const LABELLED: usize = 3;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for (index, requirement) in assembly.requirements.iter().enumerate() {
        if requirement.method == Method::WorstCase {
            continue;
        }
        let worst = evaluation
            .verdicts
            .iter()
            .filter(|v| v.requirement == index && v.outcome == Outcome::Fails)
            .filter_map(|v| Some((v, v.statistics.as_ref()?)))
            .min_by(|a, b| a.0.margin.total_cmp(&b.0.margin));
        if let Some((verdict, statistics)) = worst {
            found.push(finding(assembly, requirement, verdict, statistics));
        }
    }
}

fn finding(
    assembly: &Assembly,
    requirement: &Requirement,
    verdict: &Verdict,
    statistics: &Statistics,
) -> Diagnostic {
    let subject = words::name(&assembly.subject(requirement.subject).name);
    let what = match requirement.quantity {
        Quantity::Gap | Quantity::Value => subject,
        quantity => format!("{} of {subject}", words::quantity(assembly, quantity)),
    };
    let at = match verdict.condition {
        Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
        None => String::new(),
    };
    let unit = requirement.unit;
    let failing = percent(statistics.share_failing, Round::Up);
    let message = match requirement.method {
        Method::Share(wanted) => format!(
            "{what} holds for {} of assemblies{at}, {} required",
            percent(1.0 - statistics.share_failing, Round::Down),
            percent(wanted, Round::Nearest)
        ),
        Method::Cpk(wanted) => format!(
            "{what} has a Cpk of {}{at}, {} required",
            statistics.cpk.map_or("nothing".to_string(), |c| digits(c, 2, Round::Down)),
            digits(wanted, 2, Round::Nearest)
        ),
        Method::Rss { sigmas } => format!(
            "{what} at {} sigma is {} beyond its limit{at}",
            digits(sigmas, 1, Round::Nearest),
            number::difference_with_unit(-verdict.margin, unit, Round::Up)
        ),
        Method::WorstCase => what,
    };
    let here = format!(
        "mean {}, sigma {}, {failing} of assemblies fail",
        number::with_unit(statistics.mean, unit, Round::Nearest),
        number::difference_with_unit(statistics.sigma, unit, Round::Up),
    );
    let mut shares: Vec<_> = statistics.variance_shares.iter().collect();
    shares.sort_by(|a, b| b.share.total_cmp(&a.share));
    let mut diagnostic =
        Diagnostic::new(code(requirement.quantity, verdict.governing), requirement.span, message)
            .here(here);
    for share in shares.iter().take(LABELLED).filter(|s| s.share >= 0.005) {
        let Some(unknown) = share.unknown else { continue };
        diagnostic = diagnostic.label(
            words::place(assembly, unknown),
            format!(
                "{} makes {} of the variance",
                words::unknown(assembly, unknown),
                number::share(share.share)
            ),
        );
    }
    let largest = shares.first().and_then(|s| s.unknown);
    let help = match largest {
        Some(unknown) => format!(
            "move the mean away from the limit, or narrow the spread, of {} first",
            words::name(&words::unknown(assembly, unknown))
        ),
        None => "move the mean away from the limit".to_string(),
    };
    diagnostic.help(help)
}

/// A share as per cent with the digits that tell it from a round one.
fn percent(share: f64, round: Round) -> String {
    format!("{} %", digits(share * 100.0, 4, round))
}
