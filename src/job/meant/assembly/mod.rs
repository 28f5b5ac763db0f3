//! Assemblies: where points lie, what lies between them, what holds and loads them, and what is
//! watched.

mod bodies;
mod direction;
mod holds;
mod limits;
mod loads;
mod one_way;
mod space;
mod span;
mod watches;

pub(super) use one_way::{has_no_gaps, takes};
pub(super) use space::{Space, up};
pub(super) use span::{Span, span};
pub(super) use watches::{Stations, stations, watches};

use super::members::Meant;
use super::{Meaning, name};
use crate::model::{Assembly, Body, Hold, Place, Point, Remark};

/// What the members of a job share; `None` in a job without points. Where something is at fault,
/// which has been reported, it lacks that.
pub(super) fn assembly<'t>(
    meant: &[Meant<'_, 't>],
    meaning: &mut Meaning<'_, 't>,
) -> Option<Assembly> {
    let bodies = bodies::bodies(meaning);
    let holds = holds::holds(meaning);
    let actions = loads::actions(&bodies, &holds, meaning);
    let bodies: Vec<Body> = bodies.into_iter().flatten().collect();
    let holds: Vec<Hold> = holds.into_iter().flatten().collect();
    let coordinates = meaning.space.coordinates?;
    let written = &meaning.job.assembly.points;
    let at = meaning.space.at.iter();
    let points = written.iter().zip(at).filter_map(|(point, at)| {
        Some(Point {
            name: name(&point.name),
            place: point.name.place.clone(),
            at: (*at)?,
        })
    });
    let points = points.collect();
    if meaning.r.problems.is_empty() {
        caution_unused(meant, &bodies, &holds, meaning);
    }
    Some(Assembly {
        coordinates,
        down: meaning.space.down(),
        points,
        bodies,
        holds,
        actions,
    })
}

/// As many unused points are named.
const NAMED: usize = 8;

/// A point that no member, body or hold uses was drawn for something that is missing.
fn caution_unused<'t>(
    meant: &[Meant<'_, 't>],
    bodies: &[Body],
    holds: &[Hold],
    meaning: &mut Meaning<'_, 't>,
) {
    let written = &meaning.job.assembly.points;
    let mut used = vec![false; written.len()];
    let between = meant.iter().filter_map(|meant| meant.member.between);
    let between = between.flat_map(|between| [between.start, between.end]);
    let bodies = bodies.iter().flat_map(|body| body.points.iter().copied());
    let holds = holds.iter().flat_map(|hold| hold.points.iter().copied());
    for point in between.chain(bodies).chain(holds) {
        used[point] = true;
    }
    let unused = || (0..used.len()).filter(|&point| !used[point]);
    let Some(first) = unused().next() else {
        return;
    };
    let many = unused().count();
    let names: Vec<&str> = unused()
        .take(NAMED)
        .map(|point| written[point].name.value)
        .collect();
    let named = names.join("`, `");
    let more = match many.saturating_sub(NAMED) {
        0 => String::new(),
        more => format!(" and {more} more"),
    };
    let s = if many == 1 { "" } else { "s" };
    let first = &written[first].name;
    meaning.remarks.push(Remark {
        about: format!("point.{}", first.value),
        text: format!("no member, body or hold uses the point{s} `{named}`{more}"),
        place: Some(first.place.clone()),
        caution: true,
    });
}

/// A name with the word and the number of what has none of its own: `hold.2`.
fn name_or_number(
    written: &crate::job::written::Entry<&str>,
    word: &str,
    index: usize,
) -> crate::model::Name {
    match written.given() {
        Some(written) => name(written),
        None => format!("{word}.{}", index + 1).into(),
    }
}

impl<'t> Meaning<'_, 't> {
    /// The indices of points by their names, each once; `None` where one is at fault.
    fn points(
        &mut self,
        written: &[crate::job::written::Written<&'t str>],
        whose: &str,
    ) -> Option<Vec<usize>> {
        let mut points = Vec::with_capacity(written.len());
        for name in written {
            points.extend(self.find(super::names::Root::Point, name));
        }
        if points.len() != written.len() {
            return None;
        }
        let mut order: Vec<usize> = (0..points.len()).collect();
        order.sort_by_key(|&at| (points[at], at));
        let mut once = true;
        for two in order.windows(2) {
            if points[two[0]] == points[two[1]] {
                let again = &written[two[1]];
                let message = format!("the point `{}` stands twice in {whose}", again.value);
                self.r.problems.say(&again.place, message, "take one out");
                once = false;
            }
        }
        once.then_some(points)
    }

    /// Reports that weight acts where nothing says which way is up.
    fn needs_up(&mut self, message: String, place: &Place) {
        let help = "add `runs` to `[default]`, the direction in which x grows, or to a member between \
                    points, from its start to its end: \"up\", \"down\", \"level\" or an angle above \
                    level";
        self.r.problems.missing("runs", place, message, help);
    }
}
