//! Stack-ups with published answers, from the text of a spec to its figures.

use crate::support::{Run, assert_range, run};
use gapkeep::evaluate::respond;
use gapkeep::model::{ConditionId, Quantity, Unknown};

fn spec(unit: &str, body: &str) -> Run {
    run(&format!(
        "assembly \"stack\"\nlengths in {unit}\ntemperatures in degC\ncondition shop 20\n\
         material any {{ cte 11.5 ppm/K; source \"test\" }}\n{body}"
    ))
}

#[test]
fn a_shouldered_screw_may_clear_or_interfere() {
    // Shigley, Mechanical Engineering Design, 9th edition, example 1-3: w = 0.005 ± 0.010 in.
    let run = spec(
        "inch",
        "part p of any { a = 1.750 ±.003; b = .750 ±.001; c = .120 ±.005; d = .875 ±.001 }\n\
         gap w = p.a - p.b - p.c - p.d\n",
    );
    let (least, greatest) = run.range("w", Quantity::Gap, "shop");
    assert!((least + 0.005).abs() < 1e-9 && (greatest - 0.015).abs() < 1e-9);
}

#[test]
fn with_the_answer_of_the_example_the_screw_always_clears() {
    // The same example: d = 0.867 in gives a least gap of 0.003 in.
    let run = spec(
        "inch",
        "part p of any { a = 1.750 ±.003; b = .750 ±.001; c = .120 ±.005; d = .867 ±.001 }\n\
         gap w = p.a - p.b - p.c - p.d\n",
    );
    let (least, _) = run.range("w", Quantity::Gap, "shop");
    assert!((least - 0.003).abs() < 1e-9, "{least}");
}

#[test]
fn outside_diameter_of_a_seal_ring() {
    // Shigley, solutions manual, chapter 1: D_o = D_i + 2W = 4.012 ± 0.036 in.
    let run = spec(
        "inch",
        "part ring of any { inside = dia 3.734 ±.028; width = .139 ±.004 }\n\
         result outside = ring.inside + 2 * ring.width\n",
    );
    assert_range(run.range("outside", Quantity::Value, "shop"), (3.976, 4.048), 1e-12);
}

#[test]
fn ten_parts_by_worst_case_and_by_root_sum_of_squares() {
    // Common practice: ten parts of ±0.1 give ±1.0 by worst case and ±0.316 by RSS at 3σ.
    let mut body = String::new();
    let mut terms = Vec::new();
    for i in 0..10 {
        body.push_str(&format!("part p{i} of any {{ t = 10 ±0.1 }}\n"));
        terms.push(format!("p{i}.t"));
    }
    body.push_str(&format!(
        "gap sum = {} - 99 mm {{ require \"r\" 0.5 .. 1.5 by rss 3 sigma }}\n",
        terms.join(" + ")
    ));
    let run = spec("mm", &body);
    let (least, greatest) = run.range("sum", Quantity::Gap, "shop");
    assert!((least - 0.0).abs() < 1e-9 && (greatest - 2.0).abs() < 1e-9);
    let statistics = run.verdict("r", "shop").statistics.as_ref().unwrap();
    let spread = 3.0 * statistics.sigma * 1e3;
    assert!((spread - 0.316_227_766).abs() < 1e-8, "{spread}");
    // Three parts ±0.20, ±0.10, ±0.15: worst case ±0.45, RSS ±0.2693.
    let run = spec(
        "mm",
        "part p of any { a = 10 ±0.2; b = 5 ±0.1; c = 2 ±0.15 }\n\
         gap sum = p.a + p.b + p.c { require \"r\" 16 .. 18 by rss 3 sigma }\n",
    );
    assert_range(run.range("sum", Quantity::Gap, "shop"), (16.55, 17.45), 1e-12);
    let statistics = run.verdict("r", "shop").statistics.as_ref().unwrap();
    assert!((3.0 * statistics.sigma * 1e3 - 0.269_258_240).abs() < 1e-8);
}

#[test]
fn contact_angle_of_an_overrunning_clutch() {
    // K. W. Chase (Brigham Young University), one-way clutch: φ = acos((a+c)/(e−c)) = 7.0184°,
    // from memory; sensitivities −0.20788, −0.41420, +0.20632 rad/mm and the linearised worst case
    // of 0.017115 rad (0.981°) follow from the formula.
    let run = spec(
        "mm",
        "part hub of any { a = 27.645 ±0.05 }\npart roller of any { c = 11.43 ±0.01 }\n\
         part cage of any { e = 50.8 ±0.0125 }\n\
         result angle = acos((hub.a + roller.c) / (cage.e - roller.c))\n",
    );
    let figure = run.figure("angle", Quantity::Value, Some("shop"));
    let degrees = figure.range.mean.to_degrees();
    assert!((degrees - 7.0184).abs() < 5e-5, "{degrees}");
    let response =
        respond(&run.assembly, figure.subject, Quantity::Value, Some(ConditionId(0))).unwrap();
    let (_, slopes) = response.tape.gradient(&response.middle);
    for (slope, expected) in slopes.iter().zip([-0.207_88, -0.414_20, 0.206_32]) {
        assert!((slope * 1e-3 - expected).abs() < 5e-6, "{slope} {expected}");
    }
    // The true extremes are wider than the linearised ones: the angle falls away to zero.
    let half = 0.5 * (figure.range.greatest.bound - figure.range.least.bound);
    assert!(half > 0.017_115 && half < 0.018, "{half}");
}

#[test]
fn an_end_gauge_and_its_sensitivities() {
    // JCGM 100:2008, annex H.1: l = l_S + d − l_S(δα·θ + α_S·δθ). To first order the coefficient of
    // the standard does not enter; a difference of temperature enters with l_S·α_S = 575 nm/K (u of
    // 16.6 nm for 0.029 K), one of coefficients with l_S·θ = 5 nm for 1e-6/K at 0.1 K.
    let run = run("assembly \"gauge\"\nlengths in nm\ntemperatures in degC\n\
         condition bench 19.9 { block 0 ±0.05 K above }\n\
         material gauge_steel { cte 11.5 ±1 ppm/K; source \"JCGM 100, H.1\" }\n\
         part standard of gauge_steel { length = 50000623 ±75 }\n\
         part block of gauge_steel { length = 50000838 ±75 }\n\
         gap difference = block.length - standard.length\n");
    let figure = run.figure("difference", Quantity::Gap, Some("bench"));
    let response =
        respond(&run.assembly, figure.subject, Quantity::Gap, Some(ConditionId(0))).unwrap();
    let (value, slopes) = response.tape.gradient(&response.middle);
    assert!((value * 1e9 - 215.0).abs() < 1e-2, "{value}");
    let slope = |wanted: fn(&Unknown) -> bool| {
        let found = response.unknowns.iter().zip(&slopes).filter(|(u, _)| wanted(u));
        found.map(|(_, s)| s * 1e9).collect::<Vec<f64>>()
    };
    let temperature = slope(|u| matches!(u, Unknown::OwnTemperature { .. }));
    assert!((temperature[0] - 575.0).abs() < 0.1, "{temperature:?}");
    let scatter = slope(|u| matches!(u, Unknown::ExpansionScatter(_)));
    assert_eq!(scatter.len(), 2);
    assert!((scatter[0].abs() - 5.0).abs() < 1e-3 && (scatter[0] + scatter[1]).abs() < 1e-3);
}
