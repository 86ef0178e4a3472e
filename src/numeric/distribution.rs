//! Distributions of a single unknown: moments, distribution function, quantile, moment function,
//! draws.
//!
//! Knows nothing of what the unknown stands for. A distribution has a mean and a [`Shape`] about
//! that mean; every number is in the caller's one unit. Shapes are checked when they are made, so
//! that no later function can fail on them.

mod cumulative;
mod cut;
mod factor;
mod measured;
mod moments;
mod sample;
mod student;

pub use cut::Cut;
pub use factor::{Factor, Growth};
pub use measured::Measured;

/// A distribution: its mean and its shape about the mean.
#[derive(Debug, Clone, PartialEq)]
pub struct Distribution {
    mean: f64,
    shape: Shape,
}

/// A shape about its own mean. Half-widths are distances from the centre, not total widths.
#[derive(Debug, Clone, PartialEq)]
pub enum Shape {
    /// A single value without spread.
    Point,
    /// Normal, not cut. Source of the name and all its facts: any text, e.g. ISO 3534-1.
    Normal {
        /// The standard deviation.
        sigma: f64,
    },
    /// Normal, cut at two limits: what is left after sorting.
    Sorted(Cut),
    /// Rectangular (JCGM 100:2008, 4.3.7).
    Uniform {
        /// Half the width.
        half: f64,
    },
    /// Triangular with the peak in the middle (JCGM 100:2008, 4.3.9).
    Triangular {
        /// Half the width of the base.
        half: f64,
    },
    /// Trapezoidal and symmetric: the sum of two rectangular ones (JCGM 100:2008, 4.3.9).
    Trapezoid {
        /// Half the width of the base.
        base: f64,
        /// Half the width of the flat top, less than the base's.
        top: f64,
    },
    /// Curvilinear trapezoid: rectangular, its half-width itself rectangular within ± `slack`
    /// (JCGM 101:2008, 6.4.3).
    Curvilinear {
        /// The middle half-width.
        half: f64,
        /// How far the half-width may be off, less than `half`.
        slack: f64,
    },
    /// Arcsine, U-shaped: a sinusoidal cycle seen at a random time (JCGM 101:2008, 6.4.6).
    Arcsine {
        /// The amplitude.
        half: f64,
    },
    /// Student's t, scaled (JCGM 101:2008, 6.4.9).
    Student {
        /// The scale: the standard uncertainty as stated, less than the standard deviation.
        scale: f64,
        /// The degrees of freedom.
        degrees: f64,
    },
    /// A list of measured values, each widened by the gauge's resolution.
    Measured(Measured),
}

/// Why a distribution cannot be made.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Unsound {
    /// A number is infinite or not a number.
    NotFinite,
    /// A width, scale or number of degrees of freedom is not above zero.
    NotPositive,
    /// Limits, or widths that must lie within each other, are in the wrong order.
    WrongOrder,
    /// Sorting would keep less than a strip of a hundredth of a standard deviation, or less than
    /// one piece in 1e12: nothing a normal process would be sorted for.
    NothingLeft,
    /// A list of measured values is empty.
    NoValues,
}

/// The number itself, if finite and above zero.
fn positive(value: f64) -> Result<f64, Unsound> {
    match value {
        v if !v.is_finite() => Err(Unsound::NotFinite),
        v if v > 0.0 => Ok(v),
        _ => Err(Unsound::NotPositive),
    }
}

impl Distribution {
    fn with_mean(mean: f64, shape: Shape) -> Result<Self, Unsound> {
        if mean.is_finite() { Ok(Distribution { mean, shape }) } else { Err(Unsound::NotFinite) }
    }

    /// A fixed value.
    pub fn point(value: f64) -> Result<Self, Unsound> {
        Self::with_mean(value, Shape::Point)
    }

    /// The normal distribution with its standard deviation.
    pub fn normal(mean: f64, sigma: f64) -> Result<Self, Unsound> {
        Self::with_mean(mean, Shape::Normal { sigma: positive(sigma)? })
    }

