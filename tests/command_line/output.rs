//! Where results go: a file, whole or not at all, a device, a pipe.

use crate::{
    FAILS, PASSES, assert_refused, command, errors, folder, lengthwise, stated, status, text,
};
use std::fs;
use std::path::Path;

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
fn an_output_holds_what_standard_output_would_have_and_keeps_the_status() {
    for (job, expected) in [(PASSES, 0), (FAILS, 1)] {
        let (folder, path) = stated(job);
        let report = folder.path().join("report.out");
        for form in [
            &[][..],
            &["--brief"],
            &["--format", "json"],
            &["--format", "csv", "--table", "stations"],
        ] {
            let on_screen = lengthwise(&[&["check", text(&path)], form].concat());
            let arguments = [&["check", text(&path), "--output", text(&report)], form].concat();
            let written = lengthwise(&arguments);
            assert_eq!(status(&written), expected);
            assert!(written.stdout.is_empty() && written.stderr.is_empty());
            assert_eq!(fs::read(&report).unwrap(), on_screen.stdout, "{form:?}");
        }
        assert_eq!(
            fs::read_dir(folder.path()).unwrap().count(),
            2,
            "nothing stays beside it"
        );
    }
}

#[test]
fn an_existing_report_is_kept_where_the_new_one_is_refused() {
    let (folder, path) = stated(PASSES);
    let report = folder.path().join("report.txt");
    fs::write(&report, "of last week").unwrap();
    let missing = folder.path().join("none.toml");
    assert_refused(
        &[
            "check",
            text(&path),
            text(&missing),
            "--output",
            text(&report),
        ],
        "there is no such file or folder",
    );
    assert_eq!(fs::read_to_string(&report).unwrap(), "of last week");
}

#[cfg(unix)]
#[test]
fn permissions_are_kept_and_a_link_stays_a_link() {
    use std::os::unix::fs::{PermissionsExt, symlink};
    let (folder, path) = stated(PASSES);
    let report = folder.path().join("report.txt");
    let link = folder.path().join("latest.txt");
    fs::write(&report, "of last week").unwrap();
    fs::set_permissions(&report, PermissionsExt::from_mode(0o640)).unwrap();
    symlink("report.txt", &link).unwrap();
    let output = lengthwise(&["check", text(&path), "--output", text(&link)]);
    assert_eq!(status(&output), 0, "{}", errors(&output));
    assert!(fs::symlink_metadata(&link).unwrap().is_symlink());
    assert!(
        fs::read_to_string(&report)
            .unwrap()
            .contains("\nverdict      pass")
    );
    let mode = fs::metadata(&report).unwrap().permissions().mode();
    assert_eq!(mode & 0o777, 0o640);
}

#[cfg(target_os = "linux")]
#[test]
fn a_full_disk_is_status_2_even_where_every_check_holds() {
    let (_folder, path) = stated(PASSES);
    let output = lengthwise(&["check", text(&path), "--output", "/dev/full"]);
    assert_eq!(status(&output), 2);
    assert!(Path::new("/dev/full").exists());
}

/// A reader that takes one line and goes, as `head -1` does, of a report much longer than a pipe
/// holds.
#[cfg(unix)]
#[test]
fn a_reader_that_goes_away_ends_the_run_quietly() {
    use std::io::{BufRead, BufReader};
    let folder = folder();
    let job = folder.path().join("job.toml");
    let segment =
        "{ length = \"1 m\", section = { round = \"20 mm\" }, material = \"steel-s355\" }, ";
    let long = PASSES.replace(
        "segment = [",
        &format!("segment = [{}", segment.repeat(3000)),
    );
    fs::write(&job, long).unwrap();
    let mut running = command(&["check", text(&job)])
        .stdout(std::process::Stdio::piped())
        .stderr(std::process::Stdio::piped())
        .spawn()
        .unwrap();
    let mut reader = BufReader::new(running.stdout.take().unwrap());
    let mut line = String::new();
    reader.read_line(&mut line).unwrap();
    drop(reader);
    let output = running.wait_with_output().unwrap();
    assert_eq!(line, "Untitled job\n");
    assert_eq!(errors(&output), "");
    assert!(output.status.code().is_some_and(|code| code <= 1));
}
