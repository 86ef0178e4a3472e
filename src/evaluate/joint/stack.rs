//! Rings one in another, innermost first, joined by the fits between them.

use super::super::scene::{At, Response, Scene, Unable};
use super::super::{elastic, expression, temperature};
use crate::mechanics::ring::{self, Ring};
use crate::mechanics::{contact, joint as formulas};
use crate::model::{Assembly, Datum, Expr, Fit, Joint, Owner, PartId, SubjectId, Unknown};
use crate::numeric::{Number, Recorded};

/// The stack that a joint belongs to. Diameters are nominal, at the reference temperature, m.
pub(super) struct Stack {
    fits: Vec<SubjectId>,
    parts: Vec<PartId>,
    /// Bore of the innermost ring (`None` when solid), the contacts, outside of the outermost.
    bore: Option<f64>,
    contacts: Vec<f64>,
    outside: f64,
}

impl Stack {
    /// Follows the rings inward and outward from one joint.
    pub(super) fn of(assembly: &Assembly, fit: SubjectId) -> Self {
        let joint_of = |id: SubjectId| -> Option<(&Fit, &Joint)> {
            let fit = assembly.fit(id)?;
            Some((fit, fit.joint.as_ref()?))
        };
        let find = |wanted: &dyn Fn(&Joint) -> bool, known: &[SubjectId]| {
            assembly
                .subject_ids()
                .find(|id| !known.contains(id) && joint_of(*id).is_some_and(|(_, j)| wanted(j)))
        };
        let mut fits = vec![fit];
        while let Some((_, joint)) = fits.first().and_then(|&f| joint_of(f)) {
            let part = joint.inner.part;
            match find(&|j| j.outer.part == part, &fits) {
                Some(inside) => fits.insert(0, inside),
                None => break,
            }
        }
        while let Some((_, joint)) = fits.last().and_then(|&f| joint_of(f)) {
            let part = joint.outer.part;
            match find(&|j| j.inner.part == part, &fits) {
                Some(outside) => fits.push(outside),
                None => break,
            }
        }
        let joints: Vec<(&Fit, &Joint)> = fits.iter().filter_map(|&f| joint_of(f)).collect();
        let mut stack = Stack {
            fits,
            parts: Vec::new(),
            bore: None,
            contacts: joints.iter().map(|(fit, _)| nominal(assembly, &fit.internal)).collect(),
            outside: 0.0,
        };
        if let (Some((_, first)), Some((_, last))) = (joints.first(), joints.last()) {
            stack.parts.push(first.inner.part);
            stack.parts.extend(joints.iter().map(|(_, j)| j.outer.part));
            stack.bore = first.inner.free.as_ref().map(|e| nominal(assembly, e));
            stack.outside = last.outer.free.as_ref().map_or(0.0, |e| nominal(assembly, e));
        }
        stack
    }

    /// True for two rings with one contact.
    pub(super) fn is_pair(&self) -> bool {
        self.parts.len() == 2
    }

    /// Which contact a fit is.
    pub(super) fn contact_of(&self, fit: SubjectId) -> usize {
        self.fits.iter().position(|&f| f == fit).unwrap_or(0)
    }

    /// Which ring a part is.
    pub(super) fn ring_of(&self, part: PartId) -> usize {
        self.parts.iter().position(|&p| p == part).unwrap_or(0)
    }

    /// Nominal diameter of a contact, m.
    pub(super) fn contact_diameter(&self, place: usize) -> f64 {
        self.contacts[place]
    }

    fn diameters(&self, place: usize) -> (Option<f64>, f64) {
        let bore = if place == 0 { self.bore } else { Some(self.contacts[place - 1]) };
        (bore, self.contacts.get(place).copied().unwrap_or(self.outside))
    }

    /// True when a diameter is nearer to the bore of a ring than to its outside.
    pub(super) fn is_bore(&self, place: usize, diameter: f64) -> bool {
        let (bore, outside) = self.diameters(place);
        bore.is_some_and(|b| (diameter - b).abs() < (diameter - outside).abs())
    }

