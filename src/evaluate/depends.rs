//! What a subject depends on, directly or through other subjects.

use crate::model::{Assembly, DimensionId, Expr, ExprKind, Owner, PartId, SubjectId, SubjectKind};
use std::collections::BTreeSet;

/// The dimensions that a subject contains.
pub(crate) fn dimensions(assembly: &Assembly, subject: SubjectId) -> BTreeSet<DimensionId> {
    let mut found = Found::default();
    found.subject(assembly, subject);
    found.dimensions
}

/// The parts whose sizes or springs a subject contains.
pub(crate) fn parts(assembly: &Assembly, subject: SubjectId) -> BTreeSet<PartId> {
    let mut found = Found::default();
    found.subject(assembly, subject);
    let mut parts = found.parts;
    parts.extend(found.dimensions.iter().map(|&d| assembly.dimension(d).part));
    parts
}

/// Everyone whose temperature a subject feels: its parts, and the charges of fills.
pub(crate) fn owners(assembly: &Assembly, subject: SubjectId) -> Vec<Owner> {
    let parts = parts(assembly, subject).into_iter().map(Owner::Part);
    let fill = matches!(assembly.subject(subject).kind, SubjectKind::Fill(_));
    parts.chain(fill.then_some(Owner::Fill(subject))).collect()
}

#[derive(Default)]
struct Found {
    seen: BTreeSet<SubjectId>,
    dimensions: BTreeSet<DimensionId>,
    parts: BTreeSet<PartId>,
}

impl Found {
    fn subject(&mut self, assembly: &Assembly, subject: SubjectId) {
        if !self.seen.insert(subject) {
            return;
        }
        match &assembly.subject(subject).kind {
            SubjectKind::Gap(e) | SubjectKind::Result(e) => self.expr(assembly, e),
            SubjectKind::Fit(fit) => {
                self.expr(assembly, &fit.external);
                self.expr(assembly, &fit.internal);
                if let Some(joint) = &fit.joint {
                    self.expr(assembly, &joint.length);
                    for ring in [&joint.inner, &joint.outer] {
                        self.parts.insert(ring.part);
                        ring.free.iter().for_each(|e| self.expr(assembly, e));
                    }
                }
            }
            SubjectKind::Restraint(restraint) => {
                for member in &restraint.members {
                    self.parts.insert(member.part);
                    self.expr(assembly, &member.length);
                }
                restraint.start_gap().into_iter().for_each(|gap| self.subject(assembly, gap));
            }
            SubjectKind::Fill(fill) => {
                self.parts.insert(fill.cavity_of);
                fill.volume.iter().for_each(|e| self.expr(assembly, e));
                if let Some(wall) = &fill.wall {
                    self.expr(assembly, &wall.bore);
                    self.expr(assembly, &wall.outside);
                }
            }
        }
    }

    fn expr(&mut self, assembly: &Assembly, expr: &Expr) {
        let mut below = Vec::new();
        expr.walk(&mut |e| match e.kind {
            ExprKind::Size { dimension, .. } | ExprKind::Pieces { dimension, .. } => {
                self.dimensions.insert(dimension);
            }
            ExprKind::After { dimension, fit } => {
                self.dimensions.insert(dimension);
                below.push(fit);
            }
            ExprKind::Clearance(fit) | ExprKind::Play(fit) => below.push(fit),
            _ => {}
        });
        // The size of a geometrical tolerance's feature is an unknown of it too.
        let features: Vec<DimensionId> = self
            .dimensions
            .iter()
            .filter_map(|&d| assembly.dimension(d).geometric.and_then(|g| g.bonus))
            .collect();
        self.dimensions.extend(features);
        for fit in below {
            self.subject(assembly, fit);
        }
    }
}
