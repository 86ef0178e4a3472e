//! Mean and variance of a response from its derivatives to second order.

/// What the formulas need to know of one unknown.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct UnknownMoments {
    /// The standard deviation `σ`.
    pub sigma: f64,
    /// The skewness `γ`.
    pub skewness: f64,
    /// The kurtosis `κ`, 3 for a normal.
    pub kurtosis: f64,
}

/// Derivatives of the response at the means, in the order of the unknowns.
#[derive(Debug, Clone, Copy)]
pub struct Derivatives<'a> {
    /// The gradient `r_i`.
    pub first: &'a [f64],
    /// The second derivatives `r_ij`, row by row, symmetric.
    pub second: &'a [f64],
    /// The third derivatives `r_ijj`, row by row (`i` the row), if known.
    pub third: Option<&'a [f64]>,
}

/// Mean and variance to second order.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct SecondOrder {
    /// What the curvature adds to the response at the means.
    pub mean_shift: f64,
    /// The variance to first order, `Σ r_i²σ_i²`.
    pub first_order: f64,
    /// The variance to second order, exact for a quadratic response.
    pub variance: f64,
    /// The part of `variance` that belongs to no single unknown, `Σ_{i<j} r_ij²σ_i²σ_j²`.
    pub interaction: f64,
    /// The variance with the third derivatives' terms besides, where these are known.
    pub with_third: Option<f64>,
}

/// Mean and variance of a response of independent unknowns to second order.
///
/// Formula: mean shift `½Σ r_iiσ_i²`; variance
/// `Σ r_i²σ_i² + Σ r_i·r_iiγ_iσ_i³ + ¼Σ r_ii²σ_i⁴(κ_i−1) + Σ_{i<j} r_ij²σ_i²σ_j²`; with third
/// derivatives besides `Σ_{i≠j} r_i·r_ijjσ_i²σ_j² + ⅓Σ r_i·r_iiiκ_iσ_i⁴`.
///
/// Symbols: `r` the response and its derivatives at the means; `σ`, `γ`, `κ` standard deviation,
/// skewness and kurtosis of each unknown.
///
/// Source: JCGM 100:2008, 5.1.2, note, whose terms these are for normal unknowns (`γ = 0`,
/// `κ = 3`); for others the variance of the Taylor polynomial.
///
/// Valid for independent unknowns; exact for a quadratic. `None` unless the lists fit together.
pub fn second_order(
    unknowns: &[UnknownMoments],
    derivatives: Derivatives<'_>,
) -> Option<SecondOrder> {
    let n = unknowns.len();
    let Derivatives { first, second, third } = derivatives;
    if first.len() != n || second.len() != n * n || third.is_some_and(|t| t.len() != n * n) {
        return None;
    }
    let (mut mean_shift, mut first_order, mut diagonal) = (0.0, 0.0, 0.0);
    let (mut interaction, mut third_terms) = (0.0, 0.0);
    for (i, x) in unknowns.iter().enumerate() {
        let s2 = x.sigma * x.sigma;
        let (r, r_ii) = (first[i], second[i * n + i]);
        mean_shift += 0.5 * r_ii * s2;
        first_order += r * r * s2;
        diagonal += r * r_ii * x.skewness * s2 * x.sigma
            + 0.25 * r_ii * r_ii * s2 * s2 * (x.kurtosis - 1.0);
        for (j, y) in unknowns.iter().enumerate() {
            let t2 = y.sigma * y.sigma;
            if j > i {
                let r_ij = second[i * n + j];
                interaction += r_ij * r_ij * s2 * t2;
            }
            if let Some(third) = third {
                let share = if i == j { x.kurtosis / 3.0 } else { 1.0 };
                third_terms += r * third[i * n + j] * share * s2 * t2;
            }
        }
    }
    let variance = first_order + diagonal + interaction;
    Some(SecondOrder {
        mean_shift,
        first_order,
        variance,
        interaction,
        with_third: third.map(|_| variance + third_terms),
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    const NORMAL: UnknownMoments = UnknownMoments { sigma: 0.5, skewness: 0.0, kurtosis: 3.0 };

    #[test]
    fn a_square_of_a_normal_has_the_moments_of_chi_squared() {
        // r = x² about 0 with σ = ½: mean ¼, variance 2σ⁴ = ⅛.
        let derivatives = Derivatives { first: &[0.0], second: &[2.0], third: Some(&[0.0]) };
        let got = second_order(&[NORMAL], derivatives).expect("the lists fit");
        assert_eq!((got.mean_shift, got.variance, got.first_order), (0.25, 0.125, 0.0));
        assert_eq!(got.with_third, Some(0.125));
    }

    #[test]
    fn a_product_of_independent_unknowns_is_exact() {
        // r = x·y about (3, 4): variance 16σ_x² + 9σ_y² + σ_x²σ_y².
        let unknowns = [NORMAL, UnknownMoments { sigma: 0.25, skewness: 0.0, kurtosis: 1.8 }];
        let derivatives =
            Derivatives { first: &[4.0, 3.0], second: &[0.0, 1.0, 1.0, 0.0], third: None };
        let got = second_order(&unknowns, derivatives).expect("the lists fit");
        assert_eq!(got.variance, 16.0 * 0.25 + 9.0 * 0.0625 + 0.25 * 0.0625);
        assert_eq!(got.interaction, 0.25 * 0.0625);
    }

    #[test]
    fn a_skewed_unknown_moves_the_variance_of_its_square() {
        // Exponential of mean 1, σ = 1, γ = 2, κ = 9: Var(x²) = E x⁴ − (E x²)² = 24 − 4.
        let exponential = UnknownMoments { sigma: 1.0, skewness: 2.0, kurtosis: 9.0 };
        let derivatives = Derivatives { first: &[2.0], second: &[2.0], third: None };
        let got = second_order(&[exponential], derivatives).expect("the lists fit");
        assert_eq!((got.mean_shift, got.variance), (1.0, 20.0));
    }

    #[test]
    fn lists_that_do_not_fit_are_refused() {
        let derivatives = Derivatives { first: &[0.0], second: &[], third: None };
        assert_eq!(second_order(&[NORMAL], derivatives), None);
    }
}
