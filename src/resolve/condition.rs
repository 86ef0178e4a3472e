//! Conditions: temperatures of everything, temperatures and moisture of single parts, rotation.

mod base;
mod history;
mod own;

use super::context::Context;
use super::quantity::{self, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::condition::Rotation;
use crate::model::{Condition, Owner, PartId, Scenario, State, SubjectId, Thermal};
use crate::span::Span;
use crate::syntax::tree::{self, ThermalState};
use crate::units::Kind;

/// Resolves every condition; `conditions` are the declared ones, by index. Parts are resolved, fills
/// declared.
pub(crate) fn resolve(cx: &mut Context, conditions: &[&tree::Condition]) {
    for stated in conditions {
        let condition = condition(cx, stated);
        cx.conditions.push(condition);
    }
}

/// A condition; what is wrong in it is left out, and stands for nothing but its name.
fn condition(cx: &mut Context, stated: &tree::Condition) -> Condition {
    let states = own::states(cx, stated);
    let moisture = moisture(cx, stated, &states);
    let speed = rotation(cx, &stated.speeds);
    let thermal = match &stated.state {
        ThermalState::Temperature(quantity) => {
            quantity::scenario(cx, quantity, stated.spread.as_ref(), Expect::Temperature)
                .map(Thermal::Uniform)
        }
        ThermalState::History { file, tolerance } => {
            history::history(cx, stated, file, tolerance.as_ref(), &states).map(Thermal::History)
        }
    };
    base::check(cx, &stated.name.value, &states, thermal.as_ref());
    own::note_pinned(cx, stated, &states);
    Condition {
        name: stated.name.value.clone(),
        span: stated.name.span,
        written: written(cx, stated),
        thermal: thermal.unwrap_or_else(|| {
            Thermal::Uniform(Scenario::exact(cx.head(stated.span.file).reference))
        }),
        states,
        moisture,
        speed,
    }
}

/// The temperature as written.
fn written(cx: &Context, stated: &tree::Condition) -> String {
    let span = match &stated.state {
        ThermalState::Temperature(quantity) => quantity.span(),
        ThermalState::History { file, tolerance } => {
            let end = tolerance.as_ref().map_or(file.span, |t| t.span);
            return format!("from {}", cx.text(file.span.to(end)));
        }
    };
    cx.text(span).to_string()
}

/// A part or a fill of that name, or a finding.
fn owner(cx: &mut Context, name: &tree::Name) -> Option<Owner> {
    if let Some(part) = cx.part_names.get(&name.value) {
        return Some(Owner::Part(part));
    }
    if let Some(fill) = fill(cx, &name.value) {
        return Some(Owner::Fill(fill));
    }
    cx.unknown(Code::UnknownPart, "part", name, names)
}

/// The fill of that name.
fn fill(cx: &Context, name: &str) -> Option<SubjectId> {
    cx.subject_names.get(name).filter(|id| cx.fills.contains(id))
}

/// Everything that may have a temperature of its own.
fn names(cx: &Context) -> Vec<String> {
    let fills = cx.subject_names.names().filter(|name| fill(cx, name).is_some());
    cx.part_names.names().chain(fills).map(str::to_string).collect()
}

/// The name of a part or fill.
fn name_of(cx: &Context, owner: Owner) -> String {
    match owner {
        Owner::Part(id) => cx.parts.get(id.index()).map(|p| p.name.clone()).unwrap_or_default(),
        Owner::Fill(id) => {
            let is = |name: &&str| cx.subject_names.get(name) == Some(id);
            cx.subject_names.names().find(is).unwrap_or_default().to_string()
        }
    }
}

/// The moisture of everyone without one of their own: a state that every material which swells has.
fn moisture(cx: &mut Context, stated: &tree::Condition, states: &[State]) -> Option<String> {
    let first = stated.moisture.first()?;
    if let Some(second) = stated.moisture.get(1) {
        cx.report(
            Diagnostic::new(Code::StatedTwice, second.span, "`moisture` is stated twice")
                .label(first.span, "first stated here")
                .help("name single parts in rows of their own, such as `gear wet`"),
        );
    }
    let swelling: Vec<PartId> = (0..cx.parts.len() as u32)
        .map(PartId)
        .filter(|id| !cx.parts[id.index()].material.swell.is_empty())
        .collect();
    if swelling.is_empty() && !cx.parts.is_empty() {
        return cx.refuse(
            Diagnostic::new(Code::UnknownMoisture, first.span, "no part takes up moisture")
                .help("leave the row out, or give a material its `swell { … }`"),
        );
    }
    for id in swelling {
        let own = states.iter().find(|s| s.owner == Owner::Part(id));
        if own.is_some_and(|s| s.moisture.is_some()) {
            continue;
        }
        own::has_moisture(cx, id, first)?;
    }
    Some(first.value.clone())
}

/// The speed of a condition and who turns.
fn rotation(cx: &mut Context, speeds: &[tree::Speed]) -> Option<Rotation> {
    let stated = speeds.first()?;
    if let Some(second) = speeds.get(1) {
        cx.report(
            Diagnostic::new(Code::StatedTwice, second.span, "a condition has one speed")
                .label(stated.span, "first stated here")
                .help("make a condition for each speed"),
        );
    }
    let kind = Expect::Of(Kind::SPEED);
    let speed = quantity::scenario(cx, &stated.speed, stated.spread.as_ref(), kind);
    let mut parts: Vec<PartId> = Vec::new();
    for name in &stated.parts {
        let Some(part) = cx.part(name) else { continue };
        if parts.contains(&part) {
            let span = name.span;
            let message = format!("`{}` is named twice", name.value);
            cx.report(Diagnostic::new(Code::StatedTwice, span, message).help("keep one"));
        } else {
            parts.push(part);
        }
    }
    Some(Rotation { speed: speed?, parts })
}

/// Where the row of an owner stands.
fn row(states: &[State], owner: Owner) -> Option<Span> {
    states.iter().find(|s| s.owner == owner).map(|s| s.span)
}
