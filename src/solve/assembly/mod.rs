//! From an assembly and one combination to its results: points, bodies, holds, and its members.
//!
//! Its unknowns are the displacements of points and bodies (`unknowns`). Members, holds and hinges
//! become parts over them (`parts`, `tie`), loads come to the unknowns and to the rests of the
//! parts (`loads`, `across`), the system gives the state of least energy, and from that every
//! member is recovered along itself with the code of single members (`recover`).

mod across;
mod free;
mod loads;
mod motion;
mod parts;
mod recover;
mod restraint;
mod results;
mod space;
#[cfg(test)]
mod tests;
mod tie;
mod twist;
mod unknowns;

pub use free::FreeMotion;
pub use motion::{Motion, Mover, Moving, Way};

use super::{SolveError, Threshold, system};
use crate::model::{Assembly, Combination, Model};
use crate::quantity::Force;
use crate::result::{AssemblyTotals, BodyResult, HoldResult, MemberResult, PointResult};
use loads::Loading;
use parts::{OneSided, Parts, Rigid};
use recover::Answered;
use results::Solved;
use unknowns::Unknowns;

/// A solved assembly, with what counts as zero in it.
#[derive(Debug, Clone)]
pub struct AssemblySolution {
    /// Its members that are not taken out, each with its index in the model, rising.
    pub members: Vec<(usize, MemberResult)>,
    /// Its points.
    pub points: Vec<PointResult>,
    /// Its holds, one row for each point of each.
    pub holds: Vec<HoldResult>,
    /// Its bodies.
    pub bodies: Vec<BodyResult>,
    /// Sums over it.
    pub totals: AssemblyTotals,
    /// The combination's threshold on it.
    pub zero: Threshold,
    /// Rows of `holds` whose reaction nothing decides: theirs are the split of least size.
    pub undecided: Vec<usize>,
    /// What nothing resists and nothing pushes: set to where the points move least.
    pub free: Vec<FreeMotion>,
    /// About how many times a rounding of the stiffness comes out larger in the displacements.
    pub condition: f64,
}

/// An assembly made ready to be solved: what combinations share is kept.
pub struct PreparedAssembly<'m> {
    model: &'m Model,
    assembly: &'m Assembly,
    unknowns: Unknowns,
    /// The parts of the combination that was last solved, and the system made ready.
    ready: Option<Ready>,
}

struct Ready {
    without: Vec<usize>,
    modulus: Vec<f64>,
    parts: Parts,
    system: system::Prepared,
}

impl<'m> PreparedAssembly<'m> {
    /// `None` for a model without points.
    pub fn of(model: &'m Model) -> Option<Self> {
        let assembly = model.assembly.as_ref()?;
        Some(PreparedAssembly {
            model,
            assembly,
            unknowns: Unknowns::of(assembly),
            ready: None,
        })
    }

