//! What one combination puts on an assembly: forces on its unknowns, and the rests of its parts.

use super::parts::Parts;
use super::space::size;
use super::tie::{Loaded, Part};
use super::unknowns::Unknowns;
use crate::model::{Assembly, Combination, HoldKind, Model, Spatial};
use crate::quantity::{Force, Length, STANDARD_GRAVITY, from_si};
use crate::solve::SolveError;
use crate::solve::system::Loads;
use crate::solve::threshold::Threshold;

/// All of it, with what its members need to be recovered.
pub(super) struct Loading {
    pub(super) loads: Loads,
    /// One for each tie.
    pub(super) ties: Vec<Loaded>,
    /// The sum of all that acts on points, bodies and members.
    pub(super) applied: Spatial<Force>,
}

/// Forces on the unknowns as they are gathered, with their sum and their sizes.
struct Gathered<'a> {
    unknowns: &'a Unknowns,
    forces: Vec<Force>,
    applied: Spatial<Force>,
    sizes: Force,
}

impl Gathered<'_> {
    fn count(&mut self, force: &Spatial<Force>) {
        for (sum, entry) in self.applied.iter_mut().zip(force) {
            *sum += *entry;
        }
        self.sizes += from_si(size(&force.map(|entry| entry.value)));
    }

    fn point(&mut self, point: usize, force: &Spatial<Force>) {
        let moved = &self.unknowns.points[point];
        self.unknowns.push(&mut self.forces, moved, force);
        self.count(force);
    }

    fn body(&mut self, body: usize, centre: &Spatial<Length>, force: &Spatial<Force>) {
        self.unknowns
            .push_body(&mut self.forces, body, centre, force);
        self.count(force);
    }
}

impl Loading {
    pub(super) fn of(
        model: &Model,
        assembly: &Assembly,
        unknowns: &Unknowns,
        parts: &Parts,
        combination: &Combination,
    ) -> Result<Self, Vec<SolveError>> {
        let mut gathered = Gathered {
            unknowns,
            forces: vec![Force::default(); parts.unknowns],
            applied: Spatial::default(),
            sizes: Force::default(),
        };
        on_points_and_bodies(assembly, combination, &mut gathered);
        let mut loads = Loads {
            elastic_rest: vec![Length::default(); parts.elastic_restraint.len()],
            rigid_value: vec![Length::default(); parts.rigid.len()],
            one_way_rest: vec![Length::default(); parts.one_way.len()],
            ..Loads::default()
        };
        let ties = on_members(
            model,
            assembly,
            parts,
            combination,
            &mut gathered,
            &mut loads,
        )?;
        let moved = on_holds(assembly, parts, combination, &mut loads);
        loads.zero = threshold(parts, &loads, &moved, gathered.sizes);
        loads.forces = gathered.forces;
        Ok(Loading {
            loads,
            ties,
            applied: gathered.applied,
        })
    }
}

fn on_points_and_bodies(assembly: &Assembly, combination: &Combination, gathered: &mut Gathered) {
    let factor = |case: usize| combination.factors[case];
    let actions = &assembly.actions;
    for action in &actions.forces {
        let force = action.force.map(|entry| entry * factor(action.case));
        gathered.point(action.point, &force);
    }
    // A body that a force acts on has a centre; its reference stands in for one that it lacks.
    let centre = |body: usize| {
        let reference = || gathered.unknowns.bodies[body].reference;
        assembly.bodies[body].centre.unwrap_or_else(reference)
    };
    let forces = actions.bodies.iter().map(|action| {
        let force = action.force.map(|entry| entry * factor(action.case));
        (action.body, force)
    });
    let weights = actions.weights.iter().map(|action| {
        let mass = assembly.bodies[action.body].mass.unwrap_or_default();
        let weight: Force =
            from_si(mass.value * STANDARD_GRAVITY * action.number * factor(action.case));
        (action.body, assembly.down.map(|entry| weight * entry))
    });
    let at_centres: Vec<_> = forces
        .chain(weights)
        .map(|(body, force)| (body, centre(body), force))
        .collect();
    for (body, centre, force) in at_centres {
        gathered.body(body, &centre, &force);
    }
    for action in &actions.moments {
        let moment = action.moment.map(|entry| entry * factor(action.case));
        let size = gathered
            .unknowns
            .turn(&mut gathered.forces, action.body, &moment);
        gathered.sizes += size;
    }
}

