//! Bad input ends in located errors and status 3, or in a command-line error and status 2: no
//! panic, no hang, no silent default, no half-written file.

#![allow(clippy::unwrap_used)] // helpers of tests

mod assemblies;
mod files;
mod hostile;
mod make_ups;
mod members;
mod order;
mod outputs;
mod syntax;
mod values;

use lengthwise::result::{JobResult, JobStatus};
use std::fmt::Write;
use std::path::Path;
use std::process::{Command, Output, Stdio};

/// A job of one sound member, with lines added to its table; the first of them is the fourth.
fn tie(more: &str) -> String {
    format!(
        "[member.tie]\nstart = \"fixed\"\nsegment = [{{ name = \"rod\", length = \"2 m\", section = \
         {{ round = \"20 mm\" }}, material = \"steel-s355\" }}]\n{more}\n"
    )
}

/// The result of a job that must be an error with places.
fn refused(job: impl AsRef<[u8]>) -> JobResult {
    let result = lengthwise::check_bytes("job.toml", job.as_ref()).result;
    assert_eq!(result.status, JobStatus::Error);
    assert!(!result.errors.is_empty());
    for error in &result.errors {
        assert!(error.line.is_some() && error.column.is_some(), "{error:?}");
    }
    result
}

/// All that is said of a job: line, column, message and remedy, one fault below the other.
fn said(job: impl AsRef<[u8]>) -> String {
    let mut said = String::new();
    for error in refused(job).errors {
        let separator = if said.is_empty() { "" } else { "\n" };
        let (line, column) = (error.line.unwrap(), error.column.unwrap());
        write!(said, "{separator}{line}:{column} {}", error.message).unwrap();
        if let Some(help) = error.help {
            write!(said, " | {help}").unwrap();
        }
    }
    said
}

/// Holds what is said of every job of a table, word for word.
fn check(table: &[(&str, &str)]) {
    let mut wrong = String::new();
    for (lines, expected) in table {
        let said = said(tie(lines));
        if said != *expected {
            write!(wrong, "{lines}\n  says     {said}\n  expected {expected}\n").unwrap();
        }
    }
    assert!(wrong.is_empty(), "{wrong}");
}

/// The program with its arguments.
fn program(arguments: &[&str]) -> Output {
    let mut command = Command::new(env!("CARGO_BIN_EXE_lengthwise"));
    command.args(arguments).stdin(Stdio::null());
    command.output().unwrap()
}

fn status(output: &Output) -> i32 {
    output.status.code().unwrap()
}

fn errors(output: &Output) -> String {
    String::from_utf8_lossy(&output.stderr).into_owned()
}

fn text(path: &Path) -> &str {
    path.to_str().unwrap()
}
