//! A stiff body as equations between the displacements of its points: everything that is not one
//! of its rigid motions is 0. It has no reference point, no rotation and no translation of its own.

use super::assembly::{Assembly, Body, GRAVITY, Vector, cross, minus, plus, scaled};
use nalgebra::{DMatrix, DVector};

pub(crate) struct Stiff {
    /// One row an equation, over the coordinates of all its points in their order.
    pub(crate) equations: DMatrix<f64>,
    /// Forces on its points that do the same as the forces and the moment on it.
    pub(crate) forces: DVector<f64>,
    /// From displacements of its points to its rotation (one row or three; none in one coordinate).
    pub(crate) rotation: DMatrix<f64>,
    /// Whether its points can take what acts on it: points in one line take no moment about it.
    pub(crate) takes_its_loads: bool,
}

impl Stiff {
    pub(crate) fn of(assembly: &Assembly, body: &Body) -> Self {
        let dim = assembly.coordinates;
        let points: Vec<Vector> = body.points.iter().map(|&p| assembly.points[p]).collect();
        let middle = scaled(
            points.iter().fold([0.0; 3], |sum, &p| plus(sum, p)),
            1.0 / points.len() as f64,
        );
        let turns: &[Vector] = match dim {
            1 => &[],
            2 => &[[0.0, 0.0, 1.0]],
            _ => &[[1.0, 0.0, 0.0], [0.0, 1.0, 0.0], [0.0, 0.0, 1.0]],
        };
        let (rows, motions) = (points.len() * dim, dim + turns.len());
        // The rigid motions, one a column; a square matrix so that all left vectors come out.
        let side = rows.max(motions);
        let mut rigid = DMatrix::zeros(side, side);
        for (p, &point) in points.iter().enumerate() {
            for axis in 0..dim {
                rigid[(p * dim + axis, axis)] = 1.0;
                for (t, &turn) in turns.iter().enumerate() {
                    rigid[(p * dim + axis, dim + t)] = cross(turn, minus(point, middle))[axis];
                }
            }
        }
        let parts = rigid.clone().svd(true, true);
        let (left, right) = (parts.u.expect("asked for"), parts.v_t.expect("asked for"));
        let values = parts.singular_values;
        let acts = |k: usize| values[k] > 1e-9 * values.max();
        let mut inverse = DMatrix::zeros(motions, rows);
        let mut equations = Vec::new();
        for k in 0..side {
            let column = left.column(k);
            if acts(k) {
                for m in 0..motions {
                    for r in 0..rows {
                        inverse[(m, r)] += right[(k, m)] * column[r] / values[k];
                    }
                }
            } else if column.rows(rows, side - rows).norm() < 0.5 {
                equations.push(column.rows(0, rows).transpose());
            }
        }
        let down = scaled(assembly.down(), assembly.weight * body.mass * GRAVITY);
        let force = plus(body.force, down);
        let lever = cross(minus(body.centre, middle), force);
        let moment = plus(body.moment, lever);
        let mut wrench = DVector::zeros(motions);
        for axis in 0..dim {
            wrench[axis] = force[axis];
        }
        for (t, &turn) in turns.iter().enumerate() {
            wrench[dim + t] = super::assembly::dot(turn, moment);
        }
        let forces = inverse.transpose() * &wrench;
        let taken = rigid.view((0, 0), (rows, motions)).transpose() * &forces;
        Stiff {
            equations: match equations.as_slice() {
                [] => DMatrix::zeros(0, rows),
                rows => DMatrix::from_rows(rows),
            },
            takes_its_loads: (taken - &wrench).norm() <= 1e-9 * wrench.norm(),
            rotation: inverse.rows(dim, turns.len()).into_owned(),
            forces,
        }
    }
}
