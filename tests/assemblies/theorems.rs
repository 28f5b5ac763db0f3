//! Theorems that hold of every assembly, on random ones. They need no outside value: they follow
//! from statics, linear elasticity and the convexity of the potential energy.

use super::assembly::{Assembly, Inner, Kind, Vector, cross, dot, minus, scaled};
use super::dense::System;
use super::energy::Energy;
use super::generator;
use super::outcome::Outcome;
use super::turned::{turned, turned_outcome};
use super::twin::in_us_units;
use crate::common::chain::Random;
use crate::common::solved;

/// Assemblies that a theorem is tried on.
const EACH: usize = 150;

/// One after another in two and three coordinates, every third in one.
fn assemblies(seed: u64) -> impl Iterator<Item = (Assembly, Random)> {
    let mut random = Random(seed);
    (0..EACH).map(move |number| {
        let made = generator::assembly(&mut random, 1 + number % 3);
        (made, Random(random.bits()))
    })
}

/// The elastic assembly that remains without what acts one way, and without any action.
fn bare(mut assembly: Assembly) -> Assembly {
    use super::assembly::HoldKind;
    let gap = |kind: &Kind| matches!(kind, Kind::Gap(_));
    assembly
        .members
        .retain(|m| !m.segments.iter().any(|s| gap(&s.kind)));
    assembly
        .holds
        .retain(|h| !matches!(h.kind, HoldKind::Stop { .. }));
    for member in &mut assembly.members {
        member.carries = None;
    }
    scale_actions(&mut assembly, 0.0);
    assembly
}

/// Takes every action this number of times. Clearances and gaps are none.
fn scale_actions(assembly: &mut Assembly, factor: f64) {
    assembly.weight *= factor;
    for (_, force) in &mut assembly.forces {
        *force = scaled(*force, factor);
    }
    for body in &mut assembly.bodies {
        body.force = scaled(body.force, factor);
        body.moment = scaled(body.moment, factor);
    }
    for hold in &mut assembly.holds {
        hold.movement = scaled(hold.movement, factor);
    }
    for member in &mut assembly.members {
        for Inner { force, .. } in &mut member.forces {
            *force *= factor;
        }
        for segment in &mut member.segments {
            segment.misfit *= factor;
            for pair in [
                &mut segment.line,
                &mut segment.line_down,
                &mut segment.warming,
            ] {
                *pair = pair.map(|value| value * factor);
            }
        }
    }
}

/// A force on a point or a moment on a body, and the movement that it does work on.
#[derive(Debug, Clone, Copy)]
enum Pull {
    Point(usize, Vector),
    Body(usize, Vector),
}

impl Pull {
    fn random(random: &mut Random, assembly: &Assembly) -> Self {
        let dim = assembly.coordinates;
        let entry = |random: &mut Random| random.between(-1e4, 1e4);
        let along: Vector = std::array::from_fn(|axis| match axis < dim {
            true => entry(random),
            false => 0.0,
        });
        if dim > 1 && !assembly.bodies.is_empty() && random.chance(0.5) {
            let moment = if dim == 2 {
                [0.0, 0.0, along[0]]
            } else {
                along
            };
            return Pull::Body(random.below(assembly.bodies.len()), moment);
        }
        Pull::Point(random.below(assembly.points.len()), along)
    }

    fn on(self, assembly: &Assembly) -> Assembly {
        let mut loaded = assembly.clone();
        match self {
            Pull::Point(point, force) => loaded.forces.push((point, force)),
            Pull::Body(body, moment) => loaded.bodies[body].moment = moment,
        }
        loaded
    }

    fn work(self, outcome: &Outcome) -> f64 {
        match self {
            Pull::Point(point, force) => {
                let moved = &outcome.displacement[point];
                moved.iter().zip(force).map(|(u, f)| u * f).sum()
            }
            Pull::Body(body, moment) => dot(outcome.rotation[body], moment),
        }
    }
}

