//! `cavity-full`: a liquid or solid that has no room left; `bulk-modulus-grows`: one under so much
//! pressure that its stiffness at filling is no longer its own.
//!
//! A full cavity is an error unless the spec limits the pressure there: then it is meant to be full.

use super::number::{Round, digits, share, with_unit};
use super::words;
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Figure;
use crate::model::{Assembly, ConditionId, Fill, Owner, Quantity, SubjectId, SubjectKind};
use crate::numeric::Interval;
use crate::numeric::tolerance::LIMIT_SLACK;
use crate::units::Unit;

/// A pressure is told that is more than this share of the bulk modulus: the error is three times it.
const LEAST_SHARE: f64 = 0.01;
/// Beyond this share, three times it says nothing any more.
const MOST_SHARE: f64 = 0.1;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for id in assembly.subject_ids() {
        let SubjectKind::Fill(fill) = &assembly.subject(id).kind else { continue };
        let full = full(assembly, evaluation, id, fill);
        // What must not be full need not be told how stiff it would be.
        if full.as_ref().is_some_and(|d| d.severity == Severity::Note) {
            found.extend(stiffened(assembly, evaluation, id, fill));
        }
        found.extend(full);
    }
}

fn full(
    assembly: &Assembly,
    evaluation: &Evaluation,
    id: SubjectId,
    fill: &Fill,
) -> Option<Diagnostic> {
    let fullest = |limited: bool| {
        evaluation
            .figures
            .iter()
            .filter(|f| f.subject == id && f.quantity == Quantity::Ullage)
            .filter(|f| f.range.least.reached < -LIMIT_SLACK)
            .filter(|f| f.condition.is_some_and(|c| fill.may_be_full.contains(&c)) == limited)
            .min_by(|a, b| a.range.least.bound.total_cmp(&b.range.least.bound))
    };
    let unforeseen = fullest(false);
    let figure = unforeseen.or_else(|| fullest(true))?;
    let subject = assembly.subject(id);
    let mut here = format!("its charge needs {} more than there is", needs(figure));
    if let Some(pressure) = pressure(evaluation, id, figure.condition) {
        let most = with_unit(pressure.range.greatest.bound, unit(assembly, id), Round::Up);
        let of = if fill.wall.is_some() { "with its wall giving way" } else { "if it were rigid" };
        here.push_str(&format!("; up to {most} {of}"));
    }
    let message = format!("{} is full{}", words::name(&subject.name), at(assembly, figure));
    let mut diagnostic = Diagnostic::new(Code::CavityFull, subject.span, message).here(here);
    if unforeseen.is_none() {
        diagnostic.severity = Severity::Note;
        let wall = "a cavity without a `wall` is taken as rigid, which makes its pressure too high";
        return Some(if fill.wall.is_none() { diagnostic.help(wall) } else { diagnostic });
    }
    if fill.stated.as_ref().is_some_and(|cavity| cavity.greatest < fill.charge.least) {
        return Some(diagnostic.help(
            "the charge is stated larger than the cavity that it goes into: check both volumes",
        ));
    }
    Some(diagnostic.help(
        "a full cavity bursts or pushes its seals out: charge less, or give it room to breathe; if \
         it is to be full, limit its `pressure`",
    ))
}

/// How much more the charge needs, as a share of the cavity.
fn needs(figure: &Figure) -> String {
    share(-figure.range.least.bound)
}

fn at(assembly: &Assembly, figure: &Figure) -> String {
    match figure.condition {
        Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
        None => String::new(),
    }
}

fn pressure(
    evaluation: &Evaluation,
    fill: SubjectId,
    condition: Option<ConditionId>,
) -> Option<&Figure> {
    let wanted = |f: &&Figure| {
        f.subject == fill && f.quantity == Quantity::Pressure && f.condition == condition
    };
    evaluation.figures.iter().find(wanted)
}

/// The unit of its pressure: that of a requirement, else the usual one.
fn unit(assembly: &Assembly, fill: SubjectId) -> &'static Unit {
    let required = assembly
        .requirements
        .iter()
        .find(|r| r.subject == fill && r.quantity == Quantity::Pressure)
        .map(|r| r.unit);
    required.unwrap_or_else(|| assembly.defaults.shown(crate::units::Kind::STRESS))
}

/// The tangent modulus at filling under a pressure that has raised it, where somebody relies on it.
fn stiffened(
    assembly: &Assembly,
    evaluation: &Evaluation,
    id: SubjectId,
    fill: &Fill,
) -> Option<Diagnostic> {
    let modulus = fill.material.bulk_modulus.as_ref()?;
    let of_modulus = |figure: &Figure| {
        let t = evaluation
            .temperatures
            .iter()
            .find(|t| t.owner == Owner::Fill(id) && Some(t.condition) == figure.condition)?;
        let least = modulus.curve.range(Interval::new(t.least, t.greatest)).lo();
        Some(figure.range.greatest.bound / (least * (1.0 - modulus.scatter)))
    };
    let (figure, share) = evaluation
        .figures
        .iter()
        .filter(|f| f.subject == id && f.quantity == Quantity::Pressure)
        .filter_map(|f| Some((f, of_modulus(f)?)))
        .filter(|(_, share)| *share > LEAST_SHARE)
        .max_by(|a, b| a.1.total_cmp(&b.1))?;
    let subject = assembly.subject(id);
    let percent = |x: f64| digits(x * 100.0, 1, Round::Up);
    let most = with_unit(figure.range.greatest.bound, unit(assembly, id), Round::Up);
    Some(
        Diagnostic::new(
            Code::BulkModulusGrows,
            subject.span,
            format!(
                "the pressure of {}{} is {} % of the bulk modulus of its charge",
                words::name(&subject.name),
                at(assembly, figure),
                percent(share),
            ),
        )
        .here(format!("up to {most}, with the modulus that the charge has at filling"))
        .help(format!(
            "a modulus grows with pressure, that of water by six times as much, so that the true \
             pressure may be {} higher: leave room for that in the limit, or charge less",
            // Three times the share is the first term only.
            if share > MOST_SHARE {
                "far".to_string()
            } else {
                format!("{} %", percent(3.0 * share))
            },
        )),
    )
}
