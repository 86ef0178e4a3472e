//! Statistics where the temperature is a range, a tolerance or a history: one assembly sees all of it,
//! so that it fails where any of its temperatures breaks a limit. Against the sum of the two normal
//! tails at the two ends, computed here.

use crate::support::{Folder, run_with};
use gapkeep::evaluate::outcome::Statistics;

/// Share of a normal distribution beyond `z` standard deviations.
fn tail(z: f64) -> f64 {
    0.5 * libm::erfc(z / std::f64::consts::SQRT_2)
}

/// Mean and standard deviation of what the rod is longer than the box, `t` K above reference; each
/// has its limits of 0.03 at 3 sigma.
fn gap(t: f64) -> (f64, f64) {
    let (rod, box_) = (1.0 + 11.7e-6 * t, 1.0 + 23.4e-6 * t);
    (100.05 * rod - 100.0 * box_, 0.01 * libm::hypot(rod, box_))
}

/// The statistics of that gap within −0.05 .. 0.16 at a condition.
fn statistics(condition: &str) -> Statistics {
    let mut folder = Folder::default();
    folder.0.insert(
        "run.csv".into(),
        "time [s],rod [degC],box [degC]\n0,20,20\n60,-40,-40\n120,80,80\n".into(),
    );
    let spec = format!(
        "assembly \"Rod in a box\"\nlengths in mm\ntemperatures in degC\n\
         material light {{ cte 23.4 ppm/K; source \"test\" }}\n\
         material heavy {{ cte 11.7 ppm/K; source \"test\" }}\n\
         part box of light {{ length = 100 ±0.03 spread normal }}\n\
         part rod of heavy {{ length = 100.05 ±0.03 spread normal }}\n\
         condition service {condition}\n\
         gap over = rod.length - box.length {{\n  \
         require \"G\" -0.05 .. 0.16 for 90 % of assemblies\n}}"
    );
    run_with(&spec, &folder).verdict("G", "service").statistics.clone().expect("statistics")
}

/// Least at 80 °C and greatest at −40 °C.
fn both_ends() -> f64 {
    let ((cold, of_cold), (hot, of_hot)) = (gap(-60.0), gap(60.0));
    tail((0.16 - cold) / of_cold) + tail((hot + 0.05) / of_hot)
}

#[test]
fn an_assembly_fails_where_any_temperature_of_a_range_breaks_a_limit() {
    for condition in ["-40 .. 80", "20 ±60", "from \"run.csv\""] {
        let found = statistics(condition);
        let (least, greatest) = found.share_interval;
        let share = both_ends();
        assert!(
            least <= share * (1.0 + 1e-9) && share * (1.0 - 1e-9) <= greatest,
            "{condition}: {share} outside {least} .. {greatest}"
        );
        // The times of a history have no order in which the gap grows, so its share is drawn; the
        // interval above is then that of a million assemblies.
        assert_eq!(found.drawn.is_some(), condition.starts_with("from"));
        if found.drawn.is_none() {
            assert!((found.share_failing / share - 1.0).abs() < 1e-9, "{condition}: {found:?}");
        }
    }
}

#[test]
fn the_worst_single_temperature_alone_would_miss_failures() {
    let (cold, hot) = (statistics("-40").share_failing, statistics("80").share_failing);
    let all = statistics("-40 .. 80").share_failing;
    assert!(all > 1.1 * cold.max(hot), "{all} {cold} {hot}");
    assert!((all / (cold + hot) - 1.0).abs() < 1e-3);
}
