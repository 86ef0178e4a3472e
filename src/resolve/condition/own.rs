//! Rows of a condition: the temperature and the moisture of single parts.

use super::{name_of, owner};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::dimension::{Shape, Spread};
use crate::model::{OwnTemperature, Owner, PartId, Scenario, State};
use crate::resolve::context::{Context, suggest};
use crate::resolve::quantity::{self, Expect, figure};
use crate::span::Span;
use crate::syntax::tree::{self, Quantity, ThermalState};
use crate::units;

/// What single parts and fills do differently; rows with mistakes are left out.
pub(super) fn states(cx: &mut Context, stated: &tree::Condition) -> Vec<State> {
    let mut states: Vec<State> = Vec::new();
    for row in &stated.overrides {
        let Some(owner) = owner(cx, &row.part) else { continue };
        let moisture = match (&row.moisture, owner) {
            (Some(state), _) if matches!(state.value.as_str(), "above" | "below") => {
                word_first(cx, row, state)
            }
            (Some(state), Owner::Part(part)) => has_moisture(cx, part, state),
            (Some(state), Owner::Fill(_)) => {
                let finding = Diagnostic::new(
                    Code::UnknownMoisture,
                    state.span,
                    format!("`{}` is a fill, which takes up no moisture", row.part.value),
                );
                cx.refuse(finding.help("leave the moisture out"))
            }
            (None, _) => None,
        };
        let temperature = match &row.temperature {
            Some(own) => temperature(cx, row, own),
            None => None,
        };
        let Some(earlier) = states.iter_mut().find(|s| s.owner == owner) else {
            states.push(State { owner, span: row.span, temperature, moisture });
            continue;
        };
        if earlier.temperature.is_some() && temperature.is_some()
            || earlier.moisture.is_some() && moisture.is_some()
        {
            let first = earlier.span;
            cx.report(
                Diagnostic::new(
                    Code::StatedTwice,
                    row.span,
                    format!("`{}` is stated twice in this condition", row.part.value),
                )
                .label(first, "first stated here")
                .help("keep one of the two"),
            );
            continue;
        }
        earlier.temperature = earlier.temperature.take().or(temperature);
        earlier.moisture = earlier.moisture.take().or(moisture);
    }
    states
}

/// Refuses `rod above 20 K`, which is meant for `rod 20 K above`.
fn word_first(cx: &mut Context, row: &tree::Override, word: &tree::Name) -> Option<String> {
    let part = &row.part.value;
    let amount = match &row.temperature {
        Some(tree::OwnTemperature::Absolute(quantity)) => cx.text(quantity.span()).to_string(),
        _ => "12 K".to_string(),
    };
    let finding = Diagnostic::new(
        Code::UnknownMoisture,
        word.span,
        format!("`{}` is no moisture of `{part}`", word.value),
    );
    cx.refuse(finding.help(format!("a difference stands first: `{part} {amount} {}`", word.value)))
}

/// The state of that name of a part's material, or a finding.
pub(super) fn has_moisture(cx: &mut Context, part: PartId, state: &tree::Name) -> Option<String> {
    let part = &cx.parts[part.index()];
    let material = &part.material;
    if material.name.is_empty() || material.swell_state(&state.value).is_some() {
        return Some(state.value.clone());
    }
    let names: Vec<&str> = material.swell.iter().map(|s| s.name.as_str()).collect();
    let finding = if names.is_empty() {
        Diagnostic::new(
            Code::UnknownMoisture,
            state.span,
            format!("`{}` of `{}` takes up no moisture", material.name, part.name),
        )
        .help(format!(
            "leave the row out, or give the material `swell {{ dry 0 %; {} … }}`",
            state.value
        ))
    } else {
        let help = match suggest(&state.value, names.iter().copied()) {
            Some(near) => format!("did you mean `{near}`?"),
            None => format!("its states are `{}`", names.join("`, `")),
        };
        Diagnostic::new(
            Code::UnknownMoisture,
            state.span,
            format!("`{}` of `{}` has no moisture `{}`", material.name, part.name, state.value),
        )
        .help(help)
    };
    let finding = finding.label(part.material_span, "the material");
    cx.refuse(finding)
}

