//! The house keeps its order: each step knows the ones before it and none after it.

use std::fs;
use std::path::{Path, PathBuf};

fn sources(folder: &Path) -> Vec<PathBuf> {
    let mut found = Vec::new();
    for entry in fs::read_dir(folder).expect("a folder of sources") {
        let path = entry.expect("a readable folder").path();
        if path.is_dir() {
            // A room's own tests may read a job to have a model.
            if path.file_name().is_some_and(|name| name != "tests") {
                found.extend(sources(&path));
            }
        } else if path.extension().is_some_and(|ending| ending == "rs") {
            found.push(path);
        }
    }
    found
}

/// The rooms that a source file names, in `crate::ROOM` or in a list `crate::{ROOM, ROOM::{..}}`,
/// comments left out.
fn rooms_named(text: &str) -> Vec<String> {
    let code: Vec<&str> = text
        .lines()
        .filter(|line| !line.trim_start().starts_with("//"))
        .collect();
    let code = code.join(" ");
    let word = |text: &str| -> String {
        let text = text.trim_start();
        text.chars()
            .take_while(|c| c.is_alphanumeric() || *c == '_')
            .collect()
    };
    let mut rooms = Vec::new();
    for (at, _) in code.match_indices("crate::") {
        let rest = &code[at + "crate::".len()..];
        let Some(list) = rest.strip_prefix('{') else {
            rooms.push(word(rest));
            continue;
        };
        rooms.push(word(list));
        let mut depth = 1;
        for (at, c) in list.char_indices() {
            match c {
                '{' => depth += 1,
                '}' => depth -= 1,
                ',' if depth == 1 => rooms.push(word(&list[at + 1..])),
                _ => {}
            }
            if depth == 0 {
                break;
            }
        }
    }
    rooms
}

fn breaches(room: &str, forbidden: &[&str]) -> Vec<String> {
    let root = Path::new(env!("CARGO_MANIFEST_DIR")).join("src").join(room);
    let mut found = Vec::new();
    let files = sources(&root);
    assert!(!files.is_empty(), "no source in {room}");
    for file in files {
        for named in rooms_named(&fs::read_to_string(&file).expect("a readable source")) {
            if forbidden.contains(&named.as_str()) {
                found.push(format!("{} names crate::{named}", file.display()));
            }
        }
    }
    found
}

#[test]
fn the_proof_does_not_know_the_solver() {
    assert_eq!(
        breaches("proof", &["solve", "check", "job", "report", "cli"]),
        [""; 0]
    );
}

#[test]
fn no_step_knows_a_later_one() {
    let later: [(&str, &[&str]); 8] = [
        (
            "result",
            &["job", "solve", "proof", "check", "report", "cli"],
        ),
        (
            "quantity",
            &[
                "job", "model", "solve", "proof", "result", "check", "report", "cli",
            ],
        ),
        (
            "catalogue",
            &[
                "job", "model", "solve", "proof", "result", "check", "report", "cli",
            ],
        ),
        (
            "model",
            &["job", "solve", "proof", "result", "check", "report", "cli"],
        ),
        (
            "job",
            &["solve", "proof", "result", "check", "report", "cli"],
        ),
        ("solve", &["job", "proof", "check", "report", "cli"]),
        ("check", &["job", "proof", "report", "cli"]),
        ("report", &["job", "solve", "proof", "check", "cli"]),
    ];
    for (room, forbidden) in later {
        assert_eq!(breaches(room, forbidden), [""; 0], "{room}");
    }
}

#[test]
fn a_breach_would_be_seen() {
    let code = "use crate::solve::member;\n// crate::check\nlet x = crate::quantity::Curve;";
    assert_eq!(rooms_named(code), ["solve", "quantity"]);
    let list = "use crate::{\n    model::{Member, Model},\n    solve,\n};";
    assert_eq!(rooms_named(list), ["model", "solve", ""]);
}
