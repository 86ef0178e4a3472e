//! Statistics of a requirement: how a quantity varies from assembly to assembly.
//!
//! What is made (sizes, coatings) and what a lot brings (scatter of expansion, modulus, swelling) is
//! random. Temperatures, loads, friction and the place in a play are scenarios, taken at their worst
//! for each piece, unless the spec states a spread. A piece sees a whole range of temperatures, so
//! its worst is looked for, never the worst of the mean.

mod chance;
mod corners;
mod draw;
mod judge;
mod key;
mod linear;
mod lots;
mod together;

use super::outcome::{Evaluation, Statistics};
use super::scene::Response;
use super::tally::Tally;
use super::{Detail, Options};
use crate::model::{Assembly, Method};
use corners::Corners;
use draw::Check;

/// How draws are made, and where they are counted for whoever watches.
#[derive(Clone, Copy)]
pub(crate) struct Drawing<'a> {
    pub(crate) options: &'a Options,
    pub(crate) tally: &'a Tally,
}

/// A requirement at a condition with what its statistics need.
struct Case<'a> {
    /// Index of the verdict.
    verdict: usize,
    method: Method,
    response: &'a Response,
    corners: Corners,
    lower: Option<f64>,
    upper: Option<f64>,
}

/// Computes the statistics of every verdict that asks for them, and of the assembly as a whole;
/// replaces the verdicts that were worst case.
pub(crate) fn settle(
    assembly: &Assembly,
    responses: &[Response],
    evaluation: &mut Evaluation,
    drawing: Drawing<'_>,
) {
    let asked = |v: &super::outcome::Verdict| {
        assembly.requirements[v.requirement].method != Method::WorstCase
    };
    if !evaluation.verdicts.iter().any(asked) {
        return;
    }
    let cases: Vec<Case<'_>> = evaluation
        .verdicts
        .iter()
        .enumerate()
        .filter_map(|(verdict, v)| {
            let requirement = &assembly.requirements[v.requirement];
            let response = &responses[v.figure?];
            Some(Case {
                verdict,
                method: requirement.method,
                response,
                corners: corners::find(assembly, response),
                lower: requirement.lower.as_ref().map(|l| l.value),
                upper: requirement.upper.as_ref().map(|l| l.value),
            })
        })
        .collect();
    let mut statistics: Vec<Statistics> =
        cases.iter().map(|case| linear::statistics(assembly, case)).collect();
    // What the straight line does not tell, draws do; one draw of the parts serves everything.
    let bent: Vec<usize> = (0..cases.len()).filter(|&i| !statistics[i].exact).collect();
    if !bent.is_empty() {
        let checks: Vec<Check<'_>> = bent.iter().map(|&i| Check::of(&cases[i])).collect();
        let counts = draw::run(assembly, &checks, drawing, draw::Counts::widest);
        for (check, &i) in bent.iter().enumerate() {
            let limits = (cases[i].lower, cases[i].upper);
            draw::take(&mut statistics[i], &counts, check, limits, drawing.options);
        }
    }
    if drawing.options.detail == Detail::Full {
        lots::settle(assembly, &cases, &mut statistics, drawing);
    }
    // Nobody knows the yield where a share is missing.
    let all_known = evaluation.verdicts.iter().filter(|v| asked(v)).all(|v| v.figure.is_some());
    evaluation.assembly_yield =
        all_known.then(|| together::assembly(assembly, &cases, &statistics, drawing));
    let judged: Vec<(usize, Statistics)> =
        cases.iter().map(|c| c.verdict).zip(statistics).collect();
    for (verdict, statistics) in judged {
        let verdict = &mut evaluation.verdicts[verdict];
        let requirement = &assembly.requirements[verdict.requirement];
        if requirement.method != Method::WorstCase {
            judge::judge(verdict, requirement, &statistics);
        }
        verdict.statistics = Some(statistics);
    }
}
