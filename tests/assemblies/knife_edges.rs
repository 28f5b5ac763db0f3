//! States that touch exactly, share evenly or leave something undecided. Numbers are round, so that
//! the values follow by hand.

use crate::common::{Values, checked, solved};
use approx::assert_abs_diff_eq;
use lengthwise::result::{CombinationResult, HoldResult, JobResult, JobStatus, MemberState};

/// Bars of 20 kN/mm and 1 m: 100 mm2 of 200 GPa.
const HEAD: &str = "[material.m]\nmodulus = \"200 GPa\"\nsource = \"round numbers\"\n";
const BAR: &str =
    "segment = [{ length = \"rest\", section = { area = \"100 mm2\" }, material = \"m\" }]";

fn job(text: &str) -> String {
    format!("{}{HEAD}", text.replace("BAR", BAR))
}

fn only(result: &JobResult) -> &CombinationResult {
    assert_eq!(result.combinations.len(), 1);
    &result.combinations[0]
}

fn hold<'r>(result: &'r JobResult, name: &str) -> &'r HoldResult {
    let mut holds = only(result).holds.iter();
    holds
        .find(|h| &*h.name == name)
        .expect("a hold of this name")
}

fn state(combination: &CombinationResult, name: &str) -> MemberState {
    let mut members = combination.members.iter();
    members
        .find(|m| &*m.name == name)
        .expect("a member of this name")
        .state
}

/// Holds that one of the texts has all these words.
fn says(texts: impl Iterator<Item = String>, words: &[&str]) {
    let texts: Vec<String> = texts.collect();
    let mut all = texts.iter();
    let found = all.any(|text| words.iter().all(|word| text.contains(word)));
    assert!(found, "{words:?} not in {texts:#?}");
}

fn notes(result: &JobResult) -> impl Iterator<Item = String> {
    result
        .notes
        .iter()
        .map(|n| format!("{}: {}", n.about, n.text))
}

fn cautions(result: &JobResult) -> impl Iterator<Item = String> {
    result
        .cautions
        .iter()
        .map(|c| format!("{}: {}", c.about, c.text))
}

/// 20 kN stretch the bar by 1 mm, which is the clearance: the stop does not bear.
#[test]
fn an_exact_touch_does_not_bear() {
    let touching = |clearance: &str| {
        solved(
            "touch.toml",
            &job(&format!(
                r#"
                [point]
                a = ["0 m", "1 m"]
                b = ["0 m", "0 m"]
                [member.bar]
                between = ["a", "b"]
                BAR
                [[hold]]
                point = "a"
                [[hold]]
                name = "guide"
                point = "b"
                along = ["x"]
                [[hold]]
                name = "floor"
                point = "b"
                along = ["-y"]
                stop = "{clearance}"
                [[load]]
                point = "b"
                force = ["0 kN", "-20 kN"]
                "#
            )),
        )
    };
    let exact = touching("1 mm");
    let floor = hold(&exact, "floor");
    assert_eq!(floor.bears, Some(false));
    assert_eq!(floor.gap.map(|g| g.value), Some(0.0));
    let reaction = floor.reaction.as_ref().expect("decided");
    assert!(reaction.iter().all(|r| r.value == 0.0), "{reaction:?}");

    let nearer = touching("0.999 mm");
    assert_eq!(hold(&nearer, "floor").bears, Some(true));
    assert_abs_diff_eq!(
        Values::of(&nearer).get("floor.reaction.y"),
        20.0,
        epsilon = 1e-8
    );
    assert_eq!(hold(&touching("1.001 mm"), "floor").bears, Some(false));
}

