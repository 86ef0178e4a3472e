//! How fast shares are computed and drawn: `cargo bench --bench statistics`.
//!
//! The draws' side by side in numpy is `tests/benches/numpy_draws.py`, of the same sums and the
//! same response. `-- exact_against_a_hundred_million` runs the long check of the exact share.

use divan::counter::ItemsCount;
use divan::{Bencher, black_box};
use gapkeep::numeric::distribution::Distribution;
use gapkeep::numeric::probability::{Term, above, clopper_pearson};
use gapkeep::numeric::random::{BLOCK, Stream, monte_carlo};
use gapkeep::numeric::tape::{Column, Scratch};
use gapkeep::numeric::{Number, Tape};

fn main() {
    divan::main();
}

/// Draws of one run: few, so that some of the runs have the cores to themselves.
const DRAWS: u64 = 200 * BLOCK as u64;

/// Contributors of the long stack.
const CONTRIBUTORS: usize = 40;

fn streams() -> Vec<Stream> {
    (0..CONTRIBUTORS).map(|i| Stream::new(1, &[i as u8])).collect()
}

/// Only the normals: what any program that draws must at least do.
#[divan::bench]
fn bare_loop_of_forty_normals(bencher: Bencher<'_, '_>) {
    let streams = streams();
    bencher.counter(ItemsCount::new(DRAWS)).bench(|| {
        monte_carlo(
            DRAWS,
            #[inline(always)]
            |first, count| {
                let mut x = [0.0; BLOCK];
                for stream in &streams {
                    stream.fill_normal(first, 0.0, 1.0, &mut x[..count]);
                    black_box(&x);
                }
                0u64
            },
        )
    });
}

/// The sum of forty normals, counted where it is above a limit.
#[divan::bench]
fn yield_of_forty_normals(bencher: Bencher<'_, '_>) {
    let streams = streams();
    let part = Distribution::normal(0.0, 1.0).expect("sound");
    bencher.counter(ItemsCount::new(DRAWS)).bench(|| {
        monte_carlo(
            DRAWS,
            #[inline(always)]
            |first, count| {
                let (mut sum, mut x) = ([0.0; BLOCK], [0.0; BLOCK]);
                for (i, stream) in streams.iter().enumerate() {
                    part.fill(*stream, first, &mut x[..count]);
                    let a = 0.01 * (i + 1) as f64;
                    for (sum, x) in sum.iter_mut().zip(&x) {
                        *sum += a * x;
                    }
                }
                sum[..count].iter().filter(|sum| **sum > 1.0).count() as u64
            },
        )
    });
}

/// The pressure of a shrink joint, ten normal unknowns, counted where it is above a limit.
#[divan::bench]
fn yield_of_a_shrink_joint(bencher: Bencher<'_, '_>) {
    let streams = streams();
    let unknowns: Vec<Distribution> = JOINT
        .iter()
        .map(|(mean, sigma)| Distribution::normal(*mean, *sigma).expect("sound"))
        .collect();
    bencher.counter(ItemsCount::new(DRAWS)).bench(|| {
        monte_carlo(
            DRAWS,
            #[inline(always)]
            |first, count| {
                let mut x = [[0.0; BLOCK]; JOINT.len()];
                for ((unknown, stream), x) in unknowns.iter().zip(&streams).zip(&mut x) {
                    unknown.fill(*stream, first, &mut x[..count]);
                }
                let mut p = [0.0; BLOCK];
                for (k, p) in p.iter_mut().enumerate() {
                    *p = pressure(std::array::from_fn(|i| x[i][k]));
                }
                p[..count].iter().filter(|p| **p > 31.0).count() as u64
            },
        )
    });
}

