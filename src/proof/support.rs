//! Supports and joints: each keeps its law, and what bears is told from what does not.

use super::member::Proof;
use super::residual::Size;
use crate::model::{SegmentKind, Side, SupportKind};
use crate::quantity::{Force, Length};
use crate::result::{SegmentResult, SupportResult};

impl Proof<'_> {
    /// A joint: closed, its sides are its width nearer and press; open, nothing goes through.
    pub(super) fn joint(&mut self, piece: usize, result: &SegmentResult) {
        let segment = &self.acting.member.segments[self.acting.member.pieces[piece].segment];
        let SegmentKind::Gap(gap) = &segment.kind else {
            return;
        };
        let (_, force) = self.forces_at(piece);
        let (from, to) = (self.displacement(piece), self.displacement(piece + 1));
        let (stretch, sizes) = (to - from, from.abs() + to.abs() + gap.width);
        let left = result.gap.unwrap_or_default();
        if result.bears == Some(true) {
            let give = gap
                .stiffness
                .map_or(Length::default(), |stiffness| force / stiffness);
            self.compatibility
                .take((stretch + gap.width - give).over(sizes + give.abs()));
            self.compatibility.take(left.over(left.abs() + sizes));
            self.equilibrium
                .take(force.max(Force::default()).over(self.force_size(piece)));
        } else {
            let overlap = left.min(Length::default());
            self.compatibility.take(overlap.over(sizes));
            self.compatibility
                .take((left - gap.width - stretch).over(left.abs() + sizes));
            self.equilibrium.take(force.over(self.force_size(piece)));
        }
    }

    /// The size of the forces about a piece, against which one that should not be there is held.
    fn force_size(&self, station: usize) -> Force {
        let (before, after) = self.forces_at(station);
        let (_, load) = self.acting.forces[station];
        let (_, reactions) = self.reactions[station];
        before.abs() + after.abs() + load + reactions
    }

    /// A support keeps its law: fixed, spring, or a stop that only pushes and never overlaps.
    pub(super) fn support(&mut self, index: usize, result: &SupportResult) {
        let support = &self.acting.member.supports[index];
        let moved = self.acting.movements[index];
        let displacement = self.displacement(support.station);
        let Some(reaction) = result.reaction else {
            return;
        };
        let sizes = displacement.abs() + moved.abs();
        match support.kind {
            SupportKind::Fixed => self.compatibility.take((displacement - moved).over(sizes)),
            SupportKind::Spring(stiffness) => {
                let answer = stiffness * (moved - displacement);
                let size = reaction.abs() + stiffness * sizes + self.force_size(support.station);
                self.compatibility.take((reaction - answer).over(size));
            }
            SupportKind::Stop {
                clearance,
                side,
                stiffness,
            } => {
                let (open, push) = match side {
                    Side::End => (moved + clearance - displacement, -reaction),
                    Side::Start => (displacement - moved + clearance, reaction),
                };
                let (sizes, forces) = (sizes + clearance, self.force_size(support.station));
                let gap = result.gap.unwrap_or_default();
                if result.bears == Some(true) {
                    self.equilibrium
                        .take((-push).max(Force::default()).over(forces));
                    self.compatibility.take(gap.over(gap.abs() + sizes));
                    match stiffness {
                        Some(stiffness) => {
                            let answer = stiffness * -open;
                            self.compatibility.take(
                                (push - answer).over(push.abs() + stiffness * sizes + forces),
                            );
                        }
                        None => self.compatibility.take(open.over(sizes)),
                    }
                } else {
                    self.equilibrium.take(reaction.over(forces));
                    let overlap = gap.min(Length::default());
                    self.compatibility.take(overlap.over(sizes));
                    self.compatibility
                        .take((gap - open).over(gap.abs() + sizes));
                }
            }
        }
    }
}
