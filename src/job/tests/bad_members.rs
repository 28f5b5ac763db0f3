//! Faults of members, supports and loads.

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
        "keys of a later version",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
between = ["a"]
carries = "tension"
"#,
        r#"4:1 `between` (members between points) is not read by this version | take it out; nothing else stands for it yet
5:1 `carries` (one-way members) is not read by this version | take it out; nothing else stands for it yet"#,
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
    (
        "a load without an action",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[[member.tie.load]]

"#,
        "4:1 a load needs an action | add one of `force`, `down`, `line`, `line-down`, `weight`, `temperature-change`, `temperature`, `misfit`, `strain`, `movement`",
    ),
    (
        "a force without a place",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = "3 kN" }]
"#,
        r#"4:9 a `force` needs `at` | add `at = "end"`"#,
    ),
    (
        "two actions",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = "3 kN", at = "end", down = "3 kN" }]
"#,
        "4:39 a load has one action, and here are `force` and `down` | write a load for each",
    ),
    (
        "nobody knows where down is",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ down = "3 kN", at = "end" }]
"#,
        r#"1:1 the member `tie` needs `runs`, since weight acts on it | add `runs = "up"`, "down", "level" or an angle above level, the direction from start to end"#,
    ),
    (
        "a misspelt `runs` is not missing too",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
run = "up"
load = [{ weight = 1 }]
"#,
        "4:1 a member has no key `run` | `runs` comes nearest",
    ),
    (
        "a force acts at a station",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = "3 kN", at = "end", on = "rod" }]
"#,
        "4:39 `on` does not say where a `force` acts | a `force` takes `at`",
    ),
    (
        "actions of a later version",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ turns = 1, on = "rod" }, { preload = "3 kN" }, { take-up = 1 }]
"#,
        r#"4:11 `turns` (nut turns) is not read by this version | write them as a `misfit` of −number × pitch
4:38 `preload` (a force at assembly) is not read by this version | a known misfit is `misfit`
4:60 `take-up` (turnbuckles) is not read by this version | write them as a `misfit` of −turns × the sum of the pitches"#,
    ),
    (
        "a case in a job without",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = "3 kN", at = "end", case = "dead" }]
"#,
        "4:46 this job has no cases, and so none called `dead` | add `[case.dead]`, or name no case",
    ),
    (
        "no case in a job with",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = "3 kN", at = "end" }]
[case.dead]
"#,
        "4:9 in a job with cases each load names its case | add `case`; the cases are `dead`",
    ),
    (
        "a misspelt case",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = { daed = "3 kN" }, at = "end" }]
[case.dead]
"#,
        "4:21 no case is called `daed` | `dead` comes nearest",
    ),
    (
        "a case twice",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ force = { dead = "3 kN" }, case = "dead", at = "end" }]
[case.dead]
"#,
        "4:45 this load names a case, and its value is a table by case | keep one of them",
    ),
    (
        "a misspelt segment",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ strain = "10 ue", on = "rodd" }]
"#,
        "4:34 no segment of this member is called `rodd` | `rod` comes nearest",
    ),
    (
        "a layer where there is none",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ strain = "10 ue", on = "rod.x" }]
"#,
        "4:34 no layer of the segment `rod` is called `x` | it has no layers; write `rod`",
    ),
    (
        "a change has its sign",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ temperature-change = "35 K" }]
"#,
        "4:33 a change of temperature has its sign | write `+35 K` for warmer or `-35 K` for cooler; what a thermometer shows is given under `temperature`",
    ),
    (
        "a reading has none",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ temperature = "+35 degC" }]
"#,
        "4:26 a reading of temperature has no `+` | leave the `+` out if this is what a thermometer shows; a change is given under `temperature-change`",
    ),
    (
        "a reading needs a datum",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ temperature = "35 degC" }]
"#,
        r#"4:25 a reading of temperature needs a datum | add `datum = "10 degC"` to `[job]`, the temperature at which lengths are as drawn, or write a `temperature-change`"#,
    ),
    (
        "two of one width",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ temperature-change = "+35 K" }, { temperature-change = "+5 K" }]
"#,
        "4:66 two temperatures act on one place, the other in line 4 | keep one; the narrower of two wins only where they are of different width (layer, segment, member, case)",
    ),
    (
        "from the end to the start",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ line = "3 kN/m", from = "end", to = "start" }]
"#,
        "4:35 this line load ends where it begins, or before | `from` must lie nearer to the member's start than `to`",
    ),
    (
        "a stretch of a segment",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ line = "3 kN/m", on = "rod", to = "end" }]
"#,
        "4:28 `on` stands beside `from` or `to` | keep `on` for a whole segment, or `from` and `to` for a stretch",
    ),
    (
        "nothing stands there",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ movement = "3 mm", at = "end" }]
"#,
        "4:35 no support stands at this station, so nothing can move it | name a support with `support`, or take a station that has one",
    ),
    (
        "a misspelt support",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ movement = "3 mm", support = "stat" }]
"#,
        "4:40 no support of this member is called `stat` | `start` comes nearest",
    ),
    (
        "a movement of nothing",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ movement = "3 mm" }]
"#,
        "4:9 a `movement` needs `support` or `at` | add `support` with the name of the support that moves",
    ),
    (
        "weight is a number",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ weight = "1 kN" }]
"#,
        "4:20 a bare number is expected here, not a text | write it without quotes and without a unit, such as `1.5`",
    ),
    (
        "one table for a list",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = { at = "end", force = "1 kN" }
"#,
        "4:8 `load` is a list of tables, not a table | write `load = [{ … }]`, or a header `[[… .load]]` for each",
    ),
    (
        "numbers that are none",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ at = "end", force = "1e400 kN" }, { weight = nan }, { weight = 1e400 }]
"#,
        r#"4:32 `1e400` is too large or too small | a number is 0, or its size lies between 1e-150 and 1e150
4:56 this is no finite number | write a number that a double can hold, such as `1.5`
4:74 this is no finite number | write a number that a double can hold, such as `1.5`"#,
    ),
    (
        "a gap takes nothing",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355" }, { name = "joint", gap = "3 mm" }]
load = [{ on = "joint", strain = 1e-3 }, { line = "1 kN/m" }, { at = "1.002 m", force = "1 kN" }]"#,
        r#"4:16 `joint` is a gap, on which nothing acts | a gap has no material; take a segment beside it
4:42 this line load covers the gap `joint`, which takes none | write one load for each side, with `on`, or with `from` and `to`
4:70 this station lies inside the gap `joint`, where there is no material | take a station at one of its ends"#,
    ),
];
