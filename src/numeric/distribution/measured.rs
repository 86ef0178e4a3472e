//! A list of measured values as a distribution.

use super::Unsound;
use std::sync::Arc;

/// Measured values about their mean, equally likely, each spread over the gauge's resolution.
///
/// Cheap to clone: the list is shared.
#[derive(Debug, Clone, PartialEq)]
pub struct Measured {
    /// Distances from the mean, ascending.
    deviations: Arc<[f64]>,
    /// Half the gauge's step.
    half: f64,
}

impl Measured {
    /// The mean and the list about it.
    pub(super) fn new(values: &[f64], resolution: f64) -> Result<(f64, Self), Unsound> {
        if values.is_empty() {
            return Err(Unsound::NoValues);
        }
        if !resolution.is_finite() || values.iter().any(|v| !v.is_finite()) {
            return Err(Unsound::NotFinite);
        }
        if resolution < 0.0 {
            return Err(Unsound::NotPositive);
        }
        // Two passes: the second takes out the rounding of the first.
        let count = values.len() as f64;
        let first = values[0];
        let mean = first + values.iter().map(|v| v - first).sum::<f64>() / count;
        let mut deviations: Vec<f64> = values.iter().map(|v| v - mean).collect();
        deviations.sort_by(f64::total_cmp);
        Ok((mean, Measured { deviations: deviations.into(), half: 0.5 * resolution }))
    }

    /// How many values were measured; a share below about three over this count has no data
    /// behind it.
    pub fn count(&self) -> usize {
        self.deviations.len()
    }

    /// The values as distances from their mean, ascending.
    pub fn deviations(&self) -> &[f64] {
        &self.deviations
    }

    /// Half the gauge's step.
    pub fn half_resolution(&self) -> f64 {
        self.half
    }

    /// The central moment of whole order.
    pub(super) fn central_moment(&self, order: u32) -> f64 {
        let power = |x: f64, n: u32| (0..n).fold(1.0, |product, _| product * x);
        let mean_power = |n: u32| {
            self.deviations.iter().map(|&d| power(d, n)).sum::<f64>() / self.count() as f64
        };
        // Even moments of the resolution's rectangle: h²/3 and h⁴/5; odd ones vanish.
        let (h2, h4) = (self.half * self.half / 3.0, power(self.half, 4) / 5.0);
        match order {
            2 => mean_power(2) + h2,
            3 => mean_power(3),
            4 => mean_power(4) + 6.0 * mean_power(2) * h2 + h4,
            n => mean_power(n),
        }
    }

    /// The share above a distance from the mean; a value just there does not count.
    pub(super) fn tail(&self, x: f64) -> f64 {
        let count = self.count() as f64;
        if self.half == 0.0 {
            let at_or_below = self.deviations.partition_point(|&d| d <= x);
            return (self.count() - at_or_below) as f64 / count;
        }
        let share = |d: f64| ((d + self.half - x) / (2.0 * self.half)).clamp(0.0, 1.0);
        self.deviations.iter().map(|&d| share(d)).sum::<f64>() / count
    }

    /// The point, as a distance from the mean, below which the share `u` lies.
    pub(super) fn quantile(&self, u: f64) -> f64 {
        let (mut low, mut high) = self.support();
        if self.half == 0.0 {
            let index = (u * self.count() as f64) as usize;
            return self.deviations[index.min(self.count() - 1)];
        }
        // The distribution function is made of straight pieces; halving needs no care for flats.
        for _ in 0..200 {
            let middle = 0.5 * (low + high);
            if middle <= low || middle >= high {
                break;
            }
            if 1.0 - self.tail(middle) < u {
                low = middle;
            } else {
                high = middle;
            }
        }
        high
    }

    /// Draws with one number evenly distributed in (0, 1): its whole part chooses the value, the
    /// rest the place within the resolution.
    #[inline]
    pub(super) fn draw(&self, u: f64) -> f64 {
        let scaled = u * self.count() as f64;
        let index = (scaled as usize).min(self.count() - 1);
        let rest = scaled - index as f64;
        self.deviations[index] + (2.0 * rest - 1.0) * self.half
    }

    /// The least and greatest distance from the mean.
    pub(super) fn support(&self) -> (f64, f64) {
        let last = self.count() - 1;
        (self.deviations[0] - self.half, self.deviations[last] + self.half)
    }
}
