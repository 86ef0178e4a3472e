//! Proven extremes of what is not linear against a million drawn assemblies each: no draw may lie
//! beyond a bound, and at the corner that is reported the formula must touch it.
//!
//! A sixth of the draws of each unknown stand on each end of its range, the rest between them, so that
//! faces and corners of the box are met, where extremes mostly stand.

use crate::support::{Run, assembly, response, run};
use gapkeep::model::{PartId, Quantity};
use gapkeep::numeric::extremes::extremes;
use gapkeep::numeric::random::Stream;
use gapkeep::numeric::tape::{Column, Scratch};
use gapkeep::numeric::{Interval, Tape};

const DRAWS: usize = 1_000_000;

/// Draws made at once: their columns take little memory.
const BLOCK: usize = 20_000;

/// The least and the greatest of a formula over draws from a box, and how many were drawn.
fn sampled(tape: &Tape, ranges: &[Interval]) -> (f64, f64, usize) {
    let streams: Vec<Stream> =
        (0..ranges.len()).map(|i| Stream::new(7, &i.to_le_bytes())).collect();
    let mut columns = vec![vec![0.0; BLOCK]; ranges.len()];
    let mut scratch = Scratch::default();
    let (mut least, mut greatest, mut count) = (f64::INFINITY, f64::NEG_INFINITY, 0);
    for first in (0..DRAWS).step_by(BLOCK) {
        for ((column, stream), range) in columns.iter_mut().zip(&streams).zip(ranges) {
            let (lo, width) = (range.lo(), range.hi() - range.lo());
            for (k, x) in column.iter_mut().enumerate() {
                let share = 1.5 * stream.uniform((first + k) as u64) - 0.25;
                *x = lo + width * share.clamp(0.0, 1.0);
            }
        }
        let inputs: Vec<Column<'_>> = columns.iter().map(|c| Column::Drawn(c)).collect();
        tape.replay_columns(&inputs, BLOCK, &mut scratch, |_, _, values| {
            let Column::Drawn(values) = values else { panic!("nothing was drawn") };
            for &x in values {
                assert!(!x.is_nan());
                least = if x < least { x } else { least };
                greatest = if x > greatest { x } else { greatest };
            }
            count += values.len();
        });
    }
    (least, greatest, count)
}

/// Holds both ends of a figure against a million draws and against its own corners.
#[track_caller]
fn hold(run: &Run, subject: &str, quantity: Quantity, condition: &str) {
    let range = &run.figure(subject, quantity, Some(condition)).range;
    assert!(range.least.met, "{subject} {quantity:?} at {condition}: {range:?}");
    hold_greatest(run, subject, quantity, condition);
}

/// As [`hold`], of a figure whose least may be no more than a bound.
#[track_caller]
fn hold_greatest(run: &Run, subject: &str, quantity: Quantity, condition: &str) {
    let figure = run.figure(subject, quantity, Some(condition));
    let asked = response(&run.assembly, subject, quantity, Some(condition));
    let (least, greatest, count) = sampled(&asked.tape, &asked.ranges);
    let what = format!("{subject} {quantity:?} at {condition}");
    assert_eq!(count, DRAWS);
    let range = &figure.range;
    assert!(range.greatest.met, "{what}: {range:?}");
    assert!(
        range.least.bound <= least && greatest <= range.greatest.bound,
        "{what}: drawn {least:e} .. {greatest:e}, proven {:e} .. {:e}",
        range.least.bound,
        range.greatest.bound
    );
    // The draws must have been worth making: they cover most of what is proven.
    let proven = range.greatest.bound - range.least.bound;
    assert!(greatest - least > 0.6 * proven, "{what}: {:e} of {proven:e}", greatest - least);
    for end in [&range.least, &range.greatest].into_iter().filter(|end| end.met) {
        let corner: Vec<f64> = asked
            .unknowns
            .iter()
            .map(|unknown| {
                let stated = end.corner.iter().find(|(u, _)| u == unknown);
                stated.unwrap_or_else(|| panic!("{what}: {unknown:?} has no place")).1
            })
            .collect();
        let inside = corner.iter().zip(&asked.ranges).all(|(x, r)| r.contains(*x));
        assert!(inside, "{what}: {corner:?} lies outside of {:?}", asked.ranges);
        let value = asked.tape.value(&corner);
        let apart = (value - end.bound).abs();
        assert!(apart <= 1e-6 * end.bound.abs(), "{what}: {value:e} at {:e}", end.bound);
    }
}

