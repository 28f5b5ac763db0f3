//! The unit of a literal: names, powers, products and quotients.

use super::cursor::{Cursor, Sign};
use super::{LiteralError, expected, refuse, share};
use crate::quantity::Dimension;
use crate::quantity::exact::Exact;
use crate::quantity::unit::{self, Pound, Powers, Unit};
use std::ops::Range;

/// A unit as written.
#[derive(Debug, Clone)]
pub(super) struct Written {
    pub(super) powers: Powers,
    /// How many SI base units it is.
    pub(super) factor: Exact,
    /// The unit, where a name stands alone.
    pub(super) alone: Option<&'static Unit>,
    pub(super) at: Range<usize>,
}

impl Written {
    /// A named unit that stands alone.
    pub(super) fn named(unit: &'static Unit, at: Range<usize>) -> Self {
        Written {
            powers: unit.powers,
            factor: unit.factor,
            alone: Some(unit),
            at,
        }
    }
}

/// Reads a unit: `kN`, `N/mm2`, `um/m/K`, `kip ft`, `/degF`.
pub(super) fn unit(cursor: &mut Cursor<'_>, dimension: Dimension) -> Result<Written, LiteralError> {
    let start = cursor.at();
    let mut below = begins_below(cursor);
    let mut powers = Powers::NONE;
    let mut factor = Exact::ONE;
    let mut terms = 0;
    loop {
        let unit = name(cursor, dimension)?;
        let power = match power(cursor)? {
            power if below => -power,
            power => power,
        };
        terms += 1;
        powers = powers.times(unit.powers, power);
        let once = if power < 0 {
            unit.factor.inverse()
        } else {
            unit.factor
        };
        for _ in 0..power.unsigned_abs() {
            factor = factor.times(once);
        }
        let end = cursor.at();
        match joint(cursor) {
            Joint::End => {
                return Ok(Written {
                    powers,
                    factor,
                    alone: (terms == 1 && power == 1).then_some(unit),
                    at: start..end,
                });
            }
            Joint::Times => {}
            Joint::Over => below = true,
        }
    }
}

/// What joins a name to the next.
enum Joint {
    Times,
    Over,
    End,
}

/// Reads a leading `/` or `1/`.
fn begins_below(cursor: &mut Cursor<'_>) -> bool {
    let mut ahead = *cursor;
    if ahead.take("1") {
        ahead.blanks();
    }
    if !ahead.take("/") {
        return false;
    }
    ahead.blanks();
    *cursor = ahead;
    true
}

/// Reads what joins the name before to the next; nothing where the unit has ended.
fn joint(cursor: &mut Cursor<'_>) -> Joint {
    let mut ahead = *cursor;
    let blank = ahead.blanks();
    let joint = if ahead.take_any(&["*", "·", "⋅"]) {
        Joint::Times
    } else if ahead.take("/") {
        Joint::Over
    } else if blank && ahead.rest.starts_with(begins_name) {
        Joint::Times
    } else {
        return Joint::End;
    };
    ahead.blanks();
    // `+0.2 mm/-0.1 mm`: the stroke parts two deviations.
    if matches!(joint, Joint::Over) && opens_deviation(&ahead) {
        return Joint::End;
    }
    *cursor = ahead;
    joint
}

/// Whether a signed number, or a digit, comes next.
pub(super) fn opens_deviation(cursor: &Cursor<'_>) -> bool {
    cursor.on_digit() || cursor.rest.starts_with(['+', '-', '−'])
}

fn begins_name(c: char) -> bool {
    c.is_alphabetic() || c == '°'
}