/// Maxwell and Betti: what one load does over the movement that another brings is the same with
/// the two exchanged.
#[test]
fn movements_are_reciprocal() {
    let mut compared = 0;
    for (made, mut random) in assemblies(1) {
        let assembly = bare(made);
        let pulls = [0; 2].map(|_| Pull::random(&mut random, &assembly));
        // Some hang on what acts one way alone.
        let [Some(a), Some(b)] = pulls.map(|p| Outcome::try_of(&p.on(&assembly))) else {
            continue;
        };
        let (one, other) = (pulls[1].work(&a), pulls[0].work(&b));
        let scale = pulls[0]
            .work(&a)
            .abs()
            .max(pulls[1].work(&b).abs())
            .max(1e-9);
        assert!(
            (one - other).abs() <= 1e-11 * scale,
            "{one:e} and {other:e} of {scale:e}\n{}",
            pulls[0].on(&assembly).job()
        );
        compared += 1;
    }
    assert!(compared >= 130, "{compared}");
}

/// Clapeyron: the loads do twice the work that members and springs store.
#[test]
fn the_work_of_loads_is_twice_the_energy_stored() {
    use super::assembly::HoldKind;
    let mut compared = 0;
    for (made, mut random) in assemblies(2) {
        let assembly = bare(made);
        let pulls = [0; 3].map(|_| Pull::random(&mut random, &assembly));
        let mut loaded = assembly.clone();
        for body in &mut loaded.bodies {
            body.moment = [0.0; 3];
        }
        // Moments on one body would replace each other: the last one stands.
        let mut acting: Vec<Pull> = Vec::new();
        for pull in pulls {
            if let Pull::Body(body, _) = pull {
                acting.retain(|p| !matches!(p, Pull::Body(b, _) if *b == body));
            }
            loaded = pull.on(&loaded);
            acting.push(pull);
        }
        let Some(found) = Outcome::try_of(&loaded) else {
            continue;
        };
        let work: f64 = acting.iter().map(|p| p.work(&found)).sum();
        let system = System::of(&loaded);
        let members = system.bars.iter().zip(&found.force).map(|(bar, force)| {
            bar.elements.iter().map(|e| e.flexibility).sum::<f64>() * force[0] * force[0]
        });
        let springs = loaded
            .holds
            .iter()
            .zip(&found.reaction)
            .map(|(hold, force)| match hold.kind {
                HoldKind::Spring(k) => force.iter().map(|f| f * f).sum::<f64>() / k,
                _ => 0.0,
            });
        let stored: f64 = members.chain(springs).sum();
        assert!(
            (work - stored).abs() <= 1e-11 * stored,
            "{work:e} and {stored:e}\n{}",
            loaded.job()
        );
        compared += 1;
    }
    assert!(compared >= 130, "{compared}");
}

/// No neighbouring position has less potential energy than the one found, states included.
#[test]
fn the_position_found_has_the_least_energy() {
    let mut compared = 0;
    for (made, mut random) in assemblies(3) {
        let Some(energy) = Energy::of(&made) else {
            continue;
        };
        let Some(found) = Outcome::try_of(&made) else {
            continue;
        };
        let position: Vec<Vector> = found
            .displacement
            .iter()
            .map(|u| std::array::from_fn(|axis| u.get(axis).copied().unwrap_or(0.0)))
            .collect();
        let (least, scale) = energy.at(&position);
        for size in [1e-2, 1e-4] {
            for _ in 0..10 {
                let near = energy.neighbour(&mut random, &position, size);
                let (there, _) = energy.at(&near);
                assert!(
                    there >= least - 1e-13 * scale,
                    "{there:e} is less than {least:e}\n{}",
                    made.job()
                );
                compared += 1;
            }
        }
    }
    assert!(compared >= 1_000, "{compared}");
}

/// An assembly turned as a whole, with all that acts on it, gives the turned results.
#[test]
fn a_turned_assembly_gives_turned_results() {
    let mut compared = 0;
    for (mut made, mut random) in assemblies(4) {
        if made.coordinates == 1 {
            continue;
        }
        // Down is the only direction that does not turn with it.
        made.weight = 0.0;
        for member in &mut made.members {
            member.forces.retain(|inner| !inner.down);
            for segment in &mut member.segments {
                segment.line_down = [0.0; 2];
            }
        }
        let Some(found) = Outcome::try_of(&made) else {
            continue;
        };
        let (other, turn) = turned(&mut random, &made);
        let expected = turned_outcome(&found, turn);
        let there = Outcome::try_of(&other).expect("it was solved before it was turned");
        there.assert_near(&expected, 1e-10, &other.job());
        compared += 1;
    }
    assert!(compared >= 70, "{compared}");
}

