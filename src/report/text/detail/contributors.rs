//! What a range is made of: each cause with its sum and a bar, its contributors below.

use super::LEAST_SHARE;
use crate::findings::number::{Round, difference, digits, share};
use crate::findings::words::count;
use crate::report::cause::by_cause;
use crate::report::look::{Look, Role};
use crate::report::wrap::{blanks, left, right, visible, width};
use crate::report::{Case, CauseSum, Contribution};

/// Columns of the longest bar.
const MOST_BAR_COLUMNS: usize = 16;
/// Names longer than this stand on a line of their own.
const MOST_NAME_COLUMNS: usize = 28;
/// Columns of a sensitivity and of a share.
const SENSITIVITY_COLUMNS: usize = 11;
const SHARE_COLUMNS: usize = 8;

/// How wide the columns of one requirement are.
struct Columns {
    name: usize,
    part: usize,
    variance: bool,
    look: Look,
}

/// Writes the causes of a requirement, largest first.
pub(super) fn render(out: &mut String, case: &Case, look: Look) {
    let list = &case.contributors;
    let unit = case.unit.symbol;
    let head = if unit.is_empty() { "part".to_string() } else { format!("part, {unit}") };
    let names = list.iter().map(|c| width(&short(c)) + 2);
    let words = list.iter().map(|c| c.cause.word().len());
    let name = names.chain(words).filter(|&n| n <= MOST_NAME_COLUMNS).max().unwrap_or(0);
    let parts = list.iter().map(|c| width(&figure(case, c.part)));
    let columns = Columns {
        name: name.max("largest first".len()),
        part: parts.max().unwrap_or(0).max(width(&head)),
        variance: list.iter().any(|c| c.share_of_variance.is_some()),
        look,
    };
    columns.heads(out, &head);
    for sum in by_cause(list) {
        columns.cause(out, case, &sum);
        let of = || list.iter().filter(|c| c.cause == sum.cause);
        for contribution in of().filter(|c| c.share_of_range.abs() >= LEAST_SHARE) {
            columns.contribution(out, case, contribution);
        }
        let small = of().filter(|c| c.share_of_range.abs() < LEAST_SHARE).count();
        if small > 0 {
            let text = format!("    {} below 0.1 %", count(small, "contributor", "contributors"));
            out.push_str(&format!("{}\n", look.paint(Role::Quiet, &text)));
        }
    }
    let interaction = case.statistics.as_ref().and_then(|s| s.interaction);
    if let Some(interaction) = interaction.filter(|i| i.abs() >= LEAST_SHARE) {
        columns.interaction(out, interaction);
    }
}

/// The name without what the cause above it says already.
fn short(c: &Contribution) -> String {
    let said = [
        "expansion scatter of ",
        "swelling scatter of ",
        "temperature of ",
        "coating of ",
        "friction of ",
        "play of ",
    ];
    let name = said.iter().find_map(|lead| c.name.strip_prefix(lead)).unwrap_or(&c.name);
    visible(name)
}

fn figure(case: &Case, part: f64) -> String {
    difference(part, case.unit, Round::Nearest)
}

/// A derivative to three digits that count.
fn sensitivity(value: f64) -> String {
    let size = value.abs();
    match value {
        _ if !value.is_finite() => "not known".to_string(),
        _ if size != 0.0 && !(1e-3..1e6).contains(&size) => format!("{value:.2e}"),
        _ if size >= 100.0 => digits(value, 0, Round::Nearest),
        _ if size >= 0.1 || size == 0.0 => digits(value, 3, Round::Nearest),
        _ => digits(value, 5, Round::Nearest),
    }
}

impl Columns {
    fn heads(&self, out: &mut String, part: &str) {
        let variance = if self.variance { right("of var.", SHARE_COLUMNS) } else { String::new() };
        let line = format!(
            "  {}{}  {}{}{variance}  as written",
            left("largest first", self.name),
            right("sensitivity", SENSITIVITY_COLUMNS),
            right(part, self.part),
            right("of range", SHARE_COLUMNS + 2),
        );
        out.push_str(&format!("{}\n", self.look.paint(Role::Quiet, &line)));
    }

    fn cause(&self, out: &mut String, case: &Case, sum: &CauseSum) {
        let mut line = format!(
            "  {}  {}{}",
            left(sum.cause.word(), self.name + SENSITIVITY_COLUMNS),
            right(&figure(case, sum.part), self.part),
            right(&share(sum.share_of_range), SHARE_COLUMNS + 2),
        );
        if self.variance {
            let of = sum.share_of_variance.map_or_else(String::new, share);
            line.push_str(&right(&of, SHARE_COLUMNS));
        }
        line.push_str("  ");
        let room = self.look.width.saturating_sub(width(&line)).min(MOST_BAR_COLUMNS);
        let bar = libm::round(sum.share_of_range.clamp(0.0, 1.0) * room as f64) as usize;
        let bar = self.look.pick("\u{2588}", "#").repeat(bar);
        let line = format!("{line}{}", self.look.paint(Role::Cure, &bar));
        out.push_str(line.trim_end());
        out.push('\n');
    }

    /// What several contributors bring to the variance that none brings alone.
    fn interaction(&self, out: &mut String, of_variance: f64) {
        let word = left("interaction", self.name + SENSITIVITY_COLUMNS);
        let before = blanks(self.part + SHARE_COLUMNS + 2);
        let share = right(&share(of_variance), SHARE_COLUMNS);
        out.push_str(&format!("  {word}  {before}{share}\n"));
    }

    fn contribution(&self, out: &mut String, case: &Case, c: &Contribution) {
        let name = short(c);
        if width(&name) + 2 > self.name {
            out.push_str(&format!("    {name}\n{}", blanks(self.name + 2)));
        } else {
            out.push_str(&format!("    {}", left(&name, self.name - 2)));
        }
        let mut line = format!(
            "{}  {}{}",
            right(&sensitivity(c.sensitivity), SENSITIVITY_COLUMNS),
            right(&figure(case, c.part), self.part),
            right(&share(c.share_of_range), SHARE_COLUMNS + 2),
        );
        if self.variance {
            let of = c.share_of_variance.map_or_else(String::new, share);
            line.push_str(&right(&of, SHARE_COLUMNS));
        }
        out.push_str(&line);
        self.written(out, self.name + 2 + width(&line), c);
        out.push('\n');
    }

    /// The tolerance as written with its basis, below the line where there is too little room.
    fn written(&self, out: &mut String, column: usize, c: &Contribution) {
        let basis = match c.basis {
            Some("assumed") => "ASSUMED",
            Some(basis) => basis,
            None => "",
        };
        let written = visible(&c.written);
        let text = match (written.as_str(), basis) {
            (written, "") => written.to_string(),
            ("", basis) => basis.to_string(),
            (written, basis) => format!("{written}, {basis}"),
        };
        if text.is_empty() {
            return;
        }
        let role = if basis == "ASSUMED" { Role::Warn } else { Role::Plain };
        let shown = self.look.paint(role, &text);
        if column + 2 + width(&text) <= self.look.width {
            out.push_str(&format!("  {shown}"));
        } else {
            let lead = blanks(self.look.width.saturating_sub(width(&text)));
            out.push_str(&format!("\n{lead}{shown}"));
        }
    }
}
