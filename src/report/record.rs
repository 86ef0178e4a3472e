//! The record of a spec: every figure a reviewer should see change in a diff, a line a figure.
//!
//! YAML, in the order of the spec, rounded as in the report, without time, path or machine, so that
//! it changes only when something changed. What differs between two records is told in their own
//! lines.

use super::{Account, Case, Figure, caution};
use crate::findings::Standing;
use crate::findings::number::{Round, difference, shown, with_unit};
use crate::units::Unit;
use similar::{ChangeTag, TextDiff};

/// The ending of a record's name, which takes the place of `.gap`.
pub const ENDING: &str = ".record.yaml";

/// The name of the format.
const SCHEMA: &str = "gapkeep-record/1";

/// The record of an account, ended by a line end.
pub fn record(account: &Account) -> String {
    let mut out =
        String::from("# Written by `gapkeep record`, held by `gapkeep check --recorded`.\n");
    out.push_str(&format!("schema: {SCHEMA}\ntitle: {}\n", quoted(&account.title)));
    if let Some((number, revision)) = &account.drawing {
        out.push_str(&format!("drawing: {}\nrevision: {}\n", quoted(number), quoted(revision)));
    }
    let reference = with_unit(account.reference, account.temperature, Round::Nearest);
    out.push_str(&format!("reference: {}\n", quoted(&reference)));
    section(
        &mut out,
        "conditions",
        account
            .conditions
            .iter()
            .map(|(name, written)| format!("  {}: {}\n", quoted(name), quoted(written))),
    );
    section(&mut out, "requirements", requirements(account).into_iter());
    section(&mut out, "results", results(account).into_iter());
    section(
        &mut out,
        "materials",
        account.grounds.materials.iter().map(|m| {
            let unit = account.temperature;
            let from = with_unit(m.valid.0, unit, Round::Nearest);
            let to = with_unit(m.valid.1, unit, Round::Nearest);
            format!("  {}: {}\n", quoted(&m.name), quoted(&format!("{from} .. {to}")))
        }),
    );
    let figures = account.figures.iter().map(|f| f.caution);
    let cautions = caution::lines(figures.chain(account.cases.iter().map(|c| c.caution)));
    if !cautions.is_empty() {
        section(&mut out, "cautions", cautions.iter().map(|c| format!("  - {}\n", quoted(c))));
    }
    out
}

fn section(out: &mut String, title: &str, lines: impl Iterator<Item = String>) {
    let mut lines = lines.peekable();
    if lines.peek().is_none() {
        out.push_str(&format!("{title}: {{}}\n"));
        return;
    }
    out.push_str(&format!("{title}:\n"));
    lines.for_each(|line| out.push_str(&line));
}

/// A string in double quotes, which JSON and YAML read alike.
fn quoted(text: &str) -> String {
    serde_json::to_string(text).unwrap_or_default()
}

/// Each requirement as a heading with its limits and a line a condition.
fn requirements(account: &Account) -> Vec<String> {
    let mut lines = Vec::new();
    let mut last = None;
    for case in &account.cases {
        if last != Some(case.requirement) {
            last = Some(case.requirement);
            let subject = if case.name.contains(&case.subject) {
                case.name.clone()
            } else {
                format!("{} {} {}", case.name, case.subject, case.quantity)
            };
            let method = match case.method.as_str() {
                "worst case" => String::new(),
                method => format!(", {method}"),
            };
            let unit = case.unit.symbol;
            let heading = format!("{subject} {}, {unit}{method}", case.limits);
            lines.push(format!("  {}:\n", quoted(heading.trim_end_matches([',', ' ']))));
        }
        lines.push(format!(
            "    {}: {{{}}}\n",
            condition(case.condition.as_ref(), case.figure.map(|f| &account.figures[f])),
            of_case(account, case)
        ));
    }
    lines
}

fn of_case(account: &Account, case: &Case) -> String {
    let figures = match case.figure.map(|f| &account.figures[f]) {
        Some(figure) => range(figure, case.unit),
        None => "least: null, mean: null, greatest: null".to_string(),
    };
    let margin = if case.margin.is_finite() {
        difference(case.margin, case.unit, Round::Down)
    } else {
        "null".to_string()
    };
    let share = case
        .statistics
        .as_ref()
        .map_or_else(String::new, |s| format!(", share_failing: {:.3e}", s.failing.share));
    format!("{figures}, margin: {margin}{share}, verdict: {}", verdict(case))
}

