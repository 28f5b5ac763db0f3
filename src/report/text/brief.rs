//! The brief: the governing checks of one job, or one line a job.

use super::words::{paint, printable, status};
use super::{Layout, checks, heading, ratio, write_foot};
use crate::result::{JobResult, JobStatus};
use std::io::{self, Write};
use unicode_width::UnicodeWidthStr;

/// Writes the head of a job's report and its governing checks.
///
/// # Errors
/// Those of `out`.
pub fn write_brief(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    heading::write(out, job, layout)?;
    checks::write_governing(out, job, layout)?;
    write_foot(out, job, layout)
}

/// Writes one line: the verdict, the utilisation of the check that governs, the file padded to
/// `file_width` columns, and that check; for a job in error its first error.
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
    let governing = match job.status {
        JobStatus::Error => None,
        _ => job.governing_check(),
    };
    let used = governing.and_then(|check| check.utilisation);
    let used = ratio(&layout.style(job), used);
    let file = printable(&job.file);
    write!(out, "{}", paint(word, layout.colour))?;
    write!(out, "{:1$}", "", "unchecked".len() - word.len())?;
    write!(out, "  {used:>0$}  {file}", layout.digits + 2)?;
    let remark = match (job.status, governing, job.errors.as_slice()) {
        (JobStatus::Error, _, [error]) => error.message.clone(),
        (JobStatus::Error, _, [error, ..]) => {
            format!("{} errors, the first: {}", job.errors_total, error.message)
        }
        (_, Some(check), _) => format!(
            "{} on {}, combination {}",
            checks::governing_name(job, check),
            check.on,
            check.combination
        ),
        _ => String::new(),
    };
    if !remark.is_empty() {
        let gap = file_width.saturating_sub(file.width()) + 2;
        write!(out, "{:gap$}{}", "", printable(&remark))?;
    }
    writeln!(out)
}
