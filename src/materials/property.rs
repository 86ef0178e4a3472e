//! What a material property consists of besides its name: data, scatter, range, source. SI.

use crate::numeric::piecewise::{Beyond, TableError};
use crate::numeric::{Curve, Interval, Piecewise};
use std::fmt;
use std::sync::Arc;

/// A property against temperature.
#[derive(Debug, Clone)]
pub struct Property {
    /// Its value against temperature in K.
    pub curve: Arc<dyn Curve>,
    /// How far a lot may lie from it, as a fraction of the value.
    pub scatter: f64,
    /// The temperatures the data cover, K; a constant is taken to hold everywhere.
    pub range: Interval,
    /// Where the data come from, if not from where the material's do.
    pub source: Option<Source>,
}

impl Property {
    /// A property that does not depend on temperature, as far as is known.
    pub fn constant(value: f64) -> Self {
        Property {
            curve: Arc::new(Piecewise::constant(value)),
            scatter: 0.0,
            range: Interval::ENTIRE,
            source: None,
        }
    }

    /// A property from a table of (temperature in K, value), straight between entries and held
    /// outside them.
    ///
    /// # Errors
    /// When the table is empty, its temperatures do not rise, or a number is not finite.
    pub fn table(table: &[(f64, f64)]) -> Result<Self, TableError> {
        let curve = Piecewise::linear(table, Beyond::Hold)?;
        let range = Interval::new(table[0].0, table[table.len() - 1].0);
        Ok(Property { curve: Arc::new(curve), scatter: 0.0, range, source: None })
    }

    /// The value at a temperature in K.
    pub fn at(&self, temperature: f64) -> f64 {
        self.curve.value(temperature)
    }
}

/// How far the expansion of a lot may lie from the curve.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Scatter {
    /// A fraction of the thermal strain.
    Relative(f64),
    /// So much coefficient more or less, 1/K, whatever the curve does: the only sound way where
    /// the coefficient is near zero or changes its sign.
    PerKelvin(f64),
}

impl Scatter {
    /// No scatter.
    pub const NONE: Scatter = Scatter::Relative(0.0);

    /// True where nothing scatters.
    pub fn is_none(self) -> bool {
        matches!(self, Scatter::Relative(s) | Scatter::PerKelvin(s) if s == 0.0)
    }
}

/// One state of moisture and the free strain it brings.
#[derive(Debug, Clone, PartialEq)]
pub struct SwellState {
    /// Its name: `dry`, `humid`, `wet`, …
    pub name: String,
    /// The strain, counted from dry.
    pub strain: f64,
    /// How far a lot may lie from it, plus or minus.
    pub spread: f64,
}

/// How good a source is.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Grade {
    /// A standard or a standards laboratory's published data.
    Standard,
    /// A handbook or textbook table.
    Handbook,
    /// A supplier's statement.
    Supplier,
    /// Whoever wrote the spec says so.
    Stated,
    /// Recalled, not looked up: to be confirmed before anything depends on it.
    Memory,
}

impl Grade {
    /// All grades, best first.
    pub const ALL: [Grade; 5] =
        [Grade::Standard, Grade::Handbook, Grade::Supplier, Grade::Stated, Grade::Memory];

    /// The word for it.
    pub fn word(self) -> &'static str {
        match self {
            Grade::Standard => "standard",
            Grade::Handbook => "handbook",
            Grade::Supplier => "supplier",
            Grade::Stated => "stated",
            Grade::Memory => "memory",
        }
    }

    /// The grade of that word.
    pub fn of_word(word: &str) -> Option<Grade> {
        Grade::ALL.into_iter().find(|grade| grade.word() == word)
    }
}

/// Where data come from.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Source {
    /// How good it is.
    pub grade: Grade,
    /// The work, edition and table, or whoever said so.
    pub text: String,
}

impl Source {
    /// A source of that grade.
    pub fn new(grade: Grade, text: impl Into<String>) -> Self {
        Source { grade, text: text.into() }
    }
}

impl fmt::Display for Source {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self.grade {
            Grade::Memory => write!(f, "{} (from memory)", self.text),
            _ => f.write_str(&self.text),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_table_holds_its_ends() {
        let modulus = Property::table(&[(293.15, 207e9), (423.15, 198e9)]).unwrap();
        assert_eq!(modulus.at(200.0), 207e9);
        assert!((modulus.at(358.15) - 202.5e9).abs() < 1e-3);
        assert!(!modulus.range.contains(200.0));
    }

    #[test]
    fn every_grade_has_a_word_of_its_own() {
        for grade in Grade::ALL {
            assert_eq!(Grade::of_word(grade.word()), Some(grade));
        }
    }

    #[test]
    fn what_is_from_memory_says_so() {
        assert_eq!(
            Source::new(Grade::Memory, "usual value").to_string(),
            "usual value (from memory)"
        );
    }
}
