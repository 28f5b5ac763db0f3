//! Wrong supports, limits and keys of a member, word for word: the lines added to a sound job, and
//! what is said of it.

use super::check;

#[test]
fn each_is_told_at_its_place() {
    check(MEMBERS);
}

const MEMBERS: &[(&str, &str)] = &[
    (
        r#"support = [{ at = "start", spring = "3 kN/mm" }]"#,
        "4:12 two supports stand at `start`, and one is fixed: the other (line 2) never acts | keep one of them; the key `start` or `end` is a support too",
    ),
    (
        r#"support = [{ at = "end", spring = "1 kN/mm" }, { at = "end", spring = "2 kN/mm" }]"#,
        "4:48 two supports without a name stand at `end`, the other in line 4 | give one a `name`, so that reports can tell them apart",
    ),
    (
        r#"support = [{ at = "end", stop = "-1 mm" }]"#,
        r#"4:33 `stop` must be 0 or more | write it as in "2.85 m""#,
    ),
    (
        r#"support = [{ at = "end", spring = 3 }]"#,
        r#"4:35 a force per length is expected here, not a bare number | write it in quotes with its unit, such as "35 kN/mm"; units are N/mm kN/mm N/m kN/m lbf/in kip/in lbf/ft kip/ft"#,
    ),
    (
        r#"support = [{ at = "end", stop = "1 mm", side = "left" }]"#,
        r#"4:48 a stop blocks movement toward the "end" or the "start", not `left` | write one of `end`, `start`"#,
    ),
    (
        r#"support = [{ at = "end", stop = "1 mm", fixed = true }]"#,
        "4:26 a support is of one kind, and here are `fixed` and `stop` | write two supports",
    ),
    (
        r#"support = [{ at = "end" }]"#,
        r#"4:12 a support needs `fixed`, `spring` or `stop` | add `fixed = true`, `spring = "35 kN/mm"` or `stop = "2.5 mm"`"#,
    ),
    (
        r#"support = { at = "end", fixed = true }"#,
        "4:11 `support` is a list of tables, not a table | write `support = [{ … }]`, or a header `[[… .support]]` for each",
    ),
    (
        r#"end = "pinned""#,
        r#"4:7 an end is "fixed" or free, not `pinned` | write "fixed"; leave it out for a free end; springs and stops are a `support`"#,
    ),
    (
        r#"like = "tie""#,
        "4:8 `like` leads in a circle: tie → tie | write the keys of one of these members out",
    ),
    (
        r#"like = "tye""#,
        "4:8 no member is called `tye` | `tie` comes nearest",
    ),
    (
        r#"runs = "north""#,
        r#"4:8 no direction is called `north` | write "up", "down", "level", or an angle above level such as "30 deg""#,
    ),
    (
        r#"runs = "120 deg""#,
        r#"4:8 an angle above level lies between -90 deg and 90 deg | write "up", "down", "level", or an angle above level such as "30 deg""#,
    ),
    (
        "runs = 30",
        r#"4:8 a direction is expected here, not a bare number | write "up", "down", "level", or an angle above level such as "30 deg""#,
    ),
    (
        r#"between = ["a", "b"]"#,
        r#"2:9 the member `tie` lies between points, and so has no `start` | take it out; its points are held by a `hold`
4:12 this job has no points, and so none called `a` | add it to `[point]`, as in `a = ["4.2 m", "3 m"]`
4:17 this job has no points, and so none called `b` | add it to `[point]`, as in `b = ["4.2 m", "3 m"]`"#,
    ),
    (
        r#"carries = "tension""#,
        "4:11 `carries` stands in a member `between` two points | take it out, or write `between`; a joint that parts is a `gap` segment",
    ),
    (
        r#"limit = { tention = "0.6 yield" }"#,
        "4:11 a limit of a member has no key `tention` | `tension` comes nearest",
    ),
    (
        r#"limit = { tension = "0.6 yeld" }"#,
        "4:26 `yeld` is no strength of a material | did you mean `yield`?",
    ),
    (
        r#"limit = { elongation = "length over 500" }"#,
        r#"4:32 `/` and a number are missing after this name | the limit of a movement is a length, as in "6 mm", or a share, as in "length / 500""#,
    ),
    (
        r#"limit = { elongation = ["1 mm", "2 mm"] }"#,
        r#"4:24 a pair of limits holds each sign: the first must be 0 or less, the second 0 or more | write the negative one first, such as `["-2 mm", "5 mm"]`"#,
    ),
    (
        r#"limit = { tension = "0.6 crushing" }"#,
        "4:21 this is a share of the crushing strength of `steel-s355`, which is not given | add `crushing` in `[material.steel-s355]`, or write the limit as a stress",
    ),
    (
        r#"limit = { elongation = "1 mm", in = ["servce"] }"#,
        "4:38 `servce` is no combination nor a purpose | `service` comes nearest",
    ),
    (
        r#"limit = { buckling = "Euler" }"#,
        "4:11 `buckling` (buckling checks) is not read by this version | take it out; nothing else stands for it yet",
    ),
    (
        r#"limit = { reaction = "1 kN" }"#,
        "4:11 `reaction` is a limit of a support or a hold; here is a limit of a member | move it there, or take it out",
    ),
    (
        r#"limit = { displacement = "3 mm" }"#,
        r#"4:26 a limit of a displacement is a table, not a text | write it as in `{ at = "end", limit = "2 mm" }`; it may have `at`, `limit`"#,
    ),
    (
        "limit = { tension = 100 }",
        r#"4:21 a stress is expected here, not a bare number | write it in quotes with its unit, such as "345 MPa"; units are Pa kPa MPa GPa psi ksi Msi bar, or a force per area as in `N/mm2`"#,
    ),
];
