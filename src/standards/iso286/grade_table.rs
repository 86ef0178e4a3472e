//! Standard tolerances (ISO 286-1:2010, Table 1).
//!
//! One row a main step of nominal size, one column a grade, as the standard prints them. IT01 to IT16 up
//! to 500 mm and IT5 to IT11 over 500 mm were read in print. IT17 and IT18, and over 500 mm IT1 to IT4
//! and IT12 to IT18, are from memory; the formulas of the standard and its rule of five grades hold them.

use super::class::Grade;
use super::step::{MAIN_TO_500, Step};
use crate::standards::Micrometres;

/// IT01 and IT0, tenths of a micrometre; provided up to 500 mm.
const FINEST: [[i32; 2]; MAIN_TO_500] = [
    [3, 5],
    [4, 6],
    [4, 6],
    [5, 8],
    [6, 10],
    [6, 10],
    [8, 12],
    [10, 15],
    [12, 20],
    [20, 30],
    [25, 40],
    [30, 50],
    [40, 60],
];

/// IT1 to IT3, tenths of a micrometre.
const FINE: [[i32; 3]; 21] = [
    [8, 12, 20],
    [10, 15, 25],
    [10, 15, 25],
    [12, 20, 30],
    [15, 25, 40],
    [15, 25, 40],
    [20, 30, 50],
    [25, 40, 60],
    [35, 50, 80],
    [45, 70, 100],
    [60, 80, 120],
    [70, 90, 130],
    [80, 100, 150],
    [90, 110, 160],
    [100, 130, 180],
    [110, 150, 210],
    [130, 180, 240],
    [150, 210, 290],
    [180, 250, 350],
    [220, 300, 410],
    [260, 360, 500],
];

/// IT4 to IT18, micrometres.
#[rustfmt::skip]
const COARSE: [[i32; 15]; 21] = [
    [ 3,  4,   6,  10,  14,  25,  40,   60,  100,  140,  250,  400,   600,  1000,  1400], // to 3
    [ 4,  5,   8,  12,  18,  30,  48,   75,  120,  180,  300,  480,   750,  1200,  1800], // to 6
    [ 4,  6,   9,  15,  22,  36,  58,   90,  150,  220,  360,  580,   900,  1500,  2200], // to 10
    [ 5,  8,  11,  18,  27,  43,  70,  110,  180,  270,  430,  700,  1100,  1800,  2700], // to 18
    [ 6,  9,  13,  21,  33,  52,  84,  130,  210,  330,  520,  840,  1300,  2100,  3300], // to 30
    [ 7, 11,  16,  25,  39,  62, 100,  160,  250,  390,  620, 1000,  1600,  2500,  3900], // to 50
    [ 8, 13,  19,  30,  46,  74, 120,  190,  300,  460,  740, 1200,  1900,  3000,  4600], // to 80
    [10, 15,  22,  35,  54,  87, 140,  220,  350,  540,  870, 1400,  2200,  3500,  5400], // to 120
    [12, 18,  25,  40,  63, 100, 160,  250,  400,  630, 1000, 1600,  2500,  4000,  6300], // to 180
    [14, 20,  29,  46,  72, 115, 185,  290,  460,  720, 1150, 1850,  2900,  4600,  7200], // to 250
    [16, 23,  32,  52,  81, 130, 210,  320,  520,  810, 1300, 2100,  3200,  5200,  8100], // to 315
    [18, 25,  36,  57,  89, 140, 230,  360,  570,  890, 1400, 2300,  3600,  5700,  8900], // to 400
    [20, 27,  40,  63,  97, 155, 250,  400,  630,  970, 1550, 2500,  4000,  6300,  9700], // to 500
    [22, 32,  44,  70, 110, 175, 280,  440,  700, 1100, 1750, 2800,  4400,  7000, 11000], // to 630
    [25, 36,  50,  80, 125, 200, 320,  500,  800, 1250, 2000, 3200,  5000,  8000, 12500], // to 800
    [28, 40,  56,  90, 140, 230, 360,  560,  900, 1400, 2300, 3600,  5600,  9000, 14000], // to 1000
    [33, 47,  66, 105, 165, 260, 420,  660, 1050, 1650, 2600, 4200,  6600, 10500, 16500], // to 1250
    [39, 55,  78, 125, 195, 310, 500,  780, 1250, 1950, 3100, 5000,  7800, 12500, 19500], // to 1600
    [46, 65,  92, 150, 230, 370, 600,  920, 1500, 2300, 3700, 6000,  9200, 15000, 23000], // to 2000
    [55, 78, 110, 175, 280, 440, 700, 1100, 1750, 2800, 4400, 7000, 11000, 17500, 28000], // to 2500
    [68, 96, 135, 210, 330, 540, 860, 1350, 2100, 3300, 5400, 8600, 13500, 21000, 33000], // to 3150
];

/// Gives the tolerance of a grade at a step; none where the standard provides none.
///
/// IT01 and IT0 end at 500 mm; IT14 to IT18 are not used up to 1 mm (footnotes of Table 1).
pub(super) fn tolerance(grade: Grade, step: Step) -> Option<Micrometres> {
    if grade >= Grade::it(14) && step.to_one_mm {
        return None;
    }
    match grade.column() {
        column @ 0..=1 => {
            let row = FINEST.get(step.main)?;
            Some(Micrometres::tenths(row[column]))
        }
        column @ 2..=4 => Some(Micrometres::tenths(FINE[step.main][column - 2])),
        column => Some(Micrometres::whole(COARSE[step.main][column - 5])),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn at(nominal: f64, grade: Grade) -> Option<f64> {
        Some(tolerance(grade, Step::of(nominal)?)?.um())
    }

    #[test]
    fn each_grade_stands_in_its_column() {
        // ISO 286-1, Table 1, as printed in Narayana et al., Machine Drawing, Table 15.1.
        assert_eq!(at(60.0, Grade::IT01), Some(0.8));
        assert_eq!(at(60.0, Grade::IT0), Some(1.2));
        assert_eq!(at(60.0, Grade::it(1)), Some(2.0));
        assert_eq!(at(60.0, Grade::it(3)), Some(5.0));
        assert_eq!(at(60.0, Grade::it(4)), Some(8.0));
        assert_eq!(at(60.0, Grade::it(7)), Some(30.0));
        assert_eq!(at(60.0, Grade::it(16)), Some(1900.0));
    }

    #[test]
    fn a_tolerance_grows_with_grade_and_size() {
        let sizes = super::super::step::MAIN.map(f64::from);
        for grade in Grade::all() {
            let column: Vec<f64> = sizes.iter().filter_map(|&d| at(d, grade)).collect();
            assert!(column.is_sorted(), "{grade}");
        }
        for size in sizes {
            let row: Vec<f64> = Grade::all().filter_map(|grade| at(size, grade)).collect();
            assert!(row.windows(2).all(|pair| pair[0] < pair[1]), "{size} mm");
        }
    }

    #[test]
    fn five_grades_from_it6_multiply_a_tolerance_by_ten() {
        // ISO 286-1, the rule by which the series continues; IT6 at 3 to 6 mm alone was rounded up
        // to 8 from 7.5.
        for size in super::super::step::MAIN.map(f64::from) {
            for n in 6..=13 {
                let (fine, coarse) = (at(size, Grade::it(n)), at(size, Grade::it(n + 5)));
                let exact = fine.map(|um| 10.0 * um);
                if size == 6.0 && n == 6 {
                    assert_eq!((fine, coarse), (Some(8.0), Some(75.0)));
                } else {
                    assert_eq!(coarse, exact, "IT{n} at {size} mm");
                }
            }
        }
    }
}
