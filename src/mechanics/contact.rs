//! Any number of rings one in another, each pair in contact or open.
//!
//! Radii and gaps in m, radial; pressures in Pa, never negative. Ring `k` lies between the radii
//! `R_{k−1}` and `R_k`; contact `k` is at `R_k`, between ring `k` and ring `k+1`. Neighbours share
//! the nominal radius of their contact. Counted from 0 here. Knows nothing of temperatures or text.
//!
//! **Equations.** `u_{k+1}(R_k) − u_k(R_k) = δ_k` in every closed contact is `Mp = f` with a
//! tridiagonal M of positive diagonal and negative neighbours, and `f_k = δ_k + [u_k − u_{k+1}]`
//! without pressure. Contact can only press, so `p ≥ 0`, `Mp ≥ f` and one of the two is an equality:
//! a linear complementarity problem.
//!
//! **Solution without a case distinction.** Divided by the radii, M is the compliance of the rings:
//! symmetric and positive definite (each ring adds a 2×2 block of determinant `(1−ν²)/E²`), its
//! neighbours not positive, so M and each of its principal blocks has an inverse without negative
//! entries. For any set S of contacts let `p^S` solve `M_SS p^S = f_S`, open contacts at 0. The
//! solution p of the problem has `M_SS p_S ≥ f_S`, because the terms left out are not positive;
//! hence `p_S ≥ p^S`. With S the contacts that are closed, it is equal. A closed set of a
//! tridiagonal M falls into runs of neighbours that do not see each other, so
//!
//! `p_k = max(0, max over all runs i..j with i ≤ k ≤ j of (M_run⁻¹ f_run)_k)`.
//!
//! It needs `max` alone, and so holds for every kind of number.
//!
//! Source: the least-element property of such problems, Cottle, Pang and Stone, *The Linear
//! Complementarity Problem*, ch. 3 (from memory); the coefficients are Lamé's, see [`Ring`].

use super::ring::Ring;
use crate::numeric::Number;

/// One row of `Mp = f`.
#[derive(Debug, Clone)]
struct Row<N> {
    /// Minus `M_{k,k−1}`: not negative.
    before: N,
    /// `M_kk`.
    own: N,
    /// Minus `M_{k,k+1}`: not negative.
    after: N,
    /// `f_k`, m.
    misfit: N,
}

/// `M` and `f` of rings from the innermost outward with radial interferences `δ`.
///
/// Formula: `M_kk = R_k[(γ_{k+1}+ν_{k+1})/E_{k+1} + (γ_k−ν_k)/E_k]`,
/// `M_{k,k+1} = −2R_kR²_{k+1}/((R²_{k+1}−R²_k)E_{k+1})`,
/// `M_{k,k−1} = −2R_kR²_{k−1}/((R²_k−R²_{k−1})E_k)`, `f_k = δ_k + u_k(R_k) − u_{k+1}(R_k)` turning.
fn rows<N: Number>(rings: &[Ring<N>], interference: &[N]) -> Vec<Row<N>> {
    let pairs = rings.windows(2).zip(interference);
    let row = |(pair, delta): (&[Ring<N>], &N)| {
        let (inner, outer) = (&pair[0], &pair[1]);
        let r = inner.outside.clone();
        let growth = inner.outside_growth_turning() - outer.bore_growth_turning();
        Row {
            before: r.clone() * inner.outside_by_bore(),
            own: r.clone() * (outer.bore_compliance() + inner.outside_compliance()),
            after: r.clone() * outer.bore_by_outside(),
            misfit: delta.clone() + r * growth,
        }
    };
    pairs.map(row).collect()
}

/// What the contacts on one side of contact `k` add to its row when they are eliminated.
#[derive(Debug, Clone)]
struct Side<N> {
    /// Added to the misfit.
    misfit: N,
    /// Taken off the diagonal.
    softening: N,
}

