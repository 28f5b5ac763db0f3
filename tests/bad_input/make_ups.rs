//! Wrong sections and keys of segments, word for word: the lines added to a sound job, and what is
//! said of it.

use super::check;

#[test]
fn each_wrong_make_up_is_told() {
    check(MAKE_UPS);
}

const MAKE_UPS: &[(&str, &str)] = &[
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { round = "-20 mm" }"#,
        r#"7:21 `round` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { round = "0 mm" }"#,
        r#"7:21 `round` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { round = 20 }"#,
        r#"7:21 a length is expected here, not a bare number | write it in quotes with its unit, such as "2.85 m"; units are m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { rouns = "20 mm" }"#,
        "7:13 a section has no key `rouns` | `round` comes nearest",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = "M24""#,
        r#"7:11 a section is a table, not a text | write it as in `{ round = "30 mm" }`; it may have `round`, `tube`, `bar`, `box`, `area`, `thread`, `h`, `channel`, `angle`, `tee`, `gyration`, `stiffness-area`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = {}"#,
        r#"7:11 a section needs its kind | write its kind and dimensions, such as `{ round = "30 mm" }`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { pipe = "NPS 4 Sch 40" }"#,
        "7:13 `pipe` (pipes by designation) is not read by this version | write `tube` with its dimensions",
    ),
    (
        r##"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { rebar = "#8" }"##,
        "7:13 `rebar` (bars by designation) is not read by this version | write `round` or `area`",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { h = "W12x26" }"#,
        "7:17 `W12x26` (rolled shapes by designation) is not read by this version | write `h` with its dimensions",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { round = "20 mm", bar = { width = "1 mm", depth = "1 mm" } }"#,
        "7:30 a section is of one kind, and here are `round` and `bar` | keep one of them",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { tube = { outer = "30 mm", wall = "16 mm" } }"#,
        "7:11 this `tube` cannot be: at the segment's start its walls fill the inside: twice the wall must be less than the outer diameter (a solid one is `round`)",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { thread = "M25" }"#,
        r#"7:22 M25 has no coarse pitch in ISO 261 | write M25x2, M25x1.5 or M25x1"#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
material = "steel-s355"
section = { round = "20 mm", count = 4 }"#,
        "7:30 a section has no key `count` | write `count` beside `section`, not in it",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
count = 1.5"#,
        "8:9 `count` must be a whole number of 1 or more",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
count = 0"#,
        "8:9 `count` must be a whole number of 1 or more",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
count = inf"#,
        "8:9 this is no finite number | write a finite number, such as `1.5`",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
count = 1e400"#,
        "8:9 this is no finite number | write a finite number, such as `1.5`",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
net = "400 mm2""#,
        "8:7 the net area is more than the gross area of all pieces | write the area that is left for stress, of all pieces together",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
holes = { diameter = "20 mm", thickness = "20 mm" }"#,
        "8:9 the holes leave no area | `diameter`, `number` and `thickness` are those of one piece",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
mass = "-1 kg/m""#,
        r#"8:8 `mass` must be 0 or more | write it as in "4.9 kg/m""#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
lenth = "2 m""#,
        "8:1 a segment has no key `lenth` | `length` comes nearest",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s355"
expansion = "12e-6 /K""#,
        "8:1 `expansion` stands in a segment beside `stiffness` alone | that of a material stands in its table `[material.…]`",
    ),
    (
        r#"[[member.b.segment]]
length = "2 m"
section = { round = "20 mm" }
material = "steel-s356""#,
        "7:12 no material is called `steel-s356` | `steel-s355` comes nearest",
    ),
];
