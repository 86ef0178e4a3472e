//! A dimension at temperature.

use super::scene::{At, Scene, Unable};
use super::{elastic, temperature};
use crate::materials::{Expansion, Expansions, Material};
use crate::mechanics::{expansion, place, restraint};
use crate::model::{
    ConditionId, Dimension, DimensionId, Direction, Feature, Form, Owner, PartId, Unknown,
};
use crate::numeric::{Number, Recorded};

/// Size of one piece of a dimension in a state of the world, m or rad.
pub(crate) fn at(
    scene: &Scene<'_>,
    at: At,
    id: DimensionId,
    piece: u32,
) -> Result<Recorded, Unable> {
    let dimension = scene.assembly.dimension(id);
    let stated = as_stated(scene, id, dimension, piece);
    if dimension.form == Form::Angle {
        // An isotropic body keeps its angles.
        return Ok(stated);
    }
    let here = stretch(scene, at, id, dimension)?;
    if dimension.reference == scene.assembly.reference {
        return Ok(expansion::length(stated, here));
    }
    let when_stated = thermal_strain(scene, dimension, Recorded::exact(dimension.reference));
    Ok(expansion::length_from_own_reference(stated, here, when_stated))
}

/// What one piece of a dimension is longer by here than there, m or rad.
///
/// The size enters once, so that its tolerance hardly matters to a change, also in an enclosure.
pub(crate) fn change(
    scene: &Scene<'_>,
    here: At,
    there: At,
    id: DimensionId,
    piece: u32,
) -> Result<Recorded, Unable> {
    let dimension = scene.assembly.dimension(id);
    if dimension.form == Form::Angle {
        return Ok(Recorded::exact(0.0));
    }
    let stated = as_stated(scene, id, dimension, piece);
    let (strain, then) =
        (stretch(scene, here, id, dimension)?, stretch(scene, there, id, dimension)?);
    let growth = restraint::growth(stated, strain, then);
    if dimension.reference == scene.assembly.reference {
        return Ok(growth);
    }
    let when_stated = thermal_strain(scene, dimension, Recorded::exact(dimension.reference));
    Ok(growth / (when_stated + 1.0))
}

/// The size at its own reference temperature, coating included.
pub(crate) fn as_stated(
    scene: &Scene<'_>,
    id: DimensionId,
    dimension: &Dimension,
    piece: u32,
) -> Recorded {
    let size = scene.unknown(Unknown::Size { dimension: id, piece });
    if let Some(geometric) = dimension.geometric
        && let Some(bonus) = geometric.bonus
    {
        return place::at_maximum_material(size, dimension.upper, left(scene, bonus, piece));
    }
    let size = if dimension.members.is_empty() {
        size
    } else {
        // The set's tolerance is about the chosen member.
        size + (dimension.members[scene.member(id)] - dimension.nominal)
    };
    match &dimension.coating {
        Some(coating) if coating.before && coating.factor != 0.0 => {
            let thickness = scene.unknown(Unknown::Coating { dimension: id, piece });
            place::coated(size, thickness, coating.factor, coating.build_up)
        }
        _ => size,
    }
}

/// How far a feature has left its maximum material size, m.
fn left(scene: &Scene<'_>, feature: DimensionId, piece: u32) -> Recorded {
    let dimension = scene.assembly.dimension(feature);
    let size = scene.unknown(Unknown::Size { dimension: feature, piece });
    match dimension.feature {
        Feature::External => -size + dimension.greatest(),
        Feature::Internal | Feature::Unstated => size - dimension.least(),
    }
}

/// All strain of a dimension in a state of the world, against its drawing state.
fn stretch(
    scene: &Scene<'_>,
    at: At,
    id: DimensionId,
    dimension: &Dimension,
) -> Result<Recorded, Unable> {
    let part = dimension.part;
    scene.within_data(at, part)?;
    let temperature = temperature::of(scene, at, Owner::Part(part));
    let mut strain = thermal_strain(scene, dimension, temperature.clone());
    let At::Condition(condition) = at else { return Ok(strain) };
    if let Some(swell) = swelling(scene, part, condition) {
        strain = strain + swell;
    }
    let acts = |at: &[ConditionId]| at.is_empty() || at.contains(&condition);
    for (entry, given) in dimension.strains.iter().enumerate().filter(|(_, s)| acts(&s.conditions))
    {
        debug_assert!(given.strain.least <= given.strain.greatest);
        strain = strain + scene.unknown(Unknown::Strain { dimension: id, entry: entry as u32 });
    }
    for (entry, _) in dimension.loads.iter().enumerate().filter(|(_, l)| acts(&l.conditions)) {
        let entry = entry as u32;
        let force = scene.unknown(Unknown::Load { dimension: id, entry });
        let area = scene.unknown(Unknown::LoadArea { dimension: id, entry });
        let modulus = elastic::modulus(scene, part, temperature.clone())?;
        strain = strain + expansion::elastic_strain(force / area, modulus);
    }
    Ok(strain)
}

/// Thermal strain of a dimension's material between the file's reference temperature and
/// `temperature`, with the scatter of its lot.
pub(crate) fn thermal_strain(
    scene: &Scene<'_>,
    dimension: &Dimension,
    temperature: Recorded,
) -> Recorded {
    let part = scene.assembly.part(dimension.part);
    let scatter = Unknown::ExpansionScatter(part.lot);
    strain_of_lot(scene, scatter, &part.material, dimension.direction, temperature)
}

/// Thermal strain of a lot of material in a direction, from the file's reference temperature.
pub(crate) fn strain_of_lot(
    scene: &Scene<'_>,
    scatter: Unknown,
    material: &Material,
    direction: Direction,
    temperature: Recorded,
) -> Recorded {
    let reference = Recorded::exact(scene.assembly.reference);
    let data = expansion_in(material, direction);
    let strain = expansion::thermal_strain(&data.curve, temperature.clone(), reference.clone());
    if data.scatter.is_none() {
        return strain;
    }
    let w = scene.unknown(scatter);
    expansion::scattered_strain(strain, temperature - reference, data.scatter, w)
}

/// The expansion data of a material in a direction; a fluid's are those of its volume.
pub(crate) fn expansion_in(material: &Material, direction: Direction) -> &Expansion {
    match (&material.expansion, direction) {
        (Expansions::Isotropic(one) | Expansions::Volume(one), _) => one,
        (Expansions::Directional { across, .. }, Direction::Across) => across,
        (Expansions::Directional { along, .. }, _) => along,
    }
}

/// Strain from moisture, where the part swells and the condition names a state.
fn swelling(scene: &Scene<'_>, part: PartId, condition: ConditionId) -> Option<Recorded> {
    let part_data = scene.assembly.part(part);
    let drawn = part_data.material.swell.first()?;
    let name = scene.assembly.condition(condition).moisture_of(part)?;
    let state = part_data.material.swell_state(name)?;
    if state == drawn {
        return None;
    }
    let w = scene.unknown(Unknown::SwellScatter(part_data.lot));
    Some(expansion::swelling_strain(state, drawn, w))
}
