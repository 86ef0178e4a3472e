//! `require`: a limit that must hold wherever the assembly is used.

use super::{Group, Name, Number, Range, Scalar, Text};
use crate::span::{Span, Spanned};

/// `require "R-12" clearance 0 .. 0.030 at hot because "the race must creep, not rattle"`
#[derive(Debug, Clone, PartialEq)]
pub struct Requirement {
    /// Its own id.
    pub id: Option<Text>,
    /// What is limited; none: the subject itself.
    pub measure: Option<Measure>,
    /// The limit.
    pub limit: Limit,
    /// Where it must hold; none: at every condition.
    pub conditions: Option<Conditions>,
    /// How it is judged; none: by worst case.
    pub method: Option<Spanned<Method>>,
    /// Why it is asked.
    pub because: Option<Text>,
    /// A known deviation that is accepted for a while.
    pub concession: Option<Concession>,
    /// The whole statement.
    pub span: Span,
}

/// The words between id and limit, such as `radial clearance` or `stress in screw`.
#[derive(Debug, Clone, PartialEq)]
pub struct Measure {
    /// The words; never empty.
    pub words: Vec<Name>,
    /// All of them.
    pub span: Span,
}

/// What must hold; the limits belong to the allowed side.
#[derive(Debug, Clone, PartialEq)]
pub struct Limit {
    /// The bounds.
    pub bound: Bound,
    /// The words `of yield`: the numbers are shares of it.
    pub of_yield: Option<Span>,
    /// The whole limit.
    pub span: Span,
}

/// The four ways to write a limit.
#[derive(Debug, Clone, PartialEq)]
pub enum Bound {
    /// `>= 0.04`
    AtLeast(Scalar),
    /// `<= 0.025`
    AtMost(Scalar),
    /// `0.05 .. 0.60`
    Between(Range),
    /// `3 ±0.1`; the tolerance always stands.
    Within(Group),
}

/// Where a requirement must hold.
#[derive(Debug, Clone, PartialEq)]
pub enum Conditions {
    /// `at hot, cold`
    At(Vec<Name>),
    /// `except warm_up`
    Except(Vec<Name>),
}

/// How a requirement is judged.
#[derive(Debug, Clone, PartialEq)]
pub enum Method {
    /// `by worst case`
    WorstCase,
    /// `by rss 3 sigma`
    Rss {
        /// The count of standard deviations.
        sigma: Option<Number>,
    },
    /// `by Cpk 1.33`
    Cpk(Number),
    /// `for 99.9 % of assemblies`; the unit is as written.
    Share(Scalar),
}

/// `concession "D-7" accepts 0.031 until 2027-03-31 approved "M. Rask" because "stock"`
#[derive(Debug, Clone, PartialEq)]
pub struct Concession {
    /// Its number.
    pub id: Text,
    /// The value accepted.
    pub accepts: Scalar,
    /// The last day, as written: not checked to be a date.
    pub until: Spanned<String>,
    /// Who approved it.
    pub approved: Text,
    /// Why.
    pub because: Option<Text>,
    /// The whole clause.
    pub span: Span,
}
