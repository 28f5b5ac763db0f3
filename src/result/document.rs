//! The whole document: what one run found, job by job.

use super::{CheckResult, CombinationResult, Envelope, Governing, Verdict, Warning};
use crate::model::Name;
use crate::quantity::Units;
use serde::{Deserialize, Serialize};

/// One run.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct Document {
    /// 1.
    pub format: u32,
    /// What made it.
    pub tool: Tool,
    /// The units of its numbers.
    pub units: UnitNames,
    /// The jobs in the order of their paths.
    pub jobs: Vec<JobResult>,
    /// What was looked at.
    pub counts: Counts,
}

/// What made a document.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)]
pub struct Tool {
    pub name: String,
    pub version: String,
    /// `sha256:` of the built-in catalogue.
    pub catalogue: String,
}

/// The units of a document's numbers.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)]
pub struct UnitNames {
    pub length: String,
    pub force: String,
    pub stress: String,
    pub temperature: String,
    pub angle: String,
    pub stiffness: String,
}

impl Default for UnitNames {
    fn default() -> Self {
        UnitNames {
            length: "m".into(),
            force: "N".into(),
            stress: "Pa".into(),
            temperature: "K".into(),
            angle: "rad".into(),
            stiffness: "N/m".into(),
        }
    }
}

/// What a job came to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "lowercase")]
pub enum JobStatus {
    /// Every check that was made holds, and at least one was made.
    Pass,
    /// A check fails.
    Fail,
    /// Nothing was checked.
    Unchecked,
    /// It could not be read, or a combination could not be solved.
    Error,
}

/// One job.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)] // the keys of `[job]`, and what their types describe
pub struct JobResult {
    pub file: String,
    /// `sha256:` of the file's bytes; null where it could not be read.
    pub digest: Option<String>,
    pub title: Option<String>,
    pub reference: Option<String>,
    pub prepared_by: Option<String>,
    pub checked_by: Option<String>,
    pub date: Option<String>,
    pub note: Option<String>,
    /// K.
    pub datum: Option<f64>,
    pub units: Units,
    pub status: JobStatus,
    /// The first thousand, in the order of the file.
    pub errors: Vec<ErrorEntry>,
    /// How many there are.
    pub errors_total: usize,
    /// Stresses over their limit or near it, the governing ones.
    pub warnings: Vec<Warning>,
    pub cautions: Vec<Caution>,
    pub notes: Vec<Note>,
    pub materials: Vec<MaterialEntry>,
    pub combinations: Vec<CombinationResult>,
    pub governing: Vec<Governing>,
    pub envelope: Vec<Envelope>,
}

impl JobResult {
    /// A job of which nothing is known but why: a file that cannot be read, or a fault in the
    /// checking itself.
    pub fn unreadable(file: &str, error: ErrorEntry) -> Self {
        JobResult {
            errors: vec![error],
            errors_total: 1,
            ..Self::empty(file)
        }
    }

    /// A job of which nothing is known but its name; an error until something is.
    pub fn empty(file: &str) -> Self {
        JobResult {
            file: file.to_owned(),
            digest: None,
            title: None,
            reference: None,
            prepared_by: None,
            checked_by: None,
            date: None,
            note: None,
            datum: None,
            units: Units::default(),
            status: JobStatus::Error,
            errors: Vec::new(),
            errors_total: 0,
            warnings: Vec::new(),
            cautions: Vec::new(),
            notes: Vec::new(),
            materials: Vec::new(),
            combinations: Vec::new(),
            governing: Vec::new(),
            envelope: Vec::new(),
        }
    }

    /// The one check that decides: a failing one before any that holds, and among those the one
    /// with the largest utilisation (one that fails without a utilisation before all).
    pub fn governing_check(&self) -> Option<&Governing> {
        let rank = |row: &Governing| rank(row.status, row.utilisation);
        self.governing.iter().reduce(|first, next| {
            if rank(next) > rank(first) {
                next
            } else {
                first
            }
        })
    }

