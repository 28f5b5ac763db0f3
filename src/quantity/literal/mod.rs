//! Quantity literals: the text of a value with its unit, read.
//!
//! ```
//! use lengthwise::quantity::{Length, read, read_change, read_reading};
//!
//! let length = read::<Length>("2.85 m ± 3 mm")?;
//! assert_eq!(length.nominal.value, 2.85); // metres
//! assert_eq!(length.upper.value, 2.853);
//! assert_eq!(read::<Length>("9 ft 4-1/2 in")?.nominal.value, 2.8575);
//! assert_eq!(read_reading("20 degC")?.nominal.value, 293.15); // kelvins
//! assert_eq!(read_change("-55 degC")?.nominal.value, -55.0);
//!
//! let error = read::<Length>("62 kN").unwrap_err();
//! assert_eq!(error.message, "`kN` is a force; a length is expected here");
//! assert_eq!(error.at, 3..5);
//! # Ok::<(), lengthwise::quantity::LiteralError>(())
//! ```
//!
//! The value is the double nearest to what the text says in SI base units, for numbers of up to 19
//! digits; longer ones are within two units of the last place.

mod cursor;
mod expression;
mod feet;
mod number;
mod share;
mod temperature;
mod tolerance;

pub use share::{MovementBound, Strength, StressLimit, read_movement_bound, read_stress_limit};

use super::exact::Exact;
use super::unit::Powers;
use super::{Dimension, Measure, TemperatureInterval, ThermodynamicTemperature};
use cursor::{Cursor, Sign};
use expression::Written;
use number::Number;
use std::ops::Range;

/// What a literal said: its nominal value, and the range that its tolerance gives.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Literal<Q> {
    /// The value as written, without its tolerance.
    pub nominal: Q,
    /// The least value; the nominal one where no tolerance is written.
    pub lower: Q,
    /// The largest value; the nominal one where no tolerance is written.
    pub upper: Q,
    /// Whether a tolerance is written.
    pub toleranced: bool,
}

/// Why a text is no literal of what is expected.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
#[error("{message}")]
pub struct LiteralError {
    /// The bytes of the text that are at fault; empty at the end where something is missing.
    pub at: Range<usize>,
    /// What is wrong, one sentence without a full stop.
    pub message: String,
    /// What to write instead.
    pub help: String,
}

/// Longer than any value; what is longer is refused unread.
const LONGEST: usize = 200;

/// The least and the largest size in SI base units, so that no square or product of two values
/// overflows or vanishes. Zero is held too.
const LEAST: f64 = 1e-100;
const LARGEST: f64 = 1e100;

/// Reads a literal of the dimension of `Q`.
///
/// # Errors
///
/// Where the text is no number with a unit of that dimension, it says which part of it is at
/// fault, and what is accepted there. A nonzero value whose size in SI base units is not between
/// 1e-100 and 1e100 is refused, denormal numbers among them.
pub fn read<Q: Measure>(text: &str) -> Result<Literal<Q>, LiteralError> {
    let read = values(text, Q::DIMENSION)?;
    Ok(Literal {
        nominal: Q::from_si(read.nominal),
        lower: Q::from_si(read.lower),
        upper: Q::from_si(read.upper),
        toleranced: read.toleranced,
    })
}

/// Reads a change of temperature, `"+35 K"` or `"-55 degF"`.
///
/// # Errors
///
/// As [`read`], and where the sign is missing.
pub fn read_change(text: &str) -> Result<Literal<TemperatureInterval>, LiteralError> {
    read(text)
}

/// Reads a reading of temperature, `"20 degC"` or `"-18 degC"`, into kelvins.
///
/// # Errors
///
/// As [`read`], and where there is a leading `+` or the reading is below absolute zero.
pub fn read_reading(text: &str) -> Result<Literal<ThermodynamicTemperature>, LiteralError> {
    read(text)
}

/// Reads a literal into numbers in SI base units.
fn values(text: &str, dimension: Dimension) -> Result<Literal<f64>, LiteralError> {
    if text.len() > LONGEST {
        return Err(refuse(
            0..text.len(),
            format!("this text of {} bytes is no value with a unit", text.len()),
            expected(dimension),
        ));
    }
    let mut cursor = Cursor::new(text);
    cursor.blanks();
    if cursor.is_done() {
        return Err(refuse(
            0..text.len(),
            format!(
                "nothing is written here, where {} is expected",
                dimension.name()
            ),
            expected(dimension),
        ));
    }
    let start = cursor.at();
    let sign = cursor.sign();
    cursor.blanks();
    let first =
        number::number(&mut cursor).map_err(|error| no_number(error, &cursor, dimension))?;
    cursor.blanks();
    let (size, unit) = counted(&mut cursor, dimension, &first)?;
    let signed = match sign {
        Some(Sign::Minus) => size.negated(),
        _ => size,
    };
    let at = start..cursor.at();
    let nominal = held(to_si(signed, &unit, dimension, &cursor)?, &at, &cursor)?;
    temperature::hold_sign(dimension, sign, start, &cursor)?;
    cursor.blanks();
    let deviations = tolerance::tolerance(&mut cursor, dimension, nominal)?;
    cursor.blanks();
    if !cursor.is_done() {
        return Err(leftover(&cursor));
    }
    let (below, above) = deviations.unwrap_or((0.0, 0.0));
    let read = Literal {
        nominal,
        lower: nominal + below,
        upper: nominal + above,
        toleranced: deviations.is_some(),
    };
    if dimension == Dimension::Temperature {
        temperature::hold_above_zero(read.nominal, at)?;
        temperature::hold_above_zero(read.lower, start..cursor.at())?;
    }
    Ok(read)
}

