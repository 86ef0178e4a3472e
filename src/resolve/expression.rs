//! Expressions: names become dimensions, intermediates are shared, kinds are checked at the
//! operator.
//!
//! A `let`, gap or result that an expression names is substituted, not evaluated: both mean the same
//! unknowns. What is wrong has been reported where `None` comes back, and every operand is looked at
//! before an expression is given up, so that two mistakes in one line give two reports.

mod call;
mod kind;
mod terms;

pub(crate) use call::is_round;
pub(crate) use terms::{Term, terms};

use super::context::Context;
use super::quantity::{self, Expect};
use super::scope::{Item, Meaning, Scope};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{
    self, Binary, Condition, ConditionId, DimensionId, Expr, ExprKind, Form, PartId, Scenario,
    SubjectId, Thermal,
};
use crate::span::{Span, Spanned};
use crate::syntax::tree::{self, Operator};
use crate::units::Kind;
use std::collections::BTreeMap;
use std::sync::Arc;

/// Most nodes of an expression with everything it names put in.
///
/// Whoever walks an expression may recurse; and a dozen lines that name each other twice would
/// otherwise stand for thousands of terms. A sum of [`tree::MAX_TERMS`] fits in.
const MAX_NODES: usize = 2500;

/// Deepest nesting of an expression with everything it names put in.
const MAX_DEPTH: usize = 400;

/// Names one definition: the part it stands in, and its name.
pub(crate) type Key = (Option<PartId>, String);

/// How far a definition is resolved.
#[derive(Debug, Clone)]
enum Progress<T> {
    /// It is being resolved: whoever meets it now has found a loop.
    Open,
    /// It is resolved, or has been reported.
    Done(Option<T>),
}

/// An expression with the count of nodes below it.
type Counted = (Arc<Expr>, usize);

/// Resolves expressions and what is made of them.
pub(crate) struct Resolver<'c, 'a, 't> {
    /// What is known.
    pub(crate) cx: &'c mut Context<'a>,
    /// What names mean.
    pub(crate) scope: Scope<'t>,
    /// Conditions as written.
    pub(crate) written_conditions: BTreeMap<ConditionId, &'t tree::Condition>,
    expressions: BTreeMap<Key, Progress<Counted>>,
    fits: BTreeMap<SubjectId, Progress<model::Fit>>,
    trail: Vec<(Key, Span)>,
    reference: Option<ConditionId>,
    nodes: usize,
    depth: usize,
}

impl<'c, 'a, 't> Resolver<'c, 'a, 't> {
    /// Nothing resolved yet.
    pub(crate) fn new(
        cx: &'c mut Context<'a>,
        scope: Scope<'t>,
        written_conditions: BTreeMap<ConditionId, &'t tree::Condition>,
    ) -> Self {
        Resolver {
            cx,
            scope,
            written_conditions,
            expressions: BTreeMap::new(),
            fits: BTreeMap::new(),
            trail: Vec::new(),
            reference: None,
            nodes: 0,
            depth: 0,
        }
    }

    /// The condition of that name, or a finding; the reference state counts as one where it is
    /// named.
    pub(crate) fn condition(&mut self, name: &tree::Name) -> Option<ConditionId> {
        if name.value != "reference" {
            return self.cx.condition(name);
        }
        if let Some(id) = self.reference {
            return Some(id);
        }
        let id = ConditionId(self.cx.conditions.len() as u32);
        let kelvin = self.cx.head(name.span.file).reference;
        self.cx.conditions.push(Condition {
            name: name.value.clone(),
            span: name.span,
            written: String::new(),
            thermal: Thermal::Uniform(Scenario::exact(kelvin)),
            states: Vec::new(),
            moisture: None,
            speed: None,
        });
        self.reference = Some(id);
        Some(id)
    }

    /// Every condition that the files define.
    pub(crate) fn own_conditions(&self) -> Vec<ConditionId> {
        self.written_conditions.keys().copied().collect()
    }

