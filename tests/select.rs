//! What `select` finds, held against evaluating every edited spec from its text, and against closed
//! forms.

use crate::support::run;
use gapkeep::evaluate::outcome::Outcome;
use gapkeep::evaluate::select::{
    Asked, Choice, NoSpacer, Obstacle, Rank, Selections, select, spacer,
};
use gapkeep::evaluate::{Options, evaluate};
use gapkeep::model::{Assembly, DimensionId};
use gapkeep::resolve::resolve;
use gapkeep::source::{Source, Sources};
use gapkeep::standards::iso286::{HOLES, Kind, Letters, SHAFTS, classes_at};
use std::collections::BTreeMap;

const HEAD: &str = r#"
assembly "selection"
lengths in mm
temperatures in degC
material light { cte 23.4 ±0.4 ppm/K; source "test" }
material steel { cte 11.7 ppm/K; source "test" }
condition cold -40
condition hot  85 ±3
"#;

/// A condition in which a part called `shaft` is warmer than the rest.
const RUNNING: &str = "condition running 60 { shaft 5 .. 12 K above }\n";

/// Few draws: what is compared is drawn alike.
fn options() -> Options {
    Options { draws: 2000, ..Options::default() }
}

/// The model of a spec in which classes may be left open.
fn assembly(text: &str) -> Assembly {
    let mut sources = Sources::default();
    let file = sources.add(Source::new("test.gap", text));
    let resolved = resolve(file, &mut sources, &crate::support::Folder::default());
    let other: Vec<&str> = resolved
        .diagnostics
        .iter()
        .filter(|d| d.severity == gapkeep::diagnostic::Severity::Error)
        .map(|d| d.code.text())
        .filter(|code| *code != "class-left-open")
        .collect();
    assert!(other.is_empty(), "{other:?}");
    resolved.assembly.unwrap()
}

fn selections(text: &str) -> (Assembly, Selections) {
    let assembly = assembly(text);
    let found = select(&assembly, Asked::Everything, &options());
    (assembly, found)
}

fn dimension(assembly: &Assembly, path: &str) -> DimensionId {
    (0..assembly.dimensions.len() as u32)
        .map(DimensionId)
        .find(|&d| assembly.path(d) == path)
        .unwrap()
}

/// The least margin, mm, where every requirement of a whole spec holds.
fn least_margin(text: &str) -> Option<f64> {
    let verdicts = evaluate(&assembly(text), &options()).verdicts;
    verdicts
        .iter()
        .all(|v| v.outcome == Outcome::Holds)
        .then(|| verdicts.iter().map(|v| v.margin * 1e3).fold(f64::INFINITY, f64::min))
}

/// Holds the classes of a choice against every class at the size, each put into the text.
fn assert_brute_force(text: &str, choice: &Choice, nominal: f64, kind: Kind) {
    let mut expected: BTreeMap<String, f64> = BTreeMap::new();
    let mut judged = 0;
    for (class, _) in classes_at(nominal, kind) {
        judged += 1;
        if let Some(margin) = least_margin(&text.replacen('?', &class.to_string(), 1)) {
            expected.insert(class.to_string(), margin);
        }
    }
    assert_eq!(choice.judged, judged);
    let found: BTreeMap<String, f64> = choice
        .serving
        .iter()
        .map(|c| (c.classes[0].0.to_string(), c.governing.margin * 1e3))
        .collect();
    assert_eq!(found.keys().collect::<Vec<_>>(), expected.keys().collect::<Vec<_>>());
    for (class, margin) in &expected {
        assert!((found[class] - margin).abs() < 1e-9, "{class}: {} {margin}", found[class]);
    }
}

fn assert_widest_first(choice: &Choice) {
    for pair in choice.serving.windows(2) {
        let (a, b) = (&pair[0], &pair[1]);
        let ordered = a.tolerance() > b.tolerance()
            || a.tolerance() == b.tolerance() && a.governing.compared >= b.governing.compared;
        assert!(ordered, "{:?} before {:?}", a.classes, b.classes);
    }
}

