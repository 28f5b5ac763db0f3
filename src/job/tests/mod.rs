//! Reading whole jobs. Expected values are worked by hand from the job's own numbers.

mod bad_assembly;
mod bad_files;
mod bad_holds;
mod bad_job_loads;
mod bad_loads;
mod bad_members;
mod bad_one_way;
mod bad_segments;
mod bad_tables;
mod bad_watches;
mod draw;
mod follow_ups;
mod fuzz;
mod good;
mod good_assembly;
mod good_combinations;
mod good_limits;
mod good_members;
mod good_spaces;

use super::{Source, read};
use std::fmt::Write;

/// A job with one fixed member of one round segment, and lines added to it.
fn tie(more: &str) -> String {
    format!(
        "[member.tie]\nstart = \"fixed\"\nsegment = [{{ name = \"rod\", length = \"2 m\", section = \
         {{ round = \"20 mm\" }}, material = \"steel-s355\" }}]\n{more}\n"
    )
}

/// Why it is a fault, the job, and what is said of it.
type Bad = (&'static str, &'static str, &'static str);

/// All that is said of a job: line, column, message and remedy, one fault below the other.
fn said(job: &str) -> String {
    let source = Source::new("job.toml", job);
    let mut said = String::new();
    for problem in read(job).err().unwrap_or_default() {
        let (line, column) = source.line_and_column(&problem.place);
        let separator = if said.is_empty() { "" } else { "\n" };
        let _ = write!(said, "{separator}{line}:{column} {}", problem.message);
        if let Some(help) = problem.help {
            let _ = write!(said, " | {help}");
        }
    }
    said
}

/// Holds every message of a table word for word.
fn check(table: &[Bad]) {
    for (why, job, expected) in table {
        assert_eq!(said(job), *expected, "{why}:\n{job}");
    }
}
