//! How a material expands: `cte` and `expansion`, with or without directions. 1/K and pure strains.

use super::block::validity;
use super::property::{is_share, no_spread};
use super::table::rows;
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::{Expansion, Expansions, Material, Per, Scatter};
use crate::numeric::Interval;
use crate::numeric::piecewise::TableError;
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::syntax::tree::{
    self, Direction, PropertyKind, PropertyValue, Quantity, Table, TableForm,
};
use crate::units::Kind;

/// Temperatures that a coefficient is compared over, K: 20 °C to 100 °C, as handbooks do.
const HANDBOOK_SPAN: (f64, f64) = (293.15, 373.15);

/// The expansion that a block states; `Some(None)` where it keeps that of the material it is like.
pub(super) fn expansions(
    cx: &mut Context,
    block: &tree::Material,
    base: Option<&Material>,
    over: Option<Interval>,
) -> Option<Option<Expansions>> {
    let stated = || {
        block
            .properties
            .iter()
            .filter(|p| matches!(p.kind.value, PropertyKind::Cte | PropertyKind::Expansion))
    };
    let of = |direction: Option<Direction>| {
        stated().find(move |p| p.direction.as_ref().map(|d| d.value) == direction)
    };
    let (plain, along, across) =
        (of(None), of(Some(Direction::Along)), of(Some(Direction::Across)));
    let built = match (plain, along, across) {
        (None, None, None) if base.is_some() => return Some(None),
        (None, None, None) => {
            return cx.refuse(
                Diagnostic::new(
                    Code::ExpansionMissing,
                    block.name.span,
                    format!("material `{}` does not say how it expands", block.name.value),
                )
                .help("add `cte … ppm/K`, or start from another material with `like`"),
            );
        }
        (Some(one), None, None) => {
            let one = expansion(cx, one, over)?;
            match base.map(|b| &b.expansion) {
                Some(Expansions::Volume(_)) => Expansions::Volume(one),
                _ => Expansions::Isotropic(one),
            }
        }
        (None, Some(along), Some(across)) => {
            let (along, across) = (expansion(cx, along, over), expansion(cx, across, over));
            Expansions::Directional { along: along?, across: across? }
        }
        (Some(plain), _, _) => {
            let directed = along.or(across)?;
            return cx.refuse(
                Diagnostic::new(
                    Code::DirectionMissing,
                    plain.kind.span,
                    "expansion is stated with and without a direction",
                )
                .label(directed.kind.span, "with a direction here")
                .help("state `cte along …` and `cte across …`, or one without a direction"),
            );
        }
        (None, only, other) => {
            let (only, word) = match (only, other) {
                (Some(along), _) => (along, Direction::Across),
                (None, across) => (across?, Direction::Along),
            };
            one_direction(cx, only, word, base, over)?
        }
    };
    if let Some(base) = base {
        other_degree(cx, block, &built, base);
    }
    Some(Some(built))
}

/// One direction stated: the other is that of the material it is like, or missing.
fn one_direction(
    cx: &mut Context,
    stated: &tree::Property,
    other: Direction,
    base: Option<&Material>,
    over: Option<Interval>,
) -> Option<Expansions> {
    let own = expansion(cx, stated, over)?;
    match (base.map(|b| &b.expansion), other) {
        (Some(Expansions::Directional { across, .. }), Direction::Across) => {
            Some(Expansions::Directional { along: own, across: across.clone() })
        }
        (Some(Expansions::Directional { along, .. }), Direction::Along) => {
            Some(Expansions::Directional { along: along.clone(), across: own })
        }
        _ => {
            let word = if other == Direction::Along { "along" } else { "across" };
            cx.refuse(
                Diagnostic::new(
                    Code::DirectionMissing,
                    stated.span,
                    format!("the expansion `{word}` is missing"),
                )
                .help(format!("add `cte {word} …`")),
            )
        }
    }
}

/// One line of `cte` or `expansion`.
fn expansion(
    cx: &mut Context,
    stated: &tree::Property,
    over: Option<Interval>,
) -> Option<Expansion> {
    no_spread(cx, stated)?;
    let over = match &stated.over {
        Some(range) => Some(validity(cx, range)?),
        None => over,
    };
    let expansion = match (&stated.value, stated.kind.value) {
        (PropertyValue::Constant(constant), PropertyKind::Cte) => self::constant(cx, constant)?,
        (PropertyValue::Constant(constant), _) => {
            return cx.refuse(
                Diagnostic::new(
                    Code::WrongKind,
                    constant.span(),
                    "`expansion` is a table of ΔL/L against temperature",
                )
                .help("write `expansion { -196 degC -4150 ppm; 20 degC 0 ppm }`, or `cte … ppm/K`"),
            );
        }
        (PropertyValue::Table(table), PropertyKind::Cte) => coefficients(cx, stated, table)?,
        (PropertyValue::Table(table), _) => {
            let rows = rows(cx, stated, table, Expect::Strain)?;
            let expansion = accepted(cx, stated, Expansion::total(&rows))?;
            scattering(cx, expansion, table)?
        }
    };
    Some(match over {
        Some(over) => expansion.over(over),
        None => expansion,
    })
}

