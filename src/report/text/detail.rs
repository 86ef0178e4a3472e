//! One requirement in full, at the condition where it is tightest: what makes its range, by cause
//! and by contributor, where its ends are reached, and what statistics say.

mod contributors;
pub(super) mod statistics;

use super::{paragraph, section};
use crate::findings::number::{
    Round, decimals, difference, difference_with_unit, digits, join, with_unit,
};
use crate::report::look::{Look, Role};
use crate::report::{Account, Case, Coordinate, Figure};

/// Contributors with a smaller share of the range are summed up.
const LEAST_SHARE: f64 = 0.0005;

/// Writes each requirement of a spec that has contributors, once.
pub(super) fn render(out: &mut String, account: &Account, look: Look) {
    let mut told: Vec<&Case> = Vec::new();
    let mut begin = 0;
    while begin < account.cases.len() {
        let requirement = account.cases[begin].requirement;
        let end = account.cases[begin..]
            .iter()
            .position(|c| c.requirement != requirement)
            .map_or(account.cases.len(), |n| begin + n);
        let cases = account.cases[begin..end].iter();
        let tightest = cases
            .filter(|c| c.figure.is_some() && !c.contributors.is_empty())
            .min_by(|a, b| a.margin.total_cmp(&b.margin));
        if let Some(case) = tightest {
            let before = told.iter().find(|other| other.figure == case.figure);
            one(out, account, case, end - begin, before.copied(), look);
            told.push(case);
        }
        begin = end;
    }
}

/// One requirement; what its range is made of only if `before`, a requirement on the same figure,
/// has not told it already.
fn one(
    out: &mut String,
    account: &Account,
    case: &Case,
    conditions: usize,
    before: Option<&Case>,
    look: Look,
) {
    let at = case.condition.as_ref().map_or_else(String::new, |c| format!(" at {c}"));
    let of = if conditions > 1 {
        format!(", where the margin is least of {conditions} conditions")
    } else {
        String::new()
    };
    let subject = match case.name.contains(&case.subject) {
        true => String::new(),
        false => format!(" {}", case.subject),
    };
    let quantity = match case.quantity.as_str() {
        "gap" | "value" => "",
        _ if case.name.contains(&case.quantity) => "",
        quantity => quantity,
    };
    let quantity = if quantity.is_empty() { String::new() } else { format!(" {quantity}") };
    section(out, &format!("{}{subject}{quantity}{at}{of}", case.name), look);
    match before {
        Some(other) => {
            let text = format!("its range is made as that of {}, above", other.name);
            paragraph(out, 2, &text, Role::Plain, look);
        }
        None => range(out, account, case, look),
    }
    if let Some(statistics) = &case.statistics {
        statistics::render(out, case, statistics, look);
    }
    if let Some(window) = &case.window {
        paragraph(out, 2, &window.words, Role::Plain, look);
    }
    if let Some(concession) = &case.concession {
        paragraph(out, 2, &format!("concession {concession}"), Role::Warn, look);
    }
}

fn range(out: &mut String, account: &Account, case: &Case, look: Look) {
    contributors::render(out, case, look);
    if !case.thermal_shifts.is_empty() {
        paragraph(out, 2, &thermal_shift(case), Role::Plain, look);
    }
    let Some(figure) = case.figure.map(|f| &account.figures[f]) else { return };
    let least = with_unit(figure.least, case.unit, Round::Down);
    let greatest = with_unit(figure.greatest, case.unit, Round::Up);
    corner(out, case, "least", &least, &figure.least_at, look);
    corner(out, case, "greatest", &greatest, &figure.greatest_at, look);
    character(out, figure, look);
}

/// What temperature does to the mean: in all, and by part where several do.
fn thermal_shift(case: &Case) -> String {
    let signed = |figure: String| {
        let sign = if figure.starts_with('-') { "" } else { "+" };
        format!("{sign}{figure}")
    };
    let total: f64 = case.thermal_shifts.iter().map(|(_, shift)| shift).sum();
    let total = signed(difference_with_unit(total, case.unit, Round::Nearest));
    let parts: Vec<String> = case
        .thermal_shifts
        .iter()
        .map(|(name, shift)| {
            format!("{name} {}", signed(difference(*shift, case.unit, Round::Nearest)))
        })
        .collect();
    let parts = if parts.len() > 1 { format!(": {}", parts.join(", ")) } else { String::new() };
    format!("mean thermal shift since reference {total}{parts}")
}

fn character(out: &mut String, figure: &Figure, look: Look) {
    if !figure.met {
        let text = "proven bounds; no value that near to them was found";
        paragraph(out, 2, text, Role::Warn, look);
    }
    if let Some(character) = figure.character {
        paragraph(out, 2, &format!("{character} there"), Role::Plain, look);
    }
}

/// Where an end is reached, of what makes a difference.
fn corner(out: &mut String, case: &Case, end: &str, value: &str, at: &[Coordinate], look: Look) {
    let counts = |name: &str| {
        let contributor = case.contributors.iter().find(|c| c.name == name);
        contributor.is_none_or(|c| c.share_of_range.abs() >= LEAST_SHARE)
    };
    let places: Vec<String> = at
        .iter()
        .filter(|c| counts(&c.name))
        .map(|c| {
            let decimals = match c.unit {
                "" => 3,
                unit => crate::units::find(unit).map_or(4, decimals),
            };
            let value = digits(c.value, decimals, Round::Nearest);
            format!("{} {}", c.name, join(&value, c.unit))
        })
        .collect();
    let text = if places.is_empty() {
        format!("{end} {value}")
    } else {
        format!("{end} {value} with {}", places.join(", "))
    };
    paragraph(out, 2, &text, Role::Plain, look);
}
