//! Faults of loads of the job.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "loads without a place, without an action, with two",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[load]]
force = ["1 kN", "0 kN"]
[[load]]
point = "a"
[[load]]
point = "a"
hold = "h"
force = ["1 kN", "0 kN"]
[[load]]
point = "a"
force = ["1 kN", "0 kN"]
moment = "1 kN m"
"#,
        r#"8:1 a load of the job needs `point`, `body` or `hold` | it is a `point` with `force`, a `body` with `force` or `moment`, or a `hold` with `movement`
10:1 a load of the job needs `force`, `moment` or `movement` | it is a `point` with `force`, a `body` with `force` or `moment`, or a `hold` with `movement`
14:1 a load of the job acts on one thing, and here are `point` and `hold` | write a load for each
19:1 a load of the job has one action, and here are `force` and `moment` | write a load for each"#,
    ),
    (
        "loads that do not fit",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a"]
[[hold]]
name = "h"
point = "a"
[[load]]
point = "a"
moment = "1 kN m"
[[load]]
body = "c"
movement = ["1 mm", "0 mm"]
[[load]]
hold = "h"
force = ["1 kN", "0 kN"]
"#,
        r#"15:1 a `moment` does not act on a point | a moment acts on a `body`
18:1 a `movement` does not act on a body | a movement is that of what a `hold` is fixed to
21:1 a `force` does not act on a hold | a force acts on a `point` or a `body`"#,
    ),
    (
        "entries of the wrong number and kind",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[load]]
point = "a"
force = ["1 kN"]
[[load]]
point = "a"
force = "1 kN"
[[load]]
point = "a"
force = ["1 kN", "1 mm"]
[[load]]
point = "a"
force = ["1 kN", "0 kN", "0 kN", "0 kN"]
"#,
        r#"10:9 here are entries for one coordinate, and the points of this job have two coordinates | write one entry for each coordinate
13:9 a list with an entry for each coordinate is expected, not a text | write one entry for each coordinate, as in `["62 kN", "62 kN"]` in two; in one it is a list too
16:21 `mm` is a length; a force is expected here | write it as in "62 kN"; units of a force: N kN MN lbf kip kgf tf tonf-us
19:9 there are at most three coordinates, and here are 4 | write one entry for each coordinate, as in `["62 kN", "62 kN"]` in two; in one it is a list too"#,
    ),
    (
        "moments of two coordinates",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a"]
[[load]]
body = "c"
moment = ["1 kN m"]
[[load]]
body = "c"
moment = "1 kN"
"#,
        r#"12:10 in two coordinates a moment is one value, about z | write it as in "4 kN m", + from x toward y
15:13 `kN` is a force; a moment is expected here | write it as in "4 kN m"; units of a moment: N m, kN m, N mm, lbf ft, lbf in, kip ft, kip in"#,
    ),
    (
        "a moment in one coordinate",
        r#"[point]
a = ["0 m"]
b = ["2 m"]
[member.m]
between = ["a", "b"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a"]
[[load]]
body = "c"
moment = "1 kN m"
[[watch]]
body = "c"
rotation = "1 deg"
"#,
        r#"11:10 in one coordinate nothing turns, and so no moment acts | take it out, or give the points two coordinates
13:8 in one coordinate no body turns, so nothing is there to watch | watch one of its points, or give the points two coordinates"#,
    ),
    (
        "moments of three coordinates",
        r#"[point]
a = ["0 m", "0 m", "0 m"]
b = ["2 m", "0 m", "0 m"]
[member.m]
between = ["a", "b"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a"]
[[load]]
body = "c"
moment = "1 kN m"
[[load]]
body = "c"
moment = ["1 kN m", "0 kN m"]
"#,
        r#"11:10 in three coordinates a moment has three values, about x, y and z | write it as in `["0 kN m", "0 kN m", "4 kN m"]`
14:10 here are entries for two coordinates, and a moment has three values, about x, y and z | write it as in `["0 kN m", "0 kN m", "4 kN m"]`"#,
    ),
    (
        "movements of what is free, and of no hold",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
name = "guide"
point = "a"
along = ["x"]
[[hold]]
name = "kerb"
point = "b"
along = [[1, 1]]
stop = "1 mm"
[[load]]
hold = "guide"
movement = ["1 mm", "-1 mm"]
[[load]]
hold = "kerb"
movement = ["1 mm", "0 mm"]
[[load]]
hold = "giude"
movement = ["1 mm", "0 mm"]
"#,
        r#"19:12 this movement has a part in a direction in which the hold `guide` does not hold | write 0 there; what is free in a direction is not moved by its hold
22:12 this movement has a part in a direction in which the hold `kerb` does not hold | write 0 there; what is free in a direction is not moved by its hold
24:8 no hold is called `giude` | `guide` comes nearest"#,
    ),
    (
        "a hold without a name cannot be named",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
[[load]]
hold = "hold.1"
movement = ["1 mm", "0 mm"]
"#,
        "11:8 this job has no holds with a name, and so none called `hold.1` | give the hold that is meant a `name`",
    ),
    (
        "cases of loads of the job",
        r#"[case.dead]
[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[load]]
point = "a"
force = ["1 kN", "0 kN"]
[[load]]
case = "daed"
point = "a"
force = ["1 kN", "0 kN"]
[[load]]
point = "a"
force = { dead = ["1 kN"] }
"#,
        r#"9:1 in a job with cases each load names its case | add `case`; the cases are `dead`
13:8 no case is called `daed` | `dead` comes nearest
18:18 here are entries for one coordinate, and the points of this job have two coordinates | write one entry for each coordinate"#,
    ),
];
