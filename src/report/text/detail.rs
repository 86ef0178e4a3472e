//! One requirement in full, at the condition where it is tightest: what makes its range, split by
//! contributor and by cause, and where its ends are reached.

use super::{paragraph, section};
use crate::findings::number::{
    Round, decimals, difference, difference_with_unit, digits, join, share, with_unit,
};
use crate::report::look::{Look, Role};
use crate::report::wrap::{blanks, left, right, visible, width};
use crate::report::{Account, Case, Cause, Contribution, Coordinate, FailingShare, Statistics};

/// Columns of the bar that draws a share.
const BAR_COLUMNS: usize = 20;
/// Names have at least this room; longer ones than there is room for stand on a line of their own.
const LEAST_NAME_COLUMNS: usize = 16;
/// Tolerances longer than this stand on a line of their own.
const MOST_WRITTEN_COLUMNS: usize = 18;

/// Writes each requirement of a spec that has contributors, once.
pub(super) fn render(out: &mut String, account: &Account, look: Look) {
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
            one(out, account, case, end - begin, look);
        }
        begin = end;
    }
}

fn one(out: &mut String, account: &Account, case: &Case, conditions: usize, look: Look) {
    let at = case.condition.as_ref().map_or_else(String::new, |c| format!(" at {c}"));
    let of = if conditions > 1 {
        format!(", where the margin is least of {conditions} conditions")
    } else {
        String::new()
    };
    let unit = case.unit.symbol;
    let subject = if case.name.contains(&case.subject) {
        String::new()
    } else {
        format!("{} ", case.subject)
    };
    section(out, &visible(&format!("{} {subject}{}{at}{of}", case.name, case.quantity)), look);
    let head = if unit.is_empty() { "part".to_string() } else { format!("part, {unit}") };
    contributors(out, case, &head, look);
    causes(out, case, look);
    if let Some(shift) = case.thermal_shift {
        let shift = signed(&difference_with_unit(shift, case.unit, Round::Nearest));
        paragraph(out, 2, &format!("mean thermal shift from reference {shift}"), Role::Plain, look);
    }
    if let Some(figure) = case.figure.map(|f| &account.figures[f]) {
        let least = with_unit(figure.least, case.unit, Round::Down);
        let greatest = with_unit(figure.greatest, case.unit, Round::Up);
        corner(out, "least", &least, &figure.least_at, look);
        corner(out, "greatest", &greatest, &figure.greatest_at, look);
        if !figure.met {
            let text = "proven bounds; no value that near to them was found";
            paragraph(out, 2, text, Role::Warn, look);
        }
        if let Some(character) = figure.character {
            paragraph(out, 2, &format!("{character} there"), Role::Plain, look);
        }
    }
    if let Some(statistics) = &case.statistics {
        statistics_of(out, case, statistics, look);
    }
    if let Some(window) = &case.window {
        paragraph(out, 2, &window_words(account, case, window), Role::Plain, look);
    }
    if let Some(concession) = &case.concession {
        paragraph(out, 2, &format!("concession {concession}"), Role::Warn, look);
    }
}

fn statistics_of(out: &mut String, case: &Case, s: &Statistics, look: Look) {
    let mean = with_unit(s.mean, case.unit, Round::Nearest);
    let sigma = difference_with_unit(s.sigma, case.unit, Round::Up);
    let cpk = s.cpk.map_or_else(String::new, |c| format!(", Cpk {}", digits(c, 2, Round::Down)));
    let failing = failing(&s.failing);
    let text = format!("in statistics mean {mean}, sigma {sigma}{cpk}; {failing} fail");
    paragraph(out, 2, &text, Role::Plain, look);
    let (mean2, sigma2) = s.second_order;
    // To second order is worth a line where it tells something else.
    if mean2.is_finite()
        && ((sigma2 - s.sigma).abs() > 0.01 * s.sigma || (mean2 - s.mean).abs() > 0.01 * s.sigma)
    {
        let mean = with_unit(mean2, case.unit, Round::Nearest);
        let sigma = difference_with_unit(sigma2, case.unit, Round::Up);
        paragraph(
            out,
            2,
            &format!("to second order mean {mean}, sigma {sigma}"),
            Role::Plain,
            look,
        );
    }
    if let Some(interaction) = s.interaction {
        let text = format!("interaction makes {} of the variance", share(interaction));
        paragraph(out, 2, &text, Role::Plain, look);
    }
    if s.assumed {
        let text = "ASSUMED: sizes without a stated spread are normal, centred, limits at 3 sigma";
        paragraph(out, 2, text, Role::Warn, look);
    }
}

/// A share of assemblies with what it is known to lie between.
pub(super) fn failing(f: &FailingShare) -> String {
    let of = |x: f64| {
        if x == 0.0 { "0".to_string() } else { format!("{x:.3e}") }
    };
    match f.draws {
        Some(draws) => format!(
            "{} of assemblies ({} .. {} at 99 % confidence, {draws} draws)",
            of(f.share),
            of(f.interval.0),
            of(f.interval.1)
        ),
        None if f.share > 0.0 && f.share < 1e-18 => "< 1e-18 of assemblies".to_string(),
        None if f.interval.0 < f.share || f.share < f.interval.1 => {
            format!("{} .. {} of assemblies", of(f.interval.0), of(f.interval.1))
        }
        None => format!("{} of assemblies", of(f.share)),
    }
}

fn signed(figure: &str) -> String {
    if figure.starts_with('-') { figure.to_string() } else { format!("+{figure}") }
}

