//! Curves through the entries of a table.

use super::{Piecewise, Polynomial};
use std::fmt;

/// How a curve goes on outside its data.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Beyond {
    /// With the value at the end.
    Hold,
    /// Along the tangent at the end.
    Straight,
}

impl Beyond {
    pub(super) fn from(self, x: f64, y: f64, slope: f64) -> Polynomial {
        match self {
            Beyond::Hold => Polynomial::new(x, vec![y]),
            Beyond::Straight => Polynomial::line(x, y, slope),
        }
    }
}

/// Why a table is no curve. Entries are counted from 0.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum TableError {
    /// Fewer entries than a curve needs.
    TooFew {
        /// How many there are.
        found: usize,
        /// How many are needed.
        needed: usize,
    },
    /// This entry does not lie above the one before.
    NotRising(usize),
    /// This entry is no finite number.
    NotFinite(usize),
}

impl fmt::Display for TableError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match *self {
            TableError::TooFew { found, needed } => {
                let entries = if found == 1 { "entry" } else { "entries" };
                write!(f, "the table has {found} {entries}, needs {needed}")
            }
            TableError::NotRising(i) => {
                write!(f, "entry {} of the table does not lie above the one before", i + 1)
            }
            TableError::NotFinite(i) => {
                write!(f, "entry {} of the table is no finite number", i + 1)
            }
        }
    }
}

impl std::error::Error for TableError {}

fn checked(table: &[(f64, f64)], needed: usize) -> Result<(), TableError> {
    if table.len() < needed {
        return Err(TableError::TooFew { found: table.len(), needed });
    }
    for (i, &(x, y)) in table.iter().enumerate() {
        if !x.is_finite() || !y.is_finite() {
            return Err(TableError::NotFinite(i));
        }
        if i > 0 && table[i - 1].0 >= x {
            return Err(TableError::NotRising(i));
        }
    }
    Ok(())
}

impl Piecewise {
    /// Straight lines between the entries (`x`, `y`) of a table; a single entry is a constant.
    ///
    /// # Errors
    /// When the table is empty, `x` does not rise, or a number is not finite.
    pub fn linear(table: &[(f64, f64)], beyond: Beyond) -> Result<Self, TableError> {
        checked(table, 1)?;
        let slope = |a: (f64, f64), b: (f64, f64)| (b.1 - a.1) / (b.0 - a.0);
        let slopes: Vec<f64> = table.windows(2).map(|w| slope(w[0], w[1])).collect();
        let (x0, y0) = table[0];
        let (xn, yn) = table[table.len() - 1];
        let (first, last) = match slopes.as_slice() {
            [] => return Ok(Piecewise::constant(y0)),
            [one] => (*one, *one),
            [first, .., last] => (*first, *last),
        };
        let mut rest: Vec<(f64, Polynomial)> = table
            .iter()
            .zip(&slopes)
            .map(|(&(x, y), &slope)| (x, Polynomial::line(x, y, slope)))
            .collect();
        rest.push((xn, beyond.from(xn, yn, last)));
        Piecewise::joined(beyond.from(x0, y0, first), rest)
    }

    /// The monotone cubic through the entries (`x`, `y`) of a table: between two entries it neither
    /// overshoots nor turns, so that its extremes stand on entries.
    ///
    /// Formula: inner slope `(w₁+w₂)/(w₁/d₋+w₂/d₊)` with `w₁ = 2h₊+h₋`, `w₂ = h₊+2h₋`, zero where
    /// the secants `d₋`, `d₊` differ in sign; end slope `((2h₀+h₁)d₀−h₀d₁)/(h₀+h₁)`, zero if its
    /// sign is not that of `d₀`, and at most `3d₀` where `d₀`, `d₁` differ in sign.
    ///
    /// Source: Fritsch & Butland, *A method for constructing local monotone piecewise cubic
    /// interpolants*, SIAM J. Sci. Stat. Comput. 5 (1984) 300.
    ///
    /// # Errors
    /// When there are fewer than two entries, `x` does not rise, or a number is not finite.
    pub fn monotone(table: &[(f64, f64)], beyond: Beyond) -> Result<Self, TableError> {
        checked(table, 2)?;
        let h: Vec<f64> = table.windows(2).map(|w| w[1].0 - w[0].0).collect();
        let d: Vec<f64> = table.windows(2).zip(&h).map(|(w, h)| (w[1].1 - w[0].1) / h).collect();
        let slopes = monotone_slopes(&h, &d);
        Piecewise::hermite(table, &slopes, beyond)
    }

