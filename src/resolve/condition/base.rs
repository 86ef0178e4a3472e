//! What a temperature is measured from: chains of `above PART`, and absolute zero at their end.

use super::{name_of, row};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{OwnTemperature, Owner, State, Thermal};
use crate::resolve::context::Context;
use crate::resolve::quantity::above_absolute_zero;
use crate::span::Span;
use std::collections::{BTreeMap, BTreeSet};

/// What single parts and fills do differently, by whom.
type Rows<'s> = BTreeMap<Owner, &'s State>;

/// Reports circles of `above`, and temperatures below absolute zero.
pub(super) fn check(cx: &mut Context, name: &str, states: &[State], thermal: Option<&Thermal>) {
    let rows: Rows = states.iter().map(|state| (state.owner, state)).collect();
    let mut reported: BTreeSet<Owner> = BTreeSet::new();
    for state in states {
        if reported.contains(&state.owner) {
            continue;
        }
        match chain(&rows, state.owner) {
            Chain::Circle(owners) if owners.contains(&state.owner) => {
                circle(cx, name, states, &owners);
                reported.extend(owners);
            }
            // A circle further on is reported where it begins.
            Chain::Circle(_) => {}
            Chain::Open(owners) => least(cx, &rows, &owners, state.span, thermal),
        }
    }
}

/// The owners that a temperature is reckoned from, itself first.
enum Chain {
    Open(Vec<Owner>),
    Circle(Vec<Owner>),
}

fn chain(rows: &Rows, start: Owner) -> Chain {
    let mut owners = vec![start];
    let mut seen = BTreeSet::from([start]);
    while let Some(next) = base_of(rows, owners[owners.len() - 1]) {
        if !seen.insert(next) {
            let first = owners.iter().position(|owner| *owner == next).unwrap_or(0);
            return Chain::Circle(owners.split_off(first));
        }
        owners.push(next);
    }
    Chain::Open(owners)
}

fn base_of(rows: &Rows, owner: Owner) -> Option<Owner> {
    match rows.get(&owner)?.temperature.as_ref()? {
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
fn least(cx: &mut Context, rows: &Rows, owners: &[Owner], span: Span, thermal: Option<&Thermal>) {
    let mut sum = 0.0;
    for owner in owners {
        match rows.get(owner).and_then(|s| s.temperature.as_ref()) {
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
