//! What each unknown adds to a range.
//!
//! The parts are the integral of each derivative along the straight line from the least to the
//! greatest corner (Aumann and Shapley, *Values of Non-Atomic Games*, 1974, from memory), so that
//! they always sum to the range, also where the quantity is not linear or has a kink.

use super::outcome::{Contributor, Range};
use super::scene::Response;
use crate::numeric::quadrature::gauss_legendre_16;
use crate::numeric::tape::Tape;

/// The contributors to a range, largest first.
pub(crate) fn contributors(response: &Response, range: &Range) -> Vec<Contributor> {
    let from: Vec<f64> = range.least.corner.iter().map(|c| c.1).collect();
    let to: Vec<f64> = range.greatest.corner.iter().map(|c| c.1).collect();
    let parts = integrate(&response.tape, &from, &to);
    let (_, sensitivities) = response.tape.gradient(&response.middle);
    let whole: f64 = parts.iter().sum();
    let share = |part: f64| if whole == 0.0 { 0.0 } else { part / whole };
    let mut list: Vec<Contributor> = response
        .unknowns
        .iter()
        .zip(parts)
        .zip(sensitivities)
        .map(|((&unknown, part), sensitivity)| Contributor {
            unknown,
            sensitivity,
            part,
            share_of_range: share(part),
        })
        .collect();
    list.sort_by(|a, b| b.part.abs().total_cmp(&a.part.abs()).then(a.unknown.cmp(&b.unknown)));
    list
}

/// What each input adds along the straight line from one point to another: `Δx_i·∫₀¹ ∂r/∂x_i dt`.
///
/// Each smooth piece is integrated by itself: one rule across a contact that opens would be off by
/// several per cent.
pub(crate) fn integrate(tape: &Tape, from: &[f64], to: &[f64]) -> Vec<f64> {
    let kinks = tape.kinks_along(from, to);
    let starts = std::iter::once(0.0).chain(kinks.iter().copied());
    let pieces = starts.zip(kinks.iter().copied().chain(std::iter::once(1.0)));
    let mut parts = vec![0.0; from.len()];
    let mut point = from.to_vec();
    for (t, weight) in pieces.flat_map(|(a, b)| gauss_legendre_16().points(a, b)) {
        for ((x, a), b) in point.iter_mut().zip(from).zip(to) {
            *x = a + t * (b - a);
        }
        let (_, slopes) = tape.gradient(&point);
        for ((part, slope), (a, b)) in parts.iter_mut().zip(&slopes).zip(from.iter().zip(to)) {
            // An input that stays counts nothing, also where its slope is not finite.
            if a != b {
                *part += slope * (b - a) * weight;
            }
        }
    }
    parts
}