/// The same joint as the program draws it: the formula recorded once, replayed
/// over columns of draws.
#[divan::bench]
fn yield_of_a_recorded_shrink_joint(bencher: Bencher<'_, '_>) {
    let streams = streams();
    let unknowns: Vec<Distribution> = JOINT
        .iter()
        .map(|(mean, sigma)| Distribution::normal(*mean, *sigma).expect("sound"))
        .collect();
    let tape = Tape::of(JOINT.len(), |x| pressure(std::array::from_fn(|i| x[i].clone())));
    bencher.counter(ItemsCount::new(DRAWS)).bench(|| {
        monte_carlo(
            DRAWS,
            #[inline(always)]
            |first, count| {
                let mut x = [[0.0; BLOCK]; JOINT.len()];
                for ((unknown, stream), x) in unknowns.iter().zip(&streams).zip(&mut x) {
                    unknown.fill(*stream, first, &mut x[..count]);
                }
                let inputs = std::array::from_fn::<_, 10, _>(|i| Column::Drawn(&x[i]));
                let (mut scratch, mut above) = (Scratch::default(), 0u64);
                tape.replay_columns(&inputs, count, &mut scratch, |_, _, p| {
                    if let Column::Drawn(p) = p {
                        above += p.iter().filter(|p| **p > 31.0).count() as u64;
                    }
                });
                above
            },
        )
    });
}

/// Shaft and bore, hub outside and shaft inside diameter, moduli, ratios, expansions' difference.
const JOINT: [(f64, f64); 10] = [
    (40.068, 0.003),
    (40.012, 0.003),
    (80.0, 0.05),
    (20.0, 0.05),
    (70e3, 700.0),
    (207e3, 2000.0),
    (0.33, 0.005),
    (0.29, 0.005),
    (11.7e-6, 0.2e-6),
    (40.0, 1.0),
];

/// A stand-in of the size of a real response, not the program's own formula: two thick rings.
#[inline(always)]
fn pressure<N: Number>(x: [N; 10]) -> N {
    let [shaft, bore, outer, inner, e_hub, e_shaft, nu_hub, nu_shaft, alpha, kelvin] = x;
    let interference = shaft - bore - alpha * kelvin * 40.0;
    let q2 = (outer / 40.0).sqr();
    let r2 = (inner / 40.0).sqr();
    let hub = ((q2.clone() + 1.0) / (q2 - 1.0) + nu_hub) / e_hub;
    let one = N::exact(1.0);
    let core = ((r2.clone() + 1.0) / (one - r2) - nu_shaft) / e_shaft;
    interference.max(N::exact(0.0)) / ((hub + core) * 40.0)
}

/// Forty contributors of all kinds, those in closed form twenty times over.
fn forty() -> Vec<Term> {
    let kinds = [
        Distribution::normal(0.0, 0.02),
        Distribution::uniform(0.0, 0.02),
        Distribution::triangular(0.0, 0.04),
        Distribution::normal(0.0, 0.01),
    ];
    kinds.into_iter().cycle().take(40).map(|d| (1.0, d.expect("sound"))).collect()
}

/// The exact share of forty contributors out in the tail.
#[divan::bench(args = [0.05, 0.2, 0.4, 0.6])]
fn exact_share_of_forty(bencher: Bencher<'_, '_>, limit: f64) {
    let terms = forty();
    bencher.bench(|| above(black_box(&terms), limit));
}

/// The same of forty normals that are all cut at their limits.
#[divan::bench(args = [0.1, 0.3, 0.5])]
fn exact_share_of_forty_cut(bencher: Bencher<'_, '_>, limit: f64) {
    let cut = Distribution::sorted(0.0, 0.02, -0.05, 0.05).expect("sound");
    let terms: Vec<Term> = (0..40).map(|_| (1.0, cut.clone())).collect();
    bencher.bench(|| above(black_box(&terms), limit));
}

/// An exact share against the confidence limits of 1e8 draws, too long for a test.
#[divan::bench(sample_count = 1, sample_size = 1)]
fn exact_against_a_hundred_million() {
    let terms = forty();
    let (limit, draws) = (0.35, 100_000_000);
    let exact = above(&terms, limit).map_or(f64::NAN, |tail| tail.share);
    let seen = monte_carlo(
        draws,
        #[inline(always)]
        |first, count| {
            let (mut sum, mut x) = ([0.0; BLOCK], [0.0; BLOCK]);
            for (i, (_, distribution)) in terms.iter().enumerate() {
                distribution.fill(Stream::new(2, &[i as u8]), first, &mut x[..count]);
                for (sum, x) in sum.iter_mut().zip(&x) {
                    *sum += x;
                }
            }
            sum[..count].iter().filter(|sum| **sum > limit).count() as u64
        },
    );
    let limits = clopper_pearson(seen.unwrap_or(0), draws, 0.999);
    assert!(limits.low <= exact && exact <= limits.high, "{exact:e} is not within {limits:?}");
}
