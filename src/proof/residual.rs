//! The largest of many relative leftovers.

use uom::si::{Dimension, Quantity, SI};

/// The largest leftover seen.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Residual(f64);

impl Residual {
    /// A leftover that is not a number counts as infinite: it must never pass as small.
    pub(super) fn take(&mut self, leftover: f64) {
        if leftover.is_nan() {
            self.0 = f64::INFINITY;
        } else if leftover > self.0 {
            self.0 = leftover;
        }
    }

    pub(super) fn largest(self) -> f64 {
        self.0
    }
}

/// Division by the sum of the sizes of a leftover's terms.
pub(super) trait Size {
    /// The leftover's size over that of its terms; 0 where there are none.
    fn over(self, size: Self) -> f64;
}

impl<D: Dimension + ?Sized> Size for Quantity<D, SI<f64>, f64> {
    fn over(self, size: Self) -> f64 {
        if self.value == 0.0 {
            0.0
        } else {
            self.value.abs() / size.value
        }
    }
}
