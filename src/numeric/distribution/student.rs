//! Student's t of any degrees of freedom, not scaled.

use crate::numeric::special::{beta_quantile, regularized_beta};

/// The share above `t`.
///
/// Source: Abramowitz & Stegun, Handbook of Mathematical Functions, 26.7.1.
pub(super) fn tail(t: f64, degrees: f64) -> f64 {
    let x = degrees / (degrees + t * t);
    let half = 0.5 * regularized_beta(x, t * t / (degrees + t * t), 0.5 * degrees, 0.5);
    if t >= 0.0 { half } else { 1.0 - half }
}

/// The point below which the share `u` lies.
pub(super) fn quantile(u: f64, degrees: f64) -> f64 {
    let small = 2.0 * u.min(1.0 - u);
    let x = beta_quantile(small, 0.5 * degrees, 0.5);
    let t = if x > 0.0 { libm::sqrt(degrees * (1.0 - x) / x) } else { f64::INFINITY };
    if u < 0.5 { -t } else { t }
}
