//! Bodies that share points pass forces which no result holds; the proof finds whether any close.

use crate::hand::{Hand, Held, Stiff, residuals};
use lengthwise::model::{ForceOnBody, ForceOnPoint, Model};
use lengthwise::quantity::from_si;
use lengthwise::result::{CombinationResult, Residuals};

const X: [f64; 3] = [1.0, 0.0, 0.0];
const Y: [f64; 3] = [0.0, 1.0, 0.0];
const Z: [f64; 3] = [0.0, 0.0, 1.0];
const NONE: [f64; 3] = [0.0; 3];

fn still(points: Vec<usize>, centre: [f64; 3]) -> Stiff {
    Stiff {
        points,
        mass: 0.0,
        centre,
        displacement: NONE,
        rotation: NONE,
    }
}

/// Adds to a reaction of a hold, together with what the result says of its point and of all.
fn add_reaction(result: &mut CombinationResult, hold: usize, axis: usize, newtons: f64) {
    let name = result.holds[hold].point.clone();
    let points = result.points.iter_mut();
    let of_point = points.filter(|point| point.name == name);
    let rows = [
        result.holds[hold].reaction.as_mut(),
        result.totals.as_mut().map(|totals| &mut totals.reactions),
    ];
    let of_points = of_point.map(|point| point.reaction.as_mut());
    for row in rows.into_iter().chain(of_points).flatten() {
        row[axis].value += newtons;
    }
}

/// Each reaction of a hold in turn, changed by one part in a million.
fn reactions_bite((model, result): &(Model, CombinationResult)) {
    let left = residuals(model, result);
    assert!(left.largest() < 1e-12, "{left:?}");
    let mut tried = 0;
    for hold in 0..result.holds.len() {
        for (axis, reaction) in result.holds[hold].reaction.iter().flatten().enumerate() {
            if reaction.value != 0.0 {
                let mut changed = result.clone();
                add_reaction(&mut changed, hold, axis, reaction.value * 1e-6);
                let left = residuals(model, &changed).equilibrium;
                assert!(left > Residuals::LIMIT, "hold {hold} passed with {left:e}");
                tried += 1;
            }
        }
    }
    assert!(tried > 0);
}

/// Links in a row under a pull. Every hinge passes all of it, so that one wrong reaction at an end is
/// far from the others.
fn row_of_links(count: usize, pull: f64) -> (Model, CombinationResult) {
    let mut holds = vec![Held::fixed(0, &[X, Y], [-pull, 0.0, 0.0])];
    holds.extend((1..=count).map(|point| Held::fixed(point, &[Y], NONE)));
    let hand = Hand {
        coordinates: 2,
        down: [0.0, -1.0, 0.0],
        points: (0..=count).map(|i| [i as f64, 0.0, 0.0]).collect(),
        moves: vec![NONE; count + 1],
        bars: Vec::new(),
        bodies: (0..count)
            .map(|i| still(vec![i, i + 1], [i as f64, 0.0, 0.0]))
            .collect(),
        holds,
        applied: [pull, 0.0, 0.0],
    };
    hand.made(|assembly| {
        assembly.actions.forces.push(ForceOnPoint {
            case: 0,
            point: count,
            force: [pull, 0.0, 0.0].map(from_si),
        });
    })
}

#[test]
fn a_long_row_of_links_passes_its_pull_on() {
    for count in [2, 7, 3000] {
        reactions_bite(&row_of_links(count, 12e3));
    }
}

