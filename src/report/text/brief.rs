//! The brief: the governing checks of one job, or one line a job.

use super::words::{paint, printable, status};
use super::{Layout, checks, heading, ratio, write_foot};
use crate::result::{JobResult, JobStatus};
use std::io::{self, Write};

/// Writes the head of a job's report and its governing checks.
///
/// # Errors
/// Those of `out`.
pub fn write_brief(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    heading::write(out, job, layout)?;
    checks::write_governing(out, job, layout)?;
    write_foot(out, layout)
}

/// Writes one line: the verdict, the file padded to `file_width` columns, and the check that
/// governs with its utilisation.
///
/// # Errors
/// Those of `out`.
pub fn write_line(
    out: &mut dyn Write,
    job: &JobResult,
    file_width: usize,
    layout: &Layout,
) -> io::Result<()> {
    let word = status(job.status);
    let file = printable(&job.file);
    write!(out, "{}", paint(word, layout.colour))?;
    write!(out, "{:1$}", "", "unchecked".len() - word.len() + 2)?;
    let style = layout.style(job);
    match (job.status, job.governing_check()) {
        (JobStatus::Error, _) => {
            let first = job.errors.first();
            let message = first.map_or("", |error| error.message.as_str());
            writeln!(out, "{file:file_width$}  {}", printable(message))
        }
        (_, Some(check)) => writeln!(
            out,
            "{file:file_width$}  {} {} on {}, combination {}",
            ratio(&style, check.utilisation),
            check.check,
            check.on,
            check.combination,
        ),
        (_, None) => writeln!(out, "{file}"),
    }
}