    /// Solves the assembly under one combination. Combinations that take the same members out and
    /// have the same factors on moduli share their factors while they come one after the other.
    ///
    /// # Errors
    /// Every taper's point that would have to carry force; else the first of: a load that pushes
    /// what nothing holds, rigid holds that contradict each other, numbers out of range.
    pub fn solve(
        &mut self,
        combination: &Combination,
    ) -> Result<AssemblySolution, Vec<SolveError>> {
        let ready = match self.ready.take() {
            Some(ready) if ready.serves(combination) => ready,
            _ => {
                let (parts, system) =
                    Parts::of(self.model, self.assembly, &self.unknowns, combination)?;
                Ready {
                    without: combination.without.clone(),
                    modulus: combination.modulus.clone(),
                    parts,
                    system: system::Prepared::of(system),
                }
            }
        };
        let Ready { parts, system, .. } = self.ready.insert(ready);
        let (model, assembly, unknowns) = (self.model, self.assembly, &self.unknowns);
        let loading = Loading::of(model, assembly, unknowns, parts, combination)?;
        let answer = system
            .solve(&loading.loads)
            .map_err(|failure| vec![explain(model, assembly, unknowns, parts, failure)])?;
        let solved = Solved {
            assembly,
            unknowns,
            parts,
            answer: &answer,
        };
        let mut members = Vec::with_capacity(parts.ties.len());
        let mut errors = Vec::new();
        let mut first_station = unknowns.count;
        for (tie, loaded) in parts.ties.iter().zip(loading.ties) {
            let Some(between) = &model.members[tie.member].between else {
                continue;
            };
            let answered = Answered {
                model,
                unknowns,
                tie,
                between,
                answer: &answer,
                first_station,
            };
            match answered.result(loaded) {
                Ok(result) => members.push((tie.member, result)),
                Err(error) => errors.push(error),
            }
            first_station += tie.spans.len() - 1;
        }
        let hold_forces = solved.hold_forces();
        let points = match solved.points(&hold_forces) {
            Ok(points) if errors.is_empty() => points,
            Ok(_) => return Err(errors),
            Err(error) => {
                errors.push(error);
                return Err(errors);
            }
        };
        let reactions = hold_forces
            .iter()
            .fold([Force::default(); 3], |sum, force| {
                std::array::from_fn(|k| sum[k] + force[k])
            });
        Ok(AssemblySolution {
            members,
            holds: solved.holds(&hold_forces),
            bodies: solved.bodies(&points),
            points,
            totals: AssemblyTotals {
                applied: solved.entries(&loading.applied),
                reactions: solved.entries(&reactions),
            },
            zero: loading.loads.zero,
            undecided: undecided(parts, &answer),
            free: free::motions(model, assembly, unknowns, parts, &answer.free),
            condition: answer.condition,
        })
    }
}

impl Ready {
    fn serves(&self, combination: &Combination) -> bool {
        self.without == combination.without && self.modulus == combination.modulus
    }
}

/// The rows of holds whose reaction nothing decides.
fn undecided(parts: &Parts, answer: &system::Answer) -> Vec<usize> {
    let rigid = answer
        .undecided_rigid
        .iter()
        .filter_map(|&part| match parts.rigid[part] {
            Rigid::Held(held) => Some(held),
            Rigid::Hinge(_) => None,
        });
    let stops = answer
        .undecided_one_way
        .iter()
        .filter_map(|&part| match parts.one_way[part] {
            OneSided::Stop(held) => Some(held),
            OneSided::Member(_) => None,
        });
    let mut undecided: Vec<usize> = rigid.chain(stops).collect();
    undecided.sort_unstable();
    undecided.dedup();
    undecided
}

/// Puts a failure of the system into terms of the assembly.
fn explain(
    model: &Model,
    assembly: &Assembly,
    unknowns: &Unknowns,
    parts: &Parts,
    failure: system::Failure,
) -> SolveError {
    match failure {
        system::Failure::Pushed { motion, .. } => SolveError::Unstable {
            motion: free::motion(model, assembly, unknowns, parts, &motion),
        },
        system::Failure::Unsettled { parts } => SolveError::Unsettled { parts },
        system::Failure::Contradiction { rigid, one_way } => {
            let (mut holds, mut bodies, mut members) = (Vec::new(), Vec::new(), Vec::new());
            let keep = |list: &mut Vec<_>, name: &crate::model::Name| {
                if !list.contains(name) {
                    list.push(name.clone());
                }
            };
            for &part in &rigid {
                match parts.rigid[part] {
                    Rigid::Held(held) => {
                        keep(&mut holds, &assembly.holds[parts.held[held].hold].name);
                    }
                    Rigid::Hinge(hinge) => keep(&mut bodies, &assembly.bodies[hinge.body].name),
                }
            }
            for &part in &one_way {
                match parts.one_way[part] {
                    OneSided::Stop(held) => {
                        keep(&mut holds, &assembly.holds[parts.held[held].hold].name);
                    }
                    OneSided::Member(member) => keep(&mut members, &model.members[member].name),
                }
            }
            SolveError::HoldsContradict {
                holds,
                bodies,
                members,
            }
        }
    }
}
