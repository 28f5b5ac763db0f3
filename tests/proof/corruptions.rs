//! What may be wrong with a finished result of an assembly: a number off by one part in a million, a
//! state turned over.

use lengthwise::quantity::{Force, Length};
use lengthwise::result::{CombinationResult, MemberResult, MemberState, Rotation, SegmentResult};

/// One part in a million.
pub(crate) const PART: f64 = 1.0 + 1e-6;

pub(crate) type Corruption = (&'static str, fn(&mut CombinationResult) -> bool);

/// Changes the largest by size of some numbers; false where all are 0.
fn largest<'r>(numbers: impl Iterator<Item = &'r mut f64>) -> bool {
    match numbers.max_by(|a, b| a.abs().total_cmp(&b.abs())) {
        Some(number) if *number != 0.0 => {
            *number *= PART;
            true
        }
        _ => false,
    }
}

fn length(of: &mut Length) -> &mut f64 {
    &mut of.value
}

fn force(of: &mut Force) -> &mut f64 {
    &mut of.value
}

fn angles(of: &mut Rotation) -> Vec<&mut f64> {
    match of {
        Rotation::InPlane(angle) => vec![&mut angle.value],
        Rotation::Spatial(angles) => angles.iter_mut().map(|angle| &mut angle.value).collect(),
    }
}

fn members(r: &mut CombinationResult) -> impl Iterator<Item = &mut MemberResult> {
    r.members.iter_mut()
}

fn segments(r: &mut CombinationResult) -> impl Iterator<Item = &mut SegmentResult> {
    members(r).flat_map(|m| &mut m.segments)
}

pub(crate) const CORRUPTIONS: [Corruption; 17] = [
    ("movement of a point", |r| {
        largest(
            r.points
                .iter_mut()
                .flat_map(|p| &mut p.displacement)
                .map(length),
        )
    }),
    ("movement of a body", |r| {
        largest(
            r.bodies
                .iter_mut()
                .flat_map(|b| &mut b.displacement)
                .map(length),
        )
    }),
    ("rotation of a body", |r| {
        largest(r.bodies.iter_mut().flat_map(|b| angles(&mut b.rotation)))
    }),
    ("reaction of a hold", |r| {
        let reactions = r.holds.iter_mut().filter_map(|h| h.reaction.as_mut());
        largest(reactions.flatten().map(force))
    }),
    ("reaction of a point", |r| {
        let reactions = r.points.iter_mut().filter_map(|p| p.reaction.as_mut());
        largest(reactions.flatten().map(force))
    }),
    ("gap of a hold", |r| {
        largest(
            r.holds
                .iter_mut()
                .filter_map(|h| h.gap.as_mut())
                .map(length),
        )
    }),
    ("total applied", |r| {
        largest(r.totals.iter_mut().flat_map(|t| &mut t.applied).map(force))
    }),
    ("total of reactions", |r| {
        largest(
            r.totals
                .iter_mut()
                .flat_map(|t| &mut t.reactions)
                .map(force),
        )
    }),
    ("force in a member", |r| {
        let stations = members(r).flat_map(|m| &mut m.stations);
        largest(stations.filter_map(|s| s.force_after.as_mut()).map(force))
    }),
    ("largest force of a member", |r| {
        largest(members(r).flat_map(|m| [&mut m.force_max.value, &mut m.force_min.value]))
    }),
    ("force of a segment", |r| {
        largest(segments(r).flat_map(|s| [&mut s.force_start.value, &mut s.force_end.value]))
    }),
    ("displacement of a station", |r| {
        let stations = members(r).flat_map(|m| &mut m.stations);
        largest(stations.map(|s| &mut s.displacement.value))
    }),
    ("elongation", |r| {
        largest(members(r).map(|m| &mut m.elongation.value))
    }),
    ("elongation from force", |r| {
        largest(segments(r).map(|s| &mut s.elongation_force.value))
    }),
    ("elongation from temperature", |r| {
        largest(segments(r).map(|s| &mut s.elongation_temperature.value))
    }),
    ("elongation from misfit", |r| {
        largest(segments(r).map(|s| &mut s.elongation_misfit.value))
    }),
    ("distance from being taut", |r| {
        largest(members(r).filter_map(|m| m.slack_by.as_mut()).map(length))
    }),
];

/// The result with each of its decided states turned over in turn, and what was turned. A state is
/// decided where a force or a gap says so.
pub(crate) fn turned(result: &CombinationResult) -> Vec<(String, CombinationResult)> {
    let mut all = Vec::new();
    let mut turn = |what: String, change: &dyn Fn(&mut CombinationResult)| {
        let mut turned = result.clone();
        change(&mut turned);
        all.push((what, turned));
    };
    let largest_force = result
        .members
        .iter()
        .map(|m| m.force_max.value.abs().max(m.force_min.value.abs()))
        .chain(result.holds.iter().flat_map(|h| {
            let reaction = h.reaction.iter().flatten();
            reaction.map(|r| r.value.abs())
        }))
        .fold(0.0, f64::max);
    let clear = |force: f64, gap: f64| force.abs() > 1e-6 * largest_force || gap.abs() > 1e-8;
    for (index, hold) in result.holds.iter().enumerate() {
        let (Some(bears), Some(gap)) = (hold.bears, hold.gap) else {
            continue;
        };
        let force = hold.reaction.iter().flatten().map(|r| r.value.abs()).sum();
        if clear(force, gap.value) {
            turn(format!("hold {}", hold.name), &|r| {
                r.holds[index].bears = Some(!bears);
            });
        }
    }
    for (index, member) in result.members.iter().enumerate() {
        for (at, segment) in member.segments.iter().enumerate() {
            let (Some(bears), Some(gap)) = (segment.bears, segment.gap) else {
                continue;
            };
            if clear(segment.force_start.value, gap.value) {
                turn(format!("gap {}.{}", member.name, segment.name), &|r| {
                    r.members[index].segments[at].bears = Some(!bears);
                });
            }
        }
        for state in [MemberState::Taut, MemberState::Bearing, MemberState::Slack] {
            let loose = member.slack_by.unwrap_or_default();
            if state != member.state && clear(member.force_max.value, loose.value) {
                turn(format!("{} to {state:?}", member.name), &|r| {
                    let member = &mut r.members[index];
                    member.state = state;
                    member.slack_by = match state {
                        MemberState::Slack => Some(Length::default()),
                        _ => None,
                    };
                });
            }
        }
    }
    all
}
