//! Random members with stops and gap segments, against an enumeration of all states of these in
//! dense arithmetic (a general linear-algebra crate). The source of the values is statics and
//! compatibility written out as one linear system per state, in `states/dense.rs`.

mod common;
#[path = "states/dense.rs"]
mod dense;

use common::chain::{At, Chain, Hold, Kind, Random, Segment, Support};
use common::{checked, only_member, random_member};
use dense::{Found, State, enumerate};
use lengthwise::result::{JobResult, JobStatus};

/// What came of the members, so that the test cannot become empty unnoticed.
#[derive(Debug, Default)]
struct Tally {
    solved: usize,
    with_contact: usize,
    unsolvable: usize,
    touching: usize,
}

#[test]
fn states_and_values_are_those_of_the_enumeration() {
    let mut random = Random(20_260_101);
    let mut tally = Tally::default();
    for number in 0..2_000 {
        let chain = random_member::member(&mut random);
        let job = chain.job();
        let result = checked("random.toml", &job);
        match enumerate(&chain) {
            Found::One(state) => {
                assert!(
                    result.status != JobStatus::Error,
                    "member {number}: {:#?}\n{job}",
                    result.errors
                );
                compare(number, &chain, &result, &state);
                tally.solved += 1;
                tally.with_contact += usize::from(state.bears.iter().any(|&b| b));
            }
            Found::None => {
                assert!(
                    result.status == JobStatus::Error,
                    "member {number} has no state in balance, yet it was solved\n{job}"
                );
                tally.unsolvable += 1;
            }
            Found::Touching => tally.touching += 1,
        }
    }
    assert!(tally.solved >= 1_500, "{tally:?}");
    assert!(tally.with_contact >= 1_000, "{tally:?}");
    assert!(tally.unsolvable >= 50, "{tally:?}");
    assert!(tally.touching <= 20, "{tally:?}");
}

/// Displacements, gaps and stretches, and forces, each to 1e-11 of the largest of its kind.
fn compare(number: usize, chain: &Chain, result: &JobResult, state: &State) {
    let member = only_member(result);
    let largest = |values: &[f64]| values.iter().fold(0.0f64, |m, v| m.max(v.abs()));
    let lengths = [
        &state.displacement,
        &state.stretch_parts,
        &state.support_gap,
        &state.joint_gap,
    ];
    // Where nothing moves by a micrometre, rounding is held against that.
    let length_scale = lengths.map(|l| largest(l)).into_iter().fold(1e-6, f64::max);
    let force_scale = largest(&state.force_before).max(largest(&state.reaction));
    let near = |what: &str, found: f64, expected: f64, scale: f64| {
        assert!(
            (found - expected).abs() <= 1e-11 * scale,
            "member {number}: {what} is {found:e}, the enumeration has {expected:e}\n{}",
            chain.job()
        );
    };

    assert_eq!(member.stations.len(), state.displacement.len());
    for (i, station) in member.stations.iter().enumerate() {
        let name = &station.name;
        near(
            name,
            station.displacement.value,
            state.displacement[i],
            length_scale,
        );
        for (found, expected) in [
            (station.force_before, state.force_before[i]),
            (station.force_after, state.force_after[i]),
        ] {
            near(name, found.map_or(0.0, |f| f.value), expected, force_scale);
        }
    }
    let last = state.displacement.len() - 1;
    let elongation = state.displacement[last] - state.displacement[0];
    near(
        "elongation",
        member.elongation.value,
        elongation,
        length_scale,
    );

    for (i, support) in member.supports.iter().enumerate() {
        let reaction = support
            .reaction
            .expect("nothing is shared in these members");
        near(
            &support.name,
            reaction.value,
            state.reaction[i],
            force_scale,
        );
        if let Hold::Stop { .. } = chain.supports[i].kind {
            let gap = support.gap.expect("a stop has a gap");
            near(&support.name, gap.value, state.support_gap[i], length_scale);
            assert_eq!(
                support.bears,
                Some(state.bears[i]),
                "member {number}: {support:?}"
            );
        }
    }
    for (i, segment) in member.segments.iter().enumerate() {
        if let Kind::Gap { .. } = chain.segments[i].kind {
            let gap = segment.gap.expect("a gap segment has a gap");
            near(&segment.name, gap.value, state.joint_gap[i], length_scale);
            let closed = state.bears[chain.supports.len() + i];
            assert_eq!(segment.bears, Some(closed), "member {number}: {segment:?}");
        }
    }
}

/// The enumeration itself, on published case P13 (Hibbeler, Mechanics of Materials: the rod of 10 mm
/// whose end stands 0.2 mm short of a wall), and with the wall too far away to be met.
#[test]
fn the_enumeration_finds_the_published_wall() {
    let solid = |length| Segment {
        length,
        kind: Kind::Solid {
            area: [std::f64::consts::FRAC_PI_4 * 1e-4; 2],
            modulus: 200e9,
            expansion: 0.0,
        },
        line: [0.0; 2],
        warming: [0.0; 2],
        misfit: 0.0,
    };
    for (clearance, bears, wall) in [(0.2e-3, true, -4_048.672_789), (2e-3, false, 0.0)] {
        let wall_kind = Hold::Stop {
            clearance,
            toward_end: true,
            stiffness: None,
        };
        let support = |at, kind| Support {
            at,
            kind,
            movement: 0.0,
        };
        let rod = Chain {
            segments: vec![solid(0.4), solid(0.8)],
            supports: vec![
                support(At::Joint(0), Hold::Fixed),
                support(At::Joint(2), wall_kind),
            ],
            forces: vec![(At::Joint(1), 20e3)],
        };
        let Found::One(state) = enumerate(&rod) else {
            panic!("one state is in balance");
        };
        assert_eq!(state.bears[1], bears);
        approx::assert_relative_eq!(state.reaction[1], wall, max_relative = 1e-9);
        approx::assert_relative_eq!(state.reaction[0], -20e3 - wall, max_relative = 1e-9);
    }
}
