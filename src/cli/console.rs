//! Standard input, output and errors, and what the terminal behind them can show.

use super::refusal::{Refusal, reason};
use crate::report::look::{Look, Role};
use crate::report::wrap::{visible, wrap};
use clap::builder::StyledStr;
use std::io::{IsTerminal, Read, Write};
use std::path::PathBuf;

/// Terminals narrower than this are written to as if they were this wide.
const LEAST_COLUMNS: usize = 60;
/// Wider lines are no easier to read.
const MOST_COLUMNS: usize = 100;

/// When to colour.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default, clap::ValueEnum)]
pub(crate) enum Colour {
    /// On a terminal that shows colour.
    #[default]
    Auto,
    /// Always.
    Always,
    /// Never.
    Never,
}

/// What a run is told by its surroundings.
#[derive(Debug, Clone)]
pub struct Environment {
    /// The folder that paths are relative to.
    pub folder: PathBuf,
    /// Columns of the terminal behind standard output; `None` where there is none.
    pub columns: Option<usize>,
    /// True where standard error is a terminal, so that someone may watch it.
    pub watched: bool,
    /// True where `NO_COLOR` is set and not empty.
    pub no_color: bool,
    /// True where `CLICOLOR_FORCE` is set to anything but `0`.
    pub force_color: bool,
    /// True where the terminal shows colour and more characters than ASCII.
    pub capable: bool,
    /// The day in UTC, `YYYY-MM-DD`.
    pub today: String,
}

impl Environment {
    /// The surroundings of this process.
    pub fn of_process() -> Self {
        let variable = |name: &str| std::env::var(name).unwrap_or_default();
        let output = std::io::stdout();
        let columns = output.is_terminal().then(|| {
            terminal_size::terminal_size_of(&output).map_or(80, |(columns, _)| columns.0.into())
        });
        // The first of these that is set names the character set, as in POSIX.
        let locale = ["LC_ALL", "LC_CTYPE", "LANG"].map(variable);
        let locale = locale.iter().find(|v| !v.is_empty()).map(|v| v.to_lowercase());
        let utf8 = locale.is_some_and(|l| l.contains("utf-8") || l.contains("utf8"));
        let term = variable("TERM");
        let dumb = term.is_empty() || term == "dumb";
        Environment {
            folder: std::env::current_dir().unwrap_or_else(|_| PathBuf::from(".")),
            columns,
            watched: std::io::stderr().is_terminal(),
            no_color: !variable("NO_COLOR").is_empty(),
            force_color: !matches!(variable("CLICOLOR_FORCE").as_str(), "" | "0"),
            capable: (utf8 && !dumb) || cfg!(windows),
            today: super::day::today(),
        }
    }
}

/// Standard input, output and errors of a run.
pub struct Console<'a> {
    input: &'a mut dyn Read,
    output: &'a mut dyn Write,
    errors: &'a mut dyn Write,
    environment: Environment,
    colour: Colour,
    trouble: Option<std::io::Error>,
}

impl<'a> Console<'a> {
    /// A console over these streams.
    pub fn new(
        input: &'a mut dyn Read,
        output: &'a mut dyn Write,
        errors: &'a mut dyn Write,
        environment: Environment,
    ) -> Self {
        Console { input, output, errors, environment, colour: Colour::Auto, trouble: None }
    }

    /// What the run is told by its surroundings.
    pub(crate) fn environment(&self) -> &Environment {
        &self.environment
    }

    /// Colours as the call asks.
    pub(super) fn set_colour(&mut self, colour: Colour) {
        self.colour = colour;
    }

    /// How text on standard output may look.
    pub(crate) fn look(&self) -> Look {
        let Environment { columns, no_color, force_color, capable, .. } = self.environment;
        let terminal = columns.is_some();
        let colour = match self.colour {
            Colour::Always => true,
            Colour::Never => false,
            Colour::Auto => !no_color && (force_color || terminal && capable),
        };
        Look {
            colour,
            drawing: terminal && capable,
            width: columns.unwrap_or(80).clamp(LEAST_COLUMNS, MOST_COLUMNS),
        }
    }

    /// Everything on standard input.
    ///
    /// # Errors
    /// When it cannot be read or is longer than `most` bytes.
    pub(crate) fn read_input(&mut self, most: u64) -> Result<Vec<u8>, Refusal> {
        let mut bytes = Vec::new();
        let read = self.input.take(most + 1).read_to_end(&mut bytes);
        let refuse = |why: String| {
            Refusal::new(format!("cannot read standard input: {why}"), "name a file instead")
        };
        match read {
            Err(error) => Err(refuse(reason(&error))),
            Ok(_) if bytes.len() as u64 > most => Err(refuse("it is too long".to_string())),
            Ok(_) => Ok(bytes),
        }
    }

    /// Writes to standard output. A reader that has gone away is no mistake and ends the writing;
    /// any other trouble is kept for [`Console::finish`].
    pub(crate) fn print(&mut self, text: &[u8]) {
        if self.trouble.is_none() {
            self.trouble = self.output.write_all(text).err();
        }
    }

    /// Says something on standard error.
    pub(crate) fn say(&mut self, text: &str) {
        // Nobody is left to hear that standard error cannot be written to.
        let _ = self.errors.write_all(text.as_bytes());
    }

    /// Says what is wrong and what to do about it.
    pub(crate) fn complain(&mut self, message: &str, help: Option<&str>) {
        let look = self.look();
        let mut text = String::new();
        let mut say = |role: Role, lead: &str, indent: &str, words: &str| {
            let columns = look.width - indent.len() - lead.len() - 1;
            for (i, line) in wrap(&visible(words), columns).iter().enumerate() {
                let lead = if i == 0 { look.paint(role, lead) } else { " ".repeat(lead.len()) };
                text.push_str(&format!("{indent}{lead} {line}\n"));
            }
        };
        say(Role::Bad, "gapkeep:", "", message);
        if let Some(help) = help {
            say(Role::Cure, "help:", "  ", help);
        }
        self.say(&text);
    }

    /// Prints text that carries styles.
    pub(super) fn print_styled(&mut self, text: &StyledStr) {
        let text = if self.look().colour { text.ansi().to_string() } else { text.to_string() };
        self.print(text.as_bytes());
    }

    /// Says text that carries styles on standard error.
    pub(super) fn say_styled_error(&mut self, text: &StyledStr) {
        let text = if self.look().colour { text.ansi().to_string() } else { text.to_string() };
        self.say(&text);
    }

    /// Makes sure that everything has been written.
    ///
    /// # Errors
    /// When something could not be, other than for want of a reader.
    pub(super) fn finish(&mut self) -> Result<(), Refusal> {
        let trouble = self.trouble.take().or_else(|| self.output.flush().err());
        match trouble {
            Some(error) if error.kind() != std::io::ErrorKind::BrokenPipe => Err(Refusal::new(
                format!("cannot write to standard output: {}", reason(&error)),
                "write to a file with `--out`",
            )),
            _ => Ok(()),
        }
    }
}
