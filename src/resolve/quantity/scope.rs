//! How far a unit governs.
//!
//! A unit after the first number governs what follows, until another one stands. A unit at the end
//! alone governs the whole where there is no default unit; where there is one it has to be that one,
//! since `58 ±50 um` could be meant either way. A `%` after `±` is a share of a value that is not
//! itself in %.

use super::unit::{measures, unit, unit_for, with_article};
use super::{Context, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::Span;
use crate::syntax::tree;
use crate::units::{Kind, Unit};

/// What a deviation is counted in.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum Of {
    /// In a unit.
    Unit(&'static Unit),
    /// In hundredths of the value.
    Share,
}

/// The units of a value and of its one or two deviations.
pub(super) struct GroupUnits {
    /// Of the value.
    pub(super) value: &'static Unit,
    /// Of the first deviation.
    pub(super) first: Of,
    /// Of the second one.
    pub(super) second: Of,
}

/// The unit of a number that stands alone.
pub(super) fn lone(
    cx: &mut Context,
    scalar: &tree::Scalar,
    expect: Expect,
) -> Option<&'static Unit> {
    match &scalar.unit {
        Some(written) => unit_for(cx, written, expect),
        None => bare(cx, scalar.number.span, expect),
    }
}

/// The unit of a bare number.
fn bare(cx: &mut Context, span: Span, expect: Expect) -> Option<&'static Unit> {
    if let Some(unit) = expect.bare(cx, span.file) {
        return Some(unit);
    }
    let kind = expect.kind();
    // What is no size of the file, a coating for one, is thin.
    let example = match kind {
        Kind::LENGTH => "um",
        kind => cx.head(span.file).defaults.shown(kind).name,
    };
    let finding = Diagnostic::new(
        Code::UnitMissing,
        span,
        format!("expected {} with its unit, found a bare `{}`", with_article(kind), cx.text(span)),
    );
    let finding = match example {
        "" => finding,
        name => finding.help(format!("write the unit, such as `{} {name}`", cx.text(span))),
    };
    cx.refuse(finding)
}

/// The units of both ends of a range.
pub(super) fn pair(
    cx: &mut Context,
    low: &tree::Scalar,
    high: &tree::Scalar,
    expect: Expect,
) -> Option<(&'static Unit, &'static Unit)> {
    match (&low.unit, &high.unit) {
        (Some(first), None) => {
            let first = unit_for(cx, first, expect)?;
            Some((first, first))
        }
        (Some(first), Some(second)) => {
            let first = unit_for(cx, first, expect);
            Some((first?, unit_for(cx, second, expect)?))
        }
        (None, Some(last)) => {
            let unit = unit_for(cx, last, expect)?;
            if let Some(own) = own_unit(cx, last.span, expect)
                && own.name != unit.name
            {
                let (a, b) = (cx.text(low.number.span), cx.text(high.number.span));
                let readings = [
                    format!("{a} {u} .. {b} {u}", u = unit.name),
                    format!("{a} {} .. {b} {}", own.name, unit.name),
                ];
                return both_readings(cx, last, low.span().to(high.span()), own, &readings);
            }
            Some((unit, unit))
        }
        (None, None) => {
            let unit = bare(cx, low.number.span, expect)?;
            Some((unit, unit))
        }
    }
}

/// The units of a value and its tolerance.
pub(super) fn group(
    cx: &mut Context,
    value: &tree::Scalar,
    tolerance: &tree::Tolerance,
    expect: Expect,
) -> Option<GroupUnits> {
    let (first, second) = match &tolerance.deviation {
        tree::Deviation::Symmetric(t) => (t, t),
        tree::Deviation::Limits(a, b) => (a, b),
    };
    let written = match (&first.unit, &second.unit) {
        (Some(a), Some(b)) => Some((a, b)),
        (Some(a), None) => Some((a, a)),
        // At the end alone it governs both, unless the value has a unit that governs the first.
        (None, Some(b)) if value.unit.is_none() => Some((b, b)),
        (None, Some(b)) => {
            let of_value = lone(cx, value, expect)?;
            let second = counted_in(cx, b, of_value, expect)?;
            return Some(GroupUnits { value: of_value, first: Of::Unit(of_value), second });
        }
        (None, None) => {
            let of_value = lone(cx, value, expect)?;
            let unit = Of::Unit(of_value);
            return Some(GroupUnits { value: of_value, first: unit, second: unit });
        }
    };
    let (a, b) = written?;
    if value.unit.is_some() {
        let of_value = lone(cx, value, expect)?;
        let first = counted_in(cx, a, of_value, expect)?;
        let second = counted_in(cx, b, of_value, expect)?;
        return Some(GroupUnits { value: of_value, first, second });
    }
    at_the_end(cx, value, tolerance, (a, b), expect)
}

