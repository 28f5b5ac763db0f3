//! The largest of many relative leftovers.

use crate::quantity::Energy;
use uom::si::{Dimension, Quantity, SI};

/// The largest leftover seen.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Residual(f64);

impl Residual {
    /// A leftover that is not a number counts as infinite: it must never pass as small.
    pub(super) fn take(&mut self, leftover: f64) {
        let leftover = if leftover.is_nan() {
            f64::INFINITY
        } else {
            leftover
        };
        self.0 = self.0.max(leftover);
    }

    pub(super) fn largest(self) -> f64 {
        self.0
    }
}

/// Works that must cancel, and the sum of their sizes.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Work {
    balance: Energy,
    size: Energy,
}

impl Work {
    /// Adds a work by its own size.
    pub(super) fn take(&mut self, work: Energy) {
        self.add(work, work.abs());
    }

    /// Adds a work that terms of this size add up to.
    pub(super) fn add(&mut self, work: Energy, size: Energy) {
        self.balance += work;
        self.size += size;
    }

    /// Both together.
    pub(super) fn and(mut self, other: Work) -> Work {
        self.add(other.balance, other.size);
        self
    }

    /// What is left over, relative to the sizes.
    pub(super) fn left(&self) -> f64 {
        self.balance.over(self.size)
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
