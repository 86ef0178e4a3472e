//! The commands as a user calls them: streams, files, exit status.

mod binary;
mod cautions;
mod check;
mod draws;
mod kinks;
mod members;
mod record;
mod select;
mod statistics;
mod tools;

use gapkeep::cli::{Console, Environment, run};
use std::ffi::OsString;
use std::path::Path;
use tempfile::TempDir;

/// A spec whose one requirement holds.
pub(crate) const HOLDS: &str = "\
assembly \"Sleeve on a pin\"
drawing  \"SP-100\" rev \"A\"
lengths in mm
temperatures in degC

condition room 20
condition hot  85

part sleeve of aluminium_6061_t6 { bore = dia 42 H7 }
part pin of steel_c45 { size = dia 42 g6 }

fit slide = pin.size in sleeve.bore {
  require \"S-1\" clearance >= 0.005
}
";

/// The same with a requirement that fails at one condition.
pub(crate) fn fails() -> String {
    HOLDS.replace("clearance >= 0.005", "clearance 0 .. 0.060")
}

/// A folder of its own with files in it.
pub(crate) struct Bench {
    folder: TempDir,
}

/// What a call came to.
#[derive(Debug)]
pub(crate) struct Ran {
    pub(crate) status: u8,
    pub(crate) output: String,
    pub(crate) errors: String,
}

impl Bench {
    /// Puts files into a new folder.
    pub(crate) fn new(files: &[(&str, &str)]) -> Self {
        let bench = Bench { folder: TempDir::new().unwrap() };
        files.iter().for_each(|(name, text)| bench.put(name, text));
        bench
    }

    pub(crate) fn put(&self, name: &str, text: &str) {
        let path = self.path().join(name);
        std::fs::create_dir_all(path.parent().unwrap()).unwrap();
        std::fs::write(path, text).unwrap();
    }

    pub(crate) fn text(&self, name: &str) -> String {
        std::fs::read_to_string(self.path().join(name)).unwrap()
    }

    pub(crate) fn path(&self) -> &Path {
        self.folder.path()
    }

    /// Surroundings that are the same on every machine.
    pub(crate) fn environment(&self) -> Environment {
        Environment {
            folder: self.path().to_path_buf(),
            columns: None,
            watched: false,
            no_color: false,
            force_color: false,
            capable: true,
            today: "2027-01-15".to_string(),
        }
    }

    /// Runs a command in the folder.
    pub(crate) fn run(&self, line: &str) -> Ran {
        self.run_with(line, "", self.environment())
    }

    pub(crate) fn run_with(&self, line: &str, input: &str, environment: Environment) -> Ran {
        let arguments = std::iter::once("gapkeep").chain(line.split_whitespace());
        let (mut output, mut errors) = (Vec::new(), Vec::new());
        let mut input = input.as_bytes();
        let mut console = Console::new(&mut input, &mut output, &mut errors, environment);
        let status = run(arguments.map(OsString::from), &mut console);
        Ran {
            status,
            output: String::from_utf8(output).unwrap(),
            errors: String::from_utf8(errors).unwrap(),
        }
    }
}
