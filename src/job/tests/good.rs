//! Jobs without faults, and the models that they become.

use super::tie;
use crate::job::read;
use crate::model::{AreaUsed, LimitKind, Model, Purpose, Reads, ShareFactor};
use approx::assert_relative_eq;

/// The model of a job that must be without faults.
pub(super) fn model(text: &str) -> Model {
    match read(text) {
        Ok(model) => model,
        Err(problems) => panic!("{problems:#?}\n{text}"),
    }
}

pub(super) const SMALL: &str = r#"
[member.tie]
start = "fixed"
segment = [{ length = "8 ft", section = { round = "5/8 in" }, material = "steel-a36" }]
load = [{ at = "end", force = "5.2 kip" }, { temperature-change = "+65 degF" }]
limit = { tension = "0.6 yield", elongation = "1/8 in" }
"#;

#[test]
fn the_smallest_job_has_one_combination_called_all() {
    let model = model(SMALL);
    assert_eq!(model.combinations.len(), 1);
    assert_eq!(&*model.combinations[0].name, "all");
    assert_eq!(model.combinations[0].factors, [1.0]);
    assert_eq!(model.combinations[0].purpose, None);
    assert!(model.combinations[0].shown.is_empty());
    let member = &model.members[0];
    assert_relative_eq!(member.length().value, 96.0 * 0.0254, max_relative = 1e-15);
    let names: Vec<&str> = member.stations.iter().map(|s| &*s.name).collect();
    assert_eq!(names, ["start", "end"]);
    let force = member.actions.forces[0];
    // 1 kip is 1000 lbf, 0.45359237 kg × 9.80665 m/s² each.
    let pound = 0.45359237 * 9.80665;
    assert_relative_eq!(force.force.value, 5200.0 * pound, max_relative = 1e-14);
    assert_eq!(force.station, 1);
    let heat = member.actions.temperatures[0];
    assert_relative_eq!(heat.start.value, 65.0 / 1.8, max_relative = 1e-14);
    assert_eq!(heat.start, heat.end);
    assert_eq!(model.limits.len(), 2);
    let LimitKind::Tension { share, area, limit } = model.limits[0].kind else {
        panic!("{:?}", model.limits[0]);
    };
    assert_eq!((share, area), (Some(ShareFactor(0.6)), AreaUsed::Gross));
    // ASTM A36: a yield strength of 36 ksi; the library may round it to 250 MPa.
    assert_relative_eq!(limit.value, 0.6 * 250.0e6, max_relative = 0.01);
    assert_eq!(model.limits[0].reads, Reads::Purpose(Purpose::Strength));
    assert_eq!(model.limits[1].reads, Reads::Purpose(Purpose::Service));
}

pub(super) const WHOLE: &str = r#"
[job]
title = "Ferry ramp, hanger line 4"
reference = "FR-204 rev C"
prepared-by = "…"
date = 2026-03-04
units = "SI"
datum = "10 degC"

[case.dead]
weight = 1.0
[case.live]
[case.warm]
temperature-change = "+35 K"
[case.frost]
temperature = "-18 degC"

[combination.service]
purpose = "service"
factors = { dead = 1.0, live = [0.0, 1.0], warm = 1.0 }

[combination.strength]
purpose = "strength"
factors = { dead = 1.35, live = 1.5 }

[material.rod-steel]
like = "steel-s355"
yield = "345 MPa"
source = "mill certificate 4471"

[member.H4]
start = "fixed"
runs = "down"

[[member.H4.segment]]
name = "shank"
length = "2.850 m ± 3 mm"
section = { round = "30 mm" }
material = "rod-steel"

[[member.H4.segment]]
name = "lower thread"
length = "150 mm"
section = { thread = "M30" }
material = "rod-steel"

[[member.H4.load]]
at = "end"
force = { dead = "62 kN", live = "38 kN" }

[member.H4.limit]
tension = "yield / 1.0"
elongation = "6 mm"
"#;

#[test]
fn the_whole_job_of_the_design_is_read() {
    let model = model(WHOLE);
    assert_eq!(model.heading.date.as_deref(), Some("2026-03-04"));
    assert_relative_eq!(model.datum.unwrap().value, 283.15);
    let names: Vec<&str> = model.combinations.iter().map(|c| &*c.name).collect();
    assert_eq!(names, ["service/live=0", "service/live=1", "strength"]);
    assert_eq!(model.combinations[1].factors, [1.0, 1.0, 1.0, 0.0]);
    assert_eq!(model.combinations[1].shown, [0, 1, 2]);
    assert_eq!(model.combinations[2].purpose, Some(Purpose::Strength));
    assert_eq!(&*model.combinations[1].family, "service");
    // One literal has a tolerance.
    assert_eq!(model.tolerances.len(), 1);
    assert_eq!(&WHOLE[model.tolerances[0].clone()], "\"2.850 m ± 3 mm\"");
    assert_eq!(model.materials.len(), 1);
    let steel = &model.materials[0];
    assert_eq!(&*steel.id, "rod-steel");
    assert_eq!(steel.like.as_deref(), Some("steel-s355"));
    assert_eq!(steel.yield_strength.len(), 1); // its own replaces the table by thickness
    assert!(steel.density.is_some(), "taken over");
    assert_eq!(steel.source.as_deref(), Some("mill certificate 4471"));
    let member = &model.members[0];
    let names: Vec<&str> = member.stations.iter().map(|s| &*s.name).collect();
    assert_eq!(names, ["start", "shank.end", "end"]);
    assert_eq!(member.rise(), -1.0);
    // Weight in `dead`, the change in `warm`, the reading less the datum in `frost`.
    assert_eq!(member.actions.weights.len(), 2);
    assert!(member.actions.weights.iter().all(|weight| weight.case == 0));
    let changes: Vec<(usize, f64)> = member
        .actions
        .temperatures
        .iter()
        .map(|t| (t.case, (t.start.value * 1e6).round() / 1e6))
        .collect();
    assert_eq!(changes, [(2, 35.0), (2, 35.0), (3, -28.0), (3, -28.0)]);
    // tension on two segments, elongation on the member
    let on: Vec<&str> = model.limits.iter().map(|limit| &*limit.on).collect();
    assert_eq!(on, ["H4.shank", "H4.lower thread", "H4"]);
}

