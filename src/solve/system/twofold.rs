//! Doubled precision from error-free sums and products.
//!
//! A value is kept as the unevaluated sum of two doubles. The error-free transformations are those
//! of Knuth (the sum) and of the fused multiply-add (the product); kept up through a sum of
//! products they give about 32 digits (Ogita, Rump, Oishi, "Accurate sum and dot product", SIAM J.
//! Sci. Comput. 26, 2005).

/// An unevaluated sum of two doubles, the second at most about a rounding of the first.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub(super) struct Twofold {
    high: f64,
    low: f64,
}

impl Twofold {
    /// Rounded to one double.
    pub(super) fn value(self) -> f64 {
        self.high + self.low
    }

    /// `self + x`.
    #[inline]
    pub(super) fn plus(self, x: f64) -> Self {
        let (high, error) = two_sum(self.high, x);
        settle(high, self.low + error)
    }

    /// `self + a b`.
    #[inline]
    pub(super) fn plus_product(self, a: f64, b: Twofold) -> Self {
        let product = a * b.high;
        let product_error = a.mul_add(b.high, -product);
        let (high, error) = two_sum(self.high, product);
        settle(high, self.low + (error + a.mul_add(b.low, product_error)))
    }

    /// `a self`.
    #[inline]
    pub(super) fn times(self, a: f64) -> Self {
        Twofold::default().plus_product(a, self)
    }
}

impl From<f64> for Twofold {
    fn from(high: f64) -> Self {
        Twofold { high, low: 0.0 }
    }
}

/// The rounded sum and its exact error.
#[inline]
fn two_sum(a: f64, b: f64) -> (f64, f64) {
    let sum = a + b;
    let of_b = sum - a;
    (sum, (a - (sum - of_b)) + (b - of_b))
}

/// The same sum with its parts apart by a rounding again; `high` is the larger.
#[inline]
fn settle(high: f64, low: f64) -> Twofold {
    let sum = high + low;
    Twofold {
        high: sum,
        low: low - (sum - high),
    }
}

#[cfg(test)]
mod tests {
    use super::Twofold;

    #[test]
    fn what_cancels_leaves_its_rest() {
        let tiny = 3.0e-20;
        let sum = Twofold::from(1.0).plus(tiny).plus(-1.0);
        assert_eq!(sum.value(), tiny);
    }

    #[test]
    fn a_product_keeps_its_lower_half() {
        // (1 + e)² − 1 − 2 e = e², with e = 2⁻³⁰: the square's last bit is beyond one double.
        let e = 2.0_f64.powi(-30);
        let square = Twofold::default().plus_product(1.0 + e, Twofold::from(1.0 + e));
        assert_eq!(square.plus(-1.0).plus(-2.0 * e).value(), e * e);
    }

    #[test]
    fn a_twofold_factor_counts_with_both_halves() {
        // 1/3 in doubles is too small by 2⁻⁵⁴/3; with that as its lower half three of them make 1.
        let third = Twofold::from(1.0 / 3.0).plus(2.0_f64.powi(-54) / 3.0);
        assert!(third.times(3.0).plus(-1.0).value().abs() < 1e-31);
    }
}
