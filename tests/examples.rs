//! The example jobs: each runs as it stands, ends as its head says, and proves itself.

#![allow(clippy::unwrap_used)] // of what the tests themselves read

use lengthwise::result::{CheckResult, JobResult, JobStatus, MemberResult, Residuals, Unit};
use std::fs;
use std::path::{Path, PathBuf};
use std::process::{Command, Stdio};
use toml::{Table, Value};

/// One example: its text, the same as a table, and what the library makes of it.
struct Example {
    path: PathBuf,
    text: String,
    table: Table,
    result: JobResult,
}

impl Example {
    /// What a line `# KEY: VALUE` at the head of the file says.
    fn stated(&self, key: &str) -> Option<&str> {
        let head = self.text.lines().take_while(|line| line.starts_with('#'));
        head.filter_map(|line| {
            line.strip_prefix("# ")?
                .strip_prefix(key)?
                .strip_prefix(": ")
        })
        .next()
    }

    fn members(&self) -> impl Iterator<Item = &MemberResult> {
        let combinations = self.result.combinations.iter();
        combinations.flat_map(|combination| &combination.members)
    }

    fn checks(&self) -> impl Iterator<Item = &CheckResult> {
        let combinations = self.result.combinations.iter();
        combinations.flat_map(|combination| &combination.checks)
    }

    /// Whether the job file writes this key anywhere, with a value that `is` what is sought.
    fn writes(&self, key: &str, is: impl Fn(&Value) -> bool + Copy) -> bool {
        fn within(value: &Value, key: &str, is: impl Fn(&Value) -> bool + Copy) -> bool {
            match value {
                Value::Table(table) => table
                    .iter()
                    .any(|(name, value)| (name == key && is(value)) || within(value, key, is)),
                Value::Array(list) => list.iter().any(|value| within(value, key, is)),
                _ => false,
            }
        }
        within(&Value::Table(self.table.clone()), key, is)
    }

    fn has(&self, key: &str) -> bool {
        self.writes(key, |_| true)
    }
}

fn job_files(folder: &Path) -> Vec<PathBuf> {
    let mut found = Vec::new();
    for entry in fs::read_dir(folder).unwrap() {
        let path = entry.unwrap().path();
        if path.is_dir() {
            found.extend(job_files(&path));
        } else if path.extension().is_some_and(|ending| ending == "toml") {
            found.push(path);
        }
    }
    found.sort();
    found
}

fn folder() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("examples")
}

fn examples() -> Vec<Example> {
    let read = |path: PathBuf| {
        let text = fs::read_to_string(&path).unwrap();
        let result = lengthwise::check_text(&path.to_string_lossy(), &text);
        let table = text.parse().unwrap();
        Example {
            path,
            text,
            table,
            result,
        }
    };
    job_files(&folder()).into_iter().map(read).collect()
}

#[test]
fn the_program_ends_with_the_status_that_each_states() {
    for example in examples() {
        let stated: i32 = example
            .stated("expected status")
            .unwrap_or_else(|| panic!("{} states no status", example.path.display()))
            .parse()
            .unwrap();
        assert!(stated == 0 || stated == 1, "an example runs");
        let status = Command::new(env!("CARGO_BIN_EXE_lengthwise"))
            .arg("check")
            .arg(&example.path)
            .stdout(Stdio::null())
            .status()
            .unwrap();
        assert_eq!(status.code(), Some(stated), "{}", example.path.display());
    }
}

#[test]
fn every_combination_proves_itself() {
    for example in examples() {
        let name = example.path.display();
        assert_eq!(example.result.errors, [], "{name}");
        assert!(!example.result.combinations.is_empty(), "{name}");
        for combination in &example.result.combinations {
            let Residuals {
                equilibrium,
                compatibility,
                energy,
            } = combination.residuals;
            for residual in [equilibrium, compatibility, energy] {
                assert!(
                    residual <= 1e-9,
                    "{name}, {}: {residual:e}",
                    combination.name
                );
            }
        }
    }
}

#[test]
fn the_stated_cautions_are_given() {
    let mut stated = 0;
    for example in examples() {
        for wanted in example
            .stated("expected cautions")
            .into_iter()
            .flat_map(|list| list.split("; "))
        {
            stated += 1;
            let cautions = &example.result.cautions;
            let given = cautions
                .iter()
                .any(|caution| caution.text.contains(wanted) && caution.line.is_some());
            assert!(
                given,
                "{}: no caution says `{wanted}` at a line: {cautions:#?}",
                example.path.display()
            );
        }
    }
    assert!(stated > 10, "the heads of the examples are read");
}

