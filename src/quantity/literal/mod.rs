//! Quantity literals: the text of a value with its unit, read.

mod share;

pub use share::{MovementBound, StressLimit, read_movement_bound, read_stress_limit};

use super::{Measure, TemperatureInterval, ThermodynamicTemperature};
use std::ops::Range;

/// What a literal said: its nominal value, and the range that its tolerance gives.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Literal<Q> {
    /// The value as written, without its tolerance.
    pub nominal: Q,
    /// The least value; the nominal one where no tolerance is written.
    pub lower: Q,
    /// The largest value; the nominal one where no tolerance is written.
    pub upper: Q,
    /// Whether a tolerance is written.
    pub toleranced: bool,
}

/// Why a text is no literal of what is expected.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
#[error("{message}")]
pub struct LiteralError {
    /// The bytes of the text that are at fault; empty at the end where something is missing.
    pub at: Range<usize>,
    /// What is wrong, one sentence without a full stop.
    pub message: String,
    /// What to write instead.
    pub help: String,
}

/// Reads a literal of the dimension of `Q`.
pub fn read<Q: Measure>(text: &str) -> Result<Literal<Q>, LiteralError> {
    Err(LiteralError {
        at: 0..text.len(),
        message: format!("{} is expected here", Q::DIMENSION.name()),
        help: format!(
            "write it with its unit, such as \"{}\"",
            Q::DIMENSION.example()
        ),
    })
}

/// Reads a change of temperature, whose sign is compulsory.
pub fn read_change(text: &str) -> Result<Literal<TemperatureInterval>, LiteralError> {
    read(text)
}

/// Reads a reading of temperature, which never has a leading `+`.
pub fn read_reading(text: &str) -> Result<Literal<ThermodynamicTemperature>, LiteralError> {
    read(text)
}
