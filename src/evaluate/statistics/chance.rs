//! How each unknown varies, where it is random.

use crate::evaluate::ranges;
use crate::model::dimension::Shape;
use crate::model::{Assembly, Spread, Unknown};
use crate::numeric::distribution::Distribution;

/// The distribution of an unknown; `None` where it is a scenario, to be taken at its worst.
pub(crate) fn distribution(assembly: &Assembly, unknown: Unknown) -> Option<Distribution> {
    let stated = ranges::read(assembly, unknown);
    let limits = (stated.least, stated.greatest);
    match unknown {
        Unknown::Size { dimension, .. } => spread(&assembly.dimension(dimension).spread, limits),
        Unknown::Coating { .. } => {
            let usual = Spread::default_of_sizes();
            spread(stated.spread.as_ref().unwrap_or(&usual), limits)
        }
        // Limits without more knowledge: uniform (JCGM 100:2008, 4.3.7).
        lot if lot.is_of_a_lot() => Distribution::uniform(0.0, 1.0).ok(),
        _ => spread(stated.spread.as_ref()?, limits),
    }
}

fn spread(spread: &Spread, (least, greatest): (f64, f64)) -> Option<Distribution> {
    let half = 0.5 * (greatest - least);
    let mean = 0.5 * least + 0.5 * greatest + spread.shift;
    let made = match &spread.shape {
        Shape::Normal { cpk: None } => Distribution::normal(mean, half / 3.0),
        // Cpk counts from the mean to the nearer limit (ISO 22514-2).
        Shape::Normal { cpk: Some(cpk) } => {
            let nearer = (half - spread.shift.abs()).max(0.0);
            Distribution::normal(mean, nearer / (3.0 * cpk))
        }
        Shape::Sorted => Distribution::sorted(mean, half / 3.0, least, greatest),
        Shape::Uniform => Distribution::uniform(mean, half),
        Shape::Triangular => Distribution::triangular(mean, half),
        Shape::Measured { values, .. } => Distribution::measured(values, resolution(values))
            .and_then(|d| {
                let moved = d.mean() + spread.shift;
                d.moved_to(moved)
            }),
    };
    made.ok()
}

/// The resolution of the gauge that measured a list: the smallest step between two values.
fn resolution(values: &[f64]) -> f64 {
    let mut sorted = values.to_vec();
    sorted.sort_by(f64::total_cmp);
    let steps = sorted.windows(2).map(|w| w[1] - w[0]).filter(|&d| d > 0.0);
    let least = steps.fold(f64::INFINITY, f64::min);
    if least.is_finite() { least } else { 0.0 }
}
