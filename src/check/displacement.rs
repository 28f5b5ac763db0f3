//! Displacement of a station.

use super::{Case, Finding, moved};
use crate::model::{Bounds, Target};
use crate::quantity::Length;
use crate::result::Unit;

pub(super) fn judge(case: &Case, limit: &Bounds<Length>) -> Option<Finding> {
    let Target::Station { station, .. } = case.limit.target else {
        return None;
    };
    let before = case
        .since
        .map(|member| member.stations[station].displacement);
    let here = &case.member.stations[station];
    let demand = moved(here.displacement, before);
    Some(Finding::signed(
        demand,
        Some(here.x.value),
        limit,
        case.zero.length,
        Unit::Metre,
    ))
}
