//! Facts of common practice: rules of thumb and customary numbers of the trades, which hold within
//! 8 % here because they are rounded and because trades use different coefficients for one steel.
//! Where a closed form of handbooks is meant rather than a customary number, it is held to 1e-12.

mod common;

use common::{Values, factor, solved};

/// One number out of a job.
fn found(job: &str, address: &str, unit: &str) -> f64 {
    Values::of(&solved("practice.toml", job)).get(address) / factor(unit)
}

/// Within 8 % of a customary number.
#[track_caller]
fn customary(found: f64, customary: f64) {
    assert!(
        (found - customary).abs() <= 0.08 * customary.abs(),
        "{found} is not within 8 % of the customary {customary}"
    );
}

/// The same as a closed form.
#[track_caller]
fn closed_form(found: f64, exact: f64) {
    assert!(
        (found - exact).abs() <= 1e-12 * exact.abs(),
        "{found} is not {exact}"
    );
}

/// A member of a library steel, held at both ends and heated by one degree.
fn rail(area: &str, material: &str, rise: &str) -> String {
    format!(
        r#"
[member.rail]
start = "fixed"
end = "fixed"
segment = [{{ name = "rail", length = "100 ft", section = {{ area = "{area}" }}, material = "{material}" }}]
load = [{{ temperature-change = "{rise}" }}]
"#
    )
}

/// Continuous welded rail: 195 psi for each degree Fahrenheit (track practice).
#[test]
fn restrained_rail_by_degree() {
    let job = rail("13.35 in2", "steel-a36", "+1 degF");
    customary(found(&job, "rail.rail.stress_min", "psi"), -195.0);
}

/// Rail 136RE: about 2.6 kip for each degree Fahrenheit, with its area of 13.35 in2 (from memory).
#[test]
fn restraint_force_of_136re() {
    let job = rail("13.35 in2", "steel-a36", "+1 degF");
    customary(found(&job, "rail.force_min", "kip"), -2.6);
}

/// Rail 60E1: about 18.5 kN for each kelvin, with its area of 76.7 cm2 (from memory).
#[test]
fn restraint_force_of_60e1() {
    let job = rail("76.7 cm2", "steel-s355", "+1 K");
    customary(found(&job, "rail.force_min", "kN"), -18.5);
}

/// 100 m of rail from 10 to 27 degC must be pulled by 19.6 mm (track practice; rail coefficient
/// 1.15e-5 /K).
#[test]
fn rail_pulled_to_its_neutral_temperature() {
    let job = r#"
[job]
datum = "10 degC"
[material.rail]
like = "steel-s355"
expansion = "11.5e-6 /K"
source = "customary coefficient of rail steel"
[member.rail]
start = "fixed"
segment = [{ length = "100 m", section = { area = "76.7 cm2" }, material = "rail" }]
load = [{ temperature = "27 degC" }]
"#;
    customary(found(job, "rail.elongation", "mm"), 19.6);
}

/// The end of a long rail held by ballast moves by F^2 / (2 E A r), where F is the force of full
/// restraint and r the resistance per length (track practice, 1.9): the resistance acts as a line
/// load of known direction over the breathing length F / r.
#[test]
fn breathing_end_of_a_long_rail() {
    // F = 200 GPa x 0.0075 m2 x 1.15e-5 /K x 40 K = 690 kN; r = 10 kN/m; 69 m breathe.
    let job = r#"
[material.rail]
modulus = "200 GPa"
expansion = "11.5e-6 /K"
source = "round numbers"
[member.rail]
start = "fixed"
segment = [{ length = "69 m", section = { area = "75 cm2" }, material = "rail" }]
load = [{ temperature-change = "+40 K" }, { line = "-10 kN/m" }]
"#;
    let exact = 690e3f64.powi(2) / (2.0 * 200e9 * 0.0075 * 10e3);
    closed_form(found(job, "rail.elongation", "m"), exact);
    closed_form(found(job, "rail.force_min", "kN"), -690.0);
}

/// Bare steel of the library that changes its temperature freely.
fn free_steel(length: &str, change: &str) -> f64 {
    let job = format!(
        r#"
[member.frame]
start = "fixed"
segment = [{{ length = "{length}", section = {{ area = "20 in2" }}, material = "steel-a36" }}]
load = [{{ temperature-change = "{change}" }}]
"#
    );
    found(&job, "frame.elongation", "in")
}

