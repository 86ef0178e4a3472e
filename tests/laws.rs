//! Laws that hold for every assembly: proven ranges hold every sample, corners agree with
//! enumeration, mirrored stacks negate, units change nothing, wider tolerances never narrow.

use crate::support::{Folder, Run, run, run_with};
use gapkeep::evaluate::outcome::Outcome;
use gapkeep::evaluate::respond;
use gapkeep::model::{ConditionId, Quantity, SubjectId};
use gapkeep::numeric::random::Stream;
use std::fmt::Write;

/// Even random numbers for one case.
struct Dice(Stream, u64);

impl Dice {
    fn new(seed: u64) -> Self {
        Dice(Stream::new(seed, b"assemblies"), 0)
    }
    fn unit(&mut self) -> f64 {
        self.1 += 1;
        self.0.uniform(self.1)
    }
    fn between(&mut self, a: f64, b: f64) -> f64 {
        a + (b - a) * self.unit()
    }
    fn below(&mut self, n: usize) -> usize {
        ((self.unit() * n as f64) as usize).min(n - 1)
    }
}

/// A spec with a linear stack and a bent result over a few parts, all of it at random.
fn assembly(dice: &mut Dice) -> String {
    let mut text = String::from("assembly \"random\"\nlengths in mm\ntemperatures in degC\n");
    let t = dice.between(-100.0, 200.0);
    let band = dice.between(0.0, 40.0);
    let _ = writeln!(
        text,
        "condition one {t:.2} ±{band:.2} {{ p0 {:.1} K above }}",
        dice.between(1.0, 30.0)
    );
    let _ = writeln!(text, "condition two {:.1} .. {:.1}", t - 50.0, t + band);
    let _ = writeln!(
        text,
        "material m0 {{ cte {:.2} ±{:.2} ppm/K }}\nmaterial m1 {{ cte instantaneous ±3 %, ppm/K \
         {{ -270 {:.2}; 20 {:.2}; 400 {:.2} }} }}",
        dice.between(-2.0, 30.0),
        dice.between(0.0, 3.0),
        dice.between(1.0, 20.0),
        dice.between(5.0, 25.0),
        dice.between(10.0, 40.0),
    );
    let parts = 2 + dice.below(3);
    for p in 0..parts {
        let _ = writeln!(
            text,
            "part p{p} of m{} {{ a = {:.3} ±{:.3}; b = {:.3} +{:.3}/-{:.3}; w = {:.2} deg ±{:.2} }}",
            dice.below(2),
            dice.between(1.0, 100.0),
            dice.between(0.0, 0.2),
            dice.between(1.0, 100.0),
            dice.between(0.0, 0.2),
            dice.between(0.0, 0.1),
            dice.between(-20.0, 20.0),
            dice.between(0.0, 8.0),
        );
    }
    let mut stack = String::from("p0.a - 2x p1.b");
    let mut bent = String::from("p0.a * cos(p1.w) + p1.b * sin(p0.w)");
    for p in 2..parts {
        let _ = write!(stack, " + p{p}.a - p{p}.b");
        let _ = write!(bent, " - sqrt(p{p}.a^2 + p{p}.b^2) * cos(p{p}.w)");
    }
    let _ = writeln!(
        text,
        "gap stack = {stack}\nresult bent = {bent}\nresult grown = change(p0.a - p1.a from one)"
    );
    text
}

fn bounds(run: &Run, subject: SubjectId, condition: ConditionId) -> (f64, f64) {
    let figure = run
        .evaluation
        .figures
        .iter()
        .find(|f| f.subject == subject && f.condition == Some(condition))
        .unwrap();
    (figure.range.least.bound, figure.range.greatest.bound)
}

