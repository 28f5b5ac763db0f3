//! Tapers that run to a point: only at a free end, where nothing needs stress or stiffness.

use super::Meaning;
use crate::model::{Member, Segment};
use crate::quantity::{Area, Curve};

/// Reports each segment that runs to a point where it must carry something.
pub(super) fn points(member: &Member, meaning: &mut Meaning<'_, '_>) {
    let last = member.segments.len() - 1;
    for (index, segment) in member.segments.iter().enumerate() {
        let Some(area) = total_area(segment) else {
            continue;
        };
        for (end, value) in [("start", area.start()), ("end", area.end())] {
            if value > Area::default() {
                continue;
            }
            let (is_free, station) = if end == "start" {
                (index == 0, 0)
            } else {
                (index == last, member.stations.len() - 1)
            };
            let why = if !is_free {
                Some("where the member goes on")
            } else {
                needed_at(member, station, &area, end)
            };
            if let Some(why) = why {
                let message = format!(
                    "the segment `{}` runs to a point at its {end}, {why}",
                    segment.name
                );
                let help = "give it some size there; only a free end without a load may be a point";
                meaning.r.problems.say(&segment.place, message, help);
            }
        }
    }
}

/// Area of all layers along a segment.
fn total_area(segment: &Segment) -> Option<Curve<Area>> {
    let mut layers = segment.layers().iter().map(|layer| layer.area);
    let first = layers.next()?;
    Some(layers.fold(first, |sum, area| sum + area))
}

/// What needs stress or stiffness at the end of a member that is a point.
fn needed_at(
    member: &Member,
    station: usize,
    area: &Curve<Area>,
    end: &str,
) -> Option<&'static str> {
    if member
        .supports
        .iter()
        .any(|support| support.station == station)
    {
        return Some("where a support stands");
    }
    if member.between.is_some() {
        return Some("where it meets the point that holds it");
    }
    let actions = &member.actions;
    let none = crate::quantity::Force::default();
    if actions
        .forces
        .iter()
        .any(|load| load.station == station && load.force != none)
    {
        return Some("where a force acts");
    }
    // Near the point a line load makes N grow with the distance; an area that grows with its
    // square (a cone) would have no finite stress, one that grows with it (a wedge) does.
    let coefficients = area.coefficients();
    let second = match end {
        "start" => coefficients.get(1),
        _ => coefficients
            .len()
            .checked_sub(2)
            .map(|at| &coefficients[at]),
    };
    let is_cone = second.is_none_or(|second| *second <= Area::default());
    let piece = if end == "start" {
        0
    } else {
        member.pieces.len() - 1
    };
    let none = crate::quantity::ForcePerLength::default();
    let loaded = actions.lines.iter().any(|line| {
        let there = if end == "start" { line.start } else { line.end };
        line.piece == piece && there != none
    });
    (is_cone && loaded).then_some("where a line load acts")
}
