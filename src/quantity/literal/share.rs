//! Limits that may be written as a share of a strength or of a length.

use super::cursor::Cursor;
use super::number::{Number, number};
use super::{Literal, LiteralError, read, refuse};
use crate::quantity::unit::{self, Pound};
use crate::quantity::{Length, Stress};

/// A strength of a material that a limit may be a share of.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
#[allow(missing_docs)]
pub enum Strength {
    Yield,
    Ultimate,
    Proof,
    Crushing,
}

/// The limit of a stress as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum StressLimit {
    /// A stress: `"165 MPa"`.
    Stress(Literal<Stress>),
    /// A share of a strength of the material: `"0.6 yield"`, `"yield / 1.67"`.
    Share {
        /// What the strength is multiplied by, more than 0.
        factor: f64,
        /// Which strength.
        strength: Strength,
    },
}

/// The bound of a movement as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum MovementBound {
    /// A length: `"6 mm"`.
    Length(Literal<Length>),
    /// A share of the length of the member or segment: `"length / 500"`.
    Share {
        /// What the length is divided by, more than 0.
        divisor: f64,
    },
}

const STRENGTHS: [(&str, Strength); 4] = [
    ("yield", Strength::Yield),
    ("ultimate", Strength::Ultimate),
    ("proof", Strength::Proof),
    ("crushing", Strength::Crushing),
];

const STRESS_LIMIT: &str = "the limit of a stress is a stress, as in \"165 MPa\", or a share of a \
     strength (yield, ultimate, proof, crushing), as in \"0.6 yield\" or \"yield / 1.67\"";
const MOVEMENT_BOUND: &str =
    "the limit of a movement is a length, as in \"6 mm\", or a share, as in \"length / 500\"";

/// Reads the limit of a stress: `"165 MPa"`, `"0.6 yield"`, `"yield / 1.67"`, `"2/3 yield"`.
///
/// ```
/// use lengthwise::quantity::{Strength, StressLimit, read_stress_limit};
/// let share = StressLimit::Share { factor: 0.6, strength: Strength::Yield };
/// assert_eq!(read_stress_limit("0.6 yield")?, share);
/// # Ok::<(), lengthwise::quantity::LiteralError>(())
/// ```
///
/// # Errors
///
/// As [`read`], and where a share is not more than 0. A sign is not refused here: that a limit is
/// not negative is held where the limit is known.
pub fn read_stress_limit(text: &str) -> Result<StressLimit, LiteralError> {
    let mut cursor = Cursor::new(text);
    cursor.blanks();
    let start = cursor.at();
    if cursor.rest.starts_with(char::is_alphabetic) {
        let strength = strength(&mut cursor)?;
        let divisor = divisor(&mut cursor, STRESS_LIMIT)?;
        return Ok(StressLimit::Share {
            factor: divisor.value.inverse().rounded(),
            strength,
        });
    }
    let Ok(first) = number(&mut cursor) else {
        return stress(text);
    };
    cursor.blanks();
    let word = word(cursor);
    if word.is_empty() || unit::named(word, Pound::Force).is_some() {
        return stress(text);
    }
    if known(word).is_none() && nearest(word).is_none() {
        return stress(text);
    }
    let strength = strength(&mut cursor)?;
    end(&mut cursor, STRESS_LIMIT)?;
    positive(&first, start, STRESS_LIMIT)?;
    Ok(StressLimit::Share {
        factor: first.value.rounded(),
        strength,
    })
}

/// Reads the bound of a movement: `"6 mm"` or `"length / 500"`.
///
/// # Errors
///
/// As [`read`], and where the length is not divided by a number of more than 0.
pub fn read_movement_bound(text: &str) -> Result<MovementBound, LiteralError> {
    let mut cursor = Cursor::new(text);
    cursor.blanks();
    if !cursor.rest.starts_with(char::is_alphabetic) {
        return read(text)
            .map(MovementBound::Length)
            .map_err(|error| with_help(error, MOVEMENT_BOUND));
    }
    let at = cursor.word_at();
    if word(cursor) != "length" {
        let shown = cursor.quote(&at);
        return Err(refuse(
            at,
            format!("`{shown}` is no limit of a movement"),
            MOVEMENT_BOUND,
        ));
    }
    cursor.take("length");
    let divisor = divisor(&mut cursor, MOVEMENT_BOUND)?;
    Ok(MovementBound::Share {
        divisor: divisor.value.rounded(),
    })
}

