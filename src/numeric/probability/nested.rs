//! Nested Gauss–Legendre rules: the tail of a sum of few terms by conditioning on one after another.

use super::tail::{Method, Tail, Term};
use crate::numeric::distribution::{Distribution, Shape};
use crate::numeric::quadrature::{GaussLegendre, gauss_legendre_16, gauss_legendre_24};
use crate::numeric::special::normal_tail;

/// Densities past which nesting is out of the question.
const MOST_DENSITIES: usize = 4;

/// A bounded density with its coefficient and the points between which it is smooth.
struct Density {
    coefficient: f64,
    distribution: Distribution,
    nodes: Vec<f64>,
    /// The points where the tail of all that lies within is not smooth.
    breaks: Vec<f64>,
}

/// The terms: lists of single values outermost, then densities, a normal innermost.
pub(super) struct Nest {
    lists: Vec<Vec<f64>>,
    densities: Vec<Density>,
    sigma: f64,
}

/// Where the normal's tail is split, in standard deviations; past 12 it is 0 or 1 to 1e-32.
const NORMAL_SPLITS: [f64; 7] = [0.0, 1.2, 2.5, 4.0, 6.0, 9.0, 12.0];

impl Nest {
    /// Takes the terms of mean zero apart; `normal` is the variance of all normal ones together.
    /// `None` for more densities than can be nested.
    pub(super) fn new(terms: &[Term], normal: f64) -> Option<Self> {
        let mut nest = Nest { lists: vec![], densities: vec![], sigma: libm::sqrt(normal) };
        for (a, distribution) in terms {
            match distribution.shape() {
                Shape::Normal { .. } | Shape::Point => {}
                Shape::Measured(list) => {
                    nest.lists.push(list.deviations().iter().map(|d| a * d).collect());
                    if let Ok(step) = Distribution::uniform(0.0, list.half_resolution()) {
                        nest.densities.push(Density::new(*a, step));
                    }
                }
                _ => nest.densities.push(Density::new(*a, distribution.clone())),
            }
        }
        if nest.densities.len() > MOST_DENSITIES {
            return None;
        }
        let mut inner = vec![0.0];
        if nest.sigma > 0.0 {
            let sigma = nest.sigma;
            inner = NORMAL_SPLITS.iter().flat_map(|v| [-v * sigma, v * sigma]).collect();
        }
        for density in nest.densities.iter_mut().rev() {
            inner.sort_by(f64::total_cmp);
            inner.dedup();
            let sums = density.nodes.iter().flat_map(|own| inner.iter().map(move |x| own + x));
            let sums = sums.collect();
            density.breaks = std::mem::replace(&mut inner, sums);
        }
        Some(nest)
    }

    /// About how many evaluations of a density the nested sums take.
    pub(super) fn cost(&self) -> f64 {
        let integrated = self.densities.len() - usize::from(self.innermost_is_closed());
        let lists: f64 = self.lists.iter().map(|list| list.len() as f64).product();
        let densities = self.densities.iter().take(integrated);
        lists * densities.map(|d| 24.0 * (d.nodes.len() + d.breaks.len()) as f64).product::<f64>()
    }

    /// Whether the innermost level is a density, whose own distribution function ends the nest.
    fn innermost_is_closed(&self) -> bool {
        self.sigma == 0.0 && !self.densities.is_empty()
    }

    /// The share above `y`. The error is the difference to the rule of 16 points, which is far
    /// above that of the 24 used, and what the rounding of the limit may move.
    pub(super) fn tail(&self, y: f64) -> Tail {
        let share = self.above_lists(0, y, gauss_legendre_24());
        let coarse = self.above_lists(0, y, gauss_legendre_16());
        let reach: f64 = self.densities.iter().map(|d| d.nodes[d.nodes.len() - 1]).sum();
        let rounding = 4.0 * f64::EPSILON * (y + reach);
        let moved = self.above_lists(0, y - rounding, gauss_legendre_16());
        let error = (share - coarse).abs() + (moved - coarse).abs() + 1e-14 * share;
        Tail { share, error, method: Method::Nested }
    }

    /// `P(lists from this one on + densities + normal > z)`.
    fn above_lists(&self, list: usize, z: f64, rule: &GaussLegendre) -> f64 {
        match self.lists.get(list) {
            Some(values) => {
                let above = |x: &f64| self.above_lists(list + 1, z - x, rule);
                values.iter().map(above).sum::<f64>() / values.len() as f64
            }
            None => self.above(0, z, rule),
        }
    }

    /// `P(densities from this one on + normal > z)`.
    fn above(&self, level: usize, z: f64, rule: &GaussLegendre) -> f64 {
        let Some(density) = self.densities.get(level) else {
            return if self.sigma > 0.0 {
                normal_tail(z / self.sigma)
            } else {
                f64::from(u8::from(z < 0.0))
            };
        };
        if level + 1 == self.densities.len() && self.innermost_is_closed() {
            return density.tail(z);
        }
        let Density { coefficient, distribution, nodes, breaks } = density;
        let (start, end) = (nodes[0], nodes[nodes.len() - 1]);
        // Where the inner tail is 0 or 1 no integral is needed.
        let zero_until = z - breaks[breaks.len() - 1];
        let one_from = z - breaks[0];
        let (from, to) = (start.max(zero_until), end.min(one_from));
        let mut points: Vec<f64> = breaks.iter().map(|b| z - b).chain(nodes.clone()).collect();
        points.retain(|u| *u >= from && *u <= to);
        points.sort_by(f64::total_cmp);
        let certain = if one_from < end { density.tail(one_from) } else { 0.0 };
        let pieces = points.windows(2).filter(|pair| pair[1] > pair[0]);
        let integrand = |u: f64| {
            let weight = distribution.density(u / coefficient) / coefficient.abs();
            weight * self.above(level + 1, z - u, rule)
        };
        certain + pieces.map(|pair| rule.integrate(pair[0], pair[1], integrand)).sum::<f64>()
    }
}

impl Density {
    fn new(coefficient: f64, distribution: Distribution) -> Self {
        let mut nodes: Vec<f64> =
            distribution.nodes().into_iter().map(|x| coefficient * x).collect();
        nodes.sort_by(f64::total_cmp);
        Density { coefficient, distribution, nodes, breaks: vec![] }
    }

    /// The share above `z`.
    fn tail(&self, z: f64) -> f64 {
        let limit = z / self.coefficient;
        if self.coefficient > 0.0 {
            self.distribution.above(limit)
        } else {
            self.distribution.cdf(limit)
        }
    }
}
