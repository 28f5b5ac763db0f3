//! The range of every result over all combinations.

use crate::result::{CombinationResult, Envelope, MemberResult, Unit};

/// Every reaction, gap, member elongation and member force: one row each, in the order of the
/// members, with the combinations that the largest and the least come from.
pub fn envelope(combinations: &[CombinationResult]) -> Vec<Envelope> {
    let Some(first) = combinations.first() else {
        return Vec::new();
    };
    let mut rows = Vec::new();
    for (index, member) in first.members.iter().enumerate() {
        let mut add = |quantity: String, unit: Unit, of: &dyn Fn(&MemberResult) -> Option<f64>| {
            rows.push(range(
                format!("{}.{quantity}", member.name),
                unit,
                index,
                combinations,
                of,
            ));
        };
        add("elongation".into(), Unit::Metre, &|m| {
            Some(m.elongation.value)
        });
        add("force_max".into(), Unit::Newton, &|m| {
            Some(m.force_max.value)
        });
        add("force_min".into(), Unit::Newton, &|m| {
            Some(m.force_min.value)
        });
        for (at, segment) in member.segments.iter().enumerate() {
            if segment.gap.is_some() {
                add(format!("{}.gap", segment.name), Unit::Metre, &|m| {
                    m.segments[at].gap.map(|gap| gap.value)
                });
            }
        }
        for (at, support) in member.supports.iter().enumerate() {
            add(format!("{}.reaction", support.name), Unit::Newton, &|m| {
                m.supports[at].reaction.map(|reaction| reaction.value)
            });
            if support.gap.is_some() {
                add(format!("{}.gap", support.name), Unit::Metre, &|m| {
                    m.supports[at].gap.map(|gap| gap.value)
                });
            }
        }
    }
    rows
}

fn range(
    result: String,
    unit: Unit,
    member: usize,
    combinations: &[CombinationResult],
    of: &dyn Fn(&MemberResult) -> Option<f64>,
) -> Envelope {
    let mut most: Option<(f64, usize)> = None;
    let mut least: Option<(f64, usize)> = None;
    for (index, combination) in combinations.iter().enumerate() {
        let Some(value) = of(&combination.members[member]) else {
            continue;
        };
        if most.is_none_or(|(known, _)| value > known) {
            most = Some((value, index));
        }
        if least.is_none_or(|(known, _)| value < known) {
            least = Some((value, index));
        }
    }
    let name =
        |found: Option<(f64, usize)>| found.map(|(_, index)| combinations[index].name.clone());
    Envelope {
        result,
        unit,
        max: most.map(|(value, _)| value),
        max_in: name(most),
        min: least.map(|(value, _)| value),
        min_in: name(least),
    }
}
