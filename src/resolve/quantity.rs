//! Numbers with units as values in SI: which unit governs which number, what a tolerance makes of a
//! value, and which end is which.
//!
//! A value that cannot be read gives `None` and has been reported. Sums and differences of two
//! converted numbers are rounded once more: 58 ±0.05 mm has its limits within one rounding of the
//! doubles nearest to 57.95 mm and 58.05 mm.

mod scope;
mod spread;
#[cfg(test)]
mod tests;
mod unit;

pub(crate) use spread::spread;
pub(crate) use unit::{unit, unit_for, with_article, wrong_kind};

use super::context::{Context, known};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Limit, Scenario};
use crate::span::{FileId, Span};
use crate::syntax::tree;
use crate::units::{Kind, Unit};

/// What a number is expected to be, which decides the unit of a bare one.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum Expect {
    /// A length that follows the file's `lengths in`, and may be a tolerance class.
    Size,
    /// A length as a size, and never a tolerance class: the limit of a requirement, a joint's length.
    Limit,
    /// A temperature that follows the file's `temperatures in`.
    Temperature,
    /// A difference of temperatures; bare, in the degrees of the file.
    Difference,
    /// A small strain, often in % or ppm: a unit at the end could be a share of the value.
    Strain,
    /// Any other kind; bare only where it is a pure number.
    Of(Kind),
}

impl Expect {
    /// The kind of quantity.
    pub(crate) fn kind(self) -> Kind {
        match self {
            Expect::Size | Expect::Limit => Kind::LENGTH,
            Expect::Temperature => Kind::TEMPERATURE,
            Expect::Difference => Kind::DIFFERENCE,
            Expect::Strain => Kind::PURE,
            Expect::Of(kind) => kind,
        }
    }

    /// What a limit of that kind is expected to be: lengths and temperatures follow the file.
    pub(crate) fn limit(kind: Kind) -> Self {
        match kind {
            Kind::LENGTH => Expect::Limit,
            Kind::TEMPERATURE => Expect::Temperature,
            Kind::DIFFERENCE => Expect::Difference,
            kind => Expect::Of(kind),
        }
    }

    /// The unit of a bare number in that file, if it may be bare.
    pub(crate) fn bare(self, cx: &Context, file: FileId) -> Option<&'static Unit> {
        let defaults = cx.head(file).defaults;
        match self {
            Expect::Size | Expect::Limit => Some(defaults.length),
            Expect::Temperature | Expect::Difference => Some(defaults.temperature),
            Expect::Strain => Some(known("")),
            Expect::Of(kind) if kind == Kind::PURE => Some(known("")),
            Expect::Of(_) => None,
        }
    }

    /// A value of that kind in that unit as SI.
    fn to_si(self, unit: &Unit, value: f64) -> f64 {
        match self {
            Expect::Difference => unit.difference_to_si(value),
            _ => unit.to_si(value),
        }
    }
}

/// A value with its limit deviations, SI.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) struct Toleranced {
    /// The value stated.
    pub(crate) nominal: f64,
    /// Lower limit deviation.
    pub(crate) lower: f64,
    /// Upper limit deviation.
    pub(crate) upper: f64,
    /// The unit that the value was stated in.
    pub(crate) unit: &'static Unit,
}

/// The limits of a requirement, and the unit that they were stated in.
#[derive(Debug, Clone, PartialEq)]
pub(crate) struct Limits {
    /// Least allowed value.
    pub(crate) lower: Option<Limit>,
    /// Greatest allowed value.
    pub(crate) upper: Option<Limit>,
    /// The unit of the first number.
    pub(crate) unit: &'static Unit,
}

/// A single number as SI.
pub(crate) fn scalar(cx: &mut Context, scalar: &tree::Scalar, expect: Expect) -> Option<f64> {
    let unit = scope::lone(cx, scalar, expect)?;
    convert(cx, &scalar.number, unit, expect)
}

/// A value with its tolerance; deviations are zero where there is none.
pub(crate) fn group(cx: &mut Context, group: &tree::Group, expect: Expect) -> Option<Toleranced> {
    toleranced(cx, &group.value, group.tolerance.as_ref(), expect)
}

