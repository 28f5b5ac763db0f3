//! `[body.NAME]`: a stiff body.

use super::entries::{Entries, entries};
use super::names;
use crate::job::written::fields::{Entry, Fields, Keys, Value, Written};
use crate::job::written::{Reader, value};
use crate::model::Place;
use crate::quantity::{Length, Mass};

pub(crate) const KEYS: Keys = Keys {
    table: "body",
    keys: &["points", "mass", "at"],
};

/// A body as written.
#[derive(Debug)]
pub(crate) struct Body<'t> {
    pub(crate) name: Written<&'t str>,
    pub(crate) place: Place,
    pub(crate) points: Entry<Vec<Written<&'t str>>>,
    pub(crate) mass: Entry<Mass>,
    pub(crate) at: Entry<Entries<Length>>,
}

impl<'t> Body<'t> {
    /// Even of a value that is no table a body comes out: its name stands.
    pub(super) fn read(name: Written<&'t str>, table: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let Some(mut fields) = Fields::of(table, KEYS, r) else {
            return Body {
                name,
                place: table.span(),
                points: Entry::Wrong,
                mass: Entry::Wrong,
                at: Entry::Wrong,
            };
        };
        let body = Body {
            name,
            place: fields.place.clone(),
            points: fields.required("points", "[\"a\", \"b\"]", r, names("point")),
            mass: fields.entry("mass", r, value::not_negative("mass")),
            at: fields.entry("at", r, entries),
        };
        fields.finish(r);
        body
    }
}
