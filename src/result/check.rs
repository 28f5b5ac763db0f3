//! The results of checks, and what governs.

use crate::model::{AreaUsed, Name};
use serde::{Deserialize, Serialize};

/// Whether a check holds.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "lowercase")]
#[allow(missing_docs)]
pub enum Verdict {
    Pass,
    Fail,
}

/// The SI unit of a demand and its limit.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[allow(missing_docs)]
pub enum Unit {
    #[serde(rename = "Pa")]
    Pascal,
    #[serde(rename = "N")]
    Newton,
    #[serde(rename = "m")]
    Metre,
    #[serde(rename = "rad")]
    Radian,
    /// A yes-or-no check: demand and limit are 1 for yes and 0 for no.
    #[serde(rename = "1")]
    None,
}

/// One check in one combination. Demand and limit are signed where the limit is a pair.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct CheckResult {
    /// The key of the limit: `tension`, `gap` …
    pub check: Name,
    /// What it is held of: `H4`, `H4.shank`, `H4.shank.bars`, `H4.kerb`.
    pub on: Name,
    /// Where along the member the demand is largest; null where that has no sense.
    pub at: Option<f64>,
    /// The area that a stress stands on.
    pub area: Option<AreaUsed>,
    /// What there is.
    pub demand: f64,
    /// What is allowed.
    pub limit: f64,
    /// The unit of both.
    pub unit: Unit,
    /// Demand over limit by size; null where that has no sense.
    pub utilisation: Option<f64>,
    /// Whether it holds.
    pub status: Verdict,
    /// Where the limit comes from, in the job's words.
    pub source: Option<Name>,
    /// Values between, by name (SI).
    pub details: serde_json::Map<String, serde_json::Value>,
    /// The line of the job file that set the limit.
    pub line: usize,
}

/// The largest utilisation of one check on one thing over all combinations.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)] // as in `CheckResult`
pub struct Governing {
    pub check: Name,
    pub on: Name,
    pub combination: Name,
    pub at: Option<f64>,
    pub area: Option<AreaUsed>,
    pub demand: f64,
    pub limit: f64,
    pub unit: Unit,
    pub utilisation: Option<f64>,
    pub status: Verdict,
    pub source: Option<Name>,
    pub line: usize,
}

/// A stress over its limit, or within 5 % of it, where it governs.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)] // as in `CheckResult`
pub struct Warning {
    pub check: Name,
    pub on: Name,
    pub at: Option<f64>,
    pub combination: Name,
    /// Its size (Pa).
    pub stress: f64,
    /// The size that is allowed (Pa).
    pub allowable: f64,
    /// The first over the second; null where none is allowed.
    pub ratio: Option<f64>,
    pub status: Verdict,
    pub line: usize,
}

/// The range of one result over all combinations.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct Envelope {
    /// The result's address: `H4.start.reaction`.
    pub result: String,
    /// Its SI unit.
    pub unit: Unit,
    /// The largest value.
    pub max: Option<f64>,
    /// The combination that it comes from.
    pub max_in: Option<Name>,
    /// The least value.
    pub min: Option<f64>,
    /// The combination that it comes from.
    pub min_in: Option<Name>,
}
