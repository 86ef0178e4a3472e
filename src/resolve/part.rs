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
    let mut origins = origins(cx, parts);
    let order = order(cx, parts, &mut origins);
    let owners = owners(cx, parts, &origins, &order);
    let mut lots = Lots::default();
    let stated = stated_lots(parts, &origins, &order);
    for (index, part) in parts.iter().enumerate() {
        let owner = &owners[index];
        let lot = match stated[index] {
            Some(text) => lots.shared(cx, text, owner),
            None => add(cx, &part.name.value, false, owner),
        };
        let material = owner.material.clone().unwrap_or_else(|| unknown_material(cx));
        cx.parts.push(Part {
            name: part.name.value.clone(),
            span: part.name.span,
            material,
            material_span: owner.material_span,
            lot,
            drawing: part.drawing.as_ref().map(drawing),
            dimensions: Vec::new(),
            like: origins[index].base(),
        });
        cx.dimension_names.insert(owner.part, Names::default());
    }
    for index in order {
        dimensions(cx, parts[index], &owners[index], origins[index]);
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

impl Origin {
    /// The part that it is like.
    fn base(self) -> Option<PartId> {
        match self {
            Origin::Like(base) => Some(base),
            Origin::Own | Origin::Lost => None,
        }
    }
}

/// Looks up `like`, reporting parts that are not there.
fn origins(cx: &mut Context, parts: &[&tree::Part]) -> Vec<Origin> {
    parts
        .iter()
        .map(|part| match &part.origin {
            PartOrigin::Of(_) => Origin::Own,
            PartOrigin::Like(base) => cx.part(base).map_or(Origin::Lost, Origin::Like),
        })
        .collect()
}

/// The parts in an order in which each comes after the one it is like; circles are reported and cut.
fn order(cx: &mut Context, parts: &[&tree::Part], origins: &mut [Origin]) -> Vec<usize> {
    let mut order = Vec::with_capacity(parts.len());
    let mut placed = vec![false; parts.len()];
    for start in 0..parts.len() {
        let mut path: Vec<usize> = Vec::new();
        let mut next = Some(start);
        while let Some(index) = next.filter(|index| !placed[*index]) {
            placed[index] = true;
            path.push(index);
            next = origins[index].base().map(PartId::index);
        }
        // What is placed already stands on this path only where it is a circle.
        if let Some(first) = next.and_then(|index| path.iter().position(|p| *p == index)) {
            circle(cx, parts, &path[first..]);
            path[first..].iter().for_each(|index| origins[*index] = Origin::Lost);
        }
        order.extend(path.into_iter().rev());
    }
    order
}

fn circle(cx: &mut Context, parts: &[&tree::Part], indices: &[usize]) {
    let names: Vec<String> =
        indices.iter().map(|index| format!("`{}`", parts[*index].name.value)).collect();
    let PartOrigin::Like(base) = &parts[indices[0]].origin else { return };
    cx.report(
        Diagnostic::new(
            Code::LikeCycle,
            base.span,
            format!("parts are like each other in a circle: {}", names.join(", ")),
        )
        .help("give one of them a material and dimensions of its own"),
    );
}

/// Each part with the material that it, or the part it is like, is made of.
fn owners(
    cx: &mut Context,
    parts: &[&tree::Part],
    origins: &[Origin],
    order: &[usize],
) -> Vec<Owner> {
    let mut owners: Vec<Owner> = Vec::with_capacity(parts.len());
    for (index, part) in parts.iter().enumerate() {
        let (material, material_span) = match &part.origin {
            PartOrigin::Of(material) => (material::find(cx, material), material.span),
            PartOrigin::Like(base) => (None, base.span),
        };
        let (part, name) = (PartId(index as u32), part.name.value.clone());
        owners.push(Owner { part, name, material, material_span });
    }
    for index in order {
        if let Some(base) = origins[*index].base() {
            let (material, span) =
                (owners[base.index()].material.clone(), owners[base.index()].material_span);
            owners[*index].material = material;
            owners[*index].material_span = span;
        }
    }
    owners
}

/// The lot that each part names, or that the part it is like names.
fn stated_lots<'t>(
    parts: &[&'t tree::Part],
    origins: &[Origin],
    order: &[usize],
) -> Vec<Option<&'t tree::Text>> {
    let mut stated: Vec<Option<&tree::Text>> = parts.iter().map(|p| p.lot.as_ref()).collect();
    for index in order {
        let of_base = origins[*index].base().and_then(|base| stated[base.index()]);
        stated[*index] = stated[*index].or(of_base);
    }
    stated
}

/// Stands for a material that was not found, so that the part keeps its place.
fn unknown_material(cx: &Context) -> Arc<Material> {
    let reference = cx.head(crate::span::FileId(0)).reference;
    let nothing = Expansions::Isotropic(Expansion::constant(0.0, reference));
    Arc::new(Material::new("", nothing))
}

/// The lots named so far, with the name of their material and where that stands.
#[derive(Default)]
struct Lots {
    named: BTreeMap<String, (LotId, String, Span)>,
}

impl Lots {
    /// A lot that several parts may share; they are of one material.
    fn shared(&mut self, cx: &mut Context, stated: &tree::Text, owner: &Owner) -> LotId {
        let material = owner.material.as_ref().map(|m| m.name.clone()).unwrap_or_default();
        let Some((id, first, place)) = self.named.get(&stated.value).cloned() else {
            let id = add(cx, &stated.value, true, owner);
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

fn add(cx: &mut Context, name: &str, stated: bool, owner: &Owner) -> LotId {
    let material = owner.material.clone().unwrap_or_else(|| unknown_material(cx));
    cx.lots.push(Lot { name: name.to_string(), stated, material });
    LotId(cx.lots.len() as u32 - 1)
}

/// Declares and resolves the dimensions of a part: those of the part it is like first, in their
/// order, changed where it says so.
fn dimensions(cx: &mut Context, part: &tree::Part, owner: &Owner, origin: Origin) {
    let inherited = match origin {
        Origin::Like(base) => copy(cx, base, owner.part),
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
                let none: Option<()> = cx.unknown_dimension(base, &drawn, name);
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
