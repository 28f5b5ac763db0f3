//! The example jobs against calculations by hand.
//!
//! Each is worked here as on a calculation pad, from the figures of its job file and without the
//! library: N, mm and MPa, or kip, in and ksi where the job is in US units. Material values are
//! those of the standards that the catalogue names.

#![allow(clippy::unwrap_used)] // of what the tests themselves read

use approx::assert_relative_eq;
use lengthwise::result::JobResult;
use std::f64::consts::PI;
use std::fs;
use std::path::Path;

const MM: f64 = 1e-3;
const KN: f64 = 1e3;
const MPA: f64 = 1e6;
/// Exact: the international inch, and the pound-force of 1959 times a thousand.
const IN: f64 = 0.0254;
const KIP: f64 = 4_448.221_615_260_5;
const KSI: f64 = KIP / (IN * IN);
/// Standard gravity, in N per g.
const G: f64 = 9.80665e-3;
/// Weight of steel of 7850 kg/m3, N/mm3.
const STEEL: f64 = 7.85e-3 * G;

fn round(diameter: f64) -> f64 {
    PI / 4.0 * diameter * diameter
}

fn tube(outer: f64, wall: f64) -> f64 {
    PI * (outer - wall) * wall
}

/// Tensile stress area of a metric thread, ISO 898-1 9.1.6.1.
fn metric(diameter: f64, pitch: f64) -> f64 {
    round(diameter - 0.9382 * pitch)
}

fn job(name: &str) -> JobResult {
    let path = Path::new(env!("CARGO_MANIFEST_DIR"))
        .join("examples")
        .join(name)
        .with_extension("toml");
    let text = fs::read_to_string(path).unwrap();
    lengthwise::check_text(name, &text)
}

/// The demand of one check in one combination equals what the hand found. ISO 898-1 prints the
/// factor of the thread to four digits; everything else is exact.
#[track_caller]
fn holds(job: &JobResult, combination: &str, check: &str, on: &str, by_hand: f64) {
    let found = job
        .combinations
        .iter()
        .find(|known| &*known.name == combination);
    let found = found.unwrap_or_else(|| panic!("no combination {combination}"));
    let row = found
        .checks
        .iter()
        .find(|row| &*row.check == check && &*row.on == on);
    let row = row.unwrap_or_else(|| panic!("no {check} on {on} in {combination}"));
    assert_relative_eq!(row.demand, by_hand, max_relative = 2e-5);
}

#[test]
fn awning_tie() {
    let job = job("awning-tie");
    // ASME B1.1: tensile stress area of a Unified thread.
    let thread = round(0.75 - 0.9743 / 10.0);
    holds(&job, "all", "tension", "tie.thread", 5.85 / thread * KSI);
    let (rod, end) = (137.75, 3.5);
    let stretch =
        5.85 / 29_000.0 * (rod / round(0.75) + end / thread) + 6.5e-6 * 48.0 * (rod + end);
    holds(&job, "all", "elongation", "tie", stretch * IN);
}

#[test]
fn gangway_hanger() {
    let job = job("gangway-hanger");
    let (shank, thread) = (round(36.0), metric(36.0, 4.0));
    let below = STEEL * thread * 168.0;
    let force = 1.35 * (71.6e3 + below) + 1.5 * 93.4e3;
    holds(
        &job,
        "strength",
        "tension",
        "G3.lower thread",
        force / thread * MPA,
    );
    // Since the day it was levelled: live load and 27 K, the weights having been there.
    let live = 93.4e3 / 210e3 * (4385.0 / shank + 168.0 / thread);
    let warm = 12e-6 * 27.0 * (4385.0 + 168.0);
    holds(
        &job,
        "service/live=1",
        "displacement",
        "G3.end",
        (live + warm) * MM,
    );
}

