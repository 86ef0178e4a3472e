//! The temperatures at which a requirement holds, in words. Rounded inward: a window never looks
//! wider than was proven.

use super::number::{Round, digits, with_unit};
use super::words;
use crate::evaluate::outcome::Window;
use crate::model::Assembly;

/// Most parts whose temperatures are named at the end of a scaled window.
const NAMED: usize = 4;

/// Whether the end of the data is told where no limit ends the window before.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum DataEnds {
    /// As in `holds up to 71.3 °C`.
    Left,
    /// As in `holds from -40.0 °C, where data end, to 71.3 °C`.
    Told,
}

/// Where a requirement holds, such as `holds up to 71.3 °C`, or, where parts differ, `holds up to
/// 1.310 times the departure from 20.0 °C: hub 91.2 °C, shaft 77.4 °C`.
pub fn sentence(assembly: &Assembly, window: &Window, ends: DataEnds) -> String {
    if window.intervals.is_empty() {
        return "holds at no temperature its materials are known for".to_string();
    }
    if window.scaled {
        let pieces: Vec<String> = window.intervals.iter().map(|&i| scaled(window, i)).collect();
        let reference =
            with_unit(assembly.reference, assembly.defaults.temperature, Round::Nearest);
        let there = there(assembly, window).map_or_else(String::new, |t| format!(": {t}"));
        let pieces = pieces.join(" and ");
        return format!("holds {pieces} times the departure from {reference}{there}");
    }
    let pieces: Vec<String> =
        window.intervals.iter().map(|&i| common(assembly, window, i, ends)).collect();
    format!("holds {}", pieces.join(" and "))
}

fn scaled(window: &Window, (from, to): (f64, f64)) -> String {
    let least = digits(from, 3, Round::Up);
    // Beyond the last factor looked at nothing is known.
    let most = match to.is_finite() {
        true => digits(to, 3, Round::Down),
        false => format!("at least {}", digits(window.looked_at.1, 3, Round::Down)),
    };
    if from.is_finite() { format!("from {least} to {most}") } else { format!("up to {most}") }
}

fn common(assembly: &Assembly, window: &Window, (from, to): (f64, f64), ends: DataEnds) -> String {
    let unit = assembly.defaults.temperature;
    let (least, most) = (with_unit(from, unit, Round::Up), with_unit(to, unit, Round::Down));
    let (coldest, hottest) = window.looked_at;
    let cold = (ends == DataEnds::Told && coldest.is_finite())
        .then(|| with_unit(coldest, unit, Round::Up));
    let hot = (ends == DataEnds::Told && hottest.is_finite())
        .then(|| with_unit(hottest, unit, Round::Down));
    match (from.is_finite(), to.is_finite()) {
        (true, true) => format!("from {least} to {most}"),
        (true, false) => match hot {
            Some(hot) => format!("from {least} to {hot}, where data end"),
            None => format!("from {least} on"),
        },
        (false, true) => match cold {
            Some(cold) => format!("from {cold}, where data end, to {most}"),
            None => format!("up to {most}"),
        },
        (false, false) if !coldest.is_finite() && !hottest.is_finite() => {
            "at any temperature".to_string()
        }
        (false, false) => match (cold, hot) {
            (Some(cold), Some(hot)) => format!("wherever data reach, from {cold} to {hot}"),
            _ => "wherever its materials are known".to_string(),
        },
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
