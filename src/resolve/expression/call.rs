//! Functions of expressions, and sizes of rings once they are pressed.

use super::{Resolver, expr, kind, terms};
use crate::diagnostic::{Code, Diagnostic};
use crate::model::{DimensionId, Expr, ExprKind, Form, Function, Joint, PartId};
use crate::resolve::context::suggest;
use crate::resolve::quantity::with_article;
use crate::span::Span;
use crate::syntax::tree;
use crate::units::Kind;
use std::sync::Arc;

/// What a function does with the kinds of its arguments.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Shape {
    /// The root of an even kind.
    Root,
    /// From an angle to a ratio.
    Ratio,
    /// From a ratio to an angle.
    Angle,
    /// From two of one kind to an angle.
    AngleOfTwo,
    /// From several of one kind to that kind.
    Same,
    /// From one kind to that kind.
    Keep,
}

const FUNCTIONS: [(&str, Function, Shape); 11] = [
    ("sqrt", Function::Sqrt, Shape::Root),
    ("sin", Function::Sin, Shape::Ratio),
    ("cos", Function::Cos, Shape::Ratio),
    ("tan", Function::Tan, Shape::Ratio),
    ("asin", Function::Asin, Shape::Angle),
    ("acos", Function::Acos, Shape::Angle),
    ("atan", Function::Atan, Shape::Angle),
    ("atan2", Function::Atan2, Shape::AngleOfTwo),
    ("min", Function::Min, Shape::Same),
    ("max", Function::Max, Shape::Same),
    ("abs", Function::Abs, Shape::Keep),
];

/// Functions of fits and of conditions.
const SPECIAL: [&str; 3] = ["clearance", "play", "change"];