/// A hub of a light alloy on a steel shaft, of library materials with their curves and scatter.
const TWO_RINGS: &str = r#"
assembly "two rings"
lengths in mm
temperatures in degC
condition assembly 20
condition warm 60 ±10 { hub 0 .. 5 K above shaft }
part hub of aluminium_6082_t6 {
  bore    = dia 40 +0.025/0
  outside = dia 80 exact
  width   = 30 ±0.2
}
part shaft of steel_c45 {
  seat = dia 40 +0.090/+0.070
  bore = dia 20 exact
}
fit seat = shaft.seat in hub.bore {
  joint {
    length hub.width
    friction 0.12 .. 0.18
    hub outside hub.outside
    shaft bore shaft.bore
    hub Rz 4 um
    shaft Rz 6 um
    insertion clearance 0.04
  }
}
"#;

#[test]
fn a_joint_of_two_rings_lies_within_what_is_proven() {
    let run = run(TWO_RINGS);
    for quantity in [
        Quantity::Pressure,
        Quantity::Stress(PartId(0)),
        Quantity::Stress(PartId(1)),
        Quantity::Torque,
        Quantity::AxialForce,
    ] {
        hold(&run, "seat", quantity, "warm");
    }
}

#[test]
fn bounds_of_a_box_a_twentieth_smaller_would_be_seen_through() {
    let joint = assembly(TWO_RINGS);
    for quantity in [Quantity::Pressure, Quantity::Stress(PartId(0)), Quantity::Torque] {
        let asked = response(&joint, "seat", quantity, Some("warm"));
        let smaller: Vec<Interval> = asked
            .ranges
            .iter()
            .map(|r| Interval::new(r.lo() + 0.025 * r.width(), r.hi() - 0.025 * r.width()))
            .collect();
        let wrong = extremes(&asked.tape, &smaller, 1e-9);
        let (least, greatest, _) = sampled(&asked.tape, &asked.ranges);
        assert!(least < wrong.least.bound && wrong.greatest.bound < greatest, "{quantity:?}");
    }
}

/// The reported temperature of a joint, °C.
fn temperature(quantity: Quantity) -> f64 {
    run(TWO_RINGS).figure("seat", quantity, None).range.greatest.bound - 273.15
}

/// The clearance of the joint in a condition of its own, mm: least and greatest proven and drawn.
fn clearance(condition: &str) -> ((f64, f64), (f64, f64)) {
    let run = run(&format!("{TWO_RINGS}\n{condition}"));
    let asked = response(&run.assembly, "seat", Quantity::Clearance, Some("then"));
    let (least, greatest, count) = sampled(&asked.tape, &asked.ranges);
    assert_eq!(count, DRAWS);
    (run.range("seat", Quantity::Clearance, "then"), (least * 1e3, greatest * 1e3))
}

#[test]
fn a_hub_at_its_joining_temperature_clears_every_shaft_and_one_just() {
    let hot = temperature(Quantity::JoiningTemperature);
    let (proven, drawn) = clearance(&format!("condition then 20 {{ hub {hot:.9} }}"));
    // A ten-millionth of a kelvin is how near the temperature is sought: 1e-10 mm.
    assert!(drawn.0 >= 0.04 - 1e-9, "{drawn:?}");
    assert!((proven.0 - 0.04).abs() <= 1e-6 * 0.04, "{proven:?}");
    let cooler = hot - 1e-4 * (hot - 20.0);
    let (proven, _) = clearance(&format!("condition then 20 {{ hub {cooler:.9} }}"));
    assert!(proven.0 < 0.04, "{proven:?}");
}

