//! Curves made of polynomial pieces: tables, published fits, histories.
//!
//! Knows nothing of what is tabulated or of its unit. Between two breaks the curve is one
//! polynomial in `x − centre`. Its range over an interval is proven: on each piece the extremes
//! stand at the ends of the interval or where the piece turns, and every turning point was enclosed
//! when the curve was made.
//!
//! A curve may step at a break; over an interval that holds the break its range holds both sides,
//! and the range of its derivative there is everything, so that a mean-value argument across a step
//! can never look like a proof.

mod exponential;
mod polynomial;
mod table;

pub use exponential::Exponential;
pub use polynomial::Polynomial;
pub use table::{Beyond, TableError};

use super::{Curve, Interval, Ordered};
use polynomial::Turn;
use std::sync::{Arc, OnceLock};

/// A jump at a break below this fraction of the terms that make up the value is rounding, not a
/// step.
const STEP: f64 = 1e-12;

/// A curve of polynomial pieces. The first piece reaches from the far left to the first break, the
/// last from the last break to the far right.
#[derive(Debug, Clone)]
pub struct Piecewise {
    breaks: Vec<f64>,
    pieces: Vec<Piece>,
    /// Breaks, and the middle of each place where a piece turns.
    landmarks: Vec<f64>,
    /// Where a curve of which this is the derivative steps.
    steps_above: Vec<f64>,
    derivative: OnceLock<Arc<Piecewise>>,
}

#[derive(Debug, Clone)]
struct Piece {
    polynomial: Polynomial,
    /// The places where a bounded piece turns; an unbounded one looks for them when asked.
    turns: Option<Vec<Turn>>,
    /// All values of a bounded piece.
    hull: Interval,
}

impl Piece {
    fn new(polynomial: Polynomial, over: Interval) -> Self {
        let mut piece = Piece { polynomial, turns: None, hull: Interval::ENTIRE };
        if over.is_bounded() {
            piece.turns = Some(piece.polynomial.turns(over));
            piece.hull = piece.range(over);
        }
        piece
    }

    fn range(&self, x: Interval) -> Interval {
        if self.polynomial.degree() == 0 {
            return self.polynomial.at(Interval::ZERO);
        }
        if !x.is_bounded() {
            return Interval::ENTIRE;
        }
        let first = self.polynomial.at(Interval::point(x.lo()));
        if x.is_point() {
            return first;
        }
        let ends = first.hull(self.polynomial.at(Interval::point(x.hi())));
        let within = |turns: &[Turn]| {
            let inside = turns.iter().filter(|turn| turn.place.intersection(x).is_some());
            inside.fold(ends, |hull, turn| hull.hull(turn.value))
        };
        match &self.turns {
            Some(turns) => within(turns),
            None => within(&self.polynomial.turns(x)),
        }
    }
}

impl Piecewise {
    /// Joins polynomials: `first` up to the first break, then from each break on the next.
    ///
    /// # Errors
    /// When breaks do not rise, or a number is not finite; the index is that of the break.
    pub fn joined(first: Polynomial, rest: Vec<(f64, Polynomial)>) -> Result<Self, TableError> {
        if !first.is_finite() {
            return Err(TableError::NotFinite(0));
        }
        for (i, (at, polynomial)) in rest.iter().enumerate() {
            if !at.is_finite() || !polynomial.is_finite() {
                return Err(TableError::NotFinite(i));
            }
            if i > 0 && rest[i - 1].0 >= *at {
                return Err(TableError::NotRising(i));
            }
        }
        let (breaks, mut polynomials): (Vec<f64>, Vec<Polynomial>) = rest.into_iter().unzip();
        polynomials.insert(0, first);
        Ok(Piecewise::assembled(breaks, polynomials))
    }

    /// The curve that is `y` everywhere.
    pub fn constant(y: f64) -> Self {
        Piecewise::assembled(Vec::new(), vec![Polynomial::constant(y)])
    }

    /// The straight line through (`x`, `y`) with this slope.
    pub fn line(x: f64, y: f64, slope: f64) -> Self {
        Piecewise::assembled(Vec::new(), vec![Polynomial::line(x, y, slope)])
    }

