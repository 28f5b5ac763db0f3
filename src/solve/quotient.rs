//! One curve over another: strain N/EA and stress N/A along a taper, integrated and searched.

use super::roots::sign_changes;
use crate::quantity::{Curve, Ratio};
use std::ops::{Add, Div, Mul, Sub};

/// A curve over a curve that keeps one sign, along a piece from s = 0 to s = 1.
///
/// Zeros that both have at an end (the tip of a cone, where N and A vanish together) are taken
/// out before it is looked at, so that values at a tip are the limits there. The curves are
/// borrowed: mostly nothing is taken out, and a curve is large.
#[derive(Clone, Copy)]
struct Quotient<'c, A, B> {
    numerator: &'c Curve<A>,
    denominator: &'c Curve<B>,
}

/// The denominator vanishes where the numerator does not: a point that carries force.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Unbounded;

/// What a curve's values have to be capable of.
pub(super) trait Value:
    Copy
    + Default
    + PartialEq
    + PartialOrd
    + Add<Output = Self>
    + Sub<Output = Self>
    + Mul<f64, Output = Self>
{
}
impl<T> Value for T where
    T: Copy
        + Default
        + PartialEq
        + PartialOrd
        + Add<Output = T>
        + Sub<Output = T>
        + Mul<f64, Output = T>
{
}

/// An extreme value, and where along the piece.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Extreme<T> {
    pub(super) value: T,
    pub(super) at: f64,
}

/// The largest and the least value.
pub(super) type Extremes<T> = (Extreme<T>, Extreme<T>);

/// Nodes and weights of Gauss–Legendre quadrature with 16 points on 0..1, the half nearer to 0;
/// the other half mirrors it. Roots of the Legendre polynomial P16, computed to 40 digits.
#[allow(clippy::excessive_precision)] // as computed; the compiler rounds them
const GAUSS: [(f64, f64); 8] = [
    (0.0052995325041750337019, 0.013576229705877047426),
    (0.027712488463383711961, 0.031126761969323946431),
    (0.06718439880608412806, 0.047579255841246392405),
    (0.12229779582249848305, 0.062314485627766936026),
    (0.19106187779867812578, 0.074797994408288366041),
    (0.27099161117138630683, 0.084578259697501269095),
    (0.35919822461037054338, 0.091301707522461794433),
    (0.45249374508118127991, 0.094725305227534248143),
];

/// The spread of the denominator's coefficients up to which 16 points integrate to rounding: its
/// zeros then lie at least half a length away from the piece, where the error of n Gauss points,
/// ρ⁻²ⁿ with ρ the half axes' sum of the largest ellipse without a zero, is below 10⁻¹⁶.
const SPREAD: f64 = 3.0;

/// `∫ ds` of one curve over another, to rounding.
///
/// Fails where the denominator vanishes at an end and the numerator does not as well.
pub(super) fn integral<A, B>(
    numerator: &Curve<A>,
    denominator: &Curve<B>,
) -> Result<<A as Div<B>>::Output, Unbounded>
where
    A: Value + Div<B> + Div<A, Output = Ratio>,
    B: Value + Div<B, Output = Ratio>,
    <A as Div<B>>::Output: Value,
{
    looked_at(numerator, denominator, |quotient| quotient.integral())
}

/// The largest and the least value of one curve over another with their places; of equal ones the
/// first.
///
/// Fails where the denominator vanishes at an end and the numerator does not as well.
pub(super) fn extremes<A, B>(
    numerator: &Curve<A>,
    denominator: &Curve<B>,
) -> Result<Extremes<<A as Div<B>>::Output>, Unbounded>
where
    A: Value + Div<B> + Div<A, Output = Ratio>,
    B: Value + Div<B, Output = Ratio>,
    <A as Div<B>>::Output: Value,
{
    looked_at(numerator, denominator, |quotient| quotient.extremes())
}

