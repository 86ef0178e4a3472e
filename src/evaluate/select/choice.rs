//! Classes for dimensions: every class that the standard defines at the size, judged.
//!
//! A fit with both sides open is a choice of pairs, among the recommended classes of ISO 286-1: fits
//! of the hole-basis and the shaft-basis system (a hole H or a shaft h), and only where none of them
//! serves any other pair. All pairs of all classes would be some hundred thousand, most of which no
//! gauge is made for. Any other dimension left open is chosen with the rest as it is, open ones at their nominal size.

use super::cases::Cases;
use super::trial::Trial;
use super::{Candidate, Choice, Obstacle, Rank, first_of_line, of_line, plain_size, room};
use crate::evaluate::{Options, Outcome, verdicts};
use crate::model::{
    Assembly, Dimension, DimensionId, Feature, Fit, Form, Origin, SubjectId, SubjectKind,
};
use crate::standards::iso286::{
    Class, Deviations, HOLES, Kind, Letters, PREFERRED_HOLES, PREFERRED_SHAFTS, SHAFTS, classes_at,
    preferred_fits,
};
use std::collections::BTreeSet;

/// Choices for every dimension left open, and for the dimensions of fits that fail.
pub(super) fn all(
    assembly: &Assembly,
    cases: &Cases,
    open: &[DimensionId],
    options: &Options,
) -> Vec<Choice> {
    let mut choices = Vec::new();
    let mut paired = BTreeSet::new();
    for (hole, shaft) in fits(assembly).filter_map(|(_, fit)| sides(fit)) {
        let (hole, shaft) = (first_of_line(assembly, hole), first_of_line(assembly, shaft));
        let both = [hole, shaft];
        if both.iter().all(|d| open.contains(d) && !paired.contains(d)) {
            paired.extend(both);
            choices.push(of_pair(assembly, cases, hole, shaft, open, options));
        }
    }
    for &dimension in open.iter().filter(|d| !paired.contains(d)) {
        choices.push(of_one(assembly, cases, dimension, open, options));
    }
    if open.is_empty() {
        choices.extend(of_failing(assembly, cases, options));
    }
    choices.sort_by_key(|choice| choice.dimensions.iter().min().copied());
    choices
}

/// Choices for the dimensions of fits of which some requirement does not hold: each side with the
/// other as it is, and both together where neither side alone will do.
fn of_failing(assembly: &Assembly, cases: &Cases, options: &Options) -> Vec<Choice> {
    let bad: BTreeSet<SubjectId> = verdicts(assembly, options)
        .verdicts
        .iter()
        .filter(|v| v.outcome != Outcome::Holds)
        .map(|v| assembly.requirements[v.requirement].subject)
        .collect();
    let mut choices: Vec<Choice> = Vec::new();
    for (_, fit) in fits(assembly).filter(|(subject, _)| bad.contains(subject)) {
        let mut serves = false;
        let mut takes = 0;
        for e in [&fit.internal, &fit.external] {
            let Some(d) = plain_size(e).map(|d| first_of_line(assembly, d)) else {
                continue;
            };
            if !takes_class(assembly.dimension(d)) {
                continue;
            }
            takes += 1;
            let there = choices.iter().find(|c| c.dimensions == [d]);
            serves |= match there {
                Some(choice) => !choice.serving.is_empty(),
                None => {
                    let choice = of_one(assembly, cases, d, &[], options);
                    let serves = !choice.serving.is_empty();
                    choices.push(choice);
                    serves
                }
            };
        }
        if let (false, 2, Some((hole, shaft))) = (serves, takes, sides(fit)) {
            choices.push(of_pair(assembly, cases, hole, shaft, &[], options));
        }
    }
    choices
}

