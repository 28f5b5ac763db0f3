//! Why a combination has no solution.

use super::assembly::Motion;
use crate::model::Name;

/// Why a member or an assembly cannot be solved in a combination.
#[derive(Debug, Clone, PartialEq, thiserror::Error)]
pub enum SolveError {
    /// A free motion that a load pushes.
    #[error(
        "nothing holds member `{member}` {part}against {newtons} N toward its {toward}: it would slide away"
    )]
    Pushed {
        /// The member.
        member: Name,
        /// `` or `from a to b `.
        part: String,
        /// The size of the force that nothing takes.
        newtons: f64,
        /// `start` or `end`.
        toward: &'static str,
    },
    /// Rigid supports that are moved against each other with nothing between that gives.
    #[error(
        "the supports of member `{member}` from `{first}` to `{last}` contradict each other: nothing between them can give way to their movements"
    )]
    Contradiction {
        /// The member.
        member: Name,
        /// The first station.
        first: Name,
        /// The last station.
        last: Name,
    },
    /// A taper's point that would have to carry force.
    #[error(
        "segment `{segment}` of member `{member}` runs to a point that would have to carry force or stress"
    )]
    PointLoaded {
        /// The member.
        member: Name,
        /// The segment.
        segment: Name,
    },
    /// A free motion of an assembly that its loads push.
    #[error("{} of an assembly move freely, and its loads push them", motion.movers.len())]
    Unstable {
        /// What moves how.
        motion: Motion,
    },
    /// Rigid holds of an assembly whose movements cannot all be kept.
    #[error("rigid holds contradict each other: {holds:?}")]
    HoldsContradict {
        /// The holds.
        holds: Vec<Name>,
        /// Bodies that share points with others between them.
        bodies: Vec<Name>,
        /// Members whose rigid gaps close between them.
        members: Vec<Name>,
    },
    /// Too many one-way parts of an assembly whose states hang on each other.
    #[error(
        "the states of {parts} one-way parts of the assembly hang on each other and were not found"
    )]
    Unsettled {
        /// How many.
        parts: usize,
    },
    /// A number of an assembly ran out of the range of double precision.
    #[error("point `{point}` comes to numbers beyond the range of double precision")]
    PointOutOfRange {
        /// The point.
        point: Name,
    },
    /// A number ran out of the range of double precision.
    #[error("member `{member}` leads to numbers beyond the range of double precision")]
    OutOfRange {
        /// The member.
        member: Name,
    },
}
