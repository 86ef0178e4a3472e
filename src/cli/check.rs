//! `check`: findings and a summary of specs, in any of the formats.

mod draws;
mod output;
mod selection;

use super::console::Console;
use super::files::{MOST_BYTES, Place, Rooted, specs};
use super::pipeline::{Wish, check_counted};
use super::progress::{Progress, watch};
use super::refusal::{Outcome, Refusal};
use super::{day, glob, record};
use crate::evaluate::Detail;
use crate::report::text::Extent;
use crate::report::{Report, Spec, summary};
use clap::{ArgMatches, Args};
use draws::Draws;
use output::Format;
use rayon::iter::{IntoParallelIterator, ParallelIterator};
use selection::Selection;
use std::path::PathBuf;

/// Arguments of `check`.
#[derive(Debug, Args)]
#[command(after_help = "Examples:\n  \
    gapkeep check specs/                        every assembly below a folder\n  \
    gapkeep check spindle.gap --detail          what each range is made of\n  \
    gapkeep check specs/ --only 'R-1*' --at hot\n  \
    gapkeep check specs/ --recorded             exit 1 where a record is stale\n  \
    gapkeep check specs/ --warn-below 10%       exit 1 where a margin is thin\n  \
    gapkeep check spindle.gap --seed 2          draw other assemblies\n  \
    gapkeep check spindle.gap --to-width 0.01%  draw until shares are that sure\n  \
    gapkeep check specs/ --as text --out report.txt --as json --out report.json\n  \
    gapkeep check - < draft.gap")]
pub(super) struct CheckArguments {
    /// Files, folders (every assembly below, in the order of their names), or `-` for standard
    /// input.
    #[arg(required = true, value_name = "PATH")]
    paths: Vec<PathBuf>,
    /// Format of the report; may be given several times, each with an `--out` of its own.
    #[arg(long = "as", value_name = "FORMAT")]
    formats: Vec<Format>,
    /// File that the report goes to; its ending tells the format where `--as` does not.
    #[arg(long, value_name = "FILE")]
    out: Vec<PathBuf>,
    /// Only requirements whose id, or subject, matches; `*` stands for anything.
    #[arg(long, value_name = "GLOB")]
    only: Vec<String>,
    /// Only at these conditions.
    #[arg(long, value_name = "CONDITION")]
    at: Vec<String>,
    /// Show contributors, causes, corners and what the figures rest on.
    #[arg(long, conflicts_with = "quiet")]
    detail: bool,
    /// Show findings and the last line only.
    #[arg(long, short)]
    quiet: bool,
    /// Warn of margins below this share of what is allowed (of the limit, if there is one), and
    /// exit with status 1.
    #[arg(long, value_name = "SHARE", value_parser = share)]
    warn_below: Option<f64>,
    /// Fail where the record beside a spec is missing or differs, and show the difference.
    #[arg(long, conflicts_with_all = ["only", "at", "seed", "samples", "to_width"])]
    recorded: bool,
    #[command(flatten)]
    draws: Draws,
    /// The day that concessions are judged at, in UTC; today unless stated.
    #[arg(long, value_name = "DATE", value_parser = day::parse)]
    today: Option<String>,
    /// Folder that nothing is read outside of and that names are shown from; the folder the program
    /// is run in, or that of a file outside it.
    #[arg(long, value_name = "DIR")]
    root: Option<PathBuf>,
}

/// Reads `10%` or `0.1`.
fn share(text: &str) -> Result<f64, String> {
    let (digits, unit) = match text.trim().strip_suffix('%') {
        Some(digits) => (digits.trim_end(), 100.0),
        None => (text.trim(), 1.0),
    };
    match digits.parse::<f64>() {
        Ok(number) if (0.0..=unit).contains(&number) => Ok(number / unit),
        _ => Err("expected a share such as `10%` or `0.1`".to_string()),
    }
}

