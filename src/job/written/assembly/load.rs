//! `[[load]]` of the job: on points, bodies and holds.

use super::entries::{Entries, entries};
use crate::job::written::fields::{Entry, Fields, Keys, Value, Written};
use crate::job::written::load::{ByCase, by_case};
use crate::job::written::{Reader, value};
use crate::model::Place;
use crate::quantity::{Force, Length, Moment};
use toml::de::DeValue;

pub(crate) const KEYS: Keys = Keys {
    table: "load of the job",
    keys: &[
        "name", "case", "point", "body", "hold", "force", "moment", "movement",
    ],
};

/// A load of the job as written.
#[derive(Debug)]
pub(crate) struct Load<'t> {
    pub(crate) place: Place,
    pub(crate) case: Entry<&'t str>,
    /// The name of what it acts on, and what acts; `None` where one is wrong.
    pub(crate) acts: Option<(Written<&'t str>, Action<'t>)>,
}

/// What acts, and on what.
#[derive(Debug)]
pub(crate) enum Action<'t> {
    ForceOnPoint(ByCase<'t, Entries<Force>>),
    ForceOnBody(ByCase<'t, Entries<Force>>),
    MomentOnBody(ByCase<'t, Moments>),
    MovementOfHold(ByCase<'t, Entries<Length>>),
}

/// A moment: one value, or one about each axis.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Moments {
    One(Moment),
    Each(Entries<Moment>),
}

impl<'t> Load<'t> {
    pub(super) fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(value, KEYS, r)?;
        fields.entry("name", r, value::part_name);
        let load = Load {
            place: fields.place.clone(),
            case: fields.entry("case", r, value::text),
            acts: acts(&mut fields, r),
        };
        fields.finish(r);
        Some(load)
    }
}

fn acts<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<(Written<&'t str>, Action<'t>)> {
    let on = one_of(fields, ["point", "body", "hold"], "acts on one thing", r);
    let what = one_of(fields, ["force", "moment", "movement"], "has one action", r);
    let name = on.and_then(|(_, value)| {
        let name = value::text(value, r)?;
        let place = value.span();
        Some(Written { value: name, place })
    });
    let (on, _) = on?;
    let (what, value) = what?;
    let action = match (on, what) {
        ("point", "force") => by_case(value, r, entries).map(Action::ForceOnPoint),
        ("body", "force") => by_case(value, r, entries).map(Action::ForceOnBody),
        ("body", "moment") => by_case(value, r, moments).map(Action::MomentOnBody),
        ("hold", "movement") => by_case(value, r, entries).map(Action::MovementOfHold),
        _ => {
            let place = fields.key_place(what).unwrap_or_default();
            let message = format!("a `{what}` does not act on a {on}");
            let help = match what {
                "force" => "a force acts on a `point` or a `body`",
                "moment" => "a moment acts on a `body`",
                _ => "a movement is that of what a `hold` is fixed to",
            };
            r.problems.say(&place, message, help);
            None
        }
    };
    Some((name?, action?))
}

/// The one of these keys that a load has, with its value; reports none and several.
fn one_of<'t>(
    fields: &mut Fields<'t>,
    keys: [&'static str; 3],
    rule: &str,
    r: &mut Reader<'t>,
) -> Option<(&'static str, &'t Value<'t>)> {
    let mut found = None;
    let mut several = false;
    for key in keys {
        let Some(value) = fields.get(key) else {
            continue;
        };
        if let Some((first, _)) = found {
            let place = fields.key_place(key).unwrap_or_default();
            let message = format!("a load of the job {rule}, and here are `{first}` and `{key}`");
            r.problems.say(&place, message, "write a load for each");
            several = true;
        } else {
            found = Some((key, value));
        }
    }
    if found.is_none() {
        let [first, second, third] = keys;
        let message = format!("a load of the job needs `{first}`, `{second}` or `{third}`");
        let help = "it is a `point` with `force`, a `body` with `force` or `moment`, or a `hold` \
                    with `movement`";
        r.problems.missing("", &fields.place, message, help);
    }
    found.filter(|_| !several)
}

fn moments<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Moments> {
    match value.get_ref() {
        DeValue::Array(_) => entries(value, r).map(Moments::Each),
        _ => value::quantity(value, r).map(Moments::One),
    }
}
