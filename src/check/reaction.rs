//! Reaction of a support.

use super::{Case, Finding};
use crate::model::{Bounds, Target};
use crate::quantity::Force;
use crate::result::Unit;

pub(super) fn judge(case: &Case, limit: &Bounds<Force>) -> Option<Finding> {
    let Target::Support { member, support } = case.limit.target else {
        return None;
    };
    let reaction = case.member.supports[support].reaction?;
    let member = &case.model.members[member];
    let at = member.stations[member.supports[support].station].x.value;
    Some(Finding::signed(
        reaction,
        Some(at),
        limit,
        case.zero.force,
        Unit::Newton,
    ))
}
