//! Faults of segments and sections.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "a length without quotes",
        r#"[member.m]
start = "fixed"
segment = [{ length = 2850, section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:23 a length is expected here, not a bare number | write it in quotes with its unit, such as "2.85 m"; units are m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        "a length without a unit",
        r#"[member.m]
start = "fixed"
segment = [{ length = "2850", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:24 a unit is missing after `2850` | write it as in "2.85 m"; units of a length: m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        "a force for a length",
        r#"[member.m]
start = "fixed"
segment = [{ length = "3 kN", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:26 `kN` is a force; a length is expected here | write it as in "2.85 m"; units of a length: m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        "a unit that there is not",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 metre", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "3:26 `metre` is no known unit | did you mean `m`? Names of units keep their case",
    ),
    (
        "nothing is no length",
        r#"[member.m]
start = "fixed"
segment = [{ length = "0 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:23 `length` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        "a negative length",
        r#"[member.m]
start = "fixed"
segment = [{ length = "-2 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:23 `length` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        "a tolerance that reaches 0",
        r#"[member.m]
start = "fixed"
segment = [{ length = "2 mm ± 2 mm", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        r#"3:23 `length` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        "what is left of no distance",
        r#"[member.m]
start = "fixed"
segment = [{ length = "rest", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "3:23 `rest` is what is left between two points, and the member `m` lies between none | write the length itself, or `between` with two points in the member",
    ),
    (
        "a material that comes near two",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s35" }]
"#,
        "3:72 no material is called `steel-s35` | `steel-s235` and `steel-s355` come nearest",
    ),
    (
        "a misspelt key is no missing one too",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, materal = "steel-s355" }]
"#,
        "3:61 a segment has no key `materal` | `material` comes nearest",
    ),
    (
        "a misspelt kind of section",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { rund = "20 mm" }, material = "steel-s355" }]
"#,
        "3:42 a section has no key `rund` | `round` comes nearest",
    ),
    (
        "a section without a kind",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = {  }, material = "steel-s355" }]
"#,
        r#"3:40 a section needs its kind | write its kind and dimensions, such as `{ round = "30 mm" }`"#,
    ),
    (
        "two kinds in one section",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm", bar = { width = "1 mm", depth = "1 mm" } }, material = "steel-s355" }]
"#,
        "3:59 a section is of one kind, and here are `round` and `bar` | keep one of them",
    ),
    (
        "what stands beside a section, in it",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm", count = 2 }, material = "steel-s355" }]
"#,
        "3:59 a section has no key `count` | write `count` beside `section`, not in it",
    ),
    (
        "a kind of a later version",
        r##"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { rebar = "#8" }, material = "steel-s355" }]
"##,
        "3:42 `rebar` (bars by designation) is not read by this version | write `round` or `area`",
    ),
    (
        "a designation of a later version",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { h = "W8x10" }, material = "steel-s355" }]
"#,
        "3:46 `W8x10` (rolled shapes by designation) is not read by this version | write `h` with its dimensions",
    ),
    (
        "dimensions that are not there, one fault each",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { h = { depth = "1 m", width = "20 mm" } }, material = "steel-s355" }]
"#,
        r#"3:46 an h needs `flange` | add `flange = "12 mm"`
3:46 an h needs `web` | add `web = "12 mm"`"#,
    ),
    (
        "walls that fill the inside",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { tube = { outer = "20 mm", wall = "10 mm" } }, material = "steel-s355" }]
"#,
        "3:40 this `tube` cannot be: at the segment's start its walls fill the inside: twice the wall must be less than the outer diameter (a solid one is `round`)",
    ),
    (
        "wall and inner diameter at once",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { tube = { outer = "20 mm", wall = "1 mm", inner = "18 mm" } }, material = "steel-s355" }]
"#,
        "3:83 a tube takes `wall` or `inner`, and here are both | keep one of them",
    ),
    (
        "a gyration where dimensions tell it",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm", gyration = "3 mm" }, material = "steel-s355" }]
"#,
        "3:59 `gyration` stands beside `area` alone | take it out",
    ),
    (
        "nothing is no diameter",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "0 mm" }, material = "steel-s355" }]
"#,
        r#"3:50 `round` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        "a taper through nothing",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = ["20 mm", "-1 mm"] }, material = "steel-s355" }]