#[test]
fn hall_column_long_term() {
    let job = job("hall-column");
    // Bottom tier at the base: all floors, quasi-permanent, and all weight above.
    let tiers = [
        (4650.0, 196_600.0, 12.0 * round(25.0)),
        (4180.0, 140_500.0, 8.0 * round(25.0)),
        (3865.0, 93_700.0, 8.0 * round(20.0)),
    ];
    let weight: f64 = tiers
        .iter()
        .map(|(length, concrete, bars)| length * (24e-6 * concrete + STEEL * bars))
        .sum();
    let force = (486.0 + 447.0 + 402.0 + 131.0 + 166.0 + 74.0 + 0.6 * (318.0 + 292.0 + 97.0)) * 1e3
        + weight;
    let (_, concrete, bars) = tiers[0];
    // Both strains are one: force = Es As e + Ec Ac (e - shrinkage), all shortening positive.
    let (ec, es) = (0.38 * 35e3, 200e3);
    let strain = (force + ec * concrete * 240e-6) / (ec * concrete + es * bars);
    let row = &job.combinations[1].members[0].segments[0];
    assert_eq!(&*job.combinations[1].name, "long-term");
    assert_relative_eq!(
        row.layers[1].stress_min.unwrap().value,
        -es * strain * MPA,
        max_relative = 1e-5
    );
    assert_relative_eq!(
        row.layers[0].stress_min.unwrap().value,
        -ec * (strain - 240e-6) * MPA,
        max_relative = 1e-5
    );
}

#[test]
fn approach_deck_joint() {
    let job = job("approach-deck-joint");
    let deck = |length: f64, girders: f64, change: f64| {
        let (steel, concrete) = (210e3 * girders, 34e3 * 2.07e6);
        length * (steel * 12e-6 * change + concrete * (10e-6 * change - 70e-6)) / (steel + concrete)
    };
    let gap = |change: f64, brake: f64| {
        56.0 - deck(57_900.0, 113_800.0, change) - deck(38_250.0, 96_400.0, change) + brake / 172.0
    };
    holds(
        &job,
        "hot/braking=-1",
        "gap",
        "viaduct.joint",
        gap(32.0, -344.0) * MM,
    );
    holds(
        &job,
        "cold/braking=1",
        "gap",
        "viaduct.joint",
        gap(-30.0, 344.0) * MM,
    );
}

#[test]
fn fire_main() {
    let job = job("fire-main");
    let (area, length) = (tube(8.625, 0.322), 94.0 * 12.0 + 7.25);
    let give = length / (29_000.0 * area) + 1.0 / 880.0 + 1.0 / 415.0;
    let hot = 6.5e-6 * (117.0 - 61.0) * length / give;
    holds(
        &job,
        "sun/pressure=0",
        "compression",
        "run-45.pipe",
        hot / area * KSI,
    );
    holds(
        &job,
        "sun/pressure=0",
        "reaction",
        "run-45.block 5",
        -hot * KIP,
    );
    let cold = (6.5e-6 * (61.0 - 14.0) + 25e-6) * length / give;
    holds(&job, "ice/pressure=1", "force", "run-45", cold * KIP);
}

#[test]
fn bunker_line() {
    let job = job("bunker-line");
    let area = tube(114.3, 3.05);
    let (long, short) = (19_420.0, 5_275.0);
    // The bellows takes the contraction less the stretch of the pipe; pressed apart by 9.8 kN, the
    // pipe shortens by that as well.
    let pipe = (long + short) / (200e3 * area);
    let contraction = 14.3e-6 * 177.0 * (long + short);
    let force = (contraction + 9800.0 * pipe) / (1.0 / 86.0 + pipe);
    holds(
        &job,
        "cooled-down/pressure=1",
        "elongation",
        "A2-A3.bellows",
        force / 86.0 * MM,
    );
    holds(
        &job,
        "cooled-down/pressure=1",
        "reaction",
        "A2-A3.A3",
        force - 9800.0,
    );
}

