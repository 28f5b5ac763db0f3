//! The range of every result over all combinations.

use crate::result::{CombinationResult, Envelope, MemberResult, Unit};

/// Every reaction, gap, member elongation and member force: one row each, in the order of the
/// members, with the combinations that the largest and the least come from.
pub fn envelope(combinations: &[CombinationResult]) -> Vec<Envelope> {
    let Some(first) = combinations.first() else {
        return Vec::new();
    };
    let rows_of = |member: &MemberResult| {
        3 + 2 * member.supports.len() + member.segments.iter().filter_map(|s| s.gap).count()
    };
    let mut rows = Vec::with_capacity(first.members.iter().map(rows_of).sum());
    for (index, member) in first.members.iter().enumerate() {
        let mut add =
            |part: &str, quantity: &str, unit: Unit, of: &dyn Fn(&MemberResult) -> Option<f64>| {
                let mut address =
                    String::with_capacity(member.name.len() + part.len() + quantity.len() + 2);
                for word in [&member.name, part] {
                    if !word.is_empty() {
                        address.push_str(word);
                        address.push('.');
                    }
                }
                address.push_str(quantity);
                rows.push(range(address, unit, index, combinations, of));
            };
        add("", "elongation", Unit::Metre, &|m| Some(m.elongation.value));
        add("", "force_max", Unit::Newton, &|m| Some(m.force_max.value));
        add("", "force_min", Unit::Newton, &|m| Some(m.force_min.value));
        for (at, segment) in member.segments.iter().enumerate() {
            if segment.gap.is_some() {
                add(&segment.name, "gap", Unit::Metre, &|m| {
                    m.segments[at].gap.map(|gap| gap.value)
                });
            }
        }
        for (at, support) in member.supports.iter().enumerate() {
            add(&support.name, "reaction", Unit::Newton, &|m| {
                m.supports[at].reaction.map(|reaction| reaction.value)
            });
            if support.gap.is_some() {
                add(&support.name, "gap", Unit::Metre, &|m| {
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
