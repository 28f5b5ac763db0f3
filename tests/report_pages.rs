//! The text reports of the examples on pages of several widths: nothing is torn apart, and no line
//! is longer than the page.

#![allow(clippy::unwrap_used)] // of what the tests themselves read

use lengthwise::quantity::Units;
use lengthwise::report::text::{Layout, write_brief, write_job};
use lengthwise::result::JobResult;
use std::collections::BTreeSet;
use std::fs;
use std::path::Path;
use unicode_width::UnicodeWidthStr;

const WIDTHS: [usize; 5] = [80, 90, 100, 120, 160];

/// Every example in the units of both systems, by the name of its file.
fn jobs() -> Vec<(String, JobResult)> {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("examples");
    let entries = fs::read_dir(folder)
        .unwrap()
        .map(|entry| entry.unwrap().path());
    let files = entries.filter(|path| path.extension().is_some_and(|ending| ending == "toml"));
    let jobs = files.flat_map(|path| {
        let name = path.file_name().unwrap().to_string_lossy().into_owned();
        let job = lengthwise::check_text(&name, &fs::read_to_string(&path).unwrap());
        [Units::SI, Units::US].map(|units| {
            let job = JobResult {
                units,
                ..job.clone()
            };
            (format!("{name} in {units:?}"), job)
        })
    });
    jobs.collect()
}

fn page(width: usize, digits: usize) -> Layout {
    Layout {
        width,
        colour: false,
        digits,
    }
}

/// The whole report and the brief.
fn reports(job: &JobResult, layout: &Layout) -> String {
    let mut out = Vec::new();
    write_job(&mut out, job, layout).unwrap();
    write_brief(&mut out, job, layout).unwrap();
    String::from_utf8(out).unwrap()
}

/// The parts of a text that no line end may stand within: its words, and names and combinations
/// taken apart where they may be (after `/`, and after a dot that is no decimal point).
fn words(text: &str) -> BTreeSet<String> {
    let is_rule = |word: &&str| word.chars().all(|character| "-=".contains(character));
    let words = text.split_whitespace().filter(|word| !is_rule(word));
    let mut parts = BTreeSet::new();
    for piece in words.flat_map(|word| word.split('/')) {
        let mut part = String::new();
        let characters: Vec<char> = piece.chars().collect();
        for (index, &character) in characters.iter().enumerate() {
            let digit = |index: Option<usize>| {
                let found = index.and_then(|index| characters.get(index));
                found.is_some_and(char::is_ascii_digit)
            };
            let decimal = digit(index.checked_sub(1)) && digit(Some(index + 1));
            if character == '.' && !decimal {
                parts.insert(std::mem::take(&mut part));
            } else {
                part.push(character);
            }
        }
        parts.insert(part);
    }
    parts
}

#[test]
fn no_word_and_no_number_is_torn_apart_on_any_page() {
    for (name, job) in jobs() {
        for digits in [4, 9] {
            let whole = words(&reports(&job, &page(10_000, digits)));
            for width in WIDTHS {
                let narrow = words(&reports(&job, &page(width, digits)));
                let torn: Vec<_> = narrow.symmetric_difference(&whole).collect();
                assert!(torn.is_empty(), "{name}, {width} columns: {torn:?}");
            }
        }
    }
}

#[test]
fn no_line_is_longer_than_the_page() {
    for (name, job) in jobs() {
        for width in WIDTHS {
            for line in reports(&job, &page(width, 4)).lines() {
                assert!(line.width() <= width, "{name}, {width} columns: {line}");
                assert_eq!(line, line.trim_end(), "{name}");
            }
        }
    }
}

/// Where the page is too narrow for what cannot be broken, the line is longer, and whole.
#[test]
fn a_page_too_narrow_keeps_words_and_numbers_whole_too() {
    for (name, job) in jobs() {
        let whole = words(&reports(&job, &page(10_000, 17)));
        let narrow = words(&reports(&job, &page(20, 17)));
        let torn: Vec<_> = narrow.symmetric_difference(&whole).collect();
        assert!(torn.is_empty(), "{name}: {torn:?}");
    }
}

#[test]
fn the_tests_would_see_what_is_torn() {
    assert_eq!(
        words("S1.jack shoe at 1.25 m\n---- strength/snow=1.5")
            .into_iter()
            .collect::<Vec<_>>(),
        [
            "1.25", "S1", "at", "jack", "m", "shoe", "snow=1.5", "strength"
        ]
    );
}

#[test]
fn nothing_that_rounding_left_is_shown() {
    for (name, job) in jobs() {
        let text = reports(&job, &page(120, 4));
        let results = text
            .lines()
            .filter(|line| !line.contains("Proof") && !line.contains("is an error"));
        let numbers = results.flat_map(str::split_whitespace);
        let mut numbers = numbers.filter_map(|word| word.parse::<f64>().ok());
        let noise = numbers.find(|number| *number != 0.0 && number.abs() < 1e-9);
        assert_eq!(noise, None, "{name}");
    }
}
