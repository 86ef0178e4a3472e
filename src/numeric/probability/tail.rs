//! The share of a sum of independent unknowns beyond a limit.

use super::{inversion, nested};
use crate::numeric::distribution::{Distribution, Factor, Shape};

/// A term `a·X` of the sum: its coefficient and its distribution.
pub type Term = (f64, Distribution);

/// Below this a share is not resolved: it says less about pieces than about the model.
const NEGLIGIBLE: f64 = 1e-18;

/// Evaluations of a factor up to which the inversion is taken without looking at the nested rule.
const CHEAP: f64 = 2e5;

/// Evaluations past which neither way is gone: a second of work for one share.
const TOO_DEAR: f64 = 5e7;

/// How a tail was computed.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Method {
    /// No spread at all, or beyond the ends of the support: the share is 0 or 1 exactly.
    Certain,
    /// The distribution function of a single term, or of normal terms only.
    Closed,
    /// The inversion of the moment function, with the number of points summed.
    Inversion(usize),
    /// Nested Gauss–Legendre rules over the few terms.
    Nested,
    /// The saddle-point approximation alone, a few per cent off, with an error as large as itself:
    /// terms of such different widths that only draws tell more.
    Estimate,
    /// Below 1e-18 and not resolved: the share is given as zero, the error as 1e-18.
    Negligible,
}

/// The share of pieces beyond a limit.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Tail {
    /// The share, a fraction of one.
    pub share: f64,
    /// A bound on its absolute error: of method and rounding, each by its own estimate.
    pub error: f64,
    /// How it was computed.
    pub method: Method,
}

impl Tail {
    fn certain(share: f64) -> Self {
        Tail { share, error: 0.0, method: Method::Certain }
    }

    fn rest(self) -> Self {
        Tail { share: 1.0 - self.share, error: self.error + f64::EPSILON, ..self }
    }
}

/// A term has no moment function in closed form, so that the sum's tail can only be drawn.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct NoMomentFunction {
    /// The term's place in the list.
    pub term: usize,
}

/// The mean of the sum.
pub fn mean(terms: &[Term]) -> f64 {
    terms.iter().map(|(a, x)| a * x.mean()).sum()
}

/// The variance of the sum.
pub fn variance(terms: &[Term]) -> f64 {
    terms.iter().map(|(a, x)| a * a * x.variance()).sum()
}

/// The share above `x`: `P(Σ a_i·X_i > x)`.
///
/// Relative error 1e-10 of the smaller tail down to 1e-18; the greater is one less the smaller.
///
/// Formula: `P(r>x) = (1/2πi)·∫ e^{K(s)−sx} ds/s` on the vertical line through the saddle point,
/// by the trapezoidal rule with bounds for its step, its end and its rounding; where the line
/// decays too slowly (few bounded terms, of very different widths), nested Gauss–Legendre rules.
///
/// Symbols: `r` the sum, `K` its log moment function, all in the caller's unit.
///
/// Source: R. Lugannani & S. Rice, Adv. Appl. Prob. 12 (1980) 475–490, for the line and the
/// saddle; J. Abate & W. Whitt, Queueing Systems 10 (1992) 5–88, for the rule's errors.
///
/// Valid for independent terms with a moment function; any single term and any sum of normal ones.
pub fn above(terms: &[Term], x: f64) -> Result<Tail, NoMomentFunction> {
    let spread: Vec<Term> =
        terms.iter().filter(|(a, d)| *a != 0.0 && *d.shape() != Shape::Point).cloned().collect();
    let mean = mean(terms);
    if let [(a, distribution)] = &spread[..] {
        // Back in the term's own unit: the rest of the sum is constant.
        let limit = distribution.mean() + (x - mean) / a;
        let share =
            if *a > 0.0 { distribution.above(limit) } else { strictly_below(distribution, limit) };
        return Ok(Tail { share, error: 4.0 * f64::EPSILON * share, method: Method::Closed });
    }
    let distance = x - mean;
    // Centred, so that the sum of the means is taken once.
    let centred: Vec<Term> =
        spread.iter().map(|(a, d)| (*a, d.moved_to(0.0).unwrap_or_else(|_| d.clone()))).collect();
    if distance >= 0.0 {
        upper(&centred, distance).map_err(|term| renumber(terms, term))
    } else {
        let mirrored: Vec<Term> = centred.into_iter().map(|(a, d)| (-a, d)).collect();
        upper(&mirrored, -distance).map(Tail::rest).map_err(|term| renumber(terms, term))
    }
}

/// The share below `x`: `P(Σ a_i·X_i < x)`; as [`above`].
pub fn below(terms: &[Term], x: f64) -> Result<Tail, NoMomentFunction> {
    let mirrored: Vec<Term> = terms.iter().map(|(a, d)| (-a, d.clone())).collect();
    above(&mirrored, -x)
}

/// The place in the whole list of the `n`-th term with a spread.
fn renumber(terms: &[Term], n: usize) -> NoMomentFunction {
    let spread = terms.iter().enumerate();
    let mut spread = spread.filter(|(_, (a, d))| *a != 0.0 && *d.shape() != Shape::Point);
    NoMomentFunction { term: spread.nth(n).map_or(0, |(place, _)| place) }
}

/// The share strictly below: all but the share at or above.
fn strictly_below(distribution: &Distribution, limit: f64) -> f64 {
    match distribution.shape() {
        // A value just at the limit is not below it: the mirrored list counts those above.
        Shape::Measured(list) if list.half_resolution() == 0.0 => {
            let distance = limit - distribution.mean();
            let below = list.deviations().partition_point(|d| *d < distance);
            below as f64 / list.count() as f64
        }
        _ => distribution.cdf(limit),
    }
}

/// The upper tail at a distance `y ≥ 0` from the mean of terms of mean zero; the error names the
/// term without a moment function.
fn upper(terms: &[Term], y: f64) -> Result<Tail, usize> {
    let mut normal = 0.0;
    let mut bounded = vec![];
    for (place, (a, distribution)) in terms.iter().enumerate() {
        for factor in distribution.factors(*a).ok_or(place)? {
            match factor {
                Factor::Normal { variance } => normal += variance,
                other => bounded.push(other),
            }
        }
    }
    let edge: f64 = bounded.iter().map(Factor::edge).sum();
    if bounded.is_empty() {
        if normal == 0.0 {
            return Ok(Tail::certain(f64::from(u8::from(y < 0.0))));
        }
        let share = crate::numeric::special::normal_tail(y / libm::sqrt(normal));
        return Ok(Tail { share, error: 8.0 * f64::EPSILON * share, method: Method::Closed });
    }
    if normal == 0.0 && y >= edge {
        return Ok(Tail::certain(0.0));
    }
    let line = match inversion::Line::new(&bounded, normal, y - edge) {
        line if line.estimate < NEGLIGIBLE => {
            return Ok(Tail { share: 0.0, error: NEGLIGIBLE, method: Method::Negligible });
        }
        line => line,
    };
    let line_cost = line.cost();
    if line_cost <= CHEAP {
        return Ok(line.sum());
    }
    let nested = nested::Nest::new(terms, normal);
    let nested = nested.map(|nest| (nest.cost(), nest));
    Ok(match nested {
        Some((cost, nest)) if cost < line_cost && cost <= TOO_DEAR => nest.tail(y),
        _ if line_cost <= TOO_DEAR => line.sum(),
        _ => Tail { share: line.estimate, error: line.estimate, method: Method::Estimate },
    })
}
