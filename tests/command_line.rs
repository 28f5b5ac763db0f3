//! The program itself, from its arguments to its exit status.

#![allow(clippy::unwrap_used)] // helpers of tests

use std::fs;
use std::path::Path;
use std::process::{Command, Output, Stdio};
use tempfile::{TempDir, tempdir};

fn lengthwise(arguments: &[&str]) -> Output {
    command(arguments).output().unwrap()
}

fn command(arguments: &[&str]) -> Command {
    let mut command = Command::new(env!("CARGO_BIN_EXE_lengthwise"));
    command.args(arguments).stdin(Stdio::null());
    command
}

fn status(output: &Output) -> i32 {
    output.status.code().unwrap()
}

fn errors(output: &Output) -> &str {
    std::str::from_utf8(&output.stderr).unwrap()
}

fn text(path: &Path) -> &str {
    path.to_str().unwrap()
}

/// A folder with one job file, sound or not.
fn folder() -> TempDir {
    let folder = tempdir().unwrap();
    fs::write(folder.path().join("job.toml"), "[job]\n").unwrap();
    folder
}

/// Refused: status 2, nothing on standard output, and this on standard error.
fn assert_refused(arguments: &[&str], reason: &str) {
    let output = lengthwise(arguments);
    assert_eq!(status(&output), 2, "{arguments:?}");
    assert!(output.stdout.is_empty(), "{arguments:?}");
    let errors = errors(&output);
    assert!(errors.contains(reason), "{arguments:?}: {errors}");
}

#[test]
fn help_and_version_are_results() {
    for (arguments, said) in [
        (&["--help"][..], "check"),
        (&["check", "--help"], "--require-checks"),
        (
            &["--version"],
            concat!("lengthwise ", env!("CARGO_PKG_VERSION")),
        ),
    ] {
        let output = lengthwise(arguments);
        assert_eq!(status(&output), 0);
        assert!(String::from_utf8_lossy(&output.stdout).contains(said));
        assert_eq!(errors(&output), "");
    }
}

#[test]
fn a_wrong_command_line_is_refused_with_what_would_be_right() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let job = text(&job);
    assert_refused(&[], "Usage");
    assert_refused(&["check"], "<PATH>");
    assert_refused(&["chekc", job], "'check'");
    assert_refused(&["check", job, "--format", "xml"], "table, json, csv");
    assert_refused(&["check", job, "--table", "segments"], "--format csv alone");
    assert_refused(
        &["check", job, "--format", "json", "--table", "segments"],
        "--format csv alone",
    );
    assert_refused(&["check", job, "--format", "csv"], "say which with --table");
    assert_refused(
        &["check", job, "--format", "csv", "--table", "rows"],
        "the tables are members",
    );
    assert_refused(
        &["check", job, "--format", "csv", "--table", "holds"],
        "assemblies",
    );
    assert_refused(&["check", job, "--digits", "0"], "from 1 to 17");
    assert_refused(&["check", job, "--digits", "18"], "from 1 to 17");
    assert_refused(&["check", job, "--digits", "four"], "from 1 to 17");
    assert_refused(
        &["check", job, "--format", "json", "--digits", "6"],
        "are exact",
    );
    assert_refused(
        &["check", job, "--format", "json", "--brief"],
        "always whole",
    );
}

#[test]
fn a_path_that_does_not_exist_is_refused_before_any_work() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let missing = folder.path().join("none.toml");
    let beneath = job.join("none.toml");
    let report = folder.path().join("report.txt");
    for path in [missing, beneath] {
        assert_refused(
            &["check", text(&job), text(&path), "--output", text(&report)],
            "there is no such file or folder",
        );
    }
    assert!(!report.exists());
}

#[test]
fn a_folder_without_a_job_file_is_refused() {
    let folder = tempdir().unwrap();
    assert_refused(
        &["check", text(folder.path())],
        "no job file in this folder",
    );
    fs::write(folder.path().join("tool.toml"), "[tool]\n").unwrap();
    assert_refused(
        &["check", text(folder.path())],
        "no job file in this folder",
    );
}

#[test]
fn an_output_that_cannot_be_written_is_refused() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let before = fs::read(&job).unwrap();
    let nowhere = folder.path().join("none/report.txt");
    assert_refused(
        &["check", text(&job), "--output", text(&nowhere)],
        "folder does not exist",
    );
    assert_refused(
        &["check", text(&job), "--output", text(folder.path())],
        "it is a folder",
    );
    assert_refused(
        &["check", text(&job), "--output", text(&job)],
        "would replace a job",
    );
    assert_eq!(fs::read(&job).unwrap(), before);
}

#[cfg(unix)]
#[test]
fn an_output_over_an_input_is_refused_through_a_link_too() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let link = folder.path().join("report.txt");
    std::os::unix::fs::symlink(&job, &link).unwrap();
    assert_refused(
        &["check", text(folder.path()), "--output", text(&link)],
        "would replace a job",
    );
}

#[cfg(target_os = "linux")]
#[test]
fn a_full_disk_is_told() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let output = lengthwise(&["check", text(&job), "--output", "/dev/full"]);
    assert!(
        errors(&output).contains("/dev/full: cannot be written"),
        "{}",
        errors(&output)
    );
    assert!(status(&output) >= 2);

    let full = fs::OpenOptions::new()
        .write(true)
        .open("/dev/full")
        .unwrap();
    let output = command(&["check", text(&job)])
        .stdout(full)
        .output()
        .unwrap();
    assert!(
        errors(&output).contains("standard output cannot be written"),
        "{}",
        errors(&output)
    );
    assert!(status(&output) >= 2);
}

#[cfg(unix)]
#[test]
fn a_closed_pipe_ends_quietly() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    for arguments in [&["check", text(&job)][..], &["check", "--help"]] {
        let (reader, writer) = std::io::pipe().unwrap();
        drop(reader);
        let output = command(arguments).stdout(writer).output().unwrap();
        assert!(!errors(&output).contains("pipe"), "{}", errors(&output));
        assert!(!errors(&output).contains("panicked"), "{}", errors(&output));
        assert!(output.status.code().is_some());
    }
}

#[test]
fn a_folder_called_like_a_job_file_is_walked_into() {
    let folder = folder();
    fs::create_dir(folder.path().join("sub.toml")).unwrap();
    let output = lengthwise(&["check", text(folder.path()), "--brief"]);
    assert!(!errors(&output).contains("sub.toml"), "{}", errors(&output));
}

#[test]
fn nothing_but_a_terminal_is_coloured() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let output = lengthwise(&["check", text(&job)]);
    assert!(!output.stdout.contains(&0x1b));
}
