//! The energy is convex: an answer that meets equilibrium, the laws of its parts and the signs is
//! the state of least energy, and a motion or a dependency proves that there is none. These proofs
//! are looked at with plain sums, which know nothing of how they were found.

use super::Sketch;
use super::draw::Draw;
use crate::solve::system::{Answer, Failure, Prepared, Row};
use nalgebra::DMatrix;

fn dot(row: &Row, q: &[f64]) -> f64 {
    row.iter().map(|&(u, b)| b * q[u]).sum()
}

fn dense(row: &Row, unknowns: usize) -> Vec<f64> {
    let mut all = vec![0.0; unknowns];
    for &(unknown, b) in row {
        all[unknown] = b;
    }
    all
}

/// Whether an answer proves itself to 1e-9 of the sizes that come together.
pub(super) fn proves(sketch: &Sketch, answer: &Answer) -> Result<(), String> {
    let (system, loads) = (&sketch.system, &sketch.loads);
    let q: Vec<f64> = answer.displacements.iter().map(|u| u.value).collect();
    let mut left: Vec<f64> = loads.forces.iter().map(|f| f.value).collect();
    let mut size: Vec<f64> = left.iter().map(|f| f.abs() + 1.0).collect();
    let mut take = |row: &Row, force: f64| {
        for &(u, b) in row {
            left[u] -= b * force;
            size[u] += (b * force).abs();
        }
    };
    let close = |a: f64, b: f64, size: f64| (a - b).abs() <= 1e-10 * (a.abs() + b.abs() + size);
    for (index, part) in system.elastic.iter().enumerate() {
        let force = answer.elastic[index].value;
        let law = part.stiffness.value * (dot(&part.row, &q) - loads.elastic_rest[index].value);
        if !close(force, law, part.stiffness.value) {
            return Err(format!("elastic {index}: {force} against {law}"));
        }
        take(&part.row, force);
    }
    for (index, row) in system.rigid.iter().enumerate() {
        if !close(dot(row, &q), loads.rigid_value[index].value, 1.0) {
            return Err(format!("rigid {index} does not keep its value"));
        }
        take(row, answer.rigid[index].value);
    }
    for (index, part) in system.one_way.iter().enumerate() {
        let force = answer.one_way[index].value;
        let beyond = dot(&part.row, &q) - loads.one_way_rest[index].value;
        let clearance = answer.clearance[index].value;
        if answer.acts[index] {
            let law = part.stiffness.map_or(force, |k| k.value * beyond);
            let kept = part.stiffness.is_some() || close(beyond, 0.0, 1.0);
            let k = part.stiffness.map_or(1.0, |k| k.value);
            if !(force > 0.0 && clearance == 0.0 && kept && close(force, law, k)) {
                return Err(format!("one-way {index} acts: {force}, {beyond}"));
            }
        } else if !(force == 0.0 && clearance >= 0.0 && close(clearance, -beyond, 1.0)) {
            return Err(format!(
                "one-way {index} is open: {force}, {clearance}, {beyond}"
            ));
        }
        take(&part.row, force);
    }
    for (unknown, (left, size)) in left.iter().zip(&size).enumerate() {
        if left.abs() > 1e-10 * size {
            return Err(format!("unknown {unknown} is out of balance by {left}"));
        }
    }
    for free in &answer.free {
        let v = dense(&free.motion, q.len());
        let stretches = |row: &Row| dot(row, &v).abs() > 1e-9;
        if system.elastic.iter().any(|part| stretches(&part.row))
            || system.rigid.iter().any(stretches)
        {
            return Err(format!("{v:?} is not free"));
        }
        for (index, part) in system.one_way.iter().enumerate() {
            let along = dot(&part.row, &v);
            let touches = free.touching.contains(&index);
            if (answer.acts[index] && along.abs() > 1e-9) || (touches && along > -1e-9) {
                return Err(format!("{v:?} stretches one-way {index}"));
            }
        }
    }
    Ok(())
}

