//! What assemblies cost: a combination of a small one, and a tower of stiff floors from its text to
//! its checked result.
//!
//! `cargo bench --bench assemblies`

use divan::Bencher;
use divan::counter::ItemsCount;
use lengthwise::{check_bytes, job, model::Model, result::JobStatus, solve};
use std::fmt::Write;

fn main() {
    divan::main();
}

/// A stiff plate on `hangers` hangers that carry tension alone, held in plan: 6 unknowns for the
/// plate and 3 for each of four joints below it, 18 in all.
fn platform(hangers: usize) -> Model {
    let mut text = String::from(
        "[case.dead]\nweight = 1.0\n[case.live]\n[case.side]\n\n\
         [combination.service]\nfactors = { dead = 1.0, live = [0.0, 0.5, 1.0], side = [0.0, 0.3, 0.6, 0.9, 1.2] }\n\n",
    );
    let mut points = String::new();
    let mut members = String::new();
    let (mut corners, mut tops) = (Vec::new(), Vec::new());
    for index in 0..hangers {
        let (x, y) = (1.7 * (index / 2) as f64, 2.3 * (index % 2) as f64);
        let _ = writeln!(points, "c{index} = [\"{x} m\", \"{y} m\", \"0 m\"]");
        let _ = writeln!(points, "t{index} = [\"{x} m\", \"{y} m\", \"4.6 m\"]");
        let _ = writeln!(
            members,
            "[member.H{index}]\nbetween = [\"t{index}\", \"c{index}\"]\ncarries = \"tension\"\n\
             segment = [{{ length = \"rest\", section = {{ round = \"{} mm\" }}, material = \"steel-s355\" }}]",
            20 + index
        );
        corners.push(format!("\"c{index}\""));
        tops.push(format!("\"t{index}\""));
    }
    // Four free joints below the plate, each on three struts: 12 more unknowns.
    for joint in 0..4 {
        let _ = writeln!(
            points,
            "j{joint} = [\"{} m\", \"0.7 m\", \"-1.1 m\"]",
            0.4 + joint as f64
        );
        for corner in 0..3 {
            let _ = writeln!(
                members,
                "[member.S{joint}-{corner}]\nbetween = [\"j{joint}\", \"c{}\"]\n\
                 segment = [{{ length = \"rest\", section = {{ round = \"30 mm\" }}, material = \"steel-s355\" }}]",
                corner + usize::from(joint > 1)
            );
        }
    }
    let _ = write!(
        text,
        "[point]\n{points}\n[body.plate]\npoints = [{}]\nmass = \"2.4 t\"\nat = [\"1.6 m\", \"1.1 m\", \"0.1 m\"]\n\n{members}\n\
         [[hold]]\npoints = [{}]\n[[hold]]\npoint = \"c0\"\nalong = [\"x\", \"y\"]\n[[hold]]\npoint = \"c2\"\nalong = [\"y\"]\n\n\
         [[load]]\nbody = \"plate\"\nforce = {{ live = [\"0 kN\", \"0 kN\", \"-30 kN\"] }}\n\
         [[load]]\npoint = \"j3\"\nforce = {{ side = [\"1 kN\", \"0.5 kN\", \"-6 kN\"] }}\n",
        corners.join(", "),
        tops.join(", "),
    );
    job::read(&text).expect("a sound job")
}

/// A tower of stiff floors in a plane, each hung from the one above it by `hangers` hangers.
fn tower(floors: usize, hangers: usize) -> String {
    let mut text = String::from(
        "[case.dead]\nweight = 1.0\n\n[combination.standing]\nfactors = { dead = 1.0 }\n\n[point]\n",
    );
    for floor in 0..=floors {
        for hanger in 0..hangers {
            let (x, y) = (0.5 * hanger as f64, -3.2 * floor as f64);
            let _ = writeln!(text, "f{floor}-{hanger} = [\"{x} m\", \"{y:.1} m\"]");
        }
    }
    for floor in 1..=floors {
        let points: Vec<String> = (0..hangers)
            .map(|hanger| format!("\"f{floor}-{hanger}\""))
            .collect();
        let _ = writeln!(
            text,
            "[body.floor{floor}]\npoints = [{}]\nmass = \"0.9 t\"\nat = [\"{} m\", \"{:.1} m\"]",
            points.join(", "),
            0.26 * hangers as f64,
            -3.2 * floor as f64
        );
    }
    for floor in 1..=floors {
        for hanger in 0..hangers {
            let _ = writeln!(
                text,
                "[member.h{floor}-{hanger}]\nbetween = [\"f{}-{hanger}\", \"f{floor}-{hanger}\"]\n\
                 segment = [{{ length = \"rest\", section = {{ round = \"{} mm\" }}, material = \"steel-s355\" }}]",
                floor - 1,
                24 + hanger % 5
            );
        }
    }
    let first: Vec<String> = (0..hangers)
        .map(|hanger| format!("\"f0-{hanger}\""))
        .collect();
    let sides: Vec<String> = (1..=floors)
        .map(|floor| format!("\"f{floor}-0\""))
        .collect();
    let _ = write!(
        text,
        "[default.limit]\ntension = \"0.9 ultimate\"\n\n[[hold]]\npoints = [{}]\n[[hold]]\npoints = [{}]\nalong = [\"x\"]\n",
        first.join(", "),
        sides.join(", ")
    );
    text
}

/// Solving alone, of a job that is read and whose factors are there.
#[divan::bench]
fn combination_of_18_unknowns_solved(bencher: Bencher) {
    let model = platform(6);
    let mut prepared = solve::PreparedAssembly::of(&model).expect("an assembly");
    let combinations = &model.combinations;
    bencher
        .counter(ItemsCount::new(combinations.len()))
        .bench_local(|| {
            for combination in combinations {
                divan::black_box(prepared.solve(combination).expect("solved"));
            }
        });
}

#[divan::bench(args = [(100, 100), (1_000, 100), (25_000, 4)], sample_count = 3, sample_size = 1)]
fn tower_checked(bencher: Bencher, (floors, hangers): (usize, usize)) {
    let text = tower(floors, hangers);
    bencher
        .counter(ItemsCount::new(floors * hangers))
        .bench_local(|| {
            let run = check_bytes("tower.toml", text.as_bytes());
            assert!(
                run.result.status != JobStatus::Error,
                "{}",
                run.drawn_errors
            );
            run
        });
}
