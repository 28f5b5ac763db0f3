//! `[member.NAME]` and `[default]`.

use super::fields::{Entry, Fields, Keys, Value, Written, kind_of, list};
use super::limit::{Limits, Stands};
use super::load::Load;
use super::segment::Segment;
use super::support::Support;
use super::{Reader, value};
use crate::job::nearest::remedy;
use crate::model::{Carries, Place};
use crate::quantity::{self, Angle, ThermodynamicTemperature};
use std::f64::consts::FRAC_PI_2;
use toml::de::DeValue;

/// The forms of a direction, for messages.
const DIRECTIONS: &str =
    "write \"up\", \"down\", \"level\", or an angle above level such as \"30 deg\"";

pub(crate) const KEYS: Keys = Keys {
    table: "member",
    keys: &[
        "like", "note", "start", "end", "runs", "datum", "between", "carries", "segment",
        "support", "load", "limit",
    ],
};
pub(crate) const DEFAULT: Keys = Keys {
    table: "table of defaults",
    keys: &["material", "runs", "limit"],
};

/// A member as written, before what `like` and `[default]` add.
#[derive(Debug)]
pub(crate) struct Member<'t> {
    pub(crate) name: Written<&'t str>,
    pub(crate) place: Place,
    pub(crate) like: Entry<&'t str>,
    /// `start = "fixed"`.
    pub(crate) start: Entry<()>,
    /// `end = "fixed"`.
    pub(crate) end: Entry<()>,
    pub(crate) runs: Entry<Angle>,
    pub(crate) datum: Entry<ThermodynamicTemperature>,
    /// The points at its start and at its end.
    pub(crate) between: Entry<[Written<&'t str>; 2]>,
    pub(crate) carries: Entry<Carries>,
    pub(crate) segments: Entry<Vec<Segment<'t>>>,
    pub(crate) supports: Entry<Vec<Support<'t>>>,
    pub(crate) loads: Entry<Vec<Load<'t>>>,
    pub(crate) limits: Entry<Vec<Limits<'t>>>,
}

impl<'t> Member<'t> {
    /// Even of a value that is no table a member comes out, of which nothing is known but its
    /// name.
    pub(super) fn read(name: Written<&'t str>, table: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let Some(mut fields) = Fields::of(table, KEYS, r) else {
            return Self::unknown(name, table.span());
        };
        fields.entry("note", r, value::text);
        let member = Member {
            name,
            place: table.span(),
            like: fields.entry("like", r, value::text),
            start: fields.entry("start", r, fixed),
            end: fields.entry("end", r, fixed),
            runs: fields.entry("runs", r, runs),
            datum: fields.entry("datum", r, value::reading),
            segments: fields.entry("segment", r, |value, r| {
                let tables = list(value, "segment", r)?;
                Some(tables.iter().map(|value| Segment::read(value, r)).collect())
            }),
            supports: fields.entry("support", r, |value, r| {
                all(value, "support", r, Support::read)
            }),
            loads: fields.entry("load", r, |value, r| all(value, "load", r, Load::read)),
            limits: fields.entry("limit", r, |value, r| {
                Limits::read(value, Stands::Member, r)
            }),
            between: fields.entry("between", r, between),
            carries: fields.entry("carries", r, carries),
        };
        fields.finish(r);
        member
    }

    fn unknown(name: Written<&'t str>, place: Place) -> Self {
        Member {
            name,
            place,
            like: Entry::Wrong,
            start: Entry::Wrong,
            end: Entry::Wrong,
            runs: Entry::Wrong,
            datum: Entry::Wrong,
            between: Entry::Wrong,
            carries: Entry::Wrong,
            segments: Entry::Wrong,
            supports: Entry::Wrong,
            loads: Entry::Wrong,
            limits: Entry::Wrong,
        }
    }
}

/// `[default]`: what members have that do not give their own.
#[derive(Debug)]
pub(crate) struct Default<'t> {
    pub(crate) material: Entry<&'t str>,
    pub(crate) runs: Entry<Angle>,
    pub(crate) limits: Entry<Vec<Limits<'t>>>,
}

