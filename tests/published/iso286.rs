//! ISO 286 in use: whole fits of textbooks, classes of printed limit tables, the corrigendum, the
//! special cases, and misprints in circulation that must not come out of the program.

use gapkeep::standards::iso286::{
    Character, Class, Fit, Kind, Reason, classes_at, fit, hole_basis_fits, preferred_fits,
    shaft_basis_fits,
};

fn class(text: &str) -> Class {
    Class::parse(text).unwrap()
}

/// Upper and lower limit deviation, µm.
fn limits(text: &str, nominal: f64) -> (f64, f64) {
    let found = class(text).limits(nominal).unwrap_or_else(|refused| panic!("{refused}"));
    (found.upper.um(), found.lower.um())
}

fn pair(nominal: f64, hole: &str, shaft: &str) -> Fit {
    fit(nominal, class(hole), class(shaft)).unwrap()
}

fn refusal(text: &str, nominal: f64) -> Reason {
    class(text).limits(nominal).expect_err("not defined").reason
}

/// Nominal mm, hole, shaft; limit deviations ES, EI, es, ei in µm; least and greatest clearance in µm.
type WholeFit = (f64, &'static str, &'static str, [f64; 4], [f64; 2]);

#[test]
fn whole_fits_of_the_textbooks() {
    let cases: [WholeFit; 9] = [
        // Shigley, Mechanical Engineering Design, 9th ed., Example 7-7: 34H11/c11.
        (34.0, "H11", "c11", [160.0, 0.0, -120.0, -280.0], [120.0, 440.0]),
        // Solutions to Shigley, 8th ed., 3-64: 40H7/s6, interference 0.018 to 0.059 mm.
        (40.0, "H7", "s6", [25.0, 0.0, 59.0, 43.0], [-59.0, -18.0]),
        // The same, 3-66: 40H7/u6, shaft 40.076/40.060.
        (40.0, "H7", "u6", [25.0, 0.0, 76.0, 60.0], [-76.0, -35.0]),
        // Tutorial solutions after Shigley: 15H7/h6 and 50H7/g6.
        (15.0, "H7", "h6", [18.0, 0.0, 0.0, -11.0], [0.0, 29.0]),
        (50.0, "H7", "g6", [25.0, 0.0, -9.0, -25.0], [9.0, 50.0]),
        // 60H7/k6: printed limit tables, +0.030/0 and +0.021/+0.002.
        (60.0, "H7", "k6", [30.0, 0.0, 21.0, 2.0], [-21.0, 28.0]),
        // A worked question in circulation: 64H8/f7, hole 64.046, shaft 63.970/63.940.
        (64.0, "H8", "f7", [46.0, 0.0, -30.0, -60.0], [30.0, 106.0]),
        // Derived from the tables of Machine Drawing.
        (25.0, "H7", "p6", [21.0, 0.0, 35.0, 22.0], [-35.0, -1.0]),
        (10.0, "H7", "js6", [15.0, 0.0, 4.5, -4.5], [-4.5, 19.5]),
    ];
    for (nominal, hole, shaft, [es, ei, shaft_es, shaft_ei], [least, greatest]) in cases {
        let found = pair(nominal, hole, shaft);
        let title = format!("{nominal} {hole}/{shaft}");
        assert_eq!((found.hole.upper.um(), found.hole.lower.um()), (es, ei), "{title}");
        assert_eq!(
            (found.shaft.upper.um(), found.shaft.lower.um()),
            (shaft_es, shaft_ei),
            "{title}"
        );
        assert_eq!((found.least().um(), found.greatest().um()), (least, greatest), "{title}");
        assert_eq!(found.span().um(), greatest - least, "{title}");
    }
}

#[test]
fn limits_in_millimetres_are_the_decimals_on_the_drawing() {
    // Shigley, 9th ed., Example 7-7: shaft 33.880/33.720.
    let found = pair(34.0, "H11", "c11");
    assert_eq!(34.0 + found.shaft.upper.mm(), 33.880);
    assert_eq!(34.0 + found.shaft.lower.mm(), 33.720);
    assert_eq!(found.least().mm(), 0.120);
    assert_eq!(found.greatest().mm(), 0.440);
}

