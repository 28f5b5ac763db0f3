//! Tests of the literal reader.

mod forms;
mod properties;
mod refusals;

use super::read;
use crate::quantity::Measure;

/// The nominal value of a literal that has to be read, in SI base units.
fn si<Q: Measure>(text: &str) -> f64 {
    match read::<Q>(text) {
        Ok(literal) => literal.nominal.si(),
        Err(error) => panic!("{text:?}: {} ({})", error.message, error.help),
    }
}
