//! One press or shrink joint: pressure, what it carries, what it does to shaft and hub.
//!
//! Diameters and interference in m, diametral; pressures and stresses in Pa, a pull positive; forces
//! in N, torques in N·m. The rings carry radii; only their ratio enters here. Several rings at once,
//! and turning ones, are in [`super::contact`].

use super::ring::Ring;
use crate::numeric::Number;

/// Interference that the roughness of the two surfaces takes up, diametral, m.
///
/// Formula: `G = 0.8(Rz_s + Rz_h)`.
///
/// Symbols: `rz_shaft`, `rz_hub` mean roughness depth Rz (m).
///
/// Source: DIN 7190-1 (from memory).
///
/// Valid for: longitudinal press fits. Sources differ on whether a shrink fit loses it too: whoever
/// states no roughness gets none.
pub fn smoothing<N: Number>(rz_shaft: N, rz_hub: N) -> N {
    (rz_shaft + rz_hub) * 0.8
}

/// How much interference per diameter a pressure takes, 1/Pa.
///
/// Formula: `C = (1+2/(Q²−1)+ν_o)/E_o + (1+2q²/(1−q²)−ν_i)/E_i`, `Q = D/d`, `q = d_i/d`.
///
/// Source: Lamé; Timoshenko, *Strength of Materials*, part II (from memory); Shigley, *Mechanical
/// Engineering Design*, 8th edition, section 3-16, in diameters.
///
/// Valid for: rings of equal length, plane stress, elastic.
pub fn compliance<N: Number>(shaft: &Ring<N>, hub: &Ring<N>) -> N {
    hub.bore_compliance() + shaft.outside_compliance()
}

/// Contact pressure of a joint, Pa; 0 when it is loose.
///
/// Formula: `p = max(0, δ)/(d·C)`.
///
/// Symbols: `interference` δ = d_s(T) − d_h(T) − G, free sizes at temperature (m); `diameter` d
/// nominal (m); `compliance` C (1/Pa).
///
/// Valid for: as [`compliance`]; terms of the order δ/d + αΔT beside 1 are neglected.
pub fn pressure<N: Number>(interference: N, diameter: N, compliance: N) -> N {
    interference.max(N::exact(0.0)) / (diameter * compliance)
}

/// How far friction along a joint may shift its pressure, as a share.
///
/// Formula: `κ = (ν_o/(A_oE_o) + ν_i/(A_iE_i))·πμdL/(2C)`. Friction holds back the change of length of
/// the rings with an axial force up to `|N| ≤ πμpdL/2`, in the middle of the joint, and by Poisson's
/// ratio that force changes their diameters.
///
/// Symbols: `friction` μ; `diameter` d, `length` L of contact (m); `compliance` C (1/Pa).
///
/// Valid for: shaft and hub ending with the joint; under 1.
pub fn axial_coupling<N: Number>(
    shaft: &Ring<N>,
    hub: &Ring<N>,
    friction: N,
    diameter: N,
    length: N,
    compliance: N,
) -> N {
    let narrowing = |ring: &Ring<N>| ring.poisson.clone() / (ring.area() * ring.modulus.clone());
    let both = narrowing(hub) + narrowing(shaft);
    both * N::pi() * friction * diameter * length / (compliance * 2.0)
}

/// The least and the greatest pressure that friction along the joint leaves possible, Pa.
///
/// Formula: `p/(1+κ) … p/(1−κ)`.
///
/// Symbols: `pressure` p in plane stress (Pa); `coupling` κ of [`axial_coupling`], under 1.
pub fn pressure_band<N: Number>(pressure: N, coupling: N) -> (N, N) {
    let least = pressure.clone() / (coupling.clone() + 1.0);
    (least, pressure / (-coupling + 1.0))
}

/// Axial force that a joint carries before it slips, N.
///
/// Formula: `F = πμpLd`.
///
/// Symbols: `friction` μ; `pressure` p (Pa); `length` L, `diameter` d (m).
///
/// Source: Shigley, *Mechanical Engineering Design*, section 7-8 (from memory); the press-in force of
/// the school form of DIN 7190.
pub fn axial_force<N: Number>(friction: N, pressure: N, length: N, diameter: N) -> N {
    N::pi() * friction * pressure * length * diameter
}

/// Torque that a joint carries before it slips, N·m.
///
/// Formula: `T = ½πμpLd²`.
///
/// Symbols, source: as [`axial_force`].
pub fn torque<N: Number>(friction: N, pressure: N, length: N, diameter: N) -> N {
    axial_force(friction, pressure, length, diameter.clone()) * diameter * 0.5
}

/// The force at the surface of a joint that a torque and an axial force make together, N; the joint
/// holds while it is within [`axial_force`].
///
/// Formula: `√((2T/d)² + F²)`.
///
/// Symbols: `torque` T (N·m); `force` F (N); `diameter` d (m).
///
/// Valid for: friction alike in every direction.
pub fn combined_load<N: Number>(torque: N, force: N, diameter: N) -> N {
    (torque * 2.0 / diameter).hypot(force)
}

/// Pressure that a joint needs to carry a force at its surface, Pa.
///
/// Formula: `p = F/(πμLd)`, the inverse of [`axial_force`].
pub fn pressure_needed<N: Number>(load: N, friction: N, length: N, diameter: N) -> N {
    load / (N::pi() * friction * length * diameter)
}

/// Hoop stress in the bore of a hub, its greatest, Pa.
///
/// Formula: `σ_θ = p(Q²+1)/(Q²−1)`.
///
/// Source: as [`compliance`].
pub fn hub_hoop_stress<N: Number>(hub: &Ring<N>, pressure: N) -> N {
    pressure * hub.gamma()
}