fn looked_at<A: Value, B: Value, R>(
    numerator: &Curve<A>,
    denominator: &Curve<B>,
    look: impl FnOnce(Quotient<A, B>) -> R,
) -> Result<R, Unbounded> {
    let zero = B::default();
    let reduced;
    let (numerator, denominator) = if denominator.start() != zero && denominator.end() != zero {
        (numerator, denominator)
    } else {
        let (numerator, denominator) = cancelled(*numerator, *denominator)?;
        let (numerator, denominator) = cancelled(numerator.reversed(), denominator.reversed())?;
        reduced = (numerator.reversed(), denominator.reversed());
        (&reduced.0, &reduced.1)
    };
    Ok(look(Quotient {
        numerator,
        denominator,
    }))
}

impl<A, B> Quotient<'_, A, B>
where
    A: Value + Div<B> + Div<A, Output = Ratio>,
    B: Value + Div<B, Output = Ratio>,
    <A as Div<B>>::Output: Value,
{
    /// The value at `s`.
    fn at(&self, s: f64) -> <A as Div<B>>::Output {
        self.numerator.at(s) / self.denominator.at(s)
    }

    /// `∫ ds` over the piece, to rounding: exactly over a constant, else by Gauss points on parts
    /// that halve toward a zero of the denominator.
    fn integral(&self) -> <A as Div<B>>::Output {
        let first = self.denominator.start();
        if self.denominator.coefficients().iter().all(|&c| c == first) {
            return self.numerator.mean() / first;
        }
        let mut sum = <A as Div<B>>::Output::default();
        let mut parts = vec![(*self.numerator, *self.denominator, 1.0)];
        while let Some((numerator, denominator, width)) = parts.pop() {
            if spread(&denominator) <= SPREAD {
                sum = sum + gauss(&numerator, &denominator) * width;
            } else {
                let (near, far) = (numerator.cut(0.5), denominator.cut(0.5));
                parts.push((near.1, far.1, 0.5 * width));
                parts.push((near.0, far.0, 0.5 * width));
            }
        }
        sum
    }

    /// The largest and the least value; where the ends are they, without a search.
    fn extremes(&self) -> Extremes<<A as Div<B>>::Output> {
        let start = Extreme {
            value: self.numerator.start() / self.denominator.start(),
            at: 0.0,
        };
        if self.numerator.degree() == 0 && self.denominator.degree() == 0 {
            return (start, start);
        }
        let mut seen = (start, start);
        if !self.is_monotone() {
            for at in sign_changes(&self.slope()) {
                let value = self.at(at);
                widen(&mut seen, Extreme { value, at });
            }
        }
        let end = self.numerator.end() / self.denominator.end();
        widen(
            &mut seen,
            Extreme {
                value: end,
                at: 1.0,
            },
        );
        seen
    }

    /// Whether the value surely rises or falls all along: over a constant, where the numerator's
    /// coefficients do. The usual case, and quick to see.
    fn is_monotone(&self) -> bool {
        let rises = |pair: &[A]| pair[1] >= pair[0];
        let falls = |pair: &[A]| pair[1] <= pair[0];
        let mut pairs = self.numerator.coefficients().windows(2);
        self.denominator.degree() == 0 && (pairs.clone().all(rises) || pairs.all(falls))
    }

    /// The numerator of the derivative, P′Q − PQ′, in numbers scaled to about 1.
    fn slope(&self) -> Curve<f64> {
        let (most, size) = (largest(self.numerator), largest(self.denominator));
        if most == A::default() {
            return Curve::constant(0.0);
        }
        let p: Curve<f64> = self.numerator.map(|c| Div::<A>::div(c, most).value);
        let q: Curve<f64> = self.denominator.map(|c| Div::<B>::div(c, size).value);
        p.derivative().times(&q) - p.times(&q.derivative())
    }
}

/// Takes one more value into the extremes seen so far.
fn widen<T: Value>((most, least): &mut Extremes<T>, seen: Extreme<T>) {
    if seen.value > most.value {
        *most = seen;
    }
    if seen.value < least.value {
        *least = seen;
    }
}

/// Both curves without the zeros that they share at the end.
fn cancelled<A: Value, B: Value>(
    mut numerator: Curve<A>,
    mut denominator: Curve<B>,
) -> Result<(Curve<A>, Curve<B>), Unbounded> {
    while denominator.end() == B::default() {
        if numerator.coefficients().iter().all(|&c| c == A::default()) {
            // nothing over anything is nothing
            return Ok((
                Curve::constant(A::default()),
                Curve::constant(largest(&denominator)),
            ));
        }
        if numerator.end() != A::default() || denominator.degree() == 0 {
            return Err(Unbounded);
        }
        numerator = numerator.without_zero_at_end();
        denominator = denominator.without_zero_at_end();
    }
    Ok((numerator, denominator))
}

