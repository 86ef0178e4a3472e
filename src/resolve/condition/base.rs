//! What a temperature is measured from: chains of `above PART`, and absolute zero at their end.

use super::{name_of, row};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{OwnTemperature, Owner, State, Thermal};
use crate::resolve::context::Context;
use crate::resolve::quantity::above_absolute_zero;
use crate::span::Span;

/// Reports circles of `above`, and temperatures below absolute zero.
pub(super) fn check(cx: &mut Context, name: &str, states: &[State], thermal: Option<&Thermal>) {
    let mut reported: Vec<Owner> = Vec::new();
    for state in states {
        if reported.contains(&state.owner) {
            continue;
        }
        match chain(states, state.owner) {
            Chain::Circle(owners) => {
                if !owners.contains(&state.owner) {
                    continue;
                }
                circle(cx, name, states, &owners);
                reported.extend(owners);
            }
            Chain::Open(owners) => least(cx, states, &owners, state.span, thermal),
        }
    }
}

/// The owners that a temperature is reckoned from, itself first.
enum Chain {
    Open(Vec<Owner>),
    Circle(Vec<Owner>),
}

fn chain(states: &[State], start: Owner) -> Chain {
    let mut owners = vec![start];
    while let Some(next) = base_of(states, owners[owners.len() - 1]) {
        if let Some(first) = owners.iter().position(|owner| *owner == next) {
            return Chain::Circle(owners.split_off(first));
        }
        owners.push(next);
    }
    Chain::Open(owners)
}

fn base_of(states: &[State], owner: Owner) -> Option<Owner> {
    match states.iter().find(|s| s.owner == owner)?.temperature.as_ref()? {
        OwnTemperature::Above { base, .. } => *base,
        OwnTemperature::Absolute(_) => None,
    }
}

fn circle(cx: &mut Context, name: &str, states: &[State], owners: &[Owner]) {
    let names: Vec<String> = owners.iter().map(|o| format!("`{}`", name_of(cx, *o))).collect();
    let Some(span) = row(states, owners[0]) else { return };
    let message = match names.as_slice() {
        [alone] => format!("the temperature of {alone} is measured from itself"),
        _ => format!("temperatures are measured from each other in a circle: {}", names.join(", ")),
    };
    let mut finding = Diagnostic::new(Code::TemperatureCycle, span, message);
    for owner in &owners[1..] {
        if let Some(span) = row(states, *owner) {
            finding = finding.label(span, "and here");
        }
    }
    let help =
        format!("measure one of them from `{name}` itself: leave the part out after `above`");
    cx.report(finding.help(help));
}

/// Reports a part whose differences take it below absolute zero.
fn least(
    cx: &mut Context,
    states: &[State],
    owners: &[Owner],
    span: Span,
    thermal: Option<&Thermal>,
) {
    let mut sum = 0.0;
    for owner in owners {
        let state = states.iter().find(|s| s.owner == *owner);
        match state.and_then(|s| s.temperature.as_ref()) {
            // Said where it is written.
            Some(OwnTemperature::Absolute(_)) if owners.len() == 1 => return,
            Some(OwnTemperature::Absolute(t)) => {
                above_absolute_zero(cx, span, sum + t.least);
                return;
            }
            Some(OwnTemperature::Above { difference, .. }) => sum += difference.least,
            None => {}
        }
    }
    let differs = sum != 0.0;
    if let (true, Some(Thermal::Uniform(t))) = (differs, thermal) {
        above_absolute_zero(cx, span, sum + t.least);
    }
}
