//! A quantity that varies along a piece of a member as a polynomial.

use std::cmp::Ordering;
use std::ops::{Add, Mul, Sub};

/// The highest degree that is needed: the derivative's numerator of a layer's stress on a net area,
/// whose numerator is quintic and whose denominator is quartic.
const HIGHEST: usize = 8;

/// A polynomial in s, from 0 at the start of a piece to 1 at its end, by its Bernstein
/// coefficients.
///
/// That form is kept because areas are products of lengths that do not change sign: their
/// coefficients are then all positive, and neither evaluating nor cutting such a curve cancels a
/// digit, however steep the taper. The first and the last coefficient are the values at the ends.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Curve<T> {
    degree: usize,
    coefficients: [T; HIGHEST + 1],
}

/// Binomial coefficients up to the highest degree.
const BINOMIAL: [[f64; HIGHEST + 1]; HIGHEST + 1] = [
    [1.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0],
    [1.0, 1.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0],
    [1.0, 2.0, 1.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0],
    [1.0, 3.0, 3.0, 1.0, 0.0, 0.0, 0.0, 0.0, 0.0],
    [1.0, 4.0, 6.0, 4.0, 1.0, 0.0, 0.0, 0.0, 0.0],
    [1.0, 5.0, 10.0, 10.0, 5.0, 1.0, 0.0, 0.0, 0.0],
    [1.0, 6.0, 15.0, 20.0, 15.0, 6.0, 1.0, 0.0, 0.0],
    [1.0, 7.0, 21.0, 35.0, 35.0, 21.0, 7.0, 1.0, 0.0],
    [1.0, 8.0, 28.0, 56.0, 70.0, 56.0, 28.0, 8.0, 1.0],
];

impl<T> Curve<T>
where
    T: Copy + Default + Add<Output = T> + Sub<Output = T> + Mul<f64, Output = T>,
{
    /// The curve with these Bernstein coefficients, nine at the most.
    pub fn from_coefficients(values: &[T]) -> Self {
        debug_assert!(!values.is_empty() && values.len() <= HIGHEST + 1);
        let mut coefficients = [T::default(); HIGHEST + 1];
        coefficients[..values.len()].copy_from_slice(values);
        Curve {
            degree: values.len() - 1,
            coefficients,
        }
    }

    /// The same value all along.
    pub fn constant(value: T) -> Self {
        Self::from_coefficients(&[value])
    }

    /// Linear from `start` to `end`; of degree 0 where they are equal.
    pub fn linear(start: T, end: T) -> Self
    where
        T: PartialEq,
    {
        if start == end {
            Self::constant(start)
        } else {
            Self::from_coefficients(&[start, end])
        }
    }

    /// The degree of the form (the polynomial itself may be of a lower one).
    pub fn degree(&self) -> usize {
        self.degree
    }

    /// The Bernstein coefficients, one more than the degree.
    pub fn coefficients(&self) -> &[T] {
        &self.coefficients[..=self.degree]
    }

    /// The value at the start.
    pub fn start(&self) -> T {
        self.coefficients[0]
    }

    /// The value at the end.
    pub fn end(&self) -> T {
        self.coefficients[self.degree]
    }

    /// The value at `s`, by de Casteljau's scheme.
    pub fn at(&self, s: f64) -> T {
        let mut c = self.coefficients;
        for level in (1..=self.degree).rev() {
            for i in 0..level {
                c[i] = c[i] * (1.0 - s) + c[i + 1] * s;
            }
        }
        c[0]
    }

    /// The mean over the piece, `∫ ds`.
    pub fn mean(&self) -> T {
        let sum = self
            .coefficients()
            .iter()
            .fold(T::default(), |sum, &c| sum + c);
        sum * (1.0 / (self.degree + 1) as f64)
    }

    /// The part of the curve from `from` to `to`, again as a curve from 0 to 1.
    pub fn part(&self, from: f64, to: f64) -> Self {
        if from == 0.0 && to == 1.0 || self.degree == 0 {
            return *self;
        }
        let right = if from == 0.0 { *self } else { self.cut(from).1 };
        if to == 1.0 {
            right
        } else {
            right.cut((to - from) / (1.0 - from)).0
        }
    }

    /// The two parts on either side of `s`.
    pub fn cut(&self, s: f64) -> (Self, Self) {
        let (mut left, mut right) = (*self, *self);
        for level in 1..=self.degree {
            for i in 0..=(self.degree - level) {
                right.coefficients[i] =
                    right.coefficients[i] * (1.0 - s) + right.coefficients[i + 1] * s;
            }
            left.coefficients[level] = right.coefficients[0];
        }
        (left, right)
    }

    /// The same polynomial in a form of a higher degree.
    pub fn raised(&self, degree: usize) -> Self {
        let mut raised = *self;
        while raised.degree < degree {
            let n = raised.degree + 1;
            let before = raised.coefficients;
            for i in 1..n {
                let share = i as f64 / n as f64;
                raised.coefficients[i] = before[i - 1] * share + before[i] * (1.0 - share);
            }
            raised.coefficients[n] = before[n - 1];
            raised.degree = n;
        }
        raised
    }

    /// Every coefficient through `f`, which must be linear: a factor, or a division by a constant.
    pub fn map<U>(&self, f: impl Fn(T) -> U) -> Curve<U>
    where
        U: Copy + Default,
    {
        let mut coefficients = [U::default(); HIGHEST + 1];
        for (to, &from) in coefficients.iter_mut().zip(self.coefficients()) {
            *to = f(from);
        }
        Curve {
            degree: self.degree,
            coefficients,
        }
    }

    /// What remains of the curve after a factor that vanishes at the end, `1 - s`, is taken out.
    /// Only for a curve whose last coefficient is zero and whose degree is at least 1.
    pub fn without_zero_at_end(&self) -> Self {
        let mut rest = *self;
        for i in 0..self.degree {
            rest.coefficients[i] =
                self.coefficients[i] * (self.degree as f64 / (self.degree - i) as f64);
        }
        rest.coefficients[self.degree] = T::default();
        rest.degree -= 1;
        rest
    }

    /// The curve run through from its end to its start.
    pub fn reversed(&self) -> Self {
        let mut reversed = *self;
        reversed.coefficients[..=self.degree].reverse();
        reversed
    }

    /// The derivative by s; zero of degree 0 for a constant.
    pub fn derivative(&self) -> Self {
        let mut derivative = Self::constant(T::default());
        if self.degree > 0 {
            derivative.degree = self.degree - 1;
            for i in 0..self.degree {
                derivative.coefficients[i] =
                    (self.coefficients[i + 1] - self.coefficients[i]) * self.degree as f64;
            }
        }
        derivative
    }

    /// The product of two curves, whose degrees add up to eight at the most.
    pub fn times<U, V>(&self, other: &Curve<U>) -> Curve<V>
    where
        U: Copy,
        T: Mul<U, Output = V>,
        V: Copy + Default + Add<Output = V> + Mul<f64, Output = V>,
    {
        let degree = self.degree + other.degree;
        debug_assert!(degree <= HIGHEST);
        let mut coefficients = [V::default(); HIGHEST + 1];
        for i in 0..=self.degree {
            for j in 0..=other.degree {
                let weight =
                    BINOMIAL[self.degree][i] * BINOMIAL[other.degree][j] / BINOMIAL[degree][i + j];
                coefficients[i + j] =
                    coefficients[i + j] + self.coefficients[i] * other.coefficients[j] * weight;
            }
        }
        Curve {
            degree,
            coefficients,
        }
    }
}