    /// True when a ring turns in a state of the world.
    pub(super) fn turns(&self, scene: &Scene<'_>, at: At, place: usize) -> bool {
        let At::Condition(condition) = at else { return false };
        let rotation = &scene.assembly.condition(condition).speed;
        rotation.as_ref().is_some_and(|r| r.parts.contains(&self.parts[place]))
    }

    /// A ring with its elastic data at its temperature.
    pub(super) fn ring(
        &self,
        scene: &Scene<'_>,
        at: At,
        place: usize,
    ) -> Result<Ring<Recorded>, Unable> {
        let part = self.parts[place];
        scene.within_data(at, part)?;
        let (bore, outside) = self.diameters(place);
        let t = temperature::of(scene, at, Owner::Part(part));
        let spin = match at {
            At::Condition(condition) if self.turns(scene, at, place) => {
                let density = elastic::property(scene, part, Datum::Density, t.clone())?;
                ring::spin(density, scene.unknown(Unknown::Speed(condition)))
            }
            _ => Recorded::exact(0.0),
        };
        Ok(Ring {
            bore: bore.map(|d| Recorded::exact(0.5 * d)),
            outside: Recorded::exact(0.5 * outside),
            modulus: elastic::modulus(scene, part, t.clone())?,
            poisson: elastic::property(scene, part, Datum::Poisson, t)?,
            spin,
        })
    }

    /// Pressure in one contact, Pa.
    pub(super) fn pressure(
        &self,
        scene: &Scene<'_>,
        at: At,
        place: usize,
    ) -> Result<Recorded, Unable> {
        let (rings, interference) = self.pressed(scene, at)?;
        Ok(contact::pressures(&rings, &interference)[place].clone())
    }

    /// Pressures in the bore and on the outside of one ring, Pa.
    pub(super) fn faces(
        &self,
        scene: &Scene<'_>,
        at: At,
        place: usize,
    ) -> Result<(Recorded, Recorded), Unable> {
        let (rings, interference) = self.pressed(scene, at)?;
        Ok(contact::faces(&rings, &interference, place))
    }

    /// The rings, and the radial interference in each contact, m.
    fn pressed(
        &self,
        scene: &Scene<'_>,
        at: At,
    ) -> Result<(Vec<Ring<Recorded>>, Vec<Recorded>), Unable> {
        let rings = (0..self.parts.len())
            .map(|place| self.ring(scene, at, place))
            .collect::<Result<Vec<_>, _>>()?;
        let mut interference = Vec::with_capacity(self.fits.len());
        for &fit in &self.fits {
            let Some(fit) = scene.assembly.fit(fit) else { continue };
            let free = -expression::clearance(scene, at, fit)?;
            interference.push((free - smoothing(fit)) * 0.5);
        }
        Ok((rings, interference))
    }
}

/// Interference that roughness takes up, diametral, m; nothing where no roughness is stated.
pub(super) fn smoothing(fit: &Fit) -> f64 {
    let Some(joint) = &fit.joint else { return 0.0 };
    formulas::smoothing(joint.inner.roughness.unwrap_or(0.0), joint.outer.roughness.unwrap_or(0.0))
}

/// The value of an expression with every size at its nominal, as drawn.
pub(crate) fn nominal(assembly: &Assembly, expr: &Expr) -> f64 {
    let recorded =
        Scene::record(assembly, &[], &[], |scene| expression::value(scene, At::Reference, expr));
    let Ok(Response { tape, unknowns, middle, .. }) = recorded else { return 0.0 };
    let inputs: Vec<f64> = unknowns
        .iter()
        .zip(middle)
        .map(|(unknown, middle)| match *unknown {
            Unknown::Size { dimension, .. }
                if assembly.dimension(dimension).geometric.is_none() =>
            {
                assembly.dimension(dimension).nominal
            }
            _ => middle,
        })
        .collect();
    tape.value(&inputs)
}
