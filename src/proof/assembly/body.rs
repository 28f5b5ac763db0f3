//! Bodies: they keep their shape, and all that acts on each cancels in force and in moment.

use super::space::{difference, moment, size, sum, turned};
use super::{Together, hinges, spatial};
use crate::model::{Body, Spatial};
use crate::proof::residual::Size;
use crate::quantity::{Angle, Force, Length, Moment, from_si};

/// A force at an arm of some length.
pub(super) fn moment_of(arm: Length, force: Force) -> Moment {
    from_si(arm.value * force.value)
}

/// The mean of some places.
pub(super) fn middle(places: impl ExactSizeIterator<Item = Spatial<Length>>) -> Spatial<Length> {
    let count = places.len().max(1) as f64;
    let total = places.fold(Spatial::<Length>::default(), sum);
    total.map(|entry| entry / count)
}

/// What acts on a body, about its middle, the forces between bodies that share points left out.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Acted {
    pub(super) middle: Spatial<Length>,
    /// The farthest of its points, and its centre of mass where that is loaded, from its middle.
    pub(super) reach: Length,
    pub(super) force: Spatial<Force>,
    pub(super) moment: Spatial<Moment>,
    /// The sum of the sizes of the forces.
    pub(super) size: Force,
    /// The sum of the sizes of the moments that are not forces at arms.
    pub(super) moment_size: Moment,
}

impl Acted {
    fn add(&mut self, place: Spatial<Length>, force: Spatial<Force>, sizes: Force) {
        let arm = difference(place, self.middle);
        self.reach = self.reach.max(size(&arm));
        self.force = sum(self.force, force);
        self.moment = sum(self.moment, moment(&arm, &force));
        self.size += sizes;
    }
}

impl Together<'_> {
    /// How a body's centre of mass moves, or its first point where it has none.
    pub(super) fn moved(
        &self,
        body: &Body,
        by: &Spatial<Length>,
        rotation: &Spatial<Angle>,
    ) -> Spatial<Length> {
        let first = self.assembly.points[body.points[0]].at;
        let arm = difference(body.centre.unwrap_or(first), first);
        sum(*by, turned(rotation, &arm))
    }

    /// Every point of every body moves with it: by its displacement, and by its rotation at the arm
    /// from its first point.
    pub(super) fn bodies_move(&mut self) {
        for (body, result) in self.assembly.bodies.iter().zip(&self.result.bodies) {
            let first = self.assembly.points[body.points[0]].at;
            let (by, rotation) = (spatial(&result.displacement), result.rotation.spatial());
            for &point in &body.points {
                let arm = difference(self.assembly.points[point].at, first);
                let turn = turned(&rotation, &arm);
                // A rotation is held to what it does, however far the body moves as a whole.
                let apart = difference(self.moves[point], by);
                let turns: Length = from_si(size(&rotation).value * size(&arm).value);
                let sizes = size(&apart) + turns + self.slight_move;
                self.compatibility
                    .take(size(&difference(apart, turn)).over(sizes));
            }
            if self.assembly.coordinates == 1 && size(&rotation) != Angle::default() {
                self.compatibility.take(f64::INFINITY);
            }
        }
    }

    /// What meets at the points of every body, with its own loads, must cancel.
    pub(super) fn bodies_rest(&mut self) {
        if self.assembly.bodies.is_empty() {
            return;
        }
        let mut owners: Vec<Option<usize>> = vec![None; self.points.len()];
        let mut shared = Vec::new();
        let mut acted = Vec::with_capacity(self.assembly.bodies.len());
        for (index, body) in self.assembly.bodies.iter().enumerate() {
            let at = |point: usize| self.assembly.points[point].at;
            let mut on = Acted {
                middle: middle(body.points.iter().map(|&point| at(point))),
                ..Acted::default()
            };
            for &point in &body.points {
                let meets = &self.points[point];
                // Of several bodies at a point the first takes what meets there and passes it on.
                let force = match owners[point] {
                    None => meets.force(),
                    Some(_) => Spatial::default(),
                };
                on.add(at(point), force, meets.size);
                match owners[point] {
                    None => owners[point] = Some(index),
                    Some(first) => shared.push(hinges::Hinge {
                        at: at(point),
                        bodies: [first, index],
                    }),
                }
            }
            let loads = &self.loads.bodies[index];
            if let Some(centre) = body.centre.filter(|_| loads.force.size > Force::default()) {
                on.add(centre, loads.force.force, loads.force.size);
            }
            on.moment = sum(on.moment, loads.moment);
            on.moment_size += loads.moment_size;
            acted.push(on);
        }
        hinges::pass_on(self.assembly.coordinates, &shared, &mut acted);
        for on in &acted {
            self.equilibrium.take(size(&on.force).over(on.size));
            if self.assembly.coordinates > 1 {
                let sizes = moment_of(on.reach, on.size) + on.moment_size;
                self.equilibrium.take(size(&on.moment).over(sizes));
            }
        }
    }
}
