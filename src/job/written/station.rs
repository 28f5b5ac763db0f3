//! Stations: places along a member.

use super::fields::{Value, kind_of};
use super::{Reader, value};
use crate::quantity::{self, Length};
use toml::de::DeValue;

/// The forms of a station, for messages.
const STATIONS: &str = "write \"start\", \"end\", \"<segment>.start\", \"<segment>.end\", or a \
                        distance from the member's start such as \"1.25 m\"";

/// A place along a member as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Station<'t> {
    Start,
    End,
    /// The start of the segment of this name.
    StartOf(&'t str),
    /// The end of the segment of this name.
    EndOf(&'t str),
    /// A distance from the member's start, and how it was written.
    Distance(Length, &'t str),
}

/// A station; a name that no segment has is found later.
pub(crate) fn station<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Station<'t>> {
    let DeValue::String(text) = value.get_ref() else {
        let message = format!(
            "a station is expected here, not {}",
            kind_of(value.get_ref())
        );
        r.problems.say(&value.span(), message, STATIONS);
        return None;
    };
    station_in(text, value, r)
}

/// The station that a text, or a part of one, says.
pub(crate) fn station_in<'t>(
    text: &'t str,
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<Station<'t>> {
    if let Some(station) = named(text) {
        return Some(station);
    }
    let literal = quantity::read::<Length>(text);
    match literal {
        Ok(literal) => Some(Station::Distance(r.noted(&literal, value), text)),
        Err(_) if !text.starts_with(|c: char| c.is_ascii_digit() || "+-−.".contains(c)) => {
            let message = format!("`{text}` is no station");
            let help = match text.to_ascii_lowercase().as_str() {
                "start" | "begin" | "beginning" | "star" => "write \"start\"".to_owned(),
                "end" | "ende" | "en" => "write \"end\"".to_owned(),
                _ => STATIONS.to_owned(),
            };
            r.problems.say(&value.span(), message, help);
            None
        }
        Err(error) => {
            let place = value::inside(&error.at, text, &value.span(), r.text);
            r.problems.say(&place, error.message, error.help);
            None
        }
    }
}

fn named(text: &str) -> Option<Station<'_>> {
    match text {
        "start" => Some(Station::Start),
        "end" => Some(Station::End),
        _ => match text.rsplit_once('.')? {
            (segment, "start") => Some(Station::StartOf(segment)),
            (segment, "end") => Some(Station::EndOf(segment)),
            _ => None,
        },
    }
}
