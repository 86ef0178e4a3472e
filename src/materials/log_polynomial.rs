//! The expansion of a material whose coefficient is published as ten to the power of a polynomial of
//! the logarithm of temperature.
//!
//! Temperatures in K. With `s = ln T` the coefficient is `α = exp(E(s))`; each of its derivatives is
//! `exp(E(s))·R(s)` with polynomials E and R, so that all of them are read exactly. Its integral has
//! no closed form: it is summed by Gauss–Legendre quadrature from knot to knot, and since α > 0 it
//! rises, so that its range is its ends.

use crate::numeric::piecewise::{Beyond, Polynomial, TableError};
use crate::numeric::{Curve, Interval, Number, Ordered, Piecewise};
use crate::units::STANDARD_REFERENCE;
use std::sync::{Arc, OnceLock};

/// Positive abscissae and weights of ten-point Gauss–Legendre quadrature on −1 … 1.
///
/// Source: Abramowitz & Stegun, *Handbook of Mathematical Functions*, table 25.4, n = 10.
const GAUSS: [(f64, f64); 5] = [
    (0.148_874_338_981_631_22, 0.295_524_224_714_752_87),
    (0.433_395_394_129_247_2, 0.269_266_719_309_996_35),
    (0.679_409_568_299_024_4, 0.219_086_362_515_982_04),
    (0.865_063_366_688_984_5, 0.149_451_349_150_580_6),
    (0.973_906_528_517_171_7, 0.066_671_344_308_688_14),
];

/// Knots stand this factor of temperature apart at most. Ten points then leave an error far below
/// rounding, which a test holds against twice as many knots.
const KNOT_RATIO: f64 = 1.1;

/// How far a sum of quadratures may lie from the integral: rounding of some fifty terms, none above
/// a strain of 0.01, with a wide margin.
const QUADRATURE: f64 = 1e-15;

/// ΔL/L₀ as the integral of `unit·10^P(log₁₀ T)` from the reference temperature.
#[derive(Debug)]
pub(super) struct LogPolynomial {
    coefficient: Arc<Coefficient>,
    /// Temperature and the integral up to it.
    knots: Vec<(f64, f64)>,
    ends: [f64; 2],
}

impl LogPolynomial {
    pub(super) fn new(
        coefficients: &[f64],
        unit: f64,
        lo: f64,
        hi: f64,
    ) -> Result<Self, TableError> {
        if !coefficients.iter().chain([&unit, &lo, &hi]).all(|c| c.is_finite()) || unit <= 0.0 {
            return Err(TableError::NotFinite(0));
        }
        if lo <= 0.0 || hi <= lo {
            return Err(TableError::NotRising(1));
        }
        let coefficient = Arc::new(Coefficient::of(coefficients, unit, [lo, hi])?);
        let count = libm::ceil(libm::log(hi / lo) / libm::log(KNOT_RATIO)).max(1.0);
        let mut knots = vec![(lo, 0.0)];
        let mut strain = 0.0;
        let mut from = lo;
        for i in 1..=count as u32 {
            let to = if f64::from(i) >= count {
                hi
            } else {
                lo * libm::pow(hi / lo, f64::from(i) / count)
            };
            strain += coefficient.quadrature(from, to);
            knots.push((to, strain));
            from = to;
        }
        let mut curve = LogPolynomial { coefficient, knots, ends: [lo, hi] };
        // A coefficient is a share of the length at the reference temperature: zero strain there.
        let zero = curve.value(STANDARD_REFERENCE);
        curve.knots.iter_mut().for_each(|(_, strain)| *strain -= zero);
        Ok(curve)
    }
}

impl Curve for LogPolynomial {
    fn value(&self, x: f64) -> f64 {
        let inside = x.clamp(self.ends[0], self.ends[1]);
        let next = self.knots.partition_point(|&(t, _)| t <= inside).max(1);
        let (from, strain) = self.knots[next - 1];
        let at = strain + self.coefficient.quadrature(from, inside);
        if inside == x { at } else { at + self.coefficient.value(inside) * (x - inside) }
    }

