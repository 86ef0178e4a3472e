//! `materials`: the library, searched, listed, or one material in full.

use super::console::Console;
use super::refusal::{Outcome, Refusal};
use crate::materials::Library;
use crate::report::library::{detail, list};
use clap::Args;

/// Arguments of `materials`.
#[derive(Debug, Args)]
#[command(after_help = "Examples:\n  gapkeep materials                  the whole library\n  \
    gapkeep materials aluminium        every material that has the word\n  \
    gapkeep materials steel_c45        its values, ranges and sources")]
pub(super) struct MaterialsArguments {
    /// A name, or a word in a name, a title, a family or a designation.
    #[arg(value_name = "WORD")]
    word: Option<String>,
}

/// Lists materials or shows one.
pub(super) fn run(
    arguments: &MaterialsArguments,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let library = Library::builtin();
    let look = console.look();
    let Some(word) = &arguments.word else {
        let all: Vec<_> = library.all().collect();
        console.print(list(&all, look).as_bytes());
        return Ok(Outcome::Holds);
    };
    let found = match library.get(word) {
        Some(material) => vec![material],
        None => library.search(word),
    };
    let text = match found.as_slice() {
        [] => {
            return Err(Refusal::new(
                format!("no material has `{word}` in its name, title, family or designations"),
                "`gapkeep materials` lists all of them; a spec may state its own with `material`",
            ));
        }
        [one] => detail(one, look),
        several => list(several, look),
    };
    console.print(text.as_bytes());
    Ok(Outcome::Holds)
}
