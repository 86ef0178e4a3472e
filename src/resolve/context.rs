//! What resolving carries along: the texts, what each file's head says, the names declared, the
//! model under construction and everything that was wrong so far.
//!
//! Names are declared before anything is resolved, so that order does not matter. Every declared
//! name keeps its place in the lists of the model even where its statement is wrong: an id is always
//! valid, and a file with mistakes gives no assembly in the end.

use super::file::Files;
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::Material;
use crate::model::{Condition, ConditionId, Dimension, DimensionId, Lot, Part, PartId, SubjectId};
use crate::source::Sources;
use crate::span::{FileId, Span};
use crate::standards::iso2768;
use crate::units::{self, Defaults, STANDARD_REFERENCE, Unit};
use std::collections::{BTreeMap, BTreeSet};
use std::sync::Arc;

/// Names of one kind with what they name and where that was first said.
#[derive(Debug, Clone)]
pub(crate) struct Names<Id> {
    entries: BTreeMap<String, (Id, Span)>,
}

impl<Id> Default for Names<Id> {
    fn default() -> Self {
        Names { entries: BTreeMap::new() }
    }
}

impl<Id: Copy> Names<Id> {
    /// Declares a name; the span of the first definition if there is one already.
    pub(crate) fn declare(&mut self, name: &str, id: Id, span: Span) -> Result<(), Span> {
        match self.entries.get(name) {
            Some(&(_, first)) => Err(first),
            None => {
                self.entries.insert(name.to_string(), (id, span));
                Ok(())
            }
        }
    }

    /// What a name names.
    pub(crate) fn get(&self, name: &str) -> Option<Id> {
        self.entries.get(name).map(|&(id, _)| id)
    }

    /// Where a name was first defined.
    pub(crate) fn span(&self, name: &str) -> Option<Span> {
        self.entries.get(name).map(|&(_, span)| span)
    }

    /// All names, sorted.
    pub(crate) fn names(&self) -> impl Iterator<Item = &str> {
        self.entries.keys().map(String::as_str)
    }
}

/// What the head of one file says; it holds for the lines of that file only.
#[derive(Debug, Clone)]
pub(crate) struct Head {
    /// Units of bare numbers.
    pub(crate) defaults: Defaults,
    /// Temperature its sizes are stated at, K.
    pub(crate) reference: f64,
    /// Tolerance of sizes that state none.
    pub(crate) general: Option<General>,
}

/// The tolerance of sizes that state none.
#[derive(Debug, Clone)]
pub(crate) enum General {
    /// ISO 2768-1, by its class; with the words as written.
    Iso2768 {
        /// The class of linear and angular tolerances.
        class: iso2768::Class,
        /// As written, such as `ISO 2768-m`.
        written: String,
    },
    /// By the decimals written: deviations in m, that of angles in rad.
    ByDecimals {
        /// Least and greatest deviation by the count of decimals.
        lengths: BTreeMap<usize, (f64, f64)>,
        /// Least and greatest deviation of angles.
        angle: Option<(f64, f64)>,
    },
}

impl Default for Head {
    /// Millimetres, degrees Celsius, 20 °C (ISO 1), no general tolerance.
    fn default() -> Self {
        Head {
            defaults: Defaults { length: known("mm"), temperature: known("degC") },
            reference: STANDARD_REFERENCE,
            general: None,
        }
    }
}

/// A unit that this room names itself.
pub(crate) fn known(name: &str) -> &'static Unit {
    units::find(name).expect("the table of units holds this one")
}

