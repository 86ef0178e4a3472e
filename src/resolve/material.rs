//! Materials: those that a spec defines, and the names by which parts ask for them. SI.

mod block;
mod expansion;
mod property;
mod swell;
mod table;

use super::context::{Context, suggest};
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::{Library, Material};
use crate::syntax::tree;
use std::collections::{BTreeMap, BTreeSet};
use std::sync::Arc;

/// Most materials that a message lists.
const LISTED: usize = 6;

/// Resolves every material block; a name of the library may be defined anew.
///
/// A block with mistakes is left out, and its name counts as broken, so that its parts are not
/// reported as well.
pub(crate) fn resolve(cx: &mut Context, blocks: &[&tree::Material]) {
    let mut named: BTreeMap<&str, &tree::Material> = BTreeMap::new();
    for block in blocks {
        let name = &block.name;
        let earlier = named.get(name.value.as_str()).map(|first| first.name.span);
        let earlier = earlier.or_else(|| cx.materials.get(&name.value).map(|(_, span)| *span));
        let Some(first) = earlier else {
            named.insert(&name.value, block);
            continue;
        };
        cx.report(
            Diagnostic::new(
                Code::DuplicateName,
                name.span,
                format!("material `{}` is defined twice", name.value),
            )
            .label(first, "first defined here")
            .help("give one of the two another name"),
        );
    }
    for block in blocks {
        define(cx, &named, block.name.value.as_str());
    }
}

/// Resolves one block, and before it all that it is like.
fn define<'t>(cx: &mut Context, named: &BTreeMap<&'t str, &'t tree::Material>, name: &'t str) {
    let is_done = |cx: &Context, name: &str| cx.materials.contains_key(name) || cx.is_broken(name);
    if is_done(cx, name) {
        return;
    }
    let mut chain = vec![name];
    let mut on_it = BTreeSet::from([name]);
    while let Some(block) = named.get(chain[chain.len() - 1])
        && let Some(like) = base_of(block)
        && named.contains_key(like.value.as_str())
        && !is_done(cx, &like.value)
    {
        let next = like.value.as_str();
        if !on_it.insert(next) {
            let first = chain.iter().position(|name| *name == next).unwrap_or(0);
            circle(cx, like, &chain[first..]);
            cx.broken.extend(chain.drain(first..).map(str::to_string));
            break;
        }
        chain.push(next);
    }
    for name in chain.into_iter().rev() {
        let Some(block) = named.get(name) else { continue };
        let base = match &block.like {
            None => Some(None),
            // `material x like x` starts from the one of the library.
            Some(like) if like.value == name => {
                let base = Library::builtin().get(name);
                if base.is_none() {
                    circle(cx, like, &[name]);
                }
                base.map(Some)
            }
            Some(like) => find(cx, like).map(Some),
        };
        match base.and_then(|base| block::material(cx, block, base)) {
            Some(material) => {
                let entry = (Arc::new(material), block.name.span);
                cx.materials.insert(name.to_string(), entry);
            }
            None => {
                cx.broken.insert(name.to_string());
            }
        }
    }
}

/// The other material that a block starts from.
fn base_of(block: &tree::Material) -> Option<&tree::Name> {
    block.like.as_ref().filter(|like| like.value != block.name.value)
}

fn circle(cx: &mut Context, like: &tree::Name, names: &[&str]) {
    let names: Vec<String> = names.iter().map(|name| format!("`{name}`")).collect();
    cx.report(
        Diagnostic::new(
            Code::LikeCycle,
            like.span,
            format!("materials are like each other in a circle: {}", names.join(", ")),
        )
        .help("give one of them an expansion of its own"),
    );
}

/// The material of that name: one of the files, else one of the library.
pub(crate) fn get(cx: &Context, name: &str) -> Option<Arc<Material>> {
    match cx.materials.get(name) {
        Some((material, _)) => Some(Arc::clone(material)),
        None if cx.is_broken(name) => None,
        None => Library::builtin().get(name),
    }
}

/// The material of that name, or a finding with the nearest spelling or with what it may mean.
pub(crate) fn find(cx: &mut Context, name: &tree::Name) -> Option<Arc<Material>> {
    if let Some(found) = get(cx, &name.value) {
        return Some(found);
    }
    if cx.incomplete || cx.is_broken(&name.value) {
        return None;
    }
    let mut names: Vec<&str> = cx.materials.keys().map(String::as_str).collect();
    for name in Library::builtin().names() {
        names.push(name);
    }
    let help = meant(&name.value, names);
    cx.refuse(
        Diagnostic::new(
            Code::UnknownMaterial,
            name.span,
            format!("unknown material `{}`", name.value),
        )
        .help(help),
    )
}

/// What an unknown name may mean: a library material with its grade number, the nearest spelling, or
/// whatever the library has of that name or family.
fn meant(name: &str, names: Vec<&str>) -> String {
    let found = |word: &str| -> Vec<String> {
        Library::builtin().search(word).iter().map(|m| format!("`{}`", m.name)).collect()
    };
    let words = || name.split('_').filter(|word| word.len() > 2);
    let has_digit = |word: &&str| word.bytes().any(|b| b.is_ascii_digit());
    let define = format!("define it: `material {name} {{ cte … ppm/K }}`");
    let near = suggest(name, names);
    // `steel_304` is spelled much like `steel_1020`, but it is the number that says which.
    let graded = |grade: &str| -> Vec<String> {
        let of_it = |known: &&str| known.split('_').any(|word| word == grade);
        let named: Vec<String> =
            Library::builtin().names().filter(of_it).map(|known| format!("`{known}`")).collect();
        if named.is_empty() { found(grade) } else { named }
    };
    let grade: Vec<String> = words().filter(has_digit).flat_map(graded).collect();
    let near_has_grade =
        |near: &String| words().filter(has_digit).any(|grade| near.contains(grade));
    if !grade.is_empty() && grade.len() <= LISTED && !near.as_ref().is_some_and(near_has_grade) {
        return did_you_mean(&grade);
    }
    if let Some(near) = near {
        return did_you_mean(&[format!("`{near}`")]);
    }
    let meant = found(name);
    if !meant.is_empty() {
        return did_you_mean(&meant);
    }
    let family = words().map(found).find(|family| !family.is_empty());
    family.map_or(define.clone(), |family| format!("{} or {define}", did_you_mean(&family)))
}

fn did_you_mean(names: &[String]) -> String {
    match names {
        [one] => format!("did you mean {one}?"),
        few if few.len() <= LISTED => format!("did you mean one of {}?", few.join(", ")),
        many => {
            let rest = many.len() - LISTED;
            format!("did you mean one of {} or {rest} more?", many[..LISTED].join(", "))
        }
    }
}
