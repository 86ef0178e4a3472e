//! From model and evaluation to an account in words. Values stay SI, each with its unit.

use super::basis::grounds;
use super::cause::Cause;
use super::caution::Caution;
use super::coordinate::{coordinates, scale};
use super::shop::cards;
use super::{
    Account, Case, Contribution, FailingShare, Figure, FrictionBand, Measure, Member, Statistics,
    Window, WorstLot,
};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{self, Verdict};
use crate::findings::window::{DataEnds, sentence};
use crate::findings::{standing, thin_margin, words};
use crate::model::{
    Assembly, Basis, Condition, Expr, ExprKind, Form, Method, Quantity, Requirement, Subject,
    SubjectId, SubjectKind, Unknown,
};
use crate::units::{Kind, Unit, find};

/// The account of an evaluated assembly on the day `today` (`YYYY-MM-DD`).
pub fn account(assembly: &Assembly, evaluation: &Evaluation, today: &str) -> Account {
    let figures = evaluation.figures.iter().map(|f| figure(assembly, f)).collect();
    let cases = evaluation.verdicts.iter().map(|v| case(assembly, evaluation, v, today)).collect();
    let written = |c: &Condition| (c.name.clone(), c.written.clone());
    Account {
        title: assembly.title.clone(),
        place: assembly.span,
        drawing: assembly.drawing.as_ref().map(|d| (d.number.clone(), d.revision.clone())),
        notes: assembly.notes.clone(),
        length: assembly.defaults.length,
        temperature: assembly.defaults.temperature,
        reference: assembly.reference,
        conditions: assembly.conditions.iter().map(written).collect(),
        figures,
        cases,
        failing: evaluation.assembly_yield.map(|y| FailingShare {
            share: y.share_failing,
            interval: y.share_interval,
            drawn: y.drawn,
        }),
        shop: cards(assembly, evaluation),
        bands: bands(assembly, evaluation),
        grounds: grounds(assembly, evaluation),
    }
}

fn figure(assembly: &Assembly, figure: &outcome::Figure) -> Figure {
    let subject = assembly.subject(figure.subject);
    let range = &figure.range;
    let member = |c: &outcome::Chosen| {
        let set = assembly.dimension(c.dimension);
        let size = set.members.get(c.member as usize).copied().unwrap_or(set.nominal);
        Member { name: assembly.path(c.dimension), size, unit: set.unit(&assembly.defaults) }
    };
    Figure {
        subject: subject.name.clone(),
        kind: kind_word(subject),
        quantity: words::quantity(assembly, figure.quantity),
        measure: measure(assembly, figure.subject, figure.quantity),
        condition: figure.condition.map(|c| assembly.condition(c).name.clone()),
        members: figure.members.iter().map(member).collect(),
        unit: unit(assembly, figure),
        least: range.least.bound,
        mean: range.mean,
        greatest: range.greatest.bound,
        met: range.least.met && range.greatest.met,
        character: character(figure),
        least_at: coordinates(assembly, &range.least.corner),
        greatest_at: coordinates(assembly, &range.greatest.corner),
        secondary: !matches!(
            figure.quantity,
            Quantity::Clearance
                | Quantity::Interference
                | Quantity::RadialClearance
                | Quantity::Gap
                | Quantity::Value
                | Quantity::Ullage
        ),
        caution: Caution::of(assembly, figure.subject, figure.quantity),
    }
}

fn bands(assembly: &Assembly, evaluation: &Evaluation) -> Vec<FrictionBand> {
    let band = |band: &outcome::FrictionBand| FrictionBand {
        joint: assembly.subject(band.subject).name.clone(),
        condition: assembly.condition(band.condition).name.clone(),
        unit: unit_of(assembly, band.subject, Quantity::Pressure, false),
        coupling: band.coupling,
        least: band.least,
        greatest: band.greatest,
    };
    evaluation.friction_bands.iter().map(band).collect()
}

/// The word a subject is declared with.
fn kind_word(subject: &Subject) -> &'static str {
    match subject.kind {
        SubjectKind::Fit(_) => "fit",
        SubjectKind::Gap(_) => "gap",
        SubjectKind::Result(_) => "result",
        SubjectKind::Restraint(_) => "restraint",
        SubjectKind::Fill(_) => "fill",
    }
}

/// The unit of a figure: that of a requirement on it, else the one its kind is shown in.
fn unit(assembly: &Assembly, figure: &outcome::Figure) -> &'static Unit {
    unit_of(assembly, figure.subject, figure.quantity, figure.of_yield)
}

