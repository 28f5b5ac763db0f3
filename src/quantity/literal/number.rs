//! The number of a literal: decimal, fraction, or a whole number and a fraction.

use super::cursor::Cursor;
use super::{LiteralError, refuse};
use crate::quantity::exact::{Exact, Twofold};
use std::ops::Range;

/// A number without its sign.
#[derive(Debug, Clone)]
pub(super) struct Number {
    pub(super) value: Exact,
    /// Digits alone, without point, exponent or fraction.
    pub(super) whole: bool,
    pub(super) at: Range<usize>,
}

/// Powers of ten that a double holds without loss.
const TENS: [f64; 23] = [
    1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16,
    1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
];

/// Beyond this a number is no size of anything, and products in between could overflow.
const LARGEST: f64 = 1e150;

const HOW: &str = "a number is written as `2.85`, `1_250`, `28.5e6`, `5/8` or `1-1/2`";

/// Reads a number: `2.85`, `1_250`, `28.5e6`, `5/8`, `1-1/2`, `1 1/2`.
pub(super) fn number(cursor: &mut Cursor<'_>) -> Result<Number, LiteralError> {
    let first = decimal(cursor)?;
    if !first.whole {
        return Ok(first);
    }
    let start = first.at.start;
    if let Some(part) = fraction(cursor, first.clone())? {
        return Ok(part);
    }
    // A whole number and a fraction: `1-1/2` or `1 1/2`.
    let mut ahead = *cursor;
    if !(ahead.take("-") || ahead.blanks()) || !ahead.on_digit() {
        return Ok(first);
    }
    let Ok(over) = decimal(&mut ahead) else {
        return Ok(first);
    };
    let Some(part) = fraction(&mut ahead, over)? else {
        return Ok(first);
    };
    if part.value.rounded() >= 1.0 {
        return Err(refuse(
            part.at.clone(),
            format!(
                "the fraction `{}` after a whole number is not less than 1",
                cursor.quote(&part.at)
            ),
            "write a whole number and a proper fraction, as in `1-1/2`",
        ));
    }
    *cursor = ahead;
    Ok(Number {
        value: first.value.plus(part.value),
        whole: false,
        at: start..cursor.at(),
    })
}

/// Reads on after a whole number if it is the upper part of a fraction.
fn fraction(cursor: &mut Cursor<'_>, over: Number) -> Result<Option<Number>, LiteralError> {
    let mut ahead = *cursor;
    if !over.whole || !ahead.take("/") || !ahead.on_digit() {
        return Ok(None);
    }
    let under = decimal(&mut ahead)?;
    let at = over.at.start..ahead.at();
    if !under.whole {
        return Err(refuse(
            under.at,
            "the lower part of a fraction is a whole number",
            "write a fraction as in `5/8`, or the value with a decimal point",
        ));
    }
    if under.value.over.high == 0.0 {
        return Err(refuse(
            at,
            "this fraction divides by zero",
            "write a fraction as in `5/8`; a tolerance to one side as in `+0.2/-0 mm`",
        ));
    }
    *cursor = ahead;
    Ok(Some(Number {
        value: over.value.times(under.value.inverse()),
        whole: false,
        at,
    }))
}

