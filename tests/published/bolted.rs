//! Bolts that clamp and are heated, against textbooks.

use gapkeep::mechanics::restraint::{compliance, force, growth, stress, taken_up};
use gapkeep::numeric::extremes::extremes;
use gapkeep::numeric::{Interval, Number, Recorded, Tape};

fn near(found: f64, printed: f64, last_place: f64) {
    assert!((found - printed).abs() <= 0.51 * last_place, "found {found}, printed {printed}");
}

#[test]
fn ugural_bolt_in_a_tube_turned_and_heated() {
    // Ugural, Mechanical Design of Machine Components, examples 4.2 and 4.3: steel bolt 600 mm²,
    // 200 GPa, 11.7 ppm/K; aluminium tube 300 mm², 70 GPa, 23.2 ppm/K; 600 mm; nut advanced 1 mm,
    // then heated by 100 K: 50.3 kN.
    let (bolt, tube) = (compliance(0.6, 200e9, 600e-6), compliance(0.6, 70e9, 300e-6));
    let advance = 1e-3;
    near(force(advance, bolt + tube) * 1e-3, 29.787, 0.001);
    let grown = growth(0.6, 23.2e-6 * 100.0, 0.0) - growth(0.6, 11.7e-6 * 100.0, 0.0);
    near(force(advance + grown, bolt + tube) * 1e-3, 50.3, 0.1);
    // The same from the force after turning.
    let preload = force(advance, bolt + tube);
    let hot = force(taken_up(preload, bolt + tube, grown), bolt + tube);
    near(hot * 1e-3, 50.340, 0.001);
}

#[test]
fn hibbeler_bolt_in_a_sleeve() {
    // Hibbeler, Mechanics of Materials, bolt and sleeve (the answers from memory): 2014-T6 tube
    // 600 mm², 73.1 GPa, 23 ppm/K; A-36 bolt 400 mm², 200 GPa, 12 ppm/K; snug at 15, heated to 80 °C:
    // 20.26 kN, 50.6 and 33.8 MPa. The length cancels.
    for length in [0.15, 1.0] {
        let c = compliance(length, 73.1e9, 600e-6) + compliance(length, 200e9, 400e-6);
        let grown = growth(length, 23e-6 * 65.0, 0.0) - growth(length, 12e-6 * 65.0, 0.0);
        let f = force(grown, c);
        near(f * 1e-3, 20.26, 0.01);
        near(stress(f, 400e-6) * 1e-6, 50.6, 0.1);
        near(stress(f, 600e-6) * 1e-6, 33.8, 0.1);
        // Cooled instead, the bolt lies slack: no pull across the open face.
        assert_eq!(force(-grown, c), 0.0);
    }
}

#[test]
fn gere_bolt_through_two_copper_tubes() {
    // Gere, Mechanics of Materials, 7th edition, problem 2.5-22 (inputs; its answers were not at
    // hand): bolt of 5 mm through tubes of 40 mm (25 × 4) and 50 mm (17 × 3), warmed by 30 K, the nut
    // of 1.0 mm pitch then turned by half; 200 GPa and 12 ppm/K, copper 120 GPa and 17 ppm/K. Solved
    // here by displacements: the free faces of bolt and tubes meet under one force.
    let area = |outside: f64, wall: f64| std::f64::consts::PI * wall * (outside - wall);
    let (bolt, wide, narrow) =
        (std::f64::consts::PI / 4.0 * 25.0, area(25.0, 4.0), area(17.0, 3.0));
    near(wide, 263.894, 0.001);
    near(narrow, 131.947, 0.001);
    let (stiff_bolt, stiff_wide, stiff_narrow) =
        (200e3 * bolt / 90.0, 120e3 * wide / 40.0, 120e3 * narrow / 50.0);
    // Unknown: how far the joint between the tubes and the nut move (mm); head at 0.
    //   wide·(x₁ − 40α_cΔ) = narrow·(x₂ − x₁ − 50α_cΔ) = −bolt·(x₂ + ½ − 90α_sΔ)
    let (copper, steel) = (17e-6 * 30.0, 12e-6 * 30.0);
    let (a11, a12, b1) = (
        stiff_wide + stiff_narrow,
        -stiff_narrow,
        stiff_wide * 40.0 * copper - stiff_narrow * 50.0 * copper,
    );
    let (a21, a22, b2) = (
        -stiff_narrow,
        stiff_narrow + stiff_bolt,
        stiff_narrow * 50.0 * copper + stiff_bolt * (90.0 * steel - 0.5),
    );
    let x2 = (b2 * a11 - b1 * a21) / (a22 * a11 - a12 * a21);
    let by_displacements = stiff_bolt * (x2 + 0.5 - 90.0 * steel);
    let c = compliance(0.09, 200e9, bolt * 1e-6)
        + compliance(0.04, 120e9, wide * 1e-6)
        + compliance(0.05, 120e9, narrow * 1e-6);
    let grown = growth(0.04, copper, 0.0) + growth(0.05, copper, 0.0) - growth(0.09, steel, 0.0);
    let found = force(grown + 0.5e-3, c);
    assert!((found / by_displacements - 1.0).abs() < 1e-12, "{found} {by_displacements}");
    assert!(found > 10e3);
}

