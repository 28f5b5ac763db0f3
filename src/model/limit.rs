//! What is held: one [`Limit`] for each thing, names and shares already resolved.

use super::{Name, Place, Purpose};
use crate::quantity::{Angle, Force, Length, Stress};

/// Which area a stress stands on.
#[derive(Debug, Clone, Copy, PartialEq, Eq, serde::Serialize, serde::Deserialize)]
#[serde(rename_all = "lowercase")]
#[allow(missing_docs)]
pub enum AreaUsed {
    Gross,
    Net,
}

/// What a limit stands on. Indices are into the model's members and the member's lists.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
#[allow(missing_docs)]
pub enum Target {
    Member {
        member: usize,
    },
    Segment {
        member: usize,
        segment: usize,
    },
    Layer {
        member: usize,
        segment: usize,
        layer: usize,
    },
    Support {
        member: usize,
        support: usize,
    },
    Station {
        member: usize,
        station: usize,
    },
    /// One of the points that a hold holds, by its place in [`super::Hold::points`].
    Hold {
        hold: usize,
        point: usize,
    },
    Watch {
        watch: usize,
    },
}

impl Target {
    /// The member that it belongs to; `None` for a hold and for a watch.
    pub fn member(&self) -> Option<usize> {
        match *self {
            Target::Member { member }
            | Target::Segment { member, .. }
            | Target::Layer { member, .. }
            | Target::Support { member, .. }
            | Target::Station { member, .. } => Some(member),
            Target::Hold { .. } | Target::Watch { .. } => None,
        }
    }
}

/// A factor that the limit of a stress already holds, such as 0.6 in `"0.6 yield"`.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ShareFactor(pub f64);

/// The lower and the upper bound of a signed demand: lower ≤ 0 ≤ upper.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Bounds<Q> {
    /// Not less than this.
    pub lower: Q,
    /// Not more than this.
    pub upper: Q,
}

/// What is held about the target.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum LimitKind {
    /// Largest tensile stress of a segment's layer. Target: `Segment` (its only layer) or `Layer`.
    Tension {
        /// The size that is allowed, 0 or more.
        limit: Stress,
        /// The area that the stress stands on.
        area: AreaUsed,
        /// The factor, where the limit was written as a share of a strength.
        share: Option<ShareFactor>,
    },
    /// Largest compressive stress, by size. Targets as `Tension`.
    Compression {
        /// The size that is allowed, 0 or more.
        limit: Stress,
        /// The area that the stress stands on.
        area: AreaUsed,
        /// The factor, where the limit was written as a share of a strength.
        share: Option<ShareFactor>,
    },
    /// Axial force anywhere. Target: `Member` or `Segment`.
    Force(Bounds<Force>),
    /// Change of length. Target: `Member` or `Segment`.
    Elongation(Bounds<Length>),
    /// Displacement. Target: `Station`.
    Displacement(Bounds<Length>),
    /// Reaction of a support or a hold; of a hold that answers in more than one direction its size.
    /// Target: `Support` or `Hold`.
    Reaction(Bounds<Force>),
    /// What stays open. Target: `Support` or `Hold` with a stop, or `Segment` that is a gap.
    Gap {
        /// Not less than this.
        min: Option<Length>,
        /// Not more than this.
        max: Option<Length>,
    },
    /// It must have closed. Targets as `Gap`.
    Bears,
    /// A one-way member must carry. Target: `Member`.
    Slack,
    /// A watched movement. Target: `Watch`.
    Watch(Bounds<Length>),
    /// A watched rotation. Target: `Watch`.
    Rotation(Bounds<Angle>),
}

/// Which combinations a limit reads.
#[derive(Debug, Clone, PartialEq)]
pub enum Reads {
    /// Those whose purpose is this one, and those without a purpose.
    Purpose(Purpose),
    /// These, by their index in the model; sorted.
    Only(Vec<usize>),
}

/// One thing that is held.
#[derive(Debug, Clone, PartialEq)]
pub struct Limit {
    /// What is held.
    pub kind: LimitKind,
    /// Of what.
    pub target: Target,
    /// `H4`, `H4.shank`, `H4.shank.bars`, `H4.kerb`, the name of a hold or watch: what
    /// reports call the target.
    pub on: Name,
    /// In which combinations.
    pub reads: Reads,
    /// The combination whose movement is taken off first, by its index.
    pub since: Option<usize>,
    /// Where the limit comes from, in the job's words.
    pub source: Option<Name>,
    /// The value of the limit in the file.
    pub place: Place,
}
