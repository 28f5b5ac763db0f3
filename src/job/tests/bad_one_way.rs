//! Faults of members that carry one way, of weight without an up, and of names and bodies.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "`rest` without points",
        r#"[member.s]
start = "fixed"
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "3:23 `rest` is what is left between two points, and the member `s` lies between none | write the length itself, or `between` with two points in the member",
    ),
    (
        "an end, a support and a direction beside points",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
start = "fixed"
runs = "down"
support = [{ at = "end", spring = "1 kN/mm" }]
"#,
        r#"8:9 the member `m` lies between points, and so has no `start` | take it out; its points are held by a `hold`
9:8 `runs` in the member `m`: in two coordinates its points tell how it runs | take it out
10:11 the member `m` lies between points, and so has no `support` | take it out; its points are held by a `hold`"#,
    ),
    (
        "a copy of a member with supports",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.s]
start = "fixed"
runs = "down"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[member.m]
like = "s"
between = ["t", "a"]
"#,
        r#"11:11 the member `m` takes over `runs` by `like`, and a member between points has none | write the keys that it shares out, in place of `like`
11:11 the member `m` takes over `start` by `like`, and a member between points has none | write the keys that it shares out, in place of `like`"#,
    ),
    (
        "`carries` of neither, and without points",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
carries = "push"
[member.s]
start = "fixed"
segment = [{ length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
carries = "tension"
"#,
        r#"8:11 a member carries `tension` or `compression` alone, or both where `carries` is left out, not `push` | write one of `tension`, `compression`
12:11 `carries` stands in a member `between` two points | take it out, or write `between`; a joint that parts is a `gap` segment"#,
    ),
    (
        "loads inside a one-way member",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
carries = "tension"
load = [{ at = "end", force = "1 kN" }, { at = "0.5 m", down = "1 kN" }, { line = "1 kN/m" }, { line-down = "1 kN/m" }]
"#,
        r#"9:9 no `force` acts on a member with `carries`, which may be slack | put it on a point, with `[[load]]` of the job; a member that carries both ways takes it too
9:41 no `down` acts on a member with `carries`, which may be slack | put it on a point, with `[[load]]` of the job; a member that carries both ways takes it too
9:74 no `line` acts on a member with `carries`, which may be slack | put it on a point, with `[[load]]` of the job; a member that carries both ways takes it too
9:95 no `line-down` acts on a member with `carries`, which may be slack | put it on a point, with `[[load]]` of the job; a member that carries both ways takes it too"#,
    ),
    (
        "a gap in a one-way member",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
carries = "compression"
segment = [{ name = "joint", gap = "2 mm" }, { length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "8:12 the gap `joint` stands in a member with `carries`, which parts as a whole | keep one of the two: `carries`, or the gap",
    ),
    (
        "a movement of no support",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
load = [{ at = "end", movement = "1 mm" }]
"#,
        "8:9 a member between points has no support that could be moved | write a load of the job, `[[load]]` with `hold` and `movement`",
    ),
    (
        "a taper to a point where a point holds it",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = ["20 mm", "0 mm"] }, material = "steel-s355" }]
"#,
        "7:12 the segment `1` runs to a point at its end, where it meets the point that holds it | give it some size there; only a free end without a load may be a point",
    ),
    (
        "`slack = true`, and what is never slack",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { slack = true }
[member.n]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { slack = false }
"#,
        r#"8:19 `slack = true` is no limit | write `slack = false` for a member that must carry; else leave it out
12:19 the member `n` carries both ways, and so is never slack | take it out, or add `carries = "tension"` or "compression" to the member"#,
    ),
    (
        "`slack` of a segment",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355", limit = { slack = false } }]
"#,
        "7:97 `slack` is a limit of a member; here is a limit of a segment | move it there, or take it out",
    ),
    (
        "weight in one coordinate",
        r#"[case.g]
weight = 1
[point]
a = ["0 m"]
b = ["2 m"]
[member.m]
between = ["a", "b"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.w]
points = ["b"]
mass = "10 kg"
at = ["2 m"]
"#,
        r#"6:1 the member `m` needs `runs`, since weight acts on it | add `runs` to `[default]`, the direction in which x grows, or to a member between points, from its start to its end: "up", "down", "level" or an angle above level
9:1 weight acts on the body `w`, and nothing says which way is up | add `runs` to `[default]`, the direction in which x grows, or to a member between points, from its start to its end: "up", "down", "level" or an angle above level"#,
    ),
    (
        "two that disagree on up",
        r#"[default]
runs = "up"
[point]
a = ["0 m"]
b = ["2 m"]
[member.m]
between = ["b", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
runs = "up"
"#,
        "9:8 this and line 2 disagree on which way is up | `runs` in `[default]` is the direction in which x grows, `runs` in a member that from its start to its end",
    ),
    (
        "one name for several",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.a]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.t]
points = ["b"]
[[hold]]
name = "a"
point = "a"
[[watch]]
name = "b"
point = "a"
[[hold]]
name = "h"
point = "t"
[[watch]]
name = "h"
point = "a"
"#,
        r#"5:9 a member is called `a`, and so is a point in line 2 | give one another name; members, points, bodies, holds and watches share one set of names
8:7 a body is called `t`, and so is a point in line 4 | give one another name; members, points, bodies, holds and watches share one set of names
11:8 a hold is called `a`, and so is a point in line 2 | give one another name; members, points, bodies, holds and watches share one set of names
14:8 a watch is called `b`, and so is a point in line 3 | give one another name; members, points, bodies, holds and watches share one set of names
20:8 a watch is called `h`, and so is a hold in line 17 | give one another name; members, points, bodies, holds and watches share one set of names"#,
    ),
    (
        "a body of no points, of one twice, of unknown ones",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = []
[body.d]
points = ["a", "b", "a"]
[body.e]
points = ["aa"]
[body.f]
points = "a"
[body.g]
mass = "1 kg"
"#,
        r#"9:10 this list names no point | name at least one point, or leave the key out
11:21 the point `a` stands twice in this body | take one out
13:11 no point is called `aa` | `a` comes nearest
15:10 a list of points is expected here, not a text | write them as in `["a", "b"]`, the points by their names
16:1 a body needs `points` | add `points = ["a", "b"]`
16:1 the body `g` has a mass, and nothing says where | add `at` to the body: its centre of mass, one entry for each coordinate"#,
    ),
    (
        "a mass nowhere, a force nowhere, a negative mass",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a", "b"]
mass = "10 kg"
[body.d]
points = ["a", "b"]
[[load]]
body = "d"
force = ["1 kN", "0 kN"]
[body.e]
points = ["a"]
mass = "-1 kg"
at = ["0 m", "0 m"]
"#,
        r#"8:1 the body `c` has a mass, and nothing says where | add `at` to the body: its centre of mass, one entry for each coordinate
11:1 a force acts on the body `d` at its centre of mass, and nothing says where | add `at` to the body: its centre of mass, one entry for each coordinate
18:8 `mass` must be 0 or more | write it as in "320 kg""#,
    ),
    (
        "a centre in another space",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a", "b"]
mass = "10 kg"
at = ["1 m"]
"#,
        "11:6 here are entries for one coordinate, and the points of this job have two coordinates | write one entry for each coordinate",
    ),
    (
        "a body with a misspelt key",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
point = ["a", "b"]
"#,
        "9:1 a body has no key `point` | `points` comes nearest",
    ),
];
