//! Kinds of quantity as exponents of the base quantities that assemblies need.

use std::fmt;
use std::ops::{Div, Mul};

/// A kind of quantity: length, angle, stress, …
///
/// An angle is told from a pure number when it stands alone and is dropped in products, so that
/// radius times angle is a length.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct Kind {
    /// Exponent of length (m).
    pub length: i8,
    /// Exponent of force (N).
    pub force: i8,
    /// Exponent of temperature difference (K).
    pub temperature: i8,
    /// Exponent of time (s).
    pub time: i8,
    /// What the exponents alone do not tell.
    pub tag: Tag,
}

/// Tells apart kinds of equal exponents.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Tag {
    /// Nothing to tell.
    None,
    /// An angle (rad).
    Angle,
    /// A point on the temperature scale, not a difference.
    Absolute,
    /// A moment, which has the exponents of an energy.
    Moment,
}

const fn kind(length: i8, force: i8, temperature: i8, time: i8, tag: Tag) -> Kind {
    Kind { length, force, temperature, time, tag }
}

impl Kind {
    /// A number without unit.
    pub const PURE: Kind = kind(0, 0, 0, 0, Tag::None);
    /// An angle, rad.
    pub const ANGLE: Kind = kind(0, 0, 0, 0, Tag::Angle);
    /// A length, m.
    pub const LENGTH: Kind = kind(1, 0, 0, 0, Tag::None);
    /// An area, m².
    pub const AREA: Kind = kind(2, 0, 0, 0, Tag::None);
    /// A volume, m³.
    pub const VOLUME: Kind = kind(3, 0, 0, 0, Tag::None);
    /// A temperature, K.
    pub const TEMPERATURE: Kind = kind(0, 0, 1, 0, Tag::Absolute);
    /// A difference of temperatures, K.
    pub const DIFFERENCE: Kind = kind(0, 0, 1, 0, Tag::None);
    /// A force, N.
    pub const FORCE: Kind = kind(0, 1, 0, 0, Tag::None);
    /// A stress or pressure, Pa.
    pub const STRESS: Kind = kind(-2, 1, 0, 0, Tag::None);
    /// A moment of force, N·m.
    pub const TORQUE: Kind = kind(1, 1, 0, 0, Tag::Moment);
    /// A stiffness, N/m.
    pub const STIFFNESS: Kind = kind(-1, 1, 0, 0, Tag::None);
    /// A coefficient of expansion, 1/K.
    pub const EXPANSION: Kind = kind(0, 0, -1, 0, Tag::None);
    /// A density, kg/m³ = N·s²/m⁴.
    pub const DENSITY: Kind = kind(-4, 1, 0, 2, Tag::None);
    /// A rotational speed, rad/s.
    pub const SPEED: Kind = kind(0, 0, 0, -1, Tag::None);

    /// This kind to a whole power.
    #[must_use]
    pub fn powi(self, n: i8) -> Kind {
        kind(
            self.length.saturating_mul(n),
            self.force.saturating_mul(n),
            self.temperature.saturating_mul(n),
            self.time.saturating_mul(n),
            Tag::None,
        )
    }

    /// The kind whose square this is, if there is one.
    pub fn sqrt(self) -> Option<Kind> {
        let even =
            [self.length, self.force, self.temperature, self.time].iter().all(|e| e % 2 == 0);
        even.then(|| {
            kind(self.length / 2, self.force / 2, self.temperature / 2, self.time / 2, Tag::None)
        })
    }

    /// True for a number without unit and for an angle.
    pub fn is_pure(self) -> bool {
        self == Kind::PURE || self == Kind::ANGLE
    }

    /// The word for this kind.
    pub fn word(self) -> String {
        let named = match self {
            Kind::PURE => "pure number",
            Kind::ANGLE => "angle",
            Kind::LENGTH => "length",
            Kind::AREA => "area",
            Kind::VOLUME => "volume",
            Kind::TEMPERATURE => "temperature",
            Kind::DIFFERENCE => "temperature difference",
            Kind::FORCE => "force",
            Kind::STRESS => "stress",
            Kind::TORQUE => "torque",
            Kind::STIFFNESS => "stiffness",
            Kind::EXPANSION => "coefficient of expansion",
            Kind::DENSITY => "density",
            Kind::SPEED => "speed",
            _ => return self.to_string(),
        };
        named.to_string()
    }
}

impl Mul for Kind {
    type Output = Kind;
    fn mul(self, o: Kind) -> Kind {
        // A multiple of an angle is an angle.
        let multiple = |a: Kind, b: Kind| a == Kind::PURE && b.tag == Tag::Angle;
        let tag = if multiple(self, o) || multiple(o, self) { Tag::Angle } else { Tag::None };
        kind(
            self.length.saturating_add(o.length),
            self.force.saturating_add(o.force),
            self.temperature.saturating_add(o.temperature),
            self.time.saturating_add(o.time),
            tag,
        )
    }
}

impl Div for Kind {
    type Output = Kind;
    fn div(self, o: Kind) -> Kind {
        let tag = if o == Kind::PURE && self.tag == Tag::Angle { Tag::Angle } else { Tag::None };
        kind(
            self.length.saturating_sub(o.length),
            self.force.saturating_sub(o.force),
            self.temperature.saturating_sub(o.temperature),
            self.time.saturating_sub(o.time),
            tag,
        )
    }
}

impl fmt::Display for Kind {
    /// Writes the exponents in SI units, for kinds that have no word of their own.
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let parts =
            [("N", self.force), ("m", self.length), ("K", self.temperature), ("s", self.time)];
        let mut first = true;
        for (name, exponent) in parts.into_iter().filter(|(_, e)| *e != 0) {
            if !first {
                f.write_str("*")?;
            }
            first = false;
            if exponent == 1 { write!(f, "{name}")? } else { write!(f, "{name}^{exponent}")? }
        }
        if first { f.write_str("1") } else { Ok(()) }
    }
}
