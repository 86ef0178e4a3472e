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

/// Every spec of the project, with its path.
fn all_specs() -> Vec<(String, String)> {
    let mut found = specs();
    let mut folders = vec![place("../specs")];
    while let Some(folder) = folders.pop() {
        for entry in std::fs::read_dir(folder).expect("the folder is part of the project") {
            let path = entry.expect("a readable entry").path();
            if path.is_dir() {
                folders.push(path);
            } else if path.extension().is_some_and(|extension| extension == "gap") {
                let text = std::fs::read_to_string(&path).expect("a readable spec");
                found.push((path.to_string_lossy().into_owned(), text));
            }
        }
    }
    found
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
