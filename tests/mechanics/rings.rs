//! Rings and compound joints against `tests/data/rings.json`, which `tests/scripts/ring_ode.py`
//! computes with scipy from radial equilibrium, without the formulas used here.

use gapkeep::mechanics::ring::spin;
use gapkeep::mechanics::{Ring, contact};
use gapkeep::numeric::{Interval, Lanes, Number, Tape};
use serde_json::Value;

fn data() -> Value {
    serde_json::from_str(include_str!("../data/rings.json")).expect("rings.json is JSON")
}

fn number(value: &Value) -> f64 {
    value.as_f64().expect("a number")
}

fn numbers(value: &Value) -> Vec<f64> {
    value.as_array().expect("a list").iter().map(number).collect()
}

fn ring<N: Number>(value: &Value) -> Ring<N> {
    let of = |key: &str| N::exact(number(&value[key]));
    Ring {
        bore: value["bore"].as_f64().map(N::exact),
        outside: of("outside"),
        modulus: of("modulus"),
        poisson: of("poisson"),
        spin: spin(of("density"), of("speed")),
    }
}

fn rings<N: Number>(case: &Value) -> Vec<Ring<N>> {
    case["rings"].as_array().expect("a list").iter().map(ring).collect()
}

/// Holds numbers against each other, as exact as the largest among them.
fn agree(name: &Value, found: &[f64], expected: &[f64]) {
    let size = expected.iter().fold(0.0_f64, |m, x| m.max(x.abs()));
    assert_eq!(found.len(), expected.len(), "{name}");
    for (f, e) in found.iter().zip(expected) {
        assert!((f - e).abs() <= 1e-9 * size, "{name}: found {f}, expected {e}");
    }
}

#[test]
fn strains_and_stresses_of_single_rings() {
    let data = data();
    let cases = data["single"].as_array().expect("a list");
    assert!(cases.len() >= 8);
    for case in cases {
        let (name, ring) = (&case["name"], ring::<f64>(&case["ring"]));
        let (p_a, p_b) = (number(&case["p_a"]), number(&case["p_b"]));
        if ring.bore.is_some() {
            agree(name, &[ring.bore_strain(p_a, p_b)], &[number(&case["bore_strain"])]);
        }
        agree(name, &[ring.outside_strain(p_a, p_b)], &[number(&case["outside_strain"])]);
        let inside = ring.stress_inside(p_a, p_b);
        let radii = numbers(&case["radii"]);
        let further: Vec<_> = radii[1..].iter().map(|&r| ring.stress_at(p_a, p_b, r)).collect();
        let radial: Vec<f64> = further.iter().map(|s| s.radial()).collect();
        let hoop: Vec<f64> = further.iter().map(|s| s.hoop()).collect();
        agree(name, &[&[inside.radial()], radial.as_slice()].concat(), &numbers(&case["radial"]));
        agree(name, &[&[inside.hoop()], hoop.as_slice()].concat(), &numbers(&case["hoop"]));
        let outside = ring.stress_outside(p_a, p_b);
        let last = |list: &Value| *numbers(list).last().expect("not empty");
        let size = number(&case["hoop"][0]).abs();
        assert!((outside.hoop() - last(&case["hoop"])).abs() <= 1e-9 * size, "{name}");
        assert!((outside.radial() - last(&case["radial"])).abs() <= 1e-9 * size, "{name}");
    }
}

#[test]
fn pressures_gaps_and_stresses_of_compounds() {
    let data = data();
    let cases = data["compound"].as_array().expect("a list");
    let mut open = 0;
    for case in cases {
        let (name, rings) = (&case["name"], rings::<f64>(case));
        let delta = numbers(&case["interference"]);
        let p = contact::pressures(&rings, &delta);
        agree(name, &p, &numbers(&case["pressures"]));
        let gaps = contact::gaps(&rings, &delta);
        let expected = numbers(&case["gaps"]);
        for (gap, expected) in gaps.iter().zip(&expected) {
            open += usize::from(*expected > 0.0);
            // A gap is a difference of movements a thousand times as large.
            assert!((gap - expected).abs() <= 1e-15, "{name}: {gap} {expected}");
        }
        let stress: Vec<f64> = rings
            .iter()
            .enumerate()
            .map(|(k, ring)| {
                let (p_a, p_b) = contact::faces(&rings, &delta, k);
                ring.greatest_von_mises(p_a, p_b)
            })
            .collect();
        agree(name, &stress, &numbers(&case["von_mises"]));
    }
    assert!(open >= 3, "cases with an open contact must be among them");
}

#[test]
fn every_kind_of_number_finds_the_same_pressures() {
    for case in data()["compound"].as_array().expect("a list") {
        let delta = numbers(&case["interference"]);
        let plain = contact::pressures(&rings::<f64>(case), &delta);
        let points: Vec<Interval> = delta.iter().map(|&d| Interval::point(d)).collect();
        let proven = contact::pressures(&rings::<Interval>(case), &points);
        let lanes: Vec<Lanes> = delta.iter().map(|&d| Lanes::exact(d)).collect();
        let drawn = contact::pressures(&rings::<Lanes>(case), &lanes);
        for (k, &p) in plain.iter().enumerate() {
            assert!(proven[k].contains(p) && proven[k].width() <= 1e-9 * p.max(1.0));
            assert_eq!(drawn[k].0, [p; 8]);
            let tape = Tape::of(delta.len(), |x| contact::pressures(&rings(case), x).remove(k));
            assert!((tape.value(&delta) - p).abs() <= 1e-12 * p);
        }
    }
}

#[test]
fn bore_of_a_compound_under_heat_and_speed() {
    // Radii 10/20/25/45 mm at 70 °C and 9000 rpm: steel of 11.7 ppm/K inside. The bore's movement is
    // heat less the squeeze of the two joints; the mechanical share by ring_ode.py.
    let data = data();
    let case = data["compound"].as_array().expect("a list");
    let case = case
        .iter()
        .find(|case| case["name"] == "shaft, bush, housing at 70 degC and 9000 rpm")
        .expect("the case is there");
    let rings = rings::<f64>(case);
    let p = contact::pressures(&rings, &numbers(&case["interference"]));
    let bore = 0.010 * (11.7e-6 * 50.0 + rings[0].bore_strain(0.0, p[0]));
    assert!((bore - 0.624_038_597_8e-6).abs() < 1e-14);
}
