//! Moment functions: the factors `M(s) = E e^{sX}` of which a sum's is the product.
//!
//! Every function is taken from the *edge*: with `e` the greatest value of a bounded factor (zero
//! for the normal) it works with `M(s)·e^{−se}`, which never overflows and loses no digits near
//! the end of the support.

use super::{Cut, Distribution, Shape};
use crate::numeric::complex::Complex;

/// One independent factor about its own mean, its coefficient multiplied in.
#[derive(Debug, Clone, PartialEq)]
pub enum Factor {
    /// `M = e^{σ²s²/2}`.
    Normal {
        /// The variance `σ²`.
        variance: f64,
    },
    /// `M = (sinh(bs)/(bs))^power`: as many rectangles as the power says.
    Rectangles {
        /// The half-width `b` of one.
        half: f64,
        /// How many alike.
        power: u32,
    },
    /// The normal cut at two limits.
    Cut(Cut),
    /// Single values of equal weight, ascending.
    Atoms(Vec<f64>),
}

/// The log moment function at a real point, from the edge: `K(c) − ce`, `K′(c) − e`, `K″(c)`.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Growth {
    /// `K(c) − ce`.
    pub value: f64,
    /// `K′(c) − e`.
    pub slope: f64,
    /// `K″(c)`.
    pub curvature: f64,
}

impl Growth {
    /// The growth of a constant.
    pub const ZERO: Growth = Growth { value: 0.0, slope: 0.0, curvature: 0.0 };
}

impl std::ops::Add for Growth {
    type Output = Growth;
    fn add(self, other: Growth) -> Growth {
        Growth {
            value: self.value + other.value,
            slope: self.slope + other.slope,
            curvature: self.curvature + other.curvature,
        }
    }
}

impl Factor {
    /// The greatest value; zero for the normal, which has none.
    pub fn edge(&self) -> f64 {
        match self {
            Factor::Normal { .. } => 0.0,
            Factor::Rectangles { half, power } => half * f64::from(*power),
            Factor::Cut(cut) => cut.support().1,
            Factor::Atoms(values) => values.last().copied().unwrap_or(0.0),
        }
    }

    /// The log moment function and its derivatives at real `c > 0`.
    pub fn growth(&self, c: f64) -> Growth {
        match self {
            Factor::Normal { variance } => {
                Growth { value: 0.5 * variance * c * c, slope: variance * c, curvature: *variance }
            }
            Factor::Rectangles { half, power } => rectangle_growth(*half, f64::from(*power), c),
            Factor::Cut(cut) => cut.growth(c),
            Factor::Atoms(values) => atoms_growth(values, c),
        }
    }

    /// `M(s)·e^{−se}` for `Re s > 0`.
    pub fn moment_from_edge(&self, s: Complex) -> Complex {
        match self {
            Factor::Normal { variance } => (s * s * (0.5 * variance)).exp(),
            Factor::Rectangles { half, power } => {
                let twice = s * (2.0 * half);
                // Past this the second exponential is under the last digit of the first.
                let rise = if twice.re > 40.0 { Complex::ONE } else { -(-twice).exp_m1() };
                (rise / twice).power(*power)
            }
            Factor::Cut(cut) => cut.moment_from_edge(s),
            Factor::Atoms(values) => {
                let edge = self.edge();
                let sum = values
                    .iter()
                    .fold(Complex::new(0.0, 0.0), |sum, x| sum + (s * (x - edge)).exp());
                sum * (1.0 / values.len() as f64)
            }
        }
    }

    /// A bound `B` of `|M(c+it)|/M(c)` and a power `q` such that the quotient is at most
    /// `B·(t/t′)^q` at every `t′ ≥ t`; the normal, which falls faster, is left to the caller.
    pub fn decay(&self, c: f64, t: f64) -> (f64, u32) {
        match self {
            Factor::Normal { .. } | Factor::Atoms(_) => (1.0, 0),
            Factor::Rectangles { half, power } => {
                // |sinh bs| ≤ cosh bc, so the quotient is at most c·coth(bc)/t.
                let bound = c / (libm::tanh(half * c) * t);
                if bound < 1.0 {
                    ((0..*power).fold(1.0, |product, _| product * bound), *power)
                } else {
                    (1.0, 0)
                }
            }
            // The bound's bell falls faster than 1/t only past one standard deviation.
            Factor::Cut(cut) if cut.sigma() * t < 1.0 => (1.0, 0),
            Factor::Cut(cut) => match cut.decay(c, t) {
                bound if bound < 1.0 => (bound, 1),
                _ => (1.0, 0),
            },
        }
    }
}

