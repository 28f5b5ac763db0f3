//! Checks, cautions and envelopes of an assembly, on results made by hand: what is tested is how a
//! finished result is read, not how it is found. The numbers are chosen so that each expected value
//! can be worked out in the head.

#![allow(clippy::unwrap_used)] // of what the tests themselves make

use lengthwise::check::{self, Observed};
use lengthwise::model::{
    Assembly, AssemblyActions, Between, Body, Bounds, Hold, HoldKind, Limit, LimitKind, Model,
    Point, Purpose, Reads, Target, Watch, Watched, Weight,
};
use lengthwise::quantity::from_si;
use lengthwise::result::{
    BodyResult, CheckResult, CombinationResult, HoldResult, MemberState, PointResult, Rotation,
    SupportWord, Unit, Verdict,
};
use lengthwise::solve::Threshold;
use lengthwise::{check_text, job};

/// Three members of 2 m and three combinations; points, bodies and holds are put in by hand.
const JOB: &str = r#"
[case.dead]
[combination.erection]
factors = { dead = 1.0 }
[combination.service]
factors = { dead = 1.0 }
[combination.lost]
factors = { dead = 1.0 }

[member.first]
start = "fixed"
segment = [{ length = "2 m", section = { area = "10 cm2" }, material = "steel-s355" }]
load = [{ case = "dead", at = "end", force = "10 kN" }]
[member.second]
like = "first"
[member.third]
like = "first"
"#;

const ERECTION: usize = 0;
const SERVICE: usize = 1;
const LOST: usize = 2;

/// The last combination has lost the first member.
fn model() -> Model {
    let mut model = job::read(JOB).unwrap();
    model.combinations[LOST].without = vec![0];
    let point = |name: &str, at: [f64; 3]| Point {
        name: name.into(),
        place: 0..1,
        at: at.map(from_si),
    };
    let hold = |name: &str, points: &[usize], kind: HoldKind| Hold {
        name: name.into(),
        place: 0..1,
        points: points.into(),
        kind,
    };
    let (x, y) = ([1.0, 0.0, 0.0], [0.0, 1.0, 0.0]);
    model.assembly = Some(Assembly {
        coordinates: 2,
        down: [0.0, -1.0, 0.0],
        points: vec![
            point("a", [0.0, 0.0, 0.0]),
            point("b", [2.0, 0.0, 0.0]),
            point("c", [0.0, 2.0, 0.0]),
        ],
        bodies: vec![Body {
            name: "beam".into(),
            place: 0..1,
            points: vec![0, 1],
            mass: None,
            centre: None,
        }],
        holds: vec![
            hold("guides", &[0, 1], HoldKind::Fixed { along: vec![y] }),
            hold("foot", &[2], HoldKind::Fixed { along: vec![x, y] }),
            hold(
                "kerb",
                &[1],
                HoldKind::Stop {
                    blocks: x,
                    clearance: from_si(0.005),
                    stiffness: None,
                },
            ),
        ],
        actions: AssemblyActions::default(),
    });
    let watch = |name: &str, of: Watched| Watch {
        name: name.into(),
        place: 0..1,
        of,
    };
    let level = |along| Watched::Point {
        point: 1,
        relative_to: Some(0),
        along,
    };
    model.watches = vec![
        watch("level", level(Some(y))),
        watch("apart", level(None)),
        watch(
            "turn",
            Watched::Rotation {
                body: 0,
                about: None,
            },
        ),
        watch(
            "ends",
            Watched::Station {
                at: (1, 1),
                relative_to: Some((0, 1)),
            },
        ),
    ];
    model
}