#[test]
fn inch_sizes_of_the_textbooks_agree_to_a_ten_thousandth() {
    // Shigley, Example 7-8, 2 in H7/s6: tolerances 0.0010 and 0.0006 in, fundamental deviation 0.0017 in
    // by the inch tables, which are the metric ones rounded. 2 in is 50.8 mm.
    let found = pair(50.8, "H7", "s6");
    let inches = |um: f64| (um / 25.4 * 10.0).round() / 1e4;
    assert_eq!(inches(found.shaft.tolerance().um()), 0.0007);
    assert_eq!(inches(found.shaft.lower.um()), 0.0021);
    // The inch table puts 2.0 in into the step 1.60 to 2.00 in, up to and including: 50.0 mm, not 50.8 mm.
    let as_tabled = pair(50.0, "H7", "s6");
    assert_eq!(inches(as_tabled.hole.tolerance().um()), 0.0010);
    assert_eq!(inches(as_tabled.shaft.tolerance().um()), 0.0006);
    assert_eq!(inches(as_tabled.shaft.lower.um()), 0.0017);
    assert_eq!(inches(-as_tabled.least().um()), 0.0023);
    assert_eq!(inches(-as_tabled.greatest().um()), 0.0007);
    // Solutions to Shigley, 8th ed., 7-23, 1 in H8/f7: hole 1.0013, shaft 0.9992/0.9984.
    let running = pair(25.4, "H8", "f7");
    assert_eq!(inches(running.hole.upper.um()), 0.0013);
    assert_eq!(inches(running.shaft.upper.um()), -0.0008);
    assert_eq!(inches(running.shaft.lower.um()), -0.0016);
    assert_eq!(inches(running.least().um()), 0.0008);
    assert_eq!(inches(running.greatest().um()), 0.0029);
}

#[test]
fn the_edge_of_a_step_belongs_to_the_step_that_ends_there() {
    // "over … up to and including": ISO 286-1, heads of the tables.
    assert_eq!(limits("h7", 30.0), limits("h7", 20.0));
    assert_ne!(limits("h7", 30.001), limits("h7", 30.0));
    assert_eq!(limits("c11", 50.0).0, -130.0);
    assert_eq!(limits("c11", 50.001).0, -140.0);
    assert_eq!(limits("s6", 120.0).1, 79.0);
    assert_eq!(limits("s6", 120.001).1, 92.0);
}

#[test]
fn the_corrigendum_of_2006_is_followed() {
    // ISO 286-2:1988/Cor.1:2006: the right value, and the misprint it replaced.
    let cases = [
        ("A13", 340.0, Kind::Hole, 2090.0, 2000.0),
        ("E8", 110.0, Kind::Hole, 126.0, 125.0),
        ("R10", 25.0, Kind::Hole, -28.0, -10.0),
    ];
    for (text, nominal, kind, right, misprint) in cases {
        assert_eq!(class(text).kind, kind);
        assert_eq!(limits(text, nominal).0, right, "{text}");
        assert_ne!(limits(text, nominal).0, misprint, "{text}");
    }
    assert_eq!(limits("f9", 300.0).1, -186.0);
}

#[test]
fn misprints_in_circulation_do_not_come_out() {
    // Machine Drawing, p. 221, prints U = −256 for 200 to 225 mm; the table of EN ISO 286-1 says −258.
    assert_eq!(limits("U8", 210.0).0, -258.0);
    assert_eq!(limits("u6", 210.0).1, 258.0);
    // The same page prints X = −650 for 355 to 400 mm; IT7 + 1.6·D gives 659.9, and the standard has 660 (from
    // memory).
    assert_eq!(limits("X8", 400.0).0, -660.0);
    // A table of shafts prints 30 to 50 h8 as "0.039/+0", without the minus sign.
    assert_eq!(limits("h8", 40.0), (0.0, -39.0));
    // A table of deviations on the web prints g = −8 for 6 to 10 mm, and shifts j by one step.
    assert_eq!(limits("g6", 8.0), (-5.0, -14.0));
    assert_eq!(limits("j6", 20.0), (9.0, -4.0));
    // A reprint of JIS B 0401 has f8 = −8/−20 up to 3 mm, and a British table d6 = −170/−170.
    assert_eq!(limits("f8", 2.0), (-6.0, -20.0));
    assert_eq!(limits("d6", 200.0), (-170.0, -199.0));
    // A worked question prints the deviation f of 64 mm as −0.30115 mm for −0.030115 mm.
    assert_eq!(class("f7").limits(64.0).unwrap().upper.mm(), -0.030);
}

