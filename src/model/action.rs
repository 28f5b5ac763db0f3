//! What acts on a member. Every action names its case; a combination multiplies it by the case's
//! factor. Which temperature or weight of a case counts at a place (the narrowest) is decided when
//! the model is made: here each layer has one of each case.

use crate::quantity::{Force, ForcePerLength, Length, Ratio, TemperatureInterval};

/// Everything that acts on one member.
#[derive(Debug, Clone, Default, PartialEq)]
#[allow(missing_docs)] // each list holds the actions that its type describes
pub struct Actions {
    pub forces: Vec<PointForce>,
    pub lines: Vec<LineLoad>,
    pub weights: Vec<Weight>,
    pub temperatures: Vec<Temperatures>,
    pub strains: Vec<FreeStrain>,
    pub movements: Vec<Movement>,
}

/// A force at a station, + toward the end. `down` arrives here as its part along the axis.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct PointForce {
    pub case: usize,
    pub station: usize,
    pub force: Force,
    /// Its part across the axis, + in the direction of down less its part along the axis. A member
    /// between points hands it to its two ends; of a single member this calculation does not carry
    /// it.
    pub across: Force,
}

/// A force per length on a piece, linear from its start to its end, + toward the end.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct LineLoad {
    pub case: usize,
    pub piece: usize,
    pub start: ForcePerLength,
    pub end: ForcePerLength,
    /// Its part across the axis at its start and its end, + in the direction of down less its part
    /// along the axis. A member between points hands it to its two ends; of a single member this
    /// calculation does not carry it.
    pub across: [ForcePerLength; 2],
}

/// Self-weight of a layer (or of a part known by its stiffness, whose layer is 0) times a number.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct Weight {
    pub case: usize,
    pub segment: usize,
    pub layer: usize,
    pub number: f64,
}

/// A change of temperature of a layer (or of a part known by its stiffness, whose layer is 0),
/// linear from the start to the end of its segment. A reading arrives here as its difference from
/// the member's datum.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct Temperatures {
    pub case: usize,
    pub segment: usize,
    pub layer: usize,
    pub start: TemperatureInterval,
    pub end: TemperatureInterval,
}

/// A free strain of a layer (or of a part known by its stiffness, whose layer is 0): an imposed
/// strain, or a misfit over the length that it is spread over.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct FreeStrain {
    pub case: usize,
    pub segment: usize,
    pub layer: usize,
    pub strain: Ratio,
}

/// A movement of what a support is fixed to, + toward the end.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct Movement {
    pub case: usize,
    pub support: usize,
    pub movement: Length,
}
