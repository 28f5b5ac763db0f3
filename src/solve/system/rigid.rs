//! Rigid rows are eliminated exactly: each removes one unknown.
//!
//! Gaussian elimination over sparse rows, the largest coefficient as pivot. Every step says its
//! unknown as a value less multiples of unknowns that are removed later or never; nothing is
//! approximated by a large stiffness. Rows that depend on others remove nothing: they are kept as
//! dependencies, over which values can contradict and forces stay undecided.

use super::twofold::Twofold;
use std::cmp::Reverse;
use std::collections::{BTreeMap, BinaryHeap};

/// What a coefficient may be of the sum of the sizes it is left over from, to count as none.
const CANCELLED: f64 = 1e-12;

/// An entry of a list by unknown where there is none.
const NONE: usize = usize::MAX;

/// The rows of one set, eliminated.
#[derive(Debug, Clone)]
pub(super) struct Elimination {
    steps: Vec<Step>,
    dependencies: Vec<Dependency>,
    rows: usize,
    /// By unknown: the step that removes it, or `NONE`.
    removed_by: Vec<usize>,
    /// The unknowns that are left, in order.
    free: Vec<usize>,
    /// By unknown: its place among those that are left, or `NONE`.
    place: Vec<usize>,
}

/// One unknown removed: unknown = value − Σ coefficient × other unknown.
#[derive(Debug, Clone)]
struct Step {
    row: usize,
    unknown: usize,
    pivot: f64,
    others: Vec<(usize, f64)>,
    /// Earlier steps, and how often each was taken off the row.
    taken_off: Vec<(usize, f64)>,
}

/// A row that follows from others.
#[derive(Debug, Clone)]
struct Dependency {
    row: usize,
    taken_off: Vec<(usize, f64)>,
}

impl Elimination {
    /// Of `rows` over as many `unknowns`. Short rows go first, since they fill the others least.
    pub(super) fn of(rows: &[&[(usize, f64)]], unknowns: usize) -> Self {
        let mut order: Vec<usize> = (0..rows.len()).collect();
        order.sort_by_key(|&row| rows[row].len());
        let mut made = Elimination {
            steps: Vec::with_capacity(rows.len()),
            dependencies: Vec::new(),
            rows: rows.len(),
            removed_by: vec![NONE; unknowns],
            free: Vec::new(),
            place: vec![NONE; unknowns],
        };
        let mut workspace = Workspace::new(unknowns);
        for row in order {
            let taken_off = made.substitute(rows[row], &mut workspace);
            let left = workspace.take();
            let pivot = left
                .iter()
                .fold(None, |most: Option<(usize, f64)>, &entry| match most {
                    Some(most) if most.1.abs() >= entry.1.abs() => Some(most),
                    _ => Some(entry),
                });
            let Some((unknown, pivot)) = pivot else {
                made.dependencies.push(Dependency { row, taken_off });
                continue;
            };
            made.removed_by[unknown] = made.steps.len();
            made.steps.push(Step {
                row,
                unknown,
                pivot,
                others: left
                    .iter()
                    .filter(|entry| entry.0 != unknown)
                    .map(|&(other, coefficient)| (other, coefficient / pivot))
                    .collect(),
                taken_off,
            });
        }
        for (unknown, step) in made.removed_by.iter().enumerate() {
            if *step == NONE {
                made.place[unknown] = made.free.len();
                made.free.push(unknown);
            }
        }
        made
    }

    /// How many unknowns are left.
    pub(super) fn free(&self) -> &[usize] {
        &self.free
    }

    /// Adds a row over the unknowns that are left, by their rising places among them.
    pub(super) fn reduce_row(
        &self,
        row: &[(usize, f64)],
        workspace: &mut Workspace,
        reduced: &mut Vec<(usize, f64)>,
    ) {
        let from = reduced.len();
        if row.iter().all(|entry| self.removed_by[entry.0] == NONE) {
            reduced.extend(row.iter().map(|&(u, b)| (self.place[u], b)));
        } else {
            self.substitute(row, workspace);
            workspace.drain(|unknown, b| reduced.push((self.place[unknown], b)));
        }
        reduced[from..].sort_unstable_by_key(|entry| entry.0);
    }