/// A value and a tolerance that stands beside it.
pub(crate) fn toleranced(
    cx: &mut Context,
    value: &tree::Scalar,
    tolerance: Option<&tree::Tolerance>,
    expect: Expect,
) -> Option<Toleranced> {
    let Some(tolerance) = tolerance else {
        let unit = scope::lone(cx, value, expect)?;
        let nominal = convert(cx, &value.number, unit, expect)?;
        return Some(Toleranced { nominal, lower: 0.0, upper: 0.0, unit });
    };
    let units = scope::group(cx, value, tolerance, expect)?;
    let nominal = convert(cx, &value.number, units.value, expect)?;
    let deviation = |cx: &mut Context, number: &tree::Number, unit: scope::Of| match unit {
        scope::Of::Unit(unit) => difference(cx, number, unit),
        scope::Of::Share => Some(nominal.abs() * known("%").to_si(number.value)),
    };
    let (lower, upper) = match &tolerance.deviation {
        tree::Deviation::Symmetric(t) => {
            let t = deviation(cx, &t.number, units.first)?;
            (-t, t)
        }
        tree::Deviation::Limits(a, b) => {
            let first = deviation(cx, &a.number, units.first)?;
            let second = deviation(cx, &b.number, units.second)?;
            deviations(cx, tolerance, (a, first), (b, second))?
        }
    };
    Some(Toleranced { nominal, lower, upper, unit: units.value })
}

/// A tolerance that stands by itself, as lower and upper deviation.
pub(crate) fn tolerance(
    cx: &mut Context,
    tolerance: &tree::Tolerance,
    expect: Expect,
) -> Option<(f64, f64)> {
    let difference_of = if expect == Expect::Temperature { Expect::Difference } else { expect };
    match &tolerance.deviation {
        tree::Deviation::Symmetric(t) => {
            let t = scalar(cx, t, difference_of)?;
            Some((-t, t))
        }
        tree::Deviation::Limits(a, b) => {
            let (first, second) = scope::pair(cx, a, b, difference_of)?;
            let first = convert(cx, &a.number, first, difference_of)?;
            let second = convert(cx, &b.number, second, difference_of)?;
            deviations(cx, tolerance, (a, first), (b, second))
        }
    }
}

/// Which of two written deviations is the lower.
///
/// They may stand in either order; both on one side of zero is fine too. Where both carry the same
/// sign, the order by value decides, so nothing can be the wrong way round but `+0.02/+0.02`, which
/// is a tolerance of nothing.
fn deviations(
    cx: &mut Context,
    tolerance: &tree::Tolerance,
    (a, first): (&tree::Scalar, f64),
    (b, second): (&tree::Scalar, f64),
) -> Option<(f64, f64)> {
    if first == second && first != 0.0 {
        return cx.refuse(
            Diagnostic::new(
                Code::DeviationsEqual,
                tolerance.span,
                format!(
                    "both limit deviations are {}: nothing is left between them",
                    a.number.text
                ),
            )
            .label(b.span(), "the same again")
            .help("state an upper and a lower limit deviation, such as `+0.05/+0.02`"),
        );
    }
    Some((first.min(second), first.max(second)))
}

/// Both ends of a range, least first.
pub(crate) fn range(
    cx: &mut Context,
    range: &tree::Range,
    expect: Expect,
) -> Option<(f64, f64, &'static Unit)> {
    let (low_unit, high_unit) = scope::pair(cx, &range.low, &range.high, expect)?;
    let low = convert(cx, &range.low.number, low_unit, expect)?;
    let high = convert(cx, &range.high.number, high_unit, expect)?;
    if low > high {
        let (first, last) = (cx.text(range.low.span()), cx.text(range.high.span()));
        let finding = Diagnostic::new(
            Code::LimitsReversed,
            range.span,
            format!("the range runs from {first} down to {last}"),
        )
        .help(format!("put the lesser end first: `{last} .. {first}`"));
        return cx.refuse(finding);
    }
    Some((low, high, low_unit))
}

/// Settles the units of two numbers as those of the ends of a range; a finding where they can be
/// read in two ways.
pub(crate) fn same_unit(
    cx: &mut Context,
    first: &tree::Scalar,
    last: &tree::Scalar,
    expect: Expect,
) -> Option<()> {
    scope::pair(cx, first, last, expect).map(|_| ())
}

