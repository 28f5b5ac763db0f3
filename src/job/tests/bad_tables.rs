//! Faults of limits, cases, combinations and materials.

use super::{Bad, check};

#[test]
fn each_is_told_at_its_place() {
    check(BAD);
}

/// Why it is a fault, the job, and what is said of it: line, column, message, remedy.
const BAD: &[Bad] = &[
    (
        "a misspelt strength",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { tension = "0.6 yeild" }
"#,
        "4:26 `yeild` is no strength of a material | did you mean `yield`?",
    ),
    (
        "the size of a stress has no sign",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { tension = "-100 MPa" }
"#,
        "4:21 the limit of a stress is its size, 0 or more | leave out the sign: `tension` and `compression` say which way",
    ),
    (
        "a bare number other than 0",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { tension = 100 }
"#,
        r#"4:21 a stress is expected here, not a bare number | write it in quotes with its unit, such as "345 MPa"; units are Pa kPa MPa GPa psi ksi Msi bar, or a force per area as in `N/mm2`"#,
    ),
    (
        "a strength that steel does not give",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { tension = "0.4 crushing" }
"#,
        "4:21 this is a share of the crushing strength of `steel-s355`, which is not given | add `crushing` in `[material.steel-s355]`, or write the limit as a stress",
    ),
    (
        "a pair of one sign",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { elongation = ["2 mm", "5 mm"] }
"#,
        r#"4:24 a pair of limits holds each sign: the first must be 0 or less, the second 0 or more | write the negative one first, such as `["-2 mm", "5 mm"]`"#,
    ),
    (
        "a size has no sign",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { elongation = "-2 mm" }
"#,
        "4:24 a single limit holds the size, 0 or more | leave out the sign, or write a pair with a bound for each sign",
    ),
    (
        "a limit of something else",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { reaction = "3 kN" }
"#,
        "4:11 `reaction` is a limit of a support or a hold; here is a limit of a member | move it there, or take it out",
    ),
    (
        "limits of a later version",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { buckling = "Euler", strength = {} }
"#,
        r#"4:11 `buckling` (buckling checks) is not read by this version | take it out; nothing else stands for it yet
4:31 `strength` (clauses of standards) is not read by this version | take it out; nothing else stands for it yet"#,
    ),
    (
        "a misspelt limit",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { tenson = "3 MPa" }
"#,
        "4:11 a limit of a member has no key `tenson` | `tension` comes nearest",
    ),
    (
        "an empty limit",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = {}
"#,
        "4:9 this limit holds nothing | add one of `tension`, `compression`, `force`, `elongation`, `displacement`, `slack`",
    ),
    (
        "an area of nothing",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { area = "net" }
"#,
        "4:11 `area` stands beside `tension` or `compression` | take it out",
    ),
    (
        "a misspelt purpose",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { tension = "3 MPa", in = ["servce"] }
[combination.service]
"#,
        "4:36 `servce` is no combination nor a purpose | `service` comes nearest",
    ),
    (
        "a combination that is not there",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { elongation = "3 mm", since = "erection" }
[combination.service]
"#,
        "4:40 `erection` is no combination | write one of `service`",
    ),
    (
        "since a list",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { elongation = "3 mm", since = "x" }
[case.a]
[combination.x]
factors = { a = [0, 1] }
"#,
        r#"4:40 `x` stands for 2 combinations, and `since` takes one | name one of them, such as "x/a=0""#,
    ),
    (
        "a station that is not there",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
limit = { displacement = [{ at = "rood.end", limit = "2 mm" }] }
"#,
        "4:34 no segment of this member is called `rood` | `rod` comes nearest",
    ),
    (
        "a misspelt key and a name with a slash",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[case.a]
wieght = 1
[case."b/c"]
"#,
        r#"6:1 a case has no key `wieght` | `weight` comes nearest
7:7 the name `b/c` holds `/`, which addresses need | write a name without `.` `:` `/` `=` and without blanks at its ends"#,
    ),
    (
        "three faults of a combination",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[case.a]
[combination.x]
factors = { b = 1, a = [] }
without = ["H5"]"#,
        r#"7:13 no case is called `b` | `a` comes nearest
7:24 this list of factors is empty | write the factors that are tried, such as `[0.0, 1.0]`
8:12 no member is called `H5` | the members are `tie`"#,
    ),
    (
        "an always case has no factor",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[case.a]
always = true
[combination.x]
factors = { a = 1 }"#,
        "8:13 the case `a` acts always, with factor 1, and cannot be factored | take it out here, or take out `always` in the case",
    ),
    (
        "a factor twice, no purpose, no modulus",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[case.a]
[combination.x]
factors = { a = [1, 2, 1.0] }
purpose = "servise"
modulus = { steel-s35 = 0.5, steel-s355 = 0 }"#,
        r#"7:24 the factor 1 stands twice in this list | take one out
8:11 no purpose is called `servise` | `service` comes nearest
9:13 no material is called `steel-s35` | `steel-s235` and `steel-s355` come nearest
9:43 the factor on a modulus must be more than 0"#,
    ),
    (
        "too many combinations, ten to the fifth times two",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[case.a]
[case.b]
[case.c]
[case.d]
[case.e]
[case.f]
[combination.x]
factors = { a = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9], b = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9], c = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9], d = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9], e = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9], f = [0, 1] }"#,
        "11:14 the lists multiply out to 200,000 combinations; a job may have 100,000 | shorten the lists, or spread them over several jobs",
    ),
    (
        "a circle of materials",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[material.a]
like = "b"
[material.b]
like = "c"
[material.c]
like = "a""#,
        "6:8 `like` leads in a circle: a → b → c → a | let one of them start from a library entry, or give its values",
    ),
    (
        "no modulus",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[material.a]
expansion = "12e-6 /K""#,
        r#"5:1 the material `a` needs a `modulus` | add `modulus = "205 GPa"`, or `like` with the id of a material to start from"#,
    ),
    (
        "laws come later, and no modulus is missed beside one",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[material.a]
modulus-at = []
thermal-strain = []"#,
        r#"6:1 `modulus-at` (laws of temperature) is not read by this version | take it out; nothing else stands for it yet
7:1 `thermal-strain` (laws of temperature) is not read by this version | take it out; nothing else stands for it yet"#,
    ),
    (
        "four faults of a material",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]

