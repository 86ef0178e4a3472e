//! The trait every formula is written against, and plain `f64` as its first kind.

use super::Interval;
use super::curve::Curve;
use std::cmp::Ordering;
use std::fmt::Debug;
use std::ops::{Add, Div, Mul, Neg, Sub};
use std::sync::Arc;

/// A kind of number that a formula can be evaluated with.
///
/// A formula must not branch on the value of a number (an interval has no single one): it says
/// `max`, `min` and `abs` instead, and leaves tabulated data to [`Curve`]s.
pub trait Number:
    Sized
    + Clone
    + Debug
    + Neg<Output = Self>
    + Add<Output = Self>
    + Sub<Output = Self>
    + Mul<Output = Self>
    + Div<Output = Self>
    + Add<f64, Output = Self>
    + Sub<f64, Output = Self>
    + Mul<f64, Output = Self>
    + Div<f64, Output = Self>
{
    /// Stands for exactly `x`.
    fn exact(x: f64) -> Self;

    /// Stands for a number of which no more is known than that it lies in `interval`; kinds without
    /// width take the middle.
    fn enclosed(interval: Interval) -> Self;

    /// Stands for the circle constant π.
    fn pi() -> Self {
        let pi = std::f64::consts::PI;
        Self::enclosed(Interval::new(pi.next_down(), pi.next_up()))
    }

    /// Raises to a whole power; `x.powi(0)` is 1.
    fn powi(self, n: i32) -> Self;

    /// Multiplies by itself; tighter than `x·x` where the number is an interval.
    fn sqr(self) -> Self {
        self.powi(2)
    }

    /// Takes the square root; undefined below zero.
    fn sqrt(self) -> Self;
    /// Takes the exponential.
    fn exp(self) -> Self;
    /// Takes the natural logarithm; undefined at and below zero.
    fn ln(self) -> Self;
    /// Takes the sine of an angle in radians.
    fn sin(self) -> Self;
    /// Takes the cosine of an angle in radians.
    fn cos(self) -> Self;
    /// Takes the tangent of an angle in radians.
    fn tan(self) -> Self;
    /// Takes the arc sine, in radians; undefined outside −1 … 1.
    fn asin(self) -> Self;
    /// Takes the arc cosine, in radians; undefined outside −1 … 1.
    fn acos(self) -> Self;
    /// Takes the arc tangent, in radians.
    fn atan(self) -> Self;
    /// Takes the angle of the point (`x`, `self`), in radians, in −π … π.
    fn atan2(self, x: Self) -> Self;
    /// Takes `√(self² + other²)`, the length of the vector of the two.
    ///
    /// Its derivative lies within −1 … 1 even where both are zero, which that of the square root of
    /// their squares does not show.
    fn hypot(self, other: Self) -> Self {
        (self.sqr() + other.sqr()).sqrt()
    }

    /// Takes the absolute value.
    fn abs(self) -> Self;
    /// Takes the lesser of two.
    fn min(self, other: Self) -> Self;
    /// Takes the greater of two.
    fn max(self, other: Self) -> Self;

    /// Reads a tabulated or fitted function at this number.
    fn apply(self, curve: &Arc<dyn Curve>) -> Self;

    /// Raises to a constant power: exactly for whole ones, through the square root for halves,
    /// else as `exp(p·ln x)`.
    fn pow(self, p: f64) -> Self {
        let twice = p * 2.0;
        if p == libm::trunc(p) && p.abs() <= 64.0 {
            self.powi(p as i32)
        } else if twice == libm::trunc(twice) && twice.abs() <= 64.0 {
            self.sqrt().powi(twice as i32)
        } else {
            (self.ln() * p).exp()
        }
    }
}

/// A number that can be compared with another of its kind, if only sometimes.
///
/// It is what a derivative needs at a kink: the branch that is certain, or both.
pub trait Ordered: Number {
    /// The order of the two where it is certain.
    fn order(&self, other: &Self) -> Option<Ordering>;
    /// A number that stands for both.
    #[must_use]
    fn hull(self, other: Self) -> Self;
    /// What is left of an enclosure of a number that is known to lie between two others.
    #[must_use]
    fn known_within(self, least: f64, most: f64) -> Self;
    /// True for nothing but an exact zero without any derivative.
    fn is_zero(&self) -> bool;
}

impl Number for f64 {
    fn exact(x: f64) -> Self {
        x
    }
    fn enclosed(interval: Interval) -> Self {
        interval.mid()
    }
    fn powi(self, n: i32) -> Self {
        let mut base = if n < 0 { 1.0 / self } else { self };
        let mut left = n.unsigned_abs();
        let mut product = 1.0;
        while left > 0 {
            if left & 1 == 1 {
                product *= base;
            }
            base *= base;
            left >>= 1;
        }
        product
    }
    fn sqrt(self) -> Self {
        libm::sqrt(self)
    }
    fn exp(self) -> Self {
        libm::exp(self)
    }
    fn ln(self) -> Self {
        libm::log(self)
    }
    fn sin(self) -> Self {
        libm::sin(self)
    }
    fn cos(self) -> Self {
        libm::cos(self)
    }
    fn tan(self) -> Self {
        libm::tan(self)
    }
    fn asin(self) -> Self {
        libm::asin(self)
    }
    fn acos(self) -> Self {
        libm::acos(self)
    }
    fn atan(self) -> Self {
        libm::atan(self)
    }
    fn atan2(self, x: Self) -> Self {
        libm::atan2(self, x)
    }
    fn abs(self) -> Self {
        f64::abs(self)
    }
    fn min(self, other: Self) -> Self {
        if other < self { other } else { self }
    }
    fn max(self, other: Self) -> Self {
        if other > self { other } else { self }
    }
    fn apply(self, curve: &Arc<dyn Curve>) -> Self {
        curve.value(self)
    }
}

impl Ordered for f64 {
    fn order(&self, other: &Self) -> Option<Ordering> {
        self.partial_cmp(other)
    }
    fn hull(self, _other: Self) -> Self {
        // Only an undefined value has no order with another, and it stays undefined.
        f64::NAN
    }
    fn known_within(self, least: f64, most: f64) -> Self {
        Number::min(Number::max(self, least), most)
    }
    fn is_zero(&self) -> bool {
        *self == 0.0
    }
}
