//! What must stay open at a stop or a joint, and not more.

use super::{Case, Finding, ROUNDING};
use crate::model::{SegmentKind, Target};
use crate::quantity::Length;
use crate::result::{Unit, Verdict};

pub(super) fn judge(case: &Case, min: Option<Length>, max: Option<Length>) -> Option<Finding> {
    let (gap, drawn, at, zero) = match case.limit.target {
        Target::Support { member, .. } => {
            let (support, result) = case.support()?;
            let (_, zero) = case.member()?;
            let at = case.model.members[member].stations[support.station].x;
            (result.gap?, case.clearance()?, Some(at), zero)
        }
        Target::Hold { .. } => {
            let (_, result) = case.hold()?;
            (result.gap?, case.clearance()?, None, case.now.assembly)
        }
        Target::Segment { member, segment } => {
            let model = &case.model.members[member].segments[segment];
            let SegmentKind::Gap(gap) = model.kind else {
                return None;
            };
            let (member, zero) = case.member()?;
            let remains = member.segments[segment].gap?;
            (remains, gap.width, Some(model.from), zero)
        }
        _ => return None,
    };
    let finding = |limit: Length, utilisation, holds| Finding {
        at: at.map(|at| at.value),
        demand: gap.value,
        limit: limit.value,
        unit: Unit::Metre,
        utilisation,
        status: if holds { Verdict::Pass } else { Verdict::Fail },
        details: details(drawn, min, max),
    };
    let zero = zero.length;
    let least = min.map(|min| {
        // Used over available: what has closed of what may close.
        let (used, available) = (drawn - gap, drawn - min);
        let ratio = if available <= Length::default() {
            None
        } else {
            Some((used / available).value.max(0.0))
        };
        finding(min, ratio, gap >= min - zero)
    });
    let most = max.map(|max| {
        let ratio = if max > Length::default() {
            Some((gap / max).value)
        } else {
            (gap <= zero).then_some(0.0)
        };
        finding(max, ratio, gap <= max * (1.0 + ROUNDING) + zero)
    });
    match (least, most) {
        (Some(least), Some(most)) => Some(least.worse(most)),
        (least, most) => least.or(most),
    }
}

/// What the ratio was made of.
fn details(
    drawn: Length,
    min: Option<Length>,
    max: Option<Length>,
) -> serde_json::Map<String, serde_json::Value> {
    let mut details = serde_json::Map::new();
    let mut add = |name: &str, value: Length| details.insert(name.to_string(), value.value.into());
    add("drawn", drawn);
    for (name, value) in [("min", min), ("max", max)] {
        if let Some(value) = value {
            add(name, value);
        }
    }
    details
}
