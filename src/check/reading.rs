//! What watches read in a finished result.

use crate::model::{Combination, Model, Watched};
use crate::quantity::Length;
use crate::result::{CombinationResult, Unit, WatchResult};

/// A movement or a rotation (m, rad) along x, y, z; of a station along its member's axis, as the
/// first entry alone.
pub(super) type Moved = [f64; 3];

/// What every watch of the model reads in a solved combination, in the order of the file.
pub fn watches(
    model: &Model,
    combination: &Combination,
    result: &CombinationResult,
) -> Vec<WatchResult> {
    let read = |watch: &crate::model::Watch| WatchResult {
        name: watch.name.clone(),
        value: moved(combination, result, &watch.of).map(|moved| value(&watch.of, moved)),
        unit: if watch.of.is_rotation() {
            Unit::Radian
        } else {
            Unit::Metre
        },
    };
    model.watches.iter().map(read).collect()
}

/// How what is watched moves, before a direction or a size is taken of it; nothing where a member
/// that it needs is taken out.
pub(super) fn moved(
    combination: &Combination,
    result: &CombinationResult,
    of: &Watched,
) -> Option<Moved> {
    match *of {
        Watched::Point {
            point, relative_to, ..
        } => {
            let of = |point: usize| Some(spatial(&result.points.get(point)?.displacement));
            difference(of(point)?, relative_to.map(of))
        }
        Watched::Rotation { body, .. } => {
            let body = result.bodies.get(body)?;
            Some(body.rotation.spatial().map(|angle| angle.value))
        }
        Watched::Station { at, relative_to } => {
            let of = |(member, station): (usize, usize)| {
                let member = result.members.get(combination.position(member)?)?;
                let station = member.stations.get(station)?;
                Some([station.displacement.value, 0.0, 0.0])
            };
            difference(of(at)?, relative_to.map(of))
        }
    }
}

/// The reading of a movement: its part in the direction of the watch, or its size.
pub(super) fn value(of: &Watched, moved: Moved) -> f64 {
    let direction = match of {
        Watched::Point { along, .. } => along,
        Watched::Rotation { about, .. } => about,
        Watched::Station { .. } => return moved[0],
    };
    match direction {
        Some(direction) => moved.iter().zip(direction).map(|(m, d)| m * d).sum(),
        None => moved.iter().map(|m| m * m).sum::<f64>().sqrt(),
    }
}

/// One movement less another, if there is another to take off.
fn difference(moved: Moved, less: Option<Option<Moved>>) -> Option<Moved> {
    match less {
        None => Some(moved),
        Some(less) => {
            let less = less?;
            Some(std::array::from_fn(|axis| moved[axis] - less[axis]))
        }
    }
}

/// Three entries of what has one for each coordinate.
fn spatial(movement: &[Length]) -> Moved {
    std::array::from_fn(|axis| movement.get(axis).map_or(0.0, |along| along.value))
}
