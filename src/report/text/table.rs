//! The table at a glance: requirements by subject, a row a condition, and what nothing is required
//! of below. Columns are as wide in every block of a spec, so that figures stand under figures.

use super::detail::statistics::capability;
use super::strip::{Band, Scale, strip};
use super::{Extent, paragraph};
use crate::findings::Standing;
use crate::findings::number::{Round, decimals, difference, difference_with_unit, digits, shown};
use crate::report::look::{Look, Role};
use crate::report::wrap::{blanks, left, right, visible, width};
use crate::report::{Account, Case, Figure, Measure};
use crate::units::Unit;

/// Condition names longer than this stand on a line of their own.
const MOST_NAME_COLUMNS: usize = 16;
/// Room for the longest verdict.
const VERDICT_COLUMNS: usize = 9;
/// A strip shorter than this says nothing.
const LEAST_STRIP_COLUMNS: usize = 9;
/// A strip longer than this is no easier to read.
const MOST_STRIP_COLUMNS: usize = 32;

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

/// One line of figures, ready but for its alignment. Empty figures are not known.
struct Row {
    name: String,
    least: String,
    mean: String,
    greatest: String,
    margin: String,
    standing: Option<Standing>,
    band: Option<(f64, f64, f64)>,
    aside: String,
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
                block.rows.push(row(figure, None));
                continue;
            }
            match rest
                .iter_mut()
                .find(|(f, _)| f.quantity == figure.quantity && f.unit == figure.unit)
            {
                Some((_, block)) => block.rows.push(row(figure, None)),
                None => rest.push((figure, free(kind, figure))),
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
    let unit = case.unit.symbol;
    // A limit that was written with a unit of its own keeps it.
    let has_unit = case.limits.contains(|c: char| c.is_alphabetic() || c == '%' || c == '°');
    let limits = if unit.is_empty() || has_unit {
        case.limits.clone()
    } else {
        format!("{} {unit}", case.limits)
    };
    let rows = cases
        .iter()
        .map(|case| match case.figure.map(|f| &account.figures[f]) {
            Some(figure) => row(figure, Some(case)),
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

fn free<'a>(kind: &'static str, figure: &'a Figure) -> Block<'a> {
    let unit = figure.unit.symbol;
    let what = what(figure.measure, &figure.quantity);
    let heading: Vec<&str> = [what.as_str(), unit].into_iter().filter(|w| !w.is_empty()).collect();
    Block {
        subject: &figure.subject,
        kind,
        heading: heading.join(", "),
        because: None,
        shows: None,
        rows: vec![row(figure, None)],
        limits: (None, None),
    }
}

/// Across what, and which quantity; a gap and a result are their own quantity.
fn what(measure: Option<Measure>, quantity: &str) -> String {
    let quantity = if matches!(quantity, "gap" | "value") { "" } else { quantity };
    let words = [measure.map_or("", Measure::word), quantity];
    words.into_iter().filter(|word| !word.is_empty()).collect::<Vec<_>>().join(" ")
}

fn row(figure: &Figure, case: Option<&Case>) -> Row {
    let unit = figure.unit;
    let mut name = figure.condition.clone().unwrap_or_else(|| "any".to_string());
    for (set, size) in &figure.members {
        let size = digits(*size * 1e3, 3, Round::Nearest);
        name.push_str(&format!(", {set} {size} mm"));
    }
    let margin = case.map(|c| c.margin).filter(|m| !m.is_nan());
    // A row is about what decides: the proven bounds, or the spread from assembly to assembly.
    let statistics = case.filter(|c| c.statistical).and_then(|c| c.statistics.as_ref());
    let (least, mean, greatest) = match statistics.filter(|s| s.mean.is_finite()) {
        Some(s) => {
            let (low, high) =
                (s.low.0 - s.shown_sigmas * s.low.1, s.high.0 + s.shown_sigmas * s.high.1);
            (low, s.mean, high)
        }
        None => (figure.least, figure.mean, figure.greatest),
    };
    let aside = match statistics {
        Some(s) => capability(s),
        None => aside(figure),
    };
    Row {
        name: visible(&name),
        least: shown(least, unit, Round::Down),
        mean: shown(mean, unit, Round::Nearest),
        greatest: shown(greatest, unit, Round::Up),
        margin: margin.map_or_else(String::new, |m| difference(m, unit, Round::Down)),
        standing: case.map(|c| c.standing),
        band: Some((least, mean, greatest)),
        aside,
    }
}

fn unknown(case: &Case) -> Row {
    Row {
        name: visible(case.condition.as_deref().unwrap_or("any")),
        least: String::new(),
        mean: String::new(),
        greatest: String::new(),
        margin: String::new(),
        standing: Some(case.standing),
        band: None,
        aside: String::new(),
    }
}

/// A negative clearance as the interference it is, and the reverse.
fn aside(figure: &Figure) -> String {
    let other = match figure.quantity.as_str() {
        "clearance" => "interference",
        "radial clearance" => "radial interference",
        "interference" => "clearance",
        _ => return String::new(),
    };
    // What prints as zero is no interference worth a line.
    let least_digit = libm::pow(10.0, -(decimals(figure.unit) as f64));
    if figure.unit.from_si(figure.least) > -least_digit {
        return String::new();
    }
    let most = difference_with_unit(-figure.least, figure.unit, Round::Up);
    if figure.greatest >= 0.0 {
        format!("{other} up to {most}")
    } else {
        let fewest = difference(-figure.greatest, figure.unit, Round::Down);
        format!("{other} {fewest} .. {most}")
    }
}

/// How wide the columns of a spec are.
struct Columns {
    name: usize,
    figure: usize,
    margin: usize,
    strip: usize,
}

impl Columns {
    fn of(blocks: &[Block<'_>], look: Look) -> Columns {
        let rows = || blocks.iter().flat_map(|b| &b.rows);
        let most =
            |of: fn(&Row) -> usize, least: usize| rows().map(of).max().unwrap_or(0).max(least);
        let figure =
            most(|r| width(&r.least).max(width(&r.mean)).max(width(&r.greatest)), "greatest".len());
        let margin = most(|r| width(&r.margin), "margin".len());
        let name =
            rows().map(|r| width(&r.name)).filter(|&n| n <= MOST_NAME_COLUMNS).max().unwrap_or(0);
        let name = name.max(8);
        let taken = 4 + name + 3 * (figure + 2) + margin + 2 + 2 + VERDICT_COLUMNS + 2;
        let strip = look.width.saturating_sub(taken).min(MOST_STRIP_COLUMNS);
        let strip = if strip < LEAST_STRIP_COLUMNS { 0 } else { strip };
        Columns { name, figure, margin, strip }
    }

    fn figures_from(&self) -> usize {
        4 + self.name
    }

    fn heads(&self) -> String {
        let figure = |head| format!("  {}", right(head, self.figure));
        let margin = right("margin", self.margin);
        format!("{}{}{}  {margin}", figure("least"), figure("mean"), figure("greatest"))
    }

    fn rows(&self, out: &mut String, block: &Block<'_>, look: Look) {
        let (lower, upper) = block.limits;
        let ends = block.rows.iter().filter_map(|r| r.band).flat_map(|(l, _, g)| [l, g]);
        let scale = Scale::over(ends.chain(lower).chain(upper)).filter(|_| self.strip > 0);
        for row in &block.rows {
            if width(&row.name) > self.name {
                out.push_str(&format!("    {}\n{}", row.name, blanks(4 + self.name)));
            } else {
                out.push_str(&format!("    {}", left(&row.name, self.name)));
            }
            let bad = row.standing.is_some_and(Standing::is_bad);
            let role = if bad { Role::Bad } else { Role::Plain };
            let mut line = String::new();
            if row.band.is_some() {
                for figure in [&row.least, &row.mean, &row.greatest] {
                    line.push_str(&format!("  {}", right(figure, self.figure)));
                }
            } else {
                line.push_str(&left("  not computed", 3 * (self.figure + 2)));
            }
            let margin = right(&row.margin, self.margin);
            line.push_str(&format!("  {}", look.paint(role, &margin)));
            let (role, word) = verdict(row.standing);
            line.push_str(&format!("  {}", look.paint(role, &left(&word, VERDICT_COLUMNS))));
            if let (Some(scale), Some((least, mean, greatest))) = (scale, row.band) {
                let (lower, upper) = row.standing.map_or((None, None), |_| (lower, upper));
                let band = Band { least, mean, greatest, lower, upper };
                line.push_str(&format!("  {}", strip(band, scale, self.strip, look)));
            }
            out.push_str(line.trim_end());
            out.push('\n');
            if !row.aside.is_empty() {
                paragraph(out, self.figures_from() + 2, &row.aside, Role::Quiet, look);
            }
        }
    }
}

/// The verdict as written and its colour: what needs a reader stands in capitals.
fn verdict(standing: Option<Standing>) -> (Role, String) {
    match standing {
        None => (Role::Plain, String::new()),
        Some(standing) if standing.is_bad() => (Role::Bad, standing.word().to_uppercase()),
        Some(Standing::Conceded) => (Role::Warn, Standing::Conceded.word().to_string()),
        Some(standing) => (Role::Good, standing.word().to_string()),
    }
}
