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
