//! One material, as it stands in a YAML file.

use super::expansion::ExpansionsEntry;
use super::place;
use super::property::{PropertyOf, SourceEntry, SwellEntry};
use super::quantity::{Density, Quantity, Ratio, Stress, Temperature, TemperatureRange};
use crate::materials::{Material, Source, SwellState};
use serde::de::{Deserialize, Deserializer};

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Fields {
    name: String,
    #[serde(default)]
    title: String,
    family: String,
    #[serde(default)]
    designations: Vec<String>,
    expansion: ExpansionsEntry,
    modulus: Option<PropertyOf<Stress>>,
    poisson: Option<PropertyOf<Ratio>>,
    #[serde(rename = "yield")]
    yield_strength: Option<PropertyOf<Stress>>,
    density: Option<PropertyOf<Density>>,
    bulk_modulus: Option<PropertyOf<Stress>>,
    limit: Option<Quantity<Temperature>>,
    #[serde(default)]
    swell: Vec<SwellEntry>,
    transition: Option<TemperatureRange>,
    #[serde(default)]
    extrapolate: bool,
    #[serde(default)]
    cautions: Vec<String>,
    source: Option<SourceEntry>,
}

/// A material that was read and found sound.
#[derive(Debug)]
pub(super) struct Entry(pub(super) Material);

impl<'de> Deserialize<'de> for Entry {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::block(deserializer, "a material", Fields::entry)
    }
}

impl Fields {
    fn entry(self) -> Result<Entry, String> {
        let name = self.name;
        let starts = name.starts_with(|c: char| c == '_' || c.is_alphabetic());
        if !starts || !name.chars().all(|c| c == '_' || c.is_alphanumeric()) {
            return Err(format!(
                "`{name}` is no name: expected letters, digits and `_`, a digit not first"
            ));
        }
        let swell: Vec<SwellState> = self.swell.into_iter().map(|entry| entry.0).collect();
        for (i, state) in swell.iter().enumerate() {
            if swell[..i].iter().any(|earlier| earlier.name == state.name) {
                return Err(format!("moisture state `{}` is defined twice", state.name));
            }
        }
        Ok(Entry(Material {
            name,
            title: self.title,
            family: self.family,
            designations: self.designations,
            expansion: self.expansion.0,
            modulus: self.modulus.map(|p| p.property),
            poisson: self.poisson.map(|p| p.property),
            yield_strength: self.yield_strength.map(|p| p.property),
            density: self.density.map(|p| p.property),
            bulk_modulus: self.bulk_modulus.map(|p| p.property),
            limit: self.limit.map(|t| t.si),
            swell,
            transition: self.transition.map(|range| range.0),
            extrapolate: self.extrapolate,
            cautions: self.cautions,
            source: self.source.map(Source::from),
        }))
    }
}