#[test]
fn the_increment_raises_the_finer_holes() {
    // Machine Drawing, foot of Table 15.3: P7, 18 to 30 mm: −22 + 8 = −14.
    assert_eq!(limits("P7", 30.0), (-14.0, -35.0));
    // The same above IT7: no increment.
    assert_eq!(limits("P8", 30.0), (-22.0, -55.0));
    // Printed limit table: 60 K7.
    assert_eq!(limits("K7", 60.0), (9.0, -21.0));
    // Machine Drawing, p. 219: M6 over 250 to 315 mm is −9 in place of −11.
    assert_eq!(limits("M6", 300.0), (-9.0, -41.0));
    assert_eq!(limits("M6", 250.001), (-9.0, -41.0));
    assert_eq!(limits("M7", 300.0), (0.0, -52.0));
    assert_eq!(limits("M6", 316.0).0, -10.0);
    assert_eq!(limits("M6", 250.0).0, -8.0);
}

#[test]
fn fits_of_the_two_systems_come_out_alike() {
    // The purpose of Δ, ISO 286-1:1988, A.3.2: a hole one grade coarser than its shaft gives the same
    // fit in either system, over 3 up to 500 mm. M6 over 250 to 315 mm alone departs, by 2 µm.
    for size in [4.0, 10.0, 16.0, 28.0, 45.0, 75.0, 118.0, 170.0, 240.0, 300.0, 390.0, 480.0] {
        for letters in ["k", "m", "n", "p", "r", "s", "u", "x", "zc"] {
            for n in 5..=7 {
                let (coarse, fine) = (n, n - 1);
                let by_hole = pair(size, &format!("H{coarse}"), &format!("{letters}{fine}"));
                let hole = format!("{}{coarse}", letters.to_uppercase());
                let by_shaft = pair(size, &hole, &format!("h{fine}"));
                let apart = (by_shaft.least().um() - by_hole.least().um(), by_shaft.span(), n);
                let expected = if (hole.as_str(), size) == ("M6", 300.0) { 2.0 } else { 0.0 };
                assert_eq!(apart, (expected, by_hole.span(), n), "{size} {letters}");
            }
        }
        // Clearance fits come out alike at any grades.
        for letters in ["a", "c", "d", "e", "f", "g", "h"] {
            let by_hole = pair(size, "H8", &format!("{letters}9"));
            let by_shaft = pair(size, &format!("{}8", letters.to_uppercase()), "h9");
            assert_eq!(by_hole.least(), by_shaft.least(), "{size} {letters}");
        }
    }
}

#[test]
fn special_cases_of_n_k_and_j() {
    // N9 and coarser: ES = 0 over 3 mm, −4 up to 3 mm; not used up to 1 mm (that exclusion from memory).
    assert_eq!(limits("N9", 20.0), (0.0, -52.0));
    assert_eq!(limits("N11", 400.0).0, 0.0);
    assert_eq!(limits("N9", 3.0), (-4.0, -29.0));
    assert_eq!(refusal("N9", 1.0), Reason::NotToOneMillimetre);
    assert_eq!(limits("N8", 1.0).0, -4.0);
    // k leaves the nominal size at IT4 to IT7 only.
    for (text, ei) in [("k3", 0.0), ("k4", 2.0), ("k7", 2.0), ("k8", 0.0), ("k11", 0.0)] {
        assert_eq!(limits(text, 40.0).1, ei, "{text}");
    }
    // K above IT8 is blank over 3 mm (from memory).
    assert_eq!(limits("K9", 2.0).0, 0.0);
    assert_eq!(refusal("K9", 40.0), Reason::GradeOfLetters);
    // j and J at the grades they are tabled for.
    assert_eq!(limits("j8", 2.0), (8.0, -6.0));
    assert_eq!(refusal("j8", 4.0), Reason::GradeOfLetters);
    assert_eq!(refusal("j4", 4.0), Reason::GradeOfLetters);
    assert_eq!(refusal("J5", 4.0), Reason::GradeOfLetters);
    assert_eq!(refusal("J7", 501.0), Reason::GradeOfLetters);
    // The increment is tabled from IT3.
    assert_eq!(refusal("P2", 40.0), Reason::IncrementNotTabled);
    assert_eq!(limits("P3", 40.0), (-24.5, -28.5));
}

