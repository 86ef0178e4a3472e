//! The units a spec may be written in, with their exact factors.

use super::{Defaults, ICE_POINT, Kind};

/// One unit: a value in it times `factor`, plus `offset`, is the value in SI.
#[derive(Debug, PartialEq)]
pub struct Unit {
    /// As the formatter writes it.
    pub name: &'static str,
    /// As people read it in a report.
    pub symbol: &'static str,
    /// Other spellings that are read.
    pub spellings: &'static [&'static str],
    /// What it measures.
    pub kind: Kind,
    /// SI units in one of this unit.
    pub factor: f64,
    /// SI value of zero on this scale; not zero only for temperatures.
    pub offset: f64,
    /// One over `factor` where that is the exact number, so that 12.5 mm is the double nearest to
    /// 0.0125 m and not one rounding off it; zero where it is not.
    divisor: f64,
}

impl Unit {
    /// A value in this unit as SI.
    pub fn to_si(&self, value: f64) -> f64 {
        self.difference_to_si(value) + self.offset
    }

    /// A difference in this unit as SI.
    pub fn difference_to_si(&self, value: f64) -> f64 {
        if self.divisor != 0.0 { value / self.divisor } else { value * self.factor }
    }

    /// An SI value in this unit.
    pub fn from_si(&self, si: f64) -> f64 {
        self.difference_from_si(si - self.offset)
    }

    /// An SI difference in this unit.
    pub fn difference_from_si(&self, si: f64) -> f64 {
        if self.divisor != 0.0 { si * self.divisor } else { si / self.factor }
    }

    /// The unit of a temperature difference that belongs to this temperature unit, as words in
    /// a report.
    pub fn difference_symbol(&self) -> &'static str {
        if self.name == "degF" { "°F" } else { "K" }
    }
}

const fn unit(
    name: &'static str,
    symbol: &'static str,
    spellings: &'static [&'static str],
    kind: Kind,
    factor: f64,
    divisor: f64,
) -> Unit {
    Unit { name, symbol, spellings, kind, factor, offset: 0.0, divisor }
}

const fn scale(
    name: &'static str,
    symbol: &'static str,
    spellings: &'static [&'static str],
    factor: f64,
    offset: f64,
) -> Unit {
    Unit { name, symbol, spellings, kind: Kind::TEMPERATURE, factor, offset, divisor: 0.0 }
}

/// Newtons in one pound-force: 0.45359237 kg × 9.80665 m/s², both exact by definition.
const LBF: f64 = 4.448_221_615_260_5;
/// Pascals in one pound-force per square inch.
const PSI: f64 = LBF / (0.0254 * 0.0254);

