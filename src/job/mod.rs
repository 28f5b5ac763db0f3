//! The job file: as written, with each key and value at its place, then as meant, a
//! [`Model`].
//!
//! All faults of a file come out of one run, in the order of the text: those of the syntax, those
//! of single values, and those of what values mean together. Nothing is concluded from a value that
//! is at fault.

mod document;
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
use document::Table;
use toml::de::DeTable;

/// A job file may have as many bytes; that of a member of 100,000 segments has a tenth.
pub const MOST_BYTES: usize = 1 << 26;

/// In a larger text only one fault of the syntax is looked for: one that is nothing but
/// faults would fill the memory with them.
const LARGE: usize = 1 << 22;

/// Reads a job from its text.
///
/// # Errors
/// Everything that is wrong with it, in the order of the text, each fault once.
pub fn read(text: &str) -> Result<Model, Vec<Problem>> {
    let (table, errors) = match document::direct(text) {
        Some(table) => (table, Vec::new()),
        None => by_toml(text)?,
    };
    let mut reader = written::Reader::new(text);
    let job = written::Job::read(&table, &mut reader);
    let model = meant::model(&job, &mut reader);
    if errors.is_empty()
        && reader.problems.is_empty()
        && let Some(model) = model
    {
        return Ok(model);
    }
    let syntax = syntax::problems(&errors, text);
    Err(reader.problems.with_syntax(syntax, text))
}

/// The tree of a text that is at fault or unusual, with the faults of its syntax.
fn by_toml(text: &str) -> Result<(Table<'_>, Vec<toml::de::Error>), Vec<Problem>> {
    let (table, errors) = if text.len() <= LARGE {
        DeTable::parse_recoverable(text)
    } else {
        let table = DeTable::parse(text);
        let table = table.map_err(|error| vec![syntax::of_large(&error, text)])?;
        (table, Vec::new())
    };
    Ok((document::recovered(table.into_inner()), errors))
}

/// Every kind of table of the job file with the keys that it may have.
pub fn keys() -> Vec<(&'static str, &'static [&'static str])> {
    written::TABLES
        .iter()
        .map(|keys| (keys.table, keys.keys))
        .collect()
}
