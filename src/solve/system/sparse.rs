//! Cholesky factors of a large symmetric matrix, in an order of nested dissection.

use super::order::Rows;
use faer::dyn_stack::{MemBuffer, MemStack};
use faer::linalg::cholesky::llt::factor::LltRegularization;
use faer::perm::PermRef;
use faer::sparse::linalg::cholesky::{
    CholeskySymbolicParams, LltRef, SymbolicCholesky, SymbolicCholeskyRaw, SymmetricOrdering,
    factorize_symbolic_cholesky, supernodal::SupernodalLltRef,
};
use faer::sparse::{SparseColMatRef, SymbolicSparseColMat};
use faer::{Conj, MatMut, Par, Side};
use std::sync::Arc;

/// What a lost pivot is replaced by; scaled to diagonals of 1, no other is larger than 1.
const REPLACED: f64 = 4.0;

/// The pattern of Σ stiffness × row rowᵀ over rows, with its order of elimination.
#[derive(Debug, Clone)]
pub(super) struct Pattern {
    lower: Arc<SymbolicSparseColMat<usize>>,
    factors: Arc<SymbolicCholesky<usize>>,
    order: Arc<[usize]>,
}

/// Factors over one pattern.
#[derive(Debug, Clone)]
pub(super) struct Sparse {
    pattern: Pattern,
    factors: Vec<f64>,
    /// One over the root of each diagonal.
    scale: Vec<f64>,
    /// Pivots that were lost in rounding and replaced: the unknowns are held there by a spring of
    /// about their own stiffness.
    pub(super) replaced: Vec<usize>,
    /// The largest of diagonal over pivot, of those that were not replaced.
    pub(super) growth: f64,
}

/// The lower half by columns.
struct Lower {
    starts: Vec<usize>,
    unknowns: Vec<usize>,
    values: Vec<f64>,
}

impl Pattern {
    /// None where memory does not suffice.
    fn of(lower: &Lower, order: Vec<usize>) -> Option<Self> {
        let size = order.len();
        let mut position = vec![0; size];
        for (at, &unknown) in order.iter().enumerate() {
            position[unknown] = at;
        }
        let lower = SymbolicSparseColMat::new_checked(
            size,
            size,
            lower.starts.clone(),
            None,
            lower.unknowns.clone(),
        );
        let ordering = SymmetricOrdering::Custom(PermRef::new_checked(&order, &position, size));
        let params = CholeskySymbolicParams::default();
        let factors = factorize_symbolic_cholesky(lower.as_ref(), Side::Lower, ordering, params);
        Some(Pattern {
            factors: Arc::new(factors.ok()?),
            lower: Arc::new(lower),
            order: order.into(),
        })
    }
}

impl Sparse {
    /// Of Σ stiffness × row rowᵀ. Unknowns that are `pinned` stay 0. Pivots below `lost` of their
    /// diagonal are replaced. A pattern of the same rows is taken over. None where memory does not
    /// suffice.
    pub(super) fn of(
        rows: &impl Rows,
        stiffness: impl Fn(usize) -> f64,
        pinned: &[usize],
        lost: f64,
        pattern: Result<Pattern, Vec<usize>>,
    ) -> Option<Self> {
        let size = match &pattern {
            Ok(pattern) => pattern.order.len(),
            Err(order) => order.len(),
        };
        let mut lower = Lower::of(rows, stiffness, pinned, size);
        let scale: Vec<f64> = (0..size)
            .map(|unknown| lower.values[lower.starts[unknown]].sqrt().recip())
            .collect();
        for column in 0..size {
            for at in lower.starts[column]..lower.starts[column + 1] {
                lower.values[at] *= scale[column] * scale[lower.unknowns[at]];
            }
        }
        let pattern = match pattern {
            Ok(pattern) => pattern,
            Err(order) => Pattern::of(&lower, order)?,
        };
        let symbolic = &pattern.factors;
        let mut factors = vec![0.0; symbolic.len_val()];
        let needs = symbolic.factorize_numeric_llt_scratch::<f64>(Par::Seq, Default::default());
        let mut memory = MemBuffer::try_new(needs).ok()?;
        // What lies below the smallest double is not lost but made the smallest that is left.
        let replaced = if lost > f64::EPSILON { REPLACED } else { lost };
        let done = symbolic.factorize_numeric_llt(
            &mut factors,
            SparseColMatRef::new(pattern.lower.as_ref().as_ref(), &lower.values),
            Side::Lower,
            LltRegularization {
                dynamic_regularization_delta: replaced,
                dynamic_regularization_epsilon: lost,
            },
            Par::Seq,
            MemStack::new(&mut memory),
            Default::default(),
        );
        done.ok()?;
        let mut made = Sparse {
            pattern,
            factors,
            scale,
            replaced: Vec::new(),
            growth: 1.0,
        };
        made.look_at_pivots();
        Some(made)
    }

