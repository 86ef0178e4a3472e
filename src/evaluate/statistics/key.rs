//! The name that keys an unknown's stream of draws: what it is, not where it stands in the spec.

use crate::model::{
    Assembly, ConditionId, DimensionId, LotId, Owner, SubjectId, SubjectKind, Unknown,
};

/// The key of an unknown: no two of an assembly have the same, and none holds a place in a list of
/// the spec, so that statements may change places.
///
/// Names hold no blank, and the names of stated lots stand in quotes.
pub(super) fn key(assembly: &Assembly, unknown: Unknown) -> String {
    let path = |d: DimensionId| assembly.path(d);
    let subject = |s: SubjectId| &assembly.subject(s).name;
    let condition = |c: ConditionId| &assembly.condition(c).name;
    let lot = |l: LotId| {
        let lot = &assembly.lots[l.index()];
        if lot.stated { format!("lot {:?}", lot.name) } else { lot.name.clone() }
    };
    match unknown {
        Unknown::Size { dimension, piece } => format!("size {} {piece}", path(dimension)),
        Unknown::Coating { dimension, piece } => format!("coating {} {piece}", path(dimension)),
        Unknown::ExpansionScatter(l) => format!("expansion {}", lot(l)),
        Unknown::ModulusScatter(l) => format!("modulus {}", lot(l)),
        Unknown::DataScatter(l, which) => format!("{which:?} {}", lot(l)),
        Unknown::SwellScatter(l) => format!("swelling {}", lot(l)),
        Unknown::Temperature(c) => format!("temperature {}", condition(c)),
        Unknown::OwnTemperature { condition: c, owner: Owner::Part(part) } => {
            format!("temperature {} of part {}", condition(c), assembly.part(part).name)
        }
        Unknown::OwnTemperature { condition: c, owner: Owner::Fill(fill) } => {
            format!("temperature {} of fill {}", condition(c), subject(fill))
        }
        Unknown::Time(c) => format!("time {}", condition(c)),
        Unknown::Strain { dimension, entry } => {
            let strains = &assembly.dimension(dimension).strains;
            let acts = strains.iter().map(|s| s.conditions.as_slice());
            format!("strain {} {}", path(dimension), clause(assembly, acts, entry))
        }
        Unknown::Load { dimension, entry } => {
            let loads = &assembly.dimension(dimension).loads;
            let acts = loads.iter().map(|l| l.conditions.as_slice());
            format!("load {} {}", path(dimension), clause(assembly, acts, entry))
        }
        Unknown::LoadArea { dimension, entry } => {
            let loads = &assembly.dimension(dimension).loads;
            let acts = loads.iter().map(|l| l.conditions.as_slice());
            format!("loaded area {} {}", path(dimension), clause(assembly, acts, entry))
        }
        Unknown::Seat { fit, condition: c } => format!("play {} {}", subject(fit), condition(c)),
        Unknown::Speed(c) => format!("speed {}", condition(c)),
        Unknown::Friction(s) => format!("friction {}", subject(s)),
        Unknown::Preload(s) => format!("preload {}", subject(s)),
        Unknown::Stiffness { restraint, member } => {
            format!("stiffness {} {}", subject(restraint), of_part(assembly, restraint, member))
        }
        Unknown::Area { restraint, member } => {
            format!("area {} {}", subject(restraint), of_part(assembly, restraint, member))
        }
        Unknown::Cavity(s) => format!("cavity {}", subject(s)),
        Unknown::Charge(s) => format!("charge {}", subject(s)),
        Unknown::FillScatter(s) => format!("expansion of fill {}", subject(s)),
        Unknown::BulkScatter(s) => format!("bulk modulus of fill {}", subject(s)),
    }
}

/// One of several clauses of a dimension: by the conditions that it acts at, in the order of their
/// names, and counted among clauses that act at the same.
fn clause<'a>(
    assembly: &Assembly,
    acts: impl Iterator<Item = &'a [ConditionId]>,
    entry: u32,
) -> String {
    let names = |conditions: &[ConditionId]| {
        let mut names: Vec<&str> =
            conditions.iter().map(|&c| assembly.condition(c).name.as_str()).collect();
        names.sort_unstable();
        names.join(",")
    };
    let all: Vec<String> = acts.take(entry as usize + 1).map(names).collect();
    let own = all.last().map_or("", String::as_str);
    let count = all.iter().filter(|other| *other == own).count();
    format!("at {own} {count}")
}

/// A member of a restraint: by its part, and counted among the members of that part.
fn of_part(assembly: &Assembly, restraint: SubjectId, member: u32) -> String {
    let SubjectKind::Restraint(restraint) = &assembly.subject(restraint).kind else {
        return String::new();
    };
    let upto = &restraint.members[..restraint.members.len().min(member as usize + 1)];
    let Some(own) = upto.last() else { return String::new() };
    let count = upto.iter().filter(|m| m.part == own.part).count();
    format!("{} {count}", assembly.part(own.part).name)
}
