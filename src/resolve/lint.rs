//! What is allowed and yet likely not meant. Needs the model only, no evaluation.
//!
//! Each function looks for one thing and gives its findings; none of them stops anything.

mod joint;
mod open;
mod state;
mod statistics;
mod usage;

use crate::diagnostic::Diagnostic;
use crate::model::{Assembly, DimensionId, Expr, ExprKind, SubjectKind};
use std::collections::BTreeMap;
use std::sync::Arc;

/// What a lint looks at.
pub(crate) struct Subject<'m> {
    /// The resolved assembly.
    pub(crate) assembly: &'m Assembly,
    /// Every named intermediate, used or not.
    pub(crate) lets: &'m [Arc<Expr>],
    /// True where the spec has no error: only then is what is missing really missing.
    pub(crate) whole: bool,
}

/// All findings, in the order of the list.
pub(crate) fn lint(subject: &Subject) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    if subject.whole {
        found.extend(usage::unused_dimensions(subject));
    }
    found.extend(open::classes_left_open(subject.assembly));
    found.extend(usage::drawing_revisions(subject.assembly));
    found.extend(usage::constant_subjects(subject.assembly));
    found.extend(state::one_temperature(subject.assembly));
    found.extend(state::ptfe_transition(subject.assembly));
    found.extend(joint::one_coated_mate(subject.assembly));
    found.extend(joint::free_sizes(subject.assembly));
    found.extend(statistics::copies_or_pieces(subject.assembly));
    found
}

/// Every expression of a subject, with those of its joint.
fn expressions(kind: &SubjectKind) -> Vec<&Arc<Expr>> {
    match kind {
        SubjectKind::Gap(e) | SubjectKind::Result(e) => vec![e],
        SubjectKind::Fit(fit) => {
            let mut found = vec![&fit.external, &fit.internal];
            if let Some(joint) = &fit.joint {
                found.push(&joint.length);
                found.extend(joint.inner.free.iter().chain(&joint.outer.free));
            }
            found
        }
        SubjectKind::Restraint(restraint) => restraint.members.iter().map(|m| &m.length).collect(),
        SubjectKind::Fill(fill) => {
            let wall = fill.wall.iter().flat_map(|w| [&w.bore, &w.outside]);
            fill.volume.iter().chain(wall).collect()
        }
    }
}

/// The dimensions of an expression, with how many pieces of each; those of fits that it names stay
/// with their fits.
fn dimensions(e: &Expr) -> BTreeMap<DimensionId, u32> {
    let mut found: BTreeMap<DimensionId, u32> = BTreeMap::new();
    e.walk(&mut |e| {
        let (dimension, pieces) = match e.kind {
            ExprKind::Size { dimension, .. } | ExprKind::After { dimension, .. } => (dimension, 1),
            ExprKind::Pieces { dimension, count } => (dimension, count),
            _ => return,
        };
        let most = found.entry(dimension).or_default();
        *most = pieces.max(*most);
    });
    found
}
