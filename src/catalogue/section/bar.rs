//! A solid rectangle.

use super::{Along, Shape, no_taper, smaller};
use crate::quantity::{Area, Curve, Length};

/// A flat or square bar; each side may taper to nothing.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct Bar {
    pub width: Along<Length>,
    pub depth: Along<Length>,
}

impl Shape for Bar {
    fn area(&self) -> Curve<Area> {
        self.width * self.depth
    }

    fn area_at(&self, s: f64) -> Area {
        self.width.at(s) * self.depth.at(s)
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        Some(smaller(self.width.at(s), self.depth.at(s)) / 12f64.sqrt())
    }

    /// The smaller side, where it is greatest: at an end, or where two tapering sides are equal.
    fn thickness(&self) -> Option<Length> {
        let at = |s| smaller(self.width.at(s), self.depth.at(s));
        let (start, end) = (
            self.width.start - self.depth.start,
            self.width.end - self.depth.end,
        );
        let crossing = (start / (start - end)).value;
        let inside = if crossing > 0.0 && crossing < 1.0 {
            at(crossing)
        } else {
            Length::default()
        };
        Some(super::larger(super::larger(at(0.0), at(1.0)), inside))
    }

    fn fault(&self) -> Option<String> {
        no_taper("width", &self.width).or_else(|| no_taper("depth", &self.depth))
    }
}
