//! How a run went, in numbers and in one line.

use super::{Case, Report};
use crate::diagnostic::{Code, Severity};
use crate::findings::Standing;
use crate::findings::number::{Round, difference_with_unit};
use crate::findings::words::count;

/// How many requirements at how many conditions stand how. Each requirement counts once at each of
/// its conditions.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub struct Summary {
    /// All of them.
    pub requirements: usize,
    /// Those that hold.
    pub hold: usize,
    /// Those that fail.
    pub fail: usize,
    /// Those that could not be decided.
    pub undecided: usize,
    /// Those that fail within what a concession accepts.
    pub conceded: usize,
    /// Specs that are wrong, so that nothing of them was computed.
    pub wrong: usize,
    /// Requirements with a thinner margin than asked for.
    pub thin: usize,
    /// Findings of severity error.
    pub errors: usize,
    /// Findings of severity warning.
    pub warnings: usize,
}

/// Counts what a run found.
pub fn summary(report: &Report) -> Summary {
    let mut summary = Summary::default();
    for spec in &report.specs {
        match &spec.account {
            None => summary.wrong += 1,
            Some(account) => account.cases.iter().for_each(|case| {
                summary.requirements += 1;
                match case.standing {
                    Standing::Holds => summary.hold += 1,
                    Standing::Fails => summary.fail += 1,
                    Standing::Undecided => summary.undecided += 1,
                    Standing::Conceded => summary.conceded += 1,
                }
            }),
        }
        let thin = spec.findings.iter().filter(|d| d.code == Code::ThinMargin);
        summary.thin += thin.count();
        let of = |severity| spec.findings.iter().filter(|d| d.severity == severity).count();
        summary.errors += of(Severity::Error);
        summary.warnings += of(Severity::Warning);
    }
    summary
}

/// The last line of a report: how many stand how, and where it is tightest.
pub fn line(report: &Report) -> String {
    let summary = summary(report);
    let mut parts = Vec::new();
    if summary.wrong > 0 {
        let several = report.specs.len() > 1;
        let of = if several { format!(" of {}", report.specs.len()) } else { String::new() };
        let verb = if summary.wrong == 1 { "has" } else { "have" };
        let mistakes = count(summary.errors, "mistake", "mistakes");
        let specs = if summary.wrong == 1 && !several { "spec" } else { "specs" };
        parts.push(format!(
            "{}{of} {specs} {verb} {mistakes} and could not be checked",
            summary.wrong
        ));
    }
    if summary.requirements > 0 {
        parts.push(standings(&summary));
    } else if summary.wrong == 0 {
        parts.push("nothing is required".to_string());
    }
    if summary.wrong == 0 && summary.hold == summary.requirements && summary.errors > 0 {
        // All that is required may hold, and something still be wrong.
        parts.push(count(summary.errors, "error besides", "errors besides"));
    }
    parts.extend(tightest(report).map(tightest_words));
    if summary.warnings > 0 {
        parts.push(count(summary.warnings, "warning", "warnings"));
    }
    parts.join("; ")
}

fn standings(summary: &Summary) -> String {
    let all = count(summary.requirements, "case", "cases");
    if summary.hold == summary.requirements {
        return match summary.requirements {
            1 => "the one case holds".to_string(),
            2 => "both cases hold".to_string(),
            _ => format!("all {all} hold"),
        };
    }
    let stand: Vec<String> = [
        (summary.fail, "fails", "fail"),
        (summary.undecided, "is undecided", "are undecided"),
        (summary.conceded, "is conceded", "are conceded"),
        (summary.hold, "holds", "hold"),
    ]
    .into_iter()
    .filter(|(n, ..)| *n > 0)
    .map(|(n, one, many)| count(n, one, many))
    .collect();
    format!("{all}: {}", stand.join(", "))
}

/// The case with the least reserve, if any is known.
fn tightest(report: &Report) -> Option<&Case> {
    let cases = report.specs.iter().filter_map(|s| s.account.as_ref()).flat_map(|a| &a.cases);
    let reserve = |case: &Case| case.reserve.unwrap_or(f64::INFINITY);
    cases.filter(|c| c.reserve.is_some()).min_by(|a, b| reserve(a).total_cmp(&reserve(b)))
}

fn tightest_words(case: &Case) -> String {
    let at = case.condition.as_ref().map_or_else(String::new, |c| format!(" at {c}"));
    if case.margin < 0.0 {
        let short = difference_with_unit(-case.margin, case.unit, Round::Up);
        format!("worst is {}{at}, short by {short}", case.name)
    } else {
        let margin = difference_with_unit(case.margin, case.unit, Round::Down);
        format!("least margin {margin} ({}{at})", case.name)
    }
}
