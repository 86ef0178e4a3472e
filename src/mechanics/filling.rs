//! A liquid in a closed cavity: the room left over it, and the pressure once there is none.
//!
//! Volumes in m³ at temperature, pressures in Pa above that of filling, moduli in Pa. Knows neither
//! how a liquid nor how a cavity expands.

use super::ring::Ring;
use crate::numeric::{Interval, Number};

/// Share of a cavity that its liquid leaves free; negative where the liquid has no room.
///
/// Formula: `1 − V_l/V`.
///
/// Symbols: `liquid` V_l, `cavity` V (m³), free volumes at temperature.
pub fn ullage<N: Number>(liquid: N, cavity: N) -> N {
    -(liquid / cavity) + 1.0
}

/// How much a closed thick cylinder widens inside under pressure, as a share of its volume, 1/Pa.
///
/// Formula: `c_v = [2(1+ν)Q² + 3(1−2ν)]/(E(Q²−1))`, `Q = D/d`: twice the hoop strain and once the
/// axial one at the bore, by Lamé with the ends' force in the wall. Computed as
/// `[2 + 5g/2 + 2ν(1−g)]/E` with `g = 2/(Q²−1)`, which is the same.
///
/// Valid for: long against its diameter; end caps taken as part of the cylinder.
pub fn closed_cylinder_compliance<N: Number>(wall: &Ring<N>) -> N {
    let g = wall.g();
    let shape = g.clone() * 2.5 + 2.0 + wall.poisson.clone() * 2.0 * (-g + 1.0);
    shape / wall.modulus.clone()
}

/// Von Mises stress in the bore of a closed thick cylinder, its greatest, Pa.
///
/// Formula: `√3·p·Q²/(Q²−1)`, `Q = D/d`: from `σ_r = −p`, `σ_θ = p(Q²+1)/(Q²−1)` and the ends' force
/// `σ_z = p/(Q²−1)`. Computed as `√3·p(1 + g/2)` with `g = 2/(Q²−1)`, which is the same.
///
/// Source: Lamé; Timoshenko, *Strength of Materials*, part II (from memory).
///
/// Valid for: as [`closed_cylinder_compliance`], away from its ends.
pub fn closed_cylinder_von_mises<N: Number>(wall: &Ring<N>, pressure: N) -> N {
    pressure * (wall.g() * 0.5 + 1.0) * N::exact(3.0).sqrt()
}

/// Tangents drawn after the first; see [`full_pressure`].
const TANGENTS: usize = 5;

/// Pressure of a liquid that fills its cavity, above that of filling, Pa; 0 where it has room.
///
/// Formula: `V_l·e^{−p/K} = V(1 + c_v·p)`.
///
/// Symbols: `liquid` V_l, `cavity` V free volumes at temperature (m³); `bulk_modulus` K, isothermal,
/// tangent (Pa); `cavity_compliance` c_v (1/Pa), 0 for a rigid one.
///
/// Method: with `x = ln(V_l/V)` and `t = c_v·p` it reads `p/K + ln(1+t) = x`. The logarithm lies
/// below each of its tangents, so the p got from the tangent at any `t₀ ≥ 0`,
/// `(x − ln(1+t₀) + t₀/(1+t₀))/(1/K + c_v/(1+t₀))`, is at most the solution; from each the next
/// tangent is drawn (Newton). If t is the solution's, an error e of t₀ becomes one of at most
/// `e²/2`; beginning at `t₀ = 0`, so with `e = t`, six tangents leave less than `2e-19` of p. That
/// is added, and what is returned is an enclosure in interval arithmetic.
///
/// Valid for: `c_v·p ≤ 1`; a modulus that changes little up to p: that of water grows by about 6 p,
/// so that p is 3 p/K too low.
pub fn full_pressure<N: Number>(liquid: N, cavity: N, bulk_modulus: N, cavity_compliance: N) -> N {
    let x = (liquid / cavity).ln().max(N::exact(0.0));
    let yielding = N::exact(1.0) / bulk_modulus;
    let mut p = x.clone() / (yielding.clone() + cavity_compliance.clone());
    for _ in 0..TANGENTS {
        let t = cavity_compliance.clone() * p;
        let grown = t.clone() + 1.0;
        let above = x.clone() - grown.clone().ln() + t / grown.clone();
        p = above / (yielding.clone() + cavity_compliance.clone() / grown);
    }
    // Rounded outward, no pressure at all could look like a trace of suction.
    p.max(N::exact(0.0)) * N::enclosed(Interval::new(1.0, 1.0_f64.next_up()))
}

#[cfg(test)]
mod tests {
    use super::*;

    /// What is left of the equation, as a share of p.
    fn residual(x: f64, k: f64, c: f64) -> f64 {
        let p = full_pressure(libm::exp(x), 1.0, k, c);
        (p / k + libm::log1p(c * p) - x) / (p / k)
    }

    #[test]
    fn tangents_reach_the_solution() {
        for x in [1e-6, 1e-3, 0.05, 0.3] {
            for c in [0.0, 1e-13, 1e-11, 1e-9, 5e-9] {
                // The logarithm of a ratio near 1 is as exact as the ratio: 2e-16 of 1.
                assert!(residual(x, 1.5e9, c).abs() < 1e-13 + 4e-16 / x * (1.0 + 1.5e9 * c));
            }
        }
    }

    #[test]
    fn a_cavity_with_room_has_no_pressure() {
        assert_eq!(full_pressure(0.9, 1.0, 1.5e9, 1e-11), 0.0);
        assert_eq!(ullage(0.9, 1.0), 1.0 - 0.9);
        assert!(ullage(1.1, 1.0) < 0.0);
    }

    #[test]
    fn a_thin_wall_has_the_compliance_of_a_thin_wall() {
        // Common practice: (r/tE)(5/2 − 2ν) for a thin closed cylinder.
        let wall =
            Ring { bore: Some(0.1), outside: 0.100_01, modulus: 207e9, poisson: 0.29, spin: 0.0 };
        let thin = 0.1 / (1e-5 * 207e9) * (2.5 - 2.0 * 0.29);
        assert!((closed_cylinder_compliance(&wall) / thin - 1.0).abs() < 2e-4);
        // And the printed form, at Q = 4/3.
        let wall = Ring { bore: Some(0.03), outside: 0.04, ..wall };
        let (nu, q2) = (0.29, 16.0 / 9.0);
        let printed = (2.0 * (1.0 + nu) * q2 + 3.0 * (1.0 - 2.0 * nu)) / (207e9 * (q2 - 1.0));
        assert!((closed_cylinder_compliance(&wall) / printed - 1.0).abs() < 1e-14);
    }
}
