//! Cautions where displacements are not small any more.

use super::Observed;
use super::caution::{Look, Solved};
use crate::model::{Assembly, Between, Model, Place, Remark};
use crate::quantity::{Angle, Length, Measure, Style, from_si};
use std::array;

/// A movement of this share of the length concerned, or a turn by this angle (rad), is no small
/// displacement any more.
const LARGE: f64 = 1.0 / 50.0;

/// The movement of a single member; the stretch and the turn of one between points, whose points
/// may travel far without harm.
pub(super) fn member(look: &Look) -> Vec<Remark> {
    match &look.member.between {
        None => moved(look, |solved| {
            let stations = solved.member.stations.iter();
            let moved = stations.map(|station| station.displacement.abs());
            moved.fold(solved.member.elongation.abs(), Length::max)
        })
        .into_iter()
        .collect(),
        Some(between) => {
            let stretched = moved(look, |solved| solved.member.elongation.abs());
            stretched.into_iter().chain(turned(look, between)).collect()
        }
    }
}

fn moved(look: &Look, movement: impl Fn(&Solved) -> Length) -> Option<Remark> {
    let large = look.member.length() * LARGE;
    let (moved, combination) = look.worst(|_, solved| {
        let moved = movement(solved);
        (moved > large).then_some(moved)
    })?;
    let moved = shown(look.style, moved);
    look.caution(
        format!("movement of {moved} in `{combination}` is over 1/50 of the length: the computation is for small displacements"),
        None,
    )
}

/// The angle by which a member between points turns: the movement of its end against its start
/// across its axis, over its length.
fn turned(look: &Look, between: &Between) -> Option<Remark> {
    let length = look.member.length();
    let ((angle, across), combination) = look.worst(|seen, _| {
        let points = &seen.result.points;
        let (start, end) = (points.get(between.start)?, points.get(between.end)?);
        let apart = difference(&end.displacement, &start.displacement);
        let along: Length = (0..3)
            .map(|axis| apart[axis] * between.direction[axis])
            .sum();
        let across = size(array::from_fn(|axis| {
            apart[axis] - along * between.direction[axis]
        }));
        let angle: Angle = from_si((across / length).value);
        (angle.value > LARGE).then_some((angle, across))
    })?;
    look.caution(
        format!(
            "it turns by {} in `{combination}` ({} across its axis over its length), over 1/50 rad: the computation is for small displacements",
            shown(look.style, angle),
            shown(look.style, across),
        ),
        None,
    )
}

/// Bodies that turn far, and the point that moves furthest beside the size of the whole.
pub(super) fn assembly(model: &Model, observed: &[Observed], style: Style) -> Vec<Remark> {
    let Some(assembly) = &model.assembly else {
        return Vec::new();
    };
    let caution = |about: String, text: String, place: &Place| Remark {
        about,
        text: format!("{text}: the computation is for small displacements"),
        place: Some(place.clone()),
        caution: true,
    };
    let mut remarks = Vec::new();
    for (at, body) in assembly.bodies.iter().enumerate() {
        let turn = |seen: &Observed| {
            let turn = size(seen.result.bodies.get(at)?.rotation.spatial());
            (turn.value > LARGE).then_some(turn)
        };
        if let Some((turn, combination)) = worst(observed, turn) {
            remarks.push(caution(
                format!("body.{}", body.name),
                format!(
                    "it turns by {} in `{combination}`, over 1/50 rad",
                    shown(style, turn)
                ),
                &body.place,
            ));
        }
    }
    let extent = extent(assembly);
    let far = |seen: &Observed| {
        let moved = |(at, point): (usize, &crate::result::PointResult)| {
            (size(difference(&point.displacement, &[])), at)
        };
        let points = seen.result.points.iter().enumerate().map(moved);
        let furthest = points.reduce(|far, next| if next.0 > far.0 { next } else { far })?;
        (furthest.0 > extent * LARGE && extent > Length::default()).then_some(furthest)
    };
    if let Some(((moved, at), combination)) = worst(observed, far) {
        let point = &assembly.points[at];
        remarks.push(caution(
            format!("point.{}", point.name),
            format!(
                "it moves by {} in `{combination}`, over 1/50 of the {} from end to end of the points",
                shown(style, moved),
                shown(style, extent),
            ),
            &point.place,
        ));
    }
    remarks
}

/// The worst by `of` over all combinations, with the name of the combination.
fn worst<'a, T: PartialOrd>(
    observed: &'a [Observed],
    of: impl Fn(&Observed) -> Option<T>,
) -> Option<(T, &'a str)> {
    let found = observed
        .iter()
        .filter_map(|seen| Some((of(seen)?, &*seen.result.name)));
    found.reduce(|worst, next| if next.0 > worst.0 { next } else { worst })
}

/// The diagonal of the box around all points.
fn extent(assembly: &Assembly) -> Length {
    size(array::from_fn(|axis| {
        let along = || assembly.points.iter().map(|point| point.at[axis]);
        let most = along().reduce(Length::max).unwrap_or_default();
        let least = along().reduce(Length::min).unwrap_or_default();
        most - least
    }))
}

/// One movement less another; a coordinate that a job does not have is 0.
fn difference(movement: &[Length], less: &[Length]) -> [Length; 3] {
    let of = |list: &[Length], axis: usize| list.get(axis).copied().unwrap_or_default();
    array::from_fn(|axis| of(movement, axis) - of(less, axis))
}

fn size<Q: Measure>(parts: [Q; 3]) -> Q {
    let squares = parts.map(|part| part.si() * part.si());
    Q::from_si(squares.iter().sum::<f64>().sqrt())
}

fn shown<Q: Measure>(style: Style, quantity: Q) -> String {
    style.quantity(Q::DIMENSION, quantity.si())
}
