//! What an evaluation gives: figures for every subject at every condition, and verdicts. SI
//! throughout; a bound is never on the safe side of what was proven.

use crate::model::{ConditionId, Owner, PartId, Quantity, SubjectId, Unknown};

/// Everything that was computed of one assembly.
#[derive(Debug, Clone, Default)]
pub struct Evaluation {
    /// Figures: each subject's quantities, subject by subject, condition by condition.
    pub figures: Vec<Figure>,
    /// One for each requirement at each of its conditions, in the order of the spec.
    pub verdicts: Vec<Verdict>,
    /// Temperatures of every part and fill at every condition.
    pub temperatures: Vec<PartTemperature>,
    /// Temperatures outside what a material's data cover.
    pub beyond_data: Vec<BeyondData>,
    /// What a quantity needs and no material says.
    pub missing: Vec<Missing>,
    /// Each `one of` set that some requirement depends on.
    pub selections: Vec<Selection>,
    /// What a shop needs to make each joint.
    pub shop_cards: Vec<ShopCard>,
    /// How far friction along each joint may shift its pressure.
    pub friction_bands: Vec<FrictionBand>,
    /// Requirements that hold unless friction along a joint is counted.
    pub turned_over: Vec<TurnedOver>,
    /// The share of assemblies that break some requirement somewhere, where the spec asks for
    /// statistics.
    pub assembly_yield: Option<AssemblyYield>,
}

/// The range of one quantity of a subject at a condition.
#[derive(Debug, Clone)]
pub struct Figure {
    /// Of what.
    pub subject: SubjectId,
    /// Which quantity.
    pub quantity: Quantity,
    /// Where; `None` for what has no condition.
    pub condition: Option<ConditionId>,
    /// The member of each `one of` set it was computed with.
    pub members: Vec<Chosen>,
    /// True where the quantity is a stress as a share of yield.
    pub of_yield: bool,
    /// Its range.
    pub range: Range,
}

/// A member taken from a `one of` set.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Chosen {
    /// The set.
    pub dimension: crate::model::DimensionId,
    /// Which member, from 0.
    pub member: u32,
}

/// Proven range of a quantity with its middle.
#[derive(Debug, Clone, PartialEq)]
pub struct Range {
    /// Least value: bound proven.
    pub least: End,
    /// Value with everything in the middle of its limits.
    pub mean: f64,
    /// Greatest value: bound proven.
    pub greatest: End,
}

/// One end of a range.
#[derive(Debug, Clone, PartialEq)]
pub struct End {
    /// No value lies beyond.
    pub bound: f64,
    /// A value at or beyond this occurs.
    pub reached: f64,
    /// True when the two have met.
    pub met: bool,
    /// Where it is reached.
    pub corner: Vec<(Unknown, f64)>,
}

/// Whether a requirement holds at a condition.
#[derive(Debug, Clone)]
pub struct Verdict {
    /// Index of the requirement in the assembly.
    pub requirement: usize,
    /// Where; `None` for what has no condition.
    pub condition: Option<ConditionId>,
    /// Index of its figure in the evaluation; `None` where nothing could be computed.
    pub figure: Option<usize>,
    /// How it stands.
    pub outcome: Outcome,
    /// The limit that is nearer, or further passed.
    pub governing: Side,
    /// Distance to that limit, in the quantity's SI unit; negative when passed. Not a number where
    /// nothing could be computed.
    pub margin: f64,
    /// What the range is made of, largest share first.
    pub contributors: Vec<Contributor>,
    /// Where it would hold if the temperatures were other ones.
    pub window: Option<Window>,
    /// What temperature alone does to the mean since reference, part by part, largest first.
    pub thermal_shifts: Vec<PartShift>,
    /// How it varies from assembly to assembly, where some requirement of the spec asks for
    /// statistics.
    pub statistics: Option<Statistics>,
}

/// How a requirement stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Outcome {
    /// Proven for everything the limits allow.
    Holds,
    /// A case that the limits allow is proven to break it.
    Fails,
    /// Neither could be proven.
    Undecided,
}

/// One of two ends.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Side {
    /// The least value and the lower limit.
    Least,
    /// The greatest value and the upper limit.
    Greatest,
}

/// What one unknown does to a quantity.
#[derive(Debug, Clone, PartialEq)]
pub struct Contributor {
    /// Which.
    pub unknown: Unknown,
    /// Derivative of the quantity in the middle, in SI units of both.
    pub sensitivity: f64,
    /// Part of the range that it makes, in the quantity's SI unit; all of them sum to the range.
    pub part: f64,
    /// The same as a share of the range, 0 … 1.
    pub share_of_range: f64,
}

/// What the temperature of one part or charge does to a mean.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct PartShift {
    /// Whose temperature.
    pub owner: Owner,
    /// The shift from the reference temperature to that of the condition, in the quantity's SI unit.
    pub shift: f64,
}