/// Reads a decimal number.
fn decimal(cursor: &mut Cursor<'_>) -> Result<Number, LiteralError> {
    let start = cursor.at();
    if !cursor.on_digit() {
        return Err(no_number(cursor));
    }
    let mut digits = Digits::default();
    digits.read(cursor)?;
    let mut exponent = 0;
    let mut whole = true;
    let mut ahead = *cursor;
    if ahead.take(".") {
        if !ahead.on_digit() {
            return Err(refuse(
                start..ahead.at(),
                format!(
                    "a digit is missing after the decimal point of `{}`",
                    ahead.since(start)
                ),
                HOW,
            ));
        }
        let before = digits.count;
        digits.read(&mut ahead)?;
        exponent = before - digits.count;
        whole = false;
        *cursor = ahead;
    }
    let mut ahead = *cursor;
    if ahead.take("e") || ahead.take("E") {
        let negative = ahead.sign() == Some(super::cursor::Sign::Minus);
        if ahead.on_digit() {
            let mut power = Digits::default();
            power.read(&mut ahead)?;
            // Ten thousand is past every double already.
            let power = power.mantissa.min(10_000) as i32;
            exponent += if negative { -power } else { power };
            whole = false;
            *cursor = ahead;
        }
    }
    if cursor.rest.starts_with(',') {
        return Err(refuse(
            start..cursor.word_at().end,
            "a comma is not read in a number",
            "the decimal mark is a point, as in `2.85`; thousands may be set apart as in `1_250`",
        ));
    }
    let at = start..cursor.at();
    let value = digits.value(exponent, cursor.since(start));
    match value {
        Some(value) => Ok(Number { value, whole, at }),
        None => Err(refuse(
            at,
            format!("`{}` is too large or too small", cursor.since(start)),
            "a number is 0, or its size lies between 1e-150 and 1e150",
        )),
    }
}

/// Digits that were read, underscores left out.
#[derive(Default)]
struct Digits {
    /// The number that the first 19 make.
    mantissa: u64,
    /// How many there are, zeros at the head left out.
    significant: usize,
    /// How many there are in all.
    count: i32,
}

impl Digits {
    fn read(&mut self, cursor: &mut Cursor<'_>) -> Result<(), LiteralError> {
        let mut last = b'_';
        let mut length = 0;
        for &byte in cursor.rest.as_bytes() {
            match byte {
                b'0'..=b'9' => {
                    self.count += 1;
                    if byte != b'0' || self.significant > 0 {
                        self.significant += 1;
                    }
                    if self.significant <= 19 {
                        self.mantissa = self.mantissa * 10 + u64::from(byte - b'0');
                    }
                }
                b'_' if last != b'_' => {}
                _ => break,
            }
            last = byte;
            length += 1;
        }
        let stray = last == b'_' || cursor.rest.as_bytes().get(length) == Some(&b'_');
        cursor.rest = cursor.rest.get(length..).unwrap_or("");
        if stray {
            let at = cursor.at();
            return Err(refuse(
                at.saturating_sub(1)..at,
                "an underscore stands only between two digits",
                HOW,
            ));
        }
        Ok(())
    }

    /// The digits times ten to the power `exponent`, whose text is `written`; nothing if it is out
    /// of range.
    fn value(&self, exponent: i32, written: &str) -> Option<Exact> {
        if self.significant == 0 {
            return Some(Exact::ratio(0.0, 1.0));
        }
        let tens = TENS.get(exponent.unsigned_abs() as usize);
        if let (Some(&tens), true) = (tens, self.significant <= 19) {
            let digits = Twofold::whole(self.mantissa);
            let tens = Twofold::of(tens);
            return Some(if exponent < 0 {
                Exact {
                    over: digits,
                    under: tens,
                }
            } else {
                Exact {
                    over: digits.times(tens),
                    under: Twofold::ONE,
                }
            });
        }
        // Longer than any measurement: the standard library rounds it rightly to a double.
        let plain: String = written.chars().filter(|&c| c != '_').collect();
        let value: f64 = plain.parse().ok()?;
        let fits = (LARGEST.recip()..=LARGEST).contains(&value);
        fits.then(|| Exact::ratio(value, 1.0))
    }
}

/// Why no number starts here.
fn no_number(cursor: &Cursor<'_>) -> LiteralError {
    let at = cursor.word_at();
    let word = cursor.quote(&at);
    let lower = word.to_lowercase();
    let message = match cursor.peek() {
        None => "a number is missing here".to_owned(),
        Some(b'.') => format!("a digit is missing before the decimal point of `{word}`"),
        Some(b'_') => "an underscore stands only between two digits".to_owned(),
        Some(b',') => "a comma is not read in a number".to_owned(),
        _ if ["nan", "inf", "infinity"].contains(&lower.as_str()) => {
            format!("`{word}` is no number that can be computed with")
        }
        _ => format!("a number is expected before `{word}`"),
    };
    refuse(at, message, HOW)
}
