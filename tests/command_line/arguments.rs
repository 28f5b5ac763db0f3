//! Arguments that are wrong, and those that ask for help.

use crate::{assert_refused, errors, folder, lengthwise, status, text};
use std::fs;
use tempfile::tempdir;

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
        &["check", job, "--format", "csv", "--table", "hold"],
        "points, bodies, holds, watches",
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
