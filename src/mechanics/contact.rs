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

/// One side of a contact: the rings of a run that ends there, seen from the contact.
#[derive(Debug, Clone)]
struct Side<N> {
    /// What the contacts of the run add to the misfit, as a share of the radius.
    misfit: N,
    /// How much the side gives way for each pressure, as a share of the radius, 1/Pa.
    compliance: N,
}

/// `f_k/R_k`: what each contact must close, as a share of its radius, counted as interference.
///
/// Formula: `f_k = δ_k + u_k(R_k) − u_{k+1}(R_k)`, turning and without pressure.
fn misfits<N: Number>(rings: &[Ring<N>], interference: &[N]) -> Vec<N> {
    let pairs = rings.windows(2).zip(interference);
    let misfit = |(pair, delta): (&[Ring<N>], &N)| {
        let growth = pair[0].outside_growth_turning() - pair[1].bore_growth_turning();
        delta.clone() / pair[0].outside.clone() + growth
    };
    pairs.map(misfit).collect()
}

/// How a ring passes on what presses its far face to the near one, which touches the contact looked
/// at: the coefficients of Lamé's solution, each to be divided by the modulus.
struct Passing<N> {
    modulus: N,
    near: N,
    far: N,
    to_near: N,
    to_far: N,
}

impl<N: Number> Passing<N> {
    /// Of a ring seen from the contact in its bore.
    fn inward(ring: &Ring<N>) -> Self {
        Passing {
            modulus: ring.modulus.clone(),
            near: ring.gamma() + ring.poisson.clone(),
            far: ring.gamma() - ring.poisson.clone(),
            to_near: ring.g() + 2.0,
            to_far: ring.g(),
        }
    }

    /// Of a ring seen from the contact on its outside.
    fn outward(ring: &Ring<N>) -> Self {
        let Passing { modulus, near, far, to_near, to_far } = Passing::inward(ring);
        Passing { modulus, near: far, far: near, to_near: to_far, to_far: to_near }
    }

    /// `far + E·C`: how much the far face gives way to a pressure between it and what lies beyond,
    /// measured by the modulus of the ring.
    fn pivot(&self, beyond: &Side<N>) -> N {
        self.modulus.clone() * beyond.compliance.clone() + self.far.clone()
    }

    /// The sides of a contact next to this ring: of the ring alone, and carried by the contact at its
    /// far face, which has `misfit`, in each of its runs `beyond`.
    ///
    /// Formula: alone it gives way by `near/E`; carried, by `(near − to_far·s)/E` with
    /// `s = to_near/(far + E·C)`, and brings `s` times the misfit from there. This is elimination
    /// (Thomas) with the rows divided by the stiffness of the ring, so that its modulus enters as its
    /// ratio to the neighbours'.
    fn sides(&self, misfit: Option<&N>, beyond: &[Side<N>]) -> Vec<Side<N>> {
        let compliance = self.near.clone() / self.modulus.clone();
        let mut here = vec![Side { misfit: N::exact(0.0), compliance }];
        for (side, misfit) in beyond.iter().zip(misfit.into_iter().cycle()) {
            let share = self.to_near.clone() / self.pivot(side);
            let stiffened = self.near.clone() - share.clone() * self.to_far.clone();
            here.push(Side {
                misfit: share * (misfit.clone() + side.misfit.clone()),
                compliance: stiffened / self.modulus.clone(),
            });
        }
        here
    }
}

/// The sides outside each contact: of the run that ends with it, and of those of 1, 2, … contacts
/// more.
fn outward<N: Number>(rings: &[Ring<N>], misfits: &[N]) -> Vec<Vec<Side<N>>> {
    let mut sides: Vec<Vec<Side<N>>> = Vec::with_capacity(misfits.len());
    for (k, ring) in rings.iter().enumerate().skip(1).rev() {
        let beyond = sides.last().map_or(&[][..], |s| s);
        sides.push(Passing::inward(ring).sides(misfits.get(k), beyond));
    }
    sides.reverse();
    sides
}

