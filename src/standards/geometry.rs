//! What a geometrical tolerance of zone t contributes to a dimension chain, as a contributor of zero
//! nominal.
//!
//! ISO 1101 defines zones, not chains: how a zone enters a chain is practice. Two facts decide it.
//!
//! - Tolerances of **location, run-out and orientation** hold the feature in a zone that lies evenly about its
//!   theoretically exact place, so that a point of it deviates by at most t/2 to either side. A cylindrical
//!   zone of diameter t does so in every direction.
//! - Tolerances of **form** have no place: they say that a feature may depart by t from a perfect one.
//!   By the principle of independency (ISO 8015) a size is measured between two opposite points, and
//!   form comes on top: the part touches its neighbour with its high points, and so takes up to t more
//!   room than its size. That is 0 to +t on the side of more material, never less. For a round part t is
//!   a radial width, and the room it takes grows by at most t on the diameter: of a shape of constant
//!   width w within a band t, the circle around it is at most w + t.
//!
//! Where the envelope requirement Ⓔ of ISO 14405-1 or Rule #1 of ASME Y14.5 holds, the limits of size
//! already bound the form, and a form tolerance should not be added to the chain at all.
//!
//! The bonus of a maximum material requirement (ISO 2692) and its unknown belong to the evaluation.
//! Knows nothing of spans.

/// A geometrical characteristic of ISO 1101.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Characteristic {
    /// Of a line or of an axis.
    Straightness,
    /// Of a face.
    Flatness,
    /// Of a section.
    Roundness,
    /// Of a whole cylinder.
    Cylindricity,
    /// Of a line or surface, to theoretically exact dimensions, evenly disposed.
    Profile,
    /// To a datum.
    Parallelism,
    /// To a datum.
    Perpendicularity,
    /// To a datum, at a theoretically exact angle.
    Angularity,
    /// To theoretically exact dimensions.
    Position,
    /// Coaxiality of an axis to a datum axis.
    Concentricity,
    /// Of a median plane to a datum.
    Symmetry,
    /// Circular run-out: one section in one turn.
    Runout,
    /// Total run-out: the whole surface.
    TotalRunout,
}

/// The share of the zone t that a contributor may take, and on what ground.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Contribution {
    /// Least contribution, in units of t.
    pub lower: f64,
    /// Greatest contribution, in units of t.
    pub upper: f64,
    /// Where the zone is defined.
    pub source: &'static str,
    /// Why the zone contributes this much.
    pub reason: &'static str,
}

impl Contribution {
    const fn either_side(source: &'static str, reason: &'static str) -> Self {
        Self { lower: -0.5, upper: 0.5, source, reason }
    }

    const fn more_material(source: &'static str, reason: &'static str) -> Self {
        Self { lower: 0.0, upper: 1.0, source, reason }
    }

    /// Gives half the width of the range, in units of t.
    pub fn half(self) -> f64 {
        0.5 * (self.upper - self.lower)
    }
}

impl Characteristic {
    /// All characteristics, in the order of ISO 1101: form, profile, orientation, location, run-out.
    pub const ALL: [Characteristic; 13] = [
        Self::Straightness,
        Self::Flatness,
        Self::Roundness,
        Self::Cylindricity,
        Self::Profile,
        Self::Parallelism,
        Self::Perpendicularity,
        Self::Angularity,
        Self::Position,
        Self::Concentricity,
        Self::Symmetry,
        Self::Runout,
        Self::TotalRunout,
    ];

