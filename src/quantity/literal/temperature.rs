//! Readings and changes of temperature, which must not be taken for each other.

use super::cursor::{Cursor, Sign};
use super::expression::Written;
use super::{LiteralError, expected, refuse};
use crate::quantity::Dimension;
use crate::quantity::exact::Exact;
use std::ops::Range;

/// Holds the rule of signs: a change has one, a reading never has a `+`. The value has been read
/// from `start` on.
pub(super) fn hold_sign(
    dimension: Dimension,
    sign: Option<Sign>,
    start: usize,
    cursor: &Cursor<'_>,
) -> Result<(), LiteralError> {
    match (dimension, sign) {
        (Dimension::TemperatureChange, None) => {
            let text = cursor.since(start);
            Err(refuse(
                start..cursor.at(),
                "a change of temperature has its sign",
                format!(
                    "write `+{text}` for warmer or `-{text}` for cooler; what a thermometer shows \
                     is given under `temperature`"
                ),
            ))
        }
        (Dimension::Temperature, Some(Sign::Plus)) => Err(refuse(
            start..start + 1,
            "a reading of temperature has no `+`",
            "leave the `+` out if this is what a thermometer shows; a change is given under \
             `temperature-change`",
        )),
        _ => Ok(()),
    }
}

/// The reading in kelvins: 0 degC is 273.15 K, 0 degF is 459.67 · 5/9 K (BIPM; NIST SP 811, B.8).
pub(super) fn reading(number: Exact, unit: &Written) -> Result<Exact, LiteralError> {
    let zero = match unit.alone.map(|unit| unit.name) {
        Some("K") => Exact::ratio(0.0, 1.0),
        Some("degC" | "°C") => Exact::ratio(27_315.0, 100.0),
        Some("degF" | "°F") => Exact::ratio(45_967.0, 100.0),
        _ => {
            return Err(refuse(
                unit.at.clone(),
                "a reading of temperature has no compound unit",
                expected(Dimension::Temperature),
            ));
        }
    };
    Ok(number.plus(zero).times(unit.factor))
}

/// Refuses what lies below absolute zero.
pub(super) fn hold_above_zero(kelvin: f64, at: Range<usize>) -> Result<(), LiteralError> {
    if kelvin >= 0.0 {
        return Ok(());
    }
    Err(refuse(
        at,
        "this reading is below absolute zero",
        "a reading is 0 K, -273.15 degC, -459.67 degF or more; a change is given under \
         `temperature-change`",
    ))
}