/// Reads the name of a unit.
fn name(cursor: &mut Cursor<'_>, dimension: Dimension) -> Result<&'static Unit, LiteralError> {
    let start = cursor.at();
    if !cursor.take("%") {
        let length = name_length(cursor.rest);
        cursor.rest = cursor.rest.get(length..).unwrap_or("");
    }
    let written = cursor.since(start);
    let pound = match dimension {
        Dimension::Density | Dimension::MassPerLength | Dimension::Mass => Pound::Mass,
        _ => Pound::Force,
    };
    match unit::named(written, pound) {
        Some(unit) => Ok(unit),
        None if written.is_empty() => Err(missing(cursor, dimension)),
        None => Err(unknown(written, start..cursor.at(), dimension)),
    }
}

/// How many bytes at the head of `rest` are a name: letters, after a hyphen more letters
/// (`tonf-us`).
fn name_length(rest: &str) -> usize {
    let letters = rest.find(|c| !begins_name(c)).unwrap_or(rest.len());
    let after = rest.get(letters..).unwrap_or("");
    match after.strip_prefix('-') {
        Some(more) if letters > 0 && more.starts_with(char::is_alphabetic) => {
            let end = more.find(|c: char| !c.is_alphabetic());
            letters + 1 + end.unwrap_or(more.len())
        }
        _ => letters,
    }
}

/// Reads a power: `2`, `^2`, `²`, `^-1`, `⁻¹`; 1 where none is written.
fn power(cursor: &mut Cursor<'_>) -> Result<i16, LiteralError> {
    let start = cursor.at();
    let raised = cursor.take("^");
    let mut ahead = *cursor;
    let negative = (raised && ahead.sign() == Some(Sign::Minus)) || (!raised && ahead.take("⁻"));
    let digit = ahead.rest.chars().next().and_then(|c| match c {
        '1'..='9' => c.to_digit(10).map(|digit| digit as i16),
        '¹' => Some(1),
        '²' => Some(2),
        '³' => Some(3),
        '⁴' => Some(4),
        _ => None,
    });
    let Some(digit) = digit else {
        if raised || negative {
            return Err(refuse(
                start..ahead.word_at().end,
                "a power is missing here",
                "write a power as in `mm2`, `mm^2` or `mm²`",
            ));
        }
        return Ok(1);
    };
    let mut rest = ahead.rest.chars();
    rest.next();
    ahead.rest = rest.as_str();
    if ahead.on_digit() {
        return Err(refuse(
            start..ahead.word_at().end,
            "a power of a unit has one digit",
            "write a power as in `mm2`, `mm^2` or `mm²`",
        ));
    }
    *cursor = ahead;
    Ok(if negative { -digit } else { digit })
}

/// Why no name starts here.
#[cold]
fn missing(cursor: &Cursor<'_>, dimension: Dimension) -> LiteralError {
    let at = cursor.word_at();
    let word = cursor.quote(&at);
    // A word ahead is no unit where a tolerance begins or the text ends.
    if at.is_empty() || word.starts_with(['±', '+', '-', '−']) {
        let before = cursor.text.get(..cursor.at()).unwrap_or("").trim();
        return refuse(
            if at.is_empty() {
                0..cursor.text.len()
            } else {
                at
            },
            format!("a unit is missing after `{before}`"),
            expected(dimension),
        );
    }
    refuse(at, format!("`{word}` is no unit"), expected(dimension))
}

/// Why this name is none.
#[cold]
fn unknown(name: &str, at: Range<usize>, dimension: Dimension) -> LiteralError {
    let shown: String = name.chars().take(32).collect();
    let lower = name.to_lowercase();
    let for_a_mass = matches!(
        dimension,
        Dimension::Density | Dimension::MassPerLength | Dimension::Mass
    );
    match lower.as_str() {
        "tonf" | "ton" | "tons" => {
            let help = if for_a_mass {
                "write `t` (1000 kg) for the metric tonne, or `kg` or `lb`"
            } else {
                "write `tf` for the metric ton-force (9.80665 kN), `tonf-us` for the US short \
                 ton-force (2000 lbf), or `kN` or `kip`"
            };
            refuse(
                at,
                format!("`{shown}` is ambiguous: the ton is metric, short (US) or long"),
                help,
            )
        }
        _ => match share::out_of_place(&lower) {
            Some(message) => refuse(at, message, expected(dimension)),
            None => refuse(
                at,
                format!("`{shown}` is no known unit"),
                match unit::nearest(name) {
                    Some(near) => format!("did you mean `{near}`? Names of units keep their case"),
                    None => expected(dimension),
                },
            ),
        },
    }
}
