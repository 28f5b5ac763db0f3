//! Reports: the same finished [`crate::result`] as text, as a brief, as JSON and as CSV.
//!
//! A report computes nothing but how a value looks. Each is written job by job to whatever
//! [`std::io::Write`] it is given, so that nothing but JSON holds more than one job.

pub mod csv;
mod finite;
pub mod json;
#[cfg(test)]
pub(crate) mod sample;
pub mod text;

pub use finite::{NotFinite, all_finite};
