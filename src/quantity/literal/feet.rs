//! Feet and inches, and their marks.

use super::cursor::Cursor;
use super::expression::Written;
use super::number::{Number, number};
use super::{LiteralError, refuse};
use crate::quantity::exact::Exact;
use crate::quantity::unit::INCH;

const FEET: [&str; 3] = ["'", "′", "’"];
const INCHES: [&str; 4] = ["\"", "″", "”", "''"];

const HOW: &str = "write feet and inches as in `9 ft 4-1/2 in`, or with the marks ' and \"";

/// Reads on after a number if feet or inches with a mark, or feet and inches, stand there: the
/// number in inches. `9 ft` alone is a number and a unit like others, and is left.
pub(super) fn feet_inches(
    cursor: &mut Cursor<'_>,
    first: &Number,
) -> Result<Option<(Exact, Written)>, LiteralError> {
    // Most literals are neither: no mark and no `f` comes next.
    if !matches!(cursor.peek(), Some(b'\'' | b'"' | b'f' | 0x80..)) {
        return Ok(None);
    }
    let start = cursor.at();
    if cursor.take_any(&INCHES) {
        let unit = Written::named(&INCH, start..cursor.at());
        return Ok(Some((first.value, unit)));
    }
    let mark = cursor.take_any(&FEET);
    let mut ahead = *cursor;
    if !mark && !ahead.take("ft") {
        return Ok(None);
    }
    let feet_end = ahead.at();
    let parted = part(&mut ahead);
    if !ahead.on_digit() || !(mark || parted) {
        // The mark alone is whole feet; `ft` alone, or with a power, is left to the units.
        return Ok(mark.then(|| {
            let inches = first.value.times(Exact::ratio(12.0, 1.0));
            (inches, Written::named(&INCH, start..feet_end))
        }));
    }
    if !first.whole {
        return Err(refuse(
            first.at.clone(),
            "feet before inches are a whole number",
            HOW,
        ));
    }
    let inches = number(&mut ahead)?;
    ahead.blanks();
    let unit_start = ahead.at();
    let marked = ahead.take_any(&INCHES) || ahead.take("in");
    if !marked || ahead.rest.starts_with(char::is_alphanumeric) {
        return Err(refuse(
            unit_start..ahead.word_at().end.max(unit_start),
            "after feet and a number the inches lack their unit",
            HOW,
        ));
    }
    if inches.value.rounded() >= 12.0 {
        return Err(refuse(
            inches.at,
            "the inches after feet are less than 12",
            HOW,
        ));
    }
    *cursor = ahead;
    let all = first
        .value
        .times(Exact::ratio(12.0, 1.0))
        .plus(inches.value);
    Ok(Some((all, Written::named(&INCH, start..cursor.at()))))
}

/// Reads what may part feet from inches: blanks, a hyphen, or a hyphen between blanks. A hyphen
/// with a blank before it alone is the sign of a tolerance.
fn part(cursor: &mut Cursor<'_>) -> bool {
    let blank = cursor.blanks();
    let mut ahead = *cursor;
    if !ahead.take("-") {
        return blank;
    }
    if ahead.blanks() == blank {
        *cursor = ahead;
    }
    true
}
