//! Demands against limits: one file a kind of check.
//!
//! A check reads finished results and a [`Limit`]; it computes no mechanics. Utilisation is demand
//! over limit by size. A new kind is one new file and one line in `judge`.

mod bears;
mod caution;
mod displacement;
mod elongation;
mod envelope;
mod force;
mod gap;
mod governing;
mod reaction;
mod stress;

pub use caution::{Observed, cautions};
pub use envelope::envelope;
pub use governing::governing;

use crate::model::{Bounds, Combination, Limit, LimitKind, Model, Name, Reads};
use crate::quantity::{Dimension, from_si};
use crate::result::{CheckResult, CombinationResult, MemberResult, Unit, Verdict};
use crate::solve::Threshold;
use std::sync::LazyLock;
use uom::si::{Quantity, SI};

/// What a limit of exactly 1 may be exceeded by before it is: the rounding of the computation,
/// never more than a reader can see.
const ROUNDING: f64 = 1e-12;

/// One limit in one combination, with all that a check may look at.
pub(crate) struct Case<'a> {
    model: &'a Model,
    limit: &'a Limit,
    member: &'a MemberResult,
    zero: Threshold,
    /// The same member in the combination that the limit counts from.
    since: Option<&'a MemberResult>,
}

/// What a check found; the rest of its row comes from the limit.
pub(crate) struct Finding {
    at: Option<f64>,
    demand: f64,
    limit: f64,
    unit: Unit,
    utilisation: Option<f64>,
    status: Verdict,
    details: serde_json::Map<String, serde_json::Value>,
}

/// Whether a limit reads a combination.
pub fn reads(limit: &Limit, index: usize, combination: &Combination) -> bool {
    match &limit.reads {
        Reads::Purpose(purpose) => combination.purpose.is_none_or(|own| own == *purpose),
        Reads::Only(list) => list.binary_search(&index).is_ok(),
    }
}

/// Every check that reads the combination with this index.
///
/// `zeros` are the thresholds of its members, `since` tells where in `all` the results of a
/// combination of the model stand, and `lines` are the lines of the model's limits in the job file.
/// A limit that counts from a combination without a result is passed over, since the job is an
/// error then in any case.
pub fn combination(
    model: &Model,
    index: usize,
    result: &CombinationResult,
    zeros: &[Threshold],
    since: &dyn Fn(usize) -> Option<usize>,
    all: &[CombinationResult],
    lines: &[usize],
) -> Vec<CheckResult> {
    // A movement counted from this very combination is nothing to check.
    let looks = |limit: &Limit| {
        limit.since != Some(index) && reads(limit, index, &model.combinations[index])
    };
    let count = model.limits.iter().filter(|&limit| looks(limit)).count();
    let mut checks = Vec::with_capacity(count);
    for (limit, &line) in model.limits.iter().zip(lines) {
        if !looks(limit) {
            continue;
        }
        let Some(member) = limit
            .target
            .member()
            .and_then(|member| model.combinations[index].position(member))
        else {
            continue;
        };
        let reference = match limit.since {
            None => None,
            Some(from) => match since(from) {
                Some(position) => Some(&all[position].members[member]),
                None => continue,
            },
        };
        let case = Case {
            model,
            limit,
            member: &result.members[member],
            zero: zeros[member],
            since: reference,
        };
        if let Some(finding) = judge(&case) {
            checks.push(finding.row(limit, line));
        }
    }
    checks
}

fn judge(case: &Case) -> Option<Finding> {
    match case.limit.kind {
        LimitKind::Tension { .. } | LimitKind::Compression { .. } => stress::judge(case),
        LimitKind::Force(limit) => force::judge(case, &limit),
        LimitKind::Elongation(limit) => elongation::judge(case, &limit),
        LimitKind::Displacement(limit) => displacement::judge(case, &limit),
        LimitKind::Reaction(limit) => reaction::judge(case, &limit),
        LimitKind::Gap { min, max } => gap::judge(case, min, max),
        LimitKind::Bears => bears::judge(case),
        LimitKind::Slack | LimitKind::Watch(_) | LimitKind::Rotation(_) => None,
    }
}

