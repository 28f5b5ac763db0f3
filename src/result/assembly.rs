//! The results of an assembly in one combination. Lists over coordinates have one entry for each
//! coordinate of the job's points.

use super::{SupportWord, Unit};
use crate::model::Name;
use crate::quantity::{Angle, Force, Length};
use serde::{Deserialize, Serialize};

/// One point.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct PointResult {
    /// Its name.
    pub name: Name,
    /// How it moves, along each coordinate.
    pub displacement: Vec<Length>,
    /// What all its holds together put on it, along each coordinate; null where nothing holds it
    /// and where nothing decides it.
    pub reaction: Option<Vec<Force>>,
}

/// One point of one hold.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct HoldResult {
    /// The name of the hold, or `hold.` and its number.
    pub name: Name,
    /// The point that it holds.
    pub point: Name,
    /// How it answers.
    pub kind: SupportWord,
    /// The force that it puts on the point, along each coordinate; null where rigid holds share it
    /// in a way that nothing decides.
    pub reaction: Option<Vec<Force>>,
    /// The clearance of a stop that remains; null for other kinds.
    pub gap: Option<Length>,
    /// Whether a stop bears; null for other kinds.
    pub bears: Option<bool>,
}

/// One stiff body.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct BodyResult {
    /// Its name.
    pub name: Name,
    /// How its first point moves, along each coordinate.
    pub displacement: Vec<Length>,
    /// How it turns.
    pub rotation: Rotation,
}

/// A rotation, right-handed.
#[derive(Debug, Clone, Copy, PartialEq, Serialize, Deserialize)]
#[serde(untagged)]
pub enum Rotation {
    /// About z in two coordinates; 0 in one.
    InPlane(Angle),
    /// About x, y and z.
    Spatial([Angle; 3]),
}

impl Rotation {
    /// About x, y and z.
    pub fn spatial(self) -> [Angle; 3] {
        match self {
            Rotation::InPlane(angle) => [Angle::default(), Angle::default(), angle],
            Rotation::Spatial(angles) => angles,
        }
    }
}

/// One watched movement or rotation.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct WatchResult {
    /// The name of the watch, or `watch.` and its number.
    pub name: Name,
    /// What it reads, in the unit beside it; null where a member that it watches is taken out.
    pub value: Option<f64>,
    /// m or rad.
    pub unit: Unit,
}

/// Sums over an assembly along each coordinate; single members beside it have their own.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct AssemblyTotals {
    /// All that acts on its points, bodies and members.
    pub applied: Vec<Force>,
    /// All that its holds answer with.
    pub reactions: Vec<Force>,
}
