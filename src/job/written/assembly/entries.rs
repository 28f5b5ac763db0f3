//! Values with one entry for each coordinate.

use crate::job::written::Reader;
use crate::job::written::fields::{Value, kind_of};
use crate::job::written::value;
use crate::quantity::Measure;
use toml::de::DeValue;

/// One entry for each coordinate that was written, 0 for the others: one, two or three.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) struct Entries<Q> {
    pub(crate) values: [Q; 3],
    pub(crate) count: usize,
}

/// A list of quantities, one for each coordinate.
pub(crate) fn entries<'t, Q: Measure + Default>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<Entries<Q>> {
    let DeValue::Array(list) = value.get_ref() else {
        let kind = kind_of(value.get_ref());
        let message = format!("a list with an entry for each coordinate is expected, not {kind}");
        r.problems.say(&value.span(), message, form::<Q>());
        return None;
    };
    if list.is_empty() || list.len() > 3 {
        let message = match list.len() {
            0 => "this list has no entry for any coordinate".to_owned(),
            many => format!("there are at most three coordinates, and here are {many}"),
        };
        r.problems.say(&value.span(), message, form::<Q>());
        return None;
    }
    let mut values = [Q::default(); 3];
    let mut sound = true;
    for (entry, value) in values.iter_mut().zip(list.iter()) {
        match value::quantity(value, r) {
            Some(read) => *entry = read,
            None => sound = false,
        }
    }
    sound.then_some(Entries {
        values,
        count: list.len(),
    })
}

/// How it is written, for messages.
fn form<Q: Measure>() -> String {
    let example = Q::DIMENSION.example();
    format!(
        "write one entry for each coordinate, as in `[\"{example}\", \"{example}\"]` in two; in \
         one it is a list too"
    )
}

/// `two coordinates`, for messages.
pub(crate) fn counted(coordinates: usize) -> &'static str {
    match coordinates {
        1 => "one coordinate",
        2 => "two coordinates",
        _ => "three coordinates",
    }
}
