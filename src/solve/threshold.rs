//! The one threshold that decides what counts as zero.

use crate::quantity::{Force, Length};

/// Below these a force or a length counts as zero: an exact touch is no bearing, a balanced load is
/// no push. Both are relative to the sizes of the combination's own actions on the member, so that
/// the decision does not depend on units or on the size of the job.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Threshold {
    /// A force that counts as none.
    pub force: Force,
    /// A length that counts as none.
    pub length: Length,
}

impl Threshold {
    /// Rounding of sums stays two orders below this, and no clearance is drawn to this accuracy.
    const RELATIVE: f64 = 1e-12;

    /// The length that counts as none where lengths of this size, and no others, come together.
    pub(super) fn beside(lengths: Length) -> Length {
        lengths * Self::RELATIVE
    }

    /// From the sum of the sizes of forces and of lengths that come together in one member.
    pub(super) fn relative_to(forces: Force, lengths: Length) -> Self {
        Threshold {
            force: forces * Self::RELATIVE,
            length: lengths * Self::RELATIVE,
        }
    }
}
