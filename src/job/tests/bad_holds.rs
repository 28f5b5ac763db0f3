//! Faults of holds, loads of the job, watches, and members that are taken out.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "a hold of nothing, of two, of what is not there",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
[[hold]]
point = "a"
points = ["b"]
[[hold]]
point = "tt"
[[hold]]
point = ["a"]
[[hold]]
points = ["a", "a"]
"#,
        r#"8:1 a hold needs `point` or `points` | add `point = "a"`, the name of the point that it holds
11:1 `point` and `points` both say what is held | keep one of them
13:9 no point is called `tt` | `t` comes nearest
15:9 `point` names one point, and here is a list | write `points` for several
17:16 the point `a` stands twice in this hold | take one out"#,
    ),
    (
        "holds under one header",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[hold]
point = "a"
"#,
        "8:1 `hold` is a list of tables, not a table | write the header of each in double brackets: `[[hold]]`",
    ),
    (
        "two kinds of hold",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
spring = "1 kN/mm"
stop = "1 mm"
[[hold]]
point = "b"
spring = "1 kN/mm"
stiffness = "1 kN/mm"
"#,
        r#"11:1 a hold is of one kind, and here are `spring` and `stop` | write two holds
15:1 `stiffness` stands beside `stop` alone | the stiffness of a spring is its value: `spring = "35 kN/mm"`"#,
    ),
    (
        "stops without a sign, without a direction, with two",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
stop = "1 mm"
along = ["x"]
[[hold]]
point = "a"
stop = "1 mm"
[[hold]]
point = "a"
stop = "1 mm"
along = ["+x", "-y"]
"#,
        r#"11:10 a stop needs the sign of the direction that it blocks: `x` | write "+x" where it blocks movement toward larger x, else "-x"
12:1 a stop needs `along`, the direction that it blocks | add it with its sign: `along = ["+x"]`
18:9 a stop blocks one direction, and here are 2 | write a hold for each direction"#,
    ),
    (
        "directions that are none",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
along = "x"
[[hold]]
point = "a"
along = []
[[hold]]
point = "a"
along = ["w"]
[[hold]]
point = "a"
along = [[0, 0]]
[[hold]]
point = "a"
along = [1, 1]
"#,
        r#"10:9 a list of directions is expected here, not a text | write a list of directions, as in `["x"]` or `[[1, 1]]`
13:9 this list holds no direction | write a list of directions, as in `["x"]` or `[[1, 1]]`
16:10 no direction is called `w` | write "x", "y" or "z", or with its sign "+x" or "-x", or its part along each coordinate as in `[1, 1]`
19:10 this direction has no length, and so leads nowhere | write "x", "y" or "z", or with its sign "+x" or "-x", or its part along each coordinate as in `[1, 1]`
22:9 a list of directions is expected here, and these are the parts of one | write a list of directions, as in `["x"]` or `[[1, 1]]`"#,
    ),
    (
        "directions of another space",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
along = ["z"]
[[hold]]
point = "b"
along = [[1, 1, 1]]
"#,
        r#"10:10 a job in two coordinates has no `z` | its directions are `x`, `y`
13:10 here are entries for three coordinates, and the points of this job have two coordinates | write one entry for each coordinate"#,
    ),
    (
        "directions that depend on one another",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
along = ["x", [1, 1], "y"]
[[hold]]
point = "b"
along = ["x", "-x"]
"#,
        r#"10:23 this direction adds nothing to those before it | take it out; a hold that answers in them answers in it too
13:15 this direction adds nothing to those before it | take it out; a hold that answers in them answers in it too"#,
    ),
    (
        "held twice in one direction",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
[[hold]]
points = ["b", "a"]
along = ["y"]
"#,
        "11:16 the point `a` is held twice in one direction, first in line 8 | keep one of the two, or say with `along` in which direction each holds",
    ),
    (
        "limits of a hold",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
limit = { reaction = ["-1 kN", "2 kN"], gap = { min = "1 mm" }, bears = true }
"#,
        r#"10:22 this hold answers in 2 directions, and its reaction is held by its size | write one value; a pair belongs to a hold along one direction
10:41 `gap` is a limit of a stop or a gap segment; here is a limit of a hold | move it there, or take it out
10:65 `bears` is a limit of a stop or a gap segment; here is a limit of a hold | move it there, or take it out"#,
    ),
    (
        "a pair for a hold in two directions",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "a"
limit = { reaction = ["-1 kN", "2 kN"] }
"#,
        "10:22 this hold answers in 2 directions, and its reaction is held by its size | write one value; a pair belongs to a hold along one direction",
    ),
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
    (
        "watches of nothing and of two",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[watch]]
