//! Fundamental deviations (ISO 286-1:2010, Tables 2 to 5), micrometres.
//!
//! One column a letter, one value a step of nominal size, stated for the shaft and without its sign:
//! a to h lie below the nominal size (es = −value), k to zc above it (ei = +value). Holes mirror them,
//! by the rules in the module `limits`. j and J have columns of their own. `docs/standards.md` says where
//! each column was read.

use super::class::Letters;
use super::step::Step;

/// A column of the tables.
#[derive(Debug, Clone, Copy)]
struct Column {
    /// The steps it is stated by.
    steps: Steps,
    /// The first step that has a value; one value a step follows.
    first: usize,
    /// The values, unsigned.
    um: &'static [i32],
}

/// The two divisions of the range of sizes.
#[derive(Debug, Clone, Copy)]
enum Steps {
    Main,
    Intermediate,
}

impl Column {
    const fn by_main(um: &'static [i32]) -> Self {
        Self { steps: Steps::Main, first: 0, um }
    }

    const fn by_intermediate(um: &'static [i32]) -> Self {
        Self { steps: Steps::Intermediate, first: 0, um }
    }

    /// Begins at a later intermediate step.
    const fn from(first: usize, um: &'static [i32]) -> Self {
        Self { steps: Steps::Intermediate, first, um }
    }

    fn at(self, step: Step) -> Option<i32> {
        let index = match self.steps {
            Steps::Main => step.main,
            Steps::Intermediate => step.intermediate,
        };
        self.um.get(index.checked_sub(self.first)?).copied()
    }
}

const A: Column = Column::by_intermediate(&[
    270, 270, 280, 290, 290, 300, 300, 310, 320, 340, 360, 380, 410, 460, 520, 580, 660, 740, 820,
    920, 1050, 1200, 1350, 1500, 1650,
]);
const B: Column = Column::by_intermediate(&[
    140, 140, 150, 150, 150, 160, 160, 170, 180, 190, 200, 220, 240, 260, 280, 310, 340, 380, 420,
    480, 540, 600, 680, 760, 840,
]);
const C: Column = Column::by_intermediate(&[
    60, 70, 80, 95, 95, 110, 110, 120, 130, 140, 150, 170, 180, 200, 210, 230, 240, 260, 280, 300,
    330, 360, 400, 440, 480,
]);
/// Fine mechanisms only.
const CD: Column = Column::by_main(&[34, 46, 56]);
const D: Column = Column::by_main(&[
    20, 30, 40, 50, 65, 80, 100, 120, 145, 170, 190, 210, 230, 260, 290, 320, 350, 390, 430, 480,
    520,
]);
const E: Column = Column::by_main(&[
    14, 20, 25, 32, 40, 50, 60, 72, 85, 100, 110, 125, 135, 145, 160, 170, 195, 220, 240, 260, 290,
]);
/// Fine mechanisms only.
const EF: Column = Column::by_main(&[10, 14, 18]);
const F: Column = Column::by_main(&[
    6, 10, 13, 16, 20, 25, 30, 36, 43, 50, 56, 62, 68, 76, 80, 86, 98, 110, 120, 130, 145,
]);
/// Fine mechanisms only.
const FG: Column = Column::by_main(&[4, 6, 8]);
const G: Column = Column::by_main(&[
    2, 4, 5, 6, 7, 9, 10, 12, 14, 15, 17, 18, 20, 22, 24, 26, 28, 30, 32, 34, 38,
]);
/// IT4 to IT7; the other grades begin at the nominal size, as does every k over 500 mm.
const K: Column = Column::by_main(&[0, 1, 1, 1, 2, 2, 2, 3, 3, 4, 4, 4, 5, 0, 0, 0, 0, 0, 0, 0, 0]);
const M: Column = Column::by_main(&[
    2, 4, 6, 7, 8, 9, 11, 13, 15, 17, 20, 21, 23, 26, 30, 34, 40, 48, 58, 68, 76,
]);
const N: Column = Column::by_main(&[
    4, 8, 10, 12, 15, 17, 20, 23, 27, 31, 34, 37, 40, 44, 50, 56, 66, 78, 92, 110, 135,
]);
const P: Column = Column::by_main(&[
    6, 12, 15, 18, 22, 26, 32, 37, 43, 50, 56, 62, 68, 78, 88, 100, 120, 140, 170, 195, 240,
]);
const R: Column = Column::by_intermediate(&[
    10, 15, 19, 23, 23, 28, 28, 34, 34, 41, 43, 51, 54, 63, 65, 68, 77, 80, 84, 94, 98, 108, 114,
    126, 132, 150, 155, 175, 185, 210, 220, 250, 260, 300, 330, 370, 400, 440, 460, 550, 580,
]);
const S: Column = Column::by_intermediate(&[
    14, 19, 23, 28, 28, 35, 35, 43, 43, 53, 59, 71, 79, 92, 100, 108, 122, 130, 140, 158, 170, 190,
    208, 232, 252, 280, 310, 340, 380, 430, 470, 520, 580, 640, 720, 820, 920, 1000, 1100, 1250,
    1400,
]);
/// Begins over 24 mm.
const T: Column = Column::from(
    6,
    &[
        41, 48, 54, 66, 75, 91, 104, 122, 134, 146, 166, 180, 196, 218, 240, 268, 294, 330, 360,
        400, 450, 500, 560, 620, 680, 780, 840, 960, 1050, 1200, 1350, 1500, 1650, 1900, 2100,
    ],
);
const U: Column = Column::by_intermediate(&[
    18, 23, 28, 33, 33, 41, 48, 60, 70, 87, 102, 124, 144, 170, 190, 210, 236, 258, 284, 315, 350,
    390, 435, 490, 540, 600, 660, 740, 840, 940, 1050, 1150, 1300, 1450, 1600, 1850, 2000, 2300,
    2500, 2900, 3200,
]);
/// Begins over 14 mm.
const V: Column = Column::from(
    4,
    &[
        39, 47, 55, 68, 81, 102, 120, 146, 172, 202, 228, 252, 284, 310, 340, 385, 425, 475, 530,
        595, 660,
    ],
);
const X: Column = Column::by_intermediate(&[
    20, 28, 34, 40, 45, 54, 64, 80, 97, 122, 146, 178, 210, 248, 280, 310, 350, 385, 425, 475, 525,
    590, 660, 740, 820,
]);
/// Begins over 18 mm.
const Y: Column = Column::from(
    5,
    &[
        63, 75, 94, 114, 144, 174, 214, 254, 300, 340, 380, 425, 470, 520, 580, 650, 730, 820, 920,
        1000,
    ],
);
const Z: Column = Column::by_intermediate(&[
    26, 35, 42, 50, 60, 73, 88, 112, 136, 172, 210, 258, 310, 365, 415, 465, 520, 575, 640, 710,
    790, 900, 1000, 1100, 1250,
]);
const ZA: Column = Column::by_intermediate(&[
    32, 42, 52, 64, 77, 98, 118, 148, 180, 226, 274, 335, 400, 470, 535, 600, 670, 740, 820, 920,
    1000, 1150, 1300, 1450, 1600,
]);
const ZB: Column = Column::by_intermediate(&[
    40, 50, 67, 90, 108, 136, 160, 200, 242, 300, 360, 445, 525, 620, 700, 780, 880, 960, 1050,
    1200, 1300, 1500, 1650, 1850, 2100,
]);
const ZC: Column = Column::by_intermediate(&[
    60, 80, 97, 130, 150, 188, 218, 274, 325, 405, 480, 585, 690, 800, 900, 1000, 1150, 1250, 1350,
    1550, 1700, 1900, 2100, 2400, 2600,
]);

