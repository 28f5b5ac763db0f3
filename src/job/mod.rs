//! The job file: as written, with each key and value at its place, then as meant, a
//! [`Model`].
//!
//! All faults of a file come out of one run, in the order of the text: those of the syntax, those
//! of single values, and those of what values mean together. Nothing is concluded from a value that
//! is at fault.

mod meant;
mod nearest;
mod problem;
pub mod render;
mod source;
mod syntax;
#[cfg(test)]
mod tests;
mod written;

pub use problem::Problem;
pub use source::{Source, Undecoded, decode};

use crate::model::Model;
use toml::de::DeTable;

/// Reads a job from its text.
///
/// # Errors
/// Everything that is wrong with it, in the order of the text, each fault once.
pub fn read(text: &str) -> Result<Model, Vec<Problem>> {
    let (table, errors) = DeTable::parse_recoverable(text);
    let mut reader = written::Reader::new(text);
    let job = written::Job::read(table.get_ref(), &mut reader);
    let model = meant::model(&job, &mut reader);
    if errors.is_empty()
        && reader.problems.is_empty()
        && let Some(model) = model
    {
        return Ok(model);
    }
    let syntax = errors
        .iter()
        .map(|error| syntax::problem(error, text))
        .collect();
    Err(reader.problems.with_syntax(syntax, text))
}

/// Every kind of table of the job file with the keys that it may have.
pub fn keys() -> Vec<(&'static str, &'static [&'static str])> {
    written::TABLES
        .iter()
        .map(|keys| (keys.table, keys.keys))
        .collect()
}
