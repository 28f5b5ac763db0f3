//! Reading single values: texts, numbers, quantities, pairs.

use super::Reader;
use super::fields::{Value, kind_of};
use crate::catalogue::section::Along;
use crate::job::document::Content;
use crate::model::Place;
use crate::quantity::{
    self, Dimension, Literal, LiteralError, Measure, MovementBound, StressLimit,
    TemperatureInterval, ThermodynamicTemperature,
};

/// A text.
pub(crate) fn text<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<&'t str> {
    match value.get_ref() {
        Content::String(text) => Some(text.as_ref()),
        other => {
            let message = format!("a text is expected here, not {}", kind_of(other));
            r.problems.say(&value.span(), message, "write it in quotes");
            None
        }
    }
}

/// `true` or `false`.
pub(crate) fn boolean<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<bool> {
    match value.get_ref() {
        Content::Boolean(value) => Some(*value),
        other => {
            let message = format!("true or false is expected here, not {}", kind_of(other));
            let help = "write `true` or `false` without quotes";
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

/// A number without a dimension: finite.
pub(crate) fn number<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<f64> {
    let number = match value.get_ref() {
        Content::Number(number) => *number,
        other => {
            let message = format!("a bare number is expected here, not {}", kind_of(other));
            let help = "write it without quotes and without a unit, such as `1.5`";
            r.problems.say(&value.span(), message, help);
            return None;
        }
    };
    if !number.is_finite() {
        let message = "this is no finite number";
        let help = "write a finite number, such as `1.5`";
        r.problems.say(&value.span(), message, help);
        return None;
    }
    Some(number)
}

/// A literal of `Q`.
pub(crate) fn quantity<'t, Q: Measure>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Q> {
    literal(value, r, Q::DIMENSION, quantity::read::<Q>).map(|literal| r.noted(&literal, value))
}

/// A literal of `Q` that is more than 0; a range of it too.
pub(crate) fn positive<'t, Q: Measure>(
    key: &'static str,
) -> impl FnOnce(&'t Value<'t>, &mut Reader<'t>) -> Option<Q> {
    move |value, r| bounded(key, false, value, r)
}

/// A literal of `Q` that is 0 or more.
pub(crate) fn not_negative<'t, Q: Measure>(
    key: &'static str,
) -> impl FnOnce(&'t Value<'t>, &mut Reader<'t>) -> Option<Q> {
    move |value, r| bounded(key, true, value, r)
}

fn bounded<'t, Q: Measure>(
    key: &str,
    zero: bool,
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<Q> {
    let literal = literal(value, r, Q::DIMENSION, quantity::read::<Q>)?;
    let least = literal.lower.si().min(literal.nominal.si());
    if least > 0.0 || zero && least >= 0.0 {
        return Some(r.noted(&literal, value));
    }
    too_small(key, zero, Q::DIMENSION, &value.span(), r);
    None
}

/// Reports a value that must be larger.
pub(crate) fn too_small(
    key: &str,
    zero: bool,
    dimension: Dimension,
    place: &Place,
    r: &mut Reader<'_>,
) {
    let least = if zero { "0 or more" } else { "more than 0" };
    let message = format!("`{key}` must be {least}");
    let help = format!("write it as in \"{}\"", dimension.example());
    r.problems.say(place, message, help);
}

/// A change of temperature, with its sign.
pub(crate) fn change<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<TemperatureInterval> {
    let dimension = Dimension::TemperatureChange;
    literal(value, r, dimension, quantity::read_change).map(|literal| r.noted(&literal, value))
}

/// A reading of temperature.
pub(crate) fn reading<'t>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<ThermodynamicTemperature> {
    let dimension = Dimension::Temperature;
    literal(value, r, dimension, quantity::read_reading).map(|literal| r.noted(&literal, value))
}

/// A strain: a bare number, or a literal.
pub(crate) fn strain<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<quantity::Ratio> {
    match value.get_ref() {
        Content::Number(_) => number(value, r).map(quantity::from_si),
        _ => quantity(value, r),
    }
}

