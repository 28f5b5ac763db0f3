//! Input that is made to hurt: enormous, deep, or no text at all.

use super::{refused, said, tie};
use std::time::{Duration, Instant};

/// Whatever is tried here takes well under a second of a quiet machine.
const LONGEST: Duration = Duration::from_secs(30);

/// The first fault that is told of a job, which must be told soon.
fn first(job: impl AsRef<[u8]>) -> String {
    let begin = Instant::now();
    let said = said(job);
    assert!(begin.elapsed() < LONGEST, "{:?}", begin.elapsed());
    assert!(said.len() < 200_000, "{} bytes are said", said.len());
    said.lines().next().unwrap().to_owned()
}

#[test]
fn a_million_digits_are_refused() {
    let digits = "9".repeat(1_000_000);
    let bare = first(tie(&format!("load = [{{ weight = {digits} }}]")));
    assert_eq!(
        bare,
        "4:20 this is no finite number | write a finite number, such as `1.5`"
    );
    for number in [digits.clone(), format!("0.{}1", "0".repeat(1_000_000))] {
        let quoted = first(tie(&format!(
            "load = [{{ at = \"end\", force = \"{number} kN\" }}]"
        )));
        assert!(quoted.starts_with("4:32 this text of 1"), "{quoted}");
    }
}

#[test]
fn a_name_of_a_million_letters_is_cut_in_the_message() {
    let name = "a".repeat(1_000_000);
    for job in [
        tie(&format!("{name} = 1")),
        tie(&format!("like = \"{name}\"")),
        tie(&format!("load = [{{ at = \"{name}\", force = \"1 kN\" }}]")),
        tie("").replace("steel-s355", &name),
    ] {
        let said = first(&job);
        assert!(said.contains('…') && said.len() < 1_000, "{said}");
    }
}

#[test]
fn what_is_nested_too_deep_is_refused_at_its_line() {
    let deep = "lists, tables or keys are nested too deep here | no value of a job is nested more \
                than six deep";
    for (lines, place) in [
        (format!("limit = {}", "[".repeat(100_000)), "4:89"),
        (
            format!("limit = {}{}", "[".repeat(50_000), "]".repeat(50_000)),
            "4:89",
        ),
        (
            format!("limit = {}1{}", "{a=".repeat(50_000), "}".repeat(50_000)),
            "4:249",
        ),
        (format!("limit.{}b = 1", "a.".repeat(100_000)), "4:1"),
        (format!("[{}b]", "a.".repeat(100_000)), "4:1"),
    ] {
        assert_eq!(first(tie(&lines)), format!("{place} {deep}"));
    }
}

#[test]
fn a_text_of_nothing_but_faults_ends_soon() {
    let begin = Instant::now();
    for line in ["= = =\n", "aaa = bbb\n", "x = \"\n", "[[[\n", "key = 1\n"] {
        let few = refused(tie(&line.repeat(1_000)));
        let many = refused(tie(&line.repeat(30_000)));
        assert!(many.errors_total >= few.errors_total.min(200), "{line}");
    }
    refused("[".repeat(1_000_000));
    refused("= ".repeat(1_000_000));
    assert!(begin.elapsed() < LONGEST, "{:?}", begin.elapsed());
}

/// More than 4 MiB: there one fault of the syntax is told by itself.
#[test]
fn a_large_text_is_told_one_fault() {
    let said = said(tie(&"= = =\n".repeat(1_000_000)));
    assert_eq!(
        said,
        "4:3 here is one `=` too many | write `key = value`, one on each line; in a file as large \
         as this only one fault of the syntax is told"
    );
}

#[test]
fn a_hundred_megabytes_are_refused_unread() {
    let begin = Instant::now();
    let said = said(vec![b'#'; 100_000_000]);
    assert_eq!(
        said,
        "1:1 the file is larger than 64 MiB: no job is | look whether it is the file that you mean"
    );
    assert!(begin.elapsed() < LONGEST, "{:?}", begin.elapsed());
}

#[test]
fn the_place_in_a_line_of_many_megabytes_is_drawn_soon() {
    let begin = Instant::now();
    let mut bytes = vec![b' '; 40_000_000];
    bytes[20_000_000] = 0;
    let run = lengthwise::check_bytes("job.toml", &bytes);
    assert_eq!(run.result.errors[0].column, Some(20_000_001));
    assert!(run.drawn_errors.len() < 2_000);
    assert!(begin.elapsed() < LONGEST, "{:?}", begin.elapsed());
}

#[test]
fn a_product_of_lists_says_its_number() {
    let cases: String = (0..20).map(|case| format!("[case.c{case}]\n")).collect();
    let lists: Vec<String> = (0..20).map(|case| format!("c{case} = [0, 1]")).collect();
    let job = format!(
        "{cases}[combination.all-on]\nfactors = {{ {} }}\n{}",
        lists.join(", "),
        tie("")
    );
    assert_eq!(
        said(job),
        "21:14 the lists multiply out to 1,048,576 combinations; a job may have 100,000 \
         | shorten the lists, or spread them over several jobs"
    );
}

#[test]
fn what_is_no_utf_8_is_refused() {
    let utf16 = |bytes: fn(u16) -> [u8; 2], mark: bool| -> Vec<u8> {
        let mark = mark.then_some(0xfeff);
        let units = mark.into_iter().chain("[member.tie]\n".encode_utf16());
        units.flat_map(bytes).collect()
    };
    for mark in [true, false] {
        for bytes in [u16::to_le_bytes as fn(u16) -> [u8; 2], u16::to_be_bytes] {
            assert_eq!(
                said(utf16(bytes, mark)),
                "1:1 the file is not UTF-8; it looks like UTF-16 | save it as UTF-8"
            );
        }
    }
    assert_eq!(
        said(b"[job]\ntitle = \"Tr\xe4ger\"\n"),
        "2:12 the byte 0xe4 is not UTF-8; it looks like Latin-1 (ISO 8859-1 or Windows-1252) | save \
         the file as UTF-8"
    );
    assert_eq!(
        said(b"[job]\ntitle = \"a\0b\"\n"),
        "2:11 a NUL byte stands in the text | take it out; if the file is full of them, it is no \
         text"
    );
    assert_eq!(
        said(vec![0; 1_000]).lines().count(),
        1,
        "a file of nothing but NUL"
    );
}

#[test]
fn a_file_of_nothing_needs_a_member() {
    for nothing in ["", "\n\n", "# only\n# comments\n", "\u{feff}"] {
        assert_eq!(
            said(nothing),
            "1:1 a job needs a member | add one: `[member.tie]`",
            "{nothing:?}"
        );
    }
}

#[test]
fn no_control_character_of_a_job_reaches_a_message() {
    let run = lengthwise::check_bytes("job.toml", tie("\"a\\u001b[31mb\" = 1").as_bytes());
    assert!(!run.drawn_errors.contains('\u{1b}'), "{}", run.drawn_errors);
    assert!(run.drawn_errors.contains("no key"), "{}", run.drawn_errors);
}
