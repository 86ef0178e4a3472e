//! What text and JSON say of statistics: second order, causes, interaction, yield.

use super::Bench;
use serde_json::Value;

/// Areas whose moments are known in closed form.
const PLATE: &str = "\
assembly \"Cover plate on a frame\"
lengths in mm

condition room 20

part plate of steel_c45 {
  width = 20 ±12 spread normal
  depth = 20 ±6 spread uniform
  side = 10 ±3 spread normal
}
part frame of steel_c45 {
  width = 18 ±3 spread normal
  depth = 18 ±3 spread normal
}

result overhang = plate.width * plate.depth - frame.width * frame.depth {
  require \"A-1\" -150 mm2 .. 350 mm2 for 90 % of assemblies
}
result square = plate.side * plate.side {
  require \"A-2\" 10 mm2 .. 200 mm2 by rss 3 sigma
}
";

fn spec() -> Value {
    let ran = Bench::new(&[("plate.gap", PLATE)]).run("check plate.gap --as json --samples 1e4");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    value["specs"][0].clone()
}

fn near(value: &Value, wanted: f64) {
    let found = value.as_f64().unwrap();
    assert!((found / wanted - 1.0).abs() < 1e-6, "{found}, {wanted}");
}

#[test]
fn shares_of_variance_sum_to_one_with_the_interaction() {
    let spec = spec();
    let requirement = &spec["requirements"][0];
    // Var(XY) = μx²σy² + μy²σx² + σx²σy²; σ² is 16, 12, 1 and 1.
    let (first, interaction) = (400.0 * 16.0 + 400.0 * 12.0 + 2.0 * 324.0, 16.0 * 12.0 + 1.0);
    near(&requirement["sigma"], f64::sqrt(first));
    near(&requirement["interaction"], interaction / (first + interaction));
    let of = |list: &str| -> f64 {
        let list = requirement[list].as_array().unwrap();
        list.iter().filter_map(|c| c["share_of_variance"].as_f64()).sum()
    };
    let rest = 1.0 - requirement["interaction"].as_f64().unwrap();
    assert!((of("contributors") - rest).abs() < 1e-12);
    assert!((of("causes") - rest).abs() < 1e-12);
    let range: f64 = requirement["causes"]
        .as_array()
        .unwrap()
        .iter()
        .map(|c| c["share_of_range"].as_f64().unwrap())
        .sum();
    assert!((range - 1.0).abs() < 1e-9);
}

#[test]
fn second_order_is_given_where_it_differs() {
    let spec = spec();
    // X² of mean 10 and σ 1: mean 101, variance 400 + 2.
    let square = &spec["requirements"][1];
    near(&square["mean"], 100.0);
    near(&square["sigma"], 20.0);
    near(&square["second_order"]["mean"], 101.0);
    near(&square["second_order"]["sigma"], f64::sqrt(402.0));
    // The other one differs by 0.8 % only.
    assert!(spec["requirements"][0].get("second_order").is_none());
}

#[test]
fn the_yield_is_given_with_the_share_that_fails() {
    let all = &spec()["assembly_yield"];
    let (share, failing) = (all["share"].as_f64().unwrap(), all["share_failing"].as_f64().unwrap());
    assert!((share + failing - 1.0).abs() < 1e-15 && failing > 0.0);
}

#[test]
fn detail_says_the_same_in_words() {
    let bench = Bench::new(&[("plate.gap", PLATE)]);
    let ran = bench.run("check plate.gap --detail --samples 1e4");
    let until = ran.output.find("\nconditions\n").unwrap();
    insta::assert_snapshot!(&ran.output[..until]);
}

/// A bush whose lots of material scatter; `{a}` and `{s}` stand for their coefficients.
const BUSH: &str = "\
assembly \"Bush in a housing\"
lengths in mm

condition cold -40
condition hot  120
condition all  -40 .. 120

material alloy { cte {a} ppm/K }
material steel { cte {s} ppm/K }
part housing of alloy { bore = 80.060 ±0.015 spread normal }
part bush of steel { outside = 79.99 ±0.012 spread sorted }
gap play = housing.bore - bush.outside {
  require \"L-1\" 0.000 .. 0.190 for 99 % of assemblies
  require \"L-2\" <= 0.190 by Cpk 1.1
  require \"L-3\" <= 0.190 by rss 3 sigma
}
";

