//! Forces and movements that a line of statics or of springs gives.

use super::drawn::{X, Y, Z, all_close, bar, close, drawn};

/// Two bars side by side from a wall to one point share a force by their stiffness.
#[test]
fn bars_in_parallel_share_by_stiffness() {
    let text = bar("a", "1 m", "2 kN/mm", "") + &bar("b", "1 m", "6 kN/mm", "");
    let solution = drawn(1, &text)
        .point("wall", [0.0; 3])
        .point("tip", X)
        .tie("a", "wall", "tip")
        .tie("b", "wall", "tip")
        .fixed("wall", &[X])
        .force("tip", [8000.0, 0.0, 0.0])
        .solve();
    // u = 8 kN / 8 kN/mm
    close(solution.displacement("tip")[0], 1e-3, 1e-3);
    close(solution.force("a"), 2000.0, 8000.0);
    close(solution.force("b"), 6000.0, 8000.0);
    close(solution.reaction("wall")[0], -8000.0, 8000.0);
    assert_eq!(solution.members[0].1.totals.applied.value, 0.0);
    close(solution.totals.applied[0].value, 8000.0, 8000.0);
    close(solution.totals.reactions[0].value, -8000.0, 8000.0);
}

/// A bolt drawn up by δ in its sleeve: N = k₁ k₂ / (k₁ + k₂) δ, and nothing moves both ends at once.
#[test]
fn a_bolt_made_short_presses_its_sleeve() {
    let text = bar(
        "bolt",
        "200 mm",
        "300 kN/mm",
        "load = [{ misfit = \"-0.4 mm\" }]",
    ) + &bar("sleeve", "200 mm", "100 kN/mm", "");
    let drawing = drawn(1, &text)
        .point("head", [0.0; 3])
        .point("nut", [0.2, 0.0, 0.0])
        .tie("bolt", "head", "nut")
        .tie("sleeve", "head", "nut");
    let solution = drawing.solve();
    close(solution.force("bolt"), 30_000.0, 30_000.0);
    close(solution.force("sleeve"), -30_000.0, 30_000.0);
    // 0.3 mm shorter, and placed such that both ends move alike.
    all_close(&solution.displacement("head"), &[0.15e-3], 1e-3);
    all_close(&solution.displacement("nut"), &[-0.15e-3], 1e-3);
    assert_eq!(
        drawing.free(),
        ["points `head` and `nut` together can move along x"]
    );
}

/// A stiff lever on a pin and a hanger, 1 m and 3 m from the pin to hanger and load.
#[test]
fn a_lever_on_a_hanger() {
    let text = bar("hanger", "2 m", "10 kN/mm", "");
    let solution = drawn(2, &text)
        .point("pin", [0.0; 3])
        .point("eye", X)
        .point("tip", [3.0, 0.0, 0.0])
        .point("top", [1.0, 2.0, 0.0])
        .body("lever", &["pin", "eye", "tip"])
        .tie("hanger", "top", "eye")
        .fixed("pin", &[X, Y])
        .fixed("top", &[X, Y])
        .force("tip", [0.0, -5000.0, 0.0])
        .solve();
    close(solution.force("hanger"), 15_000.0, 15_000.0);
    all_close(&solution.displacement("eye"), &[0.0, -1.5e-3], 1.5e-3);
    all_close(&solution.displacement("tip"), &[0.0, -4.5e-3], 4.5e-3);
    all_close(&solution.reaction("pin"), &[0.0, -10_000.0], 15_000.0);
    all_close(&solution.reaction("top"), &[0.0, 15_000.0], 15_000.0);
    close(
        solution.bodies[0].rotation.spatial()[2].value,
        -1.5e-3,
        1.5e-3,
    );
    assert!(solution.free.is_empty());
}