/// `log(sinh(bc)/(bc)) − bc` with derivatives, times `power`.
fn rectangle_growth(b: f64, power: f64, c: f64) -> Growth {
    let u = b * c;
    let (slope, curvature) = if u < 0.3 {
        let u2 = u * u;
        // Langevin's function coth u − 1/u and its slope, by their series.
        (
            u * (1.0 / 3.0 - u2 * (1.0 / 45.0 - u2 * (2.0 / 945.0 - u2 / 4725.0))) - 1.0,
            1.0 / 3.0 - u2 * (1.0 / 15.0 - u2 * (2.0 / 189.0 - u2 / 675.0)),
        )
    } else {
        let sinh = libm::sinh(u.min(300.0));
        (2.0 / libm::expm1(2.0 * u.min(300.0)) - 1.0 / u, 1.0 / (u * u) - 1.0 / (sinh * sinh))
    };
    let value = if u > 0.0 { libm::log(-libm::expm1(-2.0 * u) / (2.0 * u)) } else { 0.0 };
    Growth { value: power * value, slope: power * b * slope, curvature: power * b * b * curvature }
}

fn atoms_growth(values: &[f64], c: f64) -> Growth {
    let edge = values.last().copied().unwrap_or(0.0);
    let (mut sum, mut first, mut second) = (0.0, 0.0, 0.0);
    for x in values {
        let from_edge = x - edge;
        let weight = libm::exp(c * from_edge);
        sum += weight;
        first += weight * from_edge;
        second += weight * from_edge * from_edge;
    }
    let slope = first / sum;
    Growth {
        value: libm::log(sum / values.len() as f64),
        slope,
        curvature: second / sum - slope * slope,
    }
}

impl Distribution {
    /// The factors of `coefficient` times this, about its mean; `None` where there is no moment
    /// function (Student's t) or none in closed form (curvilinear trapezoid, arcsine).
    pub fn factors(&self, coefficient: f64) -> Option<Vec<Factor>> {
        let a = coefficient.abs();
        let rectangles = |half: f64, power: u32| Factor::Rectangles { half: a * half, power };
        let factors = match &self.shape {
            Shape::Point => vec![],
            Shape::Normal { sigma } => vec![Factor::Normal { variance: a * a * sigma * sigma }],
            Shape::Sorted(cut) => {
                let cut = if coefficient < 0.0 { cut.mirrored() } else { *cut };
                vec![Factor::Cut(cut.scaled(a))]
            }
            Shape::Uniform { half } => vec![rectangles(*half, 1)],
            Shape::Triangular { half } => vec![rectangles(0.5 * half, 2)],
            Shape::Trapezoid { base, top } => {
                vec![rectangles(0.5 * (base + top), 1), rectangles(0.5 * (base - top), 1)]
            }
            Shape::Measured(list) => {
                let mut values: Vec<f64> =
                    list.deviations().iter().map(|d| coefficient * d).collect();
                values.sort_by(f64::total_cmp);
                let mut factors = vec![];
                if values.first() != values.last() {
                    factors.push(Factor::Atoms(values));
                }
                if list.half_resolution() > 0.0 {
                    factors.push(rectangles(list.half_resolution(), 1));
                }
                factors
            }
            Shape::Curvilinear { .. } | Shape::Arcsine { .. } | Shape::Student { .. } => {
                return None;
            }
        };
        Some(if a == 0.0 { vec![] } else { factors })
    }

    /// The log moment function `K(s) = log E e^{s(X − mean)}`, to a multiple of 2πi; `None` as for
    /// [`factors`](Self::factors).
    pub fn log_moment(&self, s: Complex) -> Option<Complex> {
        // Written for Re s ≥ 0; the mirrored distribution serves the other side.
        let (s, sign) = if s.re < 0.0 { (-s, -1.0) } else { (s, 1.0) };
        let mut sum = Complex::new(0.0, 0.0);
        for factor in self.factors(sign)? {
            sum = sum
                + match factor {
                    Factor::Normal { variance } => s * s * (0.5 * variance),
                    _ if s == Complex::new(0.0, 0.0) => s,
                    _ => factor.moment_from_edge(s).ln() + s * factor.edge(),
                };
        }
        Some(sum)
    }
}
