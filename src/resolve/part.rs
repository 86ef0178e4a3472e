//! Parts: what they are made of, the lot they came from, their dimensions, and parts drawn like
//! another.

use super::context::{Context, Names};
use super::dimension::{self, Owner};
use super::material;
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::{Expansion, Expansions, Material};
use crate::model::{DimensionId, Drawing, Lot, LotId, Part, PartId};
use crate::span::Span;
use crate::syntax::tree::{self, PartOrigin};
use std::collections::BTreeMap;
use std::sync::Arc;

/// Resolves every part; `parts` are the declared ones, [`PartId`] by index.
///
/// Names of parts and conditions are declared, materials resolved. Afterwards the lists of parts,
/// lots and dimensions are complete, and so are the names of dimensions.
pub(crate) fn resolve(cx: &mut Context, parts: &[&tree::Part]) {
    let origins = origins(cx, parts);
    let mut lots = Lots::default();
    for (index, part) in parts.iter().enumerate() {
        let id = PartId(index as u32);
        let owner = owner(cx, parts, &origins, id);
        let lot = lots.of(cx, parts, &origins, id, &owner);
        let like = match origins[index] {
            Origin::Like(base) => Some(base),
            Origin::Own | Origin::Lost => None,
        };
        let drawing = part.drawing.as_ref().map(drawing);
        let material = owner.material.clone().unwrap_or_else(|| unknown_material(cx));
        cx.parts.push(Part {
            name: part.name.value.clone(),
            span: part.name.span,
            material,
            material_span: owner.material_span,
            lot,
            drawing,
            dimensions: Vec::new(),
            like,
        });
        cx.dimension_names.insert(id, Names::default());
    }
    // A part is drawn after the one that it is like.
    let mut drawn = vec![false; parts.len()];
    for start in 0..parts.len() {
        let mut chain = vec![PartId(start as u32)];
        while let Origin::Like(base) = origins[chain[chain.len() - 1].index()] {
            chain.push(base);
        }
        for id in chain.into_iter().rev() {
            if !std::mem::replace(&mut drawn[id.index()], true) {
                let owner = owner(cx, parts, &origins, id);
                dimensions(cx, parts[id.index()], &owner, &origins[id.index()]);
            }
        }
    }
}

/// A drawing with its revision.
pub(crate) fn drawing(stated: &tree::Drawing) -> Drawing {
    Drawing {
        number: stated.number.value.clone(),
        revision: stated.revision.as_ref().map(|r| r.value.clone()).unwrap_or_default(),
        span: stated.span,
    }
}

/// Where a part's drawing comes from.
#[derive(Clone, Copy)]
enum Origin {
    /// It has a material of its own.
    Own,
    /// It is like another part; following these never comes back.
    Like(PartId),
    /// It is like a part that is not there, or like itself in the end.
    Lost,
}

/// Follows `like`, reporting parts that are not there and loops.
fn origins(cx: &mut Context, parts: &[&tree::Part]) -> Vec<Origin> {
    let mut origins: Vec<Origin> = parts
        .iter()
        .map(|part| match &part.origin {
            PartOrigin::Of(_) => Origin::Own,
            PartOrigin::Like(base) => cx.part(base).map_or(Origin::Lost, Origin::Like),
        })
        .collect();
    for start in 0..parts.len() {
        let mut seen = vec![start];
        while let Origin::Like(next) = origins[seen[seen.len() - 1]] {
            if next.index() == start {
                let names: Vec<String> =
                    seen.iter().map(|i| format!("`{}`", parts[*i].name.value)).collect();
                let PartOrigin::Like(base) = &parts[start].origin else { break };
                cx.report(
                    Diagnostic::new(
                        Code::LikeCycle,
                        base.span,
                        format!("parts are like each other in a circle: {}", names.join(", ")),
                    )
                    .help("give one of them a material and dimensions of its own"),
                );
                seen.iter().for_each(|i| origins[*i] = Origin::Lost);
                break;
            }
            // A loop further on is reported where it begins.
            if seen.contains(&next.index()) {
                break;
            }
            seen.push(next.index());
        }
    }
    origins
}

/// A part with the material that it, or the part it is like, is made of.
fn owner(cx: &mut Context, parts: &[&tree::Part], origins: &[Origin], id: PartId) -> Owner {
    let mut first = id;
    while let Origin::Like(base) = origins[first.index()] {
        first = base;
    }
    let name = parts[id.index()].name.value.clone();
    let (material, material_span) = match &parts[first.index()].origin {
        // What is wrong with the name is said once, where its own part is looked at first.
        PartOrigin::Of(material) if cx.parts.len() <= first.index() => {
            (material::find(cx, material), material.span)
        }
        PartOrigin::Of(material) => (material::get(cx, &material.value), material.span),
        PartOrigin::Like(base) => (None, base.span),
    };
    Owner { part: id, name, material, material_span }
}

/// Stands for a material that was not found, so that the part keeps its place.
fn unknown_material(cx: &Context) -> Arc<Material> {
    let reference = cx.head(crate::span::FileId(0)).reference;
    let nothing = Expansions::Isotropic(Expansion::constant(0.0, reference));
    Arc::new(Material::new("", nothing))
}

/// The lots named so far.
#[derive(Default)]
struct Lots {
    named: BTreeMap<String, (LotId, String, Span)>,
    of_part: BTreeMap<PartId, LotId>,
}