#[test]
fn a_joint_at_its_loosening_temperature_holds_every_pair_and_one_just() {
    let hot = temperature(Quantity::LooseningTemperature);
    let (proven, drawn) = clearance(&format!("condition then {hot:.9}"));
    // 0.8·(4 + 6) µm of roughness are pressed flat before the joint holds.
    assert!(drawn.1 <= -0.008 + 1e-9, "{drawn:?}");
    assert!((proven.1 + 0.008).abs() <= 1e-6 * 0.04, "{proven:?}");
    let hotter = hot + 1e-4 * (hot - 20.0);
    let (proven, _) = clearance(&format!("condition then {hotter:.9}"));
    assert!(proven.1 > -0.008, "{proven:?}");
}

#[test]
fn three_turning_rings_lie_within_what_is_proven() {
    let run = run(r#"
assembly "three rings"
lengths in mm
temperatures in degC
condition run 70 ±20 {
  case 0 .. 10 K below core
  speed 9000 rpm ±5 % of core, sleeve, case
}
part core of steel_c45 { bore = dia 20 exact; outside = dia 40 +0.060/+0.045 }
part sleeve of bronze_cusn8 { bore = dia 40 +0.016/0; outside = dia 50 +0.075/+0.055 }
part case of aluminium_6082_t6 { bore = dia 50 +0.016/0; outside = dia 90 exact }
fit first = core.outside in sleeve.bore {
  joint { length 20; core bore core.bore; sleeve outside sleeve.outside }
}
fit second = sleeve.outside in case.bore {
  joint { length 20; sleeve bore sleeve.bore; case outside case.outside }
}
result closure = (core.bore after first) - core.bore
"#);
    hold(&run, "first", Quantity::Pressure, "run");
    hold(&run, "second", Quantity::Pressure, "run");
    hold(&run, "first", Quantity::Stress(PartId(0)), "run");
    hold(&run, "second", Quantity::Stress(PartId(2)), "run");
    hold(&run, "closure", Quantity::Value, "run");
    // Pressed on both faces, over thirteen unknowns: the search gives up, but near to the end.
    let sleeve = &run.figure("first", Quantity::Stress(PartId(1)), Some("run")).range;
    let asked = response(&run.assembly, "first", Quantity::Stress(PartId(1)), Some("run"));
    let (least, greatest, _) = sampled(&asked.tape, &asked.ranges);
    assert!(sleeve.least.bound <= least && greatest <= sleeve.greatest.bound, "{sleeve:?}");
    assert!(sleeve.greatest.bound < 1.01 * sleeve.greatest.reached, "{sleeve:?}");
    assert!(sleeve.least.bound > 0.6 * sleeve.least.reached, "{sleeve:?}");
}

#[test]
fn magnets_between_core_and_sleeve_lie_within_what_is_proven() {
    let run = run(include_str!("../specs/assemblies/magnet-sleeve.gap"));
    for (quantity, subject) in [
        (Quantity::Pressure, "seat"),
        (Quantity::Pressure, "grip"),
        (Quantity::Stress(PartId(2)), "grip"),
    ] {
        hold(&run, subject, quantity, "cold");
        hold(&run, subject, quantity, "hot");
    }
    // What presses in the bore and what presses on the outside undo one another here.
    for condition in ["assembly", "cold"] {
        hold(&run, "grip", Quantity::Stress(PartId(1)), condition);
    }
    hold_greatest(&run, "grip", Quantity::Stress(PartId(1)), "hot");
}

#[test]
fn a_force_behind_a_gap_lies_within_what_is_proven() {
    let run = run(r#"
assembly "bars behind a gap"
lengths in mm
temperatures in degC
condition hot 120 ±15 { frame 5 .. 15 K below rod }
part rod of aluminium_6082_t6 { length = 300 ±0.1 }
part pad of bronze_cusn8 { length = 200 ±0.1 }
part frame of steel_c45 { apart = 500.5 ±0.05 }
gap opening = frame.apart - rod.length - pad.length
restraint between {
  squeezed rod.length area 400 mm2
  squeezed pad.length area 300 mm2
  stretched frame.apart stiffness 150 kN/mm ±10 %
  start gap opening
}
"#);
    hold(&run, "between", Quantity::Force, "hot");
    hold(&run, "between", Quantity::Stress(PartId(0)), "hot");
    hold(&run, "between", Quantity::Separation, "hot");
}
