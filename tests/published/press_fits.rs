//! Press and shrink joints against textbooks, and proven over their tolerances.

use crate::support::run;
use gapkeep::mechanics::{Ring, contact, joint};
use gapkeep::model::Quantity;
use gapkeep::numeric::extremes::extremes;
use gapkeep::numeric::{Interval, Number, Tape};

const INCH: f64 = 25.4e-3;
/// Pounds per square inch, in Pa.
const PSI: f64 = 6_894.757_293_168;

fn ring(bore: Option<f64>, outside: f64, modulus: f64, poisson: f64) -> Ring<f64> {
    Ring { bore, outside, modulus, poisson, spin: 0.0 }
}

/// True when `found` rounds to `printed`, of which the last place has the value `unit`.
fn prints(found: f64, printed: f64, unit: f64) -> bool {
    (found - printed).abs() <= 0.5 * unit * (1.0 + 1e-9)
}

/// A steel hub on a solid steel shaft, twice as large outside; interference diametral.
fn textbook_pressure(diameter: f64, interference: f64, modulus: f64, poisson: f64) -> f64 {
    let shaft = ring(None, diameter / 2.0, modulus, poisson);
    let hub = ring(Some(diameter / 2.0), diameter, modulus, poisson);
    joint::pressure(interference, diameter, joint::compliance(&shaft, &hub))
}

#[test]
fn shigley_hub_and_shaft_in_millimetres() {
    // Shigley, Mechanical Engineering Design, 8th edition, solutions 3-64 (40 H7/s6) and 3-66
    // (40 H7/u6): shaft limits over a hole of 40.000/40.025, 207 GPa; the outside of 80 mm is
    // inferred, both solutions agree with it.
    for (shaft, least, greatest) in
        [([40.043, 40.059], 34.9, 114.5), ([40.060, 40.076], 67.9, 147.5)]
    {
        let p = |delta: f64| textbook_pressure(0.04, delta * 1e-3, 207e9, 0.292) * 1e-6;
        assert!(prints(p(shaft[0] - 40.025), least, 0.1));
        assert!(prints(p(shaft[1] - 40.0), greatest, 0.1));
    }
}

#[test]
fn shigley_hub_and_shaft_in_inches() {
    // Shigley, 8th edition, solution 3-65: radial interference 0.00115 and 0.000 35 in at 1.5 in.
    let p =
        |radial: f64| textbook_pressure(1.5 * INCH, 2.0 * radial * INCH, 30e6 * PSI, 0.292) / PSI;
    assert!((p(0.001_15) - 17_250.0).abs() < 1e-6 && (p(0.000_35) - 5250.0).abs() < 1e-6);
    // Solution 3-68: 1.002 in a 1.000 in hole, outside 2 in: 22 500 psi, hoop stress 37 500 psi.
    let p = textbook_pressure(INCH, 0.002 * INCH, 30e6 * PSI, 0.292);
    let hub = ring(Some(0.5 * INCH), INCH, 30e6 * PSI, 0.292);
    assert!((p / PSI - 22_500.0).abs() < 1e-6);
    assert!((joint::hub_hoop_stress(&hub, p) / PSI - 37_500.0).abs() < 1e-6);
}

#[test]
fn shigley_from_the_text_of_a_spec() {
    // The two solutions of the first test by their classes: limits from the tables of ISO 286.
    for (class, least, greatest) in [("s6", 34.9, 114.5), ("u6", 67.9, 147.5)] {
        let run = run(&format!(
            r#"
assembly "solutions 3-64 and 3-66"
lengths in mm
temperatures in degC
condition shop 20
material steel {{ cte 11.5 ppm/K; modulus 207 GPa; poisson 0.292; source "Shigley" }}
part hub of steel {{ bore = dia 40 H7; outside = dia 80 exact }}
part shaft of steel {{ seat = dia 40 {class} }}
fit seat = shaft.seat in hub.bore {{
  joint {{ length 40; friction 0.15; shaft solid; hub outside hub.outside }}
}}
"#
        ));
        let (low, high) = run.range("seat", Quantity::Pressure, "shop");
        assert!(prints(low, least, 0.1) && prints(high, greatest, 0.1), "{low} {high}");
        // DIN 7190 as taught (Zwickau University of Applied Sciences): to press it in takes
        // F_e = π·D·l·µ·p at the greatest pressure, here in kN.
        let push = std::f64::consts::PI * 40.0 * 40.0 * 0.15 * high * 1e-3;
        let found = run.range("seat", Quantity::AxialForce, "shop").1;
        let unit = push / found;
        assert!((unit - 1.0).abs() < 1e-9 || (unit * 1e3 - 1.0).abs() < 1e-9, "{found} {push}");
    }
}