    /// Puts a row into the workspace and replaces what was removed, in order of removal. Gives the
    /// steps taken off and how often.
    fn substitute(&self, row: &[(usize, f64)], workspace: &mut Workspace) -> Vec<(usize, f64)> {
        let mut taken_off = Vec::new();
        for &(unknown, coefficient) in row {
            workspace.add(unknown, coefficient, self.removed_by[unknown]);
        }
        while let Some(Reverse(index)) = workspace.pending.pop() {
            let step = &self.steps[index];
            let times = workspace.remove(step.unknown);
            if times == 0.0 {
                continue;
            }
            taken_off.push((index, times));
            for &(other, coefficient) in &step.others {
                workspace.add(other, -times * coefficient, self.removed_by[other]);
            }
        }
        taken_off
    }

    /// The values of the steps for values of the rows, or the dependency that contradicts: its
    /// rows, where the values miss it by more than `zero`.
    pub(super) fn values(&self, rows: &[f64], zero: f64) -> Result<Vec<f64>, Vec<usize>> {
        let mut values = Vec::with_capacity(self.steps.len());
        for step in &self.steps {
            let value = left_over(rows[step.row], &step.taken_off, &values);
            values.push(value / step.pivot);
        }
        for dependency in &self.dependencies {
            if left_over(rows[dependency.row], &dependency.taken_off, &values).abs() > zero {
                let rows = self.over_rows(dependency);
                return Err(rows.into_iter().map(|entry| entry.0).collect());
            }
        }
        Ok(values)
    }

    /// All unknowns from those that are left and the values of the steps.
    pub(super) fn expand(&self, left: &[Twofold], values: &[f64], all: &mut [Twofold]) {
        for (&unknown, &value) in self.free.iter().zip(left) {
            all[unknown] = value;
        }
        for (step, &value) in self.steps.iter().zip(values).rev() {
            let mut sum = Twofold::from(value);
            for &(other, coefficient) in &step.others {
                sum = sum.plus_product(-coefficient, all[other]);
            }
            all[step.unknown] = sum;
        }
    }

    /// A motion of all unknowns from one of those that are left, its largest entry 1 in size.
    pub(super) fn expand_motion(&self, left: &[(usize, f64)]) -> Vec<(usize, f64)> {
        let mut all: BTreeMap<usize, f64> = left
            .iter()
            .map(|&(place, share)| (self.free[place], share))
            .collect();
        if !self.steps.is_empty() {
            for step in self.steps.iter().rev() {
                let (mut sum, mut size) = (0.0, 0.0_f64);
                for (other, coefficient) in &step.others {
                    let term = coefficient * all.get(other).copied().unwrap_or(0.0);
                    sum -= term;
                    size += term.abs();
                }
                if sum.abs() > CANCELLED * size {
                    all.insert(step.unknown, sum);
                }
            }
        }
        let largest = all.values().fold(0.0_f64, |most, x| most.max(x.abs()));
        let entries = all.into_iter();
        entries.map(|(unknown, x)| (unknown, x / largest)).collect()
    }

    /// Moves forces on removed unknowns to those that are left. On a removed unknown stays what its
    /// step must bear. `sizes` are moved alike without signs.
    pub(super) fn gather(&self, forces: &mut [Twofold], sizes: &mut [f64]) {
        for step in &self.steps {
            let (force, size) = (forces[step.unknown], sizes[step.unknown]);
            for &(other, coefficient) in &step.others {
                forces[other] = forces[other].plus_product(-coefficient, force);
                sizes[other] += coefficient.abs() * size;
            }
        }
    }

