//! The loop over the draws: fixed blocks, any number of threads, one order of summing.

use super::vectors::vectorized;
use rayon::prelude::{IntoParallelIterator, ParallelIterator};
use std::ops::Range;

/// Draws in a block. Blocks are the unit of work and of summing, so their size is part of the
/// result's digits and never depends on the machine. A few columns of a block fit the first cache.
pub const BLOCK: usize = 1024;

/// What blocks of draws are summed up in.
pub trait Merge: Send {
    /// Takes in the sums of the draws that follow.
    fn merge(&mut self, next: Self);
}

impl Merge for u64 {
    fn merge(&mut self, next: u64) {
        *self += next;
    }
}

impl<T: Send> Merge for Vec<T> {
    fn merge(&mut self, next: Vec<T>) {
        self.extend(next);
    }
}

impl<A: Merge, B: Merge> Merge for (A, B) {
    fn merge(&mut self, next: (A, B)) {
        self.0.merge(next.0);
        self.1.merge(next.1);
    }
}

/// Runs draws 0 to `draws` in blocks of [`BLOCK`] over the threads of the current pool and merges
/// the blocks' sums in the order of the draws.
///
/// `block(first, count)` sums up the draws `first..first + count`; marked `#[inline(always)]` it is
/// compiled for the widest vectors that the machine has. The result is the same for any number of
/// threads. `None` for no draws.
pub fn monte_carlo<T: Merge>(draws: u64, block: impl Fn(u64, usize) -> T + Sync) -> Option<T> {
    monte_carlo_of(0..draws, block)
}

/// The same for the draws of a range, so that draws already summed up need not be drawn again.
pub fn monte_carlo_of<T: Merge>(
    draws: Range<u64>,
    block: impl Fn(u64, usize) -> T + Sync,
) -> Option<T> {
    let blocks = draws.end.saturating_sub(draws.start).div_ceil(BLOCK as u64);
    // Sums of a batch are merged before the next one starts: memory does not grow with the draws.
    const BATCH: u64 = 4096;
    let mut total: Option<T> = None;
    for batch in 0..blocks.div_ceil(BATCH) {
        let range = batch * BATCH..((batch + 1) * BATCH).min(blocks);
        let sums: Vec<T> = range
            .into_par_iter()
            .map(|index| {
                let first = draws.start + index * BLOCK as u64;
                let count = (draws.end - first).min(BLOCK as u64) as usize;
                vectorized(
                    #[inline(always)]
                    || block(first, count),
                )
            })
            .collect();
        for sum in sums {
            match &mut total {
                Some(total) => total.merge(sum),
                None => total = Some(sum),
            }
        }
    }
    total
}

/// Count, mean and sum of squared distances from the mean, merged without loss of digits.
///
/// Source: T. F. Chan, G. H. Golub, R. J. LeVeque, Algorithms for computing the sample variance,
/// The American Statistician 37 (1983) 242–247.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Moments {
    count: u64,
    mean: f64,
    squares: f64,
}

impl Moments {
    /// The moments of a block of values, in two passes.
    pub fn of(values: &[f64]) -> Self {
        if values.is_empty() {
            return Moments::default();
        }
        let n = values.len() as f64;
        let mean = values.iter().sum::<f64>() / n;
        let squares = values.iter().map(|x| (x - mean) * (x - mean)).sum();
        Moments { count: values.len() as u64, mean, squares }
    }

    /// How many values went in.
    pub fn count(&self) -> u64 {
        self.count
    }

    /// The mean.
    pub fn mean(&self) -> f64 {
        self.mean
    }

    /// The unbiased variance; zero for fewer than two values.
    pub fn variance(&self) -> f64 {
        if self.count < 2 { 0.0 } else { self.squares / (self.count - 1) as f64 }
    }
}

impl Merge for Moments {
    fn merge(&mut self, next: Moments) {
        if next.count == 0 {
            return;
        }
        let (n, m) = (self.count as f64, next.count as f64);
        let step = next.mean - self.mean;
        self.mean += step * m / (n + m);
        self.squares += next.squares + step * step * n * m / (n + m);
        self.count += next.count;
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::random::Stream;

    fn run() -> Option<Moments> {
        let stream = Stream::new(3, b"threads");
        monte_carlo(100_003, |first, count| {
            let mut values = [0.0; BLOCK];
            stream.fill_normal(first, 10.0, 2.0, &mut values[..count]);
            Moments::of(&values[..count])
        })
    }

    #[test]
    fn the_digits_do_not_depend_on_the_number_of_threads() {
        let on =
            |threads| rayon::ThreadPoolBuilder::new().num_threads(threads).build().expect("a pool");
        let one = on(1).install(run);
        assert_eq!(one, on(2).install(run));
        assert_eq!(one, on(7).install(run));
        assert_eq!(one.map(|m| m.count()), Some(100_003));
    }

    #[test]
    fn draws_in_two_runs_are_those_of_one() {
        let stream = Stream::new(3, b"runs");
        let of = |draws: Range<u64>| {
            monte_carlo_of(draws, |first, count| {
                let mut values = [0.0; BLOCK];
                stream.fill_normal(first, 0.0, 1.0, &mut values[..count]);
                values[..count].iter().map(|x| x.to_bits()).collect::<Vec<u64>>()
            })
            .unwrap_or_default()
        };
        let mut parts = of(0..3000);
        parts.extend(of(3000..5000));
        assert_eq!(parts, of(0..5000));
        assert!(of(7..7).is_empty());
    }

    #[test]
    fn merged_moments_are_those_of_the_whole() {
        let values: Vec<f64> = (0..1000).map(|i| 1e6 + f64::from(i % 17)).collect();
        let whole = Moments::of(&values);
        let mut parts = Moments::of(&values[..300]);
        parts.merge(Moments::of(&values[300..]));
        assert!((parts.mean() - whole.mean()).abs() < 1e-9);
        assert!((parts.variance() / whole.variance() - 1.0).abs() < 1e-12);
        assert_eq!(monte_carlo(0, |_, _| 1u64), None);
    }
}
