//! What is left of a model whose spec has errors: every statement that no error points into, and
//! that names nothing but such statements.
//!
//! A statement that is wrong keeps its place while the others are resolved, so that those who name
//! it are not reported as well. Here all of that is taken out again: a figure that rests on a
//! guess must not be shown.

use crate::diagnostic::{Diagnostic, Severity};
use crate::model::{
    Assembly, Charge, ConditionId, DimensionId, Expr, ExprKind, Owner, PartId, Start, SubjectId,
    SubjectKind,
};
use crate::span::{FileId, Span};
use crate::syntax::tree;
use std::collections::BTreeSet;
use std::sync::Arc;

/// The places of errors.
pub(super) struct Errors {
    places: Vec<Span>,
}

impl Errors {
    /// Those among the findings.
    pub(super) fn of(diagnostics: &[Diagnostic]) -> Self {
        let errors = diagnostics.iter().filter(|d| d.severity == Severity::Error);
        Errors { places: errors.map(|d| d.primary.span).collect() }
    }

    /// True where there is none.
    pub(super) fn is_empty(&self) -> bool {
        self.places.is_empty()
    }

    /// True where one lies in a file that is not among these, such as a table of measured values.
    pub(super) fn elsewhere(&self, files: impl Fn(FileId) -> bool) -> bool {
        self.places.iter().any(|place| !files(place.file))
    }

    /// True where one points into a statement.
    pub(super) fn inside(&self, span: Span) -> bool {
        let inside = |p: &Span| p.file == span.file && span.start <= p.start && p.end <= span.end;
        self.places.iter().any(inside)
    }
}

/// What has to go.
#[derive(Debug, Default)]
pub(super) struct Unsound {
    /// Conditions that are wrong.
    pub(super) conditions: BTreeSet<ConditionId>,
    /// Parts whose material is wrong.
    pub(super) parts: BTreeSet<PartId>,
    /// Dimensions that are wrong.
    pub(super) dimensions: BTreeSet<DimensionId>,
    /// Subjects that are wrong.
    pub(super) subjects: BTreeSet<SubjectId>,
}

impl Unsound {
    /// Adds every condition, part and dimension that an error points into.
    pub(super) fn collect(
        &mut self,
        errors: &Errors,
        assembly: &Assembly,
        conditions: &[&tree::Condition],
    ) {
        let wrong = (0..).map(ConditionId).zip(conditions).filter(|(_, c)| errors.inside(c.span));
        self.conditions.extend(wrong.map(|(id, _)| id));
        for (id, part) in (0..).map(PartId).zip(&assembly.parts) {
            // A material that was not found has no name.
            if part.material.name.is_empty() || errors.inside(part.material_span) {
                self.parts.insert(id);
            }
        }
        let dimensions = (0..).map(DimensionId).zip(&assembly.dimensions);
        let wrong = dimensions.filter(|(_, d)| errors.inside(d.line));
        self.dimensions.extend(wrong.map(|(id, _)| id));
    }

    /// True where nothing has to go.
    pub(super) fn is_empty(&self) -> bool {
        self.conditions.is_empty()
            && self.parts.is_empty()
            && self.dimensions.is_empty()
            && self.subjects.is_empty()
    }
}

/// Takes out what is unsound and all that rests on it.
///
/// Parts and dimensions stay in their lists, where nothing names the wrong ones any more.
pub(super) fn keep_sound(mut assembly: Assembly, mut unsound: Unsound) -> Assembly {
    for (index, dimension) in assembly.dimensions.iter().enumerate() {
        let at = |mut of: std::slice::Iter<ConditionId>| of.any(|c| unsound.conditions.contains(c));
        let state = dimension.loads.iter().any(|load| at(load.conditions.iter()))
            || dimension.strains.iter().any(|strain| at(strain.conditions.iter()));
        if state || unsound.parts.contains(&dimension.part) {
            unsound.dimensions.insert(DimensionId(index as u32));
        }
    }
    // What rests on a subject that goes, goes too; each round takes one at least.
    loop {
        let gone: Vec<SubjectId> = assembly
            .subject_ids()
            .zip(&assembly.subjects)
            .filter(|(id, s)| !unsound.subjects.contains(id) && rests_on(&s.kind, &unsound))
            .map(|(id, _)| id)
            .collect();
        if gone.is_empty() {
            break;
        }
        unsound.subjects.extend(gone);
    }
    let renumber = Renumber::new(&assembly, &unsound);
    renumber.apply(&mut assembly);
    assembly
}

