//! Both ways of reading must agree: on the tree of every text that the direct way takes, and on
//! what is a fault. `toml` itself is the reference.

use super::{direct, recovered};
use proptest::prelude::*;
use std::path::Path;
use toml::de::DeTable;

/// Reads a text both ways. Where the direct way takes it, `toml` must find no fault and make the
/// same tree, each place included. Tells whether it took it.
pub(in crate::job) fn is_direct(text: &str) -> bool {
    let Some(tree) = direct(text) else {
        return false;
    };
    let (table, errors) = DeTable::parse_recoverable(text);
    assert!(errors.is_empty(), "taken with faults: {errors:?}\n{text}");
    let expected = recovered(table.into_inner());
    // As texts, since a NaN equals none.
    assert_eq!(format!("{tree:#?}"), format!("{expected:#?}"), "{text}");
    true
}

fn jobs_in(folder: &str, jobs: &mut Vec<String>) {
    let root = Path::new(env!("CARGO_MANIFEST_DIR"));
    for entry in walkdir::WalkDir::new(root.join(folder)) {
        let path = entry.unwrap().into_path();
        if path.extension().is_some_and(|end| end == "toml") {
            jobs.push(std::fs::read_to_string(path).unwrap());
        }
    }
}

#[test]
fn every_job_at_hand_is_read_directly() {
    let mut jobs = Vec::new();
    for folder in ["examples", "tests", "materials"] {
        jobs_in(folder, &mut jobs);
    }
    assert!(jobs.len() > 20, "only {} files", jobs.len());
    let left: Vec<&String> = jobs.iter().filter(|job| !is_direct(job)).collect();
    assert!(left.is_empty(), "{} left, as {}", left.len(), left[0]);
}

/// Each form of the TOML specification that a job may hold.
#[test]
fn what_is_ordinary_is_read_directly() {
    for text in [
        "",
        "\n\n# a comment\n",
        "\u{feff}a = 1",
        "a = 1\r\nb = 2 # said\r\n",
        "a = 'C:\\n'\nb = \"\\\"\\u00e9\\t\\x41\"\nc = \"\"\nd = ''\ne = \"a\tb\"\nf = \"µ 東\"",
        "a = \"\"\"\nfirst\n \"second\" \\\n  third\"\"\"\nb = '''\n'it' '''\n",
        "a = 0\nb = +1_000\nc = -0\nd = 0xff\ne = 0o17\nf = 0b101\ng = 99999999999999999999",
        "a = 1.5\nb = -2e-3\nc = 6_1.2_5E+2\nd = inf\ne = -inf\nf = nan\ng = 1e999",
        "a = true\nb = false\nc = 2026-11-30\nd = 07:32:00\ne = 1979-05-27T07:32:00.5+02:00",
        "a = []\nb = [1, [2.0, 'x'], { c = [{}] },]\nd = [\n 1, # one\n 2,\n]",
        "a = {}\nb = { c = 1, d = { e = 'f' } }\ng = {\n  h = 1,\n}",
        "a = { 'b c' = 1, \"d\\\"\" = 2, 3 = 4, - = 5 }\n'' = 6",
        "[a]\n[b]\nc = 1\n[ d . 'e f' . g ]\nh = 1\n",
        "[a.b]\nc = 1\n[a.d]\ne = 1\n[a.b.f]\n",
        "[[a]]\nb = 1\n[a.c]\nd = 1\n[[a.e]]\n[[a.e]]\nf = 1\n[[a]]\n[a.c]\n[[a.e]]",
        "[a]\nb = { c = 1 }\n[[a.d]]\n",
        "[a]\nb = 1",
    ] {
        assert!(is_direct(text), "left to toml:\n{text}");
    }
}

/// Keys of a large table are found by another way than those of a small one.
#[test]
fn large_tables_are_read_directly() {
    for count in [63, 64, 65, 1100] {
        let keys: String = (0..count).map(|key| format!("k{key} = 1\n")).collect();
        let inner: Vec<String> = (0..count).map(|key| format!("k{key} = 1")).collect();
        let inner = format!("a = {{ {} }}", inner.join(", "));
        let headers: String = (0..count).map(|key| format!("[a.k{key}]\n")).collect();
        let lists: String = (0..count)
            .map(|key| format!("[[a.k{}]]\nb = {key}\n", key % 70))
            .collect();
        for text in [&keys, &inner, &headers, &lists] {
            assert!(is_direct(text), "left to toml: {count}");
        }
        for text in [&keys, &inner, &lists] {
            let again = format!("{text}\n[a]\nk0 = 1\nk0 = 2");
            assert!(!is_direct(&again), "a fault is taken: {count}");
        }
        let twice = format!("{keys}k1 = 2\n");
        assert!(
            !is_direct(&twice),
            "a key that stands twice is taken: {count}"
        );
        let twice = inner.replacen("k2 =", "k1 =", 1);
        assert!(
            !is_direct(&twice),
            "a key that stands twice is taken: {count}"
        );
        let twice: String = (0..count)
            .chain([1])
            .map(|key| format!("[a.k{key}]\n"))
            .collect();
        assert!(
            !is_direct(&twice),
            "a header that stands twice is taken: {count}"
        );
    }
}

