//! What acts on points, bodies and holds: loads of the job, and the weight of cases on bodies.

use super::bodies::needs_centre;
use super::direction::Basis;
use super::space::Up;
use crate::job::meant::Meaning;
use crate::job::meant::names::Root;
use crate::job::written::Written;
use crate::job::written::assembly::entries::{Entries, counted};
use crate::job::written::assembly::load::{Action, Load, Moments};
use crate::job::written::load::ByCase;
use crate::model::{
    AssemblyActions, Body, ForceOnBody, ForceOnPoint, Hold, MomentOnBody, MovementOfHold, Spatial,
    WeightOfBody,
};
use crate::quantity::Moment;

/// Everything that acts on points, bodies and holds.
pub(super) fn actions<'t>(
    bodies: &[Option<Body>],
    holds: &[Option<Hold>],
    meaning: &mut Meaning<'_, 't>,
) -> AssemblyActions {
    let mut actions = AssemblyActions {
        weights: weights(bodies, meaning),
        ..AssemblyActions::default()
    };
    for load in &meaning.job.assembly.loads {
        lay(load, holds, &mut actions, meaning);
    }
    actions
}

fn lay<'t>(
    load: &Load<'t>,
    holds: &[Option<Hold>],
    actions: &mut AssemblyActions,
    meaning: &mut Meaning<'_, 't>,
) {
    let Some((on, action)) = &load.acts else {
        return;
    };
    match action {
        Action::ForceOnPoint(force) => {
            let point = meaning.find(Root::Point, on);
            for (case, force) in each_case(load, force, meaning) {
                let force = meaning.spatial(&force.value, &force.place);
                if let (Some(point), Some(force)) = (point, force) {
                    actions.forces.push(ForceOnPoint { case, point, force });
                }
            }
        }
        Action::ForceOnBody(force) => {
            let body = meaning.find(Root::Body, on);
            if let Some(body) = body {
                has_centre(body, on, meaning);
            }
            for (case, force) in each_case(load, force, meaning) {
                let force = meaning.spatial(&force.value, &force.place);
                if let (Some(body), Some(force)) = (body, force) {
                    actions.bodies.push(ForceOnBody { case, body, force });
                }
            }
        }
        Action::MomentOnBody(moment) => {
            let body = meaning.find(Root::Body, on);
            for (case, moment) in each_case(load, moment, meaning) {
                let moment = turning(moment, meaning);
                if let (Some(body), Some(moment)) = (body, moment) {
                    actions.moments.push(MomentOnBody { case, body, moment });
                }
            }
        }
        Action::MovementOfHold(movement) => {
            let hold = meaning.find(Root::Hold, on);
            for (case, movement) in each_case(load, movement, meaning) {
                let place = &movement.place;
                let movement = meaning.spatial(&movement.value, place);
                let (Some(hold), Some(movement)) = (hold, movement) else {
                    continue;
                };
                let Some(held) = &holds[hold] else {
                    continue;
                };
                let basis = Basis::of(held.kind.directions());
                if basis.misses(movement.map(|part| part.value)) {
                    let message = format!(
                        "this movement has a part in a direction in which the hold `{}` does not \
                         hold",
                        held.name
                    );
                    let help =
                        "write 0 there; what is free in a direction is not moved by its hold";
                    meaning.r.problems.say(place, message, help);
                    continue;
                }
                actions.movements.push(MovementOfHold {
                    case,
                    hold,
                    movement,
                });
            }
        }
    }
}

fn each_case<'w, 't, T>(
    load: &'w Load<'t>,
    values: &'w ByCase<'t, T>,
    meaning: &mut Meaning<'_, 't>,
) -> Vec<(usize, &'w Written<T>)> {
    meaning.by_case(&load.case, &load.place, values)
}

/// Reports a body on which a force acts and that does not say where.
fn has_centre(body: usize, on: &Written<&str>, meaning: &mut Meaning<'_, '_>) {
    let written = &meaning.job.assembly.bodies[body];
    // Of a mass the same has been reported.
    if written.at.is_absent() && written.mass.is_absent() {
        let message = format!(
            "a force acts on the body `{}` at its centre of mass, and nothing says where",
            on.value
        );
        needs_centre(written, message, meaning);
    }
}

/// A moment about x, y and z: one value in two coordinates, three in three.
fn turning(written: &Written<Moments>, meaning: &mut Meaning<'_, '_>) -> Option<Spatial<Moment>> {
    let coordinates = meaning.space.coordinates?;
    let (message, help) = match (coordinates, written.value) {
        (2, Moments::One(moment)) => {
            return Some([Moment::default(), Moment::default(), moment]);
        }
        (3, Moments::Each(Entries { values, count: 3 })) => return Some(values),
        (1, _) => (
            "in one coordinate nothing turns, and so no moment acts".to_owned(),
            "take it out, or give the points two coordinates",
        ),
        (2, _) => (
            "in two coordinates a moment is one value, about z".to_owned(),
            "write it as in \"4 kN m\", + from x toward y",
        ),
        (_, Moments::One(_)) => (
            "in three coordinates a moment has three values, about x, y and z".to_owned(),
            "write it as in `[\"0 kN m\", \"0 kN m\", \"4 kN m\"]`",
        ),
        (_, Moments::Each(Entries { count, .. })) => (
            format!(
                "here are entries for {}, and a moment has three values, about x, y and z",
                counted(count)
            ),
            "write it as in `[\"0 kN m\", \"0 kN m\", \"4 kN m\"]`",
        ),
    };
    meaning.r.problems.say(&written.place, message, help);
    None
}

/// The weight that cases put on the mass of each body.
fn weights(bodies: &[Option<Body>], meaning: &mut Meaning<'_, '_>) -> Vec<WeightOfBody> {
    let mut weights = Vec::new();
    let job = meaning.job;
    for (index, written) in job.assembly.bodies.iter().enumerate() {
        let has_mass = written
            .mass
            .given()
            .is_some_and(|mass| mass.value.value > 0.0);
        if !has_mass {
            continue;
        }
        let mut weighs = false;
        for (case, of_case) in job.cases.iter().enumerate() {
            let Some(weight) = of_case.weight.given().filter(|weight| weight.value != 0.0) else {
                continue;
            };
            weighs = true;
            if bodies[index].is_some() {
                weights.push(WeightOfBody {
                    case,
                    body: index,
                    number: weight.value,
                });
            }
        }
        if weighs && meaning.space.coordinates == Some(1) && meaning.space.up == Up::Unsaid {
            let message = format!(
                "weight acts on the body `{}`, and nothing says which way is up",
                written.name.value
            );
            meaning.needs_up(message, &written.place);
        }
    }
    weights
}
