//! Bounds on several events at once, none of whose joint behaviour need be known.

use super::confidence::ShareInterval;

/// The share of pieces that show any of the events, from the share of each.
///
/// Formula: `max p_j ≤ p ≤ min(1, Σ p_j)`: the events nested in the likeliest, or exclusive. The
/// upper bound is Boole's inequality (Bonferroni's first).
///
/// Both bounds are reached, so that no narrower ones hold without knowledge of the joint events.
/// No events: 0.
pub fn any_of(shares: &[f64]) -> ShareInterval {
    let low = shares.iter().copied().fold(0.0, f64::max);
    ShareInterval { low, high: shares.iter().sum::<f64>().min(1.0) }
}

/// The same where the events fall into groups that share no unknown: groups are independent and
/// their shares of no event multiply.
///
/// Formula: `p = 1 − Π(1 − p_g)`, at each bound; by log1p and expm1, so that small shares keep
/// their digits.
pub fn any_of_groups(groups: &[ShareInterval]) -> ShareInterval {
    let together = |share: fn(&ShareInterval) -> f64| {
        let log_none: f64 = groups.iter().map(|g| libm::log1p(-share(g).min(1.0))).sum();
        // Adding zero turns the −0 of no groups into 0.
        -libm::expm1(log_none) + 0.0
    };
    ShareInterval { low: together(|g| g.low), high: together(|g| g.high) }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn groups_multiply_and_events_within_one_are_bounded() {
        let bounds = any_of(&[0.25, 0.5]);
        assert_eq!(bounds, ShareInterval { low: 0.5, high: 0.75 });
        assert_eq!(any_of(&[0.7, 0.6]).high, 1.0);
        assert_eq!(any_of(&[]), ShareInterval { low: 0.0, high: 0.0 });
        let both = any_of_groups(&[bounds, bounds]);
        assert!((both.low - 0.75).abs() < 1e-15 && (both.high - 0.9375).abs() < 1e-15);
        let tiny = ShareInterval { low: 1e-18, high: 1e-17 };
        assert!((any_of_groups(&[tiny, tiny]).low / 2e-18 - 1.0).abs() < 1e-14);
        assert_eq!(any_of_groups(&[]), ShareInterval { low: 0.0, high: 0.0 });
    }
}
