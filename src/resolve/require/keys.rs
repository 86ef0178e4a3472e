//! What tells requirements apart: ids, or else subject, quantity, method and condition.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{ConditionId, Method, Quantity, Requirement, SubjectId};
use crate::resolve::context::Context;
use crate::span::Span;
use std::collections::BTreeMap;

/// The key of a requirement without an id, at one condition.
type Key = (SubjectId, Quantity, (u8, u64), Option<ConditionId>);

/// Refuses two requirements of one id, and two without ids that nothing tells apart.
pub(crate) fn check_keys(cx: &mut Context, requirements: &[Requirement]) {
    let mut ids: BTreeMap<&str, Span> = BTreeMap::new();
    let mut keys: BTreeMap<Key, Span> = BTreeMap::new();
    for requirement in requirements {
        match &requirement.id {
            Some(id) => {
                if let Some(first) = ids.get(id.as_str()) {
                    cx.report(
                        Diagnostic::new(
                            Code::DuplicateId,
                            requirement.span,
                            format!("the id `{id}` is taken already"),
                        )
                        .label(*first, "by this requirement")
                        .help("give each requirement an id of its own"),
                    );
                } else {
                    ids.insert(id, requirement.span);
                }
            }
            None => {
                let first = keys_of(requirement).find_map(|key| keys.get(&key).copied());
                if let Some(first) = first {
                    cx.report(
                        Diagnostic::new(
                            Code::RequirementsAlike,
                            requirement.span,
                            "nothing tells this requirement from an earlier one",
                        )
                        .label(first, "the same subject, quantity, method and condition")
                        .help("give each an id, as `require \"R-1\" …`, or state one range"),
                    );
                }
                keys.extend(keys_of(requirement).map(|key| (key, requirement.span)));
            }
        }
    }
}

fn keys_of(requirement: &Requirement) -> impl Iterator<Item = Key> + use<'_> {
    let method = match requirement.method {
        Method::WorstCase => (0, 0),
        Method::Rss { sigmas } => (1, sigmas.to_bits()),
        Method::Cpk(value) => (2, value.to_bits()),
        Method::Share(value) => (3, value.to_bits()),
    };
    let of = move |condition| (requirement.subject, requirement.quantity, method, condition);
    let unconditional = requirement.conditions.is_empty().then(|| of(None));
    requirement.conditions.iter().map(move |id| of(Some(*id))).chain(unconditional)
}
