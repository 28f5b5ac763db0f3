//! `[case.NAME]`: actions that come and go together.

use super::fields::{Entry, Fields, Keys, Value, Written};
use super::{Reader, value};
use crate::catalogue::section::Along;
use crate::model::Place;
use crate::quantity::{TemperatureInterval, ThermodynamicTemperature};

pub(crate) const KEYS: Keys = Keys {
    table: "case",
    keys: &["weight", "temperature-change", "temperature", "always"],
};

/// A case as written.
#[derive(Debug)]
pub(crate) struct Case<'t> {
    pub(crate) name: Written<&'t str>,
    pub(crate) place: Place,
    pub(crate) always: bool,
    pub(crate) weight: Entry<f64>,
    pub(crate) change: Entry<Along<TemperatureInterval>>,
    pub(crate) reading: Entry<Along<ThermodynamicTemperature>>,
}

impl<'t> Case<'t> {
    /// Even of a table with faults a case comes out: its name stands.
    pub(super) fn read(name: Written<&'t str>, table: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let mut case = Case {
            name,
            place: table.span(),
            always: false,
            weight: Entry::Absent,
            change: Entry::Absent,
            reading: Entry::Absent,
        };
        let Some(mut fields) = Fields::of(table, KEYS, r) else {
            return case;
        };
        case.weight = fields.entry("weight", r, value::number);
        case.change = fields.entry("temperature-change", r, value::along(value::change));
        case.reading = fields.entry("temperature", r, value::along(value::reading));
        case.always = match fields.entry("always", r, value::boolean) {
            Entry::Given(written) => written.value,
            _ => false,
        };
        fields.finish(r);
        case
    }
}
