//! The yield of the whole assembly: every requirement at every condition, on the same pieces.

use super::draw::{self, Check, Counts};
use super::{Case, Drawing};
use crate::evaluate::outcome::{AssemblyYield, Statistics};
use crate::model::{Assembly, Unknown};
use crate::numeric::probability::{ShareInterval, any_of_groups};
use std::collections::BTreeSet;

/// Shares below this are left to their bounds: a million draws say less.
const WORTH_DRAWING: f64 = 1e-4;
/// Bounds whose ratio is below this need no draws.
const CLOSE: f64 = 1.02;

/// The share of assemblies that break anything.
///
/// It lies between the greatest single share and the sum of all; requirements without a common
/// unknown multiply. Draws decide inside these bounds.
pub(super) fn assembly(
    assembly: &Assembly,
    cases: &[Case<'_>],
    statistics: &[Statistics],
    drawing: Drawing<'_>,
) -> AssemblyYield {
    let bounds = any_of_groups(&groups(cases, statistics));
    let (low, high) = (bounds.low, bounds.high.min(1.0));
    let known = match drawing.options.to_width {
        Some(width) => high - low <= width,
        None => high <= WORTH_DRAWING || high <= CLOSE * low,
    };
    if known {
        return AssemblyYield { share_failing: high, share_interval: (low, high), drawn: None };
    }
    // What was counted, inside of the bounds.
    let inside = |counts: &Counts| {
        let counted = draw::confidence(counts.any, counts.draws);
        let share = (counts.any as f64 / counts.draws.max(1) as f64).clamp(low, high);
        (share, (counted.low.max(low).min(share), counted.high.min(high).max(share)))
    };
    let checks: Vec<Check<'_>> = cases.iter().map(Check::of).collect();
    let counts = draw::run(assembly, &checks, drawing, |counts| {
        let (_, (least, most)) = inside(counts);
        most - least
    });
    let (share_failing, share_interval) = inside(&counts);
    let drawn = draw::drawn(counts.draws, share_interval, drawing.options);
    AssemblyYield { share_failing, share_interval, drawn: Some(drawn) }
}

/// Bounds of each group of requirements that share some random unknown.
fn groups(cases: &[Case<'_>], statistics: &[Statistics]) -> Vec<ShareInterval> {
    let mut groups: Vec<(BTreeSet<Unknown>, ShareInterval)> = Vec::new();
    for (case, statistics) in cases.iter().zip(statistics) {
        let mut unknowns: BTreeSet<Unknown> = case
            .response
            .unknowns
            .iter()
            .zip(&case.corners.chances)
            .filter(|(_, chance)| chance.is_some())
            .map(|(u, _)| *u)
            .collect();
        let mut bounds =
            ShareInterval { low: statistics.share_interval.0, high: statistics.share_interval.1 };
        let mut apart = Vec::new();
        for (other, share) in groups {
            if other.is_disjoint(&unknowns) {
                apart.push((other, share));
            } else {
                unknowns.extend(other);
                bounds.low = bounds.low.max(share.low);
                bounds.high = (bounds.high + share.high).min(1.0);
            }
        }
        apart.push((unknowns, bounds));
        groups = apart;
    }
    groups.into_iter().map(|(_, share)| share).collect()
}