/// 1/8 in for each 100 ft and 15 degF (commentary of the code of standard practice for steel
/// buildings, AISC 303 7.12).
#[test]
fn an_eighth_inch_in_a_hundred_feet_by_fifteen_degrees() {
    customary(free_steel("100 ft", "+15 degF"), 0.125);
}

/// The same commentary: a frame of 200 ft plumbed at 100 degF is set 1/2 in long to be right at 70.
#[test]
fn a_frame_of_two_hundred_feet_plumbed_hot() {
    customary(free_steel("200 ft", "-30 degF"), -0.5);
}

/// Old rule for bridge decks: 1-1/4 in for each 100 ft over the whole range, about 160 degF.
#[test]
fn an_inch_and_a_quarter_in_a_hundred_feet() {
    customary(free_steel("100 ft", "+160 degF"), 1.25);
}

/// A state bridge manual: steel of 284 and 427 ft, concrete of 385 and 578 ft, move by 4 and 6 in over
/// 150 and 120 degF with the factor 1.2 (coefficients 6.5e-6 and 6.0e-6 /degF).
#[test]
fn bridge_manual_movements() {
    for (expansion, length, range, movement) in [
        ("6.5e-6 /degF", "284 ft", "+150 degF", 4.0),
        ("6.5e-6 /degF", "427 ft", "+150 degF", 6.0),
        ("6.0e-6 /degF", "385 ft", "+120 degF", 4.0),
        ("6.0e-6 /degF", "578 ft", "+120 degF", 6.0),
    ] {
        let job = format!(
            r#"
[case.range]
temperature-change = "{range}"
[combination.movement]
purpose = "service"
factors = {{ range = 1.2 }}
[material.deck]
modulus = "29_000 ksi"
expansion = "{expansion}"
source = "bridge manual"
[member.deck]
start = "fixed"
segment = [{{ length = "{length}", section = {{ area = "900 in2" }}, material = "deck" }}]
"#
        );
        let moved = found(&job, "movement:deck.elongation", "in");
        customary(moved, movement);
        assert!(
            (moved - movement).abs() < 0.02,
            "the manual's own rounding: {moved}"
        );
    }
}

/// A rod of library steel between ends that hold, made short by `short`.
fn shrunk(length: &str, area: &str, count: u32, material: &str, short: &str) -> String {
    format!(
        r#"
[member.rod]
start = "fixed"
end = "fixed"
segment = [{{ name = "rod", length = "{length}", section = {{ area = "{area}" }}, count = {count}, material = "{material}" }}]
load = [{{ misfit = "-{short}" }}]
"#
    )
}

/// Press tie rods: a strain of 0.0007 is 20 ksi (press maintenance practice).
#[test]
fn press_tie_rod_prestrain() {
    let job = shrunk("100 in", "50 in2", 1, "steel-a36", "0.07 in");
    customary(found(&job, "rod.rod.stress_max", "ksi"), 20.0);
}

/// The same, by its rule for the nut: degrees of rotation = length in inches x threads per inch / 4
/// gives 0.0007. On 133.25 in with 6 threads to the inch it is 200 degrees, 0.0925 in of take-up.
#[test]
fn press_tie_rod_nut_rotation() {
    let take_up = 133.25 * 6.0 / 4.0 / 360.0 / 6.0;
    let job = shrunk(
        "133.25 in",
        "50 in2",
        1,
        "steel-a36",
        &format!("{take_up} in"),
    );
    customary(found(&job, "rod.rod.stress_max", "ksi"), 20.0);
}

/// Clamp force of four tie bars of 56.75 in2, stretched 0.060 in on 180 in: 2,270,000 lb (moulding
/// machine practice, 30,000 ksi).
#[test]
fn clamp_force_of_four_tie_bars() {
    let job = format!(
        "[material.bar]\nmodulus = \"30e6 psi\"\nsource = \"practice\"\n{}",
        shrunk("180 in", "56.75 in2", 4, "bar", "0.060 in")
    );
    let force = found(&job, "rod.force_max", "lbf");
    customary(force, 2_270_000.0);
    closed_form(force, 2_270_000.0);
}

