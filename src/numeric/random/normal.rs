//! Normal draws: Box and Muller's transformation in plain arithmetic.
//!
//! Logarithm, sine and cosine are short polynomials in operations that every machine rounds alike
//! (a fused multiply-add is one), without branches, so that the compiler makes vectors of them.
//! Their errors, all below 1.2e-8, are those of the density relative to itself, in the tails too:
//! it would take 1e15 draws to see them.

use super::stream::{GAMMA, Stream, mix};
use super::vectors::vectorized;

/// Draws that are made together: draw `i` of the first half and `i` of the second are a pair, the
/// word of the one giving the pair's distance from zero, that of the other its direction.
const GROUP: usize = 256;

const MANTISSA: u64 = 0x000f_ffff_ffff_ffff;
const ONE: u64 = 0x3ff0_0000_0000_0000;
const SIGN: u64 = 0x8000_0000_0000_0000;

/// `−2·ln(3/2 + x)` for x in [−½, ½], to 1.2e-8. All three are Chebyshev fits.
const LOGARITHM: [f64; 10] = [
    -0.8109302077975467,
    -1.3333333384545059,
    0.4444427638275668,
    -0.1975298419003786,
    0.09881868559620363,
    -0.052707285900515224,
    0.02868022659096684,
    -0.016367353412826934,
    0.012295834498846785,
    -0.007324484337708606,
];

/// `sin(πt/4)/t` in powers of t², t in [−1, 1], to 2.5e-9.
const SINE: [f64; 4] =
    [0.7853981609766183, -0.08074543470810147, 0.0024900068014923568, -3.595429072511075e-05];

/// `cos(πt/4)` in powers of t², t in [−1, 1], to 5e-11.
const COSINE: [f64; 5] = [
    0.9999999999524894,
    -0.30842513515829056,
    0.015854325228444592,
    -0.00032593858594162623,
    3.5297971342978537e-06,
];

/// A polynomial with its constant first.
#[inline(always)]
fn polynomial<const N: usize>(x: f64, coefficients: &[f64; N]) -> f64 {
    let mut sum = coefficients[N - 1];
    for c in coefficients[..N - 1].iter().rev() {
        sum = sum.mul_add(x, *c);
    }
    sum
}

/// Two independent normals of standard deviation `sigma` from two random words.
///
/// Formula: `R·cos φ` and `R·sin φ` with `R² = −2·ln u`, u even in (0, 1) and φ in a full turn.
///
/// Source: G. E. P. Box & M. E. Muller, Ann. Math. Statist. 29 (1958) 610–611.
#[inline(always)]
fn pair(distance: u64, direction: u64, sigma: f64) -> (f64, f64) {
    // u is an odd multiple of 2⁻⁵³, so that R reaches 8.57.
    let u = (f64::from_bits((distance & MANTISSA) | ONE) - 1.0) + 0.5 * f64::EPSILON;
    let bits = u.to_bits();
    // The exponent as a number: put under the mantissa of 2⁵², which is then taken off.
    let exponent =
        f64::from_bits((bits >> 52) | 0x4330_0000_0000_0000) - (4_503_599_627_370_496.0 + 1023.0);
    let mantissa = f64::from_bits((bits & MANTISSA) | ONE) - 1.5;
    let square = exponent.mul_add(-2.0 * std::f64::consts::LN_2, polynomial(mantissa, &LOGARITHM));
    // Where u is next to 1 the fit may be a hair below zero.
    let radius = sigma * (if square > 0.0 { square } else { 0.0 }).sqrt();
    // An eighth of a turn to either side, then mirrored to all sides by three more bits.
    let t = f64::from_bits((direction & MANTISSA) | ONE) * 2.0 - 3.0;
    let (sine, cosine) = (t * polynomial(t * t, &SINE), polynomial(t * t, &COSINE));
    let (x, y) = if direction & (SIGN >> 2) == 0 { (cosine, sine) } else { (sine, cosine) };
    (
        f64::from_bits((radius * x).to_bits() ^ (direction & SIGN)),
        f64::from_bits((radius * y).to_bits() ^ ((direction << 1) & SIGN)),
    )
}

