//! Faults of loads.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
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
4:56 this is no finite number | write a finite number, such as `1.5`
4:74 this is no finite number | write a finite number, such as `1.5`"#,
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
