//! A tee.

use super::rectangles::{Rectangle, least_gyration};
use super::{
    Along, Shape, fault_at_ends, fillets, fillets_at, larger, negative_root, not_positive,
};
use crate::quantity::{Area, Curve, Length};

/// A flange with a web in its middle, with two root fillets.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Tee {
    /// From outside of the flange to the end of the web.
    pub depth: Along<Length>,
    /// Of the flange.
    pub width: Along<Length>,
    /// Thickness of the web.
    pub web: Along<Length>,
    /// Thickness of the flange.
    pub flange: Along<Length>,
    /// Radius of the fillets between web and flange; sharp corners when `None`.
    pub root: Option<Along<Length>>,
}

impl Shape for Tee {
    fn area(&self) -> Curve<Area> {
        let area = self.width * self.flange + (self.depth - self.flange) * self.web;
        fillets(2.0, self.root).map_or(area, |fillets| area + fillets)
    }

    fn area_at(&self, s: f64) -> Area {
        let flange = self.flange.at(s);
        self.width.at(s) * flange
            + (self.depth.at(s) - flange) * self.web.at(s)
            + fillets_at(2.0, self.root, s)
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        let depth = self.depth.at(s).value;
        let thickness = self.flange.at(s).value;
        let flange = Rectangle {
            width: self.width.at(s).value,
            height: thickness,
            x: 0.0,
            y: thickness / 2.0,
        };
        let web = Rectangle {
            width: self.web.at(s).value,
            height: depth - thickness,
            x: 0.0,
            y: (depth + thickness) / 2.0,
        };
        least_gyration(&[flange, web], self.area_at(s))
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
                    let clear = self.depth.at(s) - self.flange.at(s);
                    if clear <= Length::default() {
                        Some("its flange fills the depth: the flange must be less than the depth")
                    } else if self.web.at(s) > self.width.at(s) {
                        Some("its web is thicker than its flange is wide")
                    } else if root > clear {
                        Some("its root fillets reach beyond the end of the web")
                    } else if root * 2.0 > self.width.at(s) - self.web.at(s) {
                        Some("its root fillets reach beyond the edges of the flange")
                    } else {
                        None
                    }
                })
            })
    }
}
