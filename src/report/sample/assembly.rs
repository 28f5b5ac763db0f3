//! Results of assemblies made by hand: a beam on two hangers and a kerb, whole and with each hanger
//! lost, and a plate in space.

use super::{check, failing, hanger, segment};
use crate::model::{Name, Purpose};
use crate::quantity::from_si;
use crate::result::{
    AssemblyTotals, BodyResult, CheckResult, CombinationResult, Envelope, Governing, HoldResult,
    JobResult, JobStatus, MemberResult, MemberState, PointResult, Rotation, SupportWord, Unit,
    Verdict, WatchResult,
};

/// A beam on two hangers in two coordinates; of two losses that of H2 governs.
pub(crate) fn plane() -> JobResult {
    let whole = CombinationResult {
        name: "service".into(),
        purpose: Some(Purpose::Service),
        factors: [("dead".into(), 1.0)].into(),
        members: vec![
            MemberResult {
                name: "H1".into(),
                ..hanger()
            },
            tie(),
            MemberResult {
                name: "H2".into(),
                ..hanger()
            },
        ],
        points: vec![
            point("left", &[0.0, 0.0], Some(&[0.0, 84250.0])),
            point("a", &[0.0005, -0.00216], None),
            point("lug", &[0.0005, -0.0021], None),
            point("b", &[0.0005, -0.0012], Some(&[0.0, 0.0])),
        ],
        holds: vec![
            hold("hold.1", "left", SupportWord::Fixed, Some(&[0.0, 84250.0])),
            HoldResult {
                gap: Some(from_si(0.0031)),
                bears: Some(false),
                ..hold("kerb", "b", SupportWord::Stop, Some(&[0.0, 0.0]))
            },
            hold("rail", "b", SupportWord::Spring, None),
        ],
        bodies: vec![BodyResult {
            name: "beam".into(),
            displacement: [0.0005, -0.0012].map(from_si).into(),
            rotation: Rotation::InPlane(from_si(-0.001)),
        }],
        watches: vec![
            watch("lug level", Some(-0.0021), Unit::Metre),
            watch("watch.2", Some(0.001), Unit::Radian),
        ],
        totals: Some(AssemblyTotals {
            applied: [0.0, -84250.0].map(from_si).into(),
            reactions: [0.0, 84250.0].map(from_si).into(),
        }),
        checks: vec![
            CheckResult {
                demand: 200e6,
                utilisation: Some(2.0 / 3.0),
                status: Verdict::Pass,
                ..check("tension", "H1.shank")
            },
            CheckResult {
                demand: -0.0021,
                limit: -0.004,
                utilisation: Some(0.525),
                status: Verdict::Pass,
                unit: Unit::Metre,
                area: None,
                at: None,
                ..check("watch", "lug level")
            },
            yes_or_no("slack", "sway tie", false),
        ],
        ..failing().combinations.remove(0)
    };
    let mut lost = CombinationResult {
        name: "service/without=H2".into(),
        without: vec!["H2".into()],
        ..whole.clone()
    };
    lost.members.pop();
    lost.checks[0].demand = 342e6;
    lost.checks[0].utilisation = Some(1.14);
    lost.checks[0].status = Verdict::Fail;
    lost.bodies[0].rotation = Rotation::InPlane(from_si(-0.0135));
    let mut other = CombinationResult {
        name: "service/without=H1".into(),
        without: vec!["H1".into()],
        ..whole.clone()
    };
    other.members.remove(0);
    other.checks.remove(0);
    job(vec![whole, other, lost])
}

/// A plate in three coordinates.
pub(crate) fn space() -> JobResult {
    let mut job = plane();
    job.combinations.truncate(1);
    let combination = &mut job.combinations[0];
    combination.points = vec![point("a", &[0.001, -0.002, 0.003], None)];
    combination.holds = vec![hold(
        "hold.1",
        "a",
        SupportWord::Fixed,
        Some(&[1e3, -2e3, 3e3]),
    )];
    combination.bodies = vec![BodyResult {
        name: "plate".into(),
        displacement: [0.001, -0.002, 0.003].map(from_si).into(),
        rotation: Rotation::Spatial([0.001, -0.002, 0.0].map(from_si)),
    }];
    combination.totals = Some(AssemblyTotals {
        applied: [-1e3, 2e3, -3e3].map(from_si).into(),
        reactions: [1e3, -2e3, 3e3].map(from_si).into(),
    });
    job
}

