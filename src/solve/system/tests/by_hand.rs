//! Small systems whose answers are seen at sight; the values are found by hand.

use super::Sketch;
use crate::solve::system::{Failure, Prepared};
use approx::assert_relative_eq;

/// Two stops of one face share a force in a way that nothing decides: half each.
#[test]
fn two_stops_of_one_face_share() {
    let sketch = Sketch::of(1)
        .force(0, 6.0)
        .one_way(vec![(0, 1.0)], None, 0.5)
        .one_way(vec![(0, 1.0)], None, 0.5)
        .ready();
    let answer = Prepared::of(sketch.system).solve(&sketch.loads).unwrap();
    assert_relative_eq!(answer.displacements[0].value, 0.5);
    assert_relative_eq!(answer.one_way[0].value, 3.0);
    assert_relative_eq!(answer.one_way[1].value, 3.0);
    assert_eq!(answer.undecided_one_way, [0, 1]);
}

/// Of two stops back to back only the one that is needed bears.
#[test]
fn of_two_stops_back_to_back_one_bears() {
    for force in [6.0, -6.0] {
        let sketch = Sketch::of(1)
            .force(0, force)
            .one_way(vec![(0, 1.0)], None, 0.0)
            .one_way(vec![(0, -1.0)], None, 0.0)
            .ready();
        let answer = Prepared::of(sketch.system).solve(&sketch.loads).unwrap();
        assert_eq!(answer.acts, [force > 0.0, force < 0.0]);
        assert!(answer.undecided_one_way.is_empty());
    }
}

/// Without a load a body between two touching stops stays, and no motion is free.
#[test]
fn what_touches_on_both_sides_is_not_free() {
    let sketch = Sketch::of(1)
        .one_way(vec![(0, 1.0)], None, 0.0)
        .one_way(vec![(0, -1.0)], None, 0.0)
        .ready();
    let answer = Prepared::of(sketch.system).solve(&sketch.loads).unwrap();
    assert_eq!(answer.acts, [false, false]);
    assert!(answer.free.is_empty());
}

/// A rod between two stops with clearance is put where it moves least; pushed, it finds its stop.
#[test]
fn a_loose_part_moves_no_more_than_it_must() {
    let sketch = |force: f64| {
        Sketch::of(1)
            .force(0, force)
            .one_way(vec![(0, -1.0)], None, -0.25)
            .one_way(vec![(0, 1.0)], None, 1.0)
            .ready()
    };
    let loose = sketch(0.0);
    let mut prepared = Prepared::of(loose.system);
    let answer = prepared.solve(&loose.loads).unwrap();
    assert_relative_eq!(answer.displacements[0].value, 0.25);
    assert_eq!(answer.free[0].touching, [0]);
    let answer = prepared.solve(&sketch(2.0).loads).unwrap();
    assert_relative_eq!(answer.displacements[0].value, 1.0);
    assert_eq!(answer.acts, [false, true]);
}

/// A platform of a square on four hangers with one lost and its weight on the line through two
/// others: the fourth is on the point of going slack, and no noise decides.
#[test]
fn a_platform_on_the_point_of_tipping_stands() {
    // Unknowns: lift of the centre, and of the corners by the two rotations times half the side.
    let corner = |x: f64, y: f64| vec![(0, -1.0), (1, -x), (2, -y)];
    let sketch = Sketch::of(3)
        .force(0, -30.0)
        .one_way(corner(1.0, 1.0), Some(7.0), 0.0)
        .one_way(corner(-1.0, -1.0), Some(7.0), 0.0)
        .one_way(corner(1.0, -1.0), Some(7.0), 0.0)
        .ready();
    let answer = Prepared::of(sketch.system).solve(&sketch.loads).unwrap();
    assert_eq!(answer.acts, [true, true, false]);
    assert_relative_eq!(answer.one_way[0].value, 15.0, max_relative = 1e-14);
    assert_eq!(answer.free.len(), 1);
    assert_eq!(answer.free[0].touching, [2]);
}

/// Its weight off the line: it tips.
#[test]
fn a_platform_that_tips_is_pushed() {
    let corner = |x: f64, y: f64| vec![(0, -1.0), (1, -x), (2, -y)];
    let sketch = Sketch::of(3)
        .force(0, -30.0)
        .force(1, 3.0)
        .one_way(corner(1.0, 1.0), Some(7.0), 0.0)
        .one_way(corner(-1.0, -1.0), Some(7.0), 0.0)
        .one_way(corner(1.0, -1.0), Some(7.0), 0.0)
        .ready();
    let failure = Prepared::of(sketch.system)
        .solve(&sketch.loads)
        .unwrap_err();
    let Failure::Pushed { motion, force } = failure else {
        panic!("{failure:?}");
    };
    // Corners (1, 1) and (−1, −1) stay, corner (1, −1) lifts: rotations alike and opposite.
    assert_eq!(motion.len(), 2);
    assert_relative_eq!(motion[0].1, 1.0, max_relative = 1e-12);
    assert_relative_eq!(motion[1].1, -1.0, max_relative = 1e-12);
    assert_relative_eq!(force.value, 3.0, max_relative = 1e-12);
}

/// Three rigid holds on one line through one body: the middle one cannot be told from the others.
#[test]
fn three_holds_in_a_line_leave_their_forces_undecided() {
    let at = |x: f64| vec![(0, 1.0), (1, x)];
    let sketch = Sketch::of(3)
        .force(0, 9.0)
        .force(2, 4.0)
        .rigid(at(-1.0), 0.0)
        .rigid(at(0.0), 0.0)
        .rigid(at(1.0), 0.0)
        .rigid(vec![(2, 1.0)], 0.0)
        .ready();
    let answer = Prepared::of(sketch.system).solve(&sketch.loads).unwrap();
    assert_eq!(answer.undecided_rigid, [0, 1, 2]);
    for force in &answer.rigid[..3] {
        assert_relative_eq!(force.value, 3.0, max_relative = 1e-12);
    }
    assert_relative_eq!(answer.rigid[3].value, 4.0);
}

/// The same with one moved: the three, and no other, contradict.
#[test]
fn contradictory_movements_are_named() {
    let at = |x: f64| vec![(0, 1.0), (1, x)];
    let sketch = Sketch::of(3)
        .rigid(vec![(2, 1.0)], 0.5)
        .rigid(at(-1.0), 0.0)
        .rigid(at(0.0), 0.001)
        .rigid(at(1.0), 0.0)
        .ready();
    let failure = Prepared::of(sketch.system)
        .solve(&sketch.loads)
        .unwrap_err();
    let expected = Failure::Contradiction {
        rigid: vec![1, 2, 3],
        one_way: Vec::new(),
    };
    assert_eq!(failure, expected);
}
