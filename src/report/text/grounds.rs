//! What the figures of a spec rest on: temperatures, materials, numbers no drawing states, signs,
//! cautions. Guesses and values from memory stand out by a word.

use super::{paragraph, paragraph_kept, section};
use crate::findings::number::{Round, with_unit};
use crate::findings::words::count;
use crate::report::look::{Look, Role};
use crate::report::wrap::{left, visible, width};
use crate::report::{Account, Assumption, MaterialNote};
use crate::units::Unit;

/// Names longer than this break the column.
const MOST_NAME_COLUMNS: usize = 24;

/// Writes everything the figures rest on.
pub(super) fn render(out: &mut String, account: &Account, look: Look) {
    conditions(out, account, look);
    materials(out, account, look);
    assumptions(out, account, look);
    list(out, "signs", &account.grounds.signs, Role::Plain, look);
    list(out, "cautions", &account.grounds.cautions, Role::Warn, look);
    list(out, "notes", &account.notes, Role::Plain, look);
}

fn list<T: AsRef<str>>(out: &mut String, title: &str, lines: &[T], role: Role, look: Look) {
    if !lines.is_empty() {
        section(out, title, look);
    }
    for line in lines {
        paragraph(out, 2, line.as_ref(), role, look);
    }
}

/// Each condition as written, with the parts whose temperatures it does not set for all alike.
fn conditions(out: &mut String, account: &Account, look: Look) {
    section(out, "conditions", look);
    let names = account.conditions.iter().map(|(name, _)| width(&visible(name)));
    let column = names.filter(|&n| n <= MOST_NAME_COLUMNS).max().unwrap_or(0);
    for (name, written) in &account.conditions {
        let mut alike: Vec<(String, Vec<&str>)> = Vec::new();
        for t in account.grounds.temperatures.iter().filter(|t| t.condition == *name) {
            let range = range(t.least, t.greatest, account.temperature);
            match alike.iter_mut().find(|(r, _)| *r == range) {
                Some((_, owners)) => owners.push(&t.owner),
                None => alike.push((range, vec![&t.owner])),
            }
        }
        let line = format!("{}  {written}", left(&visible(name), column));
        paragraph_kept(out, 2, &line, look);
        // One temperature that all parts share is what was written.
        let one = alike.len() == 1;
        for (range, owners) in alike.into_iter().filter(|(range, _)| !one || range.contains("..")) {
            let who = if one { "all parts".to_string() } else { owners.join(", ") };
            paragraph(out, column + 4, &format!("{who} {range}"), Role::Quiet, look);
        }
    }
}

fn range(least: f64, greatest: f64, unit: &'static Unit) -> String {
    let from = with_unit(least, unit, Round::Nearest);
    let to = with_unit(greatest, unit, Round::Nearest);
    if from == to { from } else { format!("{from} .. {to}") }
}

fn materials(out: &mut String, account: &Account, look: Look) {
    if account.grounds.materials.is_empty() {
        return;
    }
    section(out, "materials", look);
    for material in &account.grounds.materials {
        material_note(out, material, account.temperature, look);
    }
}

fn material_note(out: &mut String, material: &MaterialNote, unit: &'static Unit, look: Look) {
    let title =
        if material.title.is_empty() { String::new() } else { format!(", {}", material.title) };
    let users = material.parts.join(", ");
    paragraph(out, 2, &format!("{}{title}: {users}", material.name), Role::Plain, look);
    let (least, greatest) = material.valid;
    let beyond = if material.extrapolated { ", continued beyond at the spec's wish" } else { "" };
    let valid = match (least.is_finite(), greatest.is_finite()) {
        (true, true) => format!("expansion data over {}", range(least, greatest, unit)),
        (true, false) => format!("expansion data from {}", with_unit(least, unit, Round::Up)),
        (false, true) => format!("expansion data up to {}", with_unit(greatest, unit, Round::Down)),
        (false, false) => "expansion data without stated range".to_string(),
    };
    paragraph(out, 4, &format!("{valid}{beyond}"), Role::Plain, look);
    if material.sources.is_empty() {
        paragraph(out, 4, "no source stated", Role::Warn, look);
    }
    for (grade, source) in &material.sources {
        let role = if *grade == "memory" { Role::Warn } else { Role::Quiet };
        let text = if *grade == "memory" {
            format!("FROM MEMORY: {source}")
        } else {
            format!("{grade}: {source}")
        };
        paragraph(out, 4, &text, role, look);
    }
}

fn assumptions(out: &mut String, account: &Account, look: Look) {
    let grounds = &account.grounds;
    section(out, "where the sizes come from", look);
    if grounds.from_drawings > 0 {
        let drawn = count(grounds.from_drawings, "size", "sizes");
        paragraph(out, 2, &format!("{drawn} from drawings, as stated"), Role::Plain, look);
    }
    let names = grounds.assumptions.iter().map(|a| width(&visible(&a.what)));
    let column = names.filter(|&n| n <= MOST_NAME_COLUMNS).max().unwrap_or(0);
    for assumption in &grounds.assumptions {
        let role = if assumption.basis == "assumed" { Role::Warn } else { Role::Plain };
        let word = left(&basis_word(assumption), "supplier".len());
        let what = left(&visible(&assumption.what), column);
        let because = match assumption.because.as_str() {
            "" => String::new(),
            because => format!("  {because}"),
        };
        let line = format!("{word}  {what}  {}{because}", assumption.written);
        let line = visible(&line);
        if width(&line) + 2 <= look.width {
            out.push_str(format!("  {}\n", look.paint(role, line.trim_end())).as_str());
        } else {
            paragraph(out, 2, &line, role, look);
        }
    }
}

/// The word of a basis; a guess in capitals.
fn basis_word(assumption: &Assumption) -> String {
    match assumption.basis {
        "assumed" => "ASSUMED".to_string(),
        other => other.to_string(),
    }
}
