//! The normal curve cut at two limits: what sorting leaves.

use super::Unsound;
use super::factor::Growth;
use crate::numeric::complex::Complex;
use crate::numeric::quadrature::gauss_legendre_24;
use crate::numeric::special::{
    normal_between, normal_density, normal_quantile, normal_tail, scaled_erfc,
};
use std::f64::consts::FRAC_1_SQRT_2;

/// A normal curve of standard deviation `sigma` before the cut, kept between `low` and `high`,
/// both in standard deviations from the middle of the uncut curve.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Cut {
    sigma: f64,
    low: f64,
    high: f64,
    /// The shares that sorting takes off below and above, and that it keeps.
    off_low: f64,
    off_high: f64,
    kept: f64,
    /// The mean of what is kept, in standard deviations.
    shift: f64,
}

/// Points where the normal density is split so that 24 points integrate each piece fully.
const SPLITS: [f64; 9] = [-6.0, -4.0, -2.5, -1.2, 0.0, 1.2, 2.5, 4.0, 6.0];

impl Cut {
    /// Checks and prepares the cut.
    pub(super) fn new(sigma: f64, low: f64, high: f64) -> Result<Self, Unsound> {
        if !(low.is_finite() && high.is_finite()) {
            return Err(Unsound::NotFinite);
        }
        if low >= high {
            return Err(Unsound::WrongOrder);
        }
        let kept = normal_between(low, high);
        if high - low < 0.01 || kept < 1e-12 {
            return Err(Unsound::NothingLeft);
        }
        let (off_low, off_high) = (normal_tail(-low), normal_tail(high));
        let mut cut = Cut { sigma, low, high, off_low, off_high, kept, shift: 0.0 };
        cut.shift = cut.central_moment(1);
        Ok(cut)
    }

    /// The mean of the pieces kept less that of the process, in the caller's unit.
    pub fn shift(&self) -> f64 {
        self.sigma * self.shift
    }

    /// The share of the process that sorting keeps.
    pub fn kept(&self) -> f64 {
        self.kept
    }

    /// The standard deviation of the process before the cut, in the caller's unit.
    pub fn sigma(&self) -> f64 {
        self.sigma
    }

    /// The lower and upper limit about the mean of what is kept.
    pub(super) fn support(&self) -> (f64, f64) {
        (self.sigma * (self.low - self.shift), self.sigma * (self.high - self.shift))
    }

    /// The mirror image.
    pub(super) fn mirrored(&self) -> Self {
        Cut {
            low: -self.high,
            high: -self.low,
            off_low: self.off_high,
            off_high: self.off_low,
            shift: -self.shift,
            ..*self
        }
    }

    /// The same cut with every length multiplied by a factor above zero.
    pub(super) fn scaled(&self, factor: f64) -> Self {
        Cut { sigma: self.sigma * factor, ..*self }
    }

    /// Points about the mean between which the density is smooth enough for 24 points.
    pub(super) fn nodes(&self) -> Vec<f64> {
        let inner = SPLITS.iter().copied().filter(|&v| self.low < v && v < self.high);
        std::iter::once(self.low)
            .chain(inner)
            .chain(std::iter::once(self.high))
            .map(|v| self.sigma * (v - self.shift))
            .collect()
    }

    /// The central moment of whole order, in powers of the standard deviation before the cut.
    pub(super) fn central_moment(&self, order: u32) -> f64 {
        let integrand =
            |v: f64| (0..order).fold(normal_density(v), |product, _| product * (v - self.shift));
        let inner = SPLITS.iter().copied().filter(|&v| self.low < v && v < self.high);
        let mut start = self.low;
        let mut sum = 0.0;
        for end in inner.chain(std::iter::once(self.high)) {
            sum += gauss_legendre_24().integrate(start, end, integrand);
            start = end;
        }
        sum / self.kept
    }

    /// The density at a distance from the mean.
    pub(super) fn density(&self, x: f64) -> f64 {
        let v = x / self.sigma + self.shift;
        if v < self.low || v > self.high {
            return 0.0;
        }
        normal_density(v) / (self.sigma * self.kept)
    }

