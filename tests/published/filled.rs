//! Liquids in closed cavities, and seals, against the properties of water and a second computation.

use gapkeep::mechanics::filling::{closed_cylinder_compliance, full_pressure, ullage};
use gapkeep::mechanics::seal::{squeeze, stretch, stretched_width};
use gapkeep::mechanics::{Ring, expansion};
use gapkeep::numeric::extremes::extremes;
use gapkeep::numeric::piecewise::Beyond;
use gapkeep::numeric::{Curve, Interval, Number, Piecewise, Tape};
use std::sync::Arc;

/// Water at 101.325 kPa: temperature (°C), density (kg/m³), expansion β (1e-4/K), compressibility
/// (1e-4/MPa), pressure rise at constant volume (bar/K). IAPWS-95, computed with the open Python
/// package `iapws`.
const WATER: [[f64; 5]; 11] = [
    [1.0, 999.902, -0.499, 5.045, -0.99],
    [4.0, 999.975, 0.003, 4.943, 0.007],
    [10.0, 999.703, 0.879, 4.776, 1.84],
    [20.0, 998.207, 2.068, 4.584, 4.51],
    [25.0, 997.048, 2.573, 4.520, 5.69],
    [30.0, 995.650, 3.034, 4.472, 6.78],
    [40.0, 992.216, 3.855, 4.419, 8.72],
    [50.0, 988.035, 4.578, 4.412, 10.38],
    [60.0, 983.196, 5.233, 4.445, 11.77],
    [80.0, 971.790, 6.414, 4.609, 13.92],
    [99.0, 959.066, 7.453, 4.878, 15.28],
];

fn water(column: usize) -> Arc<dyn Curve> {
    let table: Vec<(f64, f64)> = WATER.iter().map(|row| (row[0], row[column])).collect();
    Arc::new(Piecewise::monotone(&table, Beyond::Straight).unwrap())
}

/// Pressure above that of filling (Pa) in a rigid vessel filled with water at `filled` °C.
fn rigid_vessel<N: Number>(filled: f64, t: N) -> N {
    let (density, compressibility) = (water(1), water(3));
    let liquid = N::exact(density.value(filled)) / t.clone().apply(&density);
    let bulk = N::exact(1e10) / t.apply(&compressibility);
    full_pressure(liquid, N::exact(1.0), bulk, N::exact(0.0))
}

#[test]
fn water_in_a_full_rigid_vessel() {
    // IAPWS-95, filled at 20 °C and 0.101 MPa. The formula takes the modulus at the pressure of
    // filling; that of water grows by some 6 p, so p may be 3 p/K too low, and no more.
    for (t, iapws) in [(25.0, 2.679), (30.0, 5.875), (40.0, 13.95), (60.0, 35.8)] {
        let p = rigid_vessel(20.0, t) * 1e-6 + 0.101_325;
        let bulk = 1e4 / water(3).value(t);
        let low = 3.0 * iapws / bulk;
        assert!(p < iapws * 1.003 && p > iapws * (1.0 - low - 0.003), "{t} °C: {p} MPa");
    }
}

#[test]
fn water_presses_as_its_expansion_and_compressibility_say() {
    // (∂p/∂T)_v = β/κ_T of the same tables, its mean over each step of temperature.
    for pair in WATER[1..].windows(2) {
        let (cold, warm) = (pair[0], pair[1]);
        let rise = 0.5e5 * (cold[4] + warm[4]) * (warm[0] - cold[0]);
        let p = rigid_vessel(cold[0], warm[0]);
        assert!((p / rise - 1.0).abs() < 0.035, "to {} °C: {p} Pa, by the rates {rise}", warm[0]);
    }
}

#[test]
fn water_below_four_degrees_makes_room_as_it_warms() {
    // IAPWS-95: β is negative below 3.98 °C. A vessel filled at 1 °C has room at 4, and presses only
    // once the water is lighter again than it was.
    assert_eq!(rigid_vessel(1.0, 4.0), 0.0);
    assert!(ullage(999.902 / 999.975, 1.0) > 0.0);
    assert!(rigid_vessel(1.0, 10.0) > 1e5);
    // Filled at 4 °C it presses both ways.
    assert!(rigid_vessel(4.0, 1.0) > 1e5 && rigid_vessel(4.0, 10.0) > 1e5);
    // A constant β, taken at 20 °C, has the wrong sign here.
    let constant = full_pressure(1.0 + 2.068e-4 * 3.0, 1.0, 2.0e9, 0.0);
    assert!(constant > 0.0);
    let proven = rigid_vessel(1.0, Interval::new(1.5, 4.0));
    assert!(proven.lo() == 0.0 && proven.hi() < 1e-300);
}