/// A pile under a load at its head, carried by its shaft alone.
fn pile(friction: &str) -> f64 {
    let job = format!(
        r#"
[material.pile]
modulus = "30 GPa"
source = "round number"
[member.toe-bearing]
start = "fixed"
runs = "up"
segment = [{{ length = "12 m", section = {{ area = "0.16 m2" }}, material = "pile" }}]
load = [{{ at = "end", force = "-960 kN" }}]
[member.shaft]
like = "toe-bearing"
load = [{{ at = "end", force = "-960 kN" }}, {{ line = {friction} }}]
"#
    );
    found(&job, "shaft.elongation / toe-bearing.elongation", "1")
}

/// Share of P L / A E by which a pile shortens (pile test practice): 1/2 with constant shaft friction,
/// 2/3 where friction grows in line with depth, 1 on its toe.
#[test]
fn pile_shortening_by_load_transfer() {
    closed_form(pile(r#""80 kN/m""#), 1.0 / 2.0);
    closed_form(pile(r#"["160 kN/m", "0 kN/m"]"#), 2.0 / 3.0);
}

/// A rod's own weight stretches it half as much as the same weight hung on its end (W L / 2 A E).
#[test]
fn own_weight_counts_half() {
    // 8000 kg/m3 x 9.80665 m/s2 x 0.0005 m2 x 40 m
    let job = r#"
[material.rod]
modulus = "200 GPa"
density = "8000 kg/m3"
source = "round numbers"
[member.own]
start = "fixed"
runs = "down"
segment = [{ length = "40 m", section = { area = "5 cm2" }, material = "rod" }]
load = [{ weight = 1.0 }]
[member.hung]
like = "own"
load = [{ at = "end", down = "1569.064 N" }]
"#;
    closed_form(found(job, "own.elongation / hung.elongation", "1"), 0.5);
}

/// All-thread rod from 1/2 to 1-1/2 in stretches 26 to 38 % more than its nominal area says: the
/// tensile stress area of coarse threads is 0.72 to 0.80 of it (hanger practice).
#[test]
fn all_thread_rod_on_its_tensile_area() {
    for (thread, more) in [("1/2-13 UNC", 1.38), ("1-1/2-6 UNC", 1.26)] {
        let job = format!(
            r#"
[member.threaded]
start = "fixed"
segment = [{{ length = "8 ft", section = {{ thread = "{thread}" }}, material = "steel-a36" }}]
load = [{{ at = "end", force = "4 kip" }}]
[member.nominal]
like = "threaded"
segment = [{{ length = "8 ft", section = {{ thread = "{thread}", stiffness-area = "nominal" }}, material = "steel-a36" }}]
"#
        );
        let ratio = found(&job, "threaded.elongation / nominal.elongation", "1");
        assert!((ratio - more).abs() < 0.01, "{thread}: {ratio} for {more}");
    }
}

/// The force of a heated part between elastic supports with a clearance,
/// F = (alpha dT L - gap) / (L / EA + 1 / k1 + 1 / k2) (piping and machine practice).
#[test]
fn heated_part_between_elastic_supports() {
    let job = r#"
[material.pipe]
modulus = "200 GPa"
expansion = "12e-6 /K"
source = "round numbers"
[member.pipe]
segment = [{ length = "15 m", section = { area = "40 cm2" }, material = "pipe" }]
support = [
  { at = "start", spring = "60 kN/mm" },
  { at = "end", stop = "3 mm", stiffness = "25 kN/mm" },
]
load = [{ temperature-change = "+80 K" }]
"#;
    let flexibility = 15.0 / (200e9 * 0.004) + 1.0 / 60e6 + 1.0 / 25e6;
    let exact = (12e-6 * 80.0 * 15.0 - 0.003) / flexibility;
    closed_form(found(job, "pipe.force_min", "N"), -exact);
}

/// Stainless steel cooled from 293 to 77 K with its coefficient at room temperature: 0.37 %, a quarter
/// to a third more than it really shrinks (cryogenic practice, 17.2e-6 /K from memory).
#[test]
fn cold_stainless_with_a_constant_coefficient() {
    let job = r#"
[job]
datum = "293 K"
[material.cold]
modulus = "195 GPa"
expansion = "17.2e-6 /K"
source = "from memory"
[member.line]
start = "fixed"
segment = [{ length = "100 m", section = { area = "10 cm2" }, material = "cold" }]
load = [{ temperature = "77 K" }]
"#;
    customary(found(job, "line.elongation", "m") / 100.0, -0.0037);
}
