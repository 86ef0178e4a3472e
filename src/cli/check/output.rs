//! Formats of a report, and which goes where.

use super::CheckArguments;
use crate::cli::console::Console;
use crate::cli::refusal::Refusal;
use crate::cli::write::atomically;
use crate::report::look::Look;
use crate::report::text::{Extent, render};
use crate::report::{Report, json};
use clap::{ArgMatches, ValueEnum};
use std::path::{Path, PathBuf};

/// A format of a report.
#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
pub(super) enum Format {
    /// For people.
    Text,
    /// For programs.
    Json,
    /// As JSON, in YAML.
    Yaml,
}

impl Format {
    /// The format that a file's ending tells.
    fn of_ending(path: &Path) -> Option<Format> {
        match path.extension()?.to_str()? {
            "txt" | "text" => Some(Format::Text),
            "json" => Some(Format::Json),
            "yaml" | "yml" => Some(Format::Yaml),
            _ => None,
        }
    }
}

/// One rendering and where it goes.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Output {
    /// The format.
    pub(super) format: Format,
    /// The file; standard output if absent.
    pub(super) file: Option<PathBuf>,
}

impl Output {
    /// Renders and writes.
    pub(super) fn write(
        &self,
        report: &Report,
        extent: Extent,
        console: &mut Console<'_>,
    ) -> Result<(), Refusal> {
        let look = if self.file.is_some() { Look::PLAIN } else { console.look() };
        let text = match self.format {
            Format::Text => render(report, extent, look),
            Format::Json => json::json(report),
            Format::Yaml => json::yaml(report),
        };
        match &self.file {
            None => console.print(text.as_bytes()),
            Some(file) => {
                let file = console.environment().folder.join(file);
                atomically(&file, text.as_bytes())?;
            }
        }
        Ok(())
    }
}

/// Pairs each `--out` with the `--as` before it; one without takes its format from its ending.
pub(super) fn outputs(
    arguments: &CheckArguments,
    given: Option<&ArgMatches>,
) -> Result<Vec<Output>, Refusal> {
    let places = |name: &str| -> Vec<usize> {
        given.and_then(|g| g.indices_of(name)).map(Iterator::collect).unwrap_or_default()
    };
    let formats = places("formats").into_iter().zip(&arguments.formats);
    let files = places("out").into_iter().zip(&arguments.out);
    let mut said: Vec<(usize, Said<'_>)> = formats.map(|(at, f)| (at, Said::Format(*f))).collect();
    said.extend(files.map(|(at, file)| (at, Said::File(file))));
    said.sort_by_key(|(at, _)| *at);
    let mut outputs: Vec<Output> = Vec::new();
    let mut open = false;
    for (_, said) in said {
        match said {
            Said::Format(format) => {
                outputs.push(Output { format, file: None });
                open = true;
            }
            Said::File(file) => match outputs.last_mut().filter(|_| open) {
                Some(output) => {
                    output.file = Some(file.to_path_buf());
                    open = false;
                }
                None => {
                    let format = Format::of_ending(file).ok_or_else(|| {
                        Refusal::new(
                            format!("`{}` does not tell its format", file.display()),
                            "write `--as FORMAT` before its `--out`",
                        )
                    })?;
                    outputs.push(Output { format, file: Some(file.to_path_buf()) });
                }
            },
        }
    }
    if outputs.is_empty() {
        outputs.push(Output { format: Format::Text, file: None });
    }
    if outputs.iter().filter(|o| o.file.is_none()).count() > 1 {
        return Err(Refusal::new(
            "several formats would go to standard output",
            "give all but one an `--out FILE` of its own, after its `--as`",
        ));
    }
    Ok(outputs)
}

enum Said<'a> {
    Format(Format),
    File(&'a Path),
}
