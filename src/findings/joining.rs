//! `joining-out-of-reach`: a shrink joint whose hub may not be heated and whose shaft cannot be chilled
//! as far as each of them alone would have to be.
//!
//! Only of a joint that is meant to be made by heat or cold: one with an `insertion clearance`, or with
//! a requirement on its joining temperature. Any other may be pressed in.

use super::number::{Round, difference_with_unit, with_unit};
use super::words;
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{ShopCard, Together};
use crate::model::{Assembly, Joint, Quantity};

/// Data that go further down than any usual coolant: liquid nitrogen boils at 77.4 K.
const COLDEST_COOLANT: f64 = 77.0;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for card in &evaluation.shop_cards {
        let Some(joint) = assembly.fit(card.subject).and_then(|f| f.joint.as_ref()) else {
            continue;
        };
        if is_shrunk(assembly, card, joint) && !card.may_be_heated() && card.chill_inner.is_none() {
            found.push(finding(assembly, card, joint));
        }
    }
}

fn is_shrunk(assembly: &Assembly, card: &ShopCard, joint: &Joint) -> bool {
    joint.insertion_clearance.is_some()
        || assembly
            .requirements
            .iter()
            .any(|r| r.subject == card.subject && r.quantity == Quantity::JoiningTemperature)
}

fn finding(assembly: &Assembly, card: &ShopCard, joint: &Joint) -> Diagnostic {
    let subject = assembly.subject(card.subject);
    let (hub, shaft) = (assembly.part(joint.outer.part), assembly.part(joint.inner.part));
    let (outer, inner) = (words::name(&hub.name), words::name(&shaft.name));
    let joins = card.together.is_some_and(|t| t.chill_inner.is_some());
    let alone = if joins { " alone" } else { "" };
    let message = format!(
        "neither heating {outer} nor chilling {inner}{alone} joins {}",
        words::name(&subject.name)
    );
    let mut diagnostic = Diagnostic::new(Code::JoiningOutOfReach, subject.span, message)
        .here(format!("{}; {}", heating(assembly, card, &outer), chilling(assembly, card, &inner)))
        .help(cure(assembly, card.together, &outer, &inner));
    if card.outer_limit.is_some() {
        diagnostic = diagnostic.label(hub.material_span, "of this material, which has a `limit`");
    }
    if joins {
        // There is a way, and the shop card has it.
        diagnostic.severity = Severity::Note;
    }
    diagnostic
}

/// What heat alone would take.
fn heating(assembly: &Assembly, card: &ShopCard, outer: &str) -> String {
    let unit = assembly.defaults.temperature;
    let end = with_unit(card.outer_data, unit, Round::Down);
    let limit = card.outer_limit.map(|l| with_unit(l, unit, Round::Down));
    match (card.heat_outer, limit) {
        (Some(heat), Some(limit)) => {
            format!("{outer} takes {}, {limit} allowed", with_unit(heat, unit, Round::Up))
        }
        (None, Some(limit)) => {
            format!("{outer} takes more than {end}, where its data end, {limit} allowed")
        }
        (_, None) => format!("{outer} does not reach it up to {end}, where its data end"),
    }
}

/// What cold alone would take.
fn chilling(assembly: &Assembly, card: &ShopCard, inner: &str) -> String {
    let end = with_unit(card.inner_data, assembly.defaults.temperature, Round::Up);
    if card.inner_data < COLDEST_COOLANT {
        format!("{inner} does not reach it at any cold: contraction comes to an end")
    } else {
        format!("{inner} does not reach it down to {end}, where its data end")
    }
}

/// Both at once first; where that is not enough either, how much is missing.
fn cure(assembly: &Assembly, together: Option<Together>, outer: &str, inner: &str) -> String {
    let unit = assembly.defaults.temperature;
    let length = assembly.defaults.length;
    match together {
        Some(Together { heat_outer, chill_inner: Some(chill), .. }) => format!(
            "heat {outer} to {} and chill {inner} to {}, both at once; or take less interference, \
             or press it in",
            with_unit(heat_outer, unit, Round::Down),
            with_unit(chill, unit, Round::Down),
        ),
        Some(Together { heat_outer, short, .. }) if short > 0.0 => format!(
            "even {outer} at {} and {inner} chilled at once leave {} too little: take that much \
             less interference or insertion clearance, or press it in",
            with_unit(heat_outer, unit, Round::Down),
            difference_with_unit(short, length, Round::Up),
        ),
        _ => "take less interference, or press it in".to_string(),
    }
}