/// A stiff platform on four equal hangers at (±1, ±2): N = W (1 / 4 + x xᵢ / Σx² + y yᵢ / Σy²).
#[test]
fn a_platform_on_four_hangers_shares_by_position() {
    let corners = [(1.0, 2.0), (-1.0, 2.0), (-1.0, -2.0), (1.0, -2.0)];
    let text: String = (0..4)
        .map(|i| bar(&format!("H{i}"), "3 m", "5 kN/mm", ""))
        .collect();
    let mut drawing = drawn(3, &text);
    for (i, (x, y)) in corners.into_iter().enumerate() {
        drawing = drawing
            .point(&format!("top{i}"), [x, y, 3.0])
            .point(&format!("foot{i}"), [x, y, 0.0]);
    }
    drawing = drawing.body("deck", &["foot0", "foot1", "foot2", "foot3"]);
    for i in 0..4 {
        let (top, foot) = (format!("top{i}"), format!("foot{i}"));
        drawing = drawing
            .tie(&format!("H{i}"), &top, &foot)
            .fixed(&top, &[X, Y, Z]);
    }
    let drawing = drawing.body_force([0.0, 0.0, -1e5], [0.3, -0.4, 0.1]);
    let solution = drawing.solve();
    for (i, (x, y)) in corners.into_iter().enumerate() {
        let expected = 1e5 * (0.25 + 0.3 * x / 4.0 - 0.4 * y / 16.0);
        close(solution.force(&format!("H{i}")), expected, 1e5);
    }
    // Turned about x by Σ: the moment −W y about x over k Σ y².
    let rotation = solution.bodies[0]
        .rotation
        .spatial()
        .map(|angle| angle.value);
    all_close(
        &rotation,
        &[0.4e5 / (5e6 * 16.0), 0.3e5 / (5e6 * 4.0), 0.0],
        0.01,
    );
    assert_eq!(
        drawing.free(),
        [
            "body `deck` can move along x",
            "body `deck` can move along y",
            "body `deck` can turn about an axis along z through (0 mm, 0 mm, 0 mm)",
        ]
    );
}

/// Two equal bars at 45° under a weight: N = W / √2, u = N / k · √2.
#[test]
fn two_bars_at_45_degrees() {
    let text = bar("a", "1.4142135623730951 m", "10 kN/mm", "")
        + &bar("b", "1.4142135623730951 m", "10 kN/mm", "");
    let solution = drawn(2, &text)
        .point("left", [-1.0, 1.0, 0.0])
        .point("right", [1.0, 1.0, 0.0])
        .point("lug", [0.0; 3])
        .tie("a", "left", "lug")
        .tie("b", "lug", "right")
        .fixed("left", &[X, Y])
        .fixed("right", &[X, Y])
        .force("lug", [0.0, -20_000.0, 0.0])
        .solve();
    let force = 20_000.0 / std::f64::consts::SQRT_2;
    close(solution.force("a"), force, force);
    close(solution.force("b"), force, force);
    all_close(&solution.displacement("lug"), &[0.0, -2e-3], 2e-3);
    all_close(&solution.reaction("left"), &[-1e4, 1e4], 2e4);
}

/// A steel bar at 3 : 4 with its weight: along it as a line load, across it to both ends.
#[test]
fn the_weight_of_an_inclined_bar_goes_to_its_ends() {
    let text = "[member.strut]\nruns = \"level\"\nsegment = [\
        { length = \"4 m\", section = { area = \"10 cm2\" }, material = \"steel-s355\" },\
        { length = \"1 m\", section = { area = \"30 cm2\" }, material = \"steel-s355\" }]\n\
        load = [{ weight = 1.0 }]\n";
    let drawing = drawn(2, text)
        .point("foot", [0.0; 3])
        .point("head", [4.0, 3.0, 0.0])
        .tie("strut", "foot", "head")
        .fixed("foot", &[X, Y])
        .fixed("head", &[X]);
    let density = drawing.model.materials[0]
        .density
        .expect("steel has one")
        .value;
    let solution = drawing.solve();
    let g = 9.80665;
    let (lower, upper) = (density * g * 10e-4 * 4.0, density * g * 30e-4);
    let weight = lower + upper;
    // Of the part across the axis each end gets the lever's share; the head cannot give way along
    // x alone, so N at the head balances its own vertical load: N sin + share = 0.
    let (sine, cosine) = (0.6, 0.8);
    let at_head = cosine * cosine * (lower * 2.0 + upper * 4.5) / 5.0;
    let head_force = -at_head / sine;
    let strut = &solution.members[0].1;
    close(strut.segments[1].force_end.value, head_force, weight * 2.0);
    close(
        strut.segments[0].force_start.value,
        head_force - weight * sine,
        weight * 2.0,
    );
    close(solution.reaction("foot")[1], weight, weight);
    all_close(&[solution.totals.applied[1].value], &[-weight], weight);
    close(strut.totals.applied.value, -weight * sine, weight);
}

