//! An assembly: points that members share, stiff bodies that they carry, and what holds them.
//!
//! Positions, directions, forces and movements have three entries whatever the job has: x, y, z,
//! of which a job in one or two coordinates leaves the last ones 0. A rotation or a moment in two
//! coordinates is its last entry, about z.

use super::{Name, Place};
use crate::quantity::{Force, ForcePerLength, Length, Mass, Moment};

/// Entries along x, y, z.
pub type Spatial<Q> = [Q; 3];

/// What members between points share.
#[derive(Debug, Clone, Default)]
pub struct Assembly {
    /// The number of coordinates of every point: 1, 2 or 3.
    pub coordinates: usize,
    /// The unit vector along which weight acts: −y in two coordinates, −z in three, ±x in one
    /// where the job says which way that is; 0 where it does not.
    pub down: Spatial<f64>,
    /// The points in the order of the file.
    pub points: Vec<Point>,
    /// The bodies in the order of the file.
    pub bodies: Vec<Body>,
    /// The holds in the order of the file.
    pub holds: Vec<Hold>,
    /// What acts on points, bodies and holds, case by case.
    pub actions: AssemblyActions,
}

/// A place where members, bodies and holds meet.
#[derive(Debug, Clone, PartialEq)]
pub struct Point {
    /// Its name.
    pub name: Name,
    /// Its key.
    pub place: Place,
    /// Where it lies, as drawn.
    pub at: Spatial<Length>,
}

/// A stiff body: its points keep their distances.
#[derive(Debug, Clone, PartialEq)]
pub struct Body {
    /// Its name.
    pub name: Name,
    /// Its table.
    pub place: Place,
    /// Indices of its points, each once, at least one.
    pub points: Vec<usize>,
    /// Its mass, if it has any.
    pub mass: Option<Mass>,
    /// Its centre of mass, where its weight and the forces on it act; there whenever it has a mass
    /// or a force.
    pub centre: Option<Spatial<Length>>,
}

/// What holds one or several points. Each of them is held by itself.
#[derive(Debug, Clone, PartialEq)]
pub struct Hold {
    /// Its name, or `hold.` and its number from 1.
    pub name: Name,
    /// Its table.
    pub place: Place,
    /// Indices of the points that it holds, each once, at least one.
    pub points: Vec<usize>,
    /// How it answers.
    pub kind: HoldKind,
}

/// How a hold answers. Directions are unit vectors, none of them dependent on the others.
#[derive(Debug, Clone, PartialEq)]
pub enum HoldKind {
    /// No movement along these directions but that of what it is fixed to.
    Fixed {
        /// At most as many as there are coordinates.
        along: Vec<Spatial<f64>>,
    },
    /// Along each of these directions it pulls and pushes in proportion to the movement.
    Spring {
        /// At most as many as there are coordinates.
        along: Vec<Spatial<f64>>,
        /// In each direction.
        stiffness: ForcePerLength,
    },
    /// Blocks movement along one direction once its clearance is used up, and so only pushes
    /// against that direction.
    Stop {
        /// The direction that it blocks.
        blocks: Spatial<f64>,
        /// The clearance as drawn, 0 or more.
        clearance: Length,
        /// Rigid when `None`.
        stiffness: Option<ForcePerLength>,
    },
}

impl HoldKind {
    /// The directions in which it answers.
    pub fn directions(&self) -> &[Spatial<f64>] {
        match self {
            HoldKind::Fixed { along } | HoldKind::Spring { along, .. } => along,
            HoldKind::Stop { blocks, .. } => std::slice::from_ref(blocks),
        }
    }
}

/// Everything of the job that acts on points, bodies and holds.
#[derive(Debug, Clone, Default, PartialEq)]
#[allow(missing_docs)] // each list holds the actions that its type describes
pub struct AssemblyActions {
    pub forces: Vec<ForceOnPoint>,
    pub bodies: Vec<ForceOnBody>,
    pub moments: Vec<MomentOnBody>,
    pub weights: Vec<WeightOfBody>,
    pub movements: Vec<MovementOfHold>,
}

/// A force on a point.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct ForceOnPoint {
    pub case: usize,
    pub point: usize,
    pub force: Spatial<Force>,
}

/// A force on a body, at its centre of mass.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct ForceOnBody {
    pub case: usize,
    pub body: usize,
    pub force: Spatial<Force>,
}

/// A moment on a body, right-handed about x, y, z.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct MomentOnBody {
    pub case: usize,
    pub body: usize,
    pub moment: Spatial<Moment>,
}

/// The weight of a body's mass times a number, along [`Assembly::down`] at its centre of mass.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct WeightOfBody {
    pub case: usize,
    pub body: usize,
    pub number: f64,
}

/// A movement of what a hold is fixed to: the fixed foot, the spring's foot, the stop's face; the
/// same at all of its points. It has no part in a direction that the hold does not answer in.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct MovementOfHold {
    pub case: usize,
    pub hold: usize,
    pub movement: Spatial<Length>,
}
