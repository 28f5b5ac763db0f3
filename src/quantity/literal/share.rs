//! Limits that may be written as a share of something else.

use super::{Literal, LiteralError, read};
use crate::catalogue::Strength;
use crate::quantity::{Length, Stress};

/// The limit of a stress as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum StressLimit {
    /// A stress: `"165 MPa"`.
    Stress(Literal<Stress>),
    /// A share of a strength of the material: `"0.6 yield"`, `"yield / 1.67"`.
    Share {
        /// What the strength is multiplied by.
        factor: f64,
        /// Which strength.
        strength: Strength,
    },
}

/// The bound of a movement as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum MovementBound {
    /// A length: `"6 mm"`.
    Length(Literal<Length>),
    /// A share of the length of the member or segment: `"length / 500"`.
    Share {
        /// What the length is divided by.
        divisor: f64,
    },
}

/// Reads the limit of a stress.
pub fn read_stress_limit(text: &str) -> Result<StressLimit, LiteralError> {
    read(text).map(StressLimit::Stress)
}

/// Reads the bound of a movement.
pub fn read_movement_bound(text: &str) -> Result<MovementBound, LiteralError> {
    read(text).map(MovementBound::Length)
}
