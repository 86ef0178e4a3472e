//! The temperatures at which a requirement holds, in words. Rounded inward: a window never looks
//! wider than was proven.

use super::number::{Round, digits, with_unit};
use super::words;
use crate::evaluate::outcome::Window;
use crate::model::Assembly;

/// Most parts whose temperatures are named at the end of a scaled window.
const NAMED: usize = 4;

/// Where a requirement holds, such as `holds up to 71.3 °C`, or, where parts differ, `holds up to
/// 1.31 times the departure from 20.0 °C: hub 91.2 °C, shaft 77.4 °C`.
pub fn sentence(assembly: &Assembly, window: &Window) -> String {
    if window.intervals.is_empty() {
        return "holds at no temperature its materials are known for".to_string();
    }
    let pieces: Vec<String> = window.intervals.iter().map(|i| piece(assembly, window, i)).collect();
    let pieces = pieces.join(" and ");
    if !window.scaled {
        return format!("holds {pieces}");
    }
    let reference = with_unit(assembly.reference, assembly.defaults.temperature, Round::Nearest);
    let there = there(assembly, window).map_or_else(String::new, |t| format!(": {t}"));
    format!("holds {pieces} times the departure from {reference}{there}")
}

/// How far the data of the materials go, where that ends the window; nothing where it does not.
pub fn data(assembly: &Assembly, window: &Window) -> Option<String> {
    let (from, to) = window.looked_at;
    let open = |(a, b): &(f64, f64)| {
        (a.is_infinite() && from.is_finite()) || (b.is_infinite() && to.is_finite())
    };
    if window.scaled || !window.intervals.iter().any(open) {
        return None;
    }
    let unit = assembly.defaults.temperature;
    let from = from.is_finite().then(|| format!("from {}", with_unit(from, unit, Round::Up)));
    let to = to.is_finite().then(|| format!("to {}", with_unit(to, unit, Round::Down)));
    let ends: Vec<String> = from.into_iter().chain(to).collect();
    Some(format!("data reach {}", ends.join(" ")))
}

fn piece(assembly: &Assembly, window: &Window, &(from, to): &(f64, f64)) -> String {
    let unit = assembly.defaults.temperature;
    let number = |x: f64, round| match window.scaled {
        true => digits(x, 3, round),
        false => with_unit(x, unit, round),
    };
    // Beyond the last factor looked at nothing is known.
    let (least, to) = match window.scaled && to.is_infinite() {
        true => ("at least ", window.looked_at.1),
        false => ("", to),
    };
    match (from.is_finite(), to.is_finite()) {
        (true, true) => {
            format!("from {} to {least}{}", number(from, Round::Up), number(to, Round::Down))
        }
        (true, false) => format!("from {} on", number(from, Round::Up)),
        (false, true) => format!("up to {least}{}", number(to, Round::Down)),
        (false, false) if window.looked_at == (f64::NEG_INFINITY, f64::INFINITY) => {
            "at any temperature".to_string()
        }
        (false, false) => "wherever its materials are known".to_string(),
    }
}

/// The temperatures of the parts at that end of a scaled window which is nearest to the spec's own.
fn there(assembly: &Assembly, window: &Window) -> Option<String> {
    let ends = window.intervals.iter().flat_map(|&(a, b)| [(a, Round::Up), (b, Round::Down)]);
    let finite: Vec<(f64, Round)> = ends.filter(|e| e.0.is_finite()).collect();
    let &(end, inward) =
        finite.iter().min_by(|a, b| (a.0 - 1.0).abs().total_cmp(&(b.0 - 1.0).abs()))?;
    let unit = assembly.defaults.temperature;
    let temperatures: Vec<String> = window
        .departures
        .iter()
        .take(NAMED)
        .map(|&(owner, departure)| {
            // Inward is towards the reference for a greatest factor, whichever side of it a part is.
            let round = match (inward, departure < 0.0) {
                (Round::Down, true) => Round::Up,
                (Round::Up, true) => Round::Down,
                (other, _) => other,
            };
            let t = with_unit(assembly.reference + end * departure, unit, round);
            format!("{} {t}", words::owner(assembly, owner))
        })
        .collect();
    if temperatures.is_empty() {
        return None;
    }
    let more = if window.departures.len() > NAMED { ", …" } else { "" };
    let at =
        if finite.len() > 1 { format!("at {} ", digits(end, 3, inward)) } else { String::new() };
    Some(format!("{at}{}{more}", temperatures.join(", ")))
}
