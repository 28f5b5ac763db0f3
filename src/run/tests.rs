//! Jobs with an assembly from text to result: where errors stand, and what is left open.

use super::check_text;
use crate::result::{JobResult, JobStatus};

/// A stiff beam on two hangers, with more of the job as it is written.
fn beam(more: &str) -> JobResult {
    let text = format!(
        r#"
[point]
left = ["0 m", "2 m"]
right = ["4 m", "2 m"]
a = ["0 m", "0 m"]
b = ["4 m", "0 m"]

[body.beam]
points = ["a", "b"]
mass = "1000 kg"
at = ["2 m", "0 m"]

[member.west]
between = ["left", "a"]
carries = "tension"
segment = [{{ length = "rest", stiffness = "5 kN/mm" }}]
[member.east]
between = ["right", "b"]
carries = "tension"
segment = [{{ length = "rest", stiffness = "5 kN/mm" }}]
[member.apart]
start = "fixed"
segment = [{{ length = "1 m", stiffness = "1 kN/mm" }}]
load = [{{ at = "end", force = "1 kN", case = "dead" }}]

[[hold]]
points = ["left", "right"]

[case.dead]
weight = 1.0
{more}
"#
    );
    check_text("beam.toml", &text)
}

const COMBINATIONS: &str = r#"
[combination.intact]
factors = { dead = 1.0 }
[combination.lost]
factors = { dead = 1.0 }
lose-each = ["east", "apart"]
"#;

#[test]
fn a_loss_that_leaves_a_mechanism_is_an_error_of_that_combination_alone() {
    let result = beam(&format!(
        "{COMBINATIONS}\n[[hold]]\npoint = \"a\"\nalong = [\"x\"]\n"
    ));
    assert_eq!(result.status, JobStatus::Error);
    let names: Vec<&str> = result.combinations.iter().map(|c| &*c.name).collect();
    assert_eq!(names, ["intact", "lost/without=apart"]);
    let [error] = &result.errors[..] else {
        panic!("{:?}", result.errors);
    };
    assert_eq!(error.combination.as_deref(), Some("lost/without=east"));
    assert!(
        error.message.contains("body `beam` can turn about `a`"),
        "{}",
        error.message
    );
    // At the body's own table, the eighth line of the text.
    assert_eq!(error.line, Some(8));
    // Half of 1000 kg in each hanger; the single member stands beside them in the file's order.
    let intact = &result.combinations[0];
    let members: Vec<&str> = intact.members.iter().map(|m| &*m.name).collect();
    assert_eq!(members, ["west", "east", "apart"]);
    let force = intact.members[0].force_max.value;
    assert!((force - 4903.325).abs() < 1e-8, "{force}");
    assert_eq!(result.combinations[1].members.len(), 2);
    assert!(intact.totals.is_some());
    assert!(intact.residuals.largest() < 1e-12, "{:?}", intact.residuals);
}

#[test]
fn a_free_motion_is_noted_once() {
    let result = beam("[combination.intact]\nfactors = { dead = [1.0, 0.5] }\n");
    let notes: Vec<&str> = result.notes.iter().map(|note| &*note.text).collect();
    let swaying: Vec<&&str> = notes
        .iter()
        .filter(|text| text.contains("move along x"))
        .collect();
    assert_eq!(swaying.len(), 1, "{notes:?}");
    assert!(swaying[0].starts_with("in `intact/dead=1` body `beam` can move along x"));
    assert!(result.notes.iter().any(|note| note.about == "body.beam"));
}

#[test]
fn reactions_that_nothing_decides_are_taken_back_after_the_proof() {
    let result = beam(
        "[combination.intact]\nfactors = { dead = 1.0 }\n\
         [[hold]]\nname = \"one\"\npoint = \"a\"\nalong = [\"x\"]\n\
         [[hold]]\nname = \"two\"\npoint = \"b\"\nalong = [\"x\"]\n",
    );
    let intact = &result.combinations[0];
    let open: Vec<&str> = intact
        .holds
        .iter()
        .filter(|hold| hold.reaction.is_none())
        .map(|hold| &*hold.name)
        .collect();
    assert_eq!(open, ["one", "two"]);
    assert!(intact.points[2].reaction.is_none());
    assert!(intact.points[0].reaction.is_some());
    assert!(
        result
            .notes
            .iter()
            .any(|note| note.text.contains("make one of them a `spring`"))
    );
}

#[test]
fn movements_that_contradict_each_other_name_their_holds() {
    let result = beam(
        "[combination.intact]\nfactors = { dead = 1.0 }\n\
         [[hold]]\nname = \"one\"\npoint = \"a\"\nalong = [\"x\"]\n\
         [[hold]]\nname = \"two\"\npoint = \"b\"\nalong = [\"x\"]\n\
         [[load]]\ncase = \"dead\"\nhold = \"two\"\nmovement = [\"3 mm\", \"0 mm\"]\n",
    );
    let [error] = &result.errors[..] else {
        panic!("{:?}", result.errors);
    };
    assert!(
        error.message.contains("holds `one` and `two` contradict"),
        "{}",
        error.message
    );
}
