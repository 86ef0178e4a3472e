//! Temperatures against time from a table: columns `time`, names of parts and fills, `ambient` for
//! the rest. Temperatures in K, times in s.

use super::{fill, name_of, names};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{History, OwnTemperature, Owner, PartId, Scenario, State};
use crate::numeric::piecewise::Beyond;
use crate::numeric::{Curve, Piecewise};
use crate::resolve::context::{Context, suggest};
use crate::resolve::quantity::{self, Expect, above_absolute_zero};
use crate::resolve::table::{self, Cell, Header, Table};
use crate::span::FileId;
use crate::syntax::tree;
use crate::units::{Kind, Unit};
use std::sync::Arc;

/// What a column holds.
#[derive(Clone, Copy, PartialEq)]
enum Column {
    Time,
    Ambient,
    Of(Owner),
}

/// Reads the history of a condition.
pub(super) fn history(
    cx: &mut Context,
    stated: &tree::Condition,
    path: &tree::Text,
    tolerance: Option<&tree::Tolerance>,
    states: &[State],
) -> Option<History> {
    let band = band(cx, stated, tolerance);
    let file = cx.load(path)?;
    let table = table::read(cx, file)?;
    let columns = columns(cx, &table, path, states)?;
    let times = times(cx, &table, &columns, path)?;
    let mut parts = Vec::new();
    let mut ambient = None;
    for (index, column) in columns.iter().enumerate() {
        let header = &table.header[index];
        match column {
            Column::Time => {}
            Column::Ambient => {
                ambient = Some(curve(cx, &table, index, header, &times, path.span.file)?)
            }
            Column::Of(owner) => {
                parts.push((*owner, curve(cx, &table, index, header, &times, path.span.file)?));
            }
        }
    }
    complete(cx, path, states, &parts, ambient.is_some())?;
    let time = (times[0], times[times.len() - 1]);
    Some(History { file: path.value.clone(), time, parts, ambient, band: band? })
}

/// What is common to all parts at once, about zero.
fn band(
    cx: &mut Context,
    stated: &tree::Condition,
    tolerance: Option<&tree::Tolerance>,
) -> Option<Scenario> {
    let Some(tolerance) = tolerance else { return Some(Scenario::exact(0.0)) };
    let (least, greatest) = quantity::tolerance(cx, tolerance, Expect::Temperature)?;
    let spread = match &stated.spread {
        Some(spread) => Some(quantity::spread(cx, spread, Expect::Difference)?),
        None => None,
    };
    Some(Scenario { nominal: 0.0, least, greatest, spread })
}

/// What each column holds; a finding for each that is not known.
fn columns(
    cx: &mut Context,
    table: &Table,
    path: &tree::Text,
    states: &[State],
) -> Option<Vec<Column>> {
    if table.header.is_empty() {
        return cx.refuse(
            Diagnostic::new(Code::TableShape, path.span, format!("`{}` has no header", path.value))
                .help("name the columns in its first row: `time`, parts, `ambient`"),
        );
    }
    let mut columns: Vec<Column> = Vec::new();
    let mut wrong = false;
    for header in &table.header {
        let Some(column) = column(cx, header) else {
            wrong = true;
            continue;
        };
        if let Some(first) = columns.iter().position(|c| *c == column) {
            cx.report(
                Diagnostic::new(
                    Code::StatedTwice,
                    header.name.span,
                    format!("column `{}` stands twice", header.name.value),
                )
                .label(table.header[first].name.span, "first here"),
            );
            wrong = true;
        }
        let own = |owner| {
            let state = states.iter().find(|s| s.owner == owner)?;
            state.temperature.as_ref().map(|_| state.span)
        };
        if let Column::Of(owner) = column
            && let Some(row) = own(owner)
        {
            cx.report(
                Diagnostic::new(
                    Code::StatedTwice,
                    row,
                    format!("`{}` has a column in `{}` besides", header.name.value, path.value),
                )
                .label(header.name.span, "its column")
                .help("leave out the row or the column"),
            );
            wrong = true;
        }
        columns.push(column);
    }
    (!wrong).then_some(columns)
}

