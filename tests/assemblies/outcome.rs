//! The numbers of a solved combination side by side, for comparing one assembly with another.

use super::assembly::Assembly;
use crate::common::checked;
use lengthwise::quantity::Force;
use lengthwise::result::{CombinationResult, JobResult, JobStatus, MemberState};

/// What is compared, each list in the order of the results.
#[derive(Debug, Clone, PartialEq, Default)]
pub(crate) struct Outcome {
    /// Of each point.
    pub(crate) displacement: Vec<Vec<f64>>,
    /// Of each member.
    pub(crate) elongation: Vec<f64>,
    /// Of each member: N at both ends.
    pub(crate) force: Vec<[f64; 2]>,
    /// Of each body, about x, y, z.
    pub(crate) rotation: Vec<[f64; 3]>,
    /// Of each hold.
    pub(crate) reaction: Vec<Vec<f64>>,
    /// What bears, is closed or slack.
    pub(crate) states: Vec<bool>,
}

impl Outcome {
    /// Of an assembly that can be solved; `None` where something is pushed that nothing holds.
    pub(crate) fn try_of(assembly: &Assembly) -> Option<Self> {
        let result = checked("assembly.toml", &assembly.job());
        (result.status != JobStatus::Error).then(|| Self::of_first(&result))
    }

    pub(crate) fn of_first(result: &JobResult) -> Self {
        Self::of(&result.combinations[0])
    }

    pub(crate) fn of(combination: &CombinationResult) -> Self {
        let force = |force: Option<Force>| force.map_or(0.0, |f| f.value);
        let mut outcome = Outcome::default();
        for point in &combination.points {
            let moved = point.displacement.iter().map(|u| u.value);
            outcome.displacement.push(moved.collect());
        }
        for member in &combination.members {
            outcome.elongation.push(member.elongation.value);
            let (first, last) = (
                &member.stations[0],
                &member.stations[member.stations.len() - 1],
            );
            outcome
                .force
                .push([force(first.force_after), force(last.force_before)]);
            outcome.states.push(member.state == MemberState::Slack);
            outcome
                .states
                .extend(member.segments.iter().filter_map(|s| s.bears));
        }
        for body in &combination.bodies {
            outcome
                .rotation
                .push(body.rotation.spatial().map(|a| a.value));
        }
        for hold in &combination.holds {
            let reaction = hold.reaction.as_ref().expect("nothing is shared here");
            outcome
                .reaction
                .push(reaction.iter().map(|r| r.value).collect());
            outcome.states.extend(hold.bears);
        }
        outcome
    }

    /// Lengths and rotations in one list (rotations over 1 m), forces in another.
    fn numbers(&self) -> [Vec<f64>; 2] {
        let lengths = self.displacement.iter().flatten().chain(&self.elongation);
        let lengths = lengths.chain(self.rotation.iter().flatten());
        let forces = self
            .force
            .iter()
            .flatten()
            .chain(self.reaction.iter().flatten());
        [lengths.copied().collect(), forces.copied().collect()]
    }

    /// Every number through a function of the same number of another outcome.
    pub(crate) fn with(&self, other: &Self, f: impl Fn(f64, f64) -> f64) -> Self {
        let mut made = self.clone();
        let vectors = |made: &mut Vec<Vec<f64>>, other: &Vec<Vec<f64>>| {
            for (mine, theirs) in made.iter_mut().flatten().zip(other.iter().flatten()) {
                *mine = f(*mine, *theirs);
            }
        };
        vectors(&mut made.displacement, &other.displacement);
        vectors(&mut made.reaction, &other.reaction);
        for (mine, theirs) in made.elongation.iter_mut().zip(&other.elongation) {
            *mine = f(*mine, *theirs);
        }
        for (mine, theirs) in made
            .force
            .iter_mut()
            .flatten()
            .zip(other.force.iter().flatten())
        {
            *mine = f(*mine, *theirs);
        }
        let turns = other.rotation.iter().flatten();
        for (mine, theirs) in made.rotation.iter_mut().flatten().zip(turns) {
            *mine = f(*mine, *theirs);
        }
        made
    }

    /// The same states, and each number to a share of the largest of its kind.
    pub(crate) fn assert_near(&self, other: &Self, share: f64, about: &str) {
        assert_eq!(self.states, other.states, "{about}");
        for (mine, theirs) in self.numbers().into_iter().zip(other.numbers()) {
            assert_eq!(mine.len(), theirs.len(), "{about}");
            let largest = theirs.iter().fold(1e-9, |m: f64, v| m.max(v.abs()));
            for (mine, theirs) in mine.into_iter().zip(theirs) {
                assert!(
                    (mine - theirs).abs() <= share * largest,
                    "{mine:e} against {theirs:e} of {largest:e}\n{about}"
                );
            }
        }
    }
}