/// A body carried by a hinge at a point of another: a Gerber beam.
#[test]
fn bodies_that_share_a_point_are_hinged() {
    let text = bar("post", "1 m", "1000 kN/mm", "");
    let solution = drawn(2, &text)
        .point("a", [0.0; 3])
        .point("b", [2.0, 0.0, 0.0])
        .point("hinge", [3.0, 0.0, 0.0])
        .point("c", [7.0, 0.0, 0.0])
        .point("load", [5.0, 0.0, 0.0])
        .point("ground", [2.0, -1.0, 0.0])
        .body("first", &["a", "b", "hinge"])
        .body("second", &["hinge", "load", "c"])
        .tie("post", "ground", "b")
        .fixed("ground", &[X, Y])
        .fixed("a", &[X, Y])
        .fixed("c", &[Y])
        .force("load", [0.0, -8000.0, 0.0])
        .solve();
    // Half of 8 kN at c, half at the hinge; about a: post 2 = 4 kN 3.
    close(solution.reaction("c")[1], 4000.0, 8000.0);
    close(solution.force("post"), -6000.0, 8000.0);
    close(solution.reaction("a")[1], -2000.0, 8000.0);
    // b sinks by 6 mm / 1000, the hinge by 1.5 times that.
    close(solution.displacement("hinge")[1], -9e-6, 1e-5);
    assert!(solution.undecided.is_empty());
}

/// A held point that moves takes the bar's end with it; a force on it goes into the hold.
#[test]
fn a_movement_of_a_hold_strains_what_hangs_on_it() {
    let text = bar("a", "1 m", "4 kN/mm", "");
    let solution = drawn(1, &text)
        .point("left", [0.0; 3])
        .point("right", X)
        .tie("a", "left", "right")
        .fixed("left", &[X])
        .force("right", [700.0, 0.0, 0.0])
        .fixed("right", &[X])
        .movement([2e-3, 0.0, 0.0])
        .solve();
    close(solution.force("a"), 8000.0, 8000.0);
    close(solution.reaction("right")[0], 7300.0, 8000.0);
}

/// Loads inside a member: N changes along it, and the points have the rest.
#[test]
fn loads_inside_a_member_are_condensed_exactly() {
    let text = "[member.a]\nsegment = [\
        { name = \"p\", length = \"1 m\", stiffness = \"2 kN/mm\" },\
        { name = \"q\", length = \"1 m\", stiffness = \"2 kN/mm\" }]\n\
        load = [{ at = \"p.end\", force = \"6 kN\" }, { at = \"end\", force = \"1 kN\" }]\n";
    let solution = drawn(1, text)
        .point("left", [0.0; 3])
        .point("right", [2.0, 0.0, 0.0])
        .tie("a", "left", "right")
        .fixed("left", &[X])
        .fixed("right", &[X])
        .solve();
    let a = &solution.members[0].1;
    close(a.segments[0].force_start.value, 3000.0, 6000.0);
    close(a.segments[1].force_start.value, -3000.0, 6000.0);
    close(a.stations[1].displacement.value, 1.5e-3, 1.5e-3);
    all_close(&solution.reaction("left"), &[-3000.0], 6000.0);
    all_close(&solution.reaction("right"), &[-4000.0], 6000.0);
    close(a.totals.applied.value, 7000.0, 7000.0);
    close(a.totals.reactions.value, -7000.0, 7000.0);
    close(solution.totals.applied[0].value, 7000.0, 7000.0);
}

/// A body keeps the distance of its points: a bar between two of them that wants to be shorter
/// pulls alone.
#[test]
fn a_bar_within_one_body_strains_itself() {
    let text = bar("tie", "5 m", "2 kN/mm", "load = [{ misfit = \"-3 mm\" }]");
    let solution = drawn(2, &text)
        .point("a", [0.0; 3])
        .point("b", [3.0, 4.0, 0.0])
        .body("plate", &["a", "b"])
        .tie("tie", "a", "b")
        .fixed("a", &[X, Y])
        .fixed("b", &[X])
        .solve();
    close(solution.force("tie"), 6000.0, 6000.0);
    all_close(&solution.reaction("a"), &[0.0, 0.0], 1.0);
}

/// Three rigid feet under a stiff beam: nothing decides what each takes; together they take all.
#[test]
fn three_rigid_feet_are_undecided() {
    let text = bar("unused", "1 m", "1 kN/mm", "");
    let solution = drawn(2, &text)
        .point("a", [0.0; 3])
        .point("b", X)
        .point("c", [2.0, 0.0, 0.0])
        .point("away", [0.0, 5.0, 0.0])
        .point("wall", [1.0, 5.0, 0.0])
        .body("beam", &["a", "b", "c"])
        .tie("unused", "away", "wall")
        .fixed("away", &[X, Y])
        .fixed("wall", &[X, Y])
        .fixed("a", &[X, Y])
        .fixed("b", &[Y])
        .fixed("c", &[Y])
        .force("b", [500.0, -9000.0, 0.0])
        .solve();
    let names = |row: &usize| solution.holds[*row].name.to_string();
    let undecided: Vec<String> = solution.undecided.iter().map(names).collect();
    assert_eq!(undecided, ["a hold", "b hold", "c hold"]);
    close(solution.totals.reactions[1].value, 9000.0, 9000.0);
    close(solution.reaction("a")[0], -500.0, 500.0);
}
