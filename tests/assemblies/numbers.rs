//! Dense solutions to rounding.

use nalgebra::{DMatrix, DVector, Dyn, LU};

/// Pivots below this share of the largest are 0: the equations have no single solution.
const NO_PIVOT: f64 = 1e-14;

/// LU factors; `None` where there is no single solution.
fn factors(a: &DMatrix<f64>) -> Option<LU<f64, Dyn, Dyn>> {
    let factors = a.clone().lu();
    let packed = factors.lu_internal();
    let pivots = || (0..a.nrows()).map(|i| packed[(i, i)].abs());
    let largest = pivots().fold(0.0, f64::max);
    let single = pivots().all(|pivot| pivot > NO_PIVOT * largest);
    single.then_some(factors)
}

/// LU solution as it comes.
pub(crate) fn solved(a: &DMatrix<f64>, b: &DVector<f64>) -> Option<DVector<f64>> {
    factors(a)?.solve(b)
}

/// LU solution, refined until the residual, formed in doubled precision, is at rounding.
pub(crate) fn refined(a: &DMatrix<f64>, b: &DVector<f64>) -> Option<DVector<f64>> {
    let factors = factors(a)?;
    let mut x = factors.solve(b)?;
    for _ in 0..3 {
        let residual = DVector::from_fn(b.len(), |row, _| {
            let products = (0..b.len())
                .filter(|&column| a[(row, column)] != 0.0)
                .map(|column| (-a[(row, column)], x[column]));
            doubled_sum(b[row], products)
        });
        x += factors.solve(&residual)?;
    }
    Some(x)
}

/// `first + Σ a·b` with the rounding of every step kept (Dekker's and Knuth's error-free forms).
pub(crate) fn doubled_sum(first: f64, products: impl Iterator<Item = (f64, f64)>) -> f64 {
    let (mut sum, mut rest) = (first, 0.0);
    for (a, b) in products {
        let product = a * b;
        rest += a.mul_add(b, -product);
        let next = sum + product;
        let back = next - sum;
        rest += (sum - (next - back)) + (product - back);
        sum = next;
    }
    sum + rest
}
