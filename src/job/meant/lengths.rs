//! Lengths of a member's segments against the distance between its points.

use super::Meaning;
use super::assembly::Span;
use super::members::Whole;
use crate::job::written::segment::{Extent, Segment as WrittenSegment};

/// The lengths of a member between points add up to their distance within this share of it.
const SAME: f64 = 1e-9;

/// What is left for the segment whose length is `rest`. Reports one that cannot be told, and
/// lengths that miss the distance.
pub(super) fn rest<'t>(
    whole: &Whole<'_, 't>,
    segments: &[WrittenSegment<'t>],
    span: &Span,
    meaning: &mut Meaning<'_, 't>,
) -> Option<f64> {
    let mut rests = segments.iter().filter_map(|segment| {
        let length = segment.length.given()?;
        (length.value == Extent::Rest).then_some(&length.place)
    });
    let name = whole.name.value;
    let first = rests.next();
    let mut once = true;
    for second in rests {
        let line = meaning.line(first?.start);
        let message = format!("`rest` stands twice in one member, first in line {line}");
        let help = "write all lengths but one; what is left is one length";
        meaning.r.problems.say(second, message, help);
        once = false;
    }
    let reach = match span {
        Span::Given(reach) => reach,
        Span::Wrong => return None,
        Span::None => {
            if let Some(place) = first {
                let message = format!(
                    "`rest` is what is left between two points, and the member `{name}` lies \
                     between none"
                );
                let help = "write the length itself, or `between` with two points in the member";
                meaning.r.problems.say(place, message, help);
            }
            return None;
        }
    };
    let is_known = |segment: &WrittenSegment<'_>| segment.length.given().is_some();
    if !once || segments.is_empty() || !segments.iter().all(is_known) {
        return None;
    }
    let lengths = segments.iter().filter_map(WrittenSegment::own_length);
    let sum: f64 = lengths.map(|length| length.value).sum();
    let left = reach.distance - sum;
    let between = whole.between.given()?;
    let [start, end] = [between.value[0].value, between.value[1].value];
    if let Some(place) = first {
        if left > SAME * reach.distance {
            return Some(left);
        }
        let message = format!(
            "nothing is left for this length: the other segments of `{name}` are {} long together, \
             and its points `{start}` and `{end}` lie {} apart",
            metres(sum),
            metres(reach.distance)
        );
        let help = "shorten the others, or look at the coordinates of the points";
        meaning.r.problems.say(place, message, help);
    } else if left.abs() > SAME * reach.distance {
        let message = format!(
            "the segments of `{name}` are {} long together, and its points `{start}` and `{end}` \
             lie {} apart: {} too {}",
            metres(sum),
            metres(reach.distance),
            metres(left.abs()),
            if left > 0.0 { "short" } else { "long" }
        );
        let help = "write `length = \"rest\"` in one of them; a member that was made too long or \
                    too short is as long as drawn here and has a load `misfit`";
        meaning.r.problems.say(&between.place, message, help);
    }
    None
}

/// A length to as many digits as say something.
fn metres(length: f64) -> String {
    let rounded = format!("{length:.10e}").parse().unwrap_or(length);
    format!("{rounded} m")
}
