//! How reports show quantities: in the well-known units of a system, to significant digits.
//!
//! ```
//! use lengthwise::quantity::{Dimension, Style, Units};
//! let style = Style { units: Units::US, digits: 4 };
//! assert_eq!(style.quantity(Dimension::Length, 2.8575), "112.5 in");
//! assert_eq!(Style::default().quantity(Dimension::TemperatureChange, 35.0), "+35.00 K");
//! ```
//!
//! What is shown reads back as a literal of its dimension.

use super::exact::{Exact, Twofold};
use super::unit::{CUBIC_FOOT, PI, POUND_FORCE};
use super::{Dimension, Units};

/// In which units and with how many significant digits quantities are shown.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Style {
    /// The system of units.
    pub units: Units,
    /// Significant digits, 1 to 17. Digits before the decimal point are never rounded away.
    pub digits: usize,
}

impl Default for Style {
    /// SI, four digits.
    fn default() -> Self {
        Style {
            units: Units::SI,
            digits: 4,
        }
    }
}

/// Powers of ten that are shown without an exponent: from 0.0001 to below ten million.
const ORDINARY: std::ops::Range<i32> = -4..7;

impl Style {
    /// The unit in which a dimension is shown.
    pub fn unit(&self, dimension: Dimension) -> &'static str {
        shown_in(self.units, dimension).0
    }

    /// The number that stands before the unit, for a value in SI base units (for a reading of
    /// temperature: in kelvins above absolute zero). A change of temperature bears its sign.
    pub fn number(&self, dimension: Dimension, si: f64) -> String {
        let value = self.value(dimension, si);
        let text = significant(value, self.digits);
        if dimension == Dimension::TemperatureChange && value >= 0.0 {
            format!("+{text}")
        } else {
            text
        }
    }

    /// The number and the unit: `2850 mm`. It reads back as a literal of this dimension.
    pub fn quantity(&self, dimension: Dimension, si: f64) -> String {
        format!("{} {}", self.number(dimension, si), self.unit(dimension))
    }

    /// The value in the unit in which it is shown.
    fn value(&self, dimension: Dimension, si: f64) -> f64 {
        let (_, factor) = shown_in(self.units, dimension);
        let value = Exact::ratio(si, 1.0).times(factor.inverse());
        if dimension != Dimension::Temperature {
            return value.rounded();
        }
        let zero = match self.units {
            Units::SI => Exact::ratio(-27_315.0, 100.0),
            Units::US => Exact::ratio(-45_967.0, 100.0),
        };
        let reading = value.plus(zero).rounded();
        // 0 degC is no double in kelvins; what is left of it is not a reading.
        if reading.abs() < 1e-9 { 0.0 } else { reading }
    }
}