#[test]
fn proven_ranges_hold_every_sample_of_ten_thousand_assemblies() {
    const ASSEMBLIES: u64 = 10_000;
    const SAMPLES: usize = 12;
    for seed in 0..ASSEMBLIES {
        let mut dice = Dice::new(seed);
        let text = assembly(&mut dice);
        let run = run(&text);
        for subject in run.assembly.subject_ids() {
            for condition in run.assembly.condition_ids() {
                let (least, greatest) = bounds(&run, subject, condition);
                let response =
                    respond(&run.assembly, subject, Quantity::Value, Some(condition)).unwrap();
                for _ in 0..SAMPLES {
                    let point: Vec<f64> = response
                        .ranges
                        .iter()
                        .map(|r| match dice.below(4) {
                            0 => r.lo(),
                            1 => r.hi(),
                            _ => dice.between(r.lo(), r.hi()),
                        })
                        .collect();
                    let value = response.tape.value(&point);
                    let slack = 1e-15;
                    assert!(
                        least - slack <= value && value <= greatest + slack,
                        "{text}\n{value} outside {least} .. {greatest}"
                    );
                }
            }
        }
    }
}

#[test]
fn corners_agree_with_enumeration_on_small_linear_stacks() {
    for seed in 0..200 {
        let mut dice = Dice::new(seed + 1_000_000);
        let text = assembly(&mut dice);
        let run = run(&text);
        let condition = ConditionId(0);
        let subject = SubjectId(0);
        let response = respond(&run.assembly, subject, Quantity::Gap, Some(condition)).unwrap();
        let n = response.ranges.len();
        if n > 14 {
            continue;
        }
        // The material of `m1` bends with temperature, but never so that its strain turns: a corner
        // is an extreme wherever every coefficient of expansion keeps its sign.
        let mut least = f64::INFINITY;
        let mut greatest = f64::NEG_INFINITY;
        for corner in 0..1_u32 << n {
            let point: Vec<f64> = response
                .ranges
                .iter()
                .enumerate()
                .map(|(i, r)| if corner >> i & 1 == 1 { r.hi() } else { r.lo() })
                .collect();
            let value = response.tape.value(&point);
            least = least.min(value);
            greatest = greatest.max(value);
        }
        let (low, high) = bounds(&run, subject, condition);
        // Bounds never lie inside the corners; they lie beyond only where an extreme stands inside.
        assert!(low <= least + 1e-15 && high >= greatest - 1e-15, "{text}");
        let figure = &run.evaluation.figures[0].range;
        for end in [&figure.least, &figure.greatest] {
            let on_corner = end
                .corner
                .iter()
                .zip(&response.ranges)
                .all(|((_, x), r)| *x == r.lo() || *x == r.hi());
            if on_corner {
                let reached = end.bound;
                let nearest = (reached - least).abs().min((reached - greatest).abs());
                assert!(
                    nearest <= 1e-12 * reached.abs().max(1e-3),
                    "{text}\n{reached} {least} {greatest}"
                );
            }
        }
    }
}

fn stack(first: &str, second: &str, tolerance: &str, unit: &str) -> Run {
    run(&format!(
        "assembly \"law\"\nlengths in {unit}\ntemperatures in degC\ncondition cold -40\n\
         condition room 20\ncondition hot 90 ±5\n\
         part a of aluminium_6061_t6 {{ size = {first} ±{tolerance} }}\n\
         part b of steel_c45 {{ size = {second} ±{tolerance} }}\n\
         gap g = a.size - b.size\ngap mirrored = b.size - a.size\n"
    ))
}

#[test]
fn a_mirrored_stack_negates() {
    let run = stack("50.2", "50", "0.05", "mm");
    for condition in ["cold", "room", "hot"] {
        let (a, b) = run.range("g", Quantity::Gap, condition);
        let (c, d) = run.range("mirrored", Quantity::Gap, condition);
        assert!((a + d).abs() < 1e-12 && (b + c).abs() < 1e-12);
    }
}

#[test]
fn at_the_reference_temperature_nothing_expands() {
    let run = stack("50.2", "50", "0.05", "mm");
    let (least, greatest) = run.range("g", Quantity::Gap, "room");
    assert!((least - 0.1).abs() < 1e-12 && (greatest - 0.3).abs() < 1e-12);
}

#[test]
fn the_unit_of_the_file_changes_nothing() {
    let metric = stack("50.8", "50.6", "0.0508", "mm");
    let metres = stack("0.0508", "0.0506", "0.0000508", "m");
    for condition in ["cold", "room", "hot"] {
        let (a, b) = metric.range("g", Quantity::Gap, condition);
        let (c, d) = metres.range("g", Quantity::Gap, condition);
        assert!((a - c * 1e3).abs() < 1e-11 && (b - d * 1e3).abs() < 1e-11);
    }
}

