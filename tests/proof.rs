//! The residuals bite: a finished result that is changed by one part in a million, or whose decided
//! stop or joint is turned over, does not pass as proven.

#[path = "proof/by_hand.rs"]
mod by_hand;
mod common;
#[path = "proof/corruptions.rs"]
mod corruptions;
#[path = "proof/hand.rs"]
mod hand;
#[path = "proof/rounding.rs"]
mod rounding;
#[path = "proof/shared_points.rs"]
mod shared_points;

use common::chain::Random;
use lengthwise::model::Model;
use lengthwise::quantity::{Force, Length};
use lengthwise::result::{MemberResult, Residuals};
use lengthwise::{job, proof, solve};

/// One part in a million.
const PART: f64 = 1.0 + 1e-6;

/// Random members that have a solution, with it.
fn solved_members(count: usize) -> Vec<(Model, MemberResult)> {
    let mut random = Random(20_261);
    let mut solved = Vec::new();
    while solved.len() < count {
        let text = common::random_member::member(&mut random).job();
        let model = job::read(&text).unwrap_or_else(|problems| panic!("{problems:#?}\n{text}"));
        if let Ok(solution) = solve::member(&model, &model.members[0], &model.combinations[0]) {
            solved.push((model, solution.member));
        }
    }
    solved
}

fn residuals(model: &Model, result: &MemberResult) -> Residuals {
    proof::member(model, &model.members[0], &model.combinations[0], result)
}

/// Changes the largest by size of some numbers of a result; nothing where all are 0.
fn corrupt_force<'r>(fields: impl Iterator<Item = &'r mut Force>) -> bool {
    match fields.max_by(|a, b| a.value.abs().total_cmp(&b.value.abs())) {
        Some(force) if force.value != 0.0 => {
            *force *= PART;
            true
        }
        _ => false,
    }
}

fn corrupt_length<'r>(fields: impl Iterator<Item = &'r mut Length>) -> bool {
    match fields.max_by(|a, b| a.value.abs().total_cmp(&b.value.abs())) {
        Some(length) if length.value != 0.0 => {
            *length *= PART;
            true
        }
        _ => false,
    }
}

type Corruption = (&'static str, fn(&mut MemberResult) -> bool);

const CORRUPTIONS: [Corruption; 13] = [
    ("force before a station", |r| {
        corrupt_force(
            r.stations
                .iter_mut()
                .filter_map(|s| s.force_before.as_mut()),
        )
    }),
    ("force after a station", |r| {
        corrupt_force(r.stations.iter_mut().filter_map(|s| s.force_after.as_mut()))
    }),
    ("force at a segment's start", |r| {
        corrupt_force(r.segments.iter_mut().map(|s| &mut s.force_start))
    }),
    ("force at a segment's end", |r| {
        corrupt_force(r.segments.iter_mut().map(|s| &mut s.force_end))
    }),
    ("largest force of a segment", |r| {
        corrupt_force(r.segments.iter_mut().map(|s| &mut s.force_max))
    }),
    ("least force of a segment", |r| {
        corrupt_force(r.segments.iter_mut().map(|s| &mut s.force_min))
    }),
    ("largest or least force of the member", |r| {
        corrupt_force([&mut r.force_max, &mut r.force_min].into_iter())
    }),
    ("displacement", |r| {
        corrupt_length(r.stations.iter_mut().map(|s| &mut s.displacement))
    }),
    ("reaction", |r| {
        corrupt_force(r.supports.iter_mut().filter_map(|s| s.reaction.as_mut()))
    }),
    ("elongation", |r| {
        let segments = r.segments.iter_mut().map(|s| &mut s.elongation);
        corrupt_length(segments.chain([&mut r.elongation]))
    }),
    ("elongation from force", |r| {
        corrupt_length(r.segments.iter_mut().map(|s| &mut s.elongation_force))
    }),
    ("elongation from temperature", |r| {
        corrupt_length(r.segments.iter_mut().map(|s| &mut s.elongation_temperature))
    }),
    ("elongation from misfit", |r| {
        corrupt_length(r.segments.iter_mut().map(|s| &mut s.elongation_misfit))
    }),
];

#[test]
fn sound_results_close_to_rounding() {
    for (model, result) in solved_members(500) {
        let left = residuals(&model, &result).largest();
        assert!(left < 1e-11, "{left:e}: {result:#?}");
    }
}

#[test]
fn a_number_changed_by_one_part_in_a_million_is_caught() {
    let mut tried = [0; CORRUPTIONS.len()];
    for (model, result) in solved_members(300) {
        for (index, (what, corrupt)) in CORRUPTIONS.iter().enumerate() {
            let mut corrupted = result.clone();
            if !corrupt(&mut corrupted) {
                continue;
            }
            tried[index] += 1;
            let left = residuals(&model, &corrupted).largest();
            assert!(
                left > Residuals::LIMIT,
                "{what} passed with {left:e}: {result:#?}"
            );
        }
    }
    assert!(
        tried.iter().all(|&count| count > 30),
        "too few of a kind were tried: {tried:?}"
    );
}

#[test]
fn a_decided_state_turned_over_is_caught() {
    let (mut stops, mut joints) = (0, 0);
    for (model, result) in solved_members(300) {
        let force = result.force_max.abs().max(result.force_min.abs());
        let clearly =
            |reaction: Force, gap: Length| reaction.abs() > force * 1e-6 || gap.value > 1e-8;
        for index in 0..result.supports.len() {
            let support = &result.supports[index];
            let Some(bears) = support.bears else { continue };
            if clearly(support.reaction.unwrap(), support.gap.unwrap()) {
                let mut turned = result.clone();
                turned.supports[index].bears = Some(!bears);
                let left = residuals(&model, &turned).largest();
                assert!(
                    left > Residuals::LIMIT,
                    "{} passed with {left:e}: {result:#?}",
                    support.name
                );
                stops += 1;
            }
        }
        for index in 0..result.segments.len() {
            let segment = &result.segments[index];
            let Some(bears) = segment.bears else { continue };
            if clearly(segment.force_start, segment.gap.unwrap()) {
                let mut turned = result.clone();
                turned.segments[index].bears = Some(!bears);
                let left = residuals(&model, &turned).largest();
                assert!(
                    left > Residuals::LIMIT,
                    "{} passed with {left:e}: {result:#?}",
                    segment.name
                );
                joints += 1;
            }
        }
    }
    assert!(
        stops > 100 && joints > 30,
        "too few were tried: {stops} stops, {joints} joints"
    );
}
