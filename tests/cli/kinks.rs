//! Statistics of a smallest, a largest and a distance: no straight line through the means tells them.

use super::Bench;
use serde_json::Value;

/// The requirement on a result of `a` (10 ±0.01), `b` (10.1 ±1) and `c` (1 ±0.1), all normal.
fn requirement(result: &str, require: &str) -> Value {
    let spec = format!(
        "assembly \"Kinks\"\nlengths in mm\ntemperatures in degC\ncondition room 20\n\
         part a of steel_c45 {{ w = 10 ±0.01 spread normal }}\n\
         part b of steel_c45 {{ w = 10.1 ±1 spread normal }}\n\
         part c of steel_c45 {{ w = 1 ±0.1 spread normal }}\n\
         result kink = {result} {{ require {require} }}\n"
    );
    let ran = Bench::new(&[("kink.gap", &spec)]).run("check kink.gap --as json");
    let value: Value = serde_json::from_str(&ran.output).unwrap();
    value["specs"][0]["requirements"][0].clone()
}

/// Holds a failing share against the exact one, with what a million draws leave open.
fn assert_share(result: &str, limit: &str, exact: f64) {
    let found = requirement(result, &format!("{limit} for 90 % of assemblies"));
    let share = found["share_failing"].as_f64().unwrap();
    assert!((share - exact).abs() < 0.002, "{result} {limit}: {share}, {exact}");
    assert_eq!(found["verdict"], if exact > 0.1 { "fails" } else { "holds" }, "{result}");
}

#[test]
fn shares_are_those_of_both_sides() {
    // Tables of the normal distribution: below -0.6 sigma lie 0.27425.
    assert_share("min(a.w, b.w)", ">= 9.9 mm", 0.274_25);
    assert_share("max(a.w, b.w - 0.2 mm)", "<= 10.1 mm", 0.274_25);
    assert_share("abs(c.w - 1.01 mm)", "<= 0.01 mm", 0.5 + 0.274_25);
    // A side that never decides changes nothing.
    assert_share("min(a.w, b.w + 5 mm)", ">= 9.99 mm", 0.001_35);
    assert_share("max(a.w, 9.5 mm)", "<= 10.01 mm", 0.001_35);
}

#[test]
fn mean_deviation_and_capability_are_those_of_the_draws() {
    // min(x, z) of a fixed x and a normal z: mean x - s (p(k) + k P(k)), with k = (x - m)/s.
    let found = requirement("min(a.w, b.w)", ">= 9.9 mm by Cpk 1");
    let number = |key: &str| found[key].as_f64().unwrap();
    // k = -0.3, p = 0.38139, P = 0.38209: 10 - 0.33333 (0.38139 - 0.11463) = 9.9111.
    assert!((number("mean") - 9.9111).abs() < 1e-3, "{found}");
    assert!((number("cpk") - (9.9111 - 9.9) / (3.0 * number("sigma"))).abs() < 2e-3, "{found}");
    assert_eq!(found["verdict"], "fails");
    assert_eq!(requirement("min(a.w, b.w)", ">= 9.9 mm by rss 3 sigma")["verdict"], "fails");
    assert_eq!(requirement("min(a.w, b.w)", ">= 9.3 mm by rss 3 sigma")["verdict"], "holds");
}
