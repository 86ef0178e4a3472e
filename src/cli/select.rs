//! `select`: the classes, nominals, tolerances and spacers that would meet every requirement, and
//! putting a class into the spec.

mod edit;
mod spaced;

use super::console::Console;
use super::files::{MOST_BYTES, Place, Rooted, specs};
use super::pipeline::text_of;
use super::refusal::{Outcome, Refusal};
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::evaluate::Options;
use crate::evaluate::select::{Asked, Selections, select};
use crate::model::{Assembly, DimensionId, Form};
use crate::report::diagnostic;
use crate::report::select::{json, selected, text};
use crate::resolve::{Files, Resolved, resolve};
use crate::source::{Source, Sources};
use crate::span::FileId;
use clap::{Args, ValueEnum};
use std::path::PathBuf;

/// Arguments of `select`.
#[derive(Debug, Args)]
#[command(after_help = "Examples:\n  \
    gapkeep select spindle.gap                    classes for each `dia 42 ?` and each failing fit\n  \
    gapkeep select spindle.gap --for housing.bore --all\n  \
    gapkeep select spindle.gap --write            put the first class in place of each `?`\n  \
    gapkeep select stack.gap --spacer ring.width --between cold,hot --of end_float")]
pub(super) struct SelectArguments {
    /// A spec, or `-` for standard input.
    #[arg(value_name = "SPEC")]
    path: PathBuf,
    /// Only this dimension, whatever tolerance it has now.
    #[arg(long = "for", value_name = "PART.DIMENSION")]
    dimension: Option<String>,
    /// The length of this spacer that makes a mean the same at two conditions.
    #[arg(long, value_name = "PART.DIMENSION", conflicts_with_all = ["dimension", "write"])]
    spacer: Option<String>,
    /// The two conditions; may be left out where the spec has two.
    #[arg(long, value_name = "CONDITION,CONDITION", requires = "spacer")]
    between: Option<String>,
    /// The gap, fit or result whose mean is to be the same; may be left out where only one depends on
    /// the spacer.
    #[arg(long, value_name = "NAME", requires = "spacer")]
    of: Option<String>,
    /// Show every class, not the first few and the preferred ones.
    #[arg(long)]
    all: bool,
    /// Form of the answer.
    #[arg(long = "as", value_name = "FORMAT", default_value = "text", hide_default_value = true)]
    form: Format,
    /// Put the first class that serves in place of each `?`, or of the class of `--for`; nothing
    /// else in the file is touched.
    #[arg(long)]
    write: bool,
}

/// Form of the answer.
#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
enum Format {
    /// For people.
    Text,
    /// For programs.
    Json,
}

/// Finds what would meet the requirements.
pub(super) fn run(
    arguments: &SelectArguments,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let place = place(&arguments.path, console)?;
    let files = Rooted { root: place.root.clone() };
    let bytes = match &place.name {
        None => console.read_input(MOST_BYTES)?,
        Some(name) => files.bytes(name)?,
    };
    let mut sources = Sources::default();
    let read = text_of(&bytes, &place, &mut sources)
        .map_err(|finding| vec![finding])
        .and_then(|text| model(&place, &text, &mut sources, &files));
    let assembly = match read {
        Ok(assembly) => assembly,
        Err(findings) => {
            for finding in findings {
                console.say(&diagnostic::render(&finding, &sources, console.look()));
            }
            return Ok(Outcome::Wrong);
        }
    };
    let asked = match &arguments.dimension {
        Some(path) => Asked::For(class_of(&assembly, path)?),
        None => Asked::Everything,
    };
    let options = Options::default();
    let spaced = spaced::spaced(arguments, &assembly)?;
    let found = match spaced {
        Some(_) => Selections::default(),
        None => select(&assembly, asked, &options),
    };
    let told = selected(&assembly, place.shown(), &found, spaced.as_ref());
    let answer = match arguments.form {
        Format::Text => text(&told, arguments.all, console.look()),
        Format::Json => json(&told),
    };
    console.print(answer.as_bytes());
    if arguments.write {
        let said = edit::write(&place, &files, &sources, &assembly, &found, asked)?;
        console.say(&said);
    }
    let served = found.choices.iter().all(|c| !c.serving.is_empty());
    Ok(if served { Outcome::Holds } else { Outcome::Fails })
}

fn place(path: &PathBuf, console: &Console<'_>) -> Result<Place, Refusal> {
    let folder = &console.environment().folder;
    let (mut places, wrong) = specs(std::slice::from_ref(path), None, folder);
    if let Some(refusal) = wrong.into_iter().next() {
        return Err(refusal);
    }
    match (places.pop(), places.is_empty()) {
        (Some(place), true) => Ok(place),
        _ => Err(Refusal::new(
            format!("`{}` holds more than one spec", path.display()),
            "name the one to select for",
        )),
    }
}

/// The model of a spec in which classes may be left open; else what is wrong with it.
fn model(
    place: &Place,
    text: &str,
    sources: &mut Sources,
    files: &dyn Files,
) -> Result<Assembly, Vec<Diagnostic>> {
    let root: FileId = sources.add(Source::new(place.shown(), text));
    let Resolved { assembly, diagnostics } = resolve(root, sources, files);
    let wrong: Vec<Diagnostic> = diagnostics
        .into_iter()
        .filter(|d| d.severity == Severity::Error && d.code != Code::ClassLeftOpen)
        .collect();
    match assembly {
        Some(assembly) if wrong.is_empty() => Ok(assembly),
        _ => Err(wrong),
    }
}

fn dimension(assembly: &Assembly, path: &str) -> Result<DimensionId, Refusal> {
    let mut all = (0..assembly.dimensions.len() as u32).map(DimensionId);
    all.clone().find(|&d| assembly.path(d) == path).ok_or_else(|| {
        let part = path.split('.').next().unwrap_or(path);
        let near: Vec<String> = all
            .by_ref()
            .filter(|&d| assembly.part(assembly.dimension(d).part).name == part)
            .map(|d| format!("`{}`", assembly.path(d)))
            .collect();
        let help = if near.is_empty() {
            let parts: Vec<String> =
                assembly.parts.iter().map(|p| format!("`{}`", p.name)).collect();
            format!("write it as `part.dimension`; the parts are {}", parts.join(", "))
        } else {
            format!("it has {}", near.join(", "))
        };
        Refusal::new(format!("the spec has no dimension `{path}`"), help)
    })
}

/// A dimension that may have a class.
fn class_of(assembly: &Assembly, path: &str) -> Result<DimensionId, Refusal> {
    let id = dimension(assembly, path)?;
    let stated = assembly.dimension(id);
    let of_size = matches!(stated.form, Form::Diameter | Form::Linear);
    if of_size && stated.members.is_empty() && stated.geometric.is_none() {
        return Ok(id);
    }
    Err(Refusal::new(
        format!("`{path}`, `{}`, takes no ISO 286 class", stated.written),
        "name a diameter or a width",
    ))
}
