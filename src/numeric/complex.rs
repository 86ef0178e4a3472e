//! Complex numbers with transcendental functions that give the same digits on every machine.
//!
//! Own code rather than a crate: the usual crate takes its functions from the platform as soon as
//! any other crate switches its standard-library feature on, and only these few are needed.

use std::ops::{Add, Div, Mul, Neg, Sub};

/// A complex number `re + i·im`.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Complex {
    /// The real part.
    pub re: f64,
    /// The imaginary part.
    pub im: f64,
}

impl Complex {
    /// The number one.
    pub const ONE: Complex = Complex { re: 1.0, im: 0.0 };

    /// Makes a number of its two parts.
    pub const fn new(re: f64, im: f64) -> Self {
        Complex { re, im }
    }

    /// The modulus `|s|`.
    pub fn norm(self) -> f64 {
        libm::hypot(self.re, self.im)
    }

    /// The mirror image about the real axis.
    pub fn conj(self) -> Self {
        Complex::new(self.re, -self.im)
    }

    /// The exponential `e^s`.
    pub fn exp(self) -> Self {
        let scale = libm::exp(self.re);
        let (sin, cos) = libm::sincos(self.im);
        Complex::new(scale * cos, scale * sin)
    }

    /// The exponential less one, `e^s − 1`, without loss of digits near zero.
    pub fn exp_m1(self) -> Self {
        let real = libm::expm1(self.re);
        let (sin, cos) = libm::sincos(0.5 * self.im);
        // cos(im) = 1 − 2·sin²(im/2) keeps the small real part of the result exact.
        let cos_less_one = -2.0 * sin * sin;
        Complex::new(real * (1.0 + cos_less_one) + cos_less_one, (1.0 + real) * 2.0 * sin * cos)
    }

    /// The principal logarithm, imaginary part in (−π, π].
    pub fn ln(self) -> Self {
        Complex::new(libm::log(self.norm()), libm::atan2(self.im, self.re))
    }

    /// The reciprocal `1/s`.
    pub fn recip(self) -> Self {
        let d = self.re * self.re + self.im * self.im;
        Complex::new(self.re / d, -self.im / d)
    }

    /// The whole power `s^n` by repeated squaring.
    pub fn power(self, n: u32) -> Self {
        let (mut result, mut square, mut n) = (Complex::ONE, self, n);
        while n > 0 {
            if n & 1 == 1 {
                result = result * square;
            }
            square = square * square;
            n >>= 1;
        }
        result
    }
}

impl Add for Complex {
    type Output = Complex;
    fn add(self, other: Complex) -> Complex {
        Complex::new(self.re + other.re, self.im + other.im)
    }
}

impl Sub for Complex {
    type Output = Complex;
    fn sub(self, other: Complex) -> Complex {
        Complex::new(self.re - other.re, self.im - other.im)
    }
}

impl Mul for Complex {
    type Output = Complex;
    fn mul(self, other: Complex) -> Complex {
        Complex::new(
            self.re * other.re - self.im * other.im,
            self.re * other.im + self.im * other.re,
        )
    }
}

impl Mul<f64> for Complex {
    type Output = Complex;
    fn mul(self, other: f64) -> Complex {
        Complex::new(self.re * other, self.im * other)
    }
}

impl Div for Complex {
    type Output = Complex;
    // Dividing is multiplying by the reciprocal.
    #[allow(clippy::suspicious_arithmetic_impl)]
    fn div(self, other: Complex) -> Complex {
        self * other.recip()
    }
}

impl Neg for Complex {
    type Output = Complex;
    fn neg(self) -> Complex {
        Complex::new(-self.re, -self.im)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn close(a: Complex, b: Complex) {
        assert!((a - b).norm() <= 4e-16 * b.norm(), "{a:?} is not {b:?}");
    }

    #[test]
    fn exponential_and_logarithm_undo_each_other() {
        for s in [Complex::new(0.3, -2.0), Complex::new(-4.0, 1.0), Complex::new(1e-9, 3.0)] {
            close(s.exp().ln(), s);
            close(s * s.recip(), Complex::ONE);
            close(s.power(5), s * s * s * s * s);
        }
    }

    #[test]
    fn exponential_less_one_keeps_digits_near_zero() {
        let s = Complex::new(3e-9, -2e-9);
        close(s.exp_m1(), s + s * s * 0.5);
        let far = Complex::new(-2.0, 7.0);
        close(far.exp_m1(), far.exp() - Complex::ONE);
    }
}
