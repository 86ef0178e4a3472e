//! Joining and loosening temperatures against the rules of DIN 7190 and published expansion data.

use gapkeep::materials::{Expansion, Scatter, Stretch};
use gapkeep::mechanics::joining::{
    Expanding, Loosening, hub_heated, insertion_clearance, shaft_chilled,
};
use gapkeep::numeric::Interval;
use gapkeep::numeric::piecewise::Polynomial;
use gapkeep::numeric::root::Crossing;

const ZERO_CELSIUS: f64 = 273.15;
const T_REF: f64 = 293.15;

fn constant(alpha: f64) -> Expanding {
    expanding(Expansion::constant(alpha, T_REF))
}

fn expanding(e: Expansion) -> Expanding {
    Expanding { curve: e.curve, reference: T_REF, scatter: e.scatter, range: e.range }
}

/// NIST, Cryogenic Material Properties, 304 stainless steel (UNS S30400): ΔL/L from 293 K in 1e-5,
/// 4 … 300 K, constant below 23 K.
fn stainless_304() -> Expanding {
    let coefficients = [-2.9554e2, -3.9811e-1, 9.2683e-3, -2.0261e-5, 1.7127e-8];
    let fit = Polynomial::new(0.0, coefficients.map(|c| c * 1e-5).to_vec());
    let floor = Polynomial::constant(-300.04e-5);
    let stretch = |to, polynomial| Stretch { to, polynomial, continues: false };
    expanding(Expansion::polynomials(4.0, &[stretch(23.0, floor), stretch(300.0, fit)]).unwrap())
}

fn reached(crossing: Crossing) -> f64 {
    let Crossing::Reached { before, at } = crossing else { panic!("{crossing:?}") };
    assert!((at - before).abs() < 1e-6, "found between {before} and {at} K");
    at
}

#[test]
fn din_7190_rule_for_the_joining_temperature() {
    // DIN 7190 as taught (Zwickau University of Applied Sciences): θ = U/(α·D) + θ_R with
    // U = 0.001·D + U_g and 11 ppm/K for steel; 60 H7/s6 has U_g = 72 µm: 0.132/(11e-6·60) = 200 K.
    let clearance = insertion_clearance(0.06);
    assert!((clearance - 60e-6).abs() < 1e-18);
    let t = reached(hub_heated(&constant(11e-6), 0.06, 0.060_072, clearance, T_REF));
    assert!((t - ZERO_CELSIUS - 220.0).abs() < 1e-5);
}

#[test]
fn heat_for_an_interference() {
    // Common practice: ΔT = δ/(α·d), without clearance.
    let t = reached(hub_heated(&constant(23.4e-6), 0.04, 0.040_076, 0.0, T_REF));
    assert!((t - T_REF - 0.076 / (23.4e-6 * 40.0)).abs() < 1e-5);
}

#[test]
fn an_alloy_hub_takes_every_shaft_once_it_is_hot() {
    // By hand: (40.076 + 0.04 − 40)/(40·23.4e-6) = 123.931 624 K above 20 °C.
    let t = reached(hub_heated(&constant(23.4e-6), 0.04, 0.040_076, 0.04e-3, T_REF));
    assert!((t - ZERO_CELSIUS - 143.931_624).abs() < 1e-5);
}

#[test]
fn a_stainless_shaft_is_chilled_along_its_published_curve() {
    // The roots of the NIST polynomial for (40 − c)/40.076 = (1 + e)/(1 + e(293.15 K)), found with
    // numpy.roots.
    let shaft = stainless_304();
    for (clearance, expected) in [(0.02e-3, 121.922_904), (0.04e-3, 62.047_959)] {
        let t = reached(shaft_chilled(&shaft, 0.040_076, 0.04, clearance, T_REF));
        assert!((t - expected).abs() < 1e-5, "{t}");
    }
    // Contraction saturates: 0.06 mm would need 3.4 parts in a thousand, and the steel has 3.0.
    let never = shaft_chilled(&shaft, 0.040_076, 0.04, 0.06e-3, T_REF);
    assert_eq!(never, Crossing::Never);
}

#[test]
fn a_scattering_lot_is_chilled_further() {
    let mut shaft = stainless_304();
    let sharp = reached(shaft_chilled(&shaft, 0.040_076, 0.04, 0.02e-3, T_REF));
    shaft.scatter = Scatter::Relative(0.02);
    let vague = reached(shaft_chilled(&shaft, 0.040_076, 0.04, 0.02e-3, T_REF));
    // The strain asked for is 2 % less of what the curve says.
    let curve = |t: f64| (shaft.curve.value(t) - shaft.curve.value(T_REF)) * 0.98;
    assert!(vague < sharp - 1.0);
    assert!((curve(vague) / (1.0 + shaft.curve.value(T_REF)) + 0.096 / 40.076).abs() < 1e-11);
}

#[test]
fn a_hub_of_a_steel_that_expands_less_comes_loose_in_the_cold() {
    // Least shaft and greatest bore of a 40 mm pair, alloy shaft in a steel hub: 0.035 mm at 20 °C,
    // gone where 40.035(1+23.4e-6τ) = 40(1+11.7e-6τ).
    let (alloy, steel) = (constant(23.4e-6), constant(11.7e-6));
    let pair = Loosening {
        shaft: &alloy,
        hub: &steel,
        least_shaft: 0.040_035,
        greatest_bore: 0.04,
        smoothing: 0.0,
    };
    let t = reached(pair.first(T_REF, 0.0));
    let drop = 0.035 / (40.035 * 23.4e-6 - 40.0 * 11.7e-6);
    assert!((t - (T_REF - drop)).abs() < 1e-5);
    // It tightens as it warms, for as long as the data say.
    assert_eq!(pair.first(T_REF, 1000.0), Crossing::Never);
    let scattered = Expanding { scatter: Scatter::Relative(0.05), ..alloy.clone() };
    let sooner = Loosening { shaft: &scattered, ..pair };
    assert!(reached(sooner.first(T_REF, 0.0)) > t + 1.0);
    // Beyond the data nothing is said.
    let known = Expanding { range: Interval::new(250.0, 500.0), ..alloy.clone() };
    let within = Loosening { shaft: &known, ..sooner };
    assert_eq!(within.first(T_REF, 0.0), Crossing::Never);
}