/// A constant coefficient with its scatter.
fn constant(cx: &mut Context, stated: &Quantity) -> Option<Expansion> {
    let s = quantity::scenario(cx, stated, None, Expect::Of(Kind::EXPANSION))?;
    let relative = match stated {
        Quantity::Group(group) => group.tolerance.as_ref().is_some_and(is_share),
        Quantity::Range(_) => false,
    };
    let (middle, half) = (0.5 * s.least + 0.5 * s.greatest, 0.5 * (s.greatest - s.least));
    let scatter = match relative && middle != 0.0 {
        true => Scatter::Relative(half / middle.abs()),
        false if half == 0.0 => Scatter::NONE,
        false => Scatter::PerKelvin(half),
    };
    let reference = cx.head(stated.span().file).reference;
    // A symmetrical tolerance leaves the value as it is written.
    let symmetrical = (s.greatest - s.nominal) - (s.nominal - s.least);
    let alpha = if symmetrical.abs() <= 1e-12 * half { s.nominal } else { middle };
    Some(Expansion::constant(alpha, reference).scattering(scatter))
}

/// A table of coefficients, mean or instantaneous.
fn coefficients(cx: &mut Context, stated: &tree::Property, table: &Table) -> Option<Expansion> {
    let expect = Expect::Of(Kind::EXPANSION);
    let expansion = match &table.form {
        TableForm::Plain => {
            return cx.refuse(
                Diagnostic::new(
                    Code::TableFormMissing,
                    stated.kind.span,
                    "a table of coefficients is of mean or of instantaneous ones",
                )
                .help("write `cte mean from 20 degC, ppm/K { … }` or `cte instantaneous, ppm/K { … }`"),
            );
        }
        TableForm::MeanFrom(base) => {
            let zero = quantity::scalar(cx, base, Expect::Temperature)?;
            quantity::above_absolute_zero(cx, base.span(), zero)?;
            let rows = rows(cx, stated, table, expect)?;
            accepted(cx, stated, Expansion::mean(zero, &rows))?
        }
        TableForm::Instantaneous(_) => {
            let rows = rows(cx, stated, table, expect)?;
            accepted(cx, stated, Expansion::instantaneous(&rows, Per::ReferenceLength))?
        }
    };
    scattering(cx, expansion, table)
}

/// A curve, or a finding with what the table lacks.
fn accepted(
    cx: &mut Context,
    stated: &tree::Property,
    built: Result<Expansion, TableError>,
) -> Option<Expansion> {
    match built {
        Ok(expansion) => Some(expansion),
        Err(error) => cx.refuse(Diagnostic::new(
            Code::TableShape,
            stated.span,
            format!("the table is no curve: {error}"),
        )),
    }
}

/// The tolerance of a table: a share of the strain, or so much coefficient.
fn scattering(cx: &mut Context, expansion: Expansion, table: &Table) -> Option<Expansion> {
    let Some(tolerance) = &table.tolerance else { return Some(expansion) };
    let kind = if is_share(tolerance) { Kind::PURE } else { Kind::EXPANSION };
    let tolerance = match (&tolerance.deviation, &table.unit) {
        // A tolerance takes the unit of the table as the values do.
        (tree::Deviation::Symmetric(t), Some(_)) if t.unit.is_none() => tree::Tolerance {
            deviation: tree::Deviation::Symmetric(super::table::with_unit(t, table)),
            span: tolerance.span,
        },
        _ => tolerance.clone(),
    };
    let (lower, upper) = quantity::tolerance(cx, &tolerance, Expect::Of(kind))?;
    if lower + upper != 0.0 {
        return cx.refuse(
            Diagnostic::new(
                Code::ToleranceOfRow,
                tolerance.span,
                "the tolerance of a table is the same both ways",
            )
            .help("write it as `±…`"),
        );
    }
    let scatter =
        if kind == Kind::PURE { Scatter::Relative(upper) } else { Scatter::PerKelvin(upper) };
    Some(expansion.scattering(scatter))
}

/// Warns of a coefficient that is 1.8 times that of the material it is like, or 1.8 times less: the
/// value may be of the other degree.
fn other_degree(cx: &mut Context, block: &tree::Material, own: &Expansions, base: &Material) {
    let mean = |e: &Expansion| e.mean_coefficient(HANDBOOK_SPAN.0, HANDBOOK_SPAN.1);
    for ((direction, own), (_, other)) in own.each().into_iter().zip(base.expansion.each()) {
        let (own, other) = (mean(own), mean(other));
        let ratio = own / other;
        let near = |target: f64| (ratio / target - 1.0).abs() <= 0.04;
        let (times, unit) = if near(1.8) {
            ("1.8 times", "ppm/K")
        } else if near(1.0 / 1.8) {
            ("1/1.8 times", "ppm/degF")
        } else {
            continue;
        };
        let stated = block.properties.iter().find(|p| {
            let named = p.direction.as_ref().map(|d| d.value);
            p.kind.value == PropertyKind::Cte
                && match direction {
                    "along" => named == Some(Direction::Along),
                    "across" => named == Some(Direction::Across),
                    _ => named.is_none(),
                }
        });
        let Some(stated) = stated else { continue };
        cx.report(
            Diagnostic::new(
                Code::ExpansionOfOtherDegree,
                stated.span,
                format!("this is {times} the coefficient of `{}`, which it is like", base.name),
            )
            .help(format!(
                "if the number was read in a table of the other degree, its unit is `{unit}`"
            )),
        );
    }
}
