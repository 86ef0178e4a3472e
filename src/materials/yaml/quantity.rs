//! Numbers with their units, as they stand in a YAML file.

use super::place;
use crate::numeric::Interval;
use crate::units::{self, Kind, Unit};
use serde::de::{Deserialize, Deserializer};
use std::marker::PhantomData;

/// A kind of quantity that a field is declared to hold, with the bounds that nature sets it.
pub(super) trait Measured {
    const KIND: Kind;
    const WORD: &'static str;
    const LEAST: f64 = f64::MIN_POSITIVE;
    const GREATEST: f64 = f64::INFINITY;
}

macro_rules! measured {
    ($($name:ident = $kind:ident, $word:literal $(, $least:literal ..= $greatest:literal)?;)*) => {$(
        #[derive(Debug)]
        pub(super) struct $name;
        impl Measured for $name {
            const KIND: Kind = Kind::$kind;
            const WORD: &'static str = $word;
            $(const LEAST: f64 = $least; const GREATEST: f64 = $greatest;)?
        }
    )*};
}

measured! {
    Stress = STRESS, "stress";
    Density = DENSITY, "density";
    Temperature = TEMPERATURE, "temperature", 0.0 ..= 1e5;
    Coefficient = EXPANSION, "coefficient of expansion", -1e-2 ..= 1e-2;
    Ratio = PURE, "Poisson's ratio", -1.0 ..= 0.5;
    Share = PURE, "share", -1.0 ..= 1.0;
}

/// Refuses a value that nature does not allow.
pub(super) fn bounded<M: Measured>(si: f64) -> Result<f64, String> {
    if (M::LEAST..=M::GREATEST).contains(&si) {
        Ok(si)
    } else if M::GREATEST.is_finite() {
        let (least, greatest) = (M::LEAST, M::GREATEST);
        Err(format!("a {} lies between {least} and {greatest}, found {si}", M::WORD))
    } else {
        Err(format!("a {} lies above zero, found {si}", M::WORD))
    }
}

/// The unit of that spelling, if it measures `kind`.
pub(super) fn unit_of(spelling: &str, kind: Kind) -> Result<&'static Unit, String> {
    let unit = units::find(spelling).ok_or_else(|| format!("unknown unit `{spelling}`"))?;
    if unit.kind == kind {
        Ok(unit)
    } else {
        let (wanted, found) = (kind.word(), unit.kind.word());
        Err(format!("expected a unit of {wanted}, found `{spelling}`, one of {found}"))
    }
}

/// A kind of quantity with its article.
fn one(kind: Kind) -> String {
    let word = kind.word();
    let article = if word.starts_with(['a', 'e', 'i', 'o', 'u']) { "an" } else { "a" };
    format!("{article} {word}")
}

/// One number with its unit, in SI.
#[derive(Debug)]
pub(super) struct Quantity<M> {
    pub(super) si: f64,
    kind: PhantomData<M>,
}

impl<M: Measured> Quantity<M> {
    fn new(si: f64) -> Result<Self, String> {
        Ok(Quantity { si: bounded::<M>(si)?, kind: PhantomData })
    }

    pub(super) fn parse(text: &str) -> Result<Self, String> {
        let (number, spelling) = split(text)?;
        if spelling.is_empty() && M::KIND != Kind::PURE {
            return Err(format!("expected a {} with its unit, found `{text}`", M::WORD));
        }
        let unit = units::find(spelling).ok_or_else(|| format!("unknown unit `{spelling}`"))?;
        if unit.kind != M::KIND {
            return Err(format!("expected a {}, found `{text}`, {}", M::WORD, one(unit.kind)));
        }
        Quantity::new(unit.to_si(number))
    }
}

fn split(text: &str) -> Result<(f64, &str), String> {
    let (number, unit) = text.trim().split_once(' ').unwrap_or((text.trim(), ""));
    let number: f64 =
        number.parse().map_err(|_| format!("expected a number with its unit, found `{text}`"))?;
    if number.is_finite() {
        Ok((number, unit.trim()))
    } else {
        Err(format!("expected a finite number, found `{text}`"))
    }
}

impl<'de, M: Measured> Deserialize<'de> for Quantity<M> {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::text(deserializer, &format!("a {} with its unit", M::WORD), Quantity::parse)
    }
}

/// The unit of a column of a table.
#[derive(Debug)]
pub(super) struct UnitOf<M> {
    pub(super) unit: &'static Unit,
    kind: PhantomData<M>,
}

impl<'de, M: Measured> Deserialize<'de> for UnitOf<M> {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::text(deserializer, &format!("a unit of {}", M::WORD), |spelling| {
            Ok(UnitOf { unit: unit_of(spelling, M::KIND)?, kind: PhantomData })
        })
    }
}

/// A range of temperature such as `-60 .. 150 degC`, in K.
#[derive(Debug)]
pub(super) struct TemperatureRange(pub(super) Interval);

impl TemperatureRange {
    fn parse(text: &str) -> Result<Self, String> {
        let form = || format!("expected a range as `-60 .. 150 degC`, found `{text}`");
        let (lo, rest) = text.split_once("..").ok_or_else(form)?;
        let (hi, spelling) = split(rest)?;
        let unit = unit_of(spelling, Kind::TEMPERATURE)?;
        let lo: f64 = lo.trim().parse().map_err(|_| form())?;
        let (lo, hi) =
            (bounded::<Temperature>(unit.to_si(lo))?, bounded::<Temperature>(unit.to_si(hi))?);
        if lo < hi {
            Ok(TemperatureRange(Interval::new(lo, hi)))
        } else {
            Err(format!("the range `{text}` does not rise"))
        }
    }
}

impl<'de> Deserialize<'de> for TemperatureRange {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::text(deserializer, "a range as `-60 .. 150 degC`", TemperatureRange::parse)
    }
}
