//! The linear complementarity problem: u = constant + coefficients · z, both 0 or more, and of each
//! pair at least one 0.
//!
//! Lemke's method ("Bimatrix equilibrium points and mathematical programming", Management Science
//! 11, 1965): a covering vector makes everything positive; it is then taken back along a path on
//! which one pair at a time changes over. For a positive semidefinite table the path ends at a
//! solution, or on a ray that shows that there is none. The covering vector's entries are distinct,
//! so that parts which are alike do not change over at the same point of the path.

/// A coefficient of a table with diagonals of about 1 that counts as none.
const NOTHING: f64 = 1e-11;

/// Steps that differ by no more of themselves are one, and what is left of the cover counts as none
/// below this part of the largest constant.
const SAME: f64 = 1e-12;

/// So many coefficients are worked on at most, in about half a minute.
const WORK: usize = 30_000_000_000;

/// Where the path ends.
pub(super) enum End {
    /// At a solution: by pair, whether z is the one that is more than 0.
    Solved(Vec<bool>),
    /// On a ray: there is no solution. The direction of every z, with the pairs as they stood.
    Ray {
        direction: Vec<f64>,
        pairs: Vec<bool>,
    },
    /// Nowhere in sensible time.
    Stopped,
}

/// The table in work: row i says basic i = constant i + Σ coefficient × other.
struct Table {
    size: usize,
    /// `size` rows of `size + 1` coefficients.
    coefficients: Vec<f64>,
    constants: Vec<f64>,
    /// The variable of each row and of each column: u of pair i is i, z of it is `size + i`, the
    /// cover is `2 size`.
    basic: Vec<usize>,
    others: Vec<usize>,
}

/// Follows the path of one of several covers. The table is by rows, positive semidefinite, with
/// diagonals of about 1.
pub(super) fn complement(coefficients: &[f64], constants: &[f64], cover: usize) -> End {
    let size = constants.len();
    let largest = constants.iter().fold(0.0_f64, |most, c| most.max(c.abs()));
    if constants.iter().all(|&c| c >= 0.0) {
        return End::Solved(vec![false; size]);
    }
    let mut table = Table::new(size, coefficients, constants, largest, cover);
    let cover = 2 * size;
    let mut row = table.most_negative();
    let mut column = size;
    // Each step meets another pair of states; far fewer are seen than this in practice.
    let steps = 200 + 50 * size;
    for step in 0..steps {
        if step * size * size > WORK {
            return End::Stopped;
        }
        let left = table.basic[row];
        table.exchange(row, column);
        if left == cover {
            return End::Solved(table.pairs());
        }
        let enters = if left < size {
            left + size
        } else {
            left - size
        };
        column = table
            .others
            .iter()
            .position(|&other| other == enters)
            .unwrap_or(size);
        match table.first_to_vanish(column, cover) {
            Some(first) => row = first,
            None => break,
        }
    }
    End::Ray {
        direction: table.direction(column),
        pairs: table.pairs(),
    }
}

impl Table {
    fn new(size: usize, given: &[f64], constants: &[f64], largest: f64, cover: usize) -> Self {
        let mut coefficients = Vec::with_capacity(size * (size + 1));
        for (pair, row) in given.chunks_exact(size).enumerate() {
            coefficients.extend_from_slice(row);
            // Multiples of the golden ratio, less their whole part: distinct and evenly spread.
            coefficients
                .push(1.0 + (0.618_033_988_749_895 * (pair + 1 + cover * size) as f64).fract());
        }
        Table {
            size,
            coefficients,
            constants: constants.iter().map(|c| c / largest).collect(),
            basic: (0..size).collect(),
            others: (size..=2 * size).collect(),
        }
    }

    fn at(&self, row: usize, column: usize) -> f64 {
        self.coefficients[row * (self.size + 1) + column]
    }

    /// The row that needs most of the cover.
    fn most_negative(&self) -> usize {
        let need = |row: usize| -self.constants[row] / self.at(row, self.size);
        (1..self.size).fold(
            0,
            |most, row| if need(row) > need(most) { row } else { most },
        )
    }

    /// The row whose variable vanishes first while that of the column grows; the cover's, where it
    /// vanishes with it.
    fn first_to_vanish(&self, column: usize, cover: usize) -> Option<usize> {
        let mut first: Option<(usize, f64, f64)> = None;
        for row in 0..self.size {
            let falls = -self.at(row, column);
            if falls <= NOTHING {
                continue;
            }
            let step = self.constants[row].max(0.0) / falls;
            let before = first.is_none_or(|(_, best, slope)| {
                let close = (step - best).abs() <= SAME * best;
                if close { falls > slope } else { step < best }
            });
            if before {
                first = Some((row, step, falls));
            }
        }
        let (row, step, _) = first?;
        let covered = self.basic.iter().position(|&variable| variable == cover);
        let uncovers = |&at: &usize| {
            let left = self.constants[at] + step * self.at(at, column);
            self.at(at, column) < -NOTHING && left <= SAME
        };
        covered.filter(uncovers).or(Some(row))
    }

    /// The variable of a row changes places with that of a column.
    fn exchange(&mut self, row: usize, column: usize) {
        let width = self.size + 1;
        let pivot = 1.0 / self.at(row, column);
        let (before, rest) = self.coefficients.split_at_mut(row * width);
        let (changed, after) = rest.split_at_mut(width);
        for coefficient in changed.iter_mut() {
            *coefficient *= -pivot;
        }
        changed[column] = pivot;
        let constant = -self.constants[row] * pivot;
        self.constants[row] = constant;
        let upper = before.chunks_exact_mut(width).zip(0..row);
        let lower = after.chunks_exact_mut(width).zip(row + 1..self.size);
        for (other, index) in upper.chain(lower) {
            let times = std::mem::take(&mut other[column]);
            if times != 0.0 {
                for (value, new) in other.iter_mut().zip(&*changed) {
                    *value += times * new;
                }
                self.constants[index] += times * constant;
            }
        }
        std::mem::swap(&mut self.basic[row], &mut self.others[column]);
    }

    fn pairs(&self) -> Vec<bool> {
        let mut pairs = vec![false; self.size];
        for &variable in &self.basic {
            if (self.size..2 * self.size).contains(&variable) {
                pairs[variable - self.size] = true;
            }
        }
        pairs
    }

    /// How every z changes while the variable of the column grows.
    fn direction(&self, column: usize) -> Vec<f64> {
        let mut direction = vec![0.0; self.size];
        let mut set = |variable: usize, value: f64| {
            if (self.size..2 * self.size).contains(&variable) {
                direction[variable - self.size] = value;
            }
        };
        set(self.others[column], 1.0);
        for (row, &variable) in self.basic.iter().enumerate() {
            let value = self.at(row, column);
            set(variable, if value > NOTHING { value } else { 0.0 });
        }
        direction
    }
}
