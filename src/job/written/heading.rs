//! `[job]`: what the job says of itself.

use super::fields::{Entry, Fields, Keys, Value, kind_of};
use super::{Reader, value};
use crate::job::document::Content;
use crate::job::nearest::remedy;
use crate::quantity::{ThermodynamicTemperature, Units};
use std::borrow::Cow;

pub(crate) const KEYS: Keys = Keys {
    table: "job",
    keys: &[
        "title",
        "reference",
        "prepared-by",
        "checked-by",
        "date",
        "note",
        "units",
        "datum",
    ],
};

/// `[job]` as written.
#[derive(Debug)]
pub(crate) struct Heading<'t> {
    pub(crate) title: Entry<&'t str>,
    pub(crate) reference: Entry<&'t str>,
    pub(crate) prepared_by: Entry<&'t str>,
    pub(crate) checked_by: Entry<&'t str>,
    pub(crate) date: Entry<Cow<'t, str>>,
    pub(crate) note: Entry<&'t str>,
    pub(crate) units: Entry<Units>,
    pub(crate) datum: Entry<ThermodynamicTemperature>,
}

impl<'t> Heading<'t> {
    pub(super) fn read(table: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(table, KEYS, r)?;
        let heading = Heading {
            title: fields.entry("title", r, value::text),
            reference: fields.entry("reference", r, value::text),
            prepared_by: fields.entry("prepared-by", r, value::text),
            checked_by: fields.entry("checked-by", r, value::text),
            date: fields.entry("date", r, date),
            note: fields.entry("note", r, value::text),
            units: fields.entry("units", r, units),
            datum: fields.entry("datum", r, value::reading),
        };
        fields.finish(r);
        Some(heading)
    }
}

/// A date as a text, or as TOML writes one.
fn date<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Cow<'t, str>> {
    match value.get_ref() {
        Content::String(text) => Some(Cow::Borrowed(text.as_ref())),
        Content::Datetime(date) => Some(Cow::Owned(date.to_string())),
        other => {
            let message = format!("a date is expected here, not {}", kind_of(other));
            let help = "write it in quotes, or as year-month-day without them";
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

fn units<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Units> {
    match value::text(value, r)? {
        "SI" => Some(Units::SI),
        "US" => Some(Units::US),
        other => {
            let message = format!("no system of units is called `{other}`");
            let help = remedy(other, ["SI", "US"], "reports show");
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}
