//! Why a quantity varies: the causes that a range is split by.

use super::Contribution;
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
    /// Forces, strains, speeds, stiffnesses, moduli and strengths.
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
            | Unknown::DataScatter(..)
            | Unknown::BulkScatter(_)
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

/// What all contributors of one cause make together.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct CauseSum {
    /// The cause.
    pub cause: Cause,
    /// Part of the range, SI.
    pub part: f64,
    /// The same as a share of the range.
    pub share_of_range: f64,
    /// Share of the variance, where statistics were asked for.
    pub share_of_variance: Option<f64>,
}

/// Contributors summed by cause, largest share of the range first.
pub(super) fn by_cause(list: &[Contribution]) -> Vec<CauseSum> {
    let mut sums: Vec<CauseSum> = Vec::new();
    for cause in Cause::ALL {
        let of = || list.iter().filter(|c| c.cause == cause);
        if of().next().is_some() {
            // Scenarios make no variance: a cause of nothing else has no share of it.
            let shares: Vec<f64> = of().filter_map(|c| c.share_of_variance).collect();
            sums.push(CauseSum {
                cause,
                part: of().map(|c| c.part).sum(),
                share_of_range: of().map(|c| c.share_of_range).sum(),
                share_of_variance: (!shares.is_empty()).then(|| shares.iter().sum()),
            });
        }
    }
    sums.sort_by(|a, b| b.share_of_range.total_cmp(&a.share_of_range));
    sums
}
