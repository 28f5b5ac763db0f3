//! Assemblies in one, two and three coordinates, and which way is up in them.

use super::good::model;
use super::said;
use crate::model::{HoldKind, Watched};
use approx::assert_relative_eq;

/// Members between points, of one round segment of what is left.
fn bars(head: &str, between: &[(&str, &str)]) -> String {
    let mut text = head.to_owned();
    for (number, (points, more)) in between.iter().enumerate() {
        text.push_str(&format!(
            "[member.m{number}]\nbetween = [{points}]\nsegment = [{{ length = \"rest\", section = {{ \
             round = \"20 mm\" }}, material = \"steel-s355\" }}]\n{more}\n"
        ));
    }
    text
}

#[test]
fn three_coordinates() {
    let model = model(&bars(
        r#"
[point]
a = ["0 m", "0 m", "0 m"]
b = ["3 m", "4 m", "-12 m"]
c = ["0 m", "0 m", "2 ft"]
[body.deck]
points = ["a", "b"]
[[hold]]
point = "a"
along = ["z", [0, -2, 0]]
spring = "1 kN/mm"
[[load]]
body = "deck"
moment = ["1 kN m", "2 kN m", "3 kN m"]
[[watch]]
body = "deck"
[[watch]]
body = "deck"
about = [1, 0, 0]
rotation = ["-1 deg", "2 deg"]
"#,
        &[("\"a\", \"b\"", ""), ("\"c\", \"a\"", "")],
    ));
    let assembly = model.assembly.as_ref().unwrap();
    assert_eq!((assembly.coordinates, assembly.down), (3, [0.0, 0.0, -1.0]));
    // 3, 4, 12 is 13 long.
    let between = model.members[0].between.unwrap();
    for (part, expected) in between.direction.iter().zip([3.0, 4.0, -12.0]) {
        assert_relative_eq!(*part, expected / 13.0, max_relative = 1e-15);
    }
    assert_eq!(between.rise, between.direction[2]);
    let upright = model.members[1].between.unwrap();
    assert_eq!((upright.direction, upright.rise), ([0.0, 0.0, -1.0], -1.0));
    assert_eq!(model.members[1].length().value, 0.6096); // 2 ft
    let HoldKind::Spring { along, .. } = &assembly.holds[0].kind else {
        panic!("{:?}", assembly.holds);
    };
    assert_eq!(along[..], [[0.0, 0.0, 1.0], [0.0, -1.0, 0.0]]);
    let moment = assembly.actions.moments[0].moment.map(|part| part.value);
    assert_eq!(moment, [1e3, 2e3, 3e3]);
    let size = Watched::Rotation {
        body: 0,
        about: None,
    };
    assert_eq!(model.watches[0].of, size);
}

const LINE: &str = "[case.g]\nweight = 1\n[point]\na = [\"0 m\"]\nb = [\"2 m\"]\n";

#[test]
fn one_coordinate_runs_as_the_default_says() {
    let between = [("\"a\", \"b\"", ""), ("\"b\", \"a\"", "")];
    let up = model(&bars(
        &format!("{LINE}[default]\nruns = \"up\"\n"),
        &between,
    ));
    let assembly = up.assembly.as_ref().unwrap();
    assert_eq!((assembly.coordinates, assembly.down), (1, [-1.0, 0.0, 0.0]));
    let rises: Vec<f64> = up.members.iter().map(|member| member.rise()).collect();
    assert_eq!(rises, [1.0, -1.0]);
    let sloped = model(&bars(
        &format!("{LINE}[default]\nruns = \"-30 deg\"\n"),
        &between,
    ));
    let down = sloped.assembly.as_ref().unwrap().down;
    assert_relative_eq!(down[0], 0.5, max_relative = 1e-15); // sin 30°
    let runs = sloped.members[1].runs.unwrap();
    assert_relative_eq!(
        runs.value,
        std::f64::consts::FRAC_PI_6,
        max_relative = 1e-15
    );
}

#[test]
fn one_member_tells_which_way_one_coordinate_runs() {
    let between = [
        ("\"b\", \"a\"", "runs = \"down\""),
        (
            "\"a\", \"b\"",
            "load = [{ case = \"g\", at = \"1 m\", down = \"3 kN\" }]",
        ),
    ];
    let model = model(&bars(LINE, &between));
    assert_eq!(model.assembly.as_ref().unwrap().down, [-1.0, 0.0, 0.0]);
    let force = model.members[1].actions.forces[0];
    assert_eq!((force.force.value, force.across.value), (-3e3, 0.0));
}

#[test]
fn without_weight_one_coordinate_needs_no_up() {
    let points = "[point]\na = [\"0 m\"]\nb = [\"2 m\"]\n";
    let model = model(&bars(points, &[("\"a\", \"b\"", "")]));
    assert_eq!(model.assembly.as_ref().unwrap().down, [0.0; 3]);
    assert_eq!(model.members[0].rise(), 0.0);
}

#[test]
fn a_default_of_single_members_is_no_matter_of_those_between_points() {
    let head =
        "[default]\nruns = \"up\"\n[point]\na = [\"0 m\", \"0 m\"]\nb = [\"2 m\", \"0 m\"]\n";
    let model = model(&bars(head, &[("\"a\", \"b\"", "")]));
    assert_eq!(
        (model.members[0].rise(), model.members[0].runs),
        (0.0, None)
    );
}

