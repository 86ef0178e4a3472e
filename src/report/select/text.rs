//! Selections as text, 80 columns wide unless the reader's side is another width.

use super::{Candidate, Centring, Choice, Nearest, Selected, SpacerLength, Tolerance};
use crate::findings::number::{Round, decimals, digits, join, share};
use crate::findings::words;
use crate::report::look::{Look, Role};
use crate::report::text::cautions;
use crate::report::wrap::{blanks, left, right, width, wrap};
use crate::units::Unit;

/// Rows of classes that are shown unless all are asked for; preferred ones are shown besides.
const ROWS: usize = 8;

/// What was found, as text ended by a line end; every class where `all`.
pub fn text(selected: &Selected, all: bool, look: Look) -> String {
    let mut blocks: Vec<String> = selected.classes.iter().map(|c| choice(c, all, look)).collect();
    blocks.extend(selected.centrings.iter().map(|c| centring(c, look)));
    if !selected.tolerances.is_empty() {
        blocks.push(tolerances(&selected.tolerances, look));
    }
    blocks.extend(selected.spacer.iter().map(|s| spacer(s, look)));
    if blocks.is_empty() {
        blocks.push("no class is left open, no fit fails, and nothing is required\n".to_string());
    }
    let mut out = blocks.join("\n");
    if !selected.cautions.is_empty() {
        out.push('\n');
        cautions(&mut out, &selected.cautions, look);
    }
    out
}

fn choice(choice: &Choice, all: bool, look: Look) -> String {
    let names: Vec<String> = choice
        .dimensions
        .iter()
        .zip(&choice.written)
        .map(|(path, written)| format!("{path}  {written}"))
        .collect();
    let mut out = format!("{}\n", look.paint(Role::Title, &names.join(" with ")));
    if let Some(obstacle) = &choice.obstacle {
        paragraph(&mut out, obstacle, Role::Warn, look);
        return out;
    }
    let what = if choice.dimensions.len() > 1 { "pairs of recommended classes" } else { "classes" };
    let sentence = match choice.serving.len() {
        0 => format!("none of {} {what} meets {}", choice.judged, list(&choice.requirements)),
        1 => format!("1 of {} {what} meets {}", choice.judged, list(&choice.requirements)),
        n => format!("{n} of {} {what} meet {}", choice.judged, list(&choice.requirements)),
    };
    let role = if choice.serving.is_empty() { Role::Bad } else { Role::Plain };
    paragraph(&mut out, &sentence, role, look);
    if !choice.open_beside.is_empty() {
        let others = list(&choice.open_beside);
        let sentence = format!("taken with the nominal size of {others}, left open as well");
        paragraph(&mut out, &sentence, Role::Warn, look);
    }
    rows(&mut out, &choice.serving, all, look);
    if let Some((from, to)) = choice.room {
        let unit = choice.unit;
        let sentence = format!(
            "sizes serve with any deviation from {} to {}",
            signed(from, unit, Round::Up),
            join(&signed(to, unit, Round::Down), unit.symbol)
        );
        paragraph(&mut out, &sentence, Role::Quiet, look);
    } else if choice.serving.is_empty() && choice.dimensions.len() == 1 {
        paragraph(&mut out, "no single size was found to serve", Role::Quiet, look);
    }
    out
}