/// Two bodies share two points, so that what each of these passes is not decided; what they pass
/// together is: half of a load at the middle of 4 m.
#[test]
fn two_points_that_the_same_two_bodies_share() {
    let load = 9e3;
    let hand = Hand {
        coordinates: 2,
        down: [0.0, -1.0, 0.0],
        points: vec![NONE, [2.0, 0.0, 0.0], [2.0, 1.0, 0.0], [4.0, 0.0, 0.0]],
        moves: vec![NONE; 4],
        bars: Vec::new(),
        bodies: vec![
            still(vec![0, 1, 2], [1.0, 0.5, 0.0]),
            still(vec![2, 1, 3], [2.0, 0.0, 0.0]),
        ],
        holds: vec![
            Held::fixed(0, &[X, Y], [0.0, 0.5 * load, 0.0]),
            Held::fixed(3, &[Y], [0.0, 0.5 * load, 0.0]),
        ],
        applied: [0.0, -load, 0.0],
    };
    reactions_bite(&hand.made(|assembly| {
        assembly.actions.bodies.push(ForceOnBody {
            case: 0,
            body: 1,
            force: [0.0, -load, 0.0].map(from_si),
        });
    }));
}

/// Three bodies meet at one point of a tripod in three coordinates: each leg carries a part of the
/// load along itself.
#[test]
fn three_bodies_at_one_point() {
    let load = 5e3;
    let feet = [[3.0, 0.0, 0.0], [-3.0, 3.0, 0.0], [-3.0, -3.0, 0.0]];
    let top = [0.0, 0.0, 4.0];
    // Σ s (top − foot) = load upward: s (foot a) = 2 s (foot b) = 2 s (foot c), 4 Σ s = load.
    let shares = [0.5, 0.25, 0.25].map(|share| share * load / 4.0);
    let holds = feet.iter().zip(shares).enumerate();
    let hand = Hand {
        coordinates: 3,
        down: [0.0, 0.0, -1.0],
        points: vec![feet[0], feet[1], feet[2], top],
        moves: vec![NONE; 4],
        bars: Vec::new(),
        bodies: (0..3).map(|leg| still(vec![leg, 3], top)).collect(),
        holds: holds
            .map(|(point, (foot, share))| {
                let reaction = [-foot[0] * share, -foot[1] * share, 4.0 * share];
                Held::fixed(point, &[X, Y, Z], reaction)
            })
            .collect(),
        applied: [0.0, 0.0, -load],
    };
    reactions_bite(&hand.made(|assembly| {
        assembly.actions.forces.push(ForceOnPoint {
            case: 0,
            point: 3,
            force: [0.0, 0.0, -load].map(from_si),
        });
    }));
}

/// Reactions that cancel in force and in moment over all, but turn each of two hinged beams: only what
/// the hinge can pass tells them from sound ones.
#[test]
fn reactions_that_a_hinge_cannot_pass_on() {
    let load = 9e3;
    let hand = Hand {
        coordinates: 2,
        down: [0.0, -1.0, 0.0],
        points: vec![NONE, [2.0, 0.0, 0.0], [4.0, 0.0, 0.0]],
        moves: vec![NONE; 3],
        bars: Vec::new(),
        bodies: vec![
            still(vec![0, 1], [1.0, 0.0, 0.0]),
            still(vec![1, 2], [3.0, 0.0, 0.0]),
        ],
        holds: vec![
            Held::fixed(0, &[X, Y], [0.0, 0.5 * load, 0.0]),
            Held::fixed(1, &[Y], [0.0, 0.5 * load, 0.0]),
            Held::fixed(2, &[Y], NONE),
        ],
        applied: [0.0, -load, 0.0],
    };
    let (model, result) = hand.made(|assembly| {
        assembly.actions.bodies.push(ForceOnBody {
            case: 0,
            body: 0,
            force: [0.0, -load, 0.0].map(from_si),
        });
    });
    assert!(residuals(&model, &result).largest() < 1e-12);
    let mut turned = result;
    let off = 1e-6 * load;
    for (hold, newtons) in [(0, off), (1, -2.0 * off), (2, off)] {
        add_reaction(&mut turned, hold, 1, newtons);
    }
    let left = residuals(&model, &turned).equilibrium;
    assert!(left > Residuals::LIMIT, "passed with {left:e}");
}
