//! Parts and their dimensions.

use super::material::direction;
use super::{Lower, names, path, spelled, string};
use crate::span::{Span, Spanned};
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Basis, Coating, CoatingOrder, Dimension, Form, Geometrical, GeometricalKind, Load,
    MaterialCondition, Modifier, Name, Part, PartOrigin, Scalar, Side, Sides, Size, Strain, Text,
};

impl Lower {
    /// The header alone; its dimensions stand in a block.
    pub(in crate::syntax) fn part(&mut self, node: Node<'_>) -> Option<Part> {
        let span = node.span();
        let like = node.child(Rule::word_like).is_some();
        let lot = node.child(Rule::string).map(|lot| string(&lot));
        let mut names = names(node).into_iter();
        let name = names.next()?;
        self.free_name(&name, "part");
        let origin = names.next()?;
        let origin = if like { PartOrigin::Like(origin) } else { PartOrigin::Of(origin) };
        Some(Part {
            name,
            origin,
            lot,
            drawing: None,
            dimensions: Vec::new(),
            lets: Vec::new(),
            span,
        })
    }

    pub(in crate::syntax) fn dimension(&mut self, node: Node<'_>) -> Option<Dimension> {
        let span = node.span();
        let mut children = node.children();
        let name = spelled(&children.next()?);
        let mut dimension = Dimension {
            name,
            side: None,
            form: None,
            size: Spanned::new(Size::OneOf(Vec::new(), None), span),
            spread: None,
            coating: None,
            at: None,
            direction: None,
            loads: Vec::new(),
            strains: Vec::new(),
            basis: None,
            because: None,
            span,
        };
        let mut sized = false;
        for child in children {
            match child.rule() {
                Rule::side => dimension.side = Some(side(child)?),
                Rule::form => dimension.form = Some(form(child)?),
                Rule::size => {
                    let place = child.span();
                    dimension.size = Spanned::new(self.size(child)?, place);
                    sized = true;
                }
                _ => self.clause(&mut dimension, child)?,
            }
        }
        sized.then_some(dimension)
    }

    fn clause(&mut self, dimension: &mut Dimension, node: Node<'_>) -> Option<()> {
        let span = node.span();
        match node.rule() {
            Rule::spread => {
                let spread = self.spread(node)?;
                self.once(&mut dimension.spread, spread, span, "`spread`");
            }
            Rule::coating => {
                let coating = self.coating(node)?;
                self.once(&mut dimension.coating, coating, span, "the coating");
            }
            Rule::at_temperature => {
                let at = self.group(node.child(Rule::group)?)?;
                self.once(&mut dimension.at, at, span, "`at`");
            }
            Rule::direction => {
                let stated = direction(node)?;
                self.once(&mut dimension.direction, stated, span, "the direction");
            }
            Rule::load => dimension.loads.push(self.load(node)?),
            Rule::strain => dimension.strains.push(self.strain(node)?),
            Rule::basis => {
                let stated = basis(node)?;
                self.once(&mut dimension.basis, stated, span, "`basis`");
            }
            Rule::because => {
                let text = because(&node)?;
                self.once(&mut dimension.because, text, span, "`because`");
            }
            _ => {}
        }
        Some(())
    }

    fn size(&mut self, node: Node<'_>) -> Option<Size> {
        let mut children = node.children();
        let first = children.next()?;
        match first.rule() {
            Rule::geometrical => return self.geometrical(first).map(Size::Geometrical),
            Rule::one_of => return self.one_of(first),
            _ => {}
        }
        let value = self.scalar(first)?;
        let Some(rest) = children.next() else { return Some(Size::General(value)) };
        Some(match rest.rule() {
            Rule::range_end => Size::Limits(self.range(value, rest)?),
            Rule::word_exact => Size::Exact(value),
            Rule::class => Size::Class(value, spelled(&rest)),
            Rule::open_class => Size::OpenClass(value, rest.span()),
            Rule::tolerance => Size::Toleranced(value, self.tolerance(rest)?),
            _ => return None,
        })
    }

    fn one_of(&mut self, node: Node<'_>) -> Option<Size> {
        let mut members: Vec<Scalar> = Vec::new();
        let mut tolerance = None;
        for child in node.children() {
            match child.rule() {
                Rule::plain => members.push(self.scalar(child)?),
                Rule::tolerance => tolerance = Some(self.tolerance(child)?),
                _ => {}
            }
        }
        Some(Size::OneOf(members, tolerance))
    }

