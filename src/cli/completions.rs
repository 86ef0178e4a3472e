//! `completions` and `man`: made from the one definition of the command line.

use super::arguments::command;
use super::console::Console;
use super::refusal::{Outcome, Refusal};
use clap::Args;
use clap_complete::Shell;

/// Arguments of `completions`.
#[derive(Debug, Args)]
#[command(after_help = "Examples:\n  \
    gapkeep completions bash > ~/.local/share/bash-completion/completions/gapkeep\n  \
    gapkeep completions fish > ~/.config/fish/completions/gapkeep.fish")]
pub(super) struct CompletionsArguments {
    /// The shell.
    shell: Shell,
}

/// Writes completions for a shell.
pub(super) fn completions(
    arguments: &CompletionsArguments,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let mut text = Vec::new();
    clap_complete::generate(arguments.shell, &mut command(), "gapkeep", &mut text);
    console.print(&text);
    Ok(Outcome::Holds)
}

/// Writes the manual page: the program, then each command.
pub(super) fn man(console: &mut Console<'_>) -> Result<Outcome, Refusal> {
    let mut text = Vec::new();
    let mut program = command();
    program.build();
    let commands: Vec<clap::Command> = program.get_subcommands().cloned().collect();
    // Writing to memory does not fail.
    let _ = clap_mangen::Man::new(program).render(&mut text);
    for command in commands {
        let title = format!("gapkeep {}", command.get_name()).to_uppercase();
        text.extend_from_slice(format!(".SH \"{title}\"\n").as_bytes());
        let man = clap_mangen::Man::new(command);
        let _ = man.render_synopsis_section(&mut text);
        let _ = man.render_description_section(&mut text);
        let _ = man.render_options_section(&mut text);
    }
    console.print(&text);
    Ok(Outcome::Holds)
}