/// The same assembly in inches and pounds.
#[test]
fn an_assembly_in_us_units_is_its_si_twin() {
    let mut compared = 0;
    for (made, _) in assemblies(5) {
        let job = made.job();
        let Some(found) = Outcome::try_of(&made) else {
            continue;
        };
        let twin = in_us_units(&job);
        let there = Outcome::of_first(&solved("twin.toml", &twin));
        there.assert_near(&found, 1e-10, &twin);
        compared += 1;
    }
    assert!(compared >= 100, "{compared}");
}

/// Superposition where no state changes: half-way between two multiples of the actions in which the
/// same parts act, the same act, and every number is the mean.
#[test]
fn actions_superpose_while_no_state_changes() {
    let mut compared = 0;
    for (made, mut random) in assemblies(6) {
        let more = random.between(0.7, 1.4);
        let multiple = |factor: f64| {
            let mut scaled = made.clone();
            scale_actions(&mut scaled, factor);
            Outcome::try_of(&scaled)
        };
        let (Some(one), Some(other)) = (multiple(1.0), multiple(more)) else {
            continue;
        };
        if one.states != other.states {
            continue;
        }
        let middle = multiple(f64::midpoint(1.0, more)).expect("solved on both sides of it");
        middle.assert_near(&one.with(&other, f64::midpoint), 1e-10, &made.job());
        compared += 1;
    }
    assert!(compared >= 80, "{compared}");
}

/// A stiff body does not depend on the order of its points, nor on a point far off that nothing is
/// fixed to.
#[test]
fn a_body_is_the_same_from_any_of_its_points() {
    let mut compared = 0;
    for (made, mut random) in assemblies(7) {
        if made.bodies.is_empty() {
            continue;
        }
        let Some(found) = Outcome::try_of(&made) else {
            continue;
        };
        let mut other = made.clone();
        let far = other.points.len();
        for body in &mut other.bodies {
            let turn = random.below(body.points.len());
            body.points.rotate_left(turn);
        }
        let dim = made.coordinates;
        other
            .points
            .push(std::array::from_fn(|axis| match axis < dim {
                true => random.between(-300.0, 300.0),
                false => 0.0,
            }));
        other.bodies[0].points.insert(0, far);
        let mut there = Outcome::try_of(&other).expect("it was solved before");
        there.displacement.pop();
        there.assert_near(&found, 1e-10, &other.job());
        compared += 1;
    }
    assert!(compared >= 60, "{compared}");
}

/// Three bodies of two points each, joined to a triangle, are one body of three points.
#[test]
fn three_links_joined_are_one_body() {
    let mut compared = 0;
    for (made, _) in assemblies(8) {
        let triangle = made.bodies.iter().position(|b| b.points.len() == 3);
        let (Some(index), 2..) = (triangle, made.coordinates) else {
            continue;
        };
        let mut whole = made.clone();
        let body = &mut whole.bodies[index];
        // A triangle of links takes forces at its corners alone.
        let [a, b, c] = [body.points[0], body.points[1], body.points[2]];
        let total = (body.force, body.moment);
        (body.force, body.moment, body.mass) = ([0.0; 3], [0.0; 3], 0.0);
        whole.forces.push((a, total.0));
        let apart = minus(made.points[b], made.points[a]);
        let couple = scaled(cross(total.1, apart), 1.0 / dot(apart, apart));
        whole.forces.push((b, couple));
        whole.forces.push((a, scaled(couple, -1.0)));
        let mut parts = whole.clone();
        let link = |points: [usize; 2]| super::assembly::Body {
            points: points.to_vec(),
            ..super::assembly::Body::default()
        };
        parts.bodies[index] = link([a, b]);
        parts.bodies.extend([link([b, c]), link([c, a])]);
        let Some(mut found) = Outcome::try_of(&whole) else {
            continue;
        };
        let mut there = Outcome::try_of(&parts).expect("it was solved as one body");
        (found.rotation, there.rotation) = (Vec::new(), Vec::new());
        there.assert_near(&found, 1e-10, &parts.job());
        compared += 1;
    }
    assert!(compared >= 15, "{compared}");
}
