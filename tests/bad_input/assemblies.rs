//! Wrong assemblies, word for word: what is changed in a sound job, and what is said of it.

use super::{errors, program, said, status, text};
use std::fmt::Write;
use std::fs;
use std::time::{Duration, Instant};

const SOUND: &str = r#"[case.dead]
[case.settle]
[combination.service]
factors = { dead = 1.0, settle = 1.0 }
lose-each = ["west"]

[point]
left = ["0 m", "3 m"]
right = ["4.2 m", "3 m"]
a = ["0 m", "0 m"]
b = ["4.2 m", "0 m"]

[body.beam]
points = ["a", "b"]
mass = "320 kg"
at = ["2.1 m", "0 m"]

[member.west]
between = ["left", "a"]
segment = [{ length = "3 m", section = { round = "20 mm" }, material = "steel-s355" }]
[member.east]
like = "west"
between = ["right", "b"]

[[hold]]
name = "anchors"
points = ["left", "right"]
[[hold]]
name = "kerb"
point = "a"
stop = "2 mm"
along = ["+x"]

[[load]]
case = "dead"
point = "b"
force = ["0 kN", "-25 kN"]
[[load]]
case = "settle"
hold = "anchors"
movement = ["0 mm", "-3 mm"]

[[watch]]
name = "level"
point = "b"
relative-to = "a"
along = "y"
limit = "4 mm"
"#;

#[test]
fn each_is_told_at_its_place() {
    let mut wrong = String::new();
    for (why, from, to, expected) in ASSEMBLIES {
        assert!(SOUND.contains(from), "{why}");
        let said = said(SOUND.replacen(from, to, 1));
        if said != *expected {
            write!(wrong, "{why}\n  says     {said}\n  expected {expected}\n").unwrap();
        }
    }
    assert!(wrong.is_empty(), "{wrong}");
}

#[test]
fn all_come_in_one_run() {
    assert_eq!(said(EVERY), SAID_OF_EVERY);
}

/// A million points, most of which nothing uses, and a fault at the end of the file.
#[test]
fn a_million_points_are_read() {
    let mut job = String::from("[point]\n");
    for number in 0..1_000_000 {
        writeln!(job, "p{number} = [\"{number} m\", \"0 m\"]").unwrap();
    }
    job.push_str(
        "[member.m]\nbetween = [\"p0\", \"p1000000\"]\nsegment = [{ length = \"rest\", section = \
                  { round = \"20 mm\" }, material = \"steel-s355\" }]\n",
    );
    let folder = tempfile::tempdir().unwrap();
    let file = folder.path().join("points.toml");
    fs::write(&file, job).unwrap();
    let begin = Instant::now();
    let output = program(&["check", text(&file)]);
    assert!(begin.elapsed() < Duration::from_secs(60));
    assert_eq!(status(&output), 3);
    let errors = errors(&output);
    assert!(
        errors.contains("line 1000003, column 18: no point is called `p1000000`"),
        "{errors}"
    );
}