    /// One polynomial over `lo … hi`, continued as `beyond` says.
    ///
    /// # Errors
    /// When the ends do not rise or a number is not finite.
    pub fn polynomial(
        polynomial: Polynomial,
        lo: f64,
        hi: f64,
        beyond: Beyond,
    ) -> Result<Self, TableError> {
        let slope = polynomial.derivative();
        let end = |x: f64| beyond.from(x, polynomial.at(x), slope.at(x));
        let (before, after) = (end(lo), end(hi));
        Piecewise::joined(before, vec![(lo, polynomial), (hi, after)])
    }

    fn assembled(breaks: Vec<f64>, polynomials: Vec<Polynomial>) -> Self {
        let last = breaks.len();
        let mut landmarks = breaks.clone();
        let mut pieces = Vec::with_capacity(polynomials.len());
        for (i, polynomial) in polynomials.into_iter().enumerate() {
            let lo = if i == 0 { f64::NEG_INFINITY } else { breaks[i - 1] };
            let hi = if i == last { f64::INFINITY } else { breaks[i] };
            let piece = Piece::new(polynomial, Interval::new(lo, hi));
            landmarks.extend(piece.turns.iter().flatten().map(|turn| turn.place.mid()));
            pieces.push(piece);
        }
        landmarks.sort_by(f64::total_cmp);
        landmarks.dedup();
        Piecewise {
            breaks,
            pieces,
            landmarks,
            steps_above: Vec::new(),
            derivative: OnceLock::new(),
        }
    }

    /// The integral from `from`, as a curve of its own.
    #[must_use]
    pub fn integral(&self, from: f64) -> Self {
        let mut pieces: Vec<Polynomial> = Vec::with_capacity(self.pieces.len());
        for (i, piece) in self.pieces.iter().enumerate() {
            let mut integral = piece.polynomial.integral(0.0);
            if let Some(before) = pieces.last() {
                let at = self.breaks[i - 1];
                let missing = before.at(at) - integral.at(at);
                integral = integral.raised_by(missing);
            }
            pieces.push(integral);
        }
        let start = pieces[self.place(from)].at(from);
        let pieces = pieces.into_iter().map(|p| p.raised_by(-start)).collect();
        Piecewise::assembled(self.breaks.clone(), pieces)
    }

    /// The curve times `x − zero`.
    #[must_use]
    pub fn times_distance_from(&self, zero: f64) -> Self {
        self.map(|piece| piece.times_distance_from(zero))
    }

    fn map(&self, change: impl Fn(&Polynomial) -> Polynomial) -> Self {
        let pieces = self.pieces.iter().map(|piece| change(&piece.polynomial)).collect();
        let mut changed = Piecewise::assembled(self.breaks.clone(), pieces);
        changed.steps_above.clone_from(&self.steps_above);
        changed
    }

    /// The curve plus the product of two, all three of the same breaks and centres.
    fn plus_product(&self, a: &Piecewise, b: &Piecewise) -> Self {
        let pieces = self.pieces.iter().zip(&a.pieces).zip(&b.pieces);
        let pieces = pieces.map(|((s, a), b)| s.polynomial.plus(&a.polynomial.by(&b.polynomial)));
        let mut sum = Piecewise::assembled(self.breaks.clone(), pieces.collect());
        sum.steps_above.clone_from(&self.steps_above);
        sum
    }

    /// Which piece `x` is read from: at a break the one that begins there.
    fn place(&self, x: f64) -> usize {
        self.breaks.partition_point(|&b| b <= x)
    }

    /// The breaks at which the curve steps.
    fn steps(&self) -> Vec<f64> {
        let steps = self.breaks.iter().zip(self.pieces.windows(2)).filter(|&(&at, pair)| {
            let (left, right) = (&pair[0].polynomial, &pair[1].polynomial);
            (left.at(at) - right.at(at)).abs() > STEP * (left.scale(at) + right.scale(at))
        });
        steps.map(|(&at, _)| at).collect()
    }

