//! Limits and middle of every unknown, read from the model. SI, in the unit the unknown states.

use crate::model::{Assembly, OwnTemperature, Scenario, Start, SubjectKind, Thermal, Unknown};
use crate::numeric::Interval;

/// Everything an unknown may be.
pub(crate) fn range(assembly: &Assembly, unknown: Unknown) -> Interval {
    read(assembly, unknown).interval()
}

/// The value an unknown has when everything is in the middle of its limits.
pub(crate) fn middle(assembly: &Assembly, unknown: Unknown) -> f64 {
    read(assembly, unknown).nominal
}

/// An unknown with its limits, as a scenario.
pub(crate) fn read(assembly: &Assembly, unknown: Unknown) -> Scenario {
    let scatter = || Scenario::between(-1.0, 1.0);
    match unknown {
        Unknown::Size { dimension, .. } => {
            let d = assembly.dimension(dimension);
            if d.geometric.is_some_and(|g| g.bonus.is_some()) {
                // With a bonus the unknown is the place in the zone, whose width depends on a size.
                return scatter();
            }
            let at = |deviation: f64| d.nominal + deviation;
            let nominal = at(0.5 * (d.lower + d.upper));
            Scenario { nominal, least: at(d.lower), greatest: at(d.upper), spread: None }
        }
        Unknown::Coating { dimension, .. } => match &assembly.dimension(dimension).coating {
            Some(coating) => coating.thickness.clone(),
            None => Scenario::exact(0.0),
        },
        Unknown::ExpansionScatter(_)
        | Unknown::ModulusScatter(_)
        | Unknown::DataScatter(..)
        | Unknown::BulkScatter(_)
        | Unknown::SwellScatter(_)
        | Unknown::FillScatter(_)
        | Unknown::Seat { .. } => scatter(),
        Unknown::Temperature(condition) => match &assembly.condition(condition).thermal {
            Thermal::Uniform(t) => t.clone(),
            Thermal::History(h) => h.band.clone(),
        },
        Unknown::OwnTemperature { condition, owner } => {
            match assembly.condition(condition).state(owner).and_then(|s| s.temperature.as_ref()) {
                Some(OwnTemperature::Absolute(t)) => t.clone(),
                Some(OwnTemperature::Above { difference, .. }) => difference.clone(),
                None => Scenario::exact(0.0),
            }
        }
        Unknown::Time(condition) => match &assembly.condition(condition).thermal {
            Thermal::History(h) => Scenario::between(h.time.0, h.time.1),
            Thermal::Uniform(_) => Scenario::exact(0.0),
        },
        Unknown::Strain { dimension, entry } => {
            assembly.dimension(dimension).strains[entry as usize].strain.clone()
        }
        Unknown::Load { dimension, entry } => {
            assembly.dimension(dimension).loads[entry as usize].force.clone()
        }
        Unknown::LoadArea { dimension, entry } => {
            assembly.dimension(dimension).loads[entry as usize].area.clone()
        }
        Unknown::Speed(condition) => match &assembly.condition(condition).speed {
            Some(rotation) => rotation.speed.clone(),
            None => Scenario::exact(0.0),
        },
        Unknown::Friction(subject)
        | Unknown::Preload(subject)
        | Unknown::Stiffness { restraint: subject, .. }
        | Unknown::Area { restraint: subject, .. }
        | Unknown::Cavity(subject)
        | Unknown::Charge(subject) => of_subject(assembly, unknown, subject),
    }
}

/// The unknowns that a joint, restraint or fill brings; zero where the spec states none.
fn of_subject(assembly: &Assembly, unknown: Unknown, subject: crate::model::SubjectId) -> Scenario {
    let stated = match (unknown, &assembly.subject(subject).kind) {
        (Unknown::Friction(_), SubjectKind::Fit(fit)) => {
            fit.joint.as_ref().and_then(|j| j.friction.clone())
        }
        (Unknown::Preload(_), SubjectKind::Restraint(r)) => match &r.start {
            Start::Preload { force, .. } => Some(force.clone()),
            _ => None,
        },
        (Unknown::Stiffness { member, .. }, SubjectKind::Restraint(r)) => {
            r.members[member as usize].stiffness.clone()
        }
        (Unknown::Area { member, .. }, SubjectKind::Restraint(r)) => {
            r.members[member as usize].area.clone()
        }
        (Unknown::Cavity(_), SubjectKind::Fill(f)) => f.stated.clone(),
        (Unknown::Charge(_), SubjectKind::Fill(f)) => Some(f.charge.clone()),
        _ => None,
    };
    stated.unwrap_or_else(|| Scenario::exact(0.0))
}