/// Von Mises stress in the bore of a hub, its greatest, Pa.
///
/// Formula: `p√(3Q⁴+1)/(Q²−1)`, computed as `p√((γ+½)²+¾)`, which is the same.
///
/// Source: as [`compliance`], with `σ_r = −p`.
///
/// Valid for: a hub with nothing pressing on its outside, at rest; else
/// [`Ring::greatest_von_mises`].
pub fn hub_von_mises<N: Number>(hub: &Ring<N>, pressure: N) -> N {
    // Outside the root, a pressure of 0 leaves the slope defined.
    pressure * ((hub.gamma() + 0.5).sqr() + 0.75).sqrt()
}

/// Hoop stress where it is greatest in a shaft: in its bore, or everywhere if it is solid; Pa,
/// negative.
///
/// Formula: hollow `−2p/(1−q²)`, solid `−p`: the second is not the limit of the first.
///
/// Source: as [`compliance`].
pub fn shaft_hoop_stress<N: Number>(shaft: &Ring<N>, pressure: N) -> N {
    match shaft.bore {
        Some(_) => -(pressure * (shaft.gamma() + 1.0)),
        None => -pressure,
    }
}

/// Von Mises stress where it is greatest in a shaft, Pa.
///
/// Formula: hollow `2p/(1−q²)`, solid `p`.
///
/// Source: as [`compliance`].
///
/// Valid for: a shaft with nothing pressing in its bore, at rest; else [`Ring::greatest_von_mises`].
pub fn shaft_von_mises<N: Number>(shaft: &Ring<N>, pressure: N) -> N {
    // A pressure is never negative, so this is the size of the one stress there is.
    -shaft_hoop_stress(shaft, pressure)
}

/// Pressure at which a hub begins to yield by the shear criterion of DIN 7190, Pa.
///
/// Formula: `p = R_e(1 − 1/Q²)/√3`; another criterion than [`hub_von_mises`], which allows
/// `R_e(Q²−1)/√(3Q⁴+1)`, always somewhat less.
///
/// Symbols: `yield_strength` R_e (Pa).
///
/// Source: DIN 7190 as taught (Berechnungsgleichungen für Pressverbindungen, Zwickau University of
/// Applied Sciences), without its safety factor.
pub fn hub_yield_pressure<N: Number>(hub: &Ring<N>, yield_strength: N) -> N {
    // 1 − 1/Q² = 2/(γ+1).
    yield_strength * 2.0 / ((hub.gamma() + 1.0) * N::exact(3.0).sqrt())
}

#[cfg(test)]
mod tests {
    use super::*;

    fn close(found: f64, expected: f64) {
        assert!((found - expected).abs() <= 1e-13 * expected.abs(), "{found} {expected}");
    }

    fn ring(bore: Option<f64>, outside: f64) -> Ring<f64> {
        Ring { bore, outside, modulus: 70e9, poisson: 0.33, spin: 0.0 }
    }

    #[test]
    fn stresses_are_those_of_the_general_ring() {
        let (hub, hollow, solid) =
            (ring(Some(0.02), 0.03), ring(Some(0.01), 0.02), ring(None, 0.02));
        close(hub_hoop_stress(&hub, 30e6), hub.stress_inside(30e6, 0.0).hoop());
        close(hub_von_mises(&hub, 30e6), hub.greatest_von_mises(30e6, 0.0));
        close(shaft_hoop_stress(&hollow, 30e6), hollow.stress_inside(0.0, 30e6).hoop());
        close(shaft_von_mises(&hollow, 30e6), hollow.greatest_von_mises(0.0, 30e6));
        close(shaft_von_mises(&solid, 30e6), solid.greatest_von_mises(0.0, 30e6));
        let q: f64 = 1.5;
        let printed = 30e6 * (3.0 * q * q * q * q + 1.0).sqrt() / (q * q - 1.0);
        close(hub_von_mises(&hub, 30e6), printed);
        let allowed = hub_yield_pressure(&hub, 250e6);
        close(allowed, 250e6 * (1.0 - 1.0 / (q * q)) / 3_f64.sqrt());
        assert!(hub_von_mises(&hub, allowed) > 250e6);
    }

    #[test]
    fn loads_add_as_vectors_and_ask_for_the_pressure_that_carries_them() {
        let load = combined_load(30.0, 4000.0, 0.02);
        // Three, four, five: 2·30/0.02 along the surface, 4000 along the axis.
        close(load, 5000.0);
        let p = pressure_needed(load, 0.12, 0.03, 0.02);
        close(axial_force(0.12, p, 0.03, 0.02), load);
        close(torque(0.12, p, 0.03, 0.02), load * 0.01);
    }

    #[test]
    fn a_loose_joint_presses_nothing() {
        assert_eq!(pressure(-3e-6, 0.04, 1e-11), 0.0);
        assert_eq!(pressure(0.0, 0.04, 1e-11), 0.0);
    }

    #[test]
    fn the_band_closes_without_friction() {
        let (shaft, hub) = (ring(None, 0.02), ring(Some(0.02), 0.04));
        let c = compliance(&shaft, &hub);
        let kappa = axial_coupling(&shaft, &hub, 0.0, 0.04, 0.06, c);
        assert_eq!(pressure_band(20e6, kappa), (20e6, 20e6));
        let kappa = axial_coupling(&shaft, &hub, 0.2, 0.04, 0.06, c);
        let (least, most) = pressure_band(20e6, kappa);
        assert!(least < 20e6 && 20e6 < most);
    }
}
