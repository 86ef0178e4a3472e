//! The commands: the only room with files, environment, colour and exit status.
//!
//! One file a command. Each returns whether what was asked holds; what is wrong with the call or a
//! file is a [`Refusal`], said on standard error with a way out. Nothing but the result goes to
//! standard output.

mod arguments;
mod check;
mod completions;
mod console;
mod day;
mod files;
mod glob;
mod limits;
mod materials;
mod pipeline;
mod progress;
mod record;
mod refusal;
mod select;
mod tidy;
mod write;

pub use arguments::command;
pub use console::{Console, Environment};

use arguments::{Cli, Command};
use clap::FromArgMatches;
use refusal::{Outcome, Refusal};
use std::ffi::OsString;

/// Exit status when everything that was asked holds.
pub const HOLDS: u8 = 0;
/// Exit status when some requirement fails or is undecided.
pub const FAILS: u8 = 1;
/// Exit status when a spec, a file or the call is wrong.
pub const WRONG: u8 = 2;

/// Runs the program with `arguments` (the program's own name first) and gives its exit status.
pub fn run(arguments: impl IntoIterator<Item = OsString>, console: &mut Console<'_>) -> u8 {
    let parsed = command().try_get_matches_from(arguments).and_then(|matches| {
        let cli = Cli::from_arg_matches(&matches)?;
        Ok((matches, cli))
    });
    let status = match parsed {
        Ok((matches, cli)) => {
            console.set_colour(cli.color);
            let given = matches.subcommand().map(|(_, given)| given);
            match dispatch(&cli.command, given, console) {
                Ok(Outcome::Holds) => HOLDS,
                Ok(Outcome::Fails) => FAILS,
                Ok(Outcome::Wrong) => WRONG,
                Err(refusal) => refuse(&refusal, console),
            }
        }
        Err(error) => usage(&error, console),
    };
    match console.finish() {
        Ok(()) => status,
        Err(refusal) => refuse(&refusal, console),
    }
}

fn dispatch(
    command: &Command,
    given: Option<&clap::ArgMatches>,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    match command {
        Command::Check(arguments) => check::run(arguments, given, console),
        Command::Limits(arguments) => limits::run(arguments, console),
        Command::Materials(arguments) => materials::run(arguments, console),
        Command::Record(arguments) => record::run(arguments, console),
        Command::Select(arguments) => select::run(arguments, console),
        Command::Tidy(arguments) => tidy::run(arguments, console),
        Command::Completions(arguments) => completions::completions(arguments, console),
        Command::Man => completions::man(console),
    }
}

fn refuse(refusal: &Refusal, console: &mut Console<'_>) -> u8 {
    console.complain(&refusal.message, refusal.help.as_deref());
    WRONG
}

/// What the parser of arguments has to say: help and version are results, all else a wrong call.
fn usage(error: &clap::Error, console: &mut Console<'_>) -> u8 {
    if error.use_stderr() {
        console.say_styled_error(&error.render());
        WRONG
    } else {
        console.print_styled(&error.render());
        HOLDS
    }
}
