//! Confidence limits of a share that was counted in draws.

use crate::numeric::special::beta_quantile;

/// The lower and upper limit of a share.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ShareInterval {
    /// The lower limit.
    pub low: f64,
    /// The upper limit.
    pub high: f64,
}

/// The interval that holds the true share with at least the given confidence, `count` of `draws`
/// having been seen.
///
/// Formula: `low` is the `α/2` quantile of Beta(k, n−k+1), `high` the `1−α/2` quantile of
/// Beta(k+1, n−k), `α = 1 − confidence`; 0 and 1 at the ends.
///
/// Symbols: `k` the count, `n` the draws.
///
/// Source: C. J. Clopper & E. S. Pearson, Biometrika 26 (1934) 404–413.
///
/// Valid for independent draws; the true coverage is never below the confidence.
pub fn clopper_pearson(count: u64, draws: u64, confidence: f64) -> ShareInterval {
    let alpha = 1.0 - confidence;
    let count = count.min(draws);
    let (k, rest) = (count as f64, (draws - count) as f64);
    ShareInterval {
        low: if count == 0 { 0.0 } else { beta_quantile(0.5 * alpha, k, rest + 1.0) },
        // The upper quantile of Beta(a, b) is one less the lower one of Beta(b, a).
        high: if count == draws { 1.0 } else { beta_quantile(1.0 - 0.5 * alpha, k + 1.0, rest) },
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_ends_meet_their_closed_forms() {
        // Nothing seen in n draws: high = 1 − (α/2)^(1/n), the exact form of the "rule of three".
        let got = clopper_pearson(0, 1000, 0.95);
        assert_eq!(got.low, 0.0);
        let want = -libm::expm1(libm::log(0.025) / 1000.0);
        assert!((got.high / want - 1.0).abs() < 1e-11, "{got:?}");
        let all = clopper_pearson(1000, 1000, 0.95);
        assert_eq!(all.high, 1.0);
        assert!(((1.0 - all.low) / want - 1.0).abs() < 1e-11, "{all:?}");
        assert_eq!(clopper_pearson(0, 0, 0.95), ShareInterval { low: 0.0, high: 1.0 });
    }
}
