//! The tolerance of a literal: `± 3 mm`, `± 5 %`, `+0.2/-0.1 mm`.

use super::cursor::{Cursor, Sign};
use super::expression::{Written, opens_deviation};
use super::number::number;
use super::{LiteralError, counted, held, refuse, to_si};
use crate::quantity::Dimension;
use crate::quantity::exact::Exact;
use std::ops::Range;

pub(super) const HOW: &str =
    "a tolerance is written as in `± 3 mm`, `+/- 3 mm`, `± 5 %` or `+0.2/-0.1 mm`";

/// The lower and the upper deviation from the nominal value, in SI base units.
type Deviations = (f64, f64);

/// Reads a tolerance if one comes next; `nominal` is the value before it in SI base units.
pub(super) fn tolerance(
    cursor: &mut Cursor<'_>,
    dimension: Dimension,
    nominal: f64,
) -> Result<Option<Deviations>, LiteralError> {
    if cursor.is_done() {
        return Ok(None);
    }
    // The tolerance of a reading is an interval.
    let dimension = match dimension {
        Dimension::Temperature => Dimension::TemperatureChange,
        other => other,
    };
    // A share of a reading, or of a strain, whose unit is `%` as well, would say two things.
    let share = match dimension {
        Dimension::TemperatureChange | Dimension::Strain => None,
        _ => Some(nominal.abs()),
    };
    let start = cursor.at();
    if cursor.take_any(&["±", "+/-", "+/−"]) {
        cursor.blanks();
        let sign_at = cursor.at();
        if cursor.sign().is_some() {
            return Err(refuse(
                sign_at..cursor.at(),
                "what stands after `±` has no sign",
                HOW,
            ));
        }
        let half = side(cursor, dimension)?;
        let half = deviation(&half, &half.scale, dimension, share, cursor)?;
        return Ok(Some((-half, half)));
    }
    let Some(sign) = cursor.sign() else {
        return Ok(None);
    };
    cursor.blanks();
    let first = side(cursor, dimension)?;
    cursor.blanks();
    if !cursor.take("/") {
        return Err(refuse(
            start..cursor.at(),
            "this tolerance lacks its other side",
            HOW,
        ));
    }
    cursor.blanks();
    let second_start = cursor.at();
    let second_sign = cursor.sign();
    cursor.blanks();
    let second = side(cursor, dimension)?;
    if let Scale::Open = second.scale {
        return Err(refuse(
            second.at,
            "this tolerance has more than two sides",
            HOW,
        ));
    }
    let at = start..cursor.at();
    let scale = match first.scale {
        Scale::Open => &second.scale,
        ref own => own,
    };
    let a = deviation(&first, scale, dimension, share, cursor)?;
    let b = deviation(&second, &second.scale, dimension, share, cursor)?;
    if second_sign.is_none() && b != 0.0 {
        return Err(refuse(
            second_start..cursor.at(),
            "this side of the tolerance lacks its sign",
            HOW,
        ));
    }
    let (a, b) = (
        signed(a, sign),
        signed(b, second_sign.unwrap_or(Sign::Plus)),
    );
    sides(a, b, at).map(Some)
}

/// A deviation without its sign.
struct Side {
    number: Exact,
    scale: Scale,
    at: Range<usize>,
}

/// What the number of a deviation counts.
enum Scale {
    /// A unit.
    Unit(Written),
    /// Hundredths of the value before the tolerance.
    Percent,
    /// The unit that stands after the other side.
    Open,
}

/// Reads a deviation without its sign: in a unit, in percent, or with the unit left to the other
/// side.
fn side(cursor: &mut Cursor<'_>, dimension: Dimension) -> Result<Side, LiteralError> {
    let start = cursor.at();
    let first = number(cursor)?;
    cursor.blanks();
    let (number, scale) = if cursor.take("%") {
        (first.value, Scale::Percent)
    } else if before_other_side(cursor) {
        (first.value, Scale::Open)
    } else {
        let (number, unit) = counted(cursor, dimension, &first)?;
        (number, Scale::Unit(unit))
    };
    Ok(Side {
        number,
        scale,
        at: start..cursor.at(),
    })
}

/// Whether `/` and a signed number come next.
fn before_other_side(cursor: &Cursor<'_>) -> bool {
    let mut ahead = *cursor;
    if !ahead.take("/") {
        return false;
    }
    ahead.blanks();
    opens_deviation(&ahead)
}

fn signed(size: f64, sign: Sign) -> f64 {
    match sign {
        Sign::Plus => size,
        Sign::Minus => -size,
    }
}

/// Two deviations in order; the nominal value has to lie between them.
fn sides(a: f64, b: f64, at: Range<usize>) -> Result<Deviations, LiteralError> {
    let (lower, upper) = (a.min(b), a.max(b));
    if lower > 0.0 || upper < 0.0 {
        return Err(refuse(
            at,
            "both sides of this tolerance lie on one side of the value",
            "write a value that lies within its range, then one side with `+` and one with `-`",
        ));
    }
    Ok((lower, upper))
}

/// The size of a deviation in SI base units.
fn deviation(
    amount: &Side,
    scale: &Scale,
    dimension: Dimension,
    share: Option<f64>,
    cursor: &Cursor<'_>,
) -> Result<f64, LiteralError> {
    match (scale, share) {
        (Scale::Unit(unit), _) => {
            let value = to_si(amount.number, unit, dimension, cursor)?;
            held(value, &amount.at, cursor)
        }
        (Scale::Percent, Some(share)) => {
            let percent = amount.number.times(Exact::ratio(1.0, 100.0));
            Ok(held(percent, &amount.at, cursor)? * share)
        }
        (Scale::Percent, None) => Err(refuse(
            amount.at.clone(),
            format!("a tolerance of {} is no share of it", dimension.name()),
            match dimension {
                Dimension::Strain => "write it as a strain, such as `± 20 ue`",
                _ => "write it as an interval, such as `± 3 K`",
            },
        )),
        (Scale::Open, _) => Err(refuse(
            amount.at.clone(),
            "this tolerance lacks its unit",
            HOW,
        )),
    }
}
