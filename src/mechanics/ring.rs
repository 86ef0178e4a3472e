//! Thick rings and discs: pressed on either face, and turning (Lamé).
//!
//! Radii in m, pressures and stresses in Pa. A stress is positive as a pull; a pressure on a face is
//! positive as it presses; a displacement is positive outward. Plane stress throughout: the ring is
//! free to change its length. Ratios of radii alone enter unless the ring turns, so diameters serve
//! as well then. Knows nothing of joints, temperatures or text.
//!
//! With `g = 2a²/(b²−a²) = 2/((b/a)²−1)` the usual `γ = (a²+b²)/(b²−a²)` is `1 + g`, and every
//! coefficient of Lamé's solution is `g`, `1 + g` or `2 + g`: each radius enters once, which keeps
//! an interval as narrow as it can be, and a solid disc is the case `g = 0`.

use crate::numeric::Number;

/// A ring, or a solid disc where it has no bore.
#[derive(Debug, Clone)]
pub struct Ring<N> {
    /// Inner radius `a`, m; none where it is solid.
    pub bore: Option<N>,
    /// Outer radius `b`, m.
    pub outside: N,
    /// Young's modulus `E`, Pa.
    pub modulus: N,
    /// Poisson's ratio `ν`.
    pub poisson: N,
    /// What turning loads it with, `ρω²`, Pa/m²; see [`spin`].
    pub spin: N,
}

/// The load of turning.
///
/// Formula: `ρω²`, Pa/m².
///
/// Symbols: `density` ρ (kg/m³); `speed` ω (rad/s).
pub fn spin<N: Number>(density: N, speed: N) -> N {
    density * speed.sqr()
}

/// The two stresses of a ring at one radius, Pa.
#[derive(Debug, Clone)]
pub struct Stress<N> {
    /// Their mean, `(σ_θ + σ_r)/2`.
    mean: N,
    /// Half of what hoop exceeds radial by, `(σ_θ − σ_r)/2`.
    half_difference: N,
}

impl<N: Number> Stress<N> {
    /// Radial stress `σ_r`, Pa.
    pub fn radial(&self) -> N {
        self.mean.clone() - self.half_difference.clone()
    }

    /// Hoop stress `σ_θ`, Pa.
    pub fn hoop(&self) -> N {
        self.mean.clone() + self.half_difference.clone()
    }

    /// Von Mises stress, Pa.
    ///
    /// Formula: `√(σ_r² − σ_rσ_θ + σ_θ²)`, computed as `√(m² + 3h²)` from mean and half difference,
    /// which is the same and has a derivative that stays bounded where there is no stress.
    ///
    /// Valid for: plane stress without shear.
    pub fn von_mises(&self) -> N {
        self.mean.clone().hypot(self.half_difference.clone() * N::exact(3.0).sqrt())
    }
}

impl<N: Number> Ring<N> {
    /// `g = 2a²/(b²−a²)`, zero where it is solid.
    pub(super) fn g(&self) -> N {
        match &self.bore {
            Some(a) => N::exact(2.0) / ((self.outside.clone() / a.clone()).sqr() - 1.0),
            None => N::exact(0.0),
        }
    }

    /// `γ = (a²+b²)/(b²−a²)`, one where it is solid.
    pub fn gamma(&self) -> N {
        self.g() + 1.0
    }

    /// Area of the cross-section, m².
    ///
    /// Formula: `A = π(b²−a²)`.
    pub fn area(&self) -> N {
        let square = self.outside.clone().sqr();
        N::pi() * self.bore.clone().map_or(square.clone(), |a| square - a.sqr())
    }

    /// How much the bore widens under pressure in it, per pressure and radius, 1/Pa.
    ///
    /// Formula: `(γ+ν)/E`.
    ///
    /// Source: Lamé; Timoshenko, *Strength of Materials*, part II (from memory).
    pub fn bore_compliance(&self) -> N {
        (self.gamma() + self.poisson.clone()) / self.modulus.clone()
    }