#[test]
fn classes_of_a_hole_left_open_are_those_that_hold_in_whole_specs() {
    let text = format!(
        r#"{HEAD}{RUNNING}
part housing of light {{ bore = dia 42 ? }}
part shaft of steel {{ seat = dia 42 0/-0.011 }}
fit race = shaft.seat in housing.bore {{
  require "A" clearance <= 0.075 at hot
  require "B" interference <= 0.060 at cold
}}
"#
    );
    let (assembly, found) = selections(&text);
    let [choice] = &found.choices[..] else { panic!("{:?}", found.choices) };
    assert_eq!(choice.dimensions, [dimension(&assembly, "housing.bore")]);
    assert_eq!(choice.requirements, [0, 1]);
    assert_brute_force(&text, choice, 42.0, Kind::Hole);
    assert!(choice.serving.len() > 10, "{}", choice.serving.len());
    assert_widest_first(choice);
    let rank = |name: &str| {
        choice.serving.iter().find(|c| c.classes[0].0.to_string() == name).map(|c| c.rank)
    };
    assert_eq!(rank("K7"), Some(Rank::Preferred));
    // Beside an open class nothing is said of tolerances that would rest on its nominal.
    assert!(found.tolerances.is_empty() && found.centrings.is_empty());
}

#[test]
fn classes_of_a_shaft_in_two_fits_meet_both_and_mark_the_preferred_fit() {
    let text = format!(
        r#"{HEAD}{RUNNING}
part hub of steel {{ bore = dia 25 H7 }}
part wheel of light {{ bore = dia 25 H8 }}
part shaft of steel {{ seat = dia 25 ? }}
fit fixed = shaft.seat in hub.bore {{ require clearance -0.010 .. 0.055 }}
fit loose = shaft.seat in wheel.bore {{ require clearance -0.040 .. 0.090 }}
"#
    );
    let (_, found) = selections(&text);
    let [choice] = &found.choices[..] else { panic!("{:?}", found.choices) };
    assert_brute_force(&text, choice, 25.0, Kind::Shaft);
    assert_widest_first(choice);
    // H7/g6 and H7/h6 are preferred fits of ANSI B4.2-1978, table 2.
    let preferred: Vec<String> = choice
        .serving
        .iter()
        .filter(|c| c.rank == Rank::PreferredFit)
        .map(|c| c.classes[0].0.to_string())
        .collect();
    assert!(preferred.contains(&"h6".to_string()), "{preferred:?}");
    assert!(preferred.iter().all(|c| ["f7", "g6", "h6", "k6"].contains(&c.as_str())));
}

#[test]
fn classes_with_a_statistical_requirement_and_a_bonus_are_those_of_whole_specs() {
    let text = format!(
        r#"{HEAD}
part housing of light {{ bore = dia 12 ? ; place = position dia 0.05 at MMC of bore; edge = 30 ±0.02 }}
part shaft of steel {{ seat = dia 12 g6; arm = 24 ±0.02 }}
fit running = shaft.seat in housing.bore {{
  require "A" clearance -0.005 .. 0.062
}}
gap web = housing.edge - housing.bore / 2 + housing.place - shaft.arm {{
  require "B" -0.12 .. 0.10
}}
gap wall = housing.edge - housing.bore / 2 - shaft.arm {{
  require "C" -0.060 .. 0.05 for 99.9 % of assemblies
}}
"#
    );
    let (_, found) = selections(&text);
    let [choice] = &found.choices[..] else { panic!("{:?}", found.choices) };
    assert_eq!(choice.requirements, [0, 1, 2]);
    assert!(!choice.serving.is_empty());
    // Of each whole spec statistics are computed anew, so that the recommended classes must do.
    let serving: Vec<_> = choice.serving.iter().map(|c| c.classes[0].0).collect();
    let mut servants = 0;
    for class in HOLES.iter().filter(|class| class.limits(12.0).is_ok()) {
        let holds = least_margin(&text.replacen('?', &class.to_string(), 1)).is_some();
        assert_eq!(holds, serving.contains(class), "{class}");
        servants += usize::from(holds);
    }
    assert!(servants > 2, "{servants}");
}

