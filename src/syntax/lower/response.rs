//! Fits, gaps, results, restraints, fills, and named intermediates.

use super::{Lower, path, spelled};
use crate::span::Spanned;
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Cavity, CavityVolume, Charge, ChargeState, Expr, Fill, Fit, Gap, Joint, JointLine, Let, Member,
    Name, Operand, Outcome, Preload, Restraint, RingSide, Role, Spread, Surface, Wall,
};

impl Lower {
    /// A name and the expressions after it.
    fn named(&mut self, node: Node<'_>) -> Option<(Name, Vec<Expr>)> {
        let name = spelled(&node.child(Rule::name)?);
        let mut expressions = Vec::new();
        for child in node.children().filter(|child| child.rule() == Rule::expr) {
            expressions.push(self.expr(child)?);
        }
        Some((name, expressions))
    }

    pub(in crate::syntax) fn let_line(&mut self, node: Node<'_>) -> Option<Let> {
        let span = node.span();
        let (name, expressions) = self.named(node)?;
        Some(Let { name, expr: expressions.into_iter().next()?, span })
    }

    pub(in crate::syntax) fn gap(&mut self, node: Node<'_>) -> Option<Gap> {
        let span = node.span();
        let (name, expressions) = self.named(node)?;
        Some(Gap { name, expr: expressions.into_iter().next()?, requirements: Vec::new(), span })
    }

    pub(in crate::syntax) fn outcome(&mut self, node: Node<'_>) -> Option<Outcome> {
        let span = node.span();
        let (name, expressions) = self.named(node)?;
        Some(Outcome {
            name,
            expr: expressions.into_iter().next()?,
            requirements: Vec::new(),
            span,
        })
    }

    pub(in crate::syntax) fn fit(&mut self, node: Node<'_>) -> Option<Fit> {
        let span = node.span();
        let (name, expressions) = self.named(node)?;
        let mut sides = expressions.into_iter();
        let (external, internal) = (sides.next()?, sides.next()?);
        Some(Fit { name, external, internal, joint: None, requirements: Vec::new(), span })
    }

    /// The header alone; its lines stand in a block.
    pub(in crate::syntax) fn joint(&mut self, node: Node<'_>) -> Option<Joint> {
        Some(Joint { lines: Vec::new(), span: node.span() })
    }

    pub(in crate::syntax) fn joint_line(&mut self, node: Node<'_>) -> Option<JointLine> {
        let span = node.span();
        Some(match node.rule() {
            Rule::length_line => {
                JointLine::Length { length: self.operand(node.child(Rule::operand)?)?, span }
            }
            Rule::insertion_line => JointLine::InsertionClearance {
                clearance: self.operand(node.child(Rule::operand)?)?,
                span,
            },
            Rule::friction_line => JointLine::Friction {
                friction: self.quantity(node.child(Rule::quantity)?)?,
                spread: self.spread_of(&node)?,
                span,
            },
            Rule::ring_line => {
                let part = spelled(&node.child(Rule::name)?);
                let word = node.children().next()?;
                let side =
                    if word.rule() == Rule::word_inner { RingSide::Inner } else { RingSide::Outer };
                JointLine::Ring { side: Spanned::new(side, word.span()), part, span }
            }
            _ => {
                let mut children = node.children();
                let part = spelled(&children.next()?);
                let what = children.next()?;
                match what.rule() {
                    Rule::word_solid => JointLine::Solid { part, span },
                    Rule::roughness => JointLine::Roughness {
                        part,
                        rz: self.group(what.child(Rule::group)?)?,
                        span,
                    },
                    rule => {
                        let surface =
                            if rule == Rule::word_bore { Surface::Bore } else { Surface::Outside };
                        let surface = Spanned::new(surface, what.span());
                        JointLine::Surface {
                            part,
                            surface,
                            size: self.operand(children.next()?)?,
                            span,
                        }
                    }
                }
            }
        })
    }

    fn operand(&mut self, node: Node<'_>) -> Option<Operand> {
        let what = node.children().next()?;
        Some(match what.rule() {
            Rule::quantity => Operand::Quantity(self.quantity(what)?),
            _ => Operand::Dimension(path(what)?),
        })
    }

