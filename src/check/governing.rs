//! The largest utilisation of each check over all combinations.

use super::rank;
use crate::result::{CheckResult, CombinationResult, Governing};
use std::collections::BTreeMap;

/// One row for each check on each thing, in the order in which they first appear. The worst one
/// governs: a failure before a pass, then the larger utilisation, then the earlier combination.
pub fn governing(combinations: &[CombinationResult]) -> Vec<Governing> {
    let mut order: Vec<(&CheckResult, usize)> = Vec::new();
    let mut known: BTreeMap<(&str, &str), usize> = BTreeMap::new();
    // The checks of a combination come in one order, so the next row is mostly the one looked for.
    let mut next = 0;
    for (index, combination) in combinations.iter().enumerate() {
        for check in &combination.checks {
            let expected = order
                .get(next)
                .is_some_and(|(row, _)| row.on == check.on && row.check == check.check);
            let at = if expected {
                next
            } else {
                *known.entry((&check.check, &check.on)).or_insert_with(|| {
                    order.push((check, index));
                    order.len() - 1
                })
            };
            next = if at + 1 == order.len() { 0 } else { at + 1 };
            let (worst, _) = order[at];
            if rank(check.status, check.utilisation) > rank(worst.status, worst.utilisation) {
                order[at] = (check, index);
            }
        }
    }
    let row = |(check, index): (&CheckResult, usize)| Governing {
        check: check.check.clone(),
        on: check.on.clone(),
        combination: combinations[index].name.clone(),
        at: check.at,
        area: check.area,
        demand: check.demand,
        limit: check.limit,
        unit: check.unit,
        utilisation: check.utilisation,
        status: check.status,
        source: check.source.clone(),
        line: check.line,
    };
    order.into_iter().map(row).collect()
}