/// A temperature of one's own, absolute or a difference.
fn temperature(
    cx: &mut Context,
    row: &tree::Override,
    own: &tree::OwnTemperature,
) -> Option<OwnTemperature> {
    match own {
        tree::OwnTemperature::Absolute(quantity) => {
            not_a_difference(cx, &row.part.value, quantity)?;
            let spread = row.spread.as_ref();
            let value = quantity::scenario(cx, quantity, spread, Expect::Temperature)?;
            Some(OwnTemperature::Absolute(value))
        }
        tree::OwnTemperature::Difference { amount, sense, base } => {
            let base = match base {
                Some(base) => Some(owner(cx, base)?),
                None => None,
            };
            let spread = row.spread.as_ref();
            let amount = quantity::scenario(cx, amount, spread, Expect::Difference)?;
            let difference = match sense.value {
                tree::condition::Sense::Above => amount,
                tree::condition::Sense::Below => below(amount),
            };
            Some(OwnTemperature::Above { difference, base })
        }
    }
}

/// A difference the other way.
fn below(amount: Scenario) -> Scenario {
    let spread = amount.spread.map(|spread| Spread {
        shape: match spread.shape {
            Shape::Measured { values, file } => {
                Shape::Measured { values: values.iter().map(|v| -v).collect(), file }
            }
            other => other,
        },
        shift: -spread.shift,
        ..spread
    });
    Scenario { nominal: -amount.nominal, least: -amount.greatest, greatest: -amount.least, spread }
}

/// Refuses kelvins where the file counts in other degrees: `shaft 97 K` is rarely a temperature.
fn not_a_difference(cx: &mut Context, part: &str, quantity: &Quantity) -> Option<()> {
    let first = match quantity {
        Quantity::Group(group) => &group.value,
        Quantity::Range(range) => &range.low,
    };
    let Some(unit) = first.unit.as_ref() else { return Some(()) };
    let own = cx.head(unit.span.file).defaults.temperature;
    let Some(kelvin) = units::find(&unit.value).filter(|u| u.name == "K") else { return Some(()) };
    if own.name == kelvin.name {
        return Some(());
    }
    let written = cx.text(quantity.span()).to_string();
    let there = figure(own.from_si(kelvin.to_si(first.number.value)));
    cx.refuse(
        Diagnostic::new(
            Code::TemperatureOrDifference,
            quantity.span(),
            format!("`{written}` may be a temperature or a difference"),
        )
        .here(format!("temperatures of this file are in `{}`", own.name))
        .help(format!(
            "write `{part} {written} above` for a difference, `{part} {there}` for a temperature"
        )),
    )
}

/// Says which temperatures do not follow a condition that is not one temperature.
pub(super) fn note_pinned(cx: &mut Context, stated: &tree::Condition, states: &[State]) {
    let (name, word) = match &stated.state {
        ThermalState::Temperature(Quantity::Group(_)) => return,
        ThermalState::Temperature(Quantity::Range(_)) => (&stated.name.value, "range"),
        ThermalState::History { .. } => (&stated.name.value, "history"),
    };
    let pinned: Vec<(String, Span)> = states
        .iter()
        .filter(|s| matches!(s.temperature, Some(OwnTemperature::Absolute(_))))
        .map(|s| (name_of(cx, s.owner), s.span))
        .collect();
    for (part, span) in pinned {
        cx.report(
            Diagnostic::new(
                Code::TemperaturePinned,
                span,
                format!("`{part}` does not follow `{name}`, which is a {word}"),
            )
            .help(format!("write `{part} … K above` where it should follow")),
        );
    }
}
