//! Specs with one mistake each, named after the code that they provoke (`code.gap` or
//! `code--which.gap`), with everything said about them in a snapshot beside them.

use gapkeep::diagnostic::{Diagnostic, Label, Severity};
use gapkeep::evaluate::{Options, evaluate};
use gapkeep::findings::findings;
use gapkeep::model::{ConditionId, ExprKind, SubjectKind};
use gapkeep::resolve::{FileError, Files, Resolved, resolve};
use gapkeep::source::{Source, Sources};
use gapkeep::span::FileId;
use std::fmt::Write;
use std::fs;
use std::path::{Path, PathBuf};

/// The files below a folder.
struct Folder(PathBuf);

impl Files for Folder {
    fn read(&self, path: &str) -> Result<Vec<u8>, FileError> {
        fs::read(self.0.join(path)).map_err(|_| FileError::Missing)
    }
}

fn folder(name: &str) -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("tests").join(name)
}

/// The specs of a folder, in the order of their names.
fn specs(folder: &Path) -> Vec<PathBuf> {
    let mut found: Vec<PathBuf> = fs::read_dir(folder)
        .unwrap()
        .map(|entry| entry.unwrap().path())
        .filter(|path| path.extension().is_some_and(|e| e == "gap"))
        .collect();
    found.sort();
    found
}

fn resolved(path: &Path) -> (Resolved, Sources, FileId) {
    let mut sources = Sources::default();
    let name = path.file_name().unwrap().to_string_lossy().into_owned();
    let root = sources.add(Source::new(name, fs::read_to_string(path).unwrap()));
    let files = Folder(path.parent().unwrap().to_path_buf());
    let resolved = resolve(root, &mut sources, &files);
    (resolved, sources, root)
}

/// Everything said, with line and column of each place.
fn render(diagnostics: &[Diagnostic], sources: &Sources, root: FileId) -> String {
    let mut out = String::new();
    let place = |label: &Label| {
        let source = sources.get(label.span.file);
        let (line, column) = source.position(label.span.start as usize);
        let text = sources.slice(label.span).lines().next().unwrap_or("").trim_end();
        let file = if label.span.file == root { "" } else { source.name() };
        let blank = if label.text.is_empty() { "" } else { "  " };
        format!("{file} {line}:{column} `{text}`{blank}{}", label.text).trim_start().to_string()
    };
    for d in diagnostics {
        let _ = writeln!(out, "{} [{}] {}", d.severity.word(), d.code, d.message);
        let _ = writeln!(out, "    at {}", place(&d.primary));
        for label in &d.secondary {
            let _ = writeln!(out, "    see {}", place(label));
        }
        if let Some(help) = &d.help {
            let _ = writeln!(out, "    help: {help}");
        }
    }
    out
}

/// The day that concessions are held against.
const TODAY: &str = "2026-01-01";

/// What resolving reports, and of a spec without mistakes what its figures give cause to say.
fn reported(resolved: Resolved) -> Vec<Diagnostic> {
    let mut found = resolved.diagnostics;
    let sound = found.iter().all(|d| d.severity != Severity::Error);
    if let Some(assembly) = resolved.assembly.filter(|_| sound) {
        let evaluation = evaluate(&assembly, &Options::default());
        found.extend(findings(&assembly, &evaluation, TODAY));
    }
    found
}

