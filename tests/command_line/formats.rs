//! The three formats of the results, and that they say the same.

use crate::{
    BROKEN, FAILS, PASSES, UNCHECKED, errors, folder_of, lengthwise, printed, status, text,
};
use lengthwise::result::{Document, JobResult};
use serde_json::Value;
use sha2::{Digest, Sha256};
use std::fs;
use std::path::{Path, PathBuf};
use tempfile::TempDir;

const TABLES: [&str; 8] = [
    "members",
    "segments",
    "layers",
    "stations",
    "supports",
    "checks",
    "governing",
    "envelope",
];

/// The digest as the results write it, by the general library.
fn digest(bytes: &[u8]) -> String {
    let hex: String = Sha256::digest(bytes)
        .iter()
        .map(|byte| format!("{byte:02x}"))
        .collect();
    format!("sha256:{hex}")
}

fn document(paths: &[&str]) -> (String, Document) {
    let output = lengthwise(&[&["check", "--format", "json"], paths].concat());
    let text = printed(&output).to_owned();
    let document = serde_json::from_str(&text).unwrap();
    (text, document)
}

fn table(paths: &[&str], name: &str) -> Vec<csv::StringRecord> {
    let arguments = [&["check", "--format", "csv", "--table", name], paths].concat();
    let output = lengthwise(&arguments);
    let mut reader = csv::Reader::from_reader(output.stdout.as_slice());
    assert_eq!(&reader.headers().unwrap()[0], "file", "{name}");
    reader.records().map(Result::unwrap).collect()
}

fn example(name: &str) -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR"))
        .join("examples")
        .join(name)
}

fn mixed() -> TempDir {
    folder_of(&[
        ("a.toml", PASSES),
        ("b.toml", FAILS),
        ("c.toml", UNCHECKED),
        ("d.toml", BROKEN),
    ])
}

#[test]
fn json_reads_back_equal_and_bears_the_digests_of_what_it_rests_on() {
    let folder = mixed();
    let (text_of, document) = document(&[text(folder.path())]);
    assert_eq!(serde_json::to_string(&document).unwrap() + "\n", text_of);
    for job in &document.jobs {
        let bytes = fs::read(&job.file).unwrap();
        assert_eq!(
            job.digest.as_deref(),
            Some(digest(&bytes).as_str()),
            "{}",
            job.file
        );
    }
    assert_eq!(document.tool.catalogue, lengthwise::catalogue::digest());
    let hexadecimal = document.tool.catalogue.strip_prefix("sha256:").unwrap();
    assert!(hexadecimal.len() == 64 && hexadecimal.bytes().all(|byte| byte.is_ascii_hexdigit()));
}

/// The digest is of the shipped tables as they lie in `materials/`, one after another.
#[test]
fn the_digest_of_the_catalogue_is_of_the_shipped_tables() {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("materials");
    let entries = fs::read_dir(&folder).unwrap();
    let names = entries.map(|entry| entry.unwrap().file_name().into_string().unwrap());
    let mut shipped: Vec<String> = names.filter(|name| name.ends_with(".toml")).collect();
    shipped.sort();
    let listed = lengthwise::catalogue::files().iter().map(|(name, _)| *name);
    let mut sorted: Vec<&str> = listed.clone().collect();
    sorted.sort_unstable();
    assert_eq!(sorted, shipped, "every table of the folder is built in");
    let bytes: Vec<u8> = listed
        .flat_map(|name| fs::read(folder.join(name)).unwrap())
        .collect();
    assert_eq!(lengthwise::catalogue::digest(), digest(&bytes));
}

#[test]
fn every_table_of_csv_has_the_rows_of_the_json() {
    let paths = ["hall-column.toml", "press-tie-rod.toml"].map(example);
    let paths = [text(&paths[0]), text(&paths[1])];
    let (_, document) = document(&paths);
    let combinations = || document.jobs.iter().flat_map(|job| &job.combinations);
    let members = || combinations().flat_map(|combination| &combination.members);
    let segments = || members().flat_map(|member| &member.segments);
    for name in TABLES {
        let expected = match name {
            "members" => members().count(),
            "segments" => segments().count(),
            "layers" => segments().map(|segment| segment.layers.len()).sum(),
            "stations" => members().map(|member| member.stations.len()).sum(),
            "supports" => members().map(|member| member.supports.len()).sum(),
            "checks" => combinations()
                .map(|combination| combination.checks.len())
                .sum(),
            "governing" => document.jobs.iter().map(|job| job.governing.len()).sum(),
            _ => document.jobs.iter().map(|job| job.envelope.len()).sum(),
        };
        assert!(expected > 0, "{name} is shown by these jobs");
        assert_eq!(table(&paths, name).len(), expected, "{name}");
    }
}