/// The temperatures at which a requirement holds, as proven intervals of one temperature that all
/// parts share, K, or else of a factor λ: `T = Tref + λ·(T_stated − Tref)` for every part.
#[derive(Debug, Clone, PartialEq)]
pub struct Window {
    /// The intervals; the one that holds the condition comes first. An end that only the data of the
    /// materials set is infinite.
    pub intervals: Vec<(f64, f64)>,
    /// As far as was looked: as the data go. Infinite where they have no end.
    pub looked_at: (f64, f64),
    /// True where the numbers are λ and not K.
    pub scaled: bool,
    /// Where they are λ: how far each part or charge with one temperature is from reference at
    /// λ = 1, K.
    pub departures: Vec<(Owner, f64)>,
}

/// The temperature of a part or fill at a condition.
#[derive(Debug, Clone, PartialEq)]
pub struct PartTemperature {
    /// Whose.
    pub owner: Owner,
    /// Where.
    pub condition: ConditionId,
    /// Least, K.
    pub least: f64,
    /// Greatest, K.
    pub greatest: f64,
}

/// A part or charge that gets colder or hotter than its material's data go.
#[derive(Debug, Clone, PartialEq)]
pub struct BeyondData {
    /// Whose temperature.
    pub owner: Owner,
    /// Where.
    pub condition: ConditionId,
    /// Its temperatures there, K.
    pub temperature: (f64, f64),
    /// What the data cover, K.
    pub valid: (f64, f64),
    /// True where the material says `extrapolate`, so that figures are given all the same.
    pub extrapolated: bool,
}

/// A property that a quantity needs and a material does not state.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub struct Missing {
    /// Of which subject.
    pub subject: SubjectId,
    /// Whose material.
    pub part: PartId,
    /// Which property.
    pub property: Property,
}

/// Properties that a quantity may need.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Property {
    /// Young's modulus.
    Modulus,
    /// Poisson's ratio.
    Poisson,
    /// Yield strength.
    Yield,
    /// Density.
    Density,
    /// Bulk modulus.
    BulkModulus,
}

/// Whether a `one of` set has a member for every assembly.
#[derive(Debug, Clone)]
pub struct Selection {
    /// The set.
    pub dimension: crate::model::DimensionId,
    /// The requirements that contain it, by index.
    pub requirements: Vec<usize>,
    /// For each member, the values of the first requirement's quantity at reference, without the
    /// set, for which that member meets all of them: least and greatest, empty where least is above.
    pub covers: Vec<(f64, f64)>,
    /// The values that occur: least and greatest.
    pub occurs: (f64, f64),
    /// How it stands.
    pub outcome: Outcome,
}

/// How a quantity varies from assembly to assembly, scenarios at their worst. SI.
#[derive(Debug, Clone, PartialEq)]
pub struct Statistics {
    /// The quantity at the means, on the side nearer to its limit.
    pub mean: f64,
    /// Its standard deviation to first order.
    pub sigma: f64,
    /// Mean and standard deviation to second order.
    pub second_order: (f64, f64),
    /// Mean and standard deviation where the scenarios make it least.
    pub low: (f64, f64),
    /// Mean and standard deviation where they make it greatest.
    pub high: (f64, f64),
    /// Share of assemblies that break a limit, 0 … 1.
    pub share_failing: f64,
    /// What that share is known to lie between: bounds of the method, or 99 % confidence limits
    /// where it was drawn.
    pub share_interval: (f64, f64),
    /// How it was drawn, where it was.
    pub drawn: Option<Drawn>,
    /// The same with the scatter of its lots at their worst, for requirements on a share of
    /// assemblies or a capability to which lots bring scatter, where details are asked for.
    pub worst_lot: Option<WorstLot>,
    /// Capability index to the nearer limit.
    pub cpk: Option<f64>,
    /// True where the share is that of the formula to its printed digits, without draws.
    pub exact: bool,
    /// True where sides may change in a `min`, a `max` or an absolute value: there no line tells mean
    /// and standard deviation, and those of the draws stand in their place.
    pub kinked: bool,
    /// Number of random unknowns.
    pub random: usize,
    /// True where some spread is the default and not stated.
    pub assumed: bool,
    /// What the variance is made of.
    pub variance_shares: Vec<VarianceShare>,
}

/// Second order is worth saying from this share of sigma on.
const WORTH_SAYING: f64 = 0.01;

impl Statistics {
    /// Mean and standard deviation to second order, where they differ from those to first order by
    /// 1 % of sigma or more.
    pub fn second_order_where_it_counts(&self) -> Option<(f64, f64)> {
        let (mean, sigma) = self.second_order;
        let apart = (mean - self.mean).abs().max((sigma - self.sigma).abs());
        (apart.is_finite() && apart > 0.0 && apart >= WORTH_SAYING * self.sigma)
            .then_some((mean, sigma))
    }

