//! Filled cavities from text to figures: pressure, with the wall counted, and the stress in it. Values
//! worked out independently from the formulas of `docs/method-joints.md`.

use crate::support::{Folder, Run, assert_range, run_with};
use gapkeep::model::{PartId, Quantity};

const LIQUID: &str = r#"
- name: oil
  family: liquid
  expansion:
    volume: { constant: 700 ppm/K, range: -40 .. 120 degC }
  bulk_modulus: 1500 MPa
  source: { grade: stated, text: "test" }
- name: lot_of_oil
  family: liquid
  expansion:
    volume: { constant: 700 ppm/K, range: -40 .. 120 degC }
  bulk_modulus: { value: 1500 MPa, scatter: 10 % }
  source: { grade: stated, text: "test" }
"#;

/// A steel cylinder of bore 60 and outside 80 that is full of a liquid at 20 °C.
fn tank(material: &str, lines: &str, outside: &str) -> Run {
    let text = format!(
        r#"
assembly "acceptance"
lengths in mm
temperatures in degC
use "oil.yaml"
condition filled 20
condition warm 60
material steel {{
  cte 11.7 ppm/K; modulus 207 GPa; poisson 0.29; yield 300 ±30 MPa; source "test"
}}
part body of steel {{ bore = dia 60 exact; outside = dia {outside} }}
fill tank {{
  cavity of body 240 cm3
  charge {material} 240 cm3
  {lines}
}}
"#
    );
    let files = [("oil.yaml".to_string(), LIQUID.to_string())];
    run_with(&text, &Folder(files.into()))
}

const WALL: &str = "wall bore body.bore outside body.outside";

#[test]
fn a_full_cylinder_gives_way() {
    let run = tank("oil", WALL, "80 exact");
    let found = run.range("tank", Quantity::Pressure, "warm");
    assert_range(found, (37.287_491_05, 37.287_491_05), 1e-8);
    let found = run.range("tank", Quantity::Pressure, "filled");
    assert!(found.0 == 0.0 && found.1 < 1e-9, "{found:?}");
}

#[test]
fn a_cavity_without_a_wall_is_rigid() {
    let run = tank("oil", "", "80 exact");
    let found = run.range("tank", Quantity::Pressure, "warm");
    // p = K·ln(V_l/V).
    let ratio = (1.0 + 7e-4 * 40.0) / libm::pow(1.0 + 11.7e-6 * 40.0, 3.0);
    let rigid = 1500.0 * libm::log(ratio);
    assert_range(found, (rigid, rigid), 1e-12);
}

#[test]
fn a_thick_wall_comes_near_to_a_rigid_one_and_a_thin_one_gives_more() {
    let pressure = |outside| tank("oil", WALL, outside).range("tank", Quantity::Pressure, "warm").0;
    let rigid = tank("oil", "", "80 exact").range("tank", Quantity::Pressure, "warm").0;
    let (thin, usual, thick) = (pressure("62 exact"), pressure("80 exact"), pressure("600 exact"));
    assert!(thin < usual && usual < thick && thick < rigid, "{thin} {usual} {thick} {rigid}");
    // The tolerance of the wall counts.
    let found = tank("oil", WALL, "70 ±1").range("tank", Quantity::Pressure, "warm");
    let ends = (pressure("69 exact"), pressure("71 exact"));
    assert_range(found, ends, 1e-9);
}

#[test]
fn a_pressure_is_required_with_its_margin() {
    let limits = format!(
        "{WALL}\n  require \"P\" pressure <= 38 MPa\n  require \"S\" stress in body <= 56 % of yield"
    );
    let run = tank("oil", &limits, "80 exact");
    let margin = run.verdict("P", "warm").margin;
    assert!((margin - (38e6 - 37.287_491_05e6)).abs() < 1.0, "{margin}");
    assert!((run.verdict("P", "filled").margin - 38e6).abs() < 1.0);
    // √3·p·Q²/(Q²−1) with Q² = 16/9, over a yield strength of 270 MPa at its least.
    let stress = libm::sqrt(3.0) * 37.287_491_05 * 16.0 / 7.0;
    let found = run.range("tank", Quantity::Stress(PartId(0)), "warm");
    assert_range(found, (stress, stress), 1e-8);
    let margin = run.verdict("S", "warm").margin;
    assert!((margin - (0.56 - stress / 270.0)).abs() < 1e-8, "{margin}");
}

#[test]
fn the_bulk_modulus_scatters() {
    let found = tank("lot_of_oil", "", "80 exact").range("tank", Quantity::Pressure, "warm");
    let middle = tank("oil", "", "80 exact").range("tank", Quantity::Pressure, "warm").0;
    assert_range(found, (0.9 * middle, 1.1 * middle), 1e-9);
}

#[test]
fn a_cavity_that_is_meant_to_be_full_is_a_note() {
    let severities = |lines: &str| -> Vec<&'static str> {
        let run = tank("oil", lines, "80 exact");
        let full = run.diagnostics.iter().filter(|d| d.code.text() == "cavity-full");
        full.map(|d| d.severity.word()).collect()
    };
    assert_eq!(severities(WALL), ["error"]);
    assert_eq!(severities("require \"P\" pressure <= 80 MPa"), ["note"]);
    assert_eq!(severities("require \"P\" pressure <= 80 MPa at filled"), ["error"]);
}
