//! Tree to model: names, units, classes, materials, includes; “did you mean”.
//!
//! Must not know evaluation. Mistakes are reported one by one; what is wrong, and all that rests on
//! it, is not in the model.

mod condition;
mod context;
mod dimension;
mod expression;
mod file;
mod fill;
mod fit;
mod gather;
mod head;
mod joint;
mod lint;
mod material;
mod part;
mod quantity;
mod require;
mod restraint;
mod scope;
mod sound;
mod subject;
mod table;
#[cfg(test)]
mod tests;

pub use file::{FileError, Files};

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{
    Assembly, ConditionId, Drawing, Expr, ExprKind, Feature, PartId, Requirement, Subject,
    SubjectId, SubjectKind,
};
use crate::source::Sources;
use crate::span::{FileId, Span};
use crate::syntax::tree::{self, Statement};
use crate::units::Kind;
use context::Context;
use expression::Resolver;
use fit::Side;
use gather::Gathered;
use scope::{Item, Scope};
use sound::{Errors, Unsound};
use std::collections::BTreeMap;
use std::sync::Arc;
use subject::Written;

/// A model, and what is wrong with the spec it was made from.
#[derive(Debug)]
pub struct Resolved {
    /// What can be evaluated; none where nothing can.
    pub assembly: Option<Assembly>,
    /// Everything found, of each severity, in the order of the text.
    pub diagnostics: Vec<Diagnostic>,
}

/// Resolves the file `root` and everything it uses.
///
/// Texts that are read on the way are added to `sources`. Never fails: three mistakes give three
/// findings, and the model holds what they leave.
pub fn resolve(root: FileId, sources: &mut Sources, files: &dyn Files) -> Resolved {
    let mut cx = Context::new(sources, files);
    let gathered = gather::gather(&mut cx, root);
    for (file, tree) in &gathered.trees {
        head::resolve(&mut cx, *file, tree);
    }
    let assembly = assembly(&mut cx, root, &gathered);
    let mut diagnostics = cx.diagnostics;
    diagnostics.sort_by_key(|d| (d.primary.span, d.code));
    diagnostics.dedup();
    Resolved { assembly, diagnostics }
}

/// The statements by what they define, in the order in which they count.
#[derive(Default)]
struct Statements<'t> {
    conditions: Vec<&'t tree::Condition>,
    materials: Vec<&'t tree::Material>,
    parts: Vec<&'t tree::Part>,
    lets: Vec<&'t tree::Let>,
    subjects: Vec<Written<'t>>,
    notes: Vec<&'t tree::Note>,
}