/// The sides inside each contact, as [`outward`] has those outside.
fn inward<N: Number>(rings: &[Ring<N>], misfits: &[N]) -> Vec<Vec<Side<N>>> {
    let mut sides: Vec<Vec<Side<N>>> = Vec::with_capacity(misfits.len());
    for (k, ring) in rings.iter().enumerate().take(misfits.len()) {
        let misfit = k.checked_sub(1).map(|before| &misfits[before]);
        let beyond = sides.last().map_or(&[][..], |s| s);
        sides.push(Passing::outward(ring).sides(misfit, beyond));
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
    let misfits = misfits(rings, interference);
    let (inside, outside) = (inward(rings, &misfits), outward(rings, &misfits));
    (0..misfits.len()).map(|k| pressed(&misfits[k], &inside[k], &outside[k])).collect()
}

/// The greatest pressure that any run brings to a contact, or none.
fn pressed<N: Number>(misfit: &N, inside: &[Side<N>], outside: &[Side<N>]) -> N {
    let runs = inside.iter().flat_map(|low| outside.iter().map(move |high| (low, high)));
    not_negative(runs.map(|(low, high)| {
        let closing = misfit.clone() + low.misfit.clone() + high.misfit.clone();
        closing / (low.compliance.clone() + high.compliance.clone())
    }))
}

/// The greatest of some pressures, 0 where all are negative. None is compared with 0 before the
/// greatest is known: a short run may part where a longer one presses for certain.
fn not_negative<N: Number>(pressures: impl Iterator<Item = N>) -> N {
    pressures.reduce(|most, p| most.max(p)).map_or(N::exact(0.0), |most| most.max(N::exact(0.0)))
}

/// Radial gaps in the contacts, m; 0 where closed.
///
/// Formula: `max(0, −f_k − what the neighbours bring)`: with contact k open, those inside it and those
/// outside it do not see each other, and each side brings the most that any of its runs next to k
/// does.
///
/// Symbols: as [`pressures`].
pub fn gaps<N: Number>(rings: &[Ring<N>], interference: &[N]) -> Vec<N> {
    let misfits = misfits(rings, interference);
    let (inside, outside) = (inward(rings, &misfits), outward(rings, &misfits));
    let most = |sides: &[Side<N>]| {
        sides.iter().fold(N::exact(0.0), |most, side| most.max(side.misfit.clone()))
    };
    let gap = |k: usize| {
        let closing = misfits[k].clone() + most(&inside[k]) + most(&outside[k]);
        (-closing).max(N::exact(0.0)) * rings[k].outside.clone()
    };
    (0..misfits.len()).map(gap).collect()
}

/// Pressure in the bore and on the outside of ring `k`, Pa.
///
/// Formula: that in the bore, p_a, as [`pressures`]. Given it, the contacts further out are a stack of
/// their own, whose first has `g·p_a/E` more to close; so the one outside has
/// `p_b = max(0, greatest of (E(f/R + misfit beyond) + g·p_a)/((γ−ν) + E·C))` over the runs that begin
/// with it. Both would follow from [`pressures`] too; that p_b is written by p_a keeps what they have
/// in common, on whose difference the stress depends.
///
/// Symbols, valid for: as [`pressures`].
pub fn faces<N: Number>(rings: &[Ring<N>], interference: &[N], k: usize) -> (N, N) {
    let misfits = misfits(rings, interference);
    let outside = outward(rings, &misfits);
    let p_a = match k.checked_sub(1) {
        Some(before) => {
            pressed(&misfits[before], &inward(rings, &misfits)[before], &outside[before])
        }
        None => N::exact(0.0),
    };
    let ring = Passing::inward(&rings[k]);
    let p_b = not_negative(outside.get(k).into_iter().flatten().map(|beyond| {
        let closing = ring.modulus.clone() * (misfits[k].clone() + beyond.misfit.clone());
        (closing + ring.to_far.clone() * p_a.clone()) / ring.pivot(beyond)
    }));
    (p_a, p_b)
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

    /// One row of `Mp = f`, as the module's equations have it: minus `M_{k,k−1}`, `M_kk`, minus
    /// `M_{k,k+1}`, and `f_k`.
    struct Row {
        before: f64,
        own: f64,
        after: f64,
        misfit: f64,
    }

    fn rows(rings: &[Ring<f64>], interference: &[f64]) -> Vec<Row> {
        let row = |(pair, delta): (&[Ring<f64>], &f64)| {
            let r = pair[0].outside;
            let growth = pair[0].outside_growth_turning() - pair[1].bore_growth_turning();
            Row {
                before: r * pair[0].outside_by_bore(),
                own: r * (pair[1].bore_compliance() + pair[0].outside_compliance()),
                after: r * pair[1].bore_by_outside(),
                misfit: delta + r * growth,
            }
        };
        rings.windows(2).zip(interference).map(row).collect()
    }

    /// The solution the long way: every set of closed contacts, the equations of each solved by
    /// Gauss, the one taken that satisfies all conditions.
    fn by_trial(rows: &[Row]) -> Vec<f64> {
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
        assert_eq!(faces(&rings, &delta, 1), (p[0], 0.0));
    }

    #[test]
    fn one_contact_is_the_formula_for_one_joint() {
        let rings = rings(&[0.01, 0.02, 0.04], &[207e9, 70e9]);
        let c = rings[1].bore_compliance() + rings[0].outside_compliance();
        let p = pressures(&rings, &[15e-6]);
        assert!((p[0] / (15e-6 / (0.02 * c)) - 1.0).abs() < 1e-15);
    }
}
