//! Directions: along an axis, or by their parts along each.

use super::entries::Entries;
use crate::job::written::Reader;
use crate::job::written::fields::{Value, Written, kind_of};
use crate::job::written::value;
use toml::de::DeValue;

/// The forms of a direction, for messages.
const FORMS: &str = "write \"x\", \"y\" or \"z\", or with its sign \"+x\" or \"-x\", or its part \
                     along each coordinate as in `[1, 1]`";

/// A direction as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Direction {
    /// Along x (0), y (1) or z (2).
    Axis {
        axis: usize,
        /// `None` where no sign is written.
        negative: Option<bool>,
    },
    /// Parts along each coordinate, not all of them 0.
    Parts(Entries<f64>),
}

/// One direction.
pub(crate) fn direction<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Direction> {
    match value.get_ref() {
        DeValue::String(text) => {
            let direction = along_an_axis(text);
            if direction.is_none() {
                let message = format!("no direction is called `{text}`");
                r.problems.say(&value.span(), message, FORMS);
            }
            direction
        }
        DeValue::Array(list) if list.iter().any(|part| part.get_ref().is_str()) => {
            let message = "one direction is expected here, not a list of them";
            let help = "write it without the brackets around it, as in \"y\" or `[1, 1]`";
            r.problems.say(&value.span(), message, help);
            None
        }
        DeValue::Array(list) if list.is_empty() || list.len() > 3 => {
            let message = "a direction has a part along each coordinate, one to three of them";
            r.problems.say(&value.span(), message, FORMS);
            None
        }
        DeValue::Array(list) => {
            let mut values = [0.0; 3];
            let mut sound = true;
            for (entry, value) in values.iter_mut().zip(list.iter()) {
                match value::number(value, r) {
                    Some(number) => *entry = number,
                    None => sound = false,
                }
            }
            if sound && values == [0.0; 3] {
                let message = "this direction has no length, and so leads nowhere";
                r.problems.say(&value.span(), message, FORMS);
                sound = false;
            }
            sound.then_some(Direction::Parts(Entries {
                values,
                count: list.len(),
            }))
        }
        other => {
            let message = format!("a direction is expected here, not {}", kind_of(other));
            r.problems.say(&value.span(), message, FORMS);
            None
        }
    }
}

fn along_an_axis(text: &str) -> Option<Direction> {
    let (negative, letter) = match text.strip_prefix('+') {
        Some(letter) => (Some(false), letter),
        None => match text.strip_prefix(['-', '−']) {
            Some(letter) => (Some(true), letter),
            None => (None, text),
        },
    };
    let axis = match letter {
        "x" => 0,
        "y" => 1,
        "z" => 2,
        _ => return None,
    };
    Some(Direction::Axis { axis, negative })
}

/// A list of directions, at least one.
pub(crate) fn directions<'t>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<Vec<Written<Direction>>> {
    let help = "write a list of directions, as in `[\"x\"]` or `[[1, 1]]`";
    let DeValue::Array(list) = value.get_ref() else {
        let kind = kind_of(value.get_ref());
        let message = format!("a list of directions is expected here, not {kind}");
        r.problems.say(&value.span(), message, help);
        return None;
    };
    let is_number = |value: &DeValue<'_>| value.is_integer() || value.is_float();
    if list.is_empty() || list.iter().any(|part| is_number(part.get_ref())) {
        let message = if list.is_empty() {
            "this list holds no direction"
        } else {
            "a list of directions is expected here, and these are the parts of one"
        };
        r.problems.say(&value.span(), message, help);
        return None;
    }
    let mut directions = Vec::with_capacity(list.len());
    let mut sound = true;
    for value in list.iter() {
        match direction(value, r) {
            Some(direction) => directions.push(Written {
                value: direction,
                place: value.span(),
            }),
            None => sound = false,
        }
    }
    sound.then_some(directions)
}
