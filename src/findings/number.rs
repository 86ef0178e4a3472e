//! Numbers as people read them: in a unit, to a sensible digit, rounded outward so that what is
//! printed never looks safer than what was proven.

use crate::numeric::tolerance::{EXTREME_GAP, LIMIT_SLACK};
use crate::units::{Kind, Unit};

/// Which way the last digit goes.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Round {
    /// Towards −∞: for least values and for margins.
    Down,
    /// Towards +∞: for greatest values.
    Up,
    /// To the nearest.
    Nearest,
}

/// Digits after the point that a figure in this unit is shown with.
pub fn decimals(unit: &Unit) -> usize {
    match unit.name {
        "mm" => 4,
        "um" | "nm" => 1,
        "m" => 7,
        "cm" => 5,
        "in" => 5,
        "thou" => 2,
        "deg" => 3,
        "degC" | "degF" | "K" | "MPa" | "bar" => 1,
        "N*m" | "lbf*in" | "lbf*ft" => 1,
        "N" | "lbf" | "psi" | "kPa" | "Pa" | "rpm" => 0,
        "kN" | "kN/mm" | "GPa" | "%" => 2,
        "ppm" => 0,
        "" | "rad" => 5,
        _ => 3,
    }
}

/// Below this, in the unit shown, a number is a trace of rounding and counts as nothing.
const NOTHING: f64 = EXTREME_GAP;
/// Most digits that small numbers get beyond those of their unit.
const MOST_MORE: usize = 8;
/// Digits of a number that have to be seen.
const SIGNIFICANT: f64 = 10.0;

/// The digits that numbers of one sentence share: those of their unit, and more where one of them is
/// so small that it could not be told from nothing, or from its limit.
///
/// Lengths and temperatures keep the digits of their unit, which are those of a drawing and a
/// thermometer.
#[derive(Debug, Clone, Copy)]
pub struct Digits {
    unit: &'static Unit,
    places: usize,
}

impl Digits {
    /// Enough for every one of these values and differences, SI.
    pub fn of(unit: &'static Unit, numbers: &[f64]) -> Self {
        let usual = decimals(unit);
        let mut places = usual;
        if !matches!(unit.kind, Kind::LENGTH | Kind::TEMPERATURE) {
            let sizes = numbers.iter().map(|si| unit.difference_from_si(*si).abs());
            let least =
                sizes.filter(|x| x.is_finite() && *x > NOTHING).fold(f64::INFINITY, f64::min);
            let scaled = |places: usize| least * libm::pow(10.0, places as f64);
            while scaled(places) < SIGNIFICANT && places < usual + MOST_MORE {
                places += 1;
            }
        }
        Digits { unit, places }
    }

    /// An SI value with its unit.
    pub fn value(self, si: f64, round: Round) -> String {
        join(&digits(self.unit.from_si(si), self.places, round), self.unit.symbol)
    }

    /// An SI difference with its unit.
    pub fn difference(self, si: f64, round: Round) -> String {
        let shown = digits(self.unit.difference_from_si(si), self.places, round);
        join(&shown, difference_symbol(self.unit))
    }
}

