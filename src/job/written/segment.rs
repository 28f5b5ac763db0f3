//! `[[member.NAME.segment]]` and its layers.

use super::fields::{Entry, Fields, Keys, Value, list};
use super::limit::{Limits, Stands};
use super::section::{dimension, section};
use super::{Reader, value};
use crate::catalogue::Section;
use crate::catalogue::section::Along;
use crate::model::Place;
use crate::quantity::{Area, Dimension, Expansion, ForcePerLength, Length, MassPerLength};
use toml::de::DeValue;

pub(crate) const KEYS: Keys = Keys {
    table: "segment",
    keys: &[
        "name",
        "length",
        "section",
        "material",
        "count",
        "net",
        "holes",
        "mass",
        "layer",
        "stiffness",
        "expansion",
        "gap",
        "limit",
    ],
};
pub(crate) const LAYER: Keys = Keys {
    table: "layer",
    keys: &[
        "name", "section", "material", "count", "net", "holes", "mass", "limit",
    ],
};
pub(crate) const HOLES: Keys = Keys {
    table: "table of holes",
    keys: &["diameter", "number", "thickness"],
};

/// A segment as written.
#[derive(Debug)]
pub(crate) struct Segment<'t> {
    pub(crate) place: Place,
    pub(crate) name: Entry<&'t str>,
    /// Its length; the width of a gap.
    pub(crate) length: Entry<Extent>,
    pub(crate) kind: Kind<'t>,
    pub(crate) limits: Entry<Vec<Limits<'t>>>,
}

/// How long a segment is.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Extent {
    Length(Length),
    /// What is left of the distance between the member's points.
    Rest,
}

impl Segment<'_> {
    /// Its length, where it is written and sound.
    pub(crate) fn own_length(&self) -> Option<Length> {
        match self.length.given()?.value {
            Extent::Length(length) => Some(length),
            Extent::Rest => None,
        }
    }
}

/// What a segment is made of, as written.
#[derive(Debug)]
pub(crate) enum Kind<'t> {
    /// `section` and `material`, or `layer`.
    Solid {
        layers: Vec<Layer<'t>>,
        layered: bool,
    },
    /// `stiffness`.
    Part {
        stiffness: Entry<ForcePerLength>,
        expansion: Entry<Expansion>,
        mass: Entry<MassPerLength>,
    },
    /// `gap`.
    Gap { stiffness: Entry<ForcePerLength> },
    /// Keys that contradict each other, or layers that are none: nothing may be concluded.
    Wrong,
}

/// A layer, or the one make-up of a segment without layers.
#[derive(Debug)]
pub(crate) struct Layer<'t> {
    pub(crate) place: Place,
    pub(crate) name: Entry<&'t str>,
    pub(crate) section: Entry<Section>,
    pub(crate) material: Entry<&'t str>,
    pub(crate) count: Entry<f64>,
    pub(crate) net: Entry<Along<Area>>,
    pub(crate) holes: Entry<Holes>,
    pub(crate) mass: Entry<MassPerLength>,
    pub(crate) limits: Entry<Vec<Limits<'t>>>,
}

/// Holes in one piece.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Holes {
    pub(crate) diameter: Along<Length>,
    pub(crate) thickness: Along<Length>,
    pub(crate) number: f64,
}

impl<'t> Segment<'t> {
    /// Even of a value that is no table a segment comes out, so that those after it keep their
    /// numbers.
    pub(super) fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let Some(mut fields) = Fields::of(value, KEYS, r) else {
            return Segment {
                place: value.span(),
                name: Entry::Wrong,
                length: Entry::Wrong,
                kind: Kind::Wrong,
                limits: Entry::Wrong,
            };
        };
        let place = fields.place.clone();
        let name = fields.entry("name", r, value::part_name);
        let (length, kind, stands) = if fields.has("gap") {
            let width = fields.entry("gap", r, |value, r| {
                value::positive("gap")(value, r).map(Extent::Length)
            });
            let stiffness = fields.entry("stiffness", r, value::positive("stiffness"));
            alone(&fields, "gap", &["name", "gap", "stiffness", "limit"], r);
            (width, Kind::Gap { stiffness }, Stands::Gap)
        } else if fields.has("layer") {
            let length = length(&mut fields, r);
            let layers = fields.get("layer").and_then(|value| layers(value, r));
            alone(&fields, "layer", &["name", "length", "layer", "limit"], r);
            let kind = layers.map_or(Kind::Wrong, |layers| Kind::Solid {
                layers,
                layered: true,
            });
            (length, kind, Stands::Segment)
        } else if fields.has("stiffness") {
            let length = length(&mut fields, r);
            let kind = Kind::Part {
                stiffness: fields.entry("stiffness", r, value::positive("stiffness")),
                expansion: fields.entry("expansion", r, value::quantity),
                mass: fields.entry("mass", r, value::not_negative("mass")),
            };
            let allowed = ["name", "length", "stiffness", "expansion", "mass", "limit"];
            alone(&fields, "stiffness", &allowed, r);
            (length, kind, Stands::Part)
        } else {
            let length = length(&mut fields, r);
            let mut layer = Layer::fields(&mut fields, r);
            if layer.section.is_absent() {
                fields.lacks("section", "{ round = \"30 mm\" }", r);
                layer.section = Entry::Wrong;
            }
            if let Some(place) = fields.key_place("expansion") {
                let message = "`expansion` stands in a segment beside `stiffness` alone";
                let help = "that of a material stands in its table `[material.…]`";
                r.problems.say(&place, message, help);
            }
            let layers = vec![layer];
            let kind = Kind::Solid {
                layers,
                layered: false,
            };
            (length, kind, Stands::Segment)
        };
        let limits = fields.entry("limit", r, |value, r| Limits::read(value, stands, r));
        fields.finish(r);
        Segment {
            place,
            name,
            length,
            kind,
            limits,
        }
    }
}

