//! The results of one member in one combination.

use crate::model::Name;
use crate::quantity::{Area, Force, Length, Stress};
use serde::{Deserialize, Serialize};

/// Whether the member carries.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "lowercase")]
pub enum MemberState {
    /// It carries; also said of a member that may carry either way.
    Taut,
    /// A member that only pushes, and does.
    Bearing,
    /// A one-way member that carries nothing.
    Slack,
}

/// Sums over a member, + toward the end.
#[derive(Debug, Clone, Copy, PartialEq, Default, Serialize, Deserialize)]
pub struct MemberTotals {
    /// All that acts on it.
    pub applied: Force,
    /// All that its supports answer with.
    pub reactions: Force,
}

/// One member.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct MemberResult {
    /// Its name.
    pub name: Name,
    /// Whether it carries.
    pub state: MemberState,
    /// How far a slack member is from being taut.
    pub slack_by: Option<Length>,
    /// Share of full restraint against the change of temperature, 1 for full; null where nothing
    /// would expand, and of a member between points, which the whole assembly restrains.
    pub restraint: Option<f64>,
    /// The misfit that a preload was found to need.
    pub misfit_found: Option<Length>,
    /// Sum of what acts and of what answers.
    pub totals: MemberTotals,
    /// Change of its length.
    pub elongation: Length,
    /// The part from force, closing gaps included.
    pub elongation_force: Length,
    /// The part from temperature.
    pub elongation_temperature: Length,
    /// The part from misfit and imposed strain.
    pub elongation_misfit: Length,
    /// Largest axial force (tension positive).
    pub force_max: Force,
    /// Where, from the member's start.
    pub force_max_at: Length,
    /// Least axial force.
    pub force_min: Force,
    /// Where, from the member's start.
    pub force_min_at: Length,
    /// The job's own segments in their order.
    pub segments: Vec<SegmentResult>,
    /// Every cut.
    pub stations: Vec<StationResult>,
    /// Every support.
    pub supports: Vec<SupportResult>,
}

/// One segment. Stresses stand on the area that the checks use, net where there is one.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct SegmentResult {
    /// Its name, or its number from 1.
    pub name: Name,
    /// Where it begins, from the member's start.
    pub from: Length,
    /// Where it ends.
    pub to: Length,
    /// The id of its material; null with layers, for a part known by its stiffness, for a gap.
    pub material: Option<Name>,
    /// Area for stress at its start; null with layers, for a part known by its stiffness, for a gap.
    pub area_start: Option<Area>,
    /// The same at its end.
    pub area_end: Option<Area>,
    /// EA at its start (k L of a part known by its stiffness; null for a gap).
    pub rigidity_start: Option<Force>,
    /// The same at its end.
    pub rigidity_end: Option<Force>,
    /// Axial force at its start, tension positive.
    pub force_start: Force,
    /// Axial force at its end.
    pub force_end: Force,
    /// Largest axial force in it.
    pub force_max: Force,
    /// Where, from the member's start.
    pub force_max_at: Length,
    /// Least axial force in it.
    pub force_min: Force,
    /// Where, from the member's start.
    pub force_min_at: Length,
    /// Change of its length.
    pub elongation: Length,
    /// The part from force; of a gap its closing (negative).
    pub elongation_force: Length,
    /// The part from temperature.
    pub elongation_temperature: Length,
    /// The part from misfit and imposed strain.
    pub elongation_misfit: Length,
    /// Largest stress; null where there is none to speak of.
    pub stress_max: Option<Stress>,
    /// Where, from the member's start.
    pub stress_max_at: Option<Length>,
    /// Least stress.
    pub stress_min: Option<Stress>,
    /// Where, from the member's start.
    pub stress_min_at: Option<Length>,
    /// What remains open of a gap; null for other segments.
    pub gap: Option<Length>,
    /// Whether a gap has closed and bears; null for other segments.
    pub bears: Option<bool>,
    /// Stresses on the gross area where that differs from what the checks use; what a limit with
    /// `area = "gross"` reads.
    pub gross_stress_max: Option<Stress>,
    /// Where, from the member's start.
    pub gross_stress_max_at: Option<Length>,
    /// Least stress on the gross area.
    pub gross_stress_min: Option<Stress>,
    /// Where, from the member's start.
    pub gross_stress_min_at: Option<Length>,
    /// Its layers, where the job wrote layers; else empty.
    pub layers: Vec<LayerResult>,
}

/// One layer of a segment.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)] // the same words as of a segment
pub struct LayerResult {
    pub name: Name,
    /// The id of its material.
    pub material: Name,
    pub force_start: Force,
    pub force_end: Force,
    pub stress_max: Option<Stress>,
    pub stress_max_at: Option<Length>,
    pub stress_min: Option<Stress>,
    pub stress_min_at: Option<Length>,
    pub gross_stress_max: Option<Stress>,
    pub gross_stress_max_at: Option<Length>,
    pub gross_stress_min: Option<Stress>,
    pub gross_stress_min_at: Option<Length>,
}

/// One cut.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct StationResult {
    /// `start`, `end`, `shank.end`, or the distance as written.
    pub name: Name,
    /// Distance from the member's start.
    pub x: Length,
    /// Movement, + toward the end.
    pub displacement: Length,
    /// Axial force just before it; null at the start.
    pub force_before: Option<Force>,
    /// Axial force just after it; null at the end.
    pub force_after: Option<Force>,
}

/// The words for kinds of support.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "lowercase")]
#[allow(missing_docs)]
pub enum SupportWord {
    Fixed,
    Spring,
    Stop,
}

/// One support.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct SupportResult {
    /// Its name, or that of its station.
    pub name: Name,
    /// Its station as written.
    pub at: Name,
    /// How it answers.
    pub kind: SupportWord,
    /// The force that it puts on the member, + toward the end. Null where two rigid ones share it
    /// in a way that nothing decides.
    pub reaction: Option<Force>,
    /// The clearance of a stop that remains; null for other kinds.
    pub gap: Option<Length>,
    /// Whether a stop bears; null for other kinds.
    pub bears: Option<bool>,
}
