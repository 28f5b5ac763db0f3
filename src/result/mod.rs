//! Finished results: what `solve` fills, `proof` proves, `check` judges and `report` prints.
//!
//! These types are the JSON of format 1: their fields are its names, their numbers its SI values
//! (m, N, Pa, K, rad, N/m). Tension, growth and movement toward the end are positive; a reaction is
//! the force that the support puts on the member; a gap is the clearance that remains. What does
//! not exist is `null`, never 0. Names are added to the format, never renamed.

mod assembly;
mod check;
mod document;
mod member;

pub use assembly::{AssemblyTotals, BodyResult, HoldResult, PointResult, Rotation, WatchResult};
pub use check::{CheckResult, Envelope, Governing, Unit, Verdict, Warning};
pub use document::{
    Caution, Counts, Document, ErrorEntry, JobResult, JobStatus, MaterialEntry, Note, Tool,
    UnitNames, YieldRow,
};
pub use member::{
    LayerResult, MemberResult, MemberState, MemberTotals, SegmentResult, StationResult,
    SupportResult, SupportWord,
};

use crate::model::{Name, Purpose};
use serde::{Deserialize, Serialize};
use std::collections::BTreeMap;

/// One combination, solved.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct CombinationResult {
    /// Its name with the choices of its lists.
    pub name: Name,
    /// What it is for.
    pub purpose: Option<Purpose>,
    /// The factors of the cases that it names, and of those that always act.
    pub factors: BTreeMap<Name, f64>,
    /// Members taken out.
    pub without: Vec<Name>,
    /// The members in the order of the file, without those taken out.
    pub members: Vec<MemberResult>,
    /// Points of an assembly.
    pub points: Vec<PointResult>,
    /// Holds of an assembly, one row for each point of each.
    pub holds: Vec<HoldResult>,
    /// Bodies of an assembly.
    pub bodies: Vec<BodyResult>,
    /// What is watched.
    pub watches: Vec<WatchResult>,
    /// Sums over the assembly; null in a job without points.
    pub totals: Option<AssemblyTotals>,
    /// How closely the result closes.
    pub residuals: Residuals,
    /// The checks that read this combination.
    pub checks: Vec<CheckResult>,
}

/// How far a finished result is from closing, each relative to the sum of the sizes of its terms
/// before they cancel; 0 where there are none. The largest over the members of a combination.
#[derive(Debug, Clone, Copy, PartialEq, Default, Serialize, Deserialize)]
pub struct Residuals {
    /// Forces at every station, and of the whole.
    pub equilibrium: f64,
    /// Integrated strains against displacements, supports and gaps.
    pub compatibility: f64,
    /// External work against internal work.
    pub energy: f64,
}

impl Residuals {
    /// Above this a result is an error, not a result.
    pub const LIMIT: f64 = 1e-9;

    /// The largest of the three.
    pub fn largest(&self) -> f64 {
        self.equilibrium.max(self.compatibility).max(self.energy)
    }

    /// Whether a result with these closes; one that is not a number does not.
    pub fn prove(&self) -> bool {
        [self.equilibrium, self.compatibility, self.energy]
            .iter()
            .all(|&left| left <= Self::LIMIT)
    }

    /// The larger of each.
    pub fn worse(self, other: Self) -> Self {
        Residuals {
            equilibrium: self.equilibrium.max(other.equilibrium),
            compatibility: self.compatibility.max(other.compatibility),
            energy: self.energy.max(other.energy),
        }
    }
}
