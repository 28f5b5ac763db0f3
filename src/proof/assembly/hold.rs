//! Holds: each keeps its law, and answers in its directions alone.

use super::loads::Sized;
use super::space::{along, difference, size, size_along, sum, toward};
use super::{Together, spatial};
use crate::model::{Assembly, Hold, HoldKind, Spatial};
use crate::proof::residual::Size;
use crate::quantity::{Force, Length};
use crate::result::{CombinationResult, HoldResult, SupportWord};

/// Every point of every hold with its row of the result, in their order.
fn rows<'p>(
    assembly: &'p Assembly,
    result: &'p CombinationResult,
) -> impl Iterator<Item = (usize, usize, &'p HoldResult)> {
    let holds = assembly.holds.iter().enumerate();
    holds
        .flat_map(|(index, hold)| hold.points.iter().map(move |&point| (index, point)))
        .zip(&result.holds)
        .map(|((index, point), result)| (index, point, result))
}

impl Together<'_> {
    /// What the holds put on their points, and what the result names of each point.
    pub(super) fn reactions(&mut self) {
        for (index, point, result) in rows(self.assembly, self.result) {
            let reaction = result.reaction.as_deref().map(spatial).unwrap_or_default();
            let stiffness = match self.assembly.holds[index].kind {
                HoldKind::Spring { stiffness, .. } => Some(stiffness),
                HoldKind::Stop { stiffness, .. } => stiffness,
                HoldKind::Fixed { .. } => None,
            };
            let moved = size(&self.moves[point]) + size(&self.loads.movements[index]);
            let point = &mut self.points[point];
            point.reaction.add(reaction);
            point.elastic += stiffness.map_or(Force::default(), |stiffness| stiffness * moved);
            point.held = true;
        }
        for (point, result) in self.points.iter().zip(&self.result.points) {
            let Some(named) = result.reaction.as_deref().map(spatial) else {
                continue;
            };
            let Sized { force, size: sizes } = point.reaction;
            let left = size(&difference(named, force)).over(size(&named) + sizes);
            self.equilibrium
                .take(if point.held { left } else { f64::INFINITY });
        }
    }

    /// Every hold against its law.
    pub(super) fn holds(&mut self) {
        for (index, point, result) in rows(self.assembly, self.result) {
            self.hold(index, point, result);
        }
    }

    fn hold(&mut self, index: usize, point: usize, result: &HoldResult) {
        let hold: &Hold = &self.assembly.holds[index];
        let moved = self.loads.movements[index];
        let by = self.moves[point];
        let reaction: Spatial<Force> = result.reaction.as_deref().map(spatial).unwrap_or_default();
        let forces = self.points[point].size;
        let lengths = |direction: &Spatial<f64>| {
            size_along(direction, &by) + size_along(direction, &moved) + self.slight_move
        };
        // What its foot is ahead of the point.
        let ahead = |direction: &Spatial<f64>| along(direction, &moved) - along(direction, &by);
        match (&hold.kind, result.kind) {
            (HoldKind::Fixed { along: directions }, SupportWord::Fixed) => {
                for direction in directions {
                    self.compatibility
                        .take(ahead(direction).over(lengths(direction)));
                }
                let astray = beside(directions, reaction);
                self.equilibrium.take(size(&astray).over(forces));
            }
            (
                HoldKind::Spring {
                    along: directions,
                    stiffness,
                },
                SupportWord::Spring,
            ) => {
                let (mut answer, mut sizes) = (Spatial::<Force>::default(), forces);
                for direction in directions {
                    let part = toward(direction, *stiffness * ahead(direction));
                    answer = sum(answer, part);
                    sizes += *stiffness * lengths(direction);
                }
                self.compatibility
                    .take(size(&difference(reaction, answer)).over(sizes));
            }
            (
                HoldKind::Stop {
                    blocks,
                    clearance,
                    stiffness,
                },
                SupportWord::Stop,
            ) => {
                let open = ahead(blocks) + *clearance;
                let sizes = lengths(blocks) + clearance.abs();
                let push = -along(blocks, &reaction);
                let astray = sum(reaction, toward(blocks, push));
                self.equilibrium.take(size(&astray).over(forces));
                let (Some(gap), Some(bears)) = (result.gap, result.bears) else {
                    self.compatibility.take(f64::INFINITY);
                    return;
                };
                if bears {
                    let pull = (-push).max(Force::default());
                    self.equilibrium.take(pull.over(forces));
                    self.compatibility.take(gap.over(gap.abs() + sizes));
                    match stiffness {
                        Some(stiffness) => {
                            let left = push + *stiffness * open;
                            self.compatibility
                                .take(left.over(*stiffness * sizes + forces));
                        }
                        None => self.compatibility.take(open.over(sizes)),
                    }
                } else {
                    self.equilibrium.take(size(&reaction).over(forces));
                    let overlap = gap.min(Length::default());
                    self.compatibility.take(overlap.over(sizes));
                    self.compatibility
                        .take((gap - open).over(gap.abs() + sizes));
                }
            }
            _ => self.compatibility.take(f64::INFINITY),
        }
        let stop = matches!(hold.kind, HoldKind::Stop { .. });
        if result.gap.is_some() != stop || result.bears.is_some() != stop {
            self.compatibility.take(f64::INFINITY);
        }
    }
}

/// What of a force lies in none of some independent directions (Gram and Schmidt).
fn beside(directions: &[Spatial<f64>], force: Spatial<Force>) -> Spatial<Force> {
    let mut square: Vec<Spatial<f64>> = Vec::with_capacity(directions.len());
    let mut left = force;
    for &direction in directions {
        let mut own = direction;
        for other in &square {
            own = difference(own, toward(other, along(other, &own)));
        }
        let length = along(&own, &own).sqrt();
        let own = own.map(|share| share / length);
        left = difference(left, toward(&own, along(&own, &left)));
        square.push(own);
    }
    left
}
