//! The built-in library: embedded YAML, indexed by name, each material read when first asked for.
//!
//! A spec names a handful of a hundred materials; reading all of them at every start would cost
//! more than checking the spec.

use super::{Material, yaml};
use std::collections::BTreeMap;
use std::sync::{Arc, LazyLock, OnceLock};

/// The files, each a list of materials of some families.
const FILES: [&str; 9] = [
    include_str!("library/steel.yaml"),
    include_str!("library/stainless.yaml"),
    include_str!("library/aluminium.yaml"),
    include_str!("library/metal.yaml"),
    include_str!("library/ceramic.yaml"),
    include_str!("library/polymer_engineering.yaml"),
    include_str!("library/polymer_general.yaml"),
    include_str!("library/composite.yaml"),
    include_str!("library/fluid.yaml"),
];

/// How an entry begins. Everything up to the next such line belongs to it.
const BEGINS: &str = "- name: ";

static BUILT_IN: LazyLock<Library> = LazyLock::new(|| Library::of(&FILES));

/// Materials by name.
#[derive(Debug)]
pub struct Library {
    entries: BTreeMap<&'static str, Entry>,
}

#[derive(Debug)]
struct Entry {
    text: &'static str,
    material: OnceLock<Arc<Material>>,
}

impl Library {
    /// The library that comes with the program.
    pub fn builtin() -> &'static Library {
        &BUILT_IN
    }

    fn of(files: &[&'static str]) -> Library {
        let entries = files.iter().flat_map(|file| split(file)).map(|text| {
            let name = text[BEGINS.len()..].lines().next().unwrap_or("").trim();
            (name, Entry { text, material: OnceLock::new() })
        });
        Library { entries: entries.collect() }
    }

    /// The material of that name.
    pub fn get(&self, name: &str) -> Option<Arc<Material>> {
        self.entries.get(name).map(Entry::material)
    }

    /// All names, in alphabetical order.
    pub fn names(&self) -> impl Iterator<Item = &'static str> + '_ {
        self.entries.keys().copied()
    }

    /// All materials, in alphabetical order.
    pub fn all(&self) -> impl Iterator<Item = Arc<Material>> + '_ {
        self.entries.values().map(Entry::material)
    }

    /// The materials that have `word` in their name, title, family or designations, whatever its
    /// case; in alphabetical order.
    pub fn search(&self, word: &str) -> Vec<Arc<Material>> {
        let word = word.to_lowercase();
        let has = |text: &str| text.to_lowercase().contains(&word);
        self.all()
            .filter(|m| {
                has(&m.name)
                    || has(&m.title)
                    || has(&m.family)
                    || m.designations.iter().any(|d| has(d))
            })
            .collect()
    }
}

impl Entry {
    fn material(&self) -> Arc<Material> {
        let read = || {
            let materials = yaml::read(self.text).expect("a test reads every entry");
            Arc::new(materials.into_iter().next().expect("an entry holds one material"))
        };
        self.material.get_or_init(read).clone()
    }
}

/// The entries of one file.
fn split(file: &'static str) -> Vec<&'static str> {
    let mut starts: Vec<usize> = Vec::new();
    let mut at = 0;
    for line in file.split_inclusive('\n') {
        if line.starts_with(BEGINS) {
            starts.push(at);
        }
        at += line.len();
    }
    let ends = starts.iter().skip(1).copied().chain([file.len()]);
    starts.iter().zip(ends).map(|(&start, end)| &file[start..end]).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_file_reads_as_a_whole_and_in_parts_alike() {
        let mut count = 0;
        for file in FILES {
            let whole = yaml::read(file).unwrap_or_else(|e| panic!("{}:{}: {e}", e.line, e.column));
            for material in &whole {
                let part = Library::builtin().get(&material.name).unwrap();
                assert_eq!(format!("{part:?}"), format!("{material:?}"));
            }
            count += whole.len();
        }
        assert_eq!(count, Library::builtin().names().count(), "a name stands twice");
    }

    #[test]
    fn materials_are_found_by_any_of_their_words() {
        let found = |word: &str| -> Vec<String> {
            Library::builtin().search(word).iter().map(|m| m.name.clone()).collect()
        };
        assert!(found("1.4301").contains(&"stainless_304".to_string()));
        assert!(found("Elastomer").contains(&"nbr".to_string()));
        assert!(found("no such thing").is_empty());
        assert!(Library::builtin().get("no_such_thing").is_none());
    }
}
