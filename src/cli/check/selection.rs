//! `--only`, `--at` and `--warn-below`: which requirements are checked, where, and what counts as a
//! thin margin.

use super::glob::matches;
use crate::cli::pipeline::Lens;
use crate::cli::refusal::Refusal;
use crate::diagnostic::Diagnostic;
use crate::evaluate::Evaluation;
use crate::findings::thin_margin;
use crate::model::{Assembly, Requirement};
use crate::report::Report;
use std::collections::BTreeSet;

/// What is asked for; empty lists ask for everything.
#[derive(Debug, Clone, Default)]
pub(super) struct Selection {
    /// Patterns for ids and subjects.
    pub(super) only: Vec<String>,
    /// Conditions.
    pub(super) at: Vec<String>,
    /// Share below which a margin is thin.
    pub(super) warn_below: Option<f64>,
}

impl Selection {
    fn takes(&self, assembly: &Assembly, requirement: &Requirement) -> bool {
        let subject = &assembly.subject(requirement.subject).name;
        let id = requirement.id.as_deref();
        self.only.is_empty()
            || self.only.iter().any(|p| matches(p, subject) || id.is_some_and(|id| matches(p, id)))
    }

    fn takes_condition(&self, name: &str) -> bool {
        self.at.is_empty() || self.at.iter().any(|at| at == name)
    }

    /// Makes sure that what was asked for is there.
    ///
    /// # Errors
    /// When a condition is in no spec, or no requirement is left.
    pub(super) fn settle(&self, report: &Report) -> Result<(), Refusal> {
        let accounts: Vec<_> = report.specs.iter().filter_map(|s| s.account.as_ref()).collect();
        if accounts.is_empty() {
            return Ok(());
        }
        let conditions: BTreeSet<&str> =
            accounts.iter().flat_map(|a| &a.conditions).map(|(name, _)| name.as_str()).collect();
        if let Some(missing) = self.at.iter().find(|at| !conditions.contains(at.as_str())) {
            let there: Vec<String> = conditions.iter().map(|c| format!("`{c}`")).collect();
            return Err(Refusal::new(
                format!("there is no condition `{missing}`"),
                format!("the conditions are {}", there.join(", ")),
            ));
        }
        if !self.only.is_empty() && accounts.iter().all(|a| a.cases.is_empty()) {
            let asked: Vec<String> = self.only.iter().map(|o| format!("`{o}`")).collect();
            return Err(Refusal::new(
                format!("no requirement matches {}", asked.join(", ")),
                "a pattern is held against ids and names of subjects; `*` stands for anything",
            ));
        }
        Ok(())
    }
}

impl Lens for Selection {
    fn assembly(&self, assembly: &mut Assembly) {
        let mut kept = std::mem::take(&mut assembly.requirements);
        kept.retain(|r| self.takes(assembly, r));
        for requirement in &mut kept {
            let takes = |c: &_| self.takes_condition(&assembly.condition(*c).name);
            requirement.conditions.retain(takes);
        }
        kept.retain(|r| r.quantity.is_unconditional() || !r.conditions.is_empty());
        assembly.requirements = kept;
    }

    fn evaluation(&self, assembly: &Assembly, evaluation: &mut Evaluation) {
        if self.only.is_empty() && self.at.is_empty() {
            return;
        }
        let required = |subject| assembly.requirements.iter().any(|r| r.subject == subject);
        let keep: Vec<bool> = evaluation
            .figures
            .iter()
            .map(|f| {
                let here =
                    f.condition.is_none_or(|c| self.takes_condition(&assembly.condition(c).name));
                here && (self.only.is_empty() || required(f.subject))
            })
            .collect();
        let here = |c| self.takes_condition(&assembly.condition(c).name);
        let asked = |subject| self.only.is_empty() || required(subject);
        evaluation.friction_bands.retain(|b| here(b.condition) && asked(b.subject));
        evaluation.shop_cards.retain(|card| asked(card.subject));
        let places: Vec<usize> = keep
            .iter()
            .scan(0, |next, &kept| {
                let place = *next;
                *next += usize::from(kept);
                Some(place)
            })
            .collect();
        let mut kept = keep.iter();
        evaluation.figures.retain(|_| kept.next().copied().unwrap_or(true));
        for verdict in &mut evaluation.verdicts {
            // The figure of a requirement that is kept is kept with it.
            verdict.figure = verdict.figure.filter(|&f| keep[f]).map(|f| places[f]);
        }
    }

    fn findings(&self, assembly: &Assembly, evaluation: &Evaluation) -> Vec<Diagnostic> {
        let share = self.warn_below;
        share.map_or_else(Vec::new, |share| thin_margin::find(assembly, evaluation, share))
    }
}
