//! `select`: the classes, nominals, tolerances and spacers that would meet every requirement, and
//! putting a class into the spec.

mod edit;

use super::console::Console;
use super::files::{MOST_BYTES, Place, Rooted, specs};
use super::pipeline::text_of;
use super::refusal::{Outcome, Refusal};
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::evaluate::Options;
use crate::evaluate::select::{Asked, NoSpacer, Selections, Spacer, select, spacer};
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
    #[arg(long, value_name = "PART.DIMENSION", requires_all = ["between", "of"], conflicts_with_all = ["dimension", "write"])]
    spacer: Option<String>,
    /// The two conditions.
    #[arg(long, value_name = "CONDITION,CONDITION", requires = "spacer")]
    between: Option<String>,
    /// The gap, fit or result whose mean is to be the same.
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
    let spaced = spaced(arguments, &assembly)?;
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

/// The spacer asked for, if one is.
fn spaced(arguments: &SelectArguments, assembly: &Assembly) -> Result<Option<Spacer>, Refusal> {
    let (Some(path), Some(between), Some(of)) =
        (&arguments.spacer, &arguments.between, &arguments.of)
    else {
        return Ok(None);
    };
    let id = dimension(assembly, path)?;
    let condition = |name: &str| {
        let found = assembly.condition_ids().find(|&c| assembly.condition(c).name == name.trim());
        found.ok_or_else(|| {
            let names: Vec<String> =
                assembly.conditions.iter().map(|c| format!("`{}`", c.name)).collect();
            Refusal::new(
                format!("the spec has no condition `{}`", name.trim()),
                format!("it has {}", names.join(", ")),
            )
        })
    };
    let Some((a, b)) = between.split_once(',') else {
        return Err(Refusal::new(
            format!("`{between}` does not name two conditions"),
            "name them as `cold,hot`",
        ));
    };
    let between = (condition(a)?, condition(b)?);
    let Some(subject) = assembly.subject_ids().find(|&s| assembly.subject(s).name == *of) else {
        let names: Vec<String> =
            assembly.subjects.iter().map(|s| format!("`{}`", s.name)).collect();
        return Err(Refusal::new(
            format!("the spec has no gap, fit or result `{of}`"),
            format!("it has {}", names.join(", ")),
        ));
    };
    match spacer(assembly, id, subject, between) {
        Ok(found) => Ok(Some(found)),
        Err(none) => Err(no_spacer(none, path, of)),
    }
}

fn no_spacer(none: NoSpacer, path: &str, of: &str) -> Refusal {
    match none {
        NoSpacer::NoQuantity => Refusal::new(
            format!("`{of}` has no mean of its own that a length could settle"),
            "name a gap, a fit or a result",
        ),
        NoSpacer::NotComputed => Refusal::new(
            format!("`{of}` cannot be computed at both conditions"),
            "`gapkeep check` says what is missing",
        ),
        NoSpacer::NoInfluence => Refusal::new(
            format!("`{path}` does not change how `{of}` differs between the two conditions"),
            format!("name one that `{of}` contains, of another material than its mates"),
        ),
        NoSpacer::NoLength(_) => Refusal::new(
            format!("no length of `{path}` makes `{of}` the same at both conditions"),
            "try another material for it, or another dimension",
        ),
        NoSpacer::Undecided => Refusal::new(
            format!("it could not be proven which length of `{path}` makes `{of}` the same"),
            "try conditions without a range, or another dimension",
        ),
    }
}
