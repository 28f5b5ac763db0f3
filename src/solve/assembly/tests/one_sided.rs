//! One-way members, stops and gaps.

use super::drawn::{X, Y, Z, all_close, bar, close, drawn};
use crate::model::Carries;
use crate::result::MemberState;

/// A hanger on a rope: the rope is weightless between its ends, its top carries all of it.
#[test]
fn a_rope_carries_its_own_weight_at_its_top() {
    let text = "[member.rope]\nruns = \"level\"\nsegment = [\
        { length = \"8 m\", section = { area = \"2 cm2\" }, material = \"steel-s355\", mass = \"5 kg/m\" }]\n\
        load = [{ weight = 1.0 }]\n";
    let drawing = drawn(3, text)
        .point("top", [0.0, 0.0, 8.0])
        .point("foot", [0.0; 3])
        .tie("rope", "top", "foot")
        .carries("rope", Carries::Tension)
        .fixed("top", &[X, Y, Z])
        .force("foot", [0.0, 0.0, -1000.0]);
    let solution = drawing.solve();
    let weight = 40.0 * 9.80665;
    let rope = &solution.members[0].1;
    assert_eq!(rope.state, MemberState::Taut);
    close(rope.segments[0].force_start.value, 1000.0 + weight, 1000.0);
    close(rope.segments[0].force_end.value, 1000.0, 1000.0);
    close(solution.reaction("top")[2], 1000.0 + weight, 1000.0);
    let modulus = drawing.model.materials[0].modulus.value;
    let stretch = (1000.0 + weight / 2.0) * 8.0 / (modulus * 2e-4);
    close(rope.elongation.value, stretch, stretch);
    close(solution.displacement("foot")[2], -stretch, stretch);
}

/// A pair of ropes that pull against each other: pushed one way, the other goes slack by as much.
#[test]
fn the_rope_that_is_pushed_goes_slack() {
    let text = bar("a", "1 m", "2 kN/mm", "") + &bar("b", "1 m", "2 kN/mm", "");
    let solution = drawn(1, &text)
        .point("left", [0.0; 3])
        .point("mid", X)
        .point("right", [2.0, 0.0, 0.0])
        .tie("a", "left", "mid")
        .tie("b", "mid", "right")
        .carries("a", Carries::Tension)
        .carries("b", Carries::Tension)
        .fixed("left", &[X])
        .fixed("right", &[X])
        .force("mid", [3000.0, 0.0, 0.0])
        .solve();
    close(solution.force("a"), 3000.0, 3000.0);
    let slack = &solution.members[1].1;
    assert_eq!(slack.state, MemberState::Slack);
    assert_eq!(slack.segments[0].force_start.value, 0.0);
    close(slack.slack_by.expect("it is slack").value, 1.5e-3, 1.5e-3);
    assert_eq!(slack.elongation.value, 0.0);
    close(slack.stations[1].displacement.value, 0.0, 1e-3);
    close(slack.stations[0].displacement.value, 1.5e-3, 1e-3);
}

/// The same with props: the one that is pushed bears.
#[test]
fn the_prop_that_is_pushed_bears() {
    let text = bar("a", "1 m", "2 kN/mm", "") + &bar("b", "1 m", "2 kN/mm", "");
    let solution = drawn(1, &text)
        .point("left", [0.0; 3])
        .point("mid", X)
        .point("right", [2.0, 0.0, 0.0])
        .tie("a", "left", "mid")
        .tie("b", "mid", "right")
        .carries("a", Carries::Compression)
        .carries("b", Carries::Compression)
        .fixed("left", &[X])
        .fixed("right", &[X])
        .force("mid", [3000.0, 0.0, 0.0])
        .solve();
    let [(_, a), (_, b)] = &solution.members[..] else {
        panic!("two members");
    };
    assert_eq!(
        (a.state, b.state),
        (MemberState::Slack, MemberState::Bearing)
    );
    close(b.segments[0].force_start.value, -3000.0, 3000.0);
    close(a.slack_by.expect("it is slack").value, 1.5e-3, 1.5e-3);
}