/// A passing example that is at 10 % or at 99 % everywhere says little: what governs lies between.
#[test]
fn what_governs_is_neither_idle_nor_on_the_edge() {
    for example in examples() {
        let largest = example
            .checks()
            .filter_map(|check| check.utilisation)
            .fold(0.0, f64::max);
        let sensible = match example.result.status {
            JobStatus::Pass => 0.3..0.97,
            JobStatus::Fail => 1.1..2.0,
            JobStatus::Unchecked => 0.0..f64::MIN_POSITIVE,
            JobStatus::Error => panic!("{} is in error", example.path.display()),
        };
        assert!(
            sensible.contains(&largest),
            "{}: {largest}",
            example.path.display()
        );
    }
}

#[test]
fn each_says_whose_work_it_is_and_that_it_is_invented() {
    for example in examples() {
        let name = example.path.display();
        assert!(example.text.contains("invented place"), "{name}");
        assert!(example.result.title.is_some(), "{name}");
        let reference = example.result.reference.as_deref().unwrap_or_default();
        assert!(reference.starts_with("QFT-"), "{name}: {reference}");
    }
}

#[test]
fn the_index_has_one_line_for_each() {
    let index = fs::read_to_string(folder().join("README.md")).unwrap();
    let listed: Vec<&str> = index
        .lines()
        .filter_map(|line| line.strip_prefix("| `")?.split('`').next())
        .collect();
    let mut sorted = listed.clone();
    sorted.sort_unstable();
    let files = job_files(&folder());
    let files: Vec<_> = files
        .iter()
        .map(|path| path.file_name().unwrap().to_str().unwrap())
        .collect();
    assert_eq!(sorted, files);
}

fn text(value: &Value, sought: &str) -> bool {
    value.as_str().is_some_and(|text| text.contains(sought))
}

/// What tells that a job is of a kind.
type Told = fn(&Example) -> bool;

/// The kinds of work that the set holds, each told by what only such a job has.
#[test]
fn no_kind_of_work_is_missing() {
    let kinds: [(&str, Told); 15] = [
        ("hanger with thread", |job| {
            job.has("thread") && job.writes("runs", |runs| text(runs, "down"))
        }),
        ("stepped column with layers", |job| {
            job.members().any(|member| {
                member.segments.len() > 2
                    && member
                        .segments
                        .iter()
                        .all(|segment| segment.layers.len() == 2)
            })
        }),
        ("deck joint", |job| {
            job.members()
                .any(|member| member.segments.iter().any(|segment| segment.gap.is_some()))
        }),
        ("building joint", |job| {
            job.checks()
                .any(|check| &*check.check == "gap" && check.details.contains_key("max"))
                && job.writes("movement", Value::is_table)
        }),
        ("restrained pipe", |job| {
            job.has("tube") && job.members().any(|member| member.restraint > Some(0.5))
        }),
        ("pile with shaft friction", |job| {
            job.writes("line", |line| {
                line.as_table()
                    .is_some_and(|cases| cases.values().all(Value::is_array))
            })
        }),
        ("press tie rod", |job| {
            job.has("misfit") && job.writes("side", |side| text(side, "start"))
        }),
        ("jack with stop", |job| {
            job.has("misfit")
                && job.has("bears")
                && job.checks().any(|check| &*check.check == "gap")
        }),
        ("tapered mast", |job| {
            job.writes("outer", Value::is_array) && job.has("line-down")
        }),
        ("elastic supports", |job| {
            job.members().any(|member| member.supports.len() >= 5)
        }),
        ("cold line", |job| {
            job.result.datum.is_some()
                && job.writes("temperature", |reading| text(reading, "-161 degC"))
        }),
        ("shores on a slope", |job| {
            job.writes("runs", |runs| text(runs, "deg"))
                && job.members().any(|member| member.force_max.value < 0.0)
        }),
        ("failing", |job| job.result.status == JobStatus::Fail),
        ("unchecked", |job| job.result.status == JobStatus::Unchecked),
        ("US units", |job| {
            job.result.units == lengthwise::quantity::Units::US
        }),
    ];
    let examples = examples();
    assert!(examples.len() >= 14);
    for (kind, is) in kinds {
        assert!(examples.iter().any(is), "no example is a {kind}");
    }
}

#[test]
fn every_kind_of_limit_and_of_combination_is_shown() {
    let examples = examples();
    let limits = [
        "tension",
        "compression",
        "force",
        "elongation",
        "displacement",
        "reaction",
        "gap",
        "bears",
    ];
    for limit in limits {
        let made = examples
            .iter()
            .flat_map(Example::checks)
            .filter(|check| &*check.check == limit);
        assert!(made.count() > 1, "no example holds a {limit}");
    }
    let keys = [
        "always", "since", "purpose", "source", "in", "like", "modulus", "net", "holes", "count",
        "mass",
    ];
    for key in keys {
        assert!(
            examples.iter().any(|example| example.has(key)),
            "no example writes `{key}`"
        );
    }
    let yes_or_no = examples
        .iter()
        .flat_map(Example::checks)
        .filter(|check| check.unit == Unit::None);
    assert!(yes_or_no.count() > 0);
}
