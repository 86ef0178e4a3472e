//! Classes and fits to choose first (ISO 286-1:2010, clause 5; ANSI B4.2-1978).
//!
//! A small choice of classes keeps tools and gauges few. The choice of ISO 286-1 (its figures of
//! recommended hole and shaft classes) is from memory; the fits of ANSI B4.2 were read in print.

use super::class::{Class, Letters};

macro_rules! classes {
    ($make:ident: $($letters:ident $n:literal),+ $(,)?) => {
        &[$(Class::$make(Letters::$letters, $n)),+]
    };
}

/// The recommended hole classes, the finest grade first.
pub const HOLES: &[Class] = classes!(hole:
    G 6, H 6, Js 6, K 6, M 6, N 6, P 6, R 6, S 6, T 6,
    F 7, G 7, H 7, Js 7, K 7, M 7, N 7, P 7, R 7, S 7, T 7, U 7, X 7,
    E 8, F 8, H 8, Js 8, K 8, M 8, N 8, P 8, R 8,
    D 9, E 9, F 9, H 9,
    D 10, E 10, H 10,
    A 11, B 11, C 11, D 11, H 11,
);

/// The recommended shaft classes, the finest grade first.
pub const SHAFTS: &[Class] = classes!(shaft:
    G 5, H 5, Js 5, K 5, M 5, N 5, P 5, R 5, S 5, T 5,
    F 6, G 6, H 6, Js 6, K 6, M 6, N 6, P 6, R 6, S 6, T 6, U 6, X 6,
    E 7, F 7, H 7, Js 7, K 7, M 7, N 7, P 7, R 7, S 7, T 7, U 7,
    D 8, E 8, F 8, H 8,
    D 9, E 9, H 9,
    D 10,
    A 11, B 11, C 11, H 11,
);

/// The hole classes to choose first among the recommended ones.
pub const PREFERRED_HOLES: &[Class] = classes!(hole:
    G 7, H 7, Js 7, K 7, N 7, P 7, R 7, S 7,
    F 8, H 8,
    E 9, H 9,
    D 10,
    A 11, B 11, C 11, H 11,
);

/// The shaft classes to choose first among the recommended ones.
pub const PREFERRED_SHAFTS: &[Class] = classes!(shaft:
    G 6, H 6, Js 6, K 6, N 6, P 6, R 6, S 6,
    F 7, H 7,
    E 8,
    D 9, H 9,
    A 11, B 11, C 11, H 11,
);

/// The shafts of the hole-basis fits of ANSI B4.2, from loose running to force, each with the grade
/// of its hole H.
const HOLE_BASIS: [(u8, Class); 10] = [
    (11, Class::shaft(Letters::C, 11)),
    (9, Class::shaft(Letters::D, 9)),
    (8, Class::shaft(Letters::F, 7)),
    (7, Class::shaft(Letters::G, 6)),
    (7, Class::shaft(Letters::H, 6)),
    (7, Class::shaft(Letters::K, 6)),
    (7, Class::shaft(Letters::N, 6)),
    (7, Class::shaft(Letters::P, 6)),
    (7, Class::shaft(Letters::S, 6)),
    (7, Class::shaft(Letters::U, 6)),
];

/// The holes of the shaft-basis fits of ANSI B4.2, each with the grade of its shaft h.
const SHAFT_BASIS: [(Class, u8); 10] = [
    (Class::hole(Letters::C, 11), 11),
    (Class::hole(Letters::D, 9), 9),
    (Class::hole(Letters::F, 8), 7),
    (Class::hole(Letters::G, 7), 6),
    (Class::hole(Letters::H, 7), 6),
    (Class::hole(Letters::K, 7), 6),
    (Class::hole(Letters::N, 7), 6),
    (Class::hole(Letters::P, 7), 6),
    (Class::hole(Letters::S, 7), 6),
    (Class::hole(Letters::U, 7), 6),
];

/// Gives the preferred hole-basis fits of ANSI B4.2 as hole and shaft, loosest first.
pub fn hole_basis_fits() -> impl Iterator<Item = (Class, Class)> {
    HOLE_BASIS.into_iter().map(|(n, shaft)| (Class::hole(Letters::H, n), shaft))
}

/// Gives the preferred shaft-basis fits of ANSI B4.2 as hole and shaft, loosest first.
pub fn shaft_basis_fits() -> impl Iterator<Item = (Class, Class)> {
    SHAFT_BASIS.into_iter().map(|(hole, n)| (hole, Class::shaft(Letters::H, n)))
}

/// Gives all preferred fits of ANSI B4.2, those of the hole basis first.
pub fn preferred_fits() -> impl Iterator<Item = (Class, Class)> {
    hole_basis_fits().chain(shaft_basis_fits())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_is_preferred_is_recommended() {
        assert!(PREFERRED_HOLES.iter().all(|class| HOLES.contains(class)));
        assert!(PREFERRED_SHAFTS.iter().all(|class| SHAFTS.contains(class)));
    }

    #[test]
    fn every_recommended_class_is_defined_at_a_middling_size() {
        for class in HOLES.iter().chain(SHAFTS) {
            assert!(class.limits(40.0).is_ok(), "{class}");
        }
    }
}
