//! Closed intervals with outward rounding (Moore, *Interval Analysis*).
//!
//! Every operation returns an interval that holds all results of the exact operation on all members
//! of its operands. What is undefined for some member gives [`Interval::ENTIRE`]: nothing is known.

use super::curve::Curve;
use super::{Number, Ordered};
use std::cmp::Ordering;
use std::ops::{Add, Div, Mul, Neg, Sub};
use std::sync::Arc;

/// All real numbers from `lo` to `hi`, both included.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Interval {
    lo: f64,
    hi: f64,
}

/// Relative error allowed for a function of `libm`, which states less than one unit in the last
/// place for those used here; three more keep the enclosure safe.
const LIBM_ULPS: u32 = 4;

fn down(x: f64) -> f64 {
    x.next_down()
}

fn up(x: f64) -> f64 {
    x.next_up()
}

fn outward(lo: f64, hi: f64) -> Interval {
    Interval::new(down(lo), up(hi))
}

fn widened(lo: f64, hi: f64) -> Interval {
    let (mut lo, mut hi) = (lo, hi);
    for _ in 0..LIBM_ULPS {
        lo = down(lo);
        hi = up(hi);
    }
    Interval::new(lo, hi)
}

impl Interval {
    /// Everything: nothing is known.
    pub const ENTIRE: Interval = Interval { lo: f64::NEG_INFINITY, hi: f64::INFINITY };
    /// Exactly zero.
    pub const ZERO: Interval = Interval { lo: 0.0, hi: 0.0 };

    /// The interval `lo … hi`; [`Interval::ENTIRE`] if either end is not a number or they are the
    /// wrong way round, so that a mistake can never look like a proof.
    pub fn new(lo: f64, hi: f64) -> Self {
        if lo <= hi { Interval { lo, hi } } else { Interval::ENTIRE }
    }

    /// The one number `x`.
    pub fn point(x: f64) -> Self {
        Interval::new(x, x)
    }

    /// The lower end.
    pub fn lo(self) -> f64 {
        self.lo
    }

    /// The upper end.
    pub fn hi(self) -> f64 {
        self.hi
    }

    /// A number near the middle, always a member where the interval has a finite one, and finite.
    pub fn mid(self) -> f64 {
        if self == Interval::ENTIRE {
            return 0.0;
        }
        let m = 0.5 * self.lo + 0.5 * self.hi;
        m.max(self.lo).min(self.hi).clamp(f64::MIN, f64::MAX)
    }

    /// Upper end less lower end, rounded up.
    pub fn width(self) -> f64 {
        if self.is_point() { 0.0 } else { up(self.hi - self.lo) }
    }

    /// True when both ends are one number.
    pub fn is_point(self) -> bool {
        self.lo == self.hi
    }

    /// True when both ends are finite.
    pub fn is_bounded(self) -> bool {
        self.lo.is_finite() && self.hi.is_finite()
    }

    /// True when `x` is a member.
    pub fn contains(self, x: f64) -> bool {
        self.lo <= x && x <= self.hi
    }

    /// True when every member of `other` is a member.
    pub fn encloses(self, other: Interval) -> bool {
        self.lo <= other.lo && other.hi <= self.hi
    }

    /// The members common to both; `None` when there is none.
    pub fn intersection(self, other: Interval) -> Option<Interval> {
        let lo = self.lo.max(other.lo);
        let hi = self.hi.min(other.hi);
        (lo <= hi).then_some(Interval { lo, hi })
    }

    /// The largest absolute value of a member.
    pub fn magnitude(self) -> f64 {
        self.lo.abs().max(self.hi.abs())
    }

    /// True when nothing is known of a value, be it that it is not defined.
    fn is_entire(self) -> bool {
        self == Interval::ENTIRE
    }

    fn increasing(self, f: fn(f64) -> f64) -> Interval {
        widened(f(self.lo), f(self.hi))
    }

    fn within(self, lo: f64, hi: f64) -> Interval {
        self.intersection(Interval { lo, hi }).unwrap_or(self)
    }

    /// Range of a sine or cosine, whose greatest values stand at `top + 2kπ` and least at
    /// `top + (2k+1)π`.
    fn wave(self, f: fn(f64) -> f64, top: f64) -> Interval {
        use std::f64::consts::PI;
        if self.is_entire() {
            return self;
        }
        if !self.is_bounded() || self.width() > 6.0 || self.magnitude() > 1e6 {
            return Interval { lo: -1.0, hi: 1.0 };
        }
        let (a, b) = (f(self.lo), f(self.hi));
        let ends = widened(a.min(b), a.max(b));
        let (mut lo, mut hi) = (ends.lo, ends.hi);
        // The quotient is off by far less than this at |x| < 1e6; too wide a margin only adds an
        // extreme that the end values nearly reach anyway.
        const MARGIN: f64 = 1e-9;
        let mut k = libm::ceil((self.lo - top) / PI - MARGIN);
        let last = libm::floor((self.hi - top) / PI + MARGIN);
        while k <= last {
            if libm::fmod(k.abs(), 2.0) == 0.0 {
                hi = 1.0;
            } else {
                lo = -1.0;
            }
            k += 1.0;
        }
        Interval { lo: lo.max(-1.0), hi: hi.min(1.0) }
    }
}

