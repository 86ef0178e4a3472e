//! The ways to write a size, each as a nominal size with its limit deviations.

use super::{Owner, Sized, expect, general, geometrical, iso286, set, side};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Feature, Form, Origin};
use crate::resolve::context::Context;
use crate::resolve::quantity;
use crate::syntax::tree::{self, Deviation, Size};
use crate::units::{self, Kind};

/// The size of a dimension with its limits.
pub(super) fn size(
    cx: &mut Context,
    dimension: &tree::Dimension,
    owner: &Owner,
    form: Form,
) -> Option<Sized> {
    let expect = expect(form);
    let span = dimension.size.span;
    let sized = match &dimension.size.value {
        Size::General(value) => general::general(cx, dimension, value, form)?,
        Size::Exact(value) => {
            let nominal = quantity::scalar(cx, value, expect)?;
            Sized::plain(nominal, 0.0, 0.0, Origin::Exact)
        }
        Size::Toleranced(value, tolerance) => {
            let t = quantity::toleranced(cx, value, Some(tolerance), expect)?;
            Sized::plain(t.nominal, t.lower, t.upper, Origin::Stated)
        }
        Size::Limits(range) => {
            let (low, high, _) = quantity::range(cx, range, expect)?;
            // Exact as long as the greater limit is at most twice the lesser (Sterbenz).
            Sized::plain(low, 0.0, high - low, Origin::Stated)
        }
        Size::Class(value, class) => iso286::class(cx, dimension, value, class, form)?,
        Size::OpenClass(value, mark) => {
            let nominal = quantity::scalar(cx, value, expect)?;
            iso286::takes_class(cx, *mark, form)?;
            Sized { feature: side(dimension), ..Sized::plain(nominal, 0.0, 0.0, Origin::Open) }
        }
        Size::OneOf(members, tolerance) => {
            set::one_of(cx, span, members, tolerance.as_ref(), expect)?
        }
        Size::Geometrical(stated) => geometrical::geometrical(cx, dimension, stated, owner)?,
    };
    let least = sized.nominal + sized.lower;
    let round = matches!(form, Form::Diameter | Form::Radius);
    if round && sized.geometric.is_none() && least <= 0.0 {
        let word = if form == Form::Diameter { "diameter" } else { "radius" };
        return cx.refuse(
            Diagnostic::new(
                Code::ValueOutOfRange,
                span,
                format!("the least {word} has to be above 0"),
            )
            .help("check size and tolerance"),
        );
    }
    Some(sized)
}

/// True where a unit of angle stands in a size.
pub(super) fn is_angle(size: &Size) -> bool {
    let of_scalar = |scalar: &tree::Scalar| {
        let unit = scalar.unit.as_ref().and_then(|unit| units::find(&unit.value));
        unit.is_some_and(|unit| unit.kind == Kind::ANGLE)
    };
    let of_tolerance = |tolerance: &tree::Tolerance| match &tolerance.deviation {
        Deviation::Symmetric(t) => of_scalar(t),
        Deviation::Limits(a, b) => of_scalar(a) || of_scalar(b),
    };
    match size {
        Size::General(value)
        | Size::Exact(value)
        | Size::Class(value, _)
        | Size::OpenClass(value, _) => of_scalar(value),
        Size::Toleranced(value, tolerance) => of_scalar(value) || of_tolerance(tolerance),
        Size::Limits(range) => of_scalar(&range.low) || of_scalar(&range.high),
        Size::OneOf(members, tolerance) => {
            members.iter().any(of_scalar) || tolerance.as_ref().is_some_and(of_tolerance)
        }
        Size::Geometrical(stated) => of_scalar(&stated.zone),
    }
}

/// The feature that a class says, against the side stated.
pub(super) fn agreed(
    cx: &mut Context,
    dimension: &tree::Dimension,
    class: &tree::Name,
    of_class: Feature,
) -> Option<Feature> {
    let Some(stated) = &dimension.side else { return Some(of_class) };
    if side(dimension) == of_class {
        return Some(of_class);
    }
    let (is, other, cases) = match of_class {
        Feature::Internal => ("an internal", "external", "lower case"),
        _ => ("an external", "internal", "upper case"),
    };
    let swapped: String =
        class
            .value
            .chars()
            .map(|c| {
                if c.is_ascii_lowercase() { c.to_ascii_uppercase() } else { c.to_ascii_lowercase() }
            })
            .collect();
    cx.refuse(
        Diagnostic::new(
            Code::ClassAgainstSide,
            class.span,
            format!("`{}` is a class of {is} feature", class.value),
        )
        .label(stated.span, format!("stated to be {other}"))
        .help(format!("classes of {other} features are in {cases}, as `{swapped}`")),
    )
}
