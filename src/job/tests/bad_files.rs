//! Faults of the file as a whole, of its heading and its syntax.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "nothing",
        "",
        "1:1 a job needs a member | add one: `[member.tie]`",
    ),
    (
        "an unknown key",
        "title = 1",
        "1:1 a job file has no key `title` | the keys of a job file are `job`, `case`, `combination`, `material`, `default`, `member`, `point`, `body`, `hold`, `load`, `watch`",
    ),
    (
        "no member",
        "[member]",
        "1:1 a job needs a member | add one: `[member.tie]`",
    ),
    (
        "a number for all members",
        "member = 3",
        "1:10 `member` is a table by name, not a bare number | write a header for each name: `[member.NAME]`",
    ),
    (
        "the heading",
        r#"[job]
units = "SI units"
datum = 10
title = 3
date = 3
[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

"#,
        r#"2:9 no system of units is called `SI units` | reports show `SI`, `US`
3:9 a reading of temperature is expected here, not a bare number | write it in quotes with its unit, such as "20 degC"; units are K degC degF
4:9 a text is expected here, not a bare number | write it in quotes
5:8 a date is expected here, not a bare number | write it in quotes, or as year-month-day without them"#,
    ),
    (
        "texts without quotes, and what is wrong beside them",
        r#"[member.m]
start = fixed
segment = [{ length = 3 m, section = { round = "20 mm" } }]
end = "pinned"
"#,
        r#"2:9 this is neither true nor false, and a text stands in quotes | write texts and values with a unit in quotes, such as "2.85 m"
3:23 this stands without quotes | write texts and values with a unit in quotes, such as "2.85 m"
4:7 an end is "fixed" or free, not `pinned` | write "fixed"; leave it out for a free end; springs and stops are a `support`"#,
    ),
    (
        "a header that is not closed breeds nothing",
        r#"[member.m
start = "fixed"
"#,
        "1:10 this header is not closed | write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`",
    ),
    (
        "a key twice",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
end = "fixed"
end = "fixed"
"#,
        "5:1 `end` is written twice | keep one of them",
    ),
    (
        "a text that is not closed",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
end = "fixed
"#,
        "4:13 this text is not closed | close the quotes on the same line",
    ),
    (
        "an empty line of sense",
        r#"= = =
[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

"#,
        "1:1 a key is missing here | write `key = value`, one on each line",
    ),
    (
        "no `=`",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.load]]
at "end"
force = "3 kN"
"#,
        "5:4 this key has no value | write `key = value`, one on each line",
    ),
    (
        "a table twice",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[member.tie]
"#,
        "4:9 `tie` is written twice | keep one header; in a list each table has its own in double brackets, as in `[[member.H4.segment]]`",
    ),
    (
        "a name in a line that cannot be read is not missed",
        r#"[member.m]
start = "fixed"
[[member.m.segment]]
name = shank
length = "1 m"
section = { round = "20 mm" }
material = "steel-s355"
[[member.m.load]]
at = "shank.end"
force = "1 kN""#,
        r#"4:8 this stands without quotes | write texts and values with a unit in quotes, such as "2.85 m""#,
    ),
];
