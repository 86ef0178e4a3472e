//! Tests of the parts, dimensions, conditions and materials of whole snippets.

use super::context::Context;
use super::file::{FileError, Files};
use super::{condition, dimension, head, material, part};
use crate::diagnostic::{Code, Diagnostic, Severity};
use crate::materials::{Expansions, Scatter};
use crate::model::{
    Condition, ConditionId, Dimension, Feature, Form, Lot, Origin, OwnTemperature, Part, PartId,
    SubjectId, Thermal,
};
use crate::source::{Source, Sources};
use crate::syntax::{self, tree::Statement};

/// Tables beside a snippet.
struct Beside(&'static [(&'static str, &'static str)]);

impl Files for Beside {
    fn read(&self, path: &str) -> Result<Vec<u8>, FileError> {
        let found = self.0.iter().find(|(name, _)| *name == path);
        found.map(|(_, text)| text.as_bytes().to_vec()).ok_or(FileError::Missing)
    }
}

/// What a snippet resolves to, without what is asked of it.
struct Resolved {
    conditions: Vec<Condition>,
    lots: Vec<Lot>,
    parts: Vec<Part>,
    dimensions: Vec<Dimension>,
    materials: Vec<std::sync::Arc<crate::materials::Material>>,
    findings: Vec<Diagnostic>,
}

impl Resolved {
    fn dimension(&self, name: &str) -> &Dimension {
        self.dimensions.iter().find(|d| d.name == name).expect(name)
    }

    fn errors(&self) -> Vec<&Diagnostic> {
        self.findings.iter().filter(|f| f.severity == Severity::Error).collect()
    }
}

fn run(cx: &mut Context, file: crate::span::FileId, tree: &syntax::tree::File) {
    let (mut parts, mut conditions, mut materials) = (Vec::new(), Vec::new(), Vec::new());
    head::resolve(cx, file, tree);
    for statement in &tree.statements {
        match statement {
            Statement::Part(p) => {
                let id = PartId(parts.len() as u32);
                assert_eq!(cx.part_names.declare(&p.name.value, id, p.name.span), Ok(()));
                parts.push(p);
            }
            Statement::Condition(c) => {
                let id = ConditionId(conditions.len() as u32);
                assert_eq!(cx.condition_names.declare(&c.name.value, id, c.name.span), Ok(()));
                conditions.push(c);
            }
            Statement::Material(m) => materials.push(m),
            Statement::Fill(f) => {
                let id = SubjectId(cx.fills.len() as u32);
                assert_eq!(cx.subject_names.declare(&f.name.value, id, f.name.span), Ok(()));
                cx.fills.insert(id);
            }
            _ => {}
        }
    }
    material::resolve(cx, &materials);
    part::resolve(cx, &parts);
    condition::resolve(cx, &conditions);
    dimension::report_unsettled(cx);
}

fn read(text: &str, files: &'static [(&'static str, &'static str)]) -> Resolved {
    let mut sources = Sources::default();
    let file = sources.add(Source::new("a.gap", text));
    let parsed = syntax::parse(text, file);
    assert_eq!(parsed.diagnostics, [], "{text}");
    let beside = Beside(files);
    let mut cx = Context::new(&mut sources, &beside);
    run(&mut cx, file, &parsed.tree);
    Resolved {
        materials: cx.materials.values().map(|(m, _)| m.clone()).collect(),
        conditions: cx.conditions,
        lots: cx.lots,
        parts: cx.parts,
        dimensions: cx.dimensions,
        findings: cx.diagnostics,
    }
}

#[track_caller]
fn sound(text: &str) -> Resolved {
    let resolved = read(text, &[]);
    let said: Vec<&str> = resolved.errors().iter().map(|f| f.message.as_str()).collect();
    assert!(said.is_empty(), "{text}\n{said:#?}");
    resolved
}

#[track_caller]
fn refused(text: &str, code: Code) -> Diagnostic {
    let resolved = read(text, &[]);
    let errors = resolved.errors();
    let said: Vec<&str> = errors.iter().map(|f| f.message.as_str()).collect();
    assert_eq!(errors.iter().map(|f| f.code).collect::<Vec<_>>(), [code], "{text}\n{said:#?}");
    errors[0].clone()
}

/// A part of steel with these dimensions.
fn of_steel(lines: &str) -> String {
    format!("part shaft of steel_c45 {{\n{lines}\n}}\n")
}

#[track_caller]
fn assert_limits(dimension: &Dimension, millimetres: (f64, f64)) {
    let (least, greatest) = (dimension.least() * 1e3, dimension.greatest() * 1e3);
    let near = |a: f64, b: f64| (a - b).abs() <= 1e-12 * b.abs().max(1.0);
    assert!(
        near(least, millimetres.0) && near(greatest, millimetres.1),
        "{}: {least} .. {greatest}",
        dimension.written
    );
}

#[test]
fn every_way_to_write_a_size() {
    let resolved = sound(&of_steel(
        "a = 58 ±0.05\nb = 58 -0.02/-0.05\nc = 58.00 .. 58.05\nd = dia 42 K6\ne = 20 js6\n\
         f = 58 exact\ng = 2.500 in ±0.001\nh = 30 deg ±0.5\ni = one of 0.10, 0.15 ±0.005\n\
         j = dia 42 ?\nk = flatness 0.02\nl = position dia 0.2 at MMC of d",
    ));
    let d = |name: &str| resolved.dimension(name);
    assert_limits(d("a"), (57.95, 58.05));
    assert_limits(d("b"), (57.95, 57.98));
    assert_limits(d("c"), (58.0, 58.05));
    // ISO 286-2:2010: 42 K6 is +3/-13 µm, 20 js6 is ±6.5 µm.
    assert_limits(d("d"), (41.987, 42.003));
    assert_limits(d("e"), (19.9935, 20.0065));
    assert_eq!((d("d").feature, d("e").feature), (Feature::Internal, Feature::External));
    assert_eq!(d("d").written, "dia 42 K6");
    assert_limits(d("f"), (58.0, 58.0));
    assert_limits(d("g"), (63.4746, 63.5254));
    assert_eq!(d("h").form, Form::Angle);
    assert!((d("h").greatest() - 30.5_f64.to_radians()).abs() < 1e-15);
    assert_eq!(d("i").members, [1e-4, 1.5e-4]);
    assert_eq!(d("j").origin, Origin::Open);
    assert_limits(d("k"), (0.0, 0.02));
    assert_limits(d("l"), (-0.1, 0.1));
    assert!(d("l").geometric.is_some_and(|g| g.half == 0.5 && g.bonus.is_some()));
}

#[test]
fn sizes_without_tolerance_take_the_general_one() {
    // ISO 2768-1:1989, Table 1: m, over 0.5 up to 3: ±0.1; over 30 up to 120: ±0.3.
    let resolved = sound(&format!("general ISO 2768-m\n{}", of_steel("a = 2\nb = 58")));
    assert_limits(resolved.dimension("a"), (1.9, 2.1));
    assert_limits(resolved.dimension("b"), (57.7, 58.3));
    let block = "lengths in inch\ngeneral { .XX ±.010; .XXX ±.005; angle ±0.5 deg }\n";
    let resolved = sound(&format!("{block}{}", of_steel("a = 1.50\nb = 1.500\nc = 30 deg")));
    assert_limits(resolved.dimension("a"), (1.49 * 25.4, 1.51 * 25.4));
    assert_limits(resolved.dimension("b"), (1.495 * 25.4, 1.505 * 25.4));
    assert!((resolved.dimension("c").upper - 0.5_f64.to_radians()).abs() < 1e-15);
    refused(&of_steel("a = 2"), Code::ToleranceMissing);
    refused(&format!("{block}{}", of_steel("a = 1.5")), Code::ToleranceMissing);
}

#[test]
fn mistakes_of_sizes_are_told_apart() {
    refused(&of_steel("a = dia 20 t6"), Code::ClassUndefined);
    refused(&of_steel("a = internal 20 h6"), Code::ClassAgainstSide);
    refused(&of_steel("a = external 20 H7"), Code::ClassAgainstSide);
    refused(&of_steel("a = radius 20 H7"), Code::ClassOfNoSize);
    refused(&of_steel("a = 58 ±50 um"), Code::UnitScope);
    refused(&of_steel("a = 58.05 .. 58.00"), Code::LimitsReversed);
    refused(&of_steel("a = dia 0.1 ±0.2"), Code::ValueOutOfRange);
    refused(&of_steel("a = 58 ±0.1 along"), Code::DirectionUnneeded);
    refused(&of_steel("a = 58 ±0.1 at 23 ±1 degC"), Code::ToleranceOfReference);
    refused(&of_steel("a = 58 ±0.1 load 12 kN over 350 mm2 at hot"), Code::UnknownCondition);
    refused(&of_steel("a = 58 ±0.1\na = 59 ±0.1"), Code::DuplicateName);
    refused(&of_steel("a = dia 8 H7\np = position dia 0.2 at MMC of b"), Code::UnknownDimension);
    refused(&of_steel("a = dia 8 ±1\np = position dia 0.2 at MMC of a"), Code::BonusSideUnknown);
    let class = refused(&of_steel("a = 42 K"), Code::WrongKind);
    assert_eq!(class.help.as_deref(), Some("a class needs its grade, as `K6`"));
}

#[test]
fn coatings_grow_towards_the_side_of_the_material() {
    let resolved = sound(&of_steel(
        "a = dia 42 H7 before coating 10 ±2 um\nb = dia 42 h6 before coating 40 um build-up 50 %\n\
         c = internal radius 9 ±0.1 before coating 10 um\n\
         d = external 9 ±0.1 before coating 10 um on one side\n\
         e = dia 42 ±0.1 after coating 10 ±2 um",
    ));
    let coating = |name: &str| resolved.dimension(name).coating.clone().expect("a coating");
    assert_eq!(coating("a").factor, -2.0);
    assert_eq!((coating("b").factor, coating("b").build_up), (2.0, 0.5));
    assert_eq!(coating("c").factor, -1.0);
    assert_eq!(coating("d").factor, 1.0);
    assert_eq!((coating("e").factor, coating("e").before), (0.0, false));
    refused(&of_steel("a = dia 42 ±0.1 before coating 10 um"), Code::CoatingSideUnknown);
    refused(&of_steel("a = external 9 ±0.1 before coating 10 um"), Code::CoatingSides);
    refused(&of_steel("a = dia 42 h6 before coating 10 ±2"), Code::UnitMissing);
}

#[test]
fn parts_like_another_copy_its_drawing_and_its_lot() {
    let resolved = sound(
        "part a of steel_c45 lot \"7\" { x = dia 8 H7; p = position dia 0.2 at MMC of x; y = 5 ±1 }\n\
         part b like a { y = 6 ±1 }\npart c of steel_c45",
    );
    let [a, b, c] = &resolved.parts[..] else { panic!("three parts") };
    assert_eq!(a.lot, b.lot);
    assert_ne!(a.lot, c.lot);
    assert_eq!(resolved.lots.len(), 2);
    let of_b = |i: usize| &resolved.dimensions[b.dimensions[i].index()];
    assert_eq!(of_b(1).geometric.and_then(|g| g.bonus), Some(b.dimensions[0]));
    assert_limits(of_b(2), (5.0, 7.0));
    refused("part a like b\npart b like a", Code::LikeCycle);
    refused("part c like a\npart a like b\npart b like a", Code::LikeCycle);
    refused("part a like a", Code::LikeCycle);
    refused("material a like b\nmaterial b like c\nmaterial c like b", Code::LikeCycle);
    refused(
        "part a of steel_c45 { x = 1 ±0.1 }\npart b like a { z = 2 ±0.1 }",
        Code::UnknownDimension,
    );
    refused(
        "part a of steel_c45 lot \"7\"\npart b of titanium_grade_2 lot \"7\"",
        Code::LotOfTwoMaterials,
    );
}

#[test]
fn conditions_with_their_rows() {
    let resolved = sound(
        "condition hot 85 ±3 { a 97; b 5 .. 9 K above a }\ncondition cold -40 { b 12 K below }\n\
         part a of steel_c45\npart b of steel_c45",
    );
    let hot = &resolved.conditions[0];
    assert_eq!(hot.written, "85 ±3");
    let Some(OwnTemperature::Above { difference, base }) = &hot.states[1].temperature else {
        panic!("a difference")
    };
    assert_eq!((difference.least, difference.greatest, base.is_some()), (5.0, 9.0, true));
    let Some(OwnTemperature::Above { difference, .. }) =
        &resolved.conditions[1].states[0].temperature
    else {
        panic!("a difference")
    };
    assert_eq!(difference.nominal, -12.0);
    let part = "part a of steel_c45\npart b of steel_c45\n";
    let with = |rows: &str| format!("condition hot 85 {{ {rows} }}\n{part}");
    refused(&with("c 97"), Code::UnknownPart);
    refused(&with("a 97 K"), Code::TemperatureOrDifference);
    refused(&with("a 5 K above b; b 5 K above a"), Code::TemperatureCycle);
    refused(&with("a 5 K above a"), Code::TemperatureCycle);
    refused(&with("a 400 K below"), Code::BelowAbsoluteZero);
    refused(&with("a wet"), Code::UnknownMoisture);
    refused(&with("a 97; a 98"), Code::StatedTwice);
    let pinned = read(&format!("condition all -40 .. 85 {{ a 20 }}\n{part}"), &[]);
    assert_eq!(
        pinned.findings.iter().map(|f| f.code).collect::<Vec<_>>(),
        [Code::TemperaturePinned]
    );
}

#[test]
fn histories_are_read_and_complete() {
    const GOOD: &[(&str, &str)] = &[("h.csv", "time [min],a [degF],ambient\n0,68,20\n10,212,30\n")];
    let text = "condition up from \"h.csv\" ±2\npart a of steel_c45\npart b of steel_c45";
    let resolved = read(text, GOOD);
    assert_eq!(resolved.findings, []);
    let Thermal::History(history) = &resolved.conditions[0].thermal else { panic!("a history") };
    assert_eq!(history.time, (0.0, 600.0));
    assert!((history.parts[0].1.value(300.0) - (273.15 + 60.0)).abs() < 1e-9);
    assert_eq!((history.band.least, history.band.greatest), (-2.0, 2.0));
    let code = |files| {
        let resolved = read(text, files);
        resolved.errors().iter().map(|f| f.code).collect::<Vec<_>>()
    };
    assert_eq!(code(&[("h.csv", "time,a\n0,68\n10,70\n")]), [Code::HistoryIncomplete]);
    assert_eq!(code(&[("h.csv", "time,a,c\n0,68,1\n10,70,1\n")]), [Code::UnknownColumn]);
    assert_eq!(code(&[("h.csv", "time,a,b\n0,68,\n10,70,1\n")]), [Code::TableCell]);
    assert_eq!(code(&[("h.csv", "time,a,b\n0,68,1\n0,70,1\n")]), [Code::TimeNotRising]);
    assert_eq!(code(&[("h.csv", "time,a,b\n")]), [Code::TableShape]);
    assert_eq!(code(&[("h.csv", "a,b\n1,2\n3,4\n")]), [Code::TableShape]);
    assert_eq!(code(&[]), [Code::FileMissing]);
}

#[test]
fn materials_from_blocks() {
    let resolved = sound(
        "material plate like aluminium_6061_t6 { cte 23.4 ±0.3 ppm/K over -60 .. 150 degC; source \"heat 7714\" }\n\
         material sheet { cte along 12 ppm/K ±5 %; cte across 40 ppm/K; modulus ±10 %, GPa { 20 20; 100 18 } }\n\
         material steel { cte mean from 20 degC, ppm/K { 100 11.5; 200 12.1 }; limit 150 }\n\
         material plastic { expansion { -196 degC -4150 ppm; 20 degC 0 ppm }; swell { dry 0 %; wet 0.8 % ±0.15 } }\n\
         part a of plate { x = 1 ±0.1 }\npart b of sheet { x = 1 ±0.1 across }\n\
         part c of plastic { x = 1 ±0.1 }\ncondition wet 20 { moisture wet }",
    );
    let named = |name: &str| resolved.materials.iter().find(|m| m.name == name).expect(name);
    let Expansions::Isotropic(plate) = &named("plate").expansion else { panic!("isotropic") };
    assert!(matches!(plate.scatter, Scatter::PerKelvin(s) if (s - 0.3e-6).abs() < 1e-18));
    assert!((plate.range.lo() - 213.15).abs() < 1e-9 && (plate.range.hi() - 423.15).abs() < 1e-9);
    assert!((plate.mean_coefficient(293.15, 393.15) - 23.4e-6).abs() < 1e-15);
    assert!(named("plate").modulus.is_some());
    assert_eq!(named("plate").source.as_ref().map(|s| s.text.as_str()), Some("heat 7714"));
    assert!(named("sheet").expansion.is_directional());
    assert!((named("sheet").modulus.as_ref().expect("stated").scatter - 0.1).abs() < 1e-12);
    let Expansions::Isotropic(steel) = &named("steel").expansion else { panic!("isotropic") };
    assert!((steel.curve.value(373.15) - 80.0 * 11.5e-6).abs() < 1e-15);
    assert_eq!(named("steel").limit, Some(423.15));
    assert!((named("plastic").swell[1].strain - 0.008).abs() < 1e-15);
}

#[test]
fn mistakes_of_materials_are_told_apart() {
    let block = |lines: &str| format!("material m {{ {lines} }}\npart a of m");
    refused(&block("cte 23.4"), Code::UnitMissing);
    refused(&block("modulus 70 GPa"), Code::ExpansionMissing);
    refused(&block("cte 12 ppm/K; cte 13 ppm/K"), Code::StatedTwice);
    refused(&block("cte along 12 ppm/K"), Code::DirectionMissing);
    refused(&block("cte 12 ppm/K; poisson 0.7"), Code::ValueOutOfRange);
    refused(&block("cte, ppm/K { 20 11; 100 12 }"), Code::TableFormMissing);
    refused(&block("cte instantaneous, ppm/K { 100 11; 20 12 }"), Code::TableNotRising);
    refused(&block("cte 12 ppm/K; swell { dry 1 %; wet 2 % }"), Code::SwellOfFirstState);
    refused("part a of steel_c44", Code::UnknownMaterial);
    for (named, meant) in [
        ("steel_304", "did you mean `stainless_304`?"),
        ("stainles_304", "did you mean `stainless_304`?"),
        ("alu_6061", "did you mean `aluminium_6061_t6`?"),
        (
            "optical_bk7",
            "did you mean one of `calcium_fluoride`, `glass_crown`, `glass_flint`? or define it: ",
        ),
        ("unobtainium", "define it: "),
    ] {
        let help = refused(&format!("part a of {named}"), Code::UnknownMaterial).help;
        assert!(help.as_ref().is_some_and(|h| h.starts_with(meant)), "{named}: {help:?}");
    }
    let vague = refused("part a of stainless", Code::UnknownMaterial);
    assert!(vague.help.is_some_and(|help| help.contains("stainless_304")));
    let lint = read("material m like aluminium_6061_t6 { cte 13 ppm/K }\npart a of m", &[]);
    let codes: Vec<Code> = lint.findings.iter().map(|f| f.code).collect();
    assert_eq!(codes, [Code::ExpansionOfOtherDegree]);
}

#[test]
fn the_head_holds_for_all_lines_wherever_it_stands() {
    let resolved = sound(&format!("{}lengths in inch\nreference 68 degF", of_steel("a = 2 ±.01")));
    assert_limits(resolved.dimension("a"), (1.99 * 25.4, 2.01 * 25.4));
    assert!((resolved.dimension("a").reference - 293.15).abs() < 1e-12);
    refused("lengths in mm\nlengths in inch", Code::StatedTwice);
    refused("lengths in degC", Code::WrongKind);
    refused("general ISO 2768-x", Code::UnknownGeneralClass);
}

#[test]
fn measured_values_come_from_a_table() {
    let text = of_steel("a = 58 ±0.05 spread from \"a.csv\" shift +0.01");
    let resolved = read(&text, &[("a.csv", "a [um]\n58001\n58002\n57999\n")]);
    assert_eq!(resolved.findings, []);
    let spread = &resolved.dimension("a").spread;
    assert_eq!(spread.shift, 1e-5);
    let crate::model::dimension::Shape::Measured { values, .. } = &spread.shape else {
        panic!("measured")
    };
    assert_eq!(values[0], 0.058001);
}

#[test]
fn long_chains_are_followed_without_recursion() {
    let mut text = String::from("part p0 of m0 { x = 1 ±0.1 }\nmaterial m0 like m1\n");
    for i in 1..3000 {
        text.push_str(&format!("part p{i} like p{}\nmaterial m{i} like m{}\n", i - 1, i + 1));
    }
    text.push_str("material m3000 { cte 12 ppm/K }\n");
    let resolved = sound(&text);
    assert_eq!(resolved.dimensions.len(), 3000);
    assert_eq!(resolved.parts[2999].material.name, "m0");
}
