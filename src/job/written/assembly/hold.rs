//! `[[hold]]`: what holds points.

use super::direction::{Direction, directions};
use super::names;
use crate::job::written::fields::{Entry, Fields, Keys, Value, Written};
use crate::job::written::limit::{Limits, Stands};
use crate::job::written::{Reader, value};
use crate::model::Place;
use crate::quantity::{ForcePerLength, Length};
use toml::de::DeValue;

pub(crate) const KEYS: Keys = Keys {
    table: "hold",
    keys: &[
        "name",
        "point",
        "points",
        "along",
        "spring",
        "stop",
        "stiffness",
        "limit",
    ],
};

/// A hold as written.
#[derive(Debug)]
pub(crate) struct Hold<'t> {
    pub(crate) place: Place,
    pub(crate) name: Entry<&'t str>,
    pub(crate) points: Entry<Vec<Written<&'t str>>>,
    /// Every direction where it is absent. Of a stop it is one direction with a sign.
    pub(crate) along: Entry<Vec<Written<Direction>>>,
    /// `None` where something about it is wrong.
    pub(crate) kind: Option<Kind>,
    pub(crate) limits: Entry<Vec<Limits<'t>>>,
}

/// How a hold answers, as written.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Kind {
    Fixed,
    Spring(ForcePerLength),
    Stop {
        clearance: Length,
        stiffness: Option<ForcePerLength>,
    },
}

impl<'t> Hold<'t> {
    pub(super) fn read(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Self> {
        let mut fields = Fields::of(value, KEYS, r)?;
        let name = fields.entry("name", r, value::part_name);
        if name.is_wrong() {
            r.problems.lost("hold");
        }
        let points = points(&mut fields, r);
        let mut along = fields.entry("along", r, directions);
        let is_a_stop = fields.has("stop");
        let kind = kind(&mut fields, r);
        let is_one_kind = !fields.has("spring");
        if is_a_stop && is_one_kind && !blocks_one_way(&along, &fields.place, r) {
            along = Entry::Wrong;
        }
        let stands = if is_a_stop {
            Stands::Stop
        } else {
            Stands::Hold
        };
        let limits = fields.entry("limit", r, |value, r| Limits::read(value, stands, r));
        let place = fields.place.clone();
        fields.finish(r);
        Some(Hold {
            place,
            name,
            points,
            along,
            kind,
            limits,
        })
    }
}

/// `point` or `points`.
fn points<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Entry<Vec<Written<&'t str>>> {
    let one = fields.entry("point", r, |value, r| {
        if let DeValue::Array(_) = value.get_ref() {
            let message = "`point` names one point, and here is a list";
            r.problems
                .say(&value.span(), message, "write `points` for several");
            return None;
        }
        let name = value::text(value, r)?;
        let place = value.span();
        Some(vec![Written { value: name, place }])
    });
    let several = fields.entry("points", r, names("point"));
    match (one.is_written(), several.is_written()) {
        (true, true) => {
            let place = fields.key_place("points").unwrap_or_default();
            let message = "`point` and `points` both say what is held";
            r.problems.say(&place, message, "keep one of them");
            Entry::Wrong
        }
        (false, false) => {
            let message = "a hold needs `point` or `points`";
            let help = "add `point = \"a\"`, the name of the point that it holds";
            r.problems.missing("", &fields.place, message, help);
            Entry::Wrong
        }
        (true, false) => one,
        (false, true) => several,
    }
}

fn kind<'t>(fields: &mut Fields<'t>, r: &mut Reader<'t>) -> Option<Kind> {
    let spring = fields.entry("spring", r, value::positive("spring"));
    let stop = fields.entry("stop", r, value::not_negative("stop"));
    let stiffness = fields.entry("stiffness", r, value::positive("stiffness"));
    if spring.is_written() && stop.is_written() {
        let place = fields.key_place("stop").unwrap_or_default();
        let message = "a hold is of one kind, and here are `spring` and `stop`";
        r.problems.say(&place, message, "write two holds");
        return None;
    }
    if stop.is_absent()
        && let Some(place) = fields.key_place("stiffness")
    {
        let message = "`stiffness` stands beside `stop` alone";
        let help = "the stiffness of a spring is its value: `spring = \"35 kN/mm\"`";
        r.problems.say(&place, message, help);
        return None;
    }
    match (spring, stop) {
        (Entry::Absent, Entry::Absent) => Some(Kind::Fixed),
        (Entry::Given(spring), _) => Some(Kind::Spring(spring.value)),
        (_, Entry::Given(stop)) if !stiffness.is_wrong() => Some(Kind::Stop {
            clearance: stop.value,
            stiffness: stiffness.given().map(|stiffness| stiffness.value),
        }),
        _ => None,
    }
}

/// Whether a stop says the one direction that it blocks.
fn blocks_one_way(
    along: &Entry<Vec<Written<Direction>>>,
    hold: &Place,
    r: &mut Reader<'_>,
) -> bool {
    let along = match along {
        Entry::Wrong => return false,
        Entry::Absent => {
            let message = "a stop needs `along`, the direction that it blocks";
            r.problems.missing(
                "along",
                hold,
                message,
                "add it with its sign: `along = [\"+x\"]`",
            );
            return false;
        }
        Entry::Given(along) => along,
    };
    let [one] = along.value.as_slice() else {
        let message = format!(
            "a stop blocks one direction, and here are {}",
            along.value.len()
        );
        let help = "write a hold for each direction";
        r.problems.say(&along.place, message, help);
        return false;
    };
    if let Direction::Axis {
        axis,
        negative: None,
    } = one.value
    {
        let axis = AXES[axis];
        let message = format!("a stop needs the sign of the direction that it blocks: `{axis}`");
        let help = format!(
            "write \"+{axis}\" where it blocks movement toward larger {axis}, else \"-{axis}\""
        );
        r.problems.say(&one.place, message, help);
        return false;
    }
    true
}

/// The names of the coordinates.
pub(crate) const AXES: [&str; 3] = ["x", "y", "z"];
