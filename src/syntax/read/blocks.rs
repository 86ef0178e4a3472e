//! The blocks of materials, fits, gaps, results, restraints and fills.

use super::super::grammar::Rule;
use super::super::layout::Line;
use super::super::lower::Lower;
use super::super::tree::{Fill, Joint, JointLine, Property, PropertyValue, Requirement, Statement};
use super::Reader;

/// The words that begin a line of a material.
const MATERIAL_WORDS: [&str; 12] = [
    "cte",
    "expansion",
    "modulus",
    "bulk",
    "poisson",
    "yield",
    "density",
    "limit",
    "swell",
    "over",
    "source",
    "extrapolate",
];

impl Reader<'_> {
    pub(super) fn material(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::material_line, Lower::material);
        let (mut properties, mut sources) = (Vec::new(), Vec::new());
        let (mut over, mut extrapolate) = (None, None);
        self.block(line, |reader, inner| match reader.first_word(inner) {
            "source" => sources.extend(reader.lone(inner, Rule::source_line, Lower::source)),
            "over" => {
                let range = reader.lone(inner, Rule::over_line, Lower::over_line);
                reader.once(&mut over, range, inner);
            }
            "extrapolate" => {
                let word = reader.lone(inner, Rule::extrapolate_line, Lower::extrapolate);
                reader.once(&mut extrapolate, word, inner);
            }
            word if MATERIAL_WORDS.contains(&word) => properties.extend(reader.property(inner)),
            _ => reader.unknown(inner, &MATERIAL_WORDS, "a property"),
        });
        let mut material = header?;
        (material.properties, material.sources) = (properties, sources);
        (material.over, material.extrapolate) = (over, extrapolate);
        material.span = self.whole(line);
        Some(Statement::Material(material))
    }

    fn property(&mut self, line: &Line) -> Option<Property> {
        if line.block.is_none() {
            return self.header(line, Rule::property_line, Lower::constant_property);
        }
        let header = self.header(line, Rule::table_line, Lower::table_property);
        let mut rows = Vec::new();
        self.block(line, |reader, row| rows.extend(reader.lone(row, Rule::row_line, Lower::row)));
        let mut property = header?;
        if let PropertyValue::Table(table) = &mut property.value {
            table.rows = rows;
        }
        property.span = self.whole(line);
        Some(property)
    }

    /// Reads a block that holds requirements only.
    fn requirements(&mut self, line: &Line) -> Vec<Requirement> {
        let mut requirements = Vec::new();
        self.block(line, |reader, inner| match reader.first_word(inner) {
            "require" => requirements.extend(reader.require(inner)),
            _ => reader.unknown(inner, &["require"], "`require`"),
        });
        requirements
    }

    fn require(&mut self, line: &Line) -> Option<Requirement> {
        self.lone(line, Rule::require_line, Lower::requirement)
    }

    pub(super) fn gap(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::gap_line, Lower::gap);
        let requirements = self.requirements(line);
        let mut gap = header?;
        (gap.requirements, gap.span) = (requirements, self.whole(line));
        Some(Statement::Gap(gap))
    }

    pub(super) fn outcome(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::result_line, Lower::outcome);
        let requirements = self.requirements(line);
        let mut outcome = header?;
        (outcome.requirements, outcome.span) = (requirements, self.whole(line));
        Some(Statement::Result(outcome))
    }

    pub(super) fn fit(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::fit_line, Lower::fit);
        let (mut joint, mut requirements) = (None, Vec::new());
        self.block(line, |reader, inner| match reader.first_word(inner) {
            "require" => requirements.extend(reader.require(inner)),
            "joint" => {
                let stated = reader.joint(inner);
                reader.once(&mut joint, stated, inner);
            }
            _ => reader.unknown(inner, &["require", "joint"], "`require` or `joint`"),
        });
        let mut fit = header?;
        (fit.joint, fit.requirements, fit.span) = (joint, requirements, self.whole(line));
        Some(Statement::Fit(fit))
    }

    fn joint(&mut self, line: &Line) -> Option<Joint> {
        let header = self.header(line, Rule::joint_line, Lower::joint);
        self.needs_block(line);
        let mut lines = Vec::new();
        self.block(line, |reader, inner| lines.extend(reader.joint_row(inner)));
        let mut joint = header?;
        (joint.lines, joint.span) = (lines, self.whole(line));
        Some(joint)
    }

    fn joint_row(&mut self, line: &Line) -> Option<JointLine> {
        let surface = matches!(self.second_word(line), "bore" | "outside" | "solid" | "Rz");
        let rule = match self.first_word(line) {
            _ if surface => Rule::surface_line,
            "length" => Rule::length_line,
            "friction" => Rule::friction_line,
            "insertion" => Rule::insertion_line,
            "inner" | "outer" => Rule::ring_line,
            _ if self.second_word(line).is_empty() => {
                let words = ["length", "friction", "insertion", "inner", "outer"];
                self.unknown(line, &words, "a line of a joint");
                return None;
            }
            _ => Rule::surface_line,
        };
        self.lone(line, rule, Lower::joint_line)
    }

    pub(super) fn restraint(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::restraint_line, Lower::restraint);
        self.needs_block(line);
        let (mut members, mut requirements) = (Vec::new(), Vec::new());
        let (mut preload, mut start_gap) = (None, None);
        self.block(line, |reader, inner| match reader.first_word(inner) {
            "require" => requirements.extend(reader.require(inner)),
            "squeezed" | "stretched" => {
                members.extend(reader.lone(inner, Rule::member_line, Lower::member))
            }
            "preload" => {
                let stated = reader.lone(inner, Rule::preload_line, Lower::preload);
                reader.once(&mut preload, stated, inner);
            }
            "start" => {
                let stated = reader.lone(inner, Rule::start_line, Lower::start);
                reader.once(&mut start_gap, stated, inner);
            }
            _ => {
                let words = ["squeezed", "stretched", "preload", "start", "require"];
                reader.unknown(inner, &words, "a line of a restraint");
            }
        });
        let mut restraint = header?;
        (restraint.members, restraint.requirements) = (members, requirements);
        (restraint.preload, restraint.start_gap) = (preload, start_gap);
        restraint.span = self.whole(line);
        Some(Statement::Restraint(restraint))
    }

    pub(super) fn fill(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::fill_line, Lower::fill);
        self.needs_block(line);
        let (mut cavity, mut wall, mut charge) = (None, None, None);
        let mut requirements = Vec::new();
        self.block(line, |reader, inner| match reader.first_word(inner) {
            "require" => requirements.extend(reader.require(inner)),
            "cavity" => {
                let stated = reader.lone(inner, Rule::cavity_line, Lower::cavity);
                reader.once(&mut cavity, stated, inner);
            }
            "charge" => {
                let stated = reader.lone(inner, Rule::charge_line, Lower::charge);
                reader.once(&mut charge, stated, inner);
            }
            "wall" => {
                let stated = reader.lone(inner, Rule::wall_line, Lower::wall);
                reader.once(&mut wall, stated, inner);
            }
            _ => {
                let words = ["cavity", "wall", "charge", "require"];
                reader.unknown(inner, &words, "a line of a fill");
            }
        });
        let fill: Fill = header?;
        let span = self.whole(line);
        Some(Statement::Fill(Box::new(Fill { cavity, wall, charge, requirements, span, ..fill })))
    }
}
