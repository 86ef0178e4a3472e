//! Free strain of a part: temperature, scatter, moisture, stress.
//!
//! Temperatures in K, coefficients in 1/K, strains as pure numbers, positive when longer. Knows
//! materials' curves, but neither parts nor text.

use crate::materials::{Scatter, SwellState};
use crate::numeric::{Curve, Number};
use std::sync::Arc;

/// Thermal strain from the reference temperature.
///
/// Formula: `ε_th = (1+e(T))/(1+e(Tref)) − 1`, computed as `(e(T) − e(Tref))/(1+e(Tref))`, which is
/// the same and loses no figures to the ones.
///
/// Symbols: `e` ΔL/L₀ as published; `T`, `Tref` (K).
///
/// Valid for: any base of `e`, also where a fit is not zero at its base.
pub fn thermal_strain<N: Number>(e: &Arc<dyn Curve>, t: N, t_ref: N) -> N {
    let at_reference = t_ref.apply(e);
    (t.apply(e) - at_reference.clone()) / (at_reference + 1.0)
}

/// Thermal strain of a lot that need not lie on the curve.
///
/// Formula: `u·ε_th + v·(T−Tref)` with `u = 1 + s·w` or `v = Δα·w`.
///
/// Symbols: `rise` T − Tref (K); `w` the lot's scatter, −1 … 1; `s`, `Δα` what the material states.
pub fn scattered_strain<N: Number>(strain: N, rise: N, scatter: Scatter, w: N) -> N {
    if scatter.is_none() {
        return strain;
    }
    match scatter {
        Scatter::Relative(s) => strain * (w * s + 1.0),
        Scatter::PerKelvin(delta) => strain + rise * (w * delta),
    }
}

/// Swelling strain of a lot in a state of moisture, counted from the state of the drawing.
///
/// Symbols: `w` the lot's scatter, −1 … 1, one for all states.
pub fn swelling_strain<N: Number>(state: &SwellState, drawn: &SwellState, w: N) -> N {
    // One lot takes up more or less water than another in every state alike.
    w * (state.spread - drawn.spread) + (state.strain - drawn.strain)
}

/// Elastic strain under a uniaxial stress.
///
/// Formula: `ε = σ/E(T)`: total, not incremental, with the isothermal modulus at the part's own
/// temperature.
///
/// Symbols: `stress` σ (Pa, a pull is positive); `modulus` E (Pa).
pub fn elastic_strain<N: Number>(stress: N, modulus: N) -> N {
    stress / modulus
}

/// A length at temperature.
///
/// Formula: `L(T) = L_ref·(1 + ε)`, ε the sum of thermal, swelling and elastic strain.
pub fn length<N: Number>(l_ref: N, strain: N) -> N {
    l_ref * (strain + 1.0)
}

/// A length at temperature that is stated at a reference of its own.
///
/// Formula: `L(T) = L₁·(1 + ε(T))/(1 + ε(T₁))`, both strains from the common reference and with
/// the same scatter.
///
/// Symbols: `l_stated` L₁ at T₁; `strain` ε(T); `own` ε(T₁).
pub fn length_from_own_reference<N: Number>(l_stated: N, strain: N, own: N) -> N {
    l_stated * ((strain + 1.0) / (own + 1.0))
}

/// The ratio by which the volume of an isotropic solid grows.
///
/// Formula: `V/V_ref = (1 + ε)³`.
pub fn volume_ratio<N: Number>(strain: N) -> N {
    (strain + 1.0).powi(3)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::materials::Expansion;
    use crate::numeric::{Dual, Interval};

    const T_REF: f64 = 293.15;

    #[test]
    fn at_the_reference_nothing_expands() {
        let e = Expansion::mean(294.26, &[(273.15, 11e-6), (473.15, 13e-6)]).unwrap().curve;
        assert_eq!(thermal_strain(&e, T_REF, T_REF), 0.0);
        let t = Interval::point(T_REF);
        let strain = thermal_strain(&e, t, t);
        assert!(strain.contains(0.0) && strain.width() < 1e-18);
    }

    #[test]
    fn the_slope_of_a_constant_is_its_coefficient() {
        let e = Expansion::constant(23.4e-6, T_REF).curve;
        let t = Dual::variable(Interval::new(250.0, 350.0));
        let strain = thermal_strain(&e, t, Dual::exact(T_REF));
        assert!(strain.slope.contains(23.4e-6) && strain.slope.width() < 1e-19);
    }

    #[test]
    fn scatter_in_per_kelvin_acts_where_the_curve_is_flat() {
        let per_cent = scattered_strain(0.0, 60.0, Scatter::Relative(0.02), 1.0);
        let per_kelvin = scattered_strain(0.0, 60.0, Scatter::PerKelvin(0.1e-6), -1.0);
        assert_eq!(per_cent, 0.0);
        assert!((per_kelvin + 6e-6).abs() < 1e-20);
        assert_eq!(scattered_strain(1e-3, 60.0, Scatter::NONE, 1.0), 1e-3);
    }

    #[test]
    fn a_length_of_its_own_reference_is_itself_there() {
        let e = Expansion::constant(110e-6, T_REF).curve;
        let own = thermal_strain(&e, 296.15, T_REF);
        assert_eq!(length_from_own_reference(20.0, own, own), 20.0);
        let at_reference = length_from_own_reference(20.0, 0.0, own);
        assert!((at_reference - 20.0 / (1.0 + 330e-6)).abs() < 1e-14);
    }

    #[test]
    fn swelling_counts_from_the_drawing() {
        let state = |name: &str, strain, spread| SwellState { name: name.into(), strain, spread };
        let (drawn, wet) = (state("dry", 0.001, 0.0), state("wet", 0.008, 0.0015));
        assert_eq!(swelling_strain(&drawn, &drawn, 1.0), 0.0);
        assert!((swelling_strain(&wet, &drawn, -1.0) - 0.0055).abs() < 1e-17);
        assert!((swelling_strain(&wet, &drawn, 1.0) - 0.0085).abs() < 1e-17);
    }

    #[test]
    fn volume_grows_by_three_times_the_strain_of_a_small_one() {
        // Common practice: the volumetric coefficient is three times the linear one.
        assert!((volume_ratio(1e-6) - 1.0 - 3e-6).abs() < 4e-12);
    }
}
