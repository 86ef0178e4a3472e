//! Single distributions: moments, distribution functions and draws against each other and against
//! values of an independent library.

use gapkeep::numeric::complex::Complex;
use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::quadrature::GaussLegendre;
use gapkeep::numeric::random::Stream;

fn shapes() -> Vec<Distribution> {
    [
        Distribution::normal(3.0, 0.5),
        Distribution::sorted(3.0, 0.5, 2.8, 4.0),
        Distribution::sorted(-1.0, 0.2, -1.3, -0.7),
        Distribution::uniform(1.0, 2.0),
        Distribution::triangular(-2.0, 0.1),
        Distribution::trapezoid(0.0, 3.0, 1.0),
        Distribution::curvilinear(5.0, 1.0, 0.3),
        Distribution::arcsine(0.0, 2.0),
        Distribution::student(1.0, 0.1, 9.0),
        Distribution::measured(&[1.0, 1.5, 1.2, 4.0, 1.5], 0.2),
    ]
    .map(|shape| shape.expect("sound"))
    .to_vec()
}

/// The expectation of `f` by the quantile, which every shape has: `E f(X) = ∫ f(Q(u)) du`, in
/// panels that crowd at the ends and else end at every half per cent, where the list steps.
fn expectation(shape: &Distribution, f: impl Fn(f64) -> f64) -> f64 {
    let rule = GaussLegendre::new(24);
    let crowded = (1..=40).rev().map(|k| 0.005 * libm::exp2(-f64::from(k)));
    let ends: Vec<f64> = crowded.chain((1..=100).map(|k| 0.005 * f64::from(k))).collect();
    let panels = ends.windows(2).flat_map(|w| [(w[0], w[1]), (1.0 - w[1], 1.0 - w[0])]);
    panels.map(|(a, b)| rule.integrate(a, b, |u| f(shape.quantile(u)))).sum()
}

#[test]
fn moments_are_those_of_the_quantile() {
    for shape in shapes() {
        let (mean, sigma) = (shape.mean(), shape.standard_deviation());
        let moment = |order: i32| {
            expectation(&shape, |x| (0..order).fold(1.0, |product, _| product * (x - mean) / sigma))
        };
        // What the panels leave out of Student's far tails is most of the error.
        assert!(moment(1).abs() < 1e-9, "{shape:?}: {}", moment(1));
        assert!((moment(2) - 1.0).abs() < 1e-7, "{shape:?}: {}", moment(2));
        assert!((moment(3) - shape.skewness()).abs() < 1e-7, "{shape:?}");
        assert!((moment(4) - shape.kurtosis()).abs() < 1e-3, "{shape:?}");
    }
}

#[test]
fn distribution_function_quantile_density_and_tail_agree() {
    for shape in shapes() {
        for u in [1e-4, 0.01, 0.2, 0.37, 0.5, 0.8, 0.99] {
            let x = shape.quantile(u);
            assert!((shape.cdf(x) - u).abs() < 1e-10 * u.max(1e-2), "{shape:?} at {u}");
            assert!((shape.cdf(x) + shape.above(x) - 1.0).abs() < 1e-14, "{shape:?} at {u}");
            let step = 1e-6 * shape.standard_deviation();
            let slope = (shape.cdf(x + step) - shape.cdf(x - step)) / (2.0 * step);
            let density = shape.density(x);
            let scale = density.max(0.01 / shape.standard_deviation());
            if !format!("{shape:?}").contains("Measured") && u > 1e-3 {
                assert!((slope - density).abs() < 1e-4 * scale, "{shape:?} at {u}");
            }
        }
    }
}

#[test]
fn log_moment_functions_are_those_of_the_quantile() {
    for shape in shapes() {
        let sigma = shape.standard_deviation();
        for (re, im) in [(0.7, 0.4), (-0.5, 1.1), (1.5, 0.0), (0.0, 0.9)] {
            let s = Complex::new(re / sigma, im / sigma);
            let Some(log) = shape.log_moment(s) else { continue };
            let wave = |x: f64| (s * (x - shape.mean())).exp();
            let want = Complex::new(
                expectation(&shape, |x| wave(x).re),
                expectation(&shape, |x| wave(x).im),
            );

            assert!((log.exp() - want).norm() < 1e-8, "{shape:?} at {re}, {im}");
        }
    }
}

#[test]
fn draws_follow_the_distribution_function() {
    for shape in shapes() {
        let mut draws = vec![0.0; 100_000];
        shape.fill(Stream::new(17, b"shape"), 0, &mut draws);
        let n = draws.len() as f64;
        for u in [0.001, 0.05, 0.3, 0.6, 0.97] {
            let x = shape.quantile(u);
            let seen = draws.iter().filter(|draw| **draw <= x).count() as f64 / n;
            let error = (shape.cdf(x) * shape.above(x) / n).sqrt();
            assert!((seen - shape.cdf(x)).abs() < 5.0 * error, "{shape:?} at {u}: {seen}");
        }
    }
}

/// Tails by mpmath 1.3 with 30 digits, each met by scipy.stats 1.17 (truncnorm, t).
#[test]
fn tails_agree_with_an_independent_library() {
    let close = |got: f64, want: f64| {
        assert!((got / want - 1.0).abs() < 1e-12, "got {got:e}, want {want:e}");
    };
    let cut = Distribution::sorted(0.0, 1.0, -1.0, 2.0).expect("sound");
    close(cut.above(1.0), 0.166_022_497_142_028_3);
    close(cut.above(1.9), 0.007_288_623_410_054_97);
    close(cut.above(1.9999), 6.596_227_845_673_718e-6);
    let student = Distribution::student(0.0, 1.0, 18.0).expect("sound");
    close(student.above(0.5), 0.311_566_228_648_293_2);
    close(student.above(2.878), 0.005_004_751_125_080_214);
    close(student.above(12.0), 2.5232555512818285e-10);
    let cycle = Distribution::arcsine(0.0, 1.0).expect("sound");
    close(cycle.above(0.3), 0.403_013_315_979_321_7);
    close(cycle.above(0.999999), 0.000_450_158_195_598_213_6);
}
