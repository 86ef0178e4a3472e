//! `fill`: a liquid or solid in a cavity.

use super::expression::{Resolver, expr};
use super::material;
use super::quantity::{self, Expect, with_article};
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::Material;
use crate::model::{
    Assembly, Charge, DimensionId, Expr, ExprKind, Feature, Fill, Form, PartId, Quantity, Scenario,
    SubjectKind, Wall,
};
use crate::span::Span;
use crate::syntax::tree::{self, CavityVolume, ChargeState};
use crate::units::Kind;
use std::sync::Arc;

/// A cavity: the part around it, and its volume as an expression or as a number.
type Cavity = (PartId, Option<Arc<Expr>>, Option<Scenario>);

/// Tells each fill where requirements expect it to be full; whatever of them is checked afterwards.
pub(super) fn settle_full(assembly: &mut Assembly) {
    for requirement in &assembly.requirements {
        let of_pressure = matches!(requirement.quantity, Quantity::Pressure | Quantity::Stress(_));
        let subject = assembly.subjects.get_mut(requirement.subject.index());
        if let (true, Some(SubjectKind::Fill(fill))) = (of_pressure, subject.map(|s| &mut s.kind)) {
            fill.may_be_full.extend(&requirement.conditions);
        }
    }
}

impl<'t> Resolver<'_, '_, 't> {
    /// A fill with its cavity and its charge.
    pub(super) fn fill(&mut self, written: &'t tree::Fill) -> Option<Fill> {
        let cavity = match &written.cavity {
            Some(cavity) => self.cavity(cavity),
            None => self.incomplete(written, "cavity", "cavity of housing 240 cm3 ±1 %"),
        };
        let Some(charge) = &written.charge else {
            return self.incomplete(written, "charge", "charge hydraulic_oil 225 cm3");
        };
        let material = material::find(self.cx, &charge.material);
        let spread = charge.spread.as_ref();
        let volume = quantity::scenario(self.cx, &charge.volume, spread, Expect::Of(Kind::VOLUME));
        let charged_at = self.charged_at(charge.at.as_ref());
        let wall = match &written.wall {
            Some(wall) => {
                let material = material.as_ref();
                Some(self.wall(wall, cavity.as_ref().map(|c| c.0), material, charge))
            }
            None => None,
        };
        let (cavity_of, volume_of, stated) = cavity?;
        let volume = self.positive(&charge.volume, volume?)?;
        let wall = match wall {
            Some(wall) => Some(wall?),
            None => None,
        };
        Some(Fill {
            cavity_of,
            volume: volume_of,
            stated,
            wall,
            material: material?,
            charge: volume,
            charged_at: charged_at?,
            span: charge.span,
            may_be_full: Vec::new(),
        })
    }

    fn incomplete<T>(&mut self, written: &tree::Fill, missing: &str, example: &str) -> Option<T> {
        if self.cx.has_broken(written.span) {
            return None;
        }
        self.cx.refuse(
            Diagnostic::new(
                Code::FillIncomplete,
                written.name.span,
                format!("the fill `{}` states no {missing}", written.name.value),
            )
            .help(format!("add a line such as `{example}`")),
        )
    }

    fn cavity(&mut self, written: &tree::Cavity) -> Option<Cavity> {
        let part = self.cx.part(&written.part);
        match &written.volume {
            CavityVolume::Stated(stated) => {
                let expect = Expect::Of(Kind::VOLUME);
                let volume = quantity::scenario(self.cx, stated, None, expect)?;
                let volume = self.positive(stated, volume)?;
                Some((part?, None, Some(volume)))
            }
            CavityVolume::Computed(written) => {
                let volume = self.expression(written, None)?;
                if volume.quantity != Kind::VOLUME {
                    return self.cx.refuse(
                        Diagnostic::new(
                            Code::WrongKind,
                            volume.span,
                            format!("expected a volume, found {}", with_article(volume.quantity)),
                        )
                        .help("a cavity is such as `= pi/4 * body.bore^2 * body.stroke`"),
                    );
                }
                Some((part?, Some(volume), None))
            }
        }
    }

