//! One spec through all rooms: bytes, text, model, figures, findings, account.

use super::files::{Place, Rooted};
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::evaluate::tally::Tally;
use crate::evaluate::{Evaluation, Options, evaluate_counted};
use crate::findings::findings;
use crate::model::Assembly;
use crate::report::{Spec, account};
use crate::resolve::resolve;
use crate::source::{Source, Sources};
use crate::span::Span;
use crate::syntax::decode;

/// What a run wants to know.
#[derive(Debug, Clone)]
pub(crate) struct Wish {
    /// How much is computed, and how.
    pub(crate) options: Options,
    /// The checker's day, `YYYY-MM-DD`.
    pub(crate) today: String,
}

/// A change to an assembly before it is evaluated, and to its figures afterwards.
pub(crate) trait Lens: Sync {
    /// Leaves of the assembly what is asked for.
    fn assembly(&self, assembly: &mut Assembly);
    /// Leaves of the figures what is asked for.
    fn evaluation(&self, assembly: &Assembly, evaluation: &mut Evaluation);
    /// What there is to say besides.
    fn findings(&self, assembly: &Assembly, evaluation: &Evaluation) -> Vec<Diagnostic>;
}

/// Asks for everything as it stands.
pub(crate) struct Everything;

impl Lens for Everything {
    fn assembly(&self, _: &mut Assembly) {}
    fn evaluation(&self, _: &Assembly, _: &mut Evaluation) {}
    fn findings(&self, _: &Assembly, _: &Evaluation) -> Vec<Diagnostic> {
        Vec::new()
    }
}

/// Checks a spec of these bytes.
pub(crate) fn check(place: &Place, bytes: &[u8], wish: &Wish, lens: &dyn Lens) -> Spec {
    check_counted(place, bytes, wish, lens, &Tally::default())
}

/// The same, counting its draws where someone may watch them.
pub(crate) fn check_counted(
    place: &Place,
    bytes: &[u8],
    wish: &Wish,
    lens: &dyn Lens,
    tally: &Tally,
) -> Spec {
    let mut sources = Sources::default();
    let file = place.shown().to_string();
    let text = match text_of(bytes, place, &mut sources) {
        Ok(text) => text,
        Err(finding) => {
            let findings = vec![finding];
            return Spec { file, sources, account: None, findings, stale: Vec::new() };
        }
    };
    let root = sources.add(Source::new(place.shown(), text));
    let files = Rooted { root: place.root.clone() };
    let resolved = resolve(root, &mut sources, &files);
    let mut found = resolved.diagnostics;
    let mut told = None;
    // Figures of what is left beside a mistake would look like an answer.
    let sound = found.iter().all(|d| d.severity != Severity::Error);
    if let Some(mut assembly) = resolved.assembly.filter(|_| sound) {
        lens.assembly(&mut assembly);
        let mut evaluation = evaluate_counted(&assembly, &wish.options, tally);
        lens.evaluation(&assembly, &mut evaluation);
        found.extend(findings(&assembly, &evaluation, &wish.today));
        found.extend(lens.findings(&assembly, &evaluation));
        told = Some(account(&assembly, &evaluation, &wish.today));
    }
    found.sort_by_key(|d| (d.primary.span.file, d.primary.span.start));
    Spec { file, sources, account: told, findings: found, stale: Vec::new() }
}

/// The text of a file, or the finding that it is none, which points at the first byte that is not;
/// the text up to there is then in `sources`.
pub(super) fn text_of(
    bytes: &[u8],
    place: &Place,
    sources: &mut Sources,
) -> Result<String, Diagnostic> {
    match decode(bytes) {
        Ok(text) => Ok(text.to_string()),
        Err(wrong) => {
            let before = String::from_utf8_lossy(&bytes[..wrong.offset]).into_owned();
            let end = before.len();
            let file = sources.add(Source::new(place.shown(), before));
            let at = Span::new(file, end, end);
            Err(Diagnostic::new(Code::NotText, at, "the file is not text")
                .here(wrong.reason)
                .help("save it as UTF-8"))
        }
    }
}
