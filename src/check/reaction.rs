//! Reaction of a support or of a hold.

use super::{Case, Finding};
use crate::model::{Bounds, Target};
use crate::quantity::{Force, from_si};
use crate::result::Unit;

pub(super) fn judge(case: &Case, limit: &Bounds<Force>) -> Option<Finding> {
    let (reaction, at, zero) = match case.limit.target {
        Target::Support { member, .. } => {
            let (support, result) = case.support()?;
            let (_, zero) = case.member()?;
            let at = case.model.members[member].stations[support.station].x;
            (result.reaction?, Some(at.value), zero)
        }
        Target::Hold { .. } => (of_hold(case)?, None, case.now.assembly),
        _ => return None,
    };
    Some(Finding::signed(
        reaction,
        at,
        limit,
        zero.force,
        Unit::Newton,
    ))
}

/// Along the hold's direction with its sign; where it has several, the size of the force.
fn of_hold(case: &Case) -> Option<Force> {
    let (hold, result) = case.hold()?;
    let reaction = result.reaction.as_deref()?;
    Some(match hold.kind.directions() {
        [only] => {
            let parts = reaction.iter().zip(only);
            parts.map(|(&force, share)| force * *share).sum()
        }
        _ => {
            let squares = reaction.iter().map(|force| force.value * force.value);
            from_si(squares.sum::<f64>().sqrt())
        }
    })
}
