//! The exponential of a curve of polynomial pieces, less one, and its derivatives.

use super::Piecewise;
use crate::numeric::{Curve, Interval, Number};
use std::sync::{Arc, OnceLock};

/// The curve `factor·exp(exponent) − less`.
///
/// Made as `exp(exponent) − 1`; every derivative has the same form, its factor again being made of
/// polynomial pieces.
#[derive(Debug, Clone)]
pub struct Exponential {
    exponent: Piecewise,
    factor: Piecewise,
    less: f64,
    derivative: OnceLock<Arc<Exponential>>,
}

impl Exponential {
    /// The curve `exp(exponent) − 1`.
    pub fn less_one(exponent: Piecewise) -> Self {
        let factor = exponent.map(|p| p.times(0.0).raised_by(1.0));
        Exponential { exponent, factor, less: 1.0, derivative: OnceLock::new() }
    }
}

impl Curve for Exponential {
    fn value(&self, x: f64) -> f64 {
        self.factor.value(x) * libm::exp(self.exponent.value(x)) - self.less
    }

    fn range(&self, x: Interval) -> Interval {
        self.factor.range(x) * self.exponent.range(x).exp() - self.less
    }

    fn derivative(&self) -> Arc<dyn Curve> {
        // (g·eᶠ)′ = (g′ + g·f′)·eᶠ.
        let next = self.derivative.get_or_init(|| {
            let factor = self.factor.slope().plus_product(&self.factor, self.exponent.slope());
            let exponent = self.exponent.clone();
            Arc::new(Exponential { exponent, factor, less: 0.0, derivative: OnceLock::new() })
        });
        next.clone()
    }

    fn breakpoints(&self) -> &[f64] {
        self.exponent.breakpoints()
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::piecewise::Beyond;

    fn curve() -> Exponential {
        let rate = Piecewise::linear(&[(0.0, 1.0), (1.0, 3.0), (2.0, 2.0)], Beyond::Hold).unwrap();
        Exponential::less_one(rate.integral(0.0))
    }

    #[test]
    fn the_exponential_of_an_integral_starts_at_zero_and_has_its_slope() {
        let curve = curve();
        assert_eq!(curve.value(0.0), 0.0);
        assert!((curve.value(1.0) - (libm::exp(2.0) - 1.0)).abs() < 1e-14);
        let slope = curve.derivative();
        assert!((slope.value(1.0) - 3.0 * libm::exp(2.0)).abs() < 1e-13);
        let x = 0.3;
        let step = 1e-5;
        let measured = (slope.value(x + step) - slope.value(x - step)) / (2.0 * step);
        assert!((slope.derivative().value(x) - measured).abs() < 1e-6 * measured.abs());
    }

    #[test]
    fn its_range_holds_its_values() {
        let curve = curve();
        let over = Interval::new(0.2, 1.7);
        let (range, slope) = (curve.range(over), curve.derivative().range(over));
        for i in 0..=30 {
            let x = 0.2 + 0.05 * f64::from(i);
            assert!(range.contains(curve.value(x)));
            assert!(slope.contains(curve.derivative().value(x)));
        }
        assert!((range.width() - (curve.value(1.7) - curve.value(0.2))).abs() < 1e-12);
    }
}
