//! Sizes that state no tolerance and take the file's.

use super::{Sized, expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Form, Origin};
use crate::resolve::context::{Context, General, known};
use crate::resolve::quantity;
use crate::standards::iso2768;
use crate::syntax::tree;

/// ISO 2768-1, Table 3 goes by the shorter side of an angle, which a size does not tell: the
/// shortest sides have the widest tolerance, mm.
const SHORTEST_SIDE: f64 = 10.0;

/// A size without a tolerance of its own.
pub(super) fn general(
    cx: &mut Context,
    dimension: &tree::Dimension,
    value: &tree::Scalar,
    form: Form,
) -> Option<Sized> {
    let nominal = quantity::scalar(cx, value, expect(form))?;
    let Some(general) = cx.head(value.number.span.file).general.clone() else {
        return cx.refuse(missing(cx, dimension, value, form));
    };
    match general {
        General::Iso2768 { class, written } => iso_2768(cx, value, nominal, class, &written, form),
        General::ByDecimals { lengths, angle } => {
            let decimals = value.number.decimals();
            let (deviations, name) = if form == Form::Angle {
                (angle, "angle".to_string())
            } else {
                (lengths.get(&decimals).copied(), pattern(decimals))
            };
            let Some((lower, upper)) = deviations else {
                return cx.refuse(
                    Diagnostic::new(
                        Code::ToleranceMissing,
                        dimension.size.span,
                        format!("`general` has no row `{name}`, which this size would take"),
                    )
                    .help(format!("add the row, or write `{} ±…`", cx.text(value.span()))),
                );
            };
            Some(Sized::plain(nominal, lower, upper, Origin::General(format!("general {name}"))))
        }
    }
}

/// A row's first column, as a title block writes it.
fn pattern(decimals: usize) -> String {
    if decimals == 0 { "X".to_string() } else { format!(".{}", "X".repeat(decimals)) }
}

/// A size that nothing gives a tolerance.
fn missing(
    cx: &Context,
    dimension: &tree::Dimension,
    value: &tree::Scalar,
    form: Form,
) -> Diagnostic {
    let written = cx.text(value.span());
    let example = match (form, cx.head(value.number.span.file).defaults.length.name) {
        (Form::Angle, _) => "±0.5",
        (_, "in") => "±.005",
        (_, "um") => "±50",
        _ => "±0.05",
    };
    Diagnostic::new(
        Code::ToleranceMissing,
        dimension.size.span,
        format!("`{}` has no tolerance", dimension.name.value),
    )
    .help(format!(
        "write `{written} {example}`, or `{written} exact`, or add `general ISO 2768-m` to the head \
         of the file"
    ))
}

fn iso_2768(
    cx: &mut Context,
    value: &tree::Scalar,
    nominal: f64,
    class: iso2768::Class,
    written: &str,
    form: Form,
) -> Option<Sized> {
    let size = known("mm").from_si(nominal);
    let (found, name) = match form {
        Form::Angle => {
            let found = class
                .angle_minutes(SHORTEST_SIDE)
                .map(|minutes| known("arcmin").to_si(f64::from(minutes)));
            (found, format!("{written}, shorter side up to 10 mm"))
        }
        // What a chain takes a radius for is a distance from an axis, not a broken edge.
        _ => (class.length(size.abs()).map(|t| t.metres()), written.to_string()),
    };
    match found {
        Ok(t) => Some(Sized::plain(nominal, -t, t, Origin::General(name))),
        Err(refused) => {
            let finding =
                Diagnostic::new(Code::ToleranceMissing, value.span(), refused.to_string());
            cx.refuse(finding.help(refused.help()))
        }
    }
}
