//! Every tolerance of the program, and the one comparison of a bound with a limit.

/// How far apart, in the unit shown, the proven bound of an extreme and the value reached may stay:
/// far below what a gauge resolves, far above rounding.
pub const EXTREME_GAP: f64 = 1e-9;

/// The same as a share of the value itself, for quantities that are large in their unit.
pub const RELATIVE_GAP: f64 = 1e-10;

/// Most boxes one search for an extreme may look at before it gives up and says so.
pub const MOST_BOXES: usize = 20_000;

/// How far, in the unit shown, a proven bound may lie beyond its limit and still hold: a fit whose
/// least clearance is exactly zero must hold `>= 0` whatever the last bit says.
pub const LIMIT_SLACK: f64 = 1e-9;

/// Slivers of a temperature window thinner than this, in kelvin, count as failing.
pub const WINDOW_SLIVER: f64 = 1e-6;

/// How far apart, in kelvin, the last temperature proven not to reach something and the first proven
/// to reach it may stay: far below what any oven holds, far above rounding.
pub const TEMPERATURE_FOUND: f64 = 1e-7;

/// Most pieces one search for a crossing may look at before it gives up and says so; a function that
/// rises takes some fifty.
pub const MOST_ROOT_PIECES: usize = 10_000;

/// How far, in the unit shown, a bound may lie beyond its limit within a temperature window: enough
/// for rounding, too little to move the end of a window.
pub const WINDOW_SLACK: f64 = 1e-12;
