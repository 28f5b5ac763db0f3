//! The system in one set of states, held and factored: every acting part pulls and pushes.

use super::choice::Couplings;
use super::factor::{Factored, Springs};
use super::rigid::{Elimination, Workspace};
use super::singular::free_directions;
use super::tableau::work;
use super::twofold::Twofold;
use super::{Loads, Row, System};

/// A residual of so many roundings of its terms needs no more refinement.
const STILL: f64 = 8.0 * f64::EPSILON;

/// Refinement that goes on for so long would not end.
const ROUNDS: usize = 10;

/// Of so many pushed motions the one pushed most is looked for; beyond it any of them tells enough.
const MIXED: usize = 32;

/// Which part a row belongs to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub(super) enum Part {
    Elastic(usize),
    Rigid(usize),
    OneWay(usize),
}

/// A system whose one-way parts that act are taken to act both ways, the others not at all.
#[derive(Debug, Clone)]
pub(super) struct Held {
    /// By one-way part.
    pub(super) acts: Vec<bool>,
    /// What each eliminated row belongs to.
    rigid: Vec<Part>,
    unknowns: usize,
    elimination: Elimination,
    springs: Vec<(Part, f64)>,
    factored: Factored,
    /// Motions that nothing resists.
    pub(super) motions: Vec<Row>,
}

/// Displacements and forces in one set of states.
#[derive(Debug, Clone)]
pub(super) struct Settled {
    pub(super) displacements: Vec<Twofold>,
    pub(super) elastic: Vec<f64>,
    pub(super) rigid: Vec<f64>,
    pub(super) one_way: Vec<f64>,
}

impl Held {
    pub(super) fn of(system: &System, acts: Vec<bool>) -> Self {
        let unknowns = system.places.len();
        let mut rigid: Vec<Part> = (0..system.rigid.len()).map(Part::Rigid).collect();
        let mut springs: Vec<(Part, f64)> = system
            .elastic
            .iter()
            .enumerate()
            .map(|(index, part)| (Part::Elastic(index), part.stiffness.value))
            .collect();
        for (index, part) in system.one_way.iter().enumerate() {
            if acts[index] {
                match part.stiffness {
                    Some(stiffness) => springs.push((Part::OneWay(index), stiffness.value)),
                    None => rigid.push(Part::OneWay(index)),
                }
            }
        }
        let rows: Vec<&[(usize, f64)]> = rigid.iter().map(|&part| system.row(part)).collect();
        let elimination = Elimination::of(&rows, unknowns);

        let mut workspace = Workspace::new(unknowns);
        let mut reduced = Springs::default();
        for &(part, stiffness) in &springs {
            elimination.reduce_row(system.row(part), &mut workspace, &mut reduced.entries);
            reduced.ends.push(reduced.entries.len());
            reduced.stiffness.push(stiffness);
        }
        let places: Vec<[f64; 3]> = elimination
            .free()
            .iter()
            .map(|&unknown| system.places[unknown])
            .collect();
        let factored = Factored::of(&reduced, &places);
        let motions = factored
            .motions
            .iter()
            .map(|motion| elimination.expand_motion(motion))
            .collect();
        Held {
            acts,
            rigid,
            unknowns,
            elimination,
            springs,
            factored,
            motions,
        }
    }

    /// See [`super::Answer::condition`].
    pub(super) fn condition(&self) -> f64 {
        self.factored.condition
    }