/// Reads what a number counts: the number again (in inches, where there are feet as well), and the
/// unit.
fn counted(
    cursor: &mut Cursor<'_>,
    dimension: Dimension,
    first: &Number,
) -> Result<(Exact, Written), LiteralError> {
    match feet::feet_inches(cursor, first)? {
        Some(inches) => Ok(inches),
        None => Ok((first.value, expression::unit(cursor, dimension)?)),
    }
}

/// The number in SI base units, if the unit is one of this dimension.
fn to_si(
    number: Exact,
    unit: &Written,
    dimension: Dimension,
    cursor: &Cursor<'_>,
) -> Result<Exact, LiteralError> {
    if dimension == Dimension::Temperature && unit.powers == Powers::TEMPERATURE {
        return temperature::reading(number, unit);
    }
    let value = number.times(unit.factor);
    if unit.powers == dimension.powers() {
        Ok(value)
    } else if dimension == Dimension::Density && unit.powers == Powers::UNIT_WEIGHT {
        // A unit weight, divided by standard gravity.
        Ok(value.times(Exact::ratio(100_000.0, 980_665.0)))
    } else {
        Err(wrong_kind(unit, dimension, cursor))
    }
}

/// The double nearest to a value, if it is within the sizes that are held.
fn held(value: Exact, at: &Range<usize>, cursor: &Cursor<'_>) -> Result<f64, LiteralError> {
    let rounded = value.rounded();
    // A zero is one only if it was written so, and is none that a unit has pressed to nothing.
    let zero = value.over.high == 0.0 && value.under.high.is_finite();
    if zero || (LEAST..=LARGEST).contains(&rounded.abs()) {
        return Ok(rounded);
    }
    Err(refuse(
        at.clone(),
        format!("`{}` is too large or too small", cursor.quote(at)),
        "in SI base units (m, N, Pa, K, kg) a value is 0, or its size lies between 1e-100 and 1e100",
    ))
}

#[cold]
fn refuse(at: Range<usize>, message: impl Into<String>, help: impl Into<String>) -> LiteralError {
    LiteralError {
        at,
        message: message.into(),
        help: help.into(),
    }
}

/// What is accepted where this dimension is expected.
#[cold]
fn expected(dimension: Dimension) -> String {
    format!(
        "write it as in \"{}\"; units of {}: {}",
        dimension.example(),
        dimension.name(),
        dimension.accepted()
    )
}

/// Why no number starts here; a share where only a value is read is told as such.
#[cold]
fn no_number(error: LiteralError, cursor: &Cursor<'_>, dimension: Dimension) -> LiteralError {
    match share::out_of_place(share::word(*cursor)) {
        Some(message) => refuse(error.at, message, expected(dimension)),
        None => error,
    }
}

/// Why the unit is not one of this dimension.
#[cold]
fn wrong_kind(unit: &Written, dimension: Dimension, cursor: &Cursor<'_>) -> LiteralError {
    let wanted = dimension.powers();
    let message = format!(
        "`{}` is {}; {} is expected here",
        cursor.quote(&unit.at),
        unit.powers.kind(),
        dimension.name()
    );
    let help = if unit.powers.weight() == wanted {
        format!(
            "`kg`, `g` and `t` are masses; for their weight write `kgf`, `tf` (metric ton-force) \
             or `kN`, as in \"{}\"",
            dimension.example()
        )
    } else {
        expected(dimension)
    };
    refuse(unit.at.clone(), message, help)
}

/// Why what stands after the value is not read.
#[cold]
fn leftover(cursor: &Cursor<'_>) -> LiteralError {
    let at = cursor.word_at();
    let word = cursor.quote(&at);
    let help = if cursor.rest.starts_with('.') {
        "units are written without a full stop".to_owned()
    } else {
        format!(
            "nothing else stands there but a tolerance; {}",
            tolerance::HOW
        )
    };
    refuse(
        at,
        format!("`{word}` after the unit is not understood"),
        help,
    )
}

#[cfg(test)]
mod tests;