/// The shaft j at IT5 and IT6: −ei.
const J5_J6: Column = Column::by_main(&[2, 2, 2, 3, 4, 5, 7, 9, 11, 13, 16, 18, 20]);
/// The shaft j at IT7: −ei.
const J7: Column = Column::by_main(&[4, 4, 5, 6, 8, 10, 12, 15, 18, 21, 26, 28, 32]);
/// The shaft j at IT8: −ei, up to 3 mm only.
const J8: Column = Column::by_main(&[6]);
/// The hole J at IT6: ES.
const HOLE_J6: Column = Column::by_main(&[2, 5, 5, 6, 8, 10, 13, 16, 18, 22, 25, 29, 33]);
/// The hole J at IT7: ES.
const HOLE_J7: Column = Column::by_main(&[4, 6, 8, 10, 12, 14, 18, 22, 26, 30, 36, 39, 43]);
/// The hole J at IT8: ES.
const HOLE_J8: Column = Column::by_main(&[6, 10, 12, 15, 20, 24, 28, 34, 41, 47, 55, 60, 66]);

/// Gives the distance of the tolerance interval's near limit from the nominal size; none where the
/// letter is not defined, and for js and j, which have no such column.
pub(super) fn distance(letters: Letters, step: Step) -> Option<i32> {
    let column = match letters {
        Letters::H => return Some(0),
        Letters::Js | Letters::J => return None,
        Letters::A => A,
        Letters::B => B,
        Letters::C => C,
        Letters::Cd => CD,
        Letters::D => D,
        Letters::E => E,
        Letters::Ef => EF,
        Letters::F => F,
        Letters::Fg => FG,
        Letters::G => G,
        Letters::K => K,
        Letters::M => M,
        Letters::N => N,
        Letters::P => P,
        Letters::R => R,
        Letters::S => S,
        Letters::T => T,
        Letters::U => U,
        Letters::V => V,
        Letters::X => X,
        Letters::Y => Y,
        Letters::Z => Z,
        Letters::Za => ZA,
        Letters::Zb => ZB,
        Letters::Zc => ZC,
    };
    column.at(step)
}

/// Gives −ei of the shaft j, which has a column a grade and no formula.
pub(super) fn shaft_j(grade: u8, step: Step) -> Option<i32> {
    match grade {
        5 | 6 => J5_J6.at(step),
        7 => J7.at(step),
        8 => J8.at(step),
        _ => None,
    }
}

/// Gives ES of the hole J, which has a column a grade and no formula.
pub(super) fn hole_j(grade: u8, step: Step) -> Option<i32> {
    match grade {
        6 => HOLE_J6.at(step),
        7 => HOLE_J7.at(step),
        8 => HOLE_J8.at(step),
        _ => None,
    }
}
