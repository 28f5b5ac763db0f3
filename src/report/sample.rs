//! Finished results made by hand, for the tests of the reports. Their numbers need not fit one
//! another: what is tested is how they are shown.

pub(crate) mod assembly;

use crate::model::{AreaUsed, Name, Purpose};
use crate::quantity::from_si;
use crate::result::{
    Caution, CheckResult, CombinationResult, Envelope, ErrorEntry, Governing, JobResult, JobStatus,
    LayerResult, MaterialEntry, MemberResult, MemberState, MemberTotals, Note, Residuals,
    SegmentResult, StationResult, SupportResult, SupportWord, Unit, Verdict, Warning,
};

/// A job with a hanger that fails in tension and a post with layers, a gap, stops and a spring.
pub(crate) fn failing() -> JobResult {
    let combination = CombinationResult {
        name: "strength/live=1.5".into(),
        purpose: Some(Purpose::Strength),
        factors: [("dead", 1.35), ("live", 1.5), ("frost", -0.5)]
            .map(|(case, factor)| (case.into(), factor))
            .into(),
        without: Vec::new(),
        members: vec![hanger(), post()],
        points: Vec::new(),
        holds: Vec::new(),
        bodies: Vec::new(),
        watches: Vec::new(),
        totals: None,
        residuals: Residuals {
            equilibrium: 1.1e-16,
            compatibility: 2.2e-16,
            energy: 0.0,
        },
        checks: checks(),
    };
    let governing = combination.checks.iter().map(|check| Governing {
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
    });
    JobResult {
        title: Some("Linkspan 2, hanger and post".into()),
        reference: Some("LS-31 rev B".into()),
        prepared_by: Some("R. Aune".into()),
        note: Some("Loads as of the survey of the spring; the post is looked at as built.".into()),
        datum: Some(283.15),
        status: JobStatus::Fail,
        errors: Vec::new(),
        errors_total: 0,
        warnings: vec![
            warning("hanger.lower thread", 342e6, Verdict::Fail),
            warning("hanger.shank", 290e6, Verdict::Pass),
        ],
        cautions: vec![Caution {
            about: "member.post".into(),
            text: "carries compression, and no buckling check was asked for: \
                   nobody has looked at its stability"
                .into(),
            line: Some(31),
        }],
        notes: vec![Note {
            about: "member.hanger".into(),
            text: "nominal values were used of lengths that bear a tolerance".into(),
        }],
        materials: vec![
            material(
                "rod-steel",
                210e9,
                Some("mill certificate 4471"),
                Some("steel-s355"),
            ),
            material("grout", 18e9, None, None),
        ],
        governing: governing.collect(),
        envelope: vec![Envelope {
            result: "hanger.start.reaction".into(),
            unit: Unit::Newton,
            max: Some(-84250.0),
            max_in: Some(combination.name.clone()),
            min: Some(-84250.0),
            min_in: Some(combination.name.clone()),
        }],
        combinations: vec![combination],
        ..JobResult::unreadable("linkspan/hanger.toml", nameless_error())
    }
}

/// A job in which no limit was read.
pub(crate) fn unchecked() -> JobResult {
    let mut job = failing();
    job.file = "linkspan/trial.toml".into();
    job.title = None;
    job.status = JobStatus::Unchecked;
    job.governing.clear();
    job.warnings.clear();
    let combination = &mut job.combinations[0];
    combination.name = "all".into();
    combination.purpose = None;
    combination.factors = [("".into(), 1.0)].into();
    combination.checks.clear();
    combination.members.truncate(1);
    job
}

/// A job that could not be read, with two errors.
pub(crate) fn unreadable() -> JobResult {
    let mut job = JobResult::unreadable("linkspan/broken.toml", nameless_error());
    job.errors.push(ErrorEntry {
        message: "`5 furlong` has a unit that is not known".into(),
        line: Some(12),
        column: Some(11),
        help: Some("write a length as in \"2.85 m\"".into()),
        combination: None,
    });
    job.errors_total = 2;
    job
}

