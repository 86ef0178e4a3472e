//! `relative-scatter-near-zero`: scatter in per cent of a coefficient that is nearly nothing.
//!
//! A share of almost zero is almost zero, which is not how low-expansion alloys and fibre composites
//! scatter; their tables state ppm/K.

use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::materials::Scatter;
use crate::model::{Assembly, Owner, PartId};
use crate::numeric::Interval;

/// Mean coefficients below this, 1/K, are nearly nothing.
const NEARLY_NOTHING: f64 = 2e-6;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for (index, part) in assembly.parts.iter().enumerate() {
        let owner = Owner::Part(PartId(index as u32));
        let (mut from, mut to) = (assembly.reference, assembly.reference);
        for t in evaluation.temperatures.iter().filter(|t| t.owner == owner) {
            from = from.min(t.least);
            to = to.max(t.greatest);
        }
        if from == to {
            continue;
        }
        for (_, expansion) in part.material.expansion.each() {
            let Scatter::Relative(share) = expansion.scatter else { continue };
            let slope = expansion.curve.derivative().range(Interval::new(from, to));
            if share > 0.0 && slope.lo() < NEARLY_NOTHING && slope.hi() > -NEARLY_NOTHING {
                found.push(
                    Diagnostic::new(
                        Code::RelativeScatterNearZero,
                        part.material_span,
                        format!(
                            "the expansion of {} comes near zero, where a scatter in % says little",
                            words::name(&part.material.name)
                        ),
                    )
                    .help("state its scatter in ppm/K, such as `±0.3 ppm/K`"),
                );
            }
        }
    }
}
