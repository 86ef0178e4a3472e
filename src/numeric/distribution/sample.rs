//! Draws of each shape from evenly distributed numbers.

use super::cumulative::{mirrored, trapezoid_quantile};
use super::{Distribution, Shape};
use crate::numeric::random::{Stream, fast_normal_quantile};
use std::f64::consts::PI;

impl Distribution {
    /// Makes one draw of two independent numbers, evenly distributed in (0, 1).
    ///
    /// All shapes but the curvilinear trapezoid and Student's t use `u` alone and rise with it.
    /// Normal draws are exact to 2e-10 standard deviations.
    pub fn sample(&self, u: f64, v: f64) -> f64 {
        let distance = match &self.shape {
            Shape::Point => 0.0,
            Shape::Normal { sigma } => sigma * fast_normal_quantile(u),
            Shape::Sorted(cut) => cut.quantile_by(u, fast_normal_quantile),
            Shape::Curvilinear { half, slack } => {
                (half + slack * (2.0 * v - 1.0)) * (2.0 * u - 1.0)
            }
            Shape::Student { scale, degrees } => {
                // Bailey's polar form (Mathematics of Computation 62 (1994) 779–781).
                let growth = libm::expm1(-2.0 * libm::log(u) / degrees);
                scale * libm::sqrt(degrees * growth) * libm::cos(2.0 * PI * v)
            }
            Shape::Measured(list) => list.draw(u),
            _ => return self.quantile(u),
        };
        self.mean + distance
    }

    /// Fills `out` with the draws numbered from `first` on of one unknown's stream.
    pub fn fill(&self, stream: Stream, first: u64, out: &mut [f64]) {
        let mean = self.mean;
        match &self.shape {
            Shape::Point => out.fill(mean),
            Shape::Normal { sigma } => stream.fill_normal(first, mean, *sigma, out),
            Shape::Uniform { half } => {
                stream.fill_uniform(first, out);
                for x in out {
                    *x = mean + half * (2.0 * *x - 1.0);
                }
            }
            Shape::Triangular { half } => {
                stream.fill_uniform(first, out);
                for x in out {
                    *x = mean + mirrored(*x, |p| -half * (1.0 - (2.0 * p).sqrt()));
                }
            }
            Shape::Trapezoid { base, top } => {
                stream.fill_uniform(first, out);
                for x in out {
                    *x = mean + mirrored(*x, |p| trapezoid_quantile(p, *base, *top));
                }
            }
            Shape::Curvilinear { .. } | Shape::Student { .. } => {
                let second = stream.second();
                for (draw, x) in (first..).zip(out) {
                    *x = self.sample(stream.uniform(draw), second.uniform(draw));
                }
            }
            Shape::Sorted(_) | Shape::Arcsine { .. } | Shape::Measured(_) => {
                stream.fill_uniform(first, out);
                for x in out {
                    *x = self.sample(*x, 0.5);
                }
            }
        }
    }
}
