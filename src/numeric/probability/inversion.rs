//! The inversion of a moment function on the vertical line through its saddle point.

use super::tail::{Method, Tail};
use crate::numeric::complex::Complex;
use crate::numeric::distribution::{Factor, Growth};
use std::f64::consts::PI;

/// The relative error allowed to each of the three causes: step from the left, step from the
/// right, end of the sum.
const ETA: f64 = 1e-11;

/// The line, chosen for one limit.
pub(super) struct Line<'a> {
    bounded: &'a [Factor],
    normal: f64,
    /// The limit from the edge of the bounded factors.
    z: f64,
    /// Where the line crosses the real axis.
    c: f64,
    /// `K(c) − cx`.
    exponent: f64,
    /// The saddle-point approximation of the share.
    pub(super) estimate: f64,
}

impl<'a> Line<'a> {
    /// Chooses the line for the bounded factors, a normal variance and the limit's distance `z`
    /// from the bounded factors' edge.
    pub(super) fn new(bounded: &'a [Factor], normal: f64, z: f64) -> Self {
        let mut line = Line { bounded, normal, z, c: 0.0, exponent: 0.0, estimate: 0.0 };
        line.c = line.saddle();
        let growth = line.growth(line.c);
        line.exponent = growth.value - line.c * z;
        let curvature = growth.curvature.max(0.0) + 1.0 / (line.c * line.c);
        line.estimate = libm::exp(line.exponent) / (line.c * libm::sqrt(2.0 * PI * curvature));
        line
    }

    fn growth(&self, c: f64) -> Growth {
        let normal = Factor::Normal { variance: self.normal }.growth(c);
        self.bounded.iter().fold(normal, |sum, factor| sum + factor.growth(c))
    }

    /// The root of `K′(c) − x − 1/c`, which rises in `c > 0`.
    ///
    /// Bracket: doubled and halved from the normal's root; Newton's step where it stays within the
    /// bracket, else the geometric middle. Six digits do: any line gives the same integral.
    fn saddle(&self) -> f64 {
        let excess = |c: f64| {
            let growth = self.growth(c);
            (growth.slope - self.z - 1.0 / c, growth.curvature + 1.0 / (c * c))
        };
        // At c = 0 the slope is −edge and the curvature the variance, to first order in c.
        let variance = self.spread();
        let y = self.z + self.bounded.iter().map(Factor::edge).sum::<f64>();
        let mut c = 0.5 * (y + libm::sqrt(y * y + 4.0 * variance)) / variance;
        let (mut low, mut high) = (c, c);
        for _ in 0..1000 {
            if excess(low).0 <= 0.0 {
                break;
            }
            low *= 0.5;
        }
        for _ in 0..1000 {
            if excess(high).0 >= 0.0 {
                break;
            }
            high *= 2.0;
        }
        for _ in 0..100 {
            let (value, slope) = excess(c);
            if value < 0.0 {
                low = c;
            } else {
                high = c;
            }
            let newton = c - value / slope;
            let next = if newton > low && newton < high { newton } else { libm::sqrt(low * high) };
            if (next - c).abs() <= 1e-6 * c || high <= low * (1.0 + 1e-6) {
                return next;
            }
            c = next;
        }
        c
    }

    /// The variance, as the curvature at a point so near to zero that it no longer changes.
    fn spread(&self) -> f64 {
        let width = self.bounded.iter().map(Factor::edge).sum::<f64>() + libm::sqrt(self.normal);
        self.growth(1e-4 / width).curvature
    }

    /// The step for which both errors of the trapezoidal rule are below `η` of the estimate, with
    /// a bound of their sum relative to the estimate.
    ///
    /// Formula (Poisson's summation): the error is at most `Σ e^{−2πmc/h}` and
    /// `Σ e^{2πmc/h}·P(r > x + 2πm/h)`, `m ≥ 1`. The first fixes `h`; the second vanishes past the
    /// support and is else bounded by Chernoff's inequality at points ahead of `c`.
    fn step(&self) -> (f64, f64) {
        let log_target = libm::log(ETA) + libm::log(self.estimate);
        let ahead = [1.25, 1.5, 2.0, 3.0, 4.0].map(|m| {
            let c = m * self.c;
            (c, self.growth(c).value)
        });
        let mut h = 2.0 * PI * self.c / -log_target;
        for _ in 0..100 {
            let alias = self.z + 2.0 * PI / h;
            if self.normal == 0.0 && alias >= 0.0 {
                break;
            }
            let growth = 2.0 * PI * self.c / h;
            let bound = |&(c, k): &(f64, f64)| growth + k - c * alias;
            if ahead.iter().map(bound).any(|log| log <= log_target) {
                break;
            }
            h *= 0.8;
        }
        // The terms m ≥ 2 add less than the first again.
        (h, 4.0 * ETA)
    }

