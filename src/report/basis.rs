//! What the figures of an assembly rest on: temperatures, materials with their sources, numbers that
//! no drawing states, the sense of the signs, and cautions.

use crate::evaluate::Evaluation;
use crate::findings::words;
use crate::materials::{Grade, Material};
use crate::model::{Assembly, Basis, Origin, SubjectKind};
use std::sync::Arc;

/// What the figures rest on.
#[derive(Debug, Clone, Default)]
pub struct Grounds {
    /// Temperatures of parts and fills, condition by condition.
    pub temperatures: Vec<PartTemperature>,
    /// Each material once, in the order of the parts.
    pub materials: Vec<MaterialNote>,
    /// Numbers that are not a drawing's, guesses first.
    pub assumptions: Vec<Assumption>,
    /// Number of dimensions whose basis is a drawing.
    pub from_drawings: usize,
    /// What a positive value means, for each kind of subject in the spec.
    pub signs: Vec<&'static str>,
    /// What a reader must keep in mind.
    pub cautions: Vec<String>,
}

/// The temperature of a part or fill at a condition, K.
#[derive(Debug, Clone)]
pub struct PartTemperature {
    /// The condition.
    pub condition: String,
    /// The part or fill.
    pub owner: String,
    /// Least.
    pub least: f64,
    /// Greatest.
    pub greatest: f64,
}

/// A material as a reader must know it.
#[derive(Debug, Clone)]
pub struct MaterialNote {
    /// Its name in the spec.
    pub name: String,
    /// What it is, in words.
    pub title: String,
    /// The parts that are made of it.
    pub parts: Vec<String>,
    /// The temperatures its expansion data cover, K.
    pub valid: (f64, f64),
    /// Where its data come from, each with the word of its grade.
    pub sources: Vec<(&'static str, String)>,
    /// True where some value was recalled and not looked up.
    pub from_memory: bool,
    /// True where its data are continued outside their range.
    pub extrapolated: bool,
    /// What to beware of.
    pub cautions: Vec<String>,
}

/// A number that is not a drawing's.
#[derive(Debug, Clone)]
pub struct Assumption {
    /// The word of its basis: `assumed`, `supplier`, `measured`, `general` or `exact`.
    pub basis: &'static str,
    /// What it is.
    pub what: String,
    /// As written.
    pub written: String,
    /// The reason given, or where a general tolerance comes from.
    pub because: String,
}

/// Gathers what the figures of an assembly rest on.
pub(super) fn grounds(assembly: &Assembly, evaluation: &Evaluation) -> Grounds {
    let temperatures = evaluation
        .temperatures
        .iter()
        .map(|t| PartTemperature {
            condition: assembly.condition(t.condition).name.clone(),
            owner: words::owner(assembly, t.owner),
            least: t.least,
            greatest: t.greatest,
        })
        .collect();
    let from_drawings =
        assembly.dimensions.iter().filter(|d| assumption(assembly, d).is_none()).count();
    let mut assumptions: Vec<Assumption> =
        assembly.dimensions.iter().filter_map(|d| assumption(assembly, d)).collect();
    assumptions.sort_by_key(|a| ORDER.iter().position(|&basis| basis == a.basis));
    Grounds {
        temperatures,
        materials: materials(assembly),
        assumptions,
        from_drawings,
        signs: signs(assembly),
        cautions: cautions(assembly, evaluation),
    }
}

/// Bases in the order shown: what most needs a second look first.
const ORDER: [&str; 5] = ["assumed", "general", "supplier", "measured", "exact"];

fn assumption(assembly: &Assembly, dimension: &crate::model::Dimension) -> Option<Assumption> {
    let (basis, reason) = match (dimension.basis, &dimension.origin) {
        (Basis::Drawing, Origin::General(name)) => ("general", name.clone()),
        (Basis::Drawing, Origin::Exact) => ("exact", String::new()),
        (Basis::Drawing, _) => return None,
        (other, _) => (other.word(), String::new()),
    };
    let part = &assembly.part(dimension.part).name;
    Some(Assumption {
        basis,
        what: format!("{part}.{}", dimension.name),
        written: dimension.written.clone(),
        because: dimension.because.clone().unwrap_or(reason),
    })
}

fn materials(assembly: &Assembly) -> Vec<MaterialNote> {
    let mut notes: Vec<MaterialNote> = Vec::new();
    let of_parts = assembly.parts.iter().map(|p| (&p.material, p.name.clone()));
    let of_fills = assembly.subjects.iter().filter_map(|s| match &s.kind {
        SubjectKind::Fill(fill) => Some((&fill.material, s.name.clone())),
        _ => None,
    });
    for (material, user) in of_parts.chain(of_fills) {
        match notes.iter_mut().find(|n| n.name == material.name) {
            Some(note) => note.parts.push(user),
            None => notes.push(note(material, user)),
        }
    }
    notes
}

fn note(material: &Arc<Material>, user: String) -> MaterialNote {
    let valid = material.valid();
    let sources = material.sources();
    MaterialNote {
        name: material.name.clone(),
        title: material.title.clone(),
        parts: vec![user],
        valid: (valid.lo(), valid.hi()),
        from_memory: sources.iter().any(|s| s.grade == Grade::Memory),
        sources: sources.iter().map(|s| (s.grade.word(), s.text.clone())).collect(),
        extrapolated: material.extrapolate,
        cautions: material.cautions.clone(),
    }
}

fn signs(assembly: &Assembly) -> Vec<&'static str> {
    let has = |wanted: fn(&SubjectKind) -> bool| assembly.subjects.iter().any(|s| wanted(&s.kind));
    let mut signs = Vec::new();
    if has(|k| matches!(k, SubjectKind::Fit(_))) {
        signs.push("clearance is internal minus external size; a negative one is an interference");
    }
    if has(|k| matches!(k, SubjectKind::Gap(_))) {
        signs.push("a gap is positive when open; zero is contact");
    }
    if has(|k| matches!(k, SubjectKind::Restraint(_))) {
        signs.push(
            "a restraint's force is positive when it squeezes; no tension crosses an open face",
        );
    }
    if has(|k| matches!(k, SubjectKind::Fill(_))) {
        signs.push("ullage is the free share of the cavity; zero is full");
    }
    signs
}

