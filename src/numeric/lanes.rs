//! Eight values at a time, for sampling: each operation runs over all lanes, so that the compiler
//! uses the machine's vector registers.

use super::curve::Curve;
use super::{Interval, Number};
use std::ops::{Add, Div, Mul, Neg, Sub};
use std::sync::Arc;

/// Number of values in one block.
pub const WIDTH: usize = 8;

/// A block of [`WIDTH`] values that go through a formula together.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Lanes(pub [f64; WIDTH]);

impl Lanes {
    fn map(self, f: impl Fn(f64) -> f64) -> Self {
        Lanes(std::array::from_fn(|i| f(self.0[i])))
    }
    fn zip(self, o: Self, f: impl Fn(f64, f64) -> f64) -> Self {
        Lanes(std::array::from_fn(|i| f(self.0[i], o.0[i])))
    }
}

impl Neg for Lanes {
    type Output = Self;
    fn neg(self) -> Self {
        self.map(|x| -x)
    }
}

macro_rules! arithmetic {
    ($($trait:ident $method:ident $op:tt;)*) => {$(
        impl $trait for Lanes {
            type Output = Self;
            fn $method(self, o: Self) -> Self {
                self.zip(o, |a, b| a $op b)
            }
        }
        impl $trait<f64> for Lanes {
            type Output = Self;
            fn $method(self, o: f64) -> Self {
                self.map(|a| a $op o)
            }
        }
    )*};
}

arithmetic! {
    Add add +;
    Sub sub -;
    Mul mul *;
    Div div /;
}

impl Number for Lanes {
    fn exact(x: f64) -> Self {
        Lanes([x; WIDTH])
    }
    fn enclosed(interval: Interval) -> Self {
        Lanes::exact(interval.mid())
    }
    fn powi(self, n: i32) -> Self {
        self.map(|x| Number::powi(x, n))
    }
    fn sqrt(self) -> Self {
        self.map(libm::sqrt)
    }
    fn exp(self) -> Self {
        self.map(libm::exp)
    }
    fn ln(self) -> Self {
        self.map(libm::log)
    }
    fn sin(self) -> Self {
        self.map(libm::sin)
    }
    fn cos(self) -> Self {
        self.map(libm::cos)
    }
    fn tan(self) -> Self {
        self.map(libm::tan)
    }
    fn asin(self) -> Self {
        self.map(libm::asin)
    }
    fn acos(self) -> Self {
        self.map(libm::acos)
    }
    fn atan(self) -> Self {
        self.map(libm::atan)
    }
    fn atan2(self, x: Self) -> Self {
        self.zip(x, libm::atan2)
    }
    fn abs(self) -> Self {
        self.map(f64::abs)
    }
    fn min(self, o: Self) -> Self {
        self.zip(o, Number::min)
    }
    fn max(self, o: Self) -> Self {
        self.zip(o, Number::max)
    }
    fn apply(self, curve: &Arc<dyn Curve>) -> Self {
        self.map(|x| curve.value(x))
    }
}
