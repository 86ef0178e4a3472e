//! Expansion curves: ΔL/L₀ against temperature, from any of the forms it is published in.
//!
//! Temperatures in K, coefficients in 1/K, ΔL/L₀ as a pure number. A curve is kept as it was
//! published: it need not be zero at the reference temperature, not even at its own base. Whoever
//! reads it takes the quotient `(1+e(T))/(1+e(Tref)) − 1`, which is right for any base.

use super::log_polynomial::LogPolynomial;
use super::{Scatter, Source};
use crate::numeric::piecewise::{Beyond, Exponential, Polynomial, TableError};
use crate::numeric::{Curve, Interval, Piecewise};
use crate::units::STANDARD_REFERENCE;
use std::sync::Arc;

/// How a material expands, by direction.
#[derive(Debug, Clone)]
pub enum Expansions {
    /// Alike in every direction.
    Isotropic(Expansion),
    /// One way along the fibre, the flow or the sheet, another across it.
    Directional {
        /// Along it.
        along: Expansion,
        /// Across it.
        across: Expansion,
    },
    /// A fluid: the curve is ΔV/V₀.
    Volume(Expansion),
}

impl Expansions {
    /// Every curve with its direction's name; an empty name where there is but one.
    pub fn each(&self) -> Vec<(&'static str, &Expansion)> {
        match self {
            Expansions::Isotropic(one) => vec![("", one)],
            Expansions::Directional { along, across } => vec![("along", along), ("across", across)],
            Expansions::Volume(volume) => vec![("volume", volume)],
        }
    }

    /// The temperatures that every curve covers, K.
    pub fn valid(&self) -> Interval {
        match self {
            Expansions::Isotropic(one) | Expansions::Volume(one) => one.range,
            Expansions::Directional { along, across } => {
                along.range.intersection(across.range).unwrap_or(along.range)
            }
        }
    }

    /// True where a dimension must say `along` or `across`.
    pub fn is_directional(&self) -> bool {
        matches!(self, Expansions::Directional { .. })
    }
}

/// The form the data were published in.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Form {
    /// One coefficient.
    Constant,
    /// Mean coefficients from a base, K.
    Mean {
        /// Where every mean begins.
        base: f64,
    },
    /// Coefficients at a temperature.
    Instantaneous,
    /// A table of ΔL/L₀ (or ΔV/V₀).
    Total,
    /// A polynomial for ΔL/L₀.
    Polynomial,
}

/// The length an instantaneous coefficient refers to.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Per {
    /// The length at the base: `e = ∫α dT`.
    ReferenceLength,
    /// The length at the temperature itself: `e = exp(∫α dT) − 1`.
    CurrentLength,
}

/// Expansion in one direction.
#[derive(Debug, Clone)]
pub struct Expansion {
    /// ΔL/L₀ against temperature in K, as published.
    pub curve: Arc<dyn Curve>,
    /// The form the data came in.
    pub form: Form,
    /// How far a lot may lie from the curve.
    pub scatter: Scatter,
    /// The temperatures the data cover, K.
    pub range: Interval,
    /// Where the data come from, if not from where the material's do.
    pub source: Option<Source>,
    /// Stretches of temperature (K) that come from elsewhere, as a hot end added to cryogenic data.
    pub elsewhere: Vec<(Interval, Source)>,
}

/// One polynomial of several that follow each other.
#[derive(Debug, Clone)]
pub struct Stretch {
    /// Up to which temperature it holds, K.
    pub to: f64,
    /// ΔL/L₀ against temperature in K.
    pub polynomial: Polynomial,
    /// True where it carries on from where the one before ends, whatever its own constant is.
    pub continues: bool,
}

/// Absolute temperatures: what a constant without a stated range holds over.
const EVERYWHERE: (f64, f64) = (0.0, f64::INFINITY);

impl Expansion {
    fn new(curve: impl Curve + 'static, form: Form, (lo, hi): (f64, f64)) -> Self {
        Expansion {
            curve: Arc::new(curve),
            form,
            scatter: Scatter::NONE,
            range: Interval::new(lo, hi),
            source: None,
            elsewhere: Vec::new(),
        }
    }

    /// The curve `α·(T − base)`, over every temperature.
    pub fn constant(alpha: f64, base: f64) -> Self {
        Expansion::new(Piecewise::line(base, 0.0, alpha), Form::Constant, EVERYWHERE)
    }

    /// The curve `ᾱ(T)·(T − base)` from a table of (T, ᾱ): ᾱ is straight between entries, and that
    /// of the nearest entry as far as the base and no further.
    ///
    /// # Errors
    /// When the table is empty, its temperatures do not rise, or a number is not finite.
    pub fn mean(base: f64, table: &[(f64, f64)]) -> Result<Self, TableError> {
        let curve = Piecewise::linear(table, Beyond::Hold)?.times_distance_from(base);
        let (lo, hi) = extent(table);
        Ok(Expansion::new(curve, Form::Mean { base }, (lo.min(base), hi.max(base))))
    }

    /// The integral of a table of (T, α), straight between entries.
    ///
    /// # Errors
    /// When the table is empty, its temperatures do not rise, or a number is not finite.
    pub fn instantaneous(table: &[(f64, f64)], per: Per) -> Result<Self, TableError> {
        let alpha = Piecewise::linear(table, Beyond::Hold)?;
        Ok(Expansion::integral(&alpha, per, extent(table)))
    }