/// The choice for one dimension, all others as they are.
pub(super) fn of_one(
    assembly: &Assembly,
    cases: &Cases,
    dimension: DimensionId,
    open: &[DimensionId],
    options: &Options,
) -> Choice {
    let mut choice = blank(assembly, cases, &[dimension], open);
    let stated = assembly.dimension(dimension);
    let kind = match stated.feature {
        Feature::Internal => Kind::Hole,
        Feature::External => Kind::Shaft,
        Feature::Unstated => {
            choice.obstacle = choice.obstacle.or(Some(Obstacle::SideUnknown));
            return choice;
        }
    };
    if choice.obstacle.is_some() {
        return choice;
    }
    let mates = mates(assembly, dimension);
    let mut trial = trial(assembly, cases, &[dimension], options);
    for (class, deviations) in classes_at(millimetres(stated.nominal), kind) {
        choice.judged += 1;
        trial.set(dimension, deviations.lower.metres(), deviations.upper.metres());
        if let Ok(governing) = trial.judge() {
            let rank = rank(class, &mates);
            choice.serving.push(Candidate { classes: vec![(class, deviations)], rank, governing });
        }
    }
    sort(&mut choice.serving);
    if trial.is_cheap() {
        choice.room = room::deviations(&mut trial, dimension, stated);
    }
    choice
}

/// The choice for both sides of a fit, among recommended classes.
fn of_pair(
    assembly: &Assembly,
    cases: &Cases,
    hole: DimensionId,
    shaft: DimensionId,
    open: &[DimensionId],
    options: &Options,
) -> Choice {
    let mut choice = blank(assembly, cases, &[hole, shaft], open);
    if choice.obstacle.is_some() {
        return choice;
    }
    let at = |d: DimensionId, classes: &[Class]| -> Vec<(Class, Deviations)> {
        let nominal = millimetres(assembly.dimension(d).nominal);
        classes.iter().filter_map(|c| Some((*c, c.limits(nominal).ok()?))).collect()
    };
    let (holes, shafts) = (at(hole, HOLES), at(shaft, SHAFTS));
    let same_size = assembly.dimension(hole).nominal == assembly.dimension(shaft).nominal;
    let mut trial = trial(assembly, cases, &[hole, shaft], options);
    for basis in [true, false] {
        for &(of_hole, h) in &holes {
            for &(of_shaft, s) in &shafts {
                if is_basis(of_hole, of_shaft) != basis {
                    continue;
                }
                choice.judged += 1;
                trial.set(hole, h.lower.metres(), h.upper.metres());
                trial.set(shaft, s.lower.metres(), s.upper.metres());
                if let Ok(governing) = trial.judge() {
                    let rank = rank_of_pair(of_hole, of_shaft, same_size);
                    let classes = vec![(of_hole, h), (of_shaft, s)];
                    choice.serving.push(Candidate { classes, rank, governing });
                }
            }
        }
        if !choice.serving.is_empty() {
            break;
        }
    }
    sort(&mut choice.serving);
    choice
}

/// True for fits of the hole-basis or the shaft-basis system (ISO 286-1, clause 5).
fn is_basis(hole: Class, shaft: Class) -> bool {
    hole.letters == Letters::H || shaft.letters == Letters::H
}

fn rank_of_pair(hole: Class, shaft: Class, same_size: bool) -> Rank {
    let mate: &[Class] = if same_size { &[shaft] } else { &[] };
    match rank(hole, mate) {
        Rank::PreferredFit => Rank::PreferredFit,
        // Two classes are no more to be preferred than the one that is less so.
        of_hole => of_hole.max(rank(shaft, &[])),
    }
}

fn blank(
    assembly: &Assembly,
    cases: &Cases,
    dimensions: &[DimensionId],
    open: &[DimensionId],
) -> Choice {
    let concern = cases.concern(assembly, &lines(assembly, dimensions));
    let requirements = concern.requirements();
    let obstacle = match concern.unable {
        Some(requirement) => Some(Obstacle::NotComputed(requirement)),
        None if requirements.is_empty() => Some(Obstacle::NothingRequired),
        None => None,
    };
    let shares = |d: &DimensionId| {
        let other = cases.concern(assembly, &of_line(assembly, *d)).requirements();
        other.iter().any(|r| requirements.contains(r))
    };
    let beside = open.iter().copied().filter(|d| !dimensions.contains(d)).filter(shares).collect();
    Choice {
        dimensions: dimensions.to_vec(),
        open_beside: beside,
        requirements,
        judged: 0,
        serving: Vec::new(),
        room: None,
        obstacle,
    }
}