    /// An expression where bare names are first those of the part `within`.
    pub(crate) fn expression(
        &mut self,
        written: &tree::Expr,
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        self.nodes += 1;
        if self.depth >= MAX_DEPTH {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::ExpressionTooLong,
                    written.span,
                    format!("with all names put in, this is nested over {MAX_DEPTH} deep"),
                )
                .help("let fewer names build on each other"),
            );
        }
        self.depth += 1;
        let result = self.node(written, within);
        self.depth -= 1;
        result
    }

    fn node(&mut self, written: &tree::Expr, within: Option<PartId>) -> Option<Arc<Expr>> {
        let node = match &written.kind {
            tree::ExprKind::Constant(scalar) => self.constant(scalar)?,
            tree::ExprKind::Path(path) => return self.path(path, within),
            tree::ExprKind::Pieces(count, path) => return self.pieces(count, path, within),
            tree::ExprKind::Negate(inner) => {
                let inner = self.expression(inner, within)?;
                (inner.quantity, ExprKind::Negate(inner))
            }
            tree::ExprKind::Parenthesised(inner) => {
                let inner = self.expression(inner, within)?;
                (inner.quantity, inner.kind.clone())
            }
            tree::ExprKind::Chain(first, rest) => return self.chain(first, rest, within),
            tree::ExprKind::Power(base, exponent) => {
                let base = self.expression(base, within);
                let exponent = self.expression(exponent, within)?;
                return self.power(written.span, base?, &exponent);
            }
            tree::ExprKind::Call { function, arguments, from } => {
                return self.call(written.span, function, arguments, from.as_ref(), within);
            }
            tree::ExprKind::After(inner, fit) => {
                return self.after(written.span, inner, fit, within);
            }
        };
        Some(expr(written.span, node.0, node.1))
    }

    fn constant(&mut self, scalar: &tree::Scalar) -> Option<(Kind, ExprKind)> {
        let value = scalar.number.value;
        let Some(written) = &scalar.unit else {
            return Some((Kind::PURE, ExprKind::Constant(value)));
        };
        // Most constants are lengths, so a misspelled unit most likely is one of length.
        let unit = quantity::unit(self.cx, written, Expect::Size)?;
        if unit.kind != Kind::TEMPERATURE {
            let value = unit.to_si(value);
            if !value.is_finite() {
                return self.cx.refuse(Diagnostic::new(
                    Code::ValueOutOfRange,
                    scalar.span(),
                    format!("{} is beyond anything that can be built", self.cx.text(scalar.span())),
                ));
            }
            return Some((unit.kind, ExprKind::Constant(value)));
        }
        if unit.name == "K" {
            return Some((Kind::DIFFERENCE, ExprKind::Constant(value)));
        }
        self.cx.refuse(
            Diagnostic::new(
                Code::AbsoluteTemperature,
                scalar.span(),
                format!("a temperature in `{}` cannot stand in an expression", written.value),
            )
            .help("a condition states temperatures; a difference of temperatures is in `K`"),
        )
    }

    fn path(&mut self, path: &tree::Path, within: Option<PartId>) -> Option<Arc<Expr>> {
        match self.scope.meaning(self.cx, path, within)? {
            Meaning::Dimension(id) => self.size(id, path.span),
            Meaning::Pi => Some(expr(path.span, Kind::PURE, ExprKind::Pi)),
            Meaning::PartLet(part, named) => {
                let key = (Some(part), named.name.value.clone());
                self.named(key, path.span, &named.expr)
            }
            Meaning::Item(Item::Let(named)) => {
                self.named((None, named.name.value.clone()), path.span, &named.expr)
            }
            Meaning::Item(Item::Gap(_, gap)) => {
                self.named((None, gap.name.value.clone()), path.span, &gap.expr)
            }
            Meaning::Item(Item::Result(outcome)) => {
                self.named((None, outcome.name.value.clone()), path.span, &outcome.expr)
            }
            Meaning::Item(other) => self.no_value(path, other),
        }
    }

    fn no_value<T>(&mut self, path: &tree::Path, item: Item) -> Option<T> {
        let name = &path.name.value;
        let help = match item {
            Item::Part(_) => format!("name one of its dimensions, as `{name}.length`"),
            Item::Fit(..) => format!("write `clearance({name})` or `play({name})`"),
            Item::Restraint => "require its `force` or `stress` in its own block".to_string(),
            _ => "require its `ullage` in its own block".to_string(),
        };
        self.cx.refuse(
            Diagnostic::new(
                Code::WrongSubject,
                path.span,
                format!("`{name}` is a {}, which has no value of its own", item.noun()),
            )
            .help(help),
        )
    }

    /// One piece of a dimension.
    fn size(&mut self, dimension: DimensionId, span: Span) -> Option<Arc<Expr>> {
        let quantity = self.kind_of(dimension);
        Some(expr(span, quantity, ExprKind::Size { dimension, piece: 1 }))
    }

    fn pieces(
        &mut self,
        count: &tree::Count,
        path: &tree::Path,
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        let span = count.span.to(path.span);
        match self.scope.meaning(self.cx, path, within)? {
            Meaning::Dimension(dimension) => {
                let kind = ExprKind::Pieces { dimension, count: count.value };
                Some(expr(span, self.kind_of(dimension), kind))
            }
            _ => self.cx.refuse(
                Diagnostic::new(
                    Code::NotADimension,
                    path.span,
                    format!("`{}` is no dimension, so there are no pieces of it", path.name.value),
                )
                .label(count.span, "counts independent pieces of one dimension")
                .help(format!(
                    "write `{} * {}`",
                    count.value,
                    self.cx.text(path.span)
                )),
            ),
        }
    }

    /// A dimension or pieces of it, outside of an expression.
    pub(crate) fn term(&mut self, term: &tree::Term) -> Option<Arc<Expr>> {
        match &term.count {
            Some(count) => self.pieces(count, &term.path, None),
            None => {
                let dimension = self.dimension(&term.path)?;
                self.size(dimension, term.span)
            }
        }
    }

    /// The dimension that a path names, or a finding.
    pub(crate) fn dimension(&mut self, path: &tree::Path) -> Option<DimensionId> {
        match self.scope.meaning(self.cx, path, None)? {
            Meaning::Dimension(id) => Some(id),
            _ => self.cx.refuse(Diagnostic::new(
                Code::NotADimension,
                path.span,
                format!("expected a dimension, found `{}`", self.cx.text(path.span)),
            )),
        }
    }

    fn kind_of(&self, dimension: DimensionId) -> Kind {
        match self.cx.dimensions[dimension.index()].form {
            Form::Angle => Kind::ANGLE,
            Form::Diameter | Form::Radius | Form::Linear => Kind::LENGTH,
        }
    }

    fn chain(
        &mut self,
        first: &tree::Expr,
        rest: &[(Spanned<Operator>, tree::Expr)],
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        let mut result = self.expression(first, within);
        for (operator, right) in rest {
            let right = self.expression(right, within);
            // Both sides are read before either is given up.
            result = match (result, right) {
                (Some(left), Some(right)) => self.binary(left, operator, right),
                _ => None,
            };
        }
        let result = result?;
        self.check_length(result.span)?;
        if rest.iter().any(|(o, _)| matches!(o.value, Operator::Add | Operator::Subtract)) {
            self.check_sum(&result)?;
        }
        Some(result)
    }

    fn binary(
        &mut self,
        left: Arc<Expr>,
        operator: &Spanned<Operator>,
        right: Arc<Expr>,
    ) -> Option<Arc<Expr>> {
        self.nodes += 1;
        let (binary, quantity) = match operator.value {
            Operator::Add => (Binary::Add, self.sum_kind(&left, operator.span, "+", &right)?),
            Operator::Subtract => (Binary::Sub, self.sum_kind(&left, operator.span, "-", &right)?),
            Operator::Multiply => (Binary::Mul, left.quantity * right.quantity),
            Operator::Divide => (Binary::Div, left.quantity / right.quantity),
        };
        let span = left.span.to(right.span);
        Some(expr(span, quantity, ExprKind::Binary(binary, left, right)))
    }

    /// A named expression, resolved once and shared by all who name it.
    fn named(&mut self, key: Key, mention: Span, written: &tree::Expr) -> Option<Arc<Expr>> {
        let name = key.1.clone();
        let (inner, nodes) = self.definition(key, mention, written)?;
        self.nodes += nodes;
        self.check_length(mention)?;
        Some(expr(mention, inner.quantity, ExprKind::Named(name, inner)))
    }

    /// Refuses an expression that has grown too long.
    fn check_length(&mut self, span: Span) -> Option<()> {
        if self.nodes <= MAX_NODES {
            return Some(());
        }
        self.cx.refuse(
            Diagnostic::new(
                Code::ExpressionTooLong,
                span,
                format!("with all names put in, this expression has over {MAX_NODES} terms"),
            )
            .help("a chain of that length is no longer a chain of parts: split it"),
        )
    }

    /// The expression that a name stands for.
    pub(crate) fn definition(
        &mut self,
        key: Key,
        mention: Span,
        written: &tree::Expr,
    ) -> Option<Counted> {
        match self.expressions.get(&key) {
            Some(Progress::Done(done)) => return done.clone(),
            Some(Progress::Open) => return self.report_loop(&key, mention),
            None => {}
        }
        self.expressions.insert(key.clone(), Progress::Open);
        self.trail.push((key.clone(), mention));
        let outer = std::mem::take(&mut self.nodes);
        let result = self.expression(written, key.0);
        let nodes = std::mem::replace(&mut self.nodes, outer);
        self.trail.pop();
        let result = result.map(|e| (e, nodes));
        self.expressions.insert(key, Progress::Done(result.clone()));
        result
    }

    /// A fit that an expression names: its sides and its joint.
    pub(crate) fn named_fit(&mut self, name: &tree::Name) -> Option<(SubjectId, &model::Fit)> {
        let (id, written) = self.scope.fit(self.cx, name)?;
        self.fit(id, written, name.span)?;
        match self.fits.get(&id) {
            Some(Progress::Done(Some(fit))) => Some((id, fit)),
            _ => None,
        }
    }

    /// A fit, resolved once.
    pub(crate) fn fit(
        &mut self,
        id: SubjectId,
        written: &'t tree::Fit,
        mention: Span,
    ) -> Option<&model::Fit> {
        let key = (None, written.name.value.clone());
        if let Some(Progress::Open) = self.fits.get(&id) {
            return self.report_loop(&key, mention);
        }
        if !self.fits.contains_key(&id) {
            self.fits.insert(id, Progress::Open);
            self.trail.push((key, mention));
            let outer = std::mem::take(&mut self.nodes);
            let fit = self.build_fit(written);
            self.nodes = outer;
            self.trail.pop();
            self.fits.insert(id, Progress::Done(fit));
        }
        match self.fits.get(&id) {
            Some(Progress::Done(Some(fit))) => Some(fit),
            _ => None,
        }
    }

    /// Reports a definition that leads back to itself, with every step of the way.
    fn report_loop<T>(&mut self, key: &Key, mention: Span) -> Option<T> {
        let start = self.trail.iter().position(|(k, _)| k == key).unwrap_or(0);
        let spelled = |(part, name): &Key| match part {
            Some(part) => format!("{}.{name}", self.cx.parts[part.index()].name),
            None => name.clone(),
        };
        let mut steps: Vec<String> = self.trail[start..].iter().map(|(k, _)| spelled(k)).collect();
        let first = spelled(key);
        steps.push(first.clone());
        let mut finding = Diagnostic::new(
            Code::DefinitionLoop,
            mention,
            format!("`{first}` is defined by itself"),
        )
        .here("leads back")
        .help(format!("the loop is `{}`", steps.join("` -> `")));
        for ((key, _), (_, next)) in self.trail[start..].iter().zip(&self.trail[start + 1..]) {
            finding = finding.label(*next, format!("named in `{}`", spelled(key)));
        }
        self.cx.refuse(finding)
    }
}

/// A node of the model.
pub(crate) fn expr(span: Span, quantity: Kind, kind: ExprKind) -> Arc<Expr> {
    Arc::new(Expr { kind, span, quantity })
}
