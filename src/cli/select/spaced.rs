//! `select --spacer`: which quantity and which conditions are meant, and the length itself.

use super::{SelectArguments, dimension};
use crate::cli::refusal::Refusal;
use crate::evaluate::select::{NoSpacer, Spacer, spacer};
use crate::model::{Assembly, ConditionId, DimensionId, SubjectId};

/// The spacer asked for, if one is.
pub(super) fn spaced(
    arguments: &SelectArguments,
    assembly: &Assembly,
) -> Result<Option<Spacer>, Refusal> {
    let Some(path) = &arguments.spacer else { return Ok(None) };
    let id = dimension(assembly, path)?;
    let between = conditions(assembly, arguments.between.as_deref())?;
    let Some(of) = &arguments.of else {
        return only(assembly, path, id, between).map(Some);
    };
    let Some(subject) = assembly.subject_ids().find(|&s| assembly.subject(s).name == *of) else {
        return Err(Refusal::new(
            format!("the spec has no gap, fit or result `{of}`"),
            format!("it has {}", names(assembly, assembly.subject_ids())),
        ));
    };
    match spacer(assembly, id, subject, between) {
        Ok(found) => Ok(Some(found)),
        Err(none) => Err(no_spacer(none, path, of)),
    }
}

/// The two conditions named, or those of a spec that has two.
fn conditions(
    assembly: &Assembly,
    named: Option<&str>,
) -> Result<(ConditionId, ConditionId), Refusal> {
    let all: Vec<ConditionId> = assembly.condition_ids().collect();
    let listed = || {
        let names: Vec<String> =
            assembly.conditions.iter().map(|c| format!("`{}`", c.name)).collect();
        names.join(", ")
    };
    let Some(named) = named else {
        return match all[..] {
            [a, b] => Ok((a, b)),
            _ => Err(Refusal::new(
                "`--spacer` does not say between which conditions",
                format!("add `--between` and two of {}, as `cold,hot`", listed()),
            )),
        };
    };
    let condition = |name: &str| {
        let found = all.iter().find(|&&c| assembly.condition(c).name == name.trim());
        found.copied().ok_or_else(|| {
            Refusal::new(
                format!("the spec has no condition `{}`", name.trim()),
                format!("it has {}", listed()),
            )
        })
    };
    match named.split_once(',') {
        Some((a, b)) => Ok((condition(a)?, condition(b)?)),
        None => Err(Refusal::new(
            format!("`{named}` does not name two conditions"),
            "name them as `cold,hot`",
        )),
    }
}

/// The spacer of the only quantity that it has a say in.
fn only(
    assembly: &Assembly,
    path: &str,
    id: DimensionId,
    between: (ConditionId, ConditionId),
) -> Result<Spacer, Refusal> {
    let tried: Vec<(SubjectId, Result<Spacer, NoSpacer>)> = assembly
        .subject_ids()
        .map(|subject| (subject, spacer(assembly, id, subject, between)))
        .filter(|(_, found)| !matches!(found, Err(NoSpacer::NoQuantity | NoSpacer::NoInfluence)))
        .collect();
    let depending = names(assembly, tried.iter().map(|(subject, _)| *subject));
    let mut tried = tried.into_iter();
    match (tried.next(), tried.next()) {
        (Some((subject, found)), None) => {
            found.map_err(|none| no_spacer(none, path, &assembly.subject(subject).name))
        }
        (None, _) => Err(Refusal::new(
            format!("`{path}` changes no gap, fit or result between the two conditions"),
            "name a dimension that one of them contains, of another material than its mates",
        )),
        (Some(_), Some(_)) => Err(Refusal::new(
            format!("`{path}` has a say in several quantities"),
            format!("add `--of` and one of {depending}"),
        )),
    }
}

fn names(assembly: &Assembly, subjects: impl Iterator<Item = SubjectId>) -> String {
    let names: Vec<String> = subjects.map(|s| format!("`{}`", assembly.subject(s).name)).collect();
    names.join(", ")
}

fn no_spacer(none: NoSpacer, path: &str, of: &str) -> Refusal {
    match none {
        NoSpacer::NoQuantity => Refusal::new(
            format!("`{of}` has no mean of its own that a length could settle"),
            "name a gap, a fit or a result",
        ),
        NoSpacer::NotComputed => Refusal::new(
            format!("`{of}` cannot be computed at both conditions"),
            "`gapkeep check` says what is missing",
        ),
        NoSpacer::NoInfluence => Refusal::new(
            format!("`{path}` does not change how `{of}` differs between the two conditions"),
            format!("name one that `{of}` contains, of another material than its mates"),
        ),
        NoSpacer::NoLength(_) => Refusal::new(
            format!("no length of `{path}` makes `{of}` the same at both conditions"),
            "try another material for it, or another dimension",
        ),
        NoSpacer::Undecided => Refusal::new(
            format!("it could not be proven which length of `{path}` makes `{of}` the same"),
            "try conditions without a range, or another dimension",
        ),
    }
}
