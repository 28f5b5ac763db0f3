//! Wrong values, word for word: the lines added to a sound job, and what is said of it.

use super::check;

#[test]
fn each_wrong_length_is_told() {
    check(LENGTHS);
}

#[test]
fn each_wrong_load_is_told() {
    check(LOADS);
}

#[test]
fn what_later_versions_read_is_named() {
    check(LATER);
}

const LENGTHS: &[(&str, &str)] = &[
    (
        r#"[[member.b.segment]]
length = 2
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:10 a length is expected here, not a bare number | write it in quotes with its unit, such as "2.85 m"; units are m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "-2 m"
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:10 `length` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        r#"[[member.b.segment]]
length = "0 m"
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:10 `length` must be more than 0 | write it as in "2.85 m""#,
    ),
    (
        r#"[[member.b.segment]]
length = "2 kN"
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:13 `kN` is a force; a length is expected here | write it as in "2.85 m"; units of a length: m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "nan m"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:11 `nan` is no number that can be computed with | a number is written as `2.85`, `1_250`, `28.5e6`, `5/8` or `1-1/2`",
    ),
    (
        r#"[[member.b.segment]]
length = "inf m"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:11 `inf` is no number that can be computed with | a number is written as `2.85`, `1_250`, `28.5e6`, `5/8` or `1-1/2`",
    ),
    (
        r#"[[member.b.segment]]
length = "1e400 m"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:11 `1e400` is too large or too small | a number is 0, or its size lies between 1e-150 and 1e150",
    ),
    (
        r#"[[member.b.segment]]
length = "1e-320 m"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:11 `1e-320` is too large or too small | a number is 0, or its size lies between 1e-150 and 1e150",
    ),
    (
        r#"[[member.b.segment]]
length = "1e308 km"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:11 `1e308` is too large or too small | a number is 0, or its size lies between 1e-150 and 1e150",
    ),
    (
        r#"[[member.b.segment]]
length = "2 MM"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:13 `MM` is no known unit | did you mean `mm`? Names of units keep their case",
    ),
    (
        r#"[[member.b.segment]]
length = "2 M"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:13 `M` is no known unit | did you mean `m`? Names of units keep their case",
    ),
    (
        r#"[[member.b.segment]]
length = {}
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:10 a length is expected here, not a table | write it in quotes, such as "2.85 m""#,
    ),
    (
        r#"[[member.b.segment]]
length = ""
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:11 nothing is written here, where a length is expected | write it as in "2.85 m"; units of a length: m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "2"
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:11 a unit is missing after `2` | write it as in "2.85 m"; units of a length: m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"#,
    ),
    (
        r#"[[member.b.segment]]
length = "2,5 m"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:11 a comma is not read in a number | the decimal mark is a point, as in `2.85`; thousands may be set apart as in `1_250`",
    ),
    (
        r#"[[member.b.segment]]
length = "rest"
section = { round = "1 in" }
material = "steel-s355""#,
        "5:10 `rest` is what is left between two points, and the member `b` lies between none | write the length itself, or `between` with two points in the member",
    ),
    (
        r#"[[member.b.segment]]
length = true
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:10 a length is expected here, not true or false | write it in quotes, such as "2.85 m""#,
    ),
    (
        r#"[[member.b.segment]]
length = [1, 2]
section = { round = "1 in" }
material = "steel-s355""#,
        r#"5:10 a length is expected here, not a list | write it in quotes, such as "2.85 m""#,
    ),
];

