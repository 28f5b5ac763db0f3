//! Far apart stiffness, many one-way parts, many unknowns.

use super::Sketch;
use super::certificate::proves;
use super::draw::Draw;
use crate::solve::system::{Answer, Prepared};
use approx::assert_relative_eq;

/// Two springs side by side share a force in the ratio of their stiffness, at the end of a chain
/// whose other links are 10⁹ times softer and stiffer.
#[test]
fn stiffness_far_apart_leaves_forces_right_to_rounding() {
    let link = |from: usize| vec![(from, -1.0), (from + 1, 1.0)];
    let stiffness = [1.0, 1e9, 3.0, 7e8, 1.0, 1e9];
    let mut sketch = Sketch::of(8).rigid(vec![(0, 1.0)], 0.0).force(7, 10.0);
    for (from, &k) in stiffness.iter().enumerate() {
        sketch = sketch.elastic(link(from), k, 0.0);
    }
    let sketch = sketch
        .elastic(link(6), 1.0, 0.0)
        .elastic(link(6), 1e9, 0.0)
        .ready();
    let answer = Prepared::of(sketch.system).solve(&sketch.loads).unwrap();
    for force in &answer.elastic[..6] {
        assert_relative_eq!(force.value, 10.0, max_relative = 4e-16);
    }
    assert_relative_eq!(
        answer.elastic[6].value,
        10.0 / (1.0 + 1e9),
        max_relative = 4e-16
    );
    assert_relative_eq!(
        answer.elastic[7].value,
        10.0 * 1e9 / (1.0 + 1e9),
        max_relative = 4e-16
    );
    assert_relative_eq!(answer.rigid[0].value, 10.0, max_relative = 4e-16);
    assert!(answer.free.is_empty());
    assert!(
        answer.condition < 1e3,
        "no mechanism is near: {}",
        answer.condition
    );
}

/// What is out of balance of an answer on each unknown, over the sum of the sizes there: largest.
fn unbalanced(sketch: &Sketch, answer: &Answer) -> f64 {
    let system = &sketch.system;
    let mut left: Vec<f64> = sketch.loads.forces.iter().map(|f| f.value).collect();
    let mut size: Vec<f64> = left.iter().map(|f| f.abs()).collect();
    let elastic = system
        .elastic
        .iter()
        .map(|part| &part.row)
        .zip(&answer.elastic);
    let rigid = system.rigid.iter().zip(&answer.rigid);
    let one_way = system
        .one_way
        .iter()
        .map(|part| &part.row)
        .zip(&answer.one_way);
    for (row, force) in elastic.chain(rigid).chain(one_way) {
        for &(u, b) in row {
            left[u] -= b * force.value;
            size[u] += (b * force.value).abs();
        }
    }
    let each = left.iter().zip(&size).filter(|(_, size)| **size > 0.0);
    each.map(|(left, size)| left.abs() / size)
        .fold(0.0, f64::max)
}

/// Random nets in space with stiffness from 1 to 10⁹: the residuals are rounding.
#[test]
fn nets_of_far_apart_stiffness_balance_to_rounding() {
    for seed in 0..200 {
        let mut draw = Draw(seed);
        let points = 6;
        let mut sketch = Sketch::of(3 * points);
        let place: Vec<[f64; 3]> = (0..points)
            .map(|_| [draw.share(), draw.share(), draw.share()])
            .collect();
        for a in 0..points {
            for b in a + 1..points {
                let along: Vec<f64> = (0..3).map(|side| place[b][side] - place[a][side]).collect();
                let length = along.iter().map(|x| x * x).sum::<f64>().sqrt();
                let row = (0..3)
                    .flat_map(|side| {
                        let n = along[side] / length;
                        [(3 * a + side, -n), (3 * b + side, n)]
                    })
                    .collect();
                sketch = sketch.elastic(row, 10.0_f64.powf(9.0 * draw.share()), 0.0);
            }
        }
        for unknown in [0, 1, 2, 3, 4, 8] {
            sketch = sketch.rigid(vec![(unknown, 1.0)], 0.0);
        }
        for unknown in 9..3 * points {
            let force = draw.whole(9);
            sketch = sketch.force(unknown, force);
        }
        let sketch = sketch.ready();
        let answer = Prepared::of(sketch.system.clone())
            .solve(&sketch.loads)
            .unwrap();
        let left = unbalanced(&sketch, &answer);
        assert!(left < 1e-14, "seed {seed}: {left}");
    }
}

/// A string of springs over a thousand supports that bear one way, half of them rigid.
fn string_over_supports(supports: usize, points: usize) -> Sketch {
    let mut draw = Draw(7);
    let mut sketch = Sketch::of(points);
    for point in 1..points {
        sketch = sketch.elastic(vec![(point - 1, -1.0), (point, 1.0)], 50.0, 0.0);
    }
    sketch = sketch.rigid(vec![(0, 1.0)], 0.0);
    for support in 0..supports {
        let point = 1 + support * (points - 1) / supports;
        let stiffness = (support % 2 == 0).then_some(20.0);
        sketch = sketch.one_way(vec![(point, -1.0)], stiffness, draw.share());
    }
    for point in 0..points {
        let force = draw.whole(9) - 1.0;
        sketch = sketch.force(point, force);
    }
    sketch.ready()
}

