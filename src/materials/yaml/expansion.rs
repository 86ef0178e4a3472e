//! Expansion in each of its published forms, as it stands in a YAML file.

use super::place;
use super::property::{SourceEntry, fraction};
use super::quantity::{
    Coefficient, Density, Quantity, Share, Temperature, TemperatureRange, UnitOf, bounded, unit_of,
};
use crate::materials::{Expansion, Expansions, Per, Scatter, Source, Stretch};
use crate::numeric::piecewise::{Polynomial, TableError};
use crate::units::{Kind, STANDARD_REFERENCE, Unit};
use serde::de::{Deserialize, Deserializer};

/// The curve of one direction.
#[derive(Debug)]
struct Curve(Expansion);

impl<'de> Deserialize<'de> for Curve {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::block(deserializer, "the expansion in one direction", |block: Block| {
            if block.along.is_some() || block.across.is_some() || block.volume.is_some() {
                return Err("a direction has none of its own".to_string());
            }
            block.expansion().map(Curve)
        })
    }
}

/// The block `expansion`, or one direction of it.
#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Block {
    constant: Option<Quantity<Coefficient>>,
    mean: Option<Mean>,
    instantaneous: Option<Instantaneous>,
    log10: Option<Log10>,
    total: Option<Total>,
    polynomial: Option<Pieces>,
    density: Option<Table>,
    range: Option<TemperatureRange>,
    scatter: Option<ScatterEntry>,
    source: Option<SourceEntry>,
    #[serde(default)]
    elsewhere: Vec<ElsewhereEntry>,
    along: Option<Box<Curve>>,
    across: Option<Box<Curve>>,
    volume: Option<Box<Curve>>,
}

/// A stretch of temperature that comes from elsewhere.
#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct ElsewhereEntry {
    range: TemperatureRange,
    source: SourceEntry,
}

/// Two columns, each with its unit.
#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Table {
    unit: UnitOf<Density>,
    temperature: UnitOf<Temperature>,
    table: Vec<(f64, f64)>,
}

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Mean {
    from: Quantity<Temperature>,
    unit: UnitOf<Coefficient>,
    temperature: UnitOf<Temperature>,
    table: Vec<(f64, f64)>,
}

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Instantaneous {
    unit: UnitOf<Coefficient>,
    temperature: UnitOf<Temperature>,
    #[serde(default)]
    per: PerEntry,
    table: Option<Vec<(f64, f64)>>,
    coefficients: Option<Vec<f64>>,
}

#[derive(Debug, Default, serde::Deserialize)]
enum PerEntry {
    #[default]
    #[serde(rename = "reference length")]
    ReferenceLength,
    #[serde(rename = "current length")]
    CurrentLength,
}

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Log10 {
    unit: UnitOf<Coefficient>,
    coefficients: Vec<f64>,
}

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Total {
    unit: Factor,
    temperature: UnitOf<Temperature>,
    table: Vec<(f64, f64)>,
}

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Pieces {
    unit: Factor,
    temperature: UnitOf<Temperature>,
    pieces: Vec<Piece>,
}

#[derive(Debug, serde::Deserialize)]
#[serde(deny_unknown_fields)]
struct Piece {
    to: f64,
    /// The polynomial is one of temperature less this.
    #[serde(default)]
    about: f64,
    coefficients: Vec<f64>,
    #[serde(default)]
    continues: bool,
}

/// What a strain is stated in: `ppm`, `%`, or a factor such as 1e-5.
#[derive(Debug, Clone, Copy)]
struct Factor(f64);

impl<'de> Deserialize<'de> for Factor {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::text(deserializer, "`ppm`, `%` or a factor", |text| match text.parse::<f64>() {
            Ok(factor) if factor > 0.0 && factor.is_finite() => Ok(Factor(factor)),
            Ok(_) => Err(format!("expected a factor above zero, found {text}")),
            Err(_) => unit_of(text, Kind::PURE).map(|unit| Factor(unit.to_si(1.0))),
        })
    }
}

fn said(error: TableError) -> String {
    error.to_string()
}

