//! `[material.ID]`: the job's own materials.

use super::fields::{Entry, Fields, Keys, Value, Written, list};
use super::{Reader, value};
use crate::job::document::Content;
use crate::model::Place;
use crate::quantity::{Density, Expansion, Length, Stress, ThermodynamicTemperature};

pub(crate) const KEYS: Keys = Keys {
    table: "material",
    keys: &[
        "like",
        "modulus",
        "expansion",
        "density",
        "yield",
        "yield-by-thickness",
        "ultimate",
        "proof",
        "crushing",
        "range",
        "family",
        "note",
        "source",
    ],
};

/// A material as written.
#[derive(Debug)]
pub(crate) struct Material<'t> {
    pub(crate) id: Written<&'t str>,
    pub(crate) place: Place,
    pub(crate) like: Entry<&'t str>,
    pub(crate) modulus: Entry<Stress>,
    pub(crate) expansion: Entry<Expansion>,
    pub(crate) density: Entry<Density>,
    /// At any thickness, or up to each of rising ones.
    pub(crate) yield_strength: Entry<Vec<(Option<Length>, Stress)>>,
    pub(crate) ultimate: Entry<Stress>,
    pub(crate) proof: Entry<Stress>,
    pub(crate) crushing: Entry<Stress>,
    pub(crate) range: Entry<(ThermodynamicTemperature, ThermodynamicTemperature)>,
    pub(crate) family: Entry<&'t str>,
    pub(crate) note: Entry<&'t str>,
    pub(crate) source: Entry<&'t str>,
}

impl<'t> Material<'t> {
    /// Even of a value that is no table a material comes out, of which nothing is known but its
    /// name.
    pub(super) fn read(id: Written<&'t str>, table: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let Some(mut fields) = Fields::of(table, KEYS, r) else {
            return Self::unknown(id, table.span());
        };
        let one_yield = fields.entry("yield", r, |value, r| {
            value::positive("yield")(value, r).map(|strength| vec![(None, strength)])
        });
        let rows = fields.entry("yield-by-thickness", r, yield_by_thickness);
        if one_yield.is_written() && rows.is_written() {
            let place = fields.key_place("yield-by-thickness").unwrap_or_default();
            let message = "`yield` and `yield-by-thickness` stand in one material";
            r.problems.say(&place, message, "keep one of them");
        }
        let material = Material {
            id,
            place: table.span(),
            like: fields.entry("like", r, value::text),
            modulus: fields.entry("modulus", r, value::positive("modulus")),
            expansion: fields.entry("expansion", r, value::quantity),
            density: fields.entry("density", r, value::not_negative("density")),
            yield_strength: if rows.is_written() { rows } else { one_yield },
            ultimate: fields.entry("ultimate", r, value::positive("ultimate")),
            proof: fields.entry("proof", r, value::positive("proof")),
            crushing: fields.entry("crushing", r, value::positive("crushing")),
            range: fields.entry("range", r, range),
            family: fields.entry("family", r, value::text),
            note: fields.entry("note", r, value::text),
            source: fields.entry("source", r, value::text),
        };
        fields.finish(r);
        material
    }

    fn unknown(id: Written<&'t str>, place: Place) -> Self {
        Material {
            id,
            place,
            like: Entry::Wrong,
            modulus: Entry::Wrong,
            expansion: Entry::Wrong,
            density: Entry::Wrong,
            yield_strength: Entry::Wrong,
            ultimate: Entry::Wrong,
            proof: Entry::Wrong,
            crushing: Entry::Wrong,
            range: Entry::Wrong,
            family: Entry::Wrong,
            note: Entry::Wrong,
            source: Entry::Wrong,
        }
    }
}

fn yield_by_thickness<'t>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<Vec<(Option<Length>, Stress)>> {
    let rows = match value.get_ref() {
        Content::Array(rows) if rows.is_empty() => {
            let message = "this table of yield strengths is empty";
            let help = "write rows of a thickness and a strength: `[[\"16 mm\", \"355 MPa\"]]`";
            r.problems.say(&value.span(), message, help);
            return None;
        }
        _ => list(value, "yield-by-thickness", r)?,
    };
    let mut table: Vec<(Option<Length>, Stress)> = Vec::with_capacity(rows.len());
    let mut sound = true;
    for row in rows.iter() {
        let read = value::pair(row, r).and_then(|[thickness, strength]| {
            let thickness = value::positive::<Length>("thickness")(thickness, r);
            let strength = value::positive::<Stress>("yield")(strength, r);
            Some((thickness?, strength?))
        });
        let Some((thickness, strength)) = read else {
            sound = false;
            continue;
        };
        if table
            .last()
            .is_some_and(|(last, _)| *last >= Some(thickness))
        {
            let message = "the thicknesses of this table do not rise";
            let help = "each row holds up to its thickness; write the thinnest first";
            r.problems.say(&row.span(), message, help);
            sound = false;
        }
        table.push((Some(thickness), strength));
    }
    sound.then_some(table)
}

fn range<'t>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
) -> Option<(ThermodynamicTemperature, ThermodynamicTemperature)> {
    let [from, to] = value::pair(value, r)?;
    let (from, to) = (value::reading(from, r), value::reading(to, r));
    let (from, to) = (from?, to?);
    if from >= to {
        let message = "the range of temperature is empty";
        r.problems
            .say(&value.span(), message, "write the lower reading first");
        return None;
    }
    Some((from, to))
}
