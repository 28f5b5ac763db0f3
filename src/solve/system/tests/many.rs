//! Thousands of one-way parts in one system.

use super::certificate::proves;
use super::draw::Draw;
use super::{Sketch, exactly};
use crate::solve::system::{Answer, Prepared, Row};

/// How far the floor goes up at (x, y): its own rise and two turns over its first unknown.
fn rise(first: usize, x: f64, y: f64, sign: f64) -> Row {
    vec![(first, sign), (first + 1, sign * y), (first + 2, -sign * x)]
}

/// Stiff floors below each other, each hung on the one above by `across` times `across` hangers that
/// only pull and are not all of the same length. What pushes from the side turns each floor further
/// than its weight alone could bear.
fn tower(floors: usize, across: usize, side: f64) -> Sketch {
    let mut draw = Draw(11);
    let mut sketch = Sketch::of(3 * floors);
    for floor in 0..floors {
        for unknown in 0..3 {
            sketch.system.places[3 * floor + unknown] = [0.0, 0.0, -(floor as f64)];
        }
        for hanger in 0..across * across {
            let along = |place: usize| 2.0 * place as f64 / (across - 1) as f64 - 1.0;
            let (x, y) = (along(hanger % across), along(hanger / across));
            let mut row = rise(3 * floor, x, y, -1.0);
            if floor > 0 {
                row.extend(rise(3 * floor - 3, x, y, 1.0));
                row.sort_unstable_by_key(|entry| entry.0);
            }
            let rest = 0.01 * (floors - floor) as f64 * draw.share();
            sketch = sketch.one_way(row, Some(500.0 + 100.0 * draw.share()), rest);
        }
        let hangers = (across * across) as f64;
        sketch = sketch.force(3 * floor, -hangers * (0.5 + draw.share()));
        for turn in 1..3 {
            sketch = sketch.force(3 * floor + turn, side * hangers * (draw.share() - 0.2));
        }
    }
    sketch.ready()
}

/// A stiff plate on posts that only bear, its load near one edge; without stiffness the posts are
/// rigid, of heights that differ.
fn plate(across: usize, stiffness: Option<f64>) -> Sketch {
    let mut draw = Draw(5);
    let mut sketch = Sketch::of(3).force(0, -1000.0).force(1, -500.0);
    for post in 0..across * across {
        let along = |place: usize| 2.0 * place as f64 / (across - 1) as f64 - 1.0;
        let (x, y) = (along(post % across), along(post / across));
        sketch = sketch.one_way(rise(0, x, y, -1.0), stiffness, 0.1 * draw.share());
    }
    sketch.ready()
}

fn solved(sketch: &Sketch) -> Answer {
    let answer = Prepared::of(sketch.system.clone())
        .solve(&sketch.loads)
        .unwrap();
    proves(sketch, &answer).unwrap();
    answer
}

fn open(answer: &Answer) -> usize {
    answer.acts.iter().filter(|acts| !**acts).count()
}

#[test]
fn three_thousand_hangers_of_a_tower_find_their_states() {
    let answer = solved(&tower(30, 10, 1.0));
    assert_eq!(answer.acts.len(), 3000);
    let slack = open(&answer);
    assert!((300..2000).contains(&slack), "{slack} slack");
    assert!(answer.free.is_empty());
}

#[test]
fn a_thousand_posts_under_a_plate_find_their_states() {
    let answer = solved(&plate(32, Some(20.0)));
    assert_eq!(answer.acts.len(), 1024);
    let slack = open(&answer);
    assert!((300..1000).contains(&slack), "{slack} open");
}

/// A plate stands on three points.
#[test]
fn a_plate_on_a_thousand_rigid_posts_stands_on_three() {
    let answer = solved(&plate(32, None));
    assert_eq!(answer.acts.len() - open(&answer), 3);
}

/// The exact method finds the same states from the parts in question.
#[test]
fn a_tower_stands_alike_by_both_ways() {
    let sketch = tower(5, 8, 1.0);
    let answer = exactly(&sketch).unwrap();
    proves(&sketch, &answer).unwrap();
    assert!(open(&answer) > 30);
    assert_eq!(answer.acts, solved(&sketch).acts);
}
