//! Whether the lines of a joint can be: rings with a wall, a bore inside of the contact and an outside
//! around it; a length of contact; a coefficient of friction.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Binary, Expr, ExprKind, Form, Ring, Scenario};
use crate::resolve::expression::{Resolver, is_round};
use crate::span::Span;
use crate::syntax::tree::{self, Operand};
use std::sync::Arc;

/// Soft rubber on glass has about as much; a press joint has a tenth of it.
const MOST_FRICTION: f64 = 2.0;

impl Resolver<'_, '_, '_> {
    /// Refuses an outer ring that ends inside of the contact, and an inner one whose bore reaches it;
    /// by nominal sizes, on which stiffness is taken.
    pub(super) fn has_walls(
        &mut self,
        inner: &Ring,
        outer: &Ring,
        external: &Expr,
        internal: &Expr,
    ) -> Option<()> {
        let bore = inner.free.as_ref().map(|free| (inner, free, external, "bore", -1.0));
        let outside = outer.free.as_ref().map(|free| (outer, free, internal, "outside", 1.0));
        for (ring, free, contact, word, outward) in [bore, outside].into_iter().flatten() {
            let (Some(size), Some(at)) = (self.nominal(free), self.nominal(contact)) else {
                continue;
            };
            let is_bore = outward < 0.0;
            if (size - at) * outward > 0.0 && !(is_bore && size <= 0.0) {
                continue;
            }
            let name = self.cx.parts[ring.part.index()].name.clone();
            let message = match word {
                _ if size <= 0.0 => format!("the {word} of `{name}` is not above 0"),
                "bore" => format!("the bore of `{name}` is not smaller than its contact"),
                _ => format!("the outside of `{name}` is not larger than its contact"),
            };
            let help = if is_bore {
                format!("state the bore inside of the contact, or `{name} solid`")
            } else {
                format!("state the diameter around the contact, as `{name} outside …`")
            };
            return self.cx.refuse(
                Diagnostic::new(Code::RingWithoutWall, free.span, message)
                    .label(contact.span, "in contact here")
                    .help(help),
            );
        }
        Some(())
    }

    /// The length of contact: along the axis, above 0.
    pub(super) fn contact_length(&mut self, length: &Operand, line: Span) -> Option<Arc<Expr>> {
        let found = self.operand(length, line, Form::Linear)?;
        if let ExprKind::Size { dimension, .. } = found.kind
            && is_round(self.cx.dimensions[dimension.index()].form)
        {
            let path = self.path_of(dimension);
            return self.cx.refuse(
                Diagnostic::new(
                    Code::WrongKind,
                    found.span,
                    format!("expected a length along the axis, found the round size `{path}`"),
                )
                .label(self.cx.dimensions[dimension.index()].line, "stated here")
                .help("state how long the rings touch, as `length 20`"),
            );
        }
        if self.nominal(&found).is_none_or(|length| length > 0.0) {
            return Some(found);
        }
        self.cx.refuse(
            Diagnostic::new(
                Code::ValueOutOfRange,
                found.span,
                "a length of contact has to be above 0",
            )
            .help("state how long the rings touch, as `length 20`"),
        )
    }

    /// Refuses a friction below 0, or so great that per cent are meant.
    pub(super) fn possible_friction(
        &mut self,
        friction: Scenario,
        written: &tree::Quantity,
    ) -> Option<Scenario> {
        if friction.least >= 0.0 && friction.greatest <= MOST_FRICTION {
            return Some(friction);
        }
        let help = if friction.least < 0.0 {
            "state both ends at or above 0, as `friction 0.12 .. 0.18`"
        } else {
            "state it as a pure number or with its unit, as `friction 0.12` or `friction 12 %`"
        };
        self.cx.refuse(
            Diagnostic::new(
                Code::ValueOutOfRange,
                written.span(),
                format!("a coefficient of friction lies from 0 to {MOST_FRICTION}"),
            )
            .help(help),
        )
    }

    /// The nominal value of a size or a sum of sizes, m.
    fn nominal(&self, e: &Expr) -> Option<f64> {
        Some(match &e.kind {
            ExprKind::Constant(value) => *value,
            ExprKind::Size { dimension, .. } | ExprKind::After { dimension, .. } => {
                self.cx.dimensions[dimension.index()].nominal
            }
            ExprKind::Pieces { dimension, count } => {
                f64::from(*count) * self.cx.dimensions[dimension.index()].nominal
            }
            ExprKind::Named(_, inner) => self.nominal(inner)?,
            ExprKind::Negate(inner) => -self.nominal(inner)?,
            ExprKind::Binary(Binary::Add, a, b) => self.nominal(a)? + self.nominal(b)?,
            ExprKind::Binary(Binary::Sub, a, b) => self.nominal(a)? - self.nominal(b)?,
            _ => return None,
        })
    }
}