impl Neg for Interval {
    type Output = Interval;
    fn neg(self) -> Interval {
        Interval { lo: -self.hi, hi: -self.lo }
    }
}

impl Add for Interval {
    type Output = Interval;
    fn add(self, o: Interval) -> Interval {
        // Adding nothing is exact; it keeps the sign of a derivative that other terms do not touch.
        if o == Interval::ZERO {
            return self;
        }
        if self == Interval::ZERO {
            return o;
        }
        outward(self.lo + o.lo, self.hi + o.hi)
    }
}

impl Sub for Interval {
    type Output = Interval;
    fn sub(self, o: Interval) -> Interval {
        self + -o
    }
}

impl Mul for Interval {
    type Output = Interval;
    fn mul(self, o: Interval) -> Interval {
        if self == Interval::ZERO || o == Interval::ZERO {
            return Interval::ZERO;
        }
        if o.is_point() && o.lo == 1.0 {
            return self;
        }
        if self.is_point() && self.lo == 1.0 {
            return o;
        }
        if self.lo >= 0.0 && o.lo >= 0.0 {
            let lo = self.lo * o.lo;
            let hi = self.hi * o.hi;
            return Interval::new(if lo == 0.0 { 0.0 } else { down(lo) }, up(hi));
        }
        let p = [self.lo * o.lo, self.lo * o.hi, self.hi * o.lo, self.hi * o.hi];
        if p.iter().any(|x| x.is_nan()) {
            return Interval::ENTIRE;
        }
        let (lo, hi) = p.iter().fold((p[0], p[0]), |(l, h), &x| (l.min(x), h.max(x)));
        // A zero end comes from a zero factor unless it underflowed: it keeps a proven sign.
        let zero_factor = self.lo == 0.0 || self.hi == 0.0 || o.lo == 0.0 || o.hi == 0.0;
        let lo = if lo == 0.0 && zero_factor { 0.0 } else { down(lo) };
        let hi = if hi == 0.0 && zero_factor { 0.0 } else { up(hi) };
        Interval::new(lo, hi)
    }
}

impl Div for Interval {
    type Output = Interval;
    fn div(self, o: Interval) -> Interval {
        if o.contains(0.0) {
            return Interval::ENTIRE;
        }
        if self == Interval::ZERO {
            return Interval::ZERO;
        }
        if o.is_point() && o.lo == 1.0 {
            return self;
        }
        let p = [self.lo / o.lo, self.lo / o.hi, self.hi / o.lo, self.hi / o.hi];
        if p.iter().any(|x| x.is_nan()) {
            return Interval::ENTIRE;
        }
        let (lo, hi) = p.iter().fold((p[0], p[0]), |(l, h), &x| (l.min(x), h.max(x)));
        let zero_end = self.lo == 0.0 || self.hi == 0.0;
        let lo = if lo == 0.0 && zero_end { 0.0 } else { down(lo) };
        let hi = if hi == 0.0 && zero_end { 0.0 } else { up(hi) };
        Interval::new(lo, hi)
    }
}

impl Add<f64> for Interval {
    type Output = Interval;
    fn add(self, o: f64) -> Interval {
        self + Interval::point(o)
    }
}

impl Sub<f64> for Interval {
    type Output = Interval;
    fn sub(self, o: f64) -> Interval {
        self - Interval::point(o)
    }
}

impl Mul<f64> for Interval {
    type Output = Interval;
    fn mul(self, o: f64) -> Interval {
        self * Interval::point(o)
    }
}

impl Div<f64> for Interval {
    type Output = Interval;
    fn div(self, o: f64) -> Interval {
        self / Interval::point(o)
    }
}

