//! Shares counted in draws against exact ones, and how often their confidence limits hold.

use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::probability::{Term, above, any_of, below, clopper_pearson};
use gapkeep::numeric::random::{BLOCK, Stream, monte_carlo};

/// Draws the sum and counts how often it is above the limit.
fn count_above(terms: &[Term], limit: f64, seed: u64, draws: u64) -> u64 {
    monte_carlo(draws, |first, count| {
        let (mut sum, mut x) = ([0.0; BLOCK], [0.0; BLOCK]);
        for (i, (a, distribution)) in terms.iter().enumerate() {
            let stream = Stream::new(seed, &[b'x', i as u8]);
            distribution.fill(stream, first, &mut x[..count]);
            for (sum, x) in sum.iter_mut().zip(&x) {
                *sum += a * x;
            }
        }
        sum[..count].iter().filter(|sum| **sum > limit).count() as u64
    })
    .unwrap_or(0)
}

fn stack() -> Vec<Term> {
    [
        (1.0, Distribution::normal(10.0, 0.02)),
        (-1.0, Distribution::sorted(6.0, 0.02, 5.97, 6.04)),
        (-0.5, Distribution::uniform(4.0, 0.05)),
        (2.0, Distribution::triangular(1.0, 0.03)),
        (1.0, Distribution::measured(&[0.01, 0.02, 0.015, 0.01], 0.01)),
    ]
    .map(|(a, distribution)| (a, distribution.expect("sound")))
    .to_vec()
}

#[test]
fn exact_shares_lie_within_the_limits_of_four_million_draws() {
    let terms = stack();
    for (limit, seed) in [(4.05, 1), (4.1, 2), (4.13, 3)] {
        let exact = above(&terms, limit).expect("moment functions exist").share;
        let draws = 4_000_000;
        let seen = clopper_pearson(count_above(&terms, limit, seed, draws), draws, 0.9999);
        assert!(seen.low <= exact && exact <= seen.high, "{limit}: {exact:e} not in {seen:?}");
        assert!(exact > 1e-4 && seen.high < 1.2 * exact, "the check would say nothing");
    }
}

#[test]
fn confidence_limits_hold_at_their_rate_over_a_thousand_seeds() {
    let terms = stack();
    let (limit, draws, seeds) = (4.09, 8_192, 1_000);
    let exact = above(&terms, limit).expect("moment functions exist").share;
    let held = (0..seeds)
        .filter(|seed| {
            let seen = clopper_pearson(count_above(&terms, limit, *seed, draws), draws, 0.95);
            seen.low <= exact && exact <= seen.high
        })
        .count();
    // The limits hold in at least 95 % of cases, a little more since counts are whole; three
    // standard errors of a thousand seeds are 2 %.
    assert!((930..=985).contains(&held), "{held} of {seeds} hold");
}

/// Published limits: 10 successes of 100 give [4.90 %, 17.62 %] at 95 % (e.g. A. Agresti &
/// B. A. Coull, The American Statistician 52 (1998), from memory; scipy 1.17 agrees).
#[test]
fn limits_of_a_textbook_count() {
    let limits = clopper_pearson(10, 100, 0.95);
    assert!((limits.low - 0.04900468922148596).abs() < 1e-12, "{limits:?}");
    assert!((limits.high - 0.1762225977400227).abs() < 1e-12, "{limits:?}");
}

/// Two gaps that share part a (means 0.09 and 0.06): the share that fails either, 2.471091960e-3
/// by integration over the shared part, lies between the bounds and within the draws' limits.
#[test]
fn either_of_two_gaps_that_share_a_part() {
    let part = |mean: f64, sigma3: f64| Distribution::normal(mean, sigma3 / 3.0).expect("sound");
    let parts = [part(10.0, 0.05), part(6.0, 0.03), part(3.91, 0.02), part(9.94, 0.04)];
    let gaps = [[1.0, -1.0, -1.0, 0.0], [1.0, 0.0, 0.0, -1.0]];
    let shares = gaps.map(|gap| {
        let terms: Vec<Term> = gap.into_iter().zip(parts.clone()).collect();
        below(&terms, 0.0).expect("normal").share
    });
    let bounds = any_of(&shares);
    let either = 2.471091960e-3;
    assert!(bounds.low < either && either < bounds.high, "{bounds:?}");
    let draws = 2_000_000;
    let failed = monte_carlo(draws, |first, count| {
        let mut x = [[0.0; BLOCK]; 4];
        for (i, (part, x)) in parts.iter().zip(&mut x).enumerate() {
            part.fill(Stream::new(9, &[i as u8]), first, &mut x[..count]);
        }
        let gap = |gap: &[f64; 4], k: usize| (0..4).map(|i| gap[i] * x[i][k]).sum::<f64>();
        (0..count).filter(|&k| gaps.iter().any(|g| gap(g, k) < 0.0)).count() as u64
    });
    let seen = clopper_pearson(failed.unwrap_or(0), draws, 0.999);
    assert!(seen.low <= either && either <= seen.high, "{seen:?}");
}
