//! `docs/job-file.md`: every key, both ways, every snippet, every refusal.

use super::page::{Page, code};
use lengthwise::catalogue::section::Thread;
use lengthwise::quantity::{
    self, Angle, Area, Density, Expansion, Force, ForcePerLength, Length, Mass, MassPerLength,
    Measure, Moment, Ratio, Stress,
};
use lengthwise::result::{ErrorEntry, JobStatus};
use lengthwise::{catalogue, check_bytes, check_text, job};
use std::collections::{BTreeMap, BTreeSet};

fn page() -> Page {
    Page::read("docs/job-file.md")
}

type Keys = BTreeMap<String, BTreeSet<String>>;

/// The keys that the page lists, by the table that they stand in.
fn listed(page: &Page) -> Keys {
    let mut keys = Keys::new();
    let mut add = |table: String, key: &str| {
        assert!(
            keys.entry(table.clone())
                .or_default()
                .insert(key.to_owned()),
            "`{key}` stands twice in {table}"
        );
    };
    for table in page.tables("keys") {
        for row in &table.rows {
            add(table.name.to_owned(), code(row[0])[0]);
        }
    }
    for matrix in page.tables("matrix") {
        for row in &matrix.rows {
            for (head, cell) in matrix.heads.iter().zip(row) {
                if *cell == "yes" {
                    let table = format!("{} {}", matrix.name, code(head)[0]);
                    add(table.trim().to_owned(), code(row[0])[0]);
                }
            }
        }
    }
    keys
}

#[test]
fn the_page_lists_the_keys_that_the_program_knows() {
    let known: Keys = job::keys()
        .into_iter()
        .map(|(table, keys)| {
            let keys = keys.iter().map(|key| (*key).to_owned());
            (table.to_owned(), keys.collect())
        })
        .collect();
    let listed = listed(&page());
    for (table, keys) in &known {
        assert_eq!(listed.get(table), Some(keys), "{table}");
    }
    assert_eq!(
        listed.keys().collect::<Vec<_>>(),
        known.keys().collect::<Vec<_>>()
    );
}

/// Jobs with a hole `@` in a table of each kind. Where a key is looked at beside another alone, a
/// second one has that other.
const HOLES: &[(&str, &str)] = &[
    ("job file", "@"),
    ("job", "[job]\n@"),
    ("case", "[case.a]\n@"),
    ("combination", "[combination.a]\n@"),
    ("material", "[material.a]\n@"),
    ("table of defaults", "[default]\n@"),
    ("member", "[member.a]\n@"),
    ("segment", "[[member.a.segment]]\n@"),
    ("segment", "[[member.a.segment]]\nstiffness = \"1 N/m\"\n@"),
    (
        "layer",
        "[[member.a.segment]]\n[[member.a.segment.layer]]\n@",
    ),
    (
        "table of holes",
        "[[member.a.segment]]\n[member.a.segment.holes]\n@",
    ),
    (
        "section",
        "[[member.a.segment]]\n[member.a.segment.section]\n@",
    ),
    (
        "section",
        "[[member.a.segment]]\n[member.a.segment.section]\narea = \"1 m2\"\n@",
    ),
    (
        "section",
        "[[member.a.segment]]\n[member.a.segment.section]\nthread = \"M24\"\n@",
    ),
    (
        "tube",
        "[[member.a.segment]]\n[member.a.segment.section.tube]\n@",
    ),
    (
        "bar",
        "[[member.a.segment]]\n[member.a.segment.section.bar]\n@",
    ),
    (
        "box",
        "[[member.a.segment]]\n[member.a.segment.section.box]\n@",
    ),
    ("h", "[[member.a.segment]]\n[member.a.segment.section.h]\n@"),
    (
        "channel",
        "[[member.a.segment]]\n[member.a.segment.section.channel]\n@",
    ),
    (
        "angle",
        "[[member.a.segment]]\n[member.a.segment.section.angle]\n@",
    ),
    (
        "tee",
        "[[member.a.segment]]\n[member.a.segment.section.tee]\n@",
    ),
    ("support", "[[member.a.support]]\n@"),
    ("load", "[[member.a.load]]\n@"),
    ("body", "[body.a]\n@"),
    ("hold", "[[hold]]\n@"),
    ("load of the job", "[[load]]\n@"),
    ("load of the job", "[[load]]\nbody = \"a\"\n@"),
    ("load of the job", "[[load]]\npoint = \"a\"\n@"),
    ("load of the job", "[[load]]\nhold = \"a\"\n@"),
    ("watch", "[[watch]]\n@"),
    ("watch", "[[watch]]\npoint = \"a\"\n@"),
    ("watch", "[[watch]]\nbody = \"a\"\n@"),
    ("limit of a hold", "[[hold]]\n[hold.limit]\n@"),
    ("limit of a member", "[member.a.limit]\n@"),
    (
        "limit of a segment",
        "[[member.a.segment]]\n[member.a.segment.limit]\n@",
    ),
    (
        "limit of a part known by its stiffness",
        "[[member.a.segment]]\nstiffness = \"1 N/m\"\n[member.a.segment.limit]\n@",
    ),
    (
        "limit of a gap",
        "[[member.a.segment]]\ngap = \"1 mm\"\n[member.a.segment.limit]\n@",
    ),
    (
        "limit of a layer",
        "[[member.a.segment]]\n[[member.a.segment.layer]]\n[member.a.segment.layer.limit]\n@",
    ),
    (
        "limit of a support",
        "[[member.a.support]]\nspring = \"1 N/m\"\n[member.a.support.limit]\n@",
    ),
    (
        "limit of a stop",
        "[[member.a.support]]\nstop = \"1 mm\"\n[member.a.support.limit]\n@",
    ),
    (
        "limit of a gap's width",
        "[[member.a.support]]\nstop = \"1 mm\"\n[member.a.support.limit.gap]\n@",
    ),
    (
        "limit of a displacement",
        "[[member.a.limit.displacement]]\n@",
    ),
];