#[test]
fn a_table_without_rows_has_its_header() {
    let folder = folder_of(&[("a.toml", UNCHECKED)]);
    let output = lengthwise(&[
        "check",
        text(folder.path()),
        "--format",
        "csv",
        "--table",
        "checks",
    ]);
    assert_eq!(status(&output), 0);
    assert_eq!(printed(&output).lines().count(), 1);
    assert!(printed(&output).starts_with("file,combination,check,on,"));
}

/// Demand, limit and utilisation of the governing checks in the text report, in its units.
fn told_in_text(report: &str, check: &str, on: &str) -> Option<(f64, f64, f64, String)> {
    let block = report.split("\nGoverning checks\n").nth(1)?;
    let mut rows = block.lines().take_while(|line| !line.is_empty());
    let row = rows.find(|row| row.starts_with(&format!("{check} ")) && row.contains(on))?;
    let words: Vec<&str> = row.split(on).nth(1)?.split_whitespace().collect();
    let [demand, limit, _, used, verdict] = words.as_slice() else {
        return None;
    };
    Some((
        demand.parse().ok()?,
        limit.parse().ok()?,
        used.parse().ok()?,
        (*verdict).to_owned(),
    ))
}

#[test]
fn text_json_and_csv_agree_on_place_count_and_numbers() {
    let path = example("ramp-stay-as-found.toml");
    let path = text(&path);
    let (_, document) = document(&[path]);
    let [JobResult { governing, .. }] = document.jobs.as_slice() else {
        panic!("one job");
    };
    let report = lengthwise(&["check", path, "--digits", "6"]);
    let report = printed(&report);
    let rows = table(&[path], "governing");
    assert_eq!(rows.len(), governing.len());
    assert!(governing.len() > 5);
    for (row, check) in rows.iter().zip(governing) {
        let field = |index: usize| row[index].to_owned();
        assert_eq!(field(1), *check.combination);
        assert_eq!(
            (field(2), field(3)),
            (check.check.to_string(), check.on.to_string())
        );
        assert_eq!(field(4).parse().ok(), check.at);
        assert_eq!(
            field(6).parse::<f64>().unwrap().to_bits(),
            check.demand.to_bits()
        );
        assert_eq!(
            field(7).parse::<f64>().unwrap().to_bits(),
            check.limit.to_bits()
        );
        assert_eq!(field(9).parse().ok(), check.utilisation);
        assert_eq!(field(12).parse::<usize>().unwrap(), check.line);

        let (demand, limit, used, verdict) = told_in_text(report, &check.check, &check.on)
            .unwrap_or_else(|| panic!("no row of {} on {}:\n{report}", check.check, check.on));
        // mm and MPa in the text, m and Pa in the JSON.
        let factor = if field(8) == "Pa" { 1e6 } else { 1e-3 };
        approx::assert_relative_eq!(demand * factor, check.demand, max_relative = 5e-6);
        approx::assert_relative_eq!(limit * factor, check.limit, max_relative = 5e-6);
        approx::assert_abs_diff_eq!(used, check.utilisation.unwrap(), epsilon = 5e-6);
        assert_eq!(verdict, field(10));
    }
    let counts = document.counts;
    let looked_at = format!(
        "Looked at {} file, {} members, {} combinations and {} checks: {} pass, {} fail.\n",
        counts.files, counts.members, counts.combinations, counts.checks, counts.pass, counts.fail
    );
    assert!(report.ends_with(&looked_at), "{looked_at}");
    assert_eq!(table(&[path], "checks").len(), counts.checks);
}

#[test]
fn errors_stand_at_the_same_place_in_text_and_json() {
    let folder = mixed();
    let (_, document) = document(&[text(folder.path())]);
    let drawn = lengthwise(&["check", text(folder.path()), "--brief"]);
    let job = &document.jobs[3];
    assert_eq!((job.errors.len(), job.errors_total), (2, 2));
    for error in &job.errors {
        let (line, column) = (error.line.unwrap(), error.column.unwrap());
        let head = format!(
            "{}, line {line}, column {column}: {}",
            job.file, error.message
        );
        assert!(errors(&drawn).contains(&head), "{head}\n{}", errors(&drawn));
    }
    assert!(printed(&drawn).contains("; 2\nerrors.") || printed(&drawn).contains("; 2 errors."));
    let errors = serde_json::to_value(document.counts).unwrap()["errors"].clone();
    assert_eq!(errors, Value::from(2));
}
