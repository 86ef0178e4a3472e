//! `select`: what is shown, what is refused, and what is written into a spec.

use super::Bench;
use serde_json::Value;

const OPEN: &str = "\
assembly \"Idler on a bearing\"   # the bearing is bought
lengths in mm

condition cold -40
condition hot   85 ±3

part housing of aluminium_6061_t6 { bore = dia 42 ?   because \"to be chosen\" }\r
part bearing of steel_100cr6 { outside = dia 42 0/-0.011 }

fit race = bearing.outside in housing.bore {
  require \"R-1\" clearance <= 0.060 at hot
  require \"R-2\" interference <= 0.070 at cold
}
";

const STACK: &str = "\
assembly \"Stack\"
lengths in mm

condition cold -40
condition hot   85

part tube of aluminium_6061_t6 { depth = 80 +0.1/0; slot = 12 H8 }
part rod of steel_c45 { length = 60 ±0.05 }
part ring of stainless_304 { width = 19.7 ±0.02; key = 12 h9 }

gap float = tube.depth - rod.length - ring.width { require \"F\" 0.1 .. 0.8 }
fit keyed = ring.key in tube.slot { require \"K\" clearance 0 .. 0.050 }
";

#[test]
fn classes_of_a_size_left_open() {
    let bench = Bench::new(&[("open.gap", OPEN)]);
    let ran = bench.run("select open.gap");
    assert_eq!((ran.status, ran.errors.as_str()), (0, ""));
    assert!(ran.output.lines().all(|l| l.chars().count() <= 80));
    insta::assert_snapshot!(ran.output);
    // The same, class by class, for programs.
    let ran = bench.run("select open.gap --as json");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    assert_eq!(value["schema"], "gapkeep/select/1");
    assert_eq!(value["classes"][0]["dimensions"][0], "housing.bore");
    let serving = value["classes"][0]["serving"].as_array().unwrap();
    let all = bench.run("select open.gap --all").output;
    assert_eq!(all.lines().filter(|l| l.contains(" mm  R-")).count(), serving.len());
}

#[test]
fn a_stack_and_a_failing_fit() {
    let bench = Bench::new(&[("stack.gap", STACK)]);
    let ran = bench.run("select stack.gap");
    // No class of one side alone mends the fit.
    assert_eq!((ran.status, ran.errors.as_str()), (1, ""));
    assert!(ran.output.lines().all(|l| l.chars().count() <= 80));
    insta::assert_snapshot!(ran.output);
    let ran = bench.run("select stack.gap --spacer ring.width --between cold,hot --of float");
    assert_eq!(ran.status, 0);
    // What there is only one of need not be named.
    let short = bench.run("select stack.gap --spacer ring.width");
    assert_eq!((short.status, short.output), (0, ran.output.clone()));
    insta::assert_snapshot!(ran.output);
}

#[test]
fn a_spacer_in_two_gaps_or_between_three_conditions_asks_which() {
    let two = format!("{STACK}gap other = tube.depth - ring.width {{ require >= 0 }}\n");
    let three = STACK.replace("condition hot", "condition warm 40\ncondition hot");
    let bench = Bench::new(&[("two.gap", &two), ("three.gap", &three)]);
    let ran = bench.run("select two.gap --spacer ring.width");
    assert_eq!((ran.status, ran.output.as_str()), (2, ""));
    assert!(ran.errors.contains("add `--of` and one of `float`, `other`"), "{}", ran.errors);
    let ran = bench.run("select three.gap --spacer ring.width");
    assert_eq!((ran.status, ran.output.as_str()), (2, ""));
    assert!(ran.errors.contains("two of `cold`, `warm`, `hot`"), "{}", ran.errors);
}

#[test]
fn writing_replaces_the_mark_and_nothing_else() {
    let bench = Bench::new(&[("open.gap", OPEN)]);
    let ran = bench.run("select open.gap --write");
    assert_eq!((ran.status, ran.errors.as_str()), (0, "wrote M8 for housing.bore in open.gap\n"));
    assert_eq!(bench.text("open.gap"), OPEN.replacen('?', "M8", 1));
    assert_eq!(std::fs::read_dir(bench.path()).unwrap().count(), 1);
    assert_eq!(bench.run("check open.gap").status, 0);
    // What is written can be chosen again, by name only.
    let again = bench.run("select open.gap --write");
    assert_eq!(again.status, 2);
    let loose = OPEN.replacen('?', "H8", 1);
    bench.put("open.gap", &loose);
    assert_eq!(bench.run("select open.gap --for housing.bore --write").status, 0);
    assert_eq!(bench.text("open.gap"), loose.replacen("H8", "M8", 1));
}

#[test]
fn both_sides_of_a_fit_are_written_together() {
    let text = "assembly \"Pair\"\ncondition cold -40\n\
        part tube of steel_c45 { bore = dia 12 ? }\npart rod of steel_c45 { seat = dia 12 ? }\n\
        fit slide = rod.seat in tube.bore { require \"K\" clearance 0 .. 0.050 mm }\n";
    let bench = Bench::new(&[("pair.gap", text)]);
    let ran = bench.run("select pair.gap --write");
    assert_eq!(ran.status, 0, "{}", ran.errors);
    let written = bench.text("pair.gap");
    assert!(!written.contains('?'));
    assert_eq!(bench.run("check pair.gap").status, 0, "{written}");
}

#[test]
fn what_cannot_be_written_leaves_the_file_as_it_was() {
    let none = OPEN.replace("<= 0.060", "<= -0.060");
    let stated = STACK.replace("12 h9", "12 0/-0.03");
    let bench = Bench::new(&[("none.gap", &none), ("stated.gap", &stated)]);
    for (call, reason) in [
        ("select none.gap --write", "no class serves for `housing.bore`"),
        ("select stated.gap --write", "no class is left open"),
        ("select stated.gap --for ring.key --write", "`ring.key`"),
    ] {
        let ran = bench.run(call);
        assert_eq!(ran.status, 2, "{call}");
        assert!(ran.errors.contains(reason), "{call}: {}", ran.errors);
        assert!(ran.errors.contains("help: "), "{call}: {}", ran.errors);
    }
    assert_eq!((bench.text("none.gap"), bench.text("stated.gap")), (none, stated));
}

#[test]
fn wrong_calls_are_refused_with_a_way_out() {
    let bench = Bench::new(&[("stack.gap", STACK)]);
    for call in [
        "select missing.gap",
        "select stack.gap --for tube.dept",
        "select stack.gap --for tub.depth",
        "select stack.gap --spacer ring.width --between cold --of float",
        "select stack.gap --spacer ring.width --between cold,warm --of float",
        "select stack.gap --spacer ring.width --between cold,hot --of flat",
        "select stack.gap --spacer ring.key --between cold,hot --of float",
    ] {
        let ran = bench.run(call);
        assert_eq!((ran.status, ran.output.as_str()), (2, ""), "{call}");
        assert!(ran.errors.contains("help: "), "{call}: {}", ran.errors);
    }
    let broken = STACK.replace("tube.depth -", "tube.dept -");
    bench.put("broken.gap", &broken);
    let ran = bench.run("select broken.gap");
    assert_eq!(ran.status, 2);
    assert!(ran.errors.contains("unknown-dimension"), "{}", ran.errors);
}

#[test]
fn a_spacer_whose_mean_is_beyond_a_limit_says_so() {
    let spec = "\
assembly \"Play\"
lengths in mm
temperatures in degC
condition cold -30
condition warm  90
part hub of aluminium_6082_t6 { depth = 60 ±0.1 }
part ring of steel_100cr6 { width = 20 ±0.1 }
part spacer of pom_c { length = 39.5 ±0.05 }
gap play = hub.depth - ring.width - spacer.length {
  require \"P-1\" -1 .. 1
  require \"P-2\" -50 .. 50
}
";
    let bench = Bench::new(&[("play.gap", spec)]);
    let line = "select play.gap --spacer spacer.length --between cold,warm --of play";
    let ran = bench.run(line);
    assert!(ran.output.contains("such a mean is beyond P-1: change other sizes"), "{}", ran.output);
    assert!(ran.output.lines().all(|l| l.chars().count() <= 80), "{}", ran.output);
    let json = bench.run(&format!("{line} --as json")).output;
    let json: Value = serde_json::from_str(&json).unwrap();
    assert_eq!(json["spacer"]["beyond"], serde_json::json!(["P-1"]));
    let wide = spec.replace("-1 .. 1", "-60 .. 60");
    let ran = Bench::new(&[("play.gap", &wide)]).run(line);
    assert!(ran.output.contains("at both") && !ran.output.contains("beyond"), "{}", ran.output);
}
