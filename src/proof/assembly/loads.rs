//! What a combination puts on points, bodies and holds, gathered anew from the model.

use super::space::{size, sum, toward};
use crate::model::{Assembly, Combination, Spatial};
use crate::quantity::{Force, Length, Moment, STANDARD_GRAVITY, from_si};

/// A force with the sum of the sizes that it is made of.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Sized {
    pub(super) force: Spatial<Force>,
    pub(super) size: Force,
}

impl Sized {
    pub(super) fn add(&mut self, force: Spatial<Force>) {
        self.force = sum(self.force, force);
        self.size += size(&force);
    }
}

/// What acts on a body, at its centre of mass.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct OnBody {
    pub(super) force: Sized,
    pub(super) moment: Spatial<Moment>,
    pub(super) moment_size: Moment,
}

/// The factored actions, by point, body and hold.
pub(super) struct Loads {
    pub(super) points: Vec<Sized>,
    pub(super) bodies: Vec<OnBody>,
    pub(super) movements: Vec<Spatial<Length>>,
}

impl Loads {
    pub(super) fn on(assembly: &Assembly, combination: &Combination) -> Self {
        let mut loads = Loads {
            points: vec![Sized::default(); assembly.points.len()],
            bodies: vec![OnBody::default(); assembly.bodies.len()],
            movements: vec![Default::default(); assembly.holds.len()],
        };
        let actions = &assembly.actions;
        let factor = |case: usize| combination.factors[case];
        for on in &actions.forces {
            loads.points[on.point].add(on.force.map(|force| force * factor(on.case)));
        }
        for on in &actions.bodies {
            let force = on.force.map(|force| force * factor(on.case));
            loads.bodies[on.body].force.add(force);
        }
        for on in &actions.moments {
            let moment = on.moment.map(|moment| moment * factor(on.case));
            let body = &mut loads.bodies[on.body];
            body.moment = sum(body.moment, moment);
            body.moment_size += size(&moment);
        }
        for on in &actions.weights {
            let mass = assembly.bodies[on.body].mass.unwrap_or_default();
            let weight: Force = from_si(mass.value * STANDARD_GRAVITY);
            let times = on.number * factor(on.case);
            loads.bodies[on.body]
                .force
                .add(toward(&assembly.down, weight * times));
        }
        for on in &actions.movements {
            let movement = on.movement.map(|movement| movement * factor(on.case));
            loads.movements[on.hold] = sum(loads.movements[on.hold], movement);
        }
        loads
    }
}
