//! Change of length of a member or a segment.

use super::{Case, Finding};
use crate::model::{Bounds, Target};
use crate::quantity::Length;
use crate::result::Unit;

pub(super) fn judge(case: &Case, limit: &Bounds<Length>) -> Option<Finding> {
    let (_, zero) = case.member()?;
    let demand = case.moved(|member| match case.limit.target {
        Target::Member { .. } => Some(member.elongation),
        Target::Segment { segment, .. } => Some(member.segments[segment].elongation),
        _ => None,
    })?;
    Some(Finding::signed(
        demand,
        None,
        limit,
        zero.length,
        Unit::Metre,
    ))
}
