//! Faults of watches, and of members that are taken out.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
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
