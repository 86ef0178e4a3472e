//! `joint { … }`: the rings that press on each other, and the surfaces they have besides.

mod walls;

use super::expression::{Resolver, expr, is_round, terms};
use super::quantity::{self, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Expr, ExprKind, Feature, Form, Joint, PartId, Ring, Scenario};
use crate::span::Span;
use crate::syntax::tree::{self, JointLine, Operand, RingSide, Surface};
use crate::units::Kind;
use std::sync::Arc;

/// The lines of a joint, each kind once a ring.
#[derive(Default)]
struct Lines<'t> {
    length: Option<(&'t Operand, Span)>,
    friction: Option<(&'t tree::Quantity, Option<&'t tree::Spread>, Span)>,
    insertion: Option<(&'t Operand, Span)>,
    inner: Option<(&'t tree::Name, Span)>,
    outer: Option<(&'t tree::Name, Span)>,
    rings: Vec<RingLine<'t>>,
}

/// A line that speaks of one ring.
enum RingLine<'t> {
    Surface(&'t tree::Name, Surface, &'t Operand, Span),
    Solid(&'t tree::Name, Span),
    Roughness(&'t tree::Name, &'t tree::Group, Span),
}

impl<'t> RingLine<'t> {
    fn part(&self) -> &'t tree::Name {
        match self {
            RingLine::Surface(part, ..) | RingLine::Solid(part, _) => part,
            RingLine::Roughness(part, ..) => part,
        }
    }
}

impl<'t> Resolver<'_, '_, 't> {
    /// A joint between the sides of a round fit.
    pub(super) fn joint(
        &mut self,
        written: &'t tree::Joint,
        external: &Expr,
        internal: &Expr,
        round: bool,
    ) -> Option<Joint> {
        if !round {
            let (a, b) = (external.span, internal.span);
            return self.cx.refuse(
                Diagnostic::new(
                    Code::JointNotRound,
                    written.span,
                    "a joint needs round features, and a side of this fit has no diameter",
                )
                .label(a, "the external side")
                .label(b, "the internal side")
                .help("state the sizes as diameters, `dia 42 …`, or use a `restraint`"),
            );
        }
        let lines = self.lines(written)?;
        if self.cx.has_broken(written.span) {
            return None;
        }
        let inner = self.ring_part(RingSide::Inner, lines.inner, external);
        let outer = self.ring_part(RingSide::Outer, lines.outer, internal);
        let (inner, outer) = (inner?, outer?);
        if inner == outer {
            let name = self.cx.parts[inner.index()].name.clone();
            return self.cx.refuse(Diagnostic::new(
                Code::JointIncomplete,
                written.span,
                format!("`{name}` is the inner and the outer ring of one joint"),
            ));
        }
        let inner = self.ring(inner, RingSide::Inner, &lines, written);
        let outer = self.ring(outer, RingSide::Outer, &lines, written);
        self.check_ring_names(&lines, &inner, &outer);
        let length = match lines.length {
            Some((length, span)) => self.contact_length(length, span),
            None => self.cx.refuse(
                Diagnostic::new(
                    Code::JointIncomplete,
                    written.span,
                    "the joint does not state its length of contact",
                )
                .help("add a line such as `length 20`"),
            ),
        };
        let friction = match lines.friction {
            Some((friction, spread, _)) => {
                let expect = Expect::Of(Kind::PURE);
                let found = quantity::scenario(self.cx, friction, spread, expect)?;
                Some(self.possible_friction(found, friction)?)
            }
            None => None,
        };
        let insertion_clearance = match lines.insertion {
            Some((clearance, span)) => Some(self.stated(clearance, span)?),
            None => None,
        };
        let (inner, outer, length) = (inner?, outer?, length?);
        self.has_walls(&inner, &outer, external, internal)?;
        Some(Joint { span: written.span, length, inner, outer, friction, insertion_clearance })
    }

    /// Sorts the lines, and refuses what is said twice.
    fn lines(&mut self, written: &'t tree::Joint) -> Option<Lines<'t>> {
        let mut lines = Lines::default();
        let mut fine = Some(());
        for line in &written.lines {
            let said = match line {
                JointLine::Length { length, span } => {
                    once(&mut lines.length, (length, *span), |l| l.1)
                }
                JointLine::Friction { friction, spread, span } => {
                    once(&mut lines.friction, (friction, spread.as_ref(), *span), |f| f.2)
                }
                JointLine::InsertionClearance { clearance, span } => {
                    once(&mut lines.insertion, (clearance, *span), |i| i.1)
                }
                JointLine::Ring { side, part, span } => match side.value {
                    RingSide::Inner => once(&mut lines.inner, (part, *span), |r| r.1),
                    RingSide::Outer => once(&mut lines.outer, (part, *span), |r| r.1),
                },
                JointLine::Surface { part, surface, size, span } => {
                    lines.rings.push(RingLine::Surface(part, surface.value, size, *span));
                    None
                }
                JointLine::Solid { part, span } => {
                    lines.rings.push(RingLine::Solid(part, *span));
                    None
                }
                JointLine::Roughness { part, rz, span } => {
                    lines.rings.push(RingLine::Roughness(part, rz, *span));
                    None
                }
            };
            if let Some((first, again)) = said {
                fine = self.said_twice(first, again);
            }
        }
        fine.map(|()| lines)
    }

    fn said_twice<T>(&mut self, first: Span, again: Span) -> Option<T> {
        self.cx.refuse(
            Diagnostic::new(Code::StatedTwice, again, "this is stated twice in one block")
                .label(first, "stated here first")
                .help("leave one of them out"),
        )
    }

    /// The part that carries a side: the one named, or the only one of that side.
    fn ring_part(
        &mut self,
        side: RingSide,
        named: Option<(&tree::Name, Span)>,
        e: &Expr,
    ) -> Option<PartId> {
        let (word, place) = match side {
            RingSide::Inner => ("inner", "external"),
            RingSide::Outer => ("outer", "internal"),
        };
        let mut parts: Vec<PartId> = Vec::new();
        for term in terms(e) {
            let part = self.cx.dimensions[term.dimension.index()].part;
            if !parts.contains(&part) {
                parts.push(part);
            }
        }
        if let Some((name, _)) = named {
            let part = self.cx.part(name)?;
            if parts.contains(&part) {
                return Some(part);
            }
            return self.cx.refuse(
                Diagnostic::new(
                    Code::NotOfThatJoint,
                    name.span,
                    format!("`{}` has no size on the {place} side of this fit", name.value),
                )
                .label(e.span, format!("the {place} side")),
            );
        }
        match parts.as_slice() {
            [only] => Some(*only),
            _ => {
                let names: Vec<&str> =
                    parts.iter().map(|p| self.cx.parts[p.index()].name.as_str()).collect();
                let example = names.last().copied().unwrap_or("core").to_string();
                self.cx.refuse(
                    Diagnostic::new(
                        Code::JointIncomplete,
                        e.span,
                        format!(
                            "the {place} side is a sum: the joint has to name its elastic ring"
                        ),
                    )
                    .help(format!("add a line such as `{word} {example}` to the joint")),
                )
            }
        }
    }

    fn ring(
        &mut self,
        part: PartId,
        side: RingSide,
        lines: &Lines<'t>,
        written: &tree::Joint,
    ) -> Option<Ring> {
        let name = self.cx.parts[part.index()].name.clone();
        let mut far: Option<(Option<Arc<Expr>>, Span)> = None;
        let mut rough: Option<(f64, Span)> = None;
        for line in lines.rings.iter().filter(|line| line.part().value == name) {
            let said = match line {
                RingLine::Surface(_, surface, size, span) => {
                    let free = self.free_surface(side, *surface, size, *span, &name)?;
                    once(&mut far, (Some(free), *span), |f| f.1)
                }
                RingLine::Solid(_, span) => {
                    if side == RingSide::Outer {
                        return self.cx.refuse(
                            Diagnostic::new(
                                Code::WrongSurface,
                                *span,
                                format!("`{name}` is the outer ring, which cannot be solid"),
                            )
                            .help(format!("state its outside, as `{name} outside 60`")),
                        );
                    }
                    once(&mut far, (None, *span), |f| f.1)
                }
                RingLine::Roughness(_, rz, span) => {
                    let value = self.roughness(rz)?;
                    once(&mut rough, (value, *span), |r| r.1)
                }
            };
            if let Some((first, again)) = said {
                return self.said_twice(first, again);
            }
        }
        let Some((free, _)) = far else {
            let (what, help) = match side {
                RingSide::Inner => ("bore", format!("`{name} bore 20` or `{name} solid`")),
                RingSide::Outer => ("outside", format!("`{name} outside 60`")),
            };
            return self.cx.refuse(
                Diagnostic::new(
                    Code::JointIncomplete,
                    written.span,
                    format!("the joint does not state the {what} of `{name}`"),
                )
                .help(format!("add a line such as {help}")),
            );
        };
        self.needs_stiffness(part, written.span)?;
        Some(Ring { part, free, roughness: rough.map(|(value, _)| value) })
    }

    fn free_surface(
        &mut self,
        side: RingSide,
        surface: Surface,
        size: &Operand,
        span: Span,
        name: &str,
    ) -> Option<Arc<Expr>> {
        let (wanted, word, wrong) = match side {
            RingSide::Inner => (Surface::Bore, "bore", "outside is in contact"),
            RingSide::Outer => (Surface::Outside, "outside", "bore is in contact"),
        };
        if surface != wanted {
            return self.cx.refuse(
                Diagnostic::new(Code::WrongSurface, span, format!("the {wrong} in this joint"))
                    .help(format!("state the {word} of `{name}`")),
            );
        }
        let free = self.operand(size, span, Form::Diameter)?;
        if let ExprKind::Size { dimension, .. } = free.kind {
            let owner = self.cx.dimensions[dimension.index()].part;
            if self.cx.parts[owner.index()].name != name {
                let path = self.path_of(dimension);
                return self.cx.refuse(
                    Diagnostic::new(
                        Code::NotOfThatJoint,
                        free.span,
                        format!("`{path}` is no size of `{name}`"),
                    )
                    .label(self.cx.dimensions[dimension.index()].line, "stated here")
                    .help(format!("state the {word} of `{name}` itself, as a size or by its name")),
                );
            }
            let opposite = match side {
                RingSide::Inner => Feature::External,
                RingSide::Outer => Feature::Internal,
            };
            if self.cx.dimensions[dimension.index()].feature == opposite {
                let path = self.path_of(dimension);
                return self.cx.refuse(
                    Diagnostic::new(
                        Code::WrongSurface,
                        free.span,
                        format!("`{path}` cannot be the {word} of `{name}`"),
                    )
                    .label(self.cx.dimensions[dimension.index()].line, "stated here")
                    .help(format!("name the surface of `{name}` that is not in contact")),
                );
            }
        }
        Some(free)
    }

    /// A size stated on the spot, which is then exact, or a dimension.
    pub(super) fn operand(
        &mut self,
        operand: &Operand,
        line: Span,
        form: Form,
    ) -> Option<Arc<Expr>> {
        match operand {
            Operand::Dimension(path) => {
                let dimension = self.dimension(path)?;
                let found = self.cx.dimensions[dimension.index()].form;
                if found == Form::Angle || is_round(form) && found != Form::Diameter {
                    let expected = if is_round(form) { "a diameter" } else { "a length" };
                    let finding = Diagnostic::new(
                        Code::WrongKind,
                        path.span,
                        format!("expected {expected}, found `{}`", self.path_of(dimension)),
                    )
                    .label(self.cx.dimensions[dimension.index()].line, "stated here");
                    return self.cx.refuse(finding);
                }
                let kind = ExprKind::Size { dimension, piece: 1 };
                Some(expr(path.span, Kind::LENGTH, kind))
            }
            Operand::Quantity(quantity) => {
                let value = quantity::scenario(self.cx, quantity, None, Expect::Limit)?;
                if !value.is_exact() {
                    return self.cx.refuse(
                        Diagnostic::new(
                            Code::ToleranceNotOfAPart,
                            quantity.span(),
                            "a size with a tolerance belongs to a part",
                        )
                        .label(line, "of this joint")
                        .help("state it as a dimension of the part and name that here"),
                    );
                }
                Some(expr(quantity.span(), Kind::LENGTH, ExprKind::Constant(value.nominal)))
            }
        }
    }

    /// A length stated on the spot.
    fn stated(&mut self, operand: &Operand, line: Span) -> Option<Scenario> {
        match operand {
            Operand::Quantity(quantity) => {
                let value = quantity::scenario(self.cx, quantity, None, Expect::Limit)?;
                if value.least < 0.0 {
                    return self.cx.refuse(
                        Diagnostic::new(
                            Code::ValueOutOfRange,
                            quantity.span(),
                            "a clearance while joining is not below 0",
                        )
                        .help("state the room wanted, as `insertion clearance 0.02`"),
                    );
                }
                Some(value)
            }
            Operand::Dimension(path) => self.cx.refuse(
                Diagnostic::new(Code::WrongKind, path.span, "expected a length, found a name")
                    .label(line, "the clearance wanted while joining")
                    .help("state it, as `insertion clearance 0.02`"),
            ),
        }
    }

    fn roughness(&mut self, rz: &tree::Group) -> Option<f64> {
        let value = quantity::group(self.cx, rz, Expect::Of(Kind::LENGTH))?;
        if value.lower != 0.0 || value.upper != 0.0 || value.nominal < 0.0 {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::ValueOutOfRange,
                    rz.span,
                    "a roughness is one height, not below 0",
                )
                .help("state the greatest Rz of the drawing, as `Rz 6 um`"),
            );
        }
        Some(value.nominal)
    }

    /// Reports lines that speak of a part that is no ring of the joint.
    fn check_ring_names(&mut self, lines: &Lines, inner: &Option<Ring>, outer: &Option<Ring>) {
        let (Some(inner), Some(outer)) = (inner, outer) else { return };
        let rings = [inner.part, outer.part].map(|p| self.cx.parts[p.index()].name.clone());
        for line in &lines.rings {
            let part = line.part();
            if rings.contains(&part.value) || self.cx.part(part).is_none() {
                continue;
            }
            self.cx.report(
                Diagnostic::new(
                    Code::NotOfThatJoint,
                    part.span,
                    format!("`{}` is no ring of this joint", part.value),
                )
                .help(format!("its rings are `{}` and `{}`", rings[0], rings[1])),
            );
        }
    }

    /// Refuses a part whose material cannot be pressed for want of data.
    pub(super) fn needs_stiffness(&mut self, part: PartId, need: Span) -> Option<()> {
        let material = &self.cx.parts[part.index()].material;
        let missing = match (&material.modulus, &material.poisson) {
            (None, _) => "modulus",
            (_, None) => "poisson",
            _ => return Some(()),
        };
        self.lacks(part, missing, need)
    }

    /// A part whose material states no such property, which `need` needs.
    pub(super) fn lacks<T>(&mut self, part: PartId, property: &str, need: Span) -> Option<T> {
        let part = &self.cx.parts[part.index()];
        let (material, span) = (part.material.name.clone(), part.material_span);
        self.cx.lacks(&material, span, need, property, "…")
    }
}

/// Fills a place once; where it is full, both places.
fn once<T>(slot: &mut Option<T>, value: T, place: impl Fn(&T) -> Span) -> Option<(Span, Span)> {
    match slot {
        Some(first) => Some((place(first), place(&value))),
        None => {
            *slot = Some(value);
            None
        }
    }
}