    fn range(&self, x: Interval) -> Interval {
        if !x.is_bounded() {
            return Interval::ENTIRE;
        }
        let margin = Interval::new(-QUADRATURE, QUADRATURE);
        Interval::new(self.value(x.lo()), self.value(x.hi())) + margin
    }

    fn derivative(&self) -> Arc<dyn Curve> {
        self.coefficient.clone()
    }

    fn breakpoints(&self) -> &[f64] {
        &self.ends
    }
}

/// `exp(E(ln T))·R(ln T)` inside the range: the coefficient itself, or a derivative of it. Outside
/// the range the coefficient is held and its derivatives are zero.
#[derive(Debug)]
struct Coefficient {
    exponent: Polynomial,
    factor: Polynomial,
    /// Both again, with their turning points, against ln T.
    curves: [Piecewise; 2],
    order: u32,
    ends: [f64; 2],
    derivative: OnceLock<Arc<Coefficient>>,
}

impl Coefficient {
    fn of(coefficients: &[f64], unit: f64, ends: [f64; 2]) -> Result<Self, TableError> {
        // ln α = ln unit + ln10·P(s/ln10), developed about the middle of the range, where its terms
        // are small.
        let ln10 = std::f64::consts::LN_10;
        let middle = 0.5 * (libm::log(ends[0]) + libm::log(ends[1]));
        let mut scale = ln10;
        let mut exponent = Vec::with_capacity(coefficients.len());
        for c in developed_about(middle / ln10, coefficients) {
            exponent.push(c * scale);
            scale /= ln10;
        }
        let exponent = Polynomial::new(middle, exponent).raised_by(libm::log(unit));
        Coefficient::new(exponent, Polynomial::new(middle, vec![1.0]), 0, ends)
    }

    fn new(
        exponent: Polynomial,
        factor: Polynomial,
        order: u32,
        ends: [f64; 2],
    ) -> Result<Self, TableError> {
        let (lo, hi) = (libm::log(ends[0]), libm::log(ends[1]));
        let curve = |p: &Polynomial| Piecewise::polynomial(p.clone(), lo, hi, Beyond::Hold);
        let curves = [curve(&exponent)?, curve(&factor)?];
        Ok(Coefficient { exponent, factor, curves, order, ends, derivative: OnceLock::new() })
    }

    fn inside(&self, t: f64) -> f64 {
        let s = libm::log(t);
        libm::exp(self.exponent.at(s)) * self.factor.at(s)
    }

    fn quadrature(&self, from: f64, to: f64) -> f64 {
        let (m, h) = (0.5 * (from + to), 0.5 * (to - from));
        let pair = |x: f64| self.inside(m - h * x) + self.inside(m + h * x);
        h * GAUSS.iter().map(|&(x, w)| w * pair(x)).sum::<f64>()
    }
}

impl Curve for Coefficient {
    fn value(&self, x: f64) -> f64 {
        let inside = x.clamp(self.ends[0], self.ends[1]);
        if inside == x || self.order == 0 { self.inside(inside) } else { 0.0 }
    }

    fn range(&self, x: Interval) -> Interval {
        let [lo, hi] = self.ends;
        // A derivative jumps to zero at the ends; its own derivative is then unknown there.
        if self.order >= 2 && (x.contains(lo) || x.contains(hi)) {
            return Interval::ENTIRE;
        }
        let clamp = |t: f64| t.clamp(lo, hi);
        let s = Interval::new(clamp(x.lo()), clamp(x.hi())).ln();
        let inside = self.curves[0].range(s).exp() * self.curves[1].range(s);
        if self.order == 0 {
            inside
        } else if x.hi() < lo || x.lo() > hi {
            Interval::ZERO
        } else if x.lo() <= lo || x.hi() >= hi {
            inside.hull(Interval::ZERO)
        } else {
            inside
        }
    }

