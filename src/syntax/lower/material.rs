//! Materials and their properties.

use super::{Lower, spelled, string};
use crate::span::Spanned;
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Direction, Material, Property, PropertyKind, PropertyValue, Range, Row, RowKey, Table,
    TableForm, Text,
};

impl Lower {
    /// The header alone; its properties stand in a block.
    pub(in crate::syntax) fn material(&mut self, node: Node<'_>) -> Option<Material> {
        let span = node.span();
        let mut names = super::names(node).into_iter();
        Some(Material {
            name: names.next()?,
            like: names.next(),
            properties: Vec::new(),
            over: None,
            sources: Vec::new(),
            extrapolate: None,
            span,
        })
    }

    pub(in crate::syntax) fn constant_property(&mut self, node: Node<'_>) -> Option<Property> {
        let span = node.span();
        let mut kind = None;
        let mut direction = None;
        let mut value = None;
        let mut over = None;
        let mut spread = None;
        for child in node.children() {
            let place = child.span();
            match child.rule() {
                Rule::property => kind = Some(property_kind(&child)?),
                Rule::direction => direction = Some(self::direction(child)?),
                Rule::quantity => value = Some(PropertyValue::Constant(self.quantity(child)?)),
                Rule::over => {
                    let range = self.over(child)?;
                    self.once(&mut over, range, place, "`over`");
                }
                Rule::spread => {
                    let stated = self.spread(child)?;
                    self.once(&mut spread, stated, place, "`spread`");
                }
                _ => {}
            }
        }
        Some(Property { kind: kind?, direction, value: value?, over, spread, span })
    }

    /// A table's header; its rows stand in a block.
    pub(in crate::syntax) fn table_property(&mut self, node: Node<'_>) -> Option<Property> {
        let span = node.span();
        let mut kind = None;
        let mut direction = None;
        let mut over = None;
        let mut table =
            Table { form: TableForm::Plain, tolerance: None, unit: None, rows: Vec::new() };
        for child in node.children() {
            let place = child.span();
            match child.rule() {
                Rule::property => kind = Some(property_kind(&child)?),
                Rule::direction => direction = Some(self::direction(child)?),
                Rule::mean_from => {
                    table.form = TableForm::MeanFrom(self.scalar(child.child(Rule::scalar)?)?)
                }
                Rule::word_instantaneous => table.form = TableForm::Instantaneous(place),
                Rule::table_unit => {
                    let unit = spelled(&child.child(Rule::unit)?);
                    self.once(&mut table.unit, unit, place, "the unit");
                }
                Rule::tolerance => {
                    let tolerance = self.tolerance(child)?;
                    self.once(&mut table.tolerance, tolerance, place, "the tolerance");
                }
                Rule::over => {
                    let range = self.over(child)?;
                    self.once(&mut over, range, place, "`over`");
                }
                _ => {}
            }
        }
        Some(Property {
            kind: kind?,
            direction,
            value: PropertyValue::Table(table),
            over,
            spread: None,
            span,
        })
    }

    pub(in crate::syntax) fn row(&mut self, node: Node<'_>) -> Option<Row> {
        let span = node.span();
        let mut children = node.children();
        let key = children.next()?;
        let key = match key.rule() {
            Rule::name => RowKey::State(spelled(&key)),
            _ => RowKey::Temperature(self.scalar(key)?),
        };
        Some(Row { key, value: self.group(children.next()?)?, span })
    }

    fn over(&mut self, node: Node<'_>) -> Option<Range> {
        let low = self.scalar(node.child(Rule::scalar)?)?;
        self.range(low, node.child(Rule::range_end)?)
    }

    pub(in crate::syntax) fn over_line(&mut self, node: Node<'_>) -> Option<Range> {
        self.over(node.child(Rule::over)?)
    }

    pub(in crate::syntax) fn source(&mut self, node: Node<'_>) -> Option<Text> {
        Some(string(&node.child(Rule::string)?))
    }

    pub(in crate::syntax) fn extrapolate(&mut self, node: Node<'_>) -> Option<crate::span::Span> {
        Some(node.span())
    }
}

/// `along` or `across`.
pub(super) fn direction(node: Node<'_>) -> Option<Spanned<Direction>> {
    let span = node.span();
    let direction = match node.children().next()?.rule() {
        Rule::word_along => Direction::Along,
        Rule::word_across => Direction::Across,
        _ => return None,
    };
    Some(Spanned::new(direction, span))
}

fn property_kind(node: &Node<'_>) -> Option<Spanned<PropertyKind>> {
    let kind = match node.text() {
        "cte" => PropertyKind::Cte,
        "expansion" => PropertyKind::Expansion,
        "modulus" => PropertyKind::Modulus,
        "poisson" => PropertyKind::Poisson,
        "yield" => PropertyKind::Yield,
        "density" => PropertyKind::Density,
        "limit" => PropertyKind::Limit,
        "swell" => PropertyKind::Swell,
        text if text.starts_with("bulk") => PropertyKind::BulkModulus,
        _ => return None,
    };
    Some(Spanned::new(kind, node.span()))
}
