//! The library of materials as text: a list by family, and everything about one material.

use super::look::{Look, Role};
use super::wrap::{blanks, left, right, visible, width, wrap};
use crate::findings::number::{Round, digits};
use crate::materials::{Expansion, Expansions, Form, Grade, Material, Property, Scatter, Source};
use crate::units::{ICE_POINT, STANDARD_REFERENCE};
use std::sync::Arc;

/// Temperatures a table of values is given at, °C, as far as the data go.
const STATIONS: [f64; 16] = [
    -269.0, -196.0, -150.0, -100.0, -60.0, -40.0, 0.0, 20.0, 50.0, 85.0, 100.0, 150.0, 200.0,
    300.0, 400.0, 600.0,
];
/// The temperature that the list's mean coefficients reach to, °C.
const LIST_TO: f64 = 100.0;

/// A line a material, by family.
pub fn list(materials: &[Arc<Material>], look: Look) -> String {
    let mut families: Vec<&str> = materials.iter().map(|m| m.family.as_str()).collect();
    families.sort_unstable();
    families.dedup();
    let most = |of: &dyn Fn(&Material) -> usize| materials.iter().map(|m| of(m)).max().unwrap_or(0);
    let name = most(&|m| width(&m.name));
    let mean = most(&|m| width(&coefficient(m)));
    let range = most(&|m| width(&covered(m)));
    let mut out = String::new();
    for family in families {
        out.push_str(&format!("{}\n", look.paint(Role::Title, family)));
        for material in materials.iter().filter(|m| m.family == family) {
            let grade = grade(material);
            let role = if grade == Grade::Memory { Role::Warn } else { Role::Quiet };
            out.push_str(&format!(
                "  {}  {}  {}  {}\n",
                left(&material.name, name),
                right(&coefficient(material), mean),
                left(&covered(material), range),
                look.paint(role, grade.word()),
            ));
        }
    }
    out.push_str(&format!(
        "\n{}\n",
        look.paint(
            Role::Quiet,
            "mean coefficient 20 .. 100 °C or as far as the data go; their range and grade"
        )
    ));
    out
}

/// The grade of the expansion data, the worst where there are several.
fn grade(material: &Material) -> Grade {
    let curves = material.expansion.each();
    let sources = curves.iter().map(|(_, e)| material.source_of(e.source.as_ref()));
    sources.map(|s| s.map_or(Grade::Memory, |s| s.grade)).max().unwrap_or(Grade::Memory)
}

/// The mean coefficient from 20 °C, of each direction.
fn coefficient(material: &Material) -> String {
    let curves = material.expansion.each();
    let shown: Vec<String> = curves
        .iter()
        .map(|(_, expansion)| {
            let range = expansion.range;
            let to = (LIST_TO + ICE_POINT).clamp(range.lo(), range.hi());
            let from = STANDARD_REFERENCE.clamp(range.lo(), range.hi());
            let (from, to) = if to > from { (from, to) } else { (range.lo(), from) };
            digits(expansion.mean_coefficient(from, to) * 1e6, 1, Round::Nearest)
        })
        .collect();
    format!("{} ppm/K", shown.join("/"))
}

fn covered(material: &Material) -> String {
    let valid = material.valid();
    celsius_range(valid.lo(), valid.hi())
}

fn celsius_range(least: f64, greatest: f64) -> String {
    match (least > 0.0, greatest.is_finite()) {
        (true, true) => format!("{} .. {} °C", celsius(least), celsius(greatest)),
        (false, true) => format!("up to {} °C", celsius(greatest)),
        (true, false) => format!("from {} °C", celsius(least)),
        (false, false) => "no stated range".to_string(),
    }
}

fn celsius(kelvin: f64) -> String {
    let celsius = kelvin - ICE_POINT;
    let whole = (celsius - libm::round(celsius)).abs() < 0.05;
    digits(celsius, if whole { 0 } else { 1 }, Round::Nearest)
}

/// Everything about one material.
pub fn detail(material: &Material, look: Look) -> String {
    let mut out = String::new();
    out.push_str(&format!("{}\n", look.paint(Role::Title, &visible(&material.name))));
    if !material.title.is_empty() {
        paragraph(&mut out, &material.title, Role::Plain, look);
    }
    if !material.designations.is_empty() {
        paragraph(&mut out, &material.designations.join(", "), Role::Quiet, look);
    }
    for (direction, expansion) in material.expansion.each() {
        curve(&mut out, material, direction, expansion, look);
    }
    constants(&mut out, material, look);
    swell(&mut out, material, look);
    if !material.cautions.is_empty() {
        heading(&mut out, "cautions", look);
        for caution in &material.cautions {
            paragraph(&mut out, caution, Role::Warn, look);
        }
    }
    out
}

fn heading(out: &mut String, text: &str, look: Look) {
    out.push_str(&format!("\n{}\n", look.paint(Role::Title, text)));
}

fn paragraph(out: &mut String, text: &str, role: Role, look: Look) {
    for line in wrap(&visible(text), look.width - 2) {
        out.push_str(&format!("  {}\n", look.paint(role, &line)));
    }
}

/// A source with its grade; what is from memory in capitals.
fn source(out: &mut String, source: Option<&Source>, look: Look) {
    match source {
        Some(s) if s.grade == Grade::Memory => {
            paragraph(out, &format!("FROM MEMORY: {}", s.text), Role::Warn, look);
        }
        Some(s) => paragraph(out, &format!("{}: {}", s.grade.word(), s.text), Role::Quiet, look),
        None => paragraph(out, "no source stated", Role::Warn, look),
    }
}