fn trial(assembly: &Assembly, cases: &Cases, of: &[DimensionId], options: &Options) -> Trial {
    Trial::of(assembly, &cases.concern(assembly, &lines(assembly, of)), options)
}

fn lines(assembly: &Assembly, dimensions: &[DimensionId]) -> BTreeSet<DimensionId> {
    dimensions.iter().flat_map(|&d| of_line(assembly, d)).collect()
}

fn fits(assembly: &Assembly) -> impl Iterator<Item = (SubjectId, &Fit)> {
    assembly.subject_ids().filter_map(|id| match &assembly.subject(id).kind {
        SubjectKind::Fit(fit) => Some((id, fit.as_ref())),
        _ => None,
    })
}

/// Hole and shaft of a fit of two sizes.
fn sides(fit: &Fit) -> Option<(DimensionId, DimensionId)> {
    Some((plain_size(&fit.internal)?, plain_size(&fit.external)?))
}

/// True for what may carry a class in place of its tolerance.
fn takes_class(dimension: &Dimension) -> bool {
    let of_size = matches!(dimension.form, Form::Diameter | Form::Linear);
    let replaceable =
        matches!(dimension.origin, Origin::Class(_) | Origin::Stated | Origin::General(_));
    of_size && replaceable && dimension.feature != Feature::Unstated
}

/// The classes that a dimension's mates have.
fn mates(assembly: &Assembly, dimension: DimensionId) -> Vec<Class> {
    let own = of_line(assembly, dimension);
    let class = |d: DimensionId| match &assembly.dimension(d).origin {
        Origin::Class(written)
            if assembly.dimension(d).nominal == assembly.dimension(dimension).nominal =>
        {
            Class::parse(written).ok()
        }
        _ => None,
    };
    let mate = |(hole, shaft): (DimensionId, DimensionId)| {
        if own.contains(&hole) {
            class(shaft)
        } else if own.contains(&shaft) {
            class(hole)
        } else {
            None
        }
    };
    fits(assembly).filter_map(|(_, fit)| sides(fit).and_then(mate)).collect()
}

fn rank(class: Class, mates: &[Class]) -> Rank {
    let fit = |mate: &Class| match class.kind {
        Kind::Hole => (class, *mate),
        Kind::Shaft => (*mate, class),
    };
    let (preferred, recommended) = match class.kind {
        Kind::Hole => (PREFERRED_HOLES, HOLES),
        Kind::Shaft => (PREFERRED_SHAFTS, SHAFTS),
    };
    if mates.iter().any(|mate| preferred_fits().any(|pair| pair == fit(mate))) {
        Rank::PreferredFit
    } else if preferred.contains(&class) {
        Rank::Preferred
    } else if recommended.contains(&class) {
        Rank::Recommended
    } else {
        Rank::Defined
    }
}

/// Widest tolerance first; of equal ones that with more margin, then the one to be chosen first.
fn sort(candidates: &mut [Candidate]) {
    candidates.sort_by(|a, b| {
        b.tolerance()
            .total_cmp(&a.tolerance())
            .then(b.governing.compared.total_cmp(&a.governing.compared))
            .then(a.rank.cmp(&b.rank))
            .then_with(|| {
                let classes = |c: &Candidate| c.classes.iter().map(|(c, _)| *c).collect::<Vec<_>>();
                classes(a).cmp(&classes(b))
            })
    });
}

/// A nominal as the standard's tables are entered with it, free of the rounding of unit conversion.
fn millimetres(metres: f64) -> f64 {
    libm::round(metres * 1e12) / 1e9
}
