//! Draws of each shape from an unknown's stream.

use super::cumulative::{mirrored, trapezoid_quantile};
use super::{Distribution, Shape};
use crate::numeric::random::{Stream, vectorized};
use std::f64::consts::PI;

impl Distribution {
    /// Fills `out` with the draws numbered from `first` on of one unknown's stream.
    ///
    /// Every shape but the normal, the curvilinear trapezoid and Student's t is drawn by its
    /// quantile of one even number, so that draws of one stream rise and fall together.
    pub fn fill(&self, stream: Stream, first: u64, out: &mut [f64]) {
        let mean = self.mean;
        match &self.shape {
            Shape::Point => out.fill(mean),
            Shape::Normal { sigma } => stream.fill_normal(first, mean, *sigma, out),
            Shape::Uniform { half } => {
                fill_with(stream, first, out, |u| mean + half * (2.0 * u - 1.0));
            }
            Shape::Triangular { half } => fill_with(stream, first, out, |u| {
                mean + mirrored(u, |p| -half * (1.0 - (2.0 * p).sqrt()))
            }),
            Shape::Trapezoid { base, top } => fill_with(stream, first, out, |u| {
                mean + mirrored(u, |p| trapezoid_quantile(p, *base, *top))
            }),
            Shape::Sorted(cut) => fill_with(stream, first, out, |u| mean + cut.quantile(u)),
            Shape::Measured(list) => fill_with(stream, first, out, |u| mean + list.draw(u)),
            Shape::Arcsine { .. } => fill_with(stream, first, out, |u| self.quantile(u)),
            Shape::Curvilinear { half, slack } => fill_with_two(stream, first, out, |u, v| {
                // JCGM 101:2008, 6.4.3.4: first the width, then the place within.
                mean + (half + slack * (2.0 * v - 1.0)) * (2.0 * u - 1.0)
            }),
            Shape::Student { scale, degrees } => fill_with_two(stream, first, out, |u, v| {
                // R. W. Bailey's polar form, Mathematics of Computation 62 (1994) 779–781.
                let growth = libm::expm1(-2.0 * libm::log(u) / degrees);
                mean + scale * libm::sqrt(degrees * growth) * libm::cos(2.0 * PI * v)
            }),
        }
    }
}

/// Draws made of one even number each.
#[inline(always)]
fn fill_with(stream: Stream, first: u64, out: &mut [f64], draw: impl Fn(f64) -> f64) {
    vectorized(
        #[inline(always)]
        || {
            for (k, x) in (first..).zip(&mut *out) {
                *x = draw(stream.uniform(k));
            }
        },
    );
}

/// Draws made of two even numbers each.
fn fill_with_two(stream: Stream, first: u64, out: &mut [f64], draw: impl Fn(f64, f64) -> f64) {
    let second = stream.second();
    for (k, x) in (first..).zip(out) {
        *x = draw(stream.uniform(k), second.uniform(k));
    }
}
