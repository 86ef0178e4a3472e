//! The clauses of a dimension that do not change its limits: direction, loads, strains, basis.

use super::Owner;
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Basis, ConditionId, Direction, Form, Load, Strain};
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::span::Span;
use crate::syntax::tree;
use crate::units::Kind;
use std::collections::BTreeSet;

/// The direction of a dimension: stated exactly where the material has one. Angles need none.
pub(super) fn direction(
    cx: &mut Context,
    dimension: &tree::Dimension,
    owner: &Owner,
    form: Form,
) -> Option<Direction> {
    let stated = dimension.direction.as_ref();
    let Some(material) = &owner.material else { return Some(Direction::None) };
    match (material.expansion.is_directional(), stated) {
        (true, Some(direction)) => Some(match direction.value {
            tree::Direction::Along => Direction::Along,
            tree::Direction::Across => Direction::Across,
        }),
        (false, None) => Some(Direction::None),
        (true, None) if form == Form::Angle => Some(Direction::None),
        (true, None) => cx.refuse(
            Diagnostic::new(
                Code::DirectionMissing,
                dimension.span,
                format!(
                    "`{}` has to say `along` or `across`: `{}` expands by direction",
                    dimension.name.value, material.name
                ),
            )
            .label(owner.material_span, "the material")
            .help("`along` the fibre, the flow or the sheet, or `across` it"),
        ),
        (false, Some(direction)) => cx.refuse(
            Diagnostic::new(
                Code::DirectionUnneeded,
                direction.span,
                format!("`{}` expands alike in every direction", material.name),
            )
            .label(owner.material_span, "the material")
            .help("leave the direction out, or give the material `cte along` and `cte across`"),
        ),
    }
}

/// Where a number comes from.
pub(super) fn basis(stated: Option<tree::Basis>) -> Basis {
    match stated {
        None | Some(tree::Basis::Drawing) => Basis::Drawing,
        Some(tree::Basis::Measured) => Basis::Measured,
        Some(tree::Basis::Supplier) => Basis::Supplier,
        Some(tree::Basis::Assumed) => Basis::Assumed,
    }
}

/// Elastic loads, at most one in each condition.
pub(super) fn loads(
    cx: &mut Context,
    dimension: &tree::Dimension,
    form: Form,
) -> Option<Vec<Load>> {
    let mut taken = Taken::default();
    let mut loads = Vec::new();
    for stated in &dimension.loads {
        if form == Form::Angle {
            return cx.refuse(of_an_angle(stated.span, "load"));
        }
        let conditions = conditions(cx, &stated.at);
        let force =
            quantity::scenario(cx, &stated.force, stated.spread.as_ref(), Expect::Of(Kind::FORCE));
        let area = quantity::scenario(cx, &stated.area, None, Expect::Of(Kind::AREA));
        let (conditions, force, area) = (conditions?, force?, area?);
        if area.least <= 0.0 {
            return cx.refuse(
                Diagnostic::new(
                    Code::ValueOutOfRange,
                    stated.area.span(),
                    "a load needs an area above 0",
                )
                .help("state the area that carries the load, such as `over 350 mm2`"),
            );
        }
        taken.add(cx, "load", stated.span, &conditions)?;
        loads.push(Load { force, area, conditions, span: stated.span });
    }
    Some(loads)
}

/// Strains known from elsewhere, at most one in each condition.
pub(super) fn strains(
    cx: &mut Context,
    dimension: &tree::Dimension,
    form: Form,
) -> Option<Vec<Strain>> {
    let mut taken = Taken::default();
    let mut strains = Vec::new();
    for stated in &dimension.strains {
        if form == Form::Angle {
            return cx.refuse(of_an_angle(stated.span, "strain"));
        }
        let conditions = conditions(cx, &stated.at);
        let strain = quantity::scenario(cx, &stated.strain, None, Expect::Strain);
        let (conditions, strain) = (conditions?, strain?);
        if strain.least <= -1.0 || strain.greatest >= 1.0 {
            return cx.refuse(
                Diagnostic::new(
                    Code::ValueOutOfRange,
                    stated.strain.span(),
                    "a strain of 100 % or more is none that a part survives",
                )
                .help("write it in % or ppm, such as `0.09 %`"),
            );
        }
        taken.add(cx, "strain", stated.span, &conditions)?;
        strains.push(Strain { strain, conditions, span: stated.span });
    }
    Some(strains)
}

fn of_an_angle(span: Span, word: &str) -> Diagnostic {
    Diagnostic::new(Code::WrongKind, span, format!("an angle takes no {word}"))
        .help(format!("state the {word} at a length"))
}

/// The conditions of those names; a finding for each that is not there.
fn conditions(cx: &mut Context, names: &[tree::Name]) -> Option<Vec<ConditionId>> {
    let found: Vec<Option<ConditionId>> = names.iter().map(|n| cx.condition(n)).collect();
    found.into_iter().collect()
}

/// The conditions that earlier clauses speak of.
#[derive(Default)]
struct Taken {
    everywhere: Option<Span>,
    at: BTreeSet<(ConditionId, Span)>,
}

impl Taken {
    /// Adds a clause; a finding where an earlier one speaks of the same condition.
    fn add(
        &mut self,
        cx: &mut Context,
        word: &str,
        span: Span,
        conditions: &[ConditionId],
    ) -> Option<()> {
        let earlier = self.everywhere.or_else(|| {
            let same =
                |(id, _): &&(ConditionId, Span)| conditions.is_empty() || conditions.contains(id);
            self.at.iter().find(same).map(|(_, span)| *span)
        });
        if let Some(earlier) = earlier {
            return cx.refuse(
                Diagnostic::new(
                    Code::StatedTwice,
                    span,
                    format!("`{word}` is stated twice for one condition"),
                )
                .label(earlier, "first stated here")
                .help("name the conditions of each with `at`"),
            );
        }
        if conditions.is_empty() {
            self.everywhere = Some(span);
        }
        self.at.extend(conditions.iter().map(|id| (*id, span)));
        Some(())
    }
}