fn assembly(cx: &mut Context, root: FileId, gathered: &Gathered) -> Option<Assembly> {
    let mut scope = Scope::default();
    let statements = declare(cx, gathered, &mut scope);
    material::resolve(cx, &statements.materials);
    part::resolve(cx, &statements.parts);
    condition::resolve(cx, &statements.conditions);
    for (index, part) in statements.parts.iter().enumerate() {
        scope.declare_lets(cx, PartId(index as u32), &part.lets);
    }
    settle_sides(cx, &statements);
    let title = title(cx, root, gathered);
    if statements.conditions.is_empty() && !broken(cx, gathered, "condition") {
        let place = title.map_or(Span::new(root, 0, 0), |title| title.span);
        cx.report(
            Diagnostic::new(Code::NoCondition, place, "the file states no condition")
                .help("add one at least, such as `condition room 20`"),
        );
    }
    let drawing = drawing(cx, root, gathered);
    let written: BTreeMap<ConditionId, &tree::Condition> =
        (0..).map(ConditionId).zip(statements.conditions.iter().copied()).collect();
    let mut resolver = Resolver::new(cx, scope, written);
    let (subjects, lets) = subjects(&mut resolver, &statements);
    let mut unsound = Unsound::default();
    let errors = Errors::of(&cx.diagnostics);
    let (subjects, requirements) = placeholders(subjects, &mut unsound);
    let keep = Assembly {
        file: root,
        title: title.map(|title| title.title.value.clone()).unwrap_or_default(),
        span: title.map_or(Span::new(root, 0, 0), |title| title.span),
        drawing,
        defaults: cx.head(root).defaults,
        reference: cx.head(root).reference,
        notes: statements.notes.iter().map(|note| note.text.value.clone()).collect(),
        conditions: std::mem::take(&mut cx.conditions),
        lots: std::mem::take(&mut cx.lots),
        parts: std::mem::take(&mut cx.parts),
        dimensions: std::mem::take(&mut cx.dimensions),
        subjects,
        requirements,
    };
    let whole = errors.is_empty();
    unsound.collect(&errors, &keep, &statements.conditions);
    let mut assembly = if unsound.is_empty() { keep } else { sound::keep_sound(keep, unsound) };
    fill::settle_full(&mut assembly);
    require::check_keys(cx, &assembly.requirements);
    let looked_at = lint::Subject { assembly: &assembly, lets: &lets, whole };
    cx.diagnostics.extend(lint::lint(&looked_at));
    let known = |file| gathered.trees.iter().any(|(tree, _)| *tree == file);
    let headless = gathered
        .trees
        .iter()
        .any(|(_, tree)| tree.statements.iter().any(|s| is_head(s) && errors.inside(s.span())));
    // A file whose units are not known has no number that can be trusted, and of a wrong table it
    // is not known here who reads it.
    let trusted = !headless && !errors.elsewhere(known) && title.is_some();
    (trusted && !assembly.conditions.is_empty()).then_some(assembly)
}

/// Subjects with their requirements; one that is wrong keeps its place until it is taken out.
fn placeholders(outcomes: Vec<Outcome>, unsound: &mut Unsound) -> (Vec<Subject>, Vec<Requirement>) {
    let mut subjects = Vec::new();
    let mut requirements = Vec::new();
    for (id, outcome) in (0..).map(SubjectId).zip(outcomes) {
        match outcome {
            Some((subject, required)) => {
                subjects.push(subject);
                requirements.extend(required);
            }
            None => {
                unsound.subjects.insert(id);
                let nothing = Span::default();
                let zero = expression::expr(nothing, Kind::LENGTH, ExprKind::Constant(0.0));
                let kind = SubjectKind::Gap(zero);
                subjects.push(Subject { name: String::new(), span: nothing, kind });
            }
        }
    }
    (subjects, requirements)
}

fn is_head(statement: &Statement) -> bool {
    matches!(
        statement,
        Statement::Lengths(_) | Statement::Temperatures(_) | Statement::Reference(_)
    )
}

/// Gives every name its id.
fn declare<'t>(cx: &mut Context, gathered: &'t Gathered, scope: &mut Scope<'t>) -> Statements<'t> {
    let mut found = Statements::default();
    for (_, statement) in gathered.statements() {
        match statement {
            Statement::Condition(stated) => {
                let id = ConditionId(found.conditions.len() as u32);
                let name = &stated.name;
                match cx.condition_names.declare(&name.value, id, name.span) {
                    Ok(()) => found.conditions.push(stated),
                    Err(first) => cx.report(
                        scope::duplicate(name, "condition", "condition", first)
                            .help("give one of the two another name"),
                    ),
                }
            }
            Statement::Material(stated) => found.materials.push(stated),
            Statement::Part(stated) => {
                let id = PartId(found.parts.len() as u32);
                let name = &stated.name;
                if scope.declare(cx, name, Item::Part(id)) {
                    // The scope has looked: the name is free.
                    let _ = cx.part_names.declare(&name.value, id, name.span);
                    found.parts.push(stated);
                }
            }
            Statement::Let(stated) => {
                if scope.declare(cx, &stated.name, Item::Let(stated)) {
                    found.lets.push(stated);
                }
            }
            Statement::Note(stated) => found.notes.push(stated),
            statement => {
                let Some(written) = Written::of(statement) else { continue };
                let id = SubjectId(found.subjects.len() as u32);
                let item = match written {
                    Written::Fit(fit) => Item::Fit(id, fit),
                    Written::Gap(gap) => Item::Gap(id, gap),
                    Written::Result(outcome) => Item::Result(outcome),
                    Written::Restraint(_) => Item::Restraint,
                    Written::Fill(_) => Item::Fill,
                };
                let name = written.name();
                if scope.declare(cx, name, item) {
                    let _ = cx.subject_names.declare(&name.value, id, name.span);
                    if matches!(item, Item::Fill) {
                        cx.fills.insert(id);
                    }
                    found.subjects.push(written);
                }
            }
        }
    }
    found
}

