//! Sizes with an ISO 286 class.

use super::size::agreed;
use super::{Sized, expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Feature, Form, Origin};
use crate::resolve::context::{Context, known};
use crate::resolve::quantity;
use crate::span::Span;
use crate::standards::iso286::{Class, Kind};
use crate::syntax::tree;

/// A nominal size with a class as spelled.
pub(super) fn class(
    cx: &mut Context,
    dimension: &tree::Dimension,
    value: &tree::Scalar,
    spelled: &tree::Name,
    form: Form,
) -> Option<Sized> {
    let nominal = quantity::scalar(cx, value, expect(form));
    takes_class(cx, spelled.span, form)?;
    let class = match Class::parse(&spelled.value) {
        Ok(class) => class,
        Err(wrong) => {
            let finding = Diagnostic::new(Code::ClassMisspelled, spelled.span, wrong.to_string());
            return cx.refuse(finding.help(wrong.help()));
        }
    };
    let of_class = match class.kind {
        Kind::Hole => Feature::Internal,
        Kind::Shaft => Feature::External,
    };
    let feature = agreed(cx, dimension, spelled, of_class);
    let nominal = nominal?;
    let limits = match class.limits(known("mm").from_si(nominal)) {
        Ok(limits) => limits,
        Err(undefined) => {
            let place = value.span().to(spelled.span);
            let finding = Diagnostic::new(Code::ClassUndefined, place, undefined.to_string());
            return cx.refuse(finding.help(undefined.help()));
        }
    };
    let origin = Origin::Class(spelled.value.clone());
    let sized = Sized::plain(nominal, limits.lower.metres(), limits.upper.metres(), origin);
    Some(Sized { feature: feature?, ..sized })
}

/// Refuses a class where there is no feature of size.
pub(super) fn takes_class(cx: &mut Context, place: Span, form: Form) -> Option<()> {
    let word = match form {
        Form::Diameter | Form::Linear => return Some(()),
        Form::Radius => "a radius",
        Form::Angle => "an angle",
    };
    cx.refuse(
        Diagnostic::new(
            Code::ClassOfNoSize,
            place,
            format!("ISO 286 classes are for diameters and widths, not for {word}"),
        )
        .help("state limit deviations, such as `+0.05/-0.02`"),
    )
}
