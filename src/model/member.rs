//! A member: its segments, its stations, and how it is held.

use super::{Actions, Name, Place, Spatial};
use crate::catalogue::Section;
use crate::quantity::{
    Angle, Area, Curve, Expansion, ForcePerLength, Length, MassPerLength, ThermodynamicTemperature,
};

/// A straight member along an axis from its start to its end.
#[derive(Debug, Clone)]
pub struct Member {
    /// Its name.
    pub name: Name,
    /// Its table.
    pub place: Place,
    /// The direction from start to end as an angle above level: −90° is straight down.
    pub runs: Option<Angle>,
    /// The datum of its readings: its own or the job's.
    pub datum: Option<ThermodynamicTemperature>,
    /// The points that it reaches between; `None` for a member with supports of its own.
    pub between: Option<Between>,
    /// The one way in which it carries; `None` for one that carries both ways.
    pub carries: Option<Carries>,
    /// Its segments in order from start to end.
    pub segments: Vec<Segment>,
    /// Every cut, in order; the first is the start, the last the end.
    pub stations: Vec<Station>,
    /// What lies between one station and the next: one fewer than the stations.
    pub pieces: Vec<Piece>,
    /// The supports in the order of the file, `start` and `end` before the rest.
    pub supports: Vec<Support>,
    /// What acts on it, case by case.
    pub actions: Actions,
}

impl Member {
    /// The length as drawn: that of all segments, gaps included.
    pub fn length(&self) -> Length {
        self.stations.last().map_or(Length::default(), |end| end.x)
    }

    /// The sine of the angle above level: the share of a weight that acts toward the start.
    /// Exact for members that run up, down or level.
    pub fn rise(&self) -> f64 {
        match &self.between {
            Some(between) => between.rise,
            None => self.runs.map_or(0.0, |angle| angle.value.sin()),
        }
    }
}

/// Where a member between points lies. It has no supports: the points hold it.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Between {
    /// Index of the point at its start.
    pub start: usize,
    /// Index of the point at its end.
    pub end: usize,
    /// The unit vector from start to end.
    pub direction: Spatial<f64>,
    /// The sine of its angle above level; exactly ±1 where it is upright. 0 in one coordinate where
    /// the job does not say which way is up.
    pub rise: f64,
}

/// The one way in which a member carries: as a whole it is slack, or parts, the other way.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
#[allow(missing_docs)]
pub enum Carries {
    Tension,
    Compression,
}

/// A length of a member with one make-up.
#[derive(Debug, Clone)]
pub struct Segment {
    /// Its name, or its number from 1.
    pub name: Name,
    /// Its table.
    pub place: Place,
    /// Where it begins, from the member's start.
    pub from: Length,
    /// Where it ends.
    pub to: Length,
    /// Its length as written, which the difference of the two places only rounds.
    pub length: Length,
    /// What it is made of.
    pub kind: SegmentKind,
}

impl Segment {
    /// Its layers; none for a part known by its stiffness and for a gap.
    pub fn layers(&self) -> &[Layer] {
        match &self.kind {
            SegmentKind::Solid { layers, .. } => layers,
            _ => &[],
        }
    }
}

/// What a segment is made of.
#[derive(Debug, Clone)]
pub enum SegmentKind {
    /// Section and material, or several side by side and bonded.
    Solid {
        /// At least one.
        layers: Vec<Layer>,
        /// Whether the job wrote `layer`, so that reports name them.
        layered: bool,
    },
    /// A part known by its stiffness alone.
    Stiffness(Part),
    /// A joint that bears once it has closed.
    Gap(Gap),
}

/// A bellows, a bearing, a gasket: it stretches `∫N dx / (k L)`.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Part {
    /// Force per stretch, k.
    pub stiffness: ForcePerLength,
    /// Its coefficient of expansion, if it expands.
    pub expansion: Option<Expansion>,
    /// Its mass per length, if it weighs anything.
    pub mass: Option<MassPerLength>,
}

/// A joint inside a member: carries nothing while open, compression alone once closed.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Gap {
    /// The width as drawn.
    pub width: Length,
    /// What it yields once closed; rigid when `None`.
    pub stiffness: Option<ForcePerLength>,
}

/// One material of a segment with its section.
#[derive(Debug, Clone)]
pub struct Layer {
    /// Its name; that of the segment where there is only one.
    pub name: Name,
    /// Where its make-up is written.
    pub place: Place,
    /// The section of one piece.
    pub section: Section,
    /// Index into the model's materials.
    pub material: usize,
    /// Equal pieces side by side, 1 or more.
    pub count: f64,
    /// Area of all pieces that stiffness and weight stand on, over the segment.
    pub area: Curve<Area>,
    /// Area of all pieces for stress, where it differs: `net`, `holes`, a thread's stress area.
    pub net: Option<Curve<Area>>,
    /// Area of all pieces for stress on the gross section: `area`, but a thread's nominal one.
    pub gross: Curve<Area>,
    /// Mass per length of all pieces in place of density times area.
    pub mass: Option<MassPerLength>,
}

impl Layer {
    /// The area that a stress stands on when the limit does not say: net where there is one.
    pub fn strength_area(&self) -> &Curve<Area> {
        self.net.as_ref().unwrap_or(&self.gross)
    }
}

/// A place where the member is cut: a segment ends, a load or a support stands.
#[derive(Debug, Clone, PartialEq)]
pub struct Station {
    /// `start`, `end`, `shank.end`, or the distance as it was written.
    pub name: Name,
    /// Distance from the member's start.
    pub x: Length,
}

/// What lies between two neighbouring stations: a part of one segment.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Piece {
    /// Index of its segment.
    pub segment: usize,
    /// Where it begins, as a fraction of the segment's length; 0 at its start.
    pub from: f64,
    /// Where it ends; 1 at the segment's end.
    pub to: f64,
    /// Its length.
    pub length: Length,
}

/// Which way a stop blocks movement.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Side {
    /// Blocks movement toward the end: it can only push toward the start.
    End,
    /// Blocks movement toward the start: it can only push toward the end.
    Start,
}

/// How a support answers.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum SupportKind {
    /// No movement but that of what it is fixed to.
    Fixed,
    /// Pulls and pushes in proportion to the movement.
    Spring(ForcePerLength),
    /// Pushes once its clearance is used up.
    Stop {
        /// The clearance as drawn, 0 or more.
        clearance: Length,
        /// The direction that it blocks.
        side: Side,
        /// Rigid when `None`.
        stiffness: Option<ForcePerLength>,
    },
}

/// A support at a station.
#[derive(Debug, Clone, PartialEq)]
pub struct Support {
    /// Its name, or that of its station.
    pub name: Name,
    /// Its table, or the key `start` or `end`.
    pub place: Place,
    /// Index of its station.
    pub station: usize,
    /// The station as written, for reports.
    pub at: Name,
    /// How it answers.
    pub kind: SupportKind,
}
