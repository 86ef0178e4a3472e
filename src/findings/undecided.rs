//! `not-decided`: a requirement that could be proven neither to hold nor to fail.

use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Outcome;
use crate::model::Assembly;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for verdict in evaluation.verdicts.iter().filter(|v| v.outcome == Outcome::Undecided) {
        let requirement = &assembly.requirements[verdict.requirement];
        // Where nothing could be computed, the reason is a finding of its own.
        // Where a set leaves assemblies unserved, that is the finding.
        let of_set = evaluation
            .selections
            .iter()
            .any(|s| s.outcome != Outcome::Holds && s.requirements.contains(&verdict.requirement));
        if of_set {
            continue;
        }
        let Some(figure) = verdict.figure.map(|f| &evaluation.figures[f]) else { continue };
        let at = match verdict.condition {
            Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
            None => String::new(),
        };
        let name = words::name(&words::requirement(assembly, requirement));
        let bounded =
            figure.range.least.bound.is_finite() && figure.range.greatest.bound.is_finite();
        let (message, help) = if bounded {
            (
                format!("{name} could be proven neither to hold nor to fail{at}"),
                "it counts as failing; narrow a tolerance or a temperature range, or simplify the \
                 expression",
            )
        } else {
            (
                format!("{name} has no value for some cases within the tolerances{at}"),
                "there a divisor is zero, or a root or arc function is out of its range: narrow the \
                 tolerances, or write the expression without it",
            )
        };
        found.push(Diagnostic::new(Code::NotDecided, requirement.span, message).help(help));
    }
}
