//! Internal clearance of rolling bearings: what fit, temperature and load take of it.
//!
//! Lengths in m, diametral where a diameter is meant: the radial internal clearance of a bearing is
//! the whole play of its inner ring across a diameter. Angles in rad, forces in N. Rings of one
//! material with shaft or housing; else [`super::contact`] has the general case.

use crate::numeric::Number;

/// Radial internal clearance from its parts, m.
///
/// Formula: `c = D_o − d_i − 2D_w`.
///
/// Symbols: `outer`, `inner` raceway diameters, `element` diameter of a rolling element (m), each at
/// its temperature and after its fit.
pub fn internal_clearance<N: Number>(outer: N, inner: N, element: N) -> N {
    outer - inner - element * 2.0
}

/// Clearance in operation, m; negative is preload.
///
/// Formula: `δ_eff = δ₀ − (δ_f + δ_t)`.
///
/// Symbols: `initial` δ₀; `by_fit` δ_f; `by_temperature` δ_t (m).
///
/// Source: common practice of bearing makers' handbooks.
pub fn operating_clearance<N: Number>(initial: N, by_fit: N, by_temperature: N) -> N {
    initial - (by_fit + by_temperature)
}

/// Loss of clearance where the inner ring and the elements are warmer than the outer ring, m.
///
/// Formula: `δ_t = α·Δt·D_o`.
///
/// Symbols: `alpha` α (1/K), 12.5 ppm/K for bearing steel; `difference` Δt of the rings (K);
/// `raceway` D_o of the outer ring (m).
///
/// Source: common practice of bearing makers' handbooks.
///
/// Valid for: rings and elements of one steel; with a housing of another material, sum the parts
/// with [`internal_clearance`].
pub fn loss_by_temperature<N: Number>(alpha: N, difference: N, raceway: N) -> N {
    alpha * difference * raceway
}

/// Diameter of the outer raceway of a ball bearing from bore and outside, m.
///
/// Formula: `D_o ≈ (4D + d)/5`.
///
/// Source: bearing makers' handbooks (from memory). An estimate: a measured raceway is better.
pub fn outer_raceway_of_ball_bearing<N: Number>(bore: N, outside: N) -> N {
    (outside * 4.0 + bore) / 5.0
}

/// Diameter of the outer raceway of a roller bearing from bore and outside, m.
///
/// Formula: `D_o ≈ (3D + d)/4`.
///
/// Source: as [`outer_raceway_of_ball_bearing`].
pub fn outer_raceway_of_roller_bearing<N: Number>(bore: N, outside: N) -> N {
    (outside * 3.0 + bore) / 4.0
}

/// Share of the interference by which a shaft of the same steel widens the inner raceway.
///
/// Formula: `(d/F)·(1 − (d_i/d)²)/(1 − (d_i/F)²)`; `d/F` for a solid shaft.
///
/// Symbols: `bore` d of the inner ring, `raceway` F; `hollow` d_i of the shaft, 0 where it is solid.
///
/// Source: Lamé with one material; bearing makers' handbooks (from memory), which put it between 0.7
/// and 0.9.
pub fn inner_raceway_share<N: Number>(bore: N, raceway: N, hollow: N) -> N {
    let less = |d: &N| -(hollow.clone() / d.clone()).sqr() + 1.0;
    let (at_bore, at_raceway) = (less(&bore), less(&raceway));
    bore / raceway * at_bore / at_raceway
}

/// Share of the interference by which a housing of the same steel narrows the outer raceway.
///
/// Formula: `(D_o/D)·(1 − (D/D_h)²)/(1 − (D_o/D_h)²)`.
///
/// Symbols: `outside` D of the outer ring, `raceway` D_o; `housing` D_h, its outer diameter.
///
/// Source: as [`inner_raceway_share`].
pub fn outer_raceway_share<N: Number>(outside: N, raceway: N, housing: N) -> N {
    let less = |d: &N| -(d.clone() / housing.clone()).sqr() + 1.0;
    let (at_outside, at_raceway) = (less(&outside), less(&raceway));
    raceway / outside * at_outside / at_raceway
}

