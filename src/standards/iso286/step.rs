//! The steps of nominal size, mm: "over … up to and including" (ISO 286-1:2010, Tables 1 to 5).

use crate::standards::up_to_and_including;

/// Ends of the main steps. The first begins over 0.
pub(super) const MAIN: [u16; 21] = [
    3, 6, 10, 18, 30, 50, 80, 120, 180, 250, 315, 400, 500, // to 500 mm
    630, 800, 1000, 1250, 1600, 2000, 2500, 3150,
];

/// Ends of the intermediate steps, which divide most main steps in two or three.
pub(super) const INTERMEDIATE: [u16; 41] = [
    3, 6, 10, 14, 18, 24, 30, 40, 50, 65, 80, 100, 120, 140, 160, 180, 200, 225, 250, 280, 315,
    355, 400, 450, 500, // to 500 mm
    560, 630, 710, 800, 900, 1000, 1120, 1250, 1400, 1600, 1800, 2000, 2240, 2500, 2800, 3150,
];

/// The number of main steps up to 500 mm.
pub(super) const MAIN_TO_500: usize = 13;

/// Where a nominal size stands in the tables.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Step {
    /// Index of the main step.
    pub(super) main: usize,
    /// Index of the intermediate step.
    pub(super) intermediate: usize,
    /// The size is at most 1 mm, where some classes are not to be used.
    pub(super) to_one_mm: bool,
}

impl Step {
    /// Finds the step of a nominal size, mm; none outside 0 to 3150 mm.
    pub(super) fn of(nominal: f64) -> Option<Self> {
        if nominal.is_nan() || nominal <= 0.0 {
            return None;
        }
        let within = |ends: &[u16]| {
            let index = ends.partition_point(|&end| !up_to_and_including(nominal, f64::from(end)));
            (index < ends.len()).then_some(index)
        };
        Some(Self {
            main: within(&MAIN)?,
            intermediate: within(&INTERMEDIATE)?,
            to_one_mm: up_to_and_including(nominal, 1.0),
        })
    }

    /// True for the first step, up to 3 mm, where the increment Δ is nil.
    pub(super) fn is_first(self) -> bool {
        self.main == 0
    }

    /// True over 500 mm, where holes mirror shafts without Δ.
    pub(super) fn is_over_500(self) -> bool {
        self.main >= MAIN_TO_500
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn ends(nominal: f64) -> Option<(u16, u16)> {
        Step::of(nominal).map(|s| (MAIN[s.main], INTERMEDIATE[s.intermediate]))
    }

    #[test]
    fn a_step_holds_its_end_and_not_its_beginning() {
        assert_eq!(ends(30.0), Some((30, 30)));
        assert_eq!(ends(50.0), Some((50, 50)));
        assert_eq!(ends(50.001), Some((80, 65)));
        assert_eq!(ends(120.0), Some((120, 120)));
        assert_eq!(ends(3150.0), Some((3150, 3150)));
    }

    #[test]
    fn noise_of_conversion_does_not_move_a_size_into_the_next_step() {
        let by_metres = 0.05 * 1000.0 + 7e-15;
        assert_eq!(ends(by_metres), Some((50, 50)));
        assert_eq!(ends(2.0 * 25.4), Some((80, 65)));
    }

    #[test]
    fn nothing_is_defined_outside_the_system() {
        for nominal in [0.0, -1.0, 3150.1, f64::NAN, f64::INFINITY] {
            assert_eq!(ends(nominal), None, "{nominal}");
        }
    }

    #[test]
    fn every_main_step_ends_where_an_intermediate_step_ends() {
        assert!(MAIN.iter().all(|end| INTERMEDIATE.contains(end)));
        assert!(MAIN.is_sorted() && INTERMEDIATE.is_sorted());
    }
}
