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
    let until = ran.output.find("conditions\n").unwrap();
    insta::assert_snapshot!(&ran.output[..until]);
}