    /// Displacements and forces under loads, free motions at 0 in their pinned unknown; or the
    /// rigid parts that contradict each other.
    pub(super) fn settle(&self, system: &System, loads: &Loads) -> Result<Settled, Vec<Part>> {
        let values: Vec<f64> = self.rigid.iter().map(|&part| loads.rest(part)).collect();
        let values = self
            .elimination
            .values(&values, loads.zero.length.value)
            .map_err(|rows| {
                rows.into_iter()
                    .map(|row| self.rigid[row])
                    .collect::<Vec<_>>()
            })?;

        let unknowns = system.places.len();
        let mut settled = Settled {
            displacements: vec![Twofold::default(); unknowns],
            elastic: vec![0.0; system.elastic.len()],
            rigid: vec![0.0; system.rigid.len()],
            one_way: vec![0.0; system.one_way.len()],
        };
        let free = self.elimination.free();
        let mut left = vec![Twofold::default(); free.len()];
        let mut correction = vec![0.0; free.len()];
        let mut unbalanced = vec![Twofold::default(); unknowns];
        let mut sizes = vec![0.0; unknowns];
        let mut worst = f64::INFINITY;
        for round in 0..=ROUNDS {
            self.elimination
                .expand(&left, &values, &mut settled.displacements);
            self.balance(system, loads, &mut settled, &mut unbalanced, &mut sizes);
            self.elimination.gather(&mut unbalanced, &mut sizes);
            for (x, &unknown) in correction.iter_mut().zip(free) {
                *x = unbalanced[unknown].value();
            }
            for &pin in &self.factored.pinned {
                correction[pin] = 0.0;
            }
            let largest = correction
                .iter()
                .zip(free)
                .filter(|(x, _)| **x != 0.0)
                .map(|(x, &unknown)| x.abs() / sizes[unknown].max(loads.zero.force.value))
                .fold(0.0, f64::max);
            // Once the residual no longer halves, it is rounding.
            if largest <= STILL || (round > 1 && largest > 0.5 * worst) {
                break;
            }
            worst = largest;
            self.factored.solve(&mut correction);
            for (sum, &more) in left.iter_mut().zip(&correction) {
                *sum = sum.plus(more);
            }
        }
        let forces = self.elimination.row_forces(&unbalanced);
        for (&part, force) in self.rigid.iter().zip(forces) {
            *settled.force(part) = force;
        }
        Ok(settled)
    }

    /// Forces of all springs at the displacements, and what they leave of the loads on each
    /// unknown, with the sum of the sizes there.
    fn balance(
        &self,
        system: &System,
        loads: &Loads,
        settled: &mut Settled,
        unbalanced: &mut [Twofold],
        sizes: &mut [f64],
    ) {
        for ((left, size), force) in unbalanced.iter_mut().zip(&mut *sizes).zip(&loads.forces) {
            *left = Twofold::from(force.value);
            *size = force.value.abs();
        }
        for &(part, stiffness) in &self.springs {
            let row = system.row(part);
            let force = stretch(row, &settled.displacements)
                .plus(-loads.rest(part))
                .times(stiffness);
            let rounded = force.value();
            *settled.force(part) = rounded;
            for &(unknown, b) in row {
                unbalanced[unknown] = unbalanced[unknown].plus_product(-b, force);
                sizes[unknown] += (b * rounded).abs();
            }
        }
    }

    /// Whether a row cannot be stretched, since rigid parts keep all of it.
    pub(super) fn keeps(&self, row: &[(usize, f64)]) -> bool {
        let mut left = Vec::new();
        let mut workspace = Workspace::new(self.unknowns);
        self.elimination.reduce_row(row, &mut workspace, &mut left);
        left.is_empty()
    }

    /// What the eliminated rows belong to.
    pub(super) fn rigid(&self) -> &[Part] {
        &self.rigid
    }

    /// Every way in which the rigid parts that act can pull against each other.
    pub(super) fn self_stresses(&self) -> Vec<Vec<(Part, f64)>> {
        over_parts(&self.rigid, self.elimination.self_stresses())
    }

    /// Rigid one-way parts, as few as hold all of the motions that rigid one-way parts can hold.
    pub(super) fn needed(&self, system: &System) -> Vec<usize> {
        let rigid = |part: &usize| system.one_way[*part].stiffness.is_none();
        let parts: Vec<usize> = (0..system.one_way.len()).filter(rigid).collect();
        if parts.is_empty() || self.motions.is_empty() {
            return Vec::new();
        }
        // A choice of independent rows is a choice of pivots of the transposed table.
        let mut couplings = Couplings::of(system, &self.motions);
        let mut transposed = vec![Row::new(); self.motions.len()];
        for (place, &part) in parts.iter().enumerate() {
            for (motion, along) in couplings.with(&system.one_way[part].row) {
                transposed[motion].push((place, along));
            }
        }
        let free = free_directions(parts.len(), transposed.iter().map(Row::as_slice));
        let mut needed = vec![true; parts.len()];
        for pin in free.pins {
            needed[pin] = false;
        }
        let chosen = parts.into_iter().zip(needed);
        chosen
            .filter(|(_, needed)| *needed)
            .map(|(part, _)| part)
            .collect()
    }

