//! Published and exactly known values of the statistics: tails of sums.

use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::probability::{Method, Term, above, below};

fn normal(sigma3: f64) -> Distribution {
    Distribution::normal(0.0, sigma3 / 3.0).expect("sound")
}

fn uniform(half: f64) -> Distribution {
    Distribution::uniform(0.0, half).expect("sound")
}

fn triangular(half: f64) -> Distribution {
    Distribution::triangular(0.0, half).expect("sound")
}

fn close(got: f64, want: f64, relative: f64) {
    assert!((got / want - 1.0).abs() <= relative, "got {got:.12e}, want {want:.12e}");
}

/// Twelve contributors of three kinds; the values are by two independent ways (inversion with 50
/// digits, and repeated quadrature).
#[test]
fn tails_of_a_mixed_stack_of_twelve() {
    let normals = [0.05, 0.05, 0.02, 0.1, 0.03, 0.03].map(normal);
    let uniforms = [0.02, 0.01, 0.03].map(uniform);
    let triangulars = [0.02, 0.05, 0.04].map(triangular);
    let terms: Vec<Term> = normals
        .into_iter()
        .chain(uniforms)
        .chain(triangulars)
        .enumerate()
        // Signs do not matter to symmetric contributors.
        .map(|(i, d)| (if i % 2 == 0 { 1.0 } else { -1.0 }, d))
        .collect();
    for (limit, want) in [(0.1, 0.03683697387), (0.2, 1.484450188e-4), (0.3, 1.748628886e-8)] {
        let tail = above(&terms, limit).expect("moment functions exist");
        close(tail.share, want, 5e-10);
        assert!(tail.error < 1e-10 * tail.share, "{tail:?}");
        assert!(matches!(tail.method, Method::Inversion(_)));
        close(below(&terms, -limit).expect("moment functions exist").share, want, 5e-10);
    }
}

/// Two gaps that share a part: a − b − c (mean 0.09) and a − d (mean 0.06), 3σ tolerances.
#[test]
fn tails_of_two_gaps_of_normal_parts() {
    let a = normal(0.05).moved_to(10.0).expect("sound");
    let part = |sigma3: f64, mean: f64| normal(sigma3).moved_to(mean).expect("sound");
    let first = [(1.0, a.clone()), (-1.0, part(0.03, 6.0)), (-1.0, part(0.02, 3.91))];
    let second = [(1.0, a), (-1.0, part(0.04, 9.94))];
    close(below(&first, 0.0).expect("normal").share, 5.934554475e-6, 1e-9);
    close(below(&second, 0.0).expect("normal").share, 2.468409278e-3, 1e-9);
}

/// The sum of n rectangles on (0, 1): above n − a, a ≤ 1, lies a^n/n! (Irwin 1927, Hall 1927);
/// further in the alternating sum of the same powers.
#[test]
fn sums_of_equal_rectangles_are_irwin_and_halls() {
    let exact = |n: u32, from_top: f64| {
        let mut sum = 0.0;
        let (mut binomial, mut factorial) = (1.0, 1.0);
        for k in 0..n {
            let rest = (from_top - f64::from(k)).max(0.0);
            let power = (0..n).fold(1.0, |product, _| product * rest);
            sum += if k % 2 == 0 { binomial * power } else { -binomial * power };
            binomial *= f64::from(n - k) / f64::from(k + 1);
            factorial *= f64::from(k + 1);
        }
        sum / factorial
    };
    for n in [2, 3, 4, 6, 9, 12] {
        let rectangle = Distribution::uniform(0.5, 0.5).expect("sound");
        let terms: Vec<Term> = (0..n).map(|_| (1.0, rectangle.clone())).collect();
        for from_top in [0.25, 1.0, 1.5, 2.0] {
            let from_top = f64::min(from_top, f64::from(n) / 2.0);
            let tail = above(&terms, f64::from(n) - from_top).expect("moment functions exist");
            close(tail.share, exact(n, from_top), 1e-10);
        }
        // Bates's distribution is the mean of them.
        let mean_of: Vec<Term> = (0..n).map(|_| (1.0 / f64::from(n), rectangle.clone())).collect();
        let tail = above(&mean_of, 1.0 - 1.0 / f64::from(n)).expect("moment functions exist");
        close(tail.share, exact(n, 1.0), 1e-10);
    }
}

