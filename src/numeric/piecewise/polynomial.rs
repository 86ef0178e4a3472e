//! One polynomial in `x − centre`, and the places where it turns.

use crate::numeric::{Interval, Number};

/// Boxes around turning points are halved until they are this fraction of the stretch searched:
/// the value inside one then varies by the square of it.
const FINEST: f64 = 1e-9;

/// More boxes than this around turning points are joined into one; it keeps a polynomial that is
/// flat to rounding from costing without end.
const MOST_PLACES: usize = 64;

/// A polynomial `c₀ + c₁t + c₂t² + …` of `t = x − centre`.
#[derive(Debug, Clone, PartialEq)]
pub struct Polynomial {
    centre: f64,
    coefficients: Vec<f64>,
}

/// Where a polynomial may turn: a narrow place, and what the polynomial is there.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Turn {
    pub(super) place: Interval,
    pub(super) value: Interval,
}

impl Polynomial {
    /// The polynomial with these coefficients, lowest power first; no coefficient at all is zero.
    pub fn new(centre: f64, coefficients: Vec<f64>) -> Self {
        Polynomial { centre, coefficients }
    }

    /// The polynomial that is `y` everywhere.
    pub fn constant(y: f64) -> Self {
        Polynomial::new(0.0, vec![y])
    }

    /// The straight line through (`x`, `y`) with this slope.
    pub fn line(x: f64, y: f64, slope: f64) -> Self {
        Polynomial::new(x, vec![y, slope])
    }

    /// The value at `x`, by Horner's scheme.
    pub fn at<N: Number>(&self, x: N) -> N {
        let t = x - self.centre;
        let mut coefficients = self.coefficients.iter().rev();
        let highest = N::exact(coefficients.next().copied().unwrap_or(0.0));
        coefficients.fold(highest, |sum, &c| sum * t.clone() + c)
    }

    /// The derivative.
    #[must_use]
    pub fn derivative(&self) -> Self {
        let lowered = self.coefficients.iter().zip(0_u32..).skip(1);
        Polynomial::new(self.centre, lowered.map(|(c, k)| c * f64::from(k)).collect())
    }

    /// The antiderivative that is `start` at the centre.
    #[must_use]
    pub fn integral(&self, start: f64) -> Self {
        let raised = self.coefficients.iter().zip(1_u32..).map(|(c, k)| c / f64::from(k));
        Polynomial::new(self.centre, std::iter::once(start).chain(raised).collect())
    }

    /// The polynomial times `x − zero`.
    #[must_use]
    pub fn times_distance_from(&self, zero: f64) -> Self {
        let shift = self.centre - zero;
        let mut product = vec![0.0; self.coefficients.len() + 1];
        for (k, c) in self.coefficients.iter().enumerate() {
            product[k] += c * shift;
            product[k + 1] += c;
        }
        Polynomial::new(self.centre, product)
    }

    /// The polynomial times a constant.
    #[must_use]
    pub fn times(&self, factor: f64) -> Self {
        Polynomial::new(self.centre, self.coefficients.iter().map(|c| c * factor).collect())
    }

    /// The polynomial with `y` added.
    #[must_use]
    pub fn raised_by(mut self, y: f64) -> Self {
        match self.coefficients.first_mut() {
            Some(first) => *first += y,
            None => self.coefficients.push(y),
        }
        self
    }

    /// The polynomial that is `x` itself, about the same centre.
    #[must_use]
    pub fn identity(&self) -> Self {
        Polynomial::new(self.centre, vec![self.centre, 1.0])
    }

    /// The sum with a polynomial of the same centre.
    #[must_use]
    pub fn plus(&self, other: &Self) -> Self {
        let length = self.coefficients.len().max(other.coefficients.len());
        let pick = |p: &Self, k: usize| p.coefficients.get(k).copied().unwrap_or(0.0);
        Polynomial::new(self.centre, (0..length).map(|k| pick(self, k) + pick(other, k)).collect())
    }