impl<'t> Layer<'t> {
    /// The keys that a layer and a segment of one material have in common, but for name and limit.
    fn fields(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Self {
        let layer = Layer {
            place: fields.place.clone(),
            name: Entry::Absent,
            section: fields.entry("section", r, section),
            material: fields.entry("material", r, value::text),
            count: fields.entry("count", r, |value, r| value::count("count", value, r)),
            net: fields.entry("net", r, |value, r| net(value, r)),
            holes: fields.entry("holes", r, holes),
            mass: fields.entry("mass", r, value::not_negative("mass")),
            limits: Entry::Absent,
        };
        if layer.net.is_written() && layer.holes.is_written() {
            let place = fields.key_place("holes").unwrap_or_default();
            let message = "`net` and `holes` both say what is left for stress";
            r.problems.say(&place, message, "keep one of them");
        }
        layer
    }

    fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(value, LAYER, r)?;
        let mut layer = Layer::fields(&mut fields, r);
        layer.name = fields.entry("name", r, value::part_name);
        if layer.section.is_absent() {
            fields.lacks("section", "{ area = \"0.352 m2\" }", r);
            layer.section = Entry::Wrong;
        }
        layer.limits = fields.entry("limit", r, |value, r| Limits::read(value, Stands::Layer, r));
        fields.finish(r);
        Some(layer)
    }
}

fn length<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Entry<Extent> {
    fields.required("length", "\"2.85 m\"", r, |value, r| {
        if matches!(value.get_ref(), DeValue::String(text) if text == "rest") {
            return Some(Extent::Rest);
        }
        value::positive("length")(value, r).map(Extent::Length)
    })
}

fn layers<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Vec<Layer<'t>>> {
    let tables = list(value, "layer", r)?;
    if tables.is_empty() {
        let message = "this list of layers is empty";
        r.problems
            .say(&value.span(), message, "write at least one layer");
        return None;
    }
    let mut layers = Vec::with_capacity(tables.len());
    let mut sound = true;
    for table in tables.iter() {
        match Layer::read(table, r) {
            Some(layer) => layers.push(layer),
            None => sound = false,
        }
    }
    sound.then_some(layers)
}

/// Reports the keys that do not stand beside the one that says what the segment is.
fn alone(fields: &Fields<'_>, by: &str, allowed: &[&str], r: &mut Reader<'_>) {
    for key in KEYS.keys {
        if allowed.contains(key) {
            continue;
        }
        if let Some(place) = fields.key_place(key) {
            let message = format!("`{key}` does not stand in one segment with `{by}`");
            let help = match (by, *key) {
                ("gap", "length") => "the width of the gap is its length; leave `length` out",
                ("layer", _) => "write it in each layer",
                _ => "keep one of them, or make two segments of it",
            };
            r.problems.say(&place, message, help);
        }
    }
}

fn net<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Along<Area>> {
    let area = dimension::<Area>("net")(value, r)?;
    if area.start <= Area::default() || area.end <= Area::default() {
        value::too_small("net", false, Dimension::Area, &value.span(), r);
        return None;
    }
    Some(area)
}

fn holes<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Holes> {
    let mut fields = Fields::of(value, HOLES, r)?;
    let diameter = fields.required("diameter", "\"14 mm\"", r, dimension("diameter"));
    let thickness = fields.required("thickness", "\"12 mm\"", r, dimension("thickness"));
    let number = fields.entry("number", r, |value, r| value::count("number", value, r));
    fields.finish(r);
    if number.is_wrong() {
        return None;
    }
    Some(Holes {
        diameter: diameter.given()?.value,
        thickness: thickness.given()?.value,
        number: number.given().map_or(1.0, |number| number.value),
    })
}
