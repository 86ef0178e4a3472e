//! The files of a run: the root, and what it uses, each once however often it is reached.

use super::context::Context;
use crate::diagnostic::{Code, Diagnostic};
use crate::materials;
use crate::source::Sources;
use crate::span::{FileId, Span};
use crate::syntax::{self, tree};
use std::sync::Arc;

/// Every file as read, and its statements in the order in which they count.
#[derive(Debug, Default)]
pub(super) struct Gathered {
    /// Each `.gap` file with its tree; the root first.
    pub(super) trees: Vec<(FileId, tree::File)>,
    /// Index of the file, and of the statement in it; a used file stands where it is used first.
    order: Vec<(usize, usize)>,
}

impl Gathered {
    /// All statements in the order in which they count.
    pub(super) fn statements(&self) -> impl Iterator<Item = (FileId, &tree::Statement)> {
        self.order.iter().map(|&(file, statement)| {
            let (id, tree) = &self.trees[file];
            (*id, &tree.statements[statement])
        })
    }
}

/// Reads the root and everything it uses.
pub(super) fn gather(cx: &mut Context, root: FileId) -> Gathered {
    let mut gatherer = Gatherer { gathered: Gathered::default(), open: Vec::new() };
    gatherer.file(cx, root);
    gatherer.gathered
}

struct Gatherer {
    gathered: Gathered,
    /// The files that are being read, with the line that uses the next one.
    open: Vec<(FileId, Span)>,
}

impl Gatherer {
    fn file(&mut self, cx: &mut Context, file: FileId) {
        let parsed = syntax::parse(cx.sources.get(file).text(), file);
        parsed.diagnostics.into_iter().for_each(|d| cx.report(d));
        for broken in &parsed.tree.broken {
            cx.broken_places.push(broken.span);
            cx.broken.extend(broken.name.iter().map(|name| name.value.clone()));
        }
        let index = self.gathered.trees.len();
        let uses: Vec<Option<tree::Use>> = parsed
            .tree
            .statements
            .iter()
            .map(|statement| match statement {
                tree::Statement::Use(used) => Some(used.clone()),
                _ => None,
            })
            .collect();
        self.gathered.trees.push((file, parsed.tree));
        for (statement, used) in uses.into_iter().enumerate() {
            match used {
                None => self.gathered.order.push((index, statement)),
                Some(used) => {
                    self.open.push((file, used.span));
                    self.used(cx, &used);
                    self.open.pop();
                }
            }
        }
    }

    fn used(&mut self, cx: &mut Context, used: &tree::Use) {
        let Some(file) = cx.load(&used.path) else {
            // What it would have defined cannot be told from a misspelled name.
            cx.incomplete = true;
            return;
        };
        let lower = used.path.value.to_lowercase();
        if lower.ends_with(".yaml") || lower.ends_with(".yml") {
            library(cx, file, &used.path);
            return;
        }
        if let Some(start) = self.open.iter().position(|(open, _)| *open == file) {
            let finding = self.cycle(cx.sources, start, file, used);
            cx.report(finding);
            return;
        }
        if self.gathered.trees.iter().any(|(known, _)| *known == file) {
            return;
        }
        let first = self.gathered.trees.len();
        self.file(cx, file);
        let tree = &self.gathered.trees[first].1;
        let assembly = tree.statements.iter().find_map(|statement| match statement {
            tree::Statement::Assembly(assembly) => Some(assembly.span),
            _ => None,
        });
        if let Some(assembly) = assembly {
            cx.report(
                Diagnostic::new(
                    Code::UsedAssembly,
                    used.path.span,
                    format!("`{}` is an assembly of its own", used.path.value),
                )
                .label(assembly, "its `assembly` line")
                .help("move what both share into a file without an `assembly` line"),
            );
        }
    }

    fn cycle(&self, sources: &Sources, start: usize, file: FileId, used: &tree::Use) -> Diagnostic {
        let steps = &self.open[start..];
        let names = steps.iter().map(|(open, _)| *open).chain([file]);
        let names: Vec<&str> = names.map(|id| sources.get(id).name()).collect();
        let mut finding = Diagnostic::new(
            Code::UseCycle,
            used.path.span,
            format!("`{}` uses itself", sources.get(file).name()),
        )
        .here("leads back")
        .help(format!("the loop is `{}`: leave one of its `use` lines out", names.join("` -> `")));
        for (_, line) in steps.iter().filter(|(_, line)| *line != used.span) {
            finding = finding.label(*line, "on the way");
        }
        finding
    }
}

/// Adds the materials of a library in YAML, each library once.
fn library(cx: &mut Context, file: FileId, path: &tree::Text) {
    if cx.libraries.contains(&file) {
        return;
    }
    cx.libraries.push(file);
    let read = materials::yaml::read(cx.sources.get(file).text());
    match read {
        Ok(materials) => {
            for material in materials {
                if let Some((_, first)) = cx.materials.get(&material.name) {
                    let finding = Diagnostic::new(
                        Code::DuplicateName,
                        path.span,
                        format!("the material `{}` is defined already", material.name),
                    )
                    .label(*first, "defined first")
                    .help("rename one of them");
                    cx.report(finding);
                    continue;
                }
                cx.materials.insert(material.name.clone(), (Arc::new(material), path.span));
            }
        }
        Err(error) => {
            cx.incomplete = true;
            let source = cx.sources.get(file);
            let span = match error.line {
                0 => Span::new(file, 0, 0),
                line => place(source.text(), file, line, error.column),
            };
            cx.report(
                Diagnostic::new(Code::MaterialFile, span, error.message.clone())
                    .label(path.span, "used here"),
            );
        }
    }
}

/// The place of a line and column, both from 1, the column in characters.
fn place(text: &str, file: FileId, line: usize, column: usize) -> Span {
    let start: usize = text.split_inclusive('\n').take(line - 1).map(str::len).sum();
    let rest = text[start..].split('\n').next().unwrap_or("");
    let at: usize = rest.chars().take(column.saturating_sub(1)).map(char::len_utf8).sum();
    let length = rest[at..].trim_end().len();
    Span::new(file, start + at, start + at + length)
}