/// What a stress is held to: a stress, a share of a strength, or a bare 0 for none at all.
pub(crate) fn stress_limit<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<StressLimit> {
    if is_zero(value) {
        return Some(StressLimit::Stress(nominal(Measure::from_si(0.0))));
    }
    let limit = literal(value, r, Dimension::Stress, quantity::read_stress_limit)?;
    if let StressLimit::Stress(literal) = &limit {
        r.noted(literal, value);
    }
    let size = match &limit {
        StressLimit::Stress(literal) => literal.nominal.si(),
        StressLimit::Share { factor, .. } => *factor,
    };
    if size < 0.0 {
        let message = "the limit of a stress is its size, 0 or more";
        let help = "leave out the sign: `tension` and `compression` say which way";
        r.problems.say(&value.span(), message, help);
        return None;
    }
    Some(limit)
}

/// What a movement is held to: a length, or a share of a length.
pub(crate) fn movement_bound<'t>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<MovementBound> {
    let bound = literal(value, r, Dimension::Length, quantity::read_movement_bound)?;
    if let MovementBound::Length(literal) = &bound {
        r.noted(literal, value);
    }
    Some(bound)
}

/// Whether a value is a bare 0.
pub(crate) fn is_zero(value: &Value<'_>) -> bool {
    matches!(value.get_ref(), Content::Number(0.0))
}

fn nominal<Q: Copy>(value: Q) -> Literal<Q> {
    Literal {
        nominal: value,
        lower: value,
        upper: value,
        toleranced: false,
    }
}

/// One value for all of a length, or a pair: at its start and at its end.
pub(crate) fn along<'t, Q: Copy>(
    read: impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<Q>,
) -> impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<Along<Q>> {
    move |value, r| match value.get_ref() {
        Content::Array(_) => {
            let [start, end] = pair(value, r)?;
            let (start, end) = (read(start, r), read(end, r));
            Some(Along {
                start: start?,
                end: end?,
            })
        }
        _ => read(value, r).map(|value| Along {
            start: value,
            end: value,
        }),
    }
}

/// The two values of a list of two.
pub(crate) fn pair<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<[&'t Value<'t>; 2]> {
    let list = match value.get_ref() {
        Content::Array(list) => list,
        other => {
            let message = format!("a pair is expected here, not {}", kind_of(other));
            let help = "write two values in [ ], with a comma between";
            r.problems.say(&value.span(), message, help);
            return None;
        }
    };
    let mut values = list.iter();
    match (values.next(), values.next(), values.next()) {
        (Some(first), Some(second), None) => Some([first, second]),
        _ => {
            let message = format!("a pair has two values, and here are {}", list.len());
            let help = "write two values in [ ], or one without them";
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

/// The text of a literal through its reader; an error of it is placed inside the quotes.
fn literal<'t, T>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
    dimension: Dimension,
    read: impl FnOnce(&str) -> Result<T, LiteralError>,
) -> Option<T> {
    match value.get_ref() {
        Content::String(text) => match read(text) {
            Ok(literal) => Some(literal),
            Err(error) => {
                let place = inside(&error.at, text, &value.span(), r.text);
                r.problems.say(&place, error.message, error.help);
                None
            }
        },
        other => {
            let message = format!(
                "{} is expected here, not {}",
                dimension.name(),
                kind_of(other)
            );
            let example = dimension.example();
            let help = match other {
                Content::Number(_) => format!(
                    "write it in quotes with its unit, such as \"{example}\"; units are {}",
                    dimension.accepted()
                ),
                _ => format!("write it in quotes, such as \"{example}\""),
            };
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

/// The place of a part of a text. The text as written and as decoded differ where it has escapes;
/// all of it is underlined then.
pub(crate) fn inside(at: &Place, decoded: &str, value: &Place, text: &str) -> Place {
    let raw = text.get(value.clone()).unwrap_or_default();
    for quotes in [1, 3] {
        let bare = raw
            .len()
            .checked_sub(quotes)
            .and_then(|end| raw.get(quotes..end));
        if bare == Some(decoded) {
            let start = value.start + quotes;
            return start + at.start.min(decoded.len())..start + at.end.min(decoded.len());
        }
    }
    value.clone()
}

/// A whole number of 1 or more.
pub(crate) fn count<'t>(key: &str, value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<f64> {
    let count = number(value, r)?;
    if count >= 1.0 && count.fract() == 0.0 {
        return Some(count);
    }
    let message = format!("`{key}` must be a whole number of 1 or more");
    r.problems.say(&value.span(), message, "");
    None
}

/// The name of a part of a member.
pub(crate) fn part_name<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<&'t str> {
    let name = text(value, r)?;
    super::name::is_for_a_part(name, &value.span(), r).then_some(name)
}