/// Why it is a fault, what is changed, into what, and what is said of it.
const ASSEMBLIES: &[(&str, &str, &str, &str)] = &[
    (
        "points at one place",
        r#"right = ["4.2 m", "3 m"]"#,
        r#"right = ["4.2 m", "0 mm"]"#,
        "23:11 the points `right` and `b` lie at one place, so the member `east` has no length | name another point, or look at their coordinates",
    ),
    (
        "a member from a point to itself",
        r#"between = ["left", "a"]"#,
        r#"between = ["left", "left"]"#,
        "19:20 this member goes from the point `left` to itself | name another point at one of its ends",
    ),
    (
        "coordinates of mixed number",
        r#"a = ["0 m", "0 m"]"#,
        r#"a = ["0 m", "0 m", "0 m"]"#,
        "10:5 the point `a` has three coordinates, and `left` has two coordinates | write the same number of coordinates for all points of a job",
    ),
    (
        "a point with a misspelt unit",
        r#"a = ["0 m", "0 m"]"#,
        r#"a = ["0 m", "0 M"]"#,
        "10:16 `M` is no known unit | did you mean `m`? Names of units keep their case",
    ),
    (
        "a hold on an unknown point",
        r#"points = ["left", "right"]"#,
        r#"points = ["left", "rigth"]"#,
        "27:19 no point is called `rigth` | `right` comes nearest",
    ),
    (
        "a body on an unknown point",
        r#"points = ["a", "b"]"#,
        r#"points = ["a", "c"]"#,
        "14:16 no point is called `c` | `a` and `b` come nearest",
    ),
    (
        "a body of no points",
        r#"points = ["a", "b"]"#,
        "points = []",
        "14:10 this list names no point | name at least one point, or leave the key out",
    ),
    (
        "a stop without a sign",
        r#"along = ["+x"]"#,
        r#"along = ["x"]"#,
        r#"32:10 a stop needs the sign of the direction that it blocks: `x` | write "+x" where it blocks movement toward larger x, else "-x""#,
    ),
    (
        "a stop in two directions",
        r#"along = ["+x"]"#,
        r#"along = ["+x", "+y"]"#,
        "32:9 a stop blocks one direction, and here are 2 | write a hold for each direction",
    ),
    (
        "a stop that is a spring",
        r#"stop = "2 mm""#,
        r#"stop = "2 mm"
spring = "1 kN/mm""#,
        "31:1 a hold is of one kind, and here are `spring` and `stop` | write two holds",
    ),
    (
        "a movement of what is free",
        r#"hold = "anchors"
movement = ["0 mm", "-3 mm"]"#,
        r#"hold = "kerb"
movement = ["0 mm", "-3 mm"]"#,
        "41:12 this movement has a part in a direction in which the hold `kerb` does not hold | write 0 there; what is free in a direction is not moved by its hold",
    ),
    (
        "a hold that is not there",
        r#"hold = "anchors""#,
        r#"hold = "anchor""#,
        "40:8 no hold is called `anchor` | `anchors` comes nearest",
    ),
    (
        "lengths that miss the distance",
        r#"length = "3 m""#,
        r#"length = "2.9985 m""#,
        r#"19:11 the segments of `west` are 2.9985 m long together, and its points `left` and `a` lie 3 m apart: 0.0015 m too short | write `length = "rest"` in one of them; a member that was made too long or too short is as long as drawn here and has a load `misfit`
23:11 the segments of `east` are 2.9985 m long together, and its points `right` and `b` lie 3 m apart: 0.0015 m too short | write `length = "rest"` in one of them; a member that was made too long or too short is as long as drawn here and has a load `misfit`"#,
    ),
    (
        "a name for two",
        r#"name = "kerb""#,
        r#"name = "west""#,
        "29:8 a hold is called `west`, and so is a member in line 18 | give one another name; members, points, bodies, holds and watches share one set of names",
    ),
    (
        "a taken name",
        r#"name = "level""#,
        r#"name = "rotation""#,
        "44:8 the name `rotation` is taken: addresses of results need it | write another name",
    ),
    (
        "the loss of a member that is not there",
        r#"lose-each = ["west"]"#,
        r#"lose-each = ["wets"]"#,
        "5:14 no member is called `wets` | `west` comes nearest",
    ),
    (
        "a member that is lost twice",
        r#"lose-each = ["west"]"#,
        r#"lose-each = ["west"]
without = ["west"]"#,
        "5:14 the member `west` stands in `without` and in `lose-each` | take one out",
    ),
    (
        "a force with an entry too few",
        r#"force = ["0 kN", "-25 kN"]"#,
        r#"force = ["-25 kN"]"#,
        "37:9 here are entries for one coordinate, and the points of this job have two coordinates | write one entry for each coordinate",
    ),
    (
        "a moment on a point",
        r#"force = ["0 kN", "-25 kN"]"#,
        r#"moment = "25 kN m""#,
        "37:1 a `moment` does not act on a point | a moment acts on a `body`",
    ),
    (
        "a centre of mass that is not written",
        r#"at = ["2.1 m", "0 m"]
"#,
        "",
        "13:1 the body `beam` has a mass, and nothing says where | add `at` to the body: its centre of mass, one entry for each coordinate",
    ),
    (
        "an axis that two coordinates do not have",
        r#"along = "y""#,
        r#"along = "z""#,
        "47:9 a job in two coordinates has no `z` | its directions are `x`, `y`",
    ),
    (
        "a watch relative to itself",
        r#"relative-to = "a""#,
        r#"relative-to = "b""#,
        "46:15 this is watched relative to itself, which is always 0 | name another, or leave `relative-to` out",
    ),
    (
        "a share of a length in a watch",
        r#"limit = "4 mm""#,
        r#"limit = "length / 500""#,
        r#"48:9 a watch has no length of which this could be a share | write the length itself, as in "4 mm""#,
    ),
    (
        "a member with points and a support",
        r#"like = "west""#,
        r#"like = "west"
start = "fixed""#,
        "23:9 the member `east` lies between points, and so has no `start` | take it out; its points are held by a `hold`",
    ),
    (
        "a member that runs down between points",
        r#"like = "west""#,
        r#"like = "west"
runs = "down""#,
        "23:8 `runs` in the member `east`: in two coordinates its points tell how it runs | take it out",
    ),
    (
        "a load inside a member that may be slack",
        r#"like = "west""#,
        r#"like = "west"
carries = "tension"
load = [{ case = "dead", at = "1 m", down = "2 kN" }]"#,
        "24:9 no `down` acts on a member with `carries`, which may be slack | put it on a point, with `[[load]]` of the job; a member that carries both ways takes it too",
    ),
    (
        "the word `rest` twice",
        r#"segment = [{ length = "3 m","#,
        r#"segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }, { length = "rest","#,
        "20:100 `rest` stands twice in one member, first in line 20 | write all lengths but one; what is left is one length",
    ),
];

