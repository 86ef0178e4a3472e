//! The unknowns of an assembly: everything that is not one number until a piece is made, a lot is
//! melted, a day is chosen.
//!
//! An unknown is named, not numbered: two formulas that name the same unknown mean the same one,
//! which is what makes common causes cancel.

use super::{ConditionId, DimensionId, LotId, Owner, Spread, SubjectId};
use crate::numeric::Interval;

/// A value that is known to lie between two limits; by default a scenario, random only if a spread
/// is stated.
#[derive(Debug, Clone, PartialEq)]
pub struct Scenario {
    /// The value stated, or the middle of a range; SI.
    pub nominal: f64,
    /// The least value; SI.
    pub least: f64,
    /// The greatest value; SI.
    pub greatest: f64,
    /// How it varies, where the spec says so.
    pub spread: Option<Spread>,
}

impl Scenario {
    /// A value known exactly.
    pub fn exact(value: f64) -> Self {
        Scenario { nominal: value, least: value, greatest: value, spread: None }
    }

    /// A value anywhere from `least` to `greatest`.
    pub fn between(least: f64, greatest: f64) -> Self {
        Scenario { nominal: 0.5 * least + 0.5 * greatest, least, greatest, spread: None }
    }

    /// All its values.
    pub fn interval(&self) -> Interval {
        Interval::new(self.least, self.greatest)
    }

    /// True when it is one value.
    pub fn is_exact(&self) -> bool {
        self.least == self.greatest
    }
}

/// Names one unknown.
///
/// Scatter unknowns run from −1 to 1 and scale what the material states; `Seat` runs from −1 to 1 and
/// scales half the play there is; all others are the quantity itself in SI.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Unknown {
    /// Size of piece `piece` (from 1) at its reference temperature.
    Size {
        /// Which dimension.
        dimension: DimensionId,
        /// Which of its pieces.
        piece: u32,
    },
    /// Thickness of a piece's coating.
    Coating {
        /// Which dimension.
        dimension: DimensionId,
        /// Which of its pieces.
        piece: u32,
    },
    /// Scatter of the expansion of a lot.
    ExpansionScatter(LotId),
    /// Scatter of the modulus of a lot.
    ModulusScatter(LotId),
    /// Scatter of another property of a lot.
    DataScatter(LotId, Datum),
    /// Scatter of the swelling of a lot.
    SwellScatter(LotId),
    /// A condition's own temperature, K.
    Temperature(ConditionId),
    /// A part's own temperature in a condition, K: absolute, or a difference, as the spec states it.
    OwnTemperature {
        /// In which condition.
        condition: ConditionId,
        /// Whose.
        owner: Owner,
    },
    /// Time in a condition that is a history, s.
    Time(ConditionId),
    /// Strain known from elsewhere, in a condition; `entry` counts the clauses of the dimension.
    Strain {
        /// Which dimension.
        dimension: DimensionId,
        /// Which of its `strain` clauses.
        entry: u32,
    },
    /// Force on a dimension, N; `entry` counts the clauses of the dimension.
    Load {
        /// Which dimension.
        dimension: DimensionId,
        /// Which of its `load` clauses.
        entry: u32,
    },
    /// Area that a load spreads over, m².
    LoadArea {
        /// Which dimension.
        dimension: DimensionId,
        /// Which of its `load` clauses.
        entry: u32,
    },
    /// Where in its play a fit sits, −1 … 1.
    Seat {
        /// Which fit.
        fit: SubjectId,
        /// In which condition.
        condition: ConditionId,
    },
    /// Rotational speed in a condition, rad/s.
    Speed(ConditionId),
    /// Coefficient of friction of a joint.
    Friction(SubjectId),
    /// Preload of a restraint, N.
    Preload(SubjectId),
    /// Stiffness of a member, N/m.
    Stiffness {
        /// Which restraint.
        restraint: SubjectId,
        /// Which of its members.
        member: u32,
    },
    /// Area of a member, m².
    Area {
        /// Which restraint.
        restraint: SubjectId,
        /// Which of its members.
        member: u32,
    },
    /// Volume of a cavity that is stated as a number, m³.
    Cavity(SubjectId),
    /// Volume of a charge, m³.
    Charge(SubjectId),
    /// Scatter of the expansion of a charge.
    FillScatter(SubjectId),
    /// Scatter of the bulk modulus of a charge.
    BulkScatter(SubjectId),
}

/// Properties of a lot that scatter on their own, besides expansion, modulus and swelling.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Datum {
    /// Poisson's ratio.
    Poisson,
    /// Yield strength.
    Yield,
    /// Density.
    Density,
}

impl Unknown {
    /// True for what a lot brings: scatter of its material, one value for all of its pieces.
    pub fn is_of_a_lot(self) -> bool {
        matches!(
            self,
            Unknown::ExpansionScatter(_)
                | Unknown::ModulusScatter(_)
                | Unknown::DataScatter(..)
                | Unknown::SwellScatter(_)
                | Unknown::FillScatter(_)
                | Unknown::BulkScatter(_)
        )
    }
}