/// Holds every spec of a phase against its name and its snapshot; `also` are codes that may come
/// with any other.
fn check(phase: &str, also: &[&str], report: fn(Resolved) -> Vec<Diagnostic>) {
    let place = folder(&format!("bad/{phase}"));
    let specs = specs(&place);
    assert!(!specs.is_empty(), "there is no spec in {}", place.display());
    let mut wrong = Vec::new();
    for path in specs {
        let stem = path.file_stem().unwrap().to_string_lossy().into_owned();
        let code = stem.split("--").next().unwrap();
        let (resolved, sources, root) = resolved(&path);
        let found = &report(resolved);
        if !found.iter().any(|d| d.code.text() == code) {
            wrong.push(format!("{stem}: `{code}` is not found"));
        }
        // One mistake gives one report: nothing that follows from it is reported besides.
        let errors = found.iter().filter(|d| d.severity == Severity::Error);
        for error in errors.filter(|d| d.code.text() != code && !also.contains(&d.code.text())) {
            wrong.push(format!("{stem}: also `{}`: {}", error.code, error.message));
        }
        let text = fs::read_to_string(&path).unwrap();
        let shown = format!("{}\n\n{}", text.trim_end(), render(found, &sources, root));
        let mut settings = insta::Settings::clone_current();
        settings.set_snapshot_path(&place);
        settings.set_prepend_module_to_snapshot(false);
        settings.bind(|| insta::assert_snapshot!(stem, shown));
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn mistakes_of_meaning_are_reported_once_with_a_way_out() {
    check("resolve", &[], |resolved| resolved.diagnostics);
}

#[test]
fn what_the_figures_give_cause_to_say_is_said() {
    // A concession stands beside the limit that it is about, and one range can break two.
    check("evaluate", &["gap-below-limit"], reported);
}

#[test]
fn three_mistakes_give_three_reports() {
    let (resolved, _, _) = resolved(&folder("examples/three-mistakes.gap"));
    let codes: Vec<&str> = resolved.diagnostics.iter().map(|d| d.code.text()).collect();
    assert_eq!(codes, ["unknown-unit", "unknown-material", "kinds-differ", "unknown-dimension"]);
    // What none of them touches can still be evaluated.
    let assembly = resolved.assembly.unwrap();
    let subjects: Vec<&str> = assembly.subjects.iter().map(|s| s.name.as_str()).collect();
    assert_eq!(subjects, ["depth_left"]);
    assert_eq!(assembly.requirements.len(), 1);
}

/// A spec given as a text, with no other file.
fn of_text(text: &str) -> Resolved {
    let mut sources = Sources::default();
    let root = sources.add(Source::new("a.gap", text));
    resolve(root, &mut sources, &Folder(folder("examples")))
}

#[test]
fn what_rests_on_a_mistake_is_not_in_the_model() {
    let resolved = of_text(
        "assembly \"Sensor in a flange\"
         condition day 20
         condition cold -300
         condition warm_up 60
         part flange of aluminium_6061_t6 { depth = 12 ±0.1; load_path = 5 ±0.1 load 2 kN over 9 mm2 at cold }
         part sensor of stainless_304 { height = 9 ±0.05; collar = 9 metre ±0.05 }
         gap collar_left = flange.depth - sensor.collar { require >= 0.05 }
         gap twice_left = 2 * collar_left { require >= 0.05 }
         gap path_left = flange.load_path - 1 mm { require >= 0.05 }
         gap left = flange.depth - sensor.height { require >= 0.05; require <= 9 at cold }
         result shift = change(left from warm_up) { require <= 1 }",
    );
    let errors: Vec<&str> = resolved
        .diagnostics
        .iter()
        .filter(|d| d.severity == Severity::Error)
        .map(|d| d.code.text())
        .collect();
    assert_eq!(errors, ["below-absolute-zero", "unknown-unit"]);
    let assembly = resolved.assembly.unwrap();
    let conditions: Vec<&str> = assembly.conditions.iter().map(|c| c.name.as_str()).collect();
    assert_eq!(conditions, ["day", "warm_up"]);
    let subjects: Vec<&str> = assembly.subjects.iter().map(|s| s.name.as_str()).collect();
    assert_eq!(subjects, ["left", "shift"]);
    // The requirement at the wrong condition is gone, the others stand at those that are left.
    let at: Vec<Vec<u32>> =
        assembly.requirements.iter().map(|r| r.conditions.iter().map(|c| c.0).collect()).collect();
    assert_eq!(at, [[0, 1], [0, 1]]);
    let SubjectKind::Result(shift) = &assembly.subjects[1].kind else { panic!("a result") };
    let ExprKind::Change { from, .. } = &shift.kind else { panic!("a change") };
    assert_eq!(*from, Some(ConditionId(1)));
}

#[test]
fn names_that_build_on_each_other_without_end_are_refused() {
    let mut text = String::from(
        "assembly \"Stack\"\ncondition day 20\npart a of steel_c45 { x = 1 ±0.1 }\nlet n0 = a.x\n",
    );
    for i in 1..3000 {
        let _ = writeln!(text, "let n{i} = (a.x + n{})", i - 1);
    }
    text.push_str("gap left = n2999 { require >= 0 }\n");
    let resolved = of_text(&text);
    assert!(resolved.diagnostics.iter().any(|d| d.code.text() == "expression-too-long"));
    // One name too many is one finding, not one for everybody who builds on it.
    assert!(resolved.diagnostics.len() < 20, "{}", resolved.diagnostics.len());
}

#[test]
fn the_specs_of_the_project_resolve_without_an_error() {
    let mut count = 0;
    for place in ["assemblies", "failing"] {
        for path in specs(&folder(&format!("../specs/{place}"))) {
            let (resolved, sources, root) = resolved(&path);
            let errors: Vec<Diagnostic> = resolved
                .diagnostics
                .into_iter()
                .filter(|d| d.severity == Severity::Error)
                .collect();
            assert!(errors.is_empty(), "{}\n{}", path.display(), render(&errors, &sources, root));
            assert!(resolved.assembly.is_some());
            count += 1;
        }
    }
    assert!(count >= 12);
}

#[test]
fn the_examples_resolve_without_an_error() {
    let mut count = 0;
    for path in specs(&folder("examples/whole")) {
        let (resolved, sources, root) = resolved(&path);
        let errors: Vec<Diagnostic> =
            resolved.diagnostics.into_iter().filter(|d| d.severity == Severity::Error).collect();
        assert!(errors.is_empty(), "{}\n{}", path.display(), render(&errors, &sources, root));
        let assembly = resolved.assembly.unwrap();
        assert!(!assembly.requirements.is_empty());
        count += 1;
    }
    assert_eq!(count, 7);
}
