//! Parts that hold each other along one line: equilibrium and compatibility of springs.
//!
//! Lengths in m, forces in N, areas in m², moduli and stresses in Pa. Some members are squeezed by
//! the force, the others stretched; one force runs through all. A part that is taken as rigid is
//! left out of the compliance. The force is never negative: open faces do not pull.

use crate::numeric::Number;

/// Compliance of a prismatic member, m/N; a member of known stiffness k has `1/k`.
///
/// Formula: `L/(E·A)`.
///
/// Symbols: `length` L at reference (m); `modulus` E at the member's temperature (Pa); `area` A (m²).
///
/// Valid for: uniform stress over the area.
pub fn compliance<N: Number>(length: N, modulus: N, area: N) -> N {
    length / (modulus * area)
}

/// By how much the free lengths of what is squeezed exceed those of what is stretched, m.
///
/// Formula: `m = Σ squeezed − Σ stretched`, free lengths at temperature.
pub fn misfit<N: Number>(squeezed: &[N], stretched: &[N]) -> N {
    let sum = |lengths: &[N]| lengths.iter().cloned().fold(N::exact(0.0), |sum, l| sum + l);
    sum(squeezed) - sum(stretched)
}

/// Change of a free length between two temperatures, m.
///
/// Formula: `L(ε(T) − ε(T₀))`; positive for a squeezed member and negative for a stretched one it
/// adds to what a preload has taken up.
pub fn growth<N: Number>(length: N, strain: N, strain_then: N) -> N {
    length * (strain - strain_then)
}

/// The length that all springs together have taken up at a temperature, from a preload known at
/// another, m.
///
/// Formula: `F₀C(T₀) + Σ ± L_i(ε_i(T) − ε_i(T₀))`. Tolerances of length drop out: the preload was
/// set on the very parts.
///
/// Symbols: `preload` F₀ (N); `compliance_then` C(T₀) of all members (m/N); `growth` the sum (m).
///
/// Source: with [`force`], the form VDI 2230-1 gives the thermal change of preload (from memory).
pub fn taken_up<N: Number>(preload: N, compliance_then: N, growth: N) -> N {
    preload * compliance_then + growth
}

/// Force in the members, N.
///
/// Formula: `F = max(0, x)/C(T)`, `x = m + s` with a shim or a start gap of `−s`, or
/// [`taken_up`].
///
/// Symbols: `take_up` x, the length that the springs must take up together (m); `compliance` C at
/// temperature, of all members (m/N).
///
/// Source: Beer and Johnston, *Mechanics of Materials*, section on problems involving temperature
/// changes.
///
/// Valid for: elastic members, small against their lengths.
pub fn force<N: Number>(take_up: N, compliance: N) -> N {
    take_up.max(N::exact(0.0)) / compliance
}

/// Gap that stands open when there is no force, m.
///
/// Formula: `max(0, −x)`, x as in [`force`].
pub fn separation<N: Number>(take_up: N) -> N {
    (-take_up).max(N::exact(0.0))
}

/// Stress in a stretched member, Pa; in a squeezed one it is the negative of this.
///
/// Formula: `σ = F/A`.
pub fn stress<N: Number>(force: N, area: N) -> N {
    force / area
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn force_and_separation_meet_at_contact() {
        assert_eq!((force(0.0, 1e-9), separation(0.0)), (0.0, 0.0));
        let c = 5e-9;
        for step in [1e-6, 1e-9, 1e-12] {
            // Continuous at contact: the force grows from nothing, on the side where none is open.
            assert!((force(step, c) - step / c).abs() < 1e-18 / c && separation(step) == 0.0);
            assert!(force(-step, c) == 0.0 && separation(-step) == step);
        }
    }

    #[test]
    fn a_preload_is_itself_where_it_was_set() {
        let c = compliance(0.1, 207e9, 84.3e-6) + compliance(0.1, 70e9, 400e-6);
        let back = force(taken_up(12e3, c, growth(0.1, 1e-3, 1e-3)), c);
        assert!((back - 12e3).abs() < 1e-8);
    }

    #[test]
    fn the_misfit_is_what_must_be_squeezed() {
        assert!((misfit(&[0.03, 0.0016], &[0.0315]) - 1e-4).abs() < 1e-17);
    }
}