    /// How much the outside shrinks under pressure on it, per pressure and radius, 1/Pa.
    ///
    /// Formula: `(γ−ν)/E`; of a solid disc `(1−ν)/E`.
    ///
    /// Source: as [`Ring::bore_compliance`].
    pub fn outside_compliance(&self) -> N {
        (self.gamma() - self.poisson.clone()) / self.modulus.clone()
    }

    /// How much the bore shrinks under pressure on the outside, per pressure and radius, 1/Pa.
    ///
    /// Formula: `(γ+1)/E = 2b²/((b²−a²)E)`.
    ///
    /// Source: as [`Ring::bore_compliance`].
    pub fn bore_by_outside(&self) -> N {
        (self.g() + 2.0) / self.modulus.clone()
    }

    /// How much the outside widens under pressure in the bore, per pressure and radius, 1/Pa.
    ///
    /// Formula: `(γ−1)/E = 2a²/((b²−a²)E)`; of a solid disc 0.
    ///
    /// Source: as [`Ring::bore_compliance`].
    pub fn outside_by_bore(&self) -> N {
        self.g() / self.modulus.clone()
    }

    /// How much turning alone widens the bore, as a share of its radius.
    ///
    /// Formula: `u(a)/a = ρω²[(1−ν)a²+(3+ν)b²]/4E`.
    ///
    /// Source: Timoshenko, *Strength of Materials*, part II, rotating discs (from memory).
    ///
    /// Valid for: a disc of one thickness; without a bore, the strain at the centre is not this.
    pub fn bore_growth_turning(&self) -> N {
        let hole = self.bore.clone().map_or(N::exact(0.0), N::sqr);
        self.growth_turning(hole, self.outside.clone().sqr())
    }

    /// How much turning alone widens the outside, as a share of its radius.
    ///
    /// Formula: `u(b)/b = ρω²[(3+ν)a²+(1−ν)b²]/4E`; of a solid disc, `a = 0`.
    ///
    /// Source: as [`Ring::bore_growth_turning`].
    pub fn outside_growth_turning(&self) -> N {
        let hole = self.bore.clone().map_or(N::exact(0.0), N::sqr);
        self.growth_turning(self.outside.clone().sqr(), hole)
    }

    fn growth_turning(&self, near: N, far: N) -> N {
        let nu = &self.poisson;
        let shape = (-nu.clone() + 1.0) * near + (nu.clone() + 3.0) * far;
        self.spin.clone() * shape / (self.modulus.clone() * 4.0)
    }

    /// How much the bore widens, as a share of its radius.
    ///
    /// Formula: `u(a)/a = [(γ+ν)p_a − 2b²p_b/(b²−a²)]/E + ρω²[(1−ν)a²+(3+ν)b²]/4E`. The ring's free
    /// strain (temperature, moisture) is not in it: radii are those it has at its temperature.
    ///
    /// Symbols: `p_a` pressure in the bore, `p_b` on the outside (Pa).
    ///
    /// Source: as [`Ring::bore_compliance`], [`Ring::bore_growth_turning`].
    ///
    /// Valid for: a ring with a bore; elastic, plane stress.
    pub fn bore_strain(&self, p_a: N, p_b: N) -> N {
        // γ stands once: (γ+ν)p_a − (γ+1)p_b = γ(p_a−p_b) + νp_a − p_b.
        let pressed = self.gamma() * (p_a.clone() - p_b.clone()) + self.poisson.clone() * p_a - p_b;
        pressed / self.modulus.clone() + self.bore_growth_turning()
    }

    /// How much the outside widens, as a share of its radius.
    ///
    /// Formula: `u(b)/b = [2a²p_a/(b²−a²) − (γ−ν)p_b]/E + ρω²[(3+ν)a²+(1−ν)b²]/4E`, without the
    /// ring's free strain.
    ///
    /// Symbols, source: as [`Ring::bore_strain`].
    ///
    /// Valid for: rings and solid discs; elastic, plane stress.
    pub fn outside_strain(&self, p_a: N, p_b: N) -> N {
        let g = self.g() * (p_a - p_b.clone());
        let pressed = g - (-self.poisson.clone() + 1.0) * p_b;
        pressed / self.modulus.clone() + self.outside_growth_turning()
    }