    /// The spread among a node's children; the outer nothing is a failure.
    fn spread_of(&mut self, node: &Node<'_>) -> Option<Option<Spread>> {
        match node.child(Rule::spread) {
            Some(spread) => self.spread(spread).map(Some),
            None => Some(None),
        }
    }

    /// The header alone; its lines stand in a block.
    pub(in crate::syntax) fn restraint(&mut self, node: Node<'_>) -> Option<Restraint> {
        let name = spelled(&node.child(Rule::name)?);
        let (members, requirements) = (Vec::new(), Vec::new());
        Some(Restraint {
            name,
            members,
            preload: None,
            start_gap: None,
            requirements,
            span: node.span(),
        })
    }

    pub(in crate::syntax) fn member(&mut self, node: Node<'_>) -> Option<Member> {
        let span = node.span();
        let mut role = None;
        let mut term = None;
        let mut area = None;
        let mut stiffness = None;
        for child in node.children() {
            let place = child.span();
            match child.rule() {
                Rule::word_squeezed => role = Some(Spanned::new(Role::Squeezed, place)),
                Rule::word_stretched => role = Some(Spanned::new(Role::Stretched, place)),
                Rule::term => term = Some(self.term(child)?),
                Rule::area => {
                    let stated = self.quantity(child.child(Rule::quantity)?)?;
                    self.once(&mut area, stated, place, "`area`");
                }
                Rule::stiffness => {
                    let stated = self.quantity(child.child(Rule::quantity)?)?;
                    self.once(&mut stiffness, stated, place, "`stiffness`");
                }
                _ => {}
            }
        }
        Some(Member { role: role?, term: term?, area, stiffness, span })
    }

    pub(in crate::syntax) fn preload(&mut self, node: Node<'_>) -> Option<Preload> {
        let force = self.quantity(node.child(Rule::quantity)?)?;
        let spread = self.spread_of(&node)?;
        Some(Preload { force, spread, at: spelled(&node.child(Rule::name)?), span: node.span() })
    }

    /// The gap that must close first.
    pub(in crate::syntax) fn start(&mut self, node: Node<'_>) -> Option<Name> {
        node.child(Rule::name).map(|name| spelled(&name))
    }

    /// The header alone; its lines stand in a block.
    pub(in crate::syntax) fn fill(&mut self, node: Node<'_>) -> Option<Fill> {
        let name = spelled(&node.child(Rule::name)?);
        Some(Fill {
            name,
            cavity: None,
            wall: None,
            charge: None,
            requirements: Vec::new(),
            span: node.span(),
        })
    }

    pub(in crate::syntax) fn cavity(&mut self, node: Node<'_>) -> Option<Cavity> {
        let part = spelled(&node.child(Rule::name)?);
        let volume = match node.child(Rule::expr) {
            Some(expr) => CavityVolume::Computed(self.expr(expr)?),
            None => CavityVolume::Stated(self.quantity(node.child(Rule::quantity)?)?),
        };
        Some(Cavity { part, volume, span: node.span() })
    }

    pub(in crate::syntax) fn wall(&mut self, node: Node<'_>) -> Option<Wall> {
        let span = node.span();
        let mut paths = node.children().filter(|child| child.rule() == Rule::path);
        let (bore, outside) = (path(paths.next()?)?, path(paths.next()?)?);
        Some(Wall { bore, outside, span })
    }

    pub(in crate::syntax) fn charge(&mut self, node: Node<'_>) -> Option<Charge> {
        let material = spelled(&node.child(Rule::name)?);
        let volume = self.quantity(node.child(Rule::quantity)?)?;
        let spread = self.spread_of(&node)?;
        let at = match node.child(Rule::charge_state) {
            Some(state) => Some(match state.child(Rule::name) {
                Some(name) => ChargeState::Condition(spelled(&name)),
                None => ChargeState::Temperature(self.scalar(state.child(Rule::scalar)?)?),
            }),
            None => None,
        };
        Some(Charge { material, volume, spread, at, span: node.span() })
    }
}