    /// The cubic through the entries (`x`, `y`) with the slope given at each.
    ///
    /// # Errors
    /// When there are fewer than two entries, `x` does not rise, or a number is not finite.
    pub(super) fn hermite(
        table: &[(f64, f64)],
        slopes: &[f64],
        beyond: Beyond,
    ) -> Result<Self, TableError> {
        checked(table, 2)?;
        let last = table.len() - 1;
        let mut rest = Vec::with_capacity(table.len());
        for (ends, m) in table.windows(2).zip(slopes.windows(2)) {
            let h = ends[1].0 - ends[0].0;
            let d = (ends[1].1 - ends[0].1) / h;
            let square = (3.0 * d - 2.0 * m[0] - m[1]) / h;
            let cube = (m[0] + m[1] - 2.0 * d) / (h * h);
            let (x, y) = ends[0];
            rest.push((x, Polynomial::new(x, vec![y, m[0], square, cube])));
        }
        rest.push((table[last].0, beyond.from(table[last].0, table[last].1, slopes[last])));
        Piecewise::joined(beyond.from(table[0].0, table[0].1, slopes[0]), rest)
    }
}

fn monotone_slopes(h: &[f64], d: &[f64]) -> Vec<f64> {
    let n = d.len();
    if n == 1 {
        return vec![d[0], d[0]];
    }
    let mut slopes = vec![end_slope(h[0], h[1], d[0], d[1])];
    for k in 1..n {
        let (before, after) = (d[k - 1], d[k]);
        slopes.push(if before * after <= 0.0 {
            0.0
        } else {
            let w1 = 2.0 * h[k] + h[k - 1];
            let w2 = h[k] + 2.0 * h[k - 1];
            (w1 + w2) / (w1 / before + w2 / after)
        });
    }
    slopes.push(end_slope(h[n - 1], h[n - 2], d[n - 1], d[n - 2]));
    slopes
}

fn end_slope(h0: f64, h1: f64, d0: f64, d1: f64) -> f64 {
    let slope = ((2.0 * h0 + h1) * d0 - h0 * d1) / (h0 + h1);
    if slope * d0 <= 0.0 {
        0.0
    } else if d0 * d1 < 0.0 && slope.abs() > 3.0 * d0.abs() {
        3.0 * d0
    } else {
        slope
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::{Curve, Interval};

    fn expansion() -> Piecewise {
        let t = [-196.0, -150.0, -100.0, -50.0, 0.0, 20.0, 50.0, 100.0, 150.0, 200.0];
        let e = [-3735.0, -3204.0, -2466.0, -1557.0, -450.0, 0.0, 702.0, 1926.0, 3204.0, 4536.0];
        let table: Vec<(f64, f64)> = t.into_iter().zip(e).collect();
        Piecewise::monotone(&table, Beyond::Straight).unwrap()
    }

    /// Values made with an independent library: SciPy 1.17, `PchipInterpolator`.
    #[test]
    fn a_monotone_cubic_is_that_of_fritsch_and_butland() {
        let curve = expansion();
        let values = [
            (-190.0, -3_673.677_252_25),
            (-73.0, -1_997.899_130_08),
            (35.0, 347.356_126_22),
            (190.0, 4_265.262_124_14),
        ];
        for (x, y) in values {
            assert!((curve.value(x) - y).abs() < 1e-8, "{x}: {}", curve.value(x));
        }
    }

    #[test]
    fn the_range_of_a_monotone_cubic_is_its_ends() {
        let curve = expansion();
        let range = curve.range(Interval::new(-123.0, 150.0));
        assert!((range.lo() - curve.value(-123.0)).abs() < 1e-10);
        assert!((range.hi() - 3204.0).abs() < 1e-10);
    }

    #[test]
    fn a_flat_stretch_stays_flat() {
        let table = [(0.0, 1.0), (1.0, 2.0), (2.0, 2.0), (4.0, -1.0)];
        let curve = Piecewise::monotone(&table, Beyond::Hold).unwrap();
        let range = curve.range(Interval::new(0.5, 3.0));
        assert!((range.hi() - 2.0).abs() < 1e-14, "{range:?}");
        assert_eq!(curve.value(1.5), 2.0);
        assert_eq!(curve.value(9.0), -1.0);
    }

    #[test]
    fn a_table_says_what_is_wrong_with_it() {
        let linear = |t: &[(f64, f64)]| Piecewise::linear(t, Beyond::Hold).map(|_| ()).unwrap_err();
        assert_eq!(linear(&[]).to_string(), "the table has 0 entries, needs 1");
        assert_eq!(
            linear(&[(1.0, 0.0), (1.0, 2.0)]).to_string(),
            "entry 2 of the table does not lie above the one before"
        );
        assert_eq!(
            linear(&[(1.0, f64::NAN)]).to_string(),
            "entry 1 of the table is no finite number"
        );
    }

    #[test]
    fn a_straight_table_goes_on_as_told() {
        let table = [(0.0, 1.0), (2.0, 5.0)];
        assert_eq!(Piecewise::linear(&table, Beyond::Hold).unwrap().value(-1.0), 1.0);
        assert_eq!(Piecewise::linear(&table, Beyond::Straight).unwrap().value(3.0), 7.0);
    }
}