fn contributors(out: &mut String, case: &Case, head: &str, look: Look) {
    let list = &case.contributors;
    let most = |of: &dyn Fn(&Contribution) -> usize, most: usize| {
        list.iter().map(of).filter(|&n| n <= most).max().unwrap_or(0)
    };
    let written =
        most(&|c| width(&visible(&c.written)), MOST_WRITTEN_COLUMNS).max("as written".len());
    let part = list.iter().map(|c| width(&part(case, c))).max().unwrap_or(0).max(width(head));
    let variance = list.iter().any(|c| c.share_of_variance.is_some());
    let based = list.iter().any(|c| c.basis.is_some());
    let optional = 9 * usize::from(variance) + 10 * usize::from(based);
    let room = look.width.saturating_sub(2 + 2 + written + 13 + 2 + part + 10 + optional);
    let name = most(&|c| width(&visible(&c.name)), room.max(LEAST_NAME_COLUMNS));
    let name = name.max("contributor".len());
    let of = if variance { "of range  of var." } else { "of range" };
    let heads = format!(
        "  {}  {}  {:>11}  {}  {of}",
        left("contributor", name),
        left("as written", written),
        "sensitivity",
        right(head, part),
    );
    out.push_str(&format!("{}\n", look.paint(Role::Quiet, &heads)));
    for c in list {
        let shown = visible(&c.name);
        let mut line = if width(&shown) > name {
            format!("  {shown}\n{}", blanks(name + 2))
        } else {
            format!("  {}", left(&shown, name))
        };
        let text = visible(&c.written);
        if width(&text) > written {
            line.push_str(&format!("  {text}\n{}", blanks(name + written + 4)));
        } else {
            line.push_str(&format!("  {}", left(&text, written)));
        }
        let sensitivity = sensitivity(c.sensitivity);
        line.push_str(&format!("  {sensitivity:>11}  {}", right(&self::part(case, c), part)));
        line.push_str(&format!("  {:>8}", share(c.share_of_range)));
        if variance {
            line.push_str(&format!("  {:>7}", c.share_of_variance.map_or_else(String::new, share)));
        }
        if let Some(basis) = c.basis {
            let role = if basis == "assumed" { Role::Warn } else { Role::Quiet };
            line.push_str(&format!("  {}", look.paint(role, basis)));
        }
        out.push_str(line.trim_end());
        out.push('\n');
    }
}

fn part(case: &Case, c: &Contribution) -> String {
    difference(c.part, case.unit, Round::Nearest)
}

/// A derivative to three digits that count.
fn sensitivity(value: f64) -> String {
    let size = value.abs();
    match value {
        _ if !value.is_finite() => "not known".to_string(),
        _ if size != 0.0 && !(1e-3..1e6).contains(&size) => format!("{value:.2e}"),
        _ if size >= 100.0 => digits(value, 0, Round::Nearest),
        _ if size >= 0.1 || size == 0.0 => digits(value, 3, Round::Nearest),
        _ => digits(value, 5, Round::Nearest),
    }
}

/// The range by cause, a bar each, largest first; nothing where there is but one cause.
fn causes(out: &mut String, case: &Case, look: Look) {
    let mut causes: Vec<(Cause, f64, f64)> = Vec::new();
    for cause in Cause::ALL {
        let of = || case.contributors.iter().filter(|c| c.cause == cause);
        if of().next().is_some() {
            let share = of().map(|c| c.share_of_range).sum();
            causes.push((cause, of().map(|c| c.part).sum(), share));
        }
    }
    causes.sort_by(|a, b| b.2.total_cmp(&a.2));
    let figure = |part| difference(part, case.unit, Round::Nearest);
    let columns = causes.iter().map(|c| width(&figure(c.1))).max().unwrap_or(0);
    for (cause, part, of_range) in causes {
        let bar = libm::round(of_range.clamp(0.0, 1.0) * BAR_COLUMNS as f64) as usize;
        let bar = look.pick("\u{2588}", "#").repeat(bar);
        let line = format!(
            "  by {:<18}{}  {:>8}  {}",
            cause.word(),
            right(&figure(part), columns),
            share(of_range),
            look.paint(Role::Quiet, &bar)
        );
        out.push_str(line.trim_end());
        out.push('\n');
    }
}

fn corner(out: &mut String, end: &str, value: &str, at: &[Coordinate], look: Look) {
    let places: Vec<String> = at
        .iter()
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

/// The temperatures at which a requirement would hold. Rounded inward: a window never looks wider
/// than was proven.
fn window_words(account: &Account, case: &Case, window: &[(f64, f64)]) -> String {
    let end = |value: f64, round| {
        if case.window_scaled {
            digits(value, 3, round)
        } else {
            with_unit(value, account.temperature, round)
        }
    };
    let intervals: Vec<String> = window
        .iter()
        .map(|&(from, to)| match (from.is_finite(), to.is_finite()) {
            (true, true) => format!("{} .. {}", end(from, Round::Up), end(to, Round::Down)),
            (true, false) => format!("{} and above", end(from, Round::Up)),
            (false, true) => format!("{} and below", end(to, Round::Down)),
            (false, false) => "any temperature".to_string(),
        })
        .collect();
    let of = if case.window_scaled { " times the condition's distance from reference" } else { "" };
    match intervals.is_empty() {
        true => "holds at no temperature".to_string(),
        false => format!("holds at {}{of}", intervals.join(", ")),
    }
}
