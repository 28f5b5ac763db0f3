//! A watched movement or rotation.

use super::reading::{moved, value};
use super::{Case, Finding, Observed};
use crate::model::{Assembly, Bounds, Target, Watched};
use crate::result::Unit;
use uom::si::{Dimension, Quantity, SI};

/// `unit` is that of the limit's quantity. Counted from another combination, the movements are
/// subtracted before a size is taken of what remains.
pub(super) fn judge<D: Dimension + ?Sized>(
    case: &Case,
    limit: &Bounds<Quantity<D, SI<f64>, f64>>,
    unit: Unit,
) -> Option<Finding> {
    let Target::Watch { watch } = case.limit.target else {
        return None;
    };
    let of = &case.model.watches[watch].of;
    let read = |seen: &Observed| {
        let combination = &case.model.combinations[seen.index];
        moved(combination, seen.result, of)
    };
    let now = read(&case.now)?;
    let demand = match &case.since {
        None => now,
        Some(since) => {
            let before = read(since)?;
            std::array::from_fn(|axis| now[axis] - before[axis])
        }
    };
    let demand = crate::quantity::from_si(value(of, demand));
    let zero = crate::quantity::from_si(zero(case, of));
    Some(Finding::signed(demand, None, limit, zero, unit))
}

/// What counts as no movement (m) or no rotation (rad).
fn zero(case: &Case, of: &Watched) -> f64 {
    let length = case.now.assembly.length.value;
    match *of {
        Watched::Point { .. } => length,
        Watched::Rotation { body, .. } => {
            let assembly = case.model.assembly.as_ref();
            let reach = assembly.map_or(0.0, |assembly| reach(assembly, body));
            // A body of one point cannot be seen to turn.
            if reach > 0.0 { length / reach } else { 0.0 }
        }
        Watched::Station { at, relative_to } => {
            let stations = [Some(at), relative_to].into_iter().flatten();
            let zero = |(member, _)| Some(case.now.member(case.model, member)?.1.length.value);
            stations.filter_map(zero).fold(0.0, f64::max)
        }
    }
}

/// How far a body reaches from its first point (m).
fn reach(assembly: &Assembly, body: usize) -> f64 {
    let points = &assembly.bodies[body].points;
    let at = |point: usize| assembly.points[point].at.map(|along| along.value);
    let first = at(points[0]);
    let distance = |&point: &usize| {
        let parts = at(point).into_iter().zip(first).map(|(p, f)| p - f);
        parts.map(|part| part * part).sum::<f64>().sqrt()
    };
    points.iter().map(distance).fold(0.0, f64::max)
}
