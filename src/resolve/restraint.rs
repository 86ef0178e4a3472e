//! `restraint`: parts that hold each other, and what their force starts from.

use super::expression::Resolver;
use super::quantity::{self, Expect, with_article};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{ConditionId, Hold, Member, Restraint, Start};
use crate::span::Span;
use crate::syntax::tree::{self, Quantity, Role, ThermalState};
use crate::units::Kind;

impl<'t> Resolver<'_, '_, 't> {
    /// A restraint; every member is looked at before it is given up.
    pub(super) fn restraint(&mut self, written: &'t tree::Restraint) -> Option<Restraint> {
        let members: Vec<Option<Member>> =
            written.members.iter().map(|member| self.member(member)).collect();
        let start = self.start(written);
        if self.cx.has_broken(written.span) {
            return None;
        }
        self.check_members(written)?;
        Some(Restraint { members: members.into_iter().collect::<Option<_>>()?, start: start? })
    }

    fn member(&mut self, written: &tree::Member) -> Option<Member> {
        let length = self.term(&written.term);
        let mut scenario = |quantity: &Option<Quantity>, kind| match quantity {
            Some(stated) => quantity::scenario(self.cx, stated, None, Expect::Of(kind)).map(Some),
            None => Some(None),
        };
        let area = scenario(&written.area, Kind::AREA);
        let stiffness = scenario(&written.stiffness, Kind::STIFFNESS);
        let (length, area, stiffness) = (length?, area?, stiffness?);
        if length.quantity != Kind::LENGTH {
            let word = with_article(length.quantity);
            return self.cx.refuse(Diagnostic::new(
                Code::WrongKind,
                length.span,
                format!("expected a length to be held, found {word}"),
            ));
        }
        for (value, what) in [(&area, "area"), (&stiffness, "stiffness")] {
            if value.as_ref().is_some_and(|v| v.least <= 0.0) {
                return self.cx.refuse(Diagnostic::new(
                    Code::ValueOutOfRange,
                    written.span,
                    format!("the {what} of a member has to stay above 0"),
                ));
            }
        }
        let dimension = self.dimension(&written.term.path)?;
        let part = self.cx.dimensions[dimension.index()].part;
        if stiffness.is_none() {
            if area.is_none() {
                return self.cx.refuse(
                    Diagnostic::new(
                        Code::RestraintIncomplete,
                        written.span,
                        "the member states neither an area nor a stiffness",
                    )
                    .help("add the area that carries the force, as `area 160 mm2`"),
                );
            }
            if self.cx.parts[part.index()].material.modulus.is_none() {
                return self.lacks(part, "modulus", written.span);
            }
        }
        let hold = match written.role.value {
            Role::Squeezed => Hold::Squeezed,
            Role::Stretched => Hold::Stretched,
        };
        Some(Member { hold, part, length, area, stiffness, span: written.span })
    }

    /// Refuses a restraint in which nothing holds against anything.
    fn check_members(&mut self, written: &tree::Restraint) -> Option<()> {
        let has = |role| written.members.iter().any(|m| m.role.value == role);
        let one_sided = !(has(Role::Squeezed) && has(Role::Stretched));
        if written.members.is_empty() || one_sided && written.start_gap.is_none() {
            let missing = if has(Role::Squeezed) { "stretched" } else { "squeezed" };
            return self.cx.refuse(
                Diagnostic::new(
                    Code::RestraintIncomplete,
                    written.name.span,
                    format!("nothing is {missing} in the restraint `{}`", written.name.value),
                )
                .help(format!(
                    "add a line such as `{missing} part.length area 160 mm2`, \
                     or `start gap NAME` where the rest does not give"
                )),
            );
        }
        Some(())
    }

    fn start(&mut self, written: &tree::Restraint) -> Option<Start> {
        match (&written.preload, &written.start_gap) {
            (Some(preload), Some(gap)) => self.cx.refuse(
                Diagnostic::new(
                    Code::RestraintIncomplete,
                    gap.span,
                    "a restraint starts from a preload or from a gap, not from both",
                )
                .label(preload.span, "the preload")
                .help("leave one of them out"),
            ),
            (Some(preload), None) => {
                let spread = preload.spread.as_ref();
                let expect = Expect::Of(Kind::FORCE);
                let force = quantity::scenario(self.cx, &preload.force, spread, expect);
                let condition = self.single(&preload.at, "a preload is fixed")?;
                let force = force?;
                if force.least < 0.0 {
                    return self.cx.refuse(
                        Diagnostic::new(
                            Code::ValueOutOfRange,
                            preload.force.span(),
                            "a preload cannot be below 0: nothing pulls across an open face",
                        )
                        .help("state the force that squeezes, from nought up"),
                    );
                }
                Some(Start::Preload { force, condition })
            }
            (None, Some(gap)) => Some(Start::Gap(self.scope.gap(self.cx, gap)?)),
            (None, None) => Some(Start::Misfit),
        }
    }

    /// A condition that is one temperature, a tolerance aside, or a finding.
    pub(super) fn single(&mut self, name: &tree::Name, what: &str) -> Option<ConditionId> {
        let id = self.condition(name)?;
        let varies = self.written_conditions.get(&id).and_then(|written| varies(written));
        let Some((place, how)) = varies else { return Some(id) };
        self.cx.refuse(
            Diagnostic::new(
                Code::NotOneTemperature,
                name.span,
                format!("{what} at one temperature, and `{}` is {how}", name.value),
            )
            .label(place, how)
            .help("name a condition of one temperature, a tolerance is fine"),
        )
    }
}

/// Where and how a condition is more than one temperature.
fn varies(written: &tree::Condition) -> Option<(Span, &'static str)> {
    match &written.state {
        ThermalState::Temperature(Quantity::Range(range)) => Some((range.span, "a range")),
        ThermalState::History { file, .. } => Some((file.span, "a history")),
        ThermalState::Temperature(Quantity::Group(_)) => None,
    }
}
