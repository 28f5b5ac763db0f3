//! Motions in words, and holds that contradict each other.

use super::drawn::{Drawn, X, Y, Z, bar, drawn};
use crate::solve::SolveError;

/// A beam from (0, 0) to (4, 0) that hangs on its middle.
fn beam() -> Drawn {
    drawn(2, &bar("hanger", "2 m", "10 kN/mm", ""))
        .point("a", [0.0; 3])
        .point("mid", [2.0, 0.0, 0.0])
        .point("b", [4.0, 0.0, 0.0])
        .point("top", [2.0, 2.0, 0.0])
        .body("beam", &["a", "mid", "b"])
        .tie("hanger", "top", "mid")
        .fixed("top", &[X, Y])
}

#[test]
fn a_beam_turns_about_what_it_hangs_on() {
    let pushed = beam()
        .fixed("mid", &[X])
        .force("b", [0.0, -1.0, 0.0])
        .pushed();
    assert_eq!(pushed, "body `beam` can turn about `mid`");
}

#[test]
fn a_beam_moves_along_what_nothing_holds() {
    let pushed = beam().fixed("b", &[Y]).force("b", [1.0, 0.0, 0.0]).pushed();
    assert_eq!(pushed, "body `beam` can move along x");
}

#[test]
fn points_that_members_keep_together_turn_as_one() {
    // A frame of three bars on one pin.
    let bars = [("sill", "4 m"), ("post", "3 m"), ("brace", "5 m")];
    let bars = bars.map(|(name, length)| bar(name, length, "10 kN/mm", ""));
    let pushed = drawn(2, &bars.concat())
        .point("pin", [0.0; 3])
        .point("foot", [4.0, 0.0, 0.0])
        .point("head", [0.0, 3.0, 0.0])
        .tie("sill", "pin", "foot")
        .tie("post", "pin", "head")
        .tie("brace", "foot", "head")
        .fixed("pin", &[X, Y])
        .force("foot", [0.0, -1.0, 0.0])
        .pushed();
    assert_eq!(
        pushed,
        "points `foot` and `head` together can turn about `pin`"
    );
}

#[test]
fn points_that_members_keep_together_turn_about_a_line() {
    // Two tetrahedra on one face, of which two corners are held.
    let corners = [
        ("pin", [0.0; 3]),
        ("foot", [4.0, 0.0, 0.0]),
        ("far", [0.0, 6.0, 0.0]),
        ("apex", [1.0, 1.0, 3.0]),
        ("tip", [-2.0, 3.0, 1.0]),
    ];
    let (mut bars, mut ties) = (String::new(), Vec::new());
    for (index, (to, end)) in corners.iter().enumerate() {
        for (from, start) in &corners[..index] {
            let apart = start
                .iter()
                .zip(end)
                .map(|(a, b): (&f64, &f64)| (b - a).powi(2));
            let length = format!("{} m", apart.sum::<f64>().sqrt());
            let name = format!("{from}-{to}");
            bars += &bar(&name, &length, "10 kN/mm", "");
            ties.push((name, *from, *to));
        }
    }
    let mut frame = drawn(3, &bars);
    for (name, at) in corners {
        frame = frame.point(name, at);
    }
    for (name, from, to) in ties {
        frame = frame.tie(&name, from, to);
    }
    let pushed = frame
        .fixed("pin", &[X, Y, Z])
        .fixed("foot", &[Y, Z])
        .force("apex", [0.0, -1.0, 0.0])
        .pushed();
    assert_eq!(
        pushed,
        "points `far`, `apex` and `tip` together can turn about the line through `pin` and `foot`"
    );
}

#[test]
fn a_moment_turns_a_body_of_one_point() {
    let pushed = drawn(2, &bar("a", "1 m", "1 kN/mm", ""))
        .point("p", [0.0; 3])
        .point("q", X)
        .body("block", &["q"])
        .tie("a", "p", "q")
        .fixed("p", &[X, Y])
        .fixed("q", &[Y])
        .moment([0.0, 0.0, 5.0])
        .pushed();
    assert_eq!(pushed, "body `block` can turn about `q`");
}

