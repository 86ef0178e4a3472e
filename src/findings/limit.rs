//! `…-below-limit`, `…-above-limit`: a requirement that a case within all tolerances breaks.
//!
//! One finding a line and side, at the condition where it is worst; the other conditions are named.

use super::number::{self, Digits, Round};
use super::standing::{Standing, standing};
use super::window::{DataEnds, sentence};
use super::words;
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::{Figure, Outcome, Side, Verdict};
use crate::model::{Assembly, Limit, Method, Quantity, Requirement, Unknown};
use crate::numeric::tolerance::LIMIT_SLACK;
use crate::units::Kind;

/// How many contributors a finding labels.
const LABELLED: usize = 3;
/// A size that moves its gap less than this share of its own change is no cure.
const LEAST_LEVER: f64 = 0.1;

pub(super) fn find(
    assembly: &Assembly,
    evaluation: &Evaluation,
    today: &str,
    found: &mut Vec<Diagnostic>,
) {
    for index in 0..assembly.requirements.len() {
        if assembly.requirements[index].method != Method::WorstCase {
            continue;
        }
        let verdicts: Vec<&Verdict> =
            evaluation.verdicts.iter().filter(|v| v.requirement == index).collect();
        for side in [Side::Least, Side::Greatest] {
            let mut broken: Vec<Broken<'_>> = verdicts
                .iter()
                .filter(|v| v.outcome == Outcome::Fails)
                .filter_map(|v| Broken::on(side, assembly, evaluation, v))
                .collect();
            broken.sort_by(|a, b| b.short.total_cmp(&a.short));
            if !broken.is_empty() {
                found.push(finding(assembly, evaluation, &broken, &verdicts, side, today));
            }
        }
    }
}

/// A limit passed at one condition.
struct Broken<'a> {
    verdict: &'a Verdict,
    figure: &'a Figure,
    limit: &'a Limit,
    /// How far, SI, positive.
    short: f64,
}

impl<'a> Broken<'a> {
    fn on(
        side: Side,
        assembly: &'a Assembly,
        evaluation: &'a Evaluation,
        verdict: &'a Verdict,
    ) -> Option<Self> {
        let requirement = &assembly.requirements[verdict.requirement];
        let figure = &evaluation.figures[verdict.figure?];
        let (limit, short) = match side {
            Side::Least => {
                let limit = requirement.lower.as_ref()?;
                (limit, limit.value - figure.range.least.bound)
            }
            Side::Greatest => {
                let limit = requirement.upper.as_ref()?;
                (limit, figure.range.greatest.bound - limit.value)
            }
        };
        let slack = LIMIT_SLACK * requirement.unit.difference_to_si(1.0);
        (short > slack).then_some(Broken { verdict, figure, limit, short })
    }
}

