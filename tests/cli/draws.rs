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

/// Two conditions whose temperatures are random, a load, lots with the name of a part, and two fills:
/// everything that may be random, in one order.
const CONDITIONS: [&str; 2] = [
    "condition warm 60 ±30 spread uniform { body 20 ±15 K above spread uniform }\n",
    "condition hot 90 ±30 spread normal { body 30 ±15 K above spread uniform; \
     oil 20 ±15 K above spread uniform }\n",
];
const PARTS: [&str; 3] = [
    "part body of soft { slope = 60 deg ±3 spread normal; width = 400 ±0.2 spread normal }\n",
    "part stop of soft lot \"body\" { size = 396 ±0.2 spread normal\n\
     load -90 kN ±60 kN spread uniform over 350 mm2 at warm\n\
     load -80 kN ±60 kN spread uniform over 350 mm2 at hot }\n",
    "part tank of soft { bore = dia 80 ±2 spread normal; depth = 60 ±1 spread normal }\n",
];
const SUBJECTS: [&str; 3] = [
    "gap slack = body.width * cos(body.slope - 60 deg) + 25 mm / tan(body.slope) - stop.size \
     - 18 mm\n{ require \"S-1\" >= 4 for 90 % of assemblies }\n",
    "fill oil { cavity of tank = pi/4 * tank.bore^2 * tank.depth\n\
     charge thin 240 cm3 ±4 % spread uniform\n\
     require \"F-1\" ullage >= 2 % for 90 % of assemblies }\n",
    "fill grease { cavity of tank = pi/4 * tank.bore^2 * tank.depth\n\
     charge thin 235 cm3 ±4 % spread uniform\n\
     require \"F-2\" ullage >= 3 % for 90 % of assemblies }\n",
];

/// What is drawn of a spec in which lists stand as the three orders say: share and draws by
/// requirement and condition, in the order of their names.
fn drawn_in_order(conditions: &[usize], parts: &[usize], subjects: &[usize]) -> Vec<String> {
    let materials = "\
material soft { cte 60 ±30 ppm/K; modulus 20 GPa ±20 %; poisson 0.33 }
material thin { cte 900 ±300 ppm/K }
";
    let mut text =
        format!("assembly \"In some order\"\nlengths in mm\ntemperatures in degC\n{materials}");
    conditions.iter().for_each(|&i| text.push_str(CONDITIONS[i]));
    parts.iter().for_each(|&i| text.push_str(PARTS[i]));
    subjects.iter().for_each(|&i| text.push_str(SUBJECTS[i]));
    let bench = Bench::new(&[("order.gap", &text)]);
    let ran = bench.run("check order.gap --as json --samples 20000");
    let value: Value =
        serde_json::from_str(&ran.output).unwrap_or_else(|_| panic!("{}", ran.errors));
    let spec = &value["specs"][0];
    let requirements = spec["requirements"].as_array().unwrap_or_else(|| panic!("{}", ran.output));
    let mut lines: Vec<String> = requirements
        .iter()
        .map(|r| format!("{} {} {} {}", r["id"], r["condition"], r["share_failing"], r["draws"]))
        .collect();
    lines.sort();
    lines.push(spec["assembly_yield"].to_string());
    lines
}

#[test]
fn the_order_of_statements_changes_no_drawn_digit() {
    let first = drawn_in_order(&[0, 1], &[0, 1, 2], &[0, 1, 2]);
    assert_eq!(first.len(), 7);
    // All are drawn, and none is a share that any stream would give.
    for line in &first[..6] {
        assert!(line.ends_with(" 20000"), "{line}");
        assert!(!line.contains(" 0.0 ") && !line.contains(" 1.0 "), "{line}");
    }
    assert_eq!(first, drawn_in_order(&[1, 0], &[0, 1, 2], &[0, 1, 2]));
    assert_eq!(first, drawn_in_order(&[0, 1], &[2, 1, 0], &[0, 1, 2]));
    assert_eq!(first, drawn_in_order(&[0, 1], &[1, 2, 0], &[2, 0, 1]));
    assert_eq!(first, drawn_in_order(&[1, 0], &[2, 0, 1], &[1, 2, 0]));
}
