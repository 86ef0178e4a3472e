//! Density, tails and quantile of each shape.

use super::{Distribution, Shape, student};
use crate::numeric::special::{normal_density, normal_quantile, normal_tail};
use std::f64::consts::PI;

impl Distribution {
    /// The share strictly above `x`, with full relative precision in the far tail.
    pub fn above(&self, x: f64) -> f64 {
        let x = x - self.mean;
        match &self.shape {
            Shape::Measured(list) => list.tail(x),
            Shape::Sorted(cut) => cut.tail(x),
            Shape::Point => f64::from(u8::from(x < 0.0)),
            _ => symmetric_tail(&self.shape, x),
        }
    }

    /// The share at or below `x`.
    pub fn cdf(&self, x: f64) -> f64 {
        let distance = x - self.mean;
        match &self.shape {
            Shape::Measured(_) | Shape::Point => 1.0 - self.above(x),
            Shape::Sorted(cut) => cut.mirrored().tail(-distance),
            _ => symmetric_tail(&self.shape, -distance),
        }
    }

    /// The density at `x`; zero where the distribution is made of single values.
    pub fn density(&self, x: f64) -> f64 {
        let x = x - self.mean;
        let y = x.abs();
        match &self.shape {
            Shape::Point => 0.0,
            Shape::Normal { sigma } => normal_density(x / sigma) / sigma,
            Shape::Sorted(cut) => cut.density(x),
            Shape::Uniform { half } if y <= *half => 0.5 / half,
            Shape::Triangular { half } if y <= *half => (half - y) / (half * half),
            Shape::Trapezoid { base, top } if y <= *base => {
                ((base - y) / (base - top)).min(1.0) / (base + top)
            }
            Shape::Curvilinear { half, slack } if y < half + slack => {
                libm::log((half + slack) / y.max(half - slack)) / (4.0 * slack)
            }
            Shape::Arcsine { half } if y < *half => 1.0 / (PI * libm::sqrt(half * half - x * x)),
            Shape::Student { scale, degrees } => {
                let t = x / scale;
                let log_beta = libm::lgamma(0.5 * degrees) + libm::lgamma(0.5)
                    - libm::lgamma(0.5 * (degrees + 1.0));
                let power = -0.5 * (degrees + 1.0) * libm::log1p(t * t / degrees);
                libm::exp(power - log_beta) / (scale * libm::sqrt(*degrees))
            }
            Shape::Measured(list) if list.half_resolution() > 0.0 => {
                let half = list.half_resolution();
                let within = |d: &&f64| (x - **d).abs() <= half;
                let count = list.deviations().iter().filter(within).count();
                count as f64 / (list.count() as f64 * 2.0 * half)
            }
            _ => 0.0,
        }
    }

    /// The quantile: the value below which the share `u` lies, `0 < u < 1`.
    pub fn quantile(&self, u: f64) -> f64 {
        let distance = match &self.shape {
            Shape::Point => 0.0,
            Shape::Normal { sigma } => sigma * normal_quantile(u),
            Shape::Sorted(cut) => cut.quantile(u),
            Shape::Uniform { half } => half * (2.0 * u - 1.0),
            Shape::Triangular { half } => mirrored(u, |p| -half * (1.0 - libm::sqrt(2.0 * p))),
            Shape::Trapezoid { base, top } => mirrored(u, |p| trapezoid_quantile(p, *base, *top)),
            Shape::Curvilinear { half, slack } => {
                mirrored(u, |p| -curvilinear_point(p, *half, *slack))
            }
            Shape::Arcsine { half } => -half * libm::cos(PI * u),
            Shape::Student { scale, degrees } => scale * student::quantile(u, *degrees),
            Shape::Measured(list) => list.quantile(u),
        };
        self.mean + distance
    }
}

/// A symmetric shape's quantile from that of its lower half.
#[inline]
pub(super) fn mirrored(u: f64, lower_half: impl Fn(f64) -> f64) -> f64 {
    if u < 0.5 { lower_half(u) } else { -lower_half(1.0 - u) }
}

/// The trapezoid's quantile for `p ≤ ½`: a square root on the slope, a line on the top.
#[inline]
pub(super) fn trapezoid_quantile(p: f64, base: f64, top: f64) -> f64 {
    let slope_share = 0.5 * (base - top) / (base + top);
    if p < slope_share {
        libm::sqrt(2.0 * p * (base + top) * (base - top)) - base
    } else {
        (p - 0.5) * (base + top)
    }
}

/// The share above `x` of a shape symmetric about zero.
fn symmetric_tail(shape: &Shape, x: f64) -> f64 {
    match shape {
        Shape::Normal { sigma } => return normal_tail(x / sigma),
        Shape::Student { scale, degrees } => return student::tail(x / scale, *degrees),
        _ => {}
    }
    if x < 0.0 {
        return 1.0 - symmetric_tail(shape, -x);
    }
    match shape {
        Shape::Uniform { half } => (0.5 * (half - x) / half).max(0.0),
        Shape::Triangular { half } => {
            let rest = (half - x).max(0.0) / half;
            0.5 * rest * rest
        }
        Shape::Trapezoid { base, top } => {
            if x <= *top {
                return 0.5 - x / (base + top);
            }
            let rest = (base - x).max(0.0);
            0.5 * rest * rest / ((base - top) * (base + top))
        }
        Shape::Curvilinear { half, slack } => curvilinear_tail(x, *half, *slack),
        Shape::Arcsine { half } if x < *half => {
            // atan2 keeps the digits near the end, where the arcsine's slope is infinite.
            libm::atan2(libm::sqrt((half - x) * (half + x)), x) / PI
        }
        _ => 0.0,
    }
}

/// The share of the curvilinear trapezoid above `x ≥ 0`: the mean over the half-width `W` of
/// `(1 − x/W)/2` where `W > x`.
fn curvilinear_tail(x: f64, half: f64, slack: f64) -> f64 {
    let (low, high) = (half - slack, half + slack);
    if x >= high {
        return 0.0;
    }
    let from = x.max(low);
    let r = (high - from) / from;
    // (high − from) − x·ln(high/from), by the series of ln(1+r) where the two nearly cancel.
    let rest = if r < 1e-2 && x >= low {
        let series = (0..12).rev().fold(0.0, |sum, k| {
            let sign = if k % 2 == 0 { 1.0 } else { -1.0 };
            sum * r + sign / f64::from(k + 2)
        });
        x * r * r * series
    } else {
        (high - from) - x * libm::log1p(r)
    };
    rest / (4.0 * slack)
}

/// The point of the curvilinear trapezoid above which the share `p ≤ ½` lies, by halving.
fn curvilinear_point(p: f64, half: f64, slack: f64) -> f64 {
    let (mut low, mut high) = (0.0, half + slack);
    for _ in 0..200 {
        let middle = 0.5 * (low + high);
        if middle <= low || middle >= high {
            break;
        }
        if curvilinear_tail(middle, half, slack) > p {
            low = middle;
        } else {
            high = middle;
        }
    }
    0.5 * (low + high)
}
