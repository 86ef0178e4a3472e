//! The tables of ISO 286 against printed copies of them, entry by entry.
//!
//! The copies are the two files beside this one; each block names its source. They were transcribed from
//! print and are a second, independent set of the same numbers.

use gapkeep::standards::Micrometres;
use gapkeep::standards::iso286::{Class, Deviations, Grade, Kind, Letters};

/// One printed figure: over and up to which size, in which column, what it says.
struct Entry<'a> {
    over: f64,
    to: f64,
    column: &'a str,
    cell: &'a str,
}

impl Entry<'_> {
    /// Sizes that the step holds: just over its beginning, between, and its end.
    fn sizes(&self) -> [f64; 3] {
        let begin = if self.over == 0.0 { 1.001 } else { self.over + 0.001 };
        [begin, 0.5 * (begin + self.to), self.to]
    }
}

fn entries(table: &str) -> Vec<Entry<'_>> {
    let mut columns = Vec::new();
    let mut found = Vec::new();
    for line in table.lines().filter(|line| !line.is_empty() && !line.starts_with('#')) {
        let cells: Vec<&str> = line.split(',').collect();
        if cells[0] == "over" {
            columns = cells;
            continue;
        }
        assert_eq!(cells.len(), columns.len(), "as many cells as columns: {line}");
        let (over, to) = (cells[0].parse().unwrap(), cells[1].parse().unwrap());
        let filled = columns.iter().zip(&cells).skip(2).filter(|(_, cell)| !cell.is_empty());
        found.extend(filled.map(|(&column, &cell)| Entry { over, to, column, cell }));
    }
    found
}

fn class(text: &str) -> Class {
    Class::parse(text).unwrap_or_else(|wrong| panic!("{text}: {wrong}"))
}

fn limits(class: Class, size: f64) -> Deviations {
    class.limits(size).unwrap_or_else(|refused| panic!("{refused}"))
}

/// The limit that the tables give, nearest the nominal size.
fn fundamental(class: Class, size: f64) -> Micrometres {
    let found = limits(class, size);
    match (class.kind, class.letters <= Letters::H) {
        (Kind::Hole, true) | (Kind::Shaft, false) => found.lower,
        (Kind::Hole, false) | (Kind::Shaft, true) => found.upper,
    }
}

/// The standard tolerance, which every class of the grade shows.
fn tolerance(grade: &str, size: f64) -> Micrometres {
    limits(class(&format!("h{grade}")), size).tolerance()
}

/// The increment by which the hole P is raised above the mirrored shaft p at the same grade.
fn increment(grade: &str, size: f64) -> Micrometres {
    // At IT8 it serves K, M and N only.
    let letters = if grade == "8" { "n" } else { "p" };
    let hole = class(&format!("{}{grade}", letters.to_uppercase()));
    fundamental(hole, size) + fundamental(class(&format!("{letters}{grade}")), size)
}

#[test]
fn every_printed_fundamental_deviation_and_tolerance_is_ours() {
    let table = include_str!("iso286_deviations.csv");
    let entries = entries(table);
    assert!(entries.len() > 900, "the whole file is read: {} entries", entries.len());
    for entry in &entries {
        let Entry { column, cell, to, .. } = *entry;
        for size in entry.sizes() {
            if cell == "-" {
                assert!(
                    class(column).limits(size).is_err(),
                    "{column} at {size} mm is not provided"
                );
                continue;
            }
            let printed: f64 = cell.parse().unwrap();
            let ours = if let Some(grade) = column.strip_prefix("IT") {
                tolerance(grade, size)
            } else if let Some(grade) = column.strip_prefix('Δ') {
                increment(grade, size)
            } else {
                fundamental(class(column), size)
            };
            assert_eq!(ours.um(), printed, "{column} at {size} mm, in the step to {to} mm");
        }
    }
}

#[test]
fn every_printed_pair_of_limits_is_ours() {
    let table = include_str!("iso286_limits.csv");
    let entries = entries(table);
    assert!(entries.len() > 500, "the whole file is read: {} entries", entries.len());
    for entry in &entries {
        let (upper, lower) = match entry.cell.strip_prefix('±') {
            Some(half) => (half.parse::<f64>().unwrap(), -half.parse::<f64>().unwrap()),
            None => {
                let (upper, lower) = entry.cell.split_once('/').unwrap();
                (upper.parse().unwrap(), lower.parse().unwrap())
            }
        };
        for size in entry.sizes() {
            let ours = limits(class(entry.column), size);
            assert_eq!(
                (ours.upper.um(), ours.lower.um()),
                (upper, lower),
                "{} at {size} mm",
                entry.column
            );
        }
    }
}

/// Letters of the shaft whose deviation is printed once for all grades (Table 5; k and j are not).
#[test]
fn the_fundamental_deviation_of_a_shaft_does_not_depend_on_its_grade() {
    for letters in Letters::ALL {
        if matches!(letters, Letters::Js | Letters::J | Letters::K) {
            continue;
        }
        for size in [2.0, 9.0, 28.0, 75.0, 240.0, 480.0, 700.0, 3000.0] {
            let found: Vec<Micrometres> = Grade::all()
                .map(|grade| Class { kind: Kind::Shaft, letters, grade })
                .filter(|class| class.limits(size).is_ok())
                .map(|class| fundamental(class, size))
                .collect();
            assert!(found.windows(2).all(|pair| pair[0] == pair[1]), "{letters:?} at {size} mm");
        }
    }
}
