//! The deviations between which every single size meets every requirement.
//!
//! The least margin of a size is looked at on a grid over all deviations that classes reach, then
//! about its best place; from there both ends are found by halving. Where a quantity rises or falls
//! with the size, as nearly all do, the sizes that serve are one interval; of several this is the one
//! about the best.

use super::trial::Trial;
use crate::model::{Dimension, DimensionId};

/// Places of the grid on either side of the nominal.
const GRID: i32 = 100;
/// The grid reaches this share of the nominal to either side: beyond the widest classes of small
/// sizes, which reach a tenth of them.
const REACH: f64 = 0.1;
/// Steps of the search about the best place: each leaves 0.618 of the way.
const NARROWINGS: usize = 60;
/// Halvings of each end.
const HALVINGS: usize = 50;

/// Least and greatest deviation that serve; `None` where no size does.
pub(super) fn deviations(
    trial: &mut Trial,
    id: DimensionId,
    dimension: &Dimension,
) -> Option<(f64, f64)> {
    let reach = REACH * dimension.nominal.abs();
    let mut margin = |x: f64| {
        trial.set(id, x, x);
        trial.taped_margin()
    };
    // Cubed, so that places are dense about the nominal, where requirements are.
    let place = |i: i32| {
        let t = f64::from(i) / f64::from(GRID);
        reach * t * t * t
    };
    let mut best = 0;
    let mut most = f64::NEG_INFINITY;
    for i in -GRID..=GRID {
        let here = margin(place(i));
        if here > most {
            (best, most) = (i, here);
        }
    }
    let (mut from, mut to) = (place((best - 1).max(-GRID)), place((best + 1).min(GRID)));
    for _ in 0..NARROWINGS {
        const SECTION: f64 = 0.618_033_988_749_894_9;
        let (a, b) = (to - SECTION * (to - from), from + SECTION * (to - from));
        if margin(a) >= margin(b) {
            to = b;
        } else {
            from = a;
        }
    }
    let mut middle = 0.5 * (from + to);
    if margin(middle) < most {
        middle = place(best);
    }
    let mut serves = |x: f64| {
        trial.set(id, x, x);
        trial.judge().is_ok()
    };
    if !serves(middle) {
        return None;
    }
    let mut end = |mut outside: f64| {
        if serves(outside) {
            return outside;
        }
        let mut inside = middle;
        for _ in 0..HALVINGS {
            let between = 0.5 * (inside + outside);
            if serves(between) {
                inside = between;
            } else {
                outside = between;
            }
        }
        inside
    };
    Some((end(-reach), end(reach)))
}
