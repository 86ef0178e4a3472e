//! General tolerances for dimensions that state none (ISO 2768-1:1989), classes f, m, c and v.
//!
//! Sizes are millimetres; each permissible deviation is the half-width of a symmetrical tolerance.
//! The tables were read in print but for two entries of class c, where copies in circulation give the
//! values of the older DIN 7168; `docs/standards.md` says which and why. Part 2 of the standard, on
//! geometrical tolerances, is not covered. Knows nothing of text beyond the spelling of
//! a class.

use crate::standards::{Micrometres, up_to_and_including};
use std::fmt;

/// A tolerance class of ISO 2768-1.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Class {
    /// f
    Fine,
    /// m
    Medium,
    /// c
    Coarse,
    /// v
    VeryCoarse,
}

impl Class {
    /// All classes, finest first.
    pub const ALL: [Class; 4] = [Class::Fine, Class::Medium, Class::Coarse, Class::VeryCoarse];

    /// Reads the class from a designation: `m`, or `mK`, whose second letter names a class of Part 2
    /// (H, K or L) and says nothing about sizes. None for any other spelling.
    pub fn parse(text: &str) -> Option<Self> {
        let mut letters = text.chars();
        let class = letters.next()?;
        let found = Self::ALL.into_iter().find(|known| known.letter() == class)?;
        match (letters.next(), letters.next()) {
            (None | Some('H' | 'K' | 'L'), None) => Some(found),
            _ => None,
        }
    }

    /// Gives the letter of the class.
    pub fn letter(self) -> char {
        match self {
            Self::Fine => 'f',
            Self::Medium => 'm',
            Self::Coarse => 'c',
            Self::VeryCoarse => 'v',
        }
    }

    /// Gives the permissible deviation ± of a linear size (Table 1), mm in.
    ///
    /// # Errors
    /// Refuses a size that the table does not cover for this class.
    pub fn length(self, nominal: f64) -> Result<Micrometres, NotCovered> {
        let refused = NotCovered { class: self, nominal, of: Quantity::Length };
        self.entry(nominal, &LENGTHS).map(Micrometres::whole).ok_or(refused)
    }

    /// Gives the permissible deviation ± of an external radius or a chamfer height (Table 2), mm in.
    ///
    /// # Errors
    /// Refuses a size below 0.5 mm.
    pub fn broken_edge(self, nominal: f64) -> Result<Micrometres, NotCovered> {
        let refused = NotCovered { class: self, nominal, of: Quantity::BrokenEdge };
        self.entry(nominal, &BROKEN_EDGES).map(Micrometres::whole).ok_or(refused)
    }

    /// Gives the permissible deviation ± of an angle in minutes of arc, by the length of its shorter
    /// side, mm (Table 3).
    ///
    /// # Errors
    /// Refuses a length that is not positive.
    pub fn angle_minutes(self, shorter_side: f64) -> Result<u16, NotCovered> {
        let refused = NotCovered { class: self, nominal: shorter_side, of: Quantity::Angle };
        if shorter_side.is_nan() || shorter_side <= 0.0 {
            return Err(refused);
        }
        ANGLES
            .iter()
            .find(|(end, _)| up_to_and_including(shorter_side, *end))
            .map(|(_, row)| row[self as usize])
            .ok_or(refused)
    }

    /// Gives the permissible deviation ± of an angle in radians, by the length of its shorter side, mm.
    ///
    /// # Errors
    /// Refuses a length that is not positive.
    pub fn angle(self, shorter_side: f64) -> Result<f64, NotCovered> {
        let minutes = self.angle_minutes(shorter_side)?;
        Ok((f64::from(minutes) / 60.0).to_radians())
    }

    fn entry(self, nominal: f64, table: &[(f64, [Option<i32>; 4])]) -> Option<i32> {
        if nominal.is_nan() || !up_to_and_including(LEAST_SIZE, nominal) {
            return None;
        }
        let (_, row) = table.iter().find(|(end, _)| up_to_and_including(nominal, *end))?;
        row[self as usize]
    }
}

/// The least linear size with a general tolerance, mm; a smaller one carries its own.
pub const LEAST_SIZE: f64 = 0.5;

