//! Products of vectors with entries along x, y, z.

use crate::model::Spatial;

/// `a · b`.
pub(super) fn dot(a: &Spatial<f64>, b: &Spatial<f64>) -> f64 {
    a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
}

/// `a × b`, right-handed.
pub(super) fn cross(a: &Spatial<f64>, b: &Spatial<f64>) -> Spatial<f64> {
    [
        a[1] * b[2] - a[2] * b[1],
        a[2] * b[0] - a[0] * b[2],
        a[0] * b[1] - a[1] * b[0],
    ]
}

/// The length of a vector.
pub(super) fn size(a: &Spatial<f64>) -> f64 {
    dot(a, a).sqrt()
}

/// `a + times b`.
pub(super) fn plus(a: &Spatial<f64>, times: f64, b: &Spatial<f64>) -> Spatial<f64> {
    std::array::from_fn(|k| a[k] + times * b[k])
}

/// The vector times a number.
pub(super) fn times(number: f64, a: &Spatial<f64>) -> Spatial<f64> {
    a.map(|entry| number * entry)
}
