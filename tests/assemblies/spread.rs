//! Stiffnesses ten to the ninth apart in one assembly: residuals at rounding, and values against
//! solutions known exactly and against equations refined in doubled precision.

use super::assembly::{Assembly, HoldKind, Kind, Vector, size};
use super::dense::System;
use super::generator;
use super::outcome::Outcome;
use crate::common::chain::Random;
use crate::common::{Values, checked, solved};
use approx::assert_relative_eq;
use lengthwise::result::JobStatus;

const HEAD: &str = "[material.m]\nmodulus = \"100 GPa\"\nsource = \"round numbers\"\n";

/// A residual above this is not rounding.
const ROUNDING: f64 = 1e-12;

/// A stiff and a soft bar side by side share a force as 10⁹ to 1: both are right to their own last
/// digits, and so is the soft one hung below them.
#[test]
fn parallel_bars_share_by_their_stiffness() {
    let job = format!(
        r#"{HEAD}
        [point]
        a = ["0 m"]
        b = ["1 m"]
        c = ["2 m"]
        [member.stiff]
        between = ["a", "b"]
        segment = [{{ length = "rest", stiffness = "1e12 N/m" }}]
        [member.soft]
        between = ["a", "b"]
        segment = [{{ length = "rest", stiffness = "1e3 N/m" }}]
        [member.below]
        between = ["b", "c"]
        segment = [{{ length = "rest", stiffness = "1e3 N/m" }}]
        [[hold]]
        point = "a"
        [[load]]
        point = "c"
        force = ["1 kN"]
        "#
    );
    let result = solved("spread.toml", &job);
    let values = Values::of(&result);
    // 1e12 and 1e3 side by side are 1.000000001e12 N/m.
    let shared = 1e3 / 1.000_000_001e12;
    let near = |address: &str, expected: f64| {
        assert_relative_eq!(values.get(address), expected, max_relative = 1e-14);
    };
    near("stiff.force_max", 1e12 * shared);
    near("soft.force_max", 1e3 * shared);
    near("below.force_max", 1e3);
    near("b.displacement.x", shared);
    near("c.displacement.x", 1.0 + shared);
    near("stiff.elongation", shared);
    assert!(result.combinations[0].residuals.largest() <= ROUNDING);
}

/// A lever on a stiff and a soft post, the soft one at ten times the arm: N by compatibility is
/// known exactly, each to its own digits.
#[test]
fn a_lever_on_a_stiff_and_a_soft_post() {
    let job = format!(
        r#"{HEAD}
        [point]
        pin = ["0 m", "0 m"]
        near = ["1 m", "0 m"]
        far = ["10 m", "0 m"]
        top-near = ["1 m", "1 m"]
        top-far = ["10 m", "1 m"]
        [body.lever]
        points = ["far", "near", "pin"]
        [member.stiff]
        between = ["top-near", "near"]
        segment = [{{ length = "rest", stiffness = "1e12 N/m" }}]
        [member.soft]
        between = ["top-far", "far"]
        segment = [{{ length = "rest", stiffness = "1e3 N/m" }}]
        [[hold]]
        points = ["pin", "top-near", "top-far"]
        [[load]]
        point = "far"
        force = ["0 kN", "-1 kN"]
        "#
    );
    let result = solved("spread.toml", &job);
    let values = Values::of(&result);
    // Moments about the pin: 1·1e12·θ + 10·1e3·10·θ = 10·1e3.
    let turn = 1e4 / (1e12 + 1e5);
    let near = |address: &str, expected: f64| {
        assert_relative_eq!(values.get(address), expected, max_relative = 1e-14);
    };
    near("lever.rotation", -turn);
    near("stiff.force_max", 1e12 * turn);
    near("soft.force_max", 1e4 * turn);
    near("far.displacement.y", -10.0 * turn);
    assert!(result.combinations[0].residuals.largest() <= ROUNDING);
}

/// Multiplies every stiffness by its own power of ten, 9 powers apart at most, and leaves the loads.
fn spread(random: &mut Random, assembly: &mut Assembly) {
    let mut power =
        |stiffness: &mut f64| *stiffness *= random.size(10f64.powf(-4.5), 10f64.powf(4.5));
    for member in &mut assembly.members {
        let mut share = 1.0;
        power(&mut share);
        member.carries = None;
        for segment in &mut member.segments {
            match &mut segment.kind {
                Kind::Solid(layers) => layers.iter_mut().for_each(|l| l.modulus *= share),
                Kind::Part(stiffness) => *stiffness *= share,
                Kind::Gap(_) => {}
            }
        }
    }
    for hold in &mut assembly.holds {
        if let HoldKind::Spring(stiffness) = &mut hold.kind {
            power(stiffness);
        }
    }
    assembly
        .members
        .retain(|m| !m.segments.iter().any(|s| matches!(s.kind, Kind::Gap(_))));
    assembly
        .holds
        .retain(|h| !matches!(h.kind, HoldKind::Stop { .. }));
}

