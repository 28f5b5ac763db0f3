//! The exit status, one meaning each, and what stands beside it.

use crate::{
    BROKEN, FAILS, PASSES, UNCHECKED, errors, fed, folder_of, lengthwise, printed, stated,
};
use crate::{status, text};

#[test]
fn each_outcome_of_a_job_has_its_status_and_its_word() {
    for (job, expected, word) in [
        (PASSES, 0, "pass: all 2 checks hold"),
        (FAILS, 1, "fail: 1 of 2 checks fails"),
        (UNCHECKED, 0, "unchecked: no limit was held"),
        (BROKEN, 3, "error: 2 errors"),
    ] {
        let (_folder, path) = stated(job);
        for brief in [&[][..], &["--brief"]] {
            let output = lengthwise(&[&["check", text(&path)], brief].concat());
            assert_eq!(status(&output), expected, "{job}");
            let verdict = format!("\nverdict      {word}");
            assert!(printed(&output).contains(&verdict), "{}", printed(&output));
        }
    }
}

#[test]
fn the_highest_status_of_several_jobs_wins() {
    for (jobs, expected) in [
        (&[PASSES, UNCHECKED][..], 0),
        (&[PASSES, FAILS, UNCHECKED], 1),
        (&[BROKEN, PASSES], 3),
        (&[FAILS, BROKEN, PASSES], 3),
    ] {
        let names: Vec<String> = (0..jobs.len()).map(|n| format!("{n}.toml")).collect();
        let files = names.iter().map(String::as_str).zip(jobs.iter().copied());
        let folder = folder_of(&files.collect::<Vec<_>>());
        for form in [&[][..], &["--brief"], &["--format", "json"]] {
            let output = lengthwise(&[&["check", text(folder.path())], form].concat());
            assert_eq!(status(&output), expected, "{jobs:?} {form:?}");
        }
    }
}

#[test]
fn a_job_without_checks_fails_only_where_checks_are_required() {
    for (job, expected) in [(UNCHECKED, 1), (PASSES, 0), (FAILS, 1), (BROKEN, 3)] {
        let (_folder, path) = stated(job);
        let output = lengthwise(&["check", text(&path), "--require-checks"]);
        assert_eq!(status(&output), expected, "{job}");
    }
}

#[test]
fn a_job_comes_from_standard_input_and_is_called_so() {
    let output = fed(&["check", "-"], FAILS);
    assert_eq!(status(&output), 1);
    assert!(printed(&output).contains("\nfile         standard input\n"));

    let broken = fed(&["check", "-"], BROKEN);
    assert_eq!(status(&broken), 3);
    assert!(
        errors(&broken).starts_with("standard input, line 2, column 9: "),
        "{}",
        errors(&broken)
    );

    let empty = fed(&["check", "-"], "");
    assert_eq!(status(&empty), 3);
    assert!(
        errors(&empty).starts_with("standard input, line 1, column 1: "),
        "{}",
        errors(&empty)
    );
}

#[test]
fn digits_and_brief_are_obeyed() {
    let (_folder, path) = stated(PASSES);
    // 40 kN on 20 mm round: 400/π N/mm² = 127.3239545 MPa, of a limit of 0.6 x 355 MPa.
    for (digits, stress) in [("2", " 127 "), ("4", " 127.3 "), ("9", " 127.323954 ")] {
        let output = lengthwise(&["check", text(&path), "--digits", digits]);
        assert!(
            printed(&output).contains(stress),
            "{digits}: {}",
            printed(&output)
        );
    }
    let brief = lengthwise(&["check", text(&path), "--brief"]);
    let brief = printed(&brief);
    assert!(brief.contains("\nGoverning checks\n") && brief.contains("\nLooked at 1 file, "));
    assert!(!brief.contains("\nMember tie\n") && !brief.contains("\nMaterials\n"));
}

#[test]
fn the_errors_of_a_job_are_drawn_in_the_order_of_its_lines() {
    let (_folder, path) = stated(BROKEN);
    let output = lengthwise(&["check", text(&path)]);
    let errors = errors(&output);
    let first = errors.find(", line 2, column 9: ").unwrap();
    let second = errors.find(", line 4, column 35: ").unwrap();
    assert!(first < second, "{errors}");
    assert!(
        errors.contains("start = \"fxed\"\n            ~~~~~~\n"),
        "{errors}"
    );
}

#[test]
fn a_failing_check_is_told_with_the_line_that_set_its_limit() {
    let (_folder, path) = stated(FAILS);
    let output = lengthwise(&["check", text(&path)]);
    let text = printed(&output).replace("\n  ", " ");
    // 400/π N/mm² x 2 m / 210 GPa = 1.2126 mm.
    let told = "- elongation on tie is 1.213 mm in combination all; the limit of 1.000 mm is set in \
                line 5\n";
    assert!(text.contains(told), "{text}");
}