    /// A bound of `∫ |e^{K(c+it)−K(c)}|/t dt` from `t` on.
    fn rest(&self, t: f64) -> f64 {
        let nt2 = self.normal * t * t;
        let (mut bound, mut power) = (libm::exp(-0.5 * nt2), 0u32);
        for factor in self.bounded {
            let (b, p) = factor.decay(self.c, t);
            bound *= b;
            power += p;
        }
        // ∫ t^{−q−1} dt = t^{−q}/q, and the bell alone gives e^{−σ²t²/2}/(σ²t²).
        let by_power = if power > 0 { 1.0 / f64::from(power) } else { f64::INFINITY };
        let by_bell = if nt2 > 0.0 { 1.0 / nt2 } else { f64::INFINITY };
        bound * by_power.min(by_bell)
    }

    /// How many points the sum will take, to the next power of two, from the bound of its end and
    /// the estimate of its value.
    fn points(&self, h: f64) -> f64 {
        let sum_by_step = PI * self.estimate / libm::exp(self.exponent);
        let mut points = 8.0;
        while self.rest(h * points) > ETA * sum_by_step && points < 1e12 {
            points *= 2.0;
        }
        points
    }

    /// How many evaluations of a factor the sum will take.
    pub(super) fn cost(&self) -> f64 {
        let weight = |factor: &Factor| match factor {
            Factor::Atoms(values) => values.len() as f64,
            Factor::Cut(_) => 8.0,
            _ => 1.0,
        };
        let (h, _) = self.step();
        self.points(h) * (1.0 + self.bounded.iter().map(weight).sum::<f64>())
    }

    /// Sums the line until the bound of its end is met.
    pub(super) fn sum(&self) -> Tail {
        let (h, step_error) = self.step();
        // M(c) of each factor: the sum runs over quotients, which never overflow.
        let at_c: Vec<f64> = self
            .bounded
            .iter()
            .map(|factor| 1.0 / factor.moment_from_edge(Complex::new(self.c, 0.0)).re)
            .collect();
        let (mut sum, mut rounding) = (0.5 / self.c, 0.5 / self.c);
        // The stop is met by the points foreseen; the cap only guards a sum that rounding spoils.
        let most = 16.0 * self.points(h);
        let (mut k, mut rest) = (0, f64::INFINITY);
        while (k as f64) < most {
            k += 1;
            let t = h * k as f64;
            let s = Complex::new(self.c, t);
            // The normal's quotient and the limit's wave in one exponential.
            let phase = self.normal * self.c * t - t * self.z;
            let mut quotient = Complex::new(-0.5 * self.normal * t * t, phase).exp();
            for (factor, scale) in self.bounded.iter().zip(&at_c) {
                quotient = quotient * (factor.moment_from_edge(s) * *scale);
            }
            let term = quotient * s.recip();
            sum += term.re;
            rounding += term.norm() * (1.0 + 0.1 * phase.abs());
            if k % 8 == 0 {
                rest = self.rest(t);
                if rest <= ETA * sum.abs() * h {
                    break;
                }
            }
        }
        let scale = libm::exp(self.exponent) * h / PI;
        // The limit's own rounding moves the share by c times it.
        let edge: f64 = self.bounded.iter().map(Factor::edge).sum();
        let limit = self.c * (2.0 * edge + self.z.abs());
        let digits = 8.0 + self.bounded.len() as f64 + self.exponent.abs() + limit;
        let share = scale * sum;
        let error = step_error * self.estimate
            + scale / h * rest
            + f64::EPSILON * digits * rounding * scale;
        Tail { share, error, method: Method::Inversion(k) }
    }
}