#[test]
fn locomotive_tyres_take_a_thousandth_of_their_diameter() {
    // American Railway Master Mechanics, in F. D. Jones, Turning and Boring: centres of 38 to 66 in
    // have shrink allowances of 0.040 to 0.070 in. On a solid centre of the tyre's steel (30e6 psi) the
    // hoop stress of a tyre 3 in thick is by hand E·δ/d·(1 + (d/D)²)/2, a little under the E·δ/d of a
    // thin ring; the allowances bring all of them to 27 500 … 29 300 psi.
    let table =
        [(38.0, 0.040), (44.0, 0.047), (50.0, 0.053), (56.0, 0.060), (62.0, 0.066), (66.0, 0.070)];
    for (centre, allowance) in table {
        let share: f64 = allowance / centre;
        assert!((share / 0.001_05 - 1.0).abs() < 0.025, "{centre}: {share}");
        let (d, delta) = (centre * INCH, allowance * INCH);
        let wheel = ring(None, d / 2.0, 30e6 * PSI, 0.29);
        let tyre = ring(Some(d / 2.0), d / 2.0 + 3.0 * INCH, 30e6 * PSI, 0.29);
        let p = joint::pressure(delta, d, joint::compliance(&wheel, &tyre));
        let hoop = joint::hub_hoop_stress(&tyre, p) / PSI;
        let q = centre / (centre + 6.0);
        let by_hand = 30e6 * share * (1.0 + q * q) / 2.0;
        assert!((hoop / by_hand - 1.0).abs() < 1e-12, "{centre}: {hoop} psi");
        assert!((27_500.0..29_500.0).contains(&hoop), "{centre}: {hoop} psi");
    }
}

#[test]
fn steel_tyre_on_a_rigid_wheel() {
    // Singer and Gillesania, strength of materials: tyre 10 mm thick on a rigid wheel of 1.8 m,
    // shrunk from 90 to 20 °C, 11.7 ppm/K, 200 GPa; 1.82 MPa (the answer from memory) by the formula
    // of a thin ring, which neglects the share of thickness to radius.
    let interference = 1.8 * 11.7e-6 * 70.0;
    let wheel = ring(None, 0.9, 1e30, 0.3);
    let tyre = ring(Some(0.9), 0.91, 200e9, 0.3);
    let p = joint::pressure(interference, 1.8, joint::compliance(&wheel, &tyre));
    assert!((p / 1.82e6 - 1.0).abs() < 10.0 / 900.0);
}

#[test]
fn thin_rings_have_the_pressure_of_a_thin_ring() {
    // Common practice: hoop stress pd/2t, so p = 2Eδt/d² on a rigid shaft, and p = Eδt/d² for two
    // equal rings of that thickness, to the order t/d.
    let (d, t, e, delta) = (0.2, 1e-5, 207e9, 20e-6);
    let hub = ring(Some(d / 2.0), d / 2.0 + t, e, 0.29);
    let rigid = ring(None, d / 2.0, 1e30, 0.29);
    let p = joint::pressure(delta, d, joint::compliance(&rigid, &hub));
    assert!((p / (2.0 * e * delta * t / (d * d)) - 1.0).abs() < 2.0 * t / d);
    let shell = ring(Some(d / 2.0 - t), d / 2.0, e, 0.29);
    let p = joint::pressure(delta, d, joint::compliance(&shell, &hub));
    assert!((p / (e * delta * t / (d * d)) - 1.0).abs() < 2.0 * t / d);
}

#[test]
fn rings_of_one_material_need_no_poisson_ratio() {
    // Shigley, 8th edition, section 3-16: for one material
    // p = Eδ/(2d³)·(d_o²−d²)(d²−d_i²)/(d_o²−d_i²).
    let (d_i, d, d_o, e, delta): (f64, f64, f64, f64, f64) = (0.02, 0.04, 0.08, 207e9, 40e-6);
    let square = |x: f64| x * x;
    let shape = (square(d_o) - square(d)) * (square(d) - square(d_i)) / (square(d_o) - square(d_i));
    let printed = e * delta / (2.0 * d * d * d) * shape;
    for poisson in [0.0, 0.29, 0.5] {
        let (shaft, hub) = (
            ring(Some(d_i / 2.0), d / 2.0, e, poisson),
            ring(Some(d / 2.0), d_o / 2.0, e, poisson),
        );
        let p = joint::pressure(delta, d, joint::compliance(&shaft, &hub));
        assert!((p / printed - 1.0).abs() < 1e-14);
    }
}

#[test]
fn effective_interference_after_smoothing() {
    // DIN 7190 as taught (G = 0.8·ΣRz from memory): 60 H7/s6, 23 … 72 µm, Rz 6.3 on both surfaces,
    // leaves 12.9 … 61.9 µm.
    let g = joint::smoothing(6.3, 6.3);
    assert!(prints(72.0 - g, 61.9, 0.1) && prints(23.0 - g, 12.9, 0.1));
}