fn column(cx: &mut Context, header: &Header) -> Option<Column> {
    let name = &header.name;
    match name.value.as_str() {
        "time" => return Some(Column::Time),
        "ambient" => return Some(Column::Ambient),
        _ => {}
    }
    if let Some(part) = cx.part_names.get(&name.value) {
        return Some(Column::Of(Owner::Part(part)));
    }
    if let Some(fill) = fill(cx, &name.value) {
        return Some(Column::Of(Owner::Fill(fill)));
    }
    if cx.is_broken(&name.value) {
        return None;
    }
    let known = names(cx);
    let all = known.iter().map(String::as_str).chain(["time", "ambient"]);
    let help = match suggest(&name.value, all) {
        Some(near) => format!("did you mean `{near}`?"),
        None => "columns are `time`, names of parts, and `ambient` for the rest".to_string(),
    };
    cx.refuse(
        Diagnostic::new(Code::UnknownColumn, name.span, format!("unknown column `{}`", name.value))
            .help(help),
    )
}

/// The times of all rows, s; they rise.
fn times(
    cx: &mut Context,
    table: &Table,
    columns: &[Column],
    path: &tree::Text,
) -> Option<Vec<f64>> {
    let Some(index) = columns.iter().position(|c| *c == Column::Time) else {
        return cx.refuse(
            Diagnostic::new(
                Code::TableShape,
                path.span,
                format!("`{}` has no column `time`", path.value),
            )
            .help("name it in the header, such as `time [min]`"),
        );
    };
    let seconds = Expect::Of(Kind { time: 1, ..Kind::PURE });
    let unit = table::unit(cx, &table.header[index], seconds, path.span.file)?;
    let mut times: Vec<f64> = Vec::with_capacity(table.rows.len());
    for row in &table.rows {
        let cell = row[index];
        let time = unit.to_si(cell.value);
        if times.last().is_some_and(|last| *last >= time) {
            return cx.refuse(
                Diagnostic::new(
                    Code::TimeNotRising,
                    cell.span,
                    "the time has to rise from row to row",
                )
                .help("sort the rows by their time, and keep one row for each"),
            );
        }
        times.push(time);
    }
    if times.len() < 2 {
        return cx.refuse(
            Diagnostic::new(
                Code::TableShape,
                path.span,
                format!("`{}` holds one row, which is no history", path.value),
            )
            .help("state the temperature in the condition itself, or add rows"),
        );
    }
    Some(times)
}

/// The temperature of a column against time.
fn curve(
    cx: &mut Context,
    table: &Table,
    index: usize,
    header: &Header,
    times: &[f64],
    spec: FileId,
) -> Option<Arc<dyn Curve>> {
    let unit: &Unit = table::unit(cx, header, Expect::Temperature, spec)?;
    let mut points = Vec::with_capacity(times.len());
    for (row, time) in table.rows.iter().zip(times) {
        let Cell { value, span } = row[index];
        let kelvin = unit.to_si(value);
        above_absolute_zero(cx, span, kelvin)?;
        points.push((*time, kelvin));
    }
    match Piecewise::linear(&points, Beyond::Hold) {
        Ok(curve) => Some(Arc::new(curve)),
        Err(error) => cx.refuse(Diagnostic::new(
            Code::TableShape,
            header.name.span,
            format!("column `{}` is no history: {error}", header.name.value),
        )),
    }
}

/// Reports parts and fills that the history says nothing of.
fn complete(
    cx: &mut Context,
    path: &tree::Text,
    states: &[State],
    columns: &[(Owner, Arc<dyn Curve>)],
    ambient: bool,
) -> Option<()> {
    if ambient {
        return Some(());
    }
    let parts = (0..cx.parts.len() as u32).map(|i| Owner::Part(PartId(i)));
    let fills = cx.fills.iter().map(|id| Owner::Fill(*id));
    let mut silent: Vec<String> = Vec::new();
    for owner in parts.chain(fills) {
        let own = states.iter().find(|s| s.owner == owner).and_then(|s| s.temperature.as_ref());
        let from_condition = matches!(own, Some(OwnTemperature::Above { base: None, .. }));
        let said = own.is_some() && !from_condition;
        if !said && !columns.iter().any(|(o, _)| *o == owner) {
            silent.push(format!("`{}`", name_of(cx, owner)));
        }
    }
    if silent.is_empty() {
        return Some(());
    }
    let (has, own) = if silent.len() == 1 { ("has", "its own") } else { ("have", "their own") };
    cx.refuse(
        Diagnostic::new(
            Code::HistoryIncomplete,
            path.span,
            format!("{} {has} neither a column nor a temperature of {}", silent.join(", "), own),
        )
        .help(format!("add columns to `{}`, or `ambient` for the rest", path.value)),
    )
}
