//! Tables of numbers in text files: one row a line, cells parted by `,`, `;` or tabs, a header of
//! `NAME` or `NAME [unit]`. Every cell keeps its place, so that a finding can point into the table.

use super::context::{Context, known};
use super::quantity::{self, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{FileId, Span};
use crate::syntax::tree;
use crate::units::{Kind, Unit};

/// A table as read.
#[derive(Debug, Clone)]
pub(crate) struct Table {
    /// The header; empty where the first row holds numbers already.
    pub(crate) header: Vec<Header>,
    /// Rows of numbers, each with as many cells as there are columns.
    pub(crate) rows: Vec<Vec<Cell>>,
    /// Count of columns.
    pub(crate) columns: usize,
}

/// The head of a column.
#[derive(Debug, Clone)]
pub(crate) struct Header {
    /// Its name.
    pub(crate) name: tree::Name,
    /// The unit in brackets.
    pub(crate) unit: Option<tree::Unit>,
}

/// A number in a table.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Cell {
    /// The number as it stands.
    pub(crate) value: f64,
    /// Where it stands.
    pub(crate) span: Span,
}

/// Reads a table; a finding for the first thing wrong with it.
pub(crate) fn read(cx: &mut Context, file: FileId) -> Option<Table> {
    let text = cx.sources.get(file).text().to_string();
    let mut lines = lines(&text).peekable();
    let Some(&(_, first)) = lines.peek() else {
        let (name, whole) = (cx.sources.get(file).name(), Span::new(file, 0, 0));
        let finding = Diagnostic::new(Code::TableShape, whole, format!("`{name}` is empty"));
        return cx.refuse(finding);
    };
    let separator = [';', '\t', ','].into_iter().find(|c| first.contains(*c)).unwrap_or(',');
    let cells = |(offset, line): (usize, &str)| cells(file, offset, line, separator);
    let mut header = Vec::new();
    if number(first.split(separator).next().unwrap_or("").trim()).is_none()
        && let Some(line) = lines.next()
    {
        header = cells(line).into_iter().map(|(text, span)| head(&text, span)).collect();
    }
    let mut rows = Vec::new();
    let mut columns = header.len();
    for line in lines {
        let row = cells(line);
        if columns == 0 {
            columns = row.len();
        }
        if row.len() != columns {
            let here = Span::new(file, line.0, line.0 + line.1.len());
            return cx.refuse(
                Diagnostic::new(
                    Code::TableShape,
                    here,
                    format!("expected {}, found {}", count(columns), row.len()),
                )
                .help("every row has a cell for each column"),
            );
        }
        let mut numbers = Vec::with_capacity(columns);
        for (text, span) in row {
            numbers.push(cell(cx, &text, span)?);
        }
        rows.push(numbers);
    }
    if rows.is_empty() {
        let whole = Span::new(file, 0, text.trim_end().len());
        let finding = Diagnostic::new(Code::TableShape, whole, "the table has no rows")
            .help("below the header, each line is a row of numbers");
        return cx.refuse(finding);
    }
    Some(Table { header, rows, columns })
}

fn count(columns: usize) -> String {
    if columns == 1 { "1 cell".to_string() } else { format!("{columns} cells") }
}

/// Lines that hold anything, with their offsets; a byte order mark and line ends are left out.
fn lines(text: &str) -> impl Iterator<Item = (usize, &str)> {
    let skipped = if text.starts_with('\u{feff}') { '\u{feff}'.len_utf8() } else { 0 };
    let mut offset = skipped;
    text[skipped..]
        .split_inclusive('\n')
        .map(move |line| {
            let start = offset;
            offset += line.len();
            (start, line.trim_end_matches(['\n', '\r']))
        })
        .filter(|(_, line)| !line.trim().is_empty())
}

/// The cells of a line, trimmed, with their places.
fn cells(file: FileId, offset: usize, line: &str, separator: char) -> Vec<(String, Span)> {
    let mut start = offset;
    line.split(separator)
        .map(|raw| {
            let lead = raw.len() - raw.trim_start().len();
            let text = raw.trim();
            let span = Span::new(file, start + lead, start + lead + text.len());
            start += raw.len() + separator.len_utf8();
            let bare = text.strip_prefix('"').and_then(|t| t.strip_suffix('"')).unwrap_or(text);
            (bare.to_string(), span)
        })
        .collect()
}

/// `NAME` or `NAME [unit]`.
fn head(text: &str, span: Span) -> Header {
    let parts =
        text.split_once('[').and_then(|(n, u)| Some((n.trim(), u.strip_suffix(']')?.trim())));
    let (name, unit) = match parts {
        Some((name, unit)) => (name, Some(tree::Name::new(unit.to_string(), span))),
        None => (text, None),
    };
    Header { name: tree::Name::new(name.to_string(), span), unit }
}

fn number(text: &str) -> Option<f64> {
    // Words such as `nan` are no numbers here.
    let plain = text.starts_with(|c: char| c.is_ascii_digit() || "+-.\u{2212}".contains(c));
    let value: f64 = text.replace('\u{2212}', "-").parse().ok()?;
    (plain && value.abs() <= 1e100).then_some(value)
}

fn cell(cx: &mut Context, text: &str, span: Span) -> Option<Cell> {
    if let Some(value) = number(text) {
        return Some(Cell { value, span });
    }
    let finding = match text {
        "" => Diagnostic::new(Code::TableCell, span, "empty cell, expected a number"),
        text => {
            Diagnostic::new(Code::TableCell, span, format!("expected a number, found `{text}`"))
        }
    };
    cx.refuse(finding.help("cells hold numbers; units stand in the header, as `NAME [unit]`"))
}

/// The unit of a column: its own, or that of the spec that reads it.
pub(crate) fn unit(
    cx: &mut Context,
    header: &Header,
    expect: Expect,
    spec: FileId,
) -> Option<&'static Unit> {
    match &header.unit {
        Some(written) => quantity::unit_for(cx, written, expect),
        None => default_unit(cx, expect, Span { file: spec, ..header.name.span }),
    }
}

/// The unit of a column that names none.
pub(crate) fn default_unit(cx: &mut Context, expect: Expect, place: Span) -> Option<&'static Unit> {
    if let Some(unit) = expect.bare(cx, place.file) {
        return Some(unit);
    }
    let kind = expect.kind();
    if kind == (Kind { time: 1, ..Kind::PURE }) {
        return Some(known("s"));
    }
    cx.refuse(
        Diagnostic::new(
            Code::UnitMissing,
            place,
            format!(
                "the table says no unit for its values, expected {}",
                quantity::with_article(kind)
            ),
        )
        .help("write it into the header of the column, as `NAME [unit]`"),
    )
}
