//! The potential energy of an assembly as a function of the displacements of its points alone:
//! every member, spring and elastic stop is a term, rigid ones and stiff bodies are conditions.

use super::assembly::{Assembly, HoldKind, Vector, Way, cross, minus, plus, scaled, size};
use super::dense::directions;
use super::elements::Bar;
use super::stiff::Stiff;
use crate::common::chain::Random;

/// Coefficients over the coordinates of all points, in their order.
pub(crate) type Row = Vec<(usize, f64)>;

/// Energy of half the stiffness times the square of what the stretch is beyond its rest.
#[derive(Debug, Clone)]
pub(crate) struct Term {
    pub(crate) row: Row,
    /// Rigid when `None`.
    pub(crate) stiffness: Option<f64>,
    pub(crate) rest: f64,
    /// Answers only where the stretch is beyond its rest.
    pub(crate) one_way: bool,
}

impl Term {
    fn beyond(&self, u: &[f64]) -> f64 {
        let stretch: f64 = self.row.iter().map(|&(i, c)| c * u[i]).sum();
        match self.one_way {
            true => (stretch - self.rest).max(0.0),
            false => stretch - self.rest,
        }
    }
}

pub(crate) struct Energy<'a> {
    assembly: &'a Assembly,
    pub(crate) terms: Vec<Term>,
    /// Equations of stiff bodies.
    pub(crate) equations: Vec<Row>,
    /// On every coordinate of every point.
    pub(crate) loads: Vec<f64>,
}

impl<'a> Energy<'a> {
    /// Of an assembly without gaps inside members, whose bodies can take what acts on them.
    pub(crate) fn of(assembly: &'a Assembly) -> Option<Self> {
        let dim = assembly.coordinates;
        let mut energy = Energy {
            assembly,
            terms: Vec::new(),
            equations: Vec::new(),
            loads: vec![0.0; assembly.points.len() * dim],
        };
        for &(point, force) in &assembly.forces {
            energy.push(point, force);
        }
        for member in &assembly.members {
            let bar = Bar::of(assembly, member);
            if bar.elements.iter().any(|e| e.gap.is_some()) {
                return None;
            }
            let along: f64 = bar.elements.iter().map(|e| e.load).sum();
            let inside: f64 = bar.station_force[1..].iter().sum();
            let on_ends = match member.carries {
                Some(_) => bar.lumps,
                None => [
                    plus(bar.on_ends[0], scaled(bar.axis, bar.station_force[0])),
                    plus(bar.on_ends[1], scaled(bar.axis, along + inside)),
                ],
            };
            for (end, on) in on_ends.into_iter().enumerate() {
                energy.push(member.ends[end], on);
            }
            let rest = match member.carries {
                Some(_) => bar.rest(),
                None => bar.stretch(0.0),
            };
            let sign = match member.carries {
                Some(Way::Compression) => -1.0,
                _ => 1.0,
            };
            let flexibility: f64 = bar.elements.iter().map(|e| e.flexibility).sum();
            let [a, b] = member.ends;
            let mut row = energy.row(a, scaled(bar.axis, -sign));
            row.extend(energy.row(b, scaled(bar.axis, sign)));
            energy.terms.push(Term {
                row,
                stiffness: Some(1.0 / flexibility),
                rest: sign * rest,
                one_way: member.carries.is_some(),
            });
        }
        for hold in &assembly.holds {
            for direction in directions(hold) {
                let moved = super::assembly::dot(direction, hold.movement);
                let (stiffness, rest, one_way) = match hold.kind {
                    HoldKind::Fixed => (None, moved, false),
                    HoldKind::Spring(stiffness) => (Some(stiffness), moved, false),
                    HoldKind::Stop {
                        clearance,
                        stiffness,
                    } => (stiffness, moved + clearance, true),
                };
                energy.terms.push(Term {
                    row: energy.row(hold.point, direction),
                    stiffness,
                    rest,
                    one_way,
                });
            }
        }
        for body in &assembly.bodies {
            let stiff = Stiff::of(assembly, body);
            if !stiff.takes_its_loads {
                return None;
            }
            let unknowns: Vec<usize> = body
                .points
                .iter()
                .flat_map(|&p| p * dim..(p + 1) * dim)
                .collect();
            for (own, &unknown) in unknowns.iter().enumerate() {
                energy.loads[unknown] += stiff.forces[own];
            }
            for equation in stiff.equations.row_iter() {
                let row = unknowns.iter().copied().zip(equation.iter().copied());
                energy.equations.push(row.collect());
            }
        }
        Some(energy)
    }

    fn row(&self, point: usize, direction: Vector) -> Row {
        let dim = self.assembly.coordinates;
        (0..dim)
            .map(|axis| (point * dim + axis, direction[axis]))
            .collect()
    }

    fn push(&mut self, point: usize, force: Vector) {
        for (unknown, share) in self.row(point, force) {
            self.loads[unknown] += share;
        }
    }

    /// The energy, and the sum of the sizes of its terms.
    pub(crate) fn at(&self, position: &[Vector]) -> (f64, f64) {
        let dim = self.assembly.coordinates;
        let u: Vec<f64> = position.iter().flat_map(|p| p[..dim].to_vec()).collect();
        let (mut energy, mut scale) = (0.0, 0.0);
        for term in &self.terms {
            let stored = term
                .stiffness
                .map_or(0.0, |k| k * term.beyond(&u).powi(2) / 2.0);
            energy += stored;
            scale += stored;
        }
        for (load, u) in self.loads.iter().zip(&u) {
            energy -= load * u;
            scale += (load * u).abs();
        }
        (energy, scale)
    }

    /// A position near another that keeps to what is rigid: free points and bodies that nothing
    /// rigid holds are moved by this share of the largest displacement.
    pub(crate) fn neighbour(
        &self,
        random: &mut Random,
        position: &[Vector],
        share: f64,
    ) -> Vec<Vector> {
        let assembly = self.assembly;
        let dim = assembly.coordinates;
        let largest = position.iter().map(|&u| size(u)).fold(1e-9, f64::max);
        let held = |point: usize| {
            let rigid = |h: &&super::assembly::Hold| {
                h.point == point
                    && !matches!(
                        h.kind,
                        HoldKind::Spring(_)
                            | HoldKind::Stop {
                                stiffness: Some(_),
                                ..
                            }
                    )
            };
            assembly.holds.iter().any(|h| rigid(&h))
        };
        let in_bodies = |point: usize| {
            assembly
                .bodies
                .iter()
                .filter(|b| b.points.contains(&point))
                .count()
        };
        let mut some = |entries: std::ops::Range<usize>| -> Vector {
            std::array::from_fn(|axis| match entries.contains(&axis) {
                true => random.between(-1.0, 1.0) * share * largest,
                false => 0.0,
            })
        };
        let mut near = position.to_vec();
        for (point, at) in near.iter_mut().enumerate() {
            if in_bodies(point) == 0 && !held(point) {
                *at = plus(*at, some(0..dim));
            }
        }
        for body in &assembly.bodies {
            if body.points.iter().any(|&p| held(p) || in_bodies(p) > 1) {
                continue;
            }
            let turns = if dim == 2 { 2..3 } else { 0..3 };
            let (moved, turned) = (some(0..dim), some(turns));
            for &p in &body.points {
                let lever = minus(assembly.points[p], assembly.points[body.points[0]]);
                let turned = if dim == 1 {
                    [0.0; 3]
                } else {
                    cross(turned, lever)
                };
                near[p] = plus(near[p], plus(moved, turned));
            }
        }
        near
    }
}
