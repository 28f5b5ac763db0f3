//! An angle.

use super::rectangles::{Rectangle, least_gyration};
use super::{
    Along, Shape, fault_at_ends, fillets, fillets_at, negative_root, not_positive, smaller,
};
use crate::quantity::{Area, Curve, Length};

/// Two legs of one thickness, with one root fillet. The rounding of a rolled angle's toes is not
/// counted: it makes the real area up to about 1 % less.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Angle {
    /// The one leg, heel included.
    pub depth: Along<Length>,
    /// The other leg, heel included.
    pub width: Along<Length>,
    /// Thickness of both.
    pub wall: Along<Length>,
    /// Radius of the fillet between them; a sharp corner when `None`.
    pub root: Option<Along<Length>>,
}

impl Shape for Angle {
    fn area(&self) -> Curve<Area> {
        let middle = self.depth + (self.width - self.wall);
        let area = self.wall * middle;
        fillets(1.0, self.root).map_or(area, |fillet| area + fillet)
    }

    fn area_at(&self, s: f64) -> Area {
        let wall = self.wall.at(s);
        wall * self.depth.at(s) + wall * (self.width.at(s) - wall) + fillets_at(1.0, self.root, s)
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        let depth = self.depth.at(s).value;
        let width = self.width.at(s).value;
        let wall = self.wall.at(s).value;
        let upright = Rectangle {
            width: wall,
            height: depth,
            x: wall / 2.0,
            y: depth / 2.0,
        };
        let level = Rectangle {
            width: width - wall,
            height: wall,
            x: (width + wall) / 2.0,
            y: wall / 2.0,
        };
        least_gyration(&[upright, level], self.area_at(s))
    }

    fn thickness(&self) -> Option<Length> {
        Some(self.wall.greatest())
    }

    fn fault(&self) -> Option<String> {
        not_positive("depth", &self.depth)
            .or_else(|| not_positive("width", &self.width))
            .or_else(|| not_positive("wall", &self.wall))
            .or_else(|| negative_root(&self.root))
            .or_else(|| {
                fault_at_ends(|s| {
                    let root = self.root.map_or(Length::default(), |root| root.at(s));
                    let leg = smaller(self.width.at(s), self.depth.at(s)) - self.wall.at(s);
                    if leg <= Length::default() {
                        Some("its wall is as thick as a leg is long")
                    } else if root > leg {
                        Some("its root fillet reaches beyond the end of a leg")
                    } else {
                        None
                    }
                })
            })
    }
}