fn finding(
    assembly: &Assembly,
    evaluation: &Evaluation,
    broken: &[Broken<'_>],
    verdicts: &[&Verdict],
    side: Side,
    today: &str,
) -> Diagnostic {
    let worst = &broken[0];
    let requirement = &assembly.requirements[worst.verdict.requirement];
    let (end, round, beyond) = match side {
        Side::Least => (worst.figure.range.least.bound, Round::Down, "below"),
        Side::Greatest => (worst.figure.range.greatest.bound, Round::Up, "above"),
    };
    let unit = requirement.unit;
    let of_yield = share_of(requirement);
    let digits = Digits::of(unit, &[end, worst.limit.value, worst.short]);
    let value = digits.value(end, round);
    let limit = digits.value(worst.limit.value, Round::Nearest);
    let short = digits.difference(worst.short, Round::Up);
    let word = if side == Side::Least { "least" } else { "greatest" };
    let subject = words::name(&assembly.subject(requirement.subject).name);
    let what = match requirement.quantity {
        Quantity::Gap | Quantity::Value => subject,
        quantity => format!("{} of {subject}", words::quantity(assembly, quantity)),
    };
    let at = match worst.verdict.condition {
        Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
        None => String::new(),
    };
    if worst.short.is_infinite() {
        return unbounded(requirement, &what, &at, &limit, side);
    }
    let message = format!("{what} is {short}{of_yield} {beyond} its limit{at}");
    let mut here = format!(
        "{word} {value}{of_yield}{}, limit {limit}{of_yield}",
        aside(requirement, end, side)
    );
    if broken.len() > 1 {
        let others: Vec<String> = broken[1..].iter().map(|b| at_condition(assembly, b)).collect();
        here.push_str(&format!("; also {}", others.join(", ")));
    }
    if let Some(window) = &worst.verdict.window {
        here.push_str(&format!("; {}", sentence(assembly, window, DataEnds::Left)));
    }
    let mut diagnostic =
        Diagnostic::new(code(requirement.quantity, side), requirement.span, message).here(here);
    if broken.iter().all(|b| standing(assembly, evaluation, b.verdict, today) == Standing::Conceded)
    {
        diagnostic.severity = Severity::Warning;
    }
    for contributor in worst.verdict.contributors.iter().take(LABELLED) {
        if contributor.share_of_range.abs() < 0.005 {
            continue;
        }
        diagnostic = diagnostic.label(
            words::place(assembly, contributor.unknown),
            format!(
                "{} makes {} of the range",
                words::unknown(assembly, contributor.unknown),
                number::share(contributor.share_of_range)
            ),
        );
    }
    match mend(assembly, evaluation, verdicts, worst) {
        Some(help) => diagnostic.help(help),
        None => diagnostic,
    }
}

/// A quantity that grows without end somewhere within the tolerances.
fn unbounded(
    requirement: &Requirement,
    what: &str,
    at: &str,
    limit: &str,
    side: Side,
) -> Diagnostic {
    let direction = if side == Side::Least { "falls" } else { "rises" };
    let word =
        if requirement.quantity.is_unconditional() { "is not reached" } else { "has no bound" };
    let (here, help) = match requirement.quantity {
        Quantity::JoiningTemperature => (
            format!("no heat within the data of the outer part is enough, limit {limit}"),
            "take less interference or `insertion clearance`, chill the inner part besides, or \
             press it in and leave this out",
        ),
        Quantity::LooseningTemperature => (
            format!("it holds as far as the data of its parts go, limit {limit}"),
            "take less interference, or leave this limit out",
        ),
        _ => (
            format!("it {direction} without end, limit {limit}"),
            "a divisor passes through zero within the tolerances: narrow them, or limit it first",
        ),
    };
    let message = format!("{what} {word}{at}");
    Diagnostic::new(code(requirement.quantity, side), requirement.span, message)
        .here(here)
        .help(help)
}

/// A negative clearance is also the interference it is, and the reverse.
fn aside(requirement: &Requirement, value: f64, side: Side) -> String {
    let other = match requirement.quantity {
        Quantity::Clearance | Quantity::RadialClearance if value < 0.0 => "interference",
        Quantity::Interference if value < 0.0 => "clearance",
        _ => return String::new(),
    };
    // The same digits as the value itself, which was rounded the other way.
    let round = if side == Side::Least { Round::Up } else { Round::Down };
    format!(" ({other} {})", number::with_unit(-value, requirement.unit, round))
}

/// What a share is of.
fn share_of(requirement: &Requirement) -> &'static str {
    if requirement.of_yield() { " of yield" } else { "" }
}

fn at_condition(assembly: &Assembly, broken: &Broken<'_>) -> String {
    let unit = assembly.requirements[broken.verdict.requirement].unit;
    let short = number::difference_with_unit(broken.short, unit, Round::Up);
    match broken.verdict.condition {
        Some(c) => format!("{short} at {}", words::name(&assembly.condition(c).name)),
        None => short,
    }
}

