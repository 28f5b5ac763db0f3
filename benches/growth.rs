//! How the cost of one member grows with its segments and with its stops.
//!
//! `cargo bench --bench growth`

use divan::Bencher;
use lengthwise::{job, model::Model, proof, solve};
use std::fmt::Write;

fn main() {
    divan::main();
}

/// A rail of `segments` lengths held at both ends, warmed, every tenth length on a spring.
fn rail(segments: usize) -> Model {
    let mut text = String::from(
        "[material.rail]\nmodulus = \"207 GPa\"\nexpansion = \"11.5e-6 /K\"\n\n[member.rail]\nstart = \"fixed\"\nend = \"fixed\"\n\n",
    );
    for index in 0..segments {
        let area = 70 + index % 7;
        let _ = writeln!(
            text,
            "[[member.rail.segment]]\nlength = \"0.6 m\"\nsection = {{ area = \"{area} cm2\" }}\nmaterial = \"rail\"\n"
        );
        if index % 10 == 5 {
            let _ = writeln!(
                text,
                "[[member.rail.support]]\nat = \"{}.end\"\nspring = \"15 kN/mm\"\n",
                index + 1
            );
        }
    }
    text += "[[member.rail.load]]\ntemperature-change = \"+31 K\"\n";
    job::read(&text).expect("a sound job")
}

/// A bar of `stops` lengths, each with an elastic or rigid stop of its own clearance, pushed.
fn stopped(stops: usize) -> Model {
    let mut text = String::from(
        "[material.bar]\nmodulus = \"205 GPa\"\n\n[member.bar]\nstart = \"fixed\"\n\n",
    );
    for index in 0..stops {
        let clearance = 0.4 + 0.001 * ((index * 7919) % 1000) as f64;
        let _ = writeln!(
            text,
            "[[member.bar.segment]]\nlength = \"0.5 m\"\nsection = {{ area = \"12 cm2\" }}\nmaterial = \"bar\"\n\n\
             [[member.bar.support]]\nname = \"s{index}\"\nat = \"{}.end\"\nstop = \"{clearance:.3} mm\"\nstiffness = \"{} kN/mm\"\n\n\
             [[member.bar.load]]\nat = \"{}.end\"\nforce = \"{} kN\"\n",
            index + 1,
            2 + index % 5,
            index + 1,
            1 + index % 3,
        );
    }
    job::read(&text).expect("a sound job")
}

#[divan::bench(args = [1_000, 10_000, 100_000])]
fn segments_solved(bencher: Bencher, segments: usize) {
    let model = rail(segments);
    bencher.bench(|| {
        solve::member(&model, &model.members[0], &model.combinations[0]).map(|s| s.member.force_max)
    });
}

#[divan::bench(args = [1_000, 10_000, 100_000])]
fn segments_solved_and_proven(bencher: Bencher, segments: usize) {
    let model = rail(segments);
    bencher.bench(|| {
        let solution =
            solve::member(&model, &model.members[0], &model.combinations[0]).expect("solved");
        let residuals = proof::member(
            &model,
            &model.members[0],
            &model.combinations[0],
            &solution.member,
        );
        assert!(residuals.largest() < 1e-9);
        residuals
    });
}

#[divan::bench(args = [100, 1_000, 10_000])]
fn stops_solved(bencher: Bencher, stops: usize) {
    let model = stopped(stops);
    bencher.bench(|| {
        solve::member(&model, &model.members[0], &model.combinations[0]).map(|s| s.member.force_max)
    });
}