impl Resolver<'_, '_, '_> {
    /// A call of a function.
    pub(super) fn call(
        &mut self,
        span: Span,
        function: &tree::Name,
        arguments: &[tree::Expr],
        from: Option<&tree::Name>,
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        let name = function.value.as_str();
        if let (Some(from), true) = (from, name != "change") {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::SyntaxError,
                    from.span,
                    format!("`from` has no meaning in `{name}`"),
                )
                .help("only `change` compares two conditions: `change(part.length from cold)`"),
            );
        }
        match name {
            "clearance" | "play" => self.of_fit(span, function, arguments),
            "change" => self.change(span, function, arguments, from, within),
            _ => match FUNCTIONS.iter().find(|(known, ..)| *known == name) {
                Some(&(_, id, shape)) => {
                    self.arithmetic(span, function, id, shape, arguments, within)
                }
                None => self.unknown_function(function),
            },
        }
    }

    fn unknown_function<T>(&mut self, function: &tree::Name) -> Option<T> {
        let name = &function.value;
        let known = || FUNCTIONS.iter().map(|(known, ..)| *known).chain(SPECIAL);
        let help = match suggest(name, known()) {
            Some(near) => format!("did you mean `{near}`?"),
            None => format!("there are `{}`", known().collect::<Vec<_>>().join("`, `")),
        };
        self.cx.refuse(
            Diagnostic::new(
                Code::UnknownFunction,
                function.span,
                format!("unknown function `{name}`"),
            )
            .help(help),
        )
    }

    fn count(
        &mut self,
        span: Span,
        function: &tree::Name,
        found: usize,
        expected: &str,
        ok: bool,
    ) -> Option<()> {
        if ok {
            return Some(());
        }
        self.cx.refuse(
            Diagnostic::new(
                Code::ArgumentCount,
                span,
                format!("`{}` takes {expected}, found {found}", function.value),
            )
            .label(function.span, "this function"),
        )
    }

    fn of_fit(
        &mut self,
        span: Span,
        function: &tree::Name,
        arguments: &[tree::Expr],
    ) -> Option<Arc<Expr>> {
        self.count(span, function, arguments.len(), "one fit", arguments.len() == 1)?;
        let tree::ExprKind::Path(tree::Path { owner: None, name, .. }) = &arguments[0].kind else {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::WrongSubject,
                    arguments[0].span,
                    "expected the name of a fit, found an expression",
                )
                .help(format!("`{}` takes a fit, as `{0}(outer_race)`", function.value)),
            );
        };
        let (fit, _) = self.named_fit(name)?;
        let kind = match function.value.as_str() {
            "play" => ExprKind::Play(fit),
            _ => ExprKind::Clearance(fit),
        };
        Some(expr(span, Kind::LENGTH, kind))
    }

    fn change(
        &mut self,
        span: Span,
        function: &tree::Name,
        arguments: &[tree::Expr],
        from: Option<&tree::Name>,
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        self.count(span, function, arguments.len(), "one expression", arguments.len() == 1)?;
        let of = self.expression(&arguments[0], within);
        let from = match from {
            // The reference state is what `change` compares with anyway.
            Some(name) if name.value != "reference" => Some(self.cx.condition(name)?),
            _ => None,
        };
        let of = of?;
        Some(expr(span, of.quantity, ExprKind::Change { of, from }))
    }

    fn arithmetic(
        &mut self,
        span: Span,
        function: &tree::Name,
        id: Function,
        shape: Shape,
        arguments: &[tree::Expr],
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        let found = arguments.len();
        let (expected, ok) = match shape {
            Shape::AngleOfTwo => ("two arguments", found == 2),
            Shape::Same => ("two arguments or more", found >= 2),
            _ => ("one argument", found == 1),
        };
        let resolved: Vec<Option<Arc<Expr>>> =
            arguments.iter().map(|a| self.expression(a, within)).collect();
        self.count(span, function, found, expected, ok)?;
        let arguments: Vec<Arc<Expr>> = resolved.into_iter().collect::<Option<_>>()?;
        let first = arguments[0].quantity;
        let quantity = match shape {
            Shape::Keep => first,
            Shape::Root => match first.sqrt() {
                Some(root) => root,
                None => return self.wrong_argument(function, &arguments[0], "an even power"),
            },
            Shape::Ratio | Shape::Angle => {
                let (wanted, fits) = match shape {
                    Shape::Ratio => ("an angle", first.is_pure()),
                    _ => ("a ratio", first == Kind::PURE),
                };
                if !fits {
                    return self.wrong_argument(function, &arguments[0], wanted);
                }
                if shape == Shape::Ratio { Kind::PURE } else { Kind::ANGLE }
            }
            Shape::Same | Shape::AngleOfTwo => {
                let mut shared = first;
                for argument in &arguments[1..] {
                    match kind::common(shared, argument.quantity) {
                        Some(kind) => shared = kind,
                        None => {
                            let wanted = format!("{} as before", with_article(shared));
                            return self.wrong_argument(function, argument, &wanted);
                        }
                    }
                }
                if shape == Shape::Same { shared } else { Kind::ANGLE }
            }
        };
        Some(expr(span, quantity, ExprKind::Call(id, arguments)))
    }

    fn wrong_argument<T>(
        &mut self,
        function: &tree::Name,
        argument: &Expr,
        wanted: &str,
    ) -> Option<T> {
        self.cx.refuse(
            Diagnostic::new(
                Code::WrongKind,
                argument.span,
                format!(
                    "expected {wanted} in `{}`, found {}",
                    function.value,
                    with_article(argument.quantity)
                ),
            )
            .label(function.span, "this function"),
        )
    }

    /// `D after FIT`: only a bore or an outside of a ring of that joint.
    pub(super) fn after(
        &mut self,
        span: Span,
        inner: &tree::Expr,
        fit: &tree::Name,
        within: Option<PartId>,
    ) -> Option<Arc<Expr>> {
        let inner = self.expression(inner, within);
        let (id, resolved) = self.named_fit(fit)?;
        let sides = [resolved.external.clone(), resolved.internal.clone()];
        let joint = resolved.joint.clone();
        let inner = inner?;
        let Some(joint) = joint else {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::NoJoint,
                    fit.span,
                    format!("the fit `{}` has no joint, so nothing changes size in it", fit.value),
                )
                .help("state its `joint { … }` with the rings and their surfaces"),
            );
        };
        let ExprKind::Size { dimension, .. } = inner.kind else {
            return self.cx.refuse(
                Diagnostic::new(
                    Code::NotADimension,
                    inner.span,
                    "expected one dimension before `after`, found an expression",
                )
                .help("name the bore or the outside of a ring, as `bush.bore after press`"),
            );
        };
        let surfaces = surfaces(&joint, &sides);
        if surfaces.contains(&dimension) {
            return Some(expr(span, inner.quantity, ExprKind::After { dimension, fit: id }));
        }
        let names: Vec<String> =
            surfaces.iter().map(|d| format!("`{}`", self.path_of(*d))).collect();
        self.cx.refuse(
            Diagnostic::new(
                Code::NotOfThatJoint,
                inner.span,
                format!(
                    "`{}` is no bore or outside of a ring of `{}`",
                    self.path_of(dimension),
                    fit.value
                ),
            )
            .label(joint.span, "the joint")
            .help(format!("its surfaces are {}", names.join(", "))),
        )
    }

    /// `part.dimension`, as a spec writes it.
    pub(crate) fn path_of(&self, dimension: DimensionId) -> String {
        let dimension = &self.cx.dimensions[dimension.index()];
        format!("{}.{}", self.cx.parts[dimension.part.index()].name, dimension.name)
    }
}

/// The dimensions that are surfaces of a joint's rings: those in contact and the free ones.
fn surfaces(joint: &Joint, sides: &[Arc<Expr>; 2]) -> Vec<DimensionId> {
    let mut found: Vec<DimensionId> = Vec::new();
    for (ring, side) in [(&joint.inner, &sides[0]), (&joint.outer, &sides[1])] {
        let free = ring.free.iter().flat_map(|e| terms(e));
        let contact = terms(side);
        // A side that is a sum has no surface of its own.
        let contact =
            contact.into_iter().filter(|t| matches!(side.kind, ExprKind::Size { .. }) && t.added);
        for term in contact.chain(free) {
            if !found.contains(&term.dimension) {
                found.push(term.dimension);
            }
        }
    }
    found
}

/// True for the forms that are measured across or from an axis.
pub(crate) fn is_round(form: Form) -> bool {
    matches!(form, Form::Diameter | Form::Radius)
}