/// The widest classes first, then those to choose first among the rest.
fn rows(out: &mut String, serving: &[Candidate], all: bool, look: Look) {
    if serving.is_empty() {
        return;
    }
    let first = if all { serving.len() } else { ROWS.min(serving.len()) };
    let preferred = |c: &&Candidate| c.rank.starts_with("preferred");
    let shown: Vec<&Candidate> = serving[..first]
        .iter()
        .chain(serving[first..].iter().filter(preferred).take(ROWS))
        .collect();
    let deviations: Vec<String> = shown.iter().map(|c| deviations(c)).collect();
    let wide = |least: usize, cells: &mut dyn Iterator<Item = usize>| cells.fold(least, usize::max);
    let class = wide("class".len(), &mut shown.iter().map(|c| width(&c.class)));
    let deviation =
        wide("deviations, µm".chars().count(), &mut deviations.iter().map(|d| width(d)));
    let margins: Vec<String> = shown.iter().map(|c| margin(&c.nearest)).collect();
    let room = wide("margin".len(), &mut margins.iter().map(|m| width(m)));
    let heads = format!(
        "  {}  {}  {}  {}  nearest limit",
        left("class", class),
        right("deviations, µm", deviation),
        right("tolerance", "tolerance".len()),
        right("margin", room)
    );
    out.push_str(&format!("\n{}\n", look.paint(Role::Quiet, &heads)));
    for ((candidate, deviations), margin) in shown.iter().zip(&deviations).zip(&margins) {
        let rank = if candidate.rank.starts_with("preferred") { candidate.rank } else { "" };
        let figures = format!(
            "  {}  {}  {}  {}",
            left(&candidate.class, class),
            right(deviations, deviation),
            right(&micrometres(candidate.tolerance_um), "tolerance".len()),
            right(margin, room),
        );
        let place = place(&candidate.nearest);
        let whole = width(&figures) + 2 + width(&place) + 2 + width(rank) <= look.width;
        let between = if whole { "  ".to_string() } else { format!("\n{}", blanks(4)) };
        let rank = look.paint(Role::Good, rank);
        out.push_str(format!("{figures}{between}{place}  {rank}").trim_end());
        out.push('\n');
    }
    let left_out = serving.len() - shown.len();
    if left_out > 0 {
        let sentence =
            format!("and {}; `--all` shows all", words::count(left_out, "other", "others"));
        out.push_str(&format!("  {}\n", look.paint(Role::Quiet, &sentence)));
    }
}

fn deviations(candidate: &Candidate) -> String {
    let signed = |um: f64| {
        if um > 0.0 { format!("+{}", micrometres(um)) } else { micrometres(um) }
    };
    let each = candidate.deviations_um.iter();
    each.map(|(lower, upper)| format!("{}/{}", signed(*upper), signed(*lower)))
        .collect::<Vec<_>>()
        .join("  ")
}

fn micrometres(um: f64) -> String {
    // Adding zero turns −0 into 0.
    format!("{}", um + 0.0)
}

fn margin(nearest: &Nearest) -> String {
    match nearest.margin {
        Some(margin) => {
            join(&digits(margin, decimals(nearest.unit), Round::Down), nearest.unit.symbol)
        }
        None => "unbounded".to_string(),
    }
}

fn place(nearest: &Nearest) -> String {
    match &nearest.condition {
        Some(condition) => format!("{} at {condition}", nearest.requirement),
        None => nearest.requirement.clone(),
    }
}

fn centring(centring: &Centring, look: Look) -> String {
    let title = format!("centring {}", centring.subject);
    let mut out = format!("{}\n", look.paint(Role::Title, &title));
    for (side, nearest) in [("lower", &centring.below), ("upper", &centring.above)] {
        let sentence = format!("to the {side} limit {} ({})", margin(nearest), place(nearest));
        paragraph(&mut out, &sentence, Role::Plain, look);
    }
    let unit = centring.below.unit;
    let sentence = format!(
        "centred {} on both sides, with the mean moved by {}",
        join(&digits(centring.margin, decimals(unit), Round::Down), unit.symbol),
        join(&signed(centring.shift, unit, Round::Nearest), unit.symbol)
    );
    paragraph(&mut out, &sentence, Role::Plain, look);
    let name = centring.by.iter().map(|r| width(&r.dimension)).max().unwrap_or(0);
    for recentred in &centring.by {
        let unit = recentred.unit;
        let figure = |x: f64| digits(x, decimals(unit), Round::Nearest);
        let breaks = if recentred.breaks.is_empty() {
            String::new()
        } else {
            format!("  breaks {}", list(&recentred.breaks))
        };
        let sentence = format!(
            "by {}  {} instead of {}{breaks}",
            left(&recentred.dimension, name),
            join(&figure(recentred.nominal), unit.symbol),
            figure(recentred.stated),
        );
        out.push_str(&format!("    {sentence}\n"));
    }
    if let Some(cost) = &centring.costliest {
        let sentence = format!("costs most: {} ({} of the range)", cost.name, share(cost.share));
        paragraph(&mut out, &sentence, Role::Quiet, look);
    }
    out
}