/// What a job with `key = [[true]]` in its hole is refused for at that line.
fn refusals(hole: &str, key: &str) -> Vec<(usize, ErrorEntry)> {
    let text = hole.replace('@', &format!("{key} = [[true]]"));
    let line = text
        .lines()
        .position(|line| line.contains("[[true]]"))
        .unwrap()
        + 1;
    let value = key.len() + " = ".len();
    let errors = check_text("job.toml", &text).errors;
    let here = errors.into_iter().filter(|error| error.line == Some(line));
    here.map(|error| (value, error)).collect()
}

/// No key takes `[[true]]`: a key is read where that is refused at the value, not at the key.
#[test]
fn the_program_reads_each_key_that_the_page_lists() {
    for (table, keys) in listed(&page()) {
        for key in keys {
            let holes = HOLES.iter().filter(|(of, _)| *of == table);
            let is_read = holes.clone().any(|(_, hole)| {
                let mut refusals = refusals(hole, &key).into_iter();
                refusals.any(|(value, error)| error.column.is_some_and(|column| column > value))
            });
            assert!(is_read, "`{key}` of {table} is not read");
        }
    }
}

#[test]
fn keys_that_come_later_are_refused_by_name() {
    for table in page().tables("later") {
        for row in &table.rows {
            for key in code(row[0]) {
                let (_, hole) = HOLES.iter().find(|(of, _)| *of == row[1]).unwrap();
                let refusals = refusals(hole, key);
                let by_name = |(_, error): &(usize, ErrorEntry)| {
                    error.message.starts_with(&format!("`{key}` ("))
                        && error.message.ends_with("is not read by this version")
                };
                assert!(refusals.iter().any(by_name), "{key}: {refusals:?}");
            }
        }
    }
}

#[test]
fn every_job_on_the_page_runs() {
    let page = page();
    let mut jobs = 0;
    for block in page.blocks().iter().filter(|block| block.kind == "toml") {
        let result = check_text("job.toml", block.text);
        assert_eq!(result.errors, [], "{}", block.text);
        assert_ne!(result.status, JobStatus::Fail, "{}", block.text);
        jobs += 1;
    }
    assert!(jobs >= 10);
}

