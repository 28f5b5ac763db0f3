//! Where a polynomial in Bernstein form changes its sign.

use crate::quantity::Curve;

/// How often an interval is halved before it counts as a point: 2⁻⁶⁰ of a piece is below the
/// spacing of doubles near 1.
const HALVINGS: u32 = 60;

/// The places strictly between 0 and 1 at which `curve` changes its sign, in rising order.
///
/// The coefficients bound the curve, so an interval whose coefficients have one sign is left out
/// at once; the rest are halved until they are points. A touch without a change of sign may be
/// missed: no extreme lies there.
pub(super) fn sign_changes(curve: &Curve<f64>) -> Vec<f64> {
    let mut found = Vec::new();
    search(curve, 0.0, 1.0, 0, &mut found);
    found
}

fn search(curve: &Curve<f64>, from: f64, to: f64, depth: u32, found: &mut Vec<f64>) {
    let changes = changes_of_sign(curve.coefficients());
    if changes == 0 {
        return;
    }
    let middle = 0.5 * (from + to);
    if changes == 1 && curve.start() * curve.end() < 0.0 {
        found.push(from + (to - from) * bisect(curve));
        return;
    }
    if depth == HALVINGS {
        return;
    }
    let (left, right) = curve.cut(0.5);
    search(&left, from, middle, depth + 1, found);
    if left.end() == 0.0 && left.start() * right.end() < 0.0 {
        found.push(middle);
    }
    search(&right, middle, to, depth + 1, found);
}

fn changes_of_sign(coefficients: &[f64]) -> usize {
    let mut changes = 0;
    let mut last = 0.0;
    for &c in coefficients.iter().filter(|&&c| c != 0.0) {
        if last * c < 0.0 {
            changes += 1;
        }
        last = c;
    }
    changes
}

/// The one root of a curve whose ends differ in sign.
fn bisect(curve: &Curve<f64>) -> f64 {
    let rising = curve.end() > 0.0;
    let (mut low, mut high) = (0.0, 1.0);
    for _ in 0..HALVINGS {
        let middle = 0.5 * (low + high);
        if (curve.at(middle) > 0.0) == rising {
            high = middle;
        } else {
            low = middle;
        }
    }
    0.5 * (low + high)
}

#[cfg(test)]
mod tests {
    use super::sign_changes;
    use crate::quantity::Curve;
    use approx::assert_relative_eq;

    #[test]
    fn every_change_of_sign_is_found_in_order() {
        // (s - 0.25)(s - 0.5)(s - 0.9), by its factors' coefficients
        let factor = |root: f64| Curve::linear(-root, 1.0 - root);
        let curve: Curve<f64> = factor(0.25).times(&factor(0.5)).times(&factor(0.9));
        let found = sign_changes(&curve);
        assert_eq!(found.len(), 3);
        for (found, root) in found.iter().zip([0.25, 0.5, 0.9]) {
            assert_relative_eq!(*found, root, max_relative = 1e-13);
        }
    }

    #[test]
    fn a_curve_of_one_sign_has_none() {
        assert!(sign_changes(&Curve::from_coefficients(&[1.0, 0.5, 2.0])).is_empty());
        assert!(sign_changes(&Curve::constant(0.0)).is_empty());
    }
}
