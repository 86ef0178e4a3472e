//! Nominals that centre a gap, a fit or a result between its limits over all conditions at once.
//!
//! Centred means that the least distance to a lower limit and the least to an upper one, each over
//! all requirements and conditions of the subject, are alike; they may occur at different
//! conditions. Quantities of a fit are taken as its clearance: an interference turned round, a
//! radial clearance twice.

use super::cases::{asked, conditions, size};
use super::{Centring, Governing, Recentred, ids, of_line};
use crate::evaluate::outcome::{BeyondData, Outcome, Range};
use crate::evaluate::scene::Response;
use crate::evaluate::{Options, contributor, data_range, figure, selection, verdicts};
use crate::model::{Assembly, DimensionId, Quantity, SubjectId, Unknown};
use crate::numeric::tolerance::EXTREME_GAP;
use std::collections::BTreeSet;

/// Most steps to a nominal that centres; a sum of lengths takes two.
const MOST_STEPS: usize = 20;

/// A centring for each subject that has limits on both sides.
pub(super) fn all(assembly: &Assembly, options: &Options) -> Vec<Centring> {
    let temperatures = data_range::temperatures(assembly);
    let beyond = data_range::beyond(assembly, &temperatures);
    let one = |subject| {
        let plain = selection::sets(assembly, subject).is_empty();
        let centre = Centre { assembly, beyond: &beyond, subject, options };
        if plain { centre.find() } else { None }
    };
    assembly.subject_ids().filter_map(one).collect()
}

struct Centre<'a> {
    assembly: &'a Assembly,
    beyond: &'a [BeyondData],
    subject: SubjectId,
    options: &'a Options,
}

/// Least distances to lower and upper limits, with what gave the smaller one.
struct Margins {
    below: Governing,
    above: Governing,
    tightest: (Response, Range),
}

