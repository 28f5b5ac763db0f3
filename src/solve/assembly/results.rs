//! The results of points, holds and bodies.

use super::parts::Parts;
use super::unknowns::Unknowns;
use crate::model::{Assembly, HoldKind, Spatial};
use crate::quantity::{Force, Length};
use crate::result::{BodyResult, HoldResult, PointResult, Rotation, SupportWord};
use crate::solve::SolveError;
use crate::solve::system::Answer;

/// An assembly with the answer that its results are read from.
pub(super) struct Solved<'a> {
    pub(super) assembly: &'a Assembly,
    pub(super) unknowns: &'a Unknowns,
    pub(super) parts: &'a Parts,
    pub(super) answer: &'a Answer,
}

impl Solved<'_> {
    /// The first entries, as many as there are coordinates, none of them a negative zero.
    pub(super) fn entries<Q: Copy + Default + std::ops::Add<Output = Q>>(
        &self,
        all: &Spatial<Q>,
    ) -> Vec<Q> {
        let entries = all[..self.unknowns.coordinates].iter();
        entries.map(|&entry| entry + Q::default()).collect()
    }

    /// The force that each point of each hold takes.
    pub(super) fn hold_forces(&self) -> Vec<Spatial<Force>> {
        let force = |held: &super::parts::Held| {
            let kind = &self.assembly.holds[held.hold].kind;
            let carried = match kind {
                HoldKind::Fixed { .. } => &self.answer.rigid,
                HoldKind::Spring { .. } => &self.answer.elastic,
                HoldKind::Stop { .. } => &self.answer.one_way,
            };
            let mut reaction = Spatial::default();
            for (at, direction) in kind.directions().iter().enumerate() {
                let pull = carried[held.first + at];
                for (sum, along) in reaction.iter_mut().zip(direction) {
                    *sum -= pull * *along;
                }
            }
            reaction
        };
        self.parts.held.iter().map(force).collect()
    }

    pub(super) fn holds(&self, forces: &[Spatial<Force>]) -> Vec<HoldResult> {
        let result = |(held, force): (&super::parts::Held, &Spatial<Force>)| {
            let hold = &self.assembly.holds[held.hold];
            let is_stop = matches!(hold.kind, HoldKind::Stop { .. });
            HoldResult {
                name: hold.name.clone(),
                point: self.assembly.points[held.point].name.clone(),
                kind: match hold.kind {
                    HoldKind::Fixed { .. } => SupportWord::Fixed,
                    HoldKind::Spring { .. } => SupportWord::Spring,
                    HoldKind::Stop { .. } => SupportWord::Stop,
                },
                reaction: Some(self.entries(force)),
                gap: is_stop.then(|| self.answer.clearance[held.first]),
                bears: is_stop.then(|| self.answer.acts[held.first]),
            }
        };
        self.parts.held.iter().zip(forces).map(result).collect()
    }

    /// The points with the sum of what their holds put on them.
    pub(super) fn points(&self, forces: &[Spatial<Force>]) -> Result<Vec<PointResult>, SolveError> {
        let mut reactions: Vec<Option<Spatial<Force>>> = vec![None; self.assembly.points.len()];
        for (held, force) in self.parts.held.iter().zip(forces) {
            let sum = reactions[held.point].get_or_insert_default();
            for (sum, entry) in sum.iter_mut().zip(force) {
                *sum += *entry;
            }
        }
        let points = self.assembly.points.iter().zip(&self.unknowns.points);
        points
            .zip(reactions)
            .map(|((point, moved), reaction)| {
                let displacement = self
                    .unknowns
                    .displacement(moved, &self.answer.displacements);
                let lengths = displacement.iter().map(|entry| entry.value);
                let forces = reaction.iter().flatten().map(|entry| entry.value);
                if !lengths.chain(forces).all(f64::is_finite) {
                    return Err(SolveError::PointOutOfRange {
                        point: point.name.clone(),
                    });
                }
                Ok(PointResult {
                    name: point.name.clone(),
                    displacement: self.entries(&displacement),
                    reaction: reaction.map(|reaction| self.entries(&reaction)),
                })
            })
            .collect()
    }

    pub(super) fn bodies(&self, points: &[PointResult]) -> Vec<BodyResult> {
        let result = |(index, body): (usize, &crate::model::Body)| {
            let rotation = self
                .unknowns
                .rotation(index, &self.answer.displacements)
                .map(|angle| angle + Default::default());
            let first = body.points.first();
            BodyResult {
                name: body.name.clone(),
                displacement: first.map_or_else(
                    || vec![Length::default(); self.unknowns.coordinates],
                    |&first| points[first].displacement.clone(),
                ),
                rotation: match self.unknowns.coordinates {
                    3 => Rotation::Spatial(rotation),
                    _ => Rotation::InPlane(rotation[2]),
                },
            }
        };
        let bodies = self.assembly.bodies.iter().enumerate();
        bodies.map(result).collect()
    }
}