    /// The product with a polynomial of the same centre.
    #[must_use]
    pub fn by(&self, other: &Self) -> Self {
        let length = (self.coefficients.len() + other.coefficients.len()).saturating_sub(1);
        let mut product = vec![0.0; length];
        for (i, a) in self.coefficients.iter().enumerate() {
            for (k, b) in other.coefficients.iter().enumerate() {
                product[i + k] += a * b;
            }
        }
        Polynomial::new(self.centre, product)
    }

    /// True when centre and coefficients are finite.
    pub(super) fn is_finite(&self) -> bool {
        self.centre.is_finite() && self.coefficients.iter().all(|c| c.is_finite())
    }

    /// Highest power with a coefficient other than zero; 0 for a constant.
    pub(super) fn degree(&self) -> usize {
        self.coefficients.iter().rposition(|&c| c != 0.0).unwrap_or(0)
    }

    /// Sum of the absolute values of all terms at `x`: what rounding is measured against.
    pub(super) fn scale(&self, x: f64) -> f64 {
        let t = (x - self.centre).abs();
        self.coefficients.iter().rev().fold(0.0, |sum, c| sum * t + c.abs())
    }

    /// Encloses all values over `x` by Horner's scheme and by the mean value theorem, whichever is
    /// tighter at each end.
    fn enclosure(&self, slope: &Polynomial, x: Interval) -> Interval {
        let natural = self.at(x);
        let m = Interval::point(x.mid());
        let mean = self.at(m) + slope.at(x) * (x - m);
        natural.intersection(mean).unwrap_or(natural)
    }

    /// The places in the bounded interval `over` that hold every zero of the derivative, in rising
    /// order, by bisection: a box is dropped once the derivative is proven to keep its sign there.
    pub(super) fn turns(&self, over: Interval) -> Vec<Turn> {
        if self.degree() < 2 {
            return Vec::new();
        }
        let slope = self.derivative();
        let bend = slope.derivative();
        let finest = over.width() * FINEST;
        let mut places: Vec<Interval> = Vec::new();
        let mut open = vec![over];
        while let Some(stretch) = open.pop() {
            if !slope.enclosure(&bend, stretch).contains(0.0) {
                continue;
            }
            let m = stretch.mid();
            if stretch.width() > finest && stretch.lo() < m && m < stretch.hi() {
                open.push(Interval::new(m, stretch.hi()));
                open.push(Interval::new(stretch.lo(), m));
                continue;
            }
            let full = places.len() >= MOST_PLACES;
            match places.last_mut() {
                Some(last) if last.hi() == stretch.lo() || full => {
                    *last = Interval::new(last.lo(), stretch.hi());
                }
                _ => places.push(stretch),
            }
        }
        places
            .into_iter()
            .map(|place| Turn { place, value: self.enclosure(&slope, place) })
            .collect()
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn turning_points_are_found_to_rounding() {
        // (t² − 1)² turns at −1, 0 and 1, with t = x − 5.
        let p = Polynomial::new(5.0, vec![1.0, 0.0, -2.0, 0.0, 1.0]);
        let turns = p.turns(Interval::new(3.0, 7.5));
        let places: Vec<f64> = turns.iter().map(|t| t.place.mid()).collect();
        assert_eq!(places.len(), 3, "{places:?}");
        for (place, (x, y)) in turns.iter().zip([(4.0, 0.0), (5.0, 1.0), (6.0, 0.0)]) {
            assert!(place.place.contains(x) && place.place.width() < 1e-7);
            assert!(place.value.contains(y) && place.value.width() < 1e-14, "{:?}", place.value);
        }
    }

    #[test]
    fn a_flat_polynomial_costs_no_end_of_boxes() {
        let p = Polynomial::new(0.0, vec![1.0, 0.0, 1e-300, 0.0, -1e-300]);
        assert!(p.turns(Interval::new(-1.0, 1.0)).len() <= MOST_PLACES);
    }

    #[test]
    fn differentiating_an_integral_gives_the_polynomial() {
        let p = Polynomial::new(2.0, vec![3.0, -1.0, 0.5]);
        assert_eq!(p.integral(7.0).derivative(), p);
        assert_eq!(p.integral(7.0).at(2.0), 7.0);
        assert_eq!(p.times_distance_from(1.0).at(4.0), 3.0 * p.at(4.0));
    }
}
