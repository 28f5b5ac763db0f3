//! Random assemblies against dense arithmetic and the enumeration of all states. The source of the
//! values is statics and compatibility written out as one linear system per state, in `dense.rs`.

use super::assembly::{Assembly, Body, Hold, HoldKind, Member, Segment, Vector, Way, plus, unit};
use super::dense::{Contact, Found, State, System};
use super::generator;
use crate::common::chain::Random;
use crate::common::checked;
use lengthwise::quantity::{Force, Length};
use lengthwise::result::{CombinationResult, JobResult, MemberState};

/// What came of the assemblies, so that the test cannot become empty unnoticed.
#[derive(Debug, Default)]
struct Tally {
    solved: usize,
    acting: usize,
    resting: usize,
    unsolvable: usize,
    unclear: usize,
    losses: usize,
    lost_too_much: usize,
}

/// To this share of the largest of a kind.
const NEAR: f64 = 1e-10;

/// Some of these assemblies move by far more than their members stretch.
const RESIDUAL: f64 = 1e-10;

fn run(coordinates: usize, seed: u64) {
    let mut random = Random(seed);
    let mut tally = Tally::default();
    for number in 0..2_000 {
        let mut assembly = generator::assembly(&mut random, coordinates);
        if number % 10 == 0 {
            let from = random.below(assembly.members.len());
            assembly.lose_each = (from..assembly.members.len()).take(3).collect();
        }
        let job = assembly.job();
        let result = checked("random.toml", &job);
        let about = format!("assembly {number} in {coordinates}");
        judge(&about, "intact", &assembly, &result, &mut tally);
        for &member in &assembly.lose_each {
            let less = assembly.without(member);
            let name = format!("loss/without=m{}", member + 1);
            let before = (tally.solved, tally.unsolvable);
            judge(&about, &name, &less, &result, &mut tally);
            tally.losses += tally.solved - before.0;
            tally.lost_too_much += tally.unsolvable - before.1;
        }
    }
    assert!(tally.solved >= 2_000, "{tally:?}");
    assert!(tally.acting >= 1_000 && tally.resting >= 1_000, "{tally:?}");
    assert!(tally.unsolvable >= 60, "{tally:?}");
    assert!(tally.unclear <= 100, "{tally:?}");
    assert!(
        tally.losses >= 300 && tally.lost_too_much >= 40,
        "{tally:?}"
    );
}

#[test]
fn states_and_values_in_one_coordinate_are_those_of_the_enumeration() {
    run(1, 20_261_201);
}

#[test]
fn states_and_values_in_two_coordinates_are_those_of_the_enumeration() {
    run(2, 20_261_202);
}

#[test]
fn states_and_values_in_three_coordinates_are_those_of_the_enumeration() {
    run(3, 20_261_203);
}

/// Whether a change of the drawing by some fifty roundings moves the answer by as much as is
/// compared: then two ways of computing it need not agree.
fn rounding_decides(assembly: &Assembly, system: &System, state: &State) -> bool {
    let mut nudged = assembly.clone();
    let mut random = Random(1);
    for point in &mut nudged.points {
        *point = point.map(|entry| entry * (1.0 + random.between(-1e-14, 1e-14)));
    }
    let Some((other, _)) = System::of(&nudged).state(&state.acts) else {
        return true;
    };
    let moved = |a: &[Vec<f64>], b: &[Vec<f64>]| {
        let pairs = a.iter().flatten().zip(b.iter().flatten());
        pairs.map(|(a, b)| (a - b).abs()).fold(0.0, f64::max)
    };
    moved(&state.force, &other.force) > NEAR * system.largest_force(state)
        || moved(&state.station, &other.station) > NEAR * system.largest_length(state)
}

/// One combination of a result against an assembly.
fn judge(about: &str, name: &str, assembly: &Assembly, result: &JobResult, tally: &mut Tally) {
    let system = System::of(assembly);
    let found = result.combinations.iter().find(|c| &*c.name == name);
    match system.enumerate() {
        Found::One(state) if rounding_decides(assembly, &system, &state) => tally.unclear += 1,
        Found::One(state) => {
            let combination = found.unwrap_or_else(|| {
                panic!(
                    "{about}: `{name}` is not solved: {:#?}\n{}",
                    result.errors,
                    assembly.job()
                )
            });
            compare(&format!("{about}, {name}"), &system, &state, combination);
            tally.solved += 1;
            let acting = state.acts.iter().filter(|&&a| a).count();
            tally.acting += acting;
            tally.resting += state.acts.len() - acting;
        }
        Found::None => {
            assert!(
                found.is_none(),
                "{about}: `{name}` has no state in balance, yet it was solved\n{}",
                assembly.job()
            );
            let named = |e: &lengthwise::result::ErrorEntry| e.combination.as_deref() == Some(name);
            assert!(
                result.errors.iter().any(named),
                "{about}: no error of `{name}`"
            );
            tally.unsolvable += 1;
        }
        Found::Unclear => tally.unclear += 1,
    }
}