impl Centre<'_> {
    fn find(&self) -> Option<Centring> {
        let now = self.margins(self.assembly)?;
        let (below, above) = (now.below, now.above);
        let shift = 0.5 * (above.margin - below.margin);
        let (response, range) = &now.tightest;
        let costliest = contributor::contributors(response, range)
            .into_iter()
            .find(|c| matches!(c.unknown, Unknown::Size { .. } | Unknown::Coating { .. }));
        let (_, slopes) = response.tape.gradient(&response.middle);
        let mut by = Vec::new();
        for dimension in ids(self.assembly).filter(|&d| self.may_move(d)) {
            let line = of_line(self.assembly, dimension);
            let moved = |unknown: &Unknown| size(*unknown).is_some_and(|d| line.contains(&d));
            let slope: f64 = response
                .unknowns
                .iter()
                .zip(&slopes)
                .filter(|(unknown, _)| moved(unknown))
                .map(|(_, slope)| self.sense() * slope)
                .sum();
            if slope.is_finite() && slope != 0.0 {
                by.extend(self.by(dimension, &now, shift / slope));
            }
        }
        Some(Centring {
            subject: self.subject,
            below,
            above,
            shift,
            margin: 0.5 * (above.margin + below.margin),
            by,
            costliest,
        })
    }

    /// Rising in the quantity that the tape of the subject holds: a tape of an interference falls
    /// with its clearance.
    fn sense(&self) -> f64 {
        let first = self.assembly.requirements.iter().find(|r| r.subject == self.subject);
        first.and_then(|r| factor(r.quantity)).unwrap_or(1.0)
    }

    /// The dimension with the nominal that centres; `None` where no step leads there.
    fn by(&self, dimension: DimensionId, now: &Margins, first: f64) -> Option<Recentred> {
        let start = self.assembly.dimension(dimension).nominal;
        let uneven = |m: &Margins| m.above.margin - m.below.margin;
        let close = EXTREME_GAP * 1e-3;
        // Secants: margins are all but straight in a nominal.
        let (mut x0, mut y0) = (0.0, uneven(now));
        let mut x1 = if y0.abs() <= close { 0.0 } else { first };
        for _ in 0..MOST_STEPS {
            if start + x1 <= 0.0 || !x1.is_finite() {
                return None;
            }
            let moved = self.moved(dimension, x1);
            let margins = self.margins(&moved)?;
            let y1 = uneven(&margins);
            if y1.abs() <= close {
                let margin = margins.above.margin.min(margins.below.margin);
                let breaks = self.breaks(&moved, dimension);
                return Some(Recentred { dimension, nominal: start + x1, margin, breaks });
            }
            let next = x1 - y1 * (x1 - x0) / (y1 - y0);
            (x0, y0, x1) = (x1, y1, next);
        }
        None
    }

    fn moved(&self, dimension: DimensionId, by: f64) -> Assembly {
        let mut moved = self.assembly.clone();
        for d in of_line(self.assembly, dimension) {
            moved.dimensions[d.index()].nominal += by;
        }
        moved
    }

    /// Requirements of other subjects that hold now and would not hold then.
    fn breaks(&self, moved: &Assembly, dimension: DimensionId) -> Vec<usize> {
        let line = of_line(self.assembly, dimension);
        let others: Vec<usize> = (0..self.assembly.requirements.len())
            .filter(|&r| {
                let subject = self.assembly.requirements[r].subject;
                let contained = crate::evaluate::depends::dimensions(self.assembly, subject);
                subject != self.subject && !contained.is_disjoint(&line)
            })
            .collect();
        if others.is_empty() {
            return others;
        }
        let failing = |assembly: &Assembly| -> BTreeSet<usize> {
            let mut alone = assembly.clone();
            alone.requirements = others.iter().map(|&r| assembly.requirements[r].clone()).collect();
            let verdicts = verdicts(&alone, self.options).verdicts;
            let bad = verdicts.iter().filter(|v| v.outcome != Outcome::Holds);
            bad.map(|v| others[v.requirement]).collect()
        };
        let (before, then) = (failing(self.assembly), failing(moved));
        then.difference(&before).copied().collect()
    }

    /// The first dimension of a line that has a nominal to move.
    fn may_move(&self, dimension: DimensionId) -> bool {
        let d = self.assembly.dimension(dimension);
        super::is_first(self.assembly, dimension) && d.geometric.is_none() && d.members.is_empty()
    }

    fn margins(&self, assembly: &Assembly) -> Option<Margins> {
        let mut below: Option<Governing> = None;
        let mut above: Option<Governing> = None;
        let mut tightest: Option<(f64, (Response, Range))> = None;
        for (index, requirement) in assembly.requirements.iter().enumerate() {
            let Some(factor) = factor(requirement.quantity) else { continue };
            if requirement.subject != self.subject {
                continue;
            }
            for condition in conditions(requirement) {
                let asked = asked(requirement, condition);
                let unit =
                    figure::shown_unit(assembly, asked.subject, asked.quantity, asked.of_yield);
                let response = figure::response(assembly, self.beyond, &asked).ok()?;
                let range = figure::range(&response, EXTREME_GAP * unit);
                let to_lower = requirement.lower.as_ref().map(|l| range.least.bound - l.value);
                let to_upper = requirement.upper.as_ref().map(|u| u.value - range.greatest.bound);
                let (low, high) =
                    if factor > 0.0 { (to_lower, to_upper) } else { (to_upper, to_lower) };
                for (margin, side) in [(low, &mut below), (high, &mut above)] {
                    let Some(margin) = margin.map(|m| m * factor.abs()) else { continue };
                    if side.is_none_or(|g| margin < g.margin) {
                        *side = Some(Governing {
                            requirement: index,
                            condition,
                            margin,
                            compared: margin,
                        });
                    }
                    if tightest.as_ref().is_none_or(|(least, _)| margin < *least) {
                        tightest = Some((margin, (response.clone(), range.clone())));
                    }
                }
            }
        }
        Some(Margins { below: below?, above: above?, tightest: tightest?.1 })
    }
}

/// What a quantity is times to be the subject's own: its clearance, gap or value.
fn factor(quantity: Quantity) -> Option<f64> {
    match quantity {
        Quantity::Clearance | Quantity::Gap | Quantity::Value => Some(1.0),
        Quantity::Interference => Some(-1.0),
        Quantity::RadialClearance => Some(2.0),
        _ => None,
    }
}
