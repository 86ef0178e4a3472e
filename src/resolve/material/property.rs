//! Elastic data, strength, density and the highest temperature allowed. Scatter is a share of the
//! value.

use super::block::validity;
use super::table::{self, rows};
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::Property;
use crate::numeric::Interval;
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::span::Span;
use crate::syntax::tree::{self, Deviation, PropertyKind, PropertyValue};
use crate::units::{self, Kind};

/// A property as a constant or a table.
pub(super) fn property(
    cx: &mut Context,
    stated: &tree::Property,
    kind: Kind,
    over: Option<Interval>,
) -> Option<Property> {
    no_spread(cx, stated)?;
    let over = match &stated.over {
        Some(range) => Some(validity(cx, range)?),
        None => over,
    };
    let expect = Expect::Of(kind);
    let mut property = match &stated.value {
        PropertyValue::Constant(constant) => {
            let s = quantity::scenario(cx, constant, None, expect)?;
            possible(cx, stated, constant.span(), s.least)?;
            possible(cx, stated, constant.span(), s.greatest)?;
            let middle = 0.5 * s.least + 0.5 * s.greatest;
            let half = 0.5 * (s.greatest - s.least);
            let mut property = Property::constant(middle);
            property.scatter = if half == 0.0 { 0.0 } else { half / middle.abs() };
            property
        }
        PropertyValue::Table(table) => {
            let rows = rows(cx, stated, table, expect)?;
            for (row, (_, value)) in table.rows.iter().zip(&rows) {
                possible(cx, stated, row.value.span, *value)?;
            }
            let scatter = match &table.tolerance {
                Some(tolerance) => share(cx, tolerance)?,
                None => 0.0,
            };
            match Property::table(&rows) {
                Ok(property) => Property { scatter, ..property },
                Err(error) => {
                    let message = format!("the table is no curve: {error}");
                    return cx.refuse(Diagnostic::new(Code::TableShape, stated.span, message));
                }
            }
        }
    };
    if let Some(over) = over {
        property.range = over;
    }
    Some(property)
}

/// The tolerance of a table, as a share of each value.
fn share(cx: &mut Context, tolerance: &tree::Tolerance) -> Option<f64> {
    if let Deviation::Symmetric(t) = &tolerance.deviation
        && t.unit.as_ref().is_some_and(|unit| unit.value == "%")
    {
        return quantity::scalar(cx, t, Expect::Of(Kind::PURE));
    }
    cx.refuse(
        Diagnostic::new(
            Code::WrongKind,
            tolerance.span,
            "the tolerance of a table is a share of each value",
        )
        .help("write it as `±… %`"),
    )
}

/// Refuses values that no material has.
fn possible(cx: &mut Context, stated: &tree::Property, span: Span, value: f64) -> Option<()> {
    let word = cx.text(stated.kind.span).to_string();
    let (fits, bounds) = match stated.kind.value {
        // Thermodynamics leaves −1 … 0.5 for isotropic materials.
        PropertyKind::Poisson => (value > -1.0 && value <= 0.5, "above -1 and at most 0.5"),
        _ => (value > 0.0, "above 0"),
    };
    if fits {
        return Some(());
    }
    cx.refuse(
        Diagnostic::new(Code::ValueOutOfRange, span, format!("`{word}` has to be {bounds}"))
            .help("check the number and its tolerance"),
    )
}

/// Scatter of a material lies anywhere within its limits; no other spread is reckoned with.
pub(super) fn no_spread(cx: &mut Context, stated: &tree::Property) -> Option<()> {
    let Some(spread) = &stated.spread else { return Some(()) };
    if matches!(spread.distribution.value, tree::Distribution::Uniform) && spread.shift.is_none() {
        return Some(());
    }
    cx.refuse(
        Diagnostic::new(
            Code::SpreadOfMaterial,
            spread.span,
            "the scatter of a material is taken as uniform over its limits",
        )
        .help("leave the spread out, and state limits that hold for every lot"),
    )
}

/// The highest temperature allowed, K.
pub(super) fn limit(cx: &mut Context, stated: &tree::Property) -> Option<f64> {
    match &stated.value {
        PropertyValue::Constant(tree::Quantity::Group(group)) if group.tolerance.is_none() => {
            let kelvin = quantity::scalar(cx, &group.value, Expect::Temperature)?;
            quantity::above_absolute_zero(cx, group.span, kelvin)?;
            Some(kelvin)
        }
        _ => cx.refuse(
            Diagnostic::new(Code::WrongKind, stated.span, "`limit` is one temperature")
                .help("write the highest temperature allowed, such as `limit 150 degC`"),
        ),
    }
}

/// True where a tolerance is stated in per cent.
pub(super) fn is_share(tolerance: &tree::Tolerance) -> bool {
    let of = |scalar: &tree::Scalar| {
        scalar
            .unit
            .as_ref()
            .and_then(|unit| units::find(&unit.value))
            .is_some_and(|u| u.name == "%")
    };
    match &tolerance.deviation {
        Deviation::Symmetric(t) => of(t),
        Deviation::Limits(a, b) => of(a) || of(b),
    }
}

/// A value of a table row with the table's unit, for callers that need its tolerance too.
pub(super) fn row_group(row: &tree::Row, table: &tree::Table) -> tree::Group {
    tree::Group { value: table::with_unit(&row.value.value, table), ..row.value.clone() }
}
