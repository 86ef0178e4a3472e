//! What must stand beside every figure of load or of joining, in every output.

use super::{Bench, HOLDS};
use serde_json::Value;

const REVIEW: &str = "stress and force support a qualified engineer's review, not replace it";
const BURNS: &str = "heat and cold burn; vapour of a coolant displaces the air to breathe";

/// A shrink fit; what is required of it takes the place of `REQUIRE`.
const SHRUNK: &str = "\
assembly \"Hub shrunk on a shaft\"
lengths in mm
temperatures in degC
condition assembly 20
condition warm     60
part hub of steel_c45 { bore = dia 40 H7; outside = dia 80 ±0.1 }
part shaft of steel_c45 { seat = dia 40 s6 }
fit seat = shaft.seat in hub.bore {
  joint { length 30; friction 0.12; hub outside hub.outside; shaft solid }
  REQUIRE
}
";

fn bench(require: &str) -> Bench {
    Bench::new(&[("hub.gap", &SHRUNK.replace("REQUIRE", require)), ("sleeve.gap", HOLDS)])
}

/// The cautions of a text: its lines that begin so.
fn said(text: &str) -> Vec<&str> {
    assert!(text.lines().all(|l| l.chars().count() <= 80), "{text}");
    text.lines().filter_map(|l| l.strip_prefix("caution: ")).collect()
}

#[test]
fn a_brief_report_ends_with_what_its_figures_call_for() {
    for (require, expected) in [
        ("require pressure >= 1 MPa", vec![REVIEW]),
        ("require stress in hub <= 80 % of yield", vec![REVIEW]),
        ("require torque >= 10 N·m", vec![REVIEW]),
        ("require axial force >= 1 kN", vec![REVIEW]),
        ("require joining temperature <= 300 degC", vec![REVIEW, BURNS]),
        ("require loosening temperature >= 100 degC", vec![REVIEW]),
        // Free sizes alone.
        ("require interference >= 0", vec![]),
    ] {
        let bench = bench(require);
        for call in ["check hub.gap", "check hub.gap --quiet", "check ."] {
            let ran = bench.run(call);
            assert_eq!(said(&ran.output), expected, "{require}: {call}\n{}", ran.output);
            let last = ran.output.lines().last().unwrap();
            assert!(!last.starts_with("caution"), "{last}");
        }
    }
    let ran = bench("require pressure >= 1 MPa").run("check sleeve.gap");
    assert_eq!(said(&ran.output), Vec::<&str>::new());
}

#[test]
fn findings_of_yield_and_of_joining_call_for_it_too() {
    // Nothing but a free size is required, and the findings show a stress and a temperature.
    let text =
        SHRUNK.replace("REQUIRE", "require interference >= 0").replace("40 s6", "40.2 ±0.01");
    let ran = Bench::new(&[("hub.gap", &text)]).run("check hub.gap");
    assert!(ran.output.contains("stress-past-yield"), "{}", ran.output);
    assert!(said(&ran.output).contains(&REVIEW), "{}", ran.output);
    let text = SHRUNK
        .replace("REQUIRE", "require interference >= 0")
        .replace("shaft solid", "shaft solid; insertion clearance 0.04")
        .replace("hub of steel_c45", "hub of aluminium_7075")
        .replace("dia 40 s6", "dia 40.12 ±0.01");
    let ran = Bench::new(&[("hub.gap", &text)]).run("check hub.gap");
    assert!(ran.output.contains("joining-out-of-reach"), "{}", ran.output);
    assert_eq!(said(&ran.output), [REVIEW, BURNS], "{}", ran.output);
}

#[test]
fn a_restraint_calls_for_review() {
    let text = "\
assembly \"Bar between walls\"
lengths in mm
condition hot 100
part bar of steel_c45 { length = 100 ±0.01 }
part frame of aluminium_6061_t6 { apart = 100 ±0.01 }
restraint held {
  squeezed bar.length area 100 mm2
  stretched frame.apart area 400 mm2
  start gap between
  require force <= 100 kN
}
gap between = frame.apart - bar.length
";
    let ran = Bench::new(&[("bar.gap", text)]).run("check bar.gap");
    assert_eq!(said(&ran.output), [REVIEW], "{}", ran.output);
}

