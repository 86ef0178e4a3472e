//! At what temperature a joint goes together, and at what temperature it comes loose.
//!
//! Temperatures in K, diameters and clearances in m, diametral. The temperatures are found on the
//! expansion curve itself, with the scatter of the lot at its worst, as proven crossings; one that
//! the data do not reach is a value like any other, never an extrapolation.

use super::expansion::{scattered_strain, thermal_strain};
use crate::materials::Scatter;
use crate::numeric::root::{Crossing, first_reached};
use crate::numeric::tolerance::TEMPERATURE_FOUND;
use crate::numeric::{Curve, Interval, Number};
use std::sync::Arc;

/// The hottest that a joint is looked for at, K, where the data of a part have no end.
const HOTTEST: f64 = 3000.0;

/// How a part expands, whatever lot it is from.
#[derive(Debug, Clone)]
pub struct Expanding {
    /// ΔL/L₀ against temperature in K, as published.
    pub curve: Arc<dyn Curve>,
    /// The temperature its sizes are stated at, K.
    pub reference: f64,
    /// How far a lot may lie from the curve.
    pub scatter: Scatter,
    /// The temperatures the data cover, K.
    pub range: Interval,
}

impl Expanding {
    /// The least strain that a lot may have.
    ///
    /// Formula: the lesser of `u·ε_th + v·(T−Tref)` at both ends of the scatter, in which it is
    /// linear.
    pub fn least<N: Number>(&self, t: N) -> N {
        self.lot(t.clone(), -1.0).min(self.lot(t, 1.0))
    }

    /// The greatest strain that a lot may have; as [`Expanding::least`].
    pub fn greatest<N: Number>(&self, t: N) -> N {
        self.lot(t.clone(), -1.0).max(self.lot(t, 1.0))
    }

    fn lot<N: Number>(&self, t: N, w: f64) -> N {
        let strain = thermal_strain(&self.curve, t.clone(), N::exact(self.reference));
        scattered_strain(strain, t - self.reference, self.scatter, N::exact(w))
    }

    /// The hottest its data allow, K.
    pub fn hottest(&self) -> f64 {
        self.range.hi().min(HOTTEST)
    }

    /// The coldest its data allow, K.
    pub fn coldest(&self) -> f64 {
        self.range.lo().max(0.0)
    }
}

/// Clearance wanted while joining where none is stated, m.
///
/// Formula: `0.001·d`.
///
/// Source: DIN 7190 as taught (Berechnungsgleichungen für Pressverbindungen, Zwickau University of
/// Applied Sciences).
pub fn insertion_clearance<N: Number>(diameter: N) -> N {
    diameter * 0.001
}

/// Free clearance of a bore over a shaft, each at its own strain, m.
///
/// Formula: `d_h(1+ε_h) − d_s(1+ε_s)`.
///
/// Symbols: `bore` d_h, `shaft` d_s at their reference (m).
pub fn free_clearance<N: Number>(bore: N, hub_strain: N, shaft: N, shaft_strain: N) -> N {
    bore * (hub_strain + 1.0) - shaft * (shaft_strain + 1.0)
}

/// The temperature that a hub must have so that every shaft enters it, K.
///
/// Formula: `d_h,min(1+ε_h) = d_s,max(1+ε_s) + clearance` for ε_h, at the least expansion a lot may
/// have; from `from` (K) upward as far as the data go. No smoothing enters: roughness is there while
/// joining.
///
/// Symbols: `bore` d_h,min at its reference; `shaft` d_s,max(1+ε_s), the greatest shaft at the
/// temperature it has; both proven bounds (m).
///
/// Valid for: a hub warm all through.
pub fn hub_heated(hub: &Expanding, bore: f64, shaft: f64, clearance: f64, from: f64) -> Crossing {
    let play = |t: Interval| {
        let (bore, shaft) = (Interval::point(bore), Interval::point(shaft));
        free_clearance(bore, hub.least(t), shaft, Interval::ZERO) - clearance
    };
    first_reached(play, from, hub.hottest(), TEMPERATURE_FOUND)
}

/// The temperature that a shaft must have so that it enters every hub, K.
///
/// Formula: as [`hub_heated`] for ε_s, at the least contraction a lot may have; from `from` (K)
/// downward. Contraction comes to an end in the cold, so this may never be reached.
///
/// Symbols: `shaft` d_s,max at its reference; `bore` d_h,min(1+ε_h), the least bore at the
/// temperature it has; both proven bounds (m).
///
/// Valid for: a shaft cold all through.
pub fn shaft_chilled(
    shaft: &Expanding,
    greatest: f64,
    bore: f64,
    clearance: f64,
    from: f64,
) -> Crossing {
    let play = |t: Interval| {
        let strain = shaft.greatest(t);
        let (bore, greatest) = (Interval::point(bore), Interval::point(greatest));
        free_clearance(bore, Interval::ZERO, greatest, strain) - clearance
    };
    first_reached(play, from, shaft.coldest(), TEMPERATURE_FOUND)
}

