//! Lengths as the tables of limits state them: micrometres to two decimals, exactly.

use std::fmt;
use std::ops::{Add, Neg, Sub};

/// A deviation or a tolerance as an exact decimal, held in hundredths of a micrometre.
///
/// The finest figures of ISO 286-1 are tenths of a micrometre and half of one of them, so that a
/// hundredth holds them all. Sums and differences are exact, and each conversion rounds once.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct Micrometres {
    hundredths: i32,
}

impl Micrometres {
    /// No length.
    pub const ZERO: Micrometres = Micrometres { hundredths: 0 };

    /// Makes a whole number of micrometres.
    pub const fn whole(um: i32) -> Self {
        Self { hundredths: um * 100 }
    }

    /// Makes a number of tenths of a micrometre.
    pub const fn tenths(tenths: i32) -> Self {
        Self { hundredths: tenths * 10 }
    }

    /// Halves it, exactly for every value in tenths.
    pub const fn half(self) -> Self {
        Self { hundredths: self.hundredths / 2 }
    }

    /// Gives the value in micrometres.
    pub fn um(self) -> f64 {
        f64::from(self.hundredths) / 1e2
    }

    /// Gives the value in millimetres, rounded once: 25 µm is exactly the literal `0.025`.
    pub fn mm(self) -> f64 {
        f64::from(self.hundredths) / 1e5
    }

    /// Gives the value in metres, rounded once.
    pub fn metres(self) -> f64 {
        f64::from(self.hundredths) / 1e8
    }
}

impl Add for Micrometres {
    type Output = Self;

    fn add(self, other: Self) -> Self {
        Self { hundredths: self.hundredths + other.hundredths }
    }
}

impl Sub for Micrometres {
    type Output = Self;

    fn sub(self, other: Self) -> Self {
        Self { hundredths: self.hundredths - other.hundredths }
    }
}

impl Neg for Micrometres {
    type Output = Self;

    fn neg(self) -> Self {
        Self { hundredths: -self.hundredths }
    }
}

impl fmt::Display for Micrometres {
    /// Writes the value in micrometres with as many decimals as it has, signed unless zero.
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        if self.hundredths == 0 { write!(f, "0") } else { write!(f, "{:+}", self.um()) }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_conversion_gives_the_decimal_as_a_person_would_write_it() {
        assert_eq!(Micrometres::whole(25).mm(), 0.025);
        assert_eq!(Micrometres::whole(-41).mm(), -0.041);
        assert_eq!(Micrometres::whole(13).metres(), 13e-6);
        assert_eq!(Micrometres::tenths(45).half().um(), 2.25);
    }

    #[test]
    fn it_is_written_signed_and_without_needless_decimals() {
        assert_eq!(Micrometres::whole(18).to_string(), "+18");
        assert_eq!(Micrometres::tenths(-45).to_string(), "-4.5");
        assert_eq!((Micrometres::whole(3) - Micrometres::whole(3)).to_string(), "0");
    }
}