#[test]
fn two_parts_after_lee() {
    // D. Lee, How internal loads affect bolt preload, 2010: F_b = k_b(Δ_b + δ) − k_b·α_b·ΔT_b·L_b, with
    // the lengthening δ that bolt and clamped part share; each at its own temperature.
    let (preload, k_bolt, k_clamped, length) = (12e3, 200e6, 700e6, 0.08);
    let (bolt, clamped) = (11.7e-6 * 60.0 * length, 23.4e-6 * 90.0 * length);
    // Equilibrium k_b(Δ_b + δ − e_b) = k_c(Δ_c − δ + e_c), with k_b·Δ_b = k_c·Δ_c = preload.
    let shared = (k_clamped * clamped + k_bolt * bolt) / (k_bolt + k_clamped);
    let printed = k_bolt * (preload / k_bolt + shared) - k_bolt * bolt;
    let c = 1.0 / k_bolt + 1.0 / k_clamped;
    let grown = growth(length, 23.4e-6 * 90.0, 0.0) - growth(length, 11.7e-6 * 60.0, 0.0);
    let found = force(taken_up(preload, c, grown), c);
    assert!((found / printed - 1.0).abs() < 1e-13, "{found} {printed}");
}

#[test]
fn preload_after_vdi_2230() {
    // VDI 2230-1 (the formula from memory): ΔF = l_K(α_SΔT − α_PΔT)/(δ_S E_RT/E_T + δ_P E_RT/E_T) is
    // lost by expansion, and F_V(1 − (δ_S+δ_P)/(δ_S E_RT/E_T + δ_P E_RT/E_T)) by the moduli.
    let (length, preload, rise) = (0.1, 12e3, 130.0);
    let (bolt, flange) = (|e| compliance(length, e, 84.3e-6), |e| compliance(length, e, 400e-6));
    let then = bolt(207e9) + flange(70e9);
    let now = bolt(207e9) * (207.0 / 198.0) + flange(70e9) * (70.0 / 64.0);
    let lost = length * (11.7e-6 - 23.4e-6) * rise / now;
    let printed = preload - lost - preload * (1.0 - then / now);
    let grown = growth(length, 23.4e-6 * rise, 0.0) - growth(length, 11.7e-6 * rise, 0.0);
    let found = force(taken_up(preload, then, grown), bolt(198e9) + flange(64e9));
    assert!((found / printed - 1.0).abs() < 1e-13);
}

#[test]
fn preload_scatter_is_carried_to_the_hot_joint() {
    // The joint above with 12 kN ±15 %, by hand: (F₀·C(T₀) + 100·11.7e-6·130)/C(T), in mm and N.
    let (then, now) =
        (100.0 / 84.3 / 207e3 + 100.0 / 400.0 / 70e3, 100.0 / 84.3 / 198e3 + 100.0 / 400.0 / 64e3);
    let by_hand = |f0: f64| (f0 * then + 100.0 * 11.7e-6 * 130.0) / now;
    let tape = Tape::of(1, |x| {
        let n = Recorded::exact;
        let spring = |modulus, area| compliance(n(0.1), n(modulus), n(area));
        let then = spring(207e9, 84.3e-6) + spring(70e9, 400e-6);
        let now = spring(198e9, 84.3e-6) + spring(64e9, 400e-6);
        let grown =
            growth(n(0.1), n(23.4e-6 * 130.0), n(0.0)) - growth(n(0.1), n(11.7e-6 * 130.0), n(0.0));
        force(taken_up(x[0].clone(), then, grown), now)
    });
    let found = extremes(&tape, &[Interval::new(12e3 * 0.85, 12e3 * 1.15)], 1e-6);
    for (found, by_hand, expected) in [
        (&found.least, by_hand(10_200.0), 24_954.228_06),
        (&found.greatest, by_hand(13_800.0), 28_337.695_96),
    ] {
        assert!(found.met);
        assert!((found.bound / by_hand - 1.0).abs() < 1e-12);
        assert!((found.bound / expected - 1.0).abs() < 1e-8);
    }
}