#[test]
fn a_fit_with_both_sides_open_takes_fits_of_the_two_systems() {
    let text = format!(
        r#"{HEAD}{RUNNING}
part housing of light {{ bore = dia 8 ? }}
part shaft of steel {{ seat = dia 8 ? }}
fit race = shaft.seat in housing.bore {{ require clearance 0 .. 0.055 at cold, hot }}
"#
    );
    let (assembly, found) = selections(&text);
    let [choice] = &found.choices[..] else { panic!("{:?}", found.choices) };
    let (hole, shaft) = (dimension(&assembly, "housing.bore"), dimension(&assembly, "shaft.seat"));
    assert_eq!(choice.dimensions, [hole, shaft]);
    let mut expected = Vec::new();
    let mut edited = assembly.clone();
    for h in HOLES {
        for s in SHAFTS {
            let (Ok(of_hole), Ok(of_shaft)) = (h.limits(8.0), s.limits(8.0)) else { continue };
            if h.letters != Letters::H && s.letters != Letters::H {
                continue;
            }
            for (d, limits) in [(hole, of_hole), (shaft, of_shaft)] {
                let changed = &mut edited.dimensions[d.index()];
                changed.lower = limits.lower.metres();
                changed.upper = limits.upper.metres();
            }
            let evaluation = evaluate(&edited, &options());
            if evaluation.verdicts.iter().all(|v| v.outcome == Outcome::Holds) {
                expected.push(format!("{h}/{s}"));
            }
        }
    }
    expected.sort();
    let mut shown: Vec<String> =
        choice.serving.iter().map(|c| format!("{}/{}", c.classes[0].0, c.classes[1].0)).collect();
    shown.sort();
    assert_eq!(shown, expected);
    assert!(shown.len() > 2 && shown.len() < 100, "{}", shown.len());
    assert_widest_first(choice);
}

#[test]
fn where_no_class_serves_the_deviations_that_would_are_those_of_a_hand_calculation() {
    let text = format!(
        r#"{HEAD}
part housing of steel {{ bore = dia 30 ? }}
part pin of steel {{ seat = dia 30 +0.0070/-0.0005 }}
fit snug = pin.seat in housing.bore {{ require clearance 0.00050 .. 0.00825 at reference }}
"#
    );
    let (_, found) = selections(&text);
    let choice = &found.choices[0];
    assert!(choice.serving.is_empty());
    // Bore − 0.0070 ≥ 0.0005 and bore + 0.0005 ≤ 0.00825, by hand.
    let (from, to) = choice.room.unwrap();
    assert!((from * 1e3 - 0.0075).abs() < 2e-9, "{from}");
    assert!((to * 1e3 - 0.00775).abs() < 2e-9, "{to}");
}

#[test]
fn what_cannot_be_chosen_is_said() {
    let (_, found) = selections(&format!(
        r#"{HEAD}
part housing of steel {{ bore = dia 30 ?; width = 12 ?; slot = 8 ? }}
part pin of steel {{ seat = dia 30 g6; length = 11 ±0.1 }}
fit running = pin.seat in housing.bore
gap left = housing.width - pin.length {{ require >= 0.1 }}
"#
    ));
    let obstacles: Vec<Option<Obstacle>> = found.choices.iter().map(|c| c.obstacle).collect();
    assert_eq!(
        obstacles,
        [
            Some(Obstacle::NothingRequired),
            Some(Obstacle::SideUnknown),
            Some(Obstacle::NothingRequired)
        ]
    );
}

const CLOSED: &str = r#"
part housing of light { depth = 30 ±0.05 }
part race of steel { width = 12 ±0.02 }
part ring of steel { width = 17.9 ±0.01 }
gap float = housing.depth - race.width - ring.width {
  require "F" 0.00 .. 0.45
}
"#;

