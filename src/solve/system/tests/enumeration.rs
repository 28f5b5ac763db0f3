//! Against an enumeration of all states in dense arithmetic of a general library.

use super::Sketch;
use super::draw::Draw;
use crate::solve::system::{Prepared, Row};
use nalgebra::{DMatrix, DVector};

/// The displacements and the forces of rigid rows with these one-way parts acting, where the state
/// alone decides them and all signs hold with something to spare.
fn stands(sketch: &Sketch, acts: &[bool]) -> Option<DVector<f64>> {
    let (system, loads) = (&sketch.system, &sketch.loads);
    let n = system.places.len();
    let mut stiffness = DMatrix::<f64>::zeros(n, n);
    let mut right = DVector::from_iterator(n, loads.forces.iter().map(|f| f.value));
    let mut rigid: Vec<(&[(usize, f64)], f64)> = system
        .rigid
        .iter()
        .zip(&loads.rigid_value)
        .map(|(row, value)| (row.as_slice(), value.value))
        .collect();
    let mut springs: Vec<(&Row, f64, f64)> = system
        .elastic
        .iter()
        .zip(&loads.elastic_rest)
        .map(|(part, rest)| (&part.row, part.stiffness.value, rest.value))
        .collect();
    for (index, part) in system.one_way.iter().enumerate().filter(|(i, _)| acts[*i]) {
        let rest = loads.one_way_rest[index].value;
        match part.stiffness {
            Some(k) => springs.push((&part.row, k.value, rest)),
            None => rigid.push((&part.row, rest)),
        }
    }
    for &(row, k, rest) in &springs {
        for &(i, b) in row {
            right[i] += k * b * rest;
            for &(j, c) in row {
                stiffness[(i, j)] += k * b * c;
            }
        }
    }
    let size = n + rigid.len();
    let mut table = DMatrix::<f64>::zeros(size, size);
    table.view_mut((0, 0), (n, n)).copy_from(&stiffness);
    let mut values = DVector::<f64>::zeros(size);
    values.rows_mut(0, n).copy_from(&right);
    for (index, &(row, value)) in rigid.iter().enumerate() {
        values[n + index] = value;
        for &(unknown, b) in row {
            table[(n + index, unknown)] = b;
            table[(unknown, n + index)] = b;
        }
    }
    if table.clone().svd(false, false).singular_values.min() < 1e-6 {
        return None;
    }
    let found = table.lu().solve(&values)?;
    let mut next_rigid = n + system.rigid.len();
    for (index, part) in system.one_way.iter().enumerate() {
        let beyond = part.row.iter().map(|&(u, b)| b * found[u]).sum::<f64>()
            - loads.one_way_rest[index].value;
        let spare = match (acts[index], part.stiffness) {
            (false, _) => -beyond,
            (true, Some(k)) => k.value * beyond,
            (true, None) => {
                next_rigid += 1;
                found[next_rigid - 1]
            }
        };
        if spare < 1e-7 {
            return None;
        }
    }
    Some(found)
}

#[test]
fn states_and_values_agree_with_enumeration() {
    let mut compared = 0;
    for seed in 1_000_000..1_010_000 {
        let sketch = Draw(seed).sketch();
        let parts = sketch.system.one_way.len();
        let states = (0..1_usize << parts).map(|bits| {
            (0..parts)
                .map(|part| bits >> part & 1 == 1)
                .collect::<Vec<_>>()
        });
        let standing: Vec<_> = states
            .filter_map(|acts| stands(&sketch, &acts).map(|found| (acts, found)))
            .collect();
        assert!(standing.len() <= 1, "seed {seed}: one state decides");
        let Some((acts, found)) = standing.first() else {
            continue;
        };
        compared += 1;
        let answer = Prepared::of(sketch.system.clone())
            .solve(&sketch.loads)
            .unwrap_or_else(|failure| panic!("seed {seed}: {failure:?}"));
        assert_eq!(&answer.acts, acts, "seed {seed}");
        let largest = found.amax().max(1.0);
        for (unknown, displacement) in answer.displacements.iter().enumerate() {
            let off = (displacement.value - found[unknown]).abs();
            assert!(
                off <= 1e-10 * largest,
                "seed {seed}: unknown {unknown} is off by {off}"
            );
        }
        let n = sketch.system.places.len();
        for (index, force) in answer.rigid.iter().enumerate() {
            let off = (force.value - found[n + index]).abs();
            assert!(
                off <= 1e-10 * largest,
                "seed {seed}: rigid {index} is off by {off}"
            );
        }
    }
    assert!(compared > 2_000, "only {compared} were compared");
}
