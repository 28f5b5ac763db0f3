//! Stresses over their limit or near it, which reports name at their head.

use crate::result::{Governing, Verdict, Warning};

/// A stress this close under its limit is warned of.
const NEAR: f64 = 0.95;

/// One warning for each stress check that fails or nearly does, where it governs.
pub fn warnings(governing: &[Governing]) -> Vec<Warning> {
    let warned_of = |check: &&Governing| {
        let near = check.utilisation.is_some_and(|used| used >= NEAR);
        matches!(&*check.check, "tension" | "compression")
            && (check.status == Verdict::Fail || near)
    };
    let warning = |check: &Governing| Warning {
        check: check.check.clone(),
        on: check.on.clone(),
        at: check.at,
        combination: check.combination.clone(),
        stress: check.demand,
        allowable: check.limit,
        ratio: check.utilisation,
        status: check.status,
        line: check.line,
    };
    governing.iter().filter(warned_of).map(warning).collect()
}