fn rests_on(kind: &SubjectKind, unsound: &Unsound) -> bool {
    let part = |part: &PartId| unsound.parts.contains(part);
    let expr = |e: &Arc<Expr>| {
        let mut found = false;
        e.walk(&mut |e| {
            found |= match &e.kind {
                ExprKind::Size { dimension, .. } | ExprKind::Pieces { dimension, .. } => {
                    unsound.dimensions.contains(dimension)
                }
                ExprKind::After { dimension, fit } => {
                    unsound.dimensions.contains(dimension) || unsound.subjects.contains(fit)
                }
                ExprKind::Clearance(fit) | ExprKind::Play(fit) => unsound.subjects.contains(fit),
                ExprKind::Change { from: Some(from), .. } => unsound.conditions.contains(from),
                _ => false,
            };
        });
        found
    };
    match kind {
        SubjectKind::Gap(e) | SubjectKind::Result(e) => expr(e),
        SubjectKind::Fit(fit) => {
            let joint = fit.joint.as_ref().is_some_and(|joint| {
                let rings = [&joint.inner, &joint.outer];
                expr(&joint.length)
                    || rings.iter().any(|r| part(&r.part) || r.free.iter().any(expr))
            });
            joint || expr(&fit.external) || expr(&fit.internal)
        }
        SubjectKind::Restraint(restraint) => {
            let start = match &restraint.start {
                Start::Preload { condition, .. } => unsound.conditions.contains(condition),
                Start::Gap(gap) => unsound.subjects.contains(gap),
                Start::Misfit => false,
            };
            start || restraint.members.iter().any(|m| part(&m.part) || expr(&m.length))
        }
        SubjectKind::Fill(fill) => {
            let charged = match fill.charged_at {
                Charge::Condition(condition) => unsound.conditions.contains(&condition),
                Charge::Reference | Charge::At(_) => false,
            };
            charged
                || part(&fill.cavity_of)
                || fill.volume.iter().any(expr)
                || fill.wall.iter().any(|w| expr(&w.bore) || expr(&w.outside))
        }
    }
}

/// New numbers of what stays.
struct Renumber {
    conditions: Vec<Option<ConditionId>>,
    subjects: Vec<Option<SubjectId>>,
}

/// The new number of each of `count` items, none for those that go.
fn numbers<Id: Copy>(
    ids: impl Iterator<Item = Id>,
    goes: impl Fn(&Id) -> bool,
    id: impl Fn(u32) -> Id,
) -> Vec<Option<Id>> {
    let mut next = 0;
    ids.map(|old| {
        (!goes(&old)).then(|| {
            next += 1;
            id(next - 1)
        })
    })
    .collect()
}

impl Renumber {
    fn new(assembly: &Assembly, unsound: &Unsound) -> Self {
        let goes = |id: &ConditionId| unsound.conditions.contains(id);
        let conditions = numbers(assembly.condition_ids(), goes, ConditionId);
        let goes = |id: &SubjectId| unsound.subjects.contains(id);
        let subjects = numbers(assembly.subject_ids(), goes, SubjectId);
        Renumber { conditions, subjects }
    }

    fn condition(&self, id: ConditionId) -> Option<ConditionId> {
        self.conditions.get(id.index()).copied().flatten()
    }