#[test]
fn test_pile() {
    let job = job("test-pile");
    let (upper, lower) = (210e3 * tube(508.0, 12.5), 210e3 * tube(508.0, 16.0));
    let friction = |line: [f64; 2], length: f64| 0.5 * (line[0] + line[1]) * length;
    // Shortening of a length that gives up a trapezoid of friction: P L less the moment of what is
    // given up about the length's lower end.
    let short = |force: f64, line: [f64; 2], length: f64, ea: f64| {
        (force * length - (2.0 * line[0] + line[1]) / 6.0 * length * length) / ea
    };
    let head = |force: f64, sand: [f64; 2], gravel: [f64; 2]| {
        let below = force - friction(sand, 9300.0);
        let toe = below - friction(gravel, 5750.0);
        let shaft = force * 12_850.0 / upper
            + short(force, sand, 9300.0, upper)
            + short(below, gravel, 5750.0, lower);
        (shaft + toe / 265e3, toe)
    };
    let (working, _) = head(1580e3, [11.0, 58.0], [83.0, 97.0]);
    holds(&job, "working", "displacement", "P12.start", working * MM);
    let (proof, toe) = head(2370e3, [14.0, 76.0], [118.0, 139.0]);
    holds(&job, "proof", "displacement", "P12.start", proof * MM);
    holds(&job, "proof", "reaction", "P12.toe", -toe);
}

#[test]
fn press_tie_rod() {
    let job = job("press-tie-rod");
    let thread = metric(100.0, 6.0);
    let rod = 3265.0 / (207e3 * round(96.0)) + 88.0 / (207e3 * thread);
    let frame = 1.0 / 3.9e6;
    let shrunk = 2.86 / (rod + frame);
    holds(&job, "idle", "reaction", "rod-NE.upright", shrunk);
    // The load is shared by stiffness as long as the frame bears; its growth stretches both.
    let share = frame / (rod + frame);
    let force = shrunk + 850e3 * share + 0.35 / (rod + frame);
    holds(
        &job,
        "work/warm-frame=1",
        "tension",
        "rod-NE.upper thread",
        force / thread * MPA,
    );
    holds(
        &job,
        "test",
        "reaction",
        "rod-NE.upright",
        shrunk - 1020e3 * (1.0 - share),
    );
    holds(&job, "test", "bears", "rod-NE.upright", 1.0);
}

#[test]
fn linkspan_jack() {
    let job = job("linkspan-jack");
    // Section of the stool with its fillets.
    let stool = 2.0 * 256.0 * 17.3 + (260.0 - 2.0 * 17.3) * 10.5 + (4.0 - PI) * 12.7 * 12.7;
    let weights = [
        STEEL * stool * 1145.0,
        205.0 * G * 388.0,
        STEEL * 180.0 * 180.0 * 90.0,
    ];
    let column =
        1.0 / 2.15e6 + 1145.0 / (210e3 * stool) + 1.0 / 790e3 + 90.0 / (210e3 * 180.0 * 180.0);
    // What the column sinks under its own weight, each part carrying half of itself and what is above.
    let all: f64 = weights.iter().sum();
    let sunk = all / 2.15e6
        + (all - weights[0] / 2.0) * 1145.0 / (210e3 * stool)
        + (weights[1] / 2.0 + weights[2]) / 790e3
        + weights[2] / 2.0 * 90.0 / (210e3 * 180.0 * 180.0);
    let girder = 1.0 / 41.5e3;
    let lift = (20.5 - sunk - 8.0) / (column + girder);
    holds(&job, "lift/stroke=1", "reaction", "jack-2.girder", -lift);
    holds(
        &job,
        "lift/stroke=1",
        "displacement",
        "jack-2.end",
        (8.0 + lift * girder) * MM,
    );
    holds(
        &job,
        "packed",
        "gap",
        "jack-2.girder",
        (8.0 - (0.25 * 20.5 - sunk)) * MM,
    );
}