/// Compares numbers of one kind.
struct Near<'a> {
    about: &'a str,
    system: &'a System<'a>,
    scale: f64,
}

impl Near<'_> {
    fn hold(&self, what: &str, found: f64, expected: f64) {
        assert!(
            (found - expected).abs() <= NEAR * self.scale,
            "{}: {what} is {found:e}, the enumeration has {expected:e} (largest {:e})\n{}",
            self.about,
            self.scale,
            self.system.assembly.job()
        );
    }

    fn vector(&self, what: &str, found: impl ExactSizeIterator<Item = f64>, expected: Vector) {
        assert_eq!(found.len(), self.system.assembly.coordinates, "{what}");
        for (found, expected) in found.zip(expected) {
            self.hold(what, found, expected);
        }
    }
}

/// Every displacement, elongation and gap, every force and rotation, and every state.
pub(super) fn compare(about: &str, system: &System, state: &State, found: &CombinationResult) {
    let assembly = system.assembly;
    let lengths = Near {
        about,
        system,
        scale: system.largest_length(state).max(1e-6),
    };
    let loads = system.bars.iter().map(|b| super::assembly::size(b.applied));
    let forces = Near {
        about,
        system,
        scale: loads.fold(system.largest_force(state), f64::max),
    };
    let turns = Near {
        about,
        system,
        scale: lengths.scale, // over 1 m
    };
    let acts = |contact: Contact| {
        let index = system.contacts.iter().position(|&c| c == contact);
        index.map(|i| (state.acts[i], state.clearance[i]))
    };
    for (i, point) in found.points.iter().enumerate() {
        let moved = point.displacement.iter().map(|u: &Length| u.value);
        lengths.vector(&point.name, moved, state.displacement[i]);
        let holds = assembly.holds.iter().zip(&state.reaction);
        let own: Vec<Vector> = holds
            .filter(|(h, _)| h.point == i)
            .map(|(_, &r)| r)
            .collect();
        match &point.reaction {
            Some(reaction) => {
                let sum = own.iter().fold([0.0; 3], |sum, &r| plus(sum, r));
                forces.vector(&point.name, reaction.iter().map(|r: &Force| r.value), sum);
            }
            None => assert!(own.is_empty(), "{about}: {} has a hold", point.name),
        }
    }
    for (i, body) in found.bodies.iter().enumerate() {
        let first = assembly.bodies[i].points[0];
        let moved = body.displacement.iter().map(|u| u.value);
        lengths.vector(&body.name, moved, state.displacement[first]);
        let turned = body.rotation.spatial().map(|a| a.value);
        let expected = match *state.rotation[i] {
            [x, y, z] => [x, y, z],
            [z] => [0.0, 0.0, z],
            _ => [0.0; 3],
        };
        for (found, expected) in turned.into_iter().zip(expected) {
            turns.hold(&body.name, found, expected);
        }
    }
    for (i, hold) in found.holds.iter().enumerate() {
        let reaction = hold.reaction.as_ref().expect("nothing is shared here");
        forces.vector(
            &hold.name,
            reaction.iter().map(|r| r.value),
            state.reaction[i],
        );
        if let HoldKind::Stop { .. } = assembly.holds[i].kind {
            let (bears, gap) = acts(Contact::Stop(i)).expect("a stop");
            assert_eq!(
                hold.bears,
                Some(bears),
                "{about}: {}\n{}",
                hold.name,
                assembly.job()
            );
            lengths.hold(&hold.name, hold.gap.expect("a stop has a gap").value, gap);
        }
    }
    assert_eq!(found.members.len(), assembly.members.len());
    for (i, member) in found.members.iter().enumerate() {
        let (taut, slack_by) = acts(Contact::Member(i)).unwrap_or((true, 0.0));
        let state_word = match (assembly.members[i].carries, taut) {
            (_, false) => MemberState::Slack,
            (Some(Way::Compression), true) => MemberState::Bearing,
            _ => MemberState::Taut,
        };
        assert_eq!(
            member.state,
            state_word,
            "{about}: {}\n{}",
            member.name,
            assembly.job()
        );
        assert_eq!(member.slack_by.is_some(), !taut, "{about}: {}", member.name);
        if let Some(found) = member.slack_by {
            lengths.hold(&member.name, found.value, slack_by);
        }
        let stations = &state.station[i];
        let stretch = match taut {
            true => stations[stations.len() - 1] - stations[0],
            false => system.bars[i].growth(),
        };
        lengths.hold(&member.name, member.elongation.value, stretch);
        along(&lengths, &forces, system, state, i, taut, member);
    }
    let totals = found.totals.as_ref().expect("an assembly has totals");
    let reactions = state.reaction.iter().fold([0.0; 3], |sum, &r| plus(sum, r));
    forces.vector(
        "totals",
        totals.reactions.iter().map(|r| r.value),
        reactions,
    );
    let against = reactions.map(|r| -r);
    forces.vector("totals", totals.applied.iter().map(|r| r.value), against);
    let most = found.residuals.largest();
    assert!(
        most <= RESIDUAL,
        "{about}: {:?}
{}",
        found.residuals,
        assembly.job()
    );
}

