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
        // The rigid motions, one a column.
        let mut rigid = DMatrix::zeros(rows, motions);
        for (p, &point) in points.iter().enumerate() {
            for axis in 0..dim {
                rigid[(p * dim + axis, axis)] = 1.0;
                for (t, &turn) in turns.iter().enumerate() {
                    rigid[(p * dim + axis, dim + t)] = cross(turn, minus(point, middle))[axis];
                }
            }
        }
        // What they span, and what is square to all of them.
        let mut basis = Vec::new();
        for motion in rigid.column_iter() {
            extend(&mut basis, motion.into_owned());
        }
        let rank = basis.len();
        while basis.len() < rows {
            let left = (0..rows).map(|i| rest(&basis, unit(rows, i)));
            let most = left.max_by(|a, b| a.norm().total_cmp(&b.norm()));
            extend(&mut basis, most.expect("a body has points"));
        }
        let square: Vec<_> = basis.drain(rank..).map(|v| v.transpose()).collect();
        let spanned = DMatrix::from_columns(&basis);
        // Movements of least size: rigid = spanned · shares, so its inverse is sharesᵀ (shares ·
        // sharesᵀ)⁻¹ spannedᵀ.
        let shares = spanned.transpose() * &rigid;
        let product = &shares * shares.transpose();
        let solved = product
            .lu()
            .solve(&spanned.transpose())
            .expect("independent");
        let inverse = shares.transpose() * solved;
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
        let taken = rigid.transpose() * &forces;
        Stiff {
            equations: match square.as_slice() {
                [] => DMatrix::zeros(0, rows),
                rows => DMatrix::from_rows(rows),
            },
            takes_its_loads: (taken - &wrench).norm() <= 1e-9 * wrench.norm(),
            rotation: inverse.rows(dim, turns.len()).into_owned(),
            forces,
        }
    }
}

/// Puts the part of a vector that is square to a basis into it, if there is any.
fn extend(basis: &mut Vec<DVector<f64>>, vector: DVector<f64>) {
    let left = rest(basis, vector.clone());
    if left.norm() > 1e-9 * vector.norm() {
        basis.push(left.normalize());
    }
}

/// What is left of a vector without its part along an orthonormal basis; taken off twice, so that it
/// is square to it to rounding (Kahan's "twice is enough").
fn rest(basis: &[DVector<f64>], mut vector: DVector<f64>) -> DVector<f64> {
    for _ in 0..2 {
        for direction in basis {
            vector -= direction * direction.dot(&vector);
        }
    }
    vector
}

fn unit(size: usize, index: usize) -> DVector<f64> {
    DVector::from_fn(size, |i, _| if i == index { 1.0 } else { 0.0 })
}
