//! What is free to move: harmless motions are set to zero and named, pushed ones are errors of their
//! combination that name who can move how.

use crate::common::{Values, checked, solved};
use approx::assert_abs_diff_eq;
use lengthwise::result::{JobResult, JobStatus};

const HEAD: &str = "[material.m]\nmodulus = \"200 GPa\"\nsource = \"round numbers\"\n";
const BAR: &str =
    "segment = [{ length = \"rest\", section = { area = \"100 mm2\" }, material = \"m\" }]";

fn job(text: &str) -> String {
    format!("{}{HEAD}", text.replace("BAR", BAR))
}

fn noted(text: &str, words: &[&str]) -> JobResult {
    let result = solved("free.toml", &job(text));
    let mut notes = result
        .notes
        .iter()
        .map(|n| format!("{}: {}", n.about, n.text));
    let found = notes.any(|note| words.iter().all(|word| note.contains(word)));
    assert!(found, "{words:?} not in {:#?}", result.notes);
    result
}

/// The only error of a job, which must have a place, name these words, and leave no combination.
fn pushed(text: &str, words: &[&str]) {
    let job = job(text);
    let result = checked("pushed.toml", &job);
    assert_eq!(result.status, JobStatus::Error, "{job}");
    let [error] = result.errors.as_slice() else {
        panic!("one error expected: {:#?}\n{job}", result.errors);
    };
    assert!(error.line.is_some() && error.column.is_some(), "{error:?}");
    for word in words {
        assert!(
            error.message.contains(word),
            "{word} not in `{}`\n{job}",
            error.message
        );
    }
    assert!(result.combinations.is_empty());
}

fn pendulum(force: &str) -> String {
    format!(
        r#"
        [point]
        top = ["0 m", "2 m"]
        bob = ["0 m", "0 m"]
        [member.rod]
        between = ["top", "bob"]
        BAR
        [[hold]]
        point = "top"
        [[load]]
        point = "bob"
        force = {force}
        "#
    )
}