/// The loads of all members, brought to their points and to the stations beside their gaps.
fn on_members(
    model: &Model,
    assembly: &Assembly,
    parts: &Parts,
    combination: &Combination,
    gathered: &mut Gathered,
    loads: &mut Loads,
) -> Result<Vec<Loaded>, Vec<SolveError>> {
    let mut ties = Vec::with_capacity(parts.ties.len());
    let mut errors = Vec::new();
    // The unknowns of stations follow those of points and bodies in the order of the ties.
    let mut station = gathered.unknowns.count;
    for tie in &parts.ties {
        let Some(between) = &model.members[tie.member].between else {
            continue;
        };
        let loaded = match tie.load(model, between, &assembly.down, combination) {
            Ok(loaded) => loaded,
            Err(error) => {
                errors.push(error);
                continue;
            }
        };
        let ends = loaded.on_points(&between.direction);
        gathered.point(between.start, &ends.start);
        gathered.point(between.end, &ends.end);
        gathered.sizes += loaded.sizes();
        for span in 0..tie.spans.len() - 1 {
            let force = loaded.between_spans(tie, span);
            gathered.forces[station] += force;
            gathered.sizes += force.abs();
            for (sum, along) in gathered.applied.iter_mut().zip(&between.direction) {
                *sum += force * *along;
            }
            station += 1;
        }
        for (span, inside) in tie.spans.iter().zip(&loaded.spans) {
            match span.part {
                Part::Elastic(part) => loads.elastic_rest[part] = inside.rest,
                Part::OneWay(part, crate::model::Carries::Tension) => {
                    loads.one_way_rest[part] = inside.rest;
                }
                Part::OneWay(part, crate::model::Carries::Compression) | Part::Gap(part) => {
                    loads.one_way_rest[part] = -inside.rest;
                }
                Part::Within(_) | Part::GapWithin => {}
            }
        }
        ties.push(loaded);
    }
    if errors.is_empty() {
        Ok(ties)
    } else {
        Err(errors)
    }
}

/// Movements of what holds are fixed to, and the clearances of stops. Gives the rests of one-way
/// parts without the clearances, which make no force.
fn on_holds(
    assembly: &Assembly,
    parts: &Parts,
    combination: &Combination,
    loads: &mut Loads,
) -> Vec<Length> {
    let mut unspaced = loads.one_way_rest.clone();
    let mut movements = vec![[Length::default(); 3]; assembly.holds.len()];
    for action in &assembly.actions.movements {
        let factor = combination.factors[action.case];
        for (sum, entry) in movements[action.hold].iter_mut().zip(&action.movement) {
            *sum += *entry * factor;
        }
    }
    for held in &parts.held {
        let hold = &assembly.holds[held.hold];
        let movement = &movements[held.hold];
        for (at, direction) in hold.kind.directions().iter().enumerate() {
            let moved = movement
                .iter()
                .zip(direction)
                .fold(Length::default(), |sum, (entry, along)| {
                    sum + *entry * *along
                });
            let part = held.first + at;
            match hold.kind {
                HoldKind::Fixed { .. } => loads.rigid_value[part] = moved,
                HoldKind::Spring { .. } => loads.elastic_rest[part] = moved,
                HoldKind::Stop { clearance, .. } => {
                    loads.one_way_rest[part] = moved + clearance;
                    unspaced[part] = moved;
                }
            }
        }
    }
    unspaced
}

/// What counts as zero, from the sizes of what comes together in the assembly: its loads, what
/// free changes of length and movements may make of force, and of length.
fn threshold(parts: &Parts, loads: &Loads, unspaced: &[Length], sizes: Force) -> Threshold {
    let forces = [
        (&parts.elastic_restraint, &loads.elastic_rest[..]),
        (&parts.one_way_restraint, unspaced),
        (&parts.rigid_restraint, &loads.rigid_value),
    ];
    let forces = forces
        .into_iter()
        .flat_map(|(restraint, rests)| restraint.iter().zip(rests))
        .fold(sizes, |sum, (&stiffness, rest)| {
            sum + stiffness * rest.abs()
        });
    let lengths = [&loads.elastic_rest, &loads.one_way_rest, &loads.rigid_value]
        .into_iter()
        .flatten()
        .fold(parts.softest * sizes, |sum, rest| sum + rest.abs());
    Threshold::relative_to(forces, lengths)
}
