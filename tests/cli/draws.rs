//! Shares that are drawn: seed, number of draws, width, and the same digits on any machine.

use super::Bench;
use serde_json::Value;

/// A gap that is far from a straight line over its tolerances, so that its shares are drawn.
const BENT: &str = "\
assembly \"Wedge under a stop\"
lengths in mm

condition room 20

part body of steel_c45 {
  width = 40 ±0.2 spread normal
  slope = 60 deg ±3 spread normal
  depth = 25 ±0.3 spread normal
}
part stop of steel_c45 { size = 36 ±0.2 spread normal }

gap slack =
    body.width * cos(body.slope - 60 deg)
  + body.depth / tan(body.slope)
  - stop.size
  - 18 mm
{
  require \"W-1\" -0.8 .. 1.4 for 90 % of assemblies
  require \"W-2\" >= -1.6 for 99 % of assemblies
}
";

fn bench() -> Bench {
    Bench::new(&[("wedge.gap", BENT)])
}

/// The first requirement and the yield in JSON.
fn drawn(line: &str) -> (Value, Value) {
    let ran = bench().run(&format!("check wedge.gap --as json {line}"));
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    let spec = &value["specs"][0];
    (spec["requirements"][0].clone(), spec["assembly_yield"].clone())
}

#[test]
fn the_report_says_seed_and_number_of_draws() {
    let ran = bench().run("check wedge.gap --detail --samples 5e4 --seed 7");
    assert_eq!((ran.status, ran.errors.as_str()), (0, ""));
    let until = ran.output.find("\nconditions\n").unwrap();
    insta::assert_snapshot!(&ran.output[..until]);
    let (requirement, all) = drawn("--samples 5e4 --seed 7");
    for entry in [&requirement, &all] {
        assert_eq!((&entry["draws"], &entry["seed"]), (&50_000.into(), &7.into()));
        assert!(entry.get("width_missed").is_none());
    }
}

#[test]
fn a_seed_gives_the_same_digits_on_any_number_of_threads() {
    let line = "--samples 20000 --seed";
    let on = |threads: usize, seed: u64| {
        let pool = rayon::ThreadPoolBuilder::new().num_threads(threads).build().unwrap();
        pool.install(|| drawn(&format!("{line} {seed}")))
    };
    let one = on(1, 2);
    assert_eq!(one, on(3, 2));
    assert_ne!(one.0["share_failing"], on(1, 3).0["share_failing"]);
    let to_width = |threads: usize| {
        let pool = rayon::ThreadPoolBuilder::new().num_threads(threads).build().unwrap();
        pool.install(|| drawn("--to-width 0.4%"))
    };
    assert_eq!(to_width(1), to_width(3));
}

#[test]
fn draws_go_on_to_the_width_that_is_asked_for() {
    let (requirement, all) = drawn("--to-width 0.3%");
    for interval in [&requirement["share_failing_interval"], &all["interval"]] {
        let end = |i: usize| interval[i].as_f64().unwrap();
        assert!(end(1) - end(0) <= 0.003, "{interval}");
    }
    let draws = requirement["draws"].as_u64().unwrap();
    // 7 % failing: a width w needs p (1 - p) (2 z / w)^2 draws, z = 2.576, about 190 000.
    assert!((150_000..=400_000).contains(&draws), "{draws}");
}

#[test]
fn a_width_that_is_not_reached_is_said() {
    let ran = bench().run("check wedge.gap --detail --to-width 0.001% --samples 20000");
    let told = ran.output.replace("\n  ", " ").replace('\n', " ");
    assert!(
        told.contains("20000 draws of seed 1, the most allowed; wider than the 0.001 % asked for"),
        "{}",
        ran.output
    );
    let (requirement, all) = drawn("--to-width 0.001% --samples 20000");
    assert_eq!(requirement["width_missed"], 1e-5);
    assert_eq!(all["width_missed"], 1e-5);
}

#[test]
fn numbers_out_of_range_are_refused_with_the_range() {
    for (line, range) in [
        ("--samples 999", "from 1000 to 1e9"),
        ("--samples 1e10", "from 1000 to 1e9"),
        ("--samples -1", "from 1000 to 1e9"),
        ("--seed -1", "from 0 to 18446744073709551615"),
        ("--to-width 0", "between 0 and 100 %"),
        ("--to-width 100%", "between 0 and 100 %"),
    ] {
        let ran = bench().run(&format!("check wedge.gap {line}"));
        assert_eq!(ran.status, 2, "{line}");
        assert!(ran.errors.contains(range), "{line}: {}", ran.errors);
    }
    // A record is drawn as the tool draws on its own.
    let ran = bench().run("check wedge.gap --recorded --seed 2");
    assert!(ran.status == 2 && ran.errors.contains("cannot be used with"), "{}", ran.errors);
}

#[test]
fn help_names_the_range_and_shows_an_example() {
    let help = bench().run("check --help").output;
    for words in ["1000 to 1e9", "gapkeep check spindle.gap --to-width 0.01%", "[default: 1e6]"] {
        assert!(help.contains(words), "{words}: {help}");
    }
}
