//! `docs/results.md`: every name of the JSON, both ways, and the columns of the CSV.

use super::page::{Page, code, root};
use lengthwise::quantity::from_si;
use lengthwise::report::{csv, json};
use lengthwise::result::{
    AssemblyTotals, BodyResult, Counts, HoldResult, JobResult, PointResult, Rotation, SupportWord,
    Unit, Verdict, Warning, WatchResult,
};
use lengthwise::{catalogue, check_text};
use serde_json::Value;
use std::collections::{BTreeMap, BTreeSet};
use std::fs;

/// A job that is refused, so that there are errors to name.
const REFUSED: &str = "[member.tie]\nstart = 1\n";

/// The results of all examples and of one job that is refused, as a document.
fn document() -> Value {
    let mut jobs = vec![check_text("refused.toml", REFUSED)];
    for entry in fs::read_dir(root().join("examples")).unwrap() {
        let path = entry.unwrap().path();
        if path.extension().is_some_and(|ending| ending == "toml") {
            let text = fs::read_to_string(&path).unwrap();
            jobs.push(check_text(&path.to_string_lossy(), &text));
        }
    }
    assert!(jobs.len() > 12);
    jobs.push(assembly());
    let mut counts = Counts::default();
    jobs.iter().for_each(|job| counts.add(job));
    let document = json::document(jobs, counts, catalogue::digest());
    serde_json::to_value(document).unwrap()
}

/// What only an assembly has, made by hand.
fn assembly() -> JobResult {
    let text = fs::read_to_string(root().join("examples/press-tie-rod.toml")).unwrap();
    let mut job = check_text("by-hand.toml", &text);
    let (point, force) = (from_si(0.001), from_si(1e3));
    let combination = &mut job.combinations[0];
    combination.points = vec![PointResult {
        name: "a".into(),
        displacement: vec![point],
        reaction: Some(vec![force]),
    }];
    combination.holds = vec![HoldResult {
        name: "hold.1".into(),
        point: "a".into(),
        kind: SupportWord::Fixed,
        reaction: Some(vec![force]),
        gap: None,
        bears: None,
    }];
    combination.bodies = vec![BodyResult {
        name: "beam".into(),
        displacement: vec![point],
        rotation: Rotation::InPlane(from_si(0.0)),
    }];
    combination.watches = vec![WatchResult {
        name: "watch.1".into(),
        value: Some(0.001),
        unit: Unit::Metre,
    }];
    combination.totals = Some(AssemblyTotals {
        applied: vec![-force],
        reactions: vec![force],
    });
    job.warnings = vec![Warning {
        check: "tension".into(),
        on: "rod.1".into(),
        at: None,
        combination: "all".into(),
        stress: 3e8,
        allowable: 3e8,
        ratio: Some(1.0),
        status: Verdict::Pass,
        line: 1,
    }];
    job
}

type Names = BTreeMap<String, BTreeSet<String>>;

/// The names in an object and in all below it, by what the object is.
fn gather(what: &str, value: &Value, names: &mut Names) {
    let object = match value {
        Value::Array(list) => return list.iter().for_each(|value| gather(what, value, names)),
        Value::Object(object) => object,
        _ => return,
    };
    for (name, below) in object {
        names
            .entry(what.to_owned())
            .or_default()
            .insert(name.clone());
        let below_is = match (what, name.as_str()) {
            (_, "factors") => continue, // its names are those of cases
            ("document", "jobs") => "job",
            ("job", "errors") => "error",
            ("job", "warnings") => "warning",
            ("combination", "points") => "point",
            ("combination", "holds") => "hold",
            ("combination", "bodies") => "body",
            ("combination", "watches") => "watch",
            ("job", "cautions") => "caution",
            ("job", "notes") => "note",
            ("job", "materials") => "material",
            ("job", "combinations") => "combination",
            ("combination", "members") => "member",
            ("combination", "checks") => "check",
            ("member", "segments") => "segment",
            ("member", "stations") => "station",
            ("member", "supports") => "support",
            ("segment", "layers") => "layer",
            (_, same) => same,
        };
        gather(below_is, below, names);
    }
}

fn listed(page: &Page) -> BTreeMap<String, BTreeMap<String, String>> {
    let tables = page.tables("names").into_iter().map(|table| {
        let rows = table.rows.iter().map(|row| {
            let unit = row[1].trim_matches('`').to_owned();
            (code(row[0])[0].to_owned(), unit)
        });
        (table.name.to_owned(), rows.collect())
    });
    tables.collect()
}

#[test]
fn the_page_names_what_the_json_holds() {
    let mut names = Names::new();
    gather("document", &document(), &mut names);
    let listed: Names = listed(&Page::read("docs/results.md"))
        .into_iter()
        .map(|(what, rows)| (what, rows.into_keys().collect()))
        .collect();
    for (what, names) in &names {
        assert_eq!(listed.get(what), Some(names), "{what}");
    }
    assert_eq!(
        listed.keys().collect::<Vec<_>>(),
        names.keys().collect::<Vec<_>>()
    );
}

#[test]
fn the_columns_of_the_csv_are_the_names_of_the_page_with_their_units() {
    let page = Page::read("docs/results.md");
    let names = listed(&page);
    let tables = page.tables("csv");
    let rows = &tables[0].rows;
    assert_eq!(rows.len(), csv::Table::ALL.len());
    for (row, (name, table)) in rows.iter().zip(csv::Table::ALL) {
        assert_eq!(code(row[0]), [name]);
        let mut header = Vec::new();
        csv::write_header(&mut header, table).unwrap();
        let header = String::from_utf8(header).unwrap();
        let columns: Vec<&str> = header.trim_end().split(',').collect();
        let first = code(row[2]);
        assert_eq!(columns[..first.len()], first, "{name}");
        for column in &columns[first.len()..] {
            let (column, unit) = match column.split_once(" [") {
                Some((column, unit)) => (column, unit.trim_end_matches(']')),
                None => (*column, ""),
            };
            // A list over coordinates has a column for each.
            let list = column.strip_suffix(['x', 'y', 'z']);
            let name = list
                .and_then(|list| list.strip_suffix('_'))
                .unwrap_or(column);
            let unit_on_page = names[row[1]]
                .get(name)
                .or_else(|| names["totals"].get(column).filter(|_| row[1] == "member"))
                .unwrap_or_else(|| panic!("{column} of {name} is no name of a {}", row[1]));
            let plain = ["text", "1", "number", "object", "yes or no", "unit"];
            let expected = if plain.contains(&unit_on_page.as_str()) {
                ""
            } else {
                unit_on_page
            };
            assert_eq!(unit, expected, "{column} of {name}");
        }
    }
}