/// A strut with a joint of 2 mm in it beside a strut without: the joint closes at 2 mm, and what
/// is beyond that is shared.
#[test]
fn a_gap_inside_a_member_closes() {
    let text = "[member.jointed]\nsegment = [\
        { name = \"p\", length = \"1 m\", stiffness = \"8 kN/mm\" },\
        { name = \"joint\", gap = \"2 mm\" },\
        { name = \"q\", length = \"1 m\", stiffness = \"8 kN/mm\" }]\n"
        .to_owned()
        + &bar("plain", "2.002 m", "1 kN/mm", "");
    let drawing = |force: f64| {
        drawn(1, &text)
            .point("foot", [0.0; 3])
            .point("head", [2.002, 0.0, 0.0])
            .tie("jointed", "foot", "head")
            .tie("plain", "foot", "head")
            .fixed("foot", &[X])
            .force("head", [force, 0.0, 0.0])
    };
    let closed = drawing(-12_000.0).solve();
    // plain: 1 kN/mm; jointed once closed: 4 kN/mm beyond 2 mm. 12 = u + 4 (u − 2), u = 4 mm.
    close(closed.displacement("head")[0], -4e-3, 4e-3);
    close(closed.force("jointed"), -8000.0, 12_000.0);
    close(closed.force("plain"), -4000.0, 12_000.0);
    let joint = &closed.members[0].1.segments[1];
    assert_eq!(joint.bears, Some(true));
    close(joint.elongation.value, -2e-3, 2e-3);
    let open = drawing(-1500.0).solve();
    close(open.force("plain"), -1500.0, 1500.0);
    let joint = &open.members[0].1.segments[1];
    assert_eq!((joint.bears, joint.force_start.value), (Some(false), 0.0));
    close(joint.gap.expect("it is a gap").value, 0.5e-3, 2e-3);
    assert!(open.free.is_empty());
    let pulled = drawing(1500.0).solve();
    close(
        pulled.members[0].1.segments[1].gap.expect("a gap").value,
        3.5e-3,
        3e-3,
    );
}

/// A beam on a spring at one end that comes to rest on a stop at the other.
#[test]
fn a_stop_bears_once_its_clearance_is_used_up() {
    let text = bar("a", "1 m", "1 kN/mm", "") + &bar("b", "1 m", "1 kN/mm", "");
    let drawing = |force: f64| {
        drawn(2, &text)
            .point("la", [0.0, 1.0, 0.0])
            .point("lb", [4.0, 1.0, 0.0])
            .point("a", [0.0; 3])
            .point("b", [4.0, 0.0, 0.0])
            .body("beam", &["a", "b"])
            .tie("a", "la", "a")
            .tie("b", "lb", "b")
            .fixed("la", &[X, Y])
            .fixed("lb", &[X, Y])
            .fixed("a", &[X])
            .stop("b", [0.0, -1.0, 0.0], 3e-3)
            .force("b", [0.0, -force, 0.0])
            .solve()
    };
    let bears = drawing(10_000.0);
    close(bears.force("b"), 3000.0, 10_000.0);
    all_close(&bears.reaction("b"), &[0.0, 7000.0], 10_000.0);
    let stop = bears.holds.last().expect("the stop");
    assert_eq!(
        (stop.bears, stop.gap.map(|gap| gap.value)),
        (Some(true), Some(0.0))
    );
    let open = drawing(1000.0);
    let stop = open.holds.last().expect("the stop");
    assert_eq!(stop.bears, Some(false));
    close(stop.gap.expect("a stop").value, 2e-3, 3e-3);
}

/// A platform on three ropes and a fourth: its weight on the line through two of them leaves the
/// others without force, on the point of tipping.
#[test]
fn a_weight_on_the_line_of_two_ropes_is_on_the_point_of_tipping() {
    let text: String = (0..3)
        .map(|i| bar(&format!("H{i}"), "3 m", "5 kN/mm", ""))
        .collect();
    let mut drawing = drawn(3, &text);
    let corners = [(1.0, 1.0), (-1.0, -1.0), (1.0, -1.0)];
    for (i, (x, y)) in corners.into_iter().enumerate() {
        drawing = drawing
            .point(&format!("top{i}"), [x, y, 3.0])
            .point(&format!("foot{i}"), [x, y, 0.0]);
    }
    drawing = drawing.body("deck", &["foot0", "foot1", "foot2"]);
    for i in 0..3 {
        let (top, foot) = (format!("top{i}"), format!("foot{i}"));
        drawing = drawing
            .tie(&format!("H{i}"), &top, &foot)
            .carries(&format!("H{i}"), Carries::Tension)
            .fixed(&top, &[X, Y, Z]);
    }
    let drawing = drawing
        .fixed("foot0", &[X, Y])
        .fixed("foot2", &[X])
        .mass(1000.0, [0.0; 3]);
    let solution = drawing.solve();
    let half = 500.0 * 9.80665;
    close(solution.force("H0"), half, half);
    close(solution.force("H1"), half, half);
    let third = &solution.members[2].1;
    assert_eq!(third.state, MemberState::Slack);
    assert_eq!(third.slack_by.map(|by| by.value), Some(0.0));
    assert_eq!(
        drawing.free(),
        ["body `deck` can turn about the line through `foot0` and `foot1`; H2"]
    );
}
