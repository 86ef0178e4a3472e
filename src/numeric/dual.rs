//! Forward derivatives: a value and its slope along one direction.
//!
//! Over `f64` it gives a sensitivity, over [`Interval`] the range of a derivative over a box,
//! over itself second derivatives. The rules of differentiation stand here and nowhere else; the
//! [`super::Tape`] takes its local slopes from them.

use super::curve::Curve;
use super::{Interval, Number, Ordered};
use std::cmp::Ordering;
use std::ops::{Add, Div, Mul, Neg, Sub};
use std::sync::Arc;

/// A number and its derivative along one direction.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Dual<N> {
    /// The value.
    pub value: N,
    /// The derivative of the value.
    pub slope: N,
}

impl<N: Number> Dual<N> {
    /// The variable itself: its slope is 1.
    pub fn variable(value: N) -> Self {
        Dual { value, slope: N::exact(1.0) }
    }

    /// A number that does not depend on the variable.
    pub fn constant(value: N) -> Self {
        Dual { value, slope: N::exact(0.0) }
    }
}

impl<N: Number> Neg for Dual<N> {
    type Output = Self;
    fn neg(self) -> Self {
        Dual { value: -self.value, slope: -self.slope }
    }
}

impl<N: Number> Add for Dual<N> {
    type Output = Self;
    fn add(self, o: Self) -> Self {
        Dual { value: self.value + o.value, slope: self.slope + o.slope }
    }
}

impl<N: Number> Sub for Dual<N> {
    type Output = Self;
    fn sub(self, o: Self) -> Self {
        Dual { value: self.value - o.value, slope: self.slope - o.slope }
    }
}

impl<N: Number> Mul for Dual<N> {
    type Output = Self;
    fn mul(self, o: Self) -> Self {
        Dual {
            slope: self.slope * o.value.clone() + self.value.clone() * o.slope,
            value: self.value * o.value,
        }
    }
}

impl<N: Number> Div for Dual<N> {
    type Output = Self;
    fn div(self, o: Self) -> Self {
        let value = self.value / o.value.clone();
        Dual { slope: (self.slope - value.clone() * o.slope) / o.value, value }
    }
}

impl<N: Number> Add<f64> for Dual<N> {
    type Output = Self;
    fn add(self, o: f64) -> Self {
        Dual { value: self.value + o, slope: self.slope }
    }
}

impl<N: Number> Sub<f64> for Dual<N> {
    type Output = Self;
    fn sub(self, o: f64) -> Self {
        Dual { value: self.value - o, slope: self.slope }
    }
}

impl<N: Number> Mul<f64> for Dual<N> {
    type Output = Self;
    fn mul(self, o: f64) -> Self {
        Dual { value: self.value * o, slope: self.slope * o }
    }
}

impl<N: Number> Div<f64> for Dual<N> {
    type Output = Self;
    fn div(self, o: f64) -> Self {
        Dual { value: self.value / o, slope: self.slope / o }
    }
}

impl<N: Ordered> Number for Dual<N> {
    fn exact(x: f64) -> Self {
        Dual::constant(N::exact(x))
    }
    fn enclosed(interval: Interval) -> Self {
        Dual::constant(N::enclosed(interval))
    }
    fn powi(self, n: i32) -> Self {
        if n == 0 {
            return Dual::exact(1.0);
        }
        Dual {
            slope: self.value.clone().powi(n - 1) * f64::from(n) * self.slope,
            value: self.value.powi(n),
        }
    }
    fn sqrt(self) -> Self {
        let root = self.value.sqrt();
        Dual { slope: self.slope / (root.clone() * 2.0), value: root }
    }
    fn exp(self) -> Self {
        let e = self.value.exp();
        Dual { slope: self.slope * e.clone(), value: e }
    }
    fn ln(self) -> Self {
        Dual { slope: self.slope / self.value.clone(), value: self.value.ln() }
    }
    fn sin(self) -> Self {
        Dual { slope: self.slope * self.value.clone().cos(), value: self.value.sin() }
    }
    fn cos(self) -> Self {
        Dual { slope: -(self.slope * self.value.clone().sin()), value: self.value.cos() }
    }
    fn tan(self) -> Self {
        let t = self.value.tan();
        Dual { slope: self.slope * (t.clone().sqr() + 1.0), value: t }
    }
    fn asin(self) -> Self {
        let root = (-self.value.clone().sqr() + 1.0).sqrt();
        Dual { slope: self.slope / root, value: self.value.asin() }
    }
    fn acos(self) -> Self {
        let root = (-self.value.clone().sqr() + 1.0).sqrt();
        Dual { slope: -(self.slope / root), value: self.value.acos() }
    }
    fn atan(self) -> Self {
        Dual { slope: self.slope / (self.value.clone().sqr() + 1.0), value: self.value.atan() }
    }
    fn atan2(self, x: Self) -> Self {
        let square = self.value.clone().sqr() + x.value.clone().sqr();
        Dual {
            slope: (self.slope * x.value.clone() - self.value.clone() * x.slope) / square,
            value: self.value.atan2(x.value),
        }
    }
    fn hypot(self, o: Self) -> Self {
        let length = self.value.clone().hypot(o.value.clone());
        Dual {
            slope: self.slope * share(self.value, &length) + o.slope * share(o.value, &length),
            value: length,
        }
    }
    fn abs(self) -> Self {
        let slope = match self.value.order(&N::exact(0.0)) {
            Some(Ordering::Greater | Ordering::Equal) => self.slope,
            Some(Ordering::Less) => -self.slope,
            None => self.slope.clone().hull(-self.slope),
        };
        Dual { value: self.value.abs(), slope }
    }
    fn min(self, o: Self) -> Self {
        let slope = match self.value.order(&o.value) {
            Some(Ordering::Less | Ordering::Equal) => self.slope,
            Some(Ordering::Greater) => o.slope,
            None => self.slope.hull(o.slope),
        };
        Dual { value: self.value.min(o.value), slope }
    }
    fn max(self, o: Self) -> Self {
        let slope = match self.value.order(&o.value) {
            Some(Ordering::Greater | Ordering::Equal) => self.slope,
            Some(Ordering::Less) => o.slope,
            None => self.slope.hull(o.slope),
        };
        Dual { value: self.value.max(o.value), slope }
    }
    fn apply(self, curve: &Arc<dyn Curve>) -> Self {
        Dual {
            slope: self.slope * self.value.clone().apply(&curve.derivative()),
            value: self.value.apply(curve),
        }
    }
}

/// What a side is of a length that it belongs to: `x/length`, never beyond −1 … 1, with the sign of
/// the side. Where there is no length, it may be any of that.
fn share<N: Ordered>(x: N, length: &N) -> N {
    if length.is_zero() {
        return N::enclosed(Interval::new(-1.0, 1.0));
    }
    let (least, most) = match x.order(&N::exact(0.0)) {
        Some(Ordering::Greater) => (0.0, 1.0),
        Some(Ordering::Less) => (-1.0, 0.0),
        _ => (-1.0, 1.0),
    };
    (x / length.clone()).known_within(least, most)
}

impl<N: Ordered> Ordered for Dual<N> {
    fn order(&self, o: &Self) -> Option<Ordering> {
        self.value.order(&o.value)
    }
    fn hull(self, o: Self) -> Self {
        Dual { value: self.value.hull(o.value), slope: self.slope.hull(o.slope) }
    }
    fn known_within(self, least: f64, most: f64) -> Self {
        Dual { value: self.value.known_within(least, most), slope: self.slope }
    }
    fn is_zero(&self) -> bool {
        self.value.is_zero() && self.slope.is_zero()
    }
}
