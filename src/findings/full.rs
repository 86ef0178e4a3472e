//! `cavity-full`: a liquid or solid that has no room left.

use super::number::share;
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::model::{Assembly, Quantity};
use crate::numeric::tolerance::LIMIT_SLACK;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for id in assembly.subject_ids() {
        let fullest = evaluation
            .figures
            .iter()
            .filter(|f| f.subject == id && f.quantity == Quantity::Ullage)
            .filter(|f| f.range.least.reached < -LIMIT_SLACK)
            .min_by(|a, b| a.range.least.bound.total_cmp(&b.range.least.bound));
        let Some(figure) = fullest else { continue };
        let subject = assembly.subject(id);
        let at = match figure.condition {
            Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
            None => String::new(),
        };
        found.push(
            Diagnostic::new(
                Code::CavityFull,
                subject.span,
                format!("{} is full{at}", words::name(&subject.name)),
            )
            .here(format!(
                "its charge needs {} more than there is",
                share(-figure.range.least.bound)
            ))
            .help(
                "a full cavity bursts or pushes its seals out: charge less, or give it room to \
                 breathe",
            ),
        );
    }
}