impl<T> Add for Curve<T>
where
    T: Copy + Default + Add<Output = T> + Sub<Output = T> + Mul<f64, Output = T>,
{
    type Output = Self;
    fn add(self, other: Self) -> Self {
        let (mut sum, other) = match self.degree.cmp(&other.degree) {
            Ordering::Less => (self.raised(other.degree), other),
            Ordering::Equal => (self, other),
            Ordering::Greater => (self, other.raised(self.degree)),
        };
        for (to, &more) in sum.coefficients.iter_mut().zip(other.coefficients()) {
            *to = *to + more;
        }
        sum
    }
}

impl<T> Sub for Curve<T>
where
    T: Copy + Default + Add<Output = T> + Sub<Output = T> + Mul<f64, Output = T>,
{
    type Output = Self;
    #[allow(clippy::suspicious_arithmetic_impl)] // a sum with the other's coefficients negated
    fn sub(self, other: Self) -> Self {
        self + other.map(|c| T::default() - c)
    }
}

impl<T> Mul<f64> for Curve<T>
where
    T: Copy + Default + Add<Output = T> + Sub<Output = T> + Mul<f64, Output = T>,
{
    type Output = Self;
    fn mul(self, factor: f64) -> Self {
        self.map(|c| c * factor)
    }
}

#[cfg(test)]
mod tests {
    use super::Curve;
    use approx::assert_relative_eq;

    #[test]
    fn a_product_is_the_product_of_the_values() {
        let a = Curve::from_coefficients(&[1.0, 4.0, 2.5]);
        let b = Curve::linear(3.0, -1.0);
        let product = a.times(&b);
        for s in [0.0, 0.2, 0.5, 0.9, 1.0] {
            assert_relative_eq!(
                product.at(s),
                a.at(s) * b.at(s),
                max_relative = 1e-14,
                epsilon = 1e-14
            );
        }
    }

    #[test]
    fn a_part_has_the_values_of_the_whole() {
        let whole = Curve::from_coefficients(&[1.0, -4.0, 2.5, 7.0]);
        let part = whole.part(0.25, 0.7);
        for s in [0.0, 0.3, 1.0] {
            assert_relative_eq!(
                part.at(s),
                whole.at(0.25 + s * 0.45),
                max_relative = 1e-13,
                epsilon = 1e-13
            );
        }
        assert_eq!(whole.part(0.0, 1.0), whole);
    }

    #[test]
    fn a_raised_form_is_the_same_polynomial() {
        let low = Curve::linear(2.0, 5.0);
        let high = low.raised(4);
        assert_relative_eq!(high.at(0.37), low.at(0.37), max_relative = 1e-14);
        assert_relative_eq!(high.mean(), 3.5, max_relative = 1e-14);
    }
}