impl<'t> Default<'t> {
    /// No defaults.
    pub(super) fn none() -> Self {
        Default {
            material: Entry::Absent,
            runs: Entry::Absent,
            limits: Entry::Absent,
        }
    }

    pub(super) fn read(table: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let Some(mut fields) = Fields::of(table, DEFAULT, r) else {
            return Default {
                material: Entry::Wrong,
                runs: Entry::Wrong,
                limits: Entry::Wrong,
            };
        };
        let default = Default {
            material: fields.entry("material", r, value::text),
            runs: fields.entry("runs", r, runs),
            limits: fields.entry("limit", r, |value, r| {
                Limits::read(value, Stands::Member, r)
            }),
        };
        fields.finish(r);
        default
    }
}

/// A list of tables; those at fault make the whole of it wrong, once all were read.
fn all<'t, T>(
    value: &'t Value<'t>,
    key: &str,
    r: &mut Reader<'t>,
    read: impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<T>,
) -> Option<Vec<T>> {
    let tables = list(value, key, r)?;
    let mut all = Vec::with_capacity(tables.len());
    let mut sound = true;
    for table in tables.iter() {
        match read(table, r) {
            Some(one) => all.push(one),
            None => sound = false,
        }
    }
    sound.then_some(all)
}

fn fixed<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<()> {
    let text = value::text(value, r)?;
    if text == "fixed" {
        return Some(());
    }
    let message = format!("an end is \"fixed\" or free, not `{text}`");
    let help = "write \"fixed\"; leave it out for a free end; springs and stops are a `support`";
    r.problems.say(&value.span(), message, help);
    None
}

/// The names of two points.
fn between<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<[Written<&'t str>; 2]> {
    let help = "write the names of the points at its start and at its end, as in `[\"a\", \"b\"]`";
    let list = match value.get_ref() {
        DeValue::Array(list) => list,
        other => {
            let message = format!("`between` names two points, and here is {}", kind_of(other));
            r.problems.say(&value.span(), message, help);
            return None;
        }
    };
    if list.len() != 2 {
        let message = format!("`between` names two points, and here are {}", list.len());
        r.problems.say(&value.span(), message, help);
        return None;
    }
    let mut names = list.iter().map(|value| {
        value::text(value, r).map(|name| Written {
            value: name,
            place: value.span(),
        })
    });
    let (start, end) = (names.next().flatten(), names.next().flatten());
    let (start, end) = (start?, end?);
    if start.value == end.value {
        let message = format!("this member goes from the point `{}` to itself", end.value);
        let help = "name another point at one of its ends";
        r.problems.say(&end.place, message, help);
        return None;
    }
    Some([start, end])
}

fn carries<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Carries> {
    match value::text(value, r)? {
        "tension" => Some(Carries::Tension),
        "compression" => Some(Carries::Compression),
        other => {
            let message = format!(
                "a member carries `tension` or `compression` alone, or both where `carries` is \
                 left out, not `{other}`"
            );
            let help = remedy(other, ["tension", "compression"], "write one of");
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

/// The direction from start to end as an angle above level.
fn runs<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Angle> {
    let DeValue::String(text) = value.get_ref() else {
        let message = format!(
            "a direction is expected here, not {}",
            kind_of(value.get_ref())
        );
        r.problems.say(&value.span(), message, DIRECTIONS);
        return None;
    };
    match text.as_ref() {
        "up" => return Some(quantity::from_si(FRAC_PI_2)),
        "down" => return Some(quantity::from_si(-FRAC_PI_2)),
        "level" => return Some(quantity::from_si(0.0)),
        text if text.starts_with(char::is_alphabetic) => {
            let message = format!("no direction is called `{text}`");
            r.problems.say(&value.span(), message, DIRECTIONS);
            return None;
        }
        _ => {}
    }
    let angle: Angle = value::quantity(value, r)?;
    // 90 deg comes out of its factor within a rounding of π/2; beyond it no angle above level lies.
    if angle.value.abs() > FRAC_PI_2 * (1.0 + 1e-12) {
        let message = "an angle above level lies between -90 deg and 90 deg";
        r.problems.say(&value.span(), message, DIRECTIONS);
        return None;
    }
    Some(angle)
}