fn bush(alloy: &str, steel: &str) -> Vec<Value> {
    let text = BUSH.replace("{a}", alloy).replace("{s}", steel);
    let ran = Bench::new(&[("bush.gap", &text)]).run("check bush.gap --as json --samples 1e5");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    value["specs"][0]["requirements"].as_array().unwrap().clone()
}

#[test]
fn the_worst_lot_is_as_bad_as_the_worst_fixed_coefficients_and_no_better() {
    let requirements = bush("23 ±1.5", "12 ±0.6");
    let told = |i: usize| {
        let lot = &requirements[i]["worst_lot"];
        (lot["share_failing"].as_f64(), lot["cpk"].as_f64())
    };
    // The same assembly with every lot that a grid over the limits gives.
    let mut worst = vec![(0.0, f64::INFINITY); requirements.len()];
    for alloy in ["21.5", "22.25", "23", "23.75", "24.5"] {
        for steel in ["11.4", "11.7", "12", "12.3", "12.6"] {
            for (worst, lot) in worst.iter_mut().zip(bush(alloy, steel)) {
                let share = lot["share_failing"].as_f64().unwrap();
                let cpk = lot["cpk"].as_f64().unwrap();
                *worst = (share.max(worst.0), cpk.min(worst.1));
                assert!(lot.get("worst_lot").is_none(), "no lot scatters");
            }
        }
    }
    // L-1 and L-2 at three conditions each; L-3 asks for no share.
    for i in 0..6 {
        let (share, cpk) = told(i);
        let (share, cpk) = (share.unwrap(), cpk.unwrap());
        assert!((share - worst[i].0).abs() <= 1e-6 * worst[i].0, "{i}: {share}, {:?}", worst[i]);
        assert!((cpk / worst[i].1 - 1.0).abs() < 1e-9, "{i}: {cpk}, {:?}", worst[i]);
        assert!(share >= requirements[i]["share_failing"].as_f64().unwrap(), "{i}");
    }
    assert!((6..9).all(|i| told(i) == (None, None)));
}

#[test]
fn a_bent_response_is_drawn_in_its_worst_lot_too() {
    let text = "\
assembly \"Lever\"
lengths in mm
condition hot 120
material alloy { cte 23 ±4 ppm/K }
part lever of alloy {
  arm = 400 ±0.1 spread normal
  slope = 45 deg ±6 spread normal
}
result rise = lever.arm * cos(lever.slope - 45 deg) { require >= 400 for 80 % of assemblies }
";
    let bench = Bench::new(&[("lever.gap", text)]);
    let ran = bench.run("check lever.gap --as json --samples 2e4 --seed 3");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    let requirement = &value["specs"][0]["requirements"][0];
    let lot = &requirement["worst_lot"];
    assert_eq!((&lot["draws"], &lot["seed"]), (&20_000.into(), &3.into()));
    assert_eq!(lot["at"]["expansion scatter of lever"], -1.0);
    // Fixed at 19 ppm/K it is the same assembly, and so are its draws.
    let fixed = text.replace("23 ±4", "19");
    let ran = Bench::new(&[("lever.gap", &fixed)])
        .run("check lever.gap --as json --samples 2e4 --seed 3");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    assert_eq!(value["specs"][0]["requirements"][0]["share_failing"], lot["share_failing"]);
}

#[test]
fn detail_says_the_worst_lot() {
    let text = BUSH.replace("{a}", "23 ±1.5").replace("{s}", "12 ±0.6");
    let ran = Bench::new(&[("bush.gap", &text)]).run("check bush.gap --detail --only L-2");
    let until = ran.output.find("\nconditions\n").unwrap();
    insta::assert_snapshot!(&ran.output[..until]);
}

#[test]
fn no_yield_is_claimed_where_a_condition_could_not_be_computed() {
    let spec = "\
assembly \"Cold stack\"
lengths in mm
temperatures in degC
condition room 20
condition cold -250
part case of aluminium_6082_t6 { depth = 30.2 ±0.1 spread normal }
part block of steel_c45 { width = 30 ±0.1 spread normal }
gap play = case.depth - block.width { require >= 0.05 for 99 % of assemblies }
";
    let bench = Bench::new(&[("cold.gap", spec)]);
    let ran = bench.run("check cold.gap");
    assert!(ran.output.contains("not computed"), "{}", ran.output);
    assert!(!ran.output.contains("yield"), "{}", ran.output);
    let warm = Bench::new(&[("cold.gap", &spec.replace("cold -250", "cold -50"))]);
    assert!(warm.run("check cold.gap").output.contains("first-pass yield"));
}
