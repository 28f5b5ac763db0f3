//! `[[member.NAME.load]]`.

use super::fields::{Entry, Fields, Keys, Value, Written, in_order};
use super::station::{Station, station};
use super::{Reader, value};
use crate::catalogue::section::Along;
use crate::model::Place;
use crate::quantity::{
    Force, ForcePerLength, Length, Ratio, TemperatureInterval, ThermodynamicTemperature,
};
use toml::de::DeValue;

pub(crate) const KEYS: Keys = Keys {
    table: "load",
    keys: &[
        "name",
        "case",
        "at",
        "support",
        "on",
        "from",
        "to",
        "force",
        "down",
        "line",
        "line-down",
        "weight",
        "temperature-change",
        "temperature",
        "misfit",
        "strain",
        "movement",
    ],
};

/// The keys that say what acts, of which a load has one.
const ACTIONS: &[&str] = &[
    "force",
    "down",
    "line",
    "line-down",
    "weight",
    "temperature-change",
    "temperature",
    "misfit",
    "strain",
    "movement",
];
/// Those of later versions, so that a load that has one of them is not said to have none.
const LATER: &[&str] = &["preload", "turns", "take-up"];
/// The keys that say where.
const WHERE: &[&str] = &["at", "support", "on", "from", "to"];

/// A load as written.
#[derive(Debug)]
pub(crate) struct Load<'t> {
    pub(crate) place: Place,
    pub(crate) case: Entry<&'t str>,
    pub(crate) at: Entry<Station<'t>>,
    pub(crate) support: Entry<&'t str>,
    pub(crate) on: Entry<&'t str>,
    pub(crate) from: Entry<Station<'t>>,
    pub(crate) to: Entry<Station<'t>>,
    /// `None` where it is wrong.
    pub(crate) action: Option<Action<'t>>,
}

/// What acts.
#[derive(Debug)]
pub(crate) enum Action<'t> {
    Force(ByCase<'t, Force>),
    Down(ByCase<'t, Force>),
    Line(ByCase<'t, Along<ForcePerLength>>),
    LineDown(ByCase<'t, Along<ForcePerLength>>),
    Weight(ByCase<'t, f64>),
    Change(ByCase<'t, Along<TemperatureInterval>>),
    Reading(ByCase<'t, Along<ThermodynamicTemperature>>),
    Misfit(ByCase<'t, Length>),
    Strain(ByCase<'t, Ratio>),
    Movement(ByCase<'t, Length>),
}

/// One value, or one for each case.
#[derive(Debug)]
pub(crate) enum ByCase<'t, T> {
    One(Written<T>),
    Each(Vec<(Written<&'t str>, Written<T>)>),
}

impl<'t> Load<'t> {
    pub(super) fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(value, KEYS, r)?;
        fields.entry("name", r, value::part_name);
        let load = Load {
            place: fields.place.clone(),
            case: fields.entry("case", r, value::text),
            at: fields.entry("at", r, station),
            support: fields.entry("support", r, value::text),
            on: fields.entry("on", r, value::text),
            from: fields.entry("from", r, station),
            to: fields.entry("to", r, station),
            action: action(&mut fields, r),
        };
        fields.finish(r);
        Some(load)
    }
}

fn action<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Action<'t>> {
    let mut chosen = None;
    let mut several = false;
    for &key in ACTIONS {
        let Some(value) = fields.get(key) else {
            continue;
        };
        if let Some((first, _)) = chosen {
            let place = fields.key_place(key).unwrap_or_default();
            let message = format!("a load has one action, and here are `{first}` and `{key}`");
            r.problems.say(&place, message, "write a load for each");
            several = true;
        } else {
            chosen = Some((key, value));
        }
    }
    let Some((key, value)) = chosen else {
        if !LATER.iter().any(|key| fields.has(key)) {
            let message = "a load needs an action";
            let help = format!("add one of `{}`", ACTIONS.join("`, `"));
            r.problems.missing("", &fields.place, message, help);
        }
        return None;
    };
    if several {
        return None;
    }
    let fits = places_fit(fields, key, r);
    let action = match key {
        "force" => by_case(value, r, value::quantity).map(Action::Force),
        "down" => by_case(value, r, value::quantity).map(Action::Down),
        "line" => by_case(value, r, value::along(value::quantity)).map(Action::Line),
        "line-down" => by_case(value, r, value::along(value::quantity)).map(Action::LineDown),
        "weight" => by_case(value, r, value::number).map(Action::Weight),
        "temperature-change" => by_case(value, r, value::along(value::change)).map(Action::Change),
        "temperature" => by_case(value, r, value::along(value::reading)).map(Action::Reading),
        "misfit" => by_case(value, r, value::quantity).map(Action::Misfit),
        "strain" => by_case(value, r, value::strain).map(Action::Strain),
        _ => by_case(value, r, value::quantity).map(Action::Movement),
    };
    action.filter(|_| fits)
}

/// Whether the keys that say where are those that the action takes, and the needed ones are there.
fn places_fit(fields: &Fields<'_>, action: &str, r: &mut Reader<'_>) -> bool {
    let allowed: &[&str] = match action {
        "force" | "down" => &["at"],
        "line" | "line-down" => &["on", "from", "to"],
        "movement" => &["at", "support"],
        _ => &["on"],
    };
    let mut fits = true;
    for key in WHERE {
        if allowed.contains(key) || !fields.has(key) {
            continue;
        }
        let place = fields.key_place(key).unwrap_or_default();
        let message = format!("`{key}` does not say where a `{action}` acts");
        let help = format!("a `{action}` takes `{}`", allowed.join("`, `"));
        r.problems.say(&place, message, help);
        fits = false;
    }
    let mut lacks = |key: &'static str, needs: &str, help: &str| {
        let message = format!("a `{action}` needs {needs}");
        r.problems.missing(key, &fields.place, message, help);
        fits = false;
    };
    match action {
        "force" | "down" if !fields.has("at") => lacks("at", "`at`", "add `at = \"end\"`"),
        "movement" if !fields.has("at") && !fields.has("support") => {
            lacks(
                "",
                "`support` or `at`",
                "add `support` with the name of the support that moves",
            );
        }
        _ => {}
    }
    if action == "movement" && fields.has("at") && fields.has("support") {
        let place = fields.key_place("at").unwrap_or_default();
        let message = "`at` and `support` both say what moves";
        r.problems.say(&place, message, "keep `support`");
        fits = false;
    }
    if fields.has("on") && (fields.has("from") || fields.has("to")) && allowed.len() == 3 {
        let place = fields.key_place("on").unwrap_or_default();
        let message = "`on` stands beside `from` or `to`";
        let help = "keep `on` for a whole segment, or `from` and `to` for a stretch";
        r.problems.say(&place, message, help);
        fits = false;
    }
    fits
}

/// A value, or a table of values by case.
pub(crate) fn by_case<'t, T>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
    read: impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<T>,
) -> Option<ByCase<'t, T>> {
    let DeValue::Table(table) = value.get_ref() else {
        let place = value.span();
        return read(value, r).map(|value| ByCase::One(Written { value, place }));
    };
    if table.is_empty() {
        let message = "this table names no case";
        let help = "write a value for each case: `{ dead = \"62 kN\" }`";
        r.problems.say(&value.span(), message, help);
        return None;
    }
    let mut each = Vec::with_capacity(table.len());
    for (case, value) in in_order(table) {
        if let Some(read) = read(value, r) {
            let place = value.span();
            each.push((case, Written { value: read, place }));
        }
    }
    Some(ByCase::Each(each))
}
