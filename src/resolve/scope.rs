//! What a name means where it is written: a bare name in a part is that part's first, then the
//! file's; elsewhere a dimension is `part.name`.
//!
//! Names are declared here before anything is resolved, so that order does not matter.

use super::context::{Context, suggest};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{DimensionId, PartId, SubjectId};
use crate::span::Span;
use crate::syntax::tree;
use std::collections::{BTreeMap, BTreeSet};

/// What a name of the file stands for.
#[derive(Debug, Clone, Copy)]
pub(crate) enum Item<'t> {
    /// A part.
    Part(PartId),
    /// A named intermediate.
    Let(&'t tree::Let),
    /// A fit.
    Fit(SubjectId, &'t tree::Fit),
    /// A gap.
    Gap(SubjectId, &'t tree::Gap),
    /// A result.
    Result(&'t tree::Outcome),
    /// A restraint.
    Restraint,
    /// A fill.
    Fill,
}

impl Item<'_> {
    /// The word for what it is.
    pub(crate) fn noun(self) -> &'static str {
        match self {
            Item::Part(_) => "part",
            Item::Let(_) => "let",
            Item::Fit(..) => "fit",
            Item::Gap(..) => "gap",
            Item::Result(_) => "result",
            Item::Restraint => "restraint",
            Item::Fill => "fill",
        }
    }

    /// True for what an expression may name as it stands.
    pub(crate) fn has_value(self) -> bool {
        matches!(self, Item::Let(_) | Item::Gap(..) | Item::Result(_))
    }
}

/// What a path in an expression stands for.
#[derive(Debug, Clone, Copy)]
pub(crate) enum Meaning<'t> {
    /// A dimension.
    Dimension(DimensionId),
    /// An intermediate of that part.
    PartLet(PartId, &'t tree::Let),
    /// Something that the file names.
    Item(Item<'t>),
    /// The circle constant.
    Pi,
}

/// Every name that an expression can hold.
#[derive(Debug, Default)]
pub(crate) struct Scope<'t> {
    items: BTreeMap<&'t str, (Item<'t>, Span)>,
    lets: BTreeMap<PartId, Vec<&'t tree::Let>>,
}

impl<'t> Scope<'t> {
    /// Declares a name of the file; false, with a finding, where it is taken.
    pub(crate) fn declare(
        &mut self,
        cx: &mut Context,
        name: &'t tree::Name,
        item: Item<'t>,
    ) -> bool {
        if name.value == "pi" {
            cx.report(
                Diagnostic::new(Code::ReservedName, name.span, "`pi` is the circle constant")
                    .help("take another name"),
            );
            return false;
        }
        if let Some(&(first, place)) = self.items.get(name.value.as_str()) {
            cx.report(duplicate(name, item.noun(), first.noun(), place).help(
                "parts, fits, gaps, results, lets, restraints and fills share their names: \
                 rename one",
            ));
            return false;
        }
        self.items.insert(&name.value, (item, name.span));
        true
    }

    /// Declares the intermediates of a part, which share their names with its dimensions.
    pub(crate) fn declare_lets(&mut self, cx: &mut Context, part: PartId, lets: &'t [tree::Let]) {
        for named in lets {
            let name = &named.name;
            let names = cx.dimension_names.get(&part);
            let of_dimension = names.and_then(|names| names.span(&name.value));
            let own = self.lets.entry(part).or_default();
            let of_let = own.iter().find(|l| l.name.value == name.value).map(|l| l.name.span);
            let first = of_dimension.map(|span| (span, "dimension"));
            match first.or(of_let.map(|span| (span, "let"))) {
                Some((span, noun)) => cx.report(
                    duplicate(name, "let", noun, span)
                        .help("the dimensions and lets of a part share their names: rename one"),
                ),
                None => own.push(named),
            }
        }
    }