fn unit_of(
    assembly: &Assembly,
    subject: SubjectId,
    quantity: Quantity,
    share_of_yield: bool,
) -> &'static Unit {
    let required = assembly
        .requirements
        .iter()
        .find(|r| r.subject == subject && r.quantity == quantity)
        .filter(|r| r.of_yield() == share_of_yield);
    if let Some(requirement) = required {
        return shown_unit(requirement);
    }
    match find("%") {
        Some(percent) if share_of_yield || quantity == Quantity::Ullage => percent,
        _ => assembly.defaults.shown(kind(assembly, subject, quantity)),
    }
}

/// The unit a requirement's figures are shown in; a share of yield in per cent.
fn shown_unit(requirement: &Requirement) -> &'static Unit {
    find("%").filter(|_| requirement.of_yield()).unwrap_or(requirement.unit)
}

/// The kind of a quantity; a result's is that of its expression.
fn kind(assembly: &Assembly, subject: SubjectId, quantity: Quantity) -> Kind {
    match (&assembly.subject(subject).kind, quantity.kind()) {
        (_, Some(kind)) => kind,
        (SubjectKind::Gap(e) | SubjectKind::Result(e), None) => e.quantity,
        (_, None) => Kind::PURE,
    }
}

/// Across what a length is measured: a fit says so itself, a sum by the sizes in it.
fn measure(assembly: &Assembly, subject: SubjectId, quantity: Quantity) -> Option<Measure> {
    if kind(assembly, subject, quantity) != Kind::LENGTH {
        return None;
    }
    Some(match &assembly.subject(subject).kind {
        SubjectKind::Fit(fit) if !fit.round => Measure::Linear,
        SubjectKind::Fit(_) if quantity == Quantity::RadialClearance => Measure::Radial,
        SubjectKind::Fit(_) => Measure::Diametral,
        SubjectKind::Gap(e) | SubjectKind::Result(e) => measure_of(assembly, e),
        SubjectKind::Restraint(_) | SubjectKind::Fill(_) => Measure::Linear,
    })
}

fn measure_of(assembly: &Assembly, expr: &Expr) -> Measure {
    let mut forms = Vec::new();
    expr.walk(&mut |e| match e.kind {
        ExprKind::Size { dimension, .. }
        | ExprKind::Pieces { dimension, .. }
        | ExprKind::After { dimension, .. } => forms.push(assembly.dimension(dimension).form),
        ExprKind::Clearance(_) | ExprKind::Play(_) => forms.push(Form::Linear),
        _ => {}
    });
    let all = |form| !forms.is_empty() && forms.iter().all(|&f| f == form);
    if all(Form::Diameter) {
        Measure::Diametral
    } else if all(Form::Radius) {
        Measure::Radial
    } else {
        Measure::Linear
    }
}

/// The trade's word for a fit with this clearance (ISO 286-1, 3.3).
fn character(figure: &outcome::Figure) -> Option<&'static str> {
    let (least, greatest) = (figure.range.least.bound, figure.range.greatest.bound);
    let (least, greatest) = match figure.quantity {
        Quantity::Clearance | Quantity::RadialClearance => (least, greatest),
        Quantity::Interference => (-greatest, -least),
        _ => return None,
    };
    Some(if least >= 0.0 {
        "clearance fit"
    } else if greatest <= 0.0 {
        "interference fit"
    } else {
        "transition fit"
    })
}

fn case(assembly: &Assembly, evaluation: &Evaluation, verdict: &Verdict, today: &str) -> Case {
    let requirement = &assembly.requirements[verdict.requirement];
    let lower = requirement.lower.as_ref().map(|l| l.value);
    let upper = requirement.upper.as_ref().map(|l| l.value);
    Case {
        requirement: verdict.requirement,
        id: requirement.id.clone(),
        name: words::requirement(assembly, requirement),
        subject: assembly.subject(requirement.subject).name.clone(),
        kind: kind_word(assembly.subject(requirement.subject)),
        quantity: words::quantity(assembly, requirement.quantity),
        measure: measure(assembly, requirement.subject, requirement.quantity),
        condition: verdict.condition.map(|c| assembly.condition(c).name.clone()),
        method: method(requirement.method),
        statistical: requirement.method != Method::WorstCase,
        limits: limits(requirement),
        caution: Caution::of(assembly, requirement.subject, requirement.quantity),
        lower,
        upper,
        unit: shown_unit(requirement),
        figure: verdict.figure,
        margin: verdict.margin,
        reserve: thin_margin::reserve(assembly, evaluation, verdict),
        standing: standing(assembly, evaluation, verdict, today),
        because: requirement.because.clone(),
        concession: requirement.concession.as_ref().map(|c| {
            let by = c.approved.as_ref().map_or_else(String::new, |a| format!(", approved by {a}"));
            format!("{} accepts {} until {}{by}", c.id, c.written, c.until)
        }),
        contributors: verdict
            .contributors
            .iter()
            .map(|c| contribution(assembly, requirement, verdict, c))
            .collect(),
        statistics: verdict
            .statistics
            .as_ref()
            .map(|s| statistics(assembly, s, requirement.method)),
        thermal_shifts: verdict
            .thermal_shifts
            .iter()
            .map(|s| (words::owner(assembly, s.owner), s.shift))
            .collect(),
        window: verdict.window.as_ref().map(|w| window(assembly, requirement, w)),
    }
}

