//! `[[watch]]`: movements and rotations that are shown and held.

use super::direction::{Direction, direction};
use crate::job::written::fields::{Entry, Fields, Keys, Value, Written};
use crate::job::written::limit::{Bound, bound, names};
use crate::job::written::station::{Station, station_in};
use crate::job::written::{Reader, value};
use crate::model::Place;
use crate::quantity::{Angle, Length};

pub(crate) const KEYS: Keys = Keys {
    table: "watch",
    keys: &[
        "name",
        "point",
        "body",
        "station",
        "along",
        "relative-to",
        "about",
        "limit",
        "rotation",
        "in",
        "since",
        "source",
    ],
};

/// A watch as written.
#[derive(Debug)]
pub(crate) struct Watch<'t> {
    pub(crate) place: Place,
    pub(crate) name: Entry<&'t str>,
    /// `None` where something about it is wrong.
    pub(crate) of: Option<Of<'t>>,
    /// Of a movement.
    pub(crate) limit: Entry<Bound<Length>>,
    /// Of a rotation.
    pub(crate) rotation: Entry<Bound<Angle>>,
    pub(crate) names: Entry<Vec<Written<&'t str>>>,
    pub(crate) since: Entry<&'t str>,
    pub(crate) source: Entry<&'t str>,
}

/// What is watched, as written.
#[derive(Debug)]
pub(crate) enum Of<'t> {
    Point {
        point: Written<&'t str>,
        relative_to: Option<Written<&'t str>>,
        along: Option<Written<Direction>>,
    },
    Rotation {
        body: Written<&'t str>,
        about: Option<Written<Direction>>,
    },
    Station {
        at: StationOf<'t>,
        relative_to: Option<StationOf<'t>>,
    },
}

/// A station of a member that is named with it.
#[derive(Debug)]
pub(crate) struct StationOf<'t> {
    pub(crate) member: Written<&'t str>,
    /// Wrong where it is no station, which has been reported.
    pub(crate) station: Entry<Station<'t>>,
}

impl<'t> Watch<'t> {
    pub(super) fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(value, KEYS, r)?;
        let watch = Watch {
            place: fields.place.clone(),
            name: fields.entry("name", r, value::part_name),
            of: of(&mut fields, r),
            limit: fields.entry("limit", r, |value, r| {
                bound(value, r, length, |length| length.value)
            }),
            rotation: fields.entry("rotation", r, |value, r| {
                bound(value, r, value::quantity::<Angle>, |angle| angle.value)
            }),
            names: fields.entry("in", r, names),
            since: fields.entry("since", r, value::text),
            source: fields.entry("source", r, value::text),
        };
        if watch.limit.is_absent() && watch.rotation.is_absent() {
            for key in ["in", "since", "source"] {
                if let Some(place) = fields.key_place(key) {
                    let message = format!("`{key}` belongs to a limit, and this watch has none");
                    let help = "add `limit`, for a body `rotation`, or take it out";
                    r.problems.say(&place, message, help);
                }
            }
        }
        fields.finish(r);
        Some(watch)
    }
}

/// Which keys stand beside the one that says what is watched.
const BESIDE: [(&str, &[&str]); 3] = [
    ("point", &["relative-to", "along", "limit"]),
    ("body", &["about", "rotation"]),
    ("station", &["relative-to", "limit"]),
];

fn of<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Of<'t>> {
    let mut kinds = BESIDE.iter().filter(|(key, _)| fields.has(key));
    let Some(&(kind, beside)) = kinds.next() else {
        let message = "a watch needs `point`, `body` or `station`";
        let help = "add `point = \"lug\"`, `body = \"beam\"` or `station = \"H4.end\"`";
        r.problems.missing("", &fields.place, message, help);
        return None;
    };
    if let Some((second, _)) = kinds.next() {
        let place = fields.key_place(second).unwrap_or_default();
        let message = format!("a watch looks at one thing, and here are `{kind}` and `{second}`");
        r.problems.say(&place, message, "write a watch for each");
        return None;
    }
    let mut fits = true;
    for key in ["relative-to", "along", "about", "limit", "rotation"] {
        if beside.contains(&key) {
            continue;
        }
        if let Some(place) = fields.key_place(key) {
            let message = format!("`{key}` does not stand in a watch of a {kind}");
            let help = match (kind, key) {
                ("body", "limit") => "the limit of a body's rotation is `rotation`".to_owned(),
                ("station", "along") => {
                    "a station moves along the axis of its member; take it out".to_owned()
                }
                _ => format!("beside `{kind}` stand `{}`", beside.join("`, `")),
            };
            r.problems.say(&place, message, help);
            fits = false;
        }
    }
    let of = match kind {
        "point" => {
            let point = fields.entry("point", r, value::text);
            let relative_to = fields.entry("relative-to", r, value::text);
            let along = fields.entry("along", r, direction);
            if let (Entry::Given(point), Entry::Given(other)) = (&point, &relative_to)
                && point.value == other.value
            {
                itself(&other.place, r);
                return None;
            }
            Of::Point {
                point: sound(point)??,
                relative_to: sound(relative_to)?,
                along: sound(along)?,
            }
        }
        "body" => {
            let body = fields.entry("body", r, value::text);
            let about = fields.entry("about", r, direction);
            Of::Rotation {
                body: sound(body)??,
                about: sound(about)?,
            }
        }
        _ => {
            let at = fields.entry("station", r, station_of);
            let relative_to = fields.entry("relative-to", r, station_of);
            if let (Entry::Given(at), Entry::Given(other)) = (&at, &relative_to)
                && at.value.member.value == other.value.member.value
                && let (Some(a), Some(b)) = (at.value.station.given(), other.value.station.given())
                && a.value == b.value
            {
                itself(&other.place, r);
                return None;
            }
            Of::Station {
                at: sound(at)??.value,
                relative_to: sound(relative_to)?.map(|other| other.value),
            }
        }
    };
    fits.then_some(of)
}

fn itself(place: &Place, r: &mut Reader<'_>) {
    let message = "this is watched relative to itself, which is always 0";
    r.problems
        .say(place, message, "name another, or leave `relative-to` out");
}

/// What is given, if anything; nothing at all where it is at fault.
fn sound<T>(entry: Entry<T>) -> Option<Option<Written<T>>> {
    match entry {
        Entry::Absent => Some(None),
        Entry::Wrong => None,
        Entry::Given(written) => Some(Some(written)),
    }
}

/// A length; a share of one is reported, since a watch has no length of its own.
fn length<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Length> {
    let text = value.get_ref().as_str();
    if text.is_some_and(|text| text.trim_start().starts_with("length")) {
        let message = "a watch has no length of which this could be a share";
        let help = "write the length itself, as in \"4 mm\"";
        r.problems.say(&value.span(), message, help);
        return None;
    }
    value::quantity(value, r)
}

/// A member and a station of it: `C7.tier 8.end`.
fn station_of<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<StationOf<'t>> {
    let text = value::text(value, r)?;
    let Some((member, station)) = text.split_once('.') else {
        let message = format!("`{text}` is no station of a member");
        let help = "write the member, a dot and the station, as in \"H4.end\" or \"H4.shank.end\"";
        r.problems.say(&value.span(), message, help);
        return None;
    };
    let place = value.span();
    let station = match station_in(station, value, r) {
        Some(station) => Entry::Given(Written {
            value: station,
            place: place.clone(),
        }),
        None => Entry::Wrong,
    };
    Some(StationOf {
        member: Written {
            value: member,
            place,
        },
        station,
    })
}
