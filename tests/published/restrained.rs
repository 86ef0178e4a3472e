//! Restrained expansion and closing gaps, against textbooks.

use gapkeep::mechanics::expansion::{elastic_strain, length};
use gapkeep::mechanics::restraint::{
    compliance, force, growth, misfit, separation, stress, taken_up,
};
use gapkeep::numeric::Interval;
use gapkeep::numeric::root::first_reached;

/// Pounds per square inch, in Pa; a pound's force, in N.
const PSI: f64 = 6_894.757_293_168;
const LBF: f64 = 4.448_221_615_260_5;
const INCH: f64 = 0.0254;

fn near(found: f64, printed: f64, last_place: f64) {
    assert!((found - printed).abs() <= 0.51 * last_place, "found {found}, printed {printed}");
}

#[test]
fn beer_and_johnston_bronze_and_aluminium_with_a_gap() {
    // Beer and Johnston, Mechanics of Materials, problem 2.57: bronze 350 mm, 1500 mm², 105 GPa,
    // 21.6 ppm/K; aluminium 450 mm, 1800 mm², 73 GPa, 23.2 ppm/K; gap 0.5 mm; 96 K warmer:
    // 217.5 kN, the bronze 0.2425 mm longer.
    let bronze = growth(0.35, 21.6e-6 * 96.0, 0.0);
    let aluminium = growth(0.45, 23.2e-6 * 96.0, 0.0);
    near((bronze + aluminium) * 1e3, 1.728, 0.001);
    let take_up = bronze + aluminium - 0.5e-3;
    near(take_up * 1e3, 1.228, 0.001);
    let own = compliance(0.35, 105e9, 1500e-6);
    let f = force(take_up, own + compliance(0.45, 73e9, 1800e-6));
    near(f * 1e-3, 217.5, 0.1);
    near((bronze - f * own) * 1e3, 0.2425, 0.0001);
    // The same length by its strains.
    let strain = 21.6e-6 * 96.0 + elastic_strain(-stress(f, 1500e-6), 105e9);
    near((length(0.35, strain) - 0.35) * 1e3, 0.2425, 0.0001);
}

#[test]
fn beer_and_johnston_the_same_in_inches() {
    // Beer and Johnston, problem 2.58 (from memory): bronze 14 in, 2.4 in², 15e6 psi, 12e-6/°F;
    // aluminium 18 in, 2.8 in², 10.6e6 psi, 12.9e-6/°F; 0.02 in at 75 °F: −11 ksi in the aluminium at
    // 201.6 °F, where it is 18.0107 in long.
    let rise = 201.6 - 75.0;
    let free = growth(14.0 * INCH, 12e-6 * rise, 0.0) + growth(18.0 * INCH, 12.9e-6 * rise, 0.0);
    let square = INCH * INCH;
    let c = compliance(14.0 * INCH, 15e6 * PSI, 2.4 * square)
        + compliance(18.0 * INCH, 10.6e6 * PSI, 2.8 * square);
    let sigma = stress(force(free - 0.02 * INCH, c), 2.8 * square);
    near(sigma / PSI * 1e-3, 11.0, 0.01);
    let long = length(18.0 * INCH, 12.9e-6 * rise + elastic_strain(-sigma, 10.6e6 * PSI));
    near(long / INCH, 18.0107, 0.0001);
}

#[test]
fn rails_touch_and_then_press() {
    // Singer, Strength of Materials: rails of 10 m, 3 mm apart at 15 °C, 11.7 ppm/K, 200 GPa: they
    // touch at 40.64 °C, and without a gap that rise would bring 60 MPa (answers from memory).
    let gap = |t: Interval| (t - 15.0) * 11.7e-6 * 10.0 - 3e-3;
    let touch = first_reached(gap, 15.0, 100.0, 1e-7).at().unwrap();
    near(touch, 40.64, 0.01);
    let f = force(growth(10.0, 11.7e-6 * (touch - 15.0), 0.0), compliance(10.0, 200e9, 1.0));
    near(stress(f, 1.0) * 1e-6, 60.0, 0.1);
}

#[test]
fn singer_rod_between_rigid_points() {
    // Singer: steel rod 0.25 in² with 2000 lb at 70 °F, 6.5e-6/°F, 29e6 psi: 21 195 psi at 0 °F, none
    // at 112.4 °F (answers from memory).
    let area = 0.25 * INCH * INCH;
    let c = compliance(1.0, 29e6 * PSI, area);
    let at = |fahrenheit: f64| {
        // A stretched member that grows gives back what the preload has taken up.
        let grown = -growth(1.0, 6.5e-6 * (fahrenheit - 70.0), 0.0);
        stress(force(taken_up(2000.0 * LBF, c, grown), c), area)
    };
    near(at(0.0) / PSI, 21_195.0, 1.0);
    assert!(at(112.43) > 0.0 && at(112.45) == 0.0);
}

#[test]
fn singer_rod_stretched_and_cooled() {
    // Singer: 5000 N at 20 °C, at most 130 MPa at −20 °C, 11.7 ppm/K, 200 GPa: 13.22 mm (answer from
    // memory).
    let area = std::f64::consts::PI / 4.0 * 13.22e-3 * 13.22e-3;
    let c = compliance(1.0, 200e9, area);
    let f = force(taken_up(5000.0, c, -growth(1.0, -11.7e-6 * 40.0, 0.0)), c);
    near(stress(f, area) * 1e-6, 130.0, 0.1);
}

#[test]
fn hibbeler_bar_between_walls() {
    // Hibbeler, Mechanics of Materials (from memory): A-36 bar 10 mm square between walls, 30 to 60 °C,
    // 12 ppm/K, 200 GPa: 7.2 kN, 72 MPa, whatever its length.
    for length in [0.1, 1.0, 7.0] {
        let f = force(growth(length, 12e-6 * 30.0, 0.0), compliance(length, 200e9, 1e-4));
        near(f * 1e-3, 7.2, 0.0001);
        near(stress(f, 1e-4) * 1e-6, 72.0, 0.001);
    }
}

#[test]
fn gaps_close_where_the_free_lengths_meet() {
    // Philpot-like problem: aluminium 30 in, 12.5e-6/°F, steel 44 in, 9.6e-6/°F, 0.03 in at 60 °F:
    // 97.6 °F by the free lengths. MIT 16.20, warm-up: a gap of 0.002 L, 6e-6/°F, from 70 °F: 403.3 °F.
    let closing = |rise: Interval| rise * (30.0 * 12.5e-6 + 44.0 * 9.6e-6) - 0.03;
    near(60.0 + first_reached(closing, 0.0, 500.0, 1e-9).at().unwrap(), 97.6, 0.1);
    let bar = |rise: Interval| rise * 6e-6 - 0.002;
    near(70.0 + first_reached(bar, 0.0, 500.0, 1e-9).at().unwrap(), 403.3, 0.1);
}

#[test]
fn force_grows_from_nothing_where_the_gap_closes() {
    // Across contact, force and separation are continuous and never both there.
    let c = compliance(0.35, 105e9, 1500e-6);
    let mut before = None;
    for i in -1000..=1000 {
        let stack = [0.2 + f64::from(i) * 1e-9, 0.15];
        let take_up = misfit(&stack, &[0.35]);
        let (f, open) = (force(take_up, c), separation(take_up));
        assert!(f == 0.0 || open == 0.0);
        if let Some((f_before, open_before)) = before {
            let step: f64 = (f - f_before) * c + (open_before - open);
            assert!((step - 1e-9).abs() < 1e-15);
        }
        before = Some((f, open));
    }
}