/// A value, a value with a tolerance or a range, with its spread if it states one.
pub(crate) fn scenario(
    cx: &mut Context,
    quantity: &tree::Quantity,
    stated: Option<&tree::Spread>,
    expect: Expect,
) -> Option<Scenario> {
    let mut scenario = match quantity {
        tree::Quantity::Group(g) => {
            let t = group(cx, g, expect)?;
            Scenario {
                nominal: t.nominal,
                least: t.nominal + t.lower,
                greatest: t.nominal + t.upper,
                spread: None,
            }
        }
        tree::Quantity::Range(r) => {
            let (low, high, _) = range(cx, r, expect)?;
            Scenario::between(low, high)
        }
    };
    if let Some(stated) = stated {
        if scenario.is_exact() && !matches!(stated.distribution.value, tree::Distribution::File(_))
        {
            return cx.refuse(
                Diagnostic::new(
                    Code::SpreadOfNothing,
                    stated.span,
                    "a spread needs limits to lie between",
                )
                .label(quantity.span(), "this is one value")
                .help("state a tolerance or a range, such as `85 ±3`"),
            );
        }
        scenario.spread = Some(spread(cx, stated, expect)?);
    }
    if expect == Expect::Temperature {
        above_absolute_zero(cx, quantity.span(), scenario.least)?;
    }
    Some(scenario)
}

/// Refuses a temperature (K) that there is none of.
pub(crate) fn above_absolute_zero(cx: &mut Context, span: Span, kelvin: f64) -> Option<()> {
    if kelvin >= 0.0 {
        return Some(());
    }
    let unit = cx.head(span.file).defaults.temperature;
    cx.refuse(
        Diagnostic::new(
            Code::BelowAbsoluteZero,
            span,
            format!(
                "a temperature of {} {} is below absolute zero",
                figure(unit.from_si(kelvin)),
                unit.symbol
            ),
        )
        .help(format!("absolute zero is {} {}", figure(unit.from_si(0.0)), unit.symbol)),
    )
}

/// The limits of a requirement; shares of the yield strength are pure.
pub(crate) fn limits(cx: &mut Context, limit: &tree::Limit, kind: Kind) -> Option<Limits> {
    let of_yield = limit.of_yield.is_some();
    let expect = if of_yield { Expect::Of(Kind::PURE) } else { Expect::limit(kind) };
    let end = |cx: &Context, value: f64, span: Span| Limit {
        value,
        of_yield,
        written: cx.text(span).to_string(),
        span: limit.span,
    };
    match &limit.bound {
        tree::Bound::AtLeast(s) | tree::Bound::AtMost(s) => {
            let unit = scope::lone(cx, s, expect)?;
            let value = convert(cx, &s.number, unit, expect)?;
            let end = Some(end(cx, value, s.span()));
            Some(match limit.bound {
                tree::Bound::AtLeast(_) => Limits { lower: end, upper: None, unit },
                _ => Limits { lower: None, upper: end, unit },
            })
        }
        tree::Bound::Between(r) => {
            let (low, high, unit) = range(cx, r, expect)?;
            Some(Limits {
                lower: Some(end(cx, low, r.low.span())),
                upper: Some(end(cx, high, r.high.span())),
                unit,
            })
        }
        tree::Bound::Within(g) => {
            let t = group(cx, g, expect)?;
            Some(Limits {
                lower: Some(end(cx, t.nominal + t.lower, g.span)),
                upper: Some(end(cx, t.nominal + t.upper, g.span)),
                unit: t.unit,
            })
        }
    }
}

/// A number in a unit as SI; finite.
fn convert(cx: &mut Context, number: &tree::Number, unit: &Unit, expect: Expect) -> Option<f64> {
    let value = expect.to_si(unit, number.value);
    finite(cx, number, value)
}

/// A difference in a unit as SI; finite.
fn difference(cx: &mut Context, number: &tree::Number, unit: &Unit) -> Option<f64> {
    let value = unit.difference_to_si(number.value);
    finite(cx, number, value)
}

fn finite(cx: &mut Context, number: &tree::Number, value: f64) -> Option<f64> {
    // Squares and products of what is read must stay finite as well.
    if value.abs() <= 1e100 {
        return Some(value);
    }
    cx.refuse(Diagnostic::new(
        Code::ValueOutOfRange,
        number.span,
        format!("{} is beyond anything that can be built", number.text),
    ))
}

/// A value for people: up to six digits, without noughts at its end.
pub(crate) fn figure(value: f64) -> String {
    let value = if value == 0.0 { 0.0 } else { value };
    let whole = format!("{:.0}", value.abs()).len();
    let text = format!("{value:.*}", 7_usize.saturating_sub(whole));
    match text.contains('.') {
        true => text.trim_end_matches('0').trim_end_matches('.').to_string(),
        false => text,
    }
}
