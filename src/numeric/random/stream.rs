//! One unknown's stream of random numbers.

/// The golden-ratio increment of the generator.
pub(super) const GAMMA: u64 = 0x9e37_79b9_7f4a_7c15;

/// One unknown's stream: draw `k` can be made without the draws before it.
///
/// Generator: SplitMix64, whose state is the key plus the draw's number times an odd constant; the
/// output is a hash of the state that passes the usual batteries of tests.
///
/// Source: G. L. Steele, D. Lea, C. H. Flood, Fast splittable pseudorandom number generators,
/// OOPSLA 2014; the hash is D. Stafford's variant 13.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Stream {
    key: u64,
}

impl Stream {
    /// Makes the stream of the unknown `name` under a seed.
    ///
    /// The bytes are hashed (FNV-1a, 64 bits); two streams of one seed lie at unrelated places of
    /// one cycle of 2⁶⁴ numbers, so that a million draws of a hundred unknowns overlap with a
    /// probability below 1e-9.
    pub fn new(seed: u64, name: &[u8]) -> Self {
        let hash = name.iter().fold(0xcbf2_9ce4_8422_2325_u64, |hash, byte| {
            (hash ^ u64::from(*byte)).wrapping_mul(0x0000_0100_0000_01b3)
        });
        Stream { key: mix(mix(seed.wrapping_add(GAMMA)) ^ hash) }
    }

    /// An independent stream of the same unknown, for draws that take two numbers each.
    pub fn second(self) -> Self {
        Stream { key: mix(self.key ^ 0x5851_f42d_4c95_7f2d) }
    }

    /// The state of the generator at a draw.
    #[inline(always)]
    pub(super) fn state(self, draw: u64) -> u64 {
        self.key.wrapping_add(draw.wrapping_mul(GAMMA))
    }

    /// The 64 random bits of a draw.
    #[inline(always)]
    pub fn bits(self, draw: u64) -> u64 {
        mix(self.state(draw))
    }

    /// The draw as a number evenly distributed in (0, 1), never 0 or 1: an odd multiple of 2⁻⁵³.
    #[inline(always)]
    pub fn uniform(self, draw: u64) -> f64 {
        even(self.bits(draw))
    }
}

/// Spreads 52 of the bits over (0, 1): the bits as the mantissa of a number in [1, 2), less one,
/// plus half a step; every operation is exact.
#[inline(always)]
fn even(bits: u64) -> f64 {
    (f64::from_bits((bits >> 12) | 0x3ff0_0000_0000_0000) - 1.0) + f64::EPSILON * 0.5
}

/// Stafford's variant 13 of the 64-bit finalizer.
#[inline(always)]
pub(super) fn mix(state: u64) -> u64 {
    let z = (state ^ (state >> 30)).wrapping_mul(0xbf58_476d_1ce4_e5b9);
    let z = (z ^ (z >> 27)).wrapping_mul(0x94d0_49bb_1331_11eb);
    z ^ (z >> 31)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_generator_gives_its_published_numbers() {
        // First outputs of SplitMix64 from state 1234567 (the reference C code of S. Vigna,
        // splitmix64.c), which steps the state before hashing.
        let stream = Stream { key: 1_234_567 };
        let got: Vec<u64> = (1..=3).map(|k| stream.bits(k)).collect();
        assert_eq!(
            got,
            [6_457_827_717_110_365_317, 3_203_168_211_198_807_973, 9_817_491_932_198_370_423]
        );
    }

    #[test]
    fn numbers_stay_within_the_open_interval() {
        assert!(even(0) > 0.0 && even(u64::MAX) < 1.0);
        assert_eq!(even(0) + even(u64::MAX), 1.0);
    }

    #[test]
    fn seed_name_and_draw_each_change_the_number() {
        let one = Stream::new(1, b"bore");
        assert_ne!(one, Stream::new(2, b"bore"));
        assert_ne!(one, Stream::new(1, b"shaft"));
        assert_ne!(one.bits(0), one.bits(1));
        assert_ne!(one.bits(0), one.second().bits(0));
        assert_eq!(one.bits(7), Stream::new(1, b"bore").bits(7));
    }
}