    /// What a name of the file stands for.
    pub(crate) fn item(&self, name: &str) -> Option<Item<'t>> {
        self.items.get(name).map(|&(item, _)| item)
    }

    /// Every intermediate, those of parts with their part.
    pub(crate) fn lets(&self) -> Vec<(Option<PartId>, &'t tree::Let)> {
        let of_file = self.items.values().filter_map(|&(item, _)| match item {
            Item::Let(named) => Some((None, named)),
            _ => None,
        });
        let of_parts =
            self.lets.iter().flat_map(|(part, lets)| lets.iter().map(|l| (Some(*part), *l)));
        of_file.chain(of_parts).collect()
    }

    /// An intermediate of a part, or of the part it is drawn like.
    fn part_let(&self, cx: &Context, part: PartId, name: &str) -> Option<&'t tree::Let> {
        let mut part = Some(part);
        // A part is drawn like one that is declared; a loop of them has been reported.
        for _ in 0..=cx.parts.len() {
            let here = part?;
            let own =
                self.lets.get(&here).and_then(|lets| lets.iter().find(|l| l.name.value == name));
            if let Some(found) = own {
                return Some(found);
            }
            part = cx.parts.get(here.index()).and_then(|p| p.like);
        }
        None
    }

    /// A dimension or intermediate of a part.
    fn member(&self, cx: &Context, part: PartId, name: &str) -> Option<Meaning<'t>> {
        if let Some(id) = cx.dimension_names.get(&part).and_then(|names| names.get(name)) {
            return Some(Meaning::Dimension(id));
        }
        self.part_let(cx, part, name).map(|named| Meaning::PartLet(part, named))
    }

    /// What a path stands for, or a finding.
    pub(crate) fn meaning(
        &self,
        cx: &mut Context,
        path: &tree::Path,
        within: Option<PartId>,
    ) -> Option<Meaning<'t>> {
        match &path.owner {
            Some(owner) => self.owned(cx, path, owner),
            None => self.bare(cx, &path.name, within),
        }
    }

    fn owned(
        &self,
        cx: &mut Context,
        path: &tree::Path,
        owner: &tree::Name,
    ) -> Option<Meaning<'t>> {
        let part = match self.item(&owner.value) {
            Some(Item::Part(part)) => part,
            Some(other) => {
                return cx.refuse(
                    Diagnostic::new(
                        Code::WrongSubject,
                        owner.span,
                        format!("`{}` is a {}, not a part", owner.value, other.noun()),
                    )
                    .help("only a part has dimensions"),
                );
            }
            None => return cx.part(owner).and(None),
        };
        if let Some(found) = self.member(cx, part, &path.name.value) {
            return Some(found);
        }
        if cx.is_broken(&path.name.value) || cx.is_broken(&owner.value) {
            return None;
        }
        if cx.incomplete {
            return None;
        }
        let names = self.member_names(cx, part);
        let mut finding = Diagnostic::new(
            Code::UnknownDimension,
            path.name.span,
            format!("`{}` has no dimension `{}`", owner.value, path.name.value),
        )
        .label(cx.parts[part.index()].span, "the part");
        if let Some(near) = suggest(&path.name.value, names.iter().map(String::as_str)) {
            finding = finding.help(format!("did you mean `{near}`?"));
        } else if !names.is_empty() && names.len() <= 8 {
            finding = finding.help(format!("it has `{}`", names.join("`, `")));
        }
        cx.refuse(finding)
    }

    fn bare(
        &self,
        cx: &mut Context,
        name: &tree::Name,
        within: Option<PartId>,
    ) -> Option<Meaning<'t>> {
        let text = name.value.as_str();
        if let Some(found) = within.and_then(|part| self.member(cx, part, text)) {
            return Some(found);
        }
        if let Some(item) = self.item(text) {
            return Some(Meaning::Item(item));
        }
        if text == "pi" {
            return Some(Meaning::Pi);
        }
        if cx.incomplete || cx.is_broken(text) {
            return None;
        }
        let mut finding =
            Diagnostic::new(Code::UnknownName, name.span, format!("unknown name `{text}`"));
        let owners = |name: &str| -> Vec<String> {
            let owning = cx.dimension_names.iter().filter(|(_, names)| names.get(name).is_some());
            owning.map(|(part, _)| format!("`{}.{name}`", cx.parts[part.index()].name)).collect()
        };
        let all: BTreeSet<&str> = cx.dimension_names.values().flat_map(|n| n.names()).collect();
        let near_owners = suggest(text, all).map(|near| owners(&near)).unwrap_or_default();
        let owners = owners(text);
        let candidates = self.value_names(cx, within);
        if !owners.is_empty() && owners.len() <= 4 {
            finding = finding.help(format!("write {}", owners.join(" or ")));
        } else if let Some(near) = suggest(text, candidates.iter().map(String::as_str)) {
            finding = finding.help(format!("did you mean `{near}`?"));
        } else if !near_owners.is_empty() && near_owners.len() <= 4 {
            finding = finding.help(format!("did you mean {}?", near_owners.join(" or ")));
        }
        cx.refuse(finding)
    }

    fn member_names(&self, cx: &Context, part: PartId) -> Vec<String> {
        let dimensions = cx.dimension_names.get(&part).into_iter().flat_map(|names| names.names());
        let lets = self.lets.get(&part).into_iter().flatten().map(|l| l.name.value.as_str());
        dimensions.chain(lets).map(str::to_string).collect()
    }

    fn value_names(&self, cx: &Context, within: Option<PartId>) -> Vec<String> {
        let mut names = within.map_or_else(Vec::new, |part| self.member_names(cx, part));
        let items = self.items.iter().filter(|(_, (item, _))| item.has_value());
        names.extend(items.map(|(name, _)| name.to_string()));
        names
    }

    /// The fit of that name, or a finding.
    pub(crate) fn fit(
        &self,
        cx: &mut Context,
        name: &tree::Name,
    ) -> Option<(SubjectId, &'t tree::Fit)> {
        match self.item(&name.value) {
            Some(Item::Fit(id, fit)) => Some((id, fit)),
            other => self.not_a(cx, name, "fit", other),
        }
    }

    /// The gap of that name, or a finding.
    pub(crate) fn gap(&self, cx: &mut Context, name: &tree::Name) -> Option<SubjectId> {
        match self.item(&name.value) {
            Some(Item::Gap(id, _)) => Some(id),
            other => self.not_a(cx, name, "gap", other),
        }
    }

    fn not_a<T>(
        &self,
        cx: &mut Context,
        name: &tree::Name,
        noun: &'static str,
        found: Option<Item<'t>>,
    ) -> Option<T> {
        if let Some(found) = found {
            return cx.refuse(Diagnostic::new(
                Code::WrongSubject,
                name.span,
                format!("expected a {noun}, found the {} `{}`", found.noun(), name.value),
            ));
        }
        let names = self.items.iter().filter(|(_, (item, _))| item.noun() == noun);
        let names = names.map(|(name, _)| name.to_string()).collect();
        cx.unknown(Code::UnknownName, noun, name, |_| names)
    }
}

/// A name that is defined twice.
pub(crate) fn duplicate(
    name: &tree::Name,
    noun: &str,
    first_noun: &str,
    first: Span,
) -> Diagnostic {
    Diagnostic::new(
        Code::DuplicateName,
        name.span,
        format!("the name `{}` is taken already", name.value),
    )
    .here(format!("a {noun}"))
    .label(first, format!("a {first_noun}, defined first"))
}