/// The sides of every run that ends next to each contact, by elimination towards it: for contact
/// `k`, the run of nothing, then those of 1, 2, … contacts.
///
/// `towards` is minus the coefficient that couples the contact before with this one, seen from
/// there; `back` the same seen from here.
fn eliminated<N: Number>(
    rows: &[Row<N>],
    towards: impl Fn(&Row<N>) -> N,
    back: impl Fn(&Row<N>) -> N,
) -> Vec<Vec<Side<N>>> {
    let none = Side { misfit: N::exact(0.0), softening: N::exact(0.0) };
    let mut sides: Vec<Vec<Side<N>>> = Vec::with_capacity(rows.len());
    for (k, row) in rows.iter().enumerate() {
        let mut here = vec![none.clone()];
        if let (Some(last), Some(before)) = (sides.last(), k.checked_sub(1).map(|k| &rows[k])) {
            for side in last {
                let pivot = before.own.clone() - side.softening.clone();
                let share = back(row) / pivot;
                here.push(Side {
                    misfit: share.clone() * (before.misfit.clone() + side.misfit.clone()),
                    softening: share * towards(before),
                });
            }
        }
        sides.push(here);
    }
    sides
}

/// Pressures in the contacts of rings one in another, Pa; 0 where a contact is open.
///
/// Formula: `p ≥ 0`, `Mp ≥ f`, one of the two an equality, solved as the module says. Each run is
/// eliminated from both its ends towards `k` (Thomas), so that every pivot enters once.
///
/// Symbols: `rings` from the innermost, the only one that may be solid, outward; `interference` δ_k
/// (m), radial, one for each pair of neighbours: free radius of the inner one at its temperature less
/// that of the outer one, positive when they press.
///
/// Valid for: elastic rings of equal length, plane stress; terms of the order of a strain beside 1
/// are neglected.
pub fn pressures<N: Number>(rings: &[Ring<N>], interference: &[N]) -> Vec<N> {
    let solve = |row: &Row<N>, inward: &[Side<N>], outward: &[Side<N>]| {
        let runs = inward.iter().flat_map(|low| outward.iter().map(move |high| (low, high)));
        runs.fold(N::exact(0.0), |most, (low, high)| {
            let misfit = row.misfit.clone() + low.misfit.clone() + high.misfit.clone();
            let own = row.own.clone() - low.softening.clone() - high.softening.clone();
            most.max(misfit / own)
        })
    };
    each(rings, interference, solve)
}

/// Radial gaps in the contacts, m; 0 where closed.
///
/// Formula: `max(0, −f_k − what the neighbours bring)`: with contact k open, those inside it and those
/// outside it do not see each other, and each side brings the most that any of its runs next to k
/// does.
///
/// Symbols: as [`pressures`].
pub fn gaps<N: Number>(rings: &[Ring<N>], interference: &[N]) -> Vec<N> {
    let most = |sides: &[Side<N>]| {
        sides.iter().fold(N::exact(0.0), |most, side| most.max(side.misfit.clone()))
    };
    let solve = |row: &Row<N>, inward: &[Side<N>], outward: &[Side<N>]| {
        let closing = row.misfit.clone() + most(inward) + most(outward);
        (-closing).max(N::exact(0.0))
    };
    each(rings, interference, solve)
}

/// Asks `solve` for each contact, given its row and the runs that end next to it on either side.
fn each<N: Number>(
    rings: &[Ring<N>],
    interference: &[N],
    solve: impl Fn(&Row<N>, &[Side<N>], &[Side<N>]) -> N,
) -> Vec<N> {
    let rows = rows(rings, interference);
    let inward = eliminated(&rows, |before| before.after.clone(), |row| row.before.clone());
    let reversed: Vec<Row<N>> = rows.iter().rev().cloned().collect();
    let mut outward =
        eliminated(&reversed, |before| before.before.clone(), |row| row.after.clone());
    outward.reverse();
    (0..rows.len()).map(|k| solve(&rows[k], &inward[k], &outward[k])).collect()
}

/// Pressure in the bore and on the outside of ring `k`, given those in the contacts, Pa.
pub fn faces<N: Number>(pressures: &[N], k: usize) -> (N, N) {
    let at = |k: Option<usize>| {
        k.and_then(|k| pressures.get(k)).cloned().unwrap_or_else(|| N::exact(0.0))
    };
    (at(k.checked_sub(1)), at(Some(k)))
}

