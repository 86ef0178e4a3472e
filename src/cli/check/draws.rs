//! How shares are drawn where they are: seed, number of draws, width of the confidence interval.

use crate::evaluate::{Detail, Options};
use clap::Args;

/// Fewest and most draws of a share.
const DRAWS: (u64, u64) = (1_000, 1_000_000_000);
/// Most draws for a width, unless stated.
const MOST_FOR_WIDTH: u64 = 100_000_000;

/// Arguments for draws. They change no figure that is computed without.
#[derive(Debug, Args)]
pub(in crate::cli) struct Draws {
    /// Seed of all draws; the same seed gives the same digits on every machine [default: 1].
    #[arg(long, value_name = "N", value_parser = seed, allow_negative_numbers = true)]
    seed: Option<u64>,
    /// Assemblies drawn for each share that needs draws, 1000 to 1e9 [default: 1e6]; with
    /// `--to-width` the most of them [default: 1e8].
    #[arg(long, value_name = "N", value_parser = samples, allow_negative_numbers = true)]
    samples: Option<u64>,
    /// Draw until the 99 % confidence interval of each drawn share is no wider than this, such as
    /// `0.01%`, or until the most draws are made.
    #[arg(long, value_name = "SHARE", value_parser = width, allow_negative_numbers = true)]
    to_width: Option<f64>,
}

impl Draws {
    /// What an evaluation is asked for.
    pub(super) fn options(&self, detail: Detail) -> Options {
        let usual = Options::default();
        let most = if self.to_width.is_some() { MOST_FOR_WIDTH } else { usual.draws };
        Options {
            detail,
            seed: self.seed.unwrap_or(usual.seed),
            draws: self.samples.unwrap_or(most),
            to_width: self.to_width,
        }
    }
}

fn seed(text: &str) -> Result<u64, String> {
    text.parse().map_err(|_| format!("expected a whole number from 0 to {}", u64::MAX))
}

/// Reads `1000000` or `1e6`.
fn samples(text: &str) -> Result<u64, String> {
    let whole = match text.parse::<u64>() {
        Ok(whole) => Some(whole),
        // Doubles tell every whole number up to the most that is allowed.
        Err(_) => text
            .parse::<f64>()
            .ok()
            .filter(|x| x.fract() == 0.0 && (0.0..=DRAWS.1 as f64).contains(x))
            .map(|x| x as u64),
    };
    whole
        .filter(|n| (DRAWS.0..=DRAWS.1).contains(n))
        .ok_or_else(|| format!("expected a whole number from {} to 1e9, such as `1e6`", DRAWS.0))
}

/// Reads `0.01%` or `0.0001`.
fn width(text: &str) -> Result<f64, String> {
    super::share(text)
        .ok()
        .filter(|&share| share > 0.0 && share < 1.0)
        .ok_or_else(|| "expected a share between 0 and 100 %, such as `0.01%` or `0.0001`".into())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn numbers_are_read_as_people_write_them() {
        assert_eq!(samples("1e6"), Ok(1_000_000));
        assert_eq!(samples("1000"), Ok(1000));
        assert_eq!(samples("2.5e3"), Ok(2500));
        assert_eq!(samples("1e9"), Ok(1_000_000_000));
        for wrong in ["999", "1000000001", "1e10", "1.5", "-5", "", "many", "NaN", "inf", "1e400"] {
            assert!(samples(wrong).is_err(), "{wrong}");
        }
        assert_eq!(seed("18446744073709551615"), Ok(u64::MAX));
        assert!(seed("-1").is_err() && seed("0x1").is_err());
        assert_eq!(width("0.01%"), Ok(0.0001));
        assert_eq!(width("0.0001"), Ok(0.0001));
        for wrong in ["0", "0%", "100%", "1", "-1%", "NaN", "thin"] {
            assert!(width(wrong).is_err(), "{wrong}");
        }
    }
}
