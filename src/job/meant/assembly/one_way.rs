//! What a member that carries one way alone may not have.

use crate::job::meant::Meaning;
use crate::job::meant::members::Whole;
use crate::job::meant::outline::Outline;
use crate::job::written::load::{Action, Load};

/// Reports a gap in a one-way member: both say that it parts.
pub(in crate::job::meant) fn has_no_gaps(
    whole: &Whole<'_, '_>,
    outline: &Outline<'_, '_>,
    meaning: &mut Meaning<'_, '_>,
) {
    if whole.carries.given().is_none() {
        return;
    }
    for (index, segment) in outline.segments.iter().enumerate() {
        if outline.is_gap(index) {
            let message = format!(
                "the gap `{}` stands in a member with `carries`, which parts as a whole",
                outline.names.names()[index]
            );
            let help = "keep one of the two: `carries`, or the gap";
            meaning.r.problems.say(&segment.place, message, help);
        }
    }
}

/// Whether a member between points takes a load; reports one that it does not.
pub(in crate::job::meant) fn takes(
    whole: &Whole<'_, '_>,
    load: &Load<'_>,
    action: &Action<'_>,
    meaning: &mut Meaning<'_, '_>,
) -> bool {
    let problems = &mut meaning.r.problems;
    let key = match action {
        Action::Force(_) => "force",
        Action::Down(_) => "down",
        Action::Line(_) => "line",
        Action::LineDown(_) => "line-down",
        Action::Movement(_) if whole.between.is_written() => {
            let message = "a member between points has no support that could be moved";
            let help = "write a load of the job, `[[load]]` with `hold` and `movement`";
            problems.say(&load.place, message, help);
            return false;
        }
        _ => return true,
    };
    if whole.carries.given().is_none() {
        return true;
    }
    let message = format!("no `{key}` acts on a member with `carries`, which may be slack");
    let help = "put it on a point, with `[[load]]` of the job; a member that carries both ways takes \
                it too";
    problems.say(&load.place, message, help);
    false
}