/// What is sound but left to `toml`; that it is left proves that the limits are looked at.
#[test]
fn what_is_unusual_is_left() {
    let deep = format!("a = {}{}", "[".repeat(20), "]".repeat(20));
    for text in [
        "a.b = 1\na.c = 2",
        "a = { b.c = 1 }",
        "[a.b]\n[a]\nc = 1",
        "[[a.b]]\n[a]\nc = 1",
        &deep,
        &format!("[{}a]", "a.".repeat(20)),
        &format!("[{}a]\n[b]", "a.".repeat(70)),
    ] {
        assert!(DeTable::parse(text).is_ok(), "no sound text:\n{text}");
        assert!(!is_direct(text), "not left to toml:\n{text}");
    }
}

/// Faults of the syntax, keys that stand twice, tables that are closed.
#[test]
fn what_is_at_fault_is_left() {
    for text in [
        "a = 1\na = 2",
        "a = 1\n\"a\" = 2",
        "a = { b = 1, b = 2 }",
        "[a]\n[a]",
        "[a]\n[[a]]",
        "[[a]]\n[a]",
        "a = 1\n[a]",
        "a = 1\n[a.b]",
        "a = {}\n[a]",
        "a = {}\n[a.b]",
        "a = {}\n[[a.b]]",
        "a = []\n[[a]]",
        "a = [{}]\n[[a]]",
        "a = [{}]\n[a.b]",
        "a = [1]\n[a.b]",
        "[a.b]\n[[a]]",
        "[a]\nb = 1\n[a.b]",
        "[a]\nb = [{}]\n[[a.b]]",
        "[a]\nb = {}\n[a.b.c]",
        "[[a.b]]\n[a.b]",
        "[a.b]\n[a]\n[a]",
        "a.b = 1\n[a]",
        "[a]\nb.c = 1\n[a.b]",
        "a = fixed",
        "a = \"open",
        "a = \"\\q\"",
        "a = \"x\u{1}\"",
        "a = '\u{7f}'",
        "a = 1 # \u{1}",
        "a = 1\rb = 2",
        "a = 01",
        "a = 1__0",
        "a = 2026-13-45",
        "a = [1 2]",
        "a = [1",
        "a = { b = 1",
        "a = 1 b = 2",
        "a",
        "= 1",
        "[a",
        "[]",
        "[a]]",
        "µ = 1",
        "[m µ]",
        "\"\"\"a\"\"\" = 1",
        "]",
        "a = }",
        "a = = 1",
        &format!("[{}a]\n[b]", "a.".repeat(100_000)),
        &format!("a = {}{}", "[".repeat(100_000), "]".repeat(100_000)),
        &format!("a = {}1{}", "{a=".repeat(100_000), "}".repeat(100_000)),
    ] {
        assert!(DeTable::parse(text).is_err(), "no fault:\n{text}");
        assert!(!is_direct(text), "taken:\n{text}");
    }
}

/// Bits of which texts are put together that are often sound, and as often only nearly.
const BITS: &[&str] = &[
    "a",
    "b",
    "'a'",
    "\"b\"",
    "c-1",
    ".",
    " ",
    "\n",
    "\r\n",
    "\t",
    "=",
    ",",
    "[",
    "]",
    "{",
    "}",
    "#",
    "1",
    "-2.5",
    "0x1F",
    "true",
    "2026-11-30",
    "\"t\"",
    "\"\\n\"",
    "'l'",
    "\"\"\"m\"\"\"",
    "'''",
    "µ",
    "\r",
    "\u{1}",
    "\\",
];

/// Lines likewise.
const LINES: &[&str] = &[
    "[a]",
    "[b]",
    "[a.b]",
    "[a.b.c]",
    "[b.a]",
    "[[a]]",
    "[[b]]",
    "[[a.b]]",
    "[[a.b.c]]",
    "a = 1",
    "b = 2",
    "c = { a = 1, b = [] }",
    "b = [{ a = 1 }, {}]",
    "a = {}",
    "b = []",
    "a.b = 1",
    "# c",
    "",
    "c = [1,",
    "2]",
    "\"a\" = 'x'",
    "d = \"\"\"",
    "\"\"\"",
    "e = 1.5e3",
];

proptest! {
    #![proptest_config(ProptestConfig::with_cases(4000))]

    #[test]
    fn both_ways_agree_on_bits(bits in prop::collection::vec(prop::sample::select(BITS), 0..14)) {
        is_direct(&bits.concat());
    }

    #[test]
    fn both_ways_agree_on_values(
        bits in prop::collection::vec(prop::sample::select(BITS), 1..8),
    ) {
        is_direct(&format!("a = {}\nb = 1", bits.concat()));
        is_direct(&format!("a = [{}]", bits.concat()));
        is_direct(&format!("a = {{ b = {} }}", bits.concat()));
    }

    #[test]
    fn both_ways_agree_on_lines(lines in prop::collection::vec(prop::sample::select(LINES), 0..9)) {
        is_direct(&lines.join("\n"));
    }
}