    /// The integral of a polynomial for α over `lo … hi`.
    ///
    /// # Errors
    /// When the ends do not rise or a number is not finite.
    pub fn instantaneous_polynomial(
        alpha: Polynomial,
        (lo, hi): (f64, f64),
        per: Per,
    ) -> Result<Self, TableError> {
        let alpha = Piecewise::polynomial(alpha, lo, hi, Beyond::Hold)?;
        Ok(Expansion::integral(&alpha, per, (lo, hi)))
    }

    fn integral(alpha: &Piecewise, per: Per, (lo, hi): (f64, f64)) -> Self {
        // A coefficient is a share of the length at the reference temperature, so that is where the
        // strain is zero.
        let strain = alpha.integral(STANDARD_REFERENCE);
        match per {
            Per::ReferenceLength => Expansion::new(strain, Form::Instantaneous, (lo, hi)),
            Per::CurrentLength => {
                Expansion::new(Exponential::less_one(strain), Form::Instantaneous, (lo, hi))
            }
        }
    }

    /// The integral of `α = unit·10^P(log₁₀ T)` over `lo … hi`, with the coefficients of P from the
    /// lowest power; the form of copper in the cryogenic data of NIST.
    ///
    /// # Errors
    /// When the ends are not above zero and rising, or a number is not finite.
    pub fn log_polynomial(
        coefficients: &[f64],
        unit: f64,
        (lo, hi): (f64, f64),
    ) -> Result<Self, TableError> {
        let curve = LogPolynomial::new(coefficients, unit, lo, hi)?;
        Ok(Expansion::new(curve, Form::Instantaneous, (lo, hi)))
    }

    /// The monotone cubic through a table of (T, ΔL/L₀).
    ///
    /// # Errors
    /// When the table has fewer than two entries, its temperatures do not rise, or a number is not
    /// finite.
    pub fn total(table: &[(f64, f64)]) -> Result<Self, TableError> {
        let curve = Piecewise::monotone(table, Beyond::Straight)?;
        Ok(Expansion::new(curve, Form::Total, extent(table)))
    }

    /// Polynomials for ΔL/L₀, the first from `lo`, each up to its own end. Where one neither meets
    /// nor continues the one before, the curve steps.
    ///
    /// # Errors
    /// When there is none, the temperatures do not rise, or a number is not finite.
    pub fn polynomials(lo: f64, stretches: &[Stretch]) -> Result<Self, TableError> {
        let tangent = |p: &Polynomial, x: f64| Polynomial::line(x, p.at(x), p.derivative().at(x));
        let mut rest: Vec<(f64, Polynomial)> = Vec::with_capacity(stretches.len() + 1);
        let mut from = lo;
        for stretch in stretches {
            let mut polynomial = stretch.polynomial.clone();
            if let (true, Some((_, before))) = (stretch.continues, rest.last()) {
                let missing = before.at(from) - polynomial.at(from);
                polynomial = polynomial.raised_by(missing);
            }
            rest.push((from, polynomial));
            from = stretch.to;
        }
        let (Some((_, first)), Some((_, last))) = (rest.first(), rest.last()) else {
            return Err(TableError::TooFew { found: 0, needed: 1 });
        };
        let (before, after) = (tangent(first, lo), tangent(last, from));
        rest.push((from, after));
        let curve = Piecewise::joined(before, rest)?;
        Ok(Expansion::new(curve, Form::Polynomial, (lo, from)))
    }

    /// ΔV/V₀ of a fluid from a table of (T, density): `ρ₀/ρ − 1` at the entries, ρ₀ being the first,
    /// joined by the monotone cubic.
    ///
    /// # Errors
    /// When the table has fewer than two entries, its temperatures do not rise, or a number is not
    /// finite.
    pub fn of_density(table: &[(f64, f64)]) -> Result<Self, TableError> {
        let first = table.first().map_or(f64::NAN, |&(_, density)| density);
        let volumes: Vec<(f64, f64)> = table.iter().map(|&(t, d)| (t, first / d - 1.0)).collect();
        Expansion::total(&volumes)
    }

    /// The same with this scatter.
    #[must_use]
    pub fn scattering(mut self, scatter: Scatter) -> Self {
        self.scatter = scatter;
        self
    }

    /// The same, said to hold over `range`, K.
    #[must_use]
    pub fn over(mut self, range: Interval) -> Self {
        self.range = range;
        self
    }

    /// The same with this source.
    #[must_use]
    pub fn from(mut self, source: Source) -> Self {
        self.source = Some(source);
        self
    }

    /// Every source of the data within `span`, K, each once; the general one first.
    pub fn sources_within(&self, span: Interval) -> Vec<&Source> {
        let meets = |range: &Interval| {
            range.intersection(span).is_some_and(|common| common.width() > 0.0 || span.is_point())
        };
        let elsewhere = self.elsewhere.iter().filter(|(range, _)| meets(range));
        let mut sources: Vec<&Source> = self.source.iter().collect();
        for (_, source) in elsewhere {
            if !sources.contains(&source) {
                sources.push(source);
            }
        }
        sources
    }

    /// The mean coefficient from `from` to `to`, K, on the length at `from`, 1/K.
    pub fn mean_coefficient(&self, from: f64, to: f64) -> f64 {
        let (a, b) = (self.curve.value(from), self.curve.value(to));
        ((b - a) / (1.0 + a)) / (to - from)
    }
}

fn extent(table: &[(f64, f64)]) -> (f64, f64) {
    let end = |entry: Option<&(f64, f64)>| entry.map_or(f64::NAN, |&(t, _)| t);
    (end(table.first()), end(table.last()))
}
