//! Factors of a stiffness, small or large, with the motions that it leaves free.

use super::Row;
use super::dense::Dense;
use super::order::{Rows, order};
use super::singular::free_directions;
use super::sparse::Sparse;

/// Up to so many unknowns a dense matrix is the faster one.
const SMALL: usize = 96;

/// A pivot smaller than this beside its diagonal is looked at: the motion may be free.
const SUSPICIOUS: f64 = 1e-7;

/// A pivot of rows without stiffness that is smaller than this beside its diagonal may be none.
const LOST: f64 = 1e-10;

/// What a motion of a large system may stretch a row beside the sum of its terms and be free.
const FREE: f64 = 1e-8;

/// Elastic rows with their stiffness (N/m), one after another.
#[derive(Debug, Clone, Default)]
pub(super) struct Springs {
    pub(super) entries: Vec<(usize, f64)>,
    /// Where each row ends.
    pub(super) ends: Vec<usize>,
    pub(super) stiffness: Vec<f64>,
}

impl Rows for Springs {
    fn count(&self) -> usize {
        self.ends.len()
    }

    fn row(&self, index: usize) -> &[(usize, f64)] {
        let from = if index == 0 { 0 } else { self.ends[index - 1] };
        &self.entries[from..self.ends[index]]
    }
}

/// What solves a stiffness.
#[derive(Debug, Clone)]
enum Factors {
    Dense(Dense),
    Sparse(Box<Sparse>),
}

/// A stiffness factored; its free motions pinned in one unknown each.
#[derive(Debug, Clone)]
pub(super) struct Factored {
    factors: Factors,
    pub(super) pinned: Vec<usize>,
    pub(super) motions: Vec<Row>,
    /// See [`super::Answer::condition`].
    pub(super) condition: f64,
}

impl Factored {
    pub(super) fn of(springs: &Springs, places: &[[f64; 3]]) -> Self {
        if places.len() > SMALL
            && let Some(made) = Self::sparse(springs, places)
        {
            return made;
        }
        Self::dense(springs, places.len())
    }

    fn dense(springs: &Springs, size: usize) -> Self {
        let factor = |pinned: &[usize]| {
            let rows = (0..springs.count()).map(|row| (springs.stiffness[row], springs.row(row)));
            Dense::of(size, rows, pinned)
        };
        let mut dense = factor(&[]);
        let mut made = (Vec::new(), Vec::new(), dense.growth());
        if dense.growth() > 1.0 / SUSPICIOUS {
            let rows = (0..springs.count()).map(|row| springs.row(row));
            let free = free_directions(size, rows);
            if !free.pins.is_empty() {
                dense = factor(&free.pins);
            }
            let condition = dense.growth().min(free.least.powi(-2));
            let sparse = free.motions.iter().map(|motion| without_zeros(motion));
            made = (free.pins, sparse.collect(), condition);
        }
        let (pinned, motions, condition) = made;
        Factored {
            factors: Factors::Dense(dense),
            pinned,
            motions,
            condition,
        }
    }

    /// Where a pivot is small, the rows are factored once more without their stiffness: what is
    /// lost there is lost by geometry. Each such motion is then looked at row by row.
    fn sparse(springs: &Springs, places: &[[f64; 3]]) -> Option<Self> {
        let stiffness = |row: usize| springs.stiffness[row];
        let untouched = untouched(springs, places.len());
        let order = order(places, springs);
        let first = Sparse::of(springs, stiffness, &untouched, LOST, Err(order))?;
        let mut motions: Vec<Row> = untouched.iter().map(|&u| vec![(u, 1.0)]).collect();
        let mut pinned = untouched;
        let whole = |sparse: Sparse, condition, pinned, motions| Factored {
            factors: Factors::Sparse(Box::new(sparse)),
            pinned,
            motions,
            condition,
        };
        if first.replaced.is_empty() && first.growth <= 1.0 / SUSPICIOUS {
            let condition = first.growth;
            return Some(whole(first, condition, pinned, motions));
        }
        let pattern = first.pattern().clone();
        drop(first);
        let unit = |row: usize| {
            let size: f64 = springs.row(row).iter().map(|entry| entry.1 * entry.1).sum();
            if size > 0.0 { size.recip() } else { 0.0 }
        };
        let geometry = Sparse::of(springs, unit, &pinned, LOST, Ok(pattern.clone()))?;
        let mut condition = geometry.growth;
        for &pin in &geometry.replaced {
            match motion(springs, &geometry, pin) {
                Some(motion) => {
                    motions.push(motion);
                    pinned.push(pin);
                }
                // Almost a mechanism: its pivot is about the part that was taken for lost.
                None => condition = condition.max(1.0 / LOST),
            }
        }
        drop(geometry);
        let last = Sparse::of(springs, stiffness, &pinned, f64::EPSILON, Ok(pattern))?;
        let condition = condition.min(last.growth);
        Some(whole(last, condition, pinned, motions))
    }

    /// Puts the solution in the place of the right side; pinned unknowns are 0.
    pub(super) fn solve(&self, x: &mut [f64]) {
        for &pin in &self.pinned {
            x[pin] = 0.0;
        }
        match &self.factors {
            Factors::Dense(dense) => dense.solve(x),
            Factors::Sparse(sparse) => sparse.solve(x),
        }
    }
}

fn without_zeros(motion: &[f64]) -> Row {
    let entries = motion.iter().copied().enumerate();
    entries.filter(|entry| entry.1 != 0.0).collect()
}

/// Unknowns in no row.
fn untouched(springs: &Springs, size: usize) -> Vec<usize> {
    let mut touched = vec![false; size];
    for &(unknown, _) in &springs.entries {
        touched[unknown] = true;
    }
    (0..size).filter(|&unknown| !touched[unknown]).collect()
}

/// The motion of a lost pivot, where it is free: what answers a force there, since a lost pivot is
/// held by a spring of its own.
fn motion(springs: &Springs, geometry: &Sparse, pin: usize) -> Option<Row> {
    let mut moved = vec![0.0; geometry.size()];
    moved[pin] = 1.0;
    geometry.solve(&mut moved);
    let own = moved[pin];
    let largest = moved.iter().fold(0.0_f64, |most, x| most.max(x.abs()));
    for x in &mut moved {
        *x = if x.abs() > FREE * largest {
            *x / own
        } else {
            0.0
        };
    }
    let stretched = (0..springs.count()).any(|row| {
        let (sum, size) = springs
            .row(row)
            .iter()
            .fold((0.0, 0.0_f64), |(sum, size), &(u, b)| {
                (sum + b * moved[u], size + (b * moved[u]).abs())
            });
        sum.abs() > FREE * size
    });
    (!stretched).then(|| without_zeros(&moved))
}