/// The parts of a joint as far as its coming loose depends on them.
#[derive(Debug, Clone)]
pub struct Loosening<'a> {
    /// The shaft's material.
    pub shaft: &'a Expanding,
    /// The hub's material.
    pub hub: &'a Expanding,
    /// The least shaft at its reference, m.
    pub least_shaft: f64,
    /// The greatest bore at its reference, m.
    pub greatest_bore: f64,
    /// Interference that roughness takes up, m.
    pub smoothing: f64,
}

impl Loosening<'_> {
    /// The first temperature on the way `from … to` (K) at which some pair has no interference left,
    /// both parts at the same temperature.
    ///
    /// Formula: least `δ = d_s(T) − d_h(T) − G` is 0, each material at the end of its scatter that is
    /// worse. `before` of the result is where every pair still holds.
    ///
    /// Valid for: both parts warm or cold all through, within the data of both.
    pub fn first(&self, from: f64, to: f64) -> Crossing {
        let (shaft, hub) = (self.shaft, self.hub);
        let coldest = shaft.coldest().max(hub.coldest());
        let hottest = shaft.hottest().min(hub.hottest());
        let play = |t: Interval| {
            let bore = Interval::point(self.greatest_bore);
            let least = Interval::point(self.least_shaft);
            free_clearance(bore, hub.greatest(t), least, shaft.least(t)) + self.smoothing
        };
        first_reached(play, from, to.min(hottest).max(coldest), TEMPERATURE_FOUND)
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::materials::Expansion;

    const T_REF: f64 = 293.15;

    fn constant(alpha: f64, scatter: Scatter) -> Expanding {
        let curve = Expansion::constant(alpha, T_REF).curve;
        Expanding { curve, reference: T_REF, scatter, range: Interval::new(0.0, f64::INFINITY) }
    }

    #[test]
    fn the_worst_lot_changes_side_at_the_reference() {
        let part = constant(20e-6, Scatter::Relative(0.1));
        assert!((part.least(T_REF + 100.0) - 1.8e-3).abs() < 1e-15);
        assert!((part.least(T_REF - 100.0) + 2.2e-3).abs() < 1e-15);
        assert!((part.greatest(T_REF - 100.0) + 1.8e-3).abs() < 1e-15);
        let part = constant(0.0, Scatter::PerKelvin(0.5e-6));
        assert!((part.least(T_REF - 100.0) + 50e-6).abs() < 1e-17);
    }

    #[test]
    fn a_scattering_hub_needs_more_heat() {
        let sharp = hub_heated(&constant(20e-6, Scatter::NONE), 0.05, 0.0501, 0.0, T_REF);
        let vague = hub_heated(&constant(20e-6, Scatter::Relative(0.2)), 0.05, 0.0501, 0.0, T_REF);
        assert!((sharp.at().unwrap() - (T_REF + 100.0)).abs() < 1e-6);
        assert!((vague.at().unwrap() - (T_REF + 125.0)).abs() < 1e-6);
    }

    #[test]
    fn a_hub_that_expands_too_little_is_not_heated_beyond_its_data() {
        let mut hub = constant(1.2e-6, Scatter::NONE);
        hub.range = Interval::new(200.0, 500.0);
        assert_eq!(hub_heated(&hub, 0.05, 0.0501, 0.0, T_REF), Crossing::Never);
    }

    #[test]
    fn a_joint_comes_loose_where_its_interference_ends() {
        let (steel, alloy) = (constant(11.7e-6, Scatter::NONE), constant(23.4e-6, Scatter::NONE));
        let joint = Loosening {
            shaft: &steel,
            hub: &alloy,
            least_shaft: 0.04005,
            greatest_bore: 0.04,
            smoothing: 0.01e-3,
        };
        let Crossing::Reached { before, at } = joint.first(T_REF, 1000.0) else {
            panic!("the alloy hub opens when it is hot");
        };
        // 0.01 + 40(1+23.4e-6τ) = 40.05(1+11.7e-6τ), in mm.
        let rise = 0.04 / (40.0 * 23.4e-6 - 40.05 * 11.7e-6);
        assert!(before < T_REF + rise && T_REF + rise < at && at - before < 1e-6);
        assert_eq!(joint.first(T_REF, 0.0), Crossing::Never);
    }
}
