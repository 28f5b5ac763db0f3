//! Tests of the literal reader.

mod forms;
mod properties;
mod refusals;
mod rules;

use crate::quantity::{LiteralError, Measure, read};

/// The nominal value of a literal that has to be read, in SI base units.
fn si<Q: Measure>(text: &str) -> f64 {
    match read::<Q>(text) {
        Ok(literal) => literal.nominal.si(),
        Err(error) => panic!("{text:?}: {} ({})", error.message, error.help),
    }
}

/// Holds that a text is refused with this message, that this part of it is underlined, and that
/// the help has these words.
#[track_caller]
fn hold<T: std::fmt::Debug>(
    text: &str,
    read: Result<T, LiteralError>,
    part: &str,
    message: &str,
    help: &str,
) {
    let error = read.expect_err(text);
    assert_eq!(error.message, message, "{text:?}");
    assert_eq!(&text[error.at.clone()], part, "{text:?}");
    assert!(error.help.contains(help), "{text:?}: {}", error.help);
}

#[track_caller]
fn refused<Q: Measure + std::fmt::Debug>(text: &str, part: &str, message: &str, help: &str) {
    hold(text, read::<Q>(text), part, message, help);
}

/// The help where a length is expected.
const LENGTHS: &str = "write it as in \"2.85 m\"; units of a length: m mm cm";
