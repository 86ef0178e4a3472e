//! A fit: a hole and a shaft of one nominal size (ISO 286-1:2010, 3.3 and 5).
//!
//! Clearance is hole less shaft; an interference is a negative clearance.

use super::class::{Class, Kind};
use super::limits::Deviations;
use super::refusal::NotDefined;
use crate::standards::Micrometres;
use std::fmt;

/// The limits of a hole and a shaft that share a nominal size.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Fit {
    /// The hole's limit deviations.
    pub hole: Deviations,
    /// The shaft's limit deviations.
    pub shaft: Deviations,
}

/// What the limits allow.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Character {
    /// Clearance in every pair; it may be nil.
    Clearance,
    /// Clearance or interference, by the sizes of the pair.
    Transition,
    /// Interference in every pair; it may be nil.
    Interference,
}

impl Fit {
    /// Gives the least clearance: smallest hole less greatest shaft.
    pub fn least(self) -> Micrometres {
        self.hole.lower - self.shaft.upper
    }

    /// Gives the greatest clearance: greatest hole less smallest shaft.
    pub fn greatest(self) -> Micrometres {
        self.hole.upper - self.shaft.lower
    }

    /// Gives the span of the fit: the sum of both tolerances.
    pub fn span(self) -> Micrometres {
        self.greatest() - self.least()
    }

    /// Tells the kind of fit. Line to line at one end belongs to the kind on its side: H7/h6 is a
    /// clearance fit.
    pub fn character(self) -> Character {
        if self.least() >= Micrometres::ZERO {
            Character::Clearance
        } else if self.greatest() <= Micrometres::ZERO {
            Character::Interference
        } else {
            Character::Transition
        }
    }
}

impl fmt::Display for Character {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::Clearance => "clearance fit",
            Self::Transition => "transition fit",
            Self::Interference => "interference fit",
        })
    }
}

/// Why two classes make no fit.
#[derive(Debug, Clone, PartialEq)]
pub enum FitError {
    /// The class given for the hole is a shaft's.
    NotAHole(Class),
    /// The class given for the shaft is a hole's.
    NotAShaft(Class),
    /// One of them has no limits at this size.
    NotDefined(NotDefined),
}

impl From<NotDefined> for FitError {
    fn from(refused: NotDefined) -> Self {
        Self::NotDefined(refused)
    }
}

impl fmt::Display for FitError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::NotAHole(class) => write!(f, "expected the class of a hole, found `{class}`"),
            Self::NotAShaft(class) => write!(f, "expected the class of a shaft, found `{class}`"),
            Self::NotDefined(refused) => refused.fmt(f),
        }
    }
}

impl std::error::Error for FitError {}

/// Gives the fit of a hole and a shaft at a nominal size, mm.
///
/// # Errors
/// Refuses a class on the wrong side and one without limits at this size.
pub fn fit(nominal: f64, hole: Class, shaft: Class) -> Result<Fit, FitError> {
    if hole.kind != Kind::Hole {
        return Err(FitError::NotAHole(hole));
    }
    if shaft.kind != Kind::Shaft {
        return Err(FitError::NotAShaft(shaft));
    }
    Ok(Fit { hole: hole.limits(nominal)?, shaft: shaft.limits(nominal)? })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::standards::iso286::Letters;

    #[test]
    fn a_class_on_the_wrong_side_is_refused() {
        let (hole, shaft) = (Class::hole(Letters::H, 7), Class::shaft(Letters::G, 6));
        assert_eq!(fit(40.0, shaft, shaft), Err(FitError::NotAHole(shaft)));
        assert_eq!(fit(40.0, hole, hole), Err(FitError::NotAShaft(hole)));
        assert!(fit(40.0, hole, shaft).is_ok());
    }

    #[test]
    fn line_to_line_belongs_to_the_kind_on_its_side() {
        let hole = Class::hole(Letters::H, 7);
        let character = |letters, n| fit(40.0, hole, Class::shaft(letters, n)).unwrap().character();
        assert_eq!(character(Letters::H, 6), Character::Clearance);
        assert_eq!(character(Letters::K, 6), Character::Transition);
        assert_eq!(character(Letters::P, 6), Character::Interference);
    }
}