    fn derivative(&self) -> Arc<dyn Curve> {
        // With s = ln T: d/dT (R·exp E) = (R′ + R·E′)·exp(E − s).
        let next = self.derivative.get_or_init(|| {
            let slope = self.exponent.derivative();
            let factor = self.factor.derivative().plus(&self.factor.by(&slope));
            let exponent = self.exponent.plus(&self.exponent.identity().times(-1.0));
            let order = self.order + 1;
            let coefficient = Coefficient::new(exponent, factor, order, self.ends);
            Arc::new(coefficient.expect("the ends were checked and finite products stay finite"))
        });
        next.clone()
    }

    fn breakpoints(&self) -> &[f64] {
        &self.ends
    }
}

/// The coefficients, lowest power first, of the same polynomial in powers of `x − centre` (Horner's
/// shift).
fn developed_about(centre: f64, coefficients: &[f64]) -> Vec<f64> {
    let mut shifted = coefficients.to_vec();
    for first in 0..shifted.len() {
        for k in (first + 1..shifted.len()).rev() {
            shifted[k - 1] += centre * shifted[k];
        }
    }
    shifted
}

#[cfg(test)]
mod tests {
    use super::*;

    /// NIST cryogenic data, OFHC copper (UNS C10100), coefficient of expansion.
    const COPPER: [f64; 7] = [
        -17.908_128_9,
        67.131_914,
        -118.809_316,
        109.984_599_7,
        -53.869_608_9,
        13.302_474_91,
        -1.308_434_41,
    ];

    fn copper() -> LogPolynomial {
        LogPolynomial::new(&COPPER, 1e-6, 4.0, 300.0).unwrap()
    }

    #[test]
    fn the_coefficient_is_the_published_formula() {
        let alpha = copper().derivative();
        for t in [4.0_f64, 20.0, 77.0, 150.0, 293.0] {
            let x = libm::log10(t);
            let power = COPPER.iter().rev().fold(0.0, |sum, c| sum * x + c);
            let formula = 1e-6 * libm::pow(10.0, power);
            assert!((alpha.value(t) / formula - 1.0).abs() < 1e-11, "{t}");
        }
    }

    #[test]
    fn the_integral_does_not_depend_on_where_its_knots_stand() {
        let copper = copper();
        // Cut anywhere, and summed over steps a third as long.
        let mut strain = 0.0;
        let mut from = 4.0_f64;
        while from < 300.0 {
            let to = (from * 1.031).min(300.0);
            strain += copper.coefficient.quadrature(from, to);
            assert!((copper.value(to) - copper.value(4.0) - strain).abs() < QUADRATURE, "{to}");
            from = to;
        }
    }

    #[test]
    fn derivatives_follow_each_other() {
        let mut curve: Arc<dyn Curve> = Arc::new(copper());
        for _ in 0..3 {
            let slope = curve.derivative();
            for t in [6.0_f64, 33.0, 120.0, 280.0] {
                let h = t * 1e-4;
                let measured = (curve.value(t + h) - curve.value(t - h)) / (2.0 * h);
                let scale = slope.range(Interval::new(0.8 * t, 1.05 * t)).magnitude();
                assert!((slope.value(t) - measured).abs() < 1e-5 * scale, "{t}");
            }
            curve = slope;
        }
    }

    #[test]
    fn ranges_hold_the_values_and_no_more() {
        let copper = copper();
        let range = copper.range(Interval::new(20.0, 250.0));
        let span = copper.value(250.0) - copper.value(20.0);
        assert!(range.width() < span + 3.0 * QUADRATURE);
        let slope = copper.derivative();
        let over = Interval::new(60.0, 90.0);
        let alpha = slope.range(over);
        for i in 0..=30 {
            assert!(alpha.contains(slope.value(60.0 + f64::from(i))));
        }
        assert!(alpha.width() < (slope.value(90.0) - slope.value(60.0)) * (1.0 + 1e-9));
        let beyond = slope.derivative().range(Interval::new(290.0, 310.0));
        assert!(beyond.contains(0.0) && beyond.contains(slope.derivative().value(295.0)));
    }

    #[test]
    fn the_range_must_lie_above_zero() {
        let refused = LogPolynomial::new(&COPPER, 1e-6, 0.0, 300.0);
        assert_eq!(refused.map(|_| ()), Err(TableError::NotRising(1)));
    }
}
