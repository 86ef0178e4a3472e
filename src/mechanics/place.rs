//! Where a feature may lie: in the zone of a position tolerance, in the play of a fit, under a
//! coating.
//!
//! Lengths in m. A place is told by a share w of its zone, −1 at one side and +1 at the other.

use crate::numeric::Number;

/// How far a feature has left its maximum material size, m: what that adds to the width of the zone
/// of a tolerance stated at that size. Half of it goes to each side.
///
/// Formula: `x = w·(t/2 + |D − D_MMC|/2)`.
///
/// Symbols: `share` w; `half_zone` t/2 (m); `left` |D − D_MMC| (m), not negative.
///
/// Source: ISO 2692, maximum material requirement. Size and bonus are of the same D, so that the
/// virtual size, which a gauge has, comes out the same whatever D is.
pub fn at_maximum_material<N: Number>(share: N, half_zone: f64, left: N) -> N {
    share * (left * 0.5 + half_zone)
}

/// How far a part has moved out of the middle of its fit, m.
///
/// Formula: `x = w·max(0, c)/2`.
///
/// Symbols: `share` w; `clearance` c, diametral (m), negative where the parts interfere.
pub fn in_play<N: Number>(share: N, clearance: N) -> N {
    share * clearance.max(N::exact(0.0)) * 0.5
}

/// A size with its coating on, m.
///
/// Formula: `D + k·b·s`.
///
/// Symbols: `size` D (m); `thickness` s (m); `factor` k, surfaces across the size, negative for a bore
/// or a slot; `build_up` b, the share of the thickness that grows outward: half for hard anodising,
/// common practice.
pub fn coated<N: Number>(size: N, thickness: N, factor: f64, build_up: f64) -> N {
    size + thickness * (factor * build_up)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_virtual_size_is_the_same_whatever_the_size_is() {
        // A hole of 8 mm +0.1/0, position within 0.2 at maximum material: the pin gauge is 7.8.
        for hole in [8.0, 8.03, 8.1] {
            let farthest = at_maximum_material(1.0, 0.1, hole - 8.0);
            assert!((hole - 2.0 * farthest - 7.8_f64).abs() < 1e-14);
        }
    }

    #[test]
    fn a_tight_fit_has_no_play() {
        assert_eq!(in_play(1.0, -0.02), 0.0);
        assert_eq!(in_play(-1.0, 0.02), -0.01);
    }

    #[test]
    fn a_bore_gets_smaller_by_twice_what_grows_out() {
        // 50 µm of hard anodising, half of it outward, on both sides of a bore.
        assert!((coated(20.0, 0.05, -2.0, 0.5) - 19.95_f64).abs() < 1e-14);
    }
}
