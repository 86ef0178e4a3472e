//! Laws that every tail of a sum obeys, whatever its terms.

use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::probability::{Method, Tail, Term, above, below, mean, variance};
use proptest::prelude::{ProptestConfig, Strategy, prop, prop_assert, proptest};

/// Any distribution with a moment function, of any width over five powers of ten.
fn distribution() -> impl Strategy<Value = Distribution> {
    (0..6_u8, -4.0..1.0_f64, -2.0..2.0_f64, 0.05..0.95_f64).prop_map(|(kind, power, mean, part)| {
        let width = libm::exp10(power);
        let list: Vec<f64> =
            (0..7).map(|i| mean + width * libm::sin(f64::from(i) / part)).collect();
        match kind {
            0 => Distribution::normal(mean, width),
            1 => Distribution::uniform(mean, width),
            2 => Distribution::triangular(mean, width),
            3 => Distribution::trapezoid(mean, width, width * part),
            4 => Distribution::sorted(mean, width, mean - 3.0 * part * width, mean + 2.0 * width),
            _ => Distribution::measured(&list, 0.3 * part * width),
        }
        .expect("sound")
    })
}

fn terms() -> impl Strategy<Value = Vec<Term>> {
    prop::collection::vec((-3.0..3.0_f64, distribution()), 1..7)
}

fn share(terms: &[Term], limit: f64) -> Tail {
    above(terms, limit).expect("moment functions exist")
}

proptest! {
    // Terms of very different widths take long, so fewer cases than usual.
    #![proptest_config(ProptestConfig::with_cases(100))]

    #[test]
    fn a_tail_falls_and_its_mirror_image_agrees(terms in terms(), sigmas in -6.0..6.0_f64) {
        let spread = libm::sqrt(variance(&terms));
        let limit = mean(&terms) + sigmas * spread;
        let tail = share(&terms, limit);
        prop_assert!((0.0..=1.0 + 1e-10).contains(&tail.share), "{tail:?}");
        prop_assert!(tail.error.is_finite() && tail.error >= 0.0, "{tail:?}");
        if let Method::Inversion(_) = tail.method {
            prop_assert!(tail.error <= 1e-9 * tail.share.max(1.0 - tail.share), "{tail:?}");
        }
        let further = share(&terms, limit + 0.1 * spread);
        prop_assert!(further.share <= tail.share + tail.error + further.error, "{tail:?} {further:?}");
        let mirrored: Vec<Term> = terms.iter().map(|(a, d)| (-a, d.clone())).collect();
        let same = below(&mirrored, -limit).expect("moment functions exist");
        prop_assert!((same.share - tail.share).abs() <= 1e-15 + same.error + tail.error);
        let rest = below(&terms, limit).expect("moment functions exist");
        prop_assert!((rest.share + tail.share - 1.0).abs() <= 1e-15 + rest.error + tail.error);
    }

    #[test]
    fn the_unit_and_a_fixed_part_change_nothing(terms in terms(), sigmas in -4.0..4.0_f64) {
        let limit = mean(&terms) + sigmas * libm::sqrt(variance(&terms));
        let tail = share(&terms, limit);
        // A power of two rounds nothing, so that even the digits stay.
        let scaled: Vec<Term> = terms.iter().map(|(a, d)| (1024.0 * a, d.clone())).collect();
        let other = share(&scaled, 1024.0 * limit);
        let close = 1e-12 * tail.share + tail.error + other.error;
        prop_assert!((other.share - tail.share).abs() <= close, "{tail:?} {other:?}");
        let mut longer = terms.clone();
        longer.push((2.0, Distribution::point(0.0).expect("sound")));
        prop_assert!((share(&longer, limit).share - tail.share).abs() <= close);
    }

    #[test]
    fn a_sum_of_two_halves_is_as_the_whole(half in 0.001..10.0_f64, sigmas in 0.0..4.0_f64) {
        // Normals add in squares, and two equal rectangles are a triangle.
        let part = |d: Result<Distribution, _>| (1.0, d.expect("sound"));
        let normals = [part(Distribution::normal(0.0, 0.6 * half)), part(Distribution::normal(0.0, 0.8 * half))];
        let whole = [part(Distribution::normal(0.0, half))];
        let (a, b) = (share(&normals, sigmas * half), share(&whole, sigmas * half));
        prop_assert!((a.share / b.share - 1.0).abs() < 1e-12);
        let rectangles = [part(Distribution::uniform(0.0, half)), part(Distribution::uniform(0.0, half))];
        let triangle = [part(Distribution::triangular(0.0, 2.0 * half))];
        let limit = sigmas / 2.1 * half;
        let (a, b) = (share(&rectangles, limit), share(&triangle, limit));
        prop_assert!((a.share / b.share - 1.0).abs() < 1e-10, "{a:?} {b:?}");
    }
}