/// What would mend it: a shift of a nominal if there is room on the other side at every condition,
/// else how much narrower the range must become, and where it is widest.
fn mend(
    assembly: &Assembly,
    evaluation: &Evaluation,
    verdicts: &[&Verdict],
    worst: &Broken<'_>,
) -> Option<String> {
    let requirement = &assembly.requirements[worst.verdict.requirement];
    let mut raise: f64 = 0.0;
    let mut lower: f64 = 0.0;
    let mut room_up = f64::INFINITY;
    let mut room_down = f64::INFINITY;
    for verdict in verdicts {
        let range = &evaluation.figures[verdict.figure?].range;
        if let Some(l) = &requirement.lower {
            raise = raise.max(l.value - range.least.bound);
            room_down = room_down.min(range.least.bound - l.value);
        }
        if let Some(u) = &requirement.upper {
            lower = lower.max(range.greatest.bound - u.value);
            room_up = room_up.min(u.value - range.greatest.bound);
        }
    }
    let size =
        worst.verdict.contributors.iter().find(|c| {
            matches!(c.unknown, Unknown::Size { .. }) && c.sensitivity.abs() > LEAST_LEVER
        });
    let shift = if raise > 0.0 && room_up >= raise {
        Some(raise)
    } else if lower > 0.0 && room_down >= lower {
        Some(-lower)
    } else {
        None
    };
    let unit = requirement.unit;
    let everywhere = if verdicts.len() > 1 { " at every condition" } else { "" };
    match (shift, size) {
        (Some(shift), Some(size)) if is_a_sum(requirement.quantity, unit.kind) => {
            let change = shift / size.sensitivity;
            Some(format!(
                "it holds{everywhere} with {} {} {}",
                words::name(&words::unknown(assembly, size.unknown)),
                number::difference_with_unit(change.abs(), unit, Round::Up),
                if change > 0.0 { "larger" } else { "smaller" },
            ))
        }
        (Some(shift), _) => {
            let direction = if shift > 0.0 { "up" } else { "down" };
            let by = number::difference_with_unit(shift.abs(), unit, Round::Up);
            Some(match worst.verdict.contributors.first() {
                Some(largest) => format!(
                    "all of it must move {direction} by {by}{everywhere}, or the range become \
                     narrower; {} is the widest contributor",
                    words::name(&words::unknown(assembly, largest.unknown)),
                ),
                None => format!("all of it must move {direction} by {by}{everywhere}"),
            })
        }
        (None, _) => {
            // What is left once the nominal is centred.
            let excess = -(room_down + room_up);
            let largest = worst.verdict.contributors.first()?;
            Some(format!(
                "no nominal mends both ends: once centred, the range must become {} narrower; {} is \
                 the widest contributor, {} of it",
                number::difference_with_unit(excess, unit, Round::Up),
                words::name(&words::unknown(assembly, largest.unknown)),
                number::difference_with_unit(largest.part.abs(), unit, Round::Nearest),
            ))
        }
    }
}

/// True for what follows its sizes in proportion, so that a change of one can be named.
fn is_a_sum(quantity: Quantity, kind: Kind) -> bool {
    let of_sizes = matches!(
        quantity,
        Quantity::Clearance
            | Quantity::RadialClearance
            | Quantity::Interference
            | Quantity::Gap
            | Quantity::Value
    );
    of_sizes && kind == Kind::LENGTH
}

/// The code of a limit passed on that side.
pub(super) fn code(quantity: Quantity, side: Side) -> Code {
    let (below, above) = match quantity {
        Quantity::Clearance | Quantity::RadialClearance => {
            (Code::ClearanceBelowLimit, Code::ClearanceAboveLimit)
        }
        Quantity::Interference => (Code::InterferenceBelowLimit, Code::InterferenceAboveLimit),
        Quantity::Gap | Quantity::Separation => (Code::GapBelowLimit, Code::GapAboveLimit),
        Quantity::Value => (Code::ResultBelowLimit, Code::ResultAboveLimit),
        Quantity::Pressure | Quantity::Stress(_) => {
            (Code::StressBelowLimit, Code::StressAboveLimit)
        }
        Quantity::Torque | Quantity::AxialForce | Quantity::Force => {
            (Code::ForceBelowLimit, Code::ForceAboveLimit)
        }
        Quantity::JoiningTemperature | Quantity::LooseningTemperature => {
            (Code::TemperatureBelowLimit, Code::TemperatureAboveLimit)
        }
        Quantity::Ullage => (Code::UllageBelowLimit, Code::UllageAboveLimit),
    };
    if side == Side::Least { below } else { above }
}
