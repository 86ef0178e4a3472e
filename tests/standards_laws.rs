//! Laws of the standards' tables that hold at every size, on sizes drawn at random.

use gapkeep::standards::iso286::{Class, Grade, Kind, Letters, Reason, fit};
use gapkeep::standards::iso2768;
use proptest::prelude::*;
use proptest::sample::select;

/// Sizes of the whole system, as dense at the small end as at the great, with the ends of steps among them.
fn nominal() -> impl Strategy<Value = f64> {
    let drawn = (-0.5..3.498f64).prop_map(|exponent| libm::pow(10.0, exponent));
    let ends = select(vec![1.0, 3.0, 6.0, 14.0, 18.0, 50.0, 180.0, 315.0, 500.0, 560.0, 3150.0]);
    prop_oneof![drawn, ends]
}

fn class() -> impl Strategy<Value = Class> {
    (
        select(vec![Kind::Hole, Kind::Shaft]),
        select(Letters::ALL.to_vec()),
        select(Grade::all().collect::<Vec<_>>()),
    )
        .prop_map(|(kind, letters, grade)| Class { kind, letters, grade })
}

proptest! {
    #[test]
    fn a_class_has_limits_in_order_or_a_reason_and_a_way_out(class in class(), nominal in nominal()) {
        match class.limits(nominal) {
            Ok(limits) => {
                prop_assert!(limits.lower < limits.upper);
                let bare = Class { letters: Letters::H, ..class }.limits(nominal).unwrap();
                prop_assert_eq!(limits.tolerance(), bare.tolerance(), "the grade alone makes it");
            }
            Err(refused) => {
                prop_assert!(refused.reason != Reason::SizeOutside);
                prop_assert!(!refused.alternatives.is_empty());
                for other in &refused.alternatives {
                    prop_assert!(other.limits(nominal).is_ok(), "{other} at {nominal} mm");
                    prop_assert_eq!(other.kind, class.kind);
                }
            }
        }
    }

    #[test]
    fn a_coarser_grade_of_a_clearance_class_holds_the_finer(class in class(), nominal in nominal()) {
        prop_assume!(class.letters <= Letters::Js);
        let coarser = Grade::all().find(|&grade| grade > class.grade);
        let Some(coarser) = coarser.map(|grade| Class { grade, ..class }) else { return Ok(()) };
        if let (Ok(fine), Ok(coarse)) = (class.limits(nominal), coarser.limits(nominal)) {
            prop_assert!(coarse.lower <= fine.lower && fine.upper <= coarse.upper);
            prop_assert!(coarse.tolerance() > fine.tolerance());
        }
    }

    #[test]
    fn a_size_that_came_through_metres_or_inches_takes_the_same_limits(
        class in class(),
        nominal in nominal(),
    ) {
        let by_metres = nominal / 1000.0 * 1000.0;
        let by_inches = nominal / 25.4 * 0.0254 * 1000.0;
        let direct = class.limits(nominal).ok();
        prop_assert_eq!(class.limits(by_metres).ok(), direct);
        prop_assert_eq!(class.limits(by_inches).ok(), direct);
    }

    #[test]
    fn the_span_of_a_fit_is_the_sum_of_its_tolerances(
        hole in class(),
        shaft in class(),
        nominal in nominal(),
    ) {
        let (hole, shaft) =
            (Class { kind: Kind::Hole, ..hole }, Class { kind: Kind::Shaft, ..shaft });
        if let Ok(found) = fit(nominal, hole, shaft) {
            let tolerances = found.hole.tolerance() + found.shaft.tolerance();
            prop_assert_eq!(found.greatest() - found.least(), tolerances);
            prop_assert_eq!(found.span(), tolerances);
        }
    }

    #[test]
    fn over_500_mm_a_hole_mirrors_the_shaft(class in class(), nominal in 500.001..3150.0f64) {
        prop_assume!(class.letters != Letters::J);
        let limits = |kind| Class { kind, ..class }.limits(nominal).ok();
        let hole = limits(Kind::Hole);
        let shaft = limits(Kind::Shaft);
        prop_assert_eq!(
            hole.map(|h| (h.lower, h.upper)),
            shaft.map(|s| (-s.upper, -s.lower))
        );
    }

    #[test]
    fn no_spelling_of_a_class_brings_the_reader_down(text in "\\PC{0,6}") {
        if let Ok(class) = Class::parse(&text) {
            prop_assert_eq!(class.to_string(), text);
        }
    }

    #[test]
    fn a_general_tolerance_never_falls_with_the_size(a in 0.5..4000.0f64, b in 0.5..4000.0f64) {
        let (less, more) = if a < b { (a, b) } else { (b, a) };
        for class in iso2768::Class::ALL {
            if let (Ok(of_less), Ok(of_more)) = (class.length(less), class.length(more)) {
                prop_assert!(of_less <= of_more);
            }
            prop_assert!(class.broken_edge(less).unwrap() <= class.broken_edge(more).unwrap());
            prop_assert!(class.angle_minutes(less).unwrap() >= class.angle_minutes(more).unwrap());
        }
    }
}
