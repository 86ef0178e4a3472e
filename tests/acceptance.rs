//! Whole specs with known answers, worked out independently in double precision with numpy from
//! the formulas of `docs/method.md` (relative 1e-8 unless stated).

use crate::support::{Run, assert_range, run};
use gapkeep::evaluate::outcome::Outcome;
use gapkeep::model::Quantity;

const HEAD: &str = r#"
assembly "acceptance"
lengths in mm
temperatures in degC
material light { cte 23.4 ppm/K; source "test" }
material steel { cte 11.7 ppm/K; source "test" }
"#;

fn spec(body: &str) -> String {
    format!("{HEAD}{body}")
}

#[test]
fn squeeze_of_a_stretched_seal_ring() {
    let run = run(&spec(
        r#"
condition cold -40
material rubber { cte 112 ppm/K; source "test" }
part ring of rubber {
  section = 3.43 .. 3.63
  inside  = dia 24.74 .. 25.24
}
part cap of light { bore = dia 31.60 .. 31.65 }
part plug of steel { groove = dia 25.80 .. 25.85 }
result squeeze =
    1 - (cap.bore - plug.groove) / 2 * sqrt(plug.groove / ring.inside) / ring.section
{
  require "S" 10 % .. 20 %
}
"#,
    ));
    let found = run.range("squeeze", Quantity::Value, "cold");
    assert_range(found, (0.124_566_840_3, 0.194_302_704_1), 1e-8);
    let verdict = run.verdict("S", "cold");
    assert_eq!(verdict.outcome, Outcome::Holds);
    // Shares of the range, per cent, to 1e-3.
    for (contributor, expected) in verdict.contributors.iter().zip([68.280, 12.050, 10.414, 9.255])
    {
        let share = contributor.share_of_range * 100.0;
        assert!((share - expected).abs() < 1e-3, "{share} {expected}");
    }
}

fn run_curved(steel: &str, curved: &str) -> Run {
    run(&spec(&format!(
        "material steel_like {{ cte {steel} over -60 .. 160 degC; source \"test\" }}\n\
         material curved {{\n  cte instantaneous {curved}ppm/K {{ -60 4; 160 15 }}\n  \
         source \"test\"\n}}\n{CURVED}"
    )))
}

/// The tube's strain is 8e-6·t + 2.5e-8·t², t from 20 °C, so its coefficient is a straight line.
const CURVED: &str = r#"
condition service -40 .. 150
part rod of steel_like { length = 100.10 ±0.01 }
part tube of curved { length = 100 ±0.01 }
gap between = rod.length - tube.length {
  require "G" <= 0.130
}
"#;

#[test]
fn a_gap_whose_extreme_lies_inside_the_temperature_range() {
    let run = run_curved("11.5 ppm/K", ", ");
    let found = run.range("between", Quantity::Gap, "service");
    assert_range(found, (0.049_941_8, 0.132_345_565_5), 1e-7);
    // The window, to 1e-6 K.
    let verdict = run.verdict("G", "service");
    assert_eq!(verdict.outcome, Outcome::Fails);
    let window = verdict.window.as_ref().expect("a window");
    let mut ends: Vec<f64> = window
        .intervals
        .iter()
        .flat_map(|&(a, b)| [a, b])
        .filter(|x| x.is_finite())
        .map(|x| x - 273.15)
        .collect();
    ends.sort_by(f64::total_cmp);
    assert_eq!(ends.len(), 2, "{window:?}");
    assert!((ends[0] - 59.644_018).abs() < 2e-6, "{ends:?}");
    assert!((ends[1] - 120.908_037).abs() < 2e-6, "{ends:?}");
}

#[test]
fn the_same_gap_with_scatter_of_both_materials() {
    let run = run_curved("11.5 ppm/K ±2 %", "±2 %, ");
    let found = run.range("between", Quantity::Gap, "service");
    assert_range(found, (0.047_780_48, 0.135_551_322_7), 1e-7);
}

#[test]
fn position_at_maximum_material_and_play() {
    let run = run(&spec(
        r#"
condition hot 85
part plate of light {
  edge  = 20 ±0.05
  hole  = internal dia 8 +0.1/0
  place = position dia 0.2 at MMC of hole
}
part pin of steel { size = dia 7.96 .. 7.98 }
fit pin_in_plate = pin.size in plate.hole
result web = plate.edge + plate.place - plate.hole / 2
result sway = play(pin_in_plate)
"#,
    ));
    assert_range(run.range("web", Quantity::Value, "hot"), (15.773_955_75, 16.174_564_15), 1e-8);
    assert_range(run.range("sway", Quantity::Value, "hot"), (-0.073_133_26, 0.073_133_26), 1e-6);
}

#[test]
fn two_gaps_that_share_a_dimension() {
    let run = run(&spec(
        r#"
condition shop 20
part a of steel { size = 10.09 ±0.05 }
part b of steel { size = 6 ±0.03 }
part c of steel { size = 4 ±0.02 }
part d of steel { size = 10.03 ±0.04 }
gap first = a.size - b.size - c.size { require "1" >= 0 for 99.99 % of assemblies }
gap second = a.size - d.size { require "2" >= 0 for 99 % of assemblies }
"#,
    ));
    let share = |id: &str| run.verdict(id, "shop").statistics.as_ref().unwrap().share_failing;
    assert!((share("1") / 5.934_554_475e-6 - 1.0).abs() < 1e-8, "{}", share("1"));
    assert!((share("2") / 2.468_409_278e-3 - 1.0).abs() < 1e-8, "{}", share("2"));
    let either = run.evaluation.assembly_yield.unwrap();
    let (low, high) = either.share_interval;
    assert!(low <= 2.471_091_960e-3 && 2.471_091_960e-3 <= high, "{either:?}");
}

#[test]
fn a_sum_of_normal_uniform_and_triangular_sizes() {
    let mut body = String::from("condition shop 20\npart p of steel {\n");
    let spreads = [
        ("", vec![0.05, 0.05, 0.02, 0.1, 0.03, 0.03]),
        (" spread uniform", vec![0.02, 0.01, 0.03]),
        (" spread triangular", vec![0.02, 0.05, 0.04]),
    ];
    let mut terms = Vec::new();
    for (spread, widths) in &spreads {
        for width in widths {
            let name = format!("d{}", terms.len());
            body.push_str(&format!("  {name} = 10 ±{width}{spread}\n"));
            terms.push(format!("p.{name}"));
        }
    }
    body.push_str(&format!("}}\ngap sum = {} - 120 mm {{\n", terms.join(" + ")));
    let expected =
        [("0.1", 0.036_836_973_87), ("0.2", 1.484_450_188e-4), ("0.3", 1.748_628_886e-8)];
    for (limit, _) in &expected {
        body.push_str(&format!("  require \"{limit}\" <= {limit} for 99 % of assemblies\n"));
    }
    body.push_str("}\n");
    let run = run(&spec(&body));
    for (limit, share) in expected {
        let found = run.verdict(limit, "shop").statistics.as_ref().unwrap().share_failing;
        assert!((found / share - 1.0).abs() < 1e-8, "{limit}: {found} {share}");
    }
}
