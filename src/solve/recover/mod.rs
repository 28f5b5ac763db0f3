//! From a solved chain back to the job's own segments: N, stress and elongation along each.

mod range;
mod segment;
mod stress;

use super::chain::{Solved, States};
use super::loading::Loading;
use super::{Prepared, SolveError};
use crate::model::{Member, Model, Side, Station, Support, SupportKind};
use crate::quantity::{Length, Stress};
use crate::result::{
    MemberResult, MemberState, MemberTotals, StationResult, SupportResult, SupportWord,
};

/// A solved member with all that its results are made of.
pub(super) struct Recovered<'a> {
    pub(super) model: &'a Model,
    pub(super) member: &'a Member,
    pub(super) loading: &'a Loading,
    pub(super) prepared: &'a Prepared,
    pub(super) solved: &'a Solved,
    pub(super) states: &'a States,
}

impl Recovered<'_> {
    /// The finished results of the member, its share of restraint left out.
    pub(super) fn result(&self) -> Result<MemberResult, SolveError> {
        let mut segments = Vec::with_capacity(self.member.segments.len());
        let mut layers = Vec::new();
        for index in 0..self.member.segments.len() {
            segments.push(self.segment(index, &mut layers)?);
        }
        let (first, none) = (&segments[0], Length::default());
        let mut result = MemberResult {
            name: self.member.name.clone(),
            state: MemberState::Taut,
            slack_by: None,
            restraint: None,
            misfit_found: None,
            totals: self.totals(),
            elongation: none,
            elongation_force: none,
            elongation_temperature: none,
            elongation_misfit: none,
            force_max: first.force_max,
            force_max_at: first.force_max_at,
            force_min: first.force_min,
            force_min_at: first.force_min_at,
            stations: self.stations(),
            supports: self.supports(),
            segments: Vec::new(),
        };
        for segment in &segments {
            result.elongation += segment.elongation;
            result.elongation_force += segment.elongation_force;
            result.elongation_temperature += segment.elongation_temperature;
            result.elongation_misfit += segment.elongation_misfit;
            if segment.force_max > result.force_max {
                result.force_max = segment.force_max;
                result.force_max_at = segment.force_max_at;
            }
            if segment.force_min < result.force_min {
                result.force_min = segment.force_min;
                result.force_min_at = segment.force_min_at;
            }
        }
        result.segments = segments;
        if is_finite(&result) {
            Ok(result)
        } else {
            Err(SolveError::OutOfRange {
                member: self.member.name.clone(),
            })
        }
    }

    fn totals(&self) -> MemberTotals {
        let mut totals = MemberTotals::default();
        for &load in &self.prepared.chain.loads {
            totals.applied += load;
        }
        for link in &self.prepared.chain.links {
            totals.applied += link.load;
        }
        for &reaction in &self.solved.reactions {
            totals.reactions += reaction;
        }
        totals
    }

    fn stations(&self) -> Vec<StationResult> {
        let last = self.member.stations.len() - 1;
        let result = |(index, station): (usize, &Station)| StationResult {
            name: station.name.clone(),
            x: station.x,
            displacement: self.solved.displacements[index],
            force_before: (index > 0).then(|| self.solved.before[index]),
            force_after: (index < last).then(|| self.solved.after[index]),
        };
        self.member
            .stations
            .iter()
            .enumerate()
            .map(result)
            .collect()
    }

    fn supports(&self) -> Vec<SupportResult> {
        let unanswered = |support: &Support| SupportResult {
            name: support.name.clone(),
            at: support.at.clone(),
            kind: match support.kind {
                SupportKind::Fixed => SupportWord::Fixed,
                SupportKind::Spring(_) => SupportWord::Spring,
                SupportKind::Stop { .. } => SupportWord::Stop,
            },
            reaction: None,
            gap: None,
            bears: None,
        };
        let mut results: Vec<SupportResult> = self.member.supports.iter().map(unanswered).collect();
        for (index, hold) in self.prepared.chain.holds.iter().enumerate() {
            let result = &mut results[hold.support];
            result.reaction = Some(self.solved.reactions[index]);
            if let Some(side) = hold.stop {
                let beyond = self.solved.displacements[hold.station] - hold.face;
                let clearance = match side {
                    Side::End => -beyond,
                    Side::Start => beyond,
                };
                let bears = self.states.holds[index];
                result.bears = Some(bears);
                result.gap = Some(if bears {
                    Length::default()
                } else {
                    clearance.max(Length::default())
                });
            }
        }
        results
    }
}

/// Whether every sum is a number: what feeds them is then as well.
fn is_finite(result: &MemberResult) -> bool {
    let finite = |stress: Option<Stress>| stress.is_none_or(|stress| stress.value.is_finite());
    result.elongation.value.is_finite()
        && result.force_max.value.is_finite()
        && result.force_min.value.is_finite()
        && result.totals.reactions.value.is_finite()
        && result
            .segments
            .iter()
            .all(|segment| finite(segment.stress_max) && finite(segment.stress_min))
        && result
            .stations
            .iter()
            .all(|station| station.displacement.value.is_finite())
}
