//! Laws that every material of the library keeps.

use gapkeep::materials::{Expansions, Grade, Library, Material, Property, Scatter};
use gapkeep::mechanics::expansion::thermal_strain;
use gapkeep::numeric::Interval;
use std::sync::Arc;

const T_REF: f64 = 293.15;

fn all() -> impl Iterator<Item = Arc<Material>> {
    Library::builtin().all()
}

/// Temperatures through a range, its ends included.
fn through(range: Interval) -> Vec<f64> {
    let span = range.hi() - range.lo();
    (0..=60).map(|i| range.lo() + span * f64::from(i) / 60.0).collect()
}

#[test]
fn there_is_a_material_for_everyone() {
    assert!(Library::builtin().names().count() >= 75);
}

#[test]
fn every_material_is_described_and_sourced() {
    for material in all() {
        let name = &material.name;
        assert!(!material.title.is_empty() && !material.family.is_empty(), "{name}");
        assert!(!material.sources().is_empty(), "{name} names no source");
        for source in material.sources() {
            assert!(source.text.len() > 5, "{name}: a source of one word");
            assert_ne!(source.grade, Grade::Stated, "{name}: no spec has stated it");
        }
        for (direction, expansion) in material.expansion.each() {
            let source = material.source_of(expansion.source.as_ref());
            assert!(source.is_some(), "{name} {direction}: whence is its expansion?");
            for (range, _) in &expansion.elsewhere {
                assert!(expansion.range.encloses(*range), "{name} {direction}: {range:?}");
            }
        }
    }
}

#[test]
fn at_the_reference_nothing_expands() {
    for material in all() {
        assert!(material.valid().contains(T_REF), "{} does not reach 20 °C", material.name);
        for (_, expansion) in material.expansion.each() {
            assert_eq!(thermal_strain(&expansion.curve, T_REF, T_REF), 0.0, "{}", material.name);
        }
    }
}

/// Coefficients of real materials, in ppm/K of length between −10 and 450; of liquids, in volume,
/// between −100 (water near freezing) and 1500.
#[test]
fn coefficients_are_those_of_real_materials() {
    for material in all() {
        let bounds = match material.expansion {
            Expansions::Volume(_) => -100e-6..=1500e-6,
            _ => -10e-6..=450e-6,
        };
        for (direction, expansion) in material.expansion.each() {
            let slope = expansion.curve.derivative();
            for t in through(expansion.range) {
                let a = slope.value(t);
                assert!(bounds.contains(&a), "{} {direction} at {t} K: {a:e}", material.name);
            }
        }
    }
}

/// Solids grow when warmed, but for the few that are known not to.
#[test]
fn what_shrinks_on_warming_is_known() {
    let shrinks: Vec<String> = all()
        .flat_map(|material| {
            let each = material.expansion.each();
            let falling = each.into_iter().filter(|(_, expansion)| {
                let temperatures = through(expansion.range);
                let e: Vec<f64> = temperatures.iter().map(|&t| expansion.curve.value(t)).collect();
                e.windows(2).any(|pair| pair[1] < pair[0])
            });
            let named = falling.map(|(direction, _)| format!("{} {direction}", material.name));
            named.collect::<Vec<_>>()
        })
        .collect();
    let known = [
        "aramid_epoxy_unidirectional along",
        "cfrp_unidirectional along",
        "fused_silica ",
        "silicon ",
        "water volume",
    ];
    assert_eq!(shrinks, known);
}

fn within(material: &Material, what: &str, property: Option<&Property>, least: f64, most: f64) {
    let Some(property) = property else { return };
    let range = if property.range.is_bounded() { property.range } else { Interval::point(T_REF) };
    for t in through(range) {
        let value = property.at(t);
        let name = &material.name;
        assert!((least..=most).contains(&value), "{name}: {what} {value:e} at {t} K");
    }
    assert!((0.0..=0.5).contains(&property.scatter), "{}: scatter of {what}", material.name);
}

