//! LDLᵀ of a small symmetric matrix.

/// The factors of a symmetric, positive matrix; rows of the lower half one after another.
#[derive(Debug, Clone)]
pub(super) struct Dense {
    size: usize,
    /// L below the diagonal, 1/D on it.
    factors: Vec<f64>,
    /// The largest of diagonal over pivot.
    growth: f64,
}

fn at(row: usize, column: usize) -> usize {
    row * (row + 1) / 2 + column
}

impl Dense {
    /// Of Σ stiffness × row rowᵀ. Unknowns that are `pinned` stay 0.
    pub(super) fn of<'r>(
        size: usize,
        springs: impl Iterator<Item = (f64, &'r [(usize, f64)])>,
        pinned: &[usize],
    ) -> Self {
        let mut factors = vec![0.0; at(size, 0)];
        for (stiffness, row) in springs {
            for &(i, b) in row {
                for &(j, c) in row {
                    if j <= i {
                        factors[at(i, j)] += stiffness * b * c;
                    }
                }
            }
        }
        for &pin in pinned {
            factors[at(pin, 0)..=at(pin, pin)].fill(0.0);
            for row in pin + 1..size {
                factors[at(row, pin)] = 0.0;
            }
            factors[at(pin, pin)] = 1.0;
        }
        let mut made = Dense {
            size,
            factors,
            growth: 1.0,
        };
        made.factorize();
        made
    }

    fn factorize(&mut self) {
        let mut scaled = vec![0.0; self.size];
        for i in 0..self.size {
            let diagonal = self.factors[at(i, i)];
            let mut pivot = diagonal;
            for j in 0..i {
                // Row i of L D, then of L.
                let mut sum = self.factors[at(i, j)];
                for (l, s) in self.factors[at(j, 0)..at(j, j)].iter().zip(&scaled) {
                    sum -= l * s;
                }
                scaled[j] = sum;
            }
            for (j, &s) in scaled[..i].iter().enumerate() {
                let l = s * self.factors[at(j, j)];
                self.factors[at(i, j)] = l;
                pivot -= l * s;
            }
            // A pivot that rounding has used up: the size of a rounding stands in for it.
            let least = f64::EPSILON * diagonal;
            if pivot <= least {
                pivot = if diagonal > 0.0 { least } else { 1.0 };
                self.growth = f64::INFINITY;
            } else {
                self.growth = self.growth.max(diagonal / pivot);
            }
            self.factors[at(i, i)] = 1.0 / pivot;
        }
    }

    /// The largest of diagonal over pivot: infinite where a pivot was lost in rounding.
    pub(super) fn growth(&self) -> f64 {
        self.growth
    }

    /// Puts the solution in the place of the right side.
    pub(super) fn solve(&self, x: &mut [f64]) {
        for i in 0..self.size {
            let (before, from) = x.split_at_mut(i);
            for (l, x) in self.factors[at(i, 0)..at(i, i)].iter().zip(before) {
                from[0] -= l * *x;
            }
        }
        for i in (0..self.size).rev() {
            x[i] *= self.factors[at(i, i)];
        }
        for i in (0..self.size).rev() {
            let (before, from) = x.split_at_mut(i);
            for (l, x) in self.factors[at(i, 0)..at(i, i)].iter().zip(before) {
                *x -= l * from[0];
            }
        }
    }
}
