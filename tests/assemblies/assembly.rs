//! An assembly by its plain numbers (SI), as the tests make, solve and write it.
//!
//! Vectors have three entries whatever the number of coordinates; those that a job does not have
//! are 0.

use crate::common::chain::At;

pub(crate) type Vector = [f64; 3];

/// Standard gravity (m/s²).
pub(crate) const GRAVITY: f64 = 9.80665;

/// An assembly. Points are called `p1 p2 …`, bodies `b1 …`, members `m1 …` with segments `s1 …`,
/// holds `h1 …`, each in its order.
#[derive(Debug, Clone, Default)]
pub(crate) struct Assembly {
    pub(crate) coordinates: usize,
    /// The angle of +x above level in degrees, where an assembly in one coordinate says it.
    pub(crate) runs: Option<f64>,
    pub(crate) points: Vec<Vector>,
    pub(crate) bodies: Vec<Body>,
    pub(crate) members: Vec<Member>,
    pub(crate) holds: Vec<Hold>,
    /// Forces on points.
    pub(crate) forces: Vec<(usize, Vector)>,
    /// The number of the weight of every member and body.
    pub(crate) weight: f64,
    /// Members that a second combination loses, one at a time.
    pub(crate) lose_each: Vec<usize>,
}

/// A stiff body.
#[derive(Debug, Clone, Default)]
pub(crate) struct Body {
    pub(crate) points: Vec<usize>,
    /// Its mass and where its centre lies.
    pub(crate) mass: f64,
    pub(crate) centre: Vector,
    /// At its centre.
    pub(crate) force: Vector,
    pub(crate) moment: Vector,
}

/// A member between two points.
#[derive(Debug, Clone, Default)]
pub(crate) struct Member {
    pub(crate) ends: [usize; 2],
    pub(crate) carries: Option<Way>,
    pub(crate) segments: Vec<Segment>,
    /// The segment that is written as `length = "rest"`.
    pub(crate) rest: Option<usize>,
    pub(crate) forces: Vec<Inner>,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum Way {
    Tension,
    Compression,
}

/// A force inside a member.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Inner {
    pub(crate) at: At,
    pub(crate) force: f64,
    /// Acts downward, else toward the end.
    pub(crate) down: bool,
}

#[derive(Debug, Clone)]
pub(crate) struct Segment {
    pub(crate) length: f64,
    pub(crate) kind: Kind,
    /// Line load at its start and its end, toward the end.
    pub(crate) line: [f64; 2],
    /// The same, downward.
    pub(crate) line_down: [f64; 2],
    /// Change of temperature at its start and its end.
    pub(crate) warming: [f64; 2],
    pub(crate) misfit: f64,
}

#[derive(Debug, Clone)]
pub(crate) enum Kind {
    /// One layer or several.
    Solid(Vec<Layer>),
    /// A part known by its stiffness.
    Part(f64),
    /// A joint; rigid once closed where no stiffness is given.
    Gap(Option<f64>),
}

#[derive(Debug, Clone, Copy)]
pub(crate) struct Layer {
    pub(crate) section: Section,
    pub(crate) modulus: f64,
    pub(crate) expansion: f64,
    pub(crate) density: f64,
}

/// A section at a segment's start and end.
#[derive(Debug, Clone, Copy)]
pub(crate) enum Section {
    Area([f64; 2]),
    Round([f64; 2]),
}

impl Section {
    /// The area at a fraction of the segment's length.
    pub(crate) fn area(&self, s: f64) -> f64 {
        match *self {
            Section::Area(pair) => between(pair, s),
            Section::Round(pair) => std::f64::consts::FRAC_PI_4 * between(pair, s).powi(2),
        }
    }
}

/// A hold of one point.
#[derive(Debug, Clone)]
pub(crate) struct Hold {
    pub(crate) point: usize,
    /// Directions as written, not yet of unit length.
    pub(crate) along: Vec<Vector>,
    pub(crate) kind: HoldKind,
    /// Movement of what it is fixed to.
    pub(crate) movement: Vector,
}

#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum HoldKind {
    Fixed,
    Spring(f64),
    Stop {
        clearance: f64,
        stiffness: Option<f64>,
    },
}

impl Assembly {
    /// The unit vector along which weight acts.
    pub(crate) fn down(&self) -> Vector {
        match self.coordinates {
            1 => [-self.runs.unwrap_or(0.0).to_radians().sin(), 0.0, 0.0],
            2 => [0.0, -1.0, 0.0],
            _ => [0.0, 0.0, -1.0],
        }
    }

    /// The unit vector of a member, and its length.
    pub(crate) fn axis(&self, member: &Member) -> (Vector, f64) {
        let [a, b] = member.ends.map(|p| self.points[p]);
        let along = std::array::from_fn(|i| b[i] - a[i]);
        let length = size(along);
        (scaled(along, 1.0 / length), length)
    }

    /// The directions in which everything is held.
    pub(crate) fn every_direction(&self) -> Vec<Vector> {
        (0..self.coordinates).map(unit).collect()
    }

    /// The same assembly in the state without one of its members.
    pub(crate) fn without(&self, member: usize) -> Self {
        let mut less = self.clone();
        less.members.remove(member);
        less.lose_each.clear();
        less
    }
}

impl Segment {
    /// A uniform piece of one material that nothing acts on.
    pub(crate) fn plain(length: f64, area: f64, modulus: f64) -> Self {
        let layer = Layer {
            section: Section::Area([area; 2]),
            modulus,
            expansion: 0.0,
            density: 0.0,
        };
        Segment {
            length,
            kind: Kind::Solid(vec![layer]),
            line: [0.0; 2],
            line_down: [0.0; 2],
            warming: [0.0; 2],
            misfit: 0.0,
        }
    }
}

/// Linear between the two values of a pair.
pub(crate) fn between([a, b]: [f64; 2], s: f64) -> f64 {
    a + (b - a) * s
}

pub(crate) fn unit(axis: usize) -> Vector {
    std::array::from_fn(|i| if i == axis { 1.0 } else { 0.0 })
}

pub(crate) fn dot(a: Vector, b: Vector) -> f64 {
    a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
}

pub(crate) fn cross(a: Vector, b: Vector) -> Vector {
    [
        a[1] * b[2] - a[2] * b[1],
        a[2] * b[0] - a[0] * b[2],
        a[0] * b[1] - a[1] * b[0],
    ]
}

pub(crate) fn size(a: Vector) -> f64 {
    dot(a, a).sqrt()
}

pub(crate) fn scaled(a: Vector, factor: f64) -> Vector {
    a.map(|entry| entry * factor)
}

pub(crate) fn plus(a: Vector, b: Vector) -> Vector {
    std::array::from_fn(|i| a[i] + b[i])
}

pub(crate) fn minus(a: Vector, b: Vector) -> Vector {
    std::array::from_fn(|i| a[i] - b[i])
}