#[test]
fn admissible_pressure_of_a_hub() {
    // DIN 7190 as taught (Zwickau University of Applied Sciences): p ≤ (1−Q_A²)R_e/√3, Q_A = d/D.
    let hub = ring(Some(0.03), 0.06, 210e9, 0.3);
    let allowed = joint::hub_yield_pressure(&hub, 300e6);
    assert!((allowed - 0.75 * 300e6 / 3_f64.sqrt()).abs() < 1e-6);
}

/// Diametral interference of an alloy hub on a steel shaft at 60 °C, less 8 µm of smoothing.
/// Unknowns: diameters of shaft and bore at 20 °C (m).
fn interference_at_60<N: Number>(shaft: N, bore: N) -> N {
    shaft * (11.7e-6 * 40.0 + 1.0) - bore * (23.4e-6 * 40.0 + 1.0) - 8e-6
}

fn alloy_hub_on_steel_shaft<N: Number>(bore: Option<f64>) -> (Ring<N>, Ring<N>) {
    let n = N::exact;
    let shaft = Ring {
        bore: bore.map(n),
        outside: n(0.02),
        modulus: n(207e9),
        poisson: n(0.29),
        spin: n(0.0),
    };
    let hub = Ring {
        bore: Some(n(0.02)),
        outside: n(0.04),
        modulus: n(70e9),
        poisson: n(0.33),
        spin: n(0.0),
    };
    (shaft, hub)
}

#[test]
fn extremes_of_a_joint_are_proven() {
    // The same joint at its limits by numerical integration: tests/scripts/ring_ode.py, "alloy hub
    // on a hollow shaft".
    let box_of_sizes = [Interval::new(0.040_060, 0.040_076), Interval::new(0.040, 0.040_025)];
    let over_box = |formula: fn(&Ring<_>, &Ring<_>, _) -> _| {
        let tape = Tape::of(2, |x| {
            let (shaft, hub) = alloy_hub_on_steel_shaft(Some(0.01));
            let delta = interference_at_60(x[0].clone(), x[1].clone());
            let c = joint::compliance(&shaft, &hub);
            formula(&shaft, &hub, joint::pressure(delta, Number::exact(0.04), c))
        });
        extremes(&tape, &box_of_sizes, 1e-3)
    };
    let near = |found: f64, expected: f64| (found / expected - 1.0).abs() < 1e-8;
    let p = over_box(|_, _, p| p);
    assert!(p.least.met && near(p.least.bound, 5.888_292_571e6));
    assert!(p.greatest.met && near(p.greatest.bound, 35.050_779_59e6));
    let hub = over_box(|_, hub, p| joint::hub_von_mises(hub, p));
    assert!(hub.greatest.met && near(hub.greatest.bound, 81.785_152_39e6));
    let shaft = over_box(|shaft, _, p| joint::shaft_von_mises(shaft, p));
    assert!(shaft.greatest.met && near(shaft.greatest.bound, 93.468_745_59e6));
    // ½π·0.12·p·30 mm·(40 mm)², written out.
    let torque = joint::torque(0.12, p.least.bound, 0.03, 0.04);
    assert!(near(torque, 53.276_016_05));
}

#[test]
fn friction_along_a_long_joint() {
    // By hand: areas π(40²−20²) and π·20² mm², C = (5/3+0.33)/70e9 + 0.71/207e9.
    let (shaft, hub) = alloy_hub_on_steel_shaft(None);
    let c = joint::compliance(&shaft, &hub);
    let kappa = joint::axial_coupling(&shaft, &hub, 0.18, 0.04, 0.06, c);
    let areas = 0.33 / (1200.0 * 70e9) + 0.29 / (400.0 * 207e9);
    let by_hand = areas * 0.18 * 40.0 * 60.0 / (2.0 * ((5.0 / 3.0 + 0.33) / 70e9 + 0.71 / 207e9));
    assert!((kappa / by_hand - 1.0).abs() < 1e-13);
    assert!((kappa - 0.050_231_744_45).abs() < 1e-11);
}

#[test]
fn a_loose_joint_has_no_pressure_over_its_whole_box() {
    let tape = Tape::of(2, |x| {
        let (shaft, hub) = alloy_hub_on_steel_shaft(None);
        let delta = interference_at_60(x[0].clone(), x[1].clone()) * 0.5;
        contact::pressures(&[shaft, hub], &[delta]).remove(0)
    });
    let loose =
        extremes(&tape, &[Interval::new(0.040, 0.040_02), Interval::new(0.040_03, 0.040_05)], 1e-6);
    assert!(loose.least.bound == 0.0 && loose.greatest.bound == 0.0);
    let touching =
        extremes(&tape, &[Interval::new(0.040, 0.040_04), Interval::new(0.040, 0.040_01)], 1e-3);
    assert!(touching.least.bound == 0.0 && touching.greatest.bound > 1e6 && touching.greatest.met);
}
