//! The thin program: it hands its surroundings to the library and passes the exit status on.

use gapkeep::cli::{Console, Environment, run};
use std::process::ExitCode;

fn main() -> ExitCode {
    let environment = Environment::of_process();
    let mut input = std::io::stdin().lock();
    let mut output = std::io::stdout().lock();
    let mut errors = std::io::stderr().lock();
    let mut console = Console::new(&mut input, &mut output, &mut errors, environment);
    ExitCode::from(run(std::env::args_os(), &mut console))
}
