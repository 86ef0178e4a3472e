//! Why a quantity varies: the causes that a range is split by.

use crate::model::{Assembly, Unknown};

/// A cause of variation.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Cause {
    /// Sizes anywhere within their limits.
    Size,
    /// Form, orientation and position.
    Geometry,
    /// Lots that expand otherwise than the material's curve says.
    Expansion,
    /// Temperatures, or the time in a history.
    Temperature,
    /// Thickness of coatings.
    Coating,
    /// Swelling of lots.
    Moisture,
    /// Forces, strains, speeds, stiffnesses and moduli.
    Load,
    /// Where a fit sits in its clearance.
    Play,
    /// Friction of a joint.
    Friction,
    /// Volumes of cavities and charges.
    Volume,
}

impl Cause {
    /// Every cause in the order shown.
    pub const ALL: [Cause; 10] = [
        Cause::Size,
        Cause::Geometry,
        Cause::Expansion,
        Cause::Temperature,
        Cause::Coating,
        Cause::Moisture,
        Cause::Load,
        Cause::Play,
        Cause::Friction,
        Cause::Volume,
    ];

    /// The word for it.
    pub fn word(self) -> &'static str {
        match self {
            Cause::Size => "size tolerance",
            Cause::Geometry => "form and position",
            Cause::Expansion => "CTE scatter",
            Cause::Temperature => "temperature band",
            Cause::Coating => "coating",
            Cause::Moisture => "moisture",
            Cause::Load => "load",
            Cause::Play => "play",
            Cause::Friction => "friction",
            Cause::Volume => "volume",
        }
    }

    /// The cause that an unknown belongs to.
    pub(super) fn of(assembly: &Assembly, unknown: Unknown) -> Cause {
        match unknown {
            Unknown::Size { dimension, .. }
                if assembly.dimension(dimension).geometric.is_some() =>
            {
                Cause::Geometry
            }
            Unknown::Size { .. } => Cause::Size,
            Unknown::Coating { .. } => Cause::Coating,
            Unknown::ExpansionScatter(_) | Unknown::FillScatter(_) => Cause::Expansion,
            Unknown::SwellScatter(_) => Cause::Moisture,
            Unknown::Temperature(_) | Unknown::OwnTemperature { .. } | Unknown::Time(_) => {
                Cause::Temperature
            }
            Unknown::Seat { .. } => Cause::Play,
            Unknown::Friction(_) => Cause::Friction,
            Unknown::Cavity(_) | Unknown::Charge(_) => Cause::Volume,
            Unknown::ModulusScatter(_)
            | Unknown::Strain { .. }
            | Unknown::Load { .. }
            | Unknown::LoadArea { .. }
            | Unknown::Speed(_)
            | Unknown::Preload(_)
            | Unknown::Stiffness { .. }
            | Unknown::Area { .. } => Cause::Load,
        }
    }
}
