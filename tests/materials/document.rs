//! `docs/materials.md` and the library say the same.

use gapkeep::materials::{Expansions, Grade, Library, Material, Scatter, yaml};
use std::fmt::Write as _;

const PAGE: &str = include_str!("../../docs/materials.md");

fn ppm(coefficient: f64) -> String {
    format!("{:.1}", coefficient * 1e6)
}

/// Mean coefficients from 20 to 80 °C, or as far as the data go.
fn coefficients(material: &Material) -> String {
    let each = material.expansion.each();
    let mean = each.iter().map(|(_, e)| {
        let warm = e.range.hi().min(353.15);
        ppm(e.mean_coefficient(293.15, warm))
    });
    let words = mean.collect::<Vec<_>>().join(" / ");
    match material.expansion {
        Expansions::Volume(_) => format!("{words} (volume)"),
        _ => words,
    }
}

fn scatter(material: &Material) -> String {
    let word = |scatter: Scatter| match scatter {
        Scatter::Relative(s) => format!("±{:.1} %", s * 100.0).replace(".0 %", " %"),
        Scatter::PerKelvin(d) => format!("±{:.2} ppm/K", d * 1e6),
    };
    let each = material.expansion.each();
    each.iter().map(|(_, e)| word(e.scatter)).collect::<Vec<_>>().join(" / ")
}

fn grade(material: &Material) -> &'static str {
    let (_, first) = material.expansion.each()[0];
    material.source_of(first.source.as_ref()).map_or(Grade::Memory, |s| s.grade).word()
}

fn table() -> String {
    let mut text = String::from(
        "| name | what it is | ppm/K | scatter | valid, °C | E, GPa | grade |\n\
         |---|---|---|---|---|---|---|\n",
    );
    for m in Library::builtin().all() {
        let valid = m.valid();
        let modulus = m.modulus.as_ref().map_or(String::from("–"), |e| {
            let gpa = e.at(293.15) / 1e9;
            if gpa < 1.0 { format!("{gpa:.3}") } else { format!("{gpa:.1}") }
        });
        let _ = writeln!(
            text,
            "| `{}` | {} | {} | {} | {:.0} … {:.0} | {modulus} | {} |",
            m.name,
            m.title,
            coefficients(&m),
            scatter(&m),
            valid.lo() - 273.15,
            valid.hi() - 273.15,
            grade(&m),
        );
    }
    text
}

/// On a difference the test writes the table it wants where a developer can copy it from.
#[test]
fn the_page_lists_the_library() {
    let wanted = table();
    if !PAGE.contains(&wanted) {
        let found = std::env::temp_dir().join("gapkeep-materials-table.md");
        std::fs::write(&found, &wanted).unwrap();
        panic!("docs/materials.md does not hold the table of the library; see {}", found.display());
    }
}

/// Every YAML example of the page is read, whole, by the reader it describes.
#[test]
fn the_examples_are_read() {
    let examples: Vec<&str> =
        PAGE.split("```yaml\n").skip(1).filter_map(|rest| rest.split("```").next()).collect();
    assert!(examples.len() >= 5);
    for example in examples {
        let found = yaml::read(example);
        assert!(found.is_ok_and(|materials| !materials.is_empty()), "{example}");
    }
}

/// Every grade has its line.
#[test]
fn the_grades_are_explained() {
    for grade in Grade::ALL {
        assert!(PAGE.contains(&format!("| `{}` |", grade.word())), "{grade:?}");
    }
}
