//! What members share and what the job says of it: points, bodies, holds, loads of the job, and
//! what is watched.

pub(crate) mod body;
pub(crate) mod direction;
pub(crate) mod entries;
pub(crate) mod hold;
pub(crate) mod load;
pub(crate) mod point;
pub(crate) mod watch;

use super::fields::{Fields, Value, Written, list};
use super::{Reader, name, tables, value};
use toml::de::DeValue;

/// The parts of an assembly as written; lists are in the order of the file.
#[derive(Debug)]
pub(crate) struct Assembly<'t> {
    pub(crate) points: Vec<point::Point<'t>>,
    pub(crate) bodies: Vec<body::Body<'t>>,
    pub(crate) holds: Vec<hold::Hold<'t>>,
    pub(crate) loads: Vec<load::Load<'t>>,
    pub(crate) watches: Vec<watch::Watch<'t>>,
}

impl<'t> Assembly<'t> {
    pub(super) fn read(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Self {
        let points = tables(fields, "point", r).into_iter();
        let points = points.map(|(name, value)| {
            name::is_for_a_part(name.value, &name.place, r);
            point::Point::read(name, value, r)
        });
        let points = points.collect();
        let bodies = tables(fields, "body", r).into_iter();
        let bodies = bodies.map(|(name, value)| {
            name::is_for_a_part(name.value, &name.place, r);
            body::Body::read(name, value, r)
        });
        let bodies = bodies.collect();
        Assembly {
            points,
            bodies,
            holds: each(fields, "hold", r, hold::Hold::read),
            loads: each(fields, "load", r, load::Load::read),
            watches: each(fields, "watch", r, watch::Watch::read),
        }
    }
}

/// The sound tables of a list of the job. Without one that is at fault nobody can say that a name
/// is not there.
fn each<'t, T>(
    fields: &mut Fields<'t>,
    key: &'static str,
    r: &mut Reader<'t>,
    read: impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<T>,
) -> Vec<T> {
    let Some(value) = fields.get(key) else {
        return Vec::new();
    };
    let Some(tables) = tables_of(value, key, r) else {
        r.problems.lost(key);
        return Vec::new();
    };
    let mut all = Vec::with_capacity(tables.len());
    for table in tables {
        match read(table, r) {
            Some(one) => all.push(one),
            None => r.problems.lost(key),
        }
    }
    all
}

fn tables_of<'t>(
    value: &'t Value<'t>,
    key: &'static str,
    r: &mut Reader<'t>,
) -> Option<&'t toml::de::DeArray<'t>> {
    if let DeValue::Table(_) = value.get_ref() {
        let message = format!("`{key}` is a list of tables, not a table");
        let help = format!("write the header of each in double brackets: `[[{key}]]`");
        r.problems.say(&value.span(), message, help);
        return None;
    }
    list(value, key, r)
}

/// A list of names, at least one.
pub(crate) fn names<'t>(
    what: &'static str,
) -> impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<Vec<Written<&'t str>>> {
    move |value, r| {
        let help = || format!("write them as in `[\"a\", \"b\"]`, the {what}s by their names");
        let DeValue::Array(list) = value.get_ref() else {
            let kind = super::fields::kind_of(value.get_ref());
            let message = format!("a list of {what}s is expected here, not {kind}");
            r.problems.say(&value.span(), message, help());
            return None;
        };
        if list.is_empty() {
            let message = format!("this list names no {what}");
            let help = format!("name at least one {what}, or leave the key out");
            r.problems.say(&value.span(), message, help);
            return None;
        }
        let mut names = Vec::with_capacity(list.len());
        let mut sound = true;
        for value in list.iter() {
            match value::text(value, r) {
                Some(name) => names.push(Written {
                    value: name,
                    place: value.span(),
                }),
                None => sound = false,
            }
        }
        sound.then_some(names)
    }
}
