//! A rectangular hollow section.

use super::rectangles::{Rectangle, least_gyration};
use super::{Along, Shape, fault_at_ends, not_positive, smaller};
use crate::quantity::{Area, Curve, Length};

/// A rectangular box with walls of one thickness and sharp corners.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct HollowBox {
    pub width: Along<Length>,
    pub depth: Along<Length>,
    pub wall: Along<Length>,
}

impl Shape for HollowBox {
    /// Wall times the length of its middle line.
    fn area(&self) -> Curve<Area> {
        let middle = (self.width - self.wall) + (self.depth - self.wall);
        (self.wall * middle) * 2.0
    }

    fn area_at(&self, s: f64) -> Area {
        let (width, depth, wall) = (self.width.at(s), self.depth.at(s), self.wall.at(s));
        2.0 * (wall * (width - wall) + wall * (depth - wall))
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        let width = self.width.at(s).value;
        let depth = self.depth.at(s).value;
        let wall = self.wall.at(s).value;
        let flange = |side: f64| Rectangle {
            width,
            height: wall,
            x: 0.0,
            y: side * (depth - wall) / 2.0,
        };
        let web = |side: f64| Rectangle {
            width: wall,
            height: depth - 2.0 * wall,
            x: side * (width - wall) / 2.0,
            y: 0.0,
        };
        least_gyration(
            &[flange(1.0), flange(-1.0), web(1.0), web(-1.0)],
            self.area_at(s),
        )
    }

    fn thickness(&self) -> Option<Length> {
        Some(self.wall.greatest())
    }

    fn fault(&self) -> Option<String> {
        not_positive("width", &self.width)
            .or_else(|| not_positive("depth", &self.depth))
            .or_else(|| not_positive("wall", &self.wall))
            .or_else(|| {
                fault_at_ends(|s| {
                    (self.wall.at(s) * 2.0 >= smaller(self.width.at(s), self.depth.at(s)))
                        .then_some(
                            "its walls fill the inside: twice the wall must be less than the \
                             width and the depth (a solid one is `bar`)",
                        )
                })
            })
    }
}
