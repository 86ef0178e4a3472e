//! Columns: what stands under each other in lines that belong together.

use super::token::Kind;

/// Columns between a line and its comment.
const BEFORE_COMMENT: usize = 2;

/// A line of the outcome.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct Row {
    /// Columns before it.
    pub(super) indent: usize,
    /// Its cells; all but the last are as wide as their neighbours above and below.
    pub(super) cells: Vec<String>,
    /// Which rows it lines up with; none: with no other.
    pub(super) kind: Option<Kind>,
    /// The comment at its end.
    pub(super) comment: Option<String>,
    /// True if an empty line stands before it.
    pub(super) blank_before: bool,
}

/// Joins rows to a text, neighbours of one kind in columns.
pub(super) fn join(mut rows: Vec<Row>) -> String {
    for run in rows.chunk_by_mut(|a, b| {
        a.kind.is_some() && a.kind == b.kind && a.indent == b.indent && !b.blank_before
    }) {
        if run[0].kind == Some(Kind::Condition) {
            pad_numbers(run);
            continue;
        }
        for column in 0..run.iter().map(|row| row.cells.len()).max().unwrap_or(1).saturating_sub(1)
        {
            let here = |row: &Row| {
                if column + 1 < row.cells.len() { width(&row.cells[column]) } else { 0 }
            };
            let widest = run.iter().map(here).max().unwrap_or(0);
            for row in run.iter_mut().filter(|row| column + 1 < row.cells.len()) {
                let missing = widest - width(&row.cells[column]);
                row.cells[column].push_str(&" ".repeat(missing));
            }
        }
    }
    let mut lines: Vec<(String, Row)> = rows
        .into_iter()
        .map(|row| (format!("{}{}", " ".repeat(row.indent), row.cells.join(" ").trim_end()), row))
        .collect();
    for run in lines.chunk_by_mut(|(_, a), (_, b)| {
        a.comment.is_some() && b.comment.is_some() && !b.blank_before
    }) {
        let widest = run.iter().map(|(line, _)| width(line)).max().unwrap_or(0);
        for (line, row) in run {
            if let Some(comment) = &row.comment {
                let missing = widest - width(line) + BEFORE_COMMENT;
                line.push_str(&" ".repeat(missing));
                line.push_str(comment);
            }
        }
    }
    let mut out = String::new();
    for (line, row) in lines {
        out.push_str(if row.blank_before { "\n" } else { "" });
        out.push_str(&line);
        out.push('\n');
    }
    out
}

/// Puts the last whole digits of the rows' numbers under each other, as far left as the names allow;
/// a row that holds no number begins where the longest number does.
fn pad_numbers(run: &mut [Row]) {
    let digits = |row: &Row| {
        let text = row.cells.last().map_or("", String::as_str);
        text.chars().take_while(|c| c.is_ascii_digit() || "+-\u{2212}".contains(*c)).count()
    };
    let longest = run.iter().map(digits).max().unwrap_or(0);
    let indent = |row: &Row| if digits(row) == 0 { 0 } else { longest - digits(row) };
    let least = |row: &Row| (width(&row.cells[0]) + 1).saturating_sub(indent(row));
    let begin = run.iter().filter(|row| row.cells.len() > 1).map(least).max().unwrap_or(0);
    for row in run.iter_mut().filter(|row| row.cells.len() > 1) {
        let blanks = begin + indent(row) - width(&row.cells[0]) - 1;
        row.cells[0].push_str(&" ".repeat(blanks));
    }
}

/// Columns a text takes.
pub(super) fn width(text: &str) -> usize {
    unicode_width::UnicodeWidthStr::width(text)
}
