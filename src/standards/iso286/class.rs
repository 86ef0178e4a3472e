//! The designation of a tolerance class: letters, and the number of a grade (ISO 286-1:2010, 4.2).

use std::fmt;

/// On which side of the material a feature of size lies.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Kind {
    /// An internal feature: a bore, a slot. Upper case.
    Hole,
    /// An external feature: a shaft, a key. Lower case.
    Shaft,
}

/// The identifier of a fundamental deviation, of the hole and of the shaft alike.
///
/// i, l, o, q and w are not used, so that none is read as a figure.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
#[expect(missing_docs, reason = "the letters are their own names")]
pub enum Letters {
    A,
    B,
    C,
    Cd,
    D,
    E,
    Ef,
    F,
    Fg,
    G,
    H,
    Js,
    J,
    K,
    M,
    N,
    P,
    R,
    S,
    T,
    U,
    V,
    X,
    Y,
    Z,
    Za,
    Zb,
    Zc,
}

impl Letters {
    /// All of them, from the loosest fit to the tightest.
    pub const ALL: [Letters; 28] = [
        Letters::A,
        Letters::B,
        Letters::C,
        Letters::Cd,
        Letters::D,
        Letters::E,
        Letters::Ef,
        Letters::F,
        Letters::Fg,
        Letters::G,
        Letters::H,
        Letters::Js,
        Letters::J,
        Letters::K,
        Letters::M,
        Letters::N,
        Letters::P,
        Letters::R,
        Letters::S,
        Letters::T,
        Letters::U,
        Letters::V,
        Letters::X,
        Letters::Y,
        Letters::Z,
        Letters::Za,
        Letters::Zb,
        Letters::Zc,
    ];

    /// Spells the letters as for a shaft, in lower case.
    pub fn lower(self) -> &'static str {
        [
            "a", "b", "c", "cd", "d", "e", "ef", "f", "fg", "g", "h", "js", "j", "k", "m", "n",
            "p", "r", "s", "t", "u", "v", "x", "y", "z", "za", "zb", "zc",
        ][self as usize]
    }
}

/// A standard tolerance grade, IT01 to IT18.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub struct Grade {
    /// 0 for IT01, 1 for IT0, n + 1 for ITn.
    column: u8,
}

impl Grade {
    /// The finest grade.
    pub const IT01: Grade = Grade { column: 0 };
    /// The grade between IT01 and IT1.
    pub const IT0: Grade = Grade { column: 1 };

    /// Makes ITn; n is held to 1 to 18.
    pub const fn it(n: u8) -> Self {
        let n = if n < 1 {
            1
        } else if n > 18 {
            18
        } else {
            n
        };
        Self { column: n + 1 }
    }

    /// Gives all grades, finest first.
    pub fn all() -> impl DoubleEndedIterator<Item = Grade> + Clone {
        (0..20).map(|column| Grade { column })
    }

    /// Gives n of ITn; 0 for IT0 and IT01, to which no rule about numbers applies.
    pub const fn number(self) -> u8 {
        self.column.saturating_sub(1)
    }

    /// Gives its column in the table of standard tolerances.
    pub(super) const fn column(self) -> usize {
        self.column as usize
    }

    fn parse(figures: &str) -> Option<Self> {
        Self::all().find(|grade| grade.figures() == figures)
    }

    fn figures(self) -> &'static str {
        [
            "01", "0", "1", "2", "3", "4", "5", "6", "7", "8", "9", "10", "11", "12", "13", "14",
            "15", "16", "17", "18",
        ][self.column()]
    }
}

impl fmt::Display for Grade {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "IT{}", self.figures())
    }
}

/// A tolerance class such as `H7` or `js6`.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub struct Class {
    /// Hole or shaft: the case of the letters.
    pub kind: Kind,
    /// The fundamental deviation.
    pub letters: Letters,
    /// The standard tolerance grade.
    pub grade: Grade,
}

impl Class {
    /// Makes the class of a hole at ITn.
    pub const fn hole(letters: Letters, n: u8) -> Self {
        Self { kind: Kind::Hole, letters, grade: Grade::it(n) }
    }

    /// Makes the class of a shaft at ITn.
    pub const fn shaft(letters: Letters, n: u8) -> Self {
        Self { kind: Kind::Shaft, letters, grade: Grade::it(n) }
    }

