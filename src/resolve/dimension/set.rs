//! `one of 0.10, 0.15, 0.20 ±0.005`: a set to select from at assembly.

use super::Sized;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::Origin;
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::span::Span;
use crate::syntax::tree::{self, Deviation};

/// The members and the tolerance that all of them have. The nominal size is that of the first.
pub(super) fn one_of(
    cx: &mut Context,
    span: Span,
    members: &[tree::Scalar],
    tolerance: Option<&tree::Tolerance>,
    expect: Expect,
) -> Option<Sized> {
    let first = members.first()?;
    let last = members.last()?;
    // The first and the last settle the units between them as the ends of a range do.
    let mut carried = match (&first.unit, members.iter().find_map(|m| m.unit.as_ref())) {
        (None, Some(late)) => {
            let written = tree::Scalar { unit: Some(late.clone()), ..last.clone() };
            quantity::same_unit(cx, first, &written, expect)?;
            Some(late.clone())
        }
        (own, _) => own.clone(),
    };
    let mut sizes: Vec<f64> = Vec::with_capacity(members.len());
    let mut deviations = (0.0, 0.0);
    for (index, member) in members.iter().enumerate() {
        carried = member.unit.clone().or(carried);
        let member = tree::Scalar { unit: carried.clone(), ..member.clone() };
        // The tolerance stands behind the last, and a share of it would be another for each.
        let beside = tolerance.filter(|_| index + 1 == members.len());
        if let Some(tolerance) = beside {
            absolute(cx, tolerance)?;
        }
        let t = quantity::toleranced(cx, &member, beside, expect)?;
        if let Some(twin) = sizes.iter().position(|size| *size == t.nominal) {
            return cx.refuse(
                Diagnostic::new(Code::StatedTwice, member.span(), "this size is in the set twice")
                    .label(members[twin].span(), "first stated here")
                    .help("keep one of the two"),
            );
        }
        sizes.push(t.nominal);
        if beside.is_some() {
            deviations = (t.lower, t.upper);
        }
    }
    if sizes.len() < 2 {
        return cx.refuse(
            Diagnostic::new(Code::SetOfOne, span, "a set of one size leaves nothing to select")
                .help("state the sizes to select from, such as `one of 0.10, 0.15 ±0.005`"),
        );
    }
    let sized = Sized::plain(sizes[0], deviations.0, deviations.1, Origin::Set);
    Some(Sized { members: sizes, ..sized })
}

/// Refuses a tolerance that is a share of each size.
fn absolute(cx: &mut Context, tolerance: &tree::Tolerance) -> Option<()> {
    let unit = match &tolerance.deviation {
        Deviation::Symmetric(t) => t.unit.as_ref(),
        Deviation::Limits(a, b) => a.unit.as_ref().or(b.unit.as_ref()),
    };
    match unit.filter(|unit| unit.value == "%") {
        None => Some(()),
        Some(unit) => cx.refuse(
            Diagnostic::new(
                Code::WrongKind,
                unit.span,
                "the tolerance of a set is one for all its sizes, not a share of each",
            )
            .help("state it as a length"),
        ),
    }
}
