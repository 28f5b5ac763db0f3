//! Forces that bodies pass to each other at points that they share. A result does not hold them;
//! it is in equilibrium if there are some under which every body rests.

use super::body::Acted;
use super::space::{difference, moment, size, sum};
use crate::model::Spatial;
use crate::quantity::{Force, Length, from_si};
use faer::linalg::solvers::Solve;
use faer::sparse::{SparseColMat, Triplet};
use faer::{Mat, Side};

/// A point at which one body hangs on another.
pub(super) struct Hinge {
    pub(super) at: Spatial<Length>,
    pub(super) bodies: [usize; 2],
}

/// What stands in for the forces' equations where they depend on each other, beside the largest
/// entry of each.
const SLIGHT: f64 = 1e-10;

/// How often the forces are bettered at most.
const ROUNDS: usize = 25;

/// The most rows of one body: three of force, three of moment.
const ROWS: usize = 6;

/// Passes forces at the shared points from body to body, so that as little as may be is left over
/// on each: by least squares, moments made comparable by the size of their body.
pub(super) fn pass_on(coordinates: usize, hinges: &[Hinge], bodies: &mut [Acted]) {
    if hinges.is_empty() {
        return;
    }
    let passing = Passing::of(coordinates, hinges, bodies);
    let Some(factor) = passing.factor() else {
        return;
    };
    let before = bodies.to_vec();
    let rows = passing.rows();
    let mut multipliers = Mat::<f64>::zeros(rows, 1);
    let (mut best, mut best_left) = (before.clone(), f64::INFINITY);
    let mut now = before.clone();
    for _ in 0..ROUNDS {
        let left = passing.worst(&now);
        let settled = left > 0.5 * best_left;
        if left < best_left {
            best_left = left;
            best.copy_from_slice(&now);
        }
        if settled || left == 0.0 {
            break;
        }
        let mut step = Mat::<f64>::zeros(rows, 1);
        for (place, &body) in passing.hinged.iter().enumerate() {
            let entries = passing.left_over(&now[body]);
            for (row, &entry) in entries.iter().enumerate().take(passing.each) {
                step[(place * passing.each + row, 0)] = entry;
            }
        }
        factor.solve_in_place(step.as_mut());
        multipliers += &step;
        now.copy_from_slice(&before);
        passing.act(&multipliers, &mut now);
    }
    bodies.copy_from_slice(&best);
}

/// The equations of all bodies that share points.
struct Passing<'h> {
    coordinates: usize,
    hinges: &'h [Hinge],
    /// The bodies that share points, and where each body stands among them.
    hinged: Vec<usize>,
    place: Vec<usize>,
    /// Rows of each: of force and, scaled by the body's size, of moment.
    each: usize,
    /// The rows of every hinge at its two bodies.
    arms: Vec<[Arm; 2]>,
}

/// What a unit force along each coordinate at a hinge makes of a body's rows.
type Arm = [[f64; 3]; ROWS];

impl<'h> Passing<'h> {
    fn of(coordinates: usize, hinges: &'h [Hinge], bodies: &[Acted]) -> Self {
        let mut place = vec![usize::MAX; bodies.len()];
        let mut hinged = Vec::new();
        for &body in hinges.iter().flat_map(|hinge| &hinge.bodies) {
            if place[body] == usize::MAX {
                place[body] = hinged.len();
                hinged.push(body);
            }
        }
        let mut passing = Passing {
            coordinates,
            hinges,
            hinged,
            place,
            each: [1, 3, 6][coordinates - 1],
            arms: Vec::with_capacity(hinges.len()),
        };
        for hinge in hinges {
            let arms = hinge.bodies.map(|body| passing.arm(hinge, &bodies[body]));
            passing.arms.push(arms);
        }
        passing
    }

    fn rows(&self) -> usize {
        self.hinged.len() * self.each
    }

    fn arm(&self, hinge: &Hinge, body: &Acted) -> Arm {
        let mut arm = [[0.0; 3]; ROWS];
        for axis in 0..self.coordinates {
            let mut unit = Spatial::<Force>::default();
            unit[axis] = from_si(1.0);
            let mut alone = Acted {
                force: unit,
                reach: body.reach,
                ..Acted::default()
            };
            alone.moment = moment(&difference(hinge.at, body.middle), &unit);
            for (row, entry) in self.left_over(&alone).into_iter().enumerate() {
                arm[row][axis] = entry;
            }
        }
        arm
    }

