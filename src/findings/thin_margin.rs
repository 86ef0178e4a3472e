//! `thin-margin`: a requirement that holds with less room than the checker wishes for.
//!
//! Only on demand. The margin is measured as a share of what is allowed where both limits are given,
//! else of the limit, else, where that is zero, of the range.

use super::number::{Round, difference_with_unit, share};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{Outcome, Verdict};
use crate::model::Assembly;

/// One finding for each requirement whose least margin is a share below `wish` (0 … 1).
pub fn find(assembly: &Assembly, evaluation: &Evaluation, wish: f64) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for (index, requirement) in assembly.requirements.iter().enumerate() {
        let thin = evaluation
            .verdicts
            .iter()
            .filter(|v| v.requirement == index && v.outcome == Outcome::Holds)
            .filter_map(|v| Some((v, reserve(assembly, evaluation, v)?)))
            .filter(|(_, reserve)| *reserve < wish)
            .min_by(|a, b| a.1.total_cmp(&b.1));
        let Some((verdict, reserve)) = thin else { continue };
        let name = words::name(&words::requirement(assembly, requirement));
        let margin = difference_with_unit(verdict.margin, requirement.unit, Round::Down);
        let at = match verdict.condition {
            Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
            None => String::new(),
        };
        let message = format!("{name} holds with a margin of only {margin}{at}");
        found.push(
            Diagnostic::new(Code::ThinMargin, requirement.span, message)
                .here(format!(
                    "{} of what it is measured against; asked for {}",
                    share(reserve),
                    share(wish)
                ))
                .help("widen the limit, narrow the largest contributor, or ask for less margin"),
        );
    }
    found
}

/// The margin as a share of what it is measured against; `None` where there is no such number.
pub fn reserve(assembly: &Assembly, evaluation: &Evaluation, verdict: &Verdict) -> Option<f64> {
    let requirement = &assembly.requirements[verdict.requirement];
    let range = &evaluation.figures.get(verdict.figure?)?.range;
    let lower = requirement.lower.as_ref().map(|l| l.value);
    let upper = requirement.upper.as_ref().map(|l| l.value);
    let width = range.greatest.bound - range.least.bound;
    let reserve = verdict.margin / against(lower, upper, width);
    reserve.is_finite().then_some(reserve)
}

fn against(lower: Option<f64>, upper: Option<f64>, width: f64) -> f64 {
    match (lower, upper) {
        (Some(lower), Some(upper)) if upper > lower => upper - lower,
        (Some(limit), _) | (_, Some(limit)) if limit != 0.0 => limit.abs(),
        _ => width,
    }
}

#[cfg(test)]
mod tests {
    use super::against;

    #[test]
    fn a_margin_is_measured_against_what_is_allowed() {
        assert_eq!(against(Some(1.0), Some(3.0), 0.5), 2.0);
        assert_eq!(against(None, Some(-120.0), 0.5), 120.0);
        assert_eq!(against(Some(0.0), None, 0.5), 0.5);
    }
}
