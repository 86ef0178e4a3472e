//! The smaller commands: `limits`, `materials`, `tidy`, `completions`, `man`, and the help texts.

use super::{Bench, HOLDS};

#[test]
fn limits_at_reference_and_at_a_temperature() {
    let bench = Bench::new(&[]);
    let pair = "--materials aluminium_6061_t6,steel_c45 --at -40";
    let ran = bench.run(&format!("limits 42 H7/g6 {pair}"));
    assert_eq!(ran.status, 0, "{}", ran.errors);
    insta::assert_snapshot!(ran.output);
}

#[test]
fn limits_that_are_none_are_refused_with_a_way_out() {
    let bench = Bench::new(&[]);
    for call in [
        "limits 42 Q7",
        "limits 42 g6/g6",
        "limits 42 H7/g6/g6",
        "limits forty H7",
        "limits -42 H7",
        "limits 5000 H7",
        "limits 42 H7 --materials steel_c45,steel_c45 --at 85",
        "limits 42 H7/g6 --materials steel_c45 --at 85",
        "limits 42 H7/g6 --materials stel_c45,steel_c45 --at 85",
        "limits 42 H7/g6 --materials steel_c45,steel_c45 --at 85}",
        "limits 42 H7/g6 --materials steel_c45,steel_c45 --at -400",
    ] {
        let ran = bench.run(call);
        assert_eq!((ran.status, ran.output.as_str()), (2, ""), "{call}");
        assert!(ran.errors.contains("help: "), "{call}: {}", ran.errors);
    }
}

#[test]
fn materials_are_listed_searched_and_shown() {
    let bench = Bench::new(&[]);
    let all = bench.run("materials").output;
    assert!(all.lines().count() > 50);
    assert!(all.lines().all(|l| l.chars().count() <= 80));
    let found = bench.run("materials bearing").output;
    assert!(found.contains("steel_100cr6"), "{found}");
    let one = bench.run("materials stainless_304").output;
    assert!(one.contains("ppm/K") && one.contains("modulus"), "{one}");
    assert!(one.lines().all(|l| l.chars().count() <= 80), "{one}");
    let none = bench.run("materials unobtainium");
    assert_eq!(none.status, 2);
    assert!(none.errors.contains("help: "));
}

#[test]
fn tidy_lays_out_in_place_and_check_changes_nothing() {
    let untidy = HOLDS.replace("condition room 20", "condition   room\t20   # as drawn");
    let bench =
        Bench::new(&[("a.gap", &untidy), ("parts.gap", "part x of steel_c45 {a=3 +-0.1}\n")]);
    let checked = bench.run("tidy --check .");
    assert_eq!((checked.status, bench.text("a.gap")), (1, untidy.clone()));
    assert_eq!(checked.errors, "would change a.gap\nwould change parts.gap\n");
    assert_eq!(bench.run("tidy .").status, 0);
    assert!(bench.text("a.gap").contains("# as drawn"));
    assert!(bench.text("parts.gap").contains("3 ±0.1"));
    assert_eq!(bench.run("tidy --check .").status, 0);
    let piped = bench.run_with("tidy -", &untidy, bench.environment());
    assert_eq!(piped.output, bench.text("a.gap"));
}

#[test]
fn tidy_leaves_a_file_with_mistakes_alone() {
    let bench = Bench::new(&[("a.gap", "part x of { a = 3,5 }\n")]);
    let ran = bench.run("tidy a.gap");
    assert_eq!(ran.status, 2);
    assert_eq!(bench.text("a.gap"), "part x of { a = 3,5 }\n");
    assert!(ran.errors.contains("a.gap:1:"), "{}", ran.errors);
}

#[test]
fn every_command_has_help_with_an_example() {
    let bench = Bench::new(&[]);
    for command in ["check", "record", "limits", "materials", "tidy", "completions"] {
        let ran = bench.run(&format!("{command} --help"));
        assert_eq!(ran.status, 0);
        assert!(ran.output.contains(&format!("  gapkeep {command} ")), "{}", ran.output);
        assert!(ran.errors.is_empty());
    }
    assert!(bench.run("--help").output.contains("Exit status: 0"));
    assert!(bench.run("--version").output.starts_with("gapkeep "));
}

#[test]
fn a_wrong_call_exits_with_2_and_says_so_on_standard_error() {
    let bench = Bench::new(&[]);
    for call in ["", "chek x", "check", "check x --as tex", "materials a b"] {
        let ran = bench.run(call);
        assert_eq!((ran.status, ran.output.as_str()), (2, ""), "{call}");
        assert!(!ran.errors.is_empty());
    }
}

#[test]
fn completions_and_man_know_every_command() {
    let bench = Bench::new(&[]);
    let man = bench.run("man").output;
    for command in ["check", "record", "limits", "materials", "tidy"] {
        for shell in ["bash", "zsh", "fish", "powershell", "elvish"] {
            let text = bench.run(&format!("completions {shell}")).output;
            assert!(text.contains(command), "{shell} {command}");
        }
        assert!(man.contains(&format!("GAPKEEP {}", command.to_uppercase())), "{command}");
    }
}
