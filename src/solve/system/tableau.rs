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

/// An own answer that counts as none beside the part's stiffness.
const NOTHING: f64 = 1e-12;

/// A force of a self-stress that counts as none beside its largest.
const NOISE: f64 = 1e-9;

/// So many covers are tried where the path of one ends in rounding.
const COVERS: usize = 4;

/// The answers of one-way parts to each other.
#[derive(Debug, Clone)]
pub(super) struct Tableau {
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
}

impl Tableau {
    pub(super) fn of(system: &System, base: &Held) -> Self {
        let parts = system.one_way.len();
        let typical = typical_stiffness(system);
        let mut coefficients = vec![0.0; parts * parts];
        for part in 0..parts {
            let mut unit = no_loads(system);
            apply(system, base, part, 1.0, &mut unit);
            // Unit loads contradict nothing: what is left out keeps nothing, and the base has no
            // one-way part that depends on others.
            let Ok(settled) = base.settle(system, &unit) else {
                continue;
            };
            for (other, answer) in answers(system, base, &settled, &unit)
                .into_iter()
                .enumerate()
            {
                coefficients[other * parts + part] = answer;
            }
        }
        let scale: Vec<f64> = (0..parts)
            .map(|part| {
                let own = coefficients[part * parts + part];
                let stiffness = system.one_way[part].stiffness.map(|k| k.value);
                if base.acts[part] {
                    let least = stiffness.unwrap_or(typical);
                    if own > NOTHING * least { own } else { least }
                        .sqrt()
                        .recip()
                } else if own > 0.0 && !base.keeps(&system.one_way[part].row) {
                    own.sqrt().recip()
                } else {
                    typical.sqrt()
                }
            })
            .collect();
        for (index, coefficient) in coefficients.iter_mut().enumerate() {
            *coefficient *= scale[index / parts] * scale[index % parts];
        }
        for part in (0..parts).filter(|&part| !base.acts[part]) {
            if base.keeps(&system.one_way[part].row) {
                for other in (0..parts).filter(|&other| !base.acts[other]) {
                    coefficients[part * parts + other] = 0.0;
                    coefficients[other * parts + part] = 0.0;
                }
            }
        }
        Tableau {
            coefficients,
            scale,
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
        let constants: Vec<f64> = answers(system, base, settled, loads)
            .into_iter()
            .enumerate()
            .map(|(part, answer)| {
                let zero = if base.acts[part] {
                    loads.zero.force.value
                } else {
                    loads.zero.length.value
                };
                if answer.abs() <= zero {
                    0.0
                } else {
                    answer * self.scale[part]
                }
            })
            .collect();
        let acting = |pairs: Vec<bool>| {
            let pairs = pairs.into_iter().zip(&base.acts);
            pairs.map(|(given, &in_base)| given != in_base).collect()
        };
        let mut last = Vec::new();
        for cover in 0..COVERS {
            match complement(&self.coefficients, &constants, cover) {
                End::Solved(pairs) => return Found::States(acting(pairs)),
                End::Ray { direction, pairs } => {
                    let scaled = direction.iter().zip(&self.scale);
                    let given: Vec<f64> =
                        scaled.map(|(direction, scale)| direction * scale).collect();
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

/// The force of each part of the base, the clearance of each that is left out.
fn answers(system: &System, base: &Held, settled: &Settled, loads: &Loads) -> Vec<f64> {
    (0..system.one_way.len())
        .map(|part| {
            if base.acts[part] {
                settled.one_way[part]
            } else {
                let row = &system.one_way[part].row;
                let rest = loads.one_way_rest[part].value;
                -stretch(row, &settled.displacements).plus(-rest).value()
            }
        })
        .collect()
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