[material.a]
like = "steel-s35"
yield-by-thickness = [["40 mm", "3 MPa"], ["16 mm", "2 MPa"]]
yield = "3 MPa"
range = ["30 degC", "20 degC"]"#,
        r#"6:8 no material is called `steel-s35` | `steel-s235` and `steel-s355` come nearest
7:1 `yield` and `yield-by-thickness` stand in one material | keep one of them
7:43 the thicknesses of this table do not rise | each row holds up to its thickness; write the thinnest first
9:9 the range of temperature is empty | write the lower reading first"#,
    ),
    (
        "no density where weight needs it",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "a" }]
runs = "up"
load = [{ weight = 1 }, { temperature-change = "+3 K" }]
[material.a]
modulus = "200 GPa""#,
        r#"5:20 weight needs the density of `a`, which is not given | add `density` in `[material.a]`, or `mass` to the segment
5:48 a temperature needs the expansion of `a`, which is not given | add `expansion` in `[material.a]`"#,
    ),
    (
        "thicker than the last row",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "a" }]
limit = { tension = "0.6 yield" }
[material.a]
modulus = "200 GPa"
yield-by-thickness = [["16 mm", "3 MPa"]]"#,
        "4:21 `a` gives no yield strength for a thickness of 20 mm, that of `rod`; its last row is 16 mm | write the limit as a stress, or a material of the job's own with a row for it",
    ),
    (
        "names of combinations that addresses need",
        r#"[member.tie]
start = "fixed"
segment = [{ name = "rod", length = "2 m", section = { round = "20 mm" }, material = "steel-s355" }]
[combination.max]
[combination."a:b"]
"#,
        r#"4:14 the name `max` is taken: addresses of results need it | write another name
5:14 the name `a:b` holds `:`, which addresses need | write a name without `.` `:` `/` `=` and without blanks at its ends"#,
    ),
];