/// How far it expands from 20 °C to each station that its data cover.
fn curve(out: &mut String, material: &Material, direction: &str, e: &Expansion, look: Look) {
    let of = match (&material.expansion, direction) {
        (Expansions::Volume(_), _) => "expansion of volume".to_string(),
        (_, "") => "expansion".to_string(),
        (_, direction) => format!("expansion {direction}"),
    };
    let scatter = match e.scatter {
        s if s.is_none() => String::new(),
        Scatter::Relative(s) => format!(", scatter ±{} %", trimmed(s * 100.0)),
        Scatter::PerKelvin(s) => format!(", scatter ±{} ppm/K", trimmed(s * 1e6)),
    };
    heading(out, &of, look);
    let form = match e.form {
        Form::Constant => "one coefficient".to_string(),
        Form::Mean { base } => format!("mean coefficients from {} °C", celsius(base)),
        Form::Instantaneous => "coefficients at a temperature".to_string(),
        Form::Total => "a table of total expansion".to_string(),
        Form::Polynomial => "a polynomial".to_string(),
    };
    let range = celsius_range(e.range.lo(), e.range.hi());
    paragraph(out, &format!("published as {form}, {range}{scatter}"), Role::Plain, look);
    source(out, material.source_of(e.source.as_ref()), look);
    for (stretch, from) in &e.elsewhere {
        let range = celsius_range(stretch.lo(), stretch.hi());
        paragraph(out, &format!("{range} from elsewhere:"), Role::Plain, look);
        source(out, Some(from), look);
    }
    let base = STANDARD_REFERENCE;
    if !e.range.contains(base) {
        return;
    }
    let head = "        °C  since 20 °C, ppm  mean since 20 °C, ppm/K";
    out.push_str(&format!("{}\n", look.paint(Role::Quiet, head)));
    for station in STATIONS {
        let t = station + ICE_POINT;
        if !e.range.contains(t) || t == base {
            continue;
        }
        let mean = e.mean_coefficient(base, t);
        let total = mean * (t - base) * 1e6;
        out.push_str(&format!(
            "{:>10}  {:>16}  {:>23}\n",
            digits(station, 0, Round::Nearest),
            digits(total, 1, Round::Nearest),
            digits(mean * 1e6, 2, Round::Nearest)
        ));
    }
}

/// Up to three digits after the point, none of them a trailing zero.
fn trimmed(x: f64) -> String {
    let shown = digits(x, 3, Round::Nearest);
    shown.trim_end_matches('0').trim_end_matches('.').to_string()
}

/// The other properties at 20 °C, and over their range where they vary.
fn constants(out: &mut String, material: &Material, look: Look) {
    let rows: [(&str, &Option<Property>, f64, &str); 5] = [
        ("modulus", &material.modulus, 1e9, "GPa"),
        ("Poisson's ratio", &material.poisson, 1.0, ""),
        ("yield", &material.yield_strength, 1e6, "MPa"),
        ("density", &material.density, 1.0, "kg/m³"),
        ("bulk modulus", &material.bulk_modulus, 1e9, "GPa"),
    ];
    if rows.iter().all(|(_, p, ..)| p.is_none()) && material.limit.is_none() {
        return;
    }
    heading(out, "other properties", look);
    let mut sources: Vec<&Source> = Vec::new();
    for (name, property, scale, unit) in rows {
        let Some(property) = property else { continue };
        let value = |t: f64| trimmed(property.at(t) / scale);
        let mut text = format!("{} {unit}", value(STANDARD_REFERENCE)).trim_end().to_string();
        if property.scatter > 0.0 {
            text.push_str(&format!(" ±{} %", trimmed(property.scatter * 100.0)));
        }
        let (lo, hi) = (property.range.lo(), property.range.hi());
        let ends: Vec<String> = [lo, hi]
            .into_iter()
            .filter(|t| t.is_finite() && value(*t) != value(STANDARD_REFERENCE))
            .map(|t| format!("{} at {} °C", value(t), celsius(t)))
            .collect();
        if !ends.is_empty() {
            text.push_str(&format!(" at 20 °C; {}", ends.join(", ")));
        }
        out.push_str(&format!("  {}  {text}\n", left(name, "Poisson's ratio".len())));
        let from = material.source_of(property.source.as_ref());
        if let Some(from) = from.filter(|s| !sources.contains(s)) {
            sources.push(from);
        }
    }
    if let Some(limit) = material.limit {
        let name = left("highest", "Poisson's ratio".len());
        out.push_str(&format!("  {name}  {} °C allowed\n", celsius(limit)));
    }
    for from in sources {
        source(out, Some(from), look);
    }
}

fn swell(out: &mut String, material: &Material, look: Look) {
    if material.swell.is_empty() {
        return;
    }
    heading(out, "swelling", look);
    let column = material.swell.iter().map(|s| width(&s.name)).max().unwrap_or(0);
    for (i, state) in material.swell.iter().enumerate() {
        let spread = if state.spread > 0.0 {
            format!(" ±{}", trimmed(state.spread * 100.0))
        } else {
            String::new()
        };
        let drawn = if i == 0 { "  as drawn" } else { "" };
        out.push_str(&format!(
            "  {}{}  {}{spread} %{drawn}\n",
            visible(&state.name),
            blanks(column - width(&state.name)),
            trimmed(state.strain * 100.0),
        ));
    }
}