#[cfg(test)]
mod tests {
    use super::*;

    fn rings(radii: &[f64], moduli: &[f64]) -> Vec<Ring<f64>> {
        let ring = |(r, &modulus): (&[f64], &f64)| Ring {
            bore: (r[0] > 0.0).then_some(r[0]),
            outside: r[1],
            modulus,
            poisson: 0.3,
            spin: 0.0,
        };
        radii.windows(2).zip(moduli).map(ring).collect()
    }

    /// The solution the long way: every set of closed contacts, the equations of each solved by
    /// Gauss, the one taken that satisfies all conditions.
    fn by_trial(rows: &[Row<f64>]) -> Vec<f64> {
        let n = rows.len();
        let entry = |i: usize, j: usize| match i.abs_diff(j) {
            0 => rows[i].own,
            1 if j < i => -rows[i].before,
            1 => -rows[i].after,
            _ => 0.0,
        };
        for set in 0..1_usize << n {
            let closed: Vec<usize> = (0..n).filter(|k| set >> k & 1 == 1).collect();
            let m = closed.len();
            let mut a: Vec<Vec<f64>> = closed
                .iter()
                .map(|&i| {
                    let row = closed.iter().map(|&j| entry(i, j));
                    row.chain([rows[i].misfit]).collect()
                })
                .collect();
            for i in 0..m {
                for j in 0..m {
                    if i != j {
                        let factor = a[j][i] / a[i][i];
                        let pivot = a[i].clone();
                        a[j].iter_mut().zip(&pivot).for_each(|(x, p)| *x -= factor * p);
                    }
                }
            }
            let mut p = vec![0.0; n];
            for (row, &k) in closed.iter().enumerate() {
                p[k] = a[row][m] / a[row][row];
            }
            let slack = |i: usize| (0..n).map(|j| entry(i, j) * p[j]).sum::<f64>() - rows[i].misfit;
            if p.iter().all(|&p| p >= 0.0) && (0..n).all(|i| slack(i) >= -1e-15) {
                return p;
            }
        }
        panic!("one set of contacts must do");
    }

    #[test]
    fn runs_find_what_trying_every_set_finds() {
        let radii = [0.0, 0.01, 0.014, 0.015, 0.02, 0.03];
        let rings = rings(&radii, &[207e9, 70e9, 3e9, 110e9, 70e9]);
        let levels = [-30e-6, -3e-6, 2e-6, 25e-6];
        let mut open = 0;
        for case in 0..256_usize {
            let delta: Vec<f64> = (0..4).map(|k| levels[case >> (2 * k) & 3]).collect();
            let expected = by_trial(&rows(&rings, &delta));
            let found = pressures(&rings, &delta);
            for (found, expected) in found.iter().zip(&expected) {
                assert!((found - expected).abs() <= 1e-12 * expected.abs().max(1e5));
                open += usize::from(*expected == 0.0);
            }
        }
        assert!(open > 100 && open < 900, "both kinds of contact must occur: {open} open");
    }

    #[test]
    fn a_closed_contact_has_no_gap_and_an_open_one_no_pressure() {
        let rings = rings(&[0.01, 0.02, 0.025, 0.045], &[207e9, 110e9, 70e9]);
        let delta = [20e-6, -30e-6];
        let p = pressures(&rings, &delta);
        let gap = gaps(&rings, &delta);
        assert!(p[0] > 0.0 && gap[0] == 0.0);
        assert!(p[1] == 0.0 && gap[1] > 0.0);
        // The middle ring has grown towards the outer one: less than the 30 µm it was away.
        assert!(gap[1] < 30e-6);
        let (inner, outer) = faces(&p, 1);
        assert!(inner == p[0] && outer == 0.0);
    }

    #[test]
    fn one_contact_is_the_formula_for_one_joint() {
        let rings = rings(&[0.01, 0.02, 0.04], &[207e9, 70e9]);
        let c = rings[1].bore_compliance() + rings[0].outside_compliance();
        let p = pressures(&rings, &[15e-6]);
        assert!((p[0] / (15e-6 / (0.02 * c)) - 1.0).abs() < 1e-15);
    }
}