fn results(model: &Model) -> Vec<CombinationResult> {
    let mut results = check_text("by-hand.toml", JOB).combinations;
    results[LOST].members.remove(0);
    results[LOST].name = "lost/without=first".into();
    let point = |name: &str, x: f64, y: f64| PointResult {
        name: name.into(),
        displacement: [x, y].map(from_si).into(),
        reaction: None,
    };
    let hold = |name: &str, point: &str, reaction: Option<[f64; 2]>| HoldResult {
        name: name.into(),
        point: point.into(),
        kind: SupportWord::Fixed,
        reaction: reaction.map(|reaction| reaction.map(from_si).into()),
        gap: None,
        bears: None,
    };
    for (index, result) in results.iter_mut().enumerate() {
        let times = (1 + index) as f64;
        result.points = vec![
            point("a", 0.0, 0.001 * times),
            point("b", 0.003 * times, 0.005 * times),
            point("c", 0.0, 0.0),
        ];
        result.holds = vec![
            hold("guides", "a", Some([0.0, 1000.0])),
            hold("guides", "b", Some([0.0, -2000.0 * times])),
            hold("foot", "c", Some([3000.0, 4000.0])),
            HoldResult {
                gap: Some(from_si(0.002)),
                bears: Some(index == LOST),
                ..hold("kerb", "b", Some([0.0, 0.0]))
            },
        ];
        result.bodies = vec![BodyResult {
            name: "beam".into(),
            displacement: [0.0, 0.001].map(from_si).into(),
            rotation: Rotation::InPlane(from_si(-0.002 * times)),
        }];
        result.watches = check::watches(model, &model.combinations[index], result);
    }
    results
}

fn limit(kind: LimitKind, target: Target, on: &str) -> Limit {
    Limit {
        kind,
        target,
        on: on.into(),
        reads: Reads::Purpose(Purpose::Service),
        since: None,
        source: None,
        place: 0..1,
    }
}

fn bounds<Q: lengthwise::quantity::Measure>(lower: f64, upper: f64) -> Bounds<Q> {
    Bounds {
        lower: Q::from_si(lower),
        upper: Q::from_si(upper),
    }
}

/// What `with` sees of the results as a check does.
fn observing<T>(results: &[CombinationResult], with: impl Fn(&[Observed]) -> T) -> T {
    let zeros = [Threshold::default(); 3];
    let observed: Vec<Observed> = results
        .iter()
        .enumerate()
        .map(|(index, result)| Observed {
            index,
            result,
            zeros: &zeros[..result.members.len()],
            assembly: Threshold::default(),
        })
        .collect();
    with(&observed)
}

fn checked(
    model: &mut Model,
    limits: Vec<Limit>,
    results: &[CombinationResult],
    at: usize,
) -> Vec<CheckResult> {
    let lines = vec![1; limits.len()];
    model.limits = limits;
    observing(results, |observed| {
        check::combination(model, observed, at, &lines)
    })
}

/// `on`, demand, utilisation and verdict of each row.
fn shown(rows: &[CheckResult]) -> Vec<(&str, f64, Option<f64>, Verdict)> {
    rows.iter()
        .map(|row| (&*row.on, row.demand, row.utilisation, row.status))
        .collect()
}

#[test]
fn a_slack_member_fails_where_it_must_carry() {
    let mut model = model();
    let mut results = results(&model);
    results[SERVICE].members[1].state = MemberState::Slack;
    results[SERVICE].members[2].state = MemberState::Bearing;
    let limits = (0..3).map(|member| limit(LimitKind::Slack, Target::Member { member }, "m"));
    let limits: Vec<Limit> = limits.collect();
    let rows = checked(&mut model, limits, &results, SERVICE);
    let answers: Vec<_> = rows.iter().map(|row| (row.demand, row.status)).collect();
    let (yes, no) = ((1.0, Verdict::Pass), (0.0, Verdict::Fail));
    assert_eq!(answers, [yes, no, yes]);
    assert!(rows.iter().all(|row| row.limit == 1.0
        && row.unit == Unit::None
        && row.utilisation.is_none()
        && &*row.check == "slack"));
}

