//! The yield of the worst lot: the failing share where every piece of a delivery shares its lot.
//!
//! Over many deliveries a lot's scatter is random. Within one it is the same for all pieces, and the
//! delivery may be the worst there is. So the scatter of each lot is fixed at an end, the rest stays
//! random, and the greatest share over these corners is taken.

use super::corners::{Corners, reach};
use super::draw::{self, Check, Counts};
use super::{Case, Drawing, linear};
use crate::evaluate::outcome::{Statistics, WorstLot};
use crate::model::{Assembly, Method, Unknown};
use crate::numeric::Interval;

/// Most corners that are looked at for one requirement at one condition.
const MOST_CORNERS: usize = 64;

/// A case with its lots fixed.
struct Corner<'a> {
    /// Of which case.
    index: usize,
    /// The end of each lot.
    at: Vec<(Unknown, f64)>,
    case: Case<'a>,
}

/// Computes the worst lot of each case whose requirement counts failing pieces or their
/// capability, and to which a lot brings scatter.
pub(super) fn settle(
    assembly: &Assembly,
    cases: &[Case<'_>],
    statistics: &mut [Statistics],
    drawing: Drawing<'_>,
) {
    let asked =
        |case: &&(usize, &Case<'_>)| matches!(case.1.method, Method::Share(_) | Method::Cpk(_));
    let mut corners: Vec<Corner<'_>> = Vec::new();
    for (index, case) in cases.iter().enumerate().filter(|c| asked(&c)) {
        for lots in ends(case) {
            let at = lots.iter().map(|&(i, end)| (case.response.unknowns[i], end)).collect();
            corners.push(Corner { index, at, case: fixed(case, &lots) });
        }
    }
    let mut of: Vec<Statistics> =
        corners.iter().map(|c| linear::statistics(assembly, &c.case)).collect();
    let bent: Vec<usize> = (0..of.len()).filter(|&i| !of[i].exact).collect();
    if !bent.is_empty() {
        let checks: Vec<Check<'_>> = bent.iter().map(|&i| Check::of(&corners[i].case)).collect();
        let counts = draw::run(assembly, &checks, drawing, Counts::widest);
        for (check, &i) in bent.iter().enumerate() {
            let case = &corners[i].case;
            let limits = (case.lower, case.upper);
            draw::take(&mut of[i], &counts, check, limits, drawing.options);
        }
    }
    for (corner, of) in corners.into_iter().zip(of) {
        let lot = WorstLot {
            share_failing: of.share_failing,
            share_interval: of.share_interval,
            drawn: of.drawn,
            cpk: of.cpk,
            corner: corner.at,
        };
        let worst = &mut statistics[corner.index].worst_lot;
        if worst.as_ref().is_none_or(|w| worse(&lot, w)) {
            *worst = Some(lot);
        }
    }
}

/// More fail; where as many do, the capability is less.
fn worse(one: &WorstLot, other: &WorstLot) -> bool {
    let cpk = |lot: &WorstLot| lot.cpk.unwrap_or(f64::INFINITY);
    match one.share_failing.total_cmp(&other.share_failing) {
        std::cmp::Ordering::Equal => cpk(one) < cpk(other),
        order => order.is_gt(),
    }
}

/// The ends of the lots that can be worst: for each corner of the scenarios, on each side that has a
/// limit, the end to which the quantity falls or rises, whatever the pieces are. Both ends where
/// that is not proven.
fn ends(case: &Case<'_>) -> Vec<Vec<(usize, f64)>> {
    let lots: Vec<usize> = (0..case.response.unknowns.len())
        .filter(|&i| case.response.unknowns[i].is_of_a_lot() && case.corners.chances[i].is_some())
        .collect();
    let mut found: Vec<Vec<(usize, f64)>> = Vec::new();
    let sides = [
        (case.lower.is_some(), &case.corners.least, 1.0),
        (case.upper.is_some(), &case.corners.greatest, -1.0),
    ];
    for (_, corners, sign) in sides.into_iter().filter(|(limited, ..)| *limited) {
        for corner in corners {
            let ranges: Vec<Interval> = corner
                .iter()
                .zip(&case.corners.chances)
                .map(|(&x, chance)| chance.as_ref().map_or(Interval::point(x), reach))
                .collect();
            let (_, slopes) = case.response.tape.gradient(&ranges);
            let mut here: Vec<Vec<(usize, f64)>> = vec![Vec::new()];
            for &i in &lots {
                let slope = slopes[i];
                // A lot that changes nothing here is no part of a corner.
                if slope.lo() == 0.0 && slope.hi() == 0.0 {
                    continue;
                }
                let (low, high) = (ranges[i].lo(), ranges[i].hi());
                let ends = match (slope.lo() >= 0.0, slope.hi() <= 0.0) {
                    (true, _) => vec![if sign > 0.0 { low } else { high }],
                    (_, true) => vec![if sign > 0.0 { high } else { low }],
                    _ if here.len() < MOST_CORNERS => vec![low, high],
                    _ => vec![if slope.mid() * sign > 0.0 { low } else { high }],
                };
                here = here
                    .iter()
                    .flat_map(|corner| {
                        ends.iter().map(move |&end| {
                            let mut longer = corner.clone();
                            longer.push((i, end));
                            longer
                        })
                    })
                    .collect();
            }
            for corner in here {
                if !corner.is_empty() && !found.contains(&corner) {
                    found.push(corner);
                }
            }
        }
    }
    found.truncate(MOST_CORNERS);
    found
}

/// The case with lots fixed.
fn fixed<'a>(case: &Case<'a>, lots: &[(usize, f64)]) -> Case<'a> {
    let mut chances = case.corners.chances.clone();
    lots.iter().for_each(|&(i, _)| chances[i] = None);
    let at = |corners: &[Vec<f64>]| -> Vec<Vec<f64>> {
        let mut moved: Vec<Vec<f64>> = Vec::new();
        for corner in corners {
            let mut corner = corner.clone();
            lots.iter().for_each(|&(i, end)| corner[i] = end);
            if !moved.contains(&corner) {
                moved.push(corner);
            }
        }
        moved
    };
    Case {
        verdict: case.verdict,
        method: case.method,
        response: case.response,
        corners: Corners {
            chances,
            least: at(&case.corners.least),
            greatest: at(&case.corners.greatest),
            proven: case.corners.proven,
        },
        lower: case.lower,
        upper: case.upper,
    }
}
