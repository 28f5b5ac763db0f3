//! The documents against the program: what they list is what it knows, what they show is what it
//! prints.
//!
//! What the program prints into a page is put there by
//! `UPDATE_DOCUMENTS=1 cargo test --test documentation`.

#![allow(clippy::unwrap_used)] // of what the tests themselves read

#[path = "documentation/job_file.rs"]
mod job_file;
#[path = "documentation/page.rs"]
mod page;
#[path = "documentation/readme.rs"]
mod readme;
#[path = "documentation/results.rs"]
mod results;
