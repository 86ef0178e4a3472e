//! The band that friction along the seat of a joint leaves its pressure, a line a condition.

use super::{paragraph_kept, section};
use crate::findings::number::{Round, digits, shown, with_unit};
use crate::report::look::Look;
use crate::report::wrap::{left, visible, width};
use crate::report::{Account, FrictionBand};

/// Writes the bands of each joint.
pub(super) fn render(out: &mut String, account: &Account, look: Look) {
    for bands in account.bands.chunk_by(|a, b| a.joint == b.joint) {
        section(out, &format!("friction in fit {}", bands[0].joint), look);
        let column = bands.iter().map(|b| width(&visible(&b.condition))).max().unwrap_or(0);
        for band in bands {
            let name = left(&visible(&band.condition), column.max(8));
            paragraph_kept(out, 2, &format!("{name}  {}", line(band)), look);
        }
    }
}

/// `true pressure within 28.9 .. 75.1 MPa, κ = 0.050`
fn line(band: &FrictionBand) -> String {
    let kappa = digits(band.coupling, 3, Round::Up);
    if !band.greatest.is_finite() {
        let least = with_unit(band.least, band.unit, Round::Down);
        return format!("true pressure from {least} without end, κ = {kappa}");
    }
    let least = shown(band.least, band.unit, Round::Down);
    let greatest = with_unit(band.greatest, band.unit, Round::Up);
    format!("true pressure within {least} .. {greatest}, κ = {kappa}")
}
