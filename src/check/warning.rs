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

#[cfg(test)]
mod tests {
    use super::*;
    use crate::result::Unit;

    fn governing(check: &str, on: &str, utilisation: f64) -> Governing {
        Governing {
            check: check.into(),
            on: on.into(),
            combination: "strength".into(),
            at: None,
            area: None,
            demand: 300e6 * utilisation,
            limit: 300e6,
            unit: Unit::Pascal,
            utilisation: Some(utilisation),
            status: if utilisation > 1.0 {
                Verdict::Fail
            } else {
                Verdict::Pass
            },
            source: None,
            line: 1,
        }
    }

    #[test]
    fn a_stress_over_its_limit_or_near_it_is_warned_of_and_no_movement_is() {
        let checks = [
            governing("tension", "over", 1.14),
            governing("compression", "near", 0.951),
            governing("tension", "far", 0.949),
            governing("elongation", "movement", 1.5),
        ];
        let found = warnings(&checks);
        let on: Vec<&str> = found.iter().map(|warning| &*warning.on).collect();
        assert_eq!(on, ["over", "near"]);
    }
}