fn window(assembly: &Assembly, requirement: &Requirement, found: &outcome::Window) -> Window {
    // Windows are proven for every piece, also where statistics decide.
    let by = if requirement.method == Method::WorstCase { "" } else { "by worst case it " };
    Window {
        words: format!("{by}{}", sentence(assembly, found, DataEnds::Told)),
        intervals: found.intervals.clone(),
        looked_at: found.looked_at,
        scaled: found.scaled,
    }
}

/// The method in the words of the language.
fn method(method: Method) -> String {
    match method {
        Method::WorstCase => "worst case".to_string(),
        Method::Rss { sigmas } => format!("rss {sigmas} sigma"),
        Method::Cpk(index) => format!("Cpk {index}"),
        Method::Share(share) => {
            // Per cent to twelve digits, so that 0.9999 is 99.99 and not 99.99000000000001.
            let percent = libm::round(share * 1e14) / 1e12;
            format!("for {percent} % of assemblies")
        }
    }
}

/// Both limits as they were written.
fn limits(requirement: &Requirement) -> String {
    let both = match (&requirement.lower, &requirement.upper) {
        (Some(lower), Some(upper)) => format!("{} .. {}", lower.written, upper.written),
        (Some(lower), None) => format!(">= {}", lower.written),
        (None, Some(upper)) => format!("<= {}", upper.written),
        (None, None) => String::new(),
    };
    if requirement.of_yield() { format!("{both} of yield") } else { both }
}

fn contribution(
    assembly: &Assembly,
    requirement: &Requirement,
    verdict: &Verdict,
    contributor: &outcome::Contributor,
) -> Contribution {
    let of_variance = verdict.statistics.as_ref().and_then(|s| {
        s.variance_shares.iter().find(|v| v.unknown == Some(contributor.unknown)).map(|v| v.share)
    });
    let scale = scale(assembly, contributor.unknown);
    let dimension = match contributor.unknown {
        Unknown::Size { dimension, .. } => Some(assembly.dimension(dimension)),
        _ => None,
    };
    let condition = match contributor.unknown {
        Unknown::Temperature(c) => Some(assembly.condition(c)),
        _ => None,
    };
    let written = dimension.map(|d| &d.written).or(condition.map(|c| &c.written));
    Contribution {
        name: words::unknown(assembly, contributor.unknown),
        written: written.cloned().unwrap_or_default(),
        cause: Cause::of(assembly, contributor.unknown),
        basis: dimension.filter(|d| d.basis != Basis::Drawing).map(|d| d.basis.word()),
        sensitivity: shown_unit(requirement)
            .difference_from_si(contributor.sensitivity * scale.step()),
        unit: scale.symbol(),
        part: contributor.part,
        share_of_range: contributor.share_of_range,
        share_of_variance: of_variance,
    }
}

fn statistics(assembly: &Assembly, s: &outcome::Statistics, method: Method) -> Statistics {
    Statistics {
        mean: s.mean,
        sigma: s.sigma,
        second_order: s.second_order_where_it_counts(),
        failing: FailingShare {
            share: s.share_failing,
            interval: s.share_interval,
            drawn: s.drawn,
        },
        worst_lot: s.worst_lot.as_ref().map(|w| WorstLot {
            failing: FailingShare {
                share: w.share_failing,
                interval: w.share_interval,
                drawn: w.drawn,
            },
            cpk: w.cpk,
            at: coordinates(assembly, &w.corner),
        }),
        low: s.low,
        high: s.high,
        shown_sigmas: match method {
            Method::Rss { sigmas } => sigmas,
            Method::WorstCase | Method::Cpk(_) | Method::Share(_) => 3.0,
        },
        cpk: s.cpk,
        assumed: s.assumed,
        interaction: s.variance_shares.iter().find(|v| v.unknown.is_none()).map(|v| v.share),
    }
}