    /// Nothing is known.
    pub(crate) fn unknown() -> Self {
        Statistics {
            mean: f64::NAN,
            sigma: f64::NAN,
            second_order: (f64::NAN, f64::NAN),
            low: (f64::NAN, f64::NAN),
            high: (f64::NAN, f64::NAN),
            kinked: false,
            share_failing: 1.0,
            share_interval: (0.0, 1.0),
            drawn: None,
            worst_lot: None,
            cpk: None,
            exact: false,
            random: 0,
            assumed: false,
            variance_shares: Vec::new(),
        }
    }
}

/// A share of the variance.
#[derive(Debug, Clone, PartialEq)]
pub struct VarianceShare {
    /// Of which unknown; `None` for what several bring together.
    pub unknown: Option<Unknown>,
    /// The share, 0 … 1.
    pub share: f64,
}

/// The share of assemblies that break some requirement at some condition.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct AssemblyYield {
    /// The share failing, 0 … 1.
    pub share_failing: f64,
    /// What it is known to lie between.
    pub share_interval: (f64, f64),
    /// How it was drawn, where it was.
    pub drawn: Option<Drawn>,
}

/// How a quantity varies within the delivery whose lots fail most.
#[derive(Debug, Clone, PartialEq)]
pub struct WorstLot {
    /// Share of assemblies that break a limit, 0 … 1.
    pub share_failing: f64,
    /// What that share is known to lie between.
    pub share_interval: (f64, f64),
    /// How it was drawn, where it was.
    pub drawn: Option<Drawn>,
    /// Capability index to the nearer limit.
    pub cpk: Option<f64>,
    /// The end of each lot's scatter.
    pub corner: Vec<(Unknown, f64)>,
}

/// How a share was drawn.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Drawn {
    /// Number of assemblies drawn.
    pub draws: u64,
    /// Seed of their streams.
    pub seed: u64,
    /// The width that was asked for of its confidence interval, where the most draws allowed did
    /// not reach it.
    pub missed: Option<f64>,
}

/// The pressures that friction along a joint of two rings leaves possible. Pa.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FrictionBand {
    /// Which joint.
    pub subject: SubjectId,
    /// Where.
    pub condition: ConditionId,
    /// The greatest share by which it shifts the pressure: κ of
    /// [`crate::mechanics::joint::axial_coupling`], at its upper bound.
    pub coupling: f64,
    /// No pressure lies below.
    pub least: f64,
    /// No pressure lies above; infinite where κ may reach 1.
    pub greatest: f64,
}

/// A requirement that holds, and would not with friction along the joint counted.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct TurnedOver {
    /// Index of its verdict in the evaluation.
    pub verdict: usize,
    /// The side on which it passes its limit, or further from holding.
    pub governing: Side,
    /// Least value within the band, in the quantity's SI unit.
    pub least: f64,
    /// Greatest value within the band.
    pub greatest: f64,
    /// The greatest share by which the pressure is shifted.
    pub coupling: f64,
}

/// What a shop needs to join an outer part and an inner one without force. Temperatures in K; they
/// hold for every pair within the tolerances.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ShopCard {
    /// Which joint.
    pub subject: SubjectId,
    /// Temperature of the day of assembly.
    pub ambient: f64,
    /// The condition it was taken from; the reference temperature if none.
    pub day: Option<ConditionId>,
    /// Clearance while joining, m.
    pub insertion_clearance: f64,
    /// Heat the outer part to this, the inner one at ambient; `None` where its data end first.
    pub heat_outer: Option<f64>,
    /// The highest temperature that the outer part's material allows.
    pub outer_limit: Option<f64>,
    /// Where the outer part's data end.
    pub outer_data: f64,
    /// Or chill the inner part to this, the outer one at ambient; `None` where its data end first.
    pub chill_inner: Option<f64>,
    /// Where the inner part's data end.
    pub inner_data: f64,
    /// Both at once; where the outer part may not be heated as far as it alone would have to be.
    pub together: Option<Together>,
}

/// An outer part heated as far as it may be, and an inner one chilled for the rest. K.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Together {
    /// Heat the outer part to this: its limit, or where its data end.
    pub heat_outer: f64,
    /// And chill the inner part to this; `None` where its data end first.
    pub chill_inner: Option<f64>,
    /// Clearance still missing with the inner part where its data end, m; at most 0 where none is.
    pub short: f64,
}

impl ShopCard {
    /// True where heating alone joins and stays within what the material allows.
    pub fn may_be_heated(&self) -> bool {
        self.heat_outer.is_some_and(|heat| self.outer_limit.is_none_or(|limit| heat <= limit))
    }
}
