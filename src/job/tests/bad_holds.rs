//! Faults of holds.

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
];
