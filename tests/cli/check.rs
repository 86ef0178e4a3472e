//! `check`: what goes where, which specs, which requirements, and the exit status.

use super::{Bench, HOLDS, fails};
use gapkeep::cli::Environment;
use serde_json::Value;

#[test]
fn a_spec_that_holds_is_short_and_exits_with_0() {
    let ran = Bench::new(&[("sleeve.gap", HOLDS)]).run("check sleeve.gap");
    assert_eq!((ran.status, ran.errors.as_str()), (0, ""));
    insta::assert_snapshot!(ran.output);
}

#[test]
fn a_spec_that_fails_points_at_its_line_and_exits_with_1() {
    let ran = Bench::new(&[("sleeve.gap", &fails())]).run("check sleeve.gap");
    assert_eq!((ran.status, ran.errors.as_str()), (1, ""));
    insta::assert_snapshot!(ran.output);
}

#[test]
fn detail_tells_what_the_figures_are_made_of() {
    let ran = Bench::new(&[("sleeve.gap", &fails())]).run("check sleeve.gap --detail");
    insta::assert_snapshot!(ran.output);
}

#[test]
fn colour_repeats_what_words_say() {
    let bench = Bench::new(&[("sleeve.gap", &fails())]);
    let coloured = bench.run("check sleeve.gap --color always").output;
    let plain = bench.run("check sleeve.gap").output;
    assert!(coloured.contains("\u{1b}[1;31m") || coloured.contains("\u{1b}[31;1m"));
    let mut stripped = String::new();
    let mut rest = coloured.as_str();
    while let Some(begin) = rest.find("\u{1b}[") {
        stripped.push_str(&rest[..begin]);
        let end = begin + rest[begin..].find('m').unwrap() + 1;
        rest = &rest[end..];
    }
    stripped.push_str(rest);
    assert_eq!(stripped, plain);
}

#[test]
fn colour_follows_the_call_then_the_environment_then_the_terminal() {
    let bench = Bench::new(&[("sleeve.gap", HOLDS)]);
    let pipe = bench.environment();
    let terminal = Environment { columns: Some(80), ..pipe.clone() };
    let coloured = |line: &str, environment: &Environment| {
        bench.run_with(line, "", environment.clone()).output.contains('\u{1b}')
    };
    let call = "check sleeve.gap";
    assert!(!coloured(call, &pipe));
    assert!(coloured(call, &terminal));
    assert!(!coloured(call, &Environment { no_color: true, ..terminal.clone() }));
    assert!(coloured(call, &Environment { force_color: true, ..pipe.clone() }));
    assert!(!coloured(call, &Environment { capable: false, ..terminal.clone() }));
    assert!(!coloured("check sleeve.gap --color never", &terminal));
    assert!(coloured("check sleeve.gap --color always", &pipe));
}

#[test]
fn mistakes_exit_with_2_and_three_of_them_give_three_findings() {
    let text = HOLDS
        .replace("of steel_c45", "of stel_c45")
        .replace("condition hot  85", "condition hot  8,5")
        .replace("pin.size in sleeve.bore", "pin.size in sleeve.boor");
    let ran = Bench::new(&[("sleeve.gap", &text)]).run("check sleeve.gap");
    assert_eq!(ran.status, 2);
    insta::assert_snapshot!(ran.output);
}

#[test]
fn a_folder_is_walked_in_the_order_of_names_without_parts_of_others() {
    let bench = Bench::new(&[
        ("specs/b.gap", HOLDS),
        ("specs/a/z.gap", &fails()),
        ("specs/parts.gap", "part spare of steel_c45 { size = 3 ±0.1 }\n"),
        ("specs/notes.txt", "assembly"),
    ]);
    let ran = bench.run("check specs --as json");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    let files: Vec<&str> =
        value["specs"].as_array().unwrap().iter().map(|s| s["file"].as_str().unwrap()).collect();
    assert_eq!(files, ["specs/a/z.gap", "specs/b.gap"]);
    assert_eq!(ran.status, 1);
    let text = bench.run("check specs").output;
    assert!(text.contains("holds  specs/b.gap  Sleeve on a pin\n"), "{text}");
}

#[test]
fn standard_input_is_a_spec() {
    let bench = Bench::new(&[]);
    let ran = bench.run_with("check -", HOLDS, bench.environment());
    assert_eq!(ran.status, 0);
    assert!(ran.output.contains("<stdin>, sizes at"), "{}", ran.output);
}

#[test]
fn several_outputs_go_each_to_its_file() {
    let bench = Bench::new(&[("sleeve.gap", &fails())]);
    let ran = bench.run("check sleeve.gap --as text --out r.txt --out r.json --as yaml");
    assert_eq!(ran.status, 1);
    assert!(ran.output.starts_with("schema: gapkeep/1\n"));
    assert!(bench.text("r.txt").contains("FAILS"));
    let json: Value = serde_json::from_str(&bench.text("r.json")).unwrap();
    let yaml: Value = serde_yaml::from_str(&ran.output).unwrap();
    assert_eq!(json["specs"][0]["findings"], yaml["specs"][0]["findings"]);
    assert_eq!(json["summary"], yaml["summary"]);
    assert_eq!(json["summary"]["fail"], 1);
    let quiet = bench.run("check sleeve.gap --out r.txt");
    assert_eq!(quiet.output, "");
    assert!(quiet.errors.starts_with("2 cases: 1 fails, 1 holds"), "{}", quiet.errors);
}

