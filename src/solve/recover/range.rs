//! The larger and the smaller of what is seen along a segment, with their places.

use crate::quantity::Length;
use crate::solve::quotient::{Extreme, Extremes};

/// A value and its distance from the member's start.
#[derive(Clone, Copy)]
struct Located<T> {
    value: T,
    x: Length,
}

/// The larger and the smaller of what has been seen; of equal ones the first.
#[derive(Clone, Copy)]
pub(super) struct Range<T> {
    most: Option<Located<T>>,
    least: Option<Located<T>>,
}

/// A value and its place, where there is one.
pub(super) type Placed<T> = (Option<T>, Option<Length>);

impl<T: PartialOrd + Copy> Range<T> {
    pub(super) const NOTHING: Self = Range {
        most: None,
        least: None,
    };

    /// Takes in the extremes along a piece that begins at `from`.
    pub(super) fn take(&mut self, (most, least): Extremes<T>, from: Length, length: Length) {
        let located = |extreme: Extreme<T>| Located {
            value: extreme.value,
            x: from + length * extreme.at,
        };
        if self.most.is_none_or(|known| most.value > known.value) {
            self.most = Some(located(most));
        }
        if self.least.is_none_or(|known| least.value < known.value) {
            self.least = Some(located(least));
        }
    }

    /// Takes in all that another range has seen.
    pub(super) fn widen(&mut self, other: &Self) {
        if let Some(other) = other.most
            && self.most.is_none_or(|known| other.value > known.value)
        {
            self.most = Some(other);
        }
        if let Some(other) = other.least
            && self.least.is_none_or(|known| other.value < known.value)
        {
            self.least = Some(other);
        }
    }

    /// The largest value with its place, and the least.
    pub(super) fn placed(&self) -> [Placed<T>; 2] {
        [self.most, self.least].map(|located| (located.map(|l| l.value), located.map(|l| l.x)))
    }
}
