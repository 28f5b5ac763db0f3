//! Faults of members and supports.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "a member without a segment",
        r#"[member.m]
"#,
        "1:1 the member `m` needs a segment | add `segment = [{ length = …, section = …, material = … }]`, or `like` with the name of another member",
    ),
    (
        "a misspelt key",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
stat = "fixed"
"#,
        "4:1 a member has no key `stat` | `start` comes nearest",
    ),
    (
        "an end that is neither",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
end = "pinned"
"#,
        r#"4:7 an end is "fixed" or free, not `pinned` | write "fixed"; leave it out for a free end; springs and stops are a `support`"#,
    ),
    (
        "no direction",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
runs = "sideways"
"#,
        r#"4:8 no direction is called `sideways` | write "up", "down", "level", or an angle above level such as "30 deg""#,
    ),
    (
        "an angle above level has its bounds",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
runs = "120 deg"
"#,
        r#"4:8 an angle above level lies between -90 deg and 90 deg | write "up", "down", "level", or an angle above level such as "30 deg""#,
    ),
    (
        "a bare number",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
runs = 30
"#,
        r#"4:8 a direction is expected here, not a bare number | write "up", "down", "level", or an angle above level such as "30 deg""#,
    ),
    (
        "a circle of members",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[member.a]
like = "b"
[member.b]
like = "a""#,
        "6:8 `like` leads in a circle: a → b → a | write the keys of one of these members out",
    ),
    (
        "a member that is like itself",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[member.a]
like = "a""#,
        "6:8 `like` leads in a circle: a → a | write the keys of one of these members out",
    ),
    (
        "a member that is not there",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[member.a]
like = "ti""#,
        "6:8 no member is called `ti` | `tie` comes nearest",
    ),
    (
        "two segments of one name, one by its number",
        r#"[member.m]
start = "fixed"
segment = [{ name = "2", length = "1 m", section = { round = "20 mm" }, material = "steel-s355" }, { length = "1 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "3:100 two parts of the member `m` are called `2` | give one another name; segments without a name are called 1, 2, 3 …",
    ),
    (
        "a support without a kind",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = "end"
"#,
        r#"4:1 a support needs `fixed`, `spring` or `stop` | add `fixed = true`, `spring = "35 kN/mm"` or `stop = "2.5 mm"`"#,
    ),
    (
        "a spring at a fixed end",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = "start"
spring = "3 kN/mm"
"#,
        "4:1 two supports stand at `start`, and one is fixed: the other (line 2) never acts | keep one of them; the key `start` or `end` is a support too",
    ),
    (
        "two supports without a name",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = "end"
spring = "3 kN/mm"
[[member.tie.support]]
at = "2 m"
stop = "3 mm"
"#,
        "7:1 two supports without a name stand at `2 m`, the other in line 4 | give one a `name`, so that reports can tell them apart",
    ),
    (
        "outside, and a side without a stop",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = "5 m"
spring = "3 kN/mm"
side = "end"
"#,
        r#"5:6 this station lies outside the member, which is 2 m long | distances count from the member's start
7:1 `side` stands beside `stop` alone | take it out"#,
    ),
    (
        "three faults of one support",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = "shank.end"
stop = "-3 mm"
side = "left"
"#,
        r#"5:6 no segment of this member is called `shank` | its segments are `rod`
6:8 `stop` must be 0 or more | write it as in "2.85 m"
7:8 a stop blocks movement toward the "end" or the "start", not `left` | write one of `end`, `start`"#,
    ),
    (
        "no station, and a support that is none",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = "top"
fixed = false
"#,
        r#"5:6 `top` is no station | write "start", "end", "<segment>.start", "<segment>.end", or a distance from the member's start such as "1.25 m"
6:9 `fixed = false` says nothing | leave it out; what has no support is free"#,
    ),
    (
        "a bare number for a station",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.support]]
at = 3
fixed = true
"#,
        r#"5:6 a station is expected here, not a bare number | write "start", "end", "<segment>.start", "<segment>.end", or a distance from the member's start such as "1.25 m""#,
    ),
];
