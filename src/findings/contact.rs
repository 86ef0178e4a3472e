//! `contact-beyond-free-expansion`: parts that would have to pass through each other.
//!
//! Sizes are those of free parts. Where a gap closes, or a fit without a `joint` interferes, the
//! parts press on each other and the free figures end.

use super::number::{Round, with_unit};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Figure;
use crate::model::{Assembly, Quantity, SubjectId, SubjectKind};
use crate::numeric::tolerance::LIMIT_SLACK;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for id in assembly.subject_ids() {
        let subject = assembly.subject(id);
        let (word, cure) = match &subject.kind {
            SubjectKind::Gap(_) if !starts_a_restraint(assembly, id) => (
                "parts overlap in the gap",
                "beyond contact the parts press on each other: a `restraint` with `start gap` \
                 computes the force",
            ),
            SubjectKind::Fit(fit) if fit.joint.is_none() => (
                "parts interfere in the fit",
                "from contact on the free sizes no longer hold: a `joint` block computes pressure \
                 and stress",
            ),
            _ => continue,
        };
        let closed: Vec<&Figure> = evaluation
            .figures
            .iter()
            .filter(|f| {
                // Which member of a set is put in is chosen so that it does not come to this.
                f.subject == id
                    && f.members.is_empty()
                    && matches!(f.quantity, Quantity::Gap | Quantity::Clearance)
            })
            .filter(|f| f.range.least.reached < -LIMIT_SLACK * assembly.defaults.length.to_si(1.0))
            .collect();
        let deepest =
            closed.iter().min_by(|a, b| a.range.least.bound.total_cmp(&b.range.least.bound));
        let Some(deepest) = deepest else { continue };
        let mut conditions: Vec<String> = closed
            .iter()
            .filter_map(|f| f.condition)
            .map(|c| words::name(&assembly.condition(c).name))
            .collect();
        conditions.dedup();
        let by = with_unit(-deepest.range.least.bound, assembly.defaults.length, Round::Up);
        let message = format!(
            "{word} {} by up to {by} at {}",
            words::name(&subject.name),
            conditions.join(", ")
        );
        found.push(
            Diagnostic::new(Code::ContactBeyondFreeExpansion, subject.span, message)
                .here("free sizes overlap here")
                .help(cure),
        );
    }
}

fn starts_a_restraint(assembly: &Assembly, gap: SubjectId) -> bool {
    assembly.subjects.iter().any(|s| match &s.kind {
        SubjectKind::Restraint(r) => r.start_gap() == Some(gap),
        _ => false,
    })
}