/// The key of a limit in the job file.
pub fn word(kind: &LimitKind) -> Name {
    static WORDS: LazyLock<[Name; 11]> = LazyLock::new(|| {
        [
            "tension",
            "compression",
            "force",
            "elongation",
            "displacement",
            "reaction",
            "gap",
            "bears",
            "slack",
            "watch",
            "rotation",
        ]
        .map(Name::from)
    });
    let index = match kind {
        LimitKind::Tension { .. } => 0,
        LimitKind::Compression { .. } => 1,
        LimitKind::Force(_) => 2,
        LimitKind::Elongation(_) => 3,
        LimitKind::Displacement(_) => 4,
        LimitKind::Reaction(_) => 5,
        LimitKind::Gap { .. } => 6,
        LimitKind::Bears => 7,
        LimitKind::Slack => 8,
        LimitKind::Watch(_) => 9,
        LimitKind::Rotation(_) => 10,
    };
    WORDS[index].clone()
}

impl Finding {
    fn row(self, limit: &Limit, line: usize) -> CheckResult {
        let area = match limit.kind {
            LimitKind::Tension { area, .. } | LimitKind::Compression { area, .. } => Some(area),
            _ => None,
        };
        CheckResult {
            check: word(&limit.kind),
            on: limit.on.clone(),
            at: self.at,
            area,
            demand: self.demand,
            limit: self.limit,
            unit: self.unit,
            utilisation: self.utilisation,
            status: self.status,
            source: limit.source.clone(),
            details: self.details,
            line,
        }
    }

    /// A signed demand between the two bounds of a limit, against the bound on its side.
    fn signed<D: uom::si::Dimension + ?Sized>(
        demand: Quantity<D, SI<f64>, f64>,
        at: Option<f64>,
        limit: &Bounds<Quantity<D, SI<f64>, f64>>,
        zero: Quantity<D, SI<f64>, f64>,
        unit: Unit,
    ) -> Self {
        // Rounding about zero has no sign to choose a side by.
        let counts = demand.abs() > zero;
        let demand = if counts { demand } else { from_si(0.0) };
        let bound = if demand.value < 0.0 {
            limit.lower
        } else {
            limit.upper
        };
        let (utilisation, status) = utilisation(demand.value.abs(), bound.value.abs(), counts);
        Finding {
            at,
            demand: demand.value,
            limit: bound.value,
            unit,
            utilisation,
            status,
            details: serde_json::Map::new(),
        }
    }

    /// The one of two that is worse: a failure before a pass, then the larger utilisation.
    fn worse(self, other: Self) -> Self {
        if rank(other.status, other.utilisation) > rank(self.status, self.utilisation) {
            other
        } else {
            self
        }
    }
}

/// An order in which what governs comes last.
pub(crate) fn rank(status: Verdict, utilisation: Option<f64>) -> (bool, f64) {
    let failed = status == Verdict::Fail;
    // A failure without a ratio (a limit of nothing, a stop that should bear) is beyond any ratio.
    (
        failed,
        utilisation.unwrap_or(if failed { f64::INFINITY } else { -1.0 }),
    )
}

/// Demand over limit by size, and whether it holds. `counts` is whether the demand is above what
/// counts as zero: against a limit of 0 any that does fails, without a ratio.
fn utilisation(demand: f64, limit: f64, counts: bool) -> (Option<f64>, Verdict) {
    if limit == 0.0 {
        return if counts {
            (None, Verdict::Fail)
        } else {
            (Some(0.0), Verdict::Pass)
        };
    }
    let ratio = demand / limit;
    (
        Some(ratio),
        if ratio <= 1.0 + ROUNDING {
            Verdict::Pass
        } else {
            Verdict::Fail
        },
    )
}

/// The movement in this combination, less that in the one that the limit counts from.
fn moved(
    now: crate::quantity::Length,
    since: Option<crate::quantity::Length>,
) -> crate::quantity::Length {
    now - since.unwrap_or_else(|| from_si(0.0))
}

impl Unit {
    /// The dimension in which a report shows it; `None` for a yes-or-no check.
    pub fn dimension(self) -> Option<Dimension> {
        match self {
            Unit::Pascal => Some(Dimension::Stress),
            Unit::Newton => Some(Dimension::Force),
            Unit::Metre => Some(Dimension::Length),
            Unit::Radian => Some(Dimension::Angle),
            Unit::None => None,
        }
    }
}
