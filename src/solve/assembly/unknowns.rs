//! What may move in an assembly: how points and bodies are put into unknowns, all of them lengths.
//!
//! A free point has one unknown for each coordinate. A body has a translation, that of its
//! reference, and a rotation φ times a length of the body: a point of it moves with
//! u = t + φ × r, where r is its distance from the reference in lengths of the body.

use super::motion::Moving;
use super::space::{cross, dot, plus, size, times};
use crate::model::{Assembly, Body, Point, Spatial};
use crate::quantity::{Angle, Force, Length, Moment, from_si};
use crate::solve::system::Row;

/// How a point moves.
#[derive(Debug, Clone, Copy)]
pub(super) enum Moved {
    /// By unknowns of its own, the first of which is this.
    Freely(usize),
    /// With a body.
    With {
        /// The body.
        body: usize,
        /// Its distance from the body's reference, in lengths of the body.
        arm: Spatial<f64>,
    },
}

/// How a body moves.
#[derive(Debug, Clone)]
pub(super) struct Carriage {
    /// The first unknown of its translation; those of its rotation follow.
    pub(super) first: usize,
    /// The point that its translation is that of: the centroid of its points.
    pub(super) reference: Spatial<Length>,
    /// By which its rotation is measured: the largest distance of its points from the reference,
    /// 1 m where all of them lie there.
    pub(super) size: Length,
    /// The axes of its rotation, one for each unknown of it.
    axes: Vec<Axis>,
}

/// An axis of a body's rotation.
#[derive(Debug, Clone, Copy)]
struct Axis {
    /// A unit vector.
    along: Spatial<f64>,
    /// Whether turning about it moves none of the body's points.
    idle: bool,
}

/// A body that carries a point which moves with another body: a hinge between the two.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Hinge {
    pub(super) point: usize,
    pub(super) body: usize,
}

/// The unknowns of points and bodies, numbered.
#[derive(Debug)]
pub(super) struct Unknowns {
    pub(super) coordinates: usize,
    pub(super) points: Vec<Moved>,
    pub(super) bodies: Vec<Carriage>,
    pub(super) hinges: Vec<Hinge>,
    /// The points that move freely, in the order of their unknowns.
    free: Vec<usize>,
    /// How many there are.
    pub(super) count: usize,
    /// Where each lies.
    pub(super) places: Vec<[f64; 3]>,
}

impl Unknowns {
    pub(super) fn of(assembly: &Assembly) -> Self {
        let coordinates = assembly.coordinates;
        let mut unknowns = Unknowns {
            coordinates,
            points: vec![Moved::Freely(0); assembly.points.len()],
            bodies: Vec::with_capacity(assembly.bodies.len()),
            hinges: Vec::new(),
            free: Vec::new(),
            count: 0,
            places: Vec::new(),
        };
        let mut carried = vec![false; assembly.points.len()];
        for (index, body) in assembly.bodies.iter().enumerate() {
            let carriage = Carriage::of(assembly, body, unknowns.count);
            let entries = coordinates + carriage.axes.len();
            let place = carriage.reference.map(|length| length.value);
            unknowns.add(entries, place);
            unknowns.bodies.push(carriage);
            for &point in &body.points {
                if std::mem::replace(&mut carried[point], true) {
                    unknowns.hinges.push(Hinge { point, body: index });
                } else {
                    unknowns.points[point] = unknowns.moved_with(index, &assembly.points[point].at);
                }
            }
        }
        for (index, point) in assembly.points.iter().enumerate() {
            if !carried[index] {
                unknowns.points[index] = Moved::Freely(unknowns.count);
                unknowns.free.push(index);
                unknowns.add(coordinates, point.at.map(|length| length.value));
            }
        }
        unknowns
    }

    /// The first unknown of what a point moves with.
    pub(super) fn carrier(&self, point: usize) -> usize {
        self.first(&self.points[point])
    }

    fn first(&self, moved: &Moved) -> usize {
        match moved {
            Moved::Freely(first) => *first,
            Moved::With { body, .. } => self.bodies[*body].first,
        }
    }

    /// Whether two points keep their distance on one body.
    pub(super) fn carried_together(&self, a: usize, b: usize) -> bool {
        self.carrier(a) == self.carrier(b)
    }

    fn add(&mut self, entries: usize, place: [f64; 3]) {
        self.count += entries;
        self.places.extend(std::iter::repeat_n(place, entries));
    }

    /// How a place on a body moves.
    pub(super) fn moved_with(&self, body: usize, at: &Spatial<Length>) -> Moved {
        Moved::With {
            body,
            arm: self.bodies[body].arm(at),
        }
    }

