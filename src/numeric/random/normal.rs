//! Fast normal draws: the normal quantile by short polynomials in plain arithmetic.
//!
//! The lower half of (0, 1) is cut into octaves (½, ¼, ⅛ …) and each octave into eight parts, so
//! that the exponent and three bits of the mantissa number the part. Within a part the quantile is
//! a polynomial of degree five through six Chebyshev points of the exact quantile. No branches:
//! the compiler turns the loop into whatever vectors the machine has, and since the operations are
//! the same, so are the digits.

use super::stream::Stream;
use crate::numeric::special::normal_quantile;
use std::f64::consts::PI;
use std::sync::LazyLock;

/// Terms of a polynomial.
const TERMS: usize = 6;

/// Parts, a power of two so that a mask replaces the bounds check; 53 octaves of 8 are in use.
const PARTS: usize = 512;

/// The bits of 2⁻⁵⁴ shifted to the number of a part: the least argument's part is number 0.
const FIRST_PART: u64 = (1023 - 54) << 3;

/// The polynomials' coefficients, one row a power.
type Table = [[f64; PARTS]; TERMS];

static TABLE: LazyLock<Box<Table>> = LazyLock::new(build);

/// Interpolates the quantile in every part.
fn build() -> Box<Table> {
    let mut table = Box::new([[0.0; PARTS]; TERMS]);
    for part in 0..53 * 8 {
        let start = f64::from_bits((FIRST_PART + part as u64) << 49);
        let width = f64::from_bits((FIRST_PART + part as u64 + 1) << 49) - start;
        // Nodes in the part's own variable, −½ to ½.
        let nodes: [f64; TERMS] =
            std::array::from_fn(|i| 0.5 * libm::cos(PI * (i as f64 + 0.5) / TERMS as f64));
        let mut differences = nodes.map(|t| normal_quantile(start + width * (t + 0.5)));
        for level in 1..TERMS {
            for i in (level..TERMS).rev() {
                differences[i] =
                    (differences[i] - differences[i - 1]) / (nodes[i] - nodes[i - level]);
            }
        }
        // Newton's form multiplied out to powers.
        let mut powers = [0.0; TERMS];
        for i in (0..TERMS).rev() {
            for k in (1..TERMS).rev() {
                powers[k] = powers[k - 1] - nodes[i] * powers[k];
            }
            powers[0] = differences[i] - nodes[i] * powers[0];
        }
        for (row, power) in table.iter_mut().zip(powers) {
            row[part] = power;
        }
    }
    table
}

/// The polynomial of `p` in [2⁻⁵⁴, ½).
#[inline]
fn lower_half(table: &Table, p: f64) -> f64 {
    let bits = p.to_bits();
    let part = ((bits >> 49).wrapping_sub(FIRST_PART)) as usize & (PARTS - 1);
    // The rest of the mantissa as a number in [1, 2), then from the part's middle.
    let t = f64::from_bits(((bits << 3) & 0x000f_ffff_ffff_ffff) | 0x3ff0_0000_0000_0000) - 1.5;
    let mut sum = table[TERMS - 1][part];
    for row in table[..TERMS - 1].iter().rev() {
        sum = sum * t + row[part];
    }
    sum
}

/// The normal quantile of `u` in (0, 1) to 2e-10 for draws; beyond ±8.2 it stays at the ends.
#[inline]
pub fn fast_normal_quantile(u: f64) -> f64 {
    let table: &Table = &TABLE;
    let p = u.min(1.0 - u).clamp(1.0 / (1u64 << 54) as f64, 0.5 - f64::EPSILON);
    let lower = lower_half(table, p);
    if u < 0.5 { lower } else { -lower }
}

impl Stream {
    /// Fills `out` with the normal draws numbered from `first` on.
    ///
    /// One bit gives the side, 52 bits the share of the tail, so that tails are right to 8.2
    /// standard deviations, beyond which lies one draw in 1e16.
    #[inline]
    pub fn fill_normal(self, first: u64, mean: f64, sigma: f64, out: &mut [f64]) {
        let table: &Table = &TABLE;
        for (k, x) in (first..).zip(out) {
            let bits = self.bits(k);
            let mantissa = (bits & 0x000f_ffff_ffff_ffff) | 0x3ff0_0000_0000_0000;
            let p = 0.5 * (f64::from_bits(mantissa) - 1.0) + 0.25 * f64::EPSILON;
            let side = bits & 0x8000_0000_0000_0000;
            *x = mean + sigma * f64::from_bits(lower_half(table, p).to_bits() ^ side);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_fast_quantile_is_as_exact_as_it_says() {
        let stream = Stream::new(5, b"accuracy");
        let mut worst: f64 = 0.0;
        for k in 0..20_000 {
            // Shares spread over all octaves.
            let p = stream.uniform(2 * k) * libm::exp2(-1.0 - 52.0 * stream.uniform(2 * k + 1));
            let p = p.max(1.0 / (1u64 << 54) as f64);
            worst = worst.max((fast_normal_quantile(p) - normal_quantile(p)).abs());
            // Nearer to one than this the share above has no digits left.
            let upper = 1.0 - p.max(f64::EPSILON);
            worst = worst.max((fast_normal_quantile(upper) - normal_quantile(upper)).abs());
        }
        assert!(worst < 2e-10, "{worst:e}");
    }

    #[test]
    fn normal_draws_have_the_moments_and_tails_of_a_normal() {
        let mut draws = vec![0.0; 1 << 20];
        Stream::new(11, b"moments").fill_normal(0, 0.0, 1.0, &mut draws);
        let n = draws.len() as f64;
        let moment = |k: i32| {
            draws.iter().map(|x| (0..k).fold(1.0, |product, _| product * x)).sum::<f64>() / n
        };
        // Five standard errors of each moment: its variance is (2k−1)!! − (moment)².
        assert!(moment(1).abs() < 5.0 * (1.0 / n).sqrt());
        assert!((moment(2) - 1.0).abs() < 5.0 * (2.0 / n).sqrt());
        assert!(moment(3).abs() < 5.0 * (15.0 / n).sqrt());
        assert!((moment(4) - 3.0).abs() < 5.0 * (96.0 / n).sqrt());
        for limit in [-3.0, -1.0, 0.5, 2.0, 4.0] {
            let above = draws.iter().filter(|x| **x > limit).count() as f64 / n;
            let share = crate::numeric::special::normal_tail(limit);
            assert!((above - share).abs() < 5.0 * (share * (1.0 - share) / n).sqrt(), "{limit}");
        }
    }
}
