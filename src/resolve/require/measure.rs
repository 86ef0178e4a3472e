//! The words of a requirement, looked up among the quantities that its subject has.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{PartId, Quantity, Subject, SubjectKind};
use crate::resolve::context::suggest;
use crate::resolve::expression::Resolver;
use crate::syntax::tree;

/// Quantities of a joint besides those of its fit; `stress in PART` stands apart.
const OF_JOINT: [(&str, Quantity); 5] = [
    ("pressure", Quantity::Pressure),
    ("torque", Quantity::Torque),
    ("axial force", Quantity::AxialForce),
    ("joining temperature", Quantity::JoiningTemperature),
    ("loosening temperature", Quantity::LooseningTemperature),
];

const OF_FIT: [(&str, Quantity); 3] = [
    ("clearance", Quantity::Clearance),
    ("interference", Quantity::Interference),
    ("radial clearance", Quantity::RadialClearance),
];

const OF_RESTRAINT: [(&str, Quantity); 2] =
    [("force", Quantity::Force), ("separation", Quantity::Separation)];

const OF_FILL: [(&str, Quantity); 2] =
    [("ullage", Quantity::Ullage), ("pressure", Quantity::Pressure)];

/// Words people use for a quantity that has another name here.
const OTHER_WORDS: [(&str, &str); 5] = [
    ("play", "clearance"),
    ("press", "interference"),
    ("load", "force"),
    ("tension", "force"),
    ("free volume", "ullage"),
];

impl Resolver<'_, '_, '_> {
    /// Which quantity a requirement limits.
    pub(super) fn measure(
        &mut self,
        subject: &Subject,
        written: &tree::Requirement,
    ) -> Option<Quantity> {
        let noun = noun(&subject.kind);
        let Some(measure) = &written.measure else {
            return match &subject.kind {
                SubjectKind::Gap(_) => Some(Quantity::Gap),
                SubjectKind::Result(_) => Some(Quantity::Value),
                kind => {
                    let known = words_of(kind);
                    self.cx.refuse(
                        Diagnostic::new(
                            Code::QuantityMissing,
                            written.limit.span,
                            format!("a {noun} has several quantities: which one is limited?"),
                        )
                        .help(format!("name one before the limit: {}", listed(&known))),
                    )
                }
            };
        };
        let words: Vec<&str> = measure.words.iter().map(|word| word.value.as_str()).collect();
        if let ["stress", "in", _] = words.as_slice() {
            return self.stress(subject, &measure.words[2]);
        }
        let text = words.join(" ");
        let found = quantities(&subject.kind).find(|(known, _)| *known == text);
        match found {
            Some((_, Quantity::RadialClearance)) if !is_round(&subject.kind) => self.cx.refuse(
                Diagnostic::new(
                    Code::UnknownQuantity,
                    measure.span,
                    "a fit that is not round has no radial clearance",
                )
                .help("require its `clearance`"),
            ),
            Some((_, quantity)) => {
                self.needs_friction(subject, quantity, measure)?;
                if let (SubjectKind::Fill(fill), Quantity::Pressure) = (&subject.kind, quantity)
                    && fill.material.bulk_modulus.is_none()
                {
                    return self.no_bulk_modulus(&fill.material.name, fill.span, measure.span);
                }
                Some(quantity)
            }
            None => self.unknown_quantity(subject, measure, &text),
        }
    }

    /// `stress in PART`: of a ring of the joint or of a member of the restraint.
    fn stress(&mut self, subject: &Subject, name: &tree::Name) -> Option<Quantity> {
        let part = self.cx.part(name)?;
        let (parts, role): (Vec<PartId>, &str) = match &subject.kind {
            SubjectKind::Fit(fit) => match &fit.joint {
                Some(joint) => (vec![joint.inner.part, joint.outer.part], "ring of this joint"),
                None => return self.no_joint(name.span, "stress"),
            },
            SubjectKind::Restraint(restraint) => {
                let of_part = restraint.members.iter().find(|member| member.part == part);
                if let Some(member) = of_part
                    && member.area.is_none()
                {
                    return self.cx.refuse(
                        Diagnostic::new(
                            Code::RestraintIncomplete,
                            member.span,
                            format!(
                                "the stress in `{}` needs the area that carries it",
                                name.value
                            ),
                        )
                        .label(name.span, "required here")
                        .help("add `area 84.3 mm2` to the member"),
                    );
                }
                (restraint.members.iter().map(|m| m.part).collect(), "member of this restraint")
            }
            SubjectKind::Fill(fill) if fill.wall.is_none() => {
                let finding = Diagnostic::new(
                    Code::FillIncomplete,
                    name.span,
                    "the stress around a cavity needs its wall, and the fill states none",
                );
                let help = "add a line such as `wall bore body.bore outside body.outside`";
                return self.cx.refuse(finding.label(fill.span, "the fill").help(help));
            }
            SubjectKind::Fill(fill) => (vec![fill.cavity_of], "wall of this cavity"),
            kind => {
                let text = format!("a {} has no stress", noun(kind));
                return self.cx.refuse(Diagnostic::new(Code::UnknownQuantity, name.span, text));
            }
        };
        if parts.contains(&part) {
            return Some(Quantity::Stress(part));
        }
        let names: Vec<String> =
            parts.iter().map(|p| self.cx.parts[p.index()].name.clone()).collect();
        self.cx.refuse(
            Diagnostic::new(
                Code::NotOfThatJoint,
                name.span,
                format!("`{}` is no {role}", name.value),
            )
            .help(format!("a stress is known in {}", listed(&names))),
        )
    }

    fn no_joint<T>(&mut self, span: crate::span::Span, what: &str) -> Option<T> {
        self.cx.refuse(
            Diagnostic::new(
                Code::NoJoint,
                span,
                format!("`{what}` needs a joint, and this fit states none"),
            )
            .help("add `joint { length …; … }` with the rings, their surfaces and the friction"),
        )
    }

    /// Torque and axial force are carried by friction.
    fn needs_friction(
        &mut self,
        subject: &Subject,
        quantity: Quantity,
        measure: &tree::Measure,
    ) -> Option<()> {
        let SubjectKind::Fit(fit) = &subject.kind else { return Some(()) };
        let of_joint = OF_JOINT.iter().find(|(_, known)| *known == quantity);
        let Some((word, _)) = of_joint else { return Some(()) };
        let Some(joint) = &fit.joint else { return self.no_joint(measure.span, word) };
        let carried = matches!(quantity, Quantity::Torque | Quantity::AxialForce);
        if carried && joint.friction.is_none() {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::JointIncomplete,
                    measure.span,
                    format!("`{word}` is carried by friction, and the joint states none"),
                )
                .label(joint.span, "the joint")
                .help("add a line such as `friction 0.12 .. 0.18`"),
            );
        }
        Some(())
    }

    fn unknown_quantity<T>(
        &mut self,
        subject: &Subject,
        measure: &tree::Measure,
        text: &str,
    ) -> Option<T> {
        let known = words_of(&subject.kind);
        let noun = noun(&subject.kind);
        let finding = Diagnostic::new(
            Code::UnknownQuantity,
            measure.span,
            format!("a {noun} has no quantity `{text}`"),
        );
        let other = OTHER_WORDS.iter().find(|(word, _)| *word == text).map(|(_, here)| *here);
        let near = other.filter(|here| known.iter().any(|k| k == here)).map(str::to_string);
        let near = near.or_else(|| suggest(text, known.iter().map(String::as_str)));
        let help = match (near, known.is_empty()) {
            (Some(near), _) => format!("did you mean `{near}`?"),
            (None, true) => "its limit stands alone, as `require >= 0.05`".to_string(),
            (None, false) => format!("there are {}", listed(&known)),
        };
        self.cx.refuse(finding.help(help))
    }
}

