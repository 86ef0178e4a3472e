//! `require`: which quantity of its subject is limited, where, by which method.

mod concession;
mod keys;
mod measure;

pub(crate) use keys::check_keys;

use super::expression::Resolver;
use super::quantity;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{ConditionId, Method, Quantity, Requirement, Subject, SubjectId, SubjectKind};
use crate::span::Spanned;
use crate::syntax::tree;
use crate::units::Kind;

/// Standard deviations of a root sum of squares that does not say how many.
const DEFAULT_SIGMAS: f64 = 3.0;

impl<'t> Resolver<'_, '_, 't> {
    /// A requirement of a subject; every clause is looked at before it is given up.
    pub(super) fn requirement(
        &mut self,
        id: SubjectId,
        subject: &Subject,
        written: &'t tree::Requirement,
    ) -> Option<Requirement> {
        let quantity = self.measure(subject, written);
        let conditions = self.conditions(written);
        let method = self.method(written.method.as_ref());
        let quantity = quantity?;
        let kind = match (&subject.kind, quantity.kind()) {
            (_, Some(kind)) => kind,
            (SubjectKind::Result(e), None) => e.quantity,
            _ => Kind::LENGTH,
        };
        self.check_of_yield(quantity, written)?;
        let limits = quantity::limits(self.cx, &written.limit, kind)?;
        if quantity.is_unconditional() {
            for limit in [&limits.lower, &limits.upper].into_iter().flatten() {
                quantity::above_absolute_zero(self.cx, limit.span, limit.value)?;
            }
        }
        let conditions = self.conditions_of(quantity, written, conditions)?;
        let concession = match &written.concession {
            Some(stated) => self.concession(stated, written, kind, &limits),
            None => None,
        };
        let shares = kind == Kind::PURE || written.limit.of_yield.is_some();
        let unit = match shares {
            true => limits.unit,
            false => self.cx.head(written.span.file).defaults.shown(kind),
        };
        Some(Requirement {
            id: written.id.as_ref().map(|id| id.value.clone()),
            span: written.span,
            subject: id,
            quantity,
            unit,
            lower: limits.lower,
            upper: limits.upper,
            conditions,
            method: method?,
            because: written.because.as_ref().map(|text| text.value.clone()),
            concession,
        })
    }

    /// The conditions named, and all where none is.
    fn conditions(&mut self, written: &tree::Requirement) -> Option<Vec<ConditionId>> {
        let all = self.own_conditions();
        let Some(stated) = &written.conditions else { return Some(all) };
        let (tree::Conditions::At(names) | tree::Conditions::Except(names)) = stated;
        let found: Vec<Option<ConditionId>> =
            names.iter().map(|name| self.condition(name)).collect();
        let mut found: Vec<ConditionId> = found.into_iter().collect::<Option<_>>()?;
        found.sort_unstable();
        found.dedup();
        match stated {
            tree::Conditions::At(_) => Some(found),
            tree::Conditions::Except(names) => {
                let rest: Vec<ConditionId> =
                    all.into_iter().filter(|id| !found.contains(id)).collect();
                let (Some(first), true) = (names.first(), rest.is_empty()) else {
                    return Some(rest);
                };
                self.cx.refuse(
                    Diagnostic::new(
                        Code::NothingToCheck,
                        first.span,
                        "no condition is left after `except`, so this can never be decided",
                    )
                    .help("leave out fewer conditions, or state another one"),
                )
            }
        }
    }

    /// Joining and loosening temperatures have no condition.
    fn conditions_of(
        &mut self,
        quantity: Quantity,
        written: &tree::Requirement,
        found: Option<Vec<ConditionId>>,
    ) -> Option<Vec<ConditionId>> {
        if !quantity.is_unconditional() {
            return found;
        }
        let Some(tree::Conditions::At(names) | tree::Conditions::Except(names)) =
            &written.conditions
        else {
            return Some(Vec::new());
        };
        let span = names.first().map_or(written.span, |name| name.span);
        self.cx.refuse(
            Diagnostic::new(
                Code::NotAtACondition,
                span,
                format!("{} belong to the joint, not to a condition", plural(quantity)),
            )
            .help("leave the condition out"),
        )
    }

    /// Only a stress is held against the yield strength.
    fn check_of_yield(&mut self, quantity: Quantity, written: &tree::Requirement) -> Option<()> {
        let Some(words) = written.limit.of_yield else { return Some(()) };
        let Quantity::Stress(part) = quantity else {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::WrongKind,
                    words,
                    "only a stress can be limited to a share of the yield strength",
                )
                .help("state the limit with its unit"),
            );
        };
        if self.cx.parts[part.index()].material.yield_strength.is_none() {
            return self.lacks(part, "yield", words);
        }
        Some(())
    }

    fn method(&mut self, written: Option<&Spanned<tree::Method>>) -> Option<Method> {
        let Some(written) = written else { return Some(Method::WorstCase) };
        let above_nought = |number: &tree::Number| number.value > 0.0 && number.value <= 100.0;
        match &written.value {
            tree::Method::WorstCase => Some(Method::WorstCase),
            tree::Method::Rss { sigma: None } => Some(Method::Rss { sigmas: DEFAULT_SIGMAS }),
            tree::Method::Rss { sigma: Some(n) } if above_nought(n) => {
                Some(Method::Rss { sigmas: n.value })
            }
            tree::Method::Cpk(n) if above_nought(n) => Some(Method::Cpk(n.value)),
            tree::Method::Share(share) => {
                let value = quantity::scalar(self.cx, share, quantity::Expect::Of(Kind::PURE))?;
                if value > 0.0 && value < 1.0 {
                    return Some(Method::Share(value));
                }
                let finding = Diagnostic::new(
                    Code::ValueOutOfRange,
                    share.span(),
                    format!("a share of {} cannot be shown", self.cx.text(share.span())),
                );
                let bare = share.unit.is_none() && value > 1.0 && value < 100.0;
                self.cx.refuse(finding.help(if bare {
                    format!("write `{} %`", self.cx.text(share.span()))
                } else if value >= 1.0 {
                    "all of them are `by worst case`; a share is such as `99.99 %`".to_string()
                } else {
                    "state a share between 0 and 100 %, such as `99.99 %`".to_string()
                }))
            }
            tree::Method::Rss { sigma: Some(n) } | tree::Method::Cpk(n) => self.cx.refuse(
                Diagnostic::new(
                    Code::ValueOutOfRange,
                    n.span,
                    format!("expected a number above 0 and up to 100, found {}", n.text),
                )
                .help("such as `by rss 3 sigma` or `by Cpk 1.33`"),
            ),
        }
    }
}

fn plural(quantity: Quantity) -> &'static str {
    match quantity {
        Quantity::JoiningTemperature => "joining temperatures",
        _ => "loosening temperatures",
    }
}