fn difference_symbol(unit: &'static Unit) -> &'static str {
    if unit.kind == Kind::TEMPERATURE { unit.difference_symbol() } else { unit.symbol }
}

/// True for what counts as nothing in the unit it is shown in.
pub fn is_nothing(si: f64, unit: &Unit) -> bool {
    unit.difference_from_si(si).abs() <= NOTHING
}

/// An SI value in `unit` with the digits that unit is shown with, without the unit's symbol.
pub fn shown(si: f64, unit: &Unit, round: Round) -> String {
    digits(unit.from_si(si), decimals(unit), round)
}

/// An SI difference in `unit`, as [`shown`]; for margins and widths of temperatures.
pub fn difference(si: f64, unit: &Unit, round: Round) -> String {
    digits(unit.difference_from_si(si), decimals(unit), round)
}

/// An SI value with its unit, such as `0.0041 mm` or `85.0 °C`.
pub fn with_unit(si: f64, unit: &'static Unit, round: Round) -> String {
    Digits::of(unit, &[si]).value(si, round)
}

/// An SI difference with its unit.
pub fn difference_with_unit(si: f64, unit: &'static Unit, round: Round) -> String {
    Digits::of(unit, &[si]).difference(si, round)
}

/// A figure and its unit, with a blank unless the unit is a degree sign or there is none.
pub fn join(figure: &str, symbol: &str) -> String {
    match symbol {
        "" => figure.to_string(),
        "°" => format!("{figure}{symbol}"),
        _ => format!("{figure} {symbol}"),
    }
}

/// A share 0 … 1 as per cent to one digit.
pub fn share(x: f64) -> String {
    format!("{} %", digits(x * 100.0, 1, Round::Nearest))
}

/// A number to `decimals` digits after the point.
///
/// What lies within [`LIMIT_SLACK`] of a digit counts as that digit: the rounding of binary
/// arithmetic must not turn a limit met exactly into one passed.
pub fn digits(x: f64, decimals: usize, round: Round) -> String {
    if x.is_nan() {
        return "not known".to_string();
    }
    if x.is_infinite() {
        return if x > 0.0 { "unbounded".to_string() } else { "-unbounded".to_string() };
    }
    let scale = (0..decimals).fold(1.0, |s, _| s * 10.0);
    let scaled = x * scale;
    if !scaled.is_finite() || scaled.abs() >= 1e15 {
        return format!("{x:e}");
    }
    let slack = LIMIT_SLACK * scale;
    let whole = match round {
        Round::Down => libm::floor(scaled + slack),
        Round::Up => libm::ceil(scaled - slack),
        Round::Nearest => libm::round(scaled),
    };
    // Adding zero turns −0 into 0.
    format!("{:.*}", decimals, whole / scale + 0.0)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::units::find;

    #[test]
    fn bounds_round_outward() {
        let mm = find("mm").unwrap();
        assert_eq!(shown(0.012_34e-3, mm, Round::Down), "0.0123");
        assert_eq!(shown(0.012_34e-3, mm, Round::Up), "0.0124");
        assert_eq!(shown(-0.012_34e-3, mm, Round::Down), "-0.0124");
        assert_eq!(shown(-0.000_01e-3, mm, Round::Up), "0.0000");
    }

    #[test]
    fn value_limit_and_difference_are_told_apart() {
        let said = |unit, value: f64, limit: f64| {
            let unit = find(unit).unwrap();
            let (value, limit) = (unit.to_si(value), unit.to_si(limit));
            let digits = Digits::of(unit, &[value, limit, limit - value]);
            [digits.value(value, Round::Down), digits.value(limit, Round::Nearest)].join(" ")
        };
        assert_eq!(said("MPa", 0.0123, 0.1), "0.012 MPa 0.100 MPa");
        assert_eq!(said("MPa", 37.948, 38.0), "37.948 MPa 38.000 MPa");
        assert_eq!(said("MPa", 12.3, 38.0), "12.3 MPa 38.0 MPa");
        assert_eq!(said("MPa", 0.0, 38.0), "0.0 MPa 38.0 MPa");
        // A trace of rounding asks for no digits; a drawing has its own.
        assert_eq!(said("MPa", 3e-12, 38.0), "0.0 MPa 38.0 MPa");
        assert_eq!(said("mm", 0.000_012, 0.1), "0.0000 mm 0.1000 mm");
        assert_eq!(with_unit(0.25, find("N*m").unwrap(), Round::Up), "0.25 N·m");
    }

    #[test]
    fn a_limit_met_exactly_is_printed_as_met() {
        assert_eq!(digits(0.03 + 1e-17, 4, Round::Up), "0.0300");
        assert_eq!(digits(0.1 + 0.2, 4, Round::Up), "0.3000");
        assert_eq!(digits(-1e-16, 4, Round::Down), "0.0000");
    }

    #[test]
    fn nothing_known_says_so() {
        assert_eq!(digits(f64::NAN, 3, Round::Up), "not known");
        assert_eq!(digits(f64::NEG_INFINITY, 3, Round::Down), "-unbounded");
        assert_eq!(digits(1e300, 3, Round::Up), "1e300");
    }
}