impl Number for Interval {
    fn exact(x: f64) -> Self {
        Interval::point(x)
    }
    fn enclosed(interval: Interval) -> Self {
        interval
    }
    fn powi(self, n: i32) -> Self {
        if n < 0 {
            return Interval::point(1.0) / self.powi(-n);
        }
        match n {
            0 => return Interval::point(1.0),
            1 => return self,
            _ if self.is_entire() => return self,
            _ => {}
        }
        if n % 2 == 1 || self.lo >= 0.0 {
            return Interval::new(
                power(Interval::point(self.lo), n as u32).lo,
                power(Interval::point(self.hi), n as u32).hi,
            );
        }
        if self.hi <= 0.0 {
            return (-self).powi(n);
        }
        let top = Interval::point(self.magnitude());
        Interval::new(0.0, power(top, n as u32).hi)
    }
    fn sqrt(self) -> Self {
        if self.lo < 0.0 {
            return Interval::ENTIRE;
        }
        let lo = libm::sqrt(self.lo);
        let hi = libm::sqrt(self.hi);
        Interval::new(if lo == 0.0 { 0.0 } else { down(lo) }, if hi == 0.0 { 0.0 } else { up(hi) })
    }
    fn exp(self) -> Self {
        if self.is_entire() {
            return self;
        }
        self.increasing(libm::exp).within(0.0, f64::INFINITY)
    }
    fn ln(self) -> Self {
        if self.lo <= 0.0 { Interval::ENTIRE } else { self.increasing(libm::log) }
    }
    fn sin(self) -> Self {
        self.wave(libm::sin, std::f64::consts::FRAC_PI_2)
    }
    fn cos(self) -> Self {
        self.wave(libm::cos, 0.0)
    }
    fn tan(self) -> Self {
        use std::f64::consts::{FRAC_PI_2, PI};
        let branch = |x: f64| libm::floor((x + FRAC_PI_2) / PI);
        let margin = 1e-9;
        if !self.is_bounded()
            || self.magnitude() > 1e6
            || branch(self.lo - margin) != branch(self.hi + margin)
        {
            return Interval::ENTIRE;
        }
        self.increasing(libm::tan)
    }
    fn asin(self) -> Self {
        if self.lo < -1.0 || self.hi > 1.0 {
            return Interval::ENTIRE;
        }
        self.increasing(libm::asin)
    }
    fn acos(self) -> Self {
        if self.lo < -1.0 || self.hi > 1.0 {
            return Interval::ENTIRE;
        }
        widened(libm::acos(self.hi), libm::acos(self.lo))
    }
    fn atan(self) -> Self {
        if self.is_entire() {
            return self;
        }
        self.increasing(libm::atan)
    }
    fn atan2(self, x: Self) -> Self {
        // The angle is monotone in each coordinate on a box that holds neither the origin nor the
        // cut along the negative x axis, so its extremes stand on the corners.
        if self.is_entire() || x.is_entire() {
            return Interval::ENTIRE;
        }
        let on_cut = x.lo <= 0.0 && self.contains(0.0);
        if on_cut {
            return outward(-std::f64::consts::PI, std::f64::consts::PI);
        }
        let corners = [
            libm::atan2(self.lo, x.lo),
            libm::atan2(self.lo, x.hi),
            libm::atan2(self.hi, x.lo),
            libm::atan2(self.hi, x.hi),
        ];
        let (lo, hi) =
            corners.iter().fold((corners[0], corners[0]), |(l, h), &c| (l.min(c), h.max(c)));
        widened(lo, hi)
    }
    fn hypot(self, o: Self) -> Self {
        if self.is_entire() || o.is_entire() {
            return Interval::ENTIRE;
        }
        // Rounded outward, a sum of squares may begin below zero: a length does not.
        (self.sqr() + o.sqr()).within(0.0, f64::INFINITY).sqrt()
    }
    fn abs(self) -> Self {
        if self.lo >= 0.0 || self.is_entire() {
            self
        } else if self.hi <= 0.0 {
            -self
        } else {
            Interval { lo: 0.0, hi: self.magnitude() }
        }
    }
    fn min(self, o: Self) -> Self {
        if self.is_entire() || o.is_entire() {
            return Interval::ENTIRE;
        }
        Interval { lo: self.lo.min(o.lo), hi: self.hi.min(o.hi) }
    }
    fn max(self, o: Self) -> Self {
        if self.is_entire() || o.is_entire() {
            return Interval::ENTIRE;
        }
        Interval { lo: self.lo.max(o.lo), hi: self.hi.max(o.hi) }
    }
    fn apply(self, curve: &Arc<dyn Curve>) -> Self {
        if self.is_entire() { self } else { curve.range(self) }
    }
}

/// Whole power of a point by repeated multiplication, outward.
fn power(x: Interval, n: u32) -> Interval {
    (1..n).fold(x, |product, _| product * x)
}

impl Ordered for Interval {
    fn order(&self, o: &Self) -> Option<Ordering> {
        if self.is_point() && self == o {
            Some(Ordering::Equal)
        } else if self.hi <= o.lo {
            Some(Ordering::Less)
        } else if self.lo >= o.hi {
            Some(Ordering::Greater)
        } else {
            None
        }
    }
    fn hull(self, o: Self) -> Self {
        Interval { lo: self.lo.min(o.lo), hi: self.hi.max(o.hi) }
    }
    fn known_within(self, least: f64, most: f64) -> Self {
        self.within(least, most)
    }
    fn is_zero(&self) -> bool {
        *self == Interval::ZERO
    }
}