    /// Reads a class as a drawing spells it: upper case for a hole, lower case for a shaft.
    ///
    /// # Errors
    /// Says what is wrong with the spelling; whether the class is defined at a size is another
    /// question, which [`Class::limits`] answers.
    pub fn parse(text: &str) -> Result<Self, Misspelling> {
        let split = text.find(|c: char| !c.is_ascii_alphabetic()).unwrap_or(text.len());
        let (letters, figures) = text.split_at(split);
        if letters.is_empty() {
            return Err(Misspelling::NoLetters);
        }
        let found = Letters::ALL
            .into_iter()
            .find(|known| known.lower().eq_ignore_ascii_case(letters))
            .ok_or_else(|| Misspelling::UnknownLetters(letters.to_owned()))?;
        let kind = if letters.bytes().all(|b| b.is_ascii_uppercase()) {
            Kind::Hole
        } else if letters.bytes().all(|b| b.is_ascii_lowercase()) {
            Kind::Shaft
        } else {
            return Err(Misspelling::MixedCase(found));
        };
        if figures.is_empty() {
            return Err(Misspelling::NoGrade(letters.to_owned()));
        }
        let grade =
            Grade::parse(figures).ok_or_else(|| Misspelling::UnknownGrade(figures.to_owned()))?;
        Ok(Self { kind, letters: found, grade })
    }
}

impl fmt::Display for Class {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self.kind {
            Kind::Hole => write!(f, "{}", self.letters.lower().to_ascii_uppercase())?,
            Kind::Shaft => write!(f, "{}", self.letters.lower())?,
        }
        write!(f, "{}", self.grade.figures())
    }
}

/// What is wrong with the spelling of a class.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Misspelling {
    /// It does not begin with letters.
    NoLetters,
    /// No fundamental deviation has this name.
    UnknownLetters(String),
    /// Two letters differ in case, so that it is not clear whether a hole or a shaft is meant.
    MixedCase(Letters),
    /// The number of the grade is missing.
    NoGrade(String),
    /// No grade has this number.
    UnknownGrade(String),
}

impl Misspelling {
    /// Says what would be right.
    pub fn help(&self) -> String {
        match self {
            Self::NoLetters | Self::NoGrade(_) => {
                "letters and grade stand together, as in `H7` or `g6`".to_owned()
            }
            Self::UnknownLetters(_) => {
                "fundamental deviations are a, b, c, cd, d, e, ef, f, fg, g, h, js, j, k, m, n, p, \
                 r, s, t, u, v, x, y, z, za, zb and zc, in upper case for a hole"
                    .to_owned()
            }
            Self::MixedCase(letters) => {
                let lower = letters.lower();
                let upper = lower.to_ascii_uppercase();
                format!("write `{upper}` for a hole, `{lower}` for a shaft")
            }
            Self::UnknownGrade(_) => "grades are 01, 0 and 1 to 18".to_owned(),
        }
    }
}

impl fmt::Display for Misspelling {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::NoLetters => write!(f, "expected the letters of a tolerance class"),
            Self::UnknownLetters(letters) => {
                write!(f, "`{letters}` is not a fundamental deviation of ISO 286-1")
            }
            Self::MixedCase(letters) => write!(
                f,
                "the letters `{}` of a tolerance class are written in one case",
                letters.lower()
            ),
            Self::NoGrade(letters) => write!(f, "expected a grade after `{letters}`"),
            Self::UnknownGrade(figures) => {
                write!(f, "`{figures}` is not a standard tolerance grade of ISO 286-1")
            }
        }
    }
}

impl std::error::Error for Misspelling {}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_class_reads_back_as_it_is_written() {
        for kind in [Kind::Hole, Kind::Shaft] {
            for letters in Letters::ALL {
                for grade in Grade::all() {
                    let class = Class { kind, letters, grade };
                    assert_eq!(Class::parse(&class.to_string()), Ok(class));
                }
            }
        }
    }

    #[test]
    fn case_tells_a_hole_from_a_shaft() {
        assert_eq!(Class::parse("H7"), Ok(Class::hole(Letters::H, 7)));
        assert_eq!(Class::parse("za11"), Ok(Class::shaft(Letters::Za, 11)));
        assert_eq!(Class::parse("Js6"), Err(Misspelling::MixedCase(Letters::Js)));
        assert_eq!(Class::parse("zC8"), Err(Misspelling::MixedCase(Letters::Zc)));
    }

    #[test]
    fn a_misspelling_is_named() {
        assert_eq!(Class::parse(""), Err(Misspelling::NoLetters));
        assert_eq!(Class::parse("7H"), Err(Misspelling::NoLetters));
        assert_eq!(Class::parse("W7"), Err(Misspelling::UnknownLetters("W".to_owned())));
        assert_eq!(Class::parse("H"), Err(Misspelling::NoGrade("H".to_owned())));
        for figures in ["07", "19", "7.0", "7 ", "-1", "00"] {
            let expected = Err(Misspelling::UnknownGrade(figures.to_owned()));
            assert_eq!(Class::parse(&format!("H{figures}")), expected);
        }
    }
}
