//! How far a long run has come, on standard error, for someone who waits at a terminal.

use super::console::Console;
use crate::evaluate::tally::Tally;
use std::sync::atomic::{AtomicUsize, Ordering};
use std::sync::mpsc::{RecvTimeoutError, sync_channel};
use std::time::Duration;

/// Work that ends sooner shows no progress.
const PATIENCE: Duration = Duration::from_secs(1);
/// How often the line is renewed.
const EVERY: Duration = Duration::from_millis(200);

/// How far a run has come; looked at from another thread.
#[derive(Debug, Default)]
pub(crate) struct Progress {
    /// Draws.
    pub(crate) tally: Tally,
    specs: AtomicUsize,
}

impl Progress {
    /// One more spec is done.
    pub(super) fn count_spec(&self) {
        self.specs.fetch_add(1, Ordering::Relaxed);
    }

    /// The line that says it.
    fn line(&self, specs: usize) -> String {
        let (drawn, wanted) = (self.tally.drawn(), self.tally.wanted());
        let done = self.specs.load(Ordering::Relaxed);
        let of = match specs {
            1 => "checking".to_string(),
            _ => format!("{done} of {specs} specs checked"),
        };
        if wanted == 0 {
            return of;
        }
        let millions = |draws: u64| draws as f64 / 1e6;
        format!("{of}, {:.1} of {:.1} million assemblies drawn", millions(drawn), millions(wanted))
    }
}

/// Does work on `specs` specs, and shows how far it is where somebody looks and it takes long.
pub(super) fn watch<T: Send>(
    console: &mut Console<'_>,
    progress: &Progress,
    specs: usize,
    work: impl FnOnce() -> T + Send,
) -> T {
    if !console.environment().watched {
        return work();
    }
    show(console, PATIENCE, EVERY, || progress.line(specs), work)
}

/// Does work on another thread; after `patience` writes a line, anew `every` so often, and takes it
/// back at the end. No control sequence but the return of the carriage is needed.
fn show<T: Send>(
    console: &mut Console<'_>,
    patience: Duration,
    every: Duration,
    line: impl Fn() -> String,
    work: impl FnOnce() -> T + Send,
) -> T {
    std::thread::scope(|scope| {
        let (end, ended) = sync_channel::<()>(1);
        let worker = scope.spawn(move || {
            // Dropped when the work is over, also where it panics.
            let _end = end;
            work()
        });
        let (mut wait, mut columns) = (patience, 0);
        while ended.recv_timeout(wait) == Err(RecvTimeoutError::Timeout) {
            let line = line();
            console.say(&format!("\r{line:columns$}"));
            (wait, columns) = (every, line.len());
        }
        if columns > 0 {
            console.say(&format!("\r{:columns$}\r", ""));
        }
        match worker.join() {
            Ok(result) => result,
            Err(panic) => std::panic::resume_unwind(panic),
        }
    })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::cli::Environment;

    #[test]
    fn long_work_shows_a_line_and_takes_it_back() {
        let environment = Environment { watched: true, ..Environment::of_process() };
        let (mut output, mut errors) = (Vec::new(), Vec::new());
        let mut input: &[u8] = b"";
        let mut console = Console::new(&mut input, &mut output, &mut errors, environment);
        let short = Duration::from_millis(2);
        let quick = show(&mut console, Duration::from_secs(60), short, || "a".into(), || 3);
        let progress = Progress::default();
        progress.count_spec();
        let slow = show(
            &mut console,
            short,
            short,
            || progress.line(2),
            || {
                std::thread::sleep(Duration::from_millis(100));
                4
            },
        );
        assert_eq!((quick, slow), (3, 4));
        let shown = String::from_utf8(errors).unwrap();
        assert!(shown.starts_with("\r1 of 2 specs checked\r"), "{shown:?}");
        assert!(shown.ends_with(&format!("\r{}\r", " ".repeat(20))), "{shown:?}");
        assert!(output.is_empty());
    }
}
