//! `missing-property`: a quantity needs what a material does not state.

use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Property;
use crate::model::Assembly;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    for missing in &evaluation.missing {
        let part = assembly.part(missing.part);
        let subject = assembly.subject(missing.subject);
        let (what, example) = match missing.property {
            Property::Modulus => ("modulus", "modulus 70 GPa"),
            Property::Poisson => ("Poisson's ratio", "poisson 0.33"),
            Property::Yield => ("yield strength", "yield 240 MPa"),
            Property::Density => ("density", "density 2700 kg/m3"),
            Property::BulkModulus => ("bulk modulus", "bulk modulus 1.5 GPa"),
        };
        let message = format!(
            "{} needs the {what} of {}, which {} does not state",
            words::name(&subject.name),
            words::name(&part.name),
            words::name(&part.material.name)
        );
        found.push(
            Diagnostic::new(Code::MissingProperty, subject.span, message)
                .label(part.material_span, "this material")
                .help(format!(
                    "write a material `like {}` that adds it, such as `{example}`",
                    part.material.name
                )),
        );
    }
}
