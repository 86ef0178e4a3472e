//! Joints, restraints and fills from text to figures, with values worked out independently in double
//! precision with numpy from the formulas of `docs/method-joints.md` (relative 1e-8 unless stated).

use crate::support::{Run, assert_range, run};
use gapkeep::model::{PartId, Quantity};

const HEAD: &str = r#"
assembly "acceptance"
lengths in mm
temperatures in degC
material light { cte 23.4 ppm/K; modulus 70 GPa; poisson 0.33; density 2700 kg/m3; source "test" }
material steel { cte 11.7 ppm/K; modulus 207 GPa; poisson 0.29; density 7850 kg/m3; source "test" }
material bronze { cte 17.8 ppm/K; modulus 110 GPa; poisson 0.34; density 8800 kg/m3; source "test" }
"#;

fn spec(body: &str) -> Run {
    run(&format!("{HEAD}{body}"))
}

fn hub_and_shaft(clearance: &str) -> Run {
    spec(&format!(
        r#"
condition warm 60
part hub of light {{
  bore    = dia 40 +0.025/0
  outside = dia 80 exact
}}
part shaft of steel {{
  seat = dia 40 +0.076/+0.060
  bore = dia 20 exact
}}
fit seat = shaft.seat in hub.bore {{
  joint {{
    length   30
    hub      outside hub.outside
    shaft    bore shaft.bore
    friction 0.12
    hub      Rz 4 um
    shaft    Rz 6 um
    insertion clearance {clearance}
  }}
}}
"#
    ))
}

#[test]
fn a_steel_shaft_in_a_light_alloy_hub_when_warm() {
    let run = hub_and_shaft("0.04");
    let range = |quantity| run.range("seat", quantity, "warm");
    assert_range(range(Quantity::Pressure), (5.888_292_571, 35.050_779_59), 1e-8);
    let hub = range(Quantity::Stress(PartId(0))).1;
    let shaft = range(Quantity::Stress(PartId(1))).1;
    assert_range((hub, shaft), (81.785_152_39, 93.468_745_59), 1e-8);
    let torque = range(Quantity::Torque).0;
    assert_range((torque, torque), (53.276_016_05, 53.276_016_05), 1e-8);
}

#[test]
fn the_hub_joins_at_a_temperature_that_every_pair_allows() {
    let run = hub_and_shaft("0.04");
    let figure = run.figure("seat", Quantity::JoiningTemperature, None);
    let celsius = figure.range.greatest.bound - 273.15;
    assert!((celsius - 143.931_624).abs() < 1e-5, "{celsius}");
}

/// The same joint of a hub that may not be hot, with or without an `insertion clearance`.
fn hub_that_stays_below(limit: &str, seat: &str, line: &str) -> Run {
    spec(&format!(
        r#"
condition day 20
material tempered like light {{ limit {limit} degC }}
material bar like steel {{ over -60 .. 300 degC }}
part hub of tempered {{ bore = dia 40 +0.025/0 }}
part shaft of bar {{ seat = dia 40 {seat} }}
fit seat = shaft.seat in hub.bore {{
  joint {{
    length 30
    hub    outside 80
    shaft  solid
    {line}
  }}
}}
"#
    ))
}

#[test]
fn a_hub_at_its_limit_leaves_the_rest_to_the_shaft() {
    let run = hub_that_stays_below("115", "+0.076/+0.060", "insertion clearance 0.04");
    let card = run.evaluation.shop_cards[0];
    assert!(card.heat_outer.is_some_and(|t| t > 388.15) && card.chill_inner.is_none());
    let together = card.together.unwrap();
    // (40(1 + 23.4e-6·95) − 0.04)/40.076 = 1 + 11.7e-6·ΔT, from 20 °C.
    let celsius = together.chill_inner.unwrap() - 273.15;
    let bore = 40.0 * (1.0 + 23.4e-6 * 95.0);
    let by_hand = 20.0 + ((bore - 0.04) / 40.076 - 1.0) / 11.7e-6;
    assert!((celsius - by_hand).abs() < 1e-5, "{celsius} {by_hand}");
    assert_eq!(together.heat_outer, 388.15);
    assert_eq!(run.words().len(), 1, "{:?}", run.words());
    assert!(run.words()[0].starts_with("joining-out-of-reach"));
}

