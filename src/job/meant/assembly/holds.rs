//! What holds points.

use super::direction::{Basis, axis};
use super::name_or_number;
use crate::job::meant::Meaning;
use crate::job::written::Entry;
use crate::job::written::assembly::hold::{Hold as WrittenHold, Kind};
use crate::model::{Hold, HoldKind};
use std::collections::HashMap;

/// The holds in the order of the file; `None` for one that is at fault.
pub(super) fn holds<'t>(meaning: &mut Meaning<'_, 't>) -> Vec<Option<Hold>> {
    let written = &meaning.job.assembly.holds;
    let holds: Vec<Option<Hold>> = written
        .iter()
        .enumerate()
        .map(|(index, written)| hold(index, written, meaning))
        .collect();
    held_once(&holds, meaning);
    holds
}

fn hold<'t>(
    index: usize,
    written: &WrittenHold<'t>,
    meaning: &mut Meaning<'_, 't>,
) -> Option<Hold> {
    let points = written.points.given();
    let points = points.and_then(|points| meaning.points(&points.value, "this hold"));
    let along = match &written.along {
        Entry::Wrong => None,
        Entry::Absent => meaning
            .space
            .coordinates
            .map(|all| (0..all).map(axis).collect()),
        Entry::Given(along) => meaning.directions(&along.value),
    };
    let (points, along) = (points?, along?);
    let kind = match written.kind? {
        Kind::Fixed => HoldKind::Fixed { along },
        Kind::Spring(stiffness) => HoldKind::Spring { along, stiffness },
        Kind::Stop {
            clearance,
            stiffness,
        } => HoldKind::Stop {
            blocks: *along.first()?,
            clearance,
            stiffness,
        },
    };
    (!written.name.is_wrong()).then(|| Hold {
        name: name_or_number(&written.name, "hold", index),
        place: written.place.clone(),
        points,
        kind,
    })
}

/// Reports a point that two fixed holds hold in one direction: nothing decides what each of them
/// answers.
fn held_once(holds: &[Option<Hold>], meaning: &mut Meaning<'_, '_>) {
    let mut held: HashMap<usize, (Basis, usize)> = HashMap::new();
    for (index, hold) in holds.iter().enumerate() {
        let Some(Hold {
            points,
            kind: HoldKind::Fixed { along },
            ..
        }) = hold
        else {
            continue;
        };
        for (at, &point) in points.iter().enumerate() {
            let (basis, first) = held
                .entry(point)
                .or_insert_with(|| (Basis::default(), index));
            let mut adds = true;
            for direction in along {
                adds &= basis.add(direction);
            }
            if adds {
                continue;
            }
            let written = &meaning.job.assembly.holds;
            let line = meaning.line(written[*first].place.start);
            let Some(name) = written[index]
                .points
                .given()
                .and_then(|all| all.value.get(at))
            else {
                continue;
            };
            let message = format!(
                "the point `{}` is held twice in one direction, first in line {line}",
                name.value
            );
            let help = "keep one of the two, or say with `along` in which direction each holds";
            meaning.r.problems.say(&name.place, message, help);
        }
    }
}