static UNITS: &[Unit] = &[
    unit("mm", "mm", &[], Kind::LENGTH, 1e-3, 1e3),
    unit("um", "µm", &["µm", "μm", "micron"], Kind::LENGTH, 1e-6, 1e6),
    unit("nm", "nm", &[], Kind::LENGTH, 1e-9, 1e9),
    unit("cm", "cm", &[], Kind::LENGTH, 1e-2, 1e2),
    unit("m", "m", &[], Kind::LENGTH, 1.0, 1.0),
    unit("in", "in", &["inch"], Kind::LENGTH, 0.0254, 0.0),
    unit("thou", "thou", &[], Kind::LENGTH, 0.000_025_4, 0.0),
    unit("mm2", "mm²", &["mm^2", "mm²"], Kind::AREA, 1e-6, 1e6),
    unit("cm2", "cm²", &["cm^2", "cm²"], Kind::AREA, 1e-4, 1e4),
    unit("m2", "m²", &["m^2", "m²"], Kind::AREA, 1.0, 1.0),
    unit("in2", "in²", &["in^2", "in²"], Kind::AREA, 0.0254 * 0.0254, 0.0),
    unit("mm3", "mm³", &["mm^3", "mm³"], Kind::VOLUME, 1e-9, 1e9),
    unit("cm3", "cm³", &["cm^3", "cm³", "ml", "mL"], Kind::VOLUME, 1e-6, 1e6),
    unit("l", "l", &["L", "dm3"], Kind::VOLUME, 1e-3, 1e3),
    unit("m3", "m³", &["m^3", "m³"], Kind::VOLUME, 1.0, 1.0),
    unit("in3", "in³", &["in^3", "in³"], Kind::VOLUME, 0.0254 * 0.0254 * 0.0254, 0.0),
    unit("deg", "°", &["°"], Kind::ANGLE, std::f64::consts::PI / 180.0, 0.0),
    unit("rad", "rad", &[], Kind::ANGLE, 1.0, 1.0),
    unit("mrad", "mrad", &[], Kind::ANGLE, 1e-3, 1e3),
    unit("arcmin", "arcmin", &[], Kind::ANGLE, std::f64::consts::PI / 10_800.0, 0.0),
    unit("arcsec", "arcsec", &[], Kind::ANGLE, std::f64::consts::PI / 648_000.0, 0.0),
    scale("degC", "°C", &["°C", "C", "celsius"], 1.0, ICE_POINT),
    scale("degF", "°F", &["°F", "F", "fahrenheit"], 5.0 / 9.0, 459.67 * 5.0 / 9.0),
    scale("K", "K", &["kelvin"], 1.0, 0.0),
    unit("N", "N", &[], Kind::FORCE, 1.0, 1.0),
    unit("kN", "kN", &[], Kind::FORCE, 1e3, 0.0),
    unit("MN", "MN", &[], Kind::FORCE, 1e6, 0.0),
    unit("lbf", "lbf", &["lb"], Kind::FORCE, LBF, 0.0),
    unit("Pa", "Pa", &[], Kind::STRESS, 1.0, 1.0),
    unit("kPa", "kPa", &[], Kind::STRESS, 1e3, 0.0),
    unit("MPa", "MPa", &["N/mm2", "N/mm²", "N/mm^2"], Kind::STRESS, 1e6, 0.0),
    unit("GPa", "GPa", &[], Kind::STRESS, 1e9, 0.0),
    unit("bar", "bar", &[], Kind::STRESS, 1e5, 0.0),
    unit("psi", "psi", &[], Kind::STRESS, PSI, 0.0),
    unit("ksi", "ksi", &[], Kind::STRESS, PSI * 1e3, 0.0),
    unit("N*m", "N·m", &["N·m", "Nm"], Kind::TORQUE, 1.0, 1.0),
    unit("kN*m", "kN·m", &["kN·m", "kNm"], Kind::TORQUE, 1e3, 0.0),
    unit("lbf*in", "lbf·in", &["lbf·in"], Kind::TORQUE, LBF * 0.0254, 0.0),
    unit("N/m", "N/m", &[], Kind::STIFFNESS, 1.0, 1.0),
    unit("N/mm", "N/mm", &[], Kind::STIFFNESS, 1e3, 0.0),
    unit("kN/mm", "kN/mm", &[], Kind::STIFFNESS, 1e6, 0.0),
    unit("N/um", "N/µm", &["N/µm"], Kind::STIFFNESS, 1e6, 0.0),
    unit("lbf/in", "lbf/in", &[], Kind::STIFFNESS, LBF / 0.0254, 0.0),
    unit("1/K", "1/K", &["/K"], Kind::EXPANSION, 1.0, 1.0),
    unit("ppm/K", "ppm/K", &["ppm/degC", "ppm/°C", "um/m/K"], Kind::EXPANSION, 1e-6, 1e6),
    unit("ppm/degF", "ppm/°F", &["ppm/°F", "ppm/F"], Kind::EXPANSION, 1.8e-6, 0.0),
    unit("kg/m3", "kg/m³", &["kg/m^3", "kg/m³"], Kind::DENSITY, 1.0, 1.0),
    unit("g/cm3", "g/cm³", &["g/cm^3", "g/cm³"], Kind::DENSITY, 1e3, 0.0),
    unit(
        "lb/in3",
        "lb/in³",
        &["lb/in^3"],
        Kind::DENSITY,
        0.453_592_37 / (0.0254 * 0.0254 * 0.0254),
        0.0,
    ),
    unit("rpm", "rpm", &["1/min"], Kind::SPEED, std::f64::consts::PI / 30.0, 0.0),
    unit("rad/s", "rad/s", &[], Kind::SPEED, 1.0, 1.0),
    unit("s", "s", &[], Kind { time: 1, ..Kind::PURE }, 1.0, 1.0),
    unit("min", "min", &[], Kind { time: 1, ..Kind::PURE }, 60.0, 0.0),
    unit("h", "h", &[], Kind { time: 1, ..Kind::PURE }, 3600.0, 0.0),
    unit("", "", &[], Kind::PURE, 1.0, 1.0),
    unit("%", "%", &[], Kind::PURE, 1e-2, 1e2),
    unit("ppm", "ppm", &[], Kind::PURE, 1e-6, 1e6),
];

/// Every unit, in the order of the table.
pub fn all() -> impl Iterator<Item = &'static Unit> {
    UNITS.iter()
}

/// The unit of that spelling, if there is one.
pub fn find(spelling: &str) -> Option<&'static Unit> {
    UNITS.iter().find(|u| u.name == spelling || u.spellings.contains(&spelling))
}

/// The unit a quantity of `kind` is shown in, in a file with these defaults.
pub(super) fn shown(kind: Kind, defaults: &Defaults) -> &'static Unit {
    let inch = matches!(defaults.length.name, "in" | "thou");
    let name = match kind {
        Kind::LENGTH => return defaults.length,
        Kind::TEMPERATURE => return defaults.temperature,
        Kind::DIFFERENCE if defaults.temperature.name == "degF" => return defaults.temperature,
        Kind::DIFFERENCE => "K",
        Kind::AREA if inch => "in2",
        Kind::AREA => "mm2",
        Kind::VOLUME if inch => "in3",
        Kind::VOLUME => "cm3",
        Kind::ANGLE => "deg",
        Kind::FORCE if inch => "lbf",
        Kind::FORCE => "N",
        Kind::STRESS if inch => "psi",
        Kind::STRESS => "MPa",
        Kind::TORQUE if inch => "lbf*in",
        Kind::TORQUE => "N*m",
        Kind::STIFFNESS if inch => "lbf/in",
        Kind::STIFFNESS => "N/mm",
        Kind::EXPANSION => "ppm/K",
        Kind::DENSITY => "kg/m3",
        Kind::SPEED => "rpm",
        _ => "",
    };
    find(name).unwrap_or(&UNITS[0])
}
