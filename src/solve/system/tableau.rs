//! How one-way parts answer each other.
//!
//! In the base every one-way part either acts both ways, or (rigid, and not needed to hold the
//! system) is left out. A part of the base may be let go by a slack: its force then answers. A part
//! left out may be given a force: its clearance then answers. Slacks and forces of the first kind,
//! forces and clearances of the second are pairs that are 0 or more, never both more than 0; the
//! table of their answers is positive semidefinite.

use super::held::{Held, Part, Settled, stretch};
use super::lemke::{End, complement};
use super::{Loads, Row, System};
use crate::quantity::{Length, from_si};
use std::collections::HashSet;

/// An own answer that counts as none beside the part's stiffness.
const NOTHING: f64 = 1e-12;

/// A force of a self-stress that counts as none beside its largest.
const NOISE: f64 = 1e-9;

/// So many covers are tried where the path of one ends in rounding.
const COVERS: usize = 4;

/// The answers of one-way parts to each other: of those whose states came into question, the others
/// stay as they are in the base.
#[derive(Debug, Clone, Default)]
pub(super) struct Tableau {
    parts: Vec<usize>,
    /// By rows, scaled on both sides to diagonals of about 1.
    coefficients: Vec<f64>,
    scale: Vec<f64>,
}

/// What the search for states came to.
pub(super) enum Found {
    /// These parts act.
    States(Vec<bool>),
    /// Nothing stops this motion, along which the loads push.
    Motion(Row),
    /// These rigid parts contradict each other.
    Contradiction(Vec<Part>),
    /// It would take too long.
    Nothing,
}

impl Tableau {
    /// Whether all of these are in it.
    pub(super) fn holds(&self, parts: &[usize]) -> bool {
        self.with(parts) == self.parts.len()
    }

    /// How many it has with these.
    pub(super) fn with(&self, parts: &[usize]) -> usize {
        self.parts.len() + self.missing(parts).len()
    }

    fn missing(&self, parts: &[usize]) -> Vec<usize> {
        let known: HashSet<usize> = self.parts.iter().copied().collect();
        let mut missing = parts.to_vec();
        missing.retain(|part| !known.contains(part));
        missing.sort_unstable();
        missing.dedup();
        missing
    }

    /// Extends it by parts.
    pub(super) fn take_in(&mut self, system: &System, base: &Held, parts: &[usize]) {
        let before = self.parts.len();
        self.parts.append(&mut self.missing(parts));
        let size = self.parts.len();
        if size == before {
            return;
        }
        let mut coefficients = vec![0.0; size * size];
        for (old, new) in self
            .coefficients
            .chunks_exact(before.max(1))
            .zip(coefficients.chunks_exact_mut(size))
        {
            new[..before].copy_from_slice(old);
        }
        let typical = typical_stiffness(system);
        let mut unit = no_loads(system);
        for column in before..size {
            let part = self.parts[column];
            apply(system, base, part, 1.0, &mut unit);
            // Unit loads contradict nothing: what is left out keeps nothing, and the base has no
            // one-way part that depends on others.
            let settled = base.settle(system, &unit).ok();
            apply(system, base, part, -1.0, &mut unit);
            let mut own = 0.0;
            if let Some(settled) = settled {
                for (row, &other) in self.parts.iter().enumerate() {
                    let mut along = answer(system, base, &settled, other, 0.0);
                    if row == column {
                        own = along;
                    }
                    if row < before {
                        along *= self.scale[row];
                        // The answers of two parts to each other are the same; a force to a slack
                        // and a clearance to a force turn.
                        let turned = base.acts[part] != base.acts[other];
                        coefficients[column * size + row] = if turned { -along } else { along };
                    }
                    coefficients[row * size + column] = along;
                }
            }
            let kept = !base.acts[part] && base.keeps(&system.one_way[part].row);
            let stiffness = system.one_way[part].stiffness.map(|k| k.value);
            self.scale.push(if base.acts[part] {
                let least = stiffness.unwrap_or(typical);
                if own > NOTHING * least { own } else { least }
                    .sqrt()
                    .recip()
            } else if own > 0.0 && !kept {
                own.sqrt().recip()
            } else {
                typical.sqrt()
            });
        }
        for row in 0..size {
            let from = if row < before { before } else { 0 };
            let (of_row, rows) = (self.scale[row], &mut coefficients[row * size..][..size]);
            for (column, coefficient) in rows.iter_mut().enumerate().skip(from) {
                if row >= before {
                    *coefficient *= of_row;
                }
                if column >= before {
                    *coefficient *= self.scale[column];
                }
            }
        }
        self.coefficients = coefficients;
        self.leave_out_kept(system, base, before);
    }

    /// Between open parts, one of which is kept whole by rigid parts, only rounding answers.
    fn leave_out_kept(&mut self, system: &System, base: &Held, from: usize) {
        let size = self.parts.len();
        let open = |&place: &usize| !base.acts[self.parts[place]];
        let open: Vec<usize> = (0..size).filter(open).collect();
        for &place in open.iter().filter(|&&place| place >= from) {
            if base.keeps(&system.one_way[self.parts[place]].row) {
                for &other in &open {
                    self.coefficients[place * size + other] = 0.0;
                    self.coefficients[other * size + place] = 0.0;
                }
            }
        }
    }

