//! The beta kernel, the incomplete beta function and its inverse.
//!
//! They carry the binomial's confidence limits and Student's distribution function. Counts reach
//! 1e9, where a difference of log-gammas would lose nine digits: the kernel is Loader's instead.

use std::f64::consts::PI;

/// The logarithm of the binomial density `n!/(x!·(n−x)!)·p^x·q^{n−x}`, `q = 1 − p`, for real
/// `0 ≤ x ≤ n`.
///
/// Source: C. Loader, Fast and accurate computation of binomial probabilities (2000).
pub fn log_binomial_density(x: f64, n: f64, p: f64, q: f64) -> f64 {
    let y = n - x;
    if x <= 0.0 {
        return if p < 0.1 { n * libm::log1p(-p) } else { n * libm::log(q) };
    }
    if y <= 0.0 {
        return if q < 0.1 { n * libm::log1p(-q) } else { n * libm::log(p) };
    }
    let correction = stirling_error(n) - stirling_error(x) - stirling_error(y);
    correction - deviance(x, n * p) - deviance(y, n * q) + 0.5 * libm::log(n / (2.0 * PI * x * y))
}

/// The error of Stirling's formula, `ln Γ(n+1) − ln(√(2πn)·(n/e)^n)`.
fn stirling_error(n: f64) -> f64 {
    if n < 16.0 {
        let stirling = 0.5 * libm::log(2.0 * PI * n) + n * libm::log(n) - n;
        return libm::lgamma(n + 1.0) - stirling;
    }
    let n2 = n * n;
    let series = 1.0 / 1260.0 - (1.0 / 1680.0 - 1.0 / (1188.0 * n2)) / n2;
    (1.0 / 12.0 - (1.0 / 360.0 - series / n2) / n2) / n
}

/// The deviance `x·ln(x/m) + m − x`, without cancellation where `x` is near `m`.
fn deviance(x: f64, m: f64) -> f64 {
    let difference = x - m;
    if difference.abs() >= 0.1 * (x + m) {
        return x * libm::log(x / m) - difference;
    }
    let v = difference / (x + m);
    let (mut sum, mut term) = (difference * v, 2.0 * x * v);
    for j in 1..1000 {
        term *= v * v;
        let next = sum + term / f64::from(2 * j + 1);
        if next == sum {
            break;
        }
        sum = next;
    }
    sum
}

/// The regularized incomplete beta function `I_x(a, b)`; `a, b > 0`.
///
/// `complement` is `1 − x`, handed in since the caller often has it with more digits. Relative
/// error about 1e-13 where `a + b` is below 1e9.
///
/// Source: Abramowitz & Stegun, Handbook of Mathematical Functions, 26.5.8, by Lentz's method.
pub fn regularized_beta(x: f64, complement: f64, a: f64, b: f64) -> f64 {
    if x <= 0.0 {
        return 0.0;
    }
    if complement <= 0.0 {
        return 1.0;
    }
    // The fraction converges fast below the mean; above it the mirrored one does.
    if x > (a + 1.0) / (a + b + 2.0) {
        return 1.0 - regularized_beta(complement, x, b, a);
    }
    // x^a·y^b/(a·B(a,b)) is the binomial density of a successes in a + b, times b/(a+b).
    let kernel = log_binomial_density(a, a + b, x, complement) + libm::log(b / (a + b));
    libm::exp(kernel) * beta_fraction(x, a, b)
}

/// The continued fraction of the incomplete beta function, converged to the last digit; its
/// length grows as the square root of the larger argument, hence the cap.
fn beta_fraction(x: f64, a: f64, b: f64) -> f64 {
    const TINY: f64 = 1e-300;
    let guard = |v: f64| if v.abs() < TINY { TINY } else { v };
    let mut c = 1.0;
    let mut d = 1.0 / guard(1.0 - (a + b) * x / (a + 1.0));
    let mut value = d;
    for m in 1..200_000 {
        let m = f64::from(m);
        let even = m * (b - m) * x / ((a + 2.0 * m - 1.0) * (a + 2.0 * m));
        d = 1.0 / guard(1.0 + even * d);
        c = guard(1.0 + even / c);
        value *= d * c;
        let odd = -(a + m) * (a + b + m) * x / ((a + 2.0 * m) * (a + 2.0 * m + 1.0));
        d = 1.0 / guard(1.0 + odd * d);
        c = guard(1.0 + odd / c);
        let step = d * c;
        value *= step;
        if (step - 1.0).abs() < 2e-16 {
            break;
        }
    }
    value
}

/// The quantile of the beta distribution: the `x` with `I_x(a, b) = p`.
///
/// Bisection on the logarithm of the odds, bracketed throughout; stops at a relative width of
/// 1e-14 of the smaller of `x` and `1 − x`, which 120 halvings always reach.
pub fn beta_quantile(p: f64, a: f64, b: f64) -> f64 {
    if p <= 0.0 {
        return 0.0;
    }
    if p >= 1.0 {
        return 1.0;
    }
    let (mut low, mut high) = (-700.0, 700.0);
    let share = |odds: f64| {
        let x = 1.0 / (1.0 + libm::exp(-odds));
        let y = 1.0 / (1.0 + libm::exp(odds));
        (x, regularized_beta(x, y, a, b))
    };
    for _ in 0..120 {
        let middle = 0.5 * (low + high);
        if share(middle).1 < p {
            low = middle;
        } else {
            high = middle;
        }
        if high - low < 1e-14 {
            break;
        }
    }
    share(0.5 * (low + high)).0
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn incomplete_beta_meets_its_closed_forms() {
        // I_x(1, b) = 1 − (1−x)^b and I_x(a, 1) = x^a.
        let got = regularized_beta(0.3, 0.7, 1.0, 5.0);
        assert!((got - (1.0 - 0.7_f64 * 0.7 * 0.7 * 0.7 * 0.7)).abs() < 1e-15, "{got}");
        let got = regularized_beta(0.25, 0.75, 3.0, 1.0);
        assert!((got / 0.015625 - 1.0).abs() < 1e-14, "{got}");
        // I_½(a, a) = ½, also where log-gammas would have lost nine digits.
        let got = regularized_beta(0.5, 0.5, 1e6, 1e6);
        assert!((got - 0.5).abs() < 1e-11, "{got}");
    }

    #[test]
    fn binomial_density_meets_the_exact_fraction() {
        // 10!/(3!·7!)·(1/2)^10 = 120/1024.
        let got = libm::exp(log_binomial_density(3.0, 10.0, 0.5, 0.5));
        assert!((got / (120.0 / 1024.0) - 1.0).abs() < 1e-14, "{got}");
    }

    #[test]
    fn quantile_undoes_the_function() {
        for (p, a, b) in [(0.025, 3.0, 998.0), (0.975, 4.0, 997.0), (0.5, 0.5, 9.0)] {
            let x = beta_quantile(p, a, b);
            let back = regularized_beta(x, 1.0 - x, a, b);
            assert!((back / p - 1.0).abs() < 1e-11, "{p}: {back}");
        }
    }
}