/// Tells the sizes on both sides of each fit whether they are a hole or a shaft.
fn settle_sides(cx: &mut Context, statements: &Statements) {
    for written in &statements.subjects {
        let Written::Fit(fit) = written else { continue };
        for (path, side) in fit::side_paths(fit) {
            let part = path.owner.as_ref().and_then(|owner| cx.part_names.get(&owner.value));
            let names = part.and_then(|part| cx.dimension_names.get(&part));
            let Some(id) = names.and_then(|names| names.get(&path.name.value)) else { continue };
            let feature = match side {
                Side::External => Feature::External,
                Side::Internal => Feature::Internal,
            };
            dimension::settle_side(cx, id, feature);
        }
    }
    dimension::report_unsettled(cx);
}

/// The `assembly` line of the root.
fn title<'t>(cx: &mut Context, root: FileId, gathered: &'t Gathered) -> Option<&'t tree::Assembly> {
    let mut lines =
        gathered.statements().filter(|(file, _)| *file == root).filter_map(|(_, s)| match s {
            Statement::Assembly(assembly) => Some(assembly),
            _ => None,
        });
    let first = lines.next();
    let Some(title) = first else {
        if !broken(cx, gathered, "assembly") {
            cx.report(
                Diagnostic::new(
                    Code::AssemblyMissing,
                    Span::new(root, 0, 0),
                    "the file has no `assembly` line, so it states parts and no assembly",
                )
                .help("begin it with `assembly \"TITLE\"`, or check the assembly that uses it"),
            );
        }
        return None;
    };
    for again in lines {
        cx.report(stated_twice("assembly", again.span, title.span));
    }
    Some(title)
}

/// The drawing of the assembly.
fn drawing(cx: &mut Context, root: FileId, gathered: &Gathered) -> Option<Drawing> {
    let mut lines =
        gathered.statements().filter(|(file, _)| *file == root).filter_map(|(_, s)| match s {
            Statement::Drawing(drawing) => Some(drawing),
            _ => None,
        });
    let first = lines.next()?;
    for again in lines {
        cx.report(stated_twice("drawing", again.span, first.span));
    }
    Some(part::drawing(first))
}

fn stated_twice(word: &str, again: Span, first: Span) -> Diagnostic {
    Diagnostic::new(Code::StatedTwice, again, format!("`{word}` is stated twice"))
        .label(first, "first stated here")
        .help("keep one of the two")
}

/// True where a statement that begins with that word could not be read.
fn broken(cx: &Context, gathered: &Gathered, word: &str) -> bool {
    let broken = gathered.trees.iter().flat_map(|(_, tree)| &tree.broken);
    cx.incomplete || broken.into_iter().any(|b| cx.text(b.span).trim_start().starts_with(word))
}

/// A subject with its requirements, none where it is wrong.
type Outcome = Option<(Subject, Vec<Requirement>)>;

/// Every subject in order, and every intermediate.
fn subjects<'t>(
    resolver: &mut Resolver<'_, '_, 't>,
    statements: &Statements<'t>,
) -> (Vec<Outcome>, Vec<Arc<Expr>>) {
    let mut lets = Vec::new();
    for (part, named) in resolver.scope.lets() {
        let key = (part, named.name.value.clone());
        lets.extend(resolver.definition(key, named.name.span, &named.expr).map(|(e, _)| e));
    }
    let subjects = (0..).map(SubjectId).zip(&statements.subjects);
    let subjects = subjects.map(|(id, written)| resolver.subject(id, *written)).collect();
    (subjects, lets)
}
