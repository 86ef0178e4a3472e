//! The table at a glance: requirements by subject, a row a condition, and what nothing is required
//! of below.

mod columns;
mod row;

use super::{Extent, paragraph};
use crate::report::look::{Look, Role};
use crate::report::wrap::{blanks, visible, width};
use crate::report::{Account, Case, Figure, Measure};
use crate::units::Unit;
use columns::Columns;
use row::{Row, row, unknown};

/// Rows that share a heading and a scale.
struct Block<'a> {
    subject: &'a str,
    kind: &'static str,
    heading: String,
    because: Option<&'a str>,
    /// Quantity and unit of its figures.
    shows: Option<(&'a str, &'static Unit)>,
    rows: Vec<Row>,
    limits: (Option<f64>, Option<f64>),
}

/// Writes the table of a spec.
pub(super) fn render(out: &mut String, account: &Account, extent: Extent, look: Look) {
    let blocks = blocks(account, extent);
    if blocks.is_empty() {
        return;
    }
    let columns = Columns::of(&blocks, look);
    let mut subject = "";
    for (i, block) in blocks.iter().enumerate() {
        if block.subject != subject || i == 0 {
            subject = block.subject;
            let name = visible(&format!("{} {subject}", block.kind));
            out.push('\n');
            let heads = if i == 0 { columns.heads() } else { String::new() };
            let gap = columns.figures_from().saturating_sub(width(&name));
            let line = if heads.is_empty() || gap > 0 {
                format!(
                    "{}{}{}",
                    look.paint(Role::Title, &name),
                    blanks(gap),
                    look.paint(Role::Quiet, &heads)
                )
            } else {
                format!(
                    "{}{}\n{}",
                    blanks(columns.figures_from()),
                    look.paint(Role::Quiet, &heads),
                    look.paint(Role::Title, &name)
                )
            };
            out.push_str(line.trim_end());
            out.push('\n');
        }
        paragraph(out, 2, &block.heading, Role::Plain, look);
        if let Some(because) = block.because {
            paragraph(out, 4, because, Role::Quiet, look);
        }
        columns.rows(out, block, look);
    }
}

