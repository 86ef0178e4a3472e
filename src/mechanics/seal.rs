//! Squeeze of an O-ring in its groove.
//!
//! Lengths in m at temperature, squeeze and stretch as pure numbers.

use crate::numeric::Number;

/// By how much a ring is stretched on its groove, as a share of its inner diameter.
///
/// Formula: `groove/ID − 1`.
pub fn stretch<N: Number>(groove: N, inner_diameter: N) -> N {
    groove / inner_diameter - 1.0
}

/// Width of the cross-section of a stretched ring, m.
///
/// Formula: `W′ = W/√(1+stretch)`: the volume stays, and the circumference grows by the stretch.
///
/// Valid for: rubber, incompressible, stretched by some per cent; the section stays round.
pub fn stretched_width<N: Number>(width: N, stretch: N) -> N {
    width / (stretch + 1.0).sqrt()
}

/// Share by which the cross-section is squeezed; negative where it does not touch both faces.
///
/// Formula: `1 − G/W′`.
///
/// Symbols: `gland` G, depth left for the ring; `width` W′ (m).
pub fn squeeze<N: Number>(gland: N, width: N) -> N {
    -(gland / width) + 1.0
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_quarter_is_a_quarter() {
        // Common practice: 2.0 mm squeezed to 1.5 mm is 25 %.
        assert_eq!(squeeze(1.5e-3, stretched_width(2e-3, 0.0)), 0.25);
    }

    #[test]
    fn stretch_keeps_the_volume() {
        let (width, id) = (3.53e-3, 24.99e-3);
        let s = stretch(25.5e-3, id);
        let narrow = stretched_width(width, s);
        assert!((narrow * narrow * 25.5e-3 - width * width * id).abs() < 1e-20);
    }
}