/// Rejects of a normal process in parts per million; the table is in every text on process
/// capability (values from memory, and exact by the normal tail).
#[test]
fn rejects_of_a_normal_process_are_the_trades_table() {
    let terms = [(1.0, Distribution::normal(0.0, 1.0).expect("sound"))];
    let above = |x: f64| above(&terms, x).expect("normal").share;
    for (sigmas, ppm, digits) in
        [(3.0, 2699.8, 0.05), (4.0, 63.34, 0.005), (5.0, 0.5733, 5e-5), (6.0, 0.00197, 5e-6)]
    {
        let both = 1e6 * 2.0 * above(sigmas);
        assert!((both - ppm).abs() <= digits, "{sigmas}: {both}");
    }
    // Six sigma with a mean that drifts 1.5 sigma.
    assert!((1e6 * above(4.5) - 3.398).abs() <= 5e-4);
}

/// Inflation factors 3σ/T of F. Scholz, Tolerance Stack Analysis Methods, Boeing, 1995 (from
/// memory; each follows from the variance).
#[test]
fn spreads_other_than_normal_inflate_a_root_sum_square() {
    let trapezoid = Distribution::trapezoid(0.0, 1.0, 0.5).expect("sound");
    for (distribution, factor) in
        [(uniform(1.0), 1.7321), (triangular(1.0), 1.2247), (trapezoid, 1.369), (normal(1.0), 1.0)]
    {
        let got = 3.0 * distribution.standard_deviation();
        assert!((got - factor).abs() < 5e-4, "{got}");
    }
}

/// Terms without spread, ends of the support, and shares too small to mean anything.
#[test]
fn limits_at_and_beyond_the_ends() {
    let fixed = [(2.0, Distribution::point(1.5).expect("sound"))];
    assert_eq!(above(&fixed, 3.0).expect("fixed").share, 0.0);
    assert_eq!(below(&fixed, 3.0).expect("fixed").share, 0.0);
    assert_eq!(above(&fixed, 2.9).expect("fixed").share, 1.0);
    let pair = [(1.0, uniform(1.0)), (-1.0, triangular(2.0))];
    assert_eq!(above(&pair, 3.0).expect("bounded").share, 0.0);
    assert_eq!(above(&pair, -3.0).expect("bounded").share, 1.0);
    let far = [(1.0, uniform(1.0)), (1.0, normal(1.0))];
    let tail = above(&far, 5.0).expect("moment functions exist");
    assert_eq!((tail.share, tail.error, tail.method), (0.0, 1e-18, Method::Negligible));
    let student = Distribution::student(0.0, 1.0, 5.0).expect("sound");
    let refused = above(&[(1.0, normal(1.0)), (1.0, student.clone())], 1.0);
    assert_eq!(refused.map_err(|e| e.term), Err(1));
    // Alone it has a distribution function: the one-sided 95 % point of 5 degrees of freedom is
    // 2.015 (any table of Student's t, e.g. Abramowitz & Stegun, Table 26.10).
    let share = above(&[(2.0, student)], 2.0 * 2.015).expect("one term").share;
    assert!((share - 0.05).abs() < 1e-5, "{share}");
}

/// A value just at a limit is neither above nor below it.
#[test]
fn measured_values_at_the_limit() {
    let list = Distribution::measured(&[1.0, 2.0, 2.0, 3.0], 0.0).expect("sound");
    for coefficient in [1.0, -1.0] {
        let terms = [(coefficient, list.clone())];
        assert_eq!(above(&terms, 2.0 * coefficient).expect("one term").share, 0.25);
        assert_eq!(below(&terms, 2.0 * coefficient).expect("one term").share, 0.25);
    }
    let twice = [(1.0, list.clone()), (1.0, list)];
    assert!((above(&twice, 4.5).expect("lists").share - 5.0 / 16.0).abs() < 1e-15);
}