#[test]
fn what_is_missing_with_both_at_once_is_said() {
    let run = hub_that_stays_below("60", "+0.076/+0.060", "insertion clearance 0.04");
    let together = run.evaluation.shop_cards[0].together.unwrap();
    assert_eq!(together.chill_inner, None);
    let bore = 40.0 * (1.0 + 23.4e-6 * 40.0);
    let shaft = 40.076 * (1.0 - 11.7e-6 * 80.0);
    assert!((together.short * 1e3 - (0.04 - bore + shaft)).abs() < 1e-9, "{together:?}");
}

#[test]
fn only_a_shrink_joint_that_needs_heat_is_out_of_reach() {
    // Pressed in; or with so little interference that the hub goes on below its limit.
    for (seat, line) in [
        ("+0.076/+0.060", ""),
        ("+0.010/+0.002", "insertion clearance 0.02"),
        ("-0.030/-0.040", "insertion clearance 0.02"),
    ] {
        let run = hub_that_stays_below("100", seat, line);
        assert_eq!(run.words(), Vec::<String>::new(), "{seat} {line}");
    }
}

/// A long joint of a solid shaft with an exact interference of 0.02 mm.
fn long_joint(lines: &str, requirement: &str) -> Run {
    spec(&format!(
        r#"
condition day 20
part hub of light {{ bore = dia 40 exact }}
part shaft of steel {{ seat = dia 40 +0.020000000001/+0.02 }}
fit seat = shaft.seat in hub.bore {{
  joint {{
    hub    outside 80
    shaft  solid
    {lines}
  }}
  {requirement}
}}
"#
    ))
}

#[test]
fn friction_along_a_long_joint_leaves_a_band_of_pressure() {
    let run = long_joint("length 60; friction 0.18", "");
    let [band] = run.evaluation.friction_bands[..] else { panic!("one band") };
    let kappa = 0.050_231_744_45;
    assert!((band.coupling / kappa - 1.0).abs() < 1e-9, "{}", band.coupling);
    let p = run.range("seat", Quantity::Pressure, "day").0 * 1e6;
    assert_range((band.least, band.greatest), (p / (1.0 + kappa), p / (1.0 - kappa)), 1e-8);
    // In proportion to friction and length; nothing where friction is not stated.
    let run = long_joint("length 20; friction 0.09", "");
    let sixth = run.evaluation.friction_bands[0].coupling * 6.0;
    assert!((sixth / kappa - 1.0).abs() < 1e-9, "{sixth}");
    assert!(long_joint("length 60", "").evaluation.friction_bands.is_empty());
}

#[test]
fn a_requirement_that_friction_turns_over_is_warned_of() {
    let p = long_joint("length 60", "").range("seat", Quantity::Pressure, "day").0;
    let said = |share: f64, sign: &str| {
        let limit = p * share;
        let requirement = format!("require \"LJ\" pressure {sign} {limit:.6} MPa");
        let run = long_joint("length 60; friction 0.18", &requirement);
        assert!(run.verdict("LJ", "day").margin > 0.0);
        run.words().iter().any(|w| w.starts_with("friction-along-seat"))
    };
    // The band: p/1.0502 … p/0.9498.
    assert!(said(1.04, "<=") && said(1.052, "<=") && !said(1.054, "<="));
    assert!(said(0.96, ">=") && said(0.953, ">=") && !said(0.951, ">="));
}

#[test]
fn friction_that_may_hold_all_leaves_no_upper_bound() {
    let run = long_joint("length 1300; friction 0.18", "require \"LJ\" pressure <= 1000 MPa");
    assert_eq!(run.evaluation.friction_bands[0].greatest, f64::INFINITY);
    assert!(run.words().iter().any(|w| w.starts_with("friction-along-seat")));
}

fn three_rings(sleeve_bore: &str, case_bore: &str, condition: &str) -> Run {
    spec(&format!(
        r#"
{condition}
part core of steel {{
  bore    = dia 20 exact
  outside = dia 40 exact
}}
part sleeve of bronze {{
  bore    = dia 40 {sleeve_bore}
  outside = dia 50 exact
}}
part case of light {{
  bore    = dia 50 {case_bore}
  outside = dia 90 exact
}}
fit first = core.outside in sleeve.bore {{
  joint {{ length 20; core bore core.bore; sleeve outside sleeve.outside }}
}}
fit second = sleeve.outside in case.bore {{
  joint {{ length 20; sleeve bore sleeve.bore; case outside case.outside }}
}}
result closure = (core.bore after first) - core.bore
"#
    ))
}