fn in_si(table: &[(f64, f64)], t: &Unit, y: &Unit) -> Vec<(f64, f64)> {
    table.iter().map(|&(a, b)| (t.to_si(a), y.to_si(b))).collect()
}

/// A polynomial of a temperature in `unit`, less `about`, as one of K, its values times `factor`.
fn polynomial(coefficients: &[f64], unit: &Unit, about: f64, factor: f64) -> Polynomial {
    let per_kelvin = unit.difference_from_si(1.0);
    let mut scale = factor;
    let mut converted = Vec::with_capacity(coefficients.len());
    for c in coefficients {
        converted.push(c * scale);
        scale *= per_kelvin;
    }
    Polynomial::new(unit.to_si(about), converted)
}

/// One of the forms in which expansion is published.
#[derive(Debug)]
enum Form {
    Constant(Quantity<Coefficient>),
    Mean(Mean),
    Instantaneous(Instantaneous),
    Log10(Log10),
    Total(Total),
    Polynomial(Pieces),
    Density(Table),
}

impl Form {
    fn expansion(self, range: Option<(f64, f64)>) -> Result<Expansion, String> {
        let needed = || range.ok_or_else(|| "this form of expansion needs a `range`".to_string());
        match self {
            Form::Constant(alpha) => Ok(Expansion::constant(alpha.si, STANDARD_REFERENCE)),
            Form::Mean(Mean { from, unit, temperature, table }) => {
                let entries = in_si(&table, temperature.unit, unit.unit);
                Expansion::mean(from.si, &entries).map_err(said)
            }
            Form::Instantaneous(form) => form.expansion(needed),
            Form::Log10(Log10 { unit, coefficients }) => {
                let unit = unit.unit.to_si(1.0);
                Expansion::log_polynomial(&coefficients, unit, needed()?).map_err(said)
            }
            Form::Total(Total { unit, temperature, table }) => {
                let entries = table.iter().map(|&(t, e)| (temperature.unit.to_si(t), e * unit.0));
                Expansion::total(&entries.collect::<Vec<_>>()).map_err(said)
            }
            Form::Polynomial(Pieces { unit, temperature, pieces }) => {
                let stretch = |p: &Piece| Stretch {
                    to: temperature.unit.to_si(p.to),
                    polynomial: polynomial(&p.coefficients, temperature.unit, p.about, unit.0),
                    continues: p.continues,
                };
                let stretches: Vec<Stretch> = pieces.iter().map(stretch).collect();
                Expansion::polynomials(needed()?.0, &stretches).map_err(said)
            }
            Form::Density(Table { unit, temperature, table }) => {
                let entries = in_si(&table, temperature.unit, unit.unit);
                for &(_, density) in &entries {
                    bounded::<Density>(density)?;
                }
                Expansion::of_density(&entries).map_err(said)
            }
        }
    }
}

impl Instantaneous {
    fn expansion(
        self,
        range: impl Fn() -> Result<(f64, f64), String>,
    ) -> Result<Expansion, String> {
        let (unit, temperature) = (self.unit.unit, self.temperature.unit);
        let per = match self.per {
            PerEntry::ReferenceLength => Per::ReferenceLength,
            PerEntry::CurrentLength => Per::CurrentLength,
        };
        match (self.table, self.coefficients) {
            (Some(table), None) => {
                let entries = in_si(&table, temperature, unit);
                Expansion::instantaneous(&entries, per).map_err(said)
            }
            (None, Some(coefficients)) => {
                let alpha = polynomial(&coefficients, temperature, 0.0, unit.to_si(1.0));
                Expansion::instantaneous_polynomial(alpha, range()?, per).map_err(said)
            }
            _ => Err("expected either `table` or `coefficients`".to_string()),
        }
    }
}

impl Block {
    /// True where a form of expansion stands in the block itself.
    fn has_curve(&self) -> bool {
        self.constant.is_some()
            || self.mean.is_some()
            || self.instantaneous.is_some()
            || self.log10.is_some()
            || self.total.is_some()
            || self.polynomial.is_some()
            || self.density.is_some()
    }