const LOADS: &[(&str, &str)] = &[
    (
        r#"load = [{ at = "end", force = "3 tonf" }]"#,
        "4:34 `tonf` is ambiguous: the ton is metric, short (US) or long | write `tf` for the metric ton-force (9.80665 kN), `tonf-us` for the US short ton-force (2000 lbf), or `kN` or `kip`",
    ),
    (
        r#"load = [{ at = "end", force = "3 t" }]"#,
        r#"4:34 `t` is a mass; a force is expected here | `kg`, `g` and `t` are masses; for their weight write `kgf`, `tf` (metric ton-force) or `kN`, as in "62 kN""#,
    ),
    (
        r#"load = [{ at = "end", force = "3 kn" }]"#,
        "4:34 `kn` is no known unit | did you mean `kN`? Names of units keep their case",
    ),
    (
        r#"load = [{ at = "end", force = 3 }]"#,
        r#"4:31 a force is expected here, not a bare number | write it in quotes with its unit, such as "62 kN"; units are N kN MN lbf kip kgf tf tonf-us"#,
    ),
    (
        r#"load = [{ at = "3 m", force = "3 kN" }]"#,
        "4:16 this station lies outside the member, which is 2 m long | distances count from the member's start",
    ),
    (
        r#"load = [{ at = "-1 m", force = "3 kN" }]"#,
        "4:16 this station lies outside the member, which is 2 m long | distances count from the member's start",
    ),
    (
        r#"load = [{ at = "rood.end", force = "3 kN" }]"#,
        "4:16 no segment of this member is called `rood` | `rod` comes nearest",
    ),
    (
        r#"load = [{ at = "middle", force = "3 kN" }]"#,
        r#"4:16 `middle` is no station | write "start", "end", "<segment>.start", "<segment>.end", or a distance from the member's start such as "1.25 m""#,
    ),
    (
        r#"load = [{ line = "1 kN/m", from = "1 m", to = "0.5 m" }]"#,
        "4:35 this line load ends where it begins, or before | `from` must lie nearer to the member's start than `to`",
    ),
    (
        r#"load = [{ line = "1 kN/m", from = "1 m", to = "1 m" }]"#,
        "4:35 this line load ends where it begins, or before | `from` must lie nearer to the member's start than `to`",
    ),
    (
        r#"load = [{ temperature-change = "35 K" }]"#,
        "4:33 a change of temperature has its sign | write `+35 K` for warmer or `-35 K` for cooler; what a thermometer shows is given under `temperature`",
    ),
    (
        r#"load = [{ temperature = "+35 degC" }]"#,
        "4:26 a reading of temperature has no `+` | leave the `+` out if this is what a thermometer shows; a change is given under `temperature-change`",
    ),
    (
        r#"load = [{ temperature = "-300 degC" }]"#,
        "4:26 this reading is below absolute zero | a reading is 0 K, -273.15 degC, -459.67 degF or more; a change is given under `temperature-change`",
    ),
    (
        r#"load = [{ temperature = "5 degC" }]"#,
        r#"4:25 a reading of temperature needs a datum | add `datum = "10 degC"` to `[job]`, the temperature at which lengths are as drawn, or write a `temperature-change`"#,
    ),
    (
        r#"load = [{ at = "end" }]"#,
        "4:9 a load needs an action | add one of `force`, `down`, `line`, `line-down`, `weight`, `temperature-change`, `temperature`, `misfit`, `strain`, `movement`",
    ),
    (
        r#"load = [{ at = "end", force = "1 kN", down = "1 kN" }]"#,
        "4:39 a load has one action, and here are `force` and `down` | write a load for each",
    ),
    (
        r#"load = [{ at = "end", fource = "1 kN" }]"#,
        "4:23 a load has no key `fource` | `force` comes nearest",
    ),
    (
        r#"load = [{ preload = "10 kN" }]"#,
        "4:11 `preload` (a force at assembly) is not read by this version | a known misfit is `misfit`",
    ),
    (
        "load = [{ turns = 0.5 }]",
        "4:11 `turns` (nut turns) is not read by this version | write them as a `misfit` of −number × pitch",
    ),
    (
        r#"load = [{ at = "end", force = { dead = "1 kN" } }]"#,
        "4:33 this job has no cases, and so none called `dead` | add `[case.dead]`, or name no case",
    ),
    (
        r#"load = [{ on = "nothing", strain = 1e-4 }]"#,
        "4:16 no segment of this member is called `nothing` | its segments are `rod`",
    ),
    (
        "load = [{ weight = 1 }]",
        r#"1:1 the member `tie` needs `runs`, since weight acts on it | add `runs = "up"`, "down", "level" or an angle above level, the direction from start to end"#,
    ),
    (
        r#"load = [{ strain = "1 mm" }]"#,
        r#"4:23 `mm` is a length; a strain is expected here | write it as in "-350 ue"; units of a strain: % ue microstrain mm/m in/in, or a bare number without quotes"#,
    ),
    (
        "load = [{ weight = nan }]",
        "4:20 this is no finite number | write a finite number, such as `1.5`",
    ),
    (
        r#"load = [{ movement = "1 mm", at = "end" }]"#,
        "4:35 no support stands at this station, so nothing can move it | name a support with `support`, or take a station that has one",
    ),
    (
        r#"load = [{ movement = "1 mm", support = "kerb" }]"#,
        "4:40 no support of this member is called `kerb` | its supports are `start`",
    ),
];

const LATER: &[(&str, &str)] = &[(
    r#"[material.x]
modulus-at = []"#,
    "5:1 `modulus-at` (laws of temperature) is not read by this version | take it out; nothing else stands for it yet",
)];
