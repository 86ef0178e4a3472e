//! What can be said on the command line. Completions and the man page are made from it.

use super::check::CheckArguments;
use super::completions::CompletionsArguments;
use super::console::Colour;
use super::limits::LimitsArguments;
use super::materials::MaterialsArguments;
use super::record::RecordArguments;
use super::select::SelectArguments;
use super::tidy::TidyArguments;
use clap::{CommandFactory, Parser, Subcommand};

/// The command line.
#[derive(Debug, Parser)]
#[command(
    name = "gapkeep",
    version,
    about = "Proves how parts of different materials fit together at every temperature",
    long_about = "Reads an assembly from a plain-text `.gap` file, computes every fit, gap, joint \
                  and restraint at every stated temperature, and says which requirements hold, \
                  which do not, by how much, and what would mend them.",
    after_help = "Exit status: 0 every requirement holds, 1 one fails or is undecided, 2 a spec, a \
                  file or the call is wrong.\n\n\
                  Examples:\n  gapkeep check specs/\n  gapkeep check spindle.gap --detail\n  \
                  gapkeep limits 42 H7/g6\n\n\
                  `gapkeep COMMAND --help` shows examples of each command.",
    max_term_width = 100,
    disable_help_subcommand = true
)]
pub(super) struct Cli {
    /// When to colour.
    #[arg(
        long,
        global = true,
        value_name = "WHEN",
        default_value = "auto",
        hide_default_value = true
    )]
    pub(super) color: Colour,
    /// What to do.
    #[command(subcommand)]
    pub(super) command: Command,
}

/// What to do.
#[derive(Debug, Subcommand)]
pub(super) enum Command {
    /// Check specs: findings and a summary.
    Check(CheckArguments),
    /// Write the figures of each spec beside it, for review in a diff.
    Record(RecordArguments),
    /// Show limits of size and the fit of ISO 286 classes.
    Limits(LimitsArguments),
    /// Look into the library of materials.
    Materials(MaterialsArguments),
    /// Find classes, nominals and tolerances that meet every requirement.
    Select(SelectArguments),
    /// Give specs their one layout.
    Tidy(TidyArguments),
    /// Write completions for a shell.
    Completions(CompletionsArguments),
    /// Write the manual page.
    Man,
}

/// The definition of the command line.
pub fn command() -> clap::Command {
    Cli::command()
}
