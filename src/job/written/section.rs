//! `section = { KIND = … }`: one piece's section by its dimensions. A new kind is one reader and one
//! line in [`KINDS`].

use super::fields::{Fields, Keys, Value, kind_of};
use super::later::refusal;
use super::{Reader, value};
use crate::catalogue::section::{
    Along, Angle, Bar, Channel, HShape, HollowBox, Inside, KnownArea, Round, StiffnessArea, Tee,
    Thread, Tube,
};
use crate::catalogue::{Section, Shape};
use crate::job::document::Content;
use crate::job::nearest::remedy;
use crate::quantity::{Length, Measure};

pub(crate) const KEYS: Keys = Keys {
    table: "section",
    keys: &[
        "round",
        "tube",
        "bar",
        "box",
        "area",
        "thread",
        "h",
        "channel",
        "angle",
        "tee",
        "gyration",
        "stiffness-area",
    ],
};
pub(crate) const TUBE: Keys = keys("tube", &["outer", "wall", "inner"]);
pub(crate) const BAR: Keys = keys("bar", &["width", "depth"]);
pub(crate) const BOX: Keys = keys("box", &["width", "depth", "wall"]);
pub(crate) const H: Keys = keys("h", &["depth", "width", "web", "flange", "root"]);
pub(crate) const CHANNEL: Keys = keys("channel", &["depth", "width", "web", "flange", "root"]);
pub(crate) const ANGLE: Keys = keys("angle", &["depth", "width", "wall", "root"]);
pub(crate) const TEE: Keys = keys("tee", &["depth", "width", "web", "flange", "root"]);

const fn keys(table: &'static str, keys: &'static [&'static str]) -> Keys {
    Keys { table, keys }
}

/// Reads the value of a kind's key; what stands beside it in the section is asked for there.
type ReadKind = for<'t> fn(&'t Value<'t>, &mut Fields<'t>, &mut Reader<'t>) -> Option<Section>;

const KINDS: &[(&str, ReadKind)] = &[
    ("round", round),
    ("tube", tube),
    ("bar", bar),
    ("box", hollow_box),
    ("area", area),
    ("thread", thread),
    ("h", h),
    ("channel", channel),
    ("angle", angle),
    ("tee", tee),
];

/// What stands beside a kind's key, and beside which.
const BESIDE: &[(&str, &str)] = &[("gyration", "area"), ("stiffness-area", "thread")];

/// A section.
pub(super) fn section<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let mut fields = Fields::of(value, KEYS, r)?;
    let mut chosen: Option<(&str, Option<Section>)> = None;
    for (kind, read) in KINDS {
        let Some(value) = fields.get(kind) else {
            continue;
        };
        if let Some((first, _)) = chosen {
            let place = fields.key_place(kind).unwrap_or_default();
            let message = format!("a section is of one kind, and here are `{first}` and `{kind}`");
            r.problems.say(&place, message, "keep one of them");
            fields.finish(r);
            return None;
        }
        chosen = Some((*kind, read(value, &mut fields, r)));
    }
    for (key, of) in BESIDE {
        if fields.has(key) && chosen.as_ref().is_some_and(|(kind, _)| kind != of) {
            let place = fields.key_place(key).unwrap_or_default();
            let message = format!("`{key}` stands beside `{of}` alone");
            r.problems.say(&place, message, "take it out");
        }
    }
    let has_others = value.get_ref().as_table().is_some_and(|table| {
        let strange = |key: &str| !KEYS.keys.contains(&key);
        table.keys().any(|key| strange(key.get_ref()))
    });
    let place = fields.place.clone();
    fields.finish(r);
    let Some((kind, section)) = chosen else {
        if !has_others {
            let help = "write its kind and dimensions, such as `{ round = \"30 mm\" }`";
            r.problems
                .missing("", &place, "a section needs its kind", help);
        }
        return None;
    };
    let section = section?;
    if let Some(fault) = section.fault() {
        let message = format!("this `{kind}` cannot be: {fault}");
        r.problems.say(&place, message, "");
        return None;
    }
    Some(section)
}

/// A dimension: more than 0, or a pair, of which one may be 0 where it runs to a point.
pub(super) fn dimension<'t, Q: Measure>(
    key: &'static str,
) -> impl FnOnce(&'t Value<'t>, &mut Reader<'t>) -> Option<Along<Q>> {
    move |value, r| {
        if !value.get_ref().is_array() {
            return value::positive::<Q>(key)(value, r).map(|value| Along {
                start: value,
                end: value,
            });
        }
        let along = value::along(value::quantity::<Q>)(value, r)?;
        let (start, end) = (along.start.si(), along.end.si());
        if start < 0.0 || end < 0.0 || start == 0.0 && end == 0.0 {
            value::too_small(key, false, Q::DIMENSION, &value.span(), r);
            return None;
        }
        Some(along)
    }
}

fn needed<'t>(
    fields: &mut Fields<'t>,
    key: &'static str,
    r: &mut Reader<'t>,
) -> Option<Along<Length>> {
    fields
        .required(key, "\"12 mm\"", r, dimension(key))
        .given()
        .map(|written| written.value)
}

/// A root radius, 0 or more. The outer `None` is a fault, the inner one says that none is written.
fn root<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Option<Along<Length>>> {
    let entry = fields.entry("root", r, value::along(value::quantity::<Length>));
    (!entry.is_wrong()).then(|| entry.given().map(|written| written.value))
}

fn round<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let diameter = dimension("round")(value, r)?;
    Some(Section::Round(Round { diameter }))
}