#[test]
fn a_body_of_points_in_one_line_turns_about_it() {
    // A line askew to all axes, so that nothing is zero by itself.
    let drawing = |moment: [f64; 3]| {
        drawn(3, &bar("unused", "1 m", "1 kN/mm", ""))
            .point("p", [0.1, 0.2, 0.3])
            .point("q", [0.7, 0.5, 1.1])
            .point("r", [1.3, 0.8, 1.9])
            .point("u", [0.1, 0.2, -0.7])
            .body("deck", &["p", "q", "r"])
            .tie("unused", "u", "p")
            .fixed("u", &[X, Y, Z])
            .fixed("p", &[X, Y])
            .fixed("r", &[X, Y])
            .moment(moment)
    };
    let words = "body `deck` can turn about the line through `p` and `r`";
    assert_eq!(drawing([0.6, 0.3, 0.8]).pushed(), words);
    assert_eq!(drawing([0.0; 3]).free(), [words]);
}

#[test]
fn a_point_swings_across_its_only_bar() {
    let drawing = drawn(3, &bar("rope", "2 m", "1 kN/mm", ""))
        .point("top", [0.0, 0.0, 2.0])
        .point("lug", [0.0; 3])
        .tie("rope", "top", "lug")
        .fixed("top", &[X, Y, Z])
        .force("lug", [0.0, 0.0, -10.0]);
    let words = [
        "point `lug` can move along x",
        "point `lug` can move along y",
    ];
    assert_eq!(drawing.free(), words);
    assert_eq!(drawing.force("lug", [0.0, 1.0, 0.0]).pushed(), words[1]);
}

#[test]
fn two_bodies_that_move_as_one_are_named_together() {
    let pushed = drawn(2, &bar("a", "1 m", "1 kN/mm", ""))
        .point("p", [0.0; 3])
        .point("q", X)
        .point("r", [0.0, 1.0, 0.0])
        .point("s", [1.0, 1.0, 0.0])
        .body("left", &["p", "r"])
        .body("right", &["q", "s"])
        .tie("a", "p", "q")
        .fixed("p", &[Y])
        .fixed("q", &[Y])
        .fixed("r", &[X])
        .fixed("s", &[X])
        .force("p", [1.0, 0.0, 0.0])
        .try_solve();
    // Each turns about its own head: not one motion of both.
    let errors = pushed.expect_err("nothing holds p and q along x");
    let [SolveError::Unstable { motion }] = &errors[..] else {
        panic!("{errors:?}");
    };
    assert_eq!(motion.movers.len(), 2);
    assert_eq!(motion.together, None);
    let pushed = drawn(2, &bar("a", "1 m", "1 kN/mm", ""))
        .point("p", [0.0; 3])
        .point("q", X)
        .tie("a", "p", "q")
        .fixed("p", &[Y])
        .fixed("q", &[Y])
        .force("p", [1.0, 0.0, 0.0])
        .pushed();
    assert_eq!(pushed, "points `p` and `q` together can move along x");
}

#[test]
fn a_centre_without_a_point_is_given_by_its_place() {
    // Held along y at x = 0 and along x at y = 2: it turns about (0, 2).
    let pushed = drawn(2, &bar("a", "1 m", "1 kN/mm", ""))
        .point("p", [0.0; 3])
        .point("q", [3.0, 2.0, 0.0])
        .point("r", [3.0, 3.0, 0.0])
        .body("plate", &["p", "q"])
        .tie("a", "q", "r")
        .fixed("r", &[X])
        .fixed("p", &[Y])
        .fixed("q", &[X])
        .force("p", [5.0, 0.0, 0.0])
        .pushed();
    assert!(
        pushed.contains("body `plate` can turn about (0"),
        "{pushed}"
    );
    assert!(pushed.contains("2000 mm)"), "{pushed}");
}

#[test]
fn holds_that_are_moved_against_each_other_are_named() {
    let errors = drawn(1, &bar("a", "1 m", "1 kN/mm", ""))
        .point("p", [0.0; 3])
        .point("q", X)
        .point("r", [2.0, 0.0, 0.0])
        .body("block", &["p", "q"])
        .tie("a", "q", "r")
        .fixed("r", &[X])
        .fixed("p", &[X])
        .fixed("q", &[X])
        .movement([1e-3, 0.0, 0.0])
        .try_solve()
        .expect_err("a contradiction");
    let [SolveError::HoldsContradict { holds, .. }] = &errors[..] else {
        panic!("{errors:?}");
    };
    let holds: Vec<&str> = holds.iter().map(|name| &**name).collect();
    assert_eq!(holds, ["p hold", "q hold"]);
}