#[test]
fn every_refusal_on_the_page_is_shown_word_for_word() {
    let page = page();
    let blocks = page.blocks();
    let mut shown = Vec::new();
    for (index, block) in blocks.iter().enumerate() {
        if block.kind == "toml,refused" {
            let drawn = check_bytes("job.toml", block.text.as_bytes()).drawn_errors;
            assert!(!drawn.is_empty(), "not refused: {}", block.text);
            assert_eq!(blocks[index + 1].kind, "text");
            shown.push((&blocks[index + 1], drawn));
        }
    }
    assert!(!shown.is_empty());
    page.hold(&shown);
}

#[test]
fn the_page_lists_the_library() {
    let page = page();
    let table = &page.tables("materials")[0];
    let listed: BTreeMap<&str, Vec<&str>> = table
        .rows
        .iter()
        .map(|row| (code(row[0])[0], code(row[1])))
        .collect();
    let all: Vec<&str> = listed.values().flatten().copied().collect();
    let known: BTreeSet<&str> = catalogue::ids().collect();
    assert_eq!(all.len(), known.len());
    assert_eq!(all.into_iter().collect::<BTreeSet<_>>(), known);
    for (file, text) in catalogue::files() {
        for id in listed.get(file).into_iter().flatten() {
            assert!(text.contains(&format!("[material.{id}]")), "{id} in {file}");
        }
    }
}

#[test]
fn the_units_on_the_page_are_read() {
    fn reads<Q: Measure>(unit: &str) -> bool {
        quantity::read::<Q>(&format!("2 {unit}")).is_ok()
    }
    let page = page();
    for row in &page.tables("units")[0].rows {
        let is_read: fn(&str) -> bool = match row[0] {
            "length" => reads::<Length>,
            "area" => reads::<Area>,
            "force" => reads::<Force>,
            "moment" => reads::<Moment>,
            "mass" => reads::<Mass>,
            "force per length (line load, stiffness)" => reads::<ForcePerLength>,
            "stress" => reads::<Stress>,
            "density" => reads::<Density>,
            "mass per length" => reads::<MassPerLength>,
            "coefficient of expansion" => reads::<Expansion>,
            "temperature" => |unit| {
                quantity::read_reading(&format!("400 {unit}")).is_ok()
                    && quantity::read_change(&format!("+4 {unit}")).is_ok()
            },
            "angle" => reads::<Angle>,
            "strain" => reads::<Ratio>,
            other => panic!("{other} is no kind of value"),
        };
        for unit in code(row[1]) {
            assert!(is_read(unit), "{unit} of {}", row[0]);
        }
    }
}

#[test]
fn the_literals_on_the_page_are_read() {
    fn reads<Q: Measure>(text: &str) -> bool {
        quantity::read::<Q>(text).is_ok()
    }
    let readers: [fn(&str) -> bool; 10] = [
        reads::<Length>,
        reads::<Force>,
        reads::<ForcePerLength>,
        reads::<Stress>,
        reads::<Density>,
        reads::<Expansion>,
        |text| quantity::read_change(text).is_ok(),
        |text| quantity::read_reading(text).is_ok(),
        |text| quantity::read_stress_limit(text).is_ok(),
        |text| quantity::read_movement_bound(text).is_ok(),
    ];
    let page = page();
    let mut literals = 0;
    for row in &page.tables("literals")[0].rows {
        for written in code(row[1])
            .into_iter()
            .filter(|code| code.ends_with(['"', '\'']))
        {
            let line: toml::Table = format!("value = {written}").parse().unwrap();
            let text = line["value"].as_str().unwrap();
            assert!(readers.iter().any(|reads| reads(text)), "{written}");
            literals += 1;
        }
    }
    assert!(literals > 25);
}

#[test]
fn the_threads_on_the_page_are_those_of_their_series() {
    let page = page();
    let tables = page.tables("keys");
    let section = tables.iter().find(|table| table.name == "section").unwrap();
    let row = section
        .rows
        .iter()
        .find(|row| row[0] == "`thread`")
        .unwrap();
    let threads = code(row[1]);
    assert!(threads.len() > 3);
    for thread in threads {
        let thread = thread.trim_matches('"');
        assert!(Thread::parse(thread).is_ok(), "{thread}");
    }
}
