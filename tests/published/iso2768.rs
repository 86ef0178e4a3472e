//! ISO 2768-1 general tolerances against printed copies of its tables.

use gapkeep::standards::iso2768::Class;

/// Table 1 as printed in "According to DIN ISO 2768-1" (f, m, v) and, for class c, in a second copy: the
/// first prints ±0.15 and ±0.2 for c up to 6 mm, the values of the older DIN 7168. mm; an empty cell is
/// a range not covered.
const LENGTHS: [(f64, f64, [Option<f64>; 4]); 8] = [
    (0.5, 3.0, [Some(0.05), Some(0.1), Some(0.2), None]),
    (3.0, 6.0, [Some(0.05), Some(0.1), Some(0.3), Some(0.5)]),
    (6.0, 30.0, [Some(0.1), Some(0.2), Some(0.5), Some(1.0)]),
    (30.0, 120.0, [Some(0.15), Some(0.3), Some(0.8), Some(1.5)]),
    (120.0, 400.0, [Some(0.2), Some(0.5), Some(1.2), Some(2.5)]),
    (400.0, 1000.0, [Some(0.3), Some(0.8), Some(2.0), Some(4.0)]),
    (1000.0, 2000.0, [Some(0.5), Some(1.2), Some(3.0), Some(6.0)]),
    (2000.0, 4000.0, [None, Some(2.0), Some(4.0), Some(8.0)]),
];

/// Table 3 as printed in several copies, minutes; one copy prints 20′ for c at 120 to 400 mm, against 15′ in
/// another and in the standard (from memory).
const ANGLES: [(f64, f64, [u16; 4]); 5] = [
    (0.0, 10.0, [60, 60, 90, 180]),
    (10.0, 50.0, [30, 30, 60, 120]),
    (50.0, 120.0, [20, 20, 30, 60]),
    (120.0, 400.0, [10, 10, 15, 30]),
    (400.0, 9000.0, [5, 5, 10, 20]),
];

#[test]
fn lengths_take_the_printed_tolerance_to_the_end_of_each_range() {
    for (over, to, row) in LENGTHS {
        for (class, printed) in Class::ALL.into_iter().zip(row) {
            for size in [over + 0.001, 0.5 * (over + to), to] {
                let ours = class.length(size).ok().map(|half| half.mm());
                assert_eq!(ours, printed, "{} at {size} mm", class.letter());
            }
        }
    }
}

#[test]
fn a_length_outside_the_table_must_carry_its_own_tolerance() {
    // "Sizes below 0.5 mm must carry their own tolerance": note to Table 1.
    for class in Class::ALL {
        assert!(class.length(0.499).is_err());
        assert!(class.broken_edge(0.499).is_err());
        assert!(class.length(4000.001).is_err());
    }
    assert_eq!(Class::Medium.length(0.5).unwrap().mm(), 0.1);
    assert_eq!(Class::Medium.broken_edge(0.5).unwrap().mm(), 0.2);
}

#[test]
fn radii_and_chamfers_take_the_printed_tolerance() {
    // Table 2: f and m ±0.2, ±0.5, ±1; c and v ±0.4, ±1, ±2 (a copy of low quality; memory agrees).
    for class in Class::ALL {
        let factor = if class <= Class::Medium { 1.0 } else { 2.0 };
        for (size, printed) in [(3.0, 0.2), (3.001, 0.5), (6.0, 0.5), (6.001, 1.0), (50.0, 1.0)] {
            let ours = class.broken_edge(size).unwrap().mm();
            assert_eq!(ours, factor * printed, "{} at {size} mm", class.letter());
        }
    }
}

#[test]
fn angles_take_the_printed_tolerance_of_their_shorter_side() {
    for (over, to, row) in ANGLES {
        for (class, printed) in Class::ALL.into_iter().zip(row) {
            for side in [over + 0.001, 0.5 * (over + to), to] {
                let ours = class.angle_minutes(side);
                assert_eq!(ours, Ok(printed), "{} at {side} mm", class.letter());
            }
        }
    }
}

#[test]
fn a_coarser_class_is_never_tighter_and_a_greater_length_never_tighter() {
    for pair in Class::ALL.windows(2) {
        for (_, size, _) in LENGTHS {
            if let (Ok(finer), Ok(coarser)) = (pair[0].length(size), pair[1].length(size)) {
                assert!(finer < coarser, "{size} mm");
            }
        }
    }
    for class in Class::ALL {
        let halves: Vec<_> =
            LENGTHS.iter().filter_map(|&(_, size, _)| class.length(size).ok()).collect();
        assert!(halves.is_sorted());
        let minutes = ANGLES.map(|(_, side, _)| class.angle_minutes(side).unwrap());
        assert!(minutes.is_sorted_by(|short, long| short > long));
    }
}