/// Whether a failure proves itself.
fn proves_failure(sketch: &Sketch, failure: &Failure) -> Result<(), String> {
    let (system, loads) = (&sketch.system, &sketch.loads);
    match failure {
        Failure::Pushed { motion, force } => {
            let v = dense(motion, system.places.len());
            let largest = v.iter().fold(0.0_f64, |most, x| most.max(x.abs()));
            let work: f64 = v.iter().zip(&loads.forces).map(|(v, f)| v * f.value).sum();
            let resisted = system.elastic.iter().any(|e| dot(&e.row, &v).abs() > 1e-9)
                || system.rigid.iter().any(|r| dot(r, &v).abs() > 1e-9)
                || system.one_way.iter().any(|o| dot(&o.row, &v) > 1e-9);
            if resisted
                || work <= 1e-9
                || (work - force.value).abs() > 1e-9
                || (largest - 1.0).abs() > 1e-12
            {
                return Err(format!("{v:?} is resisted or not pushed: {work}"));
            }
        }
        Failure::Contradiction { rigid, one_way } => {
            let n = system.places.len();
            let rows: Vec<(Vec<f64>, f64)> = rigid
                .iter()
                .map(|&i| (dense(&system.rigid[i], n), loads.rigid_value[i].value))
                .chain(one_way.iter().map(|&i| {
                    (
                        dense(&system.one_way[i].row, n),
                        loads.one_way_rest[i].value,
                    )
                }))
                .collect();
            if rows.is_empty()
                || one_way
                    .iter()
                    .any(|&i| system.one_way[i].stiffness.is_some())
            {
                return Err("nothing rigid is named".into());
            }
            // The one dependency among the rows that are named.
            let table = DMatrix::from_fn(n.max(rows.len()), rows.len(), |u, r| {
                rows[r].0.get(u).copied().unwrap_or(0.0)
            });
            let svd = table.svd(false, true);
            let v_t = svd.v_t.ok_or("no right vectors")?;
            let (last, smallest) = svd.singular_values.argmin();
            if smallest > 1e-9 {
                return Err(format!(
                    "rows {rigid:?} {one_way:?} do not depend on each other"
                ));
            }
            let lambda: Vec<f64> = v_t.row(last).iter().copied().collect();
            let miss: f64 = lambda.iter().zip(&rows).map(|(l, row)| l * row.1).sum();
            let turned = -miss.signum();
            let pushes = lambda[rigid.len()..].iter().any(|l| l * turned < -1e-9);
            if miss.abs() < 1e-9 || pushes {
                return Err(format!(
                    "rows {rigid:?} {one_way:?} do not contradict: {lambda:?}"
                ));
            }
        }
    }
    Ok(())
}

#[test]
fn every_outcome_of_random_systems_proves_itself() {
    let (mut solved, mut pushed, mut contradicted, mut free, mut wrong) = (0, 0, 0, 0, 0);
    for seed in 0..20_000 {
        let sketch = Draw(seed).sketch();
        let outcome = Prepared::of(sketch.system.clone()).solve(&sketch.loads);
        let proof = match &outcome {
            Ok(answer) => {
                solved += 1;
                free += usize::from(!answer.free.is_empty());
                proves(&sketch, answer)
            }
            Err(failure) => {
                match failure {
                    Failure::Pushed { .. } => pushed += 1,
                    Failure::Contradiction { .. } => contradicted += 1,
                }
                proves_failure(&sketch, failure)
            }
        };
        if let Err(why) = proof {
            wrong += 1;
            if wrong <= 5 {
                println!("seed {seed}: {why}\n{sketch:?}\n{outcome:?}\n");
            }
        }
    }
    println!(
        "{solved} solved, {free} with free motions, {pushed} pushed, {contradicted} contradicted"
    );
    assert_eq!(wrong, 0);
    assert!(solved > 5_000 && pushed > 2_000 && contradicted > 1_000 && free > 1_000);
}

/// Coefficients of any size and stiffness from 1 to 10⁹ beside rigid parts: states, signs and laws
/// hold as well.
#[test]
fn states_among_far_apart_stiffness_prove_themselves() {
    let (mut solved, mut open) = (0, 0);
    for seed in 0..5_000 {
        let mut draw = Draw(seed);
        let unknowns = 2 + draw.below(7);
        let mut sketch = Sketch::of(unknowns);
        for part in 0..2 * unknowns + 4 {
            let mut row = Row::new();
            for unknown in 0..unknowns {
                if draw.below(3) != 0 {
                    row.push((unknown, 2.0 * draw.share() - 1.0));
                }
            }
            let stiffness = 10.0_f64.powf(9.0 * draw.share());
            sketch = match part % 4 {
                0 => sketch.elastic(row, stiffness, 0.01 * draw.share()),
                1 => sketch.one_way(row, None, 0.01 * draw.share()),
                _ => sketch.one_way(row, Some(stiffness), 0.01 * draw.share()),
            };
        }
        for unknown in 0..unknowns {
            let force = draw.whole(9);
            sketch = sketch.force(unknown, force);
        }
        let sketch = sketch.ready();
        let outcome = Prepared::of(sketch.system.clone()).solve(&sketch.loads);
        let proof = match &outcome {
            Ok(answer) => {
                solved += 1;
                open += answer.acts.iter().filter(|acts| !**acts).count();
                proves(&sketch, answer)
            }
            Err(failure) => proves_failure(&sketch, failure),
        };
        proof.unwrap_or_else(|why| panic!("seed {seed}: {why}\n{outcome:?}"));
    }
    assert!(
        solved > 1_000 && open > 5_000,
        "{solved} solved, {open} open"
    );
}
