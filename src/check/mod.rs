//! Demands against limits: one file a kind of check.
//!
//! A check reads finished results and a [`Limit`]; it computes no mechanics. Utilisation is demand
//! over limit by size. A new kind is one new file and one line in `judge`.

mod bears;
mod bending;
mod caution;
mod displacement;
mod doubtful;
mod elongation;
mod envelope;
mod force;
mod gap;
mod governing;
mod large;
mod reaction;
mod reading;
mod slack;
mod stress;
mod warning;
mod watch;

pub use caution::cautions;
pub use envelope::envelope;
pub use governing::governing;
pub use reading::watches;
pub use warning::warnings;

use crate::model::{Bounds, Combination, Hold, HoldKind, Limit, LimitKind, Model, Name};
use crate::model::{Reads, Support, SupportKind, Target};
use crate::quantity::{Dimension, Length, from_si};
use crate::result::{CheckResult, CombinationResult, HoldResult, MemberResult, SupportResult};
use crate::result::{Unit, Verdict};
use crate::solve::Threshold;
use std::sync::LazyLock;
use uom::si::{Quantity, SI};

/// What a limit of exactly 1 may be exceeded by before it is: the rounding of the computation,
/// never more than a reader can see.
const ROUNDING: f64 = 1e-12;

/// A solved combination with what counts as zero in it.
#[derive(Debug, Clone, Copy)]
pub struct Observed<'a> {
    /// Its index in the model.
    pub index: usize,
    /// Its results.
    pub result: &'a CombinationResult,
    /// One threshold for each of its members.
    pub zeros: &'a [Threshold],
    /// The threshold of its points, bodies and holds; of no matter in a job without points.
    pub assembly: Threshold,
}

impl<'a> Observed<'a> {
    /// The result of a member of the model with its threshold; none where it is taken out.
    pub(crate) fn member(
        &self,
        model: &Model,
        member: usize,
    ) -> Option<(&'a MemberResult, Threshold)> {
        let position = model.combinations[self.index].position(member)?;
        Some((&self.result.members[position], self.zeros[position]))
    }
}

/// One limit in one combination, with all that a check may look at.
pub(crate) struct Case<'a> {
    model: &'a Model,
    limit: &'a Limit,
    /// The combination that is checked.
    now: Observed<'a>,
    /// The combination that the limit counts from.
    since: Option<Observed<'a>>,
    /// The row of the first point of each hold.
    hold_rows: &'a [usize],
}

impl<'a> Case<'a> {
    /// The member that the limit stands on, with what counts as zero in it.
    fn member(&self) -> Option<(&'a MemberResult, Threshold)> {
        self.now.member(self.model, self.limit.target.member()?)
    }

    /// What `of` finds in the member now, less what it found in the combination that the limit
    /// counts from; nothing where either lacks it.
    fn moved(&self, of: impl Fn(&MemberResult) -> Option<Length>) -> Option<Length> {
        let member = self.limit.target.member()?;
        let read = |seen: &Observed| of(seen.member(self.model, member)?.0);
        let now = read(&self.now)?;
        match &self.since {
            None => Some(now),
            Some(since) => Some(now - read(since)?),
        }
    }

    /// The support that the limit stands on.
    fn support(&self) -> Option<(&'a Support, &'a SupportResult)> {
        let Target::Support { member, support } = self.limit.target else {
            return None;
        };
        let (result, _) = self.member()?;
        Some((
            &self.model.members[member].supports[support],
            &result.supports[support],
        ))
    }

    /// The hold that the limit stands on, at the one of its points that it means.
    fn hold(&self) -> Option<(&'a Hold, &'a HoldResult)> {
        let Target::Hold { hold, point } = self.limit.target else {
            return None;
        };
        let row = self.hold_rows.get(hold)? + point;
        let hold = &self.model.assembly.as_ref()?.holds[hold];
        Some((hold, self.now.result.holds.get(row)?))
    }

    /// The clearance of the limit's stop as drawn.
    fn clearance(&self) -> Option<Length> {
        if let Some((hold, _)) = self.hold() {
            return match hold.kind {
                HoldKind::Stop { clearance, .. } => Some(clearance),
                _ => None,
            };
        }
        match self.support()?.0.kind {
            SupportKind::Stop { clearance, .. } => Some(clearance),
            _ => None,
        }
    }
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

/// Every check that reads the combination at the place `at` of `observed`.
///
/// `observed` are all solved combinations in the order of the model, and `lines` are the lines of
/// the model's limits in the job file. A limit on a member that the combination takes out does not
/// read it. One that counts from a combination without a result is passed over, since the job is
/// an error then in any case.
pub fn combination(
    model: &Model,
    observed: &[Observed],
    at: usize,
    lines: &[usize],
) -> Vec<CheckResult> {
    let now = observed[at];
    let hold_rows = hold_rows(model);
    let mut checks = Vec::new();
    for (limit, &line) in model.limits.iter().zip(lines) {
        // A movement counted from this very combination is nothing to check.
        if limit.since == Some(now.index)
            || !reads(limit, now.index, &model.combinations[now.index])
        {
            continue;
        }
        let since = match limit.since {
            None => None,
            Some(from) => match observed.binary_search_by_key(&from, |seen| seen.index) {
                Ok(position) => Some(observed[position]),
                Err(_) => continue,
            },
        };
        let case = Case {
            model,
            limit,
            now,
            since,
            hold_rows: &hold_rows,
        };
        if let Some(finding) = judge(&case) {
            checks.push(finding.row(limit, line));
        }
    }
    checks
}

/// Where the rows of each hold begin among the results: one row for each of its points.
fn hold_rows(model: &Model) -> Vec<usize> {
    let holds = model.assembly.iter().flat_map(|assembly| &assembly.holds);
    let mut next = 0;
    let row = |hold: &Hold| {
        let first = next;
        next += hold.points.len();
        first
    };
    holds.map(row).collect()
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
        LimitKind::Slack => slack::judge(case),
        LimitKind::Watch(limit) => watch::judge(case, &limit, Unit::Metre),
        LimitKind::Rotation(limit) => watch::judge(case, &limit, Unit::Radian),
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

    /// An answer to a question that must be answered with yes.
    fn yes_or_no(answer: bool, at: Option<f64>) -> Self {
        Finding {
            at,
            demand: f64::from(u8::from(answer)),
            limit: 1.0,
            unit: Unit::None,
            utilisation: None,
            status: if answer { Verdict::Pass } else { Verdict::Fail },
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
