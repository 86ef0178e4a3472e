//! The scaled complementary error function of a complex argument.

use crate::numeric::complex::Complex;
use std::f64::consts::{FRAC_2_SQRT_PI, PI};
use std::sync::LazyLock;

/// The last index of the sums; 12 terms reach 2e-15.
const N: usize = 11;

/// The step `√(π/(N+1))`.
static STEP: LazyLock<f64> = LazyLock::new(|| libm::sqrt(PI / (N as f64 + 1.0)));

/// Squares of the midpoints `(k+½)h` with their weights `e^{−t²}`.
static MIDPOINTS: LazyLock<[(f64, f64); N + 1]> = LazyLock::new(|| nodes(0.5));

/// Squares of the grid points `(k+1)h` with their weights `e^{−t²}`.
static GRID: LazyLock<[(f64, f64); N + 1]> = LazyLock::new(|| nodes(1.0));

fn nodes(offset: f64) -> [(f64, f64); N + 1] {
    std::array::from_fn(|k| {
        let t = (k as f64 + offset) * *STEP;
        (t * t, libm::exp(-t * t))
    })
}

/// `e^{z²}·erfc(z)` for `Re z ≥ 0`, where it is bounded; relative error about 2e-15.
///
/// For `Re z < 0` use `2e^{z²} − scaled_erfc(−z)`.
///
/// Formula: the trapezoidal or midpoint rule of `(i/π)∫ e^{−t²}/(w−t) dt`, `w = iz`, corrected by
/// the residue of the pole that the rule steps over.
///
/// Source: M. Al Azah & S. N. Chandler-Wilde, Computation of the complex error function using
/// modified trapezoidal rules, SIAM J. Numer. Anal. 59 (2021) 2346–2367.
pub fn scaled_erfc(z: Complex) -> Complex {
    // w(iz), by symmetry about the imaginary axis taken in the first quadrant.
    let w = Complex::new(z.im.abs(), z.re);
    let value = faddeeva_first_quadrant(w);
    if z.im > 0.0 { value.conj() } else { value }
}

fn faddeeva_first_quadrant(z: Complex) -> Complex {
    let (x, y) = (z.re, z.im);
    if x > 12.0 || y > 12.0 {
        return continued_fraction(z);
    }
    let h = *STEP;
    let z2 = z * z;
    let sum = |nodes: &[(f64, f64)]| {
        nodes.iter().fold(Complex::new(0.0, 0.0), |sum, &(t2, weight)| {
            sum + Complex::new(z2.re - t2, z2.im).recip() * weight
        })
    };
    let i_z = Complex::new(-y, x);
    let scale = i_z * (2.0 * h / PI);
    if y >= x.max(PI / h) {
        return scale * sum(&MIDPOINTS[..]);
    }
    // The residue's wave e^{−2πiz/h}; its modulus e^{2πy/h} stays small enough here.
    let wave = (i_z * (-2.0 * PI / h)).exp();
    let gauss = (-z2).exp() * 2.0;
    let phase = x / h - (x / h).floor();
    if y < x && (0.25..=0.75).contains(&phase) {
        let first = Complex::new(0.0, h / PI) * z.recip();
        first + scale * sum(&GRID[..N]) + gauss / (Complex::ONE - wave)
    } else {
        scale * sum(&MIDPOINTS[..]) + gauss / (Complex::ONE + wave)
    }
}

/// Laplace's continued fraction, ten levels deep: past |z| = 12 it has converged to the last digit.
///
/// Source: Abramowitz & Stegun, Handbook of Mathematical Functions, 7.1.14.
fn continued_fraction(z: Complex) -> Complex {
    let tail = (1..=10).rev().fold(z, |tail, k| z - tail.recip() * (0.5 * f64::from(k)));
    Complex::new(0.0, 0.5 * FRAC_2_SQRT_PI) * tail.recip()
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Values of `exp(z*z)*erfc(z)` from mpmath 1.3 with 40 digits.
    #[test]
    fn agrees_with_an_independent_library() {
        for (re, im, u, v) in CASES {
            let got = scaled_erfc(Complex::new(re, im));
            let want = Complex::new(u, v);
            assert!((got - want).norm() < 4e-15 * want.norm(), "({re}, {im}): {got:?}");
        }
    }
    /// Real and imaginary part of the argument and of the value.
    const CASES: [(f64, f64, f64, f64); 13] = [
        (0.0, 0.3, 0.9139311852712282, -0.31891568277156584),
        (0.01, 2.4, 0.004609039217515706, -0.2653626208830289),
        (0.2, 5.0, 0.0048070373359642435, -0.11504012013114057),
        (1.5, 1.5, 0.20111511752685224, -0.1643485813502875),
        (0.0, 7.25, 1.4872921816512705e-23, -0.07858171044238156),
        (3.0, 0.5, 0.175105212623158, -0.026636168446230884),
        (2.0, 9.0, 0.013500451659066343, -0.06002589662712968),
        (0.4, -2.2, 0.0696548848881569, 0.2717103363829778),
        (11.9, 11.9, 0.023747070985744505, -0.023663375142688882),
        (13.0, 0.2, 0.04326183059726522, -0.000661686262735401),
        (0.01, 12.5, 3.646042170644921e-05, -0.045280979011312825),
        (0.05, 0.55, 0.7112848019547477, -0.47070363194214465),
        (1e-06, 4.1, 8.71973633249915e-08, -0.14213589636719762),
    ];

    #[test]
    fn agrees_with_the_real_function_on_the_real_axis() {
        for x in [0.0, 0.1, 0.7, 1.9, 3.0, 5.5] {
            let want = libm::exp(x * x) * libm::erfc(x);
            let got = scaled_erfc(Complex::new(x, 0.0));
            assert!((got.re / want - 1.0).abs() < 2e-14 && got.im.abs() < 1e-15, "{x}: {got:?}");
        }
    }
}
