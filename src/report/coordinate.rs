//! Where an extreme is reached: the value of each unknown, in the unit people state it in.

use crate::findings::words;
use crate::model::{Assembly, OwnTemperature, Unknown};
use crate::units::{Kind, Unit, find};

/// The value of one unknown at a corner.
#[derive(Debug, Clone, PartialEq)]
pub struct Coordinate {
    /// What it is, such as `housing.bore`.
    pub name: String,
    /// Its value, in `unit`.
    pub value: f64,
    /// The unit; empty for scatters, which run from −1 to 1.
    pub unit: &'static str,
}

/// The corner in words and units.
pub(super) fn coordinates(assembly: &Assembly, corner: &[(Unknown, f64)]) -> Vec<Coordinate> {
    corner
        .iter()
        .map(|&(unknown, si)| {
            let scale = scale(assembly, unknown);
            Coordinate {
                name: words::unknown(assembly, unknown),
                value: scale.read(si),
                unit: scale.symbol(),
            }
        })
        .collect()
}

/// A unit, and whether it is read as a difference.
#[derive(Debug, Clone, Copy)]
pub(super) struct Scale {
    unit: Option<&'static Unit>,
    difference: bool,
}

impl Scale {
    fn of(unit: &'static Unit) -> Self {
        Scale { unit: Some(unit), difference: false }
    }

    /// An SI value on this scale.
    pub(super) fn read(self, si: f64) -> f64 {
        match self.unit {
            Some(unit) if self.difference => unit.difference_from_si(si),
            Some(unit) => unit.from_si(si),
            None => si,
        }
    }

    /// SI units in one unit of the scale.
    pub(super) fn step(self) -> f64 {
        self.unit.map_or(1.0, |u| u.difference_to_si(1.0))
    }

    /// The unit as people read it.
    pub(super) fn symbol(self) -> &'static str {
        match self.unit {
            Some(unit) if self.difference => unit.difference_symbol(),
            Some(unit) => unit.symbol,
            None => "",
        }
    }
}

/// The scale that an unknown is stated on.
pub(super) fn scale(assembly: &Assembly, unknown: Unknown) -> Scale {
    let shown = |kind| Scale::of(assembly.defaults.shown(kind));
    match unknown {
        Unknown::Size { dimension, .. } => {
            Scale::of(assembly.dimension(dimension).unit(&assembly.defaults))
        }
        Unknown::Coating { .. } => shown(Kind::LENGTH),
        Unknown::Temperature(_) => shown(Kind::TEMPERATURE),
        Unknown::OwnTemperature { condition, owner } => {
            let own =
                assembly.condition(condition).state(owner).and_then(|s| s.temperature.as_ref());
            let difference = matches!(own, Some(OwnTemperature::Above { .. }));
            Scale { difference, ..shown(Kind::TEMPERATURE) }
        }
        Unknown::Time(_) => Scale { unit: find("s"), difference: false },
        Unknown::Load { .. } | Unknown::Preload(_) => shown(Kind::FORCE),
        Unknown::LoadArea { .. } | Unknown::Area { .. } => shown(Kind::AREA),
        Unknown::Strain { .. } => Scale { unit: find("%"), difference: false },
        Unknown::Speed(_) => shown(Kind::SPEED),
        Unknown::Stiffness { .. } => shown(Kind::STIFFNESS),
        Unknown::Cavity(_) | Unknown::Charge(_) => shown(Kind::VOLUME),
        Unknown::ExpansionScatter(_)
        | Unknown::ModulusScatter(_)
        | Unknown::DataScatter(..)
        | Unknown::BulkScatter(_)
        | Unknown::SwellScatter(_)
        | Unknown::Seat { .. }
        | Unknown::Friction(_)
        | Unknown::FillScatter(_) => Scale { unit: None, difference: false },
    }
}
