//! Fits, gaps, results, restraints and fills, with what is required of them.

use super::expression::Resolver;
use super::quantity::with_article;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Requirement, Subject, SubjectId, SubjectKind};
use crate::syntax::tree::{self, Statement};
use crate::units::Kind;
use std::sync::Arc;

/// A subject as written.
#[derive(Debug, Clone, Copy)]
pub(super) enum Written<'t> {
    /// A fit.
    Fit(&'t tree::Fit),
    /// A gap.
    Gap(&'t tree::Gap),
    /// A result.
    Result(&'t tree::Outcome),
    /// A restraint.
    Restraint(&'t tree::Restraint),
    /// A fill.
    Fill(&'t tree::Fill),
}

impl<'t> Written<'t> {
    /// The subject that a statement defines, if it does.
    pub(super) fn of(statement: &'t Statement) -> Option<Self> {
        Some(match statement {
            Statement::Fit(fit) => Written::Fit(fit),
            Statement::Gap(gap) => Written::Gap(gap),
            Statement::Result(outcome) => Written::Result(outcome),
            Statement::Restraint(restraint) => Written::Restraint(restraint),
            Statement::Fill(fill) => Written::Fill(fill),
            _ => return None,
        })
    }

    /// Its name.
    pub(super) fn name(self) -> &'t tree::Name {
        match self {
            Written::Fit(s) => &s.name,
            Written::Gap(s) => &s.name,
            Written::Result(s) => &s.name,
            Written::Restraint(s) => &s.name,
            Written::Fill(s) => &s.name,
        }
    }

    fn requirements(self) -> &'t [tree::Requirement] {
        match self {
            Written::Fit(s) => &s.requirements,
            Written::Gap(s) => &s.requirements,
            Written::Result(s) => &s.requirements,
            Written::Restraint(s) => &s.requirements,
            Written::Fill(s) => &s.requirements,
        }
    }
}

impl<'t> Resolver<'_, '_, 't> {
    /// A subject, and those of its requirements that are right.
    pub(super) fn subject(
        &mut self,
        id: SubjectId,
        written: Written<'t>,
    ) -> Option<(Subject, Vec<Requirement>)> {
        let name = written.name();
        let kind = match written {
            Written::Fit(fit) => SubjectKind::Fit(Box::new(self.fit(id, fit, name.span)?.clone())),
            Written::Gap(gap) => {
                let (e, _) = self.definition((None, name.value.clone()), name.span, &gap.expr)?;
                if e.quantity != Kind::LENGTH {
                    return self.cx.refuse(
                        Diagnostic::new(
                            Code::WrongKind,
                            e.span,
                            format!("a gap is a length, and this is {}", with_article(e.quantity)),
                        )
                        .help(format!("anything else is a result: `result {} = …`", name.value)),
                    );
                }
                SubjectKind::Gap(e)
            }
            Written::Result(outcome) => {
                let key = (None, name.value.clone());
                let (e, _) = self.definition(key, name.span, &outcome.expr)?;
                SubjectKind::Result(Arc::clone(&e))
            }
            Written::Restraint(restraint) => {
                SubjectKind::Restraint(Box::new(self.restraint(restraint)?))
            }
            Written::Fill(fill) => SubjectKind::Fill(Box::new(self.fill(fill)?)),
        };
        let subject = Subject { name: name.value.clone(), span: name.span, kind };
        let requirements = written.requirements().iter();
        let requirements = requirements.filter_map(|r| self.requirement(id, &subject, r)).collect();
        Some((subject, requirements))
    }
}