    fn subject(&self, id: SubjectId) -> Option<SubjectId> {
        self.subjects.get(id.index()).copied().flatten()
    }

    fn owner(&self, owner: Owner) -> Option<Owner> {
        match owner {
            Owner::Part(part) => Some(Owner::Part(part)),
            Owner::Fill(fill) => self.subject(fill).map(Owner::Fill),
        }
    }

    fn apply(&self, assembly: &mut Assembly) {
        let mut index = 0..;
        assembly
            .conditions
            .retain(|_| index.next().is_some_and(|i| self.condition(ConditionId(i)).is_some()));
        let mut index = 0..;
        assembly
            .subjects
            .retain(|_| index.next().is_some_and(|i| self.subject(SubjectId(i)).is_some()));
        for condition in &mut assembly.conditions {
            condition.states.retain_mut(|state| match self.owner(state.owner) {
                Some(owner) => {
                    state.owner = owner;
                    true
                }
                None => false,
            });
        }
        for dimension in &mut assembly.dimensions {
            for load in &mut dimension.loads {
                load.conditions = self.all(&load.conditions);
            }
            for strain in &mut dimension.strains {
                strain.conditions = self.all(&strain.conditions);
            }
        }
        for subject in &mut assembly.subjects {
            self.kind(&mut subject.kind);
        }
        assembly.requirements.retain_mut(|requirement| {
            let Some(subject) = self.subject(requirement.subject) else { return false };
            requirement.subject = subject;
            let conditions = self.all(&requirement.conditions);
            let emptied = conditions.is_empty() && !requirement.conditions.is_empty();
            requirement.conditions = conditions;
            !emptied
        });
    }

    fn all(&self, conditions: &[ConditionId]) -> Vec<ConditionId> {
        conditions.iter().filter_map(|id| self.condition(*id)).collect()
    }

    fn kind(&self, kind: &mut SubjectKind) {
        match kind {
            SubjectKind::Gap(e) | SubjectKind::Result(e) => self.expr(e),
            SubjectKind::Fit(fit) => {
                self.expr(&mut fit.external);
                self.expr(&mut fit.internal);
            }
            SubjectKind::Restraint(restraint) => match &mut restraint.start {
                Start::Preload { condition, .. } => {
                    *condition = self.condition(*condition).unwrap_or(*condition);
                }
                Start::Gap(gap) => *gap = self.subject(*gap).unwrap_or(*gap),
                Start::Misfit => {}
            },
            SubjectKind::Fill(fill) => {
                if let Charge::Condition(condition) = &mut fill.charged_at {
                    *condition = self.condition(*condition).unwrap_or(*condition);
                }
                fill.volume.iter_mut().for_each(|e| self.expr(e));
                if let Some(wall) = &mut fill.wall {
                    self.expr(&mut wall.bore);
                    self.expr(&mut wall.outside);
                }
            }
        }
    }

    /// Renumbers an expression in place; one that is shared is copied, since the names it holds
    /// are substituted and not the same expression for long.
    fn expr(&self, e: &mut Arc<Expr>) {
        match &mut Arc::make_mut(e).kind {
            ExprKind::Named(_, e) | ExprKind::Negate(e) | ExprKind::Power(e, _) => self.expr(e),
            ExprKind::Binary(_, a, b) => {
                self.expr(a);
                self.expr(b);
            }
            ExprKind::Call(_, arguments) => arguments.iter_mut().for_each(|a| self.expr(a)),
            ExprKind::Change { of, from } => {
                self.expr(of);
                *from = from.and_then(|id| self.condition(id));
            }
            ExprKind::After { fit, .. } | ExprKind::Clearance(fit) | ExprKind::Play(fit) => {
                *fit = self.subject(*fit).unwrap_or(*fit);
            }
            ExprKind::Constant(_)
            | ExprKind::Pi
            | ExprKind::Size { .. }
            | ExprKind::Pieces { .. } => {}
        }
    }
}
