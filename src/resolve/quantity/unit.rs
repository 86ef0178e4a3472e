//! Units as spelled: known or not, of the right kind or not.

use super::{Context, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::resolve::context::suggest;
use crate::syntax::tree;
use crate::units::{self, Kind, Unit};

/// Spellings that mean one thing in one shop and another in the next.
const AMBIGUOUS: [(&str, &str); 4] = [
    ("mil", "a `mil` is a thousandth of an inch or a millimetre: write `thou` or `mm`"),
    ("mils", "`mils` are thousandths of an inch or millimetres: write `thou` or `mm`"),
    ("tenth", "a `tenth` is a tenth of a thou or of a millimetre: write `0.1 thou` or `0.1 mm`"),
    ("tenths", "`tenths` are of a thou or of a millimetre: write `0.1 thou` or `0.1 mm`"),
];

/// The unit of that spelling, or a finding; the nearest spelling is one of the kind expected if there
/// is any.
pub(crate) fn unit(
    cx: &mut Context,
    written: &tree::Unit,
    expect: Expect,
) -> Option<&'static Unit> {
    let spelling = written.value.as_str();
    if let Some(unit) = units::find(spelling) {
        return Some(unit);
    }
    if let Some((_, help)) = AMBIGUOUS.iter().find(|(name, _)| *name == spelling) {
        return cx.refuse(
            Diagnostic::new(
                Code::AmbiguousUnit,
                written.span,
                format!("`{spelling}` means different lengths to different people"),
            )
            .help(*help),
        );
    }
    let mut finding =
        Diagnostic::new(Code::UnknownUnit, written.span, format!("unknown unit `{spelling}`"));
    let spellings = |fits: &dyn Fn(&Unit) -> bool| -> Vec<&'static str> {
        let units = units::all().filter(|unit| !unit.name.is_empty() && fits(unit));
        units.flat_map(|u| std::iter::once(u.name).chain(u.spellings.iter().copied())).collect()
    };
    let near = suggest(spelling, spellings(&|unit| measures(unit, expect)))
        .or_else(|| suggest(spelling, spellings(&|_| true)));
    if let Some(near) = near {
        finding = finding.help(format!("did you mean `{near}`?"));
    }
    cx.refuse(finding)
}

/// The unit of that spelling, if it measures what is expected; else a finding.
pub(crate) fn unit_for(
    cx: &mut Context,
    written: &tree::Unit,
    expect: Expect,
) -> Option<&'static Unit> {
    let unit = unit(cx, written, expect)?;
    if measures(unit, expect) {
        return Some(unit);
    }
    // The grade of a class is easily forgotten, and `42 K` is then a temperature.
    let letters = written.value.as_str();
    let finding = wrong_kind(written, unit, expect.kind());
    let a_class = expect == Expect::Size && letters.len() == 1 && unit.kind == Kind::TEMPERATURE;
    cx.refuse(match a_class {
        true => finding.help(format!("a class needs its grade, as `{letters}6`")),
        false => finding,
    })
}

/// True where a unit measures what is expected; temperatures and their differences share units.
pub(super) fn measures(unit: &Unit, expect: Expect) -> bool {
    let wanted = expect.kind();
    let of_temperature = |k: Kind| k == Kind::TEMPERATURE || k == Kind::DIFFERENCE;
    unit.kind == wanted
        || of_temperature(unit.kind) && of_temperature(wanted)
        || Kind { tag: wanted.tag, ..unit.kind } == wanted && unit.kind == Kind::TORQUE
}

/// A unit that measures something else than is expected.
pub(crate) fn wrong_kind(written: &tree::Unit, unit: &Unit, expected: Kind) -> Diagnostic {
    let finding = Diagnostic::new(
        Code::WrongKind,
        written.span,
        format!(
            "expected {}, found `{}`, a unit of {}",
            with_article(expected),
            written.value,
            unit.kind.word()
        ),
    );
    let scale = if expected == Kind::DIFFERENCE { Kind::TEMPERATURE } else { expected };
    let known: Vec<String> = units::all()
        .filter(|unit| unit.kind == scale && !unit.name.is_empty())
        .map(|unit| format!("`{}`", unit.name))
        .collect();
    match known.split_last() {
        Some((last, [])) => finding.help(format!("its unit is {last}")),
        Some((last, rest)) => finding.help(format!("its units are {} and {last}", rest.join(", "))),
        None => finding,
    }
}

/// `a length`, `an angle`.
pub(crate) fn with_article(kind: Kind) -> String {
    let word = kind.word();
    let article = if word.starts_with(['a', 'e', 'i', 'o', 'u']) { "an" } else { "a" };
    format!("{article} {word}")
}
