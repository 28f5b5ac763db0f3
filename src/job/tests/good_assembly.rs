//! Assemblies without faults: points, what lies between them, bodies, holds, loads and watches.

use super::good::model;
use crate::model::{
    Assembly, Bounds, Carries, HoldKind, LimitKind, Model, Purpose, Reads, Target, Watched,
};
use crate::quantity::{Length, from_si};
use approx::assert_relative_eq;

/// The assembly of the page on the job file, with what it leaves out.
pub(super) const BEAM: &str = r#"
[case.dead]
weight = 1.0
[case.live]
[case.settle]
[combination.service]
factors = { dead = 1.0, live = [0.0, 1.0] }
lose-each = ["east", "west"]
[combination.strength]
factors = { dead = 1.35, live = 1.5, settle = 1.0 }
without = ["spare"]

[point]
left = ["0 m", "3 m ± 2 mm"]
right = ["4.2 m", "3 m"]
a = ["0 m", "0 m"]
b = ["4.2 m", "0 m"]
lug = ["2.8 m", "0 m"]

[body.beam]
points = ["a", "lug", "b"]
mass = "320 kg"
at = ["2.1 m", "0 m"]

[default]
limit = { slack = false }

[member.west]
between = ["left", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[member.east]
like = "west"
between = ["right", "b"]
carries = "tension"
[member.spare]
between = ["lug", "left"]
segment = [
  { name = "rope", length = "rest", section = { area = "2 cm2" }, material = "steel-s355" },
  { name = "lug", length = "0.1 m", section = { area = "2 cm2" }, material = "steel-s355" },
]
load = [{ case = "live", at = "1 m", down = "10 kN" }]
[member.alone]
start = "fixed"
runs = "down"
segment = [{ length = "3 m", section = { round = "20 mm" }, material = "steel-s355" }]

[[hold]]
point = "left"
[[hold]]
name = "east anchor"
point = "right"
limit = { reaction = "60 kN" }
[[hold]]
name = "guides"
points = ["a", "b"]
along = ["x"]
spring = "3 kN/mm"
limit = { reaction = ["-4 kN", "5 kN"] }
[[hold]]
name = "kerb"
point = "b"
along = [[3, 4]]
stop = "2.5 mm"
stiffness = "400 kN/mm"
limit = [{ gap = { min = "0.5 mm" } }, { bears = true, in = "service" }]

[[load]]
name = "crate"
point = "lug"
force = { live = ["0 kN", "-25 kN"], dead = ["1 kN", "-2 kN"] }
[[load]]
case = "live"
body = "beam"
force = ["3 kN", "0 kN"]
[[load]]
case = "live"
body = "beam"
moment = "4 kN m"
[[load]]
case = "settle"
hold = "east anchor"
movement = ["0 mm", "-3 mm"]
[[load]]
case = "settle"
hold = "kerb"
movement = ["3 mm", "4 mm"]

[[watch]]
name = "lug level"
point = "lug"
along = "-y"
limit = ["-1 mm", "4 mm"]
since = "strength"
in = "strength"
source = "contract 4.2"
[[watch]]
body = "beam"
rotation = "0.1 deg"
[[watch]]
point = "a"
relative-to = "b"
limit = "2 mm"
[[watch]]
station = "spare.1.5 m"
relative-to = "alone.end"
limit = "6 mm"
"#;

fn assembly(model: &Model) -> &Assembly {
    model.assembly.as_ref().unwrap()
}

fn metres(values: [f64; 3]) -> [Length; 3] {
    values.map(from_si)
}

#[test]
fn the_space_of_the_points_is_read() {
    let model = model(BEAM);
    let assembly = assembly(&model);
    assert_eq!(assembly.coordinates, 2);
    assert_eq!(assembly.down, [0.0, -1.0, 0.0]);
    let names: Vec<&str> = assembly.points.iter().map(|point| &*point.name).collect();
    assert_eq!(names, ["left", "right", "a", "b", "lug"]);
    assert_eq!(assembly.points[4].at, metres([2.8, 0.0, 0.0]));
    assert_eq!(&BEAM[assembly.points[1].place.clone()], "right");
    // The tolerance of a coordinate keeps its place.
    let tolerances: Vec<&str> = model
        .tolerances
        .iter()
        .map(|at| &BEAM[at.clone()])
        .collect();
    assert_eq!(tolerances, ["\"3 m ± 2 mm\""]);
    let body = &assembly.bodies[0];
    assert_eq!(body.points, [2, 4, 3]);
    assert_eq!(body.mass.map(|mass| mass.value), Some(320.0));
    assert_eq!(body.centre, Some(metres([2.1, 0.0, 0.0])));
    assert!(model.remarks.is_empty(), "{:?}", model.remarks);
}

#[test]
fn members_lie_between_their_points() {
    let model = model(BEAM);
    let [west, east, spare, alone] = &model.members[..] else {
        panic!("four members");
    };
    let between = west.between.unwrap();
    assert_eq!((between.start, between.end), (0, 2));
    assert_eq!(between.direction, [0.0, -1.0, 0.0]);
    assert_eq!((between.rise, west.runs, west.carries), (-1.0, None, None));
    assert_eq!(west.length().value, 3.0);
    assert!(west.supports.is_empty());
    // A copy lies between its own points.
    assert_eq!(east.between.map(|between| between.start), Some(1));
    assert_eq!(east.carries, Some(Carries::Tension));
    // From (2.8, 0) to (0, 3): √(2.8² + 3²) m long, of which the rope has all but 0.1 m.
    let long = (2.8f64 * 2.8 + 9.0).sqrt();
    assert_relative_eq!(spare.length().value, long, max_relative = 1e-15);
    let rope = spare.segments[0].length.value;
    assert_relative_eq!(rope, long - 0.1, max_relative = 1e-15);
    let names: Vec<&str> = spare
        .stations
        .iter()
        .map(|station| &*station.name)
        .collect();
    assert_eq!(names, ["start", "1 m", "1.5 m", "rope.end", "end"]);
    let down = spare.actions.forces[0];
    assert_relative_eq!(down.force.value, -10e3 * 3.0 / long, max_relative = 1e-14);
    assert_relative_eq!(down.across.value, 10e3 * 2.8 / long, max_relative = 1e-14);
    assert!(alone.between.is_none() && alone.supports.len() == 1);
}

#[test]
fn holds_answer_along_unit_vectors() {
    let model = model(BEAM);
    let holds = &assembly(&model).holds;
    let names: Vec<&str> = holds.iter().map(|hold| &*hold.name).collect();
    assert_eq!(names, ["hold.1", "east anchor", "guides", "kerb"]);
    let (x, y) = ([1.0, 0.0, 0.0], [0.0, 1.0, 0.0]);
    assert_eq!(holds[0].kind, HoldKind::Fixed { along: vec![x, y] });
    assert_eq!(holds[2].points, [2, 3]);
    let HoldKind::Spring { along, stiffness } = &holds[2].kind else {
        panic!("{:?}", holds[2]);
    };
    assert_eq!((along.as_slice(), stiffness.value), (&[x][..], 3e6));
    let HoldKind::Stop {
        blocks,
        clearance,
        stiffness,
    } = &holds[3].kind
    else {
        panic!("{:?}", holds[3]);
    };
    // [3, 4] is 5 long.
    assert_relative_eq!(blocks[0], 0.6, max_relative = 1e-15);
    assert_relative_eq!(blocks[1], 0.8, max_relative = 1e-15);
    assert_eq!((clearance.value, blocks[2]), (2.5e-3, 0.0));
    assert_eq!(stiffness.map(|stiffness| stiffness.value), Some(400e6));
}

#[test]
fn loads_of_the_job_are_laid_on_points_bodies_and_holds() {
    let model = model(BEAM);
    let actions = &assembly(&model).actions;
    let forces: Vec<(usize, usize, f64, f64)> = actions
        .forces
        .iter()
        .map(|load| {
            (
                load.case,
                load.point,
                load.force[0].value,
                load.force[1].value,
            )
        })
        .collect();
    assert_eq!(forces, [(1, 4, 0.0, -25e3), (0, 4, 1e3, -2e3)]);
    let body = actions.bodies[0];
    assert_eq!((body.case, body.body, body.force[0].value), (1, 0, 3e3));
    let moment = actions.moments[0].moment.map(|moment| moment.value);
    assert_eq!(moment, [0.0, 0.0, 4e3]);
    let weight = actions.weights[0];
    assert_eq!((weight.case, weight.body, weight.number), (0, 0, 1.0));
    let movements: Vec<(usize, [Length; 3])> = actions
        .movements
        .iter()
        .map(|load| (load.hold, load.movement))
        .collect();
    let expected = [
        (1, metres([0.0, -3e-3, 0.0])),
        (3, metres([3e-3, 4e-3, 0.0])),
    ];
    assert_eq!(movements, expected);
    // Self-weight acts on members between points as on others.
    let weights = model
        .members
        .iter()
        .map(|member| member.actions.weights.len());
    assert_eq!(weights.collect::<Vec<_>>(), [1, 1, 2, 1]);
}

#[test]
fn watches_and_what_they_are_held_to() {
    let model = model(BEAM);
    let names: Vec<&str> = model.watches.iter().map(|watch| &*watch.name).collect();
    assert_eq!(names, ["lug level", "watch.2", "watch.3", "watch.4"]);
    let of: Vec<&Watched> = model.watches.iter().map(|watch| &watch.of).collect();
    let expected = [
        Watched::Point {
            point: 4,
            relative_to: None,
            along: Some([0.0, -1.0, 0.0]),
        },
        Watched::Rotation {
            body: 0,
            about: Some([0.0, 0.0, 1.0]),
        },
        Watched::Point {
            point: 2,
            relative_to: Some(3),
            along: None,
        },
        Watched::Station {
            at: (2, 2),
            relative_to: Some((3, 1)),
        },
    ];
    assert_eq!(of, expected.iter().collect::<Vec<_>>());
    let watch = |watch: usize| {
        let is_it = |limit: &&crate::model::Limit| limit.target == Target::Watch { watch };
        model.limits.iter().find(is_it).unwrap()
    };
    let level = watch(0);
    assert_eq!(
        (&*level.on, level.source.as_deref()),
        ("lug level", Some("contract 4.2"))
    );
    // service/live=0/without=east … are 0 to 3, strength is the fifth.
    assert_eq!(
        (&level.reads, level.since),
        (&Reads::Only(vec![4]), Some(4))
    );
    let (lower, upper) = (from_si(-1e-3), from_si(4e-3));
    assert_eq!(level.kind, LimitKind::Watch(Bounds { lower, upper }));
    let LimitKind::Rotation(bounds) = watch(1).kind else {
        panic!("{:?}", watch(1));
    };
    let degree = std::f64::consts::PI / 180.0;
    assert_relative_eq!(bounds.upper.value, 0.1 * degree, max_relative = 1e-15);
    assert_eq!(watch(1).reads, Reads::Purpose(Purpose::Service));
}

#[test]
fn limits_on_holds_stand_on_each_of_their_points() {
    let model = model(BEAM);
    let of_holds: Vec<(&str, Target, bool)> = model
        .limits
        .iter()
        .filter(|limit| matches!(limit.target, Target::Hold { .. }))
        .map(|limit| {
            let of_strength = limit.reads == Reads::Purpose(Purpose::Strength);
            (&*limit.on, limit.target, of_strength)
        })
        .collect();
    let hold = |hold, point| Target::Hold { hold, point };
    let expected = [
        ("east anchor", hold(1, 0), true),
        ("guides.a", hold(2, 0), true),
        ("guides.b", hold(2, 1), true),
        ("kerb", hold(3, 0), false),
        ("kerb", hold(3, 0), false),
    ];
    assert_eq!(of_holds, expected);
    // Of the defaults `slack` holds the members that carry one way alone.
    let slack = model
        .limits
        .iter()
        .filter(|limit| limit.kind == LimitKind::Slack);
    let slack: Vec<Target> = slack.map(|limit| limit.target).collect();
    assert_eq!(slack, [Target::Member { member: 1 }]);
}

#[test]
fn each_lost_member_makes_a_combination() {
    let model = model(BEAM);
    let combinations: Vec<(&str, &[usize])> = model
        .combinations
        .iter()
        .map(|combination| (&*combination.name, combination.without.as_slice()))
        .collect();
    let expected: [(&str, &[usize]); 5] = [
        ("service/live=0/without=east", &[1]),
        ("service/live=0/without=west", &[0]),
        ("service/live=1/without=east", &[1]),
        ("service/live=1/without=west", &[0]),
        ("strength", &[2]),
    ];
    assert_eq!(combinations, expected);
    let family: Vec<&str> = model.combinations.iter().map(|c| &*c.family).collect();
    assert_eq!(family[..4], ["service"; 4]);
}

#[test]
fn members_lost_always_and_members_lost_one_by_one_go_together() {
    let lost = BEAM.replace(
        "lose-each = [\"east\", \"west\"]",
        "lose-each = [\"spare\", \"west\"]\nwithout = [\"alone\", \"east\"]",
    );
    let model = model(&lost);
    let without: Vec<&[usize]> = model
        .combinations
        .iter()
        .map(|c| c.without.as_slice())
        .collect();
    assert_eq!(without[..2], [&[1, 2, 3][..], &[0, 1, 3]]);
    assert_eq!(&*model.combinations[1].name, "service/live=0/without=west");
}