fn job(combinations: Vec<CombinationResult>) -> JobResult {
    // The last combination is the one that governs.
    let governs = combinations.last();
    let governing = governs.into_iter().flat_map(|combination| {
        let row = |check: &CheckResult| Governing {
            check: check.check.clone(),
            on: check.on.clone(),
            combination: combination.name.clone(),
            at: check.at,
            area: check.area,
            demand: check.demand,
            limit: check.limit,
            unit: check.unit,
            utilisation: check.utilisation,
            status: check.status,
            source: check.source.clone(),
            line: check.line,
        };
        combination.checks.iter().map(row)
    });
    let governing = governing.collect();
    let range = |result: &str, unit, max, max_in: usize, min, min_in: usize| Envelope {
        result: result.into(),
        unit,
        max: Some(max),
        max_in: combinations.get(max_in).map(|each| each.name.clone()),
        min: Some(min),
        min_in: combinations.get(min_in).map(|each| each.name.clone()),
    };
    let envelope = vec![
        range("H1.elongation", Unit::Metre, 0.0036, 2, 0.00216, 0),
        range("H1.force_max", Unit::Newton, 144e3, 2, 84250.0, 0),
        range("H1.force_min", Unit::Newton, 140e3, 2, 81000.0, 0),
        range("left.displacement.x", Unit::Metre, 0.0, 0, 0.0, 0),
        range("lug.displacement.y", Unit::Metre, -0.0021, 0, -0.0065, 2),
        range("left.reaction.y", Unit::Newton, 144e3, 2, 0.0, 1),
        range("hold.1.reaction.y", Unit::Newton, 144e3, 2, 0.0, 1),
        range("kerb.gap", Unit::Metre, 0.0031, 0, 0.0, 2),
        range("beam.rotation", Unit::Radian, 0.0, 0, -0.0135, 2),
    ];
    JobResult {
        title: Some("Approach beam on two hangers".into()),
        governing,
        envelope,
        status: JobStatus::Fail,
        combinations,
        warnings: Vec::new(),
        cautions: Vec::new(),
        notes: Vec::new(),
        ..failing()
    }
}

/// A slack one-way member.
fn tie() -> MemberResult {
    let nothing = from_si(0.0);
    MemberResult {
        name: "sway tie".into(),
        state: MemberState::Slack,
        slack_by: Some(from_si(0.00075)),
        totals: crate::result::MemberTotals::default(),
        force_max: nothing,
        force_min: nothing,
        elongation: from_si(0.0),
        elongation_force: from_si(0.0),
        segments: vec![crate::result::SegmentResult {
            force_start: nothing,
            force_end: nothing,
            force_max: nothing,
            force_min: nothing,
            elongation: from_si(0.0),
            elongation_force: from_si(0.0),
            ..segment("1", 0.0, 3.0, Some("rod-steel"))
        }],
        supports: Vec::new(),
        ..hanger()
    }
}

fn point(name: &str, displacement: &[f64], reaction: Option<&[f64]>) -> PointResult {
    PointResult {
        name: name.into(),
        displacement: displacement.iter().copied().map(from_si).collect(),
        reaction: reaction.map(|parts| parts.iter().copied().map(from_si).collect()),
    }
}

fn hold(name: &str, point: &str, kind: SupportWord, reaction: Option<&[f64]>) -> HoldResult {
    HoldResult {
        name: name.into(),
        point: point.into(),
        kind,
        reaction: reaction.map(|parts| parts.iter().copied().map(from_si).collect()),
        gap: None,
        bears: None,
    }
}

fn watch(name: &str, value: Option<f64>, unit: Unit) -> WatchResult {
    WatchResult {
        name: Name::from(name),
        value,
        unit,
    }
}

fn yes_or_no(name: &str, on: &str, answer: bool) -> CheckResult {
    CheckResult {
        demand: f64::from(u8::from(answer)),
        limit: 1.0,
        unit: Unit::None,
        utilisation: None,
        status: if answer { Verdict::Pass } else { Verdict::Fail },
        area: None,
        at: None,
        ..check(name, on)
    }
}
