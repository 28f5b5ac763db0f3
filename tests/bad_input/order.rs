//! Faults stand in the order of the text, each once, and every report says the same of them.

use super::{errors, program, refused, status, text, tie};
use std::fs;
use tempfile::tempdir;

/// A job with a fault in nearly every table.
const MANY: &str = r#"[job]
units = "metric"
datum = 20
[case.dead]
weight = "one"
[case.live]
wieght = 1.0
[combination.service]
factors = { dead = 1.0, life = 1.0 }
[material.rod]
like = "steel-s3555"
[default]
runs = "north"
[member.tie]
start = "pinned"
note = “old”
[[member.tie.segment]]
length = 3
section = { round = "20 kN" }
material = "rod"
[[member.tie.segment]]
length = "1 m"
section = { tube = { outer = "30 mm" } }
material = "rod"
count = 0
[[member.tie.support]]
at = "end"
stop = "-1 mm"
[[member.tie.load]]
case = "dead"
at = "end"
force = "3 tonf"
[member.tie.limit]
tension = "0.6 yeild"
"#;

#[test]
fn faults_stand_in_the_order_of_the_text_and_breed_none() {
    let lines: Vec<usize> = refused(MANY)
        .errors
        .iter()
        .filter_map(|error| error.line)
        .collect();
    let expected = [2, 3, 5, 7, 9, 11, 13, 15, 16, 18, 19, 23, 25, 28, 32, 34];
    assert_eq!(lines, expected);
}

#[test]
fn json_and_the_drawn_text_name_the_same_places() {
    let folder = tempdir().unwrap();
    let job = folder.path().join("job.toml");
    fs::write(&job, MANY).unwrap();
    let output = program(&["check", text(&job), "--format", "json"]);
    assert_eq!(status(&output), 3);
    let document: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    let entries = document["jobs"][0]["errors"].as_array().unwrap();
    let named: Vec<String> = entries
        .iter()
        .map(|error| {
            format!(
                "{}, line {}, column {}: {}",
                text(&job),
                error["line"],
                error["column"],
                error["message"].as_str().unwrap()
            )
        })
        .collect();
    let drawn = errors(&program(&["check", text(&job)]));
    let headings: Vec<&str> = drawn
        .lines()
        .filter(|line| line.starts_with(text(&job)))
        .collect();
    assert_eq!(headings, named);
    assert_eq!(document["counts"]["errors"], entries.len());
}

#[test]
fn the_text_shows_fifty_and_json_holds_a_thousand() {
    let folder = tempdir().unwrap();
    let job = folder.path().join("job.toml");
    let keys: String = (0..1_234).map(|key| format!("k{key} = 1\n")).collect();
    fs::write(&job, tie(&keys)).unwrap();
    let output = program(&["check", text(&job), "--format", "json"]);
    let drawn = errors(&program(&["check", text(&job)]));
    assert_eq!(drawn.matches("has no key").count(), 50);
    assert!(drawn.contains("1184 more errors are not shown"), "{drawn}");
    let document: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    assert_eq!(
        document["jobs"][0]["errors"].as_array().unwrap().len(),
        1_000
    );
    assert_eq!(document["counts"]["errors"], 1_234);
}
