//! `tidy`: the one layout of a `.gap` file. Keeps every comment; leaves a file with mistakes alone.

use super::console::Console;
use super::files::{MOST_BYTES, Place, Rooted, all_files};
use super::pipeline::text_of;
use super::refusal::{Outcome, Refusal};
use super::write::atomically;
use crate::report::diagnostic;
use crate::source::{Source, Sources};
use crate::syntax;
use clap::Args;
use std::path::PathBuf;

/// Arguments of `tidy`.
#[derive(Debug, Args)]
#[command(after_help = "Examples:\n  gapkeep tidy specs/\n  gapkeep tidy --check specs/    \
    # for CI: exit 1 where a file would change\n  gapkeep tidy - < draft.gap")]
pub(super) struct TidyArguments {
    /// Files, folders (every `.gap` file below), or `-` for standard input to standard output.
    #[arg(required = true, value_name = "PATH")]
    paths: Vec<PathBuf>,
    /// Change nothing; say which files would change, with exit status 1 if any.
    #[arg(long)]
    check: bool,
}

/// Lays files out.
pub(super) fn run(
    arguments: &TidyArguments,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let folder = console.environment().folder.clone();
    let (places, wrong) = all_files(&arguments.paths, &folder);
    let mut outcome = Outcome::Holds;
    for refusal in &wrong {
        console.complain(&refusal.message, refusal.help.as_deref());
        outcome = Outcome::Wrong;
    }
    for place in places {
        outcome = outcome.max(one(&place, arguments.check, console)?);
    }
    Ok(outcome)
}

fn one(place: &Place, check: bool, console: &mut Console<'_>) -> Result<Outcome, Refusal> {
    let bytes = match &place.name {
        None => console.read_input(MOST_BYTES)?,
        Some(name) => Rooted { root: place.root.clone() }.bytes(name)?,
    };
    let mut sources = Sources::default();
    let text = match text_of(&bytes, place, &mut sources) {
        Ok(text) => text,
        Err(finding) => {
            let shown = diagnostic::render(&finding, &sources, console.look());
            console.say(&shown);
            return Ok(Outcome::Wrong);
        }
    };
    let file = sources.add(Source::new(place.shown(), text.clone()));
    let Some(tidy) = syntax::tidy(&text, file) else {
        for finding in syntax::parse(&text, file).diagnostics {
            let shown = diagnostic::render(&finding, &sources, console.look());
            console.say(&shown);
        }
        return Ok(Outcome::Wrong);
    };
    let changes = tidy != text;
    match place.path() {
        None if !check => console.print(tidy.as_bytes()),
        Some(path) if changes && !check => atomically(&path, tidy.as_bytes())?,
        _ => {}
    }
    if changes && (check || place.name.is_some()) {
        let verb = if check { "would change" } else { "changed" };
        console.say(&format!("{verb} {}\n", place.shown()));
    }
    Ok(if changes && check { Outcome::Fails } else { Outcome::Holds })
}
