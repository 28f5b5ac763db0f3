//! A channel.

use super::rectangles::{Rectangle, least_gyration};
use super::{
    Along, Shape, fault_at_ends, fillets, fillets_at, larger, negative_root, not_positive,
};
use crate::quantity::{Area, Curve, Length};

/// Two parallel flanges on one side of a web, with two root fillets. Flanges whose thickness
/// varies across their width are entered by their mean thickness.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Channel {
    /// From outside to outside of the flanges.
    pub depth: Along<Length>,
    /// Of a flange, web included.
    pub width: Along<Length>,
    /// Thickness of the web.
    pub web: Along<Length>,
    /// Thickness of a flange.
    pub flange: Along<Length>,
    /// Radius of the fillets between web and flanges; sharp corners when `None`.
    pub root: Option<Along<Length>>,
}

impl Shape for Channel {
    fn area(&self) -> Curve<Area> {
        let clear = self.depth - self.flange * 2.0;
        let area = (self.width * self.flange) * 2.0 + clear * self.web;
        fillets(2.0, self.root).map_or(area, |fillets| area + fillets)
    }

    fn area_at(&self, s: f64) -> Area {
        let (web, flange) = (self.web.at(s), self.flange.at(s));
        2.0 * (self.width.at(s) * flange)
            + (self.depth.at(s) - flange * 2.0) * web
            + fillets_at(2.0, self.root, s)
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        let depth = self.depth.at(s).value;
        let width = self.width.at(s).value;
        let web = self.web.at(s).value;
        let thickness = self.flange.at(s).value;
        let flange = |side: f64| Rectangle {
            width,
            height: thickness,
            x: width / 2.0,
            y: side * (depth - thickness) / 2.0,
        };
        let web = Rectangle {
            width: web,
            height: depth - 2.0 * thickness,
            x: web / 2.0,
            y: 0.0,
        };
        // The flanges mirror each other, so the axes of the web and across it are the principal
        // ones: their products cancel to the last digit, being equal and opposite.
        least_gyration(&[flange(1.0), web, flange(-1.0)], self.area_at(s))
    }

    fn thickness(&self) -> Option<Length> {
        Some(larger(self.web.greatest(), self.flange.greatest()))
    }

    fn fault(&self) -> Option<String> {
        not_positive("depth", &self.depth)
            .or_else(|| not_positive("width", &self.width))
            .or_else(|| not_positive("web", &self.web))
            .or_else(|| not_positive("flange", &self.flange))
            .or_else(|| negative_root(&self.root))
            .or_else(|| {
                fault_at_ends(|s| {
                    let root = self.root.map_or(Length::default(), |root| root.at(s));
                    let clear = self.depth.at(s) - self.flange.at(s) * 2.0;
                    if clear <= Length::default() {
                        Some(
                            "its flanges fill the depth: twice the flange must be less than the depth",
                        )
                    } else if self.web.at(s) > self.width.at(s) {
                        Some("its web is thicker than its flanges are wide")
                    } else if root * 2.0 > clear {
                        Some("its root fillets do not fit between the flanges")
                    } else if root > self.width.at(s) - self.web.at(s) {
                        Some("its root fillets reach beyond the edges of the flanges")
                    } else {
                        None
                    }
                })
            })
    }
}