fn tube<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let mut fields = Fields::of(value, TUBE, r)?;
    let outer = needed(&mut fields, "outer", r);
    let wall = fields.entry("wall", r, dimension("wall"));
    let inner = fields.entry("inner", r, dimension("inner"));
    if wall.is_absent() && inner.is_absent() {
        fields.lacks("wall", "\"6 mm\"", r);
    } else if wall.is_written() && inner.is_written() {
        let place = fields.key_place("inner").unwrap_or_default();
        let message = "a tube takes `wall` or `inner`, and here are both";
        r.problems.say(&place, message, "keep one of them");
        fields.finish(r);
        return None;
    }
    fields.finish(r);
    let wall = wall.given().map(|wall| Inside::Wall(wall.value));
    let inner = inner.given().map(|inner| Inside::Inner(inner.value));
    Some(Section::Tube(Tube {
        outer: outer?,
        inside: wall.or(inner)?,
    }))
}

fn bar<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let mut fields = Fields::of(value, BAR, r)?;
    let width = needed(&mut fields, "width", r);
    let depth = needed(&mut fields, "depth", r);
    fields.finish(r);
    Some(Section::Bar(Bar {
        width: width?,
        depth: depth?,
    }))
}

fn hollow_box<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let mut fields = Fields::of(value, BOX, r)?;
    let width = needed(&mut fields, "width", r);
    let depth = needed(&mut fields, "depth", r);
    let wall = needed(&mut fields, "wall", r);
    fields.finish(r);
    Some(Section::Box(HollowBox {
        width: width?,
        depth: depth?,
        wall: wall?,
    }))
}

fn area<'t>(value: &'t Value<'t>, beside: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let gyration = beside.entry("gyration", r, dimension("gyration"));
    let area = dimension("area")(value, r)?;
    if gyration.is_wrong() {
        return None;
    }
    let gyration = gyration.given().map(|written| written.value);
    Some(Section::Area(KnownArea { area, gyration }))
}

fn thread<'t>(
    value: &'t Value<'t>,
    beside: &mut Fields<'t>,
    r: &mut Reader<'t>,
) -> Option<Section> {
    let stiffness_area = beside.entry("stiffness-area", r, |value, r| {
        match value::text(value, r)? {
            "tensile" => Some(StiffnessArea::Tensile),
            "nominal" => Some(StiffnessArea::Nominal),
            "minor" => Some(StiffnessArea::Minor),
            other => {
                let message = format!("no area of a thread is called `{other}`");
                let help = remedy(other, ["tensile", "nominal", "minor"], "write one of");
                r.problems.say(&value.span(), message, help);
                None
            }
        }
    });
    let text = value::text(value, r)?;
    match Thread::parse(text) {
        Ok(mut thread) => {
            if stiffness_area.is_wrong() {
                return None;
            }
            if let Some(written) = stiffness_area.given() {
                thread.stiffness_area = written.value;
            }
            Some(Section::Thread(thread))
        }
        Err(error) => {
            r.problems.say(&value.span(), error.message, error.help);
            None
        }
    }
}

/// The table of a rolled shape; its designation is for a later version.
fn rolled<'t>(value: &'t Value<'t>, known: Keys, r: &mut Reader<'t>) -> Option<Fields<'t>> {
    if let Content::String(designation) = value.get_ref() {
        let about = format!(
            "rolled shapes by designation; write `{}` with its dimensions",
            known.table
        );
        let (message, help) = refusal(designation, &about);
        r.problems.say(&value.span(), message, help);
        return None;
    }
    if !value.get_ref().is_table() {
        let message = format!(
            "`{}` is a table of dimensions, not {}",
            known.table,
            kind_of(value.get_ref())
        );
        let help = format!(
            "write `{} = {{ {} }}`",
            known.table,
            known.keys.join(" = …, ") + " = …"
        );
        r.problems.say(&value.span(), message, help);
        return None;
    }
    Fields::of(value, known, r)
}

/// Depth, width, web, flange and root of a shape that has them all.
type Rolled = [Along<Length>; 4];

fn web_and_flanges<'t>(
    value: &'t Value<'t>,
    known: Keys,
    r: &mut Reader<'t>,
) -> Option<(Rolled, Option<Along<Length>>)> {
    let mut fields = rolled(value, known, r)?;
    let depth = needed(&mut fields, "depth", r);
    let width = needed(&mut fields, "width", r);
    let web = needed(&mut fields, "web", r);
    let flange = needed(&mut fields, "flange", r);
    let root = root(&mut fields, r);
    fields.finish(r);
    Some(([depth?, width?, web?, flange?], root?))
}

fn h<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let ([depth, width, web, flange], root) = web_and_flanges(value, H, r)?;
    Some(Section::H(HShape {
        depth,
        width,
        web,
        flange,
        root,
    }))
}

fn channel<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let ([depth, width, web, flange], root) = web_and_flanges(value, CHANNEL, r)?;
    Some(Section::Channel(Channel {
        depth,
        width,
        web,
        flange,
        root,
    }))
}

fn tee<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let ([depth, width, web, flange], root) = web_and_flanges(value, TEE, r)?;
    Some(Section::Tee(Tee {
        depth,
        width,
        web,
        flange,
        root,
    }))
}

fn angle<'t>(value: &'t Value<'t>, _: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Section> {
    let mut fields = rolled(value, ANGLE, r)?;
    let depth = needed(&mut fields, "depth", r);
    let width = needed(&mut fields, "width", r);
    let wall = needed(&mut fields, "wall", r);
    let root = root(&mut fields, r);
    fields.finish(r);
    Some(Section::Angle(Angle {
        depth: depth?,
        width: width?,
        wall: wall?,
        root: root?,
    }))
}