    /// The states under loads that settle the base so.
    pub(super) fn states(
        &self,
        system: &System,
        base: &Held,
        settled: &Settled,
        loads: &Loads,
    ) -> Found {
        let constants: Vec<f64> = self
            .parts
            .iter()
            .zip(&self.scale)
            .map(|(&part, scale)| {
                let answer = answer(system, base, settled, part, loads.one_way_rest[part].value);
                let zero = if base.acts[part] {
                    loads.zero.force.value
                } else {
                    loads.zero.length.value
                };
                if answer.abs() <= zero {
                    0.0
                } else {
                    answer * scale
                }
            })
            .collect();
        let acting = |pairs: Vec<bool>| {
            let mut acts = base.acts.clone();
            for (&part, given) in self.parts.iter().zip(pairs) {
                acts[part] ^= given;
            }
            acts
        };
        let mut last = Vec::new();
        for cover in 0..COVERS {
            match complement(&self.coefficients, &constants, cover) {
                End::Solved(pairs) => return Found::States(acting(pairs)),
                End::Stopped => return Found::Nothing,
                End::Ray { direction, pairs } => {
                    let mut given = vec![0.0; base.acts.len()];
                    for ((&part, along), scale) in
                        self.parts.iter().zip(&direction).zip(&self.scale)
                    {
                        given[part] = along * scale;
                    }
                    if let Some(proven) = ray(system, base, &given, loads) {
                        return proven;
                    }
                    last = acting(pairs);
                }
            }
        }
        Found::States(last)
    }
}

/// What a ray means: a motion along which the loads push, or rigid parts that contradict. Nothing
/// where neither exceeds what counts as zero: then rounding has made the ray.
fn ray(system: &System, base: &Held, given: &[f64], loads: &Loads) -> Option<Found> {
    let answer = |in_base: bool| {
        let mut along = no_loads(system);
        for (part, &size) in given.iter().enumerate() {
            if base.acts[part] == in_base && size != 0.0 {
                apply(system, base, part, size, &mut along);
            }
        }
        base.settle(system, &along)
    };
    if let Ok(moved) = answer(true) {
        let motion: Vec<f64> = moved.displacements.iter().map(|u| u.value()).collect();
        if motion.iter().any(|&x| x != 0.0) {
            let motion = super::held::largest_to_one(&motion);
            if work(&motion, loads) > loads.zero.force.value {
                return Some(Found::Motion(motion));
            }
        }
    }
    let mut pulled = answer(false).ok()?;
    for (part, &force) in given.iter().enumerate() {
        if !base.acts[part] {
            pulled.one_way[part] = force;
        }
    }
    let rigid = (0..system.rigid.len()).map(Part::Rigid);
    let one_way = (0..system.one_way.len())
        .filter(|&part| system.one_way[part].stiffness.is_none())
        .map(Part::OneWay);
    let mut parts: Vec<(Part, f64)> = rigid
        .chain(one_way)
        .map(|part| (part, *pulled.force(part)))
        .collect();
    let largest = parts
        .iter()
        .fold(0.0_f64, |most, part| most.max(part.1.abs()));
    parts.retain(|part| part.1.abs() > NOISE * largest);
    let room: f64 = parts
        .iter()
        .map(|&(part, force)| force / largest * loads.rest(part))
        .sum();
    let parts = parts.into_iter().map(|entry| entry.0).collect();
    (room < -loads.zero.length.value).then_some(Found::Contradiction(parts))
}

/// The work of the forces on a motion (N, where the motion has no dimension).
pub(super) fn work(motion: &[(usize, f64)], loads: &Loads) -> f64 {
    let on = |&(unknown, share): &(usize, f64)| share * loads.forces[unknown].value;
    motion.iter().map(on).sum()
}

/// The force of a part of the base, the clearance of one that is left out.
fn answer(system: &System, base: &Held, settled: &Settled, part: usize, rest: f64) -> f64 {
    if base.acts[part] {
        settled.one_way[part]
    } else {
        let row = &system.one_way[part].row;
        -stretch(row, &settled.displacements).plus(-rest).value()
    }
}

/// A slack of a part of the base, or a force of one that is left out.
fn apply(system: &System, base: &Held, part: usize, size: f64, loads: &mut Loads) {
    if base.acts[part] {
        loads.one_way_rest[part].value -= size;
    } else {
        for &(unknown, b) in &system.one_way[part].row {
            loads.forces[unknown].value -= b * size;
        }
    }
}

pub(super) fn no_loads(system: &System) -> Loads {
    let lengths = |count: usize| vec![Length::default(); count];
    Loads {
        forces: vec![from_si(0.0); system.places.len()],
        elastic_rest: lengths(system.elastic.len()),
        rigid_value: lengths(system.rigid.len()),
        one_way_rest: lengths(system.one_way.len()),
        zero: super::Threshold::default(),
    }
}

/// The geometric mean of all stiffnesses, 1 N/m where there are none.
fn typical_stiffness(system: &System) -> f64 {
    let elastic = system.elastic.iter().map(|part| part.stiffness);
    let one_way = system.one_way.iter().filter_map(|part| part.stiffness);
    let (sum, count) = elastic
        .chain(one_way)
        .fold((0.0, 0), |(sum, count), k| (sum + k.value.ln(), count + 1));
    if count == 0 {
        1.0
    } else {
        (sum / f64::from(count)).exp()
    }
}
