//! No text makes the literal reader panic, and what it reads is finite.
#![no_main]

libfuzzer_sys::fuzz_target!(|text: &str| lengthwise::fuzzing::literal(text));
