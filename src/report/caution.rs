//! What must be said wherever a figure of load or of joining is shown, in a line each.
//!
//! The fuller words stand in the cautions of a detailed report ([`super::basis`]).

use crate::diagnostic::Code;
use crate::model::Quantity;

/// What a figure calls for.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Caution {
    /// It is of stress, force, pressure or torque: an engineer answers for it.
    Review,
    /// It is a temperature for joining: heat, cold and the vapour of a coolant besides.
    Joining,
}

impl Caution {
    /// What a quantity calls for; `None` for free sizes and volumes.
    pub fn of(quantity: Quantity) -> Option<Caution> {
        match quantity {
            Quantity::Pressure
            | Quantity::Torque
            | Quantity::AxialForce
            | Quantity::Stress(_)
            | Quantity::Force
            | Quantity::LooseningTemperature => Some(Caution::Review),
            Quantity::JoiningTemperature => Some(Caution::Joining),
            Quantity::Clearance
            | Quantity::Interference
            | Quantity::RadialClearance
            | Quantity::Gap
            | Quantity::Value
            | Quantity::Separation
            | Quantity::Ullage => None,
        }
    }

    /// What a finding calls for that may stand where nothing of the kind is required.
    pub(super) fn of_finding(code: Code) -> Option<Caution> {
        match code {
            Code::StressPastYield | Code::BulkModulusGrows => Some(Caution::Review),
            Code::JoiningOutOfReach => Some(Caution::Joining),
            _ => None,
        }
    }

    fn words(self) -> &'static str {
        match self {
            Caution::Review => {
                "stress and force support a qualified engineer's review, not replace it"
            }
            Caution::Joining => {
                "heat and cold burn; vapour of a coolant displaces the air to breathe"
            }
        }
    }
}

/// What is to be said of figures that call for these, each once; joining is of loads too.
pub(super) fn lines(called_for: impl IntoIterator<Item = Option<Caution>>) -> Vec<&'static str> {
    match called_for.into_iter().flatten().max() {
        None => Vec::new(),
        Some(Caution::Review) => vec![Caution::Review.words()],
        Some(Caution::Joining) => vec![Caution::Review.words(), Caution::Joining.words()],
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::wrap::width;

    #[test]
    fn each_line_is_said_once_and_fits() {
        use Caution::{Joining, Review};
        assert_eq!(lines([None, None]), Vec::<&str>::new());
        assert_eq!(lines([Some(Review), None, Some(Review)]).len(), 1);
        for line in lines([Some(Joining), Some(Review)]) {
            assert!(width(&format!("caution: {line}")) <= 80, "{line}");
        }
        assert_eq!(lines([Some(Joining)]).len(), 2);
    }
}
