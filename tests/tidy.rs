//! The order of the rooms, and what every file of the project keeps to.

use gapkeep::diagnostic::Code;
use std::collections::BTreeSet;
use std::fs;
use std::path::{Path, PathBuf};

/// The rooms from the ground up, with the rooms each may use.
const ROOMS: &[(&str, &[&str])] = &[
    ("span", &[]),
    ("source", &["span"]),
    ("diagnostic", &["span"]),
    ("syntax", &["span", "source", "diagnostic"]),
    ("numeric", &[]),
    ("units", &["numeric"]),
    ("standards", &["units", "numeric"]),
    ("materials", &["units", "numeric"]),
    ("mechanics", &["materials", "units", "numeric"]),
    ("model", &["mechanics", "materials", "standards", "units", "numeric", "span"]),
    (
        "resolve",
        &[
            "model",
            "mechanics",
            "materials",
            "standards",
            "units",
            "numeric",
            "syntax",
            "diagnostic",
            "source",
            "span",
        ],
    ),
    ("evaluate", &["model", "mechanics", "materials", "standards", "units", "numeric"]),
    (
        "findings",
        &["evaluate", "model", "materials", "standards", "units", "numeric", "diagnostic", "span"],
    ),
    (
        "report",
        &[
            "findings",
            "evaluate",
            "model",
            "materials",
            "standards",
            "units",
            "numeric",
            "diagnostic",
            "source",
            "span",
        ],
    ),
    (
        "cli",
        &[
            "report",
            "findings",
            "evaluate",
            "resolve",
            "model",
            "mechanics",
            "materials",
            "standards",
            "units",
            "numeric",
            "syntax",
            "diagnostic",
            "source",
            "span",
        ],
    ),
];

/// Longest file, in lines.
const LONGEST: usize = 500;

fn root() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR"))
}

fn files(folder: &Path, extension: &str) -> Vec<PathBuf> {
    let mut found = Vec::new();
    let mut open = vec![folder.to_path_buf()];
    while let Some(folder) = open.pop() {
        for entry in fs::read_dir(&folder).unwrap() {
            let path = entry.unwrap().path();
            if path.is_dir() {
                open.push(path);
            } else if path.extension().is_some_and(|e| e == extension) {
                found.push(path);
            }
        }
    }
    found.sort();
    found
}

fn name(path: &Path) -> String {
    path.strip_prefix(root()).unwrap().to_string_lossy().replace('\\', "/")
}

/// The room a source file belongs to; none for the crate's own two roots.
fn room(path: &Path) -> Option<String> {
    let name = name(path);
    let first = name.strip_prefix("src/")?.split('/').next()?.trim_end_matches(".rs").to_string();
    (!matches!(first.as_str(), "lib" | "main")).then_some(first)
}

/// The rooms that a text names with `crate::`, one by one or in braces.
fn used(text: &str) -> BTreeSet<String> {
    let mut rooms = BTreeSet::new();
    for line in text.lines().filter(|l| !l.trim_start().starts_with("//")) {
        for (at, _) in line.match_indices("crate::") {
            let rest = &line[at + "crate::".len()..];
            let names: Vec<&str> = match rest.strip_prefix('{') {
                Some(list) => {
                    list.split(',').map(|n| n.trim().trim_matches(['{', '}', ';'])).collect()
                }
                None => vec![rest],
            };
            for n in names {
                let word: String =
                    n.chars().take_while(|c| c.is_alphanumeric() || *c == '_').collect();
                if !word.is_empty() {
                    rooms.insert(word);
                }
            }
        }
    }
    rooms
}

#[test]
fn a_room_uses_only_those_below_it() {
    let mut wrong = Vec::new();
    for path in files(&root().join("src"), "rs") {
        let Some(own) = room(&path) else { continue };
        let Some((_, allowed)) = ROOMS.iter().find(|(r, _)| *r == own) else {
            wrong.push(format!("{}: no room `{own}` is listed", name(&path)));
            continue;
        };
        let text = fs::read_to_string(&path).unwrap();
        for other in used(&text) {
            if other != own && !allowed.contains(&other.as_str()) {
                wrong.push(format!("{}: `{own}` must not know `{other}`", name(&path)));
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn the_order_of_the_rooms_is_an_order() {
    for (at, (room, allowed)) in ROOMS.iter().enumerate() {
        for other in *allowed {
            let below = ROOMS[..at].iter().any(|(r, _)| r == other);
            assert!(below, "`{room}` may use `{other}`, which does not stand below it");
        }
    }
}

#[test]
fn files_are_short_and_say_what_they_own() {
    let mut wrong = Vec::new();
    let sources =
        files(&root().join("src"), "rs").into_iter().chain(files(&root().join("tests"), "rs"));
    for path in sources {
        let text = fs::read_to_string(&path).unwrap();
        let lines = text.lines().count();
        if lines > LONGEST {
            wrong.push(format!("{}: {lines} lines", name(&path)));
        }
        if !text.starts_with("//!") {
            wrong.push(format!("{}: does not begin with `//!`", name(&path)));
        }
        if text.lines().any(|l| l.trim_start().starts_with("use ") && l.contains("::*")) {
            wrong.push(format!("{}: imports everything", name(&path)))
        }
        if path.file_name().is_some_and(|f| f == "mod.rs") {
            wrong.push(format!("{}: a room's file stands beside its folder", name(&path)));
        }
    }
    // A module of unit tests sees its parent whole; that is what it is for.
    wrong.retain(|w| !w.ends_with("imports everything") || !only_tests_import_all(w));
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

fn only_tests_import_all(complaint: &str) -> bool {
    let path = root().join(complaint.split(':').next().unwrap());
    let text = fs::read_to_string(path).unwrap();
    text.lines()
        .filter(|l| l.trim_start().starts_with("use ") && l.contains("::*"))
        .all(|l| matches!(l.trim(), "use super::*;" | "use proptest::prelude::*;"))
}

/// What no text of a spec provokes, but bytes, files or the call; `tests/findings_doc.rs` says where
/// each is.
const BY_CALL: [Code; 5] =
    [Code::NotText, Code::FileUnreadable, Code::RecordMissing, Code::RecordStale, Code::ThinMargin];

#[test]
fn every_code_is_explained_and_provoked() {
    let explained = fs::read_to_string(root().join("docs/findings.md")).unwrap();
    let provoked: BTreeSet<String> = files(&root().join("tests/bad"), "gap")
        .iter()
        .map(|p| p.file_stem().unwrap().to_string_lossy().into_owned())
        .map(|stem| stem.split("--").next().unwrap().to_string())
        .collect();
    let mut missing = Vec::new();
    for code in Code::ALL {
        if !explained.contains(&format!("\n## {}\n", code.text())) {
            missing.push(format!("docs/findings.md has no section `{}`", code.text()));
        }
        if !provoked.contains(code.text()) && !BY_CALL.contains(code) {
            missing.push(format!("tests/bad has no spec that provokes `{}`", code.text()));
        }
    }
    assert!(missing.is_empty(), "{}", missing.join("\n"));
}

#[test]
fn nothing_below_the_program_does_io() {
    let mut wrong = Vec::new();
    for path in files(&root().join("src"), "rs") {
        if matches!(room(&path).as_deref(), Some("cli") | None) {
            continue;
        }
        let text = fs::read_to_string(&path).unwrap();
        for word in ["std::fs", "std::env", "std::io", "std::process", "std::time", "std::net"] {
            if text.contains(word) {
                wrong.push(format!("{}: uses `{word}`", name(&path)));
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}