/// The unit in which a dimension is shown, and how many SI base units it is.
fn shown_in(units: Units, dimension: Dimension) -> (&'static str, Exact) {
    let degree = Exact {
        over: PI,
        under: Twofold::of(180.0),
    };
    match (units, dimension) {
        (Units::SI, Dimension::Length) => ("mm", Exact::ratio(1.0, 1e3)),
        (Units::SI, Dimension::Area) => ("mm2", Exact::ratio(1.0, 1e6)),
        (Units::SI, Dimension::Force) => ("kN", Exact::ratio(1e3, 1.0)),
        (Units::SI, Dimension::ForcePerLength) => ("kN/mm", Exact::ratio(1e6, 1.0)),
        (Units::SI, Dimension::Moment) => ("kN m", Exact::ratio(1e3, 1.0)),
        (Units::SI, Dimension::Stress) => ("MPa", Exact::ratio(1e6, 1.0)),
        (Units::SI, Dimension::Density) => ("kg/m3", Exact::ONE),
        (Units::SI, Dimension::MassPerLength) => ("kg/m", Exact::ONE),
        (Units::SI, Dimension::Mass) => ("kg", Exact::ONE),
        (Units::SI, Dimension::Expansion) => ("um/m/K", Exact::ratio(1.0, 1e6)),
        (Units::SI, Dimension::Temperature) => ("degC", Exact::ONE),
        (Units::SI, Dimension::TemperatureChange) => ("K", Exact::ONE),
        (Units::US, Dimension::Length) => ("in", Exact::ratio(254.0, 1e4)),
        (Units::US, Dimension::Area) => ("in2", Exact::ratio(64_516.0, 1e8)),
        (Units::US, Dimension::Force) => ("kip", Exact::ratio(POUND_FORCE, 1e10)),
        (Units::US, Dimension::ForcePerLength) => ("kip/in", Exact::ratio(POUND_FORCE, 254e6)),
        (Units::US, Dimension::Moment) => (
            "kip ft",
            Exact::ratio(POUND_FORCE, 1e10).times(Exact::ratio(3048.0, 1e4)),
        ),
        (Units::US, Dimension::Stress) => ("ksi", Exact::ratio(POUND_FORCE, 6_451_600.0)),
        (Units::US, Dimension::Density) => ("lb/ft3", Exact::ratio(453_592_370_000.0, CUBIC_FOOT)),
        (Units::US, Dimension::MassPerLength) => {
            ("lb/ft", Exact::ratio(45_359_237.0, 30_480_000.0))
        }
        (Units::US, Dimension::Mass) => ("lb", Exact::ratio(45_359_237.0, 1e8)),
        (Units::US, Dimension::Expansion) => ("/degF", Exact::ratio(9.0, 5.0)),
        (Units::US, Dimension::Temperature | Dimension::TemperatureChange) => {
            ("degF", Exact::ratio(5.0, 9.0))
        }
        (_, Dimension::Angle) => ("deg", degree),
        (_, Dimension::Strain) => ("ue", Exact::ratio(1.0, 1e6)),
    }
}

/// A number to so many significant digits; the exponent form is one that literals have.
fn significant(value: f64, digits: usize) -> String {
    if value == 0.0 {
        return "0".to_owned();
    }
    let digits = digits.clamp(1, 17);
    // The exponent is read off the rounded form, since 9.9996 is 10.00.
    let scientific = format!("{value:.*e}", digits - 1);
    let exponent = scientific
        .split_once('e')
        .and_then(|(_, exponent)| exponent.parse::<i32>().ok());
    match exponent {
        Some(exponent) if ORDINARY.contains(&exponent) => {
            let decimals = (digits as i32 - 1 - exponent).max(0);
            format!("{value:.*}", decimals as usize)
        }
        _ => scientific,
    }
}

#[cfg(test)]
mod tests {
    use super::{Style, significant};
    use crate::quantity::{
        Angle, Area, Density, Expansion, Force, ForcePerLength, Length, Mass, MassPerLength,
        Moment, Ratio, Stress, TemperatureInterval, ThermodynamicTemperature,
    };
    use crate::quantity::{Dimension, Measure, Units, read};
    use proptest::prelude::*;

    const STYLES: [Units; 2] = [Units::SI, Units::US];

    #[test]
    fn digits_are_significant_and_rounded_once() {
        let cases = [
            (9.9996, 4, "10.00"),
            (9.9994, 4, "9.999"),
            (0.00099996, 4, "0.001000"),
            (2850.0, 4, "2850"),
            (123_456.7, 4, "123457"),
            (-0.0123456, 4, "-0.01235"),
            (9_999_999.6, 4, "1.000e7"),
            (1.23449e-7, 4, "1.234e-7"),
            (0.125, 2, "0.12"), // a tie in binary goes to the even digit
            (0.375, 2, "0.38"),
            (1.0, 1, "1"),
            (9.6, 1, "10"),
            (0.0, 4, "0"),
            (-0.0, 4, "0"),
            (1e-320, 3, "1.00e-320"),
        ];
        for (value, digits, text) in cases {
            assert_eq!(significant(value, digits), text);
        }
    }

