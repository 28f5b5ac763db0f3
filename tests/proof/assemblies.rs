//! The residuals bite in random assemblies, too.

use crate::common::chain::Random;
use crate::corruptions::{CORRUPTIONS, turned};
use crate::frames::frame;
use crate::hand::residuals;
use lengthwise::model::Model;
use lengthwise::result::{CombinationResult, Residuals};
use lengthwise::solve;

/// Random assemblies in one, two and three coordinates that have a solution, with it.
fn solved(count: usize) -> Vec<(Model, CombinationResult)> {
    let mut random = Random(20_262);
    let mut solved = Vec::new();
    for tried in 0.. {
        if solved.len() == count {
            break;
        }
        assert!(tried < 4 * count, "too few have a solution");
        let model = frame(&mut random, 1 + tried % 3);
        let Some(mut prepared) = solve::PreparedAssembly::of(&model) else {
            panic!("an assembly")
        };
        if let Ok(solution) = prepared.solve(&model.combinations[0]) {
            let result = CombinationResult {
                name: "all".into(),
                purpose: None,
                factors: Default::default(),
                without: Vec::new(),
                members: solution.members.into_iter().map(|(_, m)| m).collect(),
                points: solution.points,
                holds: solution.holds,
                bodies: solution.bodies,
                watches: Vec::new(),
                totals: Some(solution.totals),
                residuals: Residuals::default(),
                checks: Vec::new(),
            };
            solved.push((model, result));
        }
    }
    solved
}

#[test]
fn sound_assemblies_close_to_rounding() {
    for (model, result) in solved(600) {
        let left = residuals(&model, &result);
        assert!(left.largest() < 1e-10, "{left:?}: {result:#?}");
    }
}

#[test]
fn a_number_of_an_assembly_changed_by_one_part_in_a_million_is_caught() {
    let mut tried = [0; CORRUPTIONS.len()];
    for (model, result) in solved(450) {
        for (index, (what, corrupt)) in CORRUPTIONS.iter().enumerate() {
            let mut corrupted = result.clone();
            if corrupt(&mut corrupted) {
                let left = residuals(&model, &corrupted).largest();
                assert!(
                    left > Residuals::LIMIT,
                    "{what} passed with {left:e}: {result:#?}"
                );
                tried[index] += 1;
            }
        }
    }
    assert!(
        tried.iter().all(|&count| count > 30),
        "too few of a kind were tried: {tried:?}"
    );
}

#[test]
fn a_decided_state_of_an_assembly_turned_over_is_caught() {
    let (mut holds, mut joints, mut members) = (0, 0, 0);
    for (model, result) in solved(450) {
        for (what, turned) in turned(&result) {
            let left = residuals(&model, &turned).largest();
            assert!(
                left > Residuals::LIMIT,
                "{what} passed with {left:e}: {result:#?}"
            );
            match what.split(' ').next() {
                Some("hold") => holds += 1,
                Some("gap") => joints += 1,
                _ => members += 1,
            }
        }
    }
    assert!(
        holds > 30 && joints > 30 && members > 100,
        "too few were tried: {holds} stops, {joints} joints, {members} members"
    );
}