/// Stations and forces along a member.
fn along(
    lengths: &Near,
    forces: &Near,
    system: &System,
    state: &State,
    i: usize,
    taut: bool,
    member: &lengthwise::result::MemberResult,
) {
    let bar = &system.bars[i];
    assert_eq!(member.stations.len(), state.station[i].len());
    let last = member.stations.len() - 1;
    for (s, station) in member.stations.iter().enumerate() {
        if taut || s == 0 || s == last {
            lengths.hold(
                &station.name,
                station.displacement.value,
                state.station[i][s],
            );
        }
        let before = s.checked_sub(1).map(|e| match taut {
            true => state.force[i][e] - bar.elements[e].load,
            false => 0.0,
        });
        let after = (s < last).then(|| state.force[i][s]);
        for (found, expected) in [(station.force_before, before), (station.force_after, after)] {
            assert_eq!(found.is_some(), expected.is_some(), "{}", station.name);
            let (found, expected) = (found.map_or(0.0, |f| f.value), expected.unwrap_or(0.0));
            forces.hold(&station.name, found, expected);
        }
    }
    for (s, segment) in member.segments.iter().enumerate() {
        let elements = bar
            .elements
            .iter()
            .enumerate()
            .filter(|(_, e)| e.segment == s);
        let stretch: f64 = elements
            .map(|(e, element)| match taut {
                true => state.station[i][e + 1] - state.station[i][e],
                false => element.growth,
            })
            .sum();
        lengths.hold(&segment.name, segment.elongation.value, stretch);
        assert_eq!(segment.gap.is_some(), segment.bears.is_some());
        if let Some(gap) = segment.gap {
            let contact = system.contacts.iter().position(|&c| c == Contact::Gap(i));
            let contact = contact.expect("a gap acts one way");
            lengths.hold(&segment.name, gap.value, state.clearance[contact]);
            assert_eq!(segment.bears, Some(state.acts[contact]), "{}", member.name);
        }
    }
}

/// The enumeration itself, on published case P28 (S. S. Bhavikatti, Strength of Materials, example
/// 2.19: a stiff plate on four pillars, 20 kN at 0.6 and 0.4 of its sides), and with one pillar that
/// only pulls, so that the other three take by statics alone what they must.
#[test]
fn the_enumeration_finds_the_published_plate() {
    let mut plate = Assembly {
        coordinates: 3,
        forces: vec![(8, [0.0, 0.0, -20e3])],
        ..Assembly::default()
    };
    for [x, y] in [[0.0, 0.0], [1.0, 0.0], [1.0, 1.0], [0.0, 1.0]] {
        let foot = plate.points.len();
        plate.points.extend([[x, y, 0.0], [x, y, 3.0]]);
        plate.holds.push(Hold {
            point: foot,
            along: plate.every_direction(),
            kind: HoldKind::Fixed,
            movement: [0.0; 3],
        });
        plate.members.push(Member {
            ends: [foot, foot + 1],
            segments: vec![Segment::plain(3.0, 0.1, 20e9)],
            ..Member::default()
        });
    }
    plate.points.push([0.4, 0.6, 3.0]);
    plate.bodies.push(Body {
        points: vec![1, 3, 5, 7, 8],
        ..Body::default()
    });
    for (point, along) in [(1, unit(0)), (1, unit(1)), (3, unit(1))] {
        plate.holds.push(Hold {
            point,
            along: vec![along],
            kind: HoldKind::Fixed,
            movement: [0.0; 3],
        });
    }
    let forces = |plate: &Assembly| match System::of(plate).enumerate() {
        Found::One(state) => (
            state.force.iter().map(|f| f[0]).collect::<Vec<_>>(),
            state.acts,
        ),
        _ => panic!("one state is in balance"),
    };
    let expect = |found: Vec<f64>, expected: [f64; 4]| {
        for (found, expected) in found.into_iter().zip(expected) {
            approx::assert_relative_eq!(found, expected, max_relative = 1e-9);
        }
    };
    expect(forces(&plate).0, [-5e3, -3e3, -5e3, -7e3]);
    // Without B moments about the sides give C = 20·0.4, C + D = 20·0.6, and A takes the rest.
    plate.members[1].carries = Some(Way::Tension);
    let (found, acts) = forces(&plate);
    assert_eq!(acts, [false]);
    expect(found, [-8e3, 0.0, -8e3, -4e3]);
}
