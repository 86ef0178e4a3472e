//! Where figures, verdicts and strips of a table stand. Columns are as wide in every block of a spec,
//! so that figures stand under figures.

use super::Block;
use super::row::Row;
use crate::findings::Standing;
use crate::report::look::{Look, Role};
use crate::report::text::paragraph;
use crate::report::text::strip::{Band, Scale, strip};
use crate::report::wrap::{blanks, left, right, width};

/// Condition names longer than this stand on a line of their own.
const MOST_NAME_COLUMNS: usize = 16;
/// Room for the longest verdict.
const VERDICT_COLUMNS: usize = 9;
/// A strip shorter than this says nothing.
const LEAST_STRIP_COLUMNS: usize = 9;
/// A strip longer than this is no easier to read.
const MOST_STRIP_COLUMNS: usize = 32;

/// How wide the columns of a spec are.
pub(super) struct Columns {
    name: usize,
    figure: usize,
    margin: usize,
    strip: usize,
}

impl Columns {
    /// Wide enough for every row, the strip in what is left.
    pub(super) fn of(blocks: &[Block<'_>], look: Look) -> Columns {
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

    /// The column that figures begin at.
    pub(super) fn figures_from(&self) -> usize {
        4 + self.name
    }

    /// The heads of the figures, from that column on.
    pub(super) fn heads(&self) -> String {
        let figure = |head| format!("  {}", right(head, self.figure));
        let margin = right("margin", self.margin);
        format!("{}{}{}  {margin}", figure("least"), figure("mean"), figure("greatest"))
    }

    /// Writes the rows of a block, all strips on one scale.
    pub(super) fn rows(&self, out: &mut String, block: &Block<'_>, look: Look) {
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