fn largest<T: Value>(curve: &Curve<T>) -> T {
    let size = |c: T| {
        if c < T::default() {
            T::default() - c
        } else {
            c
        }
    };
    curve.coefficients().iter().fold(
        T::default(),
        |most, &c| if size(c) > most { size(c) } else { most },
    )
}

fn spread<B: Value + Div<B, Output = Ratio>>(denominator: &Curve<B>) -> f64 {
    let most = largest(denominator);
    let least = denominator
        .coefficients()
        .iter()
        .fold(most, |least, &c| if c < least { c } else { least });
    (most / least).value
}

fn gauss<A, B>(numerator: &Curve<A>, denominator: &Curve<B>) -> <A as Div<B>>::Output
where
    A: Value + Div<B>,
    B: Value,
    <A as Div<B>>::Output: Value,
{
    let at = |s: f64| numerator.at(s) / denominator.at(s);
    GAUSS.iter().fold(Default::default(), |sum, &(s, weight)| {
        sum + (at(s) + at(1.0 - s)) * weight
    })
}

#[cfg(test)]
mod tests {
    use super::{extremes, integral, looked_at};
    use crate::quantity::{Area, Curve, Force, from_si};
    use approx::assert_relative_eq;

    fn force(values: &[f64]) -> Curve<Force> {
        let values: Vec<Force> = values.iter().map(|&v| from_si(v)).collect();
        Curve::from_coefficients(&values)
    }

    fn area(values: &[f64]) -> Curve<Area> {
        let values: Vec<Area> = values.iter().map(|&v| from_si(v)).collect();
        Curve::from_coefficients(&values)
    }

    #[test]
    fn a_round_taper_integrates_to_its_closed_form() {
        // ∫ ds / (a + (b - a) s)² = 1 / (a b)
        for ratio in [1.0 + 1e-7, 1.5, 4.0, 1e3, 1e6] {
            let taper = area(&[1.0, 1.0 / ratio, 1.0 / (ratio * ratio)]);
            let stretch = integral(&force(&[1.0]), &taper).unwrap();
            assert_relative_eq!(stretch.value, ratio, max_relative = 4e-15);
        }
    }

    #[test]
    fn a_flat_taper_integrates_to_its_closed_form() {
        // ∫ ds / (a + (b - a) s) = ln(b / a) / (b - a)
        for ratio in [1.5_f64, 4.0, 1e3, 1e6] {
            let stretch = integral(&force(&[1.0]), &area(&[1.0, ratio])).unwrap();
            assert_relative_eq!(
                stretch.value,
                ratio.ln() / (ratio - 1.0),
                max_relative = 4e-15
            );
        }
    }

    #[test]
    fn zeros_that_both_have_at_a_tip_cancel() {
        // (1 - s)³ / (1 - s)² = 1 - s
        let (cubic, cone) = (force(&[1.0, 0.0, 0.0, 0.0]), area(&[1.0, 0.0, 0.0]));
        let stretch = integral(&cubic, &cone).unwrap();
        assert_relative_eq!(stretch.value, 0.5, max_relative = 1e-15);
        let at_tip = looked_at(&cubic, &cone, |quotient| quotient.at(1.0)).unwrap();
        assert_eq!(at_tip.value, 0.0);
        assert!(integral(&force(&[1.0]), &cone).is_err());
        assert!(integral(&force(&[1.0, 0.0]), &cone).is_err());
    }

    #[test]
    fn extremes_inside_a_piece_are_found_with_their_place() {
        // s (1 - s) over a constant: largest at the middle
        let (most, least) = extremes(&force(&[0.0, 0.5, 0.0]), &area(&[2.0])).unwrap();
        assert_relative_eq!(most.value.value, 0.125, max_relative = 1e-15);
        assert_relative_eq!(most.at, 0.5, max_relative = 1e-12);
        assert_eq!(least.value.value, 0.0);
    }
}
