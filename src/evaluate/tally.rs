//! Counts of draws that another thread may look at while an evaluation runs. They change no figure.

use std::sync::atomic::{AtomicU64, Ordering};

/// How many assemblies have been drawn of those wanted so far.
#[derive(Debug, Default)]
pub struct Tally {
    wanted: AtomicU64,
    drawn: AtomicU64,
}

impl Tally {
    /// Number of assemblies drawn.
    pub fn drawn(&self) -> u64 {
        self.drawn.load(Ordering::Relaxed)
    }

    /// Number of assemblies that are known to be wanted; grows while more are asked for.
    pub fn wanted(&self) -> u64 {
        self.wanted.load(Ordering::Relaxed)
    }

    pub(super) fn want(&self, draws: u64) {
        self.wanted.fetch_add(draws, Ordering::Relaxed);
    }

    pub(super) fn count(&self, draws: u64) {
        self.drawn.fetch_add(draws, Ordering::Relaxed);
    }
}