#[test]
fn a_wider_tolerance_never_narrows_the_range() {
    let mut last: Option<(f64, f64)> = None;
    for tolerance in ["0.001", "0.01", "0.05", "0.2"] {
        let range = stack("50.2", "50", tolerance, "mm").range("g", Quantity::Gap, "hot");
        if let Some((least, greatest)) = last {
            assert!(range.0 <= least && greatest <= range.1);
        }
        last = Some(range);
    }
}

#[test]
fn forty_dimensions_make_one_gap() {
    let mut text =
        String::from("assembly \"long\"\nlengths in mm\ntemperatures in degC\ncondition hot 90\n");
    let mut terms = String::from("box.depth");
    text.push_str("part box of aluminium_6061_t6 { depth = 400 ±0.1 }\n");
    for i in 0..39 {
        let _ = writeln!(text, "part p{i} of steel_c45 {{ t = 10.2 ±0.01 }}");
        let _ = write!(terms, " - p{i}.t");
    }
    let _ = writeln!(text, "gap g = {terms}");
    let run = run(&text);
    let figure = run.figure("g", Quantity::Gap, Some("hot"));
    assert!(figure.range.least.met && figure.range.greatest.met);
    assert!(figure.range.least.corner.len() >= 40);
}

#[test]
fn contributors_sum_to_the_range_across_a_contact_that_opens() {
    // Loose at one corner and tight at the other: the pressure has a kink in between.
    let run = run("assembly \"kink\"\nlengths in mm\ntemperatures in degC\n\
         condition hot 40 .. 90\n\
         part hub of aluminium_6061_t6 { bore = dia 40 +0.03/0\n outside = dia 80 ±0 }\n\
         part pin of steel_c45 { seat = dia 40 +0.055/+0.02 }\n\
         fit seat = pin.seat in hub.bore {\n  joint { hub outside hub.outside; pin solid; length 30 mm }\n  \
         require \"P\" pressure <= 1 MPa\n}");
    let verdict = run.verdict("P", "hot");
    let figure = run.figure("seat", Quantity::Pressure, Some("hot"));
    assert_eq!(figure.range.least.bound, 0.0);
    let range = figure.range.greatest.reached - figure.range.least.reached;
    let parts: f64 = verdict.contributors.iter().map(|c| c.part).sum();
    assert!((parts / range - 1.0).abs() < 1e-12, "{parts} {range}");
}

#[test]
fn the_thermal_shift_is_shared_out_part_by_part() {
    let head = "assembly \"shift\"\nlengths in mm\ntemperatures in degC\n\
         material light { cte 23.4 ppm/K; modulus 70 GPa; poisson 0.33; source \"test\" }\n\
         material heavy { cte 11.7 ppm/K; modulus 207 GPa; poisson 0.29; source \"test\" }\n\
         condition hot 80 ±5 { pin 30 K above }\ncondition room 20\n\
         part hub of light { bore = dia 40 +0.03/0\n outside = dia 80 ±0 }\n\
         part pin of heavy { seat = dia 40 +0.095/+0.08 }\n";
    let free =
        run(&format!("{head}fit seat = pin.seat in hub.bore {{ require \"C\" clearance <= 0 }}"));
    let unit = |si: f64| si * 1e3;
    let shifts = |run: &Run, id: &str| -> Vec<f64> {
        run.verdict(id, "hot").thermal_shifts.iter().map(|s| s.shift).collect()
    };
    // αΔT·d of each, middle sizes: the bore opens, the pin closes.
    let found = shifts(&free, "C");
    assert_eq!(found.len(), 2);
    assert!((unit(found[0]) - 23.4e-6 * 60.0 * 40.015).abs() < 1e-12, "{found:?}");
    assert!((unit(found[1]) + 11.7e-6 * 90.0 * 40.0875).abs() < 1e-12, "{found:?}");
    // Of what is not linear they still sum to all of it.
    let joint = run(&format!(
        "{head}fit seat = pin.seat in hub.bore {{\n  \
         joint {{ hub outside hub.outside; pin solid; length 30 mm }}\n  \
         require \"P\" pressure >= 0.1 MPa\n}}"
    ));
    let total: f64 = shifts(&joint, "P").iter().sum();
    let mean = |at| joint.figure("seat", Quantity::Pressure, Some(at)).range.mean;
    assert!((total / (mean("hot") - mean("room")) - 1.0).abs() < 1e-12);
}