    /// The loss that governs, where several combinations take members out, with its worst check: of
    /// losses that fail alike in a yes-or-no check, that with the largest utilisation.
    pub fn governing_loss(&self) -> Option<(&CombinationResult, &CheckResult)> {
        let combinations = self.combinations.iter();
        let losses = combinations.filter(|combination| !combination.without.is_empty());
        losses.clone().nth(1)?;
        let worst = |loss: &'_ CombinationResult| {
            let checks = loss.checks.iter();
            let ranked = checks.map(|check| rank(check.status, check.utilisation));
            let used = loss.checks.iter().filter_map(|check| check.utilisation);
            let first = ranked.enumerate().reduce(
                |worst, next| {
                    if next.1 > worst.1 { next } else { worst }
                },
            );
            first.map(|(at, rank)| (at, (rank, used.fold(0.0, f64::max))))
        };
        let found = losses.filter_map(|loss| worst(loss).map(|(at, key)| (loss, at, key)));
        let (loss, at, _) =
            found.reduce(|worst, next| if next.2 > worst.2 { next } else { worst })?;
        Some((loss, loss.checks.get(at)?))
    }
}

/// An order in which what governs comes last.
fn rank(status: Verdict, utilisation: Option<f64>) -> (bool, f64) {
    match status {
        Verdict::Fail => (true, utilisation.unwrap_or(f64::INFINITY)),
        Verdict::Pass => (false, utilisation.unwrap_or(0.0)),
    }
}

/// What is wrong, where, and what to write instead.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)]
pub struct ErrorEntry {
    pub message: String,
    /// From 1; null where there is no place, as for a file that cannot be opened.
    pub line: Option<usize>,
    /// Characters from 1.
    pub column: Option<usize>,
    pub help: Option<String>,
    pub combination: Option<Name>,
}

/// Something for the engineer to act on.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)]
pub struct Caution {
    pub about: String,
    pub text: String,
    pub line: Option<usize>,
}

/// Something to know.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)]
pub struct Note {
    pub about: String,
    pub text: String,
}

/// A material that the job uses, as it was used.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[allow(missing_docs)] // the keys of `[material]`; SI
pub struct MaterialEntry {
    pub id: Name,
    pub modulus: f64,
    pub expansion: Option<f64>,
    pub density: Option<f64>,
    /// Null where it differs by thickness.
    #[serde(rename = "yield")]
    pub yield_strength: Option<f64>,
    /// Empty where one strength holds for all thicknesses.
    pub yield_by_thickness: Vec<YieldRow>,
    pub ultimate: Option<f64>,
    pub proof: Option<f64>,
    pub crushing: Option<f64>,
    pub family: Option<String>,
    pub source: Option<String>,
    pub like: Option<Name>,
}

/// The yield strength up to a thickness.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
pub struct YieldRow {
    /// m; null for any beyond the rows before it.
    pub thickness: Option<f64>,
    /// Pa.
    #[serde(rename = "yield")]
    pub yield_strength: f64,
}

/// How much was looked at, and what came of it.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default, Serialize, Deserialize)]
#[allow(missing_docs)]
pub struct Counts {
    pub files: usize,
    pub members: usize,
    pub combinations: usize,
    pub checks: usize,
    pub pass: usize,
    pub fail: usize,
    pub unchecked_jobs: usize,
    /// Errors, not jobs with errors.
    pub errors: usize,
}

impl Counts {
    /// Adds what one job was found to hold.
    pub fn add(&mut self, job: &JobResult) {
        self.files += 1;
        self.members += job
            .combinations
            .iter()
            .map(|combination| combination.members.len() + combination.without.len())
            .max()
            .unwrap_or(0);
        self.combinations += job.combinations.len();
        for check in job.combinations.iter().flat_map(|each| &each.checks) {
            self.checks += 1;
            match check.status {
                Verdict::Pass => self.pass += 1,
                Verdict::Fail => self.fail += 1,
            }
        }
        self.unchecked_jobs += usize::from(job.status == JobStatus::Unchecked);
        self.errors += job.errors_total;
    }
}
