//! `tail-beyond-measured`: a share of assemblies that is finer than the measured values behind it can
//! show.
//!
//! Of n measured values none lies beyond a limit where the true share is below about 3/n (the rule of
//! three: `(1 − 3/n)ⁿ` is 5 per cent), so that a list says nothing of smaller shares.

use super::number::{Round, digits};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Statistics;
use crate::model::dimension::Shape;
use crate::model::{Assembly, DimensionId, Method, Requirement, SubjectId, Unknown};
use crate::numeric::special::normal_tail;
use std::collections::BTreeMap;

/// Sizes with less of the variance do not decide the tail.
const COUNTS: f64 = 0.01;

/// The finest share that a subject is asked for of a measured size.
struct Asked<'a> {
    requirement: &'a Requirement,
    allowed: f64,
    values: usize,
}

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    let mut finest: BTreeMap<(SubjectId, DimensionId), Asked<'_>> = BTreeMap::new();
    for verdict in &evaluation.verdicts {
        let requirement = &assembly.requirements[verdict.requirement];
        let Some(statistics) = &verdict.statistics else { continue };
        let Some(allowed) = allowed(requirement.method) else { continue };
        for (dimension, values) in measured(assembly, statistics) {
            let shown = 3.0 / values as f64;
            // A share that the list does show to be missed needs no more values to be missed.
            if allowed >= shown || statistics.share_failing >= shown {
                continue;
            }
            let asked = Asked { requirement, allowed, values };
            let finest =
                finest.entry((requirement.subject, dimension)).or_insert(Asked { ..asked });
            if allowed < finest.allowed {
                *finest = asked;
            }
        }
    }
    for ((subject, dimension), asked) in finest {
        found.push(finding(assembly, subject, dimension, &asked));
    }
}

/// The share that may fail; for a number of sigmas that of a normal distribution.
fn allowed(method: Method) -> Option<f64> {
    match method {
        Method::WorstCase => None,
        Method::Share(share) => Some(1.0 - share),
        Method::Rss { sigmas } => Some(2.0 * normal_tail(sigmas)),
        // The nearer limit lies 3 Cpk sigmas off; the other may be far.
        Method::Cpk(index) => Some(normal_tail(3.0 * index)),
    }
}

/// The measured sizes that count, and how many values there are of each.
fn measured<'a>(
    assembly: &'a Assembly,
    statistics: &'a Statistics,
) -> impl Iterator<Item = (DimensionId, usize)> + 'a {
    statistics.variance_shares.iter().filter(|v| v.share >= COUNTS).filter_map(|v| {
        let Some(Unknown::Size { dimension, .. }) = v.unknown else { return None };
        match &assembly.dimension(dimension).spread.shape {
            Shape::Measured { values, .. } => Some((dimension, values.len())),
            _ => None,
        }
    })
}

fn finding(
    assembly: &Assembly,
    subject: SubjectId,
    dimension: DimensionId,
    asked: &Asked<'_>,
) -> Diagnostic {
    let path = words::name(&assembly.path(dimension));
    let values = words::count(asked.values, "value", "values");
    let enough = digits(3.0 / asked.allowed, 0, Round::Up);
    let message = format!(
        "{} is asked for a finer share than the {values} of {path} can show",
        words::name(&assembly.subject(subject).name)
    );
    Diagnostic::new(Code::TailBeyondMeasured, asked.requirement.span, message)
        .here(format!("{} may fail", percent(asked.allowed)))
        .label(
            assembly.dimension(dimension).line,
            format!("{values} show no share below {}", percent(3.0 / asked.values as f64)),
        )
        .help(format!(
            "measure {enough}, or state a shape that is known to hold further out, such as `spread \
             normal Cpk 1.33`"
        ))
}

/// A share in per cent with two digits that count.
fn percent(share: f64) -> String {
    let percent = share * 100.0;
    let decimals = (1.0 - libm::floor(libm::log10(percent))).clamp(0.0, 12.0);
    format!("{} %", digits(percent, decimals as usize, Round::Nearest))
}
