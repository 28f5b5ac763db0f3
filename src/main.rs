//! Placeholder until the command line stands.
fn main() {}
