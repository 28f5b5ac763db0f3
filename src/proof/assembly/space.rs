//! Entries along x, y, z taken together.

use crate::model::Spatial;
use crate::quantity::{Angle, Energy, Force, Length, Moment, from_si};
use std::ops::{Add, Mul, Sub};
use uom::si::{Dimension, Quantity, SI};

/// What can be added and multiplied by a number.
pub(super) trait Linear:
    Copy + Default + Add<Output = Self> + Sub<Output = Self> + Mul<f64, Output = Self>
{
}

impl<Q> Linear for Q where
    Q: Copy + Default + Add<Output = Q> + Sub<Output = Q> + Mul<f64, Output = Q>
{
}

/// The part along a direction.
pub(super) fn along<Q: Linear>(direction: &Spatial<f64>, of: &Spatial<Q>) -> Q {
    of[0] * direction[0] + of[1] * direction[1] + of[2] * direction[2]
}

/// A size in a direction.
pub(super) fn toward<Q: Linear>(direction: &Spatial<f64>, size: Q) -> Spatial<Q> {
    direction.map(|share| size * share)
}

pub(super) fn sum<Q: Linear>(a: Spatial<Q>, b: Spatial<Q>) -> Spatial<Q> {
    std::array::from_fn(|axis| a[axis] + b[axis])
}

pub(super) fn difference<Q: Linear>(a: Spatial<Q>, b: Spatial<Q>) -> Spatial<Q> {
    std::array::from_fn(|axis| a[axis] - b[axis])
}

/// The sum of the sizes of the entries.
pub(super) fn size<D: Dimension + ?Sized>(
    of: &Spatial<Quantity<D, SI<f64>, f64>>,
) -> Quantity<D, SI<f64>, f64> {
    from_si(of[0].value.abs() + of[1].value.abs() + of[2].value.abs())
}

/// The sum of the sizes of what a part along a direction is made of.
pub(super) fn size_along<D: Dimension + ?Sized>(
    direction: &Spatial<f64>,
    of: &Spatial<Quantity<D, SI<f64>, f64>>,
) -> Quantity<D, SI<f64>, f64> {
    let terms = (0..3).map(|axis| (of[axis].value * direction[axis]).abs());
    from_si(terms.sum())
}

/// The movement that a small rotation makes at an arm.
pub(super) fn turned(rotation: &Spatial<Angle>, arm: &Spatial<Length>) -> Spatial<Length> {
    cross(rotation.map(|q| q.value), arm.map(|q| q.value)).map(from_si)
}

/// The moment of a force at an arm.
pub(super) fn moment(arm: &Spatial<Length>, force: &Spatial<Force>) -> Spatial<Moment> {
    cross(arm.map(|q| q.value), force.map(|q| q.value)).map(from_si)
}

/// The work of a force on a movement, and the sum of the sizes of its terms.
pub(super) fn work(force: &Spatial<Force>, movement: &Spatial<Length>) -> (Energy, Energy) {
    let terms = std::array::from_fn::<Energy, 3, _>(|axis| force[axis] * movement[axis]);
    (terms[0] + terms[1] + terms[2], size(&terms))
}

/// The same of a moment on a rotation.
pub(super) fn work_of_moment(
    moment: &Spatial<Moment>,
    rotation: &Spatial<Angle>,
) -> (Energy, Energy) {
    let terms = std::array::from_fn::<Energy, 3, _>(|axis| {
        from_si(moment[axis].value * rotation[axis].value)
    });
    (terms[0] + terms[1] + terms[2], size(&terms))
}

fn cross(a: [f64; 3], b: [f64; 3]) -> [f64; 3] {
    [
        a[1] * b[2] - a[2] * b[1],
        a[2] * b[0] - a[0] * b[2],
        a[0] * b[1] - a[1] * b[0],
    ]
}

#[cfg(test)]
mod tests {
    use super::{moment, turned};
    use crate::quantity::from_si;

    #[test]
    fn rotations_and_moments_are_right_handed() {
        // A quarter turn about z carries x toward y; a force along y at an arm along x turns about z.
        let [x, y, z] = [[1.0, 0.0, 0.0], [0.0, 1.0, 0.0], [0.0, 0.0, 1.0]];
        assert_eq!(turned(&z.map(from_si), &x.map(from_si)).map(|q| q.value), y);
        assert_eq!(moment(&x.map(from_si), &y.map(from_si)).map(|q| q.value), z);
    }
}