#[test]
fn outputs_that_cannot_be_told_apart_are_refused() {
    let bench = Bench::new(&[("sleeve.gap", HOLDS)]);
    for call in ["check sleeve.gap --as text --as json", "check sleeve.gap --out report.doc"] {
        let ran = bench.run(call);
        assert_eq!((ran.status, ran.output.as_str()), (2, ""), "{call}");
        assert!(ran.errors.contains("help: "), "{}", ran.errors);
    }
}

#[test]
fn only_and_at_leave_what_is_asked_for() {
    let bench = Bench::new(&[("sleeve.gap", &fails())]);
    assert_eq!(bench.run("check sleeve.gap --at room").status, 0);
    assert_eq!(bench.run("check sleeve.gap --only S-?").status, 1);
    assert_eq!(bench.run("check sleeve.gap --only slide --at hot").status, 1);
    let ran = bench.run("check sleeve.gap --at warm");
    assert_eq!(ran.status, 2);
    assert!(ran.errors.contains("the conditions are `hot`, `room`"), "{}", ran.errors);
    assert_eq!(bench.run("check sleeve.gap --only T-*").status, 2);
}

#[test]
fn a_thin_margin_is_warned_of_and_exits_with_1() {
    let bench = Bench::new(&[("sleeve.gap", HOLDS)]);
    assert_eq!(bench.run("check sleeve.gap --warn-below 10%").status, 0);
    let ran = bench.run("check sleeve.gap --warn-below 0.95");
    assert_eq!(ran.status, 1);
    assert!(ran.output.contains("thin-margin"), "{}", ran.output);
    assert_eq!(bench.run("check sleeve.gap --warn-below lots").status, 2);
}

#[test]
fn a_concession_counts_up_to_its_day() {
    let text = fails().replace(
        "0 .. 0.060",
        "0 .. 0.060\n    concession \"C-1\" accepts 0.120 until 2027-03-31 approved \"chief engineer\" \
         because \"first lot\"",
    );
    let bench = Bench::new(&[("sleeve.gap", &text)]);
    assert_eq!(bench.run("check sleeve.gap --today 2027-03-31").status, 0);
    assert_eq!(bench.run("check sleeve.gap --today 2027-04-01").status, 1);
    assert_eq!(bench.run("check sleeve.gap --today 2027-02-30").status, 2);
}

#[test]
fn what_cannot_be_read_is_said_and_the_rest_is_checked() {
    let bench = Bench::new(&[("sleeve.gap", HOLDS)]);
    let ran = bench.run("check missing.gap sleeve.gap");
    assert_eq!(ran.status, 2);
    assert!(ran.output.contains("both cases hold"), "{}", ran.output);
    assert!(ran.errors.contains("cannot read `missing.gap`: there is no such file"));
}

#[test]
fn nothing_outside_the_root_is_read() {
    let bench = Bench::new(&[
        (
            "specs/sleeve.gap",
            &HOLDS.replace("lengths in mm", "use \"../secret.gap\"\nlengths in mm"),
        ),
        ("secret.gap", "part spare of steel_c45 { size = 3 ±0.1 }\n"),
    ]);
    let ran = bench.run("check specs/sleeve.gap --root specs");
    assert_eq!(ran.status, 2);
    assert!(ran.output.contains("file-outside"), "{}", ran.output);
    assert_eq!(bench.run("check secret.gap --root specs").status, 2);
}

#[test]
fn no_pressure_at_all_is_a_plain_0_without_a_strip() {
    let spec = "assembly \"Reservoir\"\nlengths in mm\ntemperatures in degC\ncondition hot 90\n\
                part body of aluminium_6061_t6 { bore = dia 60 H8; stroke = 85 ±0.3 }\n\
                fill oil {\n  cavity of body = pi/4 * body.bore^2 * body.stroke\n  \
                charge hydraulic_oil 205 cm3 ±2 %\n}\n";
    let ran = Bench::new(&[("oil.gap", spec)]).run("check oil.gap --detail");
    let after = ran.output.split_once("  pressure, MPa\n").unwrap().1;
    let row = after.lines().next().unwrap();
    assert_eq!(row.split_whitespace().collect::<Vec<_>>(), ["hot", "0", "0", "0"]);
    // Under each other with the figures above.
    let ullage = ran.output.split_once("  ullage, %\n").unwrap().1.lines().next().unwrap();
    let end = |row: &str, word: &str| row.find(word).unwrap() + word.len();
    let first = ullage.split_whitespace().nth(1).unwrap();
    assert_eq!(end(row, " 0"), end(ullage, first), "{ullage}\n{row}");
}

#[test]
fn a_cavity_that_may_be_full_is_no_error_when_its_pressure_is_not_asked_for() {
    let spec = "assembly \"Accumulator\"\nlengths in mm\ntemperatures in degC\ncondition hot 60\n\
                part body of steel_c45 { bore = dia 60 H8; outside = dia 90 h8 }\n\
                fill oil {\n  cavity of body 240 cm3\n  \
                wall bore body.bore outside body.outside\n  charge hydraulic_oil 238 cm3\n  \
                require \"U\" ullage <= 5 %\n  require \"P\" pressure <= 60 MPa\n}\n";
    let bench = Bench::new(&[("oil.gap", spec)]);
    for call in ["check oil.gap", "check oil.gap --only U", "check oil.gap --only P"] {
        let ran = bench.run(call);
        assert_eq!(ran.status, 0, "{call}: {}", ran.output);
        assert!(ran.output.contains("note: `oil` is full at `hot`"), "{call}: {}", ran.output);
    }
}
