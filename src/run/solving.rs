//! Every combination of a job solved and proven: single members one by one, the assembly at once.

use super::words;
use crate::check;
use crate::job::Problem;
use crate::model::{Combination, Member, Model, Name, Remark};
use crate::proof;
use crate::quantity::Style;
use crate::result::{CombinationResult, MemberResult, Residuals};
use crate::solve::{self, AssemblySolution, PreparedAssembly, Solution, Stiffness, Threshold};
use std::collections::HashSet;

/// What the combinations came to; one that cannot be solved is a problem and has no result.
#[derive(Default)]
pub(super) struct Solved {
    /// The index of each result in the model's combinations.
    pub(super) indices: Vec<usize>,
    pub(super) results: Vec<CombinationResult>,
    /// What counts as zero in each of a combination's members.
    pub(super) zeros: Vec<Vec<Threshold>>,
    /// What counts as zero in the assembly.
    pub(super) assembly_zeros: Vec<Threshold>,
    pub(super) problems: Vec<Problem>,
    pub(super) remarks: Vec<Remark>,
}

/// A remark that is made once, of the first combination that it holds in.
pub(super) struct Said {
    /// What it says beside the combination: the remark is the same where this is.
    pub(super) what: String,
    pub(super) remark: Remark,
}

/// What one combination came to.
#[derive(Default)]
struct Outcome {
    result: Option<CombinationResult>,
    /// What counts as zero in each member, and in the assembly.
    zeros: Vec<Threshold>,
    assembly_zero: Threshold,
    problems: Vec<Problem>,
    said: Vec<Said>,
}

/// Solves and proves all combinations of a job.
pub(super) fn combinations(model: &Model, style: Style) -> Solved {
    let mut solving = Solving {
        model,
        style,
        stiffness: single_stiffness(model),
        assembly: PreparedAssembly::of(model),
    };
    let mut solved = Solved::default();
    let mut known = HashSet::new();
    let mut take = |index: usize, outcome: Outcome| {
        if let Some(result) = outcome.result {
            solved.indices.push(index);
            solved.results.push(result);
            solved.zeros.push(outcome.zeros);
            solved.assembly_zeros.push(outcome.assembly_zero);
        }
        solved.problems.extend(outcome.problems);
        for Said { what, remark } in outcome.said {
            if known.insert((remark.about.clone(), what)) {
                solved.remarks.push(remark);
            }
        }
    };
    if solving.assembly.is_none() {
        for index in 0..model.combinations.len() {
            take(index, solving.combination(index));
        }
        return solved;
    }
    let mut outcomes: Vec<Outcome> = Vec::new();
    outcomes.resize_with(model.combinations.len(), Outcome::default);
    for index in alike_together(&model.combinations) {
        outcomes[index] = solving.combination(index);
    }
    for (index, outcome) in outcomes.into_iter().enumerate() {
        take(index, outcome);
    }
    solved
}

/// The stiffness of single members in combinations without factors on moduli.
fn single_stiffness(model: &Model) -> Option<Vec<Option<Stiffness>>> {
    let mut combinations = model.combinations.iter();
    let plain = combinations.find(|combination| combination.modulus.is_empty())?;
    let of = |member: &Member| match member.between {
        Some(_) => None,
        None => Some(Stiffness::of(model, member, plain)),
    };
    Some(model.members.iter().map(of).collect())
}

/// The combinations in an order in which those come together that an assembly's factors serve.
fn alike_together(combinations: &[Combination]) -> Vec<usize> {
    let mut order: Vec<usize> = (0..combinations.len()).collect();
    let key = |index: usize| {
        let combination = &combinations[index];
        let moduli = combination.modulus.iter().map(|factor| factor.to_bits());
        (&combination.without, moduli.collect::<Vec<_>>())
    };
    order.sort_by_cached_key(|&index| key(index));
    order
}

struct Solving<'m> {
    model: &'m Model,
    style: Style,
    stiffness: Option<Vec<Option<Stiffness>>>,
    assembly: Option<PreparedAssembly<'m>>,
}