#[test]
fn a_hold_in_one_direction_has_a_sign_and_one_in_several_a_size() {
    let mut model = model();
    let mut results = results(&model);
    let reaction = |hold, point, lower, upper| {
        let kind = LimitKind::Reaction(bounds(lower, upper));
        limit(kind, Target::Hold { hold, point }, "h")
    };
    let limits = vec![
        reaction(0, 0, -5000.0, 8000.0),
        reaction(0, 1, -5000.0, 8000.0),
        reaction(1, 0, -4000.0, 4000.0),
    ];
    let rows = checked(&mut model, limits.clone(), &results, SERVICE);
    assert_eq!(
        shown(&rows),
        [
            ("h", 1000.0, Some(0.125), Verdict::Pass),
            ("h", -4000.0, Some(0.8), Verdict::Pass),
            // 3-4-5: a size has no sign.
            ("h", 5000.0, Some(1.25), Verdict::Fail),
        ]
    );
    // What nothing decides is not checked.
    results[SERVICE].holds[1].reaction = None;
    let rows = checked(&mut model, limits, &results, SERVICE);
    assert_eq!(rows.len(), 2);
}

#[test]
fn a_stop_is_held_to_its_gap_and_to_bearing() {
    let mut model = model();
    let results = results(&model);
    let kerb = Target::Hold { hold: 2, point: 0 };
    let gap = LimitKind::Gap {
        min: Some(from_si(0.001)),
        max: None,
    };
    let limits = vec![
        limit(gap, kerb, "kerb"),
        limit(LimitKind::Bears, kerb, "kerb"),
    ];
    let rows = checked(&mut model, limits.clone(), &results, SERVICE);
    // 3 mm of the 4 mm that may close have closed.
    assert_eq!(
        shown(&rows),
        [
            ("kerb", 0.002, Some(0.75), Verdict::Pass),
            ("kerb", 0.0, None, Verdict::Fail),
        ]
    );
    let rows = checked(&mut model, limits, &results, LOST);
    assert_eq!(rows[1].status, Verdict::Pass);
}

#[test]
fn watches_read_directions_sizes_rotations_and_stations() {
    let model = model();
    let mut results = results(&model);
    let read = |result: &CombinationResult| -> Vec<Option<f64>> {
        result.watches.iter().map(|watch| watch.value).collect()
    };
    let service = read(&results[SERVICE]);
    // b less a moves by (6, 8) mm: 8 mm up, 10 mm in all. Both members stretch alike.
    for (value, expected) in service.iter().zip([0.008, 0.010, 0.004, 0.0]) {
        assert!((value.unwrap() - expected).abs() < 1e-15, "{value:?}");
    }
    assert_eq!(results[SERVICE].watches[2].unit, Unit::Radian);
    assert_eq!(read(&results[LOST])[3], None, "one of its members is lost");

    results[SERVICE].members[1].stations[1].displacement = from_si(0.25);
    results[SERVICE].members[0].stations[1].displacement = from_si(0.125);
    let again = check::watches(&model, &model.combinations[SERVICE], &results[SERVICE]);
    assert_eq!(again[3].value, Some(0.125));
}

#[test]
fn a_watch_is_held_and_counted_from_another_combination_before_its_size_is_taken() {
    let mut model = model();
    let mut results = results(&model);
    // Before, b had gone the other way along x.
    results[ERECTION].points[1].displacement[0] = from_si(-0.003);
    let watch = |watch| Target::Watch { watch };
    let level = LimitKind::Watch(bounds(-0.005, 0.010));
    let turn = LimitKind::Rotation(bounds(-0.004, 0.004));
    let mut apart = limit(LimitKind::Watch(bounds(-0.005, 0.005)), watch(1), "apart");
    apart.since = Some(ERECTION);
    let limits = vec![
        limit(level, watch(0), "level"),
        limit(turn, watch(2), "turn"),
        apart,
        limit(level, watch(3), "ends"),
    ];
    let rows = checked(&mut model, limits.clone(), &results, SERVICE);
    assert_eq!(&*rows[1].check, "rotation");
    assert_eq!(rows[1].unit, Unit::Radian);
    // (6, 8) less (−3, 4) mm is (9, 4): its size, not 10 mm less 5 mm.
    let size = (81.0f64 + 16.0).sqrt() / 1000.0;
    let expected = [
        ("level", 0.008),
        ("turn", 0.004),
        ("apart", size),
        ("ends", 0.0),
    ];
    for (row, (on, demand)) in rows.iter().zip(expected) {
        assert_eq!(&*row.on, on);
        assert!((row.demand - demand).abs() < 1e-15, "{row:?}");
    }
    assert_eq!(rows[2].status, Verdict::Fail);
    // The stations of a lost member are not read, and nothing counts from the combination itself.
    assert_eq!(checked(&mut model, limits.clone(), &results, LOST).len(), 3);
    assert_eq!(checked(&mut model, limits, &results, ERECTION).len(), 3);
}

