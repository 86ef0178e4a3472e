//! Statistics from the straight line through the means, with a bound on what the line leaves out.

use super::corners::reach;
use super::{Case, Corners};
use crate::evaluate::outcome::{Statistics, VarianceShare};
use crate::evaluate::scene::Response;
use crate::model::Assembly;
use crate::numeric::Interval;
use crate::numeric::probability::{
    Derivatives, Term, UnknownMoments, above, any_of, below, second_order,
};

/// Shares whose bounds differ by less than this ratio print alike.
const ALIKE: f64 = 1.02;

/// The line at one corner of the scenarios.
struct Line {
    /// The quantity at the means.
    mean: f64,
    /// Slopes times distributions, centred.
    terms: Vec<Term>,
    /// Variance to first order.
    variance: f64,
    /// Mean and variance to second order.
    second: (f64, f64),
    interaction: f64,
    /// Most that the quantity leaves the line by, within the reach of the unknowns.
    remainder: f64,
    /// True where the quantity may have a kink within their reach.
    kinked: bool,
    /// Each random unknown: its input and the variance it brings.
    parts: Vec<(usize, f64)>,
    /// Slope and half reach of each random unknown, in the order of `parts`.
    slopes: Vec<(f64, f64)>,
}

pub(super) fn statistics(assembly: &Assembly, case: &Case<'_>) -> Statistics {
    let lines = |corners: &[Vec<f64>]| -> Vec<Line> {
        corners.iter().map(|c| line(case.response, &case.corners, c)).collect()
    };
    let (low, high) = (lines(&case.corners.least), lines(&case.corners.greatest));
    // The side that is nearer to its limit, in standard deviations, is the one shown.
    let lowest = low.iter().min_by(|a, b| reached(a, -3.0).total_cmp(&reached(b, -3.0)));
    let highest = high.iter().max_by(|a, b| reached(a, 3.0).total_cmp(&reached(b, 3.0)));
    let (Some(lowest), Some(highest)) = (lowest, highest) else { return Statistics::unknown() };
    let mut shares = Vec::new();
    let mut exact = true;
    let mut bounds = (0.0_f64, 0.0_f64);
    for (lines, limit, side) in [(&low, case.lower, Side::Below), (&high, case.upper, Side::Above)]
    {
        let Some(limit) = limit else { continue };
        for line in lines {
            let (least, share, most) = side.shares(line, limit);
            exact &= most <= ALIKE * least + 1e-15;
            bounds.0 = bounds.0.max(least);
            bounds.1 += most;
            shares.push(share);
        }
    }
    let joint = any_of(&shares);
    if exclusive(&low, &high, case) {
        bounds.0 = bounds.1.min(shares.iter().sum::<f64>() / ALIKE).max(bounds.0);
    } else {
        exact &= joint.high <= ALIKE * joint.low + 1e-15;
    }
    exact &= case.corners.proven;
    let ends = ((lowest.mean, deviation(lowest)), (highest.mean, deviation(highest)));
    let cpk = cpk(ends.0, ends.1, case.lower, case.upper);
    let shown = match (case.lower, case.upper) {
        (Some(l), Some(u)) => {
            let below = (lowest.mean - l) / deviation(lowest);
            let above = (u - highest.mean) / deviation(highest);
            if below <= above { lowest } else { highest }
        }
        (Some(_), None) => lowest,
        _ => highest,
    };
    Statistics {
        mean: shown.mean,
        sigma: deviation(shown),
        second_order: (shown.second.0, libm::sqrt(shown.second.1.max(0.0))),
        low: ends.0,
        high: ends.1,
        share_failing: shares.iter().sum::<f64>().min(1.0),
        share_interval: (bounds.0.min(1.0), bounds.1.min(1.0)),
        drawn: None,
        worst_lot: None,
        cpk,
        exact,
        kinked: low.iter().chain(&high).any(|line| line.kinked),
        random: shown.parts.len(),
        assumed: assumed(assembly, case.response),
        variance_shares: variance_shares(case.response, shown),
    }
}

/// True where no piece can break more than one of the limits counted, so that shares add up: one
/// corner a side, and the two corners too close to each other for one piece to pass both limits.
fn exclusive(low: &[Line], high: &[Line], case: &Case<'_>) -> bool {
    let (Some(lower), Some(upper)) = (case.lower, case.upper) else {
        return (case.lower.is_none() || low.len() <= 1)
            && (case.upper.is_none() || high.len() <= 1);
    };
    let ([low], [high]) = (low, high) else { return false };
    let mut apart = high.mean - low.mean + low.remainder + high.remainder;
    for ((a, reach), (b, _)) in low.slopes.iter().zip(&high.slopes) {
        apart += (b - a).abs() * reach;
    }
    apart <= upper - lower
}

fn reached(line: &Line, sigmas: f64) -> f64 {
    line.mean + sigmas * deviation(line)
}