    /// The rows of a body: what is left over on it.
    fn left_over(&self, body: &Acted) -> [f64; ROWS] {
        let reach = body.reach.value;
        let force = body.force.map(|entry| entry.value);
        let turning = body.moment.map(|entry| {
            if reach > 0.0 {
                entry.value / reach
            } else {
                0.0
            }
        });
        match self.coordinates {
            1 => [force[0], 0.0, 0.0, 0.0, 0.0, 0.0],
            2 => [force[0], force[1], turning[2], 0.0, 0.0, 0.0],
            _ => [
                force[0], force[1], force[2], turning[0], turning[1], turning[2],
            ],
        }
    }

    /// The largest leftover beside the size of its body's forces.
    fn worst(&self, bodies: &[Acted]) -> f64 {
        let of = |&body: &usize| {
            let body = &bodies[body];
            let most = self
                .left_over(body)
                .into_iter()
                .fold(0.0, |most: f64, entry| most.max(entry.abs()));
            if most == 0.0 {
                0.0
            } else {
                most / body.size.value
            }
        };
        self.hinged.iter().map(of).fold(0.0, f64::max)
    }

    /// Puts the forces at the hinges that multipliers of the rows stand for on their bodies.
    fn act(&self, multipliers: &Mat<f64>, bodies: &mut [Acted]) {
        for (hinge, arms) in self.hinges.iter().zip(&self.arms) {
            let mut force = [0.0; 3];
            for (body, (arm, sign)) in hinge.bodies.into_iter().zip(arms.iter().zip([-1.0, 1.0])) {
                for (row, shares) in arm.iter().enumerate().take(self.each) {
                    let by = multipliers[(self.place[body] * self.each + row, 0)] * sign;
                    for (entry, share) in force.iter_mut().zip(shares) {
                        *entry += share * by;
                    }
                }
            }
            for (body, sign) in hinge.bodies.into_iter().zip([1.0, -1.0]) {
                let force: Spatial<Force> = force.map(|entry| from_si(entry * sign));
                let on = &mut bodies[body];
                let arm = difference(hinge.at, on.middle);
                on.force = sum(on.force, force);
                on.moment = sum(on.moment, moment(&arm, &force));
                on.size += size(&force);
            }
        }
    }

    /// The factor of the rows' products with each other, in which each body meets only those that it
    /// shares points with.
    fn factor(&self) -> Option<faer::sparse::linalg::solvers::Llt<usize, f64>> {
        let mut entries = Vec::with_capacity(self.hinges.len() * 3 * self.each * self.each);
        let mut diagonal = vec![0.0; self.rows()];
        for (hinge, arms) in self.hinges.iter().zip(&self.arms) {
            let places = hinge.bodies.map(|body| self.place[body] * self.each);
            for (a, b) in [(0, 0), (1, 1), (1, 0)] {
                let sign = if a == b { 1.0 } else { -1.0 };
                for (i, first) in arms[a].iter().enumerate().take(self.each) {
                    for (j, second) in arms[b].iter().enumerate().take(self.each) {
                        let product: f64 = (0..3).map(|axis| first[axis] * second[axis]).sum();
                        let (row, column) = (places[a] + i, places[b] + j);
                        if a == b && i == j {
                            diagonal[row] += product;
                        }
                        // Only the lower half is read.
                        if a != b || i >= j {
                            let (row, column) = (row.max(column), row.min(column));
                            entries.push(Triplet::new(row, column, sign * product));
                        }
                    }
                }
            }
        }
        for (row, entry) in diagonal.into_iter().enumerate() {
            let slight = if entry > 0.0 { SLIGHT * entry } else { 1.0 };
            entries.push(Triplet::new(row, row, slight));
        }
        let matrix =
            SparseColMat::<usize, f64>::try_new_from_triplets(self.rows(), self.rows(), &entries)
                .ok()?;
        matrix.sp_cholesky(Side::Lower).ok()
    }
}