    /// Gives its name as a drawing note spells it.
    pub fn name(self) -> &'static str {
        match self {
            Self::Straightness => "straightness",
            Self::Flatness => "flatness",
            Self::Roundness => "roundness",
            Self::Cylindricity => "cylindricity",
            Self::Profile => "profile",
            Self::Parallelism => "parallelism",
            Self::Perpendicularity => "perpendicularity",
            Self::Angularity => "angularity",
            Self::Position => "position",
            Self::Concentricity => "concentricity",
            Self::Symmetry => "symmetry",
            Self::Runout => "runout",
            Self::TotalRunout => "total runout",
        }
    }

    /// True for a tolerance of form, which refers to no datum.
    pub fn is_form(self) -> bool {
        matches!(self, Self::Straightness | Self::Flatness | Self::Roundness | Self::Cylindricity)
    }

    /// True where `dia` may stand before the zone: an axis can be held in a cylinder.
    pub fn may_be_diametral(self) -> bool {
        matches!(
            self,
            Self::Straightness
                | Self::Parallelism
                | Self::Perpendicularity
                | Self::Angularity
                | Self::Position
                | Self::Concentricity
        )
    }

    /// True where the maximum or least material requirement may apply, since the toleranced feature
    /// may be a feature of size (ISO 2692:2014, 4).
    pub fn takes_material_condition(self) -> bool {
        self.may_be_diametral() || matches!(self, Self::Flatness | Self::Symmetry)
    }

    /// Gives what the tolerance contributes.
    ///
    /// The source is the definition of the zone in ISO 1101:2012 (clause numbers from memory); the reason
    /// is common practice.
    pub fn contribution(self) -> Contribution {
        match self {
            Self::Straightness => Contribution::more_material(
                "ISO 1101:2012, 18.1",
                "a bent part takes its local size and up to t more room",
            ),
            Self::Flatness => Contribution::more_material(
                "ISO 1101:2012, 18.2",
                "a face rests on its high points, which stand up to t above the rest",
            ),
            Self::Roundness => Contribution::more_material(
                "ISO 1101:2012, 18.3",
                "the circle around a section exceeds its two-point size by up to t",
            ),
            Self::Cylindricity => Contribution::more_material(
                "ISO 1101:2012, 18.4",
                "the cylinder around the feature exceeds its two-point size by up to t",
            ),
            Self::Profile => Contribution::either_side(
                "ISO 1101:2012, 18.5 to 18.8",
                "the zone lies evenly about the theoretically exact profile",
            ),
            Self::Parallelism => Contribution::either_side(
                "ISO 1101:2012, 18.9",
                "the dimension locates the middle of the zone, and the feature tilts within it",
            ),
            Self::Perpendicularity => Contribution::either_side(
                "ISO 1101:2012, 18.10",
                "the dimension locates the middle of the zone, and the feature tilts within it",
            ),
            Self::Angularity => Contribution::either_side(
                "ISO 1101:2012, 18.11",
                "the dimension locates the middle of the zone, and the feature tilts within it",
            ),
            Self::Position => Contribution::either_side(
                "ISO 1101:2012, 18.12",
                "the feature lies within t/2 of its theoretically exact place, in any direction \
                 for a zone of diameter t",
            ),
            Self::Concentricity => Contribution::either_side(
                "ISO 1101:2012, 18.13",
                "the axis lies within t/2 of the datum axis",
            ),
            Self::Symmetry => Contribution::either_side(
                "ISO 1101:2012, 18.14",
                "the median plane lies within t/2 of the datum",
            ),
            Self::Runout => Contribution::either_side(
                "ISO 1101:2012, 18.15",
                "the reading over a turn is twice the eccentricity of a round section",
            ),
            Self::TotalRunout => Contribution::either_side(
                "ISO 1101:2012, 18.16",
                "the reading over the surface is twice the eccentricity of a true cylinder",
            ),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_contribution_is_as_wide_as_its_zone() {
        for characteristic in Characteristic::ALL {
            let share = characteristic.contribution();
            assert_eq!(share.upper - share.lower, 1.0, "{}", characteristic.name());
            assert_eq!(share.half(), 0.5);
        }
    }

    #[test]
    fn only_form_has_a_side() {
        for characteristic in Characteristic::ALL {
            let share = characteristic.contribution();
            let expected = if characteristic.is_form() { (0.0, 1.0) } else { (-0.5, 0.5) };
            assert_eq!((share.lower, share.upper), expected, "{}", characteristic.name());
        }
    }

    #[test]
    fn a_shape_of_constant_width_takes_no_more_room_than_its_size_and_its_roundness() {
        // The Reuleaux triangle of width w is the worst shape of constant width: its radii about the
        // centre are w/√3 and w − w/√3 (common geometry), so that t = 2w/√3 − w.
        let width = 20.0;
        let around = width / libm::sqrt(3.0);
        let zone = around - (width - around);
        assert!((2.0 * around - (width + zone)).abs() < 1e-12);
        assert!(zone > 0.0 && 2.0 * around > width);
    }

    #[test]
    fn the_reading_of_an_eccentric_circle_is_twice_its_eccentricity() {
        let (radius, eccentricity) = (12.0, 0.05);
        let reading = |degrees: u32| {
            let angle = f64::from(degrees).to_radians();
            eccentricity * libm::cos(angle)
                + libm::sqrt(radius * radius - libm::pow(eccentricity * libm::sin(angle), 2.0))
        };
        let readings = (0..360).map(reading);
        let least = readings.clone().fold(f64::INFINITY, f64::min);
        let greatest = readings.fold(0.0, f64::max);
        let share = Characteristic::Runout.contribution();
        assert!((share.upper * (greatest - least) - eccentricity).abs() < 1e-12);
    }
}
