//! Surfaces of fits and joints that are easily taken for what they are not.

use super::{dimensions, expressions};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, DimensionId, Expr, ExprKind, SubjectKind};
use crate::resolve::expression::terms;
use crate::span::Span;

/// A fit in which one of the mating surfaces is coated and the other is not.
pub(super) fn one_coated_mate(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for subject in &assembly.subjects {
        let SubjectKind::Fit(fit) = &subject.kind else { continue };
        let [external, internal] = [&fit.external, &fit.internal].map(|side| surface(side));
        let (Some(external), Some(internal)) = (external, internal) else { continue };
        let coated = |d: DimensionId| assembly.dimension(d).coating.as_ref();
        let (coating, bare) = match (coated(external), coated(internal)) {
            (Some(coating), None) => (coating, internal),
            (None, Some(coating)) => (coating, external),
            _ => continue,
        };
        // A size after coating says that its drawing knows of the coating.
        if coating.before {
            let path = assembly.path(bare);
            found.push(
                Diagnostic::new(
                    Code::OneCoatedMate,
                    coating.span,
                    format!("only one of the mating surfaces of `{}` is coated", subject.name),
                )
                .label(assembly.dimension(bare).line, format!("`{path}` states no coating"))
                .help("where both parts are coated, both take their share of the clearance"),
            );
        }
    }
    found
}

/// The dimension of a side that is no sum.
fn surface(side: &Expr) -> Option<DimensionId> {
    match &side.kind {
        ExprKind::Size { dimension, .. } => Some(*dimension),
        ExprKind::Named(_, inner) => surface(inner),
        _ => None,
    }
}

/// The free bore or outside of a pressed ring, used as if nothing pressed on it.
pub(super) fn free_sizes(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for (fit_id, subject) in assembly.subject_ids().zip(&assembly.subjects) {
        let Some(joint) = assembly.fit(fit_id).and_then(|fit| fit.joint.as_ref()) else { continue };
        let free = joint.inner.free.iter().chain(&joint.outer.free);
        for surface in free.flat_map(|e| terms(e)) {
            let users =
                assembly.subject_ids().zip(&assembly.subjects).filter(|(id, _)| *id != fit_id);
            let Some((user, mention)) = users.into_iter().find_map(|(_, user)| {
                used_free(&user.kind, surface.dimension).map(|mention| (user, mention))
            }) else {
                continue;
            };
            let path = assembly.path(surface.dimension);
            found.push(
                Diagnostic::new(
                    Code::FreeSizeOfRing,
                    mention,
                    format!(
                        "`{}` takes the free size of `{path}`, which `{}` changes",
                        user.name, subject.name
                    ),
                )
                .label(surface.span, "a surface of the joint")
                .help(format!("write `{path} after {}`", subject.name)),
            );
        }
    }
    found
}

/// Where a subject names a dimension without `after` and nowhere with it.
///
/// Further rings of a chain of joints are solved together, so their surfaces are no such use.
fn used_free(kind: &SubjectKind, dimension: DimensionId) -> Option<Span> {
    let sides: Vec<_> = match kind {
        SubjectKind::Fit(fit) if fit.joint.is_some() => return None,
        SubjectKind::Restraint(_) | SubjectKind::Fill(_) => return None,
        kind => expressions(kind),
    };
    let mut mention = None;
    let mut after = false;
    for e in sides.into_iter().filter(|e| dimensions(e).contains_key(&dimension)) {
        e.walk(&mut |e| match e.kind {
            ExprKind::Size { dimension: d, .. } | ExprKind::Pieces { dimension: d, .. }
                if d == dimension =>
            {
                mention = mention.or(Some(e.span));
            }
            ExprKind::After { dimension: d, .. } if d == dimension => after = true,
            _ => {}
        });
    }
    mention.filter(|_| !after)
}
