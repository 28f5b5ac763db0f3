//! One job from its bytes to its finished result.

use crate::report::json;
use crate::result::{ErrorEntry, JobResult};

/// What checking one job came to.
#[derive(Debug, Clone, PartialEq)]
pub struct JobRun {
    /// The finished result; its digest is left to the report that prints one.
    pub result: JobResult,
    /// Its errors drawn as text, each at its place in the file; empty where there are none.
    pub drawn_errors: String,
}

/// Reads, solves, proves and checks the job in `bytes`; `file` is what messages call it.
///
/// Never fails as a whole: what is wrong with the job stands in the result's errors.
pub fn check_bytes(file: &str, bytes: &[u8]) -> JobRun {
    let message = format!("a job of {} bytes cannot be read yet", bytes.len());
    let drawn_errors = format!("error: {file}: {message}\n");
    let error = ErrorEntry {
        message,
        line: None,
        column: None,
        help: None,
        combination: None,
    };
    JobRun {
        result: JobResult::unreadable(file, error),
        drawn_errors,
    }
}

/// `sha256:` of the built-in materials and sections.
pub fn catalogue_digest() -> String {
    json::digest(b"")
}
