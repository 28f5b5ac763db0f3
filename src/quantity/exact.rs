//! Fractions kept to some 32 digits, so that a literal is rounded once, at its end.
//!
//! A number as typed and a unit's definition are both decimal fractions, which binary numbers do
//! not hold: `0.3 mm` rounded three times (0.3, 0.001, their product) need not be the double that
//! is nearest to 0.0003. Here numerator and denominator are whole numbers, each the sum of two
//! doubles, and the one division at the end is the only rounding.

/// The unevaluated sum of two doubles, the second below half a unit of the first's last place.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Twofold {
    pub(super) high: f64,
    pub(super) low: f64,
}

impl Twofold {
    pub(super) const ONE: Twofold = Twofold::of(1.0);

    /// A double as it is.
    pub(super) const fn of(high: f64) -> Self {
        Twofold { high, low: 0.0 }
    }

    /// A whole number without loss.
    pub(super) fn whole(number: u64) -> Self {
        let high = number as f64;
        if number < 1 << 53 {
            return Twofold::of(high);
        }
        // The difference has at most 11 bits; it is negative where the double was rounded up.
        let low = (i128::from(number) - high as i128) as f64;
        Twofold { high, low }
    }

    fn product(a: f64, b: f64) -> Self {
        let high = a * b;
        Twofold {
            high,
            low: a.mul_add(b, -high),
        }
    }

    fn sum(a: f64, b: f64) -> Self {
        let high = a + b;
        let part = high - a;
        Twofold {
            high,
            low: (a - (high - part)) + (b - part),
        }
    }

    pub(super) fn times(self, other: Twofold) -> Self {
        // Most factors are 1, and a fused product is dear where the processor is not asked for it.
        if other == Twofold::ONE {
            return self;
        }
        if self == Twofold::ONE {
            return other;
        }
        let product = Twofold::product(self.high, other.high);
        let cross = self.high * other.low + self.low * other.high;
        Twofold::sum(product.high, product.low + cross)
    }

    pub(super) fn plus(self, other: Twofold) -> Self {
        let high = Twofold::sum(self.high, other.high);
        let low = Twofold::sum(self.low, other.low);
        let sum = Twofold::sum(high.high, high.low + low.high);
        Twofold::sum(sum.high, sum.low + low.low)
    }

    pub(super) fn negated(self) -> Self {
        Twofold {
            high: -self.high,
            low: -self.low,
        }
    }
}

/// A fraction.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Exact {
    pub(super) over: Twofold,
    pub(super) under: Twofold,
}

impl Exact {
    pub(super) const ONE: Exact = Exact {
        over: Twofold::ONE,
        under: Twofold::ONE,
    };

    /// The fraction of two whole numbers that doubles hold.
    pub(super) const fn ratio(over: f64, under: f64) -> Self {
        Exact {
            over: Twofold::of(over),
            under: Twofold::of(under),
        }
    }

    pub(super) fn times(self, other: Exact) -> Self {
        Exact {
            over: self.over.times(other.over),
            under: self.under.times(other.under),
        }
    }

    pub(super) fn inverse(self) -> Self {
        Exact {
            over: self.under,
            under: self.over,
        }
    }

    pub(super) fn plus(self, other: Exact) -> Self {
        Exact {
            over: self
                .over
                .times(other.under)
                .plus(other.over.times(self.under)),
            under: self.under.times(other.under),
        }
    }

    pub(super) fn negated(self) -> Self {
        Exact {
            over: self.over.negated(),
            under: self.under,
        }
    }

    /// The double nearest to it, but for the rarest of ties; never a negative zero.
    pub(super) fn rounded(self) -> f64 {
        let quotient = self.over.high / self.under.high;
        if self.over.low == 0.0 && self.under.low == 0.0 {
            return quotient + 0.0;
        }
        let taken = self.under.times(Twofold::of(-quotient));
        let rest = self.over.plus(taken).high;
        quotient + rest / self.under.high + 0.0
    }
}

#[cfg(test)]
mod tests {
    use super::{Exact, Twofold};

    #[test]
    fn whole_numbers_lose_nothing() {
        for number in [0, 1, (1 << 53) + 1, u64::MAX, u64::MAX - 1, (1 << 63) + 1] {
            let held = Twofold::whole(number);
            assert_eq!(held.high as i128 + held.low as i128, i128::from(number));
        }
    }

    #[test]
    fn sums_and_products_of_fractions_are_rounded_once() {
        let tenth = Exact::ratio(1.0, 10.0);
        let fifth = Exact::ratio(2.0, 10.0);
        // In doubles 0.1 + 0.2 is 0.30000000000000004 and 0.1 * 3 as well.
        assert_eq!(tenth.plus(fifth).rounded(), 0.3);
        assert_eq!(tenth.times(Exact::ratio(3.0, 1.0)).rounded(), 0.3);
    }

    #[test]
    fn zero_has_no_sign() {
        assert!(
            Exact::ratio(0.0, 3.0)
                .negated()
                .rounded()
                .is_sign_positive()
        );
    }
}
