//! Axial force anywhere in a member or a segment, against a rated load.

use super::{Case, Finding};
use crate::model::{Bounds, Target};
use crate::quantity::Force;
use crate::result::Unit;

pub(super) fn judge(case: &Case, limit: &Bounds<Force>) -> Option<Finding> {
    let (member, zero) = case.member()?;
    let ((most, most_at), (least, least_at)) = match case.limit.target {
        Target::Member { .. } => (
            (member.force_max, member.force_max_at),
            (member.force_min, member.force_min_at),
        ),
        Target::Segment { segment, .. } => {
            let s = &member.segments[segment];
            ((s.force_max, s.force_max_at), (s.force_min, s.force_min_at))
        }
        _ => return None,
    };
    let side = |force, at: crate::quantity::Length| {
        Finding::signed(force, Some(at.value), limit, zero.force, Unit::Newton)
    };
    // The larger size first: of two with equal utilisation that is the one to show.
    let (first, second) = if least.abs() > most.abs() {
        (side(least, least_at), side(most, most_at))
    } else {
        (side(most, most_at), side(least, least_at))
    };
    Some(first.worse(second))
}
