//! What limits are laid on, and what the reading itself remarks.

use super::good::model;
use super::tie;
use crate::model::{LimitKind, Target};

#[test]
fn a_narrower_limit_takes_the_place_of_a_wider_of_the_same_key() {
    let model = model(
        r#"
[default]
material = "steel-s355"
limit = { tension = "100 MPa", compression = "90 MPa", force = "50 kN", elongation = "9 mm" }
[member.m]
start = "fixed"
segment = [
  { name = "a", length = "1 m", section = { round = "20 mm" }, limit = { tension = "80 MPa", elongation = "3 mm" } },
  { name = "b", length = "1 m", limit = { force = "40 kN" }, layer = [
    { name = "in", section = { round = "20 mm" }, limit = { compression = 0 } },
    { name = "out", section = { round = "20 mm" } } ] },
  { name = "c", length = "1 m", stiffness = "3 kN/mm" },
]
"#,
    );
    let laid: Vec<String> = model
        .limits
        .iter()
        .map(|limit| {
            let what = match limit.kind {
                LimitKind::Tension { limit, .. } => format!("tension {}", limit.value / 1e6),
                LimitKind::Compression { limit, .. } => {
                    format!("compression {}", limit.value / 1e6)
                }
                LimitKind::Force(bound) => format!("force {}", bound.upper.value / 1e3),
                LimitKind::Elongation(bound) => {
                    format!("elongation {}", (bound.upper.value * 1e6).round() / 1e3)
                }
                _ => "other".to_owned(),
            };
            format!("{} {what}", limit.on)
        })
        .collect();
    assert_eq!(
        laid,
        [
            "m.b.in tension 100",
            "m.b.out tension 100",
            "m.a compression 90",
            "m.b.out compression 90",
            "m.a force 50",
            "m.c force 50",
            "m elongation 9",
            "m.a tension 80",
            "m.a elongation 3",
            "m.b force 40",
            "m.b.in compression 0",
        ]
    );
    assert_eq!(model.limits[6].target, Target::Member { member: 0 });
}

#[test]
fn an_unknown_thickness_takes_the_lowest_row_and_says_so() {
    let text = tie("limit = { tension = \"0.5 yield\" }")
        .replace("round = \"20 mm\"", "area = \"314 mm2\"")
        .replace("steel-s355", "own")
        + "[material.own]\nmodulus = \"200 GPa\"\nyield-by-thickness = [[\"16 mm\", \"300 MPa\"], [\"40 mm\", \"200 MPa\"]]";
    let model = model(&text);
    let LimitKind::Tension { limit, .. } = model.limits[0].kind else {
        panic!("{:?}", model.limits[0]);
    };
    assert_eq!(limit.value, 100e6);
    assert_eq!(model.remarks.len(), 1);
    assert!(!model.remarks[0].caution);
    assert_eq!(
        model.remarks[0].text,
        "the thickness of `rod` is not known, so the lowest yield strength of `own` is used"
    );
}

#[test]
fn an_own_material_goes_before_one_of_the_library_with_a_note() {
    let text = tie("") + "[material.steel-s355]\nlike = \"steel-s355\"\nmodulus = \"199 GPa\"";
    let model = model(&text);
    assert_eq!(model.materials[0].modulus.value, 199e9);
    assert!(model.materials[0].density.is_some(), "from the library's");
    assert_eq!(
        model.remarks[0].text,
        "the job's own `steel-s355` stands in place of the library's `steel-s355`"
    );
}
