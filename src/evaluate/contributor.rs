//! What each unknown adds to a range.
//!
//! The parts are the integral of each derivative along the straight line from the least to the
//! greatest corner (Aumann and Shapley, *Values of Non-Atomic Games*, 1974, from memory), so that
//! they always sum to the range, also where the quantity is not linear.

use super::outcome::{Contributor, Range};
use super::scene::Response;

/// Nodes and weights of six-point Gauss–Legendre quadrature on 0 … 1 (Abramowitz and Stegun, table
/// 25.4, halved).
const GAUSS: [(f64, f64); 6] = [
    (0.033_765_242_898_423_99, 0.085_662_246_189_585_17),
    (0.169_395_306_766_867_74, 0.180_380_786_524_069_3),
    (0.380_690_406_958_401_55, 0.233_956_967_286_345_52),
    (0.619_309_593_041_598_4, 0.233_956_967_286_345_52),
    (0.830_604_693_233_132_3, 0.180_380_786_524_069_3),
    (0.966_234_757_101_576, 0.085_662_246_189_585_17),
];

/// Pieces of the line that are integrated one by one, so that a kink spoils only one of them.
const PIECES: usize = 2;

/// The contributors to a range, largest first.
pub(crate) fn contributors(response: &Response, range: &Range) -> Vec<Contributor> {
    let from: Vec<f64> = range.least.corner.iter().map(|c| c.1).collect();
    let to: Vec<f64> = range.greatest.corner.iter().map(|c| c.1).collect();
    let mut parts = vec![0.0; response.unknowns.len()];
    let mut point = from.clone();
    for piece in 0..PIECES {
        for (node, weight) in GAUSS {
            let t = (piece as f64 + node) / PIECES as f64;
            for ((x, a), b) in point.iter_mut().zip(&from).zip(&to) {
                *x = a + t * (b - a);
            }
            let (_, slopes) = response.tape.gradient(&point);
            for ((part, slope), (a, b)) in parts.iter_mut().zip(&slopes).zip(from.iter().zip(&to)) {
                *part += slope * (b - a) * weight / PIECES as f64;
            }
        }
    }
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