/// A tie as long as the way between its points when these have moved: slack by nothing.
#[test]
fn a_tie_that_fits_exactly_is_slack_by_nothing() {
    let result = solved(
        "fits.toml",
        &job(r#"
            [point]
            a = ["0 m"]
            b = ["1 m"]
            [member.bar]
            between = ["a", "b"]
            BAR
            [member.tie]
            between = ["a", "b"]
            carries = "tension"
            BAR
            load = [{ misfit = "0.5 mm" }]
            [[hold]]
            point = "a"
            [[load]]
            point = "b"
            force = ["10 kN"]
            "#),
    );
    let tie = &only(&result).members[1];
    assert_eq!(
        (tie.state, tie.slack_by.map(|l| l.value)),
        (MemberState::Slack, Some(0.0))
    );
    assert_eq!(tie.force_max.value, 0.0);
    assert_abs_diff_eq!(
        only(&result).members[0].force_max.value,
        10e3,
        epsilon = 1e-7
    );
}

/// A square platform on four hangers, its weight in the middle and so on the line of two of them.
fn platform(load: &str) -> String {
    let mut text = String::from(
        r#"
        [combination.intact]
        [combination.loss]
        lose-each = ["A", "B", "C", "D"]
        [body.deck]
        points = ["a", "b", "c", "d"]
        at = ["1 m", "1 m", "0 m"]
        [[hold]]
        points = ["ta", "tb", "tc", "td"]
        [[hold]]
        point = "a"
        along = ["x", "y"]
        [[hold]]
        point = "b"
        along = ["y"]
        [[load]]
        body = "deck"
        "#,
    );
    text += &format!("force = [\"0 kN\", \"0 kN\", \"{load}\"]\n[point]\n");
    let corners = [("a", 0, 0), ("b", 2, 0), ("c", 2, 2), ("d", 0, 2)];
    for (name, x, y) in corners {
        text += &format!("{name} = [\"{x} m\", \"{y} m\", \"0 m\"]\n");
        text += &format!("t{name} = [\"{x} m\", \"{y} m\", \"1 m\"]\n");
    }
    for (name, ..) in corners {
        text += &format!(
            "[member.{}]\nbetween = [\"t{name}\", \"{name}\"]\n",
            name.to_uppercase()
        );
        text += "carries = \"tension\"\nBAR\n";
    }
    job(&text)
}

/// With one hanger lost the two beside it carry half each; the one across carries nothing and
/// touches. The platform could tip the other way: that is a caution, no mechanism.
#[test]
fn a_weight_on_the_line_of_two_hangers_is_on_the_point_of_tipping() {
    let result = solved("platform.toml", &platform("-40 kN"));
    assert_eq!(result.combinations.len(), 5);
    let values = Values::of(&result);
    for name in ["A", "B", "C", "D"] {
        let address = format!("intact:{name}.force_max");
        assert_abs_diff_eq!(values.get(&address), 10e3, epsilon = 1e-6);
    }
    for [lost, across, one, other] in [
        ["A", "C", "B", "D"],
        ["B", "D", "C", "A"],
        ["C", "A", "B", "D"],
        ["D", "B", "C", "A"],
    ] {
        let name = format!("loss/without={lost}");
        let combination = result.combinations.iter().find(|c| *c.name == *name);
        let combination = combination.expect("each loss is a combination");
        for beside in [one, other] {
            assert_eq!(state(combination, beside), MemberState::Taut);
            let address = format!("{name}:{beside}.force_max");
            assert_abs_diff_eq!(values.get(&address), 20e3, epsilon = 1e-6);
        }
        assert_eq!(state(combination, across), MemberState::Slack, "{name}");
        assert_eq!(values.get(&format!("{name}:{across}.force_max")), 0.0);
        assert_abs_diff_eq!(
            values.get(&format!("{name}:{across}.slack_by")),
            0.0,
            epsilon = 1e-12
        );
        // Both carry 20 kN and stretch by 1 mm; the one across is as it was, the lost corner 2 mm down.
        let corner = |c: &str| values.get(&format!("{name}:{}.displacement.z", c.to_lowercase()));
        assert_abs_diff_eq!(corner(one), -1e-3, epsilon = 1e-11);
        assert_abs_diff_eq!(corner(across), 0.0, epsilon = 1e-11);
        assert_abs_diff_eq!(corner(lost), -2e-3, epsilon = 1e-11);
    }
    says(cautions(&result), &["deck", "on the point of tipping"]);
}

/// Off that line on the side of the lost hanger nothing holds the platform; on the other side the
/// hanger across is taut.
#[test]
fn a_weight_beside_the_line_tips_or_is_held() {
    let beside = |x: &str| {
        let text = platform("-40 kN").replace("at = [\"1 m\"", &format!("at = [\"{x}\""));
        checked("platform.toml", &text)
    };
    let tips = beside("0.999 m");
    let without = |result: &JobResult, name: &str| {
        let mut combinations = result.combinations.iter();
        combinations.any(|c| *c.name == *name)
    };
    // West of the middle: losing A or D (west) tips, losing B or C does not.
    assert_eq!(tips.status, JobStatus::Error);
    let names: Vec<&str> = tips
        .errors
        .iter()
        .filter_map(|e| e.combination.as_deref())
        .collect();
    assert_eq!(
        names,
        ["loss/without=A", "loss/without=D"],
        "{:#?}",
        tips.errors
    );
    assert!(without(&tips, "intact") && without(&tips, "loss/without=B"));
    assert!(!without(&tips, "loss/without=A"));
    for error in &tips.errors {
        assert!(
            error.message.contains("`deck` can turn"),
            "{}",
            error.message
        );
    }
    let held = Values::of(&tips).get("loss/without=B:D.force_max");
    // Moments about the line of A and C: 40 kN x 0.001 m / √2 over the arm √2 m.
    assert_abs_diff_eq!(held, 40e3 * 0.001 / 2.0, epsilon = 1e-6);
}

/// Two rigid stops under the ends of a beam that is pushed down in the middle bear half each.
#[test]
fn equal_parts_share_evenly() {
    let result = solved(
        "even.toml",
        &job(r#"
            [point]
            a = ["0 m", "0 m"]
            b = ["2 m", "0 m"]
            [body.beam]
            points = ["a", "b"]
            at = ["1 m", "0 m"]
            [[hold]]
            point = "a"
            along = ["x"]
            [[hold]]
            name = "west"
            point = "a"
            along = ["-y"]
            stop = "1 mm"
            [[hold]]
            name = "east"
            point = "b"
            along = ["-y"]
            stop = "1 mm"
            [[load]]
            body = "beam"
            force = ["0 kN", "-30 kN"]
            [member.by-itself]
            start = "fixed"
            segment = [{ length = "1 m", section = { area = "1 cm2" }, material = "m" }]
            "#),
    );
    for name in ["west", "east"] {
        assert_eq!(hold(&result, name).bears, Some(true));
        let reaction = Values::of(&result).get(&format!("{name}.reaction.y"));
        assert_abs_diff_eq!(reaction, 15e3, epsilon = 1e-7);
    }
    assert_abs_diff_eq!(
        only(&result).bodies[0].displacement[1].value,
        -1e-3,
        epsilon = 1e-14
    );
}

fn beam_on_three(movement: &str, load: &str) -> String {
    job(&format!(
        r#"
        [point]
        a = ["0 m", "0 m"]
        b = ["2 m", "0 m"]
        c = ["6 m", "0 m"]
        top = ["3 m", "2 m"]
        [body.beam]
        points = ["a", "b", "c"]
        at = ["3 m", "0 m"]
        [member.rod]
        between = ["b", "top"]
        BAR
        [[hold]]
        name = "anchor"
        points = ["a", "top"]
        [[hold]]
        name = "prop"
        point = "b"
        along = ["y"]
        [[hold]]
        name = "far"
        point = "c"
        along = ["y"]
        [[load]]
        body = "beam"
        force = ["0 kN", "-30 kN"]
        {load}
        [[load]]
        hold = "prop"
        movement = ["0 mm", "{movement}"]
        "#
    ))
}

/// Three rigid holds of one beam in a line: nothing decides what each takes; the rest stands.
#[test]
fn three_rigid_holds_in_a_line_show_no_reaction_and_ask_for_a_spring() {
    let result = solved("three.toml", &beam_on_three("0 mm", ""));
    for name in ["prop", "far"] {
        assert_eq!(hold(&result, name).reaction, None, "{name}");
    }
    let points = &only(&result).points;
    assert!(points[0].reaction.is_none() && points[1].reaction.is_none());
    assert!(
        points[3].reaction.is_some(),
        "the far end of the rod is decided"
    );
    let totals = only(&result)
        .totals
        .as_ref()
        .expect("an assembly has totals");
    assert_abs_diff_eq!(totals.reactions[1].value, 30e3, epsilon = 1e-6);
    for point in points {
        assert!(
            point.displacement.iter().all(|u| u.value.abs() < 1e-12),
            "{point:?}"
        );
    }
    says(notes(&result), &["prop", "spring"]);
}

/// The same holds moved along the stiff line that they lie on are at peace with each other; off it
/// they contradict.
#[test]
fn movements_of_rigid_holds_that_contradict_are_an_error() {
    let far = "[[load]]\nhold = \"far\"\nmovement = [\"0 mm\", \"-6 mm\"]";
    let result = solved("agree.toml", &beam_on_three("-2 mm", far));
    let turned = only(&result).bodies[0].rotation.spatial()[2].value;
    assert_abs_diff_eq!(turned, -1e-3, epsilon = 1e-14);

    let result = checked("contradict.toml", &beam_on_three("-1 mm", far));
    assert_eq!(result.status, JobStatus::Error);
    assert!(result.combinations.is_empty());
    let errors = result.errors.iter().map(|e| e.message.clone());
    says(errors, &["`prop`"]);
    assert!(result.errors.iter().all(|e| e.line.is_some()));
}