    fn geometrical(&mut self, node: Node<'_>) -> Option<Geometrical> {
        let kind = characteristic(&node.child(Rule::characteristic)?)?;
        let diametral = node.child(Rule::word_dia).map(|dia| dia.span());
        let zone = self.scalar(node.child(Rule::plain)?)?;
        let modifier = match node.child(Rule::modifier) {
            Some(modifier) => {
                let condition = modifier.child(Rule::material_condition)?;
                let value = match condition.text() {
                    "MMC" => MaterialCondition::Maximum,
                    _ => MaterialCondition::Least,
                };
                let feature = path(modifier.child(Rule::path)?)?;
                Some(Modifier {
                    condition: Spanned::new(value, condition.span()),
                    feature,
                    span: modifier.span(),
                })
            }
            None => None,
        };
        Some(Geometrical { kind, diametral, zone, modifier })
    }

    fn coating(&mut self, node: Node<'_>) -> Option<Coating> {
        let span = node.span();
        let mut order = None;
        let mut thickness = None;
        let mut build_up = None;
        let mut sides = None;
        for child in node.children() {
            let place = child.span();
            match child.rule() {
                Rule::word_before => order = Some(Spanned::new(CoatingOrder::Before, place)),
                Rule::word_after => order = Some(Spanned::new(CoatingOrder::After, place)),
                Rule::quantity => thickness = Some(self.quantity(child)?),
                Rule::build_up => build_up = Some(self.scalar(child.child(Rule::plain)?)?),
                Rule::coated_sides => {
                    let one = child.child(Rule::word_one).is_some();
                    sides = Some(Spanned::new(if one { Sides::One } else { Sides::Both }, place));
                }
                _ => {}
            }
        }
        Some(Coating { order: order?, thickness: thickness?, build_up, sides, span })
    }

    fn load(&mut self, node: Node<'_>) -> Option<Load> {
        let span = node.span();
        let mut quantities = Vec::new();
        let mut spread = None;
        let mut at = Vec::new();
        for child in node.children() {
            match child.rule() {
                Rule::quantity => quantities.push(self.quantity(child)?),
                Rule::spread => spread = Some(self.spread(child)?),
                Rule::at_conditions => at = names(child),
                _ => {}
            }
        }
        let mut quantities = quantities.into_iter();
        Some(Load { force: quantities.next()?, spread, area: quantities.next()?, at, span })
    }

    fn strain(&mut self, node: Node<'_>) -> Option<Strain> {
        let strain = self.quantity(node.child(Rule::quantity)?)?;
        let at = node.child(Rule::at_conditions).map(names).unwrap_or_default();
        Some(Strain { strain, at, span: node.span() })
    }
}

/// The words after `because`.
pub(super) fn because(node: &Node<'_>) -> Option<Text> {
    node.child(Rule::string).map(|text| string(&text))
}

fn side(node: Node<'_>) -> Option<Spanned<Side>> {
    let span: Span = node.span();
    let internal = node.children().next()?.rule() == Rule::word_internal;
    Some(Spanned::new(if internal { Side::Internal } else { Side::External }, span))
}

fn form(node: Node<'_>) -> Option<Spanned<Form>> {
    let span = node.span();
    let dia = node.children().next()?.rule() == Rule::word_dia;
    Some(Spanned::new(if dia { Form::Diameter } else { Form::Radius }, span))
}

fn basis(node: Node<'_>) -> Option<Spanned<Basis>> {
    let word: Node<'_> = node.children().nth(1)?;
    let basis = match word.rule() {
        Rule::word_drawing => Basis::Drawing,
        Rule::word_measured => Basis::Measured,
        Rule::word_supplier => Basis::Supplier,
        Rule::word_assumed => Basis::Assumed,
        _ => return None,
    };
    Some(Spanned::new(basis, word.span()))
}

fn characteristic(node: &Node<'_>) -> Option<Spanned<GeometricalKind>> {
    let kind = match node.text() {
        "straightness" => GeometricalKind::Straightness,
        "flatness" => GeometricalKind::Flatness,
        "roundness" => GeometricalKind::Roundness,
        "cylindricity" => GeometricalKind::Cylindricity,
        "profile" => GeometricalKind::Profile,
        "parallelism" => GeometricalKind::Parallelism,
        "perpendicularity" => GeometricalKind::Perpendicularity,
        "angularity" => GeometricalKind::Angularity,
        "position" => GeometricalKind::Position,
        "concentricity" => GeometricalKind::Concentricity,
        "symmetry" => GeometricalKind::Symmetry,
        "runout" => GeometricalKind::Runout,
        text if text.starts_with("total") => GeometricalKind::TotalRunout,
        _ => return None,
    };
    let name: Name = spelled(node);
    Some(Spanned::new(kind, name.span))
}
