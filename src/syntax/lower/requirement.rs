//! Requirements.

use super::part::because;
use super::{Lower, names, spelled, string};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::Spanned;
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Bound, Concession, Conditions, Limit, Measure, Method, Quantity, Requirement,
};

impl Lower {
    pub(in crate::syntax) fn requirement(&mut self, node: Node<'_>) -> Option<Requirement> {
        let span = node.span();
        let mut id = None;
        let mut measure = None;
        let mut limit = None;
        let mut conditions = None;
        let mut method = None;
        let mut reason = None;
        let mut concession = None;
        for child in node.children() {
            let place = child.span();
            match child.rule() {
                Rule::string => id = Some(string(&child)),
                Rule::measure => {
                    measure = Some(Measure {
                        words: child.children().map(|word| spelled(&word)).collect(),
                        span: place,
                    })
                }
                Rule::limit => limit = Some(self.limit(child)?),
                Rule::at_conditions => {
                    self.once(
                        &mut conditions,
                        Conditions::At(names(child)),
                        place,
                        "`at` or `except`",
                    );
                }
                Rule::except => {
                    self.once(
                        &mut conditions,
                        Conditions::Except(names(child)),
                        place,
                        "`at` or `except`",
                    );
                }
                Rule::method | Rule::share => {
                    let stated = Spanned::new(self.method(child)?, place);
                    self.once(&mut method, stated, place, "the method");
                }
                Rule::because => {
                    let text = because(&child)?;
                    self.once(&mut reason, text, place, "`because`");
                }
                Rule::concession => {
                    let stated = self.concession(child)?;
                    self.once(&mut concession, stated, place, "the concession");
                }
                _ => {}
            }
        }
        Some(Requirement {
            id,
            measure,
            limit: limit?,
            conditions,
            method,
            because: reason,
            concession,
            span,
        })
    }

    fn limit(&mut self, node: Node<'_>) -> Option<Limit> {
        let span = node.span();
        let mut at_least = None;
        let mut bound = None;
        let mut of_yield = None;
        for child in node.children() {
            match child.rule() {
                Rule::comparison => at_least = Some(matches!(child.text(), ">=" | "\u{2265}")),
                Rule::scalar => {
                    let scalar = self.scalar(child)?;
                    bound = Some(if at_least? {
                        Bound::AtLeast(scalar)
                    } else {
                        Bound::AtMost(scalar)
                    });
                }
                Rule::quantity => {
                    match self.quantity(child)? {
                        Quantity::Range(range) => bound = Some(Bound::Between(range)),
                        Quantity::Group(group) if group.tolerance.is_some() => {
                            bound = Some(Bound::Within(group))
                        }
                        Quantity::Group(group) => {
                            let value = group.value.number.text;
                            self.report(
                            Diagnostic::new(Code::SyntaxError, span, "expected a limit, found a lone number").help(
                                format!("write `>= {value}`, `<= {value}`, `{value} .. …` or `{value} ±…`"),
                            ),
                        );
                            return None;
                        }
                    }
                }
                Rule::of_yield => of_yield = Some(child.span()),
                _ => {}
            }
        }
        Some(Limit { bound: bound?, of_yield, span })
    }

    fn method(&mut self, node: Node<'_>) -> Option<Method> {
        if node.rule() == Rule::share {
            return Some(Method::Share(self.scalar(node.child(Rule::plain)?)?));
        }
        let kind = node.children().nth(1)?;
        let number = kind.child(Rule::number).map(|number| self.number(&number));
        match kind.rule() {
            Rule::worst_case => Some(Method::WorstCase),
            Rule::rss => Some(Method::Rss { sigma: number }),
            Rule::capability => Some(Method::Cpk(number?)),
            _ => None,
        }
    }

    fn concession(&mut self, node: Node<'_>) -> Option<Concession> {
        let span = node.span();
        let mut strings = Vec::new();
        let mut accepts = None;
        let mut until = None;
        let mut reason = None;
        for child in node.children() {
            match child.rule() {
                Rule::string => strings.push(string(&child)),
                Rule::scalar => accepts = Some(self.scalar(child)?),
                Rule::date => until = Some(spelled(&child)),
                Rule::because => reason = Some(because(&child)?),
                _ => {}
            }
        }
        let mut strings = strings.into_iter();
        let (id, approved) = (strings.next()?, strings.next()?);
        Some(Concession { id, accepts: accepts?, until: until?, approved, because: reason, span })
    }
}