/// From rubber (1 MPa) to tungsten carbide (650 GPa), from wood to tungsten, and so on.
#[test]
fn properties_are_those_of_real_materials() {
    for material in all() {
        within(&material, "modulus", material.modulus.as_ref(), 1e6, 650e9);
        within(&material, "Poisson's ratio", material.poisson.as_ref(), 0.1, 0.49999);
        within(&material, "yield", material.yield_strength.as_ref(), 4e6, 2.5e9);
        within(&material, "density", material.density.as_ref(), 400.0, 20_000.0);
        within(&material, "bulk modulus", material.bulk_modulus.as_ref(), 0.5e9, 50e9);
        if let (Some(modulus), Some(strength)) = (&material.modulus, &material.yield_strength) {
            // The strain at yield: metals below 1 %, polymers below a tenth.
            let strain = strength.at(T_REF) / modulus.at(T_REF);
            assert!(strain < 0.1, "{} yields at {strain}", material.name);
        }
        if let Some(limit) = material.limit {
            assert!(limit > T_REF + 30.0, "{}: limit {limit} K", material.name);
        }
    }
}

/// Metals and polymers soften when warmed. The low-expansion iron-nickel alloy is the known
/// exception.
#[test]
fn moduli_and_strengths_fall_on_warming() {
    for material in all().filter(|m| m.name != "fe_ni36") {
        for property in [&material.modulus, &material.yield_strength].into_iter().flatten() {
            if property.range.is_bounded() {
                let values: Vec<f64> =
                    through(property.range).iter().map(|&t| property.at(t)).collect();
                let falls = values.windows(2).all(|pair| pair[1] <= pair[0] * (1.0 + 1e-12));
                assert!(falls, "{}: {values:?}", material.name);
            }
        }
    }
}

/// A coefficient that comes near zero scatters in ppm/K: a share of nothing would be nothing.
#[test]
fn scatter_near_zero_is_not_relative() {
    for material in all() {
        for (direction, expansion) in material.expansion.each() {
            let name = &material.name;
            let slope = expansion.curve.derivative();
            let common = Interval::new(260.0, 320.0).intersection(expansion.range).unwrap();
            let least =
                through(common).iter().map(|&t| slope.value(t).abs()).fold(f64::MAX, f64::min);
            match expansion.scatter {
                Scatter::Relative(s) => {
                    assert!(s > 0.0 && s < 0.6, "{name} {direction}: {s}");
                    assert!(least > 2e-6 || name == "water", "{name} {direction}: {least:e}");
                }
                Scatter::PerKelvin(delta) => assert!(delta > 0.0, "{name} {direction}"),
            }
        }
    }
}

#[test]
fn a_direction_is_explained() {
    for material in all().filter(|m| m.expansion.is_directional()) {
        let explained = material.cautions.iter().any(|c| c.starts_with("`along` is "));
        assert!(explained, "{}", material.name);
    }
}

#[test]
fn moisture_begins_dry_and_lengthens() {
    for material in all().filter(|m| !m.swell.is_empty()) {
        let name = &material.name;
        assert_eq!(material.swell[0].name, "dry", "{name}");
        assert_eq!(material.swell[0].strain, 0.0, "{name}");
        assert!(material.swell.windows(2).all(|w| w[0].strain < w[1].strain), "{name}");
    }
}

/// Common practice: PTFE changes its crystal form about 19 °C, and nothing else here does so near
/// the temperature of a measuring room.
#[test]
fn only_ptfe_has_a_transition() {
    let with: Vec<String> =
        all().filter(|m| m.transition.is_some()).map(|m| m.name.clone()).collect();
    assert_eq!(with, ["ptfe", "ptfe_filled"]);
    let ptfe = Library::builtin().get("ptfe").unwrap();
    assert!(ptfe.transition.unwrap().contains(273.15 + 19.0));
}

/// What joints, bolted joints and fillings are computed from.
#[test]
fn structural_metals_have_all_that_a_joint_needs() {
    let families =
        ["steel", "bolt steel", "bearing steel", "stainless steel", "aluminium", "titanium"];
    for material in all().filter(|m| families.contains(&m.family.as_str())) {
        let name = &material.name;
        assert!(material.modulus.is_some() && material.poisson.is_some(), "{name}");
        assert!(material.yield_strength.is_some() || name == "steel_gauge_block", "{name}");
        assert!(material.density.is_some(), "{name}");
    }
    for material in all().filter(|m| m.family == "liquid") {
        assert!(material.density.is_some() && material.bulk_modulus.is_some(), "{}", material.name);
        assert!(matches!(material.expansion, Expansions::Volume(_)), "{}", material.name);
    }
}
