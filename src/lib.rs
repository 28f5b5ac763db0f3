//! Axial deformation of members, checked: from a job file to forces, stresses, elongations,
//! reactions, gaps and verdicts that carry their own proof.
//!
//! Data flows one way, and each step is a module that knows the ones before it:
//!
//! ```text
//! job file ──► job ──► model ──► solve ──► proof ──► check ──► report
//!                 ▲
//!             catalogue
//! ```
//!
//! [`check_text`] goes all the way for the text of one job:
//!
//! ```
//! let result = lengthwise::check_text("tie.toml", r#"
//!     [member.tie]
//!     start = "fixed"
//!     segment = [{ length = "8 ft", section = { round = "5/8 in" }, material = "steel-a36" }]
//!     load = [{ at = "end", force = "5.2 kip" }]
//!     limit = { tension = "0.6 yield", elongation = "1/8 in" }
//! "#);
//! assert_eq!(result.status, lengthwise::result::JobStatus::Pass);
//! ```
pub mod catalogue;
pub mod check;
pub mod cli;
pub mod fuzzing;
pub mod job;
pub mod model;
pub mod proof;
pub mod quantity;
pub mod report;
pub mod result;
mod run;
pub mod solve;

pub use run::{JobRun, check_bytes, check_text};
