//! Faults of the syntax, word for word: the lines added to a sound job, and what is said of it.

use super::check;

#[test]
fn each_fault_of_the_syntax_is_told_at_its_place() {
    check(SYNTAX);
}

const SYNTAX: &[(&str, &str)] = &[
    (
        r#"note = "a\q""#,
        "4:11 a backslash begins a sign that is none | write two backslashes for one, or put the text in single quotes",
    ),
    (
        r#"note = "C:\users""#,
        "4:13 a backslash begins a sign that is none | write two backslashes for one, or put the text in single quotes",
    ),
    (
        r#"note = """abc"#,
        "4:8 this text of several lines is not closed | close it with the three quotes that it began with",
    ),
    (
        "note = '''abc",
        "4:8 this text of several lines is not closed | close it with the three quotes that it began with",
    ),
    (
        "count = 007",
        "4:9 a number begins with a 0 too many | leave the 0 out",
    ),
    (
        "count = 1__0",
        "4:10 a `_` stands at the edge of a number | write `1_250`, with digits on both sides",
    ),
    (
        "x = _1",
        "4:5 a `_` stands at the edge of a number | write `1_250`, with digits on both sides",
    ),
    (
        "x = ++1",
        "4:6 a number has one sign too many | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        "x = 0xZZ",
        "4:7 this is no number | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        "x = -0x10",
        "4:5 a number in another base has no sign | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        "x = 0X10",
        "4:5 the letter of a base is a small one | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        "x = 1979-13-45",
        "4:5 this is no date | write a date as 2026-11-30, and any other text in quotes",
    ),
    (
        "x = +inf",
        "4:1 a member has no key `x` | the keys of a member are `like`, `note`, `start`, `end`, `runs`, `datum`, `between`, `carries`, `segment`, `support`, `load`, `limit`",
    ),
    (
        "x = 1.",
        "4:7 this is no number | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        "x = .5",
        "4:5 this is no number | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        "x = 1e",
        "4:7 this is no number | write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes",
    ),
    (
        r#"note = "a"
note = "b""#,
        "5:1 `note` is written twice | keep one of them",
    ),
    (
        "load.a = 1",
        "4:1 `load` is a list of tables, not a table | write `load = [{ … }]`, or a header `[[… .load]]` for each",
    ),
    (
        "x = [a = 1]",
        r#"4:6 this stands without quotes | write texts and values with a unit in quotes, such as "2.85 m""#,
    ),
    (
        r#"x = ["a" "b"]"#,
        "4:10 a comma is missing here | close every [ with ] and every { with }, with commas between",
    ),
    (
        "x = [,1]",
        "4:6 here is one comma too many | close every [ with ] and every { with }, with commas between",
    ),
    (
        "x = { a = 1 b = 2 }",
        r#"4:11 this stands without quotes | write texts and values with a unit in quotes, such as "2.85 m""#,
    ),
    (
        "x = { a = 1, , b = 2 }",
        "4:14 here is one comma too many | close every [ with ] and every { with }, with commas between",
    ),
    (
        "x = [1, 2",
        "4:10 this list is not closed | close every [ with ] and every { with }, with commas between",
    ),
    (
        "x = { a = 1",
        "4:12 this table is not closed | close every [ with ] and every { with }, with commas between",
    ),
    (
        r#"x "a""#,
        "4:3 this key has no value | write `key = value`, one on each line",
    ),
    (
        "x =",
        "4:4 the value is missing here | write `key = value`, one on each line",
    ),
    (
        "x",
        "4:2 this key has no value | write `key = value`, one on each line",
    ),
    (
        "x = 1 y = 2",
        r#"4:5 this stands without quotes | write texts and values with a unit in quotes, such as "2.85 m""#,
    ),
    (
        "x == 1",
        "4:4 here is one `=` too many | write `key = value`, one on each line",
    ),
    (
        "x: 1",
        "4:2 here is a colon | write `key = value`, one on each line",
    ),
    (
        "å = 1",
        r#"4:1 this key holds a letter that only a key in quotes may hold | write the key in quotes: `[member."H 4"]`"#,
    ),
    (
        r#""""a""" = 1"#,
        "4:1 a key stands on one line | write it with one quote on each side",
    ),
    (
        "[member.tie",
        "4:12 this header is not closed | write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`",
    ),
    (
        "[member..x]",
        "4:9 a name is missing here | write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`",
    ),
    (
        "[]",
        "4:2 a name is missing here | write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`",
    ),
    (
        "[[member.tie.load]",
        "4:19 this header is not closed | write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`",
    ),
    (
        "[member.tie] x",
        "4:14 something stands where the line should end | write `key = value`, one on each line",
    ),
    (
        "note = \"a\u{1}b\"",
        "4:10 here is a control character | take it out",
    ),
    (
        "# a\u{1}",
        "4:4 a comment holds a control character | take it out",
    ),
    (
        "x = 1\ry = 2",
        "4:7 a carriage return stands alone | end lines with a line feed, or with both",
    ),
    (
        "note = 'it's'",
        "4:12 something stands where the line should end | write `key = value`, one on each line",
    ),
    (
        "note = “abc”",
        r#"4:8 these are typographic quotes | write straight ones, such as "2.85 m""#,
    ),
    (
        "- a: b",
        "4:3 this key has no value | write `key = value`, one on each line",
    ),
    (
        "x = True",
        r#"4:5 this is neither true nor false, and a text stands in quotes | write texts and values with a unit in quotes, such as "2.85 m""#,
    ),
    (
        "x = 3 m",
        r#"4:5 this stands without quotes | write texts and values with a unit in quotes, such as "2.85 m""#,
    ),
    (
        "[member.tie]",
        "4:9 `tie` is written twice | keep one header; in a list each table has its own in double brackets, as in `[[member.H4.segment]]`",
    ),
    (
        "[[member.tie]]",
        "4:10 `tie` is written twice | keep one header; in a list each table has its own in double brackets, as in `[[member.H4.segment]]`",
    ),
    (
        r#"[member.tie.segment]
name = "x""#,
        "4:13 `segment` is written twice | keep one header; in a list each table has its own in double brackets, as in `[[member.H4.segment]]`",
    ),
    (
        "start.x = 1",
        "4:1 a key with dots adds to what is closed already | write all keys of a table in one place",
    ),
];
