//! What is watched: a movement or a rotation that reports show and limits hold.

use super::{Name, Place, Spatial};

/// One watched movement or rotation.
#[derive(Debug, Clone, PartialEq)]
pub struct Watch {
    /// Its name, or `watch.` and its number from 1.
    pub name: Name,
    /// Its table.
    pub place: Place,
    /// What of.
    pub of: Watched,
}

/// What is watched. Indices are into the lists of the model and of its assembly.
#[derive(Debug, Clone, PartialEq)]
pub enum Watched {
    /// The displacement of a point, less that of another.
    Point {
        /// The point.
        point: usize,
        /// The point whose displacement is taken off.
        relative_to: Option<usize>,
        /// The direction, a unit vector; without one the size of the displacement is watched.
        along: Option<Spatial<f64>>,
    },
    /// The rotation of a body.
    Rotation {
        /// The body.
        body: usize,
        /// The axis, a unit vector, right-handed: z in two coordinates; without one the size of the
        /// rotation is watched.
        about: Option<Spatial<f64>>,
    },
    /// The displacement of a station along its member's axis, less that of another along its own.
    Station {
        /// The member and its station.
        at: (usize, usize),
        /// The member and the station whose displacement is taken off.
        relative_to: Option<(usize, usize)>,
    },
}

impl Watched {
    /// Whether it is an angle, else a length.
    pub fn is_rotation(&self) -> bool {
        matches!(self, Watched::Rotation { .. })
    }
}