    fn expansions(mut self) -> Result<Expansions, String> {
        let directions = (self.along.take(), self.across.take(), self.volume.take());
        match directions {
            (None, None, None) => self.expansion().map(Expansions::Isotropic),
            _ if self.has_curve() => {
                Err("a curve stands either alone or under its direction".to_string())
            }
            (Some(along), Some(across), None) => {
                Ok(Expansions::Directional { along: along.0, across: across.0 })
            }
            (None, None, Some(volume)) => Ok(Expansions::Volume(volume.0)),
            (Some(_), None, None) => Err("`along` needs `across` beside it".to_string()),
            (None, Some(_), None) => Err("`across` needs `along` beside it".to_string()),
            _ => Err("`volume` stands alone".to_string()),
        }
    }

    /// The curve of one direction.
    fn expansion(self) -> Result<Expansion, String> {
        let forms = [
            self.constant.map(|form| ("constant", Form::Constant(form))),
            self.mean.map(|form| ("mean", Form::Mean(form))),
            self.instantaneous.map(|form| ("instantaneous", Form::Instantaneous(form))),
            self.log10.map(|form| ("log10", Form::Log10(form))),
            self.total.map(|form| ("total", Form::Total(form))),
            self.polynomial.map(|form| ("polynomial", Form::Polynomial(form))),
            self.density.map(|form| ("density", Form::Density(form))),
        ];
        let mut forms = forms.into_iter().flatten();
        let (name, form) = forms.next().ok_or(NO_FORM)?;
        if let Some((second, _)) = forms.next() {
            return Err(format!("expected one form of expansion, found `{name}` and `{second}`"));
        }
        let range = self.range.map(|range| range.0);
        let mut expansion = form.expansion(range.map(|range| (range.lo(), range.hi())))?;
        if let Some(range) = range {
            let data = expansion.range;
            if range.lo() < data.lo() - SAME || range.hi() > data.hi() + SAME {
                let (lo, hi) = (data.lo(), data.hi());
                return Err(format!(
                    "the range reaches beyond the data, which cover {lo:.2} .. {hi:.2} K"
                ));
            }
            expansion.range = range;
        }
        expansion.scatter = self.scatter.map_or(Scatter::NONE, |scatter| scatter.0);
        expansion.source = self.source.map(Source::from);
        let elsewhere = self.elsewhere.into_iter();
        expansion.elsewhere =
            elsewhere.map(|part| (part.range.0, Source::from(part.source))).collect();
        Ok(expansion)
    }
}

/// What is said where no form of expansion stands.
const NO_FORM: &str = "expected one of `constant`, `mean`, `instantaneous`, `log10`, `total`, \
                       `polynomial`, `density`";

/// Temperatures this close, K, are one: a range may be in another unit than its table.
const SAME: f64 = 1e-9;

#[derive(Debug)]
struct ScatterEntry(Scatter);

impl<'de> Deserialize<'de> for ScatterEntry {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::text(deserializer, "a scatter", |text| scatter(text).map(ScatterEntry))
    }
}

/// A scatter as `2 %` or `0.3 ppm/K`.
fn scatter(text: &str) -> Result<Scatter, String> {
    match Quantity::<Share>::parse(text) {
        Ok(share) => fraction(share).map(Scatter::Relative),
        Err(_) => {
            let per_kelvin = Quantity::<Coefficient>::parse(text).map_err(|_| {
                format!("expected a scatter as `2 %` or `0.3 ppm/K`, found `{text}`")
            })?;
            if per_kelvin.si < 0.0 {
                return Err("a scatter is not negative".to_string());
            }
            Ok(Scatter::PerKelvin(per_kelvin.si))
        }
    }
}

/// How a material expands, by direction.
#[derive(Debug)]
pub(super) struct ExpansionsEntry(pub(super) Expansions);

impl<'de> Deserialize<'de> for ExpansionsEntry {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        place::block(deserializer, "how the material expands", |block: Block| {
            block.expansions().map(ExpansionsEntry)
        })
    }
}
