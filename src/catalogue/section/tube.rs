//! A round tube.

use super::{Along, Shape, fault_at_ends, not_positive};
use crate::quantity::{Area, Curve, Length, from_si};
use std::f64::consts::PI;

/// A round tube.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Tube {
    /// Outer diameter.
    pub outer: Along<Length>,
    /// What is known of its inside.
    pub inside: Inside,
}

/// The inside of a tube: what is given is what varies linearly.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Inside {
    /// By the thickness of the wall.
    Wall(Along<Length>),
    /// By the inner diameter.
    Inner(Along<Length>),
}

impl Tube {
    /// The thickness of the wall; linear, however the inside is given.
    pub fn wall(&self) -> Along<Length> {
        match self.inside {
            Inside::Wall(wall) => wall,
            Inside::Inner(inner) => (self.outer - inner) * 0.5,
        }
    }

    fn outer_and_inner_at(&self, s: f64) -> (Length, Length) {
        let outer = self.outer.at(s);
        let inner = match self.inside {
            Inside::Wall(wall) => outer - wall.at(s) * 2.0,
            Inside::Inner(inner) => inner.at(s),
        };
        (outer, inner)
    }
}

impl Shape for Tube {
    /// Wall times the circumference of its middle: a thin wall's area without the difference of
    /// two squares.
    fn area(&self) -> Curve<Area> {
        let wall = self.wall();
        let middle = self.outer - wall;
        (wall * middle) * PI
    }

    fn area_at(&self, s: f64) -> Area {
        let outer = self.outer.at(s);
        match self.inside {
            Inside::Wall(wall) => {
                let wall = wall.at(s);
                PI * (wall * (outer - wall))
            }
            Inside::Inner(inner) => {
                let inner = inner.at(s);
                PI / 4.0 * ((outer - inner) * (outer + inner))
            }
        }
    }

    fn gyration_at(&self, s: f64) -> Option<Length> {
        let (outer, inner) = self.outer_and_inner_at(s);
        Some(from_si(outer.value.hypot(inner.value) / 4.0))
    }

    fn thickness(&self) -> Option<Length> {
        Some(self.wall().greatest())
    }

    fn fault(&self) -> Option<String> {
        let inside = match &self.inside {
            Inside::Wall(wall) => not_positive("wall", wall),
            Inside::Inner(inner) => not_positive("inner diameter", inner),
        };
        not_positive("outer diameter", &self.outer)
            .or(inside)
            .or_else(|| {
                fault_at_ends(|s| {
                    let (outer, inner) = self.outer_and_inner_at(s);
                    match self.inside {
                        Inside::Wall(_) if inner <= Length::default() => Some(
                            "its walls fill the inside: twice the wall must be less than the \
                             outer diameter (a solid one is `round`)",
                        ),
                        Inside::Inner(_) if inner >= outer => {
                            Some("it has no wall: the inner diameter must be less than the outer")
                        }
                        _ => None,
                    }
                })
            })
    }
}