fn tolerances(tolerances: &[Tolerance], look: Look) -> String {
    let title = "tolerances that may grow for nothing, one at a time, on each side";
    let mut out = format!("{}\n", look.paint(Role::Title, title));
    let name = tolerances.iter().map(|t| width(&t.dimension)).max().unwrap_or(0);
    let size = tolerances.iter().map(|t| width(&t.written)).max().unwrap_or(0);
    for tolerance in tolerances {
        let unit = tolerance.unit;
        let stopped = tolerance.stopped_by.as_deref().unwrap_or_default();
        let by = match tolerance.each_side {
            None => "as far as you like".to_string(),
            Some(by) => {
                let shown = digits(by, decimals(unit), Round::Down);
                if by == 0.0 || shown.chars().all(|c| matches!(c, '0' | '.')) {
                    format!("nothing: {stopped}")
                } else {
                    format!("{}, then {stopped}", join(&shown, unit.symbol))
                }
            }
        };
        let line = format!(
            "  {}  {}  {by}",
            left(&tolerance.dimension, name),
            left(&tolerance.written, size)
        );
        out.push_str(&format!("{}\n", line.trim_end()));
    }
    out
}

fn spacer(spacer: &SpacerLength, look: Look) -> String {
    let (a, b) = &spacer.conditions;
    let title = format!("spacer {} for {} at {a} and {b}", spacer.dimension, spacer.subject);
    let mut out = format!("{}\n", look.paint(Role::Title, &title));
    let length = |x: f64| digits(x, decimals(spacer.unit), Round::Nearest);
    let of_mean = spacer.unit_of_mean;
    let mean = |x: f64| digits(x, decimals(of_mean), Round::Nearest);
    let now = format!(
        "{}: mean {} at {a}, {} at {b}",
        join(&length(spacer.stated), spacer.unit.symbol),
        mean(spacer.means_stated.0),
        join(&mean(spacer.means_stated.1), of_mean.symbol),
    );
    let then = format!(
        "{}: mean {} at both",
        join(&length(spacer.nominal), spacer.unit.symbol),
        join(&mean(spacer.mean), of_mean.symbol)
    );
    paragraph(&mut out, &now, Role::Plain, look);
    paragraph(&mut out, &then, Role::Plain, look);
    if !spacer.beyond.is_empty() {
        let note = format!(
            "such a mean is beyond {}: change other sizes with it, and ask again",
            spacer.beyond.join(", ")
        );
        paragraph(&mut out, &note, Role::Plain, look);
    }
    out
}

/// A figure with its sign; zero has none.
fn signed(x: f64, unit: &Unit, round: Round) -> String {
    let shown = digits(x, decimals(unit), round);
    if x > 0.0 && !shown.chars().all(|c| matches!(c, '0' | '.')) {
        format!("+{shown}")
    } else {
        shown
    }
}

/// `A`, `A and B`, `A, B and C`.
fn list(names: &[String]) -> String {
    match names {
        [] => String::new(),
        [one] => one.clone(),
        [first @ .., last] => format!("{} and {last}", first.join(", ")),
    }
}

fn paragraph(out: &mut String, words: &str, role: Role, look: Look) {
    for line in wrap(words, look.width.saturating_sub(2)) {
        out.push_str(&format!("{}{}\n", blanks(2), look.paint(role, &line)));
    }
}