#[test]
fn classes_end_where_their_columns_end() {
    let tabled = |over, to| Reason::LettersAtSize { over, to };
    assert_eq!(refusal("t6", 24.0), tabled(24, 3150));
    assert_eq!(refusal("v6", 14.0), tabled(14, 500));
    assert_eq!(refusal("Y7", 18.0), tabled(18, 500));
    assert_eq!(refusal("cd8", 10.001), tabled(0, 10));
    assert_eq!(refusal("EF7", 12.0), tabled(0, 10));
    assert_eq!(refusal("fg6", 12.0), tabled(0, 10));
    assert_eq!(refusal("c11", 500.001), tabled(0, 500));
    assert_eq!(refusal("ZC9", 501.0), tabled(0, 500));
    assert_eq!(refusal("a11", 1.0), Reason::NotToOneMillimetre);
    assert_eq!(limits("a11", 1.001).0, -270.0);
    assert_eq!(refusal("B11", 0.5), Reason::NotToOneMillimetre);
    assert_eq!(refusal("H14", 1.0), Reason::GradeAtSize);
    assert_eq!(limits("H14", 1.001).0, 250.0);
    assert_eq!(refusal("h01", 501.0), Reason::GradeAtSize);
    assert_eq!(limits("h0", 500.0), (0.0, -6.0));
    for nominal in [0.0, -5.0, 3150.001, f64::NAN] {
        assert_eq!(refusal("H7", nominal), Reason::SizeOutside);
    }
}

#[test]
fn js_divides_its_tolerance_exactly() {
    // Tables in circulation print 10 js7 as ±7.5 or, rounded down, as ±7; Gapkeep takes the exact half.
    assert_eq!(limits("js7", 10.0), (7.5, -7.5));
    assert_eq!(limits("JS8", 15.0), (13.5, -13.5));
    assert_eq!(limits("js3", 5.0), (1.25, -1.25));
    assert_eq!(limits("js01", 2.0), (0.15, -0.15));
}

#[test]
fn the_preferred_fits_have_the_character_their_table_gives() {
    // ANSI B4.2-1978, Table of preferred fits: five clearance, two transition, three interference in
    // either system; H7/p6 is a transition fit up to 3 mm (its footnote).
    for fits in [hole_basis_fits().collect::<Vec<_>>(), shaft_basis_fits().collect()] {
        for size in [2.0, 5.0, 20.0, 40.0, 100.0, 240.0, 400.0] {
            let characters: Vec<Character> = fits
                .iter()
                .map(|&(hole, shaft)| fit(size, hole, shaft).unwrap().character())
                .collect();
            assert_eq!(characters[..5], [Character::Clearance; 5], "{size} mm");
            assert_eq!(characters[5..7], [Character::Transition; 2], "{size} mm");
            assert_eq!(characters[8..], [Character::Interference; 2], "{size} mm");
            if size > 3.0 {
                assert_eq!(characters[7], Character::Interference, "{size} mm");
            }
        }
    }
    assert_eq!(pair(2.0, "H7", "p6").character(), Character::Transition);
    assert_eq!(pair(3.001, "H7", "p6").character(), Character::Interference);
    assert_eq!(preferred_fits().count(), 20);
}

#[test]
fn the_classes_at_a_size_are_those_with_limits_there() {
    for nominal in [0.8, 2.0, 12.0, 40.0, 300.0, 500.0, 700.0, 3150.0] {
        for kind in [Kind::Hole, Kind::Shaft] {
            let found: Vec<Class> = classes_at(nominal, kind).map(|(class, _)| class).collect();
            assert!(found.len() > 150, "{nominal} mm: {}", found.len());
            assert!(found.is_sorted(), "loosest letters first, finest grade first");
            for (class, deviations) in classes_at(nominal, kind) {
                assert_eq!(class.kind, kind);
                assert_eq!(class.limits(nominal), Ok(deviations));
                assert!(deviations.lower < deviations.upper);
            }
        }
    }
    assert_eq!(classes_at(0.0, Kind::Hole).count(), 0);
}
