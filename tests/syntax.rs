//! Text to tree: whole specs, mistakes, hostile input, layout, and the language page.

mod hostile;
mod mistakes;
mod page;
mod tidy;
mod whole;

use std::path::{Path, PathBuf};

use gapkeep::source::Source;
use gapkeep::span::FileId;
use gapkeep::syntax::{Parsed, parse};

/// A path below the tests of this subject.
fn place(relative: &str) -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("tests").join(relative)
}

/// The specs that parse without a word, with their names, in the order of their names.
fn specs() -> Vec<(String, String)> {
    let folder =
        std::fs::read_dir(place("syntax/specs")).expect("the folder is part of the project");
    let mut specs: Vec<(String, String)> = folder
        .map(|entry| entry.expect("a readable entry").path())
        .map(|path| {
            let name = path.file_name().expect("a file").to_string_lossy().into_owned();
            (name, std::fs::read_to_string(path).expect("a readable spec"))
        })
        .collect();
    specs.sort();
    assert!(specs.len() >= 8, "specs are missing");
    specs
}

fn read(text: &str) -> Parsed {
    parse(text, FileId(0))
}

/// What is wrong with a text, one finding a line.
fn findings(text: &str) -> String {
    let source = Source::new("spec.gap", text);
    let mut out = String::new();
    for finding in read(text).diagnostics {
        let (line, column) = source.position(finding.primary.span.start as usize);
        out.push_str(&format!("{} {line}:{column} {}", finding.code, finding.message));
        for label in &finding.secondary {
            let (line, column) = source.position(label.span.start as usize);
            out.push_str(&format!(" | {line}:{column} {}", label.text));
        }
        if let Some(help) = &finding.help {
            out.push_str(&format!(" | help: {help}"));
        }
        out.push('\n');
    }
    out
}
