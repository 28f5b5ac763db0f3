//! A section of which only the area is known.

use super::{Along, Shape, no_taper, not_positive};
use crate::quantity::{Area, Curve, Length};

/// A section known by its area, and for buckling by its least radius of gyration.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct KnownArea {
    /// Its area; that is what varies linearly.
    pub area: Along<Area>,
    /// Its least radius of gyration, where given.
    pub gyration: Option<Along<Length>>,
}

impl Shape for KnownArea {
    fn area(&self) -> Curve<Area> {
        self.area.curve()
    }

    fn area_at(&self, s: f64) -> Area {
        self.area.at(s)
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        self.gyration.map(|gyration| gyration.at(s))
    }

    fn thickness(&self) -> Option<Length> {
        None
    }

    fn fault(&self) -> Option<String> {
        no_taper("area", &self.area).or_else(|| {
            self.gyration
                .as_ref()
                .and_then(|gyration| not_positive("radius of gyration", gyration))
        })
    }
}
