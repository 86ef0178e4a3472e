//! Temperature windows against closed forms: every end is the root of an equation that is solved
//! here on paper.

use crate::support::{Folder, Run, run, run_with};
use gapkeep::evaluate::outcome::{Outcome, Window};
use gapkeep::model::Owner;

const CELSIUS: f64 = 273.15;
const HEAD: &str = r#"
assembly "Window"
lengths in mm
temperatures in degC
material light { cte 23.4 ppm/K over -60 .. 160 degC; source "test" }
material heavy { cte 11.7 ppm/K over -80 .. 300 degC; source "test" }
part box of light { length = 100 ±0 }
part rod of heavy { length = 100.05 ±0 }
"#;

fn window(run: &Run, id: &str, condition: &str) -> Window {
    run.verdict(id, condition).window.clone().expect("a window")
}

#[track_caller]
fn near(found: f64, expected: f64, within: f64) {
    assert!((found - expected).abs() <= within, "{found}, expected {expected}");
}

/// What `rod.length - box.length <= 0.03` solves to: 100.05(1 + 11.7e-6 a) − 100(1 + 23.4e-6 b).
fn gap(rod: f64, box_: f64) -> f64 {
    100.05 * (1.0 + 11.7e-6 * rod) - 100.0 * (1.0 + 23.4e-6 * box_)
}

/// The root of a function that falls from `from` to `to`.
fn root(falling: impl Fn(f64) -> f64, mut from: f64, mut to: f64) -> f64 {
    for _ in 0..200 {
        let middle = 0.5 * (from + to);
        if falling(middle) > 0.0 { from = middle } else { to = middle }
    }
    0.5 * (from + to)
}

#[test]
fn one_temperature_for_all_parts() {
    let found = run(&format!(
        "{HEAD}condition hot 60 ±2\n\
         gap over = rod.length - box.length {{ require \"G\" <= 0.03 }}"
    ));
    let window = window(&found, "G", "hot");
    // 0.05 − (2340e-6 − 1170.585e-6)·t = 0.03; the tolerance lets the coldest be 2 K lower.
    let t = 0.02 / (2340e-6 - 100.05 * 11.7e-6);
    assert!(!window.scaled && window.departures.is_empty());
    assert_eq!(window.intervals.len(), 1);
    near(window.intervals[0].0, 20.0 + t + 2.0 + CELSIUS, 2e-6);
    // The other end is that of the narrower data, less the tolerance; no limit is met there.
    assert_eq!(window.intervals[0].1, f64::INFINITY);
    near(window.looked_at.0, -60.0 + 2.0 + CELSIUS, 1e-9);
    near(window.looked_at.1, 160.0 - 2.0 + CELSIUS, 1e-9);
}

#[test]
fn parts_of_unequal_temperatures_are_scaled_from_reference() {
    let found = run(&format!(
        "{HEAD}condition hot 60 {{ rod 29 .. 31 K above }}\n\
         gap over = rod.length - box.length {{ require \"G\" <= 0.03 }}"
    ));
    let window = window(&found, "G", "hot");
    assert!(window.scaled);
    assert_eq!(found.verdict("G", "hot").outcome, Outcome::Fails);
    // The rod is (70 λ ± 1) K above reference, the box 40 λ.
    let end = root(|scale| gap(70.0 * scale + 1.0, 40.0 * scale) - 0.03, 0.0, 3.5);
    near(end, 1.8, 0.1);
    assert_eq!(window.intervals.len(), 1);
    near(window.intervals[0].0, end, 2e-6 / 70.0 + 1e-9);
    // λ goes as far as the box has data: 140 K over 40 K.
    assert_eq!(window.intervals[0].1, f64::INFINITY);
    near(window.looked_at.1, 3.5, 1e-9);
    let departures: Vec<f64> = window.departures.iter().map(|d| d.1).collect();
    near(departures[0], 40.0, 1e-9);
    near(departures[1], 70.0, 1e-9);
}

