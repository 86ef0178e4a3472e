//! A range drawn to scale on a line of text, between its limits.
//!
//! ```text
//! |--===+====--|     holds      |  limit
//! xx|==+=====--|     fails      =  range within the limits, x  beyond them
//!     ==+==          nothing is required here
//! ```
//! All rows of one requirement share a scale, so that what temperature does is seen by looking down
//! the page. A strip never says what the row's word does not.

use crate::report::look::{Look, Role};

/// A scale spans at least this share of what is drawn on it.
const LEAST_WIDTH: f64 = 1e-9;

/// What the strips of a group are drawn to: least and greatest value on them.
#[derive(Debug, Clone, Copy)]
pub(super) struct Scale {
    from: f64,
    to: f64,
}

impl Scale {
    /// Holds every value, with a little room at both ends; `None` where that is no scale.
    pub(super) fn over(values: impl Iterator<Item = f64>) -> Option<Scale> {
        let (mut from, mut to) = (f64::INFINITY, f64::NEG_INFINITY);
        for value in values.filter(|v| v.is_finite()) {
            from = from.min(value);
            to = to.max(value);
        }
        let room = 0.05 * (to - from);
        // A width that is a trace of rounding is no scale.
        let least = LEAST_WIDTH * from.abs().max(to.abs());
        (room.is_finite() && to - from > least)
            .then_some(Scale { from: from - room, to: to + room })
    }

    /// The cell of a value among `cells`.
    fn cell(self, value: f64, cells: usize) -> usize {
        let at = (value - self.from) / (self.to - self.from) * cells as f64;
        (at.max(0.0) as usize).min(cells - 1)
    }
}

/// A range with its middle and its limits, all in one unit.
#[derive(Debug, Clone, Copy)]
pub(super) struct Band {
    pub(super) least: f64,
    pub(super) mean: f64,
    pub(super) greatest: f64,
    pub(super) lower: Option<f64>,
    pub(super) upper: Option<f64>,
}

/// The band in `cells` columns.
pub(super) fn strip(band: Band, scale: Scale, cells: usize, look: Look) -> String {
    if band.least.is_nan() || band.greatest.is_nan() || cells == 0 {
        return String::new();
    }
    let at = |value: f64| scale.cell(value, cells);
    let lower = band.lower.map(at);
    let upper = band.upper.map(at);
    let bounded = lower.is_some() || upper.is_some();
    let (first, last) = (at(band.least), at(band.greatest));
    let passed_below = band.lower.is_some_and(|l| band.least < l);
    let passed_above = band.upper.is_some_and(|u| band.greatest > u);
    let mut drawn = String::new();
    let mut run = (Role::Plain, String::new());
    for cell in 0..cells {
        let allowed = bounded && lower.is_none_or(|l| cell >= l) && upper.is_none_or(|u| cell <= u);
        let below = band.lower.is_some_and(|l| band.least < l) && lower.is_some_and(|l| cell < l);
        let above =
            band.upper.is_some_and(|u| band.greatest > u) && upper.is_some_and(|u| cell > u);
        let in_range = (first..=last).contains(&cell);
        // A limit passed by less than a column is crossed out itself.
        let just_below = lower == Some(cell) && first == cell && passed_below;
        let just_above = upper == Some(cell) && last == cell && passed_above;
        let (role, mark) = if in_range && (below || above) || just_below || just_above {
            (Role::Bad, look.pick('\u{2573}', 'x'))
        } else if lower == Some(cell) {
            (Role::Plain, look.pick('\u{251c}', '|'))
        } else if upper == Some(cell) {
            (Role::Plain, look.pick('\u{2524}', '|'))
        } else if in_range && cell == at(band.mean) {
            (if bounded { Role::Good } else { Role::Plain }, look.pick('\u{253f}', '+'))
        } else if in_range {
            (if bounded { Role::Good } else { Role::Plain }, look.pick('\u{2501}', '='))
        } else if allowed {
            (Role::Quiet, look.pick('\u{2500}', '-'))
        } else {
            (Role::Plain, ' ')
        };
        if role != run.0 {
            drawn.push_str(&look.paint(run.0, &run.1));
            run = (role, String::new());
        }
        run.1.push(mark);
    }
    drawn.push_str(&look.paint(run.0, &run.1));
    drawn
}

#[cfg(test)]
mod tests {
    use super::*;

    fn drawn(least: f64, greatest: f64, lower: Option<f64>, upper: Option<f64>) -> String {
        let scale = Scale { from: 0.0, to: 10.0 };
        let band = Band { least, mean: 0.5 * (least + greatest), greatest, lower, upper };
        strip(band, scale, 10, Look::PLAIN)
    }

    #[test]
    fn what_lies_beyond_a_limit_is_crossed_out() {
        assert_eq!(drawn(3.5, 6.5, Some(2.5), Some(8.5)), "  |==+=-| ");
        assert_eq!(drawn(0.5, 6.5, Some(2.5), Some(8.5)), "xx|+===-| ");
        assert_eq!(drawn(3.5, 9.5, None, Some(8.5)), "---===+=|x");
        assert_eq!(drawn(3.5, 6.5, None, None), "   ==+=   ");
    }

    #[test]
    fn a_limit_passed_by_less_than_a_column_shows() {
        assert_eq!(drawn(2.4, 6.5, Some(2.5), None), "  x=+==---");
    }

    #[test]
    fn a_scale_needs_two_values() {
        assert!(Scale::over([1.0, 1.0].into_iter()).is_none());
        assert!(Scale::over([f64::NAN, 2.0].into_iter()).is_none());
        assert!(Scale::over([37.0, 37.0 + 1e-12].into_iter()).is_none());
        assert!(Scale::over([0.0, 0.0].into_iter()).is_none());
        assert!(Scale::over([1.0, 2.0, f64::INFINITY].into_iter()).is_some());
    }
}