/// Everything known while a spec is resolved.
pub(crate) struct Context<'a> {
    /// Every text read; data tables are added as they are met.
    pub(crate) sources: &'a mut Sources,
    /// Gives the bytes of other files.
    pub(crate) files: &'a dyn Files,
    /// What was wrong so far, in the order found.
    pub(crate) diagnostics: Vec<Diagnostic>,
    heads: BTreeMap<FileId, Head>,
    fallback: Head,
    /// Names of conditions.
    pub(crate) condition_names: Names<ConditionId>,
    /// Names of parts.
    pub(crate) part_names: Names<PartId>,
    /// Names of fits, gaps, results, restraints and fills.
    pub(crate) subject_names: Names<SubjectId>,
    /// Which of the subjects are fills: they may have a temperature of their own.
    pub(crate) fills: BTreeSet<SubjectId>,
    /// Names of the dimensions of each part.
    pub(crate) dimension_names: BTreeMap<PartId, Names<DimensionId>>,
    /// Names that a broken statement seems to define: their users are not reported as well.
    pub(crate) broken: BTreeSet<String>,
    /// The statements that could not be read.
    pub(crate) broken_places: Vec<Span>,
    /// True when a used file could not be read: a name that nothing defines may stand there.
    pub(crate) incomplete: bool,
    /// Libraries of materials read so far.
    pub(crate) libraries: Vec<FileId>,
    /// Materials defined in the files, by name.
    pub(crate) materials: BTreeMap<String, (Arc<Material>, Span)>,
    /// Thermal states, by [`ConditionId`].
    pub(crate) conditions: Vec<Condition>,
    /// Lots, by their id.
    pub(crate) lots: Vec<Lot>,
    /// Parts, by [`PartId`].
    pub(crate) parts: Vec<Part>,
    /// Dimensions of all parts, by [`DimensionId`].
    pub(crate) dimensions: Vec<Dimension>,
}

impl<'a> Context<'a> {
    /// Nothing declared yet.
    pub(crate) fn new(sources: &'a mut Sources, files: &'a dyn Files) -> Self {
        Context {
            sources,
            files,
            diagnostics: Vec::new(),
            heads: BTreeMap::new(),
            fallback: Head::default(),
            condition_names: Names::default(),
            part_names: Names::default(),
            subject_names: Names::default(),
            fills: BTreeSet::new(),
            dimension_names: BTreeMap::new(),
            broken: BTreeSet::new(),
            broken_places: Vec::new(),
            incomplete: false,
            libraries: Vec::new(),
            materials: BTreeMap::new(),
            conditions: Vec::new(),
            lots: Vec::new(),
            parts: Vec::new(),
            dimensions: Vec::new(),
        }
    }

    /// Adds a finding.
    pub(crate) fn report(&mut self, diagnostic: Diagnostic) {
        self.diagnostics.push(diagnostic);
    }

    /// Adds a finding that has no value to go on with.
    pub(crate) fn refuse<T>(&mut self, diagnostic: Diagnostic) -> Option<T> {
        self.report(diagnostic);
        None
    }

    /// Refuses to compute what `need` asks for of a material, named at `stated`, that does not state the
    /// property it takes; `example` is a value of it.
    pub(crate) fn lacks<T>(
        &mut self,
        material: &str,
        stated: Span,
        need: Span,
        property: &str,
        example: &str,
    ) -> Option<T> {
        // A material that was not found has been reported.
        if material.is_empty() {
            return None;
        }
        self.refuse(
            Diagnostic::new(
                Code::MissingProperty,
                stated,
                format!("the material `{material}` states no `{property}`"),
            )
            .label(need, "needed here")
            .help(format!(
                "state it: `material my_{material} like {material} {{ {property} {example} }}`"
            )),
        )
    }

    /// What the head of a file says.
    pub(crate) fn head(&self, file: FileId) -> &Head {
        self.heads.get(&file).unwrap_or(&self.fallback)
    }

    /// Says what the head of a file says.
    pub(crate) fn set_head(&mut self, file: FileId, head: Head) {
        self.heads.insert(file, head);
    }

    /// The words of a place.
    pub(crate) fn text(&self, span: Span) -> &str {
        self.sources.slice(span)
    }

    /// True for a name that a broken statement seems to define.
    pub(crate) fn is_broken(&self, name: &str) -> bool {
        self.broken.contains(name)
    }

    /// True where part of a statement could not be read, so that what it lacks may stand there.
    pub(crate) fn has_broken(&self, span: Span) -> bool {
        let inside = |b: &Span| b.file == span.file && span.start <= b.start && b.end <= span.end;
        self.broken_places.iter().any(inside)
    }

    /// The condition of that name, or a finding.
    pub(crate) fn condition(&mut self, name: &crate::syntax::tree::Name) -> Option<ConditionId> {
        if let Some(id) = self.condition_names.get(&name.value) {
            return Some(id);
        }
        self.unknown(Code::UnknownCondition, "condition", name, |cx| {
            cx.condition_names.names().map(str::to_string).collect()
        })
    }