[[watch]]
point = "a"
station = "m.end"
"#,
        r#"8:1 a watch needs `point`, `body` or `station` | add `point = "lug"`, `body = "beam"` or `station = "H4.end"`
11:1 a watch looks at one thing, and here are `point` and `station` | write a watch for each"#,
    ),
    (
        "watches with keys that do not fit",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a", "b"]
[[watch]]
body = "c"
limit = "1 mm"
along = "x"
[[watch]]
point = "a"
rotation = "1 deg"
[[watch]]
station = "m.end"
along = "x"
[[watch]]
point = "a"
in = "all"
since = "all"
"#,
        r#"12:1 `limit` does not stand in a watch of a body | the limit of a body's rotation is `rotation`
13:1 `along` does not stand in a watch of a body | beside `body` stand `about`, `rotation`
16:1 `rotation` does not stand in a watch of a point | beside `point` stand `relative-to`, `along`, `limit`
19:1 `along` does not stand in a watch of a station | a station moves along the axis of its member; take it out
22:1 `in` belongs to a limit, and this watch has none | add `limit`, for a body `rotation`, or take it out
23:1 `since` belongs to a limit, and this watch has none | add `limit`, for a body `rotation`, or take it out"#,
    ),
    (
        "watches of what is not there",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[watch]]
point = "aa"
relative-to = "bb"
[[watch]]
body = "c"
[[watch]]
station = "n.end"
[[watch]]
station = "m.shank.end"
[[watch]]
station = "m"
[[watch]]
station = "m.5 m"
"#,
        r#"9:9 no point is called `aa` | `a` comes nearest
10:15 no point is called `bb` | `b` comes nearest
12:8 this job has no bodies, and so none called `c` | add `[body.c]`
14:11 no member is called `n` | `m` comes nearest
16:11 no segment of this member is called `shank` | its segments are `1`
18:11 `m` is no station of a member | write the member, a dot and the station, as in "H4.end" or "H4.shank.end"
20:11 this station lies outside the member, which is 2 m long | distances count from the member's start"#,
    ),
    (
        "relative to itself",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[watch]]
point = "a"
relative-to = "a"
[[watch]]
station = "m.end"
relative-to = "m.end"
"#,
        r#"10:15 this is watched relative to itself, which is always 0 | name another, or leave `relative-to` out
13:15 this is watched relative to itself, which is always 0 | name another, or leave `relative-to` out"#,
    ),
    (
        "directions of a watch",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[body.c]
points = ["a", "b"]
[[watch]]
point = "a"
along = ["y"]
[[watch]]
point = "a"
along = 1
[[watch]]
body = "c"
about = "x"
"#,
        r#"12:9 one direction is expected here, not a list of them | write it without the brackets around it, as in "y" or `[1, 1]`
15:9 a direction is expected here, not a bare number | write "x", "y" or "z", or with its sign "+x" or "-x", or its part along each coordinate as in `[1, 1]`
18:9 in two coordinates a body turns about z alone | leave `about` out"#,
    ),
    (
        "limits of a watch",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[[watch]]
point = "a"
limit = ["-1 mm", "2 mm"]
[[watch]]
point = "a"
limit = "length / 500"
[[watch]]
point = "a"
limit = "1 mm"
in = "servce"
"#,
        r#"10:9 without `along` the size is watched, which has no sign | write one value, or add `along`
13:9 a watch has no length of which this could be a share | write the length itself, as in "4 mm"
17:6 `servce` is no combination nor a purpose | `service` comes nearest"#,
    ),
    (
        "members that are taken out",
        r#"[point]
a = ["0 m", "0 m"]
b = ["3 m", "0 m"]
t = ["0 m", "2 m"]
[member.m]
between = ["t", "a"]
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
[combination.c]
without = ["m", "m"]
lose-each = ["m"]
[combination.d]
lose-each = []
[combination.e]
without = "m"
[combination.f]
lose-each = ["n"]
"#,
        r#"9:17 the member `m` stands twice in `without` | take one out
10:14 the member `m` stands in `without` and in `lose-each` | take one out
12:13 this list names no member | name at least one member, or leave the key out
14:11 a list of members is expected here, not a text | write them as in `["a", "b"]`, the members by their names
16:14 no member is called `n` | `m` comes nearest"#,
    ),
];