    /// Of the free motions that are pushed the mixture that is pushed most, for its size.
    pub(super) fn pushed_motion(&self, loads: &Loads) -> Row {
        // The forces less what is square to all motions: a projection on a basis made square.
        let mut square: Vec<Vec<f64>> = Vec::new();
        let mut along = vec![0.0; self.unknowns];
        let dot = |a: &[f64], b: &[f64]| a.iter().zip(b).map(|(a, b)| a * b).sum::<f64>();
        let pushed = |motion: &&Row| work(motion, loads).abs() > loads.zero.force.value;
        for motion in self.motions.iter().filter(pushed).take(MIXED) {
            let mut rest = vec![0.0; self.unknowns];
            for &(unknown, share) in motion {
                rest[unknown] = share;
            }
            for other in &square {
                let share = dot(&rest, other);
                rest.iter_mut()
                    .zip(other)
                    .for_each(|(x, o)| *x -= share * o);
            }
            let size = dot(&rest, &rest).sqrt();
            rest.iter_mut().for_each(|x| *x /= size);
            let push: f64 = rest
                .iter()
                .zip(&loads.forces)
                .map(|(x, f)| x * f.value)
                .sum();
            along
                .iter_mut()
                .zip(&rest)
                .for_each(|(a, x)| *a += push * x);
            square.push(rest);
        }
        largest_to_one(&along)
    }
}

/// Every way in which rigid parts can pull against each other.
pub(super) fn self_stresses(system: &System, parts: Vec<Part>) -> Vec<Vec<(Part, f64)>> {
    let rows: Vec<&[(usize, f64)]> = parts.iter().map(|&part| system.row(part)).collect();
    let elimination = Elimination::of(&rows, system.places.len());
    over_parts(&parts, elimination.self_stresses())
}

fn over_parts(parts: &[Part], found: Vec<Vec<(usize, f64)>>) -> Vec<Vec<(Part, f64)>> {
    let by_part = |rows: Vec<(usize, f64)>| {
        let rows = rows.into_iter();
        rows.map(|(row, force)| (parts[row], force)).collect()
    };
    found.into_iter().map(by_part).collect()
}

impl Settled {
    pub(super) fn force(&mut self, part: Part) -> &mut f64 {
        match part {
            Part::Elastic(index) => &mut self.elastic[index],
            Part::Rigid(index) => &mut self.rigid[index],
            Part::OneWay(index) => &mut self.one_way[index],
        }
    }
}

impl System {
    pub(super) fn row(&self, part: Part) -> &[(usize, f64)] {
        match part {
            Part::Elastic(index) => &self.elastic[index].row,
            Part::Rigid(index) => &self.rigid[index],
            Part::OneWay(index) => &self.one_way[index].row,
        }
    }
}

impl Loads {
    /// The stretch at which a part carries nothing, or that it keeps (m).
    pub(super) fn rest(&self, part: Part) -> f64 {
        match part {
            Part::Elastic(index) => self.elastic_rest[index].value,
            Part::Rigid(index) => self.rigid_value[index].value,
            Part::OneWay(index) => self.one_way_rest[index].value,
        }
    }
}

/// The stretch along a row.
pub(super) fn stretch(row: &[(usize, f64)], displacements: &[Twofold]) -> Twofold {
    row.iter().fold(Twofold::default(), |sum, &(unknown, b)| {
        sum.plus_product(b, displacements[unknown])
    })
}

/// A motion as a row, its largest entry 1 in size; entries that are 0 are left out.
pub(super) fn largest_to_one(motion: &[f64]) -> Row {
    let largest = motion.iter().fold(0.0_f64, |most, x| most.max(x.abs()));
    motion
        .iter()
        .enumerate()
        .filter(|(_, x)| x.abs() > f64::EPSILON * largest)
        .map(|(unknown, x)| (unknown, x / largest))
        .collect()
}