/// The verdict without regard to a concession, which depends on the day.
fn verdict(case: &Case) -> &'static str {
    match case.standing {
        Standing::Conceded => Standing::Fails.word(),
        standing => standing.word(),
    }
}

fn range(figure: &Figure, unit: &'static Unit) -> String {
    let number = |si: f64, round| {
        if si.is_finite() { shown(si, unit, round) } else { "null".to_string() }
    };
    format!(
        "least: {}, mean: {}, greatest: {}",
        number(figure.least, Round::Down),
        number(figure.mean, Round::Nearest),
        number(figure.greatest, Round::Up)
    )
}

/// A condition, and the members of sets that a figure there was computed with.
fn condition(name: Option<&String>, figure: Option<&Figure>) -> String {
    let mut name = name.map_or_else(|| "any".to_string(), String::clone);
    let members = figure.map_or(&[][..], |figure| &figure.members);
    name.extend(members.iter().map(|member| format!(", {}", member.shown())));
    quoted(&name)
}

/// Figures that no requirement shows, by subject and quantity, a line a condition.
fn results(account: &Account) -> Vec<String> {
    let shown: Vec<usize> = account.cases.iter().filter_map(|c| c.figure).collect();
    let mut lines = Vec::new();
    let mut last = String::new();
    for (index, figure) in account.figures.iter().enumerate() {
        if shown.contains(&index) {
            continue;
        }
        let unit = figure.unit.symbol;
        let heading = format!("{} {}, {unit}", figure.subject, figure.quantity);
        let heading = heading.trim_end_matches([',', ' ']).to_string();
        if heading != last {
            lines.push(format!("  {}:\n", quoted(&heading)));
            last = heading;
        }
        lines.push(format!(
            "    {}: {{{}}}\n",
            condition(figure.condition.as_ref(), Some(figure)),
            range(figure, figure.unit)
        ));
    }
    lines
}

/// The lines that differ between an old record and a new one, old ones with `-`, new ones with `+`,
/// each under the heading it stands under; empty where nothing differs.
pub fn difference_of(old: &str, new: &str) -> Vec<String> {
    let mut out = Vec::new();
    let mut heading = None;
    for change in TextDiff::from_lines(old, new).iter_all_changes() {
        let line = change.value().trim_end();
        let mark = match change.tag() {
            ChangeTag::Equal => {
                if line.ends_with(':') {
                    heading = Some(line);
                }
                continue;
            }
            ChangeTag::Delete => '-',
            ChangeTag::Insert => '+',
        };
        out.extend(heading.take().map(|heading| format!("  {heading}")));
        out.push(format!("{mark} {line}"));
    }
    out
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::sample;

    fn account() -> Account {
        sample::report().specs.remove(0).account.unwrap()
    }

    #[test]
    fn a_record_is_a_line_a_figure() {
        insta::assert_snapshot!(record(&account()));
    }

    #[test]
    fn a_record_is_yaml() {
        let value: serde_yaml::Value = serde_yaml::from_str(&record(&account())).unwrap();
        let requirement = &value["requirements"]["R-12 outer_race clearance 0 .. 0.030, mm"];
        assert_eq!(requirement["hot"]["least"].as_f64(), Some(-0.0121));
        assert_eq!(requirement["hot"]["verdict"].as_str(), Some("fails"));
    }

    #[test]
    fn only_what_changed_differs() {
        let old = record(&account());
        let mut changed = account();
        changed.figures[1].least = -0.0130e-3;
        changed.cases[1].margin = -0.0130e-3;
        assert_eq!(difference_of(&old, &old), Vec::<String>::new());
        let shown = difference_of(&old, &record(&changed));
        assert_eq!(shown.len(), 3, "{shown:?}");
        assert!(
            shown[0].contains("R-12") && shown[1].starts_with("- ") && shown[2].starts_with("+ ")
        );
        assert_eq!(difference_of("", "a\nb"), ["+ a", "+ b"]);
    }
}