fn nameless_error() -> ErrorEntry {
    ErrorEntry {
        message: "the member `tie` has no segment".into(),
        line: Some(3),
        column: Some(1),
        help: None,
        combination: None,
    }
}

fn material(id: &str, modulus: f64, source: Option<&str>, like: Option<&str>) -> MaterialEntry {
    MaterialEntry {
        id: id.into(),
        modulus,
        expansion: Some(12e-6),
        density: Some(7850.0),
        yield_strength: source.map(|_| 345e6),
        yield_by_thickness: Vec::new(),
        ultimate: None,
        proof: None,
        crushing: None,
        family: None,
        source: source.map(str::to_owned),
        like: like.map(Name::from),
    }
}

fn hanger() -> MemberResult {
    MemberResult {
        name: "hanger".into(),
        state: MemberState::Taut,
        slack_by: None,
        restraint: None,
        misfit_found: None,
        totals: MemberTotals {
            applied: from_si(84250.0),
            reactions: from_si(-84250.0),
        },
        elongation: from_si(0.00216),
        elongation_force: from_si(0.00216),
        elongation_temperature: from_si(0.0),
        elongation_misfit: from_si(0.0),
        force_max: from_si(84250.0),
        force_max_at: from_si(0.0),
        force_min: from_si(81000.0),
        force_min_at: from_si(3.0),
        segments: vec![
            SegmentResult {
                area_start: Some(from_si(706.9e-6)),
                area_end: Some(from_si(452.4e-6)),
                stress_max: Some(from_si(180e6)),
                stress_max_at: Some(from_si(2.85)),
                stress_min: Some(from_si(119.2e6)),
                stress_min_at: Some(from_si(0.0)),
                ..segment("shank", 0.0, 2.85, Some("rod-steel"))
            },
            SegmentResult {
                area_start: Some(from_si(561e-6)),
                area_end: Some(from_si(561e-6)),
                stress_max: Some(from_si(342e6)),
                stress_max_at: Some(from_si(2.85)),
                stress_min: Some(from_si(342e6)),
                stress_min_at: Some(from_si(2.85)),
                ..segment("lower thread", 2.85, 3.0, Some("rod-steel"))
            },
        ],
        stations: vec![
            station("start", 0.0, 0.0, None, Some(84250.0)),
            station("shank.end", 2.85, 0.002, Some(81000.0), Some(81000.0)),
            station("end", 3.0, 0.00216, Some(81000.0), None),
        ],
        supports: vec![support(
            "start",
            SupportWord::Fixed,
            Some(-84250.0),
            None,
            None,
        )],
    }
}

fn post() -> MemberResult {
    MemberResult {
        name: "post".into(),
        state: MemberState::Taut,
        slack_by: None,
        restraint: Some(0.8342),
        misfit_found: Some(from_si(-0.0015)),
        segments: vec![
            SegmentResult {
                force_max: from_si(95000.0),
                force_max_at: from_si(1.25),
                layers: vec![layer("grout", "grout"), layer("bars", "rod-steel")],
                ..segment("tier 1", 0.0, 2.85, None)
            },
            SegmentResult {
                rigidity_start: None,
                rigidity_end: None,
                gap: Some(from_si(0.0045)),
                bears: Some(false),
                ..segment("joint", 2.85, 3.0, None)
            },
        ],
        supports: vec![
            support("base", SupportWord::Spring, Some(41000.0), None, None),
            support(
                "kerb",
                SupportWord::Stop,
                Some(0.0),
                Some(0.0023),
                Some(false),
            ),
            support("cap", SupportWord::Stop, None, Some(0.0), Some(true)),
        ],
        ..hanger()
    }
}

