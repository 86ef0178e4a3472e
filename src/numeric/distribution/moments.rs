//! Variance, skewness, kurtosis and support of each shape.

use super::{Distribution, Shape};

impl Distribution {
    /// The variance; infinite for Student's t of two degrees of freedom or fewer.
    pub fn variance(&self) -> f64 {
        match &self.shape {
            Shape::Point => 0.0,
            Shape::Normal { sigma } => sigma * sigma,
            Shape::Sorted(cut) => cut.sigma() * cut.sigma() * cut.central_moment(2),
            Shape::Uniform { half } => half * half / 3.0,
            Shape::Triangular { half } => half * half / 6.0,
            Shape::Trapezoid { base, top } => (base * base + top * top) / 6.0,
            Shape::Curvilinear { half, slack } => (half * half + slack * slack / 3.0) / 3.0,
            Shape::Arcsine { half } => half * half / 2.0,
            Shape::Student { scale, degrees } if *degrees > 2.0 => {
                scale * scale * degrees / (degrees - 2.0)
            }
            Shape::Student { .. } => f64::INFINITY,
            Shape::Measured(list) => list.central_moment(2),
        }
    }

    /// The standard deviation.
    pub fn standard_deviation(&self) -> f64 {
        libm::sqrt(self.variance())
    }

    /// The skewness `γ`: third central moment over the cube of the standard deviation.
    pub fn skewness(&self) -> f64 {
        let third = match &self.shape {
            Shape::Sorted(cut) => {
                let spread = libm::sqrt(cut.central_moment(2));
                return cut.central_moment(3) / (spread * spread * spread);
            }
            Shape::Measured(list) => list.central_moment(3),
            _ => return 0.0,
        };
        let sigma = self.standard_deviation();
        if sigma > 0.0 { third / (sigma * sigma * sigma) } else { 0.0 }
    }

    /// The kurtosis `κ`: fourth central moment over the square of the variance (3 for a normal).
    ///
    /// Infinite for Student's t of four degrees of freedom or fewer; 3 for a fixed value, which
    /// keeps formulas that multiply it by the variance finite.
    pub fn kurtosis(&self) -> f64 {
        match &self.shape {
            Shape::Point | Shape::Normal { .. } => 3.0,
            Shape::Sorted(cut) => {
                let variance = cut.central_moment(2);
                cut.central_moment(4) / (variance * variance)
            }
            Shape::Uniform { .. } => 1.8,
            Shape::Triangular { .. } => 2.4,
            Shape::Trapezoid { base, top } => {
                // The sum of two rectangles of half-widths p and q.
                let (p2, q2) = (square(0.5 * (base + top)), square(0.5 * (base - top)));
                let fourth = p2 * p2 / 5.0 + 6.0 * p2 * q2 / 9.0 + q2 * q2 / 5.0;
                fourth / square(self.variance())
            }
            Shape::Curvilinear { half, slack } => {
                // E(W⁴)/5 for the half-width W, rectangular within ± slack.
                let (w2, d2) = (half * half, slack * slack);
                (w2 * w2 + 2.0 * w2 * d2 + d2 * d2 / 5.0) / 5.0 / square(self.variance())
            }
            Shape::Arcsine { .. } => 1.5,
            Shape::Student { degrees, .. } if *degrees > 4.0 => 3.0 + 6.0 / (degrees - 4.0),
            Shape::Student { .. } => f64::INFINITY,
            Shape::Measured(list) => {
                let variance = list.central_moment(2);
                if variance > 0.0 { list.central_moment(4) / square(variance) } else { 3.0 }
            }
        }
    }

    /// The least and greatest value; infinite where a tail never ends.
    pub fn support(&self) -> (f64, f64) {
        let (low, high) = match &self.shape {
            Shape::Point => (0.0, 0.0),
            Shape::Normal { .. } | Shape::Student { .. } => (f64::NEG_INFINITY, f64::INFINITY),
            Shape::Sorted(cut) => cut.support(),
            Shape::Uniform { half } | Shape::Triangular { half } | Shape::Arcsine { half } => {
                (-half, *half)
            }
            Shape::Trapezoid { base, .. } => (-base, *base),
            Shape::Curvilinear { half, slack } => (-half - slack, half + slack),
            Shape::Measured(list) => list.support(),
        };
        (self.mean + low, self.mean + high)
    }
}

fn square(x: f64) -> f64 {
    x * x
}

impl Distribution {
    /// Points between which the density of a bounded distribution is smooth, ends included.
    pub fn nodes(&self) -> Vec<f64> {
        let about_mean = match &self.shape {
            Shape::Triangular { half } => vec![-half, 0.0, *half],
            Shape::Trapezoid { base, top } => vec![-base, -top, *top, *base],
            Shape::Curvilinear { half, slack } => {
                vec![-half - slack, slack - half, half - slack, half + slack]
            }
            Shape::Sorted(cut) => cut.nodes(),
            _ => {
                let (low, high) = self.support();
                return vec![low, high];
            }
        };
        about_mean.into_iter().map(|x| self.mean + x).collect()
    }
}
