//! What must be said wherever a figure of load or of joining is shown, in a line each.
//!
//! The fuller words stand in the cautions of a detailed report ([`super::basis`]).

use crate::diagnostic::Code;
use crate::model::{Assembly, Quantity, SubjectId, SubjectKind};
use std::collections::BTreeSet;

/// What a figure calls for.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Caution {
    /// It is of stress, force, pressure or torque: an engineer answers for it.
    Review,
    /// It is a temperature for joining: heat, cold and the vapour of a coolant besides.
    Joining,
    /// It is of a closed liquid that fills its cavity: its pressure besides.
    Trapped,
}

impl Caution {
    /// What a quantity of a subject calls for; `None` for free sizes and volumes.
    pub fn of(assembly: &Assembly, subject: SubjectId, quantity: Quantity) -> Option<Caution> {
        let trapped = matches!(assembly.subject(subject).kind, SubjectKind::Fill(_));
        match quantity {
            Quantity::Pressure | Quantity::Stress(_) if trapped => Some(Caution::Trapped),
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
            Code::StressPastYield => Some(Caution::Review),
            Code::BulkModulusGrows | Code::CavityFull => Some(Caution::Trapped),
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
            Caution::Trapped => {
                "trapped liquid can burst its vessel: relief valve; pressure codes apply"
            }
        }
    }
}

/// What is to be said of figures that call for these, each once; all of them are of loads too.
pub(super) fn lines(called_for: impl IntoIterator<Item = Option<Caution>>) -> Vec<&'static str> {
    let mut said: BTreeSet<Caution> = called_for.into_iter().flatten().collect();
    if !said.is_empty() {
        said.insert(Caution::Review);
    }
    said.into_iter().map(Caution::words).collect()
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::wrap::width;

    #[test]
    fn each_line_is_said_once_and_fits() {
        use Caution::{Joining, Review, Trapped};
        assert_eq!(lines([None, None]), Vec::<&str>::new());
        assert_eq!(lines([Some(Review), None, Some(Review)]).len(), 1);
        for line in lines([Some(Joining), Some(Review), Some(Trapped)]) {
            assert!(width(&format!("caution: {line}")) <= 80, "{line}");
        }
        assert_eq!(lines([Some(Joining)]).len(), 2);
        assert_eq!(lines([Some(Trapped), None, Some(Trapped)]).len(), 2);
        assert_eq!(lines([Some(Trapped), Some(Joining)]).len(), 3);
    }
}
