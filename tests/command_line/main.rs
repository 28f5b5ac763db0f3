//! The program itself, from its arguments to its exit status.

#![allow(clippy::unwrap_used)] // helpers of tests

mod arguments;
mod folders;
mod formats;
mod output;
mod statuses;
mod terminal;

use std::fs;
use std::io::Write;
use std::path::{Path, PathBuf};
use std::process::{Command, Output, Stdio};
use tempfile::{TempDir, tempdir};

/// Jobs that hold, fail, check nothing, and cannot be read (two errors, in lines 2 and 4).
pub(crate) const PASSES: &str = "\
[member.tie]
start = \"fixed\"
segment = [{ length = \"2 m\", section = { round = \"20 mm\" }, material = \"steel-s355\" }]
load = [{ at = \"end\", force = \"40 kN\" }]
limit = { elongation = \"2 mm\", tension = \"0.6 yield\" }
";
pub(crate) const FAILS: &str = "\
[member.tie]
start = \"fixed\"
segment = [{ length = \"2 m\", section = { round = \"20 mm\" }, material = \"steel-s355\" }]
load = [{ at = \"end\", force = \"40 kN\" }]
limit = { elongation = \"1 mm\", tension = \"0.6 yield\" }
";
pub(crate) const UNCHECKED: &str = "\
[member.tie]
start = \"fixed\"
segment = [{ length = \"2 m\", section = { round = \"20 mm\" }, material = \"steel-s355\" }]
load = [{ at = \"end\", force = \"40 kN\" }]
";
pub(crate) const BROKEN: &str = "\
[member.tie]
start = \"fxed\"
segment = [{ length = \"2 m\", section = { round = \"20 mm\" }, material = \"steel-s355\" }]
load = [{ at = \"end\", force = \"40 furlong\" }]
";

pub(crate) fn lengthwise(arguments: &[&str]) -> Output {
    command(arguments).output().unwrap()
}

pub(crate) fn command(arguments: &[&str]) -> Command {
    let mut command = Command::new(env!("CARGO_BIN_EXE_lengthwise"));
    command.args(arguments).stdin(Stdio::null());
    command
}

/// Runs the program with this on its standard input.
pub(crate) fn fed(arguments: &[&str], input: &str) -> Output {
    let mut running = command(arguments)
        .stdin(Stdio::piped())
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .unwrap();
    // The pipe is closed at the end of the statement.
    running
        .stdin
        .take()
        .unwrap()
        .write_all(input.as_bytes())
        .unwrap();
    running.wait_with_output().unwrap()
}

pub(crate) fn status(output: &Output) -> i32 {
    output.status.code().unwrap()
}

pub(crate) fn errors(output: &Output) -> &str {
    std::str::from_utf8(&output.stderr).unwrap()
}

pub(crate) fn printed(output: &Output) -> &str {
    std::str::from_utf8(&output.stdout).unwrap()
}

pub(crate) fn text(path: &Path) -> &str {
    path.to_str().unwrap()
}

/// A folder with one job file, which cannot be read.
pub(crate) fn folder() -> TempDir {
    folder_of(&[("job.toml", "[job]\n")])
}

/// A folder with these files.
pub(crate) fn folder_of(files: &[(&str, &str)]) -> TempDir {
    let folder = tempdir().unwrap();
    for (name, text) in files {
        let path = folder.path().join(name);
        fs::create_dir_all(path.parent().unwrap()).unwrap();
        fs::write(path, text).unwrap();
    }
    folder
}

/// A folder with one job file, and its path.
pub(crate) fn stated(job: &str) -> (TempDir, PathBuf) {
    let folder = folder_of(&[("job.toml", job)]);
    let path = folder.path().join("job.toml");
    (folder, path)
}

/// Refused: status 2, nothing on standard output, and this on standard error.
pub(crate) fn assert_refused(arguments: &[&str], reason: &str) {
    let output = lengthwise(arguments);
    assert_eq!(status(&output), 2, "{arguments:?}");
    assert!(output.stdout.is_empty(), "{arguments:?}");
    let errors = errors(&output);
    assert!(errors.contains(reason), "{arguments:?}: {errors}");
}