    /// Adds to `row` what turns unknowns into `sign` times the displacement along a direction.
    pub(super) fn put(&self, row: &mut Row, moved: &Moved, direction: &Spatial<f64>, sign: f64) {
        let mut entry = |unknown: usize, coefficient: f64| {
            if coefficient != 0.0 {
                row.push((unknown, sign * coefficient));
            }
        };
        let first = self.first(moved);
        for (k, &along) in direction[..self.coordinates].iter().enumerate() {
            entry(first + k, along);
        }
        if let Moved::With { body, arm } = moved {
            let carriage = &self.bodies[*body];
            let lever = cross(arm, direction);
            for (axis, unknown) in carriage.turning(self.coordinates) {
                entry(unknown, dot(axis, &lever));
            }
        }
    }

    /// The displacement of a point.
    pub(super) fn displacement(&self, moved: &Moved, unknowns: &[Length]) -> Spatial<Length> {
        let mut displacement = [Length::default(); 3];
        let first = self.first(moved);
        displacement[..self.coordinates]
            .copy_from_slice(&unknowns[first..first + self.coordinates]);
        if let Moved::With { body, arm } = moved {
            let carriage = &self.bodies[*body];
            for (axis, unknown) in carriage.turning(self.coordinates) {
                let swept = cross(axis, arm);
                for k in 0..self.coordinates {
                    displacement[k] += unknowns[unknown] * swept[k];
                }
            }
        }
        displacement
    }

    /// Adds a force at a point to the forces on the unknowns.
    pub(super) fn push(&self, forces: &mut [Force], moved: &Moved, force: &Spatial<Force>) {
        let first = self.first(moved);
        for k in 0..self.coordinates {
            forces[first + k] += force[k];
        }
        if let Moved::With { body, arm } = moved {
            let carriage = &self.bodies[*body];
            let lever = cross(arm, &force.map(|entry| entry.value));
            for (axis, unknown) in carriage.turning(self.coordinates) {
                forces[unknown] += from_si(dot(axis, &lever));
            }
        }
    }

    /// Adds a force on a body, which acts at its centre.
    pub(super) fn push_body(
        &self,
        forces: &mut [Force],
        body: usize,
        centre: &Spatial<Length>,
        force: &Spatial<Force>,
    ) {
        let carriage = &self.bodies[body];
        for k in 0..self.coordinates {
            forces[carriage.first + k] += force[k];
        }
        let lever = cross(&carriage.arm(centre), &force.map(|entry| entry.value));
        for (axis, unknown) in carriage.axes(self.coordinates) {
            forces[unknown] += from_si(dot(&axis.along, &lever));
        }
    }

    /// Adds a moment on a body; gives its size as a force on the body's length.
    pub(super) fn turn(
        &self,
        forces: &mut [Force],
        body: usize,
        moment: &Spatial<Moment>,
    ) -> Force {
        let carriage = &self.bodies[body];
        let force: Spatial<f64> = moment.map(|entry| entry.value / carriage.size.value);
        for (axis, unknown) in carriage.axes(self.coordinates) {
            forces[unknown] += from_si(dot(&axis.along, &force));
        }
        from_si(size(&force))
    }

    /// The rotation of a body, about x, y and z.
    pub(super) fn rotation(&self, body: usize, unknowns: &[Length]) -> Spatial<Angle> {
        let carriage = &self.bodies[body];
        let mut rotation = [0.0; 3];
        for (axis, unknown) in carriage.axes(self.coordinates) {
            let angle = (unknowns[unknown] / carriage.size).value;
            rotation = plus(&rotation, angle, &axis.along);
        }
        rotation.map(from_si)
    }

    /// What an unknown of points and bodies belongs to.
    pub(super) fn owner(&self, unknown: usize) -> Option<Moving> {
        // Bodies come first, all with as many unknowns; then the points that move freely.
        let of_body = match self.coordinates {
            1 => 1,
            2 => 3,
            _ => 6,
        };
        let bodies = self.bodies.len() * of_body;
        if unknown < bodies {
            Some(Moving::Body(unknown / of_body))
        } else {
            let free = self.free.get((unknown - bodies) / self.coordinates)?;
            Some(Moving::Point(*free))
        }
    }