#[test]
fn the_narrowest_temperature_replaces_the_wider_in_one_case() {
    let text = r#"
[job]
datum = "10 degC"
[case.warm]
temperature-change = ["+10 K", "+30 K"]
[member.m]
start = "fixed"
segment = [
  { name = "a", length = "1 m", section = { round = "20 mm" }, material = "steel-s355" },
  { name = "b", length = "1 m", layer = [
    { name = "in", section = { round = "20 mm" }, material = "steel-s355" },
    { name = "out", section = { round = "20 mm" }, material = "steel-s355" } ] },
  { name = "c", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" },
]
load = [
  { case = "warm", on = "b.out", temperature-change = "+5 K" },
  { case = "warm", on = "b", temperature = "50 degC" },
]
"#;
    let model = model(text);
    let heat: Vec<(usize, usize, f64, f64)> = model.members[0]
        .actions
        .temperatures
        .iter()
        .map(|t| (t.segment, t.layer, t.start.value, t.end.value))
        .collect();
    // Of the case, from +10 at the start to +30 after 4 m; the reading is 50 less 10.
    let expected = [
        (0, 0, 10.0, 15.0),
        (1, 0, 40.0, 40.0),
        (1, 1, 5.0, 5.0),
        (2, 0, 20.0, 30.0),
    ];
    for (got, want) in heat.iter().zip(expected) {
        assert_eq!((got.0, got.1), (want.0, want.1));
        assert_relative_eq!(got.2, want.2, max_relative = 1e-12);
        assert_relative_eq!(got.3, want.3, max_relative = 1e-12);
    }
    assert_eq!(heat.len(), expected.len());
}

#[test]
fn like_replaces_whole_keys() {
    let text = tie(
        "load = [{ at = \"end\", force = \"1 kN\" }]\nlimit = { tension = \"0.6 yield\", elongation = \"2 mm\" }",
    ) + "[member.other]\nlike = \"tie\"\nlimit = { elongation = \"3 mm\" }\n[member.third]\nlike = \"other\"\nload = []";
    let model = model(&text);
    assert_eq!(model.members[1].actions.forces.len(), 1);
    assert_eq!(model.members[2].actions.forces.len(), 0);
    assert_eq!(model.members[2].supports.len(), 1);
    let on: Vec<&str> = model.limits.iter().map(|limit| &*limit.on).collect();
    // the tension limit is gone with the whole of `limit`; `third` takes over from `other`
    assert_eq!(on, ["tie.rod", "tie", "other", "third"]);
}

#[test]
fn stations_that_are_the_same_place_are_one() {
    let text = r#"
[member.m]
start = "fixed"
segment = [
  { name = "a", length = "1 m", section = { round = "20 mm" }, material = "steel-s355" },
  { name = "b", length = "500 mm", section = { round = "20 mm" }, material = "steel-s355" },
]
load = [
  { at = "1 m", force = "1 kN" },
  { at = "a.end", force = "1 kN" },
  { at = "b.start", force = "1 kN" },
  { at = "1.2 m", force = "1 kN" },
  { at = "1.2000000001 m", force = "1 kN" },
  { at = "1500 mm", force = "1 kN" },
  { at = "0 m", force = "1 kN" },
]
"#;
    let model = model(text);
    let member = &model.members[0];
    let at: Vec<usize> = member.actions.forces.iter().map(|f| f.station).collect();
    assert_eq!(at, [1, 1, 1, 2, 2, 3, 0]);
    let names: Vec<&str> = member.stations.iter().map(|s| &*s.name).collect();
    assert_eq!(names, ["start", "a.end", "1.2 m", "end"]);
}

#[test]
fn a_downward_force_on_a_slope_acts_along_and_across() {
    // 30° above level: half of a weight acts toward the start, √3/2 of it across.
    let text = tie(
        "runs = \"30 deg\"\nload = [{ at = \"end\", down = \"2 kN\" }, { line-down = \"4 kN/m\" }]",
    );
    let member = &model(&text).members[0];
    let force = member.actions.forces[0];
    assert_relative_eq!(force.force.value, -1000.0, max_relative = 1e-14);
    assert_relative_eq!(
        force.across.value,
        1000.0 * 3f64.sqrt(),
        max_relative = 1e-14
    );
    assert_relative_eq!(
        member.actions.lines[0].start.value,
        -2000.0,
        max_relative = 1e-14
    );
    let upright = tie("runs = \"up\"\nload = [{ at = \"end\", down = \"2 kN\" }]");
    let force = model(&upright).members[0].actions.forces[0];
    assert_eq!((force.force.value, force.across.value), (-2000.0, 0.0));
}
