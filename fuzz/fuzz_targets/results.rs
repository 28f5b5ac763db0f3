//! Any text is refused as results, or reads back and writes the same again.
#![no_main]

libfuzzer_sys::fuzz_target!(|text: &str| lengthwise::fuzzing::results(text));