#[test]
fn a_lost_member_is_not_read_and_those_behind_it_keep_their_own_results() {
    let mut model = model();
    let mut results = results(&model);
    for (index, result) in results.iter_mut().enumerate() {
        for member in &mut result.members {
            let number = ["first", "second", "third"]
                .iter()
                .position(|name| **name == *member.name);
            member.elongation = from_si(0.001 * (number.unwrap() + 1) as f64 * (index + 1) as f64);
        }
    }
    let elongation = |member, since| {
        let kind = LimitKind::Elongation(bounds(-0.1, 0.1));
        let mut limit = limit(kind, Target::Member { member }, "m");
        limit.since = since;
        limit
    };
    let demands = |rows: &[CheckResult]| -> Vec<i64> {
        let micrometres = rows.iter().map(|row| (row.demand * 1e6).round() as i64);
        micrometres.collect()
    };
    let limits = vec![
        elongation(0, None),
        elongation(1, None),
        elongation(2, Some(ERECTION)),
    ];
    let rows = checked(&mut model, limits, &results, LOST);
    assert_eq!(demands(&rows), [6000, 9000 - 3000]);
    // Counted from the combination that has lost it there is nothing to read.
    let from_lost = (0..3)
        .map(|member| elongation(member, Some(LOST)))
        .collect();
    let rows = checked(&mut model, from_lost, &results, SERVICE);
    assert_eq!(demands(&rows), [4000 - 6000, 6000 - 9000]);
}

#[test]
fn the_envelope_has_each_result_by_its_address() {
    let model = model();
    let results = results(&model);
    let rows = observing(&results, |observed| check::envelope(&model, observed));
    let addresses: Vec<&str> = rows
        .iter()
        .filter(|row| !row.result.contains("ir") && !row.result.starts_with("second"))
        .map(|row| &*row.result)
        .collect();
    assert_eq!(
        addresses,
        [
            "a.displacement.x",
            "a.displacement.y",
            "a.reaction.y",
            "b.displacement.x",
            "b.displacement.y",
            "b.reaction.x",
            "b.reaction.y",
            "c.displacement.x",
            "c.displacement.y",
            "c.reaction.x",
            "c.reaction.y",
            "guides.a.reaction.y",
            "guides.b.reaction.y",
            "foot.reaction.x",
            "foot.reaction.y",
            "kerb.reaction.x",
            "kerb.gap",
            "beam.rotation",
            "level.value",
            "apart.value",
            "turn.value",
            "ends.value",
        ]
    );
    let row = |address: &str| rows.iter().find(|row| row.result == address).unwrap();
    let lowest = row("guides.b.reaction.y");
    assert_eq!(lowest.min, Some(-6000.0));
    assert_eq!(lowest.min_in.as_deref(), Some("lost/without=first"));
    assert_eq!(row("b.displacement.y").max, Some(0.015));
    assert_eq!(row("turn.value").unit, Unit::Radian);
    // What the loss takes away has no part in the range.
    assert_eq!(row("ends.value").max_in.as_deref(), Some("erection"));
    assert_eq!(row("first.elongation").max_in.as_deref(), Some("erection"));
}

fn cautions(model: &Model, results: &[CombinationResult]) -> Vec<String> {
    let remarks = observing(results, |observed| check::cautions(model, observed));
    let said = remarks
        .iter()
        .map(|remark| format!("{}: {}", remark.about, remark.text));
    said.collect()
}

/// Makes the first member reach from one point to another.
fn between(model: &mut Model, start: usize, end: usize, direction: [f64; 3]) {
    let member = &mut model.members[0];
    member.supports.clear();
    member.between = Some(Between {
        start,
        end,
        direction,
        rise: direction[1],
    });
}

