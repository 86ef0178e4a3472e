//! Putting classes into a spec: only the `?`, or the class that stands there, is replaced.

use super::model;
use crate::cli::files::{Place, Rooted};
use crate::cli::refusal::Refusal;
use crate::cli::write::atomically;
use crate::evaluate::outcome::Outcome;
use crate::evaluate::select::{Asked, Choice, Selections};
use crate::evaluate::{Options, evaluate};
use crate::model::{Assembly, DimensionId, Origin};
use crate::source::Sources;
use crate::span::{FileId, Span};
use crate::syntax::{self, tree};

/// What is put where.
struct Edit {
    at: Span,
    class: String,
    path: String,
}

/// Writes the first class of each choice into the file that states the dimension, and says so.
///
/// # Errors
/// When a choice has no class, when classes chosen one by one do not serve together, or when a file
/// cannot be written; nothing is written then.
pub(super) fn write(
    place: &Place,
    files: &Rooted,
    sources: &Sources,
    assembly: &Assembly,
    found: &Selections,
    asked: Asked,
) -> Result<String, Refusal> {
    let wanted = |choice: &&Choice| {
        let open = |d: &DimensionId| assembly.dimension(*d).origin == Origin::Open;
        asked != Asked::Everything || choice.dimensions.iter().all(open)
    };
    let mut edits = Vec::new();
    for choice in found.choices.iter().filter(wanted) {
        edits.extend(of_choice(sources, assembly, choice)?);
    }
    let Some(file) = edits.first().map(|e: &Edit| e.at.file) else {
        return Err(Refusal::new(
            "no class is left open, so there is nothing to write",
            "write `?` in place of a class, or name the dimension with `--for`",
        ));
    };
    if edits.iter().any(|e| e.at.file != file) {
        return Err(Refusal::new(
            "the classes left open stand in several files",
            "write them one by one, with `--for`",
        ));
    }
    let text = edited(sources, file, &mut edits);
    let name = sources.get(file).name();
    if assembly.file == file {
        together(place, files, &text, found)?;
    }
    let Some(path) = place.path().map(|_| place.root.join(name)) else {
        return Err(Refusal::new("a spec from standard input cannot be written to", "name a file"));
    };
    atomically(&path, text.as_bytes())?;
    let each = edits.iter().map(|e| format!("wrote {} for {} in {name}\n", e.class, e.path));
    Ok(each.collect())
}

fn of_choice(
    sources: &Sources,
    assembly: &Assembly,
    choice: &Choice,
) -> Result<Vec<Edit>, Refusal> {
    let path = |d: DimensionId| assembly.path(d);
    let Some(best) = choice.serving.first() else {
        return Err(Refusal::new(
            format!("no class serves for `{}`, so nothing is written", path(choice.dimensions[0])),
            "widen a limit, narrow the tolerances beside it, or state deviations of your own",
        ));
    };
    choice
        .dimensions
        .iter()
        .zip(&best.classes)
        .map(|(&d, (class, _))| match token(sources, assembly.dimension(d).line) {
            Some(at) => Ok(Edit { at, class: class.to_string(), path: path(d) }),
            None => Err(Refusal::new(
                format!(
                    "`{}` is written `{}`, without a class that could be replaced",
                    path(d),
                    assembly.dimension(d).written
                ),
                "write `?` after its nominal size first",
            )),
        })
        .collect()
}

/// Where the `?` or the class of the dimension on `line` stands.
fn token(sources: &Sources, line: Span) -> Option<Span> {
    let parsed = syntax::parse(sources.get(line.file).text(), line.file);
    parsed.tree.statements.iter().find_map(|statement| {
        let tree::Statement::Part(part) = statement else { return None };
        let stated = part.dimensions.iter().find(|d| d.span == line)?;
        match &stated.size.value {
            tree::Size::OpenClass(_, mark) => Some(*mark),
            tree::Size::Class(_, class) => Some(class.span),
            _ => None,
        }
    })
}

/// The text of a file with the edits made, last first, so that places before stay what they are.
fn edited(sources: &Sources, file: FileId, edits: &mut [Edit]) -> String {
    edits.sort_by_key(|e| std::cmp::Reverse(e.at.start));
    let mut text = sources.get(file).text().to_string();
    for edit in edits.iter() {
        text.replace_range(edit.at.range(), &edit.class);
    }
    edits.reverse();
    text
}

/// Holds the edited spec against its requirements: classes chosen one by one may not go together.
fn together(place: &Place, files: &Rooted, text: &str, found: &Selections) -> Result<(), Refusal> {
    let refuse = || {
        Refusal::new(
            "the first classes of each list do not serve together, so nothing is written",
            "write one with `--for`, then select again for the others",
        )
    };
    let assembly = model(place, text, &mut Sources::default(), files).map_err(|_| refuse())?;
    let decided = |r: usize| found.choices.iter().any(|c| c.requirements.contains(&r));
    let verdicts = evaluate(&assembly, &Options::default()).verdicts;
    let bad = verdicts.iter().any(|v| decided(v.requirement) && v.outcome != Outcome::Holds);
    if bad { Err(refuse()) } else { Ok(()) }
}