    /// The stresses in the bore, or at the centre of a solid disc.
    ///
    /// Formula, source: as [`Ring::stress_at`], at `r = a`.
    pub fn stress_inside(&self, p_a: N, p_b: N) -> Stress<N> {
        let square = self.outside.clone().sqr();
        match &self.bore {
            Some(a) => {
                let b_over_r2 = (p_a.clone() - p_b.clone()) * (self.g() + 2.0) * 0.5;
                self.stress(p_a, p_b, a.clone().sqr(), Some((b_over_r2, square)))
            }
            None => self.stress(p_a, p_b, N::exact(0.0), None),
        }
    }

    /// The stresses at the outside.
    ///
    /// Formula, source: as [`Ring::stress_at`], at `r = b`.
    pub fn stress_outside(&self, p_a: N, p_b: N) -> Stress<N> {
        let hole = self.bore.as_ref().map(|a| {
            let b_over_r2 = (p_a.clone() - p_b.clone()) * self.g() * 0.5;
            (b_over_r2, a.clone().sqr())
        });
        self.stress(p_a, p_b, self.outside.clone().sqr(), hole)
    }

    /// The stresses at a radius `r`.
    ///
    /// Formula: `σ_r, σ_θ = A ∓ B/r² + (3+ν)/8·ρω²(a²+b² ∓ a²b²/r² − kr²)`, `k` = 1 for r and
    /// `(1+3ν)/(3+ν)` for θ; `A = (p_aa²−p_bb²)/(b²−a²)`, `B = (p_a−p_b)a²b²/(b²−a²)`. A solid disc
    /// has `B = 0`, `a = 0`.
    ///
    /// Symbols: `p_a` pressure in the bore, `p_b` on the outside (Pa); `r` (m), from a to b.
    ///
    /// Source: Timoshenko, *Strength of Materials*, part II (from memory); held against numerical
    /// integration of radial equilibrium in `tests/scripts/ring_ode.py`.
    ///
    /// Valid for: elastic, plane stress, one thickness.
    pub fn stress_at(&self, p_a: N, p_b: N, r: N) -> Stress<N> {
        let square = r.sqr();
        let hole = self.bore.as_ref().map(|a| {
            let a2_over_r2 = a.clone().sqr() / square.clone();
            let b_over_r2 =
                (p_a.clone() - p_b.clone()) * (self.g() + 2.0) * a2_over_r2.clone() * 0.5;
            (b_over_r2, self.outside.clone().sqr() * a2_over_r2)
        });
        self.stress(p_a, p_b, square, hole)
    }

    /// `hole` is `B/r²` and `a²b²/r²`, where there is a bore.
    fn stress(&self, p_a: N, p_b: N, r_square: N, hole: Option<(N, N)>) -> Stress<N> {
        let nu = &self.poisson;
        let c = self.spin.clone() * (nu.clone() + 3.0) / 8.0;
        let inner = self.bore.clone().map_or(N::exact(0.0), N::sqr);
        let squares = inner + self.outside.clone().sqr();
        // A = (g·p_a − (g+2)·p_b)/2, with g once.
        let a = self.g() * (p_a - p_b.clone()) * 0.5 - p_b;
        // (3+ν)/8·(1+k)/2 = (1+ν)/4 and (3+ν)/8·(1−k)/2 = (1−ν)/8.
        let falling = self.spin.clone() * (nu.clone() + 1.0) / 4.0 * r_square.clone();
        let parting = self.spin.clone() * (-nu.clone() + 1.0) / 8.0 * r_square;
        let half_difference = match hole {
            Some((b_over_r2, squares_over_r2)) => b_over_r2 + c.clone() * squares_over_r2 + parting,
            None => parting,
        };
        Stress { mean: a + c * squares - falling, half_difference }
    }

    /// The greatest von Mises stress anywhere in a ring that does not turn, Pa.
    ///
    /// Formula: that in the bore, `√(A² + 3B²/a⁴)`, since `√(A² + 3B²/r⁴)` falls with r; the same
    /// everywhere in a solid disc.
    ///
    /// Valid for: [`Ring::spin`] of 0; any pressures.
    pub fn greatest_von_mises_at_rest(&self, p_a: N, p_b: N) -> N {
        self.stress_inside(p_a, p_b).von_mises()
    }