#[test]
fn a_member_that_turns_and_a_body_that_turns_far_are_cautioned_of_with_their_size() {
    let mut model = model();
    between(&mut model, 0, 1, [1.0, 0.0, 0.0]);
    let mut results = results(&model);
    // 8 mm up over 2 m is no large turn; 60 mm is 0.03 rad, 1.719 deg.
    assert!(
        !cautions(&model, &results)
            .iter()
            .any(|text| text.contains("turns"))
    );
    results[SERVICE].points[1].displacement = [0.004, 0.062].map(from_si).into();
    results[SERVICE].bodies[0].rotation = Rotation::InPlane(from_si(-0.03));
    let said = cautions(&model, &results);
    let turned = "member.first: it turns by 1.719 deg in `service` (60.00 mm across its axis over \
                  its length), over 1/50 rad: the computation is for small displacements";
    assert!(said.contains(&turned.to_owned()), "{said:?}");
    let body = "body.beam: it turns by 1.719 deg in `service`, over 1/50 rad: the computation is \
                for small displacements";
    assert!(said.contains(&body.to_owned()), "{said:?}");
    // 62.13 mm of the 2828 mm from corner to corner.
    assert!(
        said.iter()
            .any(|text| text.starts_with("point.b: it moves by 62.13 mm in `service`"))
    );
}

#[test]
fn a_member_that_only_travels_with_its_points_is_not_cautioned_of() {
    let mut model = model();
    between(&mut model, 0, 1, [1.0, 0.0, 0.0]);
    let mut results = results(&model);
    for station in &mut results[SERVICE].members[0].stations {
        station.displacement = from_si(0.05);
    }
    assert_eq!(cautions(&model, &results), [""; 0]);
    results[SERVICE].members[0].elongation = from_si(0.05);
    assert_eq!(cautions(&model, &results).len(), 1);
}

/// Steel of 7850 kg/m³ on 10 cm² over 2 m weighs 153.96 N; level, it bends by w L²/8 = 38.49 N m;
/// on a slope of 3 in 5 the part across is 4/5 of that.
#[test]
fn the_bending_of_an_inclined_member_under_its_weight_is_named_with_its_size() {
    let mut model = model();
    model.members[0].actions.weights.push(Weight {
        case: 0,
        segment: 0,
        layer: 0,
        number: 1.0,
    });
    let results = results(&model);
    let said = |direction| {
        let mut model = model.clone();
        between(&mut model, 0, 1, direction);
        let said = cautions(&model, &results);
        said.into_iter().find(|text| text.contains("bend"))
    };
    let level = said([1.0, 0.0, 0.0]).unwrap();
    assert!(level.contains("0.1540 kN in `erection`"), "{level}");
    assert!(level.contains("about 0.03849 kN m "), "{level}");
    let sloping = said([0.8, 0.6, 0.0]).unwrap();
    assert!(sloping.contains("about 0.03079 kN m "), "{sloping}");
    assert_eq!(said([0.0, 1.0, 0.0]), None, "upright");
}

#[test]
fn a_limit_that_no_combination_can_read_is_cautioned_of() {
    let mut model = model();
    let results = results(&model);
    let slack = |member, reads: &[usize]| Limit {
        reads: Reads::Only(reads.into()),
        place: member..member + 1,
        ..limit(LimitKind::Slack, Target::Member { member }, "m")
    };
    model.limits = vec![slack(0, &[LOST]), slack(1, &[LOST])];
    assert_eq!(
        cautions(&model, &results),
        [
            "member.first: every combination that reads this limit on slack takes `first` out: \
             nothing is checked by it"
        ]
    );
    let mut counted = slack(0, &[SERVICE]);
    counted.kind = LimitKind::Elongation(bounds(-1.0, 1.0));
    counted.since = Some(LOST);
    model.limits = vec![counted];
    let said = cautions(&model, &results);
    assert!(
        said[0].contains("counted from `lost`, which takes a member out"),
        "{said:?}"
    );
}