fn segment(name: &str, from: f64, to: f64, material: Option<&str>) -> SegmentResult {
    SegmentResult {
        name: name.into(),
        from: from_si(from),
        to: from_si(to),
        material: material.map(Name::from),
        area_start: None,
        area_end: None,
        rigidity_start: Some(from_si(148.4e6)),
        rigidity_end: Some(from_si(95e6)),
        force_start: from_si(84250.0),
        force_end: from_si(81000.0),
        force_max: from_si(84250.0),
        force_max_at: from_si(from),
        force_min: from_si(81000.0),
        force_min_at: from_si(to),
        elongation: from_si(0.00108),
        elongation_force: from_si(0.00108),
        elongation_temperature: from_si(0.0),
        elongation_misfit: from_si(0.0),
        stress_max: None,
        stress_max_at: None,
        stress_min: None,
        stress_min_at: None,
        gap: None,
        bears: None,
        gross_stress_max: None,
        gross_stress_max_at: None,
        gross_stress_min: None,
        gross_stress_min_at: None,
        layers: Vec::new(),
    }
}

fn layer(name: &str, material: &str) -> LayerResult {
    LayerResult {
        name: name.into(),
        material: material.into(),
        force_start: from_si(-40000.0),
        force_end: from_si(-41000.0),
        stress_max: Some(from_si(-1.2e6)),
        stress_max_at: Some(from_si(0.0)),
        stress_min: Some(from_si(-1.3e6)),
        stress_min_at: Some(from_si(2.85)),
        gross_stress_max: None,
        gross_stress_max_at: None,
        gross_stress_min: None,
        gross_stress_min_at: None,
    }
}

fn station(
    name: &str,
    x: f64,
    displacement: f64,
    before: Option<f64>,
    after: Option<f64>,
) -> StationResult {
    StationResult {
        name: name.into(),
        x: from_si(x),
        displacement: from_si(displacement),
        force_before: before.map(from_si),
        force_after: after.map(from_si),
    }
}

fn support(
    name: &str,
    kind: SupportWord,
    reaction: Option<f64>,
    gap: Option<f64>,
    bears: Option<bool>,
) -> SupportResult {
    SupportResult {
        name: name.into(),
        at: "start".into(),
        kind,
        reaction: reaction.map(from_si),
        gap: gap.map(from_si),
        bears,
    }
}

fn warning(on: &str, stress: f64, status: Verdict) -> Warning {
    Warning {
        check: "tension".into(),
        on: on.into(),
        at: Some(2.85),
        combination: "strength/live=1.5".into(),
        stress,
        allowable: 300e6,
        ratio: Some(stress / 300e6),
        status,
        line: 44,
    }
}

/// A check of a stress that fails.
fn check(name: &str, on: &str) -> CheckResult {
    CheckResult {
        check: name.into(),
        on: on.into(),
        at: Some(2.85),
        area: Some(AreaUsed::Net),
        demand: 342e6,
        limit: 300e6,
        unit: Unit::Pascal,
        utilisation: Some(1.14),
        status: Verdict::Fail,
        source: Some("contract, clause 4.2".into()),
        details: serde_json::Map::new(),
        line: 44,
    }
}

fn checks() -> Vec<CheckResult> {
    let tension = check("tension", "hanger.lower thread");
    vec![
        tension.clone(),
        CheckResult {
            on: "hanger.shank".into(),
            demand: 290e6,
            utilisation: Some(290.0 / 300.0),
            status: Verdict::Pass,
            ..tension.clone()
        },
        CheckResult {
            check: "elongation".into(),
            on: "hanger".into(),
            at: None,
            area: None,
            demand: 0.00216,
            limit: 0.006,
            unit: Unit::Metre,
            utilisation: Some(0.36),
            status: Verdict::Pass,
            source: None,
            line: 45,
            ..tension.clone()
        },
        CheckResult {
            check: "bears".into(),
            on: "post.cap".into(),
            at: None,
            area: None,
            demand: 1.0,
            limit: 1.0,
            unit: Unit::None,
            utilisation: None,
            status: Verdict::Pass,
            source: None,
            line: 61,
            ..tension
        },
    ]
}
