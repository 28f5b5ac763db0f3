//! A fault is told once, and nothing is concluded from it; all faults of a file come in one run.

use super::said;

#[test]
fn a_wrong_value_breeds_no_second_fault() {
    let member = |segment: &str, more: &str| {
        format!("[member.m]\nstart = \"fixed\"\nsegment = [{{ {segment} }}]\n{more}")
    };
    let rod = "section = { round = \"20 mm\" }, material = \"steel-s355\"";
    let told = [
        // Without its length nobody can say that a station lies outside.
        member(
            &format!("length = \"2 n\", {rod}"),
            "load = [{ at = \"7 m\", force = \"1 kN\" }]",
        ),
        // Without its name nobody can say that a segment is not there.
        member(
            &format!("name = 3, length = \"2 m\", {rod}"),
            "load = [{ at = \"rod.end\", force = \"1 kN\" }, { on = \"rod\", strain = 1e-3 }]",
        ),
        // Without a material nobody can say that it has no strength or density.
        member(
            "length = \"2 m\", section = { round = \"20 mm\" }, material = \"stel-s355\"",
            "runs = \"up\"\nload = [{ weight = 1 }]\nlimit = { tension = \"0.5 crushing\" }",
        ),
        // Without a list of segments nothing on them can be found.
        "[member.m]\nsegment = 3\nload = [{ on = \"rod\", strain = 1e-3 }]\n".to_owned(),
        // A case with a fault is a case, and one with a bad name too.
        member(
            &format!("length = \"2 m\", {rod}"),
            "load = [{ at = \"end\", force = { \"a/b\" = \"1 kN\" } }]\n[case.\"a/b\"]\n",
        ),
        // Without the datum of the job nobody can say that a reading has none.
        member(
            &format!("length = \"2 m\", {rod}"),
            "load = [{ temperature = \"5 degC\" }]\n[job]\ndatum = \"10\"\n",
        ),
        // A member that is like one that is not there may have all that it lacks.
        "[member.m]\nlike = \"n\"\nload = [{ at = \"rod.end\", force = \"1 kN\" }]\n".to_owned(),
    ];
    let told = told
        .into_iter()
        .chain(LOST.iter().map(|job| (*job).to_owned()));
    for job in told {
        assert_eq!(said(&job).lines().count(), 1, "{job}\n{}", said(&job));
    }
}

/// Without its tables nobody can say that a case, a combination, a material or a member is not
/// there.
const LOST: &[&str] = &[
    r#"case = 3
combination.service.factors = { dead = 1.0 }
[member.m]
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ at = "end", force = "1 kN", case = "dead" }]
"#,
    r#"combination = 3
[member.m]
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { elongation = "1 mm", in = ["lifted"], since = "erected" }
"#,
    r#"material = 3
[member.m]
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "rod" }]
"#,
    r#"material.rod = 3
[member.m]
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "rod" }]
"#,
    r#"[member]
a = 3
b = { like = "a" }
"#,
];

#[test]
fn what_materials_lack_is_told_of_a_member_with_faults_too() {
    let job = r#"[material.resin]
modulus = "3 GPa"
[member.m]
start = "fixed"
runs = "up"
segment = [
  { length = "2 n", section = { round = "20 mm" }, material = "steel-s355" },
  { length = "1 m", section = { round = "20 mm" }, material = "resin" },
]
load = [{ weight = 1 }, { temperature-change = "+5 K" }]
limit = { tension = "0.5 yield" }
"#;
    let told = [
        "7:17 `n` is no known unit",
        "10:20 weight needs the density of `resin`, which is not given",
        "10:48 a temperature needs the expansion of `resin`, which is not given",
        "11:21 this is a share of the yield strength of `resin`, which is not given",
    ];
    let said = said(job);
    assert_eq!(said.lines().count(), told.len(), "{said}");
    for (line, told) in said.lines().zip(told) {
        assert!(line.starts_with(told), "{said}");
    }
}

#[test]
fn what_several_members_take_over_is_told_once() {
    let job = "[member.a]\nstart = \"fixed\"\nsegment = [{ name = \"rod\", length = \"1 m\", section \
               = { round = \"20 mm\" }, material = \"steel-s355\" }]\nload = [{ at = \"rood.end\", \
               force = \"1 kN\" }]\n[member.b]\nlike = \"a\"\n[member.c]\nlike = \"b\"\n";
    assert_eq!(
        said(job),
        "4:16 no segment of this member is called `rood` | `rod` comes nearest"
    );
}

#[test]
fn all_faults_come_in_one_run_in_the_order_of_the_text() {
    let job = r#"
[job]
unit = "SI"
[case.dead]
weight = "1"
[material.rod]
like = "steel-s3555"
[member.m]
start = "fixd"
note = unquoted
[[member.m.segment]]
lenght = "1 m"
section = { round = "20 mm" }
material = "aluminum-6061-t6"
[[member.m.load]]
at = "end"
force = { daed = "1 kN" }
[member.m.limit]
elongation = "length over 500"
"#;
    let lines: Vec<String> = said(job)
        .lines()
        .map(|line| line.split(' ').next().unwrap_or("").to_owned())
        .collect();
    let expected = [
        "3:1", "5:10", "7:8", "9:9", "10:8", "12:1", "14:12", "17:11",
    ];
    assert_eq!(&lines[..8], expected, "{}", said(job));
    assert!(lines[8].starts_with("19:"), "{}", said(job));
    assert_eq!(lines.len(), 9);
}