    /// The forces of the rows that bear what `gather` left on the removed unknowns; none in rows
    /// that depend on others.
    pub(super) fn row_forces(&self, gathered: &[Twofold]) -> Vec<f64> {
        let mut rows = vec![0.0; self.rows];
        let mut borne: Vec<f64> = self
            .steps
            .iter()
            .map(|step| gathered[step.unknown].value())
            .collect();
        for (index, step) in self.steps.iter().enumerate().rev() {
            let force = borne[index] / step.pivot;
            rows[step.row] = force;
            for &(earlier, times) in &step.taken_off {
                borne[earlier] -= times * force;
            }
        }
        rows
    }

    /// Every way in which the rows can pull against each other without any force on the unknowns:
    /// rows and their forces.
    pub(super) fn self_stresses(&self) -> Vec<Vec<(usize, f64)>> {
        self.dependencies
            .iter()
            .map(|dependency| self.over_rows(dependency))
            .collect()
    }

    /// A dependency's multiples of the rows themselves, its own row first.
    fn over_rows(&self, dependency: &Dependency) -> Vec<(usize, f64)> {
        let mut rows = vec![(dependency.row, 1.0)];
        let mut times: BTreeMap<usize, f64> = BTreeMap::new();
        for &(step, more) in &dependency.taken_off {
            *times.entry(step).or_default() -= more;
        }
        // A step is a multiple of its row less earlier steps, so the latest goes first.
        while let Some((index, times_of_step)) = times.pop_last() {
            let step = &self.steps[index];
            let share = times_of_step / step.pivot;
            if share.abs() > CANCELLED {
                rows.push((step.row, share));
            }
            for &(earlier, more) in &step.taken_off {
                *times.entry(earlier).or_default() -= more * share;
            }
        }
        rows
    }
}

fn left_over(value: f64, taken_off: &[(usize, f64)], values: &[f64]) -> f64 {
    taken_off
        .iter()
        .fold(value, |left, &(step, times)| left - times * values[step])
}

/// A row in work: dense by unknown, emptied after each row.
#[derive(Debug)]
pub(super) struct Workspace {
    value: Vec<f64>,
    /// The sum of the sizes that made the value; less than 0 where the unknown is not in the row.
    size: Vec<f64>,
    touched: Vec<usize>,
    /// Steps to be taken off.
    pending: BinaryHeap<Reverse<usize>>,
}

impl Workspace {
    pub(super) fn new(unknowns: usize) -> Self {
        Workspace {
            value: vec![0.0; unknowns],
            size: vec![-1.0; unknowns],
            touched: Vec::new(),
            pending: BinaryHeap::new(),
        }
    }

    fn add(&mut self, unknown: usize, coefficient: f64, removed_by: usize) {
        if self.size[unknown] < 0.0 {
            self.size[unknown] = 0.0;
            self.touched.push(unknown);
            if removed_by != NONE {
                self.pending.push(Reverse(removed_by));
            }
        }
        self.value[unknown] += coefficient;
        self.size[unknown] += coefficient.abs();
    }

    /// What stands at an unknown, 0 where it only is what rounding left; nothing is left there.
    fn remove(&mut self, unknown: usize) -> f64 {
        let value = std::mem::take(&mut self.value[unknown]);
        let size = std::mem::take(&mut self.size[unknown]);
        if value.abs() > CANCELLED * size {
            value
        } else {
            0.0
        }
    }

    /// Hands out all entries that are not 0, and empties the row.
    fn drain(&mut self, mut each: impl FnMut(usize, f64)) {
        while let Some(unknown) = self.touched.pop() {
            let value = self.remove(unknown);
            self.size[unknown] = -1.0;
            if value != 0.0 {
                each(unknown, value);
            }
        }
    }

    /// All entries that are not 0, by rising unknown.
    fn take(&mut self) -> Vec<(usize, f64)> {
        let mut entries = Vec::with_capacity(self.touched.len());
        self.drain(|unknown, value| entries.push((unknown, value)));
        entries.sort_unstable_by_key(|entry| entry.0);
        entries
    }
}
