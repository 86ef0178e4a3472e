//! `friction-along-seat`: a requirement that holds with rings free to slip along their seat, and may
//! not where friction holds them.

use super::number::{Digits, Round, digits};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{Side, TurnedOver};
use crate::model::{Assembly, Requirement};

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for (index, requirement) in assembly.requirements.iter().enumerate() {
        let of_it = |t: &&TurnedOver| evaluation.verdicts[t.verdict].requirement == index;
        let mut turned: Vec<&TurnedOver> = evaluation.turned_over.iter().filter(of_it).collect();
        turned.sort_by(|a, b| passed(requirement, b).total_cmp(&passed(requirement, a)));
        if let Some((worst, others)) = turned.split_first() {
            found.push(finding(assembly, evaluation, requirement, worst, others));
        }
    }
}

/// How far the band reaches past a limit, SI.
fn passed(requirement: &Requirement, turned: &TurnedOver) -> f64 {
    match turned.governing {
        Side::Least => requirement.lower.as_ref().map_or(0.0, |l| l.value - turned.least),
        Side::Greatest => requirement.upper.as_ref().map_or(0.0, |u| turned.greatest - u.value),
    }
}

fn finding(
    assembly: &Assembly,
    evaluation: &Evaluation,
    requirement: &Requirement,
    worst: &TurnedOver,
    others: &[&TurnedOver],
) -> Diagnostic {
    let condition = |t: &TurnedOver| {
        let condition = evaluation.verdicts[t.verdict].condition;
        condition.map_or_else(String::new, |c| words::name(&assembly.condition(c).name))
    };
    let verdict = &evaluation.verdicts[worst.verdict];
    let plain = verdict.figure.map(|f| &evaluation.figures[f].range);
    let (word, end, without, limit, round) = match worst.governing {
        Side::Least => (
            "least",
            worst.least,
            plain.map(|p| p.least.bound),
            requirement.lower.as_ref(),
            Round::Down,
        ),
        Side::Greatest => (
            "greatest",
            worst.greatest,
            plain.map(|p| p.greatest.bound),
            requirement.upper.as_ref(),
            Round::Up,
        ),
    };
    let limit_value = limit.map(|l| l.value);
    let numbers: Vec<f64> = [Some(end), without, limit_value].into_iter().flatten().collect();
    let apart = numbers.iter().map(|x| x - limit_value.unwrap_or(0.0)).collect::<Vec<f64>>();
    let shown = Digits::of(requirement.unit, &[numbers, apart].concat());
    let of_yield = if limit.is_some_and(|l| l.of_yield) { " of yield" } else { "" };
    let value = |si: Option<f64>, round| {
        si.map_or_else(String::new, |si| format!("{}{of_yield}", shown.value(si, round)))
    };
    let subject = words::name(&assembly.subject(requirement.subject).name);
    let what = words::quantity(assembly, requirement.quantity);
    let message = format!(
        "{what} of {subject} is within its limit at {} only without friction along the seat",
        condition(worst)
    );
    let mut here = format!(
        "{word} {} with it, {} without, limit {}",
        value(Some(end), round),
        value(without, round),
        value(limit_value, Round::Nearest),
    );
    if !others.is_empty() {
        let names: Vec<String> = others.iter().map(|t| condition(t)).collect();
        here.push_str(&format!("; also at {}", names.join(", ")));
    }
    let by = if worst.coupling < 1.0 {
        // p/(1−κ) is the further end of the band.
        let further = worst.coupling / (1.0 - worst.coupling);
        format!("shifts their pressure by up to {} %", digits(further * 100.0, 1, Round::Up))
    } else {
        "leaves their pressure without a bound".to_string()
    };
    Diagnostic::new(Code::FrictionAlongSeat, requirement.span, message).here(here).help(format!(
        "friction keeps the rings from changing their length and {by}: allow for it in the limit, \
         narrow the tolerances, or make the joint shorter"
    ))
}