    fn slope(&self) -> &Arc<Piecewise> {
        self.derivative.get_or_init(|| {
            let mut slope = self.map(Polynomial::derivative);
            slope.steps_above.extend(self.steps());
            slope.steps_above.sort_by(f64::total_cmp);
            slope.steps_above.dedup();
            Arc::new(slope)
        })
    }
}

impl Curve for Piecewise {
    fn value(&self, x: f64) -> f64 {
        self.pieces[self.place(x)].polynomial.at(x)
    }

    fn range(&self, x: Interval) -> Interval {
        if self.steps_above.iter().any(|&step| x.contains(step)) {
            return Interval::ENTIRE;
        }
        // A piece counts if it touches the interval, so that both sides of a break do.
        let first = self.breaks.partition_point(|&b| b < x.lo());
        let last = self.place(x.hi());
        let mut hull: Option<Interval> = None;
        for i in first..=last {
            let lo = if i == 0 { f64::NEG_INFINITY } else { self.breaks[i - 1] };
            let hi = self.breaks.get(i).copied().unwrap_or(f64::INFINITY);
            let piece = &self.pieces[i];
            let range = if first < i && i < last {
                piece.hull
            } else {
                piece.range(Interval::new(x.lo().max(lo), x.hi().min(hi)))
            };
            hull = Some(hull.map_or(range, |h| h.hull(range)));
        }
        hull.unwrap_or(Interval::ENTIRE)
    }

    fn derivative(&self) -> Arc<dyn Curve> {
        self.slope().clone()
    }

    fn breakpoints(&self) -> &[f64] {
        &self.landmarks
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn stepped() -> Piecewise {
        let rest = vec![(1.0, Polynomial::line(1.0, 2.0, -1.0)), (3.0, Polynomial::constant(0.0))];
        Piecewise::joined(Polynomial::constant(1.0), rest).unwrap()
    }

    #[test]
    fn a_step_shows_both_sides() {
        let curve = stepped();
        assert_eq!(curve.value(1.0), 2.0);
        let at = curve.range(Interval::point(1.0));
        assert!(at.contains(1.0) && at.contains(2.0) && at.width() < 1.0 + 1e-12);
    }

    #[test]
    fn the_slope_across_a_step_is_unknown_and_across_a_kink_both() {
        let slope = stepped().derivative();
        assert_eq!(slope.range(Interval::new(0.5, 1.5)), Interval::ENTIRE);
        assert_eq!(slope.range(Interval::new(2.0, 4.0)), Interval::new(-1.0, 0.0));
        assert_eq!(slope.derivative().range(Interval::new(2.0, 4.0)), Interval::ENTIRE);
        assert_eq!(slope.derivative().range(Interval::new(1.5, 2.5)), Interval::ZERO);
    }

    #[test]
    fn an_integral_is_continuous_and_zero_where_it_starts() {
        let integral = stepped().integral(2.0);
        assert_eq!(integral.value(2.0), 0.0);
        assert!((integral.value(1.0) + 1.5).abs() < 1e-15);
        assert!((integral.value(5.0) - 0.5).abs() < 1e-15);
        assert!(integral.steps().is_empty());
    }

    #[test]
    fn ranges_reach_beyond_the_data() {
        let square = Piecewise::linear(&[(0.0, 0.0), (1.0, 1.0)], Beyond::Straight)
            .unwrap()
            .times_distance_from(-4.0);
        let range = square.range(Interval::new(-5.0, 1.0));
        assert!(range.contains(-4.0) && range.lo() > -4.0 - 1e-12, "{range:?}");
        assert_eq!(square.range(Interval::new(0.0, f64::INFINITY)), Interval::ENTIRE);
        let held = Piecewise::linear(&[(0.0, 0.0), (1.0, 1.0)], Beyond::Hold).unwrap();
        assert!(held.range(Interval::ENTIRE).width() < 1.0 + 1e-12);
    }

    #[test]
    fn breaks_must_rise() {
        let rest = vec![(1.0, Polynomial::constant(0.0)), (1.0, Polynomial::constant(2.0))];
        let joined = Piecewise::joined(Polynomial::constant(1.0), rest);
        assert_eq!(joined.map(|_| ()), Err(TableError::NotRising(1)));
    }
}