const EVERY: &str = r#"[case.dead]
[point]
a = ["0 m", "0 m"]
b = ["4 m"]
[body.beam]
points = ["a", "a"]
mass = "2 kN"
[member.m]
between = ["a", "c"]
carries = "both"
segment = [{ length = "rests", section = { round = "20 mm" }, material = "steel-s355" }]
[[hold]]
point = "d"
stop = "1 mm"
[[load]]
case = "live"
body = "boom"
force = ["1 kN", "0 kN"]
[[watch]]
station = "m.shank.end"
alnog = "x"
[combination.c]
lose-each = ["n"]
"#;

const SAID_OF_EVERY: &str = r#"4:5 the point `b` has one coordinate, and `a` has two coordinates | write the same number of coordinates for all points of a job
5:1 the body `beam` has a mass, and nothing says where | add `at` to the body: its centre of mass, one entry for each coordinate
6:16 the point `a` stands twice in this body | take one out
7:11 `kN` is a force; a mass is expected here | write it as in "320 kg"; units of a mass: kg g t lb
9:17 no point is called `c` | `a` and `b` come nearest
10:11 a member carries `tension` or `compression` alone, or both where `carries` is left out, not `both` | write one of `tension`, `compression`
11:24 a number is expected before `rests` | a number is written as `2.85`, `1_250`, `28.5e6`, `5/8` or `1-1/2`
12:1 a stop needs `along`, the direction that it blocks | add it with its sign: `along = ["+x"]`
13:9 no point is called `d` | `a` and `b` come nearest
16:8 no case is called `live` | the cases are `dead`
17:8 no body is called `boom` | the bodies are `beam`
20:11 no segment of this member is called `shank` | its segments are `1`
21:1 a watch has no key `alnog` | `along` comes nearest
23:14 no member is called `n` | `m` comes nearest"#;
