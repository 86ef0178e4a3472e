//! What is stated and never used, or stated twice in two ways.

use super::{Subject, dimensions, expressions};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, DimensionId, Drawing, ExprKind, SubjectKind};
use crate::span::Span;
use std::collections::{BTreeMap, BTreeSet};

/// Dimensions that no expression, joint or restraint names.
///
/// A line that several parts `like` each other share is used where one of them is.
pub(super) fn unused_dimensions(subject: &Subject) -> Vec<Diagnostic> {
    let assembly = subject.assembly;
    let mut used: BTreeSet<DimensionId> = BTreeSet::new();
    let of_subjects = assembly.subjects.iter().flat_map(|s| expressions(&s.kind));
    for e in of_subjects.chain(subject.lets) {
        used.extend(dimensions(e).into_keys());
    }
    let bonus = |d: DimensionId| assembly.dimension(d).geometric.and_then(|g| g.bonus);
    used.extend(used.clone().into_iter().filter_map(bonus));
    let lines: BTreeSet<Span> = used.iter().map(|d| assembly.dimension(*d).line).collect();
    let mut seen: BTreeSet<Span> = lines;
    let mut found = Vec::new();
    for (index, dimension) in assembly.dimensions.iter().enumerate() {
        if seen.insert(dimension.line) {
            let path = assembly.path(DimensionId(index as u32));
            found.push(
                Diagnostic::new(
                    Code::UnusedDimension,
                    dimension.span,
                    format!("`{path}` is stated and never used"),
                )
                .help("use it in a fit, gap or result, or leave it out"),
            );
        }
    }
    found
}

/// One drawing number at two revisions.
pub(super) fn drawing_revisions(assembly: &Assembly) -> Vec<Diagnostic> {
    let of_parts = assembly.parts.iter().filter_map(|part| part.drawing.as_ref());
    let mut first: BTreeMap<&str, &Drawing> = BTreeMap::new();
    let mut found = Vec::new();
    for drawing in assembly.drawing.iter().chain(of_parts) {
        let earlier = *first.entry(&drawing.number).or_insert(drawing);
        if earlier.revision != drawing.revision && earlier.span != drawing.span {
            found.push(
                Diagnostic::new(
                    Code::DrawingRevisions,
                    drawing.span,
                    format!("drawing `{}` is named at two revisions", drawing.number),
                )
                .here(format!("revision `{}`", drawing.revision))
                .label(earlier.span, format!("revision `{}`", earlier.revision))
                .help("state the revision that the sizes were read from"),
            );
        }
    }
    found
}

/// Gaps and results that no part has a say in: their requirements decide nothing.
pub(super) fn constant_subjects(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for (id, subject) in assembly.subject_ids().zip(&assembly.subjects) {
        let (SubjectKind::Gap(e) | SubjectKind::Result(e)) = &subject.kind else { continue };
        let mut varies = false;
        e.walk(&mut |e| {
            varies |= !matches!(
                e.kind,
                ExprKind::Constant(_)
                    | ExprKind::Pi
                    | ExprKind::Named(..)
                    | ExprKind::Negate(_)
                    | ExprKind::Binary(..)
                    | ExprKind::Power(..)
                    | ExprKind::Call(..)
                    | ExprKind::Change { .. }
            );
        });
        let required = assembly.requirements.iter().find(|r| r.subject == id);
        if let (false, Some(requirement)) = (varies, required) {
            found.push(
                Diagnostic::new(
                    Code::NothingVaries,
                    e.span,
                    format!(
                        "no dimension enters `{}`, so its requirement decides nothing",
                        subject.name
                    ),
                )
                .label(requirement.span, "required here")
                .help("name the dimensions that it is made of, as `housing.depth`"),
            );
        }
    }
    found
}
