//! The names of things in sentences.

use crate::model::{Assembly, Datum, Owner, Quantity, Requirement, Unknown};
use crate::span::Span;

/// A name in backticks.
pub fn name(text: &str) -> String {
    format!("`{text}`")
}

/// `1 part`, `2 parts`.
pub fn count(n: usize, one: &str, many: &str) -> String {
    format!("{n} {}", if n == 1 { one } else { many })
}

/// The word of a quantity, as a spec writes it; empty for gaps and results, which are their own.
pub fn quantity(assembly: &Assembly, quantity: Quantity) -> String {
    match quantity {
        Quantity::Clearance => "clearance".to_string(),
        Quantity::Interference => "interference".to_string(),
        Quantity::RadialClearance => "radial clearance".to_string(),
        Quantity::Gap => "gap".to_string(),
        Quantity::Value => "value".to_string(),
        Quantity::Pressure => "pressure".to_string(),
        Quantity::Torque => "torque".to_string(),
        Quantity::AxialForce => "axial force".to_string(),
        Quantity::Stress(part) => format!("stress in {}", assembly.part(part).name),
        Quantity::JoiningTemperature => "joining temperature".to_string(),
        Quantity::LooseningTemperature => "loosening temperature".to_string(),
        Quantity::Force => "force".to_string(),
        Quantity::Separation => "separation".to_string(),
        Quantity::Ullage => "ullage".to_string(),
    }
}

/// `R-12`, or subject and quantity where the requirement has no id.
pub fn requirement(assembly: &Assembly, requirement: &Requirement) -> String {
    match &requirement.id {
        Some(id) => id.clone(),
        None => {
            let subject = &assembly.subject(requirement.subject).name;
            match requirement.quantity {
                Quantity::Gap | Quantity::Value => subject.clone(),
                other => format!("{subject} {}", quantity(assembly, other)),
            }
        }
    }
}

/// What an unknown is, as a reviewer would call it.
pub fn unknown(assembly: &Assembly, unknown: Unknown) -> String {
    let path = |d| assembly.path(d);
    let subject = |s| &assembly.subject(s).name;
    let condition = |c| &assembly.condition(c).name;
    let piece = |n: u32| if n > 1 { format!(" (piece {n})") } else { String::new() };
    match unknown {
        Unknown::Size { dimension, piece: n } => format!("{}{}", path(dimension), piece(n)),
        Unknown::Coating { dimension, piece: n } => {
            format!("coating of {}{}", path(dimension), piece(n))
        }
        Unknown::ExpansionScatter(lot) => {
            format!("expansion scatter of {}", assembly.lots[lot.index()].name)
        }
        Unknown::ModulusScatter(lot) => {
            format!("modulus scatter of {}", assembly.lots[lot.index()].name)
        }
        Unknown::DataScatter(lot, which) => {
            let what = match which {
                Datum::Poisson => "Poisson's ratio",
                Datum::Yield => "yield strength",
                Datum::Density => "density",
            };
            format!("scatter of {what} of {}", assembly.lots[lot.index()].name)
        }
        Unknown::SwellScatter(lot) => {
            format!("swelling scatter of {}", assembly.lots[lot.index()].name)
        }
        Unknown::Temperature(c) => format!("temperature of {}", condition(c)),
        Unknown::OwnTemperature { condition: c, owner: o } => {
            format!("temperature of {} at {}", owner(assembly, o), condition(c))
        }
        Unknown::Time(c) => format!("time in {}", condition(c)),
        Unknown::Strain { dimension, .. } => format!("strain of {}", path(dimension)),
        Unknown::Load { dimension, .. } => format!("load on {}", path(dimension)),
        Unknown::LoadArea { dimension, .. } => format!("loaded area of {}", path(dimension)),
        Unknown::Seat { fit, condition: c } => {
            format!("play of {} at {}", subject(fit), condition(c))
        }
        Unknown::Speed(c) => format!("speed of {}", condition(c)),
        Unknown::Friction(s) => format!("friction of {}", subject(s)),
        Unknown::Preload(s) => format!("preload of {}", subject(s)),
        Unknown::Stiffness { restraint, member } => {
            format!(
                "stiffness of {} in {}",
                member_name(assembly, restraint, member),
                subject(restraint)
            )
        }
        Unknown::Area { restraint, member } => {
            format!(
                "area of {} in {}",
                member_name(assembly, restraint, member),
                subject(restraint)
            )
        }
        Unknown::Cavity(s) => format!("cavity of {}", subject(s)),
        Unknown::Charge(s) => format!("charge of {}", subject(s)),
        Unknown::BulkScatter(s) => {
            format!("scatter of the bulk modulus of the charge of {}", subject(s))
        }
        Unknown::FillScatter(s) => format!("expansion scatter of the charge of {}", subject(s)),
    }
}

fn member_name(assembly: &Assembly, restraint: crate::model::SubjectId, member: u32) -> String {
    match &assembly.subject(restraint).kind {
        crate::model::SubjectKind::Restraint(r) => r
            .members
            .get(member as usize)
            .map_or_else(String::new, |m| assembly.part(m.part).name.clone()),
        _ => String::new(),
    }
}

/// The name of a part or fill.
pub fn owner(assembly: &Assembly, owner: Owner) -> String {
    match owner {
        Owner::Part(part) => assembly.part(part).name.clone(),
        Owner::Fill(fill) => assembly.subject(fill).name.clone(),
    }
}

/// The line to point at for an unknown.
pub fn place(assembly: &Assembly, unknown: Unknown) -> Span {
    match unknown {
        Unknown::Size { dimension, .. } => assembly.dimension(dimension).line,
        Unknown::Coating { dimension, .. } => {
            let d = assembly.dimension(dimension);
            d.coating.as_ref().map_or(d.line, |c| c.span)
        }
        Unknown::Strain { dimension, entry } => {
            let d = assembly.dimension(dimension);
            d.strains.get(entry as usize).map_or(d.line, |s| s.span)
        }
        Unknown::Load { dimension, entry } | Unknown::LoadArea { dimension, entry } => {
            let d = assembly.dimension(dimension);
            d.loads.get(entry as usize).map_or(d.line, |l| l.span)
        }
        Unknown::ExpansionScatter(lot)
        | Unknown::ModulusScatter(lot)
        | Unknown::DataScatter(lot, _)
        | Unknown::SwellScatter(lot) => {
            let part = assembly.parts.iter().find(|p| p.lot == lot);
            part.map_or(assembly.span, |p| p.material_span)
        }
        Unknown::Temperature(c) | Unknown::Time(c) | Unknown::Speed(c) => {
            assembly.condition(c).span
        }
        Unknown::OwnTemperature { condition, owner } => {
            let condition = assembly.condition(condition);
            condition.state(owner).map_or(condition.span, |s| s.span)
        }
        Unknown::Seat { fit: s, .. }
        | Unknown::Friction(s)
        | Unknown::Preload(s)
        | Unknown::Cavity(s)
        | Unknown::Charge(s)
        | Unknown::FillScatter(s)
        | Unknown::BulkScatter(s)
        | Unknown::Stiffness { restraint: s, .. }
        | Unknown::Area { restraint: s, .. } => assembly.subject(s).span,
    }
}
