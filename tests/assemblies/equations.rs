//! The equations of an assembly in one state: balance, stretch, and what is stiff.

use super::assembly::{Hold, HoldKind, Vector, dot, plus, scaled};
use super::dense::{Contact, System, directions};
use nalgebra::{DMatrix, DVector};

impl System<'_> {
    pub(super) fn equations(&self, acts: &[bool]) -> (DMatrix<f64>, DVector<f64>) {
        let count = self.at.count;
        let mut a = DMatrix::zeros(count, count);
        let mut b = DVector::zeros(count);
        let push = |b: &mut DVector<f64>, point: usize, force: Vector| {
            for axis in 0..self.assembly.coordinates {
                b[self.point(point, axis)] -= force[axis] / self.unit;
            }
        };
        for &(point, force) in &self.assembly.forces {
            push(&mut b, point, force);
        }
        for (i, bar) in self.bars.iter().enumerate() {
            let taut = self.acts(acts, Contact::Member(i));
            let last = bar.station_force.len() - 1;
            for (end, station) in [(0, 0), (1, last)] {
                let along = scaled(bar.axis, bar.station_force[station]);
                let on = if taut {
                    plus(bar.on_ends[end], along)
                } else {
                    bar.lumps[end]
                };
                push(&mut b, self.assembly.members[i].ends[end], on);
            }
            self.member_equations(i, acts, &mut a, &mut b);
        }
        for (i, hold) in self.assembly.holds.iter().enumerate() {
            self.hold_equations(i, hold, acts, &mut a, &mut b);
        }
        for (i, stiff) in self.stiff.iter().enumerate() {
            let body = &self.assembly.bodies[i];
            for (p, &point) in body.points.iter().enumerate() {
                for axis in 0..self.assembly.coordinates {
                    let (column, own) = (
                        self.point(point, axis),
                        p * self.assembly.coordinates + axis,
                    );
                    b[column] -= stiff.forces[own] / self.unit;
                    for equation in 0..stiff.equations.nrows() {
                        let row = self.at.bodies[i] + equation;
                        a[(row, column)] = stiff.equations[(equation, own)];
                        a[(column, row)] = stiff.equations[(equation, own)];
                    }
                }
            }
        }
        (a, b)
    }

    /// Balance of the stations inside a member and of its ends, and the stretch of its elements.
    fn member_equations(
        &self,
        i: usize,
        acts: &[bool],
        a: &mut DMatrix<f64>,
        b: &mut DVector<f64>,
    ) {
        let (bar, member) = (&self.bars[i], &self.assembly.members[i]);
        let inside = bar.elements.len() - 1;
        let (stations, forces) = (self.at.members[i], self.at.members[i] + inside);
        let taut = self.acts(acts, Contact::Member(i));
        // Displacement of a station: that of a point along the axis, or its own unknown.
        let moves = |a: &mut DMatrix<f64>, row: usize, station: usize, factor: f64| {
            if (1..=inside).contains(&station) {
                a[(row, stations + station - 1)] += factor;
                return;
            }
            let point = member.ends[usize::from(station > 0)];
            for axis in 0..self.assembly.coordinates {
                a[(row, self.point(point, axis))] += factor * bar.axis[axis];
            }
        };
        for (e, element) in bar.elements.iter().enumerate() {
            let force = forces + e;
            if !taut {
                // No force; each station stands where free growth puts it from the start on.
                a[(force, force)] = 1.0;
                if e < inside {
                    let row = stations + e;
                    moves(a, row, e + 1, 1.0);
                    moves(a, row, e, -1.0);
                    b[row] = element.growth;
                }
                continue;
            }
            for axis in 0..self.assembly.coordinates {
                if e == 0 {
                    a[(self.point(member.ends[0], axis), force)] += bar.axis[axis];
                }
                if e == inside {
                    let row = self.point(member.ends[1], axis);
                    a[(row, force)] -= bar.axis[axis];
                    b[row] -= element.load * bar.axis[axis] / self.unit;
                }
            }
            if e < inside {
                // N after − (N − load) + force = 0.
                let row = stations + e;
                a[(row, force + 1)] = 1.0;
                a[(row, force)] = -1.0;
                b[row] = -(element.load + bar.station_force[e + 1]) / self.unit;
            }
            if element.gap.is_some() && !self.acts(acts, Contact::Gap(i)) {
                a[(force, force)] = 1.0;
                continue;
            }
            a[(force, force)] = element.flexibility * self.unit;
            moves(a, force, e + 1, -1.0);
            moves(a, force, e, 1.0);
            b[force] = element.gap.unwrap_or(0.0) - element.by_load - element.growth;
        }
    }

    fn hold_equations(
        &self,
        i: usize,
        hold: &Hold,
        acts: &[bool],
        a: &mut DMatrix<f64>,
        b: &mut DVector<f64>,
    ) {
        for (d, direction) in directions(hold).enumerate() {
            let row = self.at.holds[i] + d;
            let (flexibility, stands) = match hold.kind {
                HoldKind::Fixed => (0.0, 0.0),
                HoldKind::Spring(stiffness) => (1.0 / stiffness, 0.0),
                HoldKind::Stop {
                    clearance,
                    stiffness,
                } => (stiffness.map_or(0.0, |k| 1.0 / k), clearance),
            };
            for axis in 0..self.assembly.coordinates {
                a[(self.point(hold.point, axis), row)] += direction[axis];
            }
            if !self.acts(acts, Contact::Stop(i)) {
                a[(row, row)] = 1.0;
                continue;
            }
            for axis in 0..self.assembly.coordinates {
                a[(row, self.point(hold.point, axis))] += direction[axis];
            }
            a[(row, row)] = flexibility * self.unit;
            b[row] = stands + dot(direction, hold.movement);
        }
    }
}
