//! Loops compiled for the vector registers that the machine has.

/// Runs a job compiled for the widest vectors of the machine: what is inlined into it is compiled
/// once for each kind, and the kind is chosen when it runs.
///
/// The operations stay the same, so the digits do too. Mark the closure `#[inline(always)]`.
#[inline]
pub fn vectorized<R>(job: impl FnMut() -> R) -> R {
    pulp::Arch::new().dispatch(Job(job))
}

struct Job<F>(F);

impl<R, F: FnMut() -> R> pulp::WithSimd for Job<F> {
    type Output = R;

    #[inline(always)]
    fn with_simd<S: pulp::Simd>(self, _: S) -> R {
        // Called by reference: a call by value goes through a function that is never inlined.
        let mut job = self.0;
        job()
    }
}