#[test]
fn a_detailed_report_says_it_where_it_lists_its_grounds() {
    let ran = bench("require joining temperature <= 300 degC").run("check hub.gap --detail");
    let (_, after) = ran.output.split_once("\ncautions\n").expect("a section of cautions");
    assert!(after.contains("a qualified engineer's review"), "{after}");
    assert!(after.contains("can burn"), "{after}");
}

#[test]
fn programs_read_the_cautions_of_each_spec() {
    let bench = bench("require interference >= 0");
    let json: Value = serde_json::from_str(&bench.run("check . --as json").output).unwrap();
    let yaml: Value = serde_yaml::from_str(&bench.run("check . --as yaml").output).unwrap();
    assert_eq!(json["specs"][0]["cautions"], yaml["specs"][0]["cautions"]);
    let of = |spec: usize| json["specs"][spec]["cautions"].to_string();
    // The results hold pressures and stresses, whatever is required.
    assert!(of(0).contains("a qualified engineer's review"), "{}", of(0));
    assert!(of(0).contains("can burn"), "{}", of(0));
    assert!(!of(1).contains("engineer"), "{}", of(1));
}

#[test]
fn a_record_of_such_figures_says_it_and_no_other() {
    let bench = bench("require interference >= 0");
    bench.run("record .");
    let record: Value = serde_yaml::from_str(&bench.text("hub.record.yaml")).unwrap();
    assert_eq!(record["cautions"], serde_json::json!([REVIEW, BURNS]));
    assert!(!bench.text("sleeve.record.yaml").contains("caution"));
    assert_eq!(bench.run("check . --recorded").status, 0);
}

#[test]
fn selections_say_it_where_loads_decide() {
    let open = "require pressure >= 1 MPa";
    let text = SHRUNK.replace("REQUIRE", open).replace("dia 40 s6", "dia 40 ?");
    let bench = Bench::new(&[("hub.gap", &text)]);
    let ran = bench.run("select hub.gap");
    assert_eq!(said(&ran.output), [REVIEW], "{}", ran.output);
    let json: Value = serde_json::from_str(&bench.run("select hub.gap --as json").output).unwrap();
    assert_eq!(json["cautions"], serde_json::json!([REVIEW]));
    let free = Bench::new(&[("sleeve.gap", &HOLDS.replace("dia 42 g6", "dia 42 ?"))]);
    assert_eq!(said(&free.run("select sleeve.gap").output), Vec::<&str>::new());
    let json: Value =
        serde_json::from_str(&free.run("select sleeve.gap --as json").output).unwrap();
    assert_eq!(json["cautions"], serde_json::json!([]));
}

#[test]
fn the_pressure_of_a_closed_liquid_calls_for_a_relief_valve() {
    let text = include_str!("../../specs/assemblies/hydraulic-test-cell.gap");
    let bench = Bench::new(&[("cell.gap", text)]);
    let trapped = "trapped liquid can burst its vessel: relief valve; pressure codes apply";
    let ran = bench.run("check cell.gap");
    assert_eq!((ran.status, said(&ran.output)), (0, vec![REVIEW, trapped]));
    let detail = bench.run("check cell.gap --detail").output.replace("\n  ", " ");
    assert!(detail.contains("the codes for pressure equipment come first"), "{detail}");
    assert_eq!(bench.run("record cell.gap").status, 0);
    assert!(bench.text("cell.record.yaml").contains(trapped));
    // Full where nothing is limited: an error, and the same caution.
    let unlimited = text.replace("require \"HC-1\" pressure <= 40 MPa", "require ullage >= -5 %");
    let unlimited = unlimited.replace("require \"HC-2\" stress in cell <= 60 % of yield", "");
    let ran = Bench::new(&[("cell.gap", &unlimited)]).run("check cell.gap");
    assert!(ran.output.contains("error: `oil` is full"), "{}", ran.output);
    assert_eq!(said(&ran.output), [REVIEW, trapped]);
}
