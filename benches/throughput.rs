//! Small jobs by the thousand, against the time that the `toml` crate alone takes to parse them
//! into owned tables.
//!
//! `cargo bench --bench throughput`

use divan::Bencher;

fn main() {
    divan::main();
}

/// A job of about 1.5 kB with six combinations; each one's numbers are its own.
fn job(index: usize) -> String {
    let (length, force) = (1800 + index % 700, 20 + index % 37);
    format!(
        r#"[job]
title = "Pontoon hanger {index}"
reference = "NH-{index:04} rev A"
prepared-by = "K. Brandvik"
note = "Pontoon 2, north row; loads from the deck sheet NL-07, temperatures from the harbour log"
units = "SI"
datum = "10 degC"

[case.dead]
weight = 1.0
[case.live]
[case.warm]                      # the log's warmest day over the datum
temperature-change = "+28 K"

[combination.service]
purpose = "service"
factors = {{ dead = 1.0, live = [0.0, 1.0], warm = [0.0, 1.0] }}
[combination.strength]
purpose = "strength"
factors = {{ dead = 1.35, live = 1.5, warm = [0.0, 1.5] }}

[member.hanger]
start = "fixed"
runs = "down"

[[member.hanger.segment]]
name = "upper thread"
length = "180 mm"
section = {{ thread = "M27" }}
material = "steel-s355"

[[member.hanger.segment]]
name = "shank"
length = "{length} mm"
section = {{ round = "27 mm" }}
material = "steel-s355"

[[member.hanger.segment]]
name = "lower thread"
length = "160 mm"
section = {{ thread = "M27" }}
material = "steel-s355"

# The deck's share of this hanger, from sheet NL-07.
[[member.hanger.load]]
name = "deck"
at = "end"
force = {{ dead = "{force} kN", live = "31 kN" }}

[[member.hanger.support]]
name = "seat"
at = "shank.end"
stop = "9 mm"
side = "end"

# Held so that the deck's joint does not open beyond its seal.
[[member.hanger.limit]]
tension = "yield / 1.1"
source = "design basis NB-01, section 4.2"

[[member.hanger.limit]]
elongation = "12 mm"
source = "joint schedule NJ-03"
displacement = [{{ at = "shank.end", limit = "8 mm" }}]
"#
    )
}

const JOBS: usize = 2_000;

fn jobs() -> Vec<String> {
    (0..JOBS).map(job).collect()
}

#[divan::bench]
fn parsed_by_toml_alone(bencher: Bencher) {
    let jobs = jobs();
    bencher.bench(|| {
        let parsed: usize = jobs
            .iter()
            .map(|job| job.parse::<toml::Table>().expect("sound").len())
            .sum();
        assert_eq!(parsed, 4 * JOBS);
        parsed
    });
}

#[divan::bench]
fn read_into_models(bencher: Bencher) {
    let jobs = jobs();
    bencher.bench(|| {
        let members: usize = jobs
            .iter()
            .map(|job| lengthwise::job::read(job).expect("sound").members.len())
            .sum();
        assert_eq!(members, JOBS);
        members
    });
}

#[divan::bench]
fn read_solved_proven_and_checked(bencher: Bencher) {
    let jobs = jobs();
    bencher.bench(|| {
        let combinations: usize = jobs
            .iter()
            .map(|job| lengthwise::check_text("job.toml", job).combinations.len())
            .sum();
        assert_eq!(combinations, 6 * JOBS);
        combinations
    });
}