/// The blocks of every subject in the order of the spec: its requirements, then its other figures.
fn blocks(account: &Account, extent: Extent) -> Vec<Block<'_>> {
    let mut subjects: Vec<(&str, &'static str)> = Vec::new();
    for figure in &account.figures {
        if !subjects.iter().any(|(name, _)| *name == figure.subject) {
            subjects.push((&figure.subject, figure.kind));
        }
    }
    for case in &account.cases {
        if !subjects.iter().any(|(name, _)| *name == case.subject) {
            subjects.push((&case.subject, case.kind));
        }
    }
    let mut blocks = Vec::new();
    for (subject, kind) in subjects {
        let mut requirements: Vec<Vec<&Case>> = Vec::new();
        for case in account.cases.iter().filter(|c| c.subject == subject) {
            match requirements.last_mut().filter(|r| r[0].requirement == case.requirement) {
                Some(cases) => cases.push(case),
                None => requirements.push(vec![case]),
            }
        }
        let own = blocks.len();
        blocks.extend(requirements.iter().map(|cases| required(account, kind, cases)));
        let mut rest: Vec<(&Figure, Block<'_>)> = Vec::new();
        for (index, figure) in account.figures.iter().enumerate() {
            if figure.subject != subject
                || figure.secondary && extent < Extent::Detail
                || covered(account, index)
            {
                continue;
            }
            let kin = blocks[own..]
                .iter_mut()
                .rev()
                .find(|b| b.shows == Some((figure.quantity.as_str(), figure.unit)));
            if let Some(block) = kin {
                block.rows.push(row(account, figure, None));
                continue;
            }
            match rest
                .iter_mut()
                .find(|(f, _)| f.quantity == figure.quantity && f.unit == figure.unit)
            {
                Some((_, block)) => block.rows.push(row(account, figure, None)),
                None => rest.push((figure, free(account, kind, figure))),
            }
        }
        blocks.extend(rest.into_iter().map(|(_, block)| block));
    }
    blocks
}

/// True where a requirement shows a figure, or the same clearance by another name.
fn covered(account: &Account, index: usize) -> bool {
    const CLEARANCES: [&str; 3] = ["clearance", "interference", "radial clearance"];
    let figure = &account.figures[index];
    account.cases.iter().filter_map(|c| c.figure).any(|shown| {
        let other = &account.figures[shown];
        let alike = CLEARANCES.contains(&figure.quantity.as_str())
            && CLEARANCES.contains(&other.quantity.as_str());
        shown == index
            || alike
                && other.subject == figure.subject
                && other.condition == figure.condition
                && other.members == figure.members
    })
}

fn required<'a>(account: &Account, kind: &'static str, cases: &[&'a Case]) -> Block<'a> {
    let case = cases[0];
    let id = case.id.as_ref().map_or_else(String::new, |id| format!("{id}  "));
    let method = match &case.statistics {
        _ if !case.statistical => String::new(),
        Some(s) if s.mean.is_finite() => {
            format!(", {}: mean and {} sigma to each side", case.method, s.shown_sigmas)
        }
        _ => format!(", {}", case.method),
    };
    let what = what(case.measure, &case.quantity);
    let limits = with_unit(&case.limits, case.unit);
    let rows = cases
        .iter()
        .map(|case| match case.figure.map(|f| &account.figures[f]) {
            Some(figure) => row(account, figure, Some(case)),
            None => unknown(case),
        })
        .collect();
    Block {
        subject: &case.subject,
        kind,
        heading: format!("{id}{what} {limits}{method}").trim_start().to_string(),
        because: case.because.as_deref(),
        shows: Some((&case.quantity, case.unit)),
        rows,
        limits: (case.lower, case.upper),
    }
}

/// Limits as written, with the unit of the figures where that is not what they were written in.
fn with_unit(limits: &str, unit: &'static Unit) -> String {
    let is_own =
        |word: &str| word == unit.name || word == unit.symbol || unit.spellings.contains(&word);
    let mut words = limits.split(' ').map(|w| w.trim_start_matches(|c: char| !c.is_alphabetic()));
    let has_unit = limits.contains(|c: char| c.is_alphabetic() || c == '%' || c == '°');
    if unit.symbol.is_empty() || limits.contains('%') || words.any(is_own) {
        limits.to_string()
    } else if has_unit {
        format!("{limits}, in {}", unit.symbol)
    } else {
        format!("{limits} {}", unit.symbol)
    }
}

fn free<'a>(account: &Account, kind: &'static str, figure: &'a Figure) -> Block<'a> {
    let unit = figure.unit.symbol;
    let what = what(figure.measure, &figure.quantity);
    let heading: Vec<&str> = [what.as_str(), unit].into_iter().filter(|w| !w.is_empty()).collect();
    Block {
        subject: &figure.subject,
        kind,
        heading: heading.join(", "),
        because: None,
        shows: None,
        rows: vec![row(account, figure, None)],
        limits: (None, None),
    }
}

/// Across what, and which quantity; a gap and a result are their own quantity.
fn what(measure: Option<Measure>, quantity: &str) -> String {
    let quantity = if matches!(quantity, "gap" | "value") { "" } else { quantity };
    // A radial clearance says so itself.
    let measure = measure.map_or("", Measure::word);
    let measure = if quantity.starts_with(measure) { "" } else { measure };
    let words = [measure, quantity];
    words.into_iter().filter(|word| !word.is_empty()).collect::<Vec<_>>().join(" ")
}

#[cfg(test)]
mod tests {
    use super::{what, with_unit};
    use crate::report::Measure;
    use crate::units::find;

    #[test]
    fn a_heading_says_across_what_once() {
        assert_eq!(what(Some(Measure::Radial), "radial clearance"), "radial clearance");
        assert_eq!(what(Some(Measure::Diametral), "clearance"), "diametral clearance");
        assert_eq!(what(Some(Measure::Linear), "gap"), "linear");
        assert_eq!(what(None, "pressure"), "pressure");
    }

    #[test]
    fn figures_say_their_unit_once() {
        let shown = |limits, unit| with_unit(limits, find(unit).unwrap());
        assert_eq!(shown("0 .. 0.030", "mm"), "0 .. 0.030 mm");
        assert_eq!(shown(">= 6 kN", "N"), ">= 6 kN, in N");
        assert_eq!(shown("<= 120MPa", "MPa"), "<= 120MPa");
        assert_eq!(shown("<= 3 deg", "deg"), "<= 3 deg");
        assert_eq!(shown("<= 85 % of yield", "%"), "<= 85 % of yield");
        assert_eq!(shown(">= 1.2", ""), ">= 1.2");
    }
}