#[test]
fn lengths_within_a_billionth_of_the_distance_are_sound() {
    let job = |length: &str| {
        format!(
            "[point]\na = [\"0 m\", \"0 m\"]\nb = [\"3 m\", \"4 m\"]\n[member.m]\nbetween = [\"a\", \"b\"]\n\
             segment = [{{ length = \"{length}\", section = {{ round = \"20 mm\" }}, material = \
             \"steel-s355\" }}]\n"
        )
    };
    assert_eq!(said(&job("5.000000004 m")), "");
    assert!(said(&job("5.000000006 m")).contains("too long"));
}

#[test]
fn a_copy_takes_between_like_any_key() {
    let job = bars(
        "[point]\na = [\"0 m\", \"0 m\"]\nb = [\"2 m\", \"0 m\"]\n[member.s]\nsegment = [{ length = \"2 m\", \
         section = { round = \"20 mm\" }, material = \"steel-s355\" }]\nsupport = [{ at = \"start\", \
         spring = \"1 kN/mm\" }]\n[member.copy]\nlike = \"s\"\nbetween = [\"a\", \"b\"]\nsupport = []\n\
         [member.twin]\nlike = \"m0\"\n",
        &[("\"b\", \"a\"", "")],
    );
    let model = model(&job);
    let ends: Vec<Option<(usize, usize)>> = model
        .members
        .iter()
        .map(|member| member.between.map(|between| (between.start, between.end)))
        .collect();
    assert_eq!(ends, [None, Some((0, 1)), Some((1, 0)), Some((1, 0))]);
}

#[test]
fn points_that_nothing_uses_get_a_caution() {
    let spare: String = (0..10)
        .map(|n| format!("p{n} = [\"{n} m\", \"0 m\"]\n"))
        .collect();
    let head = format!("[point]\na = [\"0 m\", \"0 m\"]\nb = [\"2 m\", \"0 m\"]\n{spare}");
    let job = bars(&head, &[("\"a\", \"b\"", "")]);
    let model = model(&job);
    let [remark] = &model.remarks[..] else {
        panic!("{:?}", model.remarks);
    };
    assert_eq!(
        remark.text,
        "no member, body or hold uses the points `p0`, `p1`, `p2`, `p3`, `p4`, `p5`, `p6`, `p7` and 2 \
         more"
    );
    assert_eq!((remark.about.as_str(), remark.caution), ("point.p0", true));
}

#[test]
fn two_points_at_one_place_and_a_body_of_one_are_sound() {
    let head = "[point]\na = [\"0 m\", \"0 m\"]\nb = [\"2 m\", \"0 m\"]\nc = [\"2 m\", \"0 m\"]\n\
                [body.pin]\npoints = [\"c\"]\n";
    let model = model(&bars(head, &[("\"a\", \"b\"", "")]));
    assert_eq!(
        model
            .assembly
            .map(|assembly| assembly.bodies[0].points.clone()),
        Some(vec![2])
    );
}

/// A tower of bodies with members between: the cost must grow in line with their number, which a
/// quadratic step would show as minutes.
#[test]
fn many_members_between_points_are_read_in_one_go() {
    let mut text = String::from("[point]\n");
    let floors = 12_500;
    for floor in 0..=floors {
        for corner in 0..8 {
            text.push_str(&format!(
                "f{floor}c{corner} = [\"{corner} m\", \"{floor} m\"]\n"
            ));
        }
    }
    for floor in 0..floors {
        text.push_str(&format!("[body.floor{floor}]\npoints = ["));
        for corner in 0..8 {
            text.push_str(&format!("\"f{floor}c{corner}\", "));
        }
        text.push_str("]\n");
        for corner in 0..8 {
            let above = floor + 1;
            text.push_str(&format!(
                "[member.m{floor}c{corner}]\nbetween = [\"f{above}c{corner}\", \"f{floor}c{corner}\"]\n\
                 segment = [{{ length = \"rest\", section = {{ area = \"1 cm2\" }}, material = \
                 \"steel-s355\" }}]\n"
            ));
        }
    }
    text.push_str("[[hold]]\npoints = [");
    for corner in 0..8 {
        text.push_str(&format!("\"f{floors}c{corner}\", "));
    }
    text.push_str("]\n");
    let model = model(&text);
    assert_eq!(model.members.len(), 8 * floors);
    assert!(model.members.iter().all(|member| member.rise() == -1.0));
}

/// Nothing but faults, of which each looks for a name among all.
#[test]
fn many_unknown_points_are_told_in_time() {
    let mut text = String::from("[point]\n");
    for number in 0..50_000 {
        text.push_str(&format!("p{number} = [\"{number} m\"]\n"));
    }
    text.push_str("[body.b]\npoints = [");
    for number in 0..50_000 {
        text.push_str(&format!("\"q{number}\",\n"));
    }
    text.push_str("]\n[[hold]]\nname = \"p7\"\npoint = \"p7\"\n");
    let said = said(&text);
    assert_eq!(said.lines().count(), 50_002); // a job needs a member
    assert!(
        said.contains("a hold is called `p7`, and so is a point in line 9"),
        "{}",
        &said[..80]
    );
}
