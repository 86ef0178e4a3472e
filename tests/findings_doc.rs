//! The page of findings: every example on it provokes its finding, in the words that are printed
//! beside it.

use gapkeep::diagnostic::{Code, Diagnostic, Severity};
use gapkeep::evaluate::{Options, evaluate};
use gapkeep::findings::findings;
use gapkeep::resolve::{FileError, Files, resolve};
use gapkeep::source::{Source, Sources};
use std::collections::BTreeMap;

/// What no text of a spec provokes, in the order of the codes' names, and why.
const WITHOUT_EXAMPLE: [(Code, &str); 5] = [
    (Code::FileUnreadable, "the system refuses a file; provoked below"),
    (Code::NotText, "bytes that are no text; provoked below"),
    (Code::RecordMissing, "asked for by `--recorded`; provoked in tests/cli/record.rs"),
    (Code::RecordStale, "asked for by `--recorded`; provoked in tests/cli/record.rs"),
    (Code::ThinMargin, "asked for by `--warn-below`; provoked in tests/cli/check.rs"),
];

/// Files as the page gives them, or as the system refuses them.
#[derive(Default)]
struct Given(BTreeMap<String, Result<Vec<u8>, FileError>>);

impl Files for Given {
    fn read(&self, path: &str) -> Result<Vec<u8>, FileError> {
        self.0.get(path).cloned().unwrap_or(Err(FileError::Missing))
    }
}

/// Everything said of a spec on the first day of 2026.
fn reported(text: &str, files: &Given) -> Vec<Diagnostic> {
    let mut sources = Sources::default();
    let root = sources.add(Source::new("spec.gap", text));
    let resolved = resolve(root, &mut sources, files);
    let mut found = resolved.diagnostics;
    let sound = found.iter().all(|d| d.severity != Severity::Error);
    if let Some(assembly) = resolved.assembly.filter(|_| sound) {
        let evaluation = evaluate(&assembly, &Options::default());
        found.extend(findings(&assembly, &evaluation, "2026-01-01"));
    }
    found
}

/// A finding as the page prints it.
fn printed(finding: &Diagnostic) -> String {
    let mut out = format!("{}: {}\n", finding.severity.word(), finding.message);
    if !finding.primary.text.is_empty() {
        out.push_str(&format!("  {}\n", finding.primary.text));
    }
    if let Some(help) = &finding.help {
        out.push_str(&format!("  help: {help}\n"));
    }
    out
}

/// A section of the page: its heading and its fenced blocks, each with its info string.
struct Section<'a> {
    code: &'a str,
    blocks: Vec<(&'a str, &'a str)>,
}

fn sections(page: &str) -> Vec<Section<'_>> {
    let mut found = Vec::new();
    // Groups are headings of the first level, so that each code has the one of its own.
    for part in page.split("\n## ").skip(1) {
        let Some((code, _)) = part.split_once('\n') else { continue };
        let blocks = part
            .split("\n```")
            .enumerate()
            .filter(|(at, _)| at % 2 == 1)
            .filter_map(|(_, block)| block.split_once('\n'))
            .collect();
        found.push(Section { code, blocks });
    }
    found
}

fn page() -> String {
    let path = concat!(env!("CARGO_MANIFEST_DIR"), "/docs/findings.md");
    std::fs::read_to_string(path).unwrap()
}

#[test]
fn every_example_provokes_its_finding_in_these_words() {
    let page = page();
    let mut without = Vec::new();
    let mut wrong = Vec::new();
    for section in sections(&page) {
        let mut files = Given::default();
        let mut spec = None;
        let mut words = None;
        for (info, text) in &section.blocks {
            let text = format!("{text}\n");
            match info.split_once(' ') {
                Some((_, name)) => {
                    files.0.insert(name.to_string(), Ok(text.into_bytes()));
                }
                None if *info == "gap" => spec = Some(text),
                None => words = Some(text),
            }
        }
        let (Some(spec), Some(words)) = (spec, words) else {
            without.push(section.code);
            continue;
        };
        let found = reported(&spec, &files);
        let said: Vec<String> =
            found.iter().filter(|d| d.code.text() == section.code).map(printed).collect();
        if !said.contains(&words) {
            let all: String =
                found.iter().map(|d| format!("[{}] {}", d.code, printed(d))).collect();
            wrong.push(format!("`{}`: the page prints\n{words}found\n{all}", section.code));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
    without.sort_unstable();
    let known: Vec<&str> = WITHOUT_EXAMPLE.iter().map(|(code, _)| code.text()).collect();
    assert_eq!(without, known, "sections without an example");
}

#[test]
fn the_page_has_the_codes_and_no_others() {
    let page = page();
    let mut found: Vec<&str> = sections(&page).iter().map(|s| s.code).collect();
    let mut known: Vec<&str> = Code::ALL.iter().map(|c| c.text()).collect();
    found.sort_unstable();
    known.sort_unstable();
    assert_eq!(found, known);
}

/// A text cannot show bytes that are none, nor a file that the system keeps to itself.
#[test]
fn what_only_bytes_and_files_provoke() {
    let spec = "assembly \"Plate\"\ncondition day 20\nuse \"parts.gap\"\n";
    let provoked = |answer: Result<Vec<u8>, FileError>| -> Vec<&'static str> {
        let files = Given(BTreeMap::from([("parts.gap".to_string(), answer)]));
        reported(spec, &files).iter().map(|d| d.code.text()).collect()
    };
    assert_eq!(provoked(Ok(vec![0xff, 0xfe, 0x70])), ["not-text"]);
    assert_eq!(provoked(Ok(b"note \"a\0b\"\n".to_vec())), ["not-text"]);
    let refused = FileError::Unreadable("permission denied".to_string());
    assert_eq!(provoked(Err(refused)), ["file-unreadable"]);
}
