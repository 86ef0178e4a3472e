//! Kinds of quantity and the table of units. Values inside the program are SI: metre, kelvin, pascal,
//! newton, kilogram per cubic metre, radian, radian per second.
//!
//! A temperature and a temperature difference are two kinds: 20 °C is 293.15 K, a rise of 20 °C is
//! 20 K. Knows nothing of files or spans.

mod kind;
mod table;

pub use kind::{Kind, Tag};
pub use table::{Unit, all, find};

/// Absolute temperature of 0 °C, K (exact by definition of the Celsius scale).
pub const ICE_POINT: f64 = 273.15;

/// Standard reference temperature of geometrical specification, 20 °C in K (ISO 1).
pub const STANDARD_REFERENCE: f64 = 293.15;

/// The units a file states its bare numbers in.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Defaults {
    /// Unit of bare lengths.
    pub length: &'static Unit,
    /// Unit of bare temperatures.
    pub temperature: &'static Unit,
}

impl Defaults {
    /// The unit that a quantity of `kind` is shown in.
    ///
    /// Lengths and temperatures follow the file; everything else takes the unit the trade writes it
    /// in beside millimetres or inches.
    pub fn shown(&self, kind: Kind) -> &'static Unit {
        table::shown(kind, self)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_temperature_and_a_difference_are_not_the_same() {
        let f = find("degF").unwrap();
        assert!((f.to_si(68.0) - STANDARD_REFERENCE).abs() < 1e-12);
        assert!((f.difference_to_si(9.0) - 5.0).abs() < 1e-12);
        assert!((f.from_si(STANDARD_REFERENCE) - 68.0).abs() < 1e-12);
    }

    #[test]
    fn inch_and_thou_are_exact() {
        // 1 in = 25.4 mm exactly (international yard and pound agreement, 1959).
        assert_eq!(find("in").unwrap().to_si(1.0), 0.0254);
        assert_eq!(find("thou").unwrap().to_si(1.0), 0.0000254);
    }

    #[test]
    fn every_unit_converts_back() {
        for unit in all() {
            let there = unit.from_si(unit.to_si(12.5));
            assert!((there - 12.5).abs() < 1e-9, "{}", unit.name);
        }
    }
}