/// Table 1: the end of each range of size, mm, and the deviation of f, m, c, v, µm.
#[rustfmt::skip]
const LENGTHS: [(f64, [Option<i32>; 4]); 8] = [
    (3.0,    [Some(50),  Some(100),  Some(200),  None]),
    (6.0,    [Some(50),  Some(100),  Some(300),  Some(500)]),
    (30.0,   [Some(100), Some(200),  Some(500),  Some(1000)]),
    (120.0,  [Some(150), Some(300),  Some(800),  Some(1500)]),
    (400.0,  [Some(200), Some(500),  Some(1200), Some(2500)]),
    (1000.0, [Some(300), Some(800),  Some(2000), Some(4000)]),
    (2000.0, [Some(500), Some(1200), Some(3000), Some(6000)]),
    (4000.0, [None,      Some(2000), Some(4000), Some(8000)]),
];

/// Table 2: the end of each range of size, mm, and the deviation of f, m, c, v, µm.
#[rustfmt::skip]
const BROKEN_EDGES: [(f64, [Option<i32>; 4]); 3] = [
    (3.0,           [Some(200),  Some(200),  Some(400),  Some(400)]),
    (6.0,           [Some(500),  Some(500),  Some(1000), Some(1000)]),
    (f64::INFINITY, [Some(1000), Some(1000), Some(2000), Some(2000)]),
];

/// Table 3: the end of each range of the shorter side, mm, and the deviation of f, m, c, v in minutes.
#[rustfmt::skip]
const ANGLES: [(f64, [u16; 4]); 5] = [
    (10.0,          [60, 60, 90, 180]),
    (50.0,          [30, 30, 60, 120]),
    (120.0,         [20, 20, 30,  60]),
    (400.0,         [10, 10, 15,  30]),
    (f64::INFINITY, [ 5,  5, 10,  20]),
];

/// What a general tolerance was asked for.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Quantity {
    /// A linear size.
    Length,
    /// An external radius or a chamfer height.
    BrokenEdge,
    /// An angle, by its shorter side.
    Angle,
}

/// A size for which the standard states no general tolerance.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct NotCovered {
    /// The class asked for.
    pub class: Class,
    /// The size, mm.
    pub nominal: f64,
    /// What it measures.
    pub of: Quantity,
}

impl NotCovered {
    /// Says what would be right.
    pub fn help(&self) -> &'static str {
        "state a tolerance at the dimension itself"
    }
}

impl fmt::Display for NotCovered {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let letter = self.class.letter();
        let nominal = (self.nominal * 1e6).round() / 1e6;
        write!(f, "ISO 2768-{letter} has no tolerance for {nominal} mm: ")?;
        match (self.of, self.class) {
            (Quantity::Angle, _) => write!(f, "the shorter side must be longer than 0 (Table 3)"),
            (Quantity::BrokenEdge, _) => write!(f, "Table 2 begins at {LEAST_SIZE} mm"),
            (Quantity::Length, Class::Fine) => {
                write!(f, "Table 1 covers {LEAST_SIZE} to 2000 mm in this class")
            }
            (Quantity::Length, Class::VeryCoarse) => {
                write!(f, "Table 1 covers sizes over 3 up to 4000 mm in this class")
            }
            (Quantity::Length, _) => {
                write!(f, "Table 1 covers {LEAST_SIZE} to 4000 mm in this class")
            }
        }
    }
}

impl std::error::Error for NotCovered {}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_class_is_read_with_and_without_the_letter_of_part_2() {
        assert_eq!(Class::parse("m"), Some(Class::Medium));
        assert_eq!(Class::parse("fH"), Some(Class::Fine));
        for text in ["", "M", "mk", "x", "mKE", "K"] {
            assert_eq!(Class::parse(text), None, "{text}");
        }
    }

    #[test]
    fn an_angle_in_radians_is_the_one_in_minutes() {
        let radians = Class::Medium.angle(200.0).unwrap();
        assert!((radians - core::f64::consts::PI / 180.0 / 6.0).abs() < 1e-18);
    }

    #[test]
    fn a_refusal_says_what_the_class_covers() {
        let refused = Class::Fine.length(2500.0).expect_err("too long for f");
        assert_eq!(
            refused.to_string(),
            "ISO 2768-f has no tolerance for 2500 mm: Table 1 covers 0.5 to 2000 mm in this class"
        );
        assert_eq!(refused.help(), "state a tolerance at the dimension itself");
        assert!(Class::VeryCoarse.length(2.0).is_err());
        for nothing in [0.0, -1.0, f64::NAN] {
            assert!(Class::Medium.length(nothing).is_err());
            assert!(Class::Medium.broken_edge(nothing).is_err());
            assert!(Class::Medium.angle(nothing).is_err());
        }
    }
}