    /// The velocity of a body's reference or of a point, and the rotation, from the shares of its
    /// unknowns in a motion.
    pub(super) fn velocity(&self, owner: Moving, shares: &[(usize, f64)]) -> [Spatial<f64>; 2] {
        let (mut velocity, mut rotation) = ([0.0; 3], [0.0; 3]);
        let first = match owner {
            Moving::Body(body) => self.bodies[body].first,
            Moving::Point(point) | Moving::Member(point) => self.carrier(point),
        };
        for &(unknown, share) in shares {
            match (unknown - first).checked_sub(self.coordinates) {
                None => velocity[unknown - first] = share,
                Some(axis) => {
                    if let Moving::Body(body) = owner {
                        let carriage = &self.bodies[body];
                        let angle = share / carriage.size.value;
                        rotation = plus(&rotation, angle, &carriage.axes[axis].along);
                    }
                }
            }
        }
        [velocity, rotation]
    }

    /// Unknowns of rotations that move no point.
    pub(super) fn idle(&self) -> impl Iterator<Item = usize> {
        self.bodies.iter().flat_map(|carriage| {
            carriage
                .axes(self.coordinates)
                .filter_map(|(axis, unknown)| axis.idle.then_some(unknown))
        })
    }
}

impl Carriage {
    fn of(assembly: &Assembly, body: &Body, first: usize) -> Self {
        let points = || body.points.iter().map(|&point| &assembly.points[point]);
        let share = 1.0 / body.points.len() as f64;
        let start = points()
            .next()
            .map_or_else(Default::default, |first| first.at);
        // The centroid, from one of the points, so that points level with it stay exactly level.
        let reference: Spatial<Length> = std::array::from_fn(|k| {
            let sum = |sum: Length, point: &Point| sum + (point.at[k] - start[k]);
            start[k] + points().fold(Length::default(), sum) * share
        });
        let apart = |point: &Point| -> Spatial<f64> {
            std::array::from_fn(|k| (point.at[k] - reference[k]).value)
        };
        let farthest = points().map(apart).fold([0.0; 3], |most, next| {
            if size(&next) > size(&most) {
                next
            } else {
                most
            }
        });
        let largest = size(&farthest);
        let extent = points()
            .flat_map(|point| point.at)
            .fold(0.0_f64, |most, entry| most.max(entry.value.abs()));
        let rounding = ON_LINE * largest + 8.0 * f64::EPSILON * extent;
        let alone = largest <= rounding;
        let mut carriage = Carriage {
            first,
            reference,
            size: from_si(if alone { 1.0 } else { largest }),
            axes: Vec::new(),
        };
        let axis = |(along, idle)| Axis { along, idle };
        let square = [[1.0, 0.0, 0.0], [0.0, 1.0, 0.0], [0.0, 0.0, 1.0]];
        let axes = match assembly.coordinates {
            2 => vec![(square[2], alone)],
            3 if alone => square.map(|along| (along, true)).to_vec(),
            3 => {
                let line = times(1.0 / largest, &farthest);
                let on_line = |point: &Point| size(&cross(&line, &apart(point))) <= rounding;
                if points().all(on_line) {
                    let [line, first, second] = around(&line);
                    vec![(line, true), (first, false), (second, false)]
                } else {
                    square.map(|along| (along, false)).to_vec()
                }
            }
            _ => Vec::new(),
        };
        carriage.axes.extend(axes.into_iter().map(axis));
        carriage
    }

    /// The distance of a place from the reference, in lengths of the body.
    fn arm(&self, at: &Spatial<Length>) -> Spatial<f64> {
        std::array::from_fn(|k| ((at[k] - self.reference[k]) / self.size).value)
    }

    /// Its axes of rotation, each with its unknown and whether turning about it moves no point.
    fn axes(&self, coordinates: usize) -> impl Iterator<Item = (&Axis, usize)> {
        self.axes.iter().zip(self.first + coordinates..)
    }

    /// The axes of rotation that move its points, each with its unknown.
    fn turning(&self, coordinates: usize) -> impl Iterator<Item = (&Spatial<f64>, usize)> {
        self.axes(coordinates)
            .filter_map(|(axis, unknown)| (!axis.idle).then_some((&axis.along, unknown)))
    }
}

/// How far off the line of a body's points, in lengths of the body, a point still lies on it.
const ON_LINE: f64 = 1e-12;

/// A unit vector with two that stand square on it and on each other.
fn around(line: &Spatial<f64>) -> [Spatial<f64>; 3] {
    // Beside the axis that it is farthest from.
    let least = (0..3).fold(0, |least, k| {
        if line[k].abs() < line[least].abs() {
            k
        } else {
            least
        }
    });
    let mut beside = [0.0; 3];
    beside[least] = 1.0;
    let first = cross(line, &beside);
    let first = times(1.0 / size(&first), &first);
    let second = cross(line, &first);
    [*line, first, second]
}