fn cautions(assembly: &Assembly, evaluation: &Evaluation) -> Vec<String> {
    let mut cautions: Vec<String> = Vec::new();
    for material in materials(assembly) {
        let name = words::name(&material.name);
        if material.from_memory {
            cautions.push(format!("{name}: some values are from memory; confirm them before use"));
        }
        cautions.extend(material.cautions.iter().map(|c| format!("{name}: {c}")));
    }
    for beyond in evaluation.beyond_data.iter().filter(|b| b.extrapolated) {
        cautions.push(format!(
            "{} at {} lies outside its material's data, which are continued at the spec's wish",
            words::name(&words::owner(assembly, beyond.owner)),
            words::name(&assembly.condition(beyond.condition).name),
        ));
    }
    for subject in &assembly.subjects {
        let SubjectKind::Fill(fill) = &subject.kind else { continue };
        if fill.wall.is_none() && fill.material.bulk_modulus.is_some() {
            cautions.push(format!(
                "the cavity of {} is taken as rigid, which makes its pressure too high; its `wall` \
                 would be counted",
                words::name(&subject.name)
            ));
        }
    }
    let closed = |k: &SubjectKind| matches!(k, SubjectKind::Fill(f) if !f.may_be_full.is_empty());
    if assembly.subjects.iter().any(|s| closed(&s.kind)) {
        cautions.push(
            "a trapped liquid gains pressure with every kelvin and can burst what holds it: give it \
             a relief valve or room; the codes for pressure equipment come first"
                .to_string(),
        );
    }
    let joint = assembly
        .subjects
        .iter()
        .any(|s| matches!(&s.kind, SubjectKind::Fit(fit) if fit.joint.is_some()));
    let held = assembly.subjects.iter().any(|s| matches!(s.kind, SubjectKind::Restraint(_)));
    let walled = assembly
        .subjects
        .iter()
        .any(|s| matches!(&s.kind, SubjectKind::Fill(fill) if fill.wall.is_some()));
    if joint || held || walled {
        cautions.push(
            "stress and force are elastic and without bending, creep or load from outside; they \
             support, and do not replace, a qualified engineer's review"
                .to_string(),
        );
    }
    if joint {
        cautions.push(
            "joining by heat or cold can burn; evaporating coolant displaces the air to breathe"
                .to_string(),
        );
    }
    cautions
}