/// A steel cylinder, inside 60, outside 80 mm.
fn steel_cylinder<N: Number>() -> Ring<N> {
    let n = N::exact;
    Ring {
        bore: Some(n(0.03)),
        outside: n(0.04),
        modulus: n(207e9),
        poisson: n(0.29),
        spin: n(0.0),
    }
}

#[test]
fn oil_in_a_full_steel_cylinder() {
    // Oil of 7e-4/K and 1500 MPa, full at 20, warmed to 60 °C in steel of 11.7 ppm/K: the equation
    // solved with scipy.optimize.brentq gives 37.287 491 05 MPa.
    let cavity = expansion::volume_ratio(11.7e-6 * 40.0);
    let yielding = closed_cylinder_compliance(&steel_cylinder());
    let p = full_pressure(1.0 + 7e-4 * 40.0, cavity, 1500e6, yielding);
    assert!((p / 37.287_491_05e6 - 1.0).abs() < 1e-9);
    // Common practice: about 1 MPa a kelvin for oil in a rigid vessel.
    let rigid = full_pressure(1.0 + 7e-4, 1.0, 1500e6, 0.0);
    assert!((rigid / 1e6 - 1.05).abs() < 0.01);
}

#[test]
fn a_charge_by_its_scatter_is_proven_at_its_worst() {
    // Charge ±1 %, bulk modulus ±10 %, 20 … 60 °C: both ends of the range at corners.
    let tape = Tape::of(3, |x| {
        let warm = x[2].clone() - 20.0;
        let liquid = x[0].clone() * (warm.clone() * 7e-4 + 1.0);
        let cavity = expansion::volume_ratio(warm * 11.7e-6);
        full_pressure(liquid, cavity, x[1].clone(), closed_cylinder_compliance(&steel_cylinder()))
    });
    let box_of_states =
        [Interval::new(0.98, 1.0), Interval::new(1350e6, 1650e6), Interval::new(20.0, 60.0)];
    let found = extremes(&tape, &box_of_states, 1.0);
    assert!(found.least.met && found.least.bound == 0.0);
    assert!(found.greatest.met && found.greatest.at == [1.0, 1650e6, 60.0]);
    assert!((found.greatest.bound - tape.value(&[1.0, 1650e6, 60.0])).abs() < 1.0);
}

#[test]
fn a_ring_in_a_cold_groove() {
    // A ring of 3.43 … 3.63 by 24.74 … 25.24 mm (112 ppm/K) on a groove of 25.80 … 25.85 (11.7 ppm/K)
    // in a bore of 31.60 … 31.65 (23.4 ppm/K) at −40 °C; both ends by hand below.
    let at = |alpha: f64| 1.0 - 60.0 * alpha * 1e-6;
    let tape = Tape::of(4, |x| {
        let (width, inner) = (x[0].clone() * at(112.0), x[1].clone() * at(112.0));
        let (bore, groove) = (x[2].clone() * at(23.4), x[3].clone() * at(11.7));
        let gland = (bore - groove.clone()) / 2.0;
        squeeze(gland, stretched_width(width, stretch(groove, inner)))
    });
    let sizes = [
        Interval::new(3.43, 3.63),
        Interval::new(24.74, 25.24),
        Interval::new(31.60, 31.65),
        Interval::new(25.80, 25.85),
    ];
    let found = extremes(&tape, &sizes, 1e-11);
    let by_hand = |w: f64, id: f64, bore: f64, groove: f64| {
        let (bore, groove) = (bore * at(23.4), groove * at(11.7));
        let narrow = w * at(112.0) / (groove / (id * at(112.0))).sqrt();
        1.0 - (bore - groove) / 2.0 / narrow
    };
    let least = by_hand(3.43, 24.74, 31.65, 25.80);
    let greatest = by_hand(3.63, 25.24, 31.60, 25.85);
    assert!(found.least.met && (found.least.bound - least).abs() < 1e-10);
    assert!(found.greatest.met && (found.greatest.bound - greatest).abs() < 1e-10);
    assert!((least - 0.124_566_840_3).abs() < 1e-10);
    assert!((greatest - 0.194_302_704_1).abs() < 1e-10);
}
