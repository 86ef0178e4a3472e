//! Materials written in YAML: the schema, and its reader.
//!
//! The only place that knows YAML and the crate that reads it. Every number stands with its unit, as
//! `68.9 GPa`, or in a table whose units are named beside it; what comes out is SI. The schema is
//! described in `docs/materials.md`, and is the same for the built-in library and for a user's own.

mod entry;
mod expansion;
mod place;
mod property;
mod quantity;

use super::Material;
use std::fmt;

/// Why a text is no list of materials.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct ReadError {
    /// Line, from 1; 0 where the place is not known.
    pub line: usize,
    /// Column in characters, from 1; 0 where the place is not known.
    pub column: usize,
    /// What is wrong.
    pub message: String,
}

impl fmt::Display for ReadError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(&self.message)
    }
}

impl std::error::Error for ReadError {}

impl From<serde_yaml::Error> for ReadError {
    fn from(error: serde_yaml::Error) -> Self {
        let (line, column) =
            error.location().map_or((0, 0), |place| (place.line(), place.column()));
        // The place is data here, and the path of indices before the message helps nobody.
        let mut message = error.to_string();
        if let Some(cut) = message.rfind(" at line ") {
            message.truncate(cut);
        }
        if let Some((path, rest)) = message.split_once(": ")
            && path.starts_with(['.', '['])
        {
            message = rest.to_string();
        }
        ReadError { line, column, message }
    }
}

/// Reads a list of materials.
///
/// # Errors
/// When the text is no YAML, has a field that the schema does not, leaves one out, gives a number a
/// unit of another kind, or names two materials alike.
pub fn read(text: &str) -> Result<Vec<Material>, ReadError> {
    let entries: Vec<entry::Entry> = serde_yaml::from_str(text)?;
    let materials: Vec<Material> = entries.into_iter().map(|entry| entry.0).collect();
    for (i, material) in materials.iter().enumerate() {
        if materials[..i].iter().any(|earlier| earlier.name == material.name) {
            return Err(ReadError {
                line: second_line_naming(text, &material.name),
                column: 1,
                message: format!("material `{}` is defined twice", material.name),
            });
        }
    }
    Ok(materials)
}

fn second_line_naming(text: &str, name: &str) -> usize {
    let names = |line: &str| {
        line.trim_start_matches("- ").trim().strip_prefix("name:").map(str::trim) == Some(name)
    };
    text.lines().zip(1..).filter(|(line, _)| names(line)).nth(1).map_or(0, |(_, number)| number)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::materials::{Expansions, Grade, Scatter};

    const BRACKET: &str = "
- name: bracket_alloy
  title: an alloy of our own
  family: aluminium
  expansion:
    mean:
      from: 20 degC
      unit: ppm/K
      temperature: degC
      table: [[100, 23.0], [200, 24.0]]
    range: 20 .. 200 degC
    scatter: 2 %
    source: { grade: supplier, text: certificate 17 }
  modulus: { unit: GPa, temperature: degC, table: [[20, 70], [150, 64]], scatter: 3 % }
  poisson: 0.33
  yield: 240 MPa
  swell:
    - { state: dry, strain: 0 % }
    - { state: wet, strain: 0.8 %, spread: 0.15 % }
";

    #[test]
    fn a_material_is_read_into_si() {
        let materials = read(BRACKET).unwrap();
        let alloy = &materials[0];
        let Expansions::Isotropic(expansion) = &alloy.expansion else {
            panic!("it has no directions")
        };
        assert!((expansion.curve.value(373.15) - 80.0 * 23e-6).abs() < 1e-15);
        assert_eq!(expansion.scatter, Scatter::Relative(0.02));
        assert_eq!(expansion.source.as_ref().map(|s| s.grade), Some(Grade::Supplier));
        assert_eq!((expansion.range.lo(), expansion.range.hi()), (293.15, 473.15));
        let modulus = alloy.modulus.as_ref().unwrap();
        assert!((modulus.at(423.15) - 64e9).abs() < 1.0);
        assert_eq!(alloy.poisson.as_ref().unwrap().at(300.0), 0.33);
        assert_eq!(alloy.yield_strength.as_ref().unwrap().at(300.0), 240e6);
        assert_eq!(alloy.swell_state("wet").unwrap().spread, 0.0015);
    }

    fn refused(from: &str, to: &str) -> ReadError {
        let changed = BRACKET.replace(from, to);
        assert_ne!(changed, BRACKET);

        read(&changed).unwrap_err()
    }

    #[test]
    fn mistakes_are_reported_with_their_place() {
        let unknown = refused("  poisson:", "  poison:");

        assert_eq!((unknown.line, unknown.column), (15, 3));
        assert!(unknown.message.starts_with("unknown field `poison`"), "{unknown}");

        let kind = refused("240 MPa", "240 kg/m3");

        assert_eq!((kind.line, kind.column), (16, 10));
        assert_eq!(kind.message, "expected a stress, found `240 kg/m3`, a density");

        let unit = refused("yield: 240 MPa", "yield: 240 mpa");
        assert_eq!(unit.message, "unknown unit `mpa`");

        let bare = refused("yield: 240 MPa", "yield: 240");
        assert_eq!(bare.message, "expected a stress with its unit, found `240`");

        let table = refused("[[100, 23.0], [200, 24.0]]", "[[100, 23.0], [90, 24.0]]");
        assert_eq!(table.message, "entry 2 of the table does not lie above the one before");
        assert_eq!(table.line, 6);

        let none = refused("    mean:\n      from: 20 degC\n", "    means:\n      from: 20 degC\n");
        assert!(none.message.starts_with("unknown field `means`"), "{none}");

        let poisson = refused("0.33", "0.53");
        assert_eq!(poisson.message, "a Poisson's ratio lies between -1 and 0.5, found 0.53");

        let range = refused("20 .. 200 degC", "200 .. 20 degC");
        assert_eq!(range.message, "the range `200 .. 20 degC` does not rise");

        let beyond = refused("20 .. 200 degC", "0 .. 200 degC");
        assert_eq!(
            beyond.message,
            "the range reaches beyond the data, which cover 293.15 .. 473.15 K"
        );
        let area = refused("240 MPa", "240 mm2");
        assert_eq!(area.message, "expected a stress, found `240 mm2`, an area");

        let grade = refused("grade: supplier", "grade: rumour");
        assert!(grade.message.starts_with("unknown variant `rumour`"), "{grade}");
    }

    #[test]
    fn a_material_has_one_curve_a_direction() {
        let both = refused("    scatter: 2 %", "    constant: 3 ppm/K");
        assert_eq!(both.message, "expected one form of expansion, found `constant` and `mean`");
        let none = read("- { name: x, family: y, expansion: { scatter: 2 % } }").unwrap_err();
        assert!(none.message.starts_with("expected one of `constant`"), "{none}");
        let half = read("- { name: x, family: y, expansion: { along: { constant: 2 ppm/K } } }")
            .unwrap_err();
        assert_eq!(half.message, "`along` needs `across` beside it");
    }

    #[test]
    fn a_name_stands_once() {
        let twice = read(&format!("{BRACKET}{}", BRACKET.trim_start())).unwrap_err();
        assert_eq!(twice.message, "material `bracket_alloy` is defined twice");
        assert_eq!(twice.line, 20);
    }
}
