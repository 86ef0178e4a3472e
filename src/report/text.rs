//! The report for people: which requirement fails, where and by how much, at a glance.
//!
//! A row a condition for each requirement: least, mean and greatest value, margin, a verdict in a
//! word, and the range drawn to scale between its limits. What holds is said briefly; the rest is
//! given on demand. Bounds and margins are rounded outward.

mod band;
mod detail;
mod grounds;
mod shop;
mod strip;
mod table;

use super::look::{Look, Role};
use super::wrap::{blanks, visible, width, wrap};
use super::{Account, Caution, Report, Spec, caution, diagnostic, summary};
use crate::diagnostic::Severity;
use crate::findings::Standing;
use crate::findings::number::{Round, with_unit};
use rayon::prelude::{IntoParallelRefIterator, ParallelIterator};

/// How much is shown.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Extent {
    /// Findings and the last line.
    Quiet,
    /// Besides, a row for each requirement and each fit and gap at each condition. Of several specs,
    /// those that hold get one line each.
    Normal,
    /// Besides, contributors, causes, corners and everything the figures rest on.
    Detail,
}

/// The report as text, ended by a line end.
pub fn render(report: &Report, extent: Extent, look: Look) -> String {
    let mut out = String::new();
    let mut after_brief = false;
    let several = report.specs.len() > 1;
    let parts: Vec<String> =
        report.specs.par_iter().map(|spec| part(spec, several, extent, look)).collect();
    for part in &parts {
        if part.is_empty() {
            continue;
        }
        // Specs of one line stand directly below each other.
        let brief = part.lines().count() == 1;
        if !(out.is_empty() || brief && after_brief) {
            out.push('\n');
        }
        after_brief = brief;
        out.push_str(part);
    }
    if !out.is_empty() {
        out.push('\n');
    }
    // A detailed report has them, at more length, among what its figures rest on.
    if extent < Extent::Detail {
        let cases = report.specs.iter().filter_map(|s| s.account.as_ref()).flat_map(|a| &a.cases);
        let findings = report.specs.iter().flat_map(|s| &s.findings);
        let called_for =
            cases.map(|c| c.caution).chain(findings.map(|d| Caution::of_finding(d.code)));
        cautions(&mut out, &caution::lines(called_for), look);
    }
    let counted = summary::summary(report);
    let role = if counted.fail + counted.undecided + counted.wrong > 0 {
        Role::Bad
    } else if counted.warnings + counted.conceded > 0 {
        Role::Warn
    } else {
        Role::Good
    };
    for line in wrap(&visible(&summary::line(report)), look.width) {
        out.push_str(&format!("{}\n", look.paint(role, &line)));
    }
    out
}

/// What there is to say of one spec; empty where that is nothing.
fn part(spec: &Spec, several: bool, extent: Extent, look: Look) -> String {
    let mut part = String::new();
    if let Some(account) = &spec.account {
        match extent {
            Extent::Quiet => {}
            Extent::Normal if several && all_holds(spec, account) => {
                part.push_str(&one_line(spec, account, look));
            }
            _ => whole(&mut part, spec, account, extent, look),
        }
    }
    for finding in &spec.findings {
        if !part.is_empty() {
            part.push('\n');
        }
        part.push_str(&diagnostic::render(finding, &spec.sources, look));
    }
    for line in &spec.stale {
        let role = match line.as_bytes().first() {
            Some(b'-') => Role::Bad,
            Some(b'+') => Role::Good,
            _ => Role::Quiet,
        };
        part.push_str(&format!("  {}\n", look.paint(role, &visible(line))));
    }
    part
}

fn all_holds(spec: &Spec, account: &Account) -> bool {
    spec.findings.iter().all(|d| d.severity == Severity::Note)
        && account.cases.iter().all(|c| c.standing == Standing::Holds)
}

/// File and how many requirements hold, for specs among others.
fn one_line(spec: &Spec, account: &Account, look: Look) -> String {
    let holds = look.paint(Role::Good, "holds");
    let title = visible(&format!("  {}", account.title));
    let file = visible(&spec.file);
    let room = look.width.saturating_sub(7);
    let title = if width(&file) + width(&title) <= room { title } else { String::new() };
    format!("{holds}  {file}{}\n", look.paint(Role::Quiet, &title))
}

fn whole(out: &mut String, spec: &Spec, account: &Account, extent: Extent, look: Look) {
    heading(out, spec, account, look);
    table::render(out, account, extent, look);
    if let Some(failing) = &account.failing {
        out.push('\n');
        paragraph(out, 0, &detail::statistics::first_pass(failing), Role::Plain, look);
    }
    if extent == Extent::Detail {
        detail::render(out, account, look);
        band::render(out, account, look);
        shop::render(out, account, look);
        grounds::render(out, account, look);
    }
}

/// Title and drawing at the two ends of a line, then file and reference.
fn heading(out: &mut String, spec: &Spec, account: &Account, look: Look) {
    let drawing = match &account.drawing {
        Some((number, revision)) if revision.is_empty() => visible(number),
        Some((number, revision)) => visible(&format!("{number} rev {revision}")),
        None => String::new(),
    };
    let title = visible(&account.title);
    let room = look.width.saturating_sub(width(&drawing) + 2);
    let lines = wrap(&title, room);
    for (i, line) in lines.iter().enumerate() {
        out.push_str(&look.paint(Role::Title, line));
        if i == 0 && !drawing.is_empty() {
            let between = look.width.saturating_sub(width(line) + width(&drawing));
            out.push_str(&format!("{}{drawing}", blanks(between)));
        }
        out.push('\n');
    }
    let reference = with_unit(account.reference, account.temperature, Round::Nearest);
    let place = visible(&format!("{}, sizes at {reference}", spec.file));
    out.push_str(&format!("{}\n", look.paint(Role::Quiet, &place)));
}

/// A heading of a section and the lines below it, each indented and wrapped.
fn section(out: &mut String, title: &str, look: Look) {
    out.push('\n');
    paragraph(out, 0, title, Role::Title, look);
}

/// A line for each caution.
pub(super) fn cautions(out: &mut String, lines: &[&str], look: Look) {
    for line in lines {
        paragraph(out, 0, &format!("caution: {line}"), Role::Warn, look);
    }
}

/// A paragraph, wrapped, first line and others indented alike.
fn paragraph(out: &mut String, indent: usize, text: &str, role: Role, look: Look) {
    for line in wrap(&visible(text), look.width.saturating_sub(indent)) {
        out.push_str(&format!("{}{}\n", blanks(indent), look.paint(role, &line)));
    }
}

/// A line as it is, wrapped only where it is too long.
fn paragraph_kept(out: &mut String, indent: usize, text: &str, look: Look) {
    let line = format!("{}{}", " ".repeat(indent), visible(text));
    if width(&line) <= look.width {
        out.push_str(line.trim_end());
        out.push('\n');
    } else {
        paragraph(out, indent, text, Role::Plain, look);
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::sample;

    #[test]
    fn a_failing_spec_at_a_glance() {
        insta::assert_snapshot!(render(&sample::report(), Extent::Normal, Look::PLAIN));
    }

    #[test]
    fn a_failing_spec_drawn() {
        let look = Look { drawing: true, ..Look::PLAIN };
        insta::assert_snapshot!(render(&sample::report(), Extent::Detail, look));
    }
}