#[test]
fn a_nominal_that_centres_is_that_of_a_hand_calculation() {
    let (assembly, found) = selections(&format!(
        r#"
assembly "centre"
lengths in mm
temperatures in degC
material light {{ cte 24 ppm/K; source "test" }}
material steel {{ cte 12 ppm/K; source "test" }}
condition cold -80
condition hot 120
{CLOSED}"#
    ));
    let [centring] = &found.centrings[..] else { panic!("{:?}", found.centrings) };
    // By hand: G = d(1+24e-6ΔT) − 29.9(1+12e-6ΔT); least at −80 °C (ΔT −100), greatest at 120 °C
    // (ΔT 100); below = G_least − 0, above = 0.45 − G_greatest.
    let (cold, hot) = (-100.0, 100.0);
    let grown = |x: f64, cte: f64, t: f64| x * (1.0 + cte * 1e-6 * t);
    let least = |d: f64| grown(d - 0.05, 24.0, cold) - grown(29.93, 12.0, cold);
    let greatest = |d: f64| grown(d + 0.05, 24.0, hot) - grown(29.87, 12.0, hot);
    assert!((centring.below.margin * 1e3 - least(30.0)).abs() < 1e-9);
    assert!((centring.above.margin * 1e3 - (0.45 - greatest(30.0))).abs() < 1e-9);
    let shift = 0.5 * (0.45 - greatest(30.0) - least(30.0));
    assert!((centring.shift * 1e3 - shift).abs() < 1e-9);
    // least(d) = 0.45 − greatest(d), linear in d with slopes (1 − 2.4e-3) and (1 + 2.4e-3).
    let nominal = 30.0 + shift;
    let depth = dimension(&assembly, "housing.depth");
    let by = centring.by.iter().find(|r| r.dimension == depth).unwrap();
    assert!((by.nominal * 1e3 - nominal).abs() < 1e-8, "{}", by.nominal);
    assert!((by.margin * 1e3 - least(nominal)).abs() < 1e-8);
    assert_eq!(centring.by.len(), 3);
    // The widest tolerance costs most.
    let costliest = centring.costliest.as_ref().unwrap();
    assert!((costliest.share_of_range - 0.05 / 0.08).abs() < 2e-3, "{costliest:?}");
}

#[test]
fn a_tolerance_loosened_to_its_limit_holds_and_just_beyond_fails() {
    let (assembly, found) = selections(&format!("{HEAD}{}", CLOSED.replace("0.00 ..", "-0.1 ..")));
    assert_eq!(found.tolerances.len(), 3);
    for slack in &found.tolerances {
        assert!(slack.each_side > 1e-6 && slack.each_side.is_finite(), "{slack:?}");
        assert_eq!(slack.stopped_by, Some(0));
        let held = |by: f64| {
            let mut edited = assembly.clone();
            let changed = &mut edited.dimensions[slack.dimension.index()];
            changed.lower -= by;
            changed.upper += by;
            let evaluation = evaluate(&edited, &options());
            evaluation.verdicts.iter().all(|v| v.outcome == Outcome::Holds)
        };
        assert!(held(slack.each_side));
        assert!(!held(slack.each_side + 5e-12));
    }
}

#[test]
fn a_failing_fit_has_the_classes_of_either_side_that_would_mend_it() {
    let text = |hole: &str, shaft: &str| {
        format!(
            r#"{HEAD}
part housing of steel {{ bore = dia 42 {hole} }}
part pin of steel {{ seat = dia 42 {shaft} }}
part fork of steel {{ seat = dia 42 {shaft} }}
fit running = pin.seat in housing.bore {{ require clearance 0.008 .. 0.052 }}
"#
        )
    };
    let (assembly, found) = selections(&text("H7", "h6"));
    let paths: Vec<String> = found.choices.iter().map(|c| assembly.path(c.dimensions[0])).collect();
    assert_eq!(paths, ["housing.bore", "pin.seat"]);
    assert_brute_force(&text("?", "h6"), &found.choices[0], 42.0, Kind::Hole);
    assert_brute_force(
        &text("H7", "g6").replacen("g6", "?", 1),
        &found.choices[1],
        42.0,
        Kind::Shaft,
    );
    let g6 = found.choices[1].serving.iter().find(|c| c.classes[0].0.to_string() == "g6").unwrap();
    assert_eq!(g6.rank, Rank::PreferredFit);
    // What fails now cannot be loosened.
    let bore = dimension(&assembly, "housing.bore");
    let slack = found.tolerances.iter().find(|s| s.dimension == bore).unwrap();
    assert_eq!((slack.each_side, slack.stopped_by), (0.0, Some(0)));
}

#[test]
fn parts_like_each_other_change_together() {
    let text = format!(
        r#"{HEAD}
part housing of steel {{ bore = dia 20 ? }}
part hub like housing
part pin of steel {{ seat = dia 20 h6 }}
part key of steel {{ seat = dia 20 m6 }}
fit running = pin.seat in housing.bore {{ require clearance 0 .. 0.080 }}
fit tight = key.seat in hub.bore {{ require clearance -0.030 .. 0.040 }}
"#
    );
    let (_, found) = selections(&text);
    let [choice] = &found.choices[..] else { panic!("{:?}", found.choices) };
    assert_brute_force(&text, choice, 20.0, Kind::Hole);
    assert!(!choice.serving.is_empty());
}