/// A unit after the tolerance alone.
fn at_the_end(
    cx: &mut Context,
    value: &tree::Scalar,
    tolerance: &tree::Tolerance,
    (a, b): (&tree::Unit, &tree::Unit),
    expect: Expect,
) -> Option<GroupUnits> {
    let unit = unit(cx, a, expect)?;
    if unit.name == "%" && expect == Expect::Strain {
        let (v, t) = (cx.text(value.span()).to_string(), cx.text(tolerance.span).to_string());
        let t = t.trim_end_matches([' ', '%', '\u{a0}', '\u{2009}', '\u{202f}']);
        let finding = Diagnostic::new(
            Code::UnitScope,
            a.span,
            "`%` after the tolerance alone can be read in two ways",
        )
        .here("does it govern the value as well?")
        .help(format!(
            "write `{v} % {t}` for both in per cent; a share stands after a unit, as in `900 ppm ±1 %`"
        ));
        return cx.refuse(finding);
    }
    if unit.name == "%" && !is_temperature(expect) {
        let of_value = bare(cx, value.number.span, expect)?;
        let second = counted_in(cx, b, of_value, expect)?;
        return Some(GroupUnits { value: of_value, first: Of::Share, second });
    }
    let unit = unit_for(cx, a, expect)?;
    let second = unit_for(cx, b, expect)?;
    if let Some(own) = own_unit(cx, a.span, expect)
        && own.name != unit.name
    {
        let v = cx.text(value.number.span).to_string();
        let whole = cx.text(tolerance.span).to_string();
        let bare: String = without_unit(cx, tolerance, a);
        let readings = [format!("{v} {} {whole}", own.name), format!("{v} {} {bare}", unit.name)];
        return both_readings(cx, a, value.span().to(tolerance.span), own, &readings);
    }
    Some(GroupUnits { value: unit, first: Of::Unit(unit), second: Of::Unit(second) })
}

/// A tolerance as written, without that unit.
fn without_unit(cx: &Context, tolerance: &tree::Tolerance, unit: &tree::Unit) -> String {
    let text = cx.text(tolerance.span);
    let start = (unit.span.start - tolerance.span.start) as usize;
    let end = start + unit.span.len();
    match (text.get(..start), text.get(end..)) {
        (Some(before), Some(after)) => format!("{}{after}", before.trim_end()),
        _ => text.to_string(),
    }
}

/// What a deviation with a unit of its own is counted in.
fn counted_in(
    cx: &mut Context,
    written: &tree::Unit,
    of_value: &'static Unit,
    expect: Expect,
) -> Option<Of> {
    let unit = unit(cx, written, expect)?;
    let relative = unit.name == "%" && of_value.name != "%" && !is_temperature(expect);
    if relative {
        return Some(Of::Share);
    }
    if measures(unit, expect) {
        return Some(Of::Unit(unit));
    }
    let kind = if is_temperature(expect) { Kind::DIFFERENCE } else { expect.kind() };
    let finding = super::wrong_kind(written, unit, kind);
    cx.refuse(finding)
}

fn is_temperature(expect: Expect) -> bool {
    matches!(expect, Expect::Temperature | Expect::Difference)
}

/// The file's own unit where bare sizes and temperatures have one.
fn own_unit(cx: &Context, span: Span, expect: Expect) -> Option<&'static Unit> {
    match expect {
        Expect::Size | Expect::Limit | Expect::Temperature => expect.bare(cx, span.file),
        _ => None,
    }
}

/// A unit at the end that is not the file's own.
fn both_readings<T>(
    cx: &mut Context,
    written: &tree::Unit,
    whole: Span,
    own: &Unit,
    readings: &[String; 2],
) -> Option<T> {
    cx.refuse(
        Diagnostic::new(
            Code::UnitScope,
            whole,
            format!("`{}` after the last number alone can be read in two ways", written.value),
        )
        .here(format!("bare numbers of this file are in `{}`", own.name))
        .help(format!("write `{}` or `{}`", readings[0], readings[1])),
    )
}