/// Standard deviation to first order.
fn deviation(line: &Line) -> f64 {
    libm::sqrt(line.variance.max(0.0))
}

/// True where some random unknown varies as nobody has said it does.
fn assumed(assembly: &Assembly, response: &Response) -> bool {
    response.unknowns.iter().any(|u| match *u {
        crate::model::Unknown::Size { dimension, .. } => {
            !assembly.dimension(dimension).spread.stated
        }
        _ => false,
    })
}

/// The capability index to the nearer limit, of mean and standard deviation at either side.
pub(super) fn cpk(
    low: (f64, f64),
    high: (f64, f64),
    lower: Option<f64>,
    upper: Option<f64>,
) -> Option<f64> {
    let below = lower.map(|l| (low.0 - l) / (3.0 * low.1));
    let above = upper.map(|u| (u - high.0) / (3.0 * high.1));
    match (below, above) {
        (Some(b), Some(a)) => Some(b.min(a)),
        (one, other) => one.or(other),
    }
}

fn variance_shares(response: &Response, line: &Line) -> Vec<VarianceShare> {
    let whole = line.variance + line.interaction;
    let share = |part: f64| if whole > 0.0 { part / whole } else { 0.0 };
    line.parts
        .iter()
        .map(|&(input, part)| VarianceShare {
            unknown: Some(response.unknowns[input]),
            share: share(part),
        })
        .chain(
            (line.interaction > 1e-12 * whole)
                .then(|| VarianceShare { unknown: None, share: share(line.interaction) }),
        )
        .collect()
}

/// Which limit a share lies beyond.
#[derive(Clone, Copy, PartialEq)]
enum Side {
    Below,
    Above,
}

impl Side {
    /// The share beyond a limit: at least, on the line, at most.
    fn shares(self, line: &Line, limit: f64) -> (f64, f64, f64) {
        // The terms are centred, so the limit is taken from the mean.
        let share = |x: f64| {
            let tail = match self {
                Side::Below => below(&line.terms, x - line.mean),
                Side::Above => above(&line.terms, x - line.mean),
            };
            tail.map_or(1.0, |t| t.share)
        };
        let on_line = share(limit);
        if line.remainder == 0.0 {
            return (on_line, on_line, on_line);
        }
        if !line.remainder.is_finite() {
            return (0.0, on_line, 1.0);
        }
        let (inward, outward) = (share(limit + line.remainder), share(limit - line.remainder));
        (inward.min(outward), on_line, inward.max(outward))
    }
}

fn line(response: &Response, corners: &Corners, at: &[f64]) -> Line {
    let (mean, slopes, curvature) = response.tape.hessian(at);
    let random: Vec<usize> = (0..at.len()).filter(|&i| corners.chances[i].is_some()).collect();
    let boxed: Vec<Interval> = at
        .iter()
        .zip(&corners.chances)
        .map(|(&x, chance)| chance.as_ref().map_or(Interval::point(x), reach))
        .collect();
    let (_, within, bends) = response.tape.hessian(&boxed);
    // Second derivatives see no kink; first derivatives enclose the slopes on both of its sides.
    let kinked = response.tape.may_kink_within(&boxed);
    let far = |i: usize| (boxed[i].hi() - at[i]).max(at[i] - boxed[i].lo());
    let (mut terms, mut parts, mut moments) = (Vec::new(), Vec::new(), Vec::new());
    let (mut remainder, mut variance) = (0.0, 0.0);
    for &i in &random {
        let Some(chance) = &corners.chances[i] else { continue };
        let sigma = chance.standard_deviation();
        let part = slopes[i] * slopes[i] * sigma * sigma;
        variance += part;
        parts.push((i, part));
        terms.push((slopes[i], chance.moved_to(0.0).unwrap_or_else(|_| chance.clone())));
        moments.push(UnknownMoments {
            sigma,
            skewness: chance.skewness(),
            kurtosis: chance.kurtosis(),
        });
        if kinked {
            remainder += (within[i] - Interval::point(slopes[i])).magnitude() * far(i);
        } else {
            remainder += random
                .iter()
                .map(|&j| 0.5 * bends[i][j].magnitude() * far(i) * far(j))
                .sum::<f64>();
        }
    }
    let first: Vec<f64> = random.iter().map(|&i| slopes[i]).collect();
    let second: Vec<f64> = random
        .iter()
        .flat_map(|&i| random.iter().map(move |&j| (i, j)))
        .map(|(i, j)| curvature[i][j])
        .collect();
    let derivatives = Derivatives { first: &first, second: &second, third: None };
    let (shift, total, interaction) = match second_order(&moments, derivatives) {
        Some(s) => (s.mean_shift, s.variance, s.interaction),
        None => (0.0, variance, 0.0),
    };
    Line {
        mean,
        terms,
        variance,
        second: (mean + shift, total),
        interaction,
        remainder,
        kinked,
        parts,
        slopes: random.iter().map(|&i| (slopes[i], far(i))).collect(),
    }
}
