//! What nothing holds, and what nothing decides: set to where it moves least, or left open, and said.

use approx::assert_relative_eq;
use lengthwise::result::{JobResult, JobStatus};

fn checked(text: &str) -> JobResult {
    let material = "[material.m]\nmodulus = \"200 GPa\"\nsource = \"round numbers\"\n";
    let result = lengthwise::check_text("free.toml", &format!("{material}{text}"));
    assert!(result.status != JobStatus::Error, "{:#?}", result.errors);
    result
}

/// Two loose parts with a joint between that their growth more than closes: by symmetry each gives
/// way by half of what is too much.
#[test]
fn loose_parts_that_would_overlap_move_apart_by_the_same() {
    let result = checked(
        r#"
        [member.a]
        segment = [
          { name = "p", length = "1 m", section = { area = "100 mm2" }, material = "m" },
          { name = "g", gap = "1 mm" },
          { name = "q", length = "1 m", section = { area = "100 mm2" }, material = "m" },
        ]
        load = [{ misfit = "3 mm" }]
        "#,
    );
    let stations = &result.combinations[0].members[0].stations;
    assert_relative_eq!(stations[0].displacement.value, -1e-3, max_relative = 1e-12);
    assert_relative_eq!(stations[3].displacement.value, 1e-3, max_relative = 1e-12);
    let notes: Vec<&str> = result.notes.iter().map(|note| note.text.as_str()).collect();
    assert_eq!(notes.len(), 2, "{notes:#?}");
    assert!(notes[0].contains("from `start` to `p.end`"), "{notes:#?}");
}

/// A free bar that grows: the squares of its ends' movements are least where both move alike.
#[test]
fn a_loose_bar_grows_to_both_sides() {
    let result = checked(
        r#"
        [member.a]
        segment = [{ length = "2 m", section = { area = "100 mm2" }, material = "m" }]
        load = [{ misfit = "4 mm" }]
        "#,
    );
    let stations = &result.combinations[0].members[0].stations;
    assert_relative_eq!(stations[0].displacement.value, -2e-3, max_relative = 1e-12);
    assert_relative_eq!(stations[1].displacement.value, 2e-3, max_relative = 1e-12);
}

/// Rigid stops with one face share a force in a way that nothing decides.
#[test]
fn equal_rigid_stops_show_no_reaction_and_ask_for_a_spring() {
    let result = checked(
        r#"
        [member.t]
        segment = [{ length = "1 m", section = { area = "1 cm2" }, material = "m" }]
        support = [
          { name = "L", at = "end", stop = "0 mm", limit = { bears = true } },
          { name = "R", at = "end", stop = "0 mm", limit = { bears = true } },
        ]
        load = [{ at = "end", force = "10 kN" }]
        "#,
    );
    let member = &result.combinations[0].members[0];
    for support in &member.supports {
        assert_eq!(
            (support.reaction, support.bears),
            (None, Some(true)),
            "{}",
            support.name
        );
    }
    assert_relative_eq!(member.totals.reactions.value, -10e3, max_relative = 1e-12);
    assert_eq!(result.status, JobStatus::Pass);
    assert!(
        result
            .notes
            .iter()
            .any(|note| note.text.contains("`L` and `R`")),
        "{:#?}",
        result.notes
    );
}
