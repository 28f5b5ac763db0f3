//! A one-way member that must carry.

use super::{Case, Finding};
use crate::result::MemberState;

/// Fails where the member is slack, which an exact touch (N = 0) is too.
pub(super) fn judge(case: &Case) -> Option<Finding> {
    let (member, _) = case.member()?;
    let carries = member.state != MemberState::Slack;
    Some(Finding::yes_or_no(carries, None))
}
