//! Jobs that were damaged: whatever the text, reading ends in a model or in located problems.

use super::good::{SMALL, WHOLE};
use super::good_assembly::BEAM;
use crate::job::{Source, read, render};
use proptest::prelude::*;

/// Bits of text that a damaged job may hold.
const BITS: &[&str] = &[
    "\"",
    "'",
    "[",
    "]",
    "[[",
    "]]",
    "{",
    "}",
    "=",
    ",",
    ".",
    "\n",
    "#",
    "±",
    "−",
    "µ",
    "東",
    "\u{0}",
    "\t",
    "1e400",
    "nan",
    "-1",
    "0",
    "\"0 m\"",
    "\"-3 kN\"",
    "true",
    "like = \"H4\"\n",
    "\"length / 0\"",
    "\"1e308 m\"",
    "[1, 2]",
    "{}",
    "[]",
    "\"start\"",
    "\"shank.end\"",
    "start",
    "segment",
    "gap = \"1 mm\"",
    "layer",
    "1979-05-27",
    "\\u0000",
    "\"\"\"",
    "[member.H4]\n",
    "[point]\n",
    "[[hold]]\n",
    "[[load]]\n",
    "[[watch]]\n",
    "\"rest\"",
    "\"+x\"",
    "[0, 1]",
    "[\"0 m\", \"3 m\"]",
    "[\"0 m\"]",
    "between = [\"left\", \"b\"]\n",
    "carries = \"tension\"\n",
    "runs = \"up\"\n",
    "like = \"alone\"\n",
];

/// What is done to a job: a stretch of it is taken out, and a bit or another stretch put in.
fn damaged(text: &str, cuts: &[(usize, usize, usize)]) -> String {
    let mut text: Vec<char> = text.chars().collect();
    for &(at, length, bit) in cuts {
        let at = at % (text.len() + 1);
        let end = (at + length).min(text.len());
        let put: Vec<char> = match BITS.get(bit) {
            Some(bit) => bit.chars().collect(),
            None => {
                let from = bit * 37 % (text.len() + 1);
                text[from..(from + 24).min(text.len())].to_vec()
            }
        };
        text.splice(at..end, put);
    }
    text.into_iter().collect()
}

/// Reads a text and draws what is said of it: every place must lie in the text, in order.
fn ends_well(text: &str) {
    let Err(problems) = read(text) else {
        return;
    };
    assert!(!problems.is_empty(), "an error that says nothing:\n{text}");
    let mut last = 0;
    for problem in &problems {
        assert!(problem.place.end <= text.len(), "{problem:?}\n{text}");
        assert!(problem.place.start >= last, "out of order\n{text}");
        last = problem.place.start;
        assert!(!problem.message.is_empty());
    }
    let drawn = render::draw_all(&problems, &Source::new("job.toml", text));
    assert!(drawn.starts_with("job.toml, line "));
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(3000))]

    #[test]
    fn damaged_jobs_end_well(
        cuts in prop::collection::vec((0usize..3000, 0usize..12, 0usize..90), 1..5),
        job in prop::sample::select(vec![SMALL, WHOLE, BEAM]),
    ) {
        ends_well(&damaged(job, &cuts));
    }

    #[test]
    fn any_text_ends_well(text in "[ -~\\n\"=\\[\\]{}.±]{0,200}") {
        ends_well(&text);
    }
}

#[test]
fn texts_that_once_were_hard_end_well() {
    for text in [
        "[[[[[[",
        "a.b.c.d = 1",
        "\"\" = 1",
        "[member.\"\"]",
        "[[member]]",
        "[[member.m]]",
        "[member.m.segment]",
        "[[case]]",
        "[point]",
        "[[point]]",
        "[hold]",
        "point.a = [\"1 m\"]\n[member.m]\nbetween = [\"a\", \"a\"]",
        "[body.a]\n[[hold]]\n[[load]]\n[[watch]]",
        "[member.m]\nbetween = [\"a\", \"b\"]\nsegment = []\n[point]\na = [\"0 m\"]\nb = [\"1e-99 m\"]",
        "member.m = { segment = [1, \"x\", {}, []] }",
        "\n\n  [member.m]\r\nsegment = [{ gap = \"1 mm\" }]\r\nload = [{ misfit = \"1 mm\" }]\r\n",
    ] {
        ends_well(text);
    }
    ends_well(&"=\n".repeat(2_000));
    ends_well(&"[".repeat(10_000));
    ends_well(&format!("[member.m]\nlimit = {}", "[".repeat(200)));
}

/// A member of many segments with a load, a limit and a support on each: the cost must grow in line
/// with their number, which a quadratic step would show as minutes.
#[test]
fn many_segments_are_read_in_one_go() {
    let mut text = String::from("[member.m]\nstart = \"fixed\"\n");
    for number in 0..20_000 {
        text.push_str(&format!(
            "[[member.m.segment]]\nname = \"s{number}\"\nlength = \"1 m\"\nsection = {{ area = \"1 cm2\" }}\n\
             material = \"steel-s355\"\nlimit = {{ tension = \"0.6 yield\", elongation = \"1 mm\" }}\n\
             [[member.m.load]]\non = \"s{number}\"\nstrain = 1e-6\n\
             [[member.m.load]]\nat = \"s{number}.end\"\nforce = \"1 kN\"\n\
             [[member.m.support]]\nat = \"{number}.5 m\"\nstop = \"1 mm\"\n"
        ));
    }
    let model = read(&text).unwrap_or_else(|problems| panic!("{:?}", &problems[..1]));
    assert_eq!(model.members[0].stations.len(), 40_001);
    assert_eq!(model.limits.len(), 40_000);
}
