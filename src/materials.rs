//! Materials: expansion, elastic data, the built-in library and its sources.
//!
//! Knows nothing of spans, files or the language of a spec. Everything is SI: K, Pa, kg/m³, 1/K,
//! strain as a pure number. A material is plain data: a spec or a library writes its fields, and
//! whoever evaluates reads its curves.

mod expansion;
mod library;
mod log_polynomial;
mod property;
pub mod yaml;

pub use expansion::{Expansion, Expansions, Form, Per, Stretch};
pub use library::Library;
pub use property::{Grade, Property, Scatter, Source, SwellState};

use crate::numeric::Interval;

/// A material with its data and where they come from.
#[derive(Debug, Clone)]
pub struct Material {
    /// Its name in a spec.
    pub name: String,
    /// What it is, in words.
    pub title: String,
    /// The family it is listed under: `aluminium`, `glass`, `elastomer`, …
    pub family: String,
    /// Standard designations (EN, UNS, ASTM, …).
    pub designations: Vec<String>,
    /// How it expands.
    pub expansion: Expansions,
    /// Young's modulus, Pa.
    pub modulus: Option<Property>,
    /// Poisson's ratio.
    pub poisson: Option<Property>,
    /// Yield strength, or the proof strength used as one, Pa.
    pub yield_strength: Option<Property>,
    /// Density, kg/m³.
    pub density: Option<Property>,
    /// Bulk modulus, isothermal, Pa.
    pub bulk_modulus: Option<Property>,
    /// The highest temperature it may be heated to, as for joining, K.
    pub limit: Option<f64>,
    /// Free strain from moisture; the first state is that of the drawing. Empty where it does not
    /// swell.
    pub swell: Vec<SwellState>,
    /// Temperatures in which it changes length abruptly, K: a size stated there means little.
    pub transition: Option<Interval>,
    /// True where data may be continued outside their range, which every report then says.
    pub extrapolate: bool,
    /// What to beware of.
    pub cautions: Vec<String>,
    /// Where the data come from that do not name a source of their own.
    pub source: Option<Source>,
}

impl Material {
    /// A material of which nothing but the expansion is known yet.
    pub fn new(name: impl Into<String>, expansion: Expansions) -> Self {
        Material {
            name: name.into(),
            title: String::new(),
            family: String::new(),
            designations: Vec::new(),
            expansion,
            modulus: None,
            poisson: None,
            yield_strength: None,
            density: None,
            bulk_modulus: None,
            limit: None,
            swell: Vec::new(),
            transition: None,
            extrapolate: false,
            cautions: Vec::new(),
            source: None,
        }
    }

    /// The temperatures its expansion data cover, in every direction, K.
    pub fn valid(&self) -> Interval {
        self.expansion.valid()
    }

    /// The moisture state of that name.
    pub fn swell_state(&self, name: &str) -> Option<&SwellState> {
        self.swell.iter().find(|state| state.name == name)
    }

    /// The source of a property: its own, else the material's.
    pub fn source_of<'a>(&'a self, own: Option<&'a Source>) -> Option<&'a Source> {
        own.or(self.source.as_ref())
    }

    /// Every source its data name, each once, in the order of the fields.
    pub fn sources(&self) -> Vec<&Source> {
        let properties =
            [&self.modulus, &self.poisson, &self.yield_strength, &self.density, &self.bulk_modulus];
        let mut sources: Vec<&Source> = Vec::new();
        let named = self
            .expansion
            .each()
            .into_iter()
            .flat_map(|(_, expansion)| expansion.sources_within(Interval::ENTIRE))
            .map(Some)
            .chain(properties.into_iter().flatten().map(|p| p.source.as_ref()))
            .chain([self.source.as_ref()]);
        for source in named.flatten() {
            if !sources.contains(&source) {
                sources.push(source);
            }
        }
        sources
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn sources_are_named_once() {
        let handbook = Source::new(Grade::Handbook, "a handbook");
        let mut expansion = Expansion::constant(12e-6, 293.15);
        expansion.source = Some(handbook.clone());
        let mut material = Material::new("x", Expansions::Isotropic(expansion));
        material.source = Some(Source::new(Grade::Memory, "from memory"));
        material.modulus = Some(Property { source: Some(handbook), ..Property::constant(2e11) });
        let grades: Vec<Grade> = material.sources().iter().map(|s| s.grade).collect();
        assert_eq!(grades, [Grade::Handbook, Grade::Memory]);
        assert_eq!(material.source_of(None).map(|s| s.grade), Some(Grade::Memory));
    }
}
