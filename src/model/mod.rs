//! What a job means: members, what acts on them, how cases combine, and what limits hold.
//!
//! A [`Model`] is made by [`crate::job`] from a file without faults. Names are resolved to indices,
//! units to SI, stations to places on the axis; nothing in it can be unknown, negative where that
//! has no sense, or out of range. `solve`, `proof` and `check` read it and nothing else.

mod action;
mod assembly;
mod combination;
mod limit;
mod member;
mod watch;

pub use action::{Actions, FreeStrain, LineLoad, Movement, PointForce, Temperatures, Weight};
pub use assembly::{
    Assembly, AssemblyActions, Body, ForceOnBody, ForceOnPoint, Hold, HoldKind, MomentOnBody,
    MovementOfHold, Point, Spatial, WeightOfBody,
};
pub use combination::{Case, Combination, Purpose};
pub use limit::{AreaUsed, Bounds, Limit, LimitKind, Reads, ShareFactor, Target};
pub use member::{
    Between, Carries, Gap, Layer, Member, Part, Piece, Segment, SegmentKind, Side, Station,
    Support, SupportKind,
};
pub use watch::{Watch, Watched};

use crate::catalogue::Material;
use crate::quantity::{ThermodynamicTemperature, Units};
use std::ops::Range;
use std::sync::Arc;

/// A name as the job gives it; shared, since results repeat it for every combination.
pub type Name = Arc<str>;

/// Where something stands in the job file: a range of bytes of its text.
pub type Place = Range<usize>;

/// What the job says of itself, printed at the head of a report.
#[derive(Debug, Clone, Default, PartialEq)]
#[allow(missing_docs)] // each field is the key of `[job]` with its name
pub struct Heading {
    pub title: Option<String>,
    pub reference: Option<String>,
    pub prepared_by: Option<String>,
    pub checked_by: Option<String>,
    pub date: Option<String>,
    pub note: Option<String>,
}

/// A whole job, validated.
#[derive(Debug, Clone)]
pub struct Model {
    /// What the job says of itself.
    pub heading: Heading,
    /// The units of the report.
    pub units: Units,
    /// The job's datum temperature, if it gives one.
    pub datum: Option<ThermodynamicTemperature>,
    /// The load cases in the order of the file; in a job without cases one nameless case that
    /// holds every action and is always on.
    pub cases: Vec<Case>,
    /// The combinations, lists multiplied out, in the order of the file.
    pub combinations: Vec<Combination>,
    /// The materials that the job's members use, each once.
    pub materials: Vec<Material>,
    /// The members in the order of the file.
    pub members: Vec<Member>,
    /// What members between points share; `None` in a job without points.
    pub assembly: Option<Assembly>,
    /// What is watched, in the order of the file.
    pub watches: Vec<Watch>,
    /// The limits, one for each thing that is held, in the order of the file.
    pub limits: Vec<Limit>,
    /// The places of literals that bear a tolerance, in the order of the file.
    pub tolerances: Vec<Place>,
    /// Things that the reading itself has to say: a limit that no combination reads, a strength
    /// taken from the lowest row of a table.
    pub remarks: Vec<Remark>,
}

/// A sentence about a part of the job that is no error.
#[derive(Debug, Clone, PartialEq)]
pub struct Remark {
    /// What it is about: `member.H4`, `case.dead`.
    pub about: String,
    /// The sentence.
    pub text: String,
    /// Where it stands.
    pub place: Option<Place>,
    /// A caution is for the engineer to act on; otherwise it is a note.
    pub caution: bool,
}