impl Lots {
    /// The lot of a part: the one it names, that of the part it is like, or one of its own.
    fn of(
        &mut self,
        cx: &mut Context,
        parts: &[&tree::Part],
        origins: &[Origin],
        id: PartId,
        owner: &Owner,
    ) -> LotId {
        let mut named_by = id;
        while let (None, Origin::Like(base)) =
            (&parts[named_by.index()].lot, origins[named_by.index()])
        {
            named_by = base;
        }
        let lot = match &parts[named_by.index()].lot {
            None => add(cx, &parts[id.index()].name.value, owner),
            Some(stated) => self.shared(cx, stated, owner),
        };
        self.of_part.insert(id, lot);
        lot
    }

    /// A lot that several parts may share; they are of one material.
    fn shared(&mut self, cx: &mut Context, stated: &tree::Text, owner: &Owner) -> LotId {
        let material = owner.material.as_ref().map(|m| m.name.clone()).unwrap_or_default();
        let Some((id, first, place)) = self.named.get(&stated.value).cloned() else {
            let id = add(cx, &stated.value, owner);
            let entry = (id, material, owner.material_span);
            self.named.insert(stated.value.clone(), entry);
            return id;
        };
        if first != material && !first.is_empty() && !material.is_empty() {
            cx.report(
                Diagnostic::new(
                    Code::LotOfTwoMaterials,
                    owner.material_span,
                    format!("lot `{}` is of `{first}`, not of `{material}`", stated.value),
                )
                .label(place, format!("`{first}` here"))
                .help("parts of one lot came from one melt or batch: name another lot"),
            );
        }
        id
    }
}

fn add(cx: &mut Context, name: &str, owner: &Owner) -> LotId {
    let material = owner.material.clone().unwrap_or_else(|| unknown_material(cx));
    cx.lots.push(Lot { name: name.to_string(), material });
    LotId(cx.lots.len() as u32 - 1)
}

/// Declares and resolves the dimensions of a part: those of the part it is like first, in their
/// order, changed where it says so.
fn dimensions(cx: &mut Context, part: &tree::Part, owner: &Owner, origin: &Origin) {
    let inherited = match origin {
        Origin::Like(base) => copy(cx, *base, owner.part),
        Origin::Own | Origin::Lost => Vec::new(),
    };
    let mut own: Vec<(DimensionId, &tree::Dimension)> = Vec::new();
    for stated in &part.dimensions {
        let name = &stated.name;
        let known = cx.dimension_names.get(&owner.part).and_then(|names| names.get(&name.value));
        let id = match (origin, known) {
            (Origin::Like(_), Some(id)) if inherited.contains(&id) => {
                if let Some((_, first)) = own.iter().find(|(changed, _)| *changed == id) {
                    let first = first.name.span;
                    twice(cx, name, first);
                    continue;
                }
                let blank = dimension::placeholder(cx, stated, owner.part);
                cx.dimensions[id.index()] = blank;
                id
            }
            (Origin::Like(base), _) => {
                let drawn = cx.parts[base.index()].name.clone();
                let none: Option<()> = cx.unknown_dimension(*base, &drawn, name);
                debug_assert!(none.is_none());
                continue;
            }
            (_, Some(id)) => {
                let first = cx.dimensions[id.index()].span;
                twice(cx, name, first);
                continue;
            }
            (_, None) => {
                let blank = dimension::placeholder(cx, stated, owner.part);
                push(cx, owner.part, blank)
            }
        };
        own.push((id, stated));
    }
    for (id, stated) in &own {
        if let Some(resolved) = dimension::resolve(cx, stated, owner) {
            cx.dimensions[id.index()] = resolved;
        }
    }
    own.iter().for_each(|(id, _)| dimension::check_bonus(cx, *id));
}

fn twice(cx: &mut Context, name: &tree::Name, first: Span) {
    cx.report(
        Diagnostic::new(
            Code::DuplicateName,
            name.span,
            format!("`{}` is defined twice", name.value),
        )
        .label(first, "first defined here")
        .help("give one of the two another name"),
    );
}

/// Adds a dimension to a part under its name.
fn push(cx: &mut Context, part: PartId, dimension: crate::model::Dimension) -> DimensionId {
    let id = DimensionId(cx.dimensions.len() as u32);
    if let Some(names) = cx.dimension_names.get_mut(&part) {
        // The caller has looked: the name is free.
        let _ = names.declare(&dimension.name, id, dimension.span);
    }
    cx.dimensions.push(dimension);
    cx.parts[part.index()].dimensions.push(id);
    id
}

/// Copies the dimensions of `base` to `part`; bonuses come from the copy's own features.
fn copy(cx: &mut Context, base: PartId, part: PartId) -> Vec<DimensionId> {
    let originals = cx.parts[base.index()].dimensions.clone();
    let first = cx.dimensions.len() as u32;
    let mut copies = Vec::with_capacity(originals.len());
    for original in &originals {
        let mut dimension = cx.dimensions[original.index()].clone();
        dimension.part = part;
        if let Some(geometric) = &mut dimension.geometric {
            let place = geometric.bonus.and_then(|of| originals.iter().position(|o| *o == of));
            geometric.bonus = place.map(|n| DimensionId(first + n as u32));
        }
        copies.push(push(cx, part, dimension));
    }
    copies
}
