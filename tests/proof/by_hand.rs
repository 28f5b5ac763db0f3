//! Assemblies small enough to be written down: they prove themselves, and no corruption of them does.
//! The numbers follow from statics and `N L / EA`, as the comments beside them say.

use crate::corruptions::{CORRUPTIONS, turned};
use crate::hand::{Bar, Hand, Held, Stiff, residuals};
use lengthwise::model::{
    Carries, ForceOnBody, ForceOnPoint, HoldKind, Model, MomentOnBody, MovementOfHold, WeightOfBody,
};
use lengthwise::quantity::{STANDARD_GRAVITY, from_si};
use lengthwise::result::{CombinationResult, Residuals};

const X: [f64; 3] = [1.0, 0.0, 0.0];
const Y: [f64; 3] = [0.0, 1.0, 0.0];
const Z: [f64; 3] = [0.0, 0.0, 1.0];
const NONE: [f64; 3] = [0.0; 3];
const DOWN_2: [f64; 3] = [0.0, -1.0, 0.0];
const DOWN_3: [f64; 3] = [0.0, 0.0, -1.0];
/// E of the material of all these members.
const E: f64 = 200e9;

/// The result closes; every number off by one part in a million, and every state turned over, does
/// not. `tried` names corruptions that must have been possible.
fn bites((model, result): &(Model, CombinationResult), tried: &[&str]) {
    let left = residuals(model, result);
    assert!(left.largest() < 1e-11, "{left:?}: {result:#?}");
    let mut done = Vec::new();
    for (what, corrupt) in CORRUPTIONS {
        let mut corrupted = result.clone();
        if corrupt(&mut corrupted) {
            let left = residuals(model, &corrupted).largest();
            assert!(left > Residuals::LIMIT, "{what} passed with {left:e}");
            done.push(what.to_owned());
        }
    }
    for (what, turned) in turned(result) {
        let left = residuals(model, &turned).largest();
        assert!(left > Residuals::LIMIT, "{what} passed with {left:e}");
        done.push(what);
    }
    for what in tried {
        assert!(done.iter().any(|done| done == what), "{what}: not tried");
    }
}

fn force_on(point: usize, force: [f64; 3]) -> ForceOnPoint {
    ForceOnPoint {
        case: 0,
        point,
        force: force.map(from_si),
    }
}

/// Two ties of 5 m and 5 cm² from (∓3 m, 4 m) to the origin, of which each weighs w L and gives half
/// of it to its ends: N = (P + w L) / 1.6.
fn two_ties(carries: Option<Carries>, load: f64) -> (Hand, f64) {
    let area = 5e-4;
    let weight = 7850.0 * STANDARD_GRAVITY * area * 5.0;
    let n = (load + weight) / 1.6;
    let stretch = n * 5.0 / (E * area);
    let make_up = "{ length = \"5 m\", section = { area = \"5 cm2\" }, material = \"m\" }";
    let tie = |top: usize| Bar {
        carries,
        weighs: true,
        ..Bar::of((top, 2), make_up)
    };
    let top = |point: usize, side: f64| {
        let reaction = [side * 0.6 * n, 0.8 * n + 0.5 * weight, 0.0];
        Held::fixed(point, &[X, Y], reaction)
    };
    let hand = Hand {
        coordinates: 2,
        down: DOWN_2,
        points: vec![[-3.0, 4.0, 0.0], [3.0, 4.0, 0.0], NONE],
        moves: vec![NONE, NONE, [0.0, -stretch / 0.8, 0.0]],
        bars: vec![tie(0), tie(1)],
        bodies: Vec::new(),
        holds: vec![top(0, -1.0), top(1, 1.0)],
        applied: [0.0, -load - 2.0 * weight, 0.0],
    };
    (hand, n)
}