#[test]
fn three_rings_turning() {
    let run = three_rings(
        "-0.039964431656/-0.039964431666",
        "-0.049941568365/-0.049941568375",
        "condition run 70 { speed 9000 rpm of core, sleeve, case }",
    );
    let first = run.range("first", Quantity::Pressure, "run");
    let second = run.range("second", Quantity::Pressure, "run");
    // The bores are drawn so that the interference at temperature is that of the worked values.
    assert_range((first.0, second.0), (41.473_217_10, 28.971_373_44), 1e-7);
    let closure = run.range("closure", Quantity::Value, "run").0 * 1e3 / 2.0;
    // The whole displacement of the bore's radius is 0.624 038 597 8 µm, 5.85 of it by temperature.
    assert!((closure - (0.624_038_597_8 - 5.85)).abs() < 1e-6, "{closure}");
}

#[test]
fn a_contact_that_opens_carries_nothing() {
    let run = three_rings(
        "-0.039907653689/-0.039907653699",
        "-0.011963606708/-0.011963606718",
        "condition hot 150",
    );
    let first = run.range("first", Quantity::Pressure, "hot");
    let second = run.range("second", Quantity::Pressure, "hot");
    assert_range(first, (4.046_476_689, 4.046_476_689), 1e-6);
    assert_eq!(second, (0.0, 0.0));
}

#[test]
fn preload_of_a_bolt_through_a_light_alloy_flange() {
    let run = spec(
        r#"
condition assembly 20
condition hot 150
material bolt_steel like steel { modulus { 20 degC 207 GPa; 150 degC 198 GPa } }
material flange_alloy like light { modulus { 20 degC 70 GPa; 150 degC 64 GPa } }
part bolt of bolt_steel { grip = 100 exact }
part flange of flange_alloy { thickness = 100 exact }
restraint clamp {
  squeezed  flange.thickness area 400 mm2
  stretched bolt.grip area 84.3 mm2
  preload 12 kN ±15 % at assembly
}
"#,
    );
    let force = run.range("clamp", Quantity::Force, "hot");
    assert_range(force, (24_954.228_06, 28_337.695_96), 1e-8);
}

#[test]
fn two_bars_that_close_a_gap() {
    // Beer and Johnston, Mechanics of Materials, problem 2.57: P = 217.5 kN (217 465 N recomputed).
    let run = spec(
        r#"
condition hot 116
material bronze_257 { cte 21.6 ppm/K; modulus 105 GPa; source "test" }
material light_257 { cte 23.2 ppm/K; modulus 73 GPa; source "test" }
material rigid { cte 0 ppm/K; modulus 100000 GPa; source "test" }
part left of bronze_257 { length = 350 exact }
part right of light_257 { length = 450 exact }
part walls of rigid { apart = 800.5 exact }
gap opening = walls.apart - left.length - right.length
restraint between {
  squeezed left.length area 1500 mm2
  squeezed right.length area 1800 mm2
  start gap opening
}
"#,
    );
    let force = run.range("between", Quantity::Force, "hot");
    assert_range(force, (217_465.0, 217_465.0), 1e-4);
}

#[test]
fn a_reservoir_that_loses_its_free_volume_when_warm() {
    // Volumetric expansion of the liquid against three times the linear one of the cavity.
    let run = spec(
        r#"
condition cold 0
condition hot 80
part body of light { bore = dia 60 exact; stroke = 100 exact }
fill tank {
  cavity of body = pi / 4 * body.bore^2 * body.stroke
  charge water 270 cm3
}
"#,
    );
    // Density of water at 20 and 80 °C: 998.207 and 971.790 kg/m³ (IAPWS-95 at 101.325 kPa).
    let liquid = 270.0 * 998.207 / 971.790;
    let grown = libm::pow(1.0 + 23.4e-6 * 60.0, 3.0);
    let cavity = std::f64::consts::PI / 4.0 * 3600.0 * 100.0 / 1e3 * grown;
    let expected = 1.0 - liquid / cavity;
    let found = run.range("tank", Quantity::Ullage, "hot");
    assert!((found.0 - expected).abs() < 2e-4, "{found:?} {expected}");
}