/// Loss of interference of the inner ring under a radial load, m.
///
/// Formula: `Δd = 0.08·√(d/B·F_r)` µm.
///
/// Symbols: `bore` d, `width` B of the ring (m); `load` F_r (N).
///
/// Source: bearing makers' handbooks, in N.
pub fn interference_loss_under_load<N: Number>(bore: N, width: N, load: N) -> N {
    (bore / width * load).sqrt() * 0.08e-6
}

/// Axial play of two rows of one contact angle from their radial play, m.
///
/// Formula: `G_a = G_r/tan α`.
///
/// Symbols: `radial` G_r; `angle` α, between the line of contact and the radial plane (rad).
///
/// Valid for: tapered rollers; angular contact balls while the play leaves the angle as it is.
pub fn axial_play<N: Number>(radial: N, angle: N) -> N {
    radial / angle.tan()
}

/// Radial play of two rows of one contact angle from their axial play, m; the inverse of
/// [`axial_play`].
///
/// Formula: `G_r = G_a·tan α`.
pub fn radial_play<N: Number>(axial: N, angle: N) -> N {
    axial * angle.tan()
}

/// Axial play of a deep groove ball bearing from its radial play, m.
///
/// Formula: `G_a = √(4m₀G_r − G_r²)`, `m₀ = r_o + r_i − D_w`: with no play left the centres of the two
/// grooves stand m₀ apart, of which `m₀ − G_r/2` is radial.
///
/// Symbols: `radial` G_r; `curvature` m₀ from the groove radii and the ball (m).
///
/// Valid for: no load; `0 ≤ G_r ≤ 2m₀`.
pub fn axial_play_of_grooves<N: Number>(radial: N, curvature: N) -> N {
    (radial.clone() * (curvature * 4.0 - radial)).sqrt()
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::mechanics::ring::Ring;
    use crate::mechanics::{contact, joint};

    fn close(found: f64, expected: f64) {
        assert!((found - expected).abs() <= 1e-12 * expected.abs(), "{found} {expected}");
    }

    fn ring(bore: f64, outside: f64) -> Ring<f64> {
        let bore = (bore > 0.0).then_some(bore / 2.0);
        Ring { bore, outside: outside / 2.0, modulus: 207e9, poisson: 0.29, spin: 0.0 }
    }

    #[test]
    fn a_common_bearing_loses_what_its_handbook_says() {
        // Common practice, by hand for d 50, D 110: raceway 98 mm, 5 K take 6.1 µm, a fit of 20 µm
        // of which 80 % arrive takes 16 µm.
        let raceway = outer_raceway_of_ball_bearing(0.05, 0.11);
        close(raceway, 0.098);
        let warm = loss_by_temperature(12.5e-6, 5.0, raceway);
        close(warm, 6.125e-6);
        assert!((operating_clearance(30e-6, 16e-6, warm) - 7.875e-6).abs() < 1e-18);
    }

    #[test]
    fn raceways_move_as_the_rings_of_a_joint_do() {
        for hollow in [0.0, 0.02] {
            let (shaft, inner) = (ring(hollow, 0.05), ring(0.05, 0.0653));
            let p = joint::pressure(20e-6, 0.05, joint::compliance(&shaft, &inner));
            let growth = 0.0653 * inner.outside_strain(p, 0.0);
            close(inner_raceway_share(0.05, 0.0653, hollow), growth / 20e-6);
        }
        let (outer, housing) = (ring(0.098, 0.11), ring(0.11, 0.16));
        let p = contact::pressures(&[outer.clone(), housing], &[5e-6]);
        let shrink = -0.098 * outer.bore_strain(0.0, p[0]);
        close(outer_raceway_share(0.11, 0.098, 0.16), shrink / 10e-6);
    }

    #[test]
    fn plays_turn_into_each_other() {
        let angle = 0.25;
        close(radial_play(axial_play(40e-6, angle), angle), 40e-6);
        // A groove that is no wider than its ball leaves axial what it leaves radial, at 45°.
        let play = axial_play_of_grooves(40e-6, 20e-6);
        close(play, 40e-6);
        assert!(axial_play_of_grooves(15e-6, 0.4e-3) > 100e-6);
        close(interference_loss_under_load(0.05, 0.02, 4000.0), 8e-6);
    }

    #[test]
    fn clearance_is_what_the_elements_leave() {
        close(internal_clearance(98.02e-3, 65.0e-3, 16.5e-3), 20e-6);
    }
}