fn stress(text: &str) -> Result<StressLimit, LiteralError> {
    read(text)
        .map(StressLimit::Stress)
        .map_err(|error| with_help(error, STRESS_LIMIT))
}

/// The letters that come next.
pub(super) fn word<'t>(cursor: Cursor<'t>) -> &'t str {
    let end = cursor.rest.find(|c: char| !c.is_alphabetic());
    cursor
        .rest
        .get(..end.unwrap_or(cursor.rest.len()))
        .unwrap_or("")
}

fn known(word: &str) -> Option<Strength> {
    STRENGTHS
        .iter()
        .find(|(name, _)| *name == word)
        .map(|&(_, strength)| strength)
}

/// The name of a strength that a misspelt one may mean.
fn nearest(word: &str) -> Option<&'static str> {
    if word.len() > 20 {
        return None;
    }
    let lower = word.to_lowercase();
    STRENGTHS
        .iter()
        .map(|&(name, _)| name)
        .find(|name| lower == *name || unit::one_apart(&lower, name))
}

/// What is wrong with a share where only a value is read: `word` names what it would be a share of.
pub(super) fn out_of_place(word: &str) -> Option<String> {
    if word == "length" {
        let message =
            "a share of a length is read only in the limit of a movement, as `length / 500`";
        return Some(message.to_owned());
    }
    known(word)?;
    Some(format!(
        "a share of a strength (`{word}`) is read only in the limit of a stress"
    ))
}

/// Reads the name of a strength.
fn strength(cursor: &mut Cursor<'_>) -> Result<Strength, LiteralError> {
    let word = word(*cursor);
    if let Some(strength) = known(word) {
        cursor.take(word);
        return Ok(strength);
    }
    let start = cursor.at();
    let at = start..start + word.len();
    let shown: String = word.chars().take(32).collect();
    Err(refuse(
        at,
        format!("`{shown}` is no strength of a material"),
        match nearest(word) {
            Some(near) => format!("did you mean `{near}`?"),
            None => STRESS_LIMIT.to_owned(),
        },
    ))
}

/// Reads `/` and a number of more than 0, and that nothing follows.
fn divisor(cursor: &mut Cursor<'_>, how: &str) -> Result<Number, LiteralError> {
    cursor.blanks();
    let start = cursor.at();
    if !cursor.take("/") {
        return Err(refuse(
            cursor.word_at(),
            "`/` and a number are missing after this name",
            how,
        ));
    }
    cursor.blanks();
    let number = number(cursor).map_err(|error| LiteralError {
        help: how.to_owned(),
        ..error
    })?;
    end(cursor, how)?;
    positive(&number, start, how)?;
    Ok(number)
}

fn positive(number: &Number, start: usize, how: &str) -> Result<(), LiteralError> {
    if number.value.rounded() > 0.0 {
        return Ok(());
    }
    Err(refuse(
        start..number.at.end,
        "the number of a share is more than 0",
        how,
    ))
}

fn end(cursor: &mut Cursor<'_>, how: &str) -> Result<(), LiteralError> {
    cursor.blanks();
    if cursor.is_done() {
        return Ok(());
    }
    let at = cursor.word_at();
    let shown = cursor.quote(&at);
    Err(refuse(
        at,
        format!("`{shown}` after a share is not understood"),
        how,
    ))
}

/// The error of a plain value, where a share would do as well.
fn with_help(error: LiteralError, how: &str) -> LiteralError {
    let help = if error.help.starts_with("write it as in") {
        how.to_owned()
    } else {
        error.help
    };
    LiteralError { help, ..error }
}
