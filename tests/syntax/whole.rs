//! Whole specs: nothing is reported, nothing is lost, and each place is where its words are.

use super::{all_specs, findings, read, specs};
use gapkeep::syntax::tree::{ExprKind, Material, Part, PropertyValue, Size, Statement};

#[test]
fn specs_parse_without_a_word() {
    for (name, text) in all_specs() {
        assert_eq!(findings(&text), "", "{name}");
        assert!(read(&text).tree.broken.is_empty(), "{name}");
    }
}

#[test]
fn places_hold_the_words_they_are_the_places_of() {
    for (name, text) in specs() {
        for statement in read(&text).tree.statements {
            let span = statement.span();
            let words = &text[span.range()];
            assert_eq!(words, words.trim(), "{name}");
            let Statement::Part(part) = statement else { continue };
            for dimension in part.dimensions {
                assert_eq!(text[dimension.name.span.range()], dimension.name.value, "{name}");
                let line = &text[dimension.span.range()];
                assert!(
                    line.starts_with(&dimension.name.value) && line.trim() == line,
                    "{name}: {line}"
                );
                let size = &text[dimension.size.span.range()];
                assert!(size.trim() == size && !size.contains('#'), "{name}: {size}");
            }
        }
    }
}

fn statements(text: &str) -> Vec<Statement> {
    assert_eq!(findings(text), "");
    read(text).tree.statements
}

fn part(lines: &str) -> Part {
    match statements(&format!("part p of m {{\n{lines}\n}}")).pop() {
        Some(Statement::Part(part)) => part,
        other => panic!("expected a part, found {other:?}"),
    }
}

#[test]
fn a_class_comes_before_a_unit() {
    let part = part(
        "a = 42 K6\nb = 42K\nc = 20 m6\nd = 20 m\ne = 20e8\nf = 20 e8\ng = 5 i6\nh = 42 mm H7",
    );
    let sizes: Vec<String> = part
        .dimensions
        .iter()
        .map(|dimension| match &dimension.size.value {
            Size::Class(value, class) => format!("{} class {}", value.number.text, class.value),
            Size::General(value) => {
                format!(
                    "{} unit {}",
                    value.number.text,
                    value.unit.as_ref().map_or("-", |unit| &unit.value)
                )
            }
            other => format!("{other:?}"),
        })
        .collect();
    let expected = [
        "42 class K6",
        "42 unit K",
        "20 class m6",
        "20 unit m",
        "20 class e8",
        "20 class e8",
        "5 unit i6",
        "42 class H7",
    ];
    assert_eq!(sizes, expected);
}

#[test]
fn two_dots_make_a_range_and_a_sign_an_exponent() {
    let part = part("a = 0..5\nb = 0...5\nc = 1e-6\nd = 1.5E+2\ne = −3 ±.5");
    let values: Vec<Vec<f64>> = part
        .dimensions
        .iter()
        .map(|dimension| match &dimension.size.value {
            Size::Limits(range) => vec![range.low.number.value, range.high.number.value],
            Size::General(value) | Size::Toleranced(value, _) => vec![value.number.value],
            other => panic!("unexpected {other:?}"),
        })
        .collect();
    assert_eq!(values, [vec![0.0, 5.0], vec![0.0, 0.5], vec![1e-6], vec![150.0], vec![-3.0]]);
}

#[test]
fn numbers_keep_their_spelling() {
    let part = part("a = 58.00 .. 58.050\nb = 12");
    let Size::Limits(range) = &part.dimensions[0].size.value else { panic!("limits") };
    assert_eq!((range.low.number.text.as_str(), range.low.number.decimals()), ("58.00", 2));
    assert_eq!((range.high.number.text.as_str(), range.high.number.decimals()), ("58.050", 3));
}