#[test]
fn leading_light_mast() {
    let job = job("leading-light-mast");
    // The lower tube is straight-sided in area, since its wall keeps its thickness.
    let (foot, head) = (tube(11.5, 0.25), tube(9.25, 0.25));
    // The upper one by Simpson, exact for a product of two straight lines.
    let upper = (head + 4.0 * tube(7.8125, 0.21875) + tube(6.375, 0.1875)) / 6.0 * 387.0;
    let weight = 490.0 / 1728.0 / 1000.0 * upper;
    let above = 1.2 * (1.34 + weight) + 0.052 / 12.0 * 387.0 + 7.4 + 5.1 + 1.6 * (14.2 + 11.7);
    holds(
        &job,
        "strength",
        "compression",
        "mast.lower",
        above / head * KSI,
    );
    let base =
        above + 1.2 * 490.0 / 1728.0 / 1000.0 * 0.5 * (foot + head) * 501.0 + 0.052 / 12.0 * 501.0;
    let member = &job.combinations.last().unwrap().members[0];
    assert_relative_eq!(
        member.supports[0].reaction.unwrap().value,
        base * KIP,
        max_relative = 1e-5
    );
}

#[test]
fn slope_shores() {
    let job = job("slope-shores");
    for (shore, degrees, earth) in [("S1", 33.0_f64, 96e3), ("S2", 41.0, 79e3)] {
        let slope = degrees.to_radians().sin();
        let timber = 420e-6 * G * 200.0 * 200.0 * 5940.0;
        let force = 1.35 * (earth + slope * (timber + 2100.0)) + 1.5 * 47e3;
        holds(
            &job,
            "strength/surcharge=1.5",
            "compression",
            &format!("{shore}.timber"),
            force / 40e3 * MPA,
        );
    }
}

#[test]
fn counterweight_ropes() {
    let job = job("counterweight-ropes");
    let (fall, rocker) = (8.28 * G * 21_750.0, 160.0 * G * 1350.0);
    let force = (148.0 + 31.0 + 26.0) * KN + fall + rocker;
    holds(&job, "strength/snatch=1", "force", "ropes", force);
    let end = (148.0 + 31.0) * KN;
    let drop =
        (end + rocker + fall / 2.0) * 21_750.0 / (103e3 * 878.0) + (end + rocker / 2.0) / 145e3;
    holds(
        &job,
        "service/unbalance=1",
        "displacement",
        "ropes.end",
        drop * MM,
    );
}

#[test]
fn hung_mullion() {
    let job = job("hung-mullion");
    // Set 2.5 mm up; warmed by 51 K at the head and 38 K at the spigot, so 44.5 K in the mean.
    let growth = 23e-6 * 44.5 * 7775.0;
    // The weight's stretch is under 0.9 mm; the gap is the rest.
    let night = 23e-6 * -32.0 * 7775.0;
    let gap = |name: &str| {
        let known = job
            .combinations
            .iter()
            .find(|known| &*known.name == name)
            .unwrap();
        known.members[0]
            .supports
            .iter()
            .find_map(|support| support.gap)
            .unwrap()
            .value
            / MM
    };
    let stretch = 16.0 + 2.5 - growth - gap("service/floor=0");
    assert!((0.4..0.9).contains(&stretch), "{stretch}");
    assert_relative_eq!(
        gap("night/floor=1"),
        16.0 + 2.5 + 4.5 - night - stretch,
        max_relative = 1e-9
    );
}

#[test]
fn ramp_stay() {
    let job = job("ramp-stay-as-found");
    // Two eyes and the flat hang at 52 degrees; the weakest place is the top of the lower eye.
    let below = STEEL * 140.0 * 20.0 * 420.0 * 52.0_f64.to_radians().sin();
    let force = 1.35 * (118e3 + 227e3 + below);
    holds(
        &job,
        "strength",
        "tension",
        "stay-2.lower eye",
        force / 1380.0 * MPA,
    );
    holds(
        &job,
        "strength",
        "tension",
        "stay-1.lower eye",
        force / ((140.0 - 33.0) * 20.0) * MPA,
    );
}