    /// A normal process cut at two limits; `mean` and `sigma` are the process's before the cut.
    ///
    /// The distribution's own [`mean`](Self::mean) is that of the pieces kept.
    pub fn sorted(mean: f64, sigma: f64, lower: f64, upper: f64) -> Result<Self, Unsound> {
        if !(mean.is_finite() && lower.is_finite() && upper.is_finite()) {
            return Err(Unsound::NotFinite);
        }
        let sigma = positive(sigma)?;
        let cut = Cut::new(sigma, (lower - mean) / sigma, (upper - mean) / sigma)?;
        Self::with_mean(mean + cut.shift(), Shape::Sorted(cut))
    }

    /// The rectangular distribution within ± `half` of its mean.
    pub fn uniform(mean: f64, half: f64) -> Result<Self, Unsound> {
        Self::with_mean(mean, Shape::Uniform { half: positive(half)? })
    }

    /// The symmetric triangular distribution within ± `half` of its mean.
    pub fn triangular(mean: f64, half: f64) -> Result<Self, Unsound> {
        Self::with_mean(mean, Shape::Triangular { half: positive(half)? })
    }

    /// The symmetric trapezoidal distribution: base within ± `base`, flat within ± `top`.
    pub fn trapezoid(mean: f64, base: f64, top: f64) -> Result<Self, Unsound> {
        let (base, top) = (positive(base)?, positive(top)?);
        if top >= base {
            return Err(Unsound::WrongOrder);
        }
        Self::with_mean(mean, Shape::Trapezoid { base, top })
    }

    /// The curvilinear trapezoid: rectangular within a half-width known to ± `slack` only.
    pub fn curvilinear(mean: f64, half: f64, slack: f64) -> Result<Self, Unsound> {
        let (half, slack) = (positive(half)?, positive(slack)?);
        if slack >= half {
            return Err(Unsound::WrongOrder);
        }
        Self::with_mean(mean, Shape::Curvilinear { half, slack })
    }

    /// The arcsine distribution of amplitude `half`.
    pub fn arcsine(mean: f64, half: f64) -> Result<Self, Unsound> {
        Self::with_mean(mean, Shape::Arcsine { half: positive(half)? })
    }

    /// Student's t of the given degrees of freedom, times `scale`.
    pub fn student(mean: f64, scale: f64, degrees: f64) -> Result<Self, Unsound> {
        let (scale, degrees) = (positive(scale)?, positive(degrees)?);
        Self::with_mean(mean, Shape::Student { scale, degrees })
    }

    /// Measured values, equally likely, each spread evenly over the gauge's `resolution` (its
    /// whole step; zero for none).
    pub fn measured(values: &[f64], resolution: f64) -> Result<Self, Unsound> {
        let (mean, list) = Measured::new(values, resolution)?;
        Self::with_mean(mean, Shape::Measured(list))
    }

    /// The same shape about another mean.
    pub fn moved_to(&self, mean: f64) -> Result<Self, Unsound> {
        Self::with_mean(mean, self.shape.clone())
    }

    /// The mean.
    pub fn mean(&self) -> f64 {
        self.mean
    }

    /// The shape about the mean.
    pub fn shape(&self) -> &Shape {
        &self.shape
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn unsound_numbers_are_refused() {
        assert_eq!(Distribution::normal(0.0, 0.0), Err(Unsound::NotPositive));
        assert_eq!(Distribution::normal(f64::NAN, 1.0), Err(Unsound::NotFinite));
        assert_eq!(Distribution::uniform(0.0, f64::INFINITY), Err(Unsound::NotFinite));
        assert_eq!(Distribution::trapezoid(0.0, 1.0, 1.0), Err(Unsound::WrongOrder));
        assert_eq!(Distribution::curvilinear(0.0, 1.0, 2.0), Err(Unsound::WrongOrder));
        assert_eq!(Distribution::sorted(0.0, 1.0, 1.0, -1.0), Err(Unsound::WrongOrder));
        assert_eq!(Distribution::sorted(0.0, 1.0, 0.0, 0.001), Err(Unsound::NothingLeft));
        assert_eq!(Distribution::sorted(0.0, 1.0, 9.0, 10.0), Err(Unsound::NothingLeft));
        assert_eq!(Distribution::measured(&[], 0.0), Err(Unsound::NoValues));
    }
}
