//! Change of length of a member or a segment.

use super::{Case, Finding, moved};
use crate::model::{Bounds, Target};
use crate::quantity::Length;
use crate::result::{MemberResult, Unit};

pub(super) fn judge(case: &Case, limit: &Bounds<Length>) -> Option<Finding> {
    let of = |member: &MemberResult| match case.limit.target {
        Target::Member { .. } => Some(member.elongation),
        Target::Segment { segment, .. } => Some(member.segments[segment].elongation),
        _ => None,
    };
    let demand = moved(of(case.member)?, case.since.and_then(of));
    Some(Finding::signed(
        demand,
        None,
        limit,
        case.zero.length,
        Unit::Metre,
    ))
}