/// Random assemblies, against the same equations refined with residuals of doubled precision.
#[test]
fn random_assemblies_ten_to_the_ninth_apart() {
    let mut random = Random(21);
    let mut compared = 0;
    for number in 0..300 {
        let mut assembly = generator::assembly(&mut random, 1 + number % 3);
        spread(&mut random, &mut assembly);
        let system = System::of(&assembly);
        let Some((state, _)) = system.state(&[]) else {
            continue;
        };
        let result = checked("spread.toml", &assembly.job());
        assert!(
            result.status != JobStatus::Error,
            "{:#?}\n{}",
            result.errors,
            assembly.job()
        );
        let residual = result.combinations[0].residuals.largest();
        assert!(residual <= ROUNDING, "{residual:e}\n{}", assembly.job());
        let found = Outcome::of_first(&result);
        let largest = |vectors: &[Vector]| vectors.iter().map(|&v| size(v)).fold(1e-9, f64::max);
        let (length, force) = (largest(&state.displacement), system.largest_force(&state));
        let lists = [
            (&found.displacement, &state.displacement, length),
            (&found.reaction, &state.reaction, force),
        ];
        for (found, expected, scale) in lists {
            for (found, expected) in found.iter().zip(expected) {
                for (found, expected) in found.iter().zip(expected) {
                    assert!(
                        (found - expected).abs() <= 1e-9 * scale,
                        "{found:e} against {expected:e} of {scale:e}\n{}",
                        assembly.job()
                    );
                }
            }
        }
        compared += 1;
    }
    assert!(compared >= 250, "{compared}");
}

/// A part that is soft beside the force lets much count as a touch for the states; a clearance is
/// told as it is all the same, since the bodies do not move.
#[test]
fn a_small_clearance_beside_a_soft_member_is_told() {
    let job = r#"
        [point]
        pin = ["0 m", "0 m"]
        tip = ["3 m", "0 m"]
        eye = ["1 m", "0 m"]
        above = ["1 m", "3 m"]
        [body.lever]
        points = ["pin", "tip", "eye"]
        [member.soft]
        between = ["above", "eye"]
        segment = [{ length = "rest", stiffness = "1 N/m" }]
        [[hold]]
        points = ["pin", "above"]
        [[hold]]
        name = "below"
        point = "tip"
        along = ["-y"]
        stop = "0 mm"
        [[hold]]
        name = "over"
        point = "tip"
        along = ["+y"]
        stop = "0.0001 mm"
        [[load]]
        point = "tip"
        force = ["0 N", "-5000 kN"]
    "#;
    let result = solved("soft.toml", job);
    let holds = &result.combinations[0].holds;
    let hold = |name: &str| holds.iter().find(|hold| &*hold.name == name).unwrap();
    assert_eq!(hold("below").bears, Some(true));
    assert_eq!(hold("over").bears, Some(false));
    assert_relative_eq!(hold("over").gap.unwrap().value, 1e-7, max_relative = 1e-12);
    assert!(result.combinations[0].residuals.largest() <= ROUNDING);
}

/// What floats beside an open gap carries nothing at all, and no rounding of what moves it.
#[test]
fn a_run_beside_an_open_gap_carries_exactly_nothing() {
    let job = format!(
        r#"{HEAD}
        [point]
        left = ["0 m"]
        right = ["3 m"]
        [member.rod]
        between = ["left", "right"]
        segment = [
          {{ length = "0.7 m", section = {{ area = "3 cm2" }}, material = "m" }},
          {{ name = "play", gap = "0.3 mm" }},
          {{ length = "rest", section = {{ area = "3 cm2" }}, material = "m" }},
        ]
        load = [{{ misfit = "-0.13 mm" }}]
        [[hold]]
        name = "ends"
        points = ["left", "right"]
        [[load]]
        hold = "ends"
        movement = ["0.11 mm"]
        "#
    );
    let result = solved("gap.toml", &job);
    let rod = &result.combinations[0].members[0];
    assert_eq!(rod.force_max.value, 0.0);
    assert_eq!(rod.force_min.value, 0.0);
    assert_relative_eq!(
        rod.segments[1].gap.unwrap().value,
        0.43e-3,
        max_relative = 1e-12
    );
}
