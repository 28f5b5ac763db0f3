//! Displacement of a station.

use super::{Case, Finding};
use crate::model::{Bounds, Target};
use crate::quantity::Length;
use crate::result::Unit;

pub(super) fn judge(case: &Case, limit: &Bounds<Length>) -> Option<Finding> {
    let Target::Station { station, .. } = case.limit.target else {
        return None;
    };
    let (member, zero) = case.member()?;
    let demand = case.moved(|member| Some(member.stations[station].displacement))?;
    let at = member.stations[station].x.value;
    Some(Finding::signed(
        demand,
        Some(at),
        limit,
        zero.length,
        Unit::Metre,
    ))
}