    #[test]
    fn well_known_values_in_both_systems() {
        let si = Style::default();
        let us = Style {
            units: Units::US,
            digits: 4,
        };
        // 36 ksi is 248.2 MPa, 0.2836 lb/in³ (490.1 lb/ft³) 7850 kg/m³: common tables.
        assert_eq!(si.quantity(Dimension::Stress, 248.2e6), "248.2 MPa");
        assert_eq!(us.quantity(Dimension::Stress, 248.2e6), "36.00 ksi");
        assert_eq!(us.quantity(Dimension::Density, 7850.0), "490.1 lb/ft3");
        // 1 kip ft is 1.356 kN m, from the same tables.
        assert_eq!(si.quantity(Dimension::Moment, 4e3), "4.000 kN m");
        assert_eq!(us.quantity(Dimension::Moment, 13.56e3), "10.00 kip ft");
        assert_eq!(si.quantity(Dimension::Temperature, 293.15), "20.00 degC");
        assert_eq!(us.quantity(Dimension::Temperature, 293.15), "68.00 degF");
        assert_eq!(si.quantity(Dimension::Temperature, 273.15), "0 degC");
        assert_eq!(
            us.quantity(Dimension::Temperature, 459.67 * 5.0 / 9.0),
            "0 degF"
        );
        assert_eq!(
            us.quantity(Dimension::TemperatureChange, 35.0),
            "+63.00 degF"
        );
        assert_eq!(si.quantity(Dimension::TemperatureChange, -12.5), "-12.50 K");
        assert_eq!(si.quantity(Dimension::TemperatureChange, 0.0), "+0 K");
        assert_eq!(us.quantity(Dimension::Expansion, 11.7e-6), "6.500e-6 /degF");
        assert_eq!(si.quantity(Dimension::Strain, -350e-6), "-350.0 ue");
    }

    /// What is shown reads back to within half a unit of its last digit, and is then shown alike.
    fn reads_back<Q: Measure>(si: f64, digits: usize) -> Result<(), TestCaseError> {
        for units in STYLES {
            let style = Style { units, digits };
            let text = style.quantity(Q::DIMENSION, si);
            let back = match read::<Q>(&text) {
                Ok(back) => back,
                Err(error) => return Err(TestCaseError::fail(format!("{text}: {error}"))),
            };
            // The zero of a scale lies up to 460 degF from absolute zero.
            let size = match Q::DIMENSION {
                Dimension::Temperature => si + 300.0,
                _ => si.abs(),
            };
            let half = 0.5 * 10f64.powi(1 - digits as i32);
            let off = (back.nominal.si() - si).abs();
            prop_assert!(
                off <= size * (half + 1e-15),
                "{} for {}: off by {}",
                text,
                si,
                off
            );
            // What is shown of what was read is the same text.
            prop_assert_eq!(style.quantity(Q::DIMENSION, back.nominal.si()), text);
        }
        Ok(())
    }

    proptest! {
        #[test]
        fn what_is_shown_reads_back(
            size in -30.0f64..30.0,
            negative: bool,
            kelvin in 0.0f64..5000.0,
            digits in 1usize..=14,
        ) {
            let si = 10f64.powf(size) * if negative { -1.0 } else { 1.0 };
            reads_back::<Length>(si, digits)?;
            reads_back::<Area>(si, digits)?;
            reads_back::<Force>(si, digits)?;
            reads_back::<ForcePerLength>(si, digits)?;
            reads_back::<Moment>(si, digits)?;
            reads_back::<Stress>(si, digits)?;
            reads_back::<Density>(si, digits)?;
            reads_back::<MassPerLength>(si, digits)?;
            reads_back::<Mass>(si, digits)?;
            reads_back::<Expansion>(si, digits)?;
            reads_back::<TemperatureInterval>(si, digits)?;
            reads_back::<Angle>(si, digits)?;
            reads_back::<Ratio>(si, digits)?;
            reads_back::<ThermodynamicTemperature>(kelvin, digits.max(5))?;
        }
    }
}
