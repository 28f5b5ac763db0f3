//! The proof's own integration along a piece; it shares nothing with the solver's.

use std::sync::OnceLock;

/// A node between 0 and 1 with its weight.
#[derive(Debug, Clone, Copy)]
pub(super) struct Node {
    pub(super) s: f64,
    pub(super) weight: f64,
}

/// Gauss–Legendre with three points: exact to degree 5, where a piece of constant area needs 4 (the
/// square of an N that is quadratic). Abscissae 0 and ±√(3/5), weights 8/9 and 5/9.
pub(super) fn uniform() -> &'static [Node] {
    static NODES: OnceLock<[Node; 3]> = OnceLock::new();
    NODES.get_or_init(|| {
        let outer = 0.6_f64.sqrt();
        [(-outer, 5.0), (0.0, 8.0), (outer, 5.0)].map(|(x, weight)| Node {
            s: 0.5 * (1.0 + x),
            weight: weight / 18.0,
        })
    })
}

/// Double-exponential (tanh–sinh) quadrature: its nodes crowd toward both ends, so that steep
/// tapers and tips integrate to rounding (H. Takahasi, M. Mori, Publ. RIMS 9, 1974).
pub(super) fn tapered() -> &'static [Node] {
    static NODES: OnceLock<Vec<Node>> = OnceLock::new();
    NODES.get_or_init(|| {
        const STEP: f64 = 1.0 / 24.0;
        const REACH: i32 = 84; // beyond 3.5 the nodes fall on the ends
        let node = |k: i32| {
            let t = f64::from(k) * STEP;
            let inner = std::f64::consts::FRAC_PI_2 * t.sinh();
            let weight = std::f64::consts::FRAC_PI_2 * t.cosh() / inner.cosh().powi(2);
            Node {
                s: 1.0 / (1.0 + (-2.0 * inner).exp()),
                weight: 0.5 * STEP * weight,
            }
        };
        (-REACH..=REACH)
            .map(node)
            .filter(|node| node.s > 0.0 && node.s < 1.0)
            .collect()
    })
}

#[cfg(test)]
mod tests {
    use super::{Node, tapered, uniform};
    use approx::assert_relative_eq;

    fn integrate(nodes: &[Node], f: impl Fn(f64) -> f64) -> f64 {
        nodes.iter().map(|node| node.weight * f(node.s)).sum()
    }

    #[test]
    fn three_points_are_exact_to_degree_five() {
        for degree in 0..6 {
            let exact = 1.0 / f64::from(degree + 1);
            assert_relative_eq!(
                integrate(uniform(), |s| s.powi(degree)),
                exact,
                max_relative = 1e-14
            );
        }
    }

    #[test]
    fn steep_tapers_integrate_to_their_closed_forms() {
        for ratio in [1.0_f64, 0.5, 1e-2, 1e-4, 1e-6] {
            let round = integrate(tapered(), |s| ((1.0 - s) + ratio * s).powi(-2));
            // A node next to the thin end is known to a rounding of 1, so to one of 1 / ratio there.
            assert_relative_eq!(round, 1.0 / ratio, max_relative = 1e-14 + 4e-16 / ratio);
        }
    }
}