impl Solving<'_> {
    fn combination(&mut self, index: usize) -> Outcome {
        let (model, combination) = (self.model, &self.model.combinations[index]);
        let mut outcome = Outcome::default();
        let mut members = Vec::with_capacity(model.members.len());
        let mut residuals = Residuals::default();
        for (at, member) in model.members.iter().enumerate() {
            if member.between.is_none()
                && combination.position(at).is_some()
                && let Some((solution, own)) = self.single(at, combination, &mut outcome)
            {
                residuals = residuals.worse(own);
                members.push((at, solution.member, solution.zero));
            }
        }
        let assembly = match &mut self.assembly {
            None => None,
            Some(assembly) => match assembly.solve(combination) {
                Ok(mut solution) => {
                    let zero = solution.zero;
                    let own = solution.members.drain(..);
                    members.extend(own.map(|(at, member)| (at, member, zero)));
                    members.sort_by_key(|&(at, ..)| at);
                    Some(solution)
                }
                Err(errors) => {
                    let problem = |error| words::unsolved(error, model, combination, self.style);
                    outcome.problems.extend(errors.iter().map(problem));
                    None
                }
            },
        };
        if !outcome.problems.is_empty() {
            return outcome;
        }
        outcome.zeros = members.iter().map(|&(.., zero)| zero).collect();
        let members = members.into_iter().map(|(_, member, _)| member).collect();
        let mut result = result_of(model, combination, members, residuals);
        if let Some(solution) = assembly {
            self.join(solution, combination, &mut result, &mut outcome);
        }
        result.watches = check::watches(model, combination, &result);
        outcome.result = Some(result);
        outcome
    }

    /// A member with supports of its own.
    fn single(
        &self,
        at: usize,
        combination: &Combination,
        outcome: &mut Outcome,
    ) -> Option<(Solution, Residuals)> {
        let (model, member) = (self.model, &self.model.members[at]);
        let stiffness = match &self.stiffness {
            Some(stiffness) if combination.modulus.is_empty() => stiffness[at].as_ref(),
            _ => None,
        };
        let solution = match stiffness {
            Some(stiffness) => solve::member_of(model, member, combination, stiffness),
            None => solve::member(model, member, combination),
        };
        match solution {
            Ok(mut solution) => {
                let residuals = proof::member(model, member, combination, &solution.member);
                if !residuals.prove() {
                    let whose = format!("member `{}`", member.name);
                    let problem = words::unproven(&whose, residuals, combination, &member.place);
                    outcome.problems.push(problem);
                }
                // The proof has had the split of least size.
                for &support in &solution.undecided {
                    solution.member.supports[support].reaction = None;
                }
                let said = words::of_member(member, &combination.name, &solution);
                outcome.said.extend(said);
                Some((solution, residuals))
            }
            Err(error) => {
                let problem = words::unsolved(&error, model, combination, self.style);
                outcome.problems.push(problem);
                None
            }
        }
    }

    /// Enters a solved assembly into the result of its combination, and proves it there.
    fn join(
        &self,
        solution: AssemblySolution,
        combination: &Combination,
        result: &mut CombinationResult,
        outcome: &mut Outcome,
    ) {
        outcome.assembly_zero = solution.zero;
        let said = words::of_assembly(self.model, combination, &solution, self.style);
        outcome.said.extend(said);
        result.points = solution.points;
        result.holds = solution.holds;
        result.bodies = solution.bodies;
        result.totals = Some(solution.totals);
        let residuals = proof::assembly(self.model, combination, result);
        if !residuals.prove() {
            let place = &combination.place;
            let problem = words::unproven("the assembly", residuals, combination, place);
            outcome.problems.push(problem);
        }
        result.residuals = result.residuals.worse(residuals);
        // The proof has had the split of least size.
        for row in solution.undecided {
            let hold = &mut result.holds[row];
            hold.reaction = None;
            let mut points = result.points.iter_mut();
            if let Some(point) = points.find(|point| point.name == hold.point) {
                point.reaction = None;
            }
        }
    }
}

fn result_of(
    model: &Model,
    combination: &Combination,
    members: Vec<MemberResult>,
    residuals: Residuals,
) -> CombinationResult {
    let factor = |&case: &usize| (model.cases[case].name.clone(), combination.factors[case]);
    let name = |&member: &usize| -> Name { model.members[member].name.clone() };
    CombinationResult {
        name: combination.name.clone(),
        purpose: combination.purpose,
        factors: combination.shown.iter().map(factor).collect(),
        without: combination.without.iter().map(name).collect(),
        members,
        points: Vec::new(),
        holds: Vec::new(),
        bodies: Vec::new(),
        watches: Vec::new(),
        totals: None,
        residuals,
        checks: Vec::new(),
    }
}
