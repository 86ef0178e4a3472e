//! The main job: reading a spec, checking it, checking a folder of them, one long gap.
//!
//! `cargo bench --bench check`

use divan::Bencher;
use divan::counter::BytesCount;
use gapkeep::evaluate::{Options, evaluate, respond};
use gapkeep::model::{Assembly, ConditionId, Quantity, SubjectId};
use gapkeep::numeric::extremes::extremes;
use gapkeep::resolve::{FileError, Files, resolve};
use gapkeep::source::{Source, Sources};
use gapkeep::span::FileId;
use rayon::prelude::{IntoParallelIterator, ParallelIterator};
use std::fmt::Write;

fn main() {
    divan::main();
}

struct NoFiles;

impl Files for NoFiles {
    fn read(&self, _: &str) -> Result<Vec<u8>, FileError> {
        Err(FileError::Missing)
    }
}

/// A spec of sixty lines; `n` changes its numbers, not its shape.
fn spec(n: usize) -> String {
    let mut text = String::from(
        "assembly \"Generated gearbox\"\nlengths in mm\ntemperatures in degC\n\
         general ISO 2768-m\n\ncondition cold -40\ncondition room 20\n\
         condition hot 90 ±5 { shaft 10 .. 20 K above }\n\n",
    );
    let _ = writeln!(
        text,
        "part shaft of steel_42crmo4 {{\n  seat = dia 40 k6\n  shoulder = 30 ±0.1\n}}"
    );
    for i in 0..6 {
        let _ = writeln!(
            text,
            "part housing{i} of aluminium_6082_t6 {{\n  bore  = dia {} H7\n  depth = {}.5 ±0.05\n}}\n\
             part ring{i} of steel_100cr6 {{\n  outside = dia {} 0/-0.013\n  width = 13 0/-0.12\n}}",
            60 + i,
            40 + (n % 7),
            60 + i,
        );
    }
    for i in 0..3 {
        let _ = writeln!(
            text,
            "fit seat{i} = ring{i}.outside in housing{i}.bore {{\n  \
             require clearance -0.100 .. 0.150\n}}\n\
             gap float{i} = housing{i}.depth - ring{i}.width - shaft.shoulder + 5 mm {{\n  \
             require >= -10\n}}"
        );
    }
    text
}

fn assembly(text: &str) -> Assembly {
    let mut sources = Sources::default();
    let file = sources.add(Source::new("bench.gap", text));
    resolve(file, &mut sources, &NoFiles).assembly.expect("a sound spec")
}

fn check(text: &str) -> usize {
    evaluate(&assembly(text), &Options::default()).verdicts.len()
}

#[divan::bench]
fn parse_sixty_lines(bencher: Bencher) {
    let text = spec(0);
    bencher
        .counter(BytesCount::of_str(&text))
        .bench(|| gapkeep::syntax::parse(divan::black_box(&text), FileId(0)));
}

#[divan::bench]
fn check_sixty_lines(bencher: Bencher) {
    let text = spec(0);
    bencher.bench(|| check(divan::black_box(&text)));
}

#[divan::bench]
fn check_a_thousand_specs(bencher: Bencher) {
    let texts: Vec<String> = (0..1000).map(spec).collect();
    bencher.bench(|| (0..texts.len()).into_par_iter().map(|i| check(&texts[i])).sum::<usize>());
}

#[divan::bench]
fn extremes_of_forty_dimensions(bencher: Bencher) {
    let mut text = String::from(
        "assembly \"long\"\nlengths in mm\ntemperatures in degC\ncondition hot 90\n\
         part box of aluminium_6082_t6 { depth = 400 ±0.1 }\n",
    );
    let mut terms = String::from("box.depth");
    for i in 0..39 {
        let _ = writeln!(text, "part p{i} of steel_c45 {{ t = 10.2 ±0.01 }}");
        let _ = write!(terms, " - p{i}.t");
    }
    let _ = writeln!(text, "gap g = {terms}");
    let assembly = assembly(&text);
    bencher.bench(|| {
        let response =
            respond(&assembly, SubjectId(0), Quantity::Gap, Some(ConditionId(0))).expect("figures");
        extremes(&response.tape, &response.ranges, 1e-12)
    });
}
