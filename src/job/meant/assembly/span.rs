//! What a member between points reaches over.

use super::direction::unit;
use crate::job::meant::Meaning;
use crate::job::meant::members::Whole;
use crate::job::meant::names::Root;
use crate::job::written::Entry;
use crate::job::written::assembly::entries::counted;
use crate::model::{Place, Spatial};

/// Points that lie nearer to one another than this share of their coordinates lie at one place.
const SAME: f64 = 1e-12;

/// What a member reaches over.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(in crate::job::meant) enum Span {
    /// It has supports of its own.
    None,
    /// Something about its points is at fault.
    Wrong,
    Given(Reach),
}

/// From one point to another.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(in crate::job::meant) struct Reach {
    pub(in crate::job::meant) start: usize,
    pub(in crate::job::meant) end: usize,
    /// The unit vector from start to end, exact where it lies along an axis.
    pub(in crate::job::meant) direction: Spatial<f64>,
    /// In metres.
    pub(in crate::job::meant) distance: f64,
}

/// What a member reaches over; reports keys that do not stand beside `between`, unknown points, and
/// points at one place.
pub(in crate::job::meant) fn span<'t>(
    whole: &Whole<'_, 't>,
    meaning: &mut Meaning<'_, 't>,
) -> Span {
    let between = match whole.between {
        Entry::Given(between) => between,
        Entry::Wrong => return Span::Wrong,
        Entry::Absent => {
            if let Some(carries) = whole.carries.given() {
                let message = "`carries` stands in a member `between` two points";
                let help = "take it out, or write `between`; a joint that parts is a `gap` segment";
                meaning.r.problems.say(&carries.place, message, help);
            }
            return Span::None;
        }
    };
    alone(whole, &between.place, meaning);
    let [start, end] = &between.value;
    let found = (
        meaning.find(Root::Point, start),
        meaning.find(Root::Point, end),
    );
    let (Some(from), Some(to)) = found else {
        return Span::Wrong;
    };
    let at = &meaning.space.at;
    let (Some(a), Some(b)) = (at[from], at[to]) else {
        return Span::Wrong;
    };
    let largest = a.iter().chain(&b).map(|q| q.value.abs());
    let largest = largest.fold(0.0, f64::max);
    let difference = [0, 1, 2].map(|axis| (b[axis] - a[axis]).value);
    match unit(difference) {
        Some((direction, distance)) if distance > SAME * largest => Span::Given(Reach {
            start: from,
            end: to,
            direction,
            distance,
        }),
        _ => {
            let message = format!(
                "the points `{}` and `{}` lie at one place, so the member `{}` has no length",
                start.value, end.value, whole.name.value
            );
            let help = "name another point, or look at their coordinates";
            meaning.r.problems.say(&between.place, message, help);
            Span::Wrong
        }
    }
}

/// Reports keys that do not stand beside `between`.
fn alone(whole: &Whole<'_, '_>, between: &Place, meaning: &mut Meaning<'_, '_>) {
    let own = whole.own;
    let supports = whole.supports.given().filter(|all| !all.value.is_empty());
    let coordinates = meaning.space.coordinates;
    let runs = whole
        .runs
        .given()
        .filter(|_| coordinates.is_some_and(|many| many > 1));
    let keys = [
        (
            "start",
            whole.start.given().map(|it| &it.place),
            &own.start.is_written(),
        ),
        (
            "end",
            whole.end.given().map(|it| &it.place),
            &own.end.is_written(),
        ),
        (
            "support",
            supports.map(|it| &it.place),
            &own.supports.is_written(),
        ),
        ("runs", runs.map(|it| &it.place), &own.runs.is_written()),
    ];
    let name = whole.name.value;
    for (key, place, is_own) in keys {
        let Some(place) = place else {
            continue;
        };
        let problems = &mut meaning.r.problems;
        if !is_own {
            let message = format!(
                "the member `{name}` takes over `{key}` by `like`, and a member between points has \
                 none"
            );
            let help = "write the keys that it shares out, in place of `like`";
            problems.say(between, message, help);
        } else if key == "runs" {
            let message = format!(
                "`runs` in the member `{name}`: in {} its points tell how it runs",
                counted(coordinates.unwrap_or(2))
            );
            problems.say(place, message, "take it out");
        } else {
            let message = format!("the member `{name}` lies between points, and so has no `{key}`");
            let help = "take it out; its points are held by a `hold`";
            problems.say(place, message, help);
        }
    }
}
