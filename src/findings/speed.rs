//! `speed-without-effect`: a part that turns but belongs to no joint.
//!
//! Growth by rotation is computed for the rings of joints only; a free part's sizes stay as they are.

use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, PartId, SubjectKind};

pub(super) fn find(assembly: &Assembly, found: &mut Vec<Diagnostic>) {
    let joined = |part: PartId| {
        assembly.subjects.iter().any(|s| match &s.kind {
            SubjectKind::Fit(fit) => {
                fit.joint.as_ref().is_some_and(|j| j.inner.part == part || j.outer.part == part)
            }
            _ => false,
        })
    };
    for condition in &assembly.conditions {
        let Some(rotation) = &condition.speed else { continue };
        for &part in rotation.parts.iter().filter(|p| !joined(**p)) {
            found.push(
                Diagnostic::new(
                    Code::SpeedWithoutEffect,
                    condition.span,
                    format!(
                        "{} turns at {}, but its growth by rotation is not computed",
                        words::name(&assembly.part(part).name),
                        words::name(&condition.name)
                    ),
                )
                .label(assembly.part(part).span, "a ring of no `joint`")
                .help(
                    "rotation acts on the rings of a `joint`; give a free part its growth as \
                     `strain … at CONDITION`",
                ),
            );
        }
    }
}
