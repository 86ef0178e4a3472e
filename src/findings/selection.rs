//! `selection-incomplete`: assemblies for which no member of a `one of` set fits.

use super::number::{Round, with_unit};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Outcome;
use crate::model::Assembly;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for selection in evaluation.selections.iter().filter(|s| s.outcome != Outcome::Holds) {
        let dimension = assembly.dimension(selection.dimension);
        // Assemblies are told apart by the first quantity that contains the set.
        let first = selection.requirements.first().map(|&index| &assembly.requirements[index]);
        let unit = first.map_or(assembly.defaults.length, |r| r.unit);
        let of_member = dimension.unit(&assembly.defaults);
        let mut diagnostic = Diagnostic::new(
            Code::SelectionIncomplete,
            dimension.line,
            format!(
                "{} has no member for some assemblies",
                words::name(&assembly.path(selection.dimension))
            ),
        )
        .here(format!(
            "with its first member {} comes out from {} to {} at reference",
            measured(assembly, &selection.requirements),
            with_unit(selection.occurs.0, unit, Round::Down),
            with_unit(selection.occurs.1, unit, Round::Up)
        ));
        for &index in &selection.requirements {
            diagnostic = diagnostic.label(assembly.requirements[index].span, "contains it");
        }
        let covered: Vec<String> = dimension
            .members
            .iter()
            .zip(&selection.covers)
            .map(|(member, (from, to))| {
                let member = with_unit(*member, of_member, Round::Nearest);
                if from <= to {
                    format!(
                        "{member} serves {} .. {}",
                        with_unit(*from, unit, Round::Up),
                        with_unit(*to, unit, Round::Down)
                    )
                } else {
                    format!("{member} serves none")
                }
            })
            .collect();
        found.push(diagnostic.help(format!(
            "add a member where these leave room: counted in the same way, {}",
            covered.join("; ")
        )));
    }
}

/// What the assemblies are told apart by: the subject of the first requirement on the set.
fn measured(assembly: &Assembly, requirements: &[usize]) -> String {
    let first = requirements.first().map(|&index| &assembly.requirements[index]);
    first.map_or_else(String::new, |r| words::name(&assembly.subject(r.subject).name))
}
