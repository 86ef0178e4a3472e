//! Tables of a material block: a property at several temperatures.

use crate::diagnostic::{Code, Diagnostic};
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::syntax::tree::{self, RowKey};

/// The rows as (temperature in K, value), temperatures rising.
pub(super) fn rows(
    cx: &mut Context,
    stated: &tree::Property,
    table: &tree::Table,
    expect: Expect,
) -> Option<Vec<(f64, f64)>> {
    let mut rows: Vec<(f64, f64)> = Vec::with_capacity(table.rows.len());
    for row in &table.rows {
        let RowKey::Temperature(key) = &row.key else {
            return cx.refuse(
                Diagnostic::new(
                    Code::WrongKind,
                    row.span,
                    format!("`{}` is a table against temperature", cx.text(stated.kind.span)),
                )
                .help("begin the row with a temperature, such as `100 11.5`"),
            );
        };
        let temperature = quantity::scalar(cx, key, Expect::Temperature)?;
        quantity::above_absolute_zero(cx, key.span(), temperature)?;
        if rows.last().is_some_and(|(last, _)| *last >= temperature) {
            return cx.refuse(
                Diagnostic::new(
                    Code::TableNotRising,
                    key.span(),
                    "the temperatures of a table have to rise",
                )
                .help("sort the rows, and keep one for each temperature"),
            );
        }
        if let Some(tolerance) = &row.value.tolerance {
            return cx.refuse(
                Diagnostic::new(
                    Code::ToleranceOfRow,
                    tolerance.span,
                    "the tolerance of a table is one for all its rows",
                )
                .help("write it before the brace, such as `modulus ±2 %, GPa { … }`"),
            );
        }
        let value = value(cx, &row.value.value, table, expect)?;
        rows.push((temperature, value));
    }
    if rows.is_empty() {
        return cx.refuse(
            Diagnostic::new(Code::TableShape, stated.span, "the table has no rows")
                .help("each row is a temperature and a value, such as `100 11.5`"),
        );
    }
    Some(rows)
}

/// A value of a row, in its own unit or in that of the table.
pub(super) fn value(
    cx: &mut Context,
    value: &tree::Scalar,
    table: &tree::Table,
    expect: Expect,
) -> Option<f64> {
    quantity::scalar(cx, &with_unit(value, table), expect)
}

/// A number with the unit of its table where it has none.
pub(super) fn with_unit(value: &tree::Scalar, table: &tree::Table) -> tree::Scalar {
    tree::Scalar {
        number: value.number.clone(),
        unit: value.unit.clone().or_else(|| table.unit.clone()),
    }
}
