//! `spread …`: how a value varies, with the values measured where a file has them.

use super::{Context, Expect, finite, scalar};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::Spread;
use crate::model::dimension::Shape;
use crate::resolve::table;
use crate::syntax::tree;
use std::sync::Arc;

/// A spread clause; its shift and its measured values are of the kind expected.
pub(crate) fn spread(cx: &mut Context, stated: &tree::Spread, expect: Expect) -> Option<Spread> {
    let moved = if expect == Expect::Temperature { Expect::Difference } else { expect };
    let shift = match &stated.shift {
        Some(shift) => scalar(cx, shift, moved)?,
        None => 0.0,
    };
    let shape = match &stated.distribution.value {
        tree::Distribution::Normal { cpk: None } => Shape::Normal { cpk: None },
        tree::Distribution::Normal { cpk: Some(cpk) } => {
            if cpk.value <= 0.0 {
                return cx.refuse(
                    Diagnostic::new(
                        Code::ValueOutOfRange,
                        cpk.span,
                        format!("a capability index of {} says nothing", cpk.text),
                    )
                    .help("state a Cpk above 0, such as `Cpk 1.33`"),
                );
            }
            Shape::Normal { cpk: Some(finite(cx, cpk, cpk.value)?) }
        }
        tree::Distribution::Sorted => Shape::Sorted,
        tree::Distribution::Uniform => Shape::Uniform,
        tree::Distribution::Triangular => Shape::Triangular,
        tree::Distribution::File(path) => {
            let values = measured(cx, path, expect)?;
            Shape::Measured { values: Arc::from(values), file: path.value.clone() }
        }
    };
    Some(Spread { shape, shift, stated: true })
}

/// The values of the only column of a table; its header may name a unit, and is not needed.
fn measured(cx: &mut Context, path: &tree::Text, expect: Expect) -> Option<Vec<f64>> {
    let file = cx.load(path)?;
    let table = table::read(cx, file)?;
    if table.columns != 1 {
        return cx.refuse(
            Diagnostic::new(
                Code::TableShape,
                path.span,
                format!("`{}` has {} columns, expected one", path.value, table.columns),
            )
            .help("measured values stand one on a line, below a header such as `bore [mm]`"),
        );
    }
    let unit = match table.header.first() {
        Some(header) => table::unit(cx, header, expect, path.span.file)?,
        None => table::default_unit(cx, expect, path.span)?,
    };
    let mut values = Vec::with_capacity(table.rows.len());
    for row in &table.rows {
        for cell in row {
            values.push(expect.to_si(unit, cell.value));
        }
    }
    if values.len() < 2 {
        return cx.refuse(
            Diagnostic::new(
                Code::TableShape,
                path.span,
                format!("`{}` holds too few values to show a spread", path.value),
            )
            .help(
                "two values are the least, and a hundred say little about one part in a thousand",
            ),
        );
    }
    Some(values)
}
