//! `README.md`: its commands, its screen, its table of exit statuses.

use super::page::{Page, code, root};
use std::fs;
use std::process::Command;

fn readme() -> Page {
    Page::read("README.md")
}

fn lengthwise(arguments: &[&str]) -> (String, Option<i32>) {
    let output = Command::new(env!("CARGO_BIN_EXE_lengthwise"))
        .args(arguments)
        .current_dir(root())
        .output()
        .unwrap();
    (
        String::from_utf8(output.stdout).unwrap(),
        output.status.code(),
    )
}

/// The lines of the set-up section's fenced blocks.
fn commands() -> Vec<String> {
    let set_up = readme().section("Set-up");
    let blocks = set_up.blocks();
    let lines = blocks.iter().flat_map(|block| block.text.lines());
    lines.map(str::to_owned).collect()
}

/// The arguments of `check` in the first command.
fn main_job() -> Vec<String> {
    let commands = commands();
    let (_, arguments) = commands[0].split_once(" -- ").unwrap();
    arguments.split(' ').map(str::to_owned).collect()
}

#[test]
fn two_commands_set_up_the_main_job_and_the_tests() {
    let commands = commands();
    assert_eq!(commands.len(), 2, "{commands:?}");
    assert!(commands[0].starts_with("cargo run --release "));
    assert!(commands[1].starts_with("cargo test"));
    assert_eq!(main_job()[0], "check");
}

#[test]
fn the_job_and_the_screen_are_those_of_the_main_job() {
    let readme = readme();
    let arguments = main_job();
    let arguments: Vec<&str> = arguments.iter().map(String::as_str).collect();
    let (screen, status) = lengthwise(&arguments);
    assert_eq!(status, Some(0));
    let job = fs::read_to_string(root().join(arguments[1])).unwrap();
    let (_, job) = job.split_once("\n\n").unwrap(); // what stands at the head is for the tests
    let blocks = readme.blocks();
    let find = |kind| blocks.iter().find(|block| block.kind == kind).unwrap();
    readme.hold(&[(find("toml"), job.to_owned()), (find("text"), screen)]);
}

#[test]
fn the_exit_statuses_are_those_that_the_program_tells() {
    let (help, _) = lengthwise(&["--help"]);
    let (_, told) = help.split_once("Exit status:\n").unwrap();
    let told: Vec<(&str, &str)> = told
        .lines()
        .filter_map(|line| line.trim().split_once("  "))
        .collect();
    assert_eq!(told.len(), 4, "{help}");
    let readme = readme();
    let table = &readme.tables("statuses")[0];
    let listed: Vec<(&str, &str)> = table
        .rows
        .iter()
        .map(|row| (code(row[0])[0], row[1]))
        .collect();
    assert_eq!(listed, told);
}

#[test]
fn the_options_are_those_that_the_program_tells() {
    let (help, _) = lengthwise(&["check", "--help"]);
    let options = help
        .lines()
        .filter_map(|line| line.strip_prefix("      --"));
    let told: Vec<String> = options
        .filter_map(|line| Some(format!("--{}", line.split(' ').next()?)))
        .collect();
    assert!(told.len() > 4, "{help}");
    let readme = readme();
    let table = &readme.tables("options")[0];
    let listed: Vec<&str> = table
        .rows
        .iter()
        .map(|row| code(row[0])[0].split(' ').next().unwrap())
        .collect();
    assert_eq!(listed, told);
}
