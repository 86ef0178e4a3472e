//! Shop cards: one joint each, two ways to join, and what to beware of.

use super::{paragraph, section};
use crate::findings::number::{Round, difference_with_unit, with_unit};
use crate::report::look::{Look, Role};
use crate::report::{Account, ShopCard};

/// Writes the card of each joint.
pub(super) fn render(out: &mut String, account: &Account, look: Look) {
    for card in &account.shop {
        one(out, account, card, look);
    }
}

fn one(out: &mut String, account: &Account, card: &ShopCard, look: Look) {
    // A temperature to reach is rounded away from the day's, so that what is printed joins.
    let hotter = |t: f64| with_unit(t, account.temperature, Round::Up);
    let colder = |t: f64| with_unit(t, account.temperature, Round::Down);
    let ambient = with_unit(card.ambient, account.temperature, Round::Nearest);
    let day = card.day.as_deref().unwrap_or("reference");
    section(out, &format!("shop card of {}: {} into {}", card.joint, card.inner, card.outer), look);
    let clearance = difference_with_unit(card.clearance, account.length, Round::Nearest);
    let text = format!("day of assembly {ambient} ({day}); clearance while joining {clearance}");
    paragraph(out, 2, &text, Role::Plain, look);
    match card.heat {
        Some(heat) => {
            let limit = card
                .limit
                .map_or_else(String::new, |limit| format!(", at most {} allowed", colder(limit)));
            let text = format!("heat {} to {}{limit}", card.outer, hotter(heat));
            if card.may_be_heated {
                paragraph(out, 2, &text, Role::Plain, look);
            } else {
                paragraph(out, 2, &format!("{text}: NOT ALLOWED"), Role::Bad, look);
            }
        }
        None => {
            let end = colder(card.outer_data);
            let text =
                format!("heating {} does not reach up to {end}, where its data end", card.outer);
            paragraph(out, 2, &text, Role::Warn, look);
        }
    }
    match card.chill {
        Some(chill) => {
            paragraph(
                out,
                2,
                &format!("or chill {} to {}", card.inner, colder(chill)),
                Role::Plain,
                look,
            );
        }
        None => {
            let end = hotter(card.inner_data);
            let text =
                format!("chilling {} does not reach down to {end}, where its data end", card.inner);
            paragraph(out, 2, &text, Role::Warn, look);
        }
    }
    let Some((heat, chill)) = card.together else { return };
    // A limit is not to be passed: the other way round than a temperature to reach.
    let (outer, inner, heat) = (&card.outer, &card.inner, colder(heat));
    match chill {
        Some(chill) => {
            let text = format!("or heat {outer} to {heat} and chill {inner} to {}", colder(chill));
            paragraph(out, 2, &text, Role::Plain, look);
        }
        None => {
            let text = format!("{outer} at {heat} and {inner} chilled at once do not reach either");
            paragraph(out, 2, &text, Role::Warn, look);
        }
    }
}
