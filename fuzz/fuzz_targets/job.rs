//! Any bytes end in located errors or in a proven result.
#![no_main]

libfuzzer_sys::fuzz_target!(|bytes: &[u8]| lengthwise::fuzzing::job(bytes));
