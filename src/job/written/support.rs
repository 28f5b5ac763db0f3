//! `[[member.NAME.support]]`.

use super::fields::{Entry, Fields, Keys, Value};
use super::limit::{Limits, Stands};
use super::station::{Station, station};
use super::{Reader, value};
use crate::job::nearest::remedy;
use crate::model::{Place, Side, SupportKind};

pub(crate) const KEYS: Keys = Keys {
    table: "support",
    keys: &[
        "name",
        "at",
        "fixed",
        "spring",
        "stop",
        "side",
        "stiffness",
        "limit",
    ],
};

/// A support as written.
#[derive(Debug)]
pub(crate) struct Support<'t> {
    pub(crate) place: Place,
    pub(crate) name: Entry<&'t str>,
    pub(crate) at: Entry<Station<'t>>,
    /// `None` where something about it is wrong.
    pub(crate) kind: Option<SupportKind>,
    pub(crate) limits: Entry<Vec<Limits<'t>>>,
}

impl<'t> Support<'t> {
    pub(super) fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(value, KEYS, r)?;
        let support = Support {
            place: fields.place.clone(),
            name: fields.entry("name", r, value::part_name),
            at: fields.required("at", "\"end\"", r, station),
            kind: kind(&mut fields, r),
            limits: Entry::Absent,
        };
        let stands = match support.kind {
            Some(SupportKind::Fixed | SupportKind::Spring(_)) => Stands::Support,
            Some(SupportKind::Stop { .. }) | None => Stands::Stop,
        };
        let limits = fields.entry("limit", r, |value, r| Limits::read(value, stands, r));
        fields.finish(r);
        Some(Support { limits, ..support })
    }
}

fn kind<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<SupportKind> {
    let fixed = fields.entry("fixed", r, |value, r| {
        let fixed = value::boolean(value, r)?;
        if !fixed {
            let message = "`fixed = false` says nothing";
            let help = "leave it out; what has no support is free";
            r.problems.say(&value.span(), message, help);
        }
        fixed.then_some(())
    });
    let spring = fields.entry("spring", r, value::positive("spring"));
    let stop = fields.entry("stop", r, value::not_negative("stop"));
    let side = fields.entry("side", r, side);
    let stiffness = fields.entry("stiffness", r, value::positive("stiffness"));
    let written = [
        ("fixed", fixed.is_written()),
        ("spring", spring.is_written()),
        ("stop", stop.is_written()),
    ];
    let mut kinds = written.iter().filter(|(_, is)| *is).map(|(key, _)| *key);
    let Some(kind) = kinds.next() else {
        let message = "a support needs `fixed`, `spring` or `stop`";
        let help = "add `fixed = true`, `spring = \"35 kN/mm\"` or `stop = \"2.5 mm\"`";
        r.problems.missing("", &fields.place, message, help);
        return None;
    };
    if let Some(second) = kinds.next() {
        let place = fields.key_place(second).unwrap_or_default();
        let message = format!("a support is of one kind, and here are `{kind}` and `{second}`");
        r.problems.say(&place, message, "write two supports");
        return None;
    }
    if kind != "stop" {
        for key in ["side", "stiffness"] {
            if let Some(place) = fields.key_place(key) {
                let message = format!("`{key}` stands beside `stop` alone");
                let help = if (kind, key) == ("spring", "stiffness") {
                    "the stiffness of a spring is its value: `spring = \"35 kN/mm\"`"
                } else {
                    "take it out"
                };
                r.problems.say(&place, message, help);
            }
        }
    }
    match kind {
        "fixed" => fixed.given().map(|_| SupportKind::Fixed),
        "spring" => spring
            .given()
            .map(|spring| SupportKind::Spring(spring.value)),
        _ => {
            if side.is_wrong() || stiffness.is_wrong() {
                return None;
            }
            Some(SupportKind::Stop {
                clearance: stop.given()?.value,
                side: side.given().map_or(Side::End, |side| side.value),
                stiffness: stiffness.given().map(|stiffness| stiffness.value),
            })
        }
    }
}

fn side<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Side> {
    match value::text(value, r)? {
        "end" => Some(Side::End),
        "start" => Some(Side::Start),
        other => {
            let message = format!(
                "a stop blocks movement toward the \"end\" or the \"start\", not `{other}`"
            );
            let help = remedy(other, ["end", "start"], "write one of");
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}
