//! Faults of points and members between them.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "coordinates that are no list",
        r#"[point]
a = "0 m"
[member.s]
start = "fixed"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"2:5 a list with an entry for each coordinate is expected, not a text | write one entry for each coordinate, as in `["2.85 m", "2.85 m"]` in two; in one it is a list too"#,
    ),
    (
        "coordinates of nothing, and too many",
        r#"[point]
a = []
b = ["0 m", "1 m", "2 m", "3 m"]
[member.s]
start = "fixed"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"2:5 this list has no entry for any coordinate | write one entry for each coordinate, as in `["2.85 m", "2.85 m"]` in two; in one it is a list too
3:5 there are at most three coordinates, and here are 4 | write one entry for each coordinate, as in `["2.85 m", "2.85 m"]` in two; in one it is a list too"#,
    ),
    (
        "a coordinate without a unit, and one of another kind",
        r#"[point]
a = [0, "3 m"]
b = ["3 kN", "0 m"]
[member.s]
start = "fixed"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"2:6 a length is expected here, not a bare number | write it in quotes with its unit, such as "2.85 m"; units are m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`
3:9 `kN` is a force; a length is expected here | write it as in "2.85 m"; units of a length: m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        "points of mixed number",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m"]
c = ["0 m", "0 m", "1 m"]
[member.s]
start = "fixed"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:5 the point `b` has one coordinate, and `a` has two coordinates | write the same number of coordinates for all points of a job
4:5 the point `c` has three coordinates, and `a` has two coordinates | write the same number of coordinates for all points of a job"#,
    ),
    (
        "names that addresses need",
        r#"[point]
x = ["0 m"]
"a.b" = ["1 m"]
[body.rotation]
points = ["x"]
[member.s]
start = "fixed"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"2:1 the name `x` is taken: addresses of results need it | write another name
3:1 the name `a.b` holds `.`, which addresses need | write a name without `.` `:` `/` `=` and without blanks at its ends
4:7 the name `rotation` is taken: addresses of results need it | write another name"#,
    ),
    (
        "points that are no table",
        r#"point = 3
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"1:9 `point` is a table by name, not a bare number | write a line for each below `[point]`, as in `a = ["4.2 m", "3 m"]`"#,
    ),
    (
        "one point",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"6:11 `between` names two points, and here are 1 | write the names of the points at its start and at its end, as in `["a", "b"]`"#,
    ),
    (
        "points by one text",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = "a"
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"6:11 `between` names two points, and here is a text | write the names of the points at its start and at its end, as in `["a", "b"]`"#,
    ),
    (
        "from a point to itself",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["a", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "6:17 this member goes from the point `a` to itself | name another point at one of its ends",
    ),
    (
        "unknown points",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["tt", "c"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"6:12 no point is called `tt` | `t` comes nearest
6:18 no point is called `c` | `a` and `b` and `t` come nearest"#,
    ),
    (
        "points at one place",
        r#"[point]
a = ["1 m", "0 m"]
b = ["1000 mm", "0 m"]
[member.m]
between = ["a", "b"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "5:11 the points `a` and `b` lie at one place, so the member `m` has no length | name another point, or look at their coordinates",
    ),
    (
        "a job without points",
        r#"[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"2:12 this job has no points, and so none called `t` | add it to `[point]`, as in `t = ["4.2 m", "3 m"]`
2:17 this job has no points, and so none called `a` | add it to `[point]`, as in `a = ["4.2 m", "3 m"]`"#,
    ),
    (
        "a length that misses the distance",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "1.998 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"6:11 the segments of `m` are 1.998 m long together, and its points `t` and `a` lie 2 m apart: 0.002 m too short | write `length = "rest"` in one of them; a member that was made too long or too short is as long as drawn here and has a load `misfit`"#,
    ),
    (
        "a length beyond it in feet",
        r#"[point]
a = ["0 ft"]
b = ["9 ft"]
[member.m]
between = ["a", "b"]
segment = [{ length = "9 ft 0-1/8 in", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"5:11 the segments of `m` are 2.746375 m long together, and its points `a` and `b` lie 2.7432 m apart: 0.003175 m too long | write `length = "rest"` in one of them; a member that was made too long or too short is as long as drawn here and has a load `misfit`"#,
    ),
    (
        "`rest` twice",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [
  { length = "rest", section = { round = "20 mm" }, material = "steel-s355" },
  { length = "1 m", section = { round = "20 mm" }, material = "steel-s355" },
  { length = "rest", section = { round = "20 mm" }, material = "steel-s355" },
]
"#,
        "10:14 `rest` stands twice in one member, first in line 8 | write all lengths but one; what is left is one length",
    ),
    (
        "nothing left for `rest`",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }, { length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "7:99 nothing is left for this length: the other segments of `m` are 2 m long together, and its points `t` and `a` lie 2 m apart | shorten the others, or look at the coordinates of the points",
    ),
];