    /// The greatest von Mises stress anywhere in the ring, Pa.
    ///
    /// Formula: the greater of those at the two faces (of a solid disc, centre and outside). With
    /// `x = r²` the mean stress is `m = m₀ − αx` and the half difference `h = β₀/x + βx`, β ≥ 0, so
    /// that `m² + 3h² = (m₀−αx)² + 3(β₀²/x² + 2β₀β + β²x²)` is convex in x: no radius between the
    /// faces can have more than both of them, whatever the pressures and the speed.
    ///
    /// Valid for: as [`Ring::stress_at`].
    pub fn greatest_von_mises(&self, p_a: N, p_b: N) -> N {
        let inside = self.stress_inside(p_a.clone(), p_b.clone()).von_mises();
        inside.max(self.stress_outside(p_a, p_b).von_mises())
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn ring(bore: Option<f64>, spin: f64) -> Ring<f64> {
        Ring { bore, outside: 0.05, modulus: 207e9, poisson: 0.29, spin }
    }

    fn close(found: f64, expected: f64) {
        assert!((found - expected).abs() <= 1e-12 * expected.abs(), "{found} {expected}");
    }

    #[test]
    fn the_faces_carry_their_pressures() {
        let ring = ring(Some(0.02), 4e9);
        let (p_a, p_b) = (30e6, 12e6);
        close(ring.stress_inside(p_a, p_b).radial(), -p_a);
        close(ring.stress_outside(p_a, p_b).radial(), -p_b);
        close(ring.stress_at(p_a, p_b, 0.02).hoop(), ring.stress_inside(p_a, p_b).hoop());
        close(ring.stress_at(p_a, p_b, 0.05).hoop(), ring.stress_outside(p_a, p_b).hoop());
    }

    #[test]
    fn strain_of_a_face_is_hookes_law() {
        for spin in [0.0, 4e9] {
            let ring = ring(Some(0.02), spin);
            let hooke = |s: Stress<f64>| (s.hoop() - 0.29 * s.radial()) / 207e9;
            close(ring.bore_strain(30e6, 12e6), hooke(ring.stress_inside(30e6, 12e6)));
            close(ring.outside_strain(30e6, 12e6), hooke(ring.stress_outside(30e6, 12e6)));
        }
        let disc = ring(None, 4e9);
        let rim = disc.stress_outside(0.0, 12e6);
        close(disc.outside_strain(0.0, 12e6), (rim.hoop() - 0.29 * rim.radial()) / 207e9);
    }

    #[test]
    fn a_solid_disc_is_not_the_limit_of_a_small_hole() {
        // The hole doubles the hoop stress at the centre, pressed or turning.
        let (pin_hole, solid) = (ring(Some(1e-7), 4e9), ring(None, 4e9));
        let doubled = pin_hole.stress_inside(0.0, 0.0).hoop();
        assert!((doubled / solid.stress_inside(0.0, 0.0).hoop() - 2.0).abs() < 1e-6);
        let still = ring(None, 0.0);
        assert_eq!(still.greatest_von_mises(0.0, 7e6), 7e6);
    }

    #[test]
    fn no_radius_between_has_more_than_a_face() {
        for spin in [0.0, 1e9, 6e10] {
            for bore in [None, Some(0.004), Some(0.045)] {
                for (p_a, p_b) in [(0.0, 0.0), (50e6, 0.0), (0.0, 50e6), (20e6, 80e6)] {
                    let ring = ring(bore, spin);
                    let most = ring.greatest_von_mises(p_a, p_b);
                    if spin == 0.0 {
                        assert_eq!(most, ring.greatest_von_mises_at_rest(p_a, p_b));
                    }
                    let a = bore.unwrap_or(1e-6);
                    for i in 0..=100 {
                        let r = a + (0.05 - a) * f64::from(i) / 100.0;
                        let here = ring.stress_at(p_a, p_b, r).von_mises();
                        assert!(here <= most * (1.0 + 1e-12), "{here} {most} at {r}");
                    }
                }
            }
        }
    }
}
