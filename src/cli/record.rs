//! `record`: the figures of each spec beside it, for a reviewer to see change in a diff; and holding
//! a spec against its record.

use super::console::Console;
use super::files::{Place, Rooted, specs};
use super::pipeline::{Everything, Wish, check};
use super::refusal::{Outcome, Refusal};
use super::write::atomically;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Options;
use crate::report::record::{ENDING, difference_of, record};
use crate::report::{Spec, diagnostic};
use crate::resolve::{FileError, Files};
use clap::Args;
use std::path::PathBuf;

/// Arguments of `record`.
#[derive(Debug, Args)]
#[command(
    after_help = "Examples:\n  gapkeep record specs/           writes specs/NAME.record.yaml \
    for each assembly\n  gapkeep check specs/ --recorded  holds the specs against them"
)]
pub(super) struct RecordArguments {
    /// Files, or folders (every assembly below).
    #[arg(required = true, value_name = "PATH")]
    paths: Vec<PathBuf>,
    /// Folder that nothing is read outside of.
    #[arg(long, value_name = "DIR")]
    root: Option<PathBuf>,
}

/// Writes records.
pub(super) fn run(
    arguments: &RecordArguments,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let folder = console.environment().folder.clone();
    let (places, wrong) = specs(&arguments.paths, arguments.root.as_deref(), &folder);
    let mut outcome = Outcome::Holds;
    for refusal in &wrong {
        console.complain(&refusal.message, refusal.help.as_deref());
        outcome = Outcome::Wrong;
    }
    let wish = Wish { options: Options::default(), today: console.environment().today.clone() };
    for place in places {
        let Some(path) = name(&place) else {
            return Err(Refusal::new(
                "a spec from standard input has no place for its record",
                "name a file",
            ));
        };
        let bytes = Rooted { root: place.root.clone() }.bytes(place.shown())?;
        let spec = check(&place, &bytes, &wish, &Everything);
        match &spec.account {
            Some(account) => {
                atomically(&place.root.join(&path), record(account).as_bytes())?;
                console.say(&format!("wrote {path}\n"));
            }
            None => {
                for finding in &spec.findings {
                    let shown = diagnostic::render(finding, &spec.sources, console.look());
                    console.say(&shown);
                }
                outcome = Outcome::Wrong;
            }
        }
    }
    Ok(outcome)
}

/// The name of a spec's record, from the root; `None` for standard input.
fn name(place: &Place) -> Option<String> {
    let name = place.name.as_deref()?;
    let stem = name.strip_suffix(".gap").unwrap_or(name);
    Some(format!("{stem}{ENDING}"))
}

/// Holds a spec against its record: a finding where that is missing or differs.
pub(super) fn hold(place: &Place, spec: &mut Spec) {
    let (Some(account), Some(path)) = (&spec.account, name(place)) else { return };
    let at = account.place;
    let help = format!("look at the difference, then run `gapkeep record {}`", place.shown());
    let files = Rooted { root: place.root.clone() };
    match files.read(&path).map(String::from_utf8) {
        Ok(Ok(old)) => {
            spec.stale = difference_of(&old, &record(account));
            if !spec.stale.is_empty() {
                let message = format!("the record `{path}` is not what the spec gives now");
                spec.findings.push(Diagnostic::new(Code::RecordStale, at, message).help(help));
            }
        }
        Err(FileError::Missing) => {
            let message = format!("there is no record `{path}`");
            let help = format!("run `gapkeep record {}`", place.shown());
            spec.findings.push(Diagnostic::new(Code::RecordMissing, at, message).help(help));
        }
        Ok(Err(_)) | Err(_) => {
            let message = format!("the record `{path}` cannot be read");
            spec.findings.push(Diagnostic::new(Code::RecordStale, at, message).help(help));
        }
    }
}
