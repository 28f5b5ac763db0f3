//! Motions that nothing resists, from geometry alone: stiffness may differ by any factor.

/// What is left of a row of size 1 that counts as none: a thousand times the rounding of an
/// elimination over some ten thousand unknowns, and below what any drawing means.
const NOTHING: f64 = 1e-11;

/// What a set of rows leaves free.
#[derive(Debug, Clone)]
pub(super) struct FreeDirections {
    /// An unknown for each motion, which alone among these moves in it.
    pub(super) pins: Vec<usize>,
    /// The motions; the pin's entry is 1.
    pub(super) motions: Vec<Vec<f64>>,
    /// The smallest pivot that counted.
    pub(super) least: f64,
}

/// The null space of rows over `size` unknowns, by Gaussian elimination with full pivoting.
pub(super) fn free_directions<'r>(
    size: usize,
    rows: impl Iterator<Item = &'r [(usize, f64)]>,
) -> FreeDirections {
    let mut table: Vec<f64> = Vec::new();
    let mut count = 0;
    for row in rows {
        let largest = row
            .iter()
            .fold(0.0_f64, |most, entry| most.max(entry.1.abs()));
        if largest > 0.0 {
            count += 1;
            let from = table.len();
            table.resize(from + size, 0.0);
            for &(unknown, b) in row {
                table[from + unknown] = b / largest;
            }
        }
    }
    let mut columns: Vec<usize> = (0..size).collect();
    let mut rank = 0;
    let mut least = 1.0_f64;
    while rank < count.min(size) {
        let mut best = (rank, rank);
        let mut most = 0.0;
        for row in rank..count {
            for (offset, value) in table[row * size + rank..(row + 1) * size]
                .iter()
                .enumerate()
            {
                if value.abs() > most {
                    most = value.abs();
                    best = (row, rank + offset);
                }
            }
        }
        if most <= NOTHING {
            break;
        }
        least = least.min(most);
        for row in 0..count {
            table.swap(row * size + rank, row * size + best.1);
        }
        columns.swap(rank, best.1);
        if best.0 != rank {
            let (upper, lower) = table.split_at_mut(best.0 * size);
            upper[rank * size..(rank + 1) * size].swap_with_slice(&mut lower[..size]);
        }
        let (done, below) = table.split_at_mut((rank + 1) * size);
        let pivot_row = &done[rank * size..];
        for row in below.chunks_exact_mut(size) {
            let times = row[rank] / pivot_row[rank];
            if times != 0.0 {
                for (value, pivot) in row[rank..].iter_mut().zip(&pivot_row[rank..]) {
                    *value -= times * pivot;
                }
            }
        }
        rank += 1;
    }
    let motions = (rank..size)
        .map(|pin| {
            let mut motion = vec![0.0; size];
            motion[columns[pin]] = 1.0;
            for row in (0..rank).rev() {
                let at = |column: usize| table[row * size + column];
                let (mut sum, mut sizes) = (-at(pin), at(pin).abs());
                for column in row + 1..rank {
                    let share = at(column) * motion[columns[column]];
                    sum -= share;
                    sizes += share.abs();
                }
                motion[columns[row]] = if sum.abs() > NOTHING * sizes {
                    sum / at(row)
                } else {
                    0.0
                };
            }
            motion
        })
        .collect();
    FreeDirections {
        pins: columns.split_off(rank),
        motions,
        least,
    }
}