#[test]
fn a_range_is_scaled_whole() {
    // The rod is pinned by a row of its own, so the two are not at one temperature.
    let found = run(&format!(
        "{HEAD}condition service -20 .. 60 {{ rod 20 }}\n\
         gap over = rod.length - box.length {{ require \"G\" 0 .. 0.2 }}"
    ));
    let window = window(&found, "G", "service");
    // At the hot end of the range: 0.05 − 0.00234·40 λ = 0; at the cold one 0.05 + 0.00234·40 λ = 0.2.
    near(window.intervals[0].1, 0.05 / (2340e-6 * 40.0), 1e-7);
    assert_eq!(found.verdict("G", "service").outcome, Outcome::Fails);
    // No place is told of the box, which has many temperatures.
    assert_eq!(window.departures.len(), 1);
}

#[test]
fn every_time_of_a_history_is_scaled() {
    let mut folder = Folder::default();
    let table = "time [s],rod [degC],box [degC]\n0,20,20\n600,20,100\n1200,100,100\n";
    folder.0.insert("warm-up.csv".into(), table.into());
    let spec = format!(
        "{HEAD}condition warm_up from \"warm-up.csv\" ±2\n\
         gap over = rod.length - box.length {{ require \"G\" >= -0.2 }}"
    );
    let found = run_with(&spec, &folder);
    assert_eq!(found.verdict("G", "warm_up").outcome, Outcome::Holds);
    let window = window(&found, "G", "warm_up");
    // Least at 600 s with both 2 K hotter: the box is 80 λ + 2 above reference, the rod 2.
    let end = root(|scale| gap(2.0, 80.0 * scale + 2.0) + 0.2, 0.0, 1.75);
    near(end, 1.32, 0.01);
    assert!(window.scaled);
    assert_eq!(window.intervals.len(), 1);
    near(window.intervals[0].1, end, 2e-6 / 80.0 + 1e-9);
    near(window.looked_at.1, (140.0 - 2.0) / 80.0, 1e-9);
}

#[test]
fn the_charge_of_a_fill_has_a_temperature_and_data_too() {
    let spec = |hot: &str, charge: &str| {
        run(&format!(
            "{HEAD}condition hot {hot}\n\
             fill space {{\n  cavity of box 100 cm3\n  charge hydraulic_oil {charge} cm3\n  \
             require \"U\" ullage >= 1 %\n}}"
        ))
    };
    // 0.99 − V(1 + 7e-4·1.05 t)/(100(1 + 23.4e-6 T)³), with the scatter of the library's oil.
    let spare = |charge: f64, oil: f64, box_: f64| {
        0.99 - charge / 100.0 * (1.0 + 7.35e-4 * oil) / libm::pow(1.0 + 23.4e-6 * box_, 3.0)
    };
    // At one temperature: the oil's data end at 150 °C, the box's at 160 °C.
    let found = window(&spec("80", "85"), "U", "hot");
    assert!(!found.scaled);
    assert!(spare(85.0, 130.0, 130.0) > 0.0);
    assert_eq!(found.intervals[0].1, f64::INFINITY);
    near(found.looked_at.0, -60.0 + CELSIUS, 1e-9);
    near(found.looked_at.1, 150.0 + CELSIUS, 1e-9);
    // With oil 15 K hotter than the box they are scaled: 75 λ and 60 λ above reference.
    let found = window(&spec("80 { space 15 K above }", "85"), "U", "hot");
    assert!(found.scaled);
    near(found.looked_at.1, 130.0 / 75.0, 1e-9);
    let owners: Vec<bool> =
        found.departures.iter().map(|d| matches!(d.0, Owner::Fill(_))).collect();
    assert_eq!(owners, [false, true]);
    // And with a fuller charge the limit is met within the data.
    let found = window(&spec("60 { space 15 K above }", "94"), "U", "hot");
    let end = root(|scale| spare(94.0, 55.0 * scale, 40.0 * scale), 0.0, 2.3);
    near(end, 1.38, 0.1);
    near(found.intervals[0].1, end, 2e-6 / 55.0 + 1e-9);
}