    /// The share above a distance from the mean.
    pub(super) fn tail(&self, x: f64) -> f64 {
        let v = x / self.sigma + self.shift;
        if v <= self.low {
            return 1.0;
        }
        normal_between(v, self.high) / self.kept
    }

    /// The point, as a distance from the mean, below which the share `u` lies.
    pub(super) fn quantile(&self, u: f64) -> f64 {
        let below = self.off_low + u * self.kept;
        let v = if below <= 0.5 {
            normal_quantile(below)
        } else {
            -normal_quantile(self.off_high + (1.0 - u) * self.kept)
        };
        self.sigma * (v.clamp(self.low, self.high) - self.shift)
    }

    /// `M(s)·e^{−s·edge}`, with the edge the upper limit; `Re s ≥ 0`.
    ///
    /// Formula: `M = e^{σ²s²/2}·(Φ(β−σs) − Φ(α−σs))/kept`, written with the scaled error function
    /// so that the exponentials that would overflow cancel beforehand.
    pub(super) fn moment_from_edge(&self, s: Complex) -> Complex {
        let s = s * self.sigma;
        // The common factor e^{−sβ} of all three parts.
        let end = |limit: f64| {
            let z = (s - Complex::new(limit, 0.0)) * FRAC_1_SQRT_2;
            let scale = (s * (limit - self.high)).exp() * libm::exp(-0.5 * limit * limit);
            if z.re >= 0.0 {
                (scale * scaled_erfc(z) * 0.5, false)
            } else {
                (scale * scaled_erfc(-z) * -0.5, true)
            }
        };
        let ((upper, upper_inside), (lower, lower_inside)) = (end(self.high), end(self.low));
        let mut sum = upper - lower;
        // erfc(z) = 2 − erfc(−z): the 2 is the whole curve, and cancels if both ends have it.
        if upper_inside != lower_inside {
            let whole = (s * s * 0.5 - s * self.high).exp();
            sum = if upper_inside { sum + whole } else { sum - whole };
        }
        sum * (1.0 / self.kept)
    }

    /// The log moment function from the edge and its derivatives at real `c ≥ 0`.
    ///
    /// Formula: `K″ = σ²(1 + α′R_α − β′R_β − (R_α−R_β)²)` with `α′ = α−σc` and `R` the density at
    /// a cut over the share within, both of the tilted curve (the moments of a cut normal).
    pub(super) fn growth(&self, c: f64) -> Growth {
        let m = self.moment_from_edge(Complex::new(c, 0.0)).re;
        let tilt = self.sigma * c;
        let (r_low, r_high) = (
            normal_density(self.low) * libm::exp(tilt * (self.low - self.high)) / (m * self.kept),
            normal_density(self.high) / (m * self.kept),
        );
        let mean = tilt + r_low - r_high;
        let spread = 1.0 + (self.low - tilt) * r_low
            - (self.high - tilt) * r_high
            - (r_low - r_high) * (r_low - r_high);
        // Far out the formulas cancel; the tilted density is then exponential of rate tilt − β.
        let rate = tilt - self.high;
        let far = if rate > 30.0 { Some(1.0 / rate) } else { None };
        Growth {
            value: libm::log(m),
            slope: self.sigma * far.map_or(mean - self.high, |width| -width),
            curvature: self.sigma * self.sigma * far.map_or(spread, |width| width * width),
        }
    }

    /// An upper bound of `|M(c+it)|/M(c)`, for any `c ≥ 0` and `t > 0`.
    ///
    /// The total variation of the tilted density bounds it by twice the greatest density over `t`;
    /// the whole curve with two steps at the cuts bounds it too.
    pub(super) fn decay(&self, c: f64, t: f64) -> f64 {
        let m = self.moment_from_edge(Complex::new(c, 0.0)).re * self.kept;
        let tilt = self.sigma * c;
        let density = |v: f64| normal_density(v) * libm::exp(tilt * (v - self.high)) / m;
        let peak = density(tilt.clamp(self.low, self.high));
        let by_variation = 2.0 * peak / (self.sigma * t);
        let steps = 2.0 * (density(self.low) + density(self.high)) / (self.sigma * t);
        let st = self.sigma * t;
        let whole = libm::exp(0.5 * (tilt * tilt - st * st) - tilt * self.high) / m;
        by_variation.min(steps + whole)
    }
}
