//! Cautions about limits that hold less, or more, than they seem to.

use crate::model::{Combination, Limit, LimitKind, Member, Model, Remark};
use crate::model::{ShareFactor, Target, Watched};
use std::collections::{BTreeSet, HashSet};

/// A share of a strength below this holds a safety factor of allowable-stress design (0.6 yield,
/// 0.5 ultimate); resistance and partial factors lie above (0.75 is a resistance factor, 1/1.1 a
/// partial factor) and go with factored loads. Common practice.
const HOLDS_A_SAFETY_FACTOR: f64 = 0.7;

/// What is to be said of the limits of a job. One literal may limit many segments: it is said once.
pub(super) fn limits(model: &Model) -> Vec<Remark> {
    let mut said = HashSet::new();
    let mut remarks = Vec::new();
    for limit in &model.limits {
        if said.insert(limit.place.start) {
            remarks.extend(factored_share(model, limit));
            remarks
                .extend(counted_from_nothing(model, limit).or_else(|| always_lost(model, limit)));
        }
    }
    remarks
}

/// A share of a strength that already holds a safety factor, read with factored loads.
fn factored_share(model: &Model, limit: &Limit) -> Option<Remark> {
    let (LimitKind::Tension { share, .. } | LimitKind::Compression { share, .. }) = limit.kind
    else {
        return None;
    };
    let ShareFactor(share) = share?;
    if share >= HOLDS_A_SAFETY_FACTOR {
        return None;
    }
    let index = limit.target.member()?;
    let member = &model.members[index];
    let acting = match member.between {
        // What acts anywhere in an assembly may come to any of its members.
        Some(_) => (0..model.cases.len()).collect(),
        None => cases_on(member),
    };
    let factored = |factors: &[f64]| acting.iter().any(|&case| factors[case].abs() > 1.0);
    let (_, combination) = model
        .combinations
        .iter()
        .enumerate()
        .find(|(at, combination)| {
            super::reads(limit, *at, combination)
                && combination.position(index).is_some()
                && factored(&combination.factors)
        })?;
    Some(Remark {
        about: format!("member.{}", member.name),
        text: format!(
            "the limit on {} is {share:.3} of a strength and so may hold a safety factor already, and `{}` has factored loads: safety may be counted twice",
            super::word(&limit.kind),
            combination.name,
        ),
        place: Some(limit.place.clone()),
        caution: true,
    })
}

/// The cases that put anything on a member.
fn cases_on(member: &Member) -> BTreeSet<usize> {
    let actions = &member.actions;
    let forces = actions.forces.iter().map(|action| action.case);
    let lines = actions.lines.iter().map(|action| action.case);
    let weights = actions.weights.iter().map(|action| action.case);
    let temperatures = actions.temperatures.iter().map(|action| action.case);
    let strains = actions.strains.iter().map(|action| action.case);
    let movements = actions.movements.iter().map(|action| action.case);
    forces
        .chain(lines)
        .chain(weights)
        .chain(temperatures)
        .chain(strains)
        .chain(movements)
        .collect()
}

/// A movement that no combination reads but the one that it is counted from, or that is counted
/// from one that takes its member out.
fn counted_from_nothing(model: &Model, limit: &Limit) -> Option<Remark> {
    let since = limit.since?;
    let has_members = |combination: &Combination| {
        members_of(model, limit).all(|member| combination.position(member).is_some())
    };
    let from = &model.combinations[since];
    let mut reading = model
        .combinations
        .iter()
        .enumerate()
        .filter(|(index, combination)| super::reads(limit, *index, combination));
    let key = super::word(&limit.kind);
    let text = if !has_members(from) {
        format!(
            "this limit on {key} is counted from `{}`, which takes a member out that it is about: nothing is checked by it",
            from.name,
        )
    } else if !reading.any(|(index, combination)| index != since && has_members(combination)) {
        format!(
            "no combination reads this limit on {key} but `{}`, from which it is counted: nothing is checked by it",
            from.name,
        )
    } else {
        return None;
    };
    let about = match limit.target.member() {
        Some(member) => format!("member.{}", model.members[member].name),
        None => limit.on.to_string(),
    };
    Some(Remark {
        about,
        text,
        place: Some(limit.place.clone()),
        caution: true,
    })
}

/// A limit on a member that every combination which reads it takes out.
fn always_lost(model: &Model, limit: &Limit) -> Option<Remark> {
    let member = limit.target.member()?;
    let combinations = model.combinations.iter().enumerate();
    let mut reading = combinations
        .filter(|(index, combination)| super::reads(limit, *index, combination))
        .peekable();
    reading.peek()?;
    if reading.any(|(_, combination)| combination.position(member).is_some()) {
        return None;
    }
    let name = &model.members[member].name;
    Some(Remark {
        about: format!("member.{name}"),
        text: format!(
            "every combination that reads this limit on {} takes `{name}` out: nothing is checked by it",
            super::word(&limit.kind),
        ),
        place: Some(limit.place.clone()),
        caution: true,
    })
}

/// The members whose results a limit needs.
fn members_of(model: &Model, limit: &Limit) -> impl Iterator<Item = usize> {
    let watched = match limit.target {
        Target::Watch { watch } => match model.watches[watch].of {
            Watched::Station { at, relative_to } => [Some(at.0), relative_to.map(|(of, _)| of)],
            _ => [None, None],
        },
        target => [target.member(), None],
    };
    watched.into_iter().flatten()
}