fn spacers(steel: &str) -> Assembly {
    run(&format!(
        r#"
assembly "spacer"
lengths in mm
temperatures in degC
material light {{ cte 23.4 ppm/K; source "test" }}
material mid {{ cte 17.3 ppm/K; source "test" }}
material steel {{ cte {steel} ppm/K; source "test" }}
condition cold -40
condition hot 100
part tube of light {{ length = 80 +0.10/0 }}
part rod of steel {{ length = 120 ±0.05 }}
part base of mid {{ length = 40 ±0.02 }}
gap left = tube.length + base.length - rod.length
"#
    ))
    .assembly
}

#[test]
fn a_spacer_makes_a_mean_the_same_at_two_conditions() {
    let assembly = spacers("17.3");
    let id = |name: &str| assembly.condition_ids().find(|&c| assembly.condition(c).name == name);
    let between = (id("cold").unwrap(), id("hot").unwrap());
    let subject = assembly.subject_ids().next().unwrap();
    let found = spacer(&assembly, dimension(&assembly, "rod.length"), subject, between).unwrap();
    // Σ α·L = 0: 23.4·80.05 + 17.3·40 = 17.3·L, by hand.
    let expected = (23.4 * 80.05 + 17.3 * 40.0) / 17.3;
    assert!((found.nominal * 1e3 - expected).abs() < 1e-6, "{} {expected}", found.nominal);
    assert!((found.mean * 1e3 - (80.05 + 40.0 - expected)).abs() < 1e-6);
    // The mean now, cold less hot: −140 K · Σ α·L.
    let now = -140e-6 * (23.4 * 80.05 + 17.3 * 40.0 - 17.3 * 120.0);
    assert!(((found.means_now.0 - found.means_now.1) * 1e3 - now).abs() < 1e-9);
    // A deviation of its own counts: the mean length of the tube lies 0.05 above its nominal.
    let tube = spacer(&assembly, dimension(&assembly, "tube.length"), subject, between).unwrap();
    let expected = 17.3 * (120.0 - 40.0) / 23.4 - 0.05;
    assert!((tube.nominal * 1e3 - expected).abs() < 1e-6);
}

#[test]
fn a_spacer_that_cannot_do_it_is_refused() {
    // A rod that does not expand has no say; with a smaller expansion on both sides none is short
    // enough.
    let assembly = spacers("17.3");
    let base = dimension(&assembly, "base.length");
    let subject = assembly.subject_ids().next().unwrap();
    let between =
        (assembly.condition_ids().next().unwrap(), assembly.condition_ids().nth(1).unwrap());
    // 23.4·80.05 + 17.3·x = 17.3·120 has x > 0; with the rod's expansion small it has none.
    assert!(spacer(&assembly, base, subject, between).is_ok());
    let stiff = spacers("5");
    let refused = spacer(&stiff, base, subject, between);
    assert!(matches!(refused, Err(NoSpacer::NoLength(_))), "{refused:?}");
}

#[test]
fn classes_of_a_pressed_shaft_meet_pressure_and_torque_besides() {
    let text = r#"
assembly "press"
lengths in mm
temperatures in degC
material light { cte 23.4 ppm/K; modulus 70 GPa; poisson 0.33; source "test" }
material steel { cte 11.7 ppm/K; modulus 207 GPa; poisson 0.29; source "test" }
condition cold -20
condition hot 60
part hub of light { bore = dia 40 H7 }
part shaft of steel { seat = dia 40 ? }
fit pressed = shaft.seat in hub.bore {
  joint { length 30; hub outside 80; shaft solid; friction 0.12 }
  require "P" pressure 5 .. 95 MPa at hot, cold
  require "T" torque >= 30 Nm at hot
  require "I" interference >= 0.020 at reference
}
"#;
    let (_, found) = selections(text);
    let [choice] = &found.choices[..] else { panic!("{:?}", found.choices) };
    assert_eq!((choice.requirements.len(), choice.obstacle), (3, None));
    let serving: Vec<_> = choice.serving.iter().map(|c| c.classes[0].0).collect();
    let mut servants = 0;
    for (class, _) in classes_at(40.0, Kind::Shaft) {
        let holds = least_margin(&text.replacen('?', &class.to_string(), 1)).is_some();
        assert_eq!(holds, serving.contains(&class), "{class}");
        servants += usize::from(holds);
    }
    assert!(servants > 2, "{servants}");
    assert_widest_first(choice);
}