#[test]
fn a_quantity_without_a_value_somewhere_never_holds() {
    // 10 ±1 over 9.5 ±0.1 is less than 1 for some, more than 1 for others; each of these is bounded
    // wherever it has a value.
    for (result, limit) in [
        ("cos(acos(a.x / a.y))", "<= 2"),
        ("sin(asin(a.x / a.y))", "-2 .. 2"),
        ("min(1, sqrt(a.x / a.y - 1))", "<= 2"),
        ("max(0, sqrt(a.x / a.y - 1))", ">= 0"),
        ("abs(sqrt(a.x / a.y - 1))", ">= 0"),
        ("(sqrt(a.x / a.y - 1))^2", ">= 0"),
        ("atan(sqrt(a.x / a.y - 1))", "<= 100 deg"),
        ("atan2(sqrt(a.x / a.y - 1), 1)", "<= 200 deg"),
    ] {
        let run = run(&format!(
            "assembly \"no value\"\nlengths in mm\ncondition shop 20\n\
             part a of steel_c45 {{ x = 10 ±1; y = 9.5 ±0.1 }}\n\
             result r = {result} {{ require \"R\" {limit} }}\n"
        ));
        let outcome = run.verdict("R", "shop").outcome;
        assert_eq!(outcome, Outcome::Undecided, "{result}");
    }
}

#[test]
fn a_tail_needs_three_over_its_share_measured_values() {
    // The rule of three, common practice: 300 values for a share of 1 per cent.
    let warned = |count: usize, asked: &str| {
        let rows: String =
            (0..count).map(|i| format!("{:.3}\n", 4.0 + 1e-3 * (i % 7) as f64)).collect();
        let mut folder = Folder::default();
        folder.0.insert("slot.csv".into(), format!("slot [mm]\n{rows}"));
        let spec = format!(
            "assembly \"t\"\nlengths in mm\ntemperatures in degC\ncondition day 20\n\
             part a of steel_c45 {{ size = 10 ±0.01 spread normal }}\n\
             part b of steel_c45 {{ slot = 4 ±0.05 spread from \"slot.csv\" }}\n\
             gap g = a.size - b.slot {{ require >= 5.9 {asked} }}"
        );
        let run = run_with(&spec, &folder);
        run.diagnostics.iter().any(|d| d.code.text() == "tail-beyond-measured")
    };
    assert!(warned(299, "for 99 % of assemblies"));
    assert!(!warned(300, "for 99 % of assemblies"));
    // One side of 3 sigma: 0.135 per cent.
    assert!(warned(2222, "by Cpk 1") && !warned(2223, "by Cpk 1"));
    assert!(!warned(10, "by worst case"));
}

#[test]
fn a_quantity_that_only_seems_to_leave_its_domain_is_decided() {
    // The argument is 1 − x/(x + y), always within 0 … 1; taken apart it goes below −1 or above 1.
    let text = |result: &str, limit: &str| {
        format!(
            "assembly \"near the edge\"\nlengths in mm\ncondition shop 20\n\
             part a of steel_c45 {{ x = 5 ±4.9; y = 3 ±2 }}\n\
             result r = {result} {{ require \"R\" {limit} }}\n"
        )
    };
    let share = "(1 - a.x / (a.x + a.y))";
    for (result, limit) in [
        (format!("sin(acos({share}))"), "<= 1"),
        (format!("asin({share})"), "0 .. 90 deg"),
        (format!("sqrt({share})"), "0 .. 1"),
        (format!("sqrt({share}) / {share}"), ">= 1"),
    ] {
        let outcome = run(&text(&result, limit)).verdict("R", "shop").outcome;
        assert_eq!(outcome, Outcome::Holds, "{result}");
    }
    // With a little more it has no value for some.
    for (result, limit) in
        [(format!("sqrt({share} - 0.1)"), ">= 0"), (format!("acos(2 * {share})"), ">= 0 deg")]
    {
        let outcome = run(&text(&result, limit)).verdict("R", "shop").outcome;
        assert_eq!(outcome, Outcome::Undecided, "{result}");
    }
}
