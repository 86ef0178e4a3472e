//! Sums of mixed distributions against `tests/data/mixed_sums.json`, whose shares
//! `tests/scripts/mixed_sums.py` computes with mpmath and scipy by another way.

use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::probability::{Term, above, below};
use serde_json::Value;

/// A number of the file, which writes them as text so that no reader rounds them first.
fn number(value: &Value) -> f64 {
    value.as_str().and_then(|text| text.parse().ok()).expect("a number written as text")
}

fn term(value: &Value) -> Term {
    let of = |key: &str| number(&value[key]);
    let distribution = match value["kind"].as_str().expect("a kind") {
        "normal" => Distribution::normal(0.0, of("sigma")),
        "uniform" => Distribution::uniform(0.0, of("half")),
        "triangular" => Distribution::triangular(0.0, of("half")),
        "trapezoid" => Distribution::trapezoid(0.0, of("base"), of("top")),
        "sorted" => Distribution::sorted(0.0, of("sigma"), of("lower"), of("upper")),
        "measured" => {
            let values = value["values"].as_array().expect("a list");
            let values: Vec<f64> = values.iter().map(number).collect();
            Distribution::measured(&values, of("resolution"))
        }
        other => panic!("no distribution is called {other}"),
    };
    (of("coefficient"), distribution.expect("sound"))
}

#[test]
fn shares_agree_with_an_independent_way() {
    let cases: Value =
        serde_json::from_str(include_str!("../data/mixed_sums.json")).expect("valid JSON");
    let cases = cases.as_array().expect("a list");
    assert!(cases.len() > 50);
    let mut wrong = vec![];
    for case in cases {
        let terms: Vec<Term> = case["terms"].as_array().expect("a list").iter().map(term).collect();
        let (limit, want) = (number(&case["limit"]), number(&case["above"]));
        let got = above(&terms, limit).expect("moment functions exist");
        let other = below(&terms, limit).expect("moment functions exist");
        let relative = if want > 1e-18 { 1e-9 * want } else { 1e-18 };
        let error = (got.share - want).abs();
        let truly_bounded = error <= got.error + 4.0 * f64::EPSILON * want;
        let whole = (got.share + other.share - 1.0).abs() <= 1e-15 + got.error + other.error;
        if error > relative || !truly_bounded || !whole {
            wrong.push(format!("{} above {limit}: {got:?}, want {want:e}", case["name"]));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}
