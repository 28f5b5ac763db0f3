//! A stop or a joint that must have closed.

use super::{Case, Finding};
use crate::model::Target;

pub(super) fn judge(case: &Case) -> Option<Finding> {
    let (bears, at) = match case.limit.target {
        Target::Support { member, .. } => {
            let (support, result) = case.support()?;
            let at = case.model.members[member].stations[support.station].x;
            (result.bears?, Some(at))
        }
        Target::Segment { segment, .. } => {
            let joint = &case.member()?.0.segments[segment];
            (joint.bears?, Some(joint.from))
        }
        Target::Hold { .. } => (case.hold()?.1.bears?, None),
        _ => return None,
    };
    Some(Finding::yes_or_no(bears, at.map(|at| at.value)))
}
