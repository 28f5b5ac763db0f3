//! What is watched.

use super::direction::axis;
use super::name_or_number;
use crate::job::meant::Meaning;
use crate::job::meant::members::Meant;
use crate::job::meant::names::Root;
use crate::job::written::assembly::direction::Direction;
use crate::job::written::assembly::watch::{Of, StationOf};
use crate::job::written::station::Station;
use crate::job::written::{Entry, Job, Written};
use crate::model::{Spatial, Watch, Watched};
use std::collections::HashMap;

/// The stations that are watched, by the name of their member: it is cut there.
pub(in crate::job::meant) type Stations<'w, 't> = HashMap<&'t str, Vec<&'w Entry<Station<'t>>>>;

/// The stations that a job's watches name.
pub(in crate::job::meant) fn stations<'w, 't>(job: &'w Job<'t>) -> Stations<'w, 't> {
    let mut stations = Stations::new();
    for watch in &job.assembly.watches {
        let Some(Of::Station { at, relative_to }) = &watch.of else {
            continue;
        };
        for one in [Some(at), relative_to.as_ref()].into_iter().flatten() {
            let of_member = stations.entry(one.member.value).or_default();
            of_member.push(&one.station);
        }
    }
    stations
}

/// The watches in the order of the file; `None` for one that is at fault.
pub(in crate::job::meant) fn watches<'t>(
    meant: &[Meant<'_, 't>],
    meaning: &mut Meaning<'_, 't>,
) -> Vec<Option<Watch>> {
    let written = &meaning.job.assembly.watches;
    written
        .iter()
        .enumerate()
        .map(|(index, written)| {
            let of = watched(written.of.as_ref()?, meant, meaning)?;
            (!written.name.is_wrong()).then(|| Watch {
                name: name_or_number(&written.name, "watch", index),
                place: written.place.clone(),
                of,
            })
        })
        .collect()
}

fn watched<'t>(
    of: &Of<'t>,
    meant: &[Meant<'_, 't>],
    meaning: &mut Meaning<'_, 't>,
) -> Option<Watched> {
    match of {
        Of::Point {
            point,
            relative_to,
            along,
        } => {
            let point = meaning.find(Root::Point, point);
            let relative_to = optional(relative_to.as_ref(), |other| {
                meaning.find(Root::Point, other)
            });
            let along = optional(along.as_ref(), |along| meaning.direction(along));
            Some(Watched::Point {
                point: point?,
                relative_to: relative_to?,
                along: along?,
            })
        }
        Of::Rotation { body, about } => {
            let found = meaning.find(Root::Body, body);
            let about = about_which(about.as_ref(), &body.place, meaning);
            Some(Watched::Rotation {
                body: found?,
                about: about?,
            })
        }
        Of::Station { at, relative_to } => {
            let at = station(at, meant, meaning);
            let relative_to =
                optional(relative_to.as_ref(), |other| station(other, meant, meaning));
            Some(Watched::Station {
                at: at?,
                relative_to: relative_to?,
            })
        }
    }
}

/// What is made of something that may be left out; `None` where it is at fault.
fn optional<T, U>(written: Option<T>, make: impl FnOnce(T) -> Option<U>) -> Option<Option<U>> {
    match written {
        None => Some(None),
        Some(written) => make(written).map(Some),
    }
}

/// The axis of a rotation: in two coordinates z, in three the one that is written, if any.
fn about_which(
    about: Option<&Written<Direction>>,
    body: &crate::model::Place,
    meaning: &mut Meaning<'_, '_>,
) -> Option<Option<Spatial<f64>>> {
    match (meaning.space.coordinates?, about) {
        (1, _) => {
            let message = "in one coordinate no body turns, so nothing is there to watch";
            let help = "watch one of its points, or give the points two coordinates";
            meaning.r.problems.say(body, message, help);
            None
        }
        (2, None) => Some(Some(axis(2))),
        (2, Some(about)) => match about.value {
            Direction::Axis { axis: 2, negative } => {
                let sign = if negative == Some(true) { -1.0 } else { 1.0 };
                Some(Some([0.0, 0.0, sign]))
            }
            _ => {
                let message = "in two coordinates a body turns about z alone";
                meaning
                    .r
                    .problems
                    .say(&about.place, message, "leave `about` out");
                None
            }
        },
        (_, about) => optional(about, |about| meaning.direction(about)),
    }
}

fn station<'t>(
    written: &StationOf<'t>,
    meant: &[Meant<'_, 't>],
    meaning: &mut Meaning<'_, 't>,
) -> Option<(usize, usize)> {
    let member = meaning.find(Root::Member, &written.member)?;
    // Of members with faults some may be left out, so that their numbers differ.
    let meant = meant.get(member)?;
    if meant.whole.name.value != written.member.value {
        return None;
    }
    let station = meant.outline.find(&written.station.given()?.value)?;
    Some((member, station))
}