"#,
        r#"3:50 `round` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        "a pair of one",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = ["20 mm"] }, material = "steel-s355" }]
"#,
        "3:50 a pair has two values, and here are 1 | write two values in [ ], or one without them",
    ),
    (
        "half a piece",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", count = 1.5 }]
"#,
        "3:94 `count` must be a whole number of 1 or more",
    ),
    (
        "no piece",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", count = 0 }]
"#,
        "3:94 `count` must be a whole number of 1 or more",
    ),
    (
        "net over gross (314 mm2)",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", net = "400 mm2" }]
"#,
        "3:92 the net area is more than the gross area of all pieces | write the area that is left for stress, of all pieces together",
    ),
    (
        "holes as wide as the rod",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", holes = { diameter = "20 mm", thickness = "20 mm" } }]
"#,
        "3:94 the holes leave no area | `diameter`, `number` and `thickness` are those of one piece",
    ),
    (
        "net and holes at once",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", net = "300 mm2", holes = { diameter = "2 mm", thickness = "20 mm" } }]
"#,
        "3:103 `net` and `holes` both say what is left for stress | keep one of them",
    ),
    (
        "a gap has no material",
        r#"[member.m]
start = "fixed"
segment = [{ gap = "3 mm", material = "steel-s355", length = "1 m" }]
"#,
        r#"3:28 `material` does not stand in one segment with `gap` | keep one of them, or make two segments of it
3:53 `length` does not stand in one segment with `gap` | the width of the gap is its length; leave `length` out"#,
    ),
    (
        "a stiffness instead of a section",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", stiffness = "3 kN/mm", section = { round = "20 mm" } }]
"#,
        "3:53 `section` does not stand in one segment with `stiffness` | keep one of them, or make two segments of it",
    ),
    (
        "no layer",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", layer = [] }]
"#,
        "3:38 this list of layers is empty | write at least one layer",
    ),
    (
        "two layers of one name",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", layer = [{ name = "a", section = { area = "1 cm2" }, material = "steel-s355" }, { name = "a", section = { area = "1 cm2" }, material = "steel-s355" }] }]
"#,
        "3:119 two layers of the segment `1` are called `a` | give one another name",
    ),
    (
        "expansion belongs to the material",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", expansion = "1e-5 /K" }]
"#,
        "3:86 `expansion` stands in a segment beside `stiffness` alone | that of a material stands in its table `[material.…]`",
    ),
    (
        "addresses are made with points",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", name = "a.b" }]
"#,
        "3:93 the name `a.b` holds `.`, which addresses need | write a name without `.` `:` `/` `=` and without blanks at its ends",
    ),
    (
        "`end` is a station",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", name = "end" }]
"#,
        "3:93 the name `end` is taken: addresses of results need it | write another name",
    ),
    (
        "results are called so",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = "20 mm" }, material = "steel-s355", name = "stress_max" }]
"#,
        "3:93 the name `stress_max` is taken: addresses of results need it | write another name",
    ),
    (
        "a point where a support stands",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = ["0 mm", "20 mm"] }, material = "steel-s355" }]
"#,
        "3:12 the segment `1` runs to a point at its start, where a support stands | give it some size there; only a free end without a load may be a point",
    ),
    (
        "a point where a force acts",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = ["20 mm", "0 mm"] }, material = "steel-s355" }]
load = [{ at = "end", force = "1 kN" }]"#,
        "3:12 the segment `1` runs to a point at its end, where a force acts | give it some size there; only a free end without a load may be a point",
    ),
    (
        "a cone's tip under a line load has no finite stress",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = ["20 mm", "0 mm"] }, material = "steel-s355" }]
load = [{ line = "1 kN/m" }]"#,
        "3:12 the segment `1` runs to a point at its end, where a line load acts | give it some size there; only a free end without a load may be a point",
    ),
    (
        "a point where the member goes on",
        r#"[member.m]
start = "fixed"
segment = [{ length = "1 m", section = { round = ["20 mm", "0 mm"] }, material = "steel-s355" }, { length = "1 m", section = { round = "20 mm" }, material = "steel-s355" }]
"#,
        "3:12 the segment `1` runs to a point at its end, where the member goes on | give it some size there; only a free end without a load may be a point",
    ),
];
