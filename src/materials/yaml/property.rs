//! Properties, swelling and sources, as they stand in a YAML file.

use super::place;
use super::quantity::{Measured, Quantity, Share, Temperature, UnitOf, bounded};
use crate::materials::{Grade, Property, Source, SwellState};
use serde::Deserialize;
use serde::de::value::MapAccessDeserializer;
use serde::de::{Deserializer, Error, MapAccess, Visitor};
use std::fmt;
use std::marker::PhantomData;

/// A property: a number with its unit, or a block with a value or table, scatter and source.
#[derive(Debug)]
pub(super) struct PropertyOf<M> {
    pub(super) property: Property,
    kind: PhantomData<M>,
}

impl<M> PropertyOf<M> {
    fn new(property: Property) -> Self {
        PropertyOf { property, kind: PhantomData }
    }
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields, bound = "M: Measured")]
struct Block<M> {
    value: Option<Quantity<M>>,
    unit: Option<UnitOf<M>>,
    temperature: Option<UnitOf<Temperature>>,
    table: Option<Vec<(f64, f64)>>,
    scatter: Option<Quantity<Share>>,
    source: Option<SourceEntry>,
}

impl<M: Measured> Block<M> {
    fn property(self) -> Result<Property, String> {
        let mut property = match (self.value, self.table) {
            (Some(value), None) if self.unit.is_none() && self.temperature.is_none() => {
                Property::constant(value.si)
            }
            (None, Some(table)) => {
                let needs = |what: &str| format!("a table needs `{what}` beside it");
                let unit = self.unit.ok_or_else(|| needs("unit"))?.unit;
                let temperature = self.temperature.ok_or_else(|| needs("temperature"))?.unit;
                let convert = |(t, y): (f64, f64)| {
                    bounded::<M>(unit.to_si(y)).map(|y| (temperature.to_si(t), y))
                };
                let table: Vec<(f64, f64)> =
                    table.into_iter().map(convert).collect::<Result<_, _>>()?;
                Property::table(&table).map_err(|error| error.to_string())?
            }
            _ => {
                return Err(
                    "expected either `value`, or `unit`, `temperature` and `table`".to_string()
                );
            }
        };
        property.scatter = self.scatter.map_or(Ok(0.0), fraction)?;
        property.source = self.source.map(Source::from);
        Ok(property)
    }
}

/// A scatter as a fraction, which is not negative.
pub(super) fn fraction(share: Quantity<Share>) -> Result<f64, String> {
    if share.si < 0.0 {
        return Err("a scatter is not negative".to_string());
    }
    Ok(share.si)
}

impl<'de, M: Measured> Deserialize<'de> for PropertyOf<M> {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        struct Reader<M>(PhantomData<M>);
        impl<M: Measured> Reader<M> {
            fn constant<E: Error>(text: &str) -> Result<PropertyOf<M>, E> {
                let value = Quantity::<M>::parse(text).map_err(E::custom)?;
                Ok(PropertyOf::new(Property::constant(value.si)))
            }
        }
        impl<'de, M: Measured> Visitor<'de> for Reader<M> {
            type Value = PropertyOf<M>;
            fn expecting(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
                write!(f, "a {} with its unit, or a block with a table", M::WORD)
            }
            fn visit_str<E: Error>(self, text: &str) -> Result<Self::Value, E> {
                Self::constant(text)
            }
            fn visit_f64<E: Error>(self, number: f64) -> Result<Self::Value, E> {
                Self::constant(&number.to_string())
            }
            fn visit_i64<E: Error>(self, number: i64) -> Result<Self::Value, E> {
                Self::constant(&number.to_string())
            }
            fn visit_u64<E: Error>(self, number: u64) -> Result<Self::Value, E> {
                Self::constant(&number.to_string())
            }
            fn visit_map<A: MapAccess<'de>>(self, map: A) -> Result<Self::Value, A::Error> {
                let block = Block::<M>::deserialize(MapAccessDeserializer::new(map))?;
                block.property().map(PropertyOf::new).map_err(A::Error::custom)
            }
        }
        deserializer.deserialize_any(Reader(PhantomData))
    }
}

/// One state of moisture.
#[derive(Debug)]
pub(super) struct SwellEntry(pub(super) SwellState);

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct SwellFields {
    state: String,
    strain: Quantity<Share>,
    spread: Option<Quantity<Share>>,
}

impl<'de> Deserialize<'de> for SwellEntry {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::block(deserializer, "a state of moisture", |fields: SwellFields| {
            let spread = fields.spread.map_or(Ok(0.0), fraction)?;
            Ok(SwellEntry(SwellState { name: fields.state, strain: fields.strain.si, spread }))
        })
    }
}

/// Where data come from.
#[derive(Debug, Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct SourceEntry {
    grade: GradeEntry,
    text: String,
}

#[derive(Debug, Deserialize)]
#[serde(rename_all = "lowercase")]
enum GradeEntry {
    Standard,
    Handbook,
    Supplier,
    Stated,
    Memory,
}

impl From<SourceEntry> for Source {
    fn from(entry: SourceEntry) -> Self {
        let grade = match entry.grade {
            GradeEntry::Standard => Grade::Standard,
            GradeEntry::Handbook => Grade::Handbook,
            GradeEntry::Supplier => Grade::Supplier,
            GradeEntry::Stated => Grade::Stated,
            GradeEntry::Memory => Grade::Memory,
        };
        Source::new(grade, entry.text)
    }
}