    /// The part of that name, or a finding.
    pub(crate) fn part(&mut self, name: &crate::syntax::tree::Name) -> Option<PartId> {
        if let Some(id) = self.part_names.get(&name.value) {
            return Some(id);
        }
        self.unknown(Code::UnknownPart, "part", name, |cx| {
            cx.part_names.names().map(str::to_string).collect()
        })
    }

    /// Reports a dimension that a part does not have, with the nearest spelling.
    pub(crate) fn unknown_dimension<T>(
        &mut self,
        part: PartId,
        owner: &str,
        name: &crate::syntax::tree::Name,
    ) -> Option<T> {
        if self.is_broken(&name.value) {
            return None;
        }
        let names: Vec<&str> =
            self.dimension_names.get(&part).map(|n| n.names().collect()).unwrap_or_default();
        let help = match suggest(&name.value, names.iter().copied()) {
            Some(near) => format!("did you mean `{near}`?"),
            None if names.is_empty() => format!("`{owner}` has no dimensions at all"),
            None => format!("its dimensions are `{}`", names.join("`, `")),
        };
        self.refuse(
            Diagnostic::new(
                Code::UnknownDimension,
                name.span,
                format!("`{owner}` has no dimension `{}`", name.value),
            )
            .help(help),
        )
    }

    /// Reports a name that nothing defines, with the nearest spelling or with what there is.
    pub(crate) fn unknown<T>(
        &mut self,
        code: Code,
        noun: &str,
        name: &crate::syntax::tree::Name,
        candidates: impl FnOnce(&Self) -> Vec<String>,
    ) -> Option<T> {
        if self.incomplete || self.is_broken(&name.value) {
            return None;
        }
        let candidates = candidates(self);
        let near = suggest(&name.value, candidates.iter().map(String::as_str));
        let mut finding =
            Diagnostic::new(code, name.span, format!("unknown {noun} `{}`", name.value));
        if let Some(near) = near {
            finding = finding.help(format!("did you mean `{near}`?"));
        } else if !candidates.is_empty() && candidates.len() <= 8 {
            finding = finding.help(format!("there {}", listing(noun, &candidates)));
        }
        self.refuse(finding)
    }
}

/// `is one part: `a`` or `are 2 parts: `a`, `b``.
fn listing(noun: &str, candidates: &[String]) -> String {
    let names: Vec<String> = candidates.iter().map(|c| format!("`{c}`")).collect();
    match candidates.len() {
        1 => format!("is one {noun}: {}", names[0]),
        n => format!("are {n} {noun}s: {}", names.join(", ")),
    }
}

/// The candidate nearest to a misspelled name, if one is near enough to be meant.
///
/// Near enough is one slip in three letters (an exchange of two neighbours is one slip), or the same
/// letters in another case. Among equals the first wins.
pub(crate) fn suggest<'n>(
    name: &str,
    candidates: impl IntoIterator<Item = &'n str>,
) -> Option<String> {
    let lower = name.to_lowercase();
    let allowed = (name.chars().count() / 3).max(1);
    let mut best: Option<(usize, &str)> = None;
    for candidate in candidates {
        let other = candidate.to_lowercase();
        let distance = strsim::damerau_levenshtein(&lower, &other);
        // A single letter is one slip away from every other: only its other case is near.
        let allowed = if name.chars().count() < 2 { 0 } else { allowed };
        if distance <= allowed && best.is_none_or(|(least, _)| distance < least) {
            best = Some((distance, candidate));
        }
    }
    best.map(|(_, candidate)| candidate.to_string())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_nearest_spelling_is_suggested_and_nothing_far() {
        let names = ["bearing", "housing", "shaft"];
        assert_eq!(suggest("baering", names).as_deref(), Some("bearing"));
        assert_eq!(suggest("Shaft", names).as_deref(), Some("shaft"));
        assert_eq!(suggest("piston", names), None);
        assert_eq!(suggest("a", ["b", "A"]).as_deref(), Some("A"));
    }

    #[test]
    fn a_name_keeps_its_first_place() {
        let mut names = Names::default();
        let (first, second) = (Span::new(FileId(0), 0, 4), Span::new(FileId(0), 9, 13));
        assert_eq!(names.declare("seat", PartId(0), first), Ok(()));
        assert_eq!(names.declare("seat", PartId(1), second), Err(first));
        assert_eq!(names.get("seat"), Some(PartId(0)));
    }
}