#[test]
fn two_inclined_ties_under_load_and_weight() {
    for carries in [None, Some(Carries::Tension)] {
        let (hand, _) = two_ties(carries, 40e3);
        let made = hand.made(|assembly| {
            assembly.actions.forces.push(force_on(2, [0.0, -40e3, 0.0]));
        });
        let slack = carries.map_or("reaction of a hold", |_| "b0 to Slack");
        bites(
            &made,
            &[
                slack,
                "b0 to Bearing",
                "movement of a point",
                "force in a member",
            ],
        );
    }
}

/// A tie of two thicknesses hangs slack below: its weight goes to its ends by the lever rule, and its
/// distance from being taut counts the stretch that this weight would give it.
#[test]
fn a_slack_tie_below_two_inclined_ones() {
    let (w1, w2) = (10.0 * STANDARD_GRAVITY, 2.0 * STANDARD_GRAVITY);
    let (above, below) = (0.75 * w1 + 0.25 * w2, 0.25 * w1 + 0.75 * w2);
    let load = 40e3;
    let (mut hand, _) = two_ties(None, load + above);
    hand.points.push([0.0, -2.0, 0.0]);
    hand.moves.push(NONE);
    // N falls by each weight; the force at the middle of a uniform length gives its stretch.
    let (a1, a2) = (1e-4, 3e-4);
    let by_weight = (above - 0.5 * w1) / (E * a1) + (above - w1 - 0.5 * w2) / (E * a2);
    let (warm, misfit) = (2.0 * 12e-6 * 15.0, 1e-3);
    hand.bars.push(Bar {
        carries: Some(Carries::Tension),
        slack_by: Some(warm + misfit + by_weight - hand.moves[2][1]),
        weighs: true,
        loads: "{ temperature-change = \"+15 K\" }, { misfit = \"1 mm\" }".into(),
        ..Bar::of(
            (2, 3),
            "{ length = \"1 m\", section = { area = \"1 cm2\" }, material = \"m\", mass = \"10 kg/m\" },
             { length = \"1 m\", section = { area = \"3 cm2\" }, material = \"m\", mass = \"2 kg/m\" }",
        )
    });
    // Apart: the foot stands still and the top sinks by −u, so that n·(u_b − u_a) = u < 0.
    hand.holds.push(Held::fixed(3, &[X, Y], [0.0, below, 0.0]));
    hand.applied[1] -= below;
    let made = hand.made(|assembly| {
        assembly.actions.forces.push(force_on(2, [0.0, -load, 0.0]));
    });
    bites(
        &made,
        &[
            "b2 to Taut",
            "distance from being taut",
            "elongation from misfit",
        ],
    );
}

/// A triangular platform in three coordinates on hangers of 3 m: statics gives N = W (0.45, 0.3,
/// 0.25), and a force along x at the centre turns into reactions of its guides.
#[test]
fn a_platform_on_three_hangers() {
    let (mass, side) = (1200.0, 800.0);
    let weight = mass * STANDARD_GRAVITY;
    let areas = [1e-4, 2e-4, 3e-4];
    let forces = [0.45 * weight, 0.3 * weight, 0.25 * weight];
    let warm = [0.0, 3.0 * 12e-6 * 20.0, 0.0];
    let sinks: [f64; 3] = std::array::from_fn(|i| forces[i] * 3.0 / (E * areas[i]) + warm[i]);
    let corner = [NONE, [2.0, 0.0, 0.0], [0.0, 2.0, 0.0]];
    let top = corner.map(|[x, y, _]| [x, y, 3.0]);
    let sections = [
        "{ length = \"3 m\", section = { area = \"1 cm2\" }, material = \"m\" }",
        "{ length = \"3 m\", section = { area = \"2 cm2\" }, material = \"m\" }",
        "{ length = \"3 m\", section = { area = \"3 cm2\" }, material = \"m\" }",
    ];
    let mut bars: Vec<Bar> = (0..3).map(|i| Bar::of((i, 3 + i), sections[i])).collect();
    bars[1].loads = "{ temperature-change = \"+20 K\" }".into();
    let mut holds: Vec<Held> = (0..3)
        .map(|i| Held::fixed(i, &[X, Y, Z], [0.0, 0.0, forces[i]]))
        .collect();
    // Moment about a: −0.5 m × F from the force, 2 m × R from the guide at b.
    let turning = 0.25 * side;
    holds.push(Held::fixed(3, &[X, Y], [-side, -turning, 0.0]));
    holds.push(Held::fixed(4, &[Y], [0.0, turning, 0.0]));
    let hand = Hand {
        coordinates: 3,
        down: DOWN_3,
        points: [top, corner].concat(),
        moves: [[NONE; 3], sinks.map(|sink| [0.0, 0.0, -sink])].concat(),
        bars,
        bodies: vec![Stiff {
            points: vec![3, 4, 5],
            mass,
            centre: [0.6, 0.5, 0.0],
            displacement: [0.0, 0.0, -sinks[0]],
            rotation: [
                (sinks[0] - sinks[2]) / 2.0,
                (sinks[1] - sinks[0]) / 2.0,
                0.0,
            ],
        }],
        holds,
        applied: [side, 0.0, -weight],
    };
    let made = hand.made(|assembly| {
        let actions = &mut assembly.actions;
        actions.weights.push(WeightOfBody {
            case: 0,
            body: 0,
            number: 1.0,
        });
        actions.bodies.push(ForceOnBody {
            case: 0,
            body: 0,
            force: [side, 0.0, 0.0].map(from_si),
        });
    });
    bites(
        &made,
        &[
            "rotation of a body",
            "movement of a body",
            "reaction of a hold",
            "elongation from temperature",
        ],
    );
}

/// Two bars in one coordinate: the first foot moves, a spring holds between them, and a stop ends the
/// movement of the second, another stop behind it opens.
#[test]
fn a_spring_and_two_stops_in_one_coordinate() {
    let (k1, k2, spring) = (E * 2e-4 / 2.0, E * 3e-4 / 3.0, 5e6);
    let (moved, clearance, back, load) = (0.2e-3, 1.5e-3, 1e-3, 60e3);
    let u = (k2 * clearance + k1 * moved) / (k1 + k2 + spring);
    let (first, second) = (k1 * (u - moved), k2 * (clearance - u));
    let stop = |blocks: [f64; 3], clearance: f64, reaction: f64, gap: f64| Held {
        points: vec![2],
        kind: HoldKind::Stop {
            blocks,
            clearance: from_si(clearance),
            stiffness: None,
        },
        reactions: vec![[reaction, 0.0, 0.0]],
        gap: Some(gap),
    };
    let push = load - second;
    assert!(push > 0.0);
    let hand = Hand {
        coordinates: 1,
        down: NONE,
        points: vec![NONE, [2.0, 0.0, 0.0], [5.0, 0.0, 0.0]],
        moves: vec![[moved, 0.0, 0.0], [u, 0.0, 0.0], [clearance, 0.0, 0.0]],
        bars: vec![
            Bar::of(
                (0, 1),
                "{ length = \"2 m\", section = { area = \"2 cm2\" }, material = \"m\" }",
            ),
            Bar::of(
                (2, 1),
                "{ length = \"3 m\", section = { area = \"3 cm2\" }, material = \"m\" }",
            ),
        ],
        bodies: Vec::new(),
        holds: vec![
            Held::fixed(0, &[X], [-first, 0.0, 0.0]),
            Held {
                points: vec![1],
                kind: HoldKind::Spring {
                    along: vec![X],
                    stiffness: from_si(spring),
                },
                reactions: vec![[-spring * u, 0.0, 0.0]],
                gap: None,
            },
            stop(X, clearance, -push, 0.0),
            stop([-1.0, 0.0, 0.0], back, 0.0, back + clearance),
        ],
        applied: [load, 0.0, 0.0],
    };
    let made = hand.made(|assembly| {
        assembly.actions.forces.push(force_on(2, [load, 0.0, 0.0]));
        assembly.actions.movements.push(MovementOfHold {
            case: 0,
            hold: 0,
            movement: [moved, 0.0, 0.0].map(from_si),
        });
    });
    bites(
        &made,
        &[
            "hold hold.3",
            "hold hold.4",
            "gap of a hold",
            "reaction of a hold",
        ],
    );
}

/// A strut beside one whose joint of 0.5 mm is still open, and then closed: −u = (F + k2 g) / (k1 + k2).
#[test]
fn a_joint_inside_a_member() {
    let (k1, k2, joint) = (E * 2e-4 / 2.0, E * 4e-4 / 1.9995, 0.5e-3);
    for (load, closed) in [(8e3, false), (40e3, true)] {
        let u = if closed {
            -(load + k2 * joint) / (k1 + k2)
        } else {
            -load / k1
        };
        assert_eq!(u < -joint, closed);
        let hand = Hand {
            coordinates: 1,
            down: NONE,
            points: vec![NONE, [2.0, 0.0, 0.0]],
            moves: vec![NONE, [u, 0.0, 0.0]],
            bars: vec![
                Bar::of(
                    (0, 1),
                    "{ length = \"2 m\", section = { area = \"2 cm2\" }, material = \"m\" }",
                ),
                Bar::of(
                    (0, 1),
                    "{ gap = \"0.5 mm\" }, { length = \"1.9995 m\", section = { area = \"4 cm2\" }, material = \"m\" }",
                ),
            ],
            bodies: Vec::new(),
            holds: vec![Held::fixed(0, &[X], [load, 0.0, 0.0])],
            applied: [-load, 0.0, 0.0],
        };
        let made = hand.made(|assembly| {
            assembly.actions.forces.push(force_on(1, [-load, 0.0, 0.0]));
        });
        bites(&made, &["gap b1.1", "elongation"]);
    }
}

/// Two beams of 2 m with a hinge between them that hangs on a rod: half of P at the middle of the
/// first goes to the rod, and a moment on the second is carried by its far end and the rod.
#[test]
fn a_hinge_between_two_bodies() {
    let (load, turning) = (30e3, 8e3);
    // The second beam rests on the hinge with M / 2 and is held down at its end with the same.
    let n = 0.5 * load + 0.5 * turning;
    let sink = n * 3.0 / (E * 5e-4);
    let beam = |points: Vec<usize>, centre: f64, at: f64, rotation: f64| Stiff {
        points,
        mass: 0.0,
        centre: [centre, 0.0, 0.0],
        displacement: [0.0, at, 0.0],
        rotation: [0.0, 0.0, rotation],
    };
    let hand = Hand {
        coordinates: 2,
        down: DOWN_2,
        points: vec![NONE, [2.0, 0.0, 0.0], [4.0, 0.0, 0.0], [2.0, 3.0, 0.0]],
        moves: vec![NONE, [0.0, -sink, 0.0], NONE, NONE],
        bars: vec![Bar::of(
            (3, 1),
            "{ length = \"3 m\", section = { area = \"5 cm2\" }, material = \"m\" }",
        )],
        bodies: vec![
            beam(vec![0, 1], 1.0, 0.0, -sink / 2.0),
            beam(vec![1, 2], 3.0, -sink, sink / 2.0),
        ],
        holds: vec![
            Held::fixed(0, &[X, Y], [0.0, 0.5 * load, 0.0]),
            Held::fixed(2, &[Y], [0.0, -0.5 * turning, 0.0]),
            Held::fixed(3, &[X, Y], [0.0, n, 0.0]),
        ],
        applied: [0.0, -load, 0.0],
    };
    let made = hand.made(|assembly| {
        assembly.actions.bodies.push(ForceOnBody {
            case: 0,
            body: 0,
            force: [0.0, -load, 0.0].map(from_si),
        });
        assembly.actions.moments.push(MomentOnBody {
            case: 0,
            body: 1,
            moment: [0.0, 0.0, turning].map(from_si),
        });
    });
    bites(
        &made,
        &[
            "rotation of a body",
            "reaction of a hold",
            "force in a member",
        ],
    );
}
