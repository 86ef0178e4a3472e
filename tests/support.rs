//! Runs a spec that stands in a test, from text to figures.

use gapkeep::diagnostic::Diagnostic;
use gapkeep::evaluate::outcome::{Figure, Verdict};
use gapkeep::evaluate::scene::Response;
use gapkeep::evaluate::{Detail, Evaluation, Options, evaluate, respond};
use gapkeep::findings::findings;
use gapkeep::model::{Assembly, Quantity};
use gapkeep::resolve::{FileError, Files, resolve};
use gapkeep::source::{Source, Sources};
use std::collections::BTreeMap;

/// Files that a spec reads, by name.
#[derive(Default)]
pub(crate) struct Folder(pub(crate) BTreeMap<String, String>);

impl Files for Folder {
    fn read(&self, path: &str) -> Result<Vec<u8>, FileError> {
        self.0.get(path).map(|text| text.clone().into_bytes()).ok_or(FileError::Missing)
    }
}

/// A spec that has been evaluated.
pub(crate) struct Run {
    pub(crate) assembly: Assembly,
    pub(crate) evaluation: Evaluation,
    pub(crate) diagnostics: Vec<Diagnostic>,
}

/// Evaluates a spec without files; panics with what was reported if it has mistakes.
pub(crate) fn run(text: &str) -> Run {
    run_with(text, &Folder::default())
}

/// Evaluates a spec with files.
pub(crate) fn run_with(text: &str, files: &Folder) -> Run {
    let (assembly, mut diagnostics) = resolved(text, files);
    let options = Options { detail: Detail::Full, ..Options::default() };
    let evaluation = evaluate(&assembly, &options);
    diagnostics.extend(findings(&assembly, &evaluation, "2026-01-01"));
    Run { assembly, evaluation, diagnostics }
}

/// Resolves a spec without files, and evaluates nothing of it.
pub(crate) fn assembly(text: &str) -> Assembly {
    resolved(text, &Folder::default()).0
}

fn resolved(text: &str, files: &Folder) -> (Assembly, Vec<Diagnostic>) {
    let mut sources = Sources::default();
    let file = sources.add(Source::new("test.gap", text));
    let resolved = resolve(file, &mut sources, files);
    let wrong: Vec<String> = resolved
        .diagnostics
        .iter()
        .filter(|d| d.severity == gapkeep::diagnostic::Severity::Error)
        .map(|d| {
            let (line, _) = sources.get(d.primary.span.file).position(d.primary.span.range().start);
            format!("{line}: {}: {} ({:?})", d.code, d.message, d.help)
        })
        .collect();
    assert!(wrong.is_empty(), "the spec has mistakes:\n{}", wrong.join("\n"));
    (resolved.assembly.expect("an assembly"), resolved.diagnostics)
}

/// Records one quantity of a subject at a condition (none for what has none).
pub(crate) fn response(
    assembly: &Assembly,
    subject: &str,
    quantity: Quantity,
    condition: Option<&str>,
) -> Response {
    let subject =
        assembly.subject_ids().find(|&s| assembly.subject(s).name == subject).expect("a subject");
    let condition = condition.map(|name| {
        assembly.condition_ids().find(|&c| assembly.condition(c).name == name).expect("a condition")
    });
    respond(assembly, subject, quantity, condition).expect("a quantity that can be computed")
}

impl Run {
    /// The figure of a quantity of a subject at a condition (none for what has none).
    pub(crate) fn figure(
        &self,
        subject: &str,
        quantity: Quantity,
        condition: Option<&str>,
    ) -> &Figure {
        let wanted = |f: &&Figure| {
            self.assembly.subject(f.subject).name == subject
                && f.quantity == quantity
                && f.condition.map(|c| self.assembly.condition(c).name.as_str()) == condition
        };
        self.evaluation.figures.iter().find(wanted).unwrap_or_else(|| {
            panic!("no figure {subject} {quantity:?} at {condition:?}: {:?}", self.words())
        })
    }

    /// Least and greatest of a figure in the unit it is shown in.
    pub(crate) fn range(&self, subject: &str, quantity: Quantity, condition: &str) -> (f64, f64) {
        let figure = self.figure(subject, quantity, Some(condition));
        let unit = self.unit(figure);
        (unit.from_si(figure.range.least.bound), unit.from_si(figure.range.greatest.bound))
    }

    fn unit(&self, figure: &Figure) -> &'static gapkeep::units::Unit {
        use gapkeep::model::SubjectKind;
        let kind = match (&self.assembly.subject(figure.subject).kind, figure.quantity.kind()) {
            (_, Some(kind)) => kind,
            (SubjectKind::Gap(e) | SubjectKind::Result(e), None) => e.quantity,
            _ => gapkeep::units::Kind::PURE,
        };
        self.assembly.defaults.shown(kind)
    }

    /// The verdict of a requirement at a condition.
    pub(crate) fn verdict(&self, id: &str, condition: &str) -> &Verdict {
        self.evaluation
            .verdicts
            .iter()
            .find(|v| {
                let requirement = &self.assembly.requirements[v.requirement];
                requirement.id.as_deref() == Some(id)
                    && v.condition.is_some_and(|c| self.assembly.condition(c).name == condition)
            })
            .unwrap_or_else(|| panic!("no verdict {id} at {condition}"))
    }

    /// All that was reported, a line each.
    pub(crate) fn words(&self) -> Vec<String> {
        self.diagnostics.iter().map(|d| format!("{}: {}", d.code, d.message)).collect()
    }
}

/// Fails unless both ends agree to a relative error of `tolerance`.
#[track_caller]
pub(crate) fn assert_range(found: (f64, f64), expected: (f64, f64), tolerance: f64) {
    let close = |a: f64, b: f64| (a - b).abs() <= tolerance * b.abs().max(1e-300);
    assert!(
        close(found.0, expected.0) && close(found.1, expected.1),
        "found {found:?}, expected {expected:?}"
    );
}
