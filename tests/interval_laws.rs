//! The interval arithmetic against exact results of mpmath; the cases are made and checked by
//! `tests/scripts/interval_laws.py`.

use gapkeep::numeric::{Dual, Interval, Number};

type Case = (String, Vec<String>, Vec<String>, String, String);

fn double(bits: &str) -> f64 {
    f64::from_bits(u64::from_str_radix(bits, 16).unwrap())
}

fn interval(ends: &[String]) -> Interval {
    Interval::new(double(&ends[0]), double(&ends[1]))
}

fn run(name: &str, x: Interval, y: Option<Interval>) -> Interval {
    let y = || y.expect("a second operand");
    match name {
        "add" => x + y(),
        "sub" => x - y(),
        "mul" => x * y(),
        "div" => x / y(),
        "atan2" => x.atan2(y()),
        "hypot" => x.hypot(y()),
        "sqrt" => x.sqrt(),
        "exp" => x.exp(),
        "ln" => x.ln(),
        "sin" => x.sin(),
        "cos" => x.cos(),
        "tan" => x.tan(),
        "asin" => x.asin(),
        "acos" => x.acos(),
        "atan" => x.atan(),
        "sqr" => x.sqr(),
        "cube" => x.powi(3),
        "inverse-square" => x.powi(-2),
        "two-thirds" => x.pow(0.66),
        other => panic!("no operation {other}"),
    }
}

#[test]
fn the_middle_is_finite_whatever_the_ends() {
    let (inf, max) = (f64::INFINITY, f64::MAX);
    for (lo, hi) in [(inf, inf), (max, inf), (-inf, -inf), (-inf, 3.0), (3.0, inf), (-max, max)] {
        let mid = Interval::new(lo, hi).mid();
        assert!(mid.is_finite(), "{lo} {hi}: {mid}");
        assert!(lo <= mid && mid <= hi || lo.is_infinite() && lo == hi, "{lo} {hi}: {mid}");
    }
}

#[test]
fn interval_results_hold_the_exact_ones() {
    let cases: Vec<Case> = serde_json::from_str(include_str!("data/interval_laws.json")).unwrap();
    assert!(cases.len() > 2000);
    for (name, first, second, below, above) in &cases {
        let x = interval(first);
        let y = (!second.is_empty()).then(|| interval(second));
        let result = run(name, x, y);
        assert!(
            result.lo() <= double(below) && double(above) <= result.hi(),
            "{name} {x:?} {y:?} = {result:?} does not hold {}",
            double(below)
        );
        let points = x.is_point() && y.is_none_or(Interval::is_point);
        if points {
            let allowed = 40.0 * f64::EPSILON * result.magnitude().max(f64::MIN_POSITIVE);
            assert!(result.width() <= allowed, "{name} {x:?} {y:?} = {result:?} is too wide");
        }
    }
}

/// Derivatives over intervals hold central differences of the same formula in doubles.
#[test]
fn the_slope_over_an_interval_holds_every_slope() {
    fn formula<N: Number>(x: N) -> N {
        let inner = (x.clone() * 0.7).sin() * x.clone().exp() + x.clone().powi(3) / 7.0;
        (inner.sqr() + 1.0).sqrt().atan() + x.clone().tan() * x.ln()
    }
    let x = Interval::new(0.5, 0.9);
    let slope = formula(Dual::variable(x)).slope;
    for i in 0..=100 {
        let at = 0.5 + 0.4 * f64::from(i) / 100.0;
        let exact = formula(Dual::variable(at)).slope;
        let h = 1e-6;
        let difference = (formula(at + h) - formula(at - h)) / (2.0 * h);
        assert!((exact - difference).abs() < 1e-7 * exact.abs().max(1.0));
        assert!(slope.contains(exact), "{slope:?} does not hold {exact} at {at}");
    }
}

#[test]
fn the_slope_of_a_length_is_bounded_where_the_length_may_be_zero() {
    let slope = |x: Interval, y: Interval| Dual::variable(x).hypot(Dual::constant(y)).slope;
    let y = Interval::new(-2.0, 3.0);
    assert!(slope(Interval::new(-1.0, 1.0), y) == Interval::new(-1.0, 1.0));
    // A side that is not negative cannot make the length fall.
    assert!(slope(Interval::new(0.0, 1.0), y) == Interval::new(0.0, 1.0));
    assert!(slope(Interval::new(-1.0, 0.0), y) == Interval::new(-1.0, 0.0));
    assert!(slope(Interval::ZERO, Interval::ZERO) == Interval::new(-1.0, 1.0));
    assert!(slope(Interval::point(3.0), Interval::point(4.0)).contains(0.6));
    assert_eq!(Dual::variable(3.0).hypot(Dual::constant(4.0)).slope, 0.6);
    assert_eq!(Dual::variable(0.0).hypot(Dual::constant(0.0)).slope, 0.0);
    // Of the slope's own slope nothing is known there, which it must say.
    let twice = Dual::variable(Dual::variable(Interval::new(-1.0, 1.0)));
    let zero = Dual::constant(Dual::constant(Interval::ZERO));
    assert_eq!(twice.hypot(zero).slope.slope, Interval::ENTIRE);
}

#[test]
fn what_is_undefined_stays_so_whatever_comes_after() {
    // √x − 1 … has no value for some of x: no later operation may make a bound of it.
    let nothing = Interval::new(-1.0, 4.0).sqrt();
    assert_eq!(nothing, Interval::ENTIRE);
    let one = Interval::point(1.0);
    for (name, result) in [
        ("sin", nothing.sin()),
        ("cos", nothing.cos()),
        ("atan", nothing.atan()),
        ("exp", nothing.exp()),
        ("sqr", nothing.sqr()),
        ("abs", Number::abs(nothing)),
        ("min", Number::min(nothing, one)),
        ("min of the other", Number::min(one, nothing)),
        ("max", Number::max(nothing, one)),
        ("max of the other", Number::max(one, nothing)),
        ("atan2", nothing.atan2(one)),
        ("atan2 of the other", one.atan2(nothing)),
        ("hypot", nothing.hypot(one)),
        ("hypot of the other", one.hypot(nothing)),
    ] {
        assert_eq!(result, Interval::ENTIRE, "{name}");
    }
}