    pub(super) fn pattern(&self) -> &Pattern {
        &self.pattern
    }

    pub(super) fn size(&self) -> usize {
        self.scale.len()
    }

    fn look_at_pivots(&mut self) {
        let order = Arc::clone(&self.pattern.order);
        let (mut replaced, mut growth) = (Vec::new(), 1.0_f64);
        let mut look = |position: usize, root: f64| {
            if root > 1.0 + 1e-6 {
                replaced.push(order[position]);
            } else {
                growth = growth.max((root * root).recip());
            }
        };
        match self.pattern.factors.raw() {
            SymbolicCholeskyRaw::Simplicial(symbolic) => {
                for (position, &at) in symbolic.col_ptr()[..order.len()].iter().enumerate() {
                    look(position, self.factors[at]);
                }
            }
            SymbolicCholeskyRaw::Supernodal(symbolic) => {
                let factors = SupernodalLltRef::new(symbolic, &self.factors);
                for index in 0..symbolic.n_supernodes() {
                    let supernode = factors.supernode(index);
                    let block = supernode.val();
                    for column in 0..block.ncols() {
                        look(supernode.start() + column, block[(column, column)]);
                    }
                }
            }
        }
        replaced.sort_unstable();
        self.replaced = replaced;
        self.growth = growth;
    }

    /// Puts the solution in the place of the right side.
    pub(super) fn solve(&self, x: &mut [f64]) {
        let symbolic = &self.pattern.factors;
        x.iter_mut().zip(&self.scale).for_each(|(x, s)| *x *= s);
        let mut memory = MemBuffer::new(symbolic.solve_in_place_scratch::<f64>(1, Par::Seq));
        let size = x.len();
        LltRef::new(symbolic, &self.factors).solve_in_place_with_conj(
            Conj::No,
            MatMut::from_column_major_slice_mut(x, size, 1),
            Par::Seq,
            MemStack::new(&mut memory),
        );
        x.iter_mut().zip(&self.scale).for_each(|(x, s)| *x *= s);
    }
}

impl Lower {
    /// Column by column over the rows in which its unknown stands; an unknown in no row, or pinned,
    /// has a diagonal of 1.
    fn of(
        rows: &impl Rows,
        stiffness: impl Fn(usize) -> f64,
        pinned: &[usize],
        size: usize,
    ) -> Self {
        let mut rows_starts = vec![0; size + 1];
        for row in 0..rows.count() {
            for &(unknown, _) in rows.row(row) {
                rows_starts[unknown + 1] += 1;
            }
        }
        for unknown in 0..size {
            rows_starts[unknown + 1] += rows_starts[unknown];
        }
        let mut next = rows_starts.clone();
        let mut rows_of = vec![(0, 0); rows_starts[size]];
        for row in 0..rows.count() {
            for (place, &(unknown, _)) in rows.row(row).iter().enumerate() {
                rows_of[next[unknown]] = (row, place);
                next[unknown] += 1;
            }
        }
        let mut is_pinned = vec![false; size];
        for &pin in pinned {
            is_pinned[pin] = true;
        }
        let mut made = Lower {
            starts: vec![0],
            unknowns: Vec::new(),
            values: Vec::new(),
        };
        let mut sums = vec![0.0; size];
        let mut in_column = vec![usize::MAX; size];
        for column in 0..size {
            let from = made.unknowns.len();
            made.unknowns.push(column);
            in_column[column] = column;
            for &(row, place) in &rows_of[rows_starts[column]..rows_starts[column + 1]] {
                let entries = &rows.row(row)[place..];
                let times = stiffness(row) * entries[0].1;
                for &(unknown, b) in entries {
                    if in_column[unknown] != column {
                        in_column[unknown] = column;
                        made.unknowns.push(unknown);
                    }
                    sums[unknown] += times * b;
                }
            }
            made.unknowns[from..].sort_unstable();
            for &unknown in &made.unknowns[from..] {
                let sum = std::mem::take(&mut sums[unknown]);
                let kept = !is_pinned[column] && !is_pinned[unknown];
                made.values.push(if kept { sum } else { 0.0 });
            }
            if made.values[from] <= 0.0 {
                made.values[from] = 1.0;
            }
            made.starts.push(made.unknowns.len());
        }
        made
    }
}