impl Stream {
    /// Fills `out` with the normal draws numbered from `first` on.
    ///
    /// The draws of any number are the same however they are asked for; whole groups of 256 from
    /// a multiple of 256 on are the fastest. Tails are right to 8.5 standard deviations, beyond
    /// which lies one draw in 1e17.
    pub fn fill_normal(self, first: u64, mean: f64, sigma: f64, out: &mut [f64]) {
        vectorized(
            #[inline(always)]
            || self.fill_groups(first, mean, sigma, out),
        );
    }

    #[inline(always)]
    fn fill_groups(self, first: u64, mean: f64, sigma: f64, mut out: &mut [f64]) {
        let mut next = first;
        while !out.is_empty() {
            let offset = (next % GROUP as u64) as usize;
            let count = out.len().min(GROUP - offset);
            let (now, later) = out.split_at_mut(count);
            if let Ok(group) = <&mut [f64; GROUP]>::try_from(&mut *now) {
                self.fill_group(next, mean, sigma, group);
            } else {
                // A part of a group is cut out of the whole.
                let mut group = [0.0; GROUP];
                self.fill_normal(next - offset as u64, mean, sigma, &mut group);
                now.copy_from_slice(&group[offset..offset + count]);
            }
            next += count as u64;
            out = later;
        }
    }

    #[inline(always)]
    fn fill_group(self, first: u64, mean: f64, sigma: f64, group: &mut [f64; GROUP]) {
        const HALF: u64 = GROUP as u64 / 2;
        let mut state = self.state(first);
        let (front, back) = group.split_at_mut(GROUP / 2);
        for (x, y) in front.iter_mut().zip(back) {
            let (distance, direction) =
                (mix(state), mix(state.wrapping_add(HALF.wrapping_mul(GAMMA))));
            let (a, b) = pair(distance, direction, sigma);
            *x = mean + a;
            *y = mean + b;
            state = state.wrapping_add(GAMMA);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::special::normal_tail;

    #[test]
    fn a_pair_is_the_transformation_to_the_digits_stated() {
        let words = Stream::new(5, b"accuracy");
        for k in 0..20_000 {
            // Small distances' words too, for the far tail.
            let distance = words.bits(2 * k) >> (12 + k % 52);
            let direction = words.bits(2 * k + 1);
            let (x, y) = pair(distance, direction, 1.0);
            let u = (distance & MANTISSA) as f64 * f64::EPSILON + 0.5 * f64::EPSILON;
            let square = x * x + y * y;
            assert!((square + 2.0 * libm::log(u)).abs() < 3e-8 * (1.0 + square), "{u:e}");
            let eighth = libm::atan2(x.abs().min(y.abs()), x.abs().max(y.abs()));
            let t = (direction & MANTISSA) as f64 * (2.0 * f64::EPSILON) - 1.0;
            let angle = t.abs() * std::f64::consts::FRAC_PI_4;
            assert!((eighth - angle).abs() < 1e-8, "{t}");
        }
    }

    #[test]
    fn draws_are_the_same_however_they_are_asked_for() {
        let stream = Stream::new(2, b"pieces");
        let mut whole = [0.0; 1000];
        stream.fill_normal(700, 1.0, 2.0, &mut whole);
        for (first, last) in [(0, 1), (1, 67), (67, 68), (68, 580), (580, 1000)] {
            let mut piece = vec![0.0; last - first];
            stream.fill_normal(700 + first as u64, 1.0, 2.0, &mut piece);
            assert_eq!(piece, whole[first..last]);
        }
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
            let share = normal_tail(limit);
            assert!((above - share).abs() < 5.0 * (share * (1.0 - share) / n).sqrt(), "{limit}");
        }
        // The two of a pair are independent, and so are their squares.
        let (mut cross, mut squares) = (0.0, 0.0);
        for group in draws.chunks_exact(GROUP) {
            for i in 0..GROUP / 2 {
                let (x, y) = (group[i], group[i + GROUP / 2]);
                cross += x * y;
                squares += (x * x - 1.0) * (y * y - 1.0);
            }
        }
        let pairs = n / 2.0;
        assert!((cross / pairs).abs() < 5.0 / pairs.sqrt(), "{cross}");
        assert!((squares / pairs).abs() < 5.0 * 2.0 / pairs.sqrt(), "{squares}");
    }
}
