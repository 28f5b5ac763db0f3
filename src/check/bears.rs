//! A stop or a joint that must have closed.

use super::{Case, Finding};
use crate::model::Target;
use crate::result::{Unit, Verdict};

pub(super) fn judge(case: &Case) -> Option<Finding> {
    let (bears, at) = match case.limit.target {
        Target::Support { member, support } => {
            let model = &case.model.members[member];
            let at = model.stations[model.supports[support].station].x;
            (case.member.supports[support].bears?, at)
        }
        Target::Segment { segment, .. } => {
            let joint = &case.member.segments[segment];
            (joint.bears?, joint.from)
        }
        _ => return None,
    };
    Some(Finding {
        at: Some(at.value),
        demand: f64::from(u8::from(bears)),
        limit: 1.0,
        unit: Unit::None,
        utilisation: None,
        status: if bears { Verdict::Pass } else { Verdict::Fail },
        details: serde_json::Map::new(),
    })
}
