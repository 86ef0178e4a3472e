//! `rss-of-few`, `variance-of-one`, `spread-assumed`: statistics that rest on little.
//!
//! The first is told once a requirement, the others once a subject, whatever the number of their
//! requirements and conditions; where few contribute, nothing is said of one that outweighs them.

use super::{number, words};
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Statistics;
use crate::model::{Assembly, DimensionId, Method, Quantity, Requirement, SubjectId, Unknown};
use crate::span::Span;
use std::collections::{BTreeMap, BTreeSet};

/// Fewest sizes for which a root sum of squares is commonly trusted (common practice).
const ENOUGH: usize = 4;
/// A contributor that makes more of the variance than all others together.
const MOST: f64 = 0.5;
/// Sizes with less of the variance do not decide.
const COUNTS: f64 = 0.01;
/// How many sizes a finding labels.
const LABELLED: usize = 3;

/// What is known of the statistics of one subject.
#[derive(Default)]
struct Known {
    /// The requirements that ask for statistics, in the order of the spec.
    asked: Vec<Span>,
    /// Which of them are root sums of squares of few sizes, and of how many.
    few: Vec<(usize, usize)>,
    /// The greatest share of the variance that each unknown has in any of them.
    shares: BTreeMap<Unknown, f64>,
    /// Those that one contributor decides, and its share, except where few contribute anyway.
    decided: BTreeMap<Unknown, (Vec<Span>, f64)>,
}

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    let mut told: BTreeSet<DimensionId> = BTreeSet::new();
    for subject in assembly.subject_ids() {
        let known = known(assembly, evaluation, subject);
        let name = words::name(&assembly.subject(subject).name);
        for &(index, sizes) in &known.few {
            found.push(of_few(assembly, &assembly.requirements[index], sizes));
        }
        for (&unknown, (asked, share)) in &known.decided {
            found.push(of_one(assembly, unknown, &name, asked, *share));
        }
        found.extend(assumed(assembly, &known, &name, &mut told));
    }
}

fn known(assembly: &Assembly, evaluation: &Evaluation, subject: SubjectId) -> Known {
    let mut known = Known::default();
    for (index, requirement) in assembly.requirements.iter().enumerate() {
        if requirement.subject != subject || requirement.method == Method::WorstCase {
            continue;
        }
        let of_it = evaluation.verdicts.iter().filter(|v| v.requirement == index);
        let mut any = false;
        for statistics in of_it.filter_map(|v| v.statistics.as_ref()) {
            any = true;
            let few = few(assembly, requirement, statistics);
            if let Some(sizes) = few
                && !known.few.iter().any(|(told, _)| *told == index)
            {
                known.few.push((index, sizes));
            }
            for share in &statistics.variance_shares {
                let Some(unknown) = share.unknown else { continue };
                let most = known.shares.entry(unknown).or_insert(0.0);
                *most = most.max(share.share);
                if share.share > MOST && few.is_none() {
                    decided(&mut known.decided, requirement, unknown, share.share);
                }
            }
        }
        if any {
            known.asked.push(requirement.span);
        }
    }
    known
}

/// How many sizes vary in a root sum of squares, where they are fewer than it takes.
fn few(assembly: &Assembly, requirement: &Requirement, statistics: &Statistics) -> Option<usize> {
    let of_sizes = matches!(
        requirement.quantity,
        Quantity::Clearance
            | Quantity::Interference
            | Quantity::RadialClearance
            | Quantity::Gap
            | Quantity::Value
    );
    let elastic = assembly.fit(requirement.subject).is_some_and(|fit| fit.joint.is_some());
    let by_rss = matches!(requirement.method, Method::Rss { .. });
    let is_size = |unknown: &Option<Unknown>| matches!(unknown, Some(Unknown::Size { .. }));
    let sizes = statistics.variance_shares.iter().filter(|s| is_size(&s.unknown)).count();
    (by_rss && of_sizes && !elastic && sizes < ENOUGH).then_some(sizes)
}

/// A root sum of squares of so few sizes that one of them decides.
fn of_few(assembly: &Assembly, requirement: &Requirement, sizes: usize) -> Diagnostic {
    let vary = words::count(sizes, "size varies", "sizes vary");
    let name = words::name(&assembly.subject(requirement.subject).name);
    let message = format!("a root sum of squares, and only {vary} in {name}");
    Diagnostic::new(Code::RssOfFew, requirement.span, message)
        .help("with so few, one off its middle decides: use `by worst case`")
}

fn decided(
    all: &mut BTreeMap<Unknown, (Vec<Span>, f64)>,
    requirement: &Requirement,
    unknown: Unknown,
    share: f64,
) {
    let (asked, most) = all.entry(unknown).or_default();
    if !asked.contains(&requirement.span) {
        asked.push(requirement.span);
    }
    *most = most.max(share);
}

fn of_one(
    assembly: &Assembly,
    unknown: Unknown,
    name: &str,
    asked: &[Span],
    share: f64,
) -> Diagnostic {
    let what = words::name(&words::unknown(assembly, unknown));
    let message = format!("{what} makes {} of the variance of {name}", number::share(share));
    let open = matches!(unknown, Unknown::Size { dimension, .. }
        if !assembly.dimension(dimension).spread.stated);
    let help = match (open, unknown.is_of_a_lot()) {
        (true, _) => "how it varies decides: state it with `spread`, or use `by worst case`",
        (_, true) => "all pieces of a lot have it in common: `--detail` shows the worst lot",
        _ => "how it varies decides: narrow it first",
    };
    let place = words::place(assembly, unknown);
    let mut diagnostic = Diagnostic::new(Code::VarianceOfOne, place, message).help(help);
    for &span in asked.iter().take(LABELLED) {
        diagnostic = diagnostic.label(span, "statistics are asked for here");
    }
    diagnostic
}

/// Sizes that are taken as the default says, unless all of them have been told of before.
fn assumed(
    assembly: &Assembly,
    known: &Known,
    name: &str,
    told: &mut BTreeSet<DimensionId>,
) -> Option<Diagnostic> {
    // A size of several pieces is one line of the spec.
    let mut sizes: BTreeMap<DimensionId, f64> = BTreeMap::new();
    for (&unknown, &share) in &known.shares {
        if let Unknown::Size { dimension, .. } = unknown
            && !assembly.dimension(dimension).spread.stated
        {
            *sizes.entry(dimension).or_insert(0.0) += share;
        }
    }
    sizes.retain(|_, share| *share >= COUNTS);
    let new = sizes.keys().filter(|&&d| told.insert(d)).count();
    let first = *known.asked.first()?;
    if new == 0 {
        return None;
    }
    let count = words::count(sizes.len(), "size", "sizes");
    let mut largest: Vec<(DimensionId, f64)> = sizes.into_iter().collect();
    largest.sort_by(|a, b| b.1.total_cmp(&a.1));
    let message = format!("the spread of {count} in the statistics of {name} is assumed");
    let mut diagnostic = Diagnostic::new(Code::SpreadAssumed, first, message)
        .here("normal, centred, limits at 3 sigma")
        .help(
            "state `spread normal`, `spread uniform` or what was measured after each that matters",
        );
    for (dimension, share) in largest.into_iter().take(LABELLED) {
        diagnostic = diagnostic.label(
            assembly.dimension(dimension).line,
            format!("no `spread` stated; up to {} of the variance", number::share(share)),
        );
    }
    Some(diagnostic)
}