/// The word for a kind of subject.
fn noun(kind: &SubjectKind) -> &'static str {
    match kind {
        SubjectKind::Fit(_) => "fit",
        SubjectKind::Gap(_) => "gap",
        SubjectKind::Result(_) => "result",
        SubjectKind::Restraint(_) => "restraint",
        SubjectKind::Fill(_) => "fill",
    }
}

fn is_round(kind: &SubjectKind) -> bool {
    matches!(kind, SubjectKind::Fit(fit) if fit.round)
}

fn quantities(kind: &SubjectKind) -> impl Iterator<Item = (&'static str, Quantity)> {
    let (first, second): (&[_], &[_]) = match kind {
        SubjectKind::Fit(_) => (&OF_FIT, &OF_JOINT),
        SubjectKind::Restraint(_) => (&OF_RESTRAINT, &[]),
        SubjectKind::Fill(_) => (&OF_FILL, &[]),
        SubjectKind::Gap(_) | SubjectKind::Result(_) => (&[], &[]),
    };
    first.iter().chain(second).copied()
}

fn words_of(kind: &SubjectKind) -> Vec<String> {
    let mut words: Vec<String> = quantities(kind).map(|(word, _)| word.to_string()).collect();
    if matches!(kind, SubjectKind::Fit(_) | SubjectKind::Restraint(_) | SubjectKind::Fill(_)) {
        words.push("stress in PART".to_string());
    }
    words
}

fn listed(names: &[String]) -> String {
    names.iter().map(|name| format!("`{name}`")).collect::<Vec<_>>().join(", ")
}
