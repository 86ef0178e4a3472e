//! `fill`: a liquid or solid in a cavity.

use super::expression::Resolver;
use super::material;
use super::quantity::{self, Expect, with_article};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Charge, Expr, Fill, PartId, Scenario};
use crate::syntax::tree::{self, CavityVolume, ChargeState};
use crate::units::Kind;
use std::sync::Arc;

/// A cavity: the part around it, and its volume as an expression or as a number.
type Cavity = (PartId, Option<Arc<Expr>>, Option<Scenario>);

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
        let (cavity_of, volume_of, stated) = cavity?;
        let volume = self.positive(&charge.volume, volume?)?;
        Some(Fill {
            cavity_of,
            volume: volume_of,
            stated,
            material: material?,
            charge: volume,
            charged_at: charged_at?,
            span: charge.span,
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

    fn positive(&mut self, written: &tree::Quantity, volume: Scenario) -> Option<Scenario> {
        if volume.least > 0.0 {
            return Some(volume);
        }
        self.cx.refuse(Diagnostic::new(
            Code::ValueOutOfRange,
            written.span(),
            "a volume has to stay above nought",
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
