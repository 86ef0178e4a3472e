//! The calibration of a gauge block that two guides on uncertainty work through.
//!
//! The length is `l = l_S + d − l_S·(δα·θ + α_S·δθ)`, in nanometres here; its derivatives at the
//! means are written out by hand.

use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::probability::{Derivatives, UnknownMoments, second_order};
use gapkeep::numeric::random::{BLOCK, Merge, Moments, Stream, monte_carlo};

/// Nominal length and means: standard's length in nm, its expansion per kelvin, temperature in °C
/// from 20.
const NOMINAL: f64 = 50_000_000.0;
const STANDARD: f64 = 50_000_623.0;
const DIFFERENCE: f64 = 215.0;
const EXPANSION: f64 = 11.5e-6;
const TEMPERATURE: f64 = -0.1;

/// Moments to second order for the unknowns l_S, d, δα, θ, α_S, δθ of these standard deviations.
fn by_derivatives(sigma: [f64; 6]) -> (f64, f64) {
    let unknowns = sigma.map(|sigma| UnknownMoments { sigma, skewness: 0.0, kurtosis: 3.0 });
    let first = [1.0, 1.0, -STANDARD * TEMPERATURE, 0.0, 0.0, -STANDARD * EXPANSION];
    let mut second = [0.0; 36];
    // −l_S·δα·θ and −l_S·α_S·δθ: the mixed derivatives that are not zero at the means.
    for (i, j, value) in
        [(2, 3, -STANDARD), (4, 5, -STANDARD), (0, 2, -TEMPERATURE), (0, 5, -EXPANSION)]
    {
        second[i * 6 + j] = value;
        second[j * 6 + i] = value;
    }
    let derivatives = Derivatives { first: &first, second: &second, third: None };
    let moments = second_order(&unknowns, derivatives).expect("the lists fit");
    (moments.first_order.sqrt(), moments.variance.sqrt())
}

/// JCGM 100:2008, annex H.1: 32 nm to first order, 34 nm with the terms of H.1.7; the digits
/// behind follow from the inputs printed there.
#[test]
fn standard_uncertainty_of_the_guide() {
    let root3 = 3.0_f64.sqrt();
    let difference = (5.8_f64 * 5.8 + 3.9 * 3.9 + 6.7 * 6.7).sqrt();
    let temperature = (0.2_f64 * 0.2 + 0.5 * 0.5 / 2.0).sqrt();
    let sigma = [25.0, difference, 1e-6 / root3, temperature, 2e-6 / root3, 0.05 / root3];
    let (first, second) = by_derivatives(sigma);
    assert!((first - 31.66).abs() < 0.005, "{first}");
    assert!((second - 33.81).abs() < 0.005, "{second}");
}

/// The distributions of JCGM 101:2008, Table 10 (from memory).
fn unknowns() -> [(&'static str, Distribution); 9] {
    [
        ("standard", Distribution::student(STANDARD, 25.0, 18.0)),
        ("difference", Distribution::student(DIFFERENCE, 6.0, 24.0)),
        ("random effects", Distribution::student(0.0, 4.0, 5.0)),
        ("systematic effects", Distribution::student(0.0, 7.0, 8.0)),
        ("expansion", Distribution::uniform(EXPANSION, 2e-6)),
        ("temperature", Distribution::normal(TEMPERATURE, 0.2)),
        ("cycle", Distribution::arcsine(0.0, 0.5)),
        ("expansion difference", Distribution::curvilinear(0.0, 1e-6, 0.1e-6)),
        ("temperature difference", Distribution::curvilinear(0.0, 0.05, 0.025)),
    ]
    .map(|(name, distribution)| (name, distribution.expect("sound")))
}

/// JCGM 101:2008, 9.5: 838 nm, standard uncertainty 36 nm, shortest 99 % interval [745, 932] nm.
#[test]
fn monte_carlo_of_the_guides_supplement() {
    let unknowns = unknowns();
    let variance = |i: usize| unknowns[i].1.variance();
    let difference = (variance(1) + variance(2) + variance(3)).sqrt();
    let temperature = (variance(5) + variance(6)).sqrt();
    let sigma = [
        variance(0).sqrt(),
        difference,
        variance(7).sqrt(),
        temperature,
        variance(4).sqrt(),
        variance(8).sqrt(),
    ];
    // To third order in its products only, the formula is exact to the digits asked.
    let (_, exact) = by_derivatives(sigma);
    assert!((exact - 35.81).abs() < 0.01, "{exact}");

    let draws = 1_000_000;
    let (moments, mut lengths) = monte_carlo(draws, |first, count| {
        let mut x = vec![[0.0; BLOCK]; unknowns.len()];
        for ((name, distribution), x) in unknowns.iter().zip(&mut x) {
            distribution.fill(Stream::new(1, name.as_bytes()), first, &mut x[..count]);
        }
        let lengths: Vec<f64> = (0..count)
            .map(|k| {
                let [l, d, d1, d2, alpha, theta, cycle, delta_alpha, delta_theta] =
                    std::array::from_fn(|i| x[i][k]);
                let thermal = delta_alpha * (theta + cycle) + alpha * delta_theta;
                l - NOMINAL + d + d1 + d2 - l * thermal
            })
            .collect();
        (Moments::of(&lengths), lengths)
    })
    .expect("there are draws");
    // Five standard errors of a million draws.
    assert!((moments.mean() - 838.0).abs() < 5.0 * exact / 1e3, "{moments:?}");
    assert!((moments.variance().sqrt() - exact).abs() < 5.0 * exact / 1.4e3, "{moments:?}");
    lengths.sort_by(f64::total_cmp);
    let (low, high) = shortest_interval(&lengths, 0.99);
    assert!((low - 745.0).abs() < 2.0 && (high - 932.0).abs() < 2.0, "[{low}, {high}]");
}

/// The shortest interval that holds a share of the sorted values (JCGM 101:2008, 7.7.1, 5.3.4).
fn shortest_interval(sorted: &[f64], share: f64) -> (f64, f64) {
    let held = (share * sorted.len() as f64) as usize;
    let ends = sorted.iter().zip(&sorted[held..]);
    let shortest = ends.min_by(|a, b| (a.1 - a.0).total_cmp(&(b.1 - b.0)));
    shortest.map(|(low, high)| (*low, *high)).expect("there are values")
}

/// Merging in the order of the draws keeps lists in that order too.
#[test]
fn lists_merge_in_order() {
    let mut list = vec![1, 2];
    list.merge(vec![3]);
    assert_eq!(list, [1, 2, 3]);
}