    /// The wall around a cavity, by two diameters of the part that the cavity is of.
    fn wall(
        &mut self,
        written: &'t tree::Wall,
        cavity_of: Option<PartId>,
        material: Option<&Arc<Material>>,
        charge: &tree::Charge,
    ) -> Option<Wall> {
        let bore = self.diameter(&written.bore, cavity_of, Feature::External, "bore");
        let outside = self.diameter(&written.outside, cavity_of, Feature::Internal, "outside");
        if let Some(material) = material.filter(|m| m.bulk_modulus.is_none()) {
            // Without it nothing is computed that the wall has to do with.
            let name = material.name.clone();
            return self.no_bulk_modulus(&name, charge.material.span, written.span);
        }
        let (bore, outside) = (bore?, outside?);
        self.around(bore, outside, written.span)?;
        self.needs_stiffness(cavity_of?, written.span)?;
        let size = |dimension, path: &tree::Path| {
            expr(path.span, Kind::LENGTH, ExprKind::Size { dimension, piece: 1 })
        };
        Some(Wall {
            bore: size(bore, &written.bore),
            outside: size(outside, &written.outside),
            span: written.span,
        })
    }

    /// A diameter of the part that a cavity is of, not on the wrong side of its wall.
    fn diameter(
        &mut self,
        path: &tree::Path,
        cavity_of: Option<PartId>,
        wrong: Feature,
        word: &str,
    ) -> Option<DimensionId> {
        let id = self.dimension(path)?;
        let found = &self.cx.dimensions[id.index()];
        let (line, form, feature, part) = (found.line, found.form, found.feature, found.part);
        let name = self.path_of(id);
        let refusal =
            |code, message| Diagnostic::new(code, path.span, message).label(line, "stated here");
        if let Some(owner) = cavity_of.filter(|owner| *owner != part) {
            let owner = &self.cx.parts[owner.index()].name;
            let finding = refusal(
                Code::NotOfThatJoint,
                format!("`{name}` is no size of `{owner}`, which the cavity is of"),
            );
            let help = format!("name the {word} of `{owner}`, as `{owner}.{word}`");
            return self.cx.refuse(finding.help(help));
        }
        if form != Form::Diameter {
            let finding = refusal(Code::WrongKind, format!("expected a diameter, found `{name}`"));
            return self.cx.refuse(finding.help("a wall has two diameters, stated as `dia 60 H8`"));
        }
        if feature == wrong {
            let finding =
                refusal(Code::WrongSurface, format!("`{name}` cannot be the {word} of a wall"));
            let help = "name the hole first and what is around it second, as `wall bore body.bore \
                        outside body.outside`";
            return self.cx.refuse(finding.help(help));
        }
        Some(id)
    }

    /// Refuses a wall that is not there within the tolerances.
    fn around(&mut self, bore: DimensionId, outside: DimensionId, span: Span) -> Option<()> {
        let (inner, outer) =
            (&self.cx.dimensions[bore.index()], &self.cx.dimensions[outside.index()]);
        if inner.nominal + inner.upper < outer.nominal + outer.lower {
            return Some(());
        }
        let (inner, outer) = (inner.line, outer.line);
        self.cx.refuse(
            Diagnostic::new(
                Code::RingWithoutWall,
                span,
                "the outside of the wall is not larger than its bore",
            )
            .label(inner, "the bore")
            .label(outer, "the outside")
            .help("name the bore first, as `wall bore body.bore outside body.outside`"),
        )
    }

    /// Refuses to compute the pressure of what states no stiffness.
    pub(super) fn no_bulk_modulus<T>(
        &mut self,
        material: &str,
        stated: Span,
        need: Span,
    ) -> Option<T> {
        self.cx.lacks(material, stated, need, "bulk modulus", "1.6 GPa")
    }

    fn positive(&mut self, written: &tree::Quantity, volume: Scenario) -> Option<Scenario> {
        if volume.least > 0.0 {
            return Some(volume);
        }
        self.cx.refuse(Diagnostic::new(
            Code::ValueOutOfRange,
            written.span(),
            "a volume has to stay above 0",
        ))
    }

    fn charged_at(&mut self, at: Option<&ChargeState>) -> Option<Charge> {
        match at {
            None => Some(Charge::Reference),
            Some(ChargeState::Condition(name)) if name.value == "reference" => {
                Some(Charge::Reference)
            }
            Some(ChargeState::Condition(name)) => {
                Some(Charge::Condition(self.single(name, "a charge is measured")?))
            }
            Some(ChargeState::Temperature(at)) => {
                let kelvin = quantity::scalar(self.cx, at, Expect::Temperature)?;
                quantity::above_absolute_zero(self.cx, at.span(), kelvin)?;
                Some(Charge::At(kelvin))
            }
        }
    }
}