/// Checks specs.
pub(super) fn run(
    arguments: &CheckArguments,
    given: Option<&ArgMatches>,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let outputs = output::outputs(arguments, given)?;
    let folder = console.environment().folder.clone();
    let (places, wrong) = specs(&arguments.paths, arguments.root.as_deref(), &folder);
    for refusal in &wrong {
        console.complain(&refusal.message, refusal.help.as_deref());
    }
    let full = arguments.detail || outputs.iter().any(|o| o.format != Format::Text);
    let wish = Wish {
        options: arguments.draws.options(if full { Detail::Full } else { Detail::Brief }),
        today: arguments.today.clone().unwrap_or_else(|| console.environment().today.clone()),
    };
    let selection = Selection {
        only: arguments.only.clone(),
        at: arguments.at.clone(),
        warn_below: arguments.warn_below,
    };
    let mut outcome = if wrong.is_empty() { Outcome::Holds } else { Outcome::Wrong };
    let (mut report, refusals) = report(&places, &wish, &selection, arguments.quiet, console);
    for refusal in &refusals {
        console.complain(&refusal.message, refusal.help.as_deref());
        outcome = Outcome::Wrong;
    }
    selection.settle(&report)?;
    if arguments.recorded {
        hold_against_records(&places, &mut report);
    }
    let extent = match (arguments.quiet, arguments.detail) {
        (true, _) => Extent::Quiet,
        (_, true) => Extent::Detail,
        _ => Extent::Normal,
    };
    if !report.specs.is_empty() {
        for output in &outputs {
            output.write(&report, extent, console)?;
        }
        if outputs.iter().all(|o| o.file.is_some()) && !arguments.quiet {
            console.say(&format!("{}\n", summary::line(&report)));
        }
    }
    Ok(outcome.max(verdict(&report)))
}

/// What was read of standard input; `None` where a file is to be read.
type Input = Option<Result<Vec<u8>, Refusal>>;

/// Checks every place, side by side where there are several; no thread is started for one that
/// nobody watches.
fn report(
    places: &[Place],
    wish: &Wish,
    selection: &Selection,
    quiet: bool,
    console: &mut Console<'_>,
) -> (Report, Vec<Refusal>) {
    // Standard input is read first: the console stays here, the work may go to another thread.
    let mut input = |place: &Place| place.name.is_none().then(|| console.read_input(MOST_BYTES));
    let given: Vec<(&Place, Input)> = places.iter().map(|p| (p, input(p))).collect();
    let progress = Progress::default();
    let one = |(place, input): (&Place, Input)| {
        let bytes = match input {
            Some(bytes) => bytes,
            None => Rooted { root: place.root.clone() }.bytes(place.shown()),
        };
        let spec =
            bytes.map(|bytes| check_counted(place, &bytes, wish, selection, &progress.tally));
        progress.count_spec();
        spec
    };
    let all = || -> Vec<Result<Spec, Refusal>> {
        match given.len() {
            1 => given.into_iter().map(one).collect(),
            _ => given.into_par_iter().map(one).collect(),
        }
    };
    let checked = if quiet { all() } else { watch(console, &progress, places.len(), all) };
    let (mut report, mut refusals) = (Report::default(), Vec::new());
    for spec in checked {
        match spec {
            Ok(spec) => report.specs.push(spec),
            Err(refusal) => refusals.push(refusal),
        }
    }
    (report, refusals)
}

/// Holds each spec that could be computed against the record beside it.
fn hold_against_records(places: &[Place], report: &mut Report) {
    for spec in &mut report.specs {
        let place = places.iter().find(|p| p.shown() == spec.file);
        if let Some(place) = place.filter(|p| p.name.is_some()) {
            record::hold(place, spec);
        }
    }
}

/// What the findings of a run come to.
fn verdict(report: &Report) -> Outcome {
    let counted = summary::summary(report);
    if counted.wrong > 0 {
        Outcome::Wrong
    } else if counted.fail + counted.undecided + counted.thin + counted.errors > 0 {
        Outcome::Fails
    } else {
        Outcome::Holds
    }
}