#[test]
fn a_rod_that_hangs_may_swing_and_may_not_be_pushed() {
    let result = noted(&pendulum(r#"["0 kN", "-10 kN"]"#), &["`bob`", "along x"]);
    let values = Values::of(&result);
    assert_abs_diff_eq!(values.get("bob.displacement.y"), -1e-3, epsilon = 1e-14);
    assert_eq!(values.get("bob.displacement.x"), 0.0);
    pushed(&pendulum(r#"["1 N", "-10 kN"]"#), &["`bob`", "along x"]);
}

/// A deck on two hangers, guided along its plane, its load on the line between them or beside it.
fn deck(y: &str) -> String {
    format!(
        r#"
        [point]
        a = ["0 m", "0 m", "0 m"]
        b = ["4 m", "0 m", "0 m"]
        c = ["2 m", "3 m", "0 m"]
        ta = ["0 m", "0 m", "2 m"]
        tb = ["4 m", "0 m", "2 m"]
        [body.deck]
        points = ["c", "a", "b"]
        at = ["2 m", "{y}", "0 m"]
        [member.A]
        between = ["ta", "a"]
        BAR
        [member.B]
        between = ["tb", "b"]
        BAR
        [[hold]]
        points = ["ta", "tb"]
        [[hold]]
        point = "a"
        along = ["x", "y"]
        [[hold]]
        point = "b"
        along = ["y"]
        [[load]]
        body = "deck"
        force = ["0 kN", "0 kN", "-20 kN"]
        "#
    )
}

#[test]
fn a_deck_on_two_hangers_turns_about_their_line() {
    let line = ["`deck`", "turn", "`a`", "`b`"];
    let result = noted(&deck("0 m"), &line);
    // 10 kN on 2 m stretch both hangers by 1 mm; the squares of the movements are least where c stays.
    let values = Values::of(&result);
    for (point, expected) in [("a", -1e-3), ("b", -1e-3), ("c", 0.0)] {
        let moved = values.get(&format!("{point}.displacement.z"));
        assert_abs_diff_eq!(moved, expected, epsilon = 1e-12);
    }
    pushed(&deck("1 mm"), &line);
}

/// A harmless motion is set so that the squares of the displacements of points are least: the deck
/// settles on one side, and turns no further than that asks for.
#[test]
fn a_free_turn_makes_the_movements_least() {
    let text = r#"
        [point]
        a = ["0 m", "0 m"]
        b = ["3 m", "0 m"]
        top = ["0 m", "1 m"]
        [body.beam]
        points = ["a", "b"]
        [member.rod]
        between = ["top", "a"]
        BAR
        [[hold]]
        point = "top"
        [[hold]]
        point = "a"
        along = ["x"]
        [[load]]
        point = "a"
        force = ["0 kN", "-20 kN"]
        "#;
    let result = noted(text, &["`beam`", "turn", "`a`"]);
    let values = Values::of(&result);
    assert_abs_diff_eq!(values.get("a.displacement.y"), -1e-3, epsilon = 1e-12);
    assert_abs_diff_eq!(values.get("b.displacement.y"), 0.0, epsilon = 1e-12);
    assert_abs_diff_eq!(values.get("beam.rotation"), 1e-3 / 3.0, epsilon = 1e-12);
}

/// A body of two points in space takes a moment across their line, none about it.
fn spreader(moment: &str) -> String {
    let mut text = format!(
        r#"
        [[load]]
        body = "beam"
        moment = {moment}
        [body.beam]
        points = ["a", "b"]
        [[hold]]
        points = ["ta", "tb"]
        [[hold]]
        point = "a"
        along = ["x", "y"]
        [[hold]]
        point = "b"
        along = ["y"]
        "#
    );
    text += "[point]\na = [\"0 m\", \"0 m\", \"0 m\"]\nb = [\"2 m\", \"0 m\", \"0 m\"]\n";
    text += "ta = [\"0 m\", \"0 m\", \"1 m\"]\ntb = [\"2 m\", \"0 m\", \"1 m\"]\n";
    text += "[member.A]\nbetween = [\"ta\", \"a\"]\nBAR\n";
    text + "[member.B]\nbetween = [\"tb\", \"b\"]\nBAR\n"
}

#[test]
fn points_in_a_line_take_a_moment_across_it_but_none_about_it() {
    let across = spreader(r#"["0 kN m", "4 kN m", "0 kN m"]"#);
    let values = Values::of(&solved("spreader.toml", &job(&across)));
    // A moment about +y lifts a (x = 0) and lowers b: 4 kN m over 2 m.
    assert_abs_diff_eq!(values.get("A.force_min"), -2e3, epsilon = 1e-7);
    assert_abs_diff_eq!(values.get("B.force_max"), 2e3, epsilon = 1e-7);
    // 2 kN on 20 kN/mm is 0.1 mm at each end: 0.2 mm over 2 m. The spin stays 0.
    assert_abs_diff_eq!(values.get("beam.rotation.y"), 1e-4, epsilon = 1e-13);
    assert_eq!(values.get("beam.rotation.x"), 0.0);
    let about = spreader(r#"["1 N m", "0 kN m", "0 kN m"]"#);
    pushed(&about, &["`beam`", "turn"]);
}

fn single(moment: &str) -> String {
    format!(
        r#"
        [point]
        p = ["0 m", "0 m"]
        top = ["0 m", "1 m"]
        [body.bob]
        points = ["p"]
        mass = "100 kg"
        at = {moment}
        [member.rod]
        between = ["top", "p"]
        BAR
        [[hold]]
        point = "top"
        [[hold]]
        point = "p"
        along = ["x"]
        [case.dead]
        weight = 1.0
        "#
    )
}

#[test]
fn a_body_of_one_point_takes_no_moment() {
    let text = single(r#"["0 m", "-0.3 m"]"#);
    let result = solved(
        "bob.toml",
        &job(&text).replace("source", "density = \"0 kg/m3\"\nsource"),
    );
    let values = Values::of(&result);
    assert_abs_diff_eq!(values.get("rod.force_max"), 980.665, epsilon = 1e-9);
    assert_eq!(values.get("bob.rotation"), 0.0);

    let beside = single(r#"["0.1 m", "-0.3 m"]"#);
    let text = job(&beside).replace("source", "density = \"0 kg/m3\"\nsource");
    let result = checked("bob.toml", &text);
    assert_eq!(result.status, JobStatus::Error);
    let [error] = result.errors.as_slice() else {
        panic!("{:#?}", result.errors);
    };
    assert!(
        error.message.contains("`bob`") && error.message.contains("turn"),
        "{error:?}"
    );
}

/// A square of four bars is a mechanism in its own plane; a brace makes it none.
#[test]
fn a_square_of_bars_is_a_mechanism() {
    let square = |brace: &str| {
        format!(
            r#"
            [point]
            a = ["0 m", "0 m"]
            b = ["1 m", "0 m"]
            c = ["1 m", "1 m"]
            d = ["0 m", "1 m"]
            [member.left]
            between = ["a", "d"]
            BAR
            [member.right]
            between = ["b", "c"]
            BAR
            [member.top]
            between = ["d", "c"]
            BAR
            {brace}
            [[hold]]
            points = ["a", "b"]
            [[load]]
            point = "d"
            force = ["10 kN", "0 kN"]
            "#
        )
    };
    pushed(&square(""), &["`c`", "`d`", "together"]);
    let braced = square("[member.brace]\nbetween = [\"a\", \"c\"]\nBAR");
    let values = Values::of(&solved("braced.toml", &job(&braced)));
    assert_abs_diff_eq!(
        values.get("brace.force_max"),
        10e3 * 2f64.sqrt(),
        epsilon = 1e-7
    );
    // A tie in place of the brace holds the one way and leaves a mechanism the other.
    let tie = |force: &str| {
        let tie = "[member.tie]\nbetween = [\"a\", \"c\"]\ncarries = \"tension\"\nBAR";
        square(tie).replace("\"10 kN\"", force)
    };
    let values = Values::of(&solved("tie.toml", &job(&tie("\"10 kN\""))));
    assert_abs_diff_eq!(
        values.get("tie.force_max"),
        10e3 * 2f64.sqrt(),
        epsilon = 1e-7
    );
    pushed(&tie("\"-10 kN\""), &["`c`", "`d`", "together"]);
}

/// A loss that leaves a mechanism is an error of that combination alone; the others are kept.
#[test]
fn a_loss_that_leaves_a_mechanism_is_an_error_of_that_combination_alone() {
    let text = r#"
        [case.dead]
        [combination.service]
        factors = { dead = 1.0 }
        [combination.lost]
        factors = { dead = 1.0 }
        lose-each = ["rod", "spare-1", "spare-2"]
        [point]
        a = ["0 m"]
        b = ["1 m"]
        c = ["2 m"]
        [member.rod]
        between = ["a", "b"]
        BAR
        [member.spare-1]
        between = ["b", "c"]
        BAR
        [member.spare-2]
        between = ["b", "c"]
        BAR
        [[hold]]
        point = "a"
        [[load]]
        case = "dead"
        point = "c"
        force = ["20 kN"]
        "#;
    let result = checked("lost.toml", &job(text));
    assert_eq!(result.status, JobStatus::Error);
    let [error] = result.errors.as_slice() else {
        panic!("{:#?}", result.errors);
    };
    assert_eq!(error.combination.as_deref(), Some("lost/without=rod"));
    assert!(error.line.is_some());
    assert!(
        error.message.contains('b') && error.message.contains('c'),
        "{error:?}"
    );
    let names: Vec<&str> = result.combinations.iter().map(|c| &*c.name).collect();
    assert_eq!(
        names,
        ["service", "lost/without=spare-1", "lost/without=spare-2"]
    );
    let lost = &result.combinations[1];
    assert_eq!(
        lost.without.iter().map(|n| &**n).collect::<Vec<_>>(),
        ["spare-1"]
    );
    let members: Vec<&str> = lost.members.iter().map(|m| &*m.name).collect();
    assert_eq!(members, ["rod", "spare-2"]);
    assert_abs_diff_eq!(lost.members[1].force_max.value, 20e3, epsilon = 1e-7);
}
