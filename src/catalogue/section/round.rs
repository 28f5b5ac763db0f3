//! A solid round.

use super::{Along, Shape, no_taper};
use crate::quantity::{Area, Curve, Length};
use std::f64::consts::FRAC_PI_4;

/// A solid round; it may taper to a point.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Round {
    /// Diameter.
    pub diameter: Along<Length>,
}

impl Shape for Round {
    fn area(&self) -> Curve<Area> {
        (self.diameter * self.diameter) * FRAC_PI_4
    }

    fn area_at(&self, s: f64) -> Area {
        let d = self.diameter.at(s);
        FRAC_PI_4 * (d * d)
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        Some(self.diameter.at(s) / 4.0)
    }

    fn thickness(&self) -> Option<Length> {
        Some(self.diameter.greatest())
    }

    fn fault(&self) -> Option<String> {
        no_taper("diameter", &self.diameter)
    }
}
