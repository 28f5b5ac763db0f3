//! What is nothing but rounding is not held against a result: a structure that settles or warms
//! without force has forces in it that are only what large terms leave of each other.

use crate::hand::{Bar, Hand, Held, residuals};
use lengthwise::model::MovementOfHold;
use lengthwise::quantity::from_si;

const NONE: [f64; 3] = [0.0; 3];
const X: [f64; 3] = [1.0, 0.0, 0.0];
const Y: [f64; 3] = [0.0, 1.0, 0.0];

fn two_ties(loads: &str, moves: [[f64; 3]; 3]) -> Hand {
    let make_up = "{ length = \"5 m\", section = { area = \"5 cm2\" }, material = \"m\" }";
    let tie = |top: usize| Bar {
        loads: loads.into(),
        ..Bar::of((top, 2), make_up)
    };
    Hand {
        coordinates: 2,
        down: [0.0, -1.0, 0.0],
        points: vec![[-3.0, 4.0, 0.0], [3.0, 4.0, 0.0], NONE],
        moves: moves.to_vec(),
        bars: vec![tie(0), tie(1)],
        bodies: Vec::new(),
        holds: vec![Held::fixed(0, &[X, Y], NONE), Held::fixed(1, &[X, Y], NONE)],
        applied: NONE,
    }
}

#[test]
fn a_frame_that_settles_as_one() {
    // Not the same double at every point, as when each is solved for by itself.
    let settled = [0.003_7, -0.012_3, 0.0];
    let nearly = settled.map(|by: f64| by * (1.0 + f64::EPSILON));
    let (model, result) = two_ties("", [settled, settled, nearly]).made(|assembly| {
        for hold in 0..2 {
            assembly.actions.movements.push(MovementOfHold {
                case: 0,
                hold,
                movement: settled.map(from_si),
            });
        }
    });
    let forces = result.members.iter().map(|m| m.force_max.value.abs());
    assert!(forces.fold(0.0, f64::max) > 0.0, "no rounding to look at");
    let left = residuals(&model, &result);
    assert!(left.largest() < 1e-10, "{left:?}");
}

#[test]
fn a_frame_that_warms_and_is_free_to() {
    // Both grow by α ΔT L, which the foot follows as the tie's growth over its rise.
    let growth = 12e-6 * 31.0 * 5.0;
    let sink = [0.0, -growth / 0.8, 0.0];
    let loads = "{ temperature-change = \"+31 K\" }";
    let (model, result) = two_ties(loads, [NONE, NONE, sink]).made(|_| {});
    let left = residuals(&model, &result);
    assert!(left.largest() < 1e-10, "{left:?}");
    assert!(result.members[0].elongation_temperature.value > 0.0);
}

#[test]
fn a_frame_of_which_nothing_is_asked() {
    let (model, result) = two_ties("", [NONE; 3]).made(|_| {});
    assert_eq!(residuals(&model, &result).largest(), 0.0);
}

#[test]
fn a_result_that_lacks_a_part_is_not_proven() {
    let (model, result) = two_ties("", [NONE; 3]).made(|_| {});
    let mut lacks = result.clone();
    lacks.holds.pop();
    assert!(!residuals(&model, &lacks).prove());
    let mut lacks = result.clone();
    lacks.points[1].displacement.pop();
    assert!(!residuals(&model, &lacks).prove());
    let mut lacks = result;
    lacks.totals = None;
    assert!(!residuals(&model, &lacks).prove());
}
