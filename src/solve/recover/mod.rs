//! From a solved chain back to the job's own segments: N, stress and elongation along each.

mod range;
mod segment;
mod stress;

use super::chain::{Solved, States};
use super::loading::Loading;
use super::{Prepared, SolveError};
use crate::model::{Member, Model, Side, Station, Support, SupportKind};
use crate::quantity::{Force, Length};
use crate::result::{
    MemberResult, MemberState, MemberTotals, SegmentResult, StationResult, SupportResult,
    SupportWord,
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
        let sum = |part: fn(&SegmentResult) -> Length| {
            segments
                .iter()
                .fold(Length::default(), |sum, s| sum + part(s))
        };
        let first = |beats: fn(&SegmentResult, &SegmentResult) -> bool| {
            segments[1..].iter().fold(
                &segments[0],
                |best, s| if beats(s, best) { s } else { best },
            )
        };
        let most = first(|a, b| a.force_max > b.force_max);
        let least = first(|a, b| a.force_min < b.force_min);
        let result = MemberResult {
            name: self.member.name.clone(),
            state: MemberState::Taut,
            slack_by: None,
            restraint: None,
            misfit_found: None,
            totals: self.totals(),
            elongation: sum(|s| s.elongation),
            elongation_force: sum(|s| s.elongation_force),
            elongation_temperature: sum(|s| s.elongation_temperature),
            elongation_misfit: sum(|s| s.elongation_misfit),
            force_max: most.force_max,
            force_max_at: most.force_max_at,
            force_min: least.force_min,
            force_min_at: least.force_min_at,
            stations: self.stations(),
            supports: self.supports(),
            segments,
        };
        if is_finite(&result) {
            Ok(result)
        } else {
            Err(SolveError::OutOfRange {
                member: self.member.name.clone(),
            })
        }
    }

    fn totals(&self) -> MemberTotals {
        let add = |sum: Force, force: Force| sum + force;
        let chain = &self.prepared.chain;
        let forces = chain.loads.iter().copied();
        let lines = chain.links.iter().map(|link| link.load);
        MemberTotals {
            applied: forces.chain(lines).fold(Force::default(), add),
            reactions: self
                .solved
                .reactions
                .iter()
                .copied()
                .fold(Force::default(), add),
        }
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
    let stresses = result
        .segments
        .iter()
        .flat_map(|s| [s.stress_max, s.stress_min])
        .flatten();
    let displacements = result.stations.iter().map(|s| s.displacement.value);
    [
        result.elongation.value,
        result.force_max.value,
        result.force_min.value,
        result.totals.reactions.value,
    ]
    .into_iter()
    .chain(stresses.map(|stress| stress.value))
    .chain(displacements)
    .all(f64::is_finite)
}