#[test]
fn a_thousand_one_way_parts_find_their_states() {
    for points in [60, 700] {
        let sketch = string_over_supports(1000, points);
        let answer = Prepared::of(sketch.system.clone())
            .solve(&sketch.loads)
            .unwrap();
        proves(&sketch, &answer).unwrap();
        let acting = answer.acts.iter().filter(|acts| **acts).count();
        assert!(acting > 20 && acting < 980, "{acting} of 1000 act");
    }
}

/// A lattice of `side` by `side` points in the plane, each cell with one diagonal, held along one
/// edge.
fn lattice(side: usize) -> Sketch {
    let mut draw = Draw(3);
    let unknown = |x: usize, y: usize| 2 * (x + side * y);
    let mut sketch = Sketch::of(2 * side * side);
    for y in 0..side {
        for x in 0..side {
            for axis in 0..2 {
                sketch.system.places[unknown(x, y) + axis] = [x as f64, y as f64, 0.0];
                if y == 0 {
                    sketch = sketch.rigid(vec![(unknown(x, y) + axis, 1.0)], 0.0);
                }
            }
            let slope = 0.5_f64.sqrt();
            for (dx, dy, n) in [
                (1, 0, [1.0, 0.0]),
                (0, 1, [0.0, 1.0]),
                (1, 1, [slope, slope]),
            ] {
                if x + dx < side && y + dy < side {
                    let (a, b) = (unknown(x, y), unknown(x + dx, y + dy));
                    let row = (0..2)
                        .filter(|&axis| n[axis] != 0.0)
                        .flat_map(|axis| [(a + axis, -n[axis]), (b + axis, n[axis])])
                        .collect();
                    sketch = sketch.elastic(row, 0.5 + draw.share(), 0.0);
                }
            }
        }
    }
    for unknown in 2 * side..2 * side * side {
        let force = draw.whole(3);
        sketch = sketch.force(unknown, force);
    }
    sketch.ready()
}

#[test]
fn a_lattice_of_a_hundred_thousand_unknowns_balances() {
    let sketch = lattice(224);
    let answer = Prepared::of(sketch.system.clone())
        .solve(&sketch.loads)
        .unwrap();
    let left = unbalanced(&sketch, &answer);
    assert!(left < 1e-13, "{left}");
    assert!(answer.free.is_empty());
}

/// The same lattice with the edge held in one direction only, a loose point and a loose pair: what
/// is free is found without regard to the size.
#[test]
fn free_motions_of_large_systems_are_found() {
    let mut sketch = lattice(12);
    let n = sketch.system.places.len();
    let held = sketch.system.rigid.iter().zip(&sketch.loads.rigid_value);
    let upright: Vec<_> = held
        .filter(|(row, _)| row[0].0 % 2 == 1)
        .map(|(row, _)| row.clone())
        .collect();
    sketch.loads.rigid_value.truncate(upright.len());
    sketch.system.rigid = upright;
    for extra in 0..4 {
        sketch.system.places.push([20.0 + extra as f64, 3.0, 0.0]);
        sketch.system.shown.push(vec![(n + extra, 1.0)]);
        sketch.loads.forces.push(crate::quantity::from_si(0.0));
    }
    let sketch = sketch.elastic(vec![(n + 2, -1.0), (n + 3, 1.0)], 4.0, 0.5);
    let along: f64 = sketch
        .loads
        .forces
        .iter()
        .step_by(2)
        .take(144)
        .map(|f| f.value)
        .sum();
    let sketch = sketch.force(4, -along).ready();
    let answer = Prepared::of(sketch.system.clone())
        .solve(&sketch.loads)
        .unwrap();
    proves(&sketch, &answer).unwrap();
    // All of the lattice level, each of the two loose points, and the pair as a whole.
    let mut sizes: Vec<usize> = answer.free.iter().map(|free| free.motion.len()).collect();
    sizes.sort_unstable();
    assert_eq!(sizes, [1, 1, 2, 144]);
    // The pair is stretched by its rest and lies around where it was.
    assert_relative_eq!(
        answer.displacements[n + 2].value,
        -0.25,
        max_relative = 1e-12
    );
    assert_relative_eq!(
        answer.displacements[n + 3].value,
        0.25,
        max_relative = 1e-12
    );
}

/// The same loads give the same bits, whatever was solved between.
#[test]
fn what_was_solved_before_changes_no_bit() {
    for seed in 0..300 {
        let sketch = Draw(seed).sketch();
        let mut other = sketch.loads.clone();
        other
            .forces
            .iter_mut()
            .for_each(|force| force.value = -2.0 * force.value + 1.0);
        let mut prepared = Prepared::of(sketch.system);
        let first = prepared.solve(&sketch.loads);
        let _ = prepared.solve(&other);
        let second = prepared.solve(&sketch.loads);
        assert_eq!(format!("{first:?}"), format!("{second:?}"), "seed {seed}");
    }
}