/// An expression with all of its parentheses.
fn shown(expr: &gapkeep::syntax::tree::Expr) -> String {
    match &expr.kind {
        ExprKind::Constant(scalar) => {
            format!("{}{}", scalar.number.text, scalar.unit.as_ref().map_or("", |unit| &unit.value))
        }
        ExprKind::Path(path) => match &path.owner {
            Some(owner) => format!("{}.{}", owner.value, path.name.value),
            None => path.name.value.clone(),
        },
        ExprKind::Pieces(count, path) => format!("{}x{}", count.value, path.name.value),
        ExprKind::Negate(inner) => format!("(-{})", shown(inner)),
        ExprKind::Chain(first, rest) => {
            let rest: String = rest
                .iter()
                .map(|(operator, term)| format!(" {:?} {}", operator.value, shown(term)))
                .collect();
            format!("({}{rest})", shown(first))
        }
        ExprKind::Power(base, exponent) => format!("({}^{})", shown(base), shown(exponent)),
        ExprKind::Call { function, arguments, from } => {
            let arguments: Vec<String> = arguments.iter().map(shown).collect();
            let from = from.as_ref().map_or(String::new(), |from| format!(" from {}", from.value));
            format!("{}[{}{from}]", function.value, arguments.join(", "))
        }
        ExprKind::Parenthesised(inner) => shown(inner),
        ExprKind::After(inner, fit) => format!("({} after {})", shown(inner), fit.value),
    }
}

#[test]
fn operators_bind_as_in_a_formula() {
    let cases = [
        ("-x^2", "(-(x^2))"),
        ("a - b/c*d + -e", "(a Subtract (b Divide c Multiply d) Add (-e))"),
        ("2x a.b - 2 * c", "(2xb Subtract (2 Multiply c))"),
        ("a^-2", "(a^(-2))"),
        ("(a - b) / 2.5 mm", "((a Subtract b) Divide 2.5mm)"),
        ("a/2", "(a Divide 2)"),
        ("2.5 mm/2", "(2.5mm Divide 2)"),
        ("2.5 mm * tan(3 deg)", "(2.5mm Multiply tan[3deg])"),
        ("23 ppm/K", "23ppm/K"),
        ("change(a.b/2 from room)", "change[(a.b Divide 2) from room]"),
        ("(a.b after seat) - a.b", "((a.b after seat) Subtract a.b)"),
        ("3 × a · b − c", "((3 Multiply a Multiply b) Subtract c)"),
    ];
    for (text, expected) in cases {
        let Some(Statement::Let(line)) = statements(&format!("let v = {text}")).pop() else {
            panic!("{text}")
        };
        assert_eq!(shown(&line.expr), expected, "{text}");
        assert_eq!(line.expr.span.len(), text.len(), "{text}");
    }
}

#[test]
fn inch_is_a_unit_after_a_number_and_a_word_elsewhere() {
    let text = "lengths in inch\npart p of m { a = .045 in because \"b\" }\nfit f = p.a in q.a\nfit g = (p.a + 2 in) in q.a\ngap s = p.a { require stress in p <= 3 MPa }";
    assert_eq!(findings(text), "");
}

#[test]
fn blanks_line_ends_and_a_byte_order_mark_do_not_matter() {
    let plain = "part p of m {\n  a = 3 ±0.1 mm # x\n}\n";
    let dressed =
        format!("\u{FEFF}{}", plain.replace(' ', "\u{A0}\t\u{2009}\u{202F}").replace('\n', "\r\n"));
    assert_eq!(findings(&dressed), "");
    let (Some(Statement::Part(a)), Some(Statement::Part(b))) =
        (read(plain).tree.statements.pop(), read(&dressed).tree.statements.pop())
    else {
        panic!("two parts")
    };
    assert_eq!(a.dimensions.len(), b.dimensions.len());
    assert_eq!(read(&dressed).tree.comments[0].text, "#\u{A0}\t\u{2009}\u{202F}x");
}

#[test]
fn a_row_may_begin_with_a_sign() {
    let text = "material m {\n expansion {\n  -196 degC -4150 ppm\n  -100 -2000\n  20 0 ppm\n }\n}";
    let Some(Statement::Material(Material { properties, .. })) = statements(text).pop() else {
        panic!("a material")
    };
    let PropertyValue::Table(table) = &properties[0].value else { panic!("a table") };
    assert_eq!(table.rows.len(), 3);
}

#[test]
fn words_are_names_too() {
    let text = "condition assembly 20\ncondition at 20\npart part of material {\n part = 3\n along = 4\n at = 5\n let = 6\n dia = dia 7 H7\n drawing = 8\n} \nlet gap = part.along after let";
    assert_eq!(findings(text), "");
}
